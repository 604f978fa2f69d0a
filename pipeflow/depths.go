package pipeflow

import "math"

// Depths are the answers to a question that may have none, one or two of them.
type Depths struct {
	Count        int
	Lower, Upper float64 // Lower holds where Count is 1 or 2, Upper where it is 2
}

// NormalDepths are all the depths at which a flow runs uniformly: two from full-bore capacity to the largest discharge of
// a closed section with a round crown, otherwise one, or none where [Manning.NormalDepth] has none. At full-bore capacity
// the upper one is the rise, at the largest discharge both are the same. Under a flat roof the discharge drops to
// full-bore capacity at once where the roof is wetted, so there is no upper one.
func (m Manning) NormalDepths(s Section, flow float64) Depths {
	lower, ok := m.NormalDepth(s, flow)
	if !ok {
		return Depths{}
	}
	if flow == 0 || !s.Closed() {
		return Depths{Count: 1, Lower: lower}
	}
	factor := flow / m.strength()
	if round, is := s.(Circle); is {
		if upper, ok := round.upperNormalDepth(factor); ok {
			return Depths{2, lower, upper}
		}
	}
	upper, ok := falling(s, normalFunction(s, factor), crestOf(s).depth)
	if !ok {
		return Depths{Count: 1, Lower: lower}
	}
	return Depths{2, lower, upper}
}

// falling is the zero of a hydraulic function on its falling branch, from the crest to the round crown, or to just below
// a flat roof. What is zero at the crown within rounding is the rise itself.
func falling(s Section, f hydraulic, crest float64) (depth float64, ok bool) {
	top := s.Rise()
	if flatRoofed(s) {
		top *= underRoof
	}
	atCrest, _, _ := f(crest)
	atTop, _, _ := f(top)
	switch {
	case crest >= s.Rise()*underRoof || atCrest < -rounding || atTop > rounding:
		return 0, false
	case atCrest <= 0:
		return crest, true
	case atTop >= -rounding:
		return top, true
	}
	// The perimeter grows like w = √(top - y) below a crown, so it is in w that the function is smooth.
	inRoot := func(w float64) float64 {
		value, _, _ := f(top - w*w)
		return value
	}
	w := root(inRoot, 0, math.Sqrt(top-crest), atTop, atCrest, 0.1*depthTolerance*math.Sqrt(top))
	return top - w*w, true
}

// DepthsOfVelocity are the depths at which uniform flow has a mean velocity: two from the velocity at full-bore capacity
// to the largest velocity of a closed section with a round crown, otherwise one, or none where the velocity is over the
// largest. Velocity 0 has depth 0. In a channel with upright sides the velocity stays under a limit.
func (m Manning) DepthsOfVelocity(s Section, velocity float64) Depths {
	if !(m.Slope > 0) || !(velocity >= 0) || math.IsInf(velocity, 1) {
		return Depths{}
	}
	if velocity == 0 {
		return Depths{Count: 1}
	}
	f := radiusFunction(s, velocity/m.strength())
	if ground, is := s.(*Ground); is {
		return ground.leastDepth(f)
	}
	high, start := s.Rise(), min(1, s.Rise()/2)
	if s.Closed() {
		high = deepestRadius(s)
	}
	if !math.IsInf(high, 1) {
		if value, _, _ := f(high); value < 0 {
			return Depths{}
		}
	}
	lower, ok := solveDepth(start, high, math.Inf(1), f)
	if !ok {
		return Depths{}
	}
	if s.Closed() {
		if upper, ok := falling(s, f, high); ok {
			return Depths{2, lower, upper}
		}
	}
	return Depths{Count: 1, Lower: lower}
}
