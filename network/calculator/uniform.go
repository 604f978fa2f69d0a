package calculator

import (
	"math"

	"rimfall/pipeflow"
)

// uniform is uniform flow in one section, whose roughness may change with depth.
type uniform struct {
	section pipeflow.Section
	manning pipeflow.Manning  // with n of the full pipe where it varies
	varying *pipeflow.Varying // nil: one n at every depth
}

// uniformIn is the uniform flow of a question in a section.
func (q *Question) uniformIn(s pipeflow.Section, n, slope float64) uniform {
	u := uniform{section: s, manning: pipeflow.Manning{Factor: q.Units.ManningFactor, N: n, Slope: slope}}
	var v pipeflow.Varying
	ground, is := s.(*pipeflow.Ground)
	switch {
	case q.VaryingN:
		v = u.manning.PartFull(s)
	case is && q.Conduit.roughSomewhere():
		v = u.manning.Composite(ground, q.rule())
		u.manning.N = v.N(ground.Rise())
	case is: // one n, but flow need not grow with depth where a bench is flooded
		v = pipeflow.Varying{Factor: u.manning.Factor, Slope: slope, N: func(float64) float64 { return n }}
	default:
		return u
	}
	u.varying = &v
	return u
}

// rule joins the roughness of the parts of a ground line.
func (q *Question) rule() func([]pipeflow.Lining) (float64, bool) {
	if q.Composite == Lotter {
		return pipeflow.LotterN
	}
	return pipeflow.HortonN
}

// at is Manning's equation with the roughness of one depth.
func (u uniform) at(depth float64) pipeflow.Manning {
	m := u.manning
	if u.varying != nil {
		m.N = u.varying.N(depth)
	}
	return m
}

func (u uniform) flow(depth float64) float64     { return u.at(depth).Flow(u.section, depth) }
func (u uniform) velocity(depth float64) float64 { return u.at(depth).Velocity(u.section, depth) }

// depths are all the depths that carry a flow, from the lowest up.
func (u uniform) depths(flow float64) []float64 {
	if u.varying != nil {
		return u.varying.NormalDepths(u.section, flow)
	}
	return ascending(u.manning.NormalDepths(u.section, flow))
}

// ascending lists the depths, equal ones once.
func ascending(d pipeflow.Depths) []float64 {
	switch {
	case d.Count == 0:
		return nil
	case d.Count == 1 || d.Upper-d.Lower <= 1e-9*d.Upper:
		return []float64{d.Lower}
	}
	return []float64{d.Lower, d.Upper}
}

// largest is the most that a closed section carries and the depth of it.
func (u uniform) largest() (flow, depth float64, ok bool) {
	if u.varying != nil {
		return u.varying.LargestFlow(u.section)
	}
	return u.manning.LargestFlow(u.section)
}

// depthOfArea is the depth at which a section has a wetted area: the area grows with
// depth, so it is bracketed and halved until no number lies between, at most 200
// times. There is none where the area is over the whole of the section.
func depthOfArea(s pipeflow.Section, area float64) (depth float64, ok bool) {
	low, high := 0.0, s.Rise()
	if math.IsInf(high, 1) {
		for high = 1; s.At(high).Area < area; high *= 2 {
			if high > math.MaxFloat64/4 {
				return 0, false
			}
		}
	}
	if whole := s.At(high).Area; !(area <= whole*(1+sameLength)) {
		return 0, false
	} else if area >= whole*(1-sameLength) {
		return high, true
	}
	for range 200 {
		middle := (low + high) / 2
		if middle <= low || middle >= high {
			break
		}
		if s.At(middle).Area < area {
			low = middle
		} else {
			high = middle
		}
	}
	return (low + high) / 2, true
}

// sameLength is the relative difference within which two lengths or areas are one:
// far above rounding and what conversions of units leave, far below any measurement.
const sameLength = 1e-9
