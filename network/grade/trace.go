package grade

import (
	"rimfall/network"
	"rimfall/pipeflow/surface"
)

// Point is a place on the lines along a pipe.
type Point struct {
	Distance float64 // from the lower end
	Depth    float64 // of the water over the invert there, over the rise under pressure
	HGL, EGL float64
}

// Trace lists the lines along a pipe from its lower end up: both ends, the places that cut it into equal parts, where the
// surface meets the crown, and at a jump both depths. The loss of a bend stands at the upper end, as a step. There is
// nothing where the lines are not known.
func (l *Lines) Trace(p network.PipeIndex, parts int) []Point {
	line := &l.Pipes[p]
	if !line.Known {
		return nil
	}
	if line.Regime == Dry {
		return l.pool(p, parts)
	}
	b := l.barrel(p)
	var profile surface.Profile
	if err := profile.SolveWith(b.Pipe, b.flow, surface.Control{Level: line.control}, b.depths); err != nil {
		return nil
	}
	var points []Point
	for _, at := range profile.AppendPoints(nil, parts) {
		depth := at.Depth + line.skew(&l.network.Pipes[p])*at.Distance/b.Length
		hgl := l.invertAt(p, at.Distance) + depth
		points = append(points, Point{at.Distance, depth, hgl, hgl + b.head(depth)})
	}
	if line.Bend > 0 {
		points = append(points, Point{points[len(points)-1].Distance, line.HGLUpper - l.network.Pipes[p].InvertUpper.V, line.HGLUpper, line.EGLUpper})
	}
	return points
}

// pool is a pipe without flow: the water below, or the invert where that is higher.
func (l *Lines) pool(p network.PipeIndex, parts int) []Point {
	line, length := &l.Pipes[p], l.network.Pipes[p].Length
	level := line.control + l.network.Pipes[p].InvertLower.V
	var points []Point
	for i := range max(1, parts) + 1 {
		x := length * float64(i) / float64(max(1, parts))
		invert := l.invertAt(p, x)
		hgl := max(invert, level)
		points = append(points, Point{x, hgl - invert, hgl, hgl})
	}
	return points
}

// invertAt is the invert of a pipe at a distance from its lower end.
func (l *Lines) invertAt(p network.PipeIndex, distance float64) float64 {
	pipe := &l.network.Pipes[p]
	upper, lower := pipe.InvertUpper.V, pipe.InvertLower.V
	return lower + (upper-lower)*distance/pipe.Length
}
