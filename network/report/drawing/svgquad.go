package drawing

import "math"

// quad is a convex shape with four corners, in order: an upright box, a turned label or a stretch of a line.
type quad [4]Point

func (b Box) quad() quad {
	return quad{{b.Left, b.Top}, {b.Right, b.Top}, {b.Right, b.Bottom}, {b.Left, b.Bottom}}
}

// box is the upright box around the shape.
func (q quad) box() Box {
	b := Box{q[0].X, q[0].Y, q[0].X, q[0].Y}
	for _, p := range q[1:] {
		b = b.with(p)
	}
	return b
}

// band is the shape of a straight line of some width.
func band(a, b Point, width float64) quad {
	length := math.Hypot(b.X-a.X, b.Y-a.Y)
	if length == 0 {
		return Box{a.X, a.Y, a.X, a.Y}.grown(width / 2).quad()
	}
	x, y := (b.X-a.X)/length*width/2, (b.Y-a.Y)/length*width/2
	return quad{{a.X - y, a.Y + x}, {b.X - y, b.Y + x}, {b.X + y, b.Y - x}, {a.X + y, a.Y - x}}
}

// meets tells whether two shapes overlap: whether no edge of either separates them (separating axis theorem).
func (q quad) meets(o quad) bool {
	return !q.parts(o) && !o.parts(q)
}

// parts tells whether an edge of q has all of o on its far side.
func (q quad) parts(o quad) bool {
	for i := range q {
		a, b := q[i], q[(i+1)%len(q)]
		normal := Point{b.Y - a.Y, a.X - b.X}
		low, high := q.along(normal)
		from, to := o.along(normal)
		if to <= low || from >= high {
			return true
		}
	}
	return false
}

// along is the extent of the shape in a direction.
func (q quad) along(direction Point) (low, high float64) {
	low, high = math.Inf(1), math.Inf(-1)
	for _, p := range q {
		v := p.X*direction.X + p.Y*direction.Y
		low, high = min(low, v), max(high, v)
	}
	return low, high
}
