package grade

import (
	"math"

	"rimfall/network"
)

// straight is half a turn, degrees: the angle between two pipes in one line.
const straight = 180

// turn is the deflection between a pipe and a pipe out of its lower structure, degrees from straight on, 0 to 180: from the
// pipe's own column, else from coordinates. Where neither gives it, the largest pipe in is taken straight and any other at
// a right angle, and assumed is true.
func (l *Lines) turn(in, out network.PipeIndex) (deflection float64, assumed bool) {
	pipe := &l.network.Pipes[in]
	if out == none {
		return 0, false
	}
	if pipe.Angle.OK {
		return folded(pipe.Angle.V), false
	}
	if deflection, ok := l.plan(pipe, &l.network.Pipes[out]); ok {
		return deflection, false
	}
	if largest, _, ok := l.network.LargestIn(pipe.To); ok && largest == in {
		return 0, true
	}
	return straight / 2, true
}

// folded brings any angle into 0 to 180.
func folded(degrees float64) float64 {
	a := math.Mod(math.Abs(degrees), 2*straight)
	if a > straight {
		return 2*straight - a
	}
	return a
}

// plan is the deflection between two pipes in plan; none where a coordinate is missing or an end stands on the structure.
func (l *Lines) plan(in, out *network.Pipe) (deflection float64, ok bool) {
	from, at, to := &l.network.Structures[in.From], &l.network.Structures[in.To], &l.network.Structures[out.To]
	if !placed(from) || !placed(at) || !placed(to) {
		return 0, false
	}
	x1, y1 := at.X.V-from.X.V, at.Y.V-from.Y.V
	x2, y2 := to.X.V-at.X.V, to.Y.V-at.Y.V
	if x1 == 0 && y1 == 0 || x2 == 0 && y2 == 0 {
		return 0, false
	}
	return math.Abs(math.Atan2(x1*y2-y1*x2, x1*x2+y1*y2)) * straight / math.Pi, true
}

func placed(s *network.Structure) bool { return s.X.OK && s.Y.OK }
