package pipeflow

import "math"

// Where a bank is overtopped, width and perimeter of a ground line jump, so that neither A R^(2/3) nor A³/T need grow with
// depth there. Between the heights of two points both are smooth; the depths are looked for band by band.

// bandParts is into how many steps a band between the heights of two points is cut when zeros are looked for.
const bandParts = 8

// normalDepth is the least depth at which A R^(2/3) reaches the given value.
func (g *Ground) normalDepth(factor float64) (depth float64, ok bool) {
	found := g.leastDepth(normalFunction(g, factor))
	return found.Lower, found.Count == 1
}

// leastDepth is the least depth at which a hydraulic function passes zero upward, if any.
func (g *Ground) leastDepth(f hydraulic) (found Depths) {
	g.crossings(f, func(y float64) bool {
		found = Depths{Count: 1, Lower: y}
		return false
	})
	return found
}

// criticalDepth is the depth of least specific energy y + Q²/(2gA²) among those where A³/T passes the target Q²/g upward.
func (g *Ground) criticalDepth(target float64) (depth float64, ok bool) {
	least := math.Inf(1)
	g.crossings(criticalFunction(g, target), func(y float64) bool {
		area := g.At(y).Area
		if energy := y + target/(2*area*area); energy < least {
			depth, ok, least = y, true, energy
		}
		return true
	})
	return depth, ok
}

// crossings calls visit with each depth at which f passes zero upward, from the lowest on, as long as visit says to go on.
// Each band is followed from just over the point at its bottom to just under the one at its top, as a level bench there
// makes f jump.
func (g *Ground) crossings(f hydraulic, visit func(depth float64) bool) {
	low, atLow := 0.0, math.Inf(-1)
	for i := range g.levels[1:] {
		bottom, top := g.levels[i], g.levels[i+1]*underRoof
		for part := range bandParts + 1 {
			y := bottom + (top-bottom)*float64(part)/bandParts
			if y == 0 {
				continue
			}
			value, _, _ := f(y)
			if atLow < 0 && value >= 0 {
				if depth, ok := g.cross(low, y, f); ok && !visit(depth) {
					return
				}
			}
			low, atLow = y, value
		}
	}
}

// cross is the zero between two depths; from the bottom of the line the search goes down as far as it takes.
func (g *Ground) cross(low, high float64, f hydraulic) (depth float64, ok bool) {
	if value, _, _ := f(high); value == 0 {
		return high, true
	}
	if low == 0 {
		return solveDepth(high/2, high, math.Inf(1), f)
	}
	return bracketDepth(low, high, valueOf(f))
}
