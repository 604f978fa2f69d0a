package size

import (
	"math"

	"rimfall/network"
)

// bounds are the levels between which the inverts of one pipe may lie. Where
// nothing bounds a level it is infinite.
type bounds struct {
	upperHigh, upperLow float64 // at the upper end
	lowerHigh, lowerLow float64 // at the lower end
}

// bounds finds them for a pipe of a rise and wall.
func (c *Chooser) bounds(p *network.Pipe, rise, wall float64) bounds {
	n, from, to := c.Network, &c.Network.Structures[p.From], &c.Network.Structures[p.To]
	b := bounds{math.Inf(1), math.Inf(-1), math.Inf(1), math.Inf(-1)}
	if c.Criteria.MinCover.OK {
		above := c.Criteria.MinCover.V + wall + rise
		if from.Rim.OK {
			b.upperHigh = from.Rim.V - above
		}
		if to.Rim.OK && to.Kind != network.Outfall {
			b.lowerHigh = to.Rim.V - above
		}
	}
	height := c.Criteria.SizeChange.Height()
	fall := n.LeastFallAt(p.From, c.Criteria)
	for _, i := range n.PipesIn(p.From) {
		in := &n.Pipes[i]
		if !in.InvertLower.OK || in.Section == nil {
			continue
		}
		matched := in.InvertLower.V + height*(in.Section.Rise()-rise)
		b.upperHigh = min(b.upperHigh, matched, in.InvertLower.V-fall)
	}
	if from.LowestInvert.OK {
		b.upperLow = from.LowestInvert.V
	}
	b.lowerLow = c.lowerLow(p.To)
	return b
}

// lowerLow is the lowest level at which a pipe may enter a structure: its lowest
// invert, and the least fall above every given invert out of it.
func (c *Chooser) lowerLow(s network.StructureIndex) float64 {
	low := math.Inf(-1)
	if l := c.Network.Structures[s].LowestInvert; l.OK {
		low = l.V
	}
	fall := c.Network.LeastFallAt(s, c.Criteria)
	for _, i := range c.Network.PipesOut(s) {
		if out := c.given[i].InvertUpper; out.OK {
			low = max(low, out.V+fall)
		}
	}
	return low
}

// step is the rounding of chosen inverts: whole hundredths of a foot, whole
// millimetres. A level within a ten-millionth of a step counts as on it, which
// is room for the arithmetic and nothing else.
type step float64

const onStep = 1e-7

func (s step) down(level float64) float64 {
	return math.Floor(level*float64(s)+onStep) / float64(s)
}

func (s step) up(level float64) float64 {
	return math.Ceil(level*float64(s)-onStep) / float64(s)
}
