package size

import (
	"math"

	"rimfall/network"
	"rimfall/pipeflow"
)

// hydraulics are the numbers on which the slope of one size depends.
type hydraulics struct {
	section    pipeflow.Section
	flow       float64 // of one barrel
	n          float64
	factor     float64 // of Manning's equation
	unitWeight float64
}

// leastSlope is the least slope that meets the least slope of the criteria and
// the cleansing velocity and shear.
func (h hydraulics) leastSlope(c *network.Criteria) float64 {
	s := c.MinSlope
	switch c.VelocityBasis {
	case network.FullBore:
		s = max(s, h.slopeFor(c.MinVelocity, h.section.Rise()))
	case network.AtDesignDepth:
		s = max(s, h.slopeForDesignVelocity(c.MinVelocity))
	}
	if c.MinShear.OK && h.flow > 0 {
		s = max(s, h.slopeForShear(c.MinShear.V, c.MaxSlope))
	}
	return s
}

// slopeForDesignVelocity is the least slope on which the flow runs at a velocity.
//
// As the slope grows, a pipe runs over its capacity with V = Q/A full, until at
// the slope that just carries the flow the depth falls at once to the lower depth
// of full-bore capacity; from there depth and velocity change steadily.
func (h hydraulics) slopeForDesignVelocity(velocity float64) float64 {
	rise := h.section.Rise()
	switch {
	case h.flow <= 0 || h.flow >= velocity*h.section.At(rise).Area:
		return 0 // any slope will do
	case h.flow >= velocity*h.section.At(h.brimming()).Area:
		return h.slopeFor(h.flow/h.section.At(rise).Area, rise) // that just carries it
	}
	return h.slopeFor(velocity, h.depthOf(h.flow/velocity))
}

// steepestSlope is the greatest slope that keeps to the greatest slope and
// velocity of the criteria; 0 where the flow is too fast on any slope.
func (h hydraulics) steepestSlope(c *network.Criteria) float64 {
	rise, area := h.section.Rise(), h.flow/c.MaxVelocity
	switch full := h.section.At(rise).Area; {
	case h.flow <= 0:
		return c.MaxSlope
	case area > full:
		return 0
	case area > h.section.At(h.brimming()).Area: // just too flat to carry the flow, see slopeForDesignVelocity
		return min(c.MaxSlope, h.slopeFor(h.flow/full, rise)*(1-1e-9))
	}
	return min(c.MaxSlope, h.slopeFor(c.MaxVelocity, h.depthOf(area)))
}

// brimming is the lower of the two depths that carry the full-bore capacity; it
// depends on the section alone.
func (h hydraulics) brimming() float64 {
	m := pipeflow.Manning{Factor: 1, N: 1, Slope: 1}
	depth, ok := m.NormalDepth(h.section, m.FullFlow(h.section))
	if !ok {
		return h.section.Rise()
	}
	return depth
}

// slopeFor is the slope on which water of a depth runs at a velocity, from
// Manning's equation: S = (n V / (k R^(2/3)))².
func (h hydraulics) slopeFor(velocity, depth float64) float64 {
	r := h.section.At(depth).HydraulicRadius()
	root := h.n * velocity / (h.factor * math.Pow(r, 2.0/3))
	return root * root
}

// depthOf is the depth at which the section has a wetted area less than its full
// one. Bisection: the area grows with depth, and 60 halvings leave less than the
// last digit of a float64.
func (h hydraulics) depthOf(area float64) float64 {
	low, high := 0.0, h.section.Rise()
	for range 60 {
		depth := (low + high) / 2
		if h.section.At(depth).Area < area {
			low = depth
		} else {
			high = depth
		}
	}
	return high
}

// slopeForShear is the least slope, up to the greatest one, on which the boundary
// shear γRS at design depth reaches a value. For one flow the shear grows with
// the slope: the depth falls, but more slowly than the slope grows.
func (h hydraulics) slopeForShear(shear, steepest float64) float64 {
	low, high := 0.0, steepest
	for range 60 {
		s := (low + high) / 2
		if h.shearOn(s) < shear {
			low = s
		} else {
			high = s
		}
	}
	return high
}

// shearOn is the boundary shear at design depth on a slope; full where the flow
// is over the full-bore capacity.
func (h hydraulics) shearOn(slope float64) float64 {
	m := pipeflow.Manning{Factor: h.factor, N: h.n, Slope: slope}
	depth := h.section.Rise()
	if h.flow <= m.FullFlow(h.section) {
		if y, ok := m.NormalDepth(h.section, h.flow); ok {
			depth = y
		}
	}
	return pipeflow.Shear(h.unitWeight, h.section.At(depth).HydraulicRadius(), slope)
}

// carries is the flow that one barrel may be counted on for: at the greatest
// depth ratio, and never more than full-bore capacity.
func (h hydraulics) carries(slope, depthRatio float64) float64 {
	m := pipeflow.Manning{Factor: h.factor, N: h.n, Slope: slope}
	full := m.FullFlow(h.section)
	if depthRatio >= 1 {
		return full
	}
	return min(full, m.Flow(h.section, depthRatio*h.section.Rise()))
}
