package pipeflow

import "math"

// NormalDepth is the depth at which a flow runs uniformly. Where two depths carry it, between full-bore capacity and
// the largest discharge of a closed section, it is the lower one. Flow 0 has depth 0.
//
// There is none where the slope is not over 0, the flow is negative, not a number, or over the largest discharge; a
// section with a flat roof carries most just below the roof, and that limit itself is not reached.
//
// Checked for every closed shape there and back, from 1e-8 of the rise to 0.98 of the depth of the largest discharge:
// largest relative difference 6e-15. Nearer to the largest discharge, where the curve is flat, the depth is as good as the
// flow allows: it carries the flow to 4e-15. No allocation; a circle takes about three evaluations of [Manning.Flow],
// other closed shapes five to ten.
func (m Manning) NormalDepth(s Section, flow float64) (depth float64, ok bool) {
	if flow == 0 && m.Slope > 0 {
		return 0, true
	}
	if !(m.Slope > 0) || !(flow > 0) || math.IsInf(flow, 1) {
		return 0, false
	}
	return depthOfFactor(s, flow/m.strength())
}

// normalSolver is a section with a faster way to its lower normal depth for A R^(2/3) of a given value. It may decline
// with ok false, whereupon the search decides.
type normalSolver interface {
	normalDepth(factor float64) (depth float64, ok bool)
}

// rounding is how far two equal quantities that were computed in different ways may be apart.
const rounding = 1e-14

// depthOfFactor is the least depth at which A R^(2/3) has the given value over 0.
func depthOfFactor(s Section, factor float64) (depth float64, ok bool) {
	if fast, is := s.(normalSolver); is {
		if depth, ok := fast.normalDepth(factor); ok {
			return depth, true
		}
	}
	high, most := s.Rise(), math.Inf(1)
	if s.Closed() {
		top := crestOf(s)
		high, most = top.depth, top.factor
	} else if !math.IsInf(high, 1) {
		most = sectionFactor(s.At(high))
	}
	if factor >= most {
		return high, factor <= most*(1+rounding) && high < s.Rise()*underRoof
	}
	start := normalStart(s, factor)
	if !(start < high) {
		start = high * 0.999
	}
	return solveDepth(start, high, math.Inf(1), normalFunction(s, factor))
}

// normalStart is a first guess. Over a flat floor a section runs nearly like a rectangle of its span, or of its floor where
// the walls lean out without end; another closed section fills like a circle that carries the same share of its capacity.
func normalStart(s Section, factor float64) float64 {
	if width := s.At(0).TopWidth; width > 0 {
		if s.Closed() {
			width = s.Span()
		}
		return width * rectangleStart(rectangleConstant(width, factor))
	}
	if s.Closed() {
		share := factor / sectionFactor(s.At(s.Rise()))
		return s.Rise() * circleStart(min(share, crestFlow))
	}
	return min(1, s.Rise()/2)
}
