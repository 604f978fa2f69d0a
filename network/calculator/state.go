package calculator

import (
	"math"

	"rimfall/network"
	"rimfall/pipeflow"
)

// State is a flow at one depth with all that a hand calculation writes down.
type State struct {
	Depth, Flow, Velocity float64
	N                     float64 // roughness at this depth
	pipeflow.Geometry
	Radius        float64       // hydraulic radius
	HydraulicDeep network.Maybe // A/T; none where the section is full
	Ratio         network.Maybe // depth over rise, of a closed section

	// Full-bore capacity of a closed section, and the most that it carries.
	FullFlow, FullVelocity, LargestFlow, LargestDepth network.Maybe

	CriticalDepth, CriticalSlope network.Maybe // none under a flat roof that the flow would need to rise above
	Froude                       network.Maybe // none where the section is full
	Energy                       float64       // y + V²/2g
	Conjugate                    network.Maybe // depth behind a jump, of a rapid flow
	Shear                        float64       // mean boundary shear γRS, lb/ft² or Pa

	Regime    string // a closed section: part-full or full; an open one: as FlowState
	FlowState string // subcritical, critical or supercritical; blank where the section is full
}

// state works out the whole state of a flow at a depth.
func (a *Answer) state(depth, flow float64) State {
	s := a.Section
	wet := s.At(depth)
	st := State{
		Depth: depth, Flow: flow, Velocity: flow / wet.Area, N: a.flow.at(depth).N,
		Geometry: wet, Radius: wet.HydraulicRadius(),
		HydraulicDeep: maybe(wet.HydraulicDepth()),
		Shear:         pipeflow.Shear(a.Units.UnitWeight, wet.HydraulicRadius(), a.Slope),
	}
	st.Energy = depth + st.Velocity*st.Velocity/(2*a.Units.Gravity)
	if s.Closed() {
		st.Ratio = network.Some(depth / s.Rise())
		full := a.flow.flow(s.Rise())
		st.FullFlow, st.FullVelocity = network.Some(full), network.Some(full/s.At(s.Rise()).Area)
		if most, at, ok := a.flow.largest(); ok {
			st.LargestFlow, st.LargestDepth = network.Some(most), network.Some(at)
		}
	}
	a.critical(&st)
	return st
}

// critical adds the critical state and names how the water runs.
func (a *Answer) critical(st *State) {
	g := a.Units.Gravity
	st.CriticalDepth = maybe(pipeflow.CriticalDepth(a.Section, g, st.Flow))
	if st.CriticalDepth.OK {
		st.CriticalSlope = maybe(a.flow.at(st.CriticalDepth.V).CriticalSlope(a.Section, g, st.Flow))
	}
	st.Froude = maybe(pipeflow.Froude(a.Section, g, st.Depth, st.Flow))
	st.FlowState = flowState(st.Froude)
	if st.FlowState == "supercritical" {
		st.Conjugate = maybe(pipeflow.ConjugateDepth(a.Section, g, st.Depth, st.Flow))
	}
	switch {
	case !a.Section.Closed():
		st.Regime = st.FlowState
	case st.Depth >= a.Section.Rise():
		st.Regime = "full"
	default:
		st.Regime = "part-full"
	}
}

// flowState is the word for a Froude number; within a millionth of 1 it is critical,
// which no measurement could tell apart.
func flowState(froude network.Maybe) string {
	switch {
	case !froude.OK:
		return ""
	case math.Abs(froude.V-1) < 1e-6:
		return "critical"
	case froude.V < 1:
		return "subcritical"
	}
	return "supercritical"
}

func maybe(v float64, ok bool) network.Maybe {
	if !ok {
		return network.Maybe{}
	}
	return network.Some(v)
}
