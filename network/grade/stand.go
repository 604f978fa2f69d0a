package grade

import (
	"math"

	"rimfall/network"
)

// stand finds the level of a structure from its pipes out: the highest that one of them asks for with its own flow. It is
// not known where a pipe out is not.
//
// Where water flows, a pipe out without flow counts only when water from below stands in its end; its invert holds nothing
// back. Where nothing flows the highest end is the level.
func (l *Lines) stand(s network.StructureIndex) {
	at, out := &l.Structures[s], l.network.PipesOut(s)
	at.Out, at.plunge, at.counted = none, math.Inf(1), 1
	flows := false
	for _, p := range out {
		if !l.Pipes[p].Known {
			return
		}
		flows = flows || l.flows.Pipes[p].Flow > 0
	}
	for _, p := range out {
		if l.flows.Pipes[p].Flow <= 0 && flows && l.Pipes[p].HGLUpper <= l.network.Pipes[p].InvertUpper.V {
			continue
		}
		if set := l.ask(s, p); !at.Known || set.Level > at.Level {
			*at = set
		}
	}
}

// ask is the level of a structure as one pipe out sets it.
func (l *Lines) ask(s network.StructureIndex, p network.PipeIndex) Structure {
	given, line := &l.network.Structures[s], &l.Pipes[p]
	set := Structure{Known: true, Level: line.EGLUpper, Out: p, plunge: math.Inf(1), counted: 1}
	if l.flows.Pipes[p].Flow <= 0 {
		return set
	}
	m := l.mouth(p)
	set.plunge = m.invert + m.entry
	junction, ok := l.junction(s, p)
	switch {
	case given.Loss.OK:
		set.Parts.Coefficient = given.Loss.V * m.head
	case l.settings.Method == NoLoss:
	case ok:
		set.Parts.Junction = junction
	case l.settings.Method == Coefficient:
		set.Parts.Coefficient = l.coefficient(s, &m) * m.head
	default:
		set.Parts = l.accessHole(s, &m)
		set.counted = stillCounted
	}
	set.Level += set.Parts.Sum()
	return set
}

// mouth is the upper end of a pipe out, as the structure above it sees it. Heights are over its invert.
type mouth struct {
	pipe   network.PipeIndex
	flow   float64 // of all barrels
	invert float64
	rise   float64 // Do
	energy float64 // Ei, just inside
	head   float64 // Vo²/2g, just inside
	entry  float64 // Eai, in the structure before the losses of benching, angle and plunging
}

// mouth measures the upper end of a pipe out.
func (l *Lines) mouth(p network.PipeIndex) mouth {
	pipe, line := &l.network.Pipes[p], &l.Pipes[p]
	m := mouth{
		pipe: p, flow: l.flows.Pipes[p].Flow, invert: pipe.InvertUpper.V, rise: pipe.Section.Rise(),
		energy: line.EGLUpper - pipe.InvertUpper.V, head: line.EGLUpper - line.HGLUpper,
	}
	barrels := float64(pipe.Count)
	intensity := dischargeIntensity(m.flow/barrels, pipe.FullArea()/barrels, m.rise, l.settings.Gravity)
	m.entry = entryEnergy(m.energy, m.head, m.rise, intensity, line.full)
	return m
}

// plunges tells whether a pipe enters above the energy in the structure.
func (l *Lines) plunges(in network.PipeIndex, m *mouth) bool {
	invert := l.network.Pipes[in].InvertLower
	return invert.OK && invert.V > m.invert+m.entry
}
