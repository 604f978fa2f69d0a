package pipeflow

// LargestFlow is the largest discharge of a closed section flowing part full and the depth at which it runs. In a circle
// that is 1.0757 of full-bore capacity at 0.9382 of the diameter. Under a flat roof it is a limit that is not reached:
// the depth is the rise, the flow the one just before the roof is wet.
//
// None for an open section, which always carries more when deeper, and where the slope is not over 0.
func (m Manning) LargestFlow(s Section) (flow, depth float64, ok bool) {
	if !s.Closed() || !(m.Slope > 0) {
		return 0, 0, false
	}
	top := crestOf(s)
	return m.strength() * top.factor, openDepth(s, top.depth), true
}

// LargestVelocity is the largest mean velocity of a closed section and the depth at which it runs. In a circle that is
// 1.1400 of the velocity at full-bore capacity, at 0.8128 of the diameter. Flat roofs and no answer are as for
// [Manning.LargestFlow].
func (m Manning) LargestVelocity(s Section) (velocity, depth float64, ok bool) {
	if !s.Closed() || !(m.Slope > 0) {
		return 0, 0, false
	}
	depth = deepestRadius(s)
	return m.Velocity(s, depth), openDepth(s, depth), true
}

// openDepth gives a depth just below the roof as the rise.
func openDepth(s Section, depth float64) float64 {
	if depth >= s.Rise()*underRoof {
		return s.Rise()
	}
	return depth
}

// deepestRadius is the depth at which the hydraulic radius of a closed section is largest, just below the roof where it
// is flat.
func deepestRadius(s Section) float64 {
	roof := s.Rise() * underRoof
	f := radiusFunction(s, 1)
	rate := func(y float64) float64 {
		_, slope, _ := f(y)
		return -slope
	}
	low := s.Rise() / 4
	atLow, atRoof := rate(low), rate(roof)
	if !(atLow < 0 && atRoof > 0) {
		return roof
	}
	return root(rate, low, roof, atLow, atRoof, depthTolerance*s.Rise())
}
