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
		if depth, ok := h.depthAt(c.MinVelocity); ok {
			s = max(s, h.slopeFor(c.MinVelocity, depth))
		}
	}
	if c.MinShear.OK && h.flow > 0 {
		s = max(s, h.slopeForShear(c.MinShear.V, c.MaxSlope))
	}
	return s
}

// steepestSlope is the greatest slope that keeps to the greatest slope and
// velocity of the criteria. A pipe that runs full at that velocity is steep
// enough; whether it then carries the peak is another question.
func (h hydraulics) steepestSlope(c *network.Criteria) float64 {
	if h.flow <= 0 {
		return c.MaxSlope
	}
	depth, ok := h.depthAt(c.MaxVelocity)
	if !ok {
		depth = h.section.Rise()
	}
	return min(c.MaxSlope, h.slopeFor(c.MaxVelocity, depth))
}

// slopeFor is the slope on which water of a depth runs at a velocity, from
// Manning's equation: S = (n V / (k R^(2/3)))².
func (h hydraulics) slopeFor(velocity, depth float64) float64 {
	r := h.section.At(depth).HydraulicRadius()
	root := h.n * velocity / (h.factor * math.Pow(r, 2.0/3))
	return root * root
}

// depthAt is the depth at which the flow has a velocity, by continuity; ok is
// false where the flow would fill the section at that velocity, or there is none.
func (h hydraulics) depthAt(velocity float64) (depth float64, ok bool) {
	if velocity <= 0 || h.flow <= 0 {
		return 0, false
	}
	area, rise := h.flow/velocity, h.section.Rise()
	if area >= h.section.At(rise).Area {
		return 0, false
	}
	// Bisection: the area grows with depth, and 60 halvings leave less than the
	// last digit of a float64.
	low, high := 0.0, rise
	for range 60 {
		depth = (low + high) / 2
		if h.section.At(depth).Area < area {
			low = depth
		} else {
			high = depth
		}
	}
	return high, true
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
