package surface

import (
	"math"

	"rimfall/pipeflow"
)

// water is one flow in one pipe: what the relations along it need, worked out once.
type water struct {
	section pipeflow.Section
	rise    float64
	closed  bool
	slope   float64 // S0
	inertia float64 // Q²/g
	drag    float64 // (Q n / k)²
	full    float64 // friction slope of the pipe running full; +Inf for an open section, which never does
}

// newWater prepares a flow over 0.
func newWater(p Pipe, flow float64) water {
	resistance := flow * p.Manning.N / p.Manning.Factor
	w := water{
		section: p.Section,
		rise:    p.Section.Rise(),
		closed:  p.Section.Closed(),
		slope:   p.Manning.Slope,
		inertia: flow / p.Gravity * flow,
		drag:    resistance * resistance,
		full:    math.Inf(1),
	}
	if w.closed {
		w.full = w.friction(w.section.At(w.rise))
	}
	return w
}

// friction is the slope that the flow uses up at a wetted section, Manning's equation solved for it:
//
//	Sf = (Q n / k)² / (A² R^(4/3))    (Chow 1959, eq. 5-6)
func (w *water) friction(g pipeflow.Geometry) float64 {
	overRadius := g.Perimeter / g.Area
	return w.drag / (g.Area * g.Area) * overRadius * cubeRoot(overRadius)
}

// run is the distance upstream for a unit of depth gained, -dx/dy of Chow 1959, section 9-2:
//
//	ds/dy = (1 - Fr²) / (Sf - S0)    Fr² = Q² T / (g A³)
func (w *water) run(depth float64) float64 {
	g := w.section.At(depth)
	froude2 := w.inertia * g.TopWidth / (g.Area * g.Area * g.Area)
	return (1 - froude2) / (w.friction(g) - w.slope)
}

// force is the specific force at a depth, or with the pressure line at a height over the rise, and its change upstream:
//
//	M = Q²/(g A) + A ȳ       (Chow 1959, eq. 3-17)
//	dM/ds = A (Sf - S0)        (the momentum of a short reach: weight less friction)
func (w *water) force(depth float64) (force, change float64) {
	g := w.section.At(depth)
	force = w.inertia/g.Area + w.section.Moment(depth)
	if w.closed && depth > w.rise {
		force += g.Area * (depth - w.rise)
	}
	return force, g.Area * (w.friction(g) - w.slope)
}

// rises reports whether tranquil water at a depth below the crown stands deeper upstream: it uses more slope than the
// pipe has.
func (w *water) rises(depth float64) bool {
	return w.friction(w.section.At(depth)) > w.slope
}
