package pipeflow

import "math"

// NormalDepth is the depth at which a flow runs uniformly. Where two depths carry it, between full-bore capacity and
// the largest discharge of a closed section, it is the lower one. Flow 0 has depth 0.
//
// There is none where the slope is not over 0, the flow is negative, not a number, or over the largest discharge; a
// section with a flat roof carries most just below the roof, and that limit itself is not reached.
func (m Manning) NormalDepth(s Section, flow float64) (depth float64, ok bool) {
	if flow == 0 && m.Slope > 0 {
		return 0, true
	}
	if !(m.Slope > 0) || !(flow > 0) || math.IsInf(flow, 1) {
		return 0, false
	}
	return depthOfFactor(s, flow/m.strength())
}

// depthOfFactor is the least depth at which A R^(2/3) has the given value over 0.
func depthOfFactor(s Section, factor float64) (depth float64, ok bool) {
	high, ok := depthAbove(s, factor)
	if !ok {
		return 0, false
	}
	return solveDepth(high, func(y float64) float64 {
		return math.Log(sectionFactor(s.At(y)) / factor)
	})
}

// depthAbove is a depth on the rising branch of the discharge at which A R^(2/3) is not under the given value.
func depthAbove(s Section, factor float64) (depth float64, ok bool) {
	if s.Closed() {
		top := crestOf(s)
		return top.depth, factor <= top.factor
	}
	rise := s.Rise()
	if !math.IsInf(rise, 1) {
		return rise, sectionFactor(s.At(rise)) >= factor
	}
	depth = 1
	for sectionFactor(s.At(depth)) < factor {
		depth *= 4
		if math.IsInf(depth, 1) {
			return 0, false
		}
	}
	return depth, true
}
