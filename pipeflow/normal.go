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
		depth, largest := largestFactor(s)
		return depth, factor <= largest
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

// underRoof is the greatest depth ratio that still counts as below a roof: one part in 2^50, near the spacing of
// floating-point numbers, so that a section is measured there as it is just before it fills.
const underRoof = 1 - 1./(1<<50)

// largestFactor is the largest A R^(2/3) of a closed section and its depth, found by golden-section search over the
// upper half. The depth is good to about 1e-8 of the rise, as the top of a curve is flat; the value to its last digits.
func largestFactor(s Section) (depth, factor float64) {
	const golden = 0.6180339887498949 // (√5 - 1)/2
	low, high := s.Rise()/2, s.Rise()*underRoof
	left, right := high-golden*(high-low), low+golden*(high-low)
	atLeft, atRight := sectionFactor(s.At(left)), sectionFactor(s.At(right))
	for high-low > 1e-9*high {
		if atLeft > atRight {
			high, right, atRight = right, left, atLeft
			left = high - golden*(high-low)
			atLeft = sectionFactor(s.At(left))
		} else {
			low, left, atLeft = left, right, atRight
			right = low + golden*(high-low)
			atRight = sectionFactor(s.At(right))
		}
	}
	for _, y := range [...]float64{left, right, s.Rise() * underRoof} {
		if value := sectionFactor(s.At(y)); value > factor {
			depth, factor = y, value
		}
	}
	return depth, factor
}
