package pipeflow

import "math"

// Varying is uniform flow with a roughness that changes with depth: a pipe whose n is larger part full ([PartFullRatio]),
// or a channel of several linings ([HortonN], [LotterN]).
type Varying struct {
	Factor float64                     // unit constant k, as in Manning
	Slope  float64                     // rise over run, over 0
	N      func(depth float64) float64 // roughness at a depth, over 0
}

// at is uniform flow with the roughness of one depth.
func (v Varying) at(depth float64) Manning {
	return Manning{Factor: v.Factor, N: v.N(depth), Slope: v.Slope}
}

// Flow is the uniform flow at a depth: 0 at depth 0, and where the slope is not over 0.
func (v Varying) Flow(s Section, depth float64) float64 {
	if !(depth > 0) {
		return 0
	}
	return v.at(depth).Flow(s, depth)
}

// Velocity is the mean velocity of the uniform flow at a depth, 0 at depth 0.
func (v Varying) Velocity(s Section, depth float64) float64 {
	if !(depth > 0) {
		return 0
	}
	return v.at(depth).Velocity(s, depth)
}

// scanParts is into how many steps the rise is cut when depths are looked for.
const scanParts = 400

// NormalDepths are the depths, from the lowest up, at which a flow runs uniformly below the rise of the section; a flow
// equal to that at the rise of a round crown has the rise for its last. With a varying n there is no bound on their
// number. The rise (of a section without end, a depth that carries the flow) is cut into 400 steps: two depths between
// the same neighbours are not seen.
//
// There are none for a slope or a flow not over 0, or over the largest discharge on those steps.
func (v Varying) NormalDepths(s Section, flow float64) []float64 {
	if !(v.Slope > 0) || !(flow > 0) || math.IsInf(flow, 1) {
		return nil
	}
	f := func(y float64) float64 { return math.Log(v.Flow(s, y) / flow) }
	most := v.deepest(s, flow)
	var depths []float64
	low, atLow := 0.0, math.Inf(-1)
	for i := 1; i <= scanParts; i++ {
		y := most * float64(i) / scanParts
		if i == scanParts && flatRoofed(s) {
			y *= underRoof
		}
		value := f(y)
		switch {
		case value == 0:
			depths = append(depths, y)
		case (atLow < 0) == (value > 0) && atLow != 0:
			if depth, ok := crossing(low, y, atLow < 0, f); ok {
				depths = append(depths, depth)
			}
		}
		low, atLow = y, value
	}
	return depths
}

// crossing is the zero of f between two depths where it passes upward or downward.
func crossing(low, high float64, upward bool, f func(float64) float64) (depth float64, ok bool) {
	if upward {
		return bracketDepth(low, high, f)
	}
	return bracketDepth(low, high, func(y float64) float64 { return -f(y) })
}

// deepest is the rise, or for walls without end a depth that carries more than the flow.
func (v Varying) deepest(s Section, flow float64) float64 {
	most := s.Rise()
	if !math.IsInf(most, 1) {
		return most
	}
	most = 1
	for v.Flow(s, most) < flow && most < math.MaxFloat64/2 {
		most *= 2
	}
	return most
}

// LargestFlow is the largest discharge below the rise of a closed section and its depth, to a step of the scan of
// [Varying.NormalDepths]. None for an open section or a slope not over 0.
func (v Varying) LargestFlow(s Section) (flow, depth float64, ok bool) {
	if !s.Closed() || !(v.Slope > 0) {
		return 0, 0, false
	}
	for i := 1; i <= scanParts; i++ {
		y := s.Rise() * float64(i) / scanParts
		if i == scanParts && flatRoofed(s) {
			y *= underRoof
		}
		if value := v.Flow(s, y); value > flow {
			flow, depth = value, y
		}
	}
	return flow, depth, true
}

// partFull is the roughness of a circular pipe flowing part full over that flowing full, at depth ratios 0.1, 0.2 … 1
// (T. R. Camp, Sewage Works Journal 18, 1946; repeated in ASCE Manual of Practice 60). From memory: not confirmed against
// a print.
var partFull = [...]float64{1.22, 1.28, 1.29, 1.28, 1.24, 1.22, 1.18, 1.14, 1.08, 1.00}

// PartFullRatio is n over the n of full flow at a depth ratio of a circular pipe, straight between the tenths of Camp's
// curve. Below 0.1, where the values at hand end, that of 0.1 is held; over 1 it is 1.
func PartFullRatio(depthRatio float64) float64 {
	place := depthRatio*10 - 1
	switch {
	case !(place > 0):
		return partFull[0]
	case place >= 9:
		return partFull[9]
	}
	i := int(place)
	return partFull[i] + (place-float64(i))*(partFull[i+1]-partFull[i])
}

// PartFull is Manning's flow with n of the full pipe made to vary with depth by [PartFullRatio].
func (m Manning) PartFull(s Section) Varying {
	return Varying{Factor: m.Factor, Slope: m.Slope, N: func(depth float64) float64 {
		return m.N * PartFullRatio(depth/s.Rise())
	}}
}

// Composite is Manning's flow along a ground line with the n of its stretches joined by a rule, [HortonN] or [LotterN];
// stretches without n take that of the receiver. At a depth where the rule has no answer it is the receiver's too.
func (m Manning) Composite(g *Ground, rule func([]Lining) (float64, bool)) Varying {
	return Varying{Factor: m.Factor, Slope: m.Slope, N: func(depth float64) float64 {
		parts := g.Linings(depth)
		for i := range parts {
			if parts[i].N == 0 {
				parts[i].N = m.N
			}
		}
		if n, ok := rule(parts); ok {
			return n
		}
		return m.N
	}}
}
