package grade

import (
	"math"

	"rimfall/network"
	"rimfall/pipeflow"
)

// meet is how the water of a pipe meets the level of its lower structure: the depth that the structure holds in the
// pipe's end, 0 where it holds none, because its level is too low or the pipe plunges from above.
//
// A pipe with a loss of its own takes its grade line from the pipe out:
//
//	hgl in = hgl of the pipe out + K Vo²/2g
//
// else the part of its velocity head that counts, 0.6 with access holes and all elsewhere, and its depth make up the level:
//
//	y + c V²/2g = level - invert
func (l *Lines) meet(p network.PipeIndex, b *barrel) (depth float64, end End) {
	pipe := &l.network.Pipes[p]
	below := &l.Structures[pipe.To]
	if pipe.Loss.OK && below.Out != none {
		out := &l.Pipes[below.Out]
		level := out.HGLUpper + pipe.Loss.V*(out.EGLUpper-out.HGLUpper)
		return max(0, level-pipe.InvertLower.V), EndsGiven
	}
	if pipe.InvertLower.V > below.plunge {
		return 0, EndsFalling
	}
	depth, ok := b.tranquil(below.Level-pipe.InvertLower.V, below.counted)
	if !ok {
		return 0, EndsFalling
	}
	return depth, EndsBacked
}

// tranquil is the depth not under critical at which y + c V²/2g has a given value, over the rise the height of the
// pressure line. There is none where the value at critical depth is higher.
func (b *barrel) tranquil(energy, counted float64) (depth float64, ok bool) {
	rise, critical := b.Section.Rise(), b.critical()
	if full := counted * b.head(rise); energy >= rise+full {
		return energy - full, true
	}
	if !(energy >= critical+counted*b.head(critical)) {
		return 0, false
	}
	return tranquilDepth(b.Section, critical, energy, counted*b.flow*b.flow/(2*b.Gravity)), true
}

// tranquilDepth solves y + h/A² = energy between critical depth and the crown, where the left side grows, by Newton's
// method kept between bounds that close in:
//
//	d/dy (y + h/A²) = 1 - 2 h T/A³
//
// From above it comes down without overshooting, since the velocity head flattens with depth. The tolerance, 1e-14 of the
// energy, is near the spacing of floating-point numbers; halving alone would be through after 50 of the 100 steps.
func tranquilDepth(s pipeflow.Section, critical, energy, h float64) float64 {
	low, high := critical, min(energy, s.Rise())
	y := high
	for range 100 {
		g := s.At(y)
		excess := y + h/(g.Area*g.Area) - energy
		if excess > 0 {
			high = y
		} else {
			low = y
		}
		next := y - excess/(1-2*h*g.TopWidth/(g.Area*g.Area*g.Area))
		if !(next >= low) || !(next <= high) {
			next = low + (high-low)/2
		}
		if math.Abs(next-y) <= 1e-14*energy {
			return next
		}
		y = next
	}
	return y
}
