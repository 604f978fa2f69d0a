package size

import (
	"math"

	"rimfall/network"
)

// laid is where a pipe of one size lies.
type laid struct {
	upper, lower, slope float64
}

// lay finds inverts and slope of a pipe of one size. need and steep are the least
// and the greatest slope that the criteria allow this size. What the pipe has
// already is kept.
func (c *Chooser) lay(p *network.Pipe, b bounds, need, steep float64) laid {
	steep = max(steep, need)
	switch {
	case p.InvertUpper.OK && p.InvertLower.OK:
		return laid{p.InvertUpper.V, p.InvertLower.V, p.Slope.V}
	case p.Slope.OK:
		return c.layOnSlope(p, b)
	case p.InvertLower.OK:
		return c.layToLower(p, b, need, steep)
	case p.InvertUpper.OK:
		return c.layFrom(p, b, p.InvertUpper.V, need, steep)
	}
	return c.layFreely(p, b, need, steep)
}

// layOnSlope: the slope is given and no level. The lower invert follows the slope exactly.
func (c *Chooser) layOnSlope(p *network.Pipe, b bounds) laid {
	fall := p.Slope.V * p.Length
	upper := c.step.down(min(b.upperHigh, b.lowerHigh+fall))
	if low := max(b.upperLow, b.lowerLow+fall); upper < low {
		upper = c.step.up(low)
	}
	return laid{upper, upper - fall, p.Slope.V}
}

// layToLower: only the lower invert is given. The upper one is as high as it may
// be, which makes the slope.
func (c *Chooser) layToLower(p *network.Pipe, b bounds, need, steep float64) laid {
	lower := p.InvertLower.V
	upper := c.step.down(min(b.upperHigh, lower+steep*p.Length))
	if upper < b.upperLow {
		upper = c.step.up(b.upperLow)
	}
	if upper <= lower { // the bounds cross: the lower one wins
		upper = c.step.up(lower + need*p.Length)
	}
	return laid{upper, lower, (upper - lower) / p.Length}
}

// layFreely: no level is given. The upper invert is as high as it may be, unless
// the ground, or the cover at the lower end, asks for more slope than the pipe may
// have: then the lower end lies where that slope would have put it, the pipe on
// the steepest slope, and the rest of the fall is a drop at the upper structure.
func (c *Chooser) layFreely(p *network.Pipe, b bounds, need, steep float64) laid {
	upper := c.step.down(b.upperHigh)
	if upper < b.upperLow {
		upper = c.step.up(b.upperLow)
	}
	if upper <= b.lowerLow { // the bounds cross: the lower one wins
		upper = c.step.up(b.lowerLow + need*p.Length)
	}
	wanted := c.wantedSlope(p, b, upper, need)
	if wanted <= steep {
		return c.layFrom(p, b, upper, need, steep)
	}
	lower := c.step.down(upper - wanted*p.Length)
	if lower < b.lowerLow {
		lower = c.step.up(b.lowerLow)
	}
	upper = min(upper, c.step.down(lower+steep*p.Length))
	if upper < b.upperLow || upper <= lower {
		upper = c.step.up(max(b.upperLow, lower+need*p.Length))
		lower = max(lower, c.step.up(upper-steep*p.Length))
	}
	return laid{upper, lower, (upper - lower) / p.Length}
}

// wantedSlope is the ground's slope where that serves, else the least slope that
// the criteria and the cover at the lower end ask for.
func (c *Chooser) wantedSlope(p *network.Pipe, b bounds, upper, need float64) float64 {
	slope := max(need, (upper-b.lowerHigh)/p.Length)
	if ground, ok := c.groundSlope(p); ok {
		slope = max(slope, ground)
	}
	return slope
}

// layFrom lays a pipe down from its upper invert, not steeper than allowed and not
// below the lower bound at its lower end. The lower invert is rounded down, so
// that the least slope and the cover hold; up where down would be too steep.
func (c *Chooser) layFrom(p *network.Pipe, b bounds, upper, need, steep float64) laid {
	slope := min(c.wantedSlope(p, b, upper, need), steep)
	lower := c.step.down(upper - slope*p.Length)
	if steepest := upper - steep*p.Length; lower < steepest-onStep/float64(c.step) {
		lower = c.step.up(upper - slope*p.Length)
	}
	if lower < b.lowerLow {
		lower = c.step.up(b.lowerLow)
	}
	return laid{upper, lower, (upper - lower) / p.Length}
}

// groundSlope is the fall of the rims over the length; none where a rim is blank.
func (c *Chooser) groundSlope(p *network.Pipe) (float64, bool) {
	from, to := &c.Network.Structures[p.From], &c.Network.Structures[p.To]
	if !from.Rim.OK || !to.Rim.OK {
		return 0, false
	}
	return (from.Rim.V - to.Rim.V) / p.Length, !math.IsInf(p.Length, 0)
}
