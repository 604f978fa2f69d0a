package pipeflow

import "math"

// SpecificForce is the momentum and the pressure of the flow through a section, over the specific weight of water:
//
//	F = Q²/(g A) + A ȳ    (Chow 1959, eq. 3-17)
//
// A depth over the rise of a closed section is the pressure head of the full section: A ȳ is then A (depth - (rise - ȳ)),
// ȳ counted from the highest point. There is none for a flow in a dry section.
func SpecificForce(s Section, g, depth, flow float64) (force float64, ok bool) {
	if flow == 0 {
		return staticForce(s, depth), true
	}
	force = flow/g*(flow/s.At(depth).Area) + staticForce(s, depth)
	return force, !math.IsInf(force, 0) && !math.IsNaN(force)
}

// staticForce is A ȳ, with the pressure head above the rise of a closed section.
func staticForce(s Section, depth float64) float64 {
	if over := depth - s.Rise(); over > 0 && s.Closed() {
		return s.Moment(s.Rise()) + s.At(s.Rise()).Area*over
	}
	return s.Moment(depth)
}

// ConjugateDepth is the depth on the other side of a hydraulic jump, at which the same flow has the same specific force:
// tranquil for a rapid depth, rapid for a tranquil one. Over the rise of a closed section it is the pressure head of the
// full section. At critical depth it is the critical depth.
//
// There is none where the flow is not over 0, the section is dry, or an open section cannot hold the tranquil depth.
//
// Checked there and back in every closed shape from 0.1 to 0.95 of critical depth: within 1e-10, as force is flat near
// critical depth and magnifies rounding.
func ConjugateDepth(s Section, g, depth, flow float64) (conjugate float64, ok bool) {
	force, ok := SpecificForce(s, g, depth, flow)
	if !ok || !(flow > 0) || !(g > 0) {
		return 0, false
	}
	return otherSide(depth, criticalOrRise(s, g, flow), DepthsOfForce(s, g, force, flow))
}

// DepthsOfForce are the rapid and the tranquil depth at which a flow has a specific force: two over the least force, which
// is that of critical depth; none below it. Over the rise of a closed section the upper one is the pressure head of the
// full section. An open section that cannot hold the tranquil depth has the lower one only.
func DepthsOfForce(s Section, g, force, flow float64) Depths {
	if !(flow > 0) || !(g > 0) || !(force > 0) || math.IsInf(force, 1) {
		return Depths{}
	}
	critical := criticalOrRise(s, g, flow)
	surplus := func(y float64) float64 {
		f, _ := SpecificForce(s, g, y, flow)
		return f - force
	}
	return eachSide(s, critical, deepEnough(s, critical, force), surplus)
}

// deepEnough is a depth at which the static part alone is over the force.
func deepEnough(s Section, critical, force float64) float64 {
	if s.Closed() {
		return s.Rise() + force/s.At(s.Rise()).Area
	}
	depth := critical
	for staticForce(s, depth) < force && depth < s.Rise() {
		depth *= 2
	}
	return min(depth, s.Rise())
}
