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
	return c.layFrom(p, b, c.highest(p, b, need, steep), need, steep)
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

// highest is the upper invert where none is given: as high as it may be. Where
// the ground falls more steeply than the pipe may, the rest of its fall is taken
// by a drop at the upper structure; where that leaves too little cover at the
// lower end, the pipe goes deeper still. The lower bounds win over all of these.
func (c *Chooser) highest(p *network.Pipe, b bounds, need, steep float64) float64 {
	upper := b.upperHigh
	if ground, ok := c.groundSlope(p); ok && ground > steep {
		upper -= (ground - steep) * p.Length
	}
	upper = c.step.down(min(upper, b.lowerHigh+steep*p.Length))
	if upper < b.upperLow {
		upper = c.step.up(b.upperLow)
	}
	if upper <= b.lowerLow { // the bounds cross
		upper = c.step.up(b.lowerLow + need*p.Length)
	}
	return upper
}

// layFrom lays a pipe down from its upper invert: on the ground's slope where
// that serves, else on the least slope; not steeper than allowed, and not below
// the lower bound at its lower end.
func (c *Chooser) layFrom(p *network.Pipe, b bounds, upper, need, steep float64) laid {
	least := max(need, (upper-b.lowerHigh)/p.Length)
	slope := least
	if ground, ok := c.groundSlope(p); ok {
		slope = max(slope, ground)
	}
	slope = min(slope, steep)
	target := upper - slope*p.Length
	lowest := max(b.lowerLow, upper-steep*p.Length) // lower would break a limit
	lower := c.step.down(target)
	if lower < lowest-onStep/float64(c.step) {
		lower = c.step.up(lowest)
		if highest := upper - least*p.Length; lower > highest && b.lowerLow < c.step.down(highest) {
			lower = c.step.down(highest) // no whole step lies between: the least slope holds
		}
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
