package grade

import (
	"math"

	"rimfall/network"
)

// The FHWA access-hole method: HEC-22 3rd ed. 2009 section 7.1.6.7, rendered in the Texas DOT Hydraulic Design Manual ch.
// 10 section 8 (eqs. 10-38 to 10-46). Its numbers 0.2, 1.6, 0.67, 4.5, 0.4 and the benching coefficients are from memory of
// the former.

// dischargeIntensity is the flow of one barrel against what its size would carry under gravity alone:
//
//	DI = Q / (A √(g Do))
func dischargeIntensity(flow, area, rise, gravity float64) float64 {
	return flow / (area * math.Sqrt(gravity*rise))
}

// entryEnergy is the energy in the structure that drives the flow into the pipe out, the largest of three, and not under
// the energy inside:
//
//	outlet control, full     Eaio = Ei + 0.2 Vo²/2g
//	inlet control, covered   Eais = Do DI²
//	inlet control, open      Eaiu = 1.6 Do DI^0.67
func entryEnergy(inside, head, rise, intensity float64, full bool) float64 {
	outlet := 0.0
	if full {
		outlet = inside + 0.2*head
	}
	covered := rise * intensity * intensity
	open := 1.6 * rise * math.Pow(intensity, 0.67)
	return max(outlet, covered, open, inside)
}

// stillCounted is the part of the velocity head of a pipe in that counts for the water in the structure: 0.4 is its exit
// loss.
const stillCounted = 0.6

// accessHole is what the structure adds to the energy inside the pipe out, part by part:
//
//	Ea = Eai + (CB + Cθ + CP)(Eai - Ei), not under Ei
func (l *Lines) accessHole(s network.StructureIndex, m *mouth) Parts {
	entrance := m.entry - m.energy
	angle, plunging := l.turning(s, m)
	parts := Parts{
		Entrance: entrance,
		Benching: benchingCoefficient(l.network.Structures[s].Benching, m.entry/m.rise) * entrance,
		Angle:    angle * entrance,
		Plunging: plunging * entrance,
	}
	parts.Held = max(0, -parts.Sum())
	return parts
}

// benching holds the coefficients CB, submerged and unsubmerged, in the order of the forms.
var benching = [...]struct{ submerged, unsubmerged float64 }{
	network.Flat:          {-0.05, -0.05},
	network.Depressed:     {0, 0},
	network.HalfBench:     {-0.05, -0.85},
	network.FullBench:     {-0.25, -0.93},
	network.ImprovedBench: {-0.60, -0.98},
}

// benchingCoefficient is CB at an energy over the rise of the pipe out: unsubmerged under 1, submerged over 2.5, between
// them straight.
func benchingCoefficient(form network.Benching, energyRatio float64) float64 {
	const unsubmerged, submerged = 1, 2.5
	share := max(0, min(1, (energyRatio-unsubmerged)/(submerged-unsubmerged)))
	c := benching[form]
	return c.unsubmerged + share*(c.submerged-c.unsubmerged)
}

// turning finds the coefficients of angled and of plunging inflows. Peaks of different pipes do not add, so the inflows
// count for no more than the flow out.
//
//	Cθ = 4.5 (ΣQj/Qo) cos(θw/2)     θw = Σ Qj θj / ΣQj, over pipes that do not plunge; θ = 180° straight on
//	CP = Σ Qk hk / Qo               hk = (zk - Eai)/Do, over what plunges
//
// What enters at an inlet itself falls from its rim.
func (l *Lines) turning(s network.StructureIndex, m *mouth) (angle, plunging float64) {
	total := l.inflow(s)
	scale := min(1, m.flow/total)
	level, turned := 0.0, 0.0 // ΣQj, ΣQj θj
	for _, in := range l.network.PipesIn(s) {
		flow := l.flows.Pipes[in].Flow
		if flow <= 0 {
			continue
		}
		if l.plunges(in, m) {
			plunging += flow * scale * m.plungeHeight(l.network.Pipes[in].InvertLower.V)
			continue
		}
		deflection, _ := l.turn(in, m.pipe)
		level += flow
		turned += flow * (straight - deflection)
	}
	if given := &l.network.Structures[s]; given.Kind == network.Inlet && given.Rim.OK {
		plunging += max(0, m.flow-total) * m.plungeHeight(given.Rim.V)
	}
	if level > 0 {
		angle = 4.5 * min(1, level/m.flow) * math.Cos(turned/level/2*math.Pi/180)
	}
	return angle, plunging / m.flow
}

// plungeHeight is hk of water that enters at a level: 0 where that is not over the energy in the structure. The source
// counts no height over 10 Do.
func (m *mouth) plungeHeight(level float64) float64 {
	const highest = 10 // of Do
	z := min(level-m.invert, highest*m.rise)
	return max(0, (z-m.entry)/m.rise)
}

// inflow is the sum of the flows of the pipes in.
func (l *Lines) inflow(s network.StructureIndex) float64 {
	sum := 0.0
	for _, in := range l.network.PipesIn(s) {
		sum += l.flows.Pipes[in].Flow
	}
	return sum
}
