package pipeflow

import "math"

// SpecificEnergy is the energy head over the lowest point of the section,
//
//	E = y + Q²/(2 g A²)    (Chow 1959, eq. 3-5, with an energy coefficient of 1)
//
// A depth over the rise of a closed section is the pressure head of the full section. There is none for a flow in a dry
// section.
func SpecificEnergy(s Section, g, depth, flow float64) (energy float64, ok bool) {
	if flow == 0 {
		return max(depth, 0), true
	}
	velocity := flow / s.At(depth).Area
	energy = depth + velocity*velocity/(2*g)
	return energy, !math.IsInf(energy, 0) && !math.IsNaN(energy)
}

// AlternateDepth is the other depth at which a flow has the same specific energy: rapid for a tranquil depth, tranquil
// for a rapid one. Over the rise of a closed section it is the pressure head of the full section. At critical depth it
// is the critical depth.
//
// There is none where the flow is not over 0, the section is dry, or an open section cannot hold the tranquil depth.
//
// Checked there and back in every closed shape from 0.1 to 0.95 of critical depth: within 1e-10, as energy is flat near
// critical depth and magnifies rounding.
func AlternateDepth(s Section, g, depth, flow float64) (alternate float64, ok bool) {
	energy, ok := SpecificEnergy(s, g, depth, flow)
	if !ok || !(flow > 0) || !(g > 0) {
		return 0, false
	}
	return otherSide(depth, criticalOrRise(s, g, flow), DepthsOfEnergy(s, g, energy, flow))
}

// otherSide picks of two depths the one that lies across critical depth from a depth.
func otherSide(depth, critical float64, both Depths) (other float64, ok bool) {
	switch {
	case both.Count == 0: // rounding has put the energy or force under its least: the depth is the critical one
		return critical, math.Abs(depth-critical) < 1e-6*critical
	case depth > critical:
		return both.Lower, true
	}
	return both.Upper, both.Count == 2
}

// DepthsOfEnergy are the rapid and the tranquil depth at which a flow has a specific energy (Chow 1959, section 3-3): two
// over the least energy, which is that of critical depth; none below it. Over the rise of a closed section the upper one
// is the pressure head of the full section. An open section that cannot hold the tranquil depth has the lower one only.
func DepthsOfEnergy(s Section, g, energy, flow float64) Depths {
	if !(flow > 0) || !(g > 0) || !(energy > 0) || math.IsInf(energy, 1) {
		return Depths{}
	}
	critical := criticalOrRise(s, g, flow)
	surplus := func(y float64) float64 {
		e, _ := SpecificEnergy(s, g, y, flow)
		return e - energy
	}
	return eachSide(s, critical, energy, surplus)
}

// eachSide are the zeros on both sides of critical depth of a function that has its minimum there: it falls from +Inf at
// depth 0 and rises beyond, above the rise of a closed section without a bend. The upper one is not over most.
func eachSide(s Section, critical, most float64, surplus func(depth float64) float64) Depths {
	atCritical := surplus(critical)
	if atCritical > 0 || math.IsInf(critical, 1) {
		return Depths{}
	}
	low := critical
	for surplus(low) <= 0 && low > 0 {
		low /= 2
	}
	if low == 0 {
		return Depths{}
	}
	lower := critical
	if atCritical < 0 {
		lower = math.Exp(root(func(z float64) float64 { return -surplus(math.Exp(z)) },
			math.Log(low), math.Log(critical), -surplus(low), -atCritical, depthTolerance))
	}
	if !s.Closed() {
		most = min(most, s.Rise())
	}
	atMost := surplus(most)
	if most < critical || atMost < 0 {
		return Depths{Count: 1, Lower: lower}
	}
	upper := most
	if atCritical < 0 && atMost > 0 {
		upper = root(surplus, critical, most, atCritical, atMost, depthTolerance*most)
	}
	return Depths{2, lower, upper}
}

// criticalOrRise is the critical depth, or the rise where a roof is wetted before the flow is critical.
func criticalOrRise(s Section, g, flow float64) float64 {
	if depth, ok := CriticalDepth(s, g, flow); ok {
		return depth
	}
	return s.Rise()
}

// CriticalSlope is the slope at which a flow runs uniformly at its critical depth (Chow 1959, section 6-6). There is none
// where the flow has no critical depth inside, or is 0.
func (m Manning) CriticalSlope(s Section, g, flow float64) (slope float64, ok bool) {
	depth, ok := CriticalDepth(s, g, flow)
	if !ok || flow == 0 {
		return 0, false
	}
	return m.SlopeFor(s, depth, flow)
}
