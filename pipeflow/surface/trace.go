package surface

import "slices"

// Point is a place on the surface: its distance from the lower end and the depth there, over the rise where the pipe runs
// under pressure.
type Point struct{ Distance, Depth float64 }

// Depth is the depth at a distance from the lower end, which is clamped to the pipe; at a jump the depth below it.
func (p *Profile) Depth(distance float64) float64 {
	distance = max(0, min(distance, p.pipe.Length))
	switch {
	case p.Regime == Dry:
		return p.pool(distance)
	case p.held > 0 && distance <= p.held:
		return p.sub.depth(distance)
	}
	return p.sup.depth(distance)
}

// AppendPoints adds the surface from the lower end up to a list: both ends, the places between that cut the pipe into
// equal parts, the places where the surface meets the crown, and at a jump both depths.
func (p *Profile) AppendPoints(points []Point, parts int) []Point {
	first := len(points)
	for i := range max(1, parts) + 1 {
		x := p.pipe.Length * float64(i) / float64(max(1, parts))
		points = append(points, Point{x, p.Depth(x)})
	}
	if p.Regime == Dry {
		return points
	}
	for _, x := range [...]float64{p.sub.drowned, p.sub.top} {
		if x > 0 && x < p.held {
			points = append(points, Point{x, p.Depth(x)})
		}
	}
	if p.HasJump {
		points = append(points, Point{p.Jump, p.JumpAfter}, Point{p.Jump, p.JumpBefore})
	}
	slices.SortStableFunc(points[first:], func(a, b Point) int {
		switch {
		case a.Distance < b.Distance:
			return -1
		case a.Distance > b.Distance:
			return 1
		}
		return 0
	})
	return points
}
