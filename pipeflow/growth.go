package pipeflow

import "math"

// growth is how fast wetted perimeter and top width grow with depth, dP/dy and dT/dy, and how fast that changes itself,
// d²P/dy² and d²T/dy². That of the area is the top width.
type growth struct{ perimeter, perimeterBend, width, widthBend float64 }

// growing is a section that knows its growth. Others are differenced.
type growing interface{ growth(depth float64) growth }

// growthOf is the way to the growth of a section.
func growthOf(s Section) growing {
	if known, ok := s.(growing); ok {
		return known
	}
	return differenced{s}
}

// differenced measures growth by differences over a ten-thousandth of the depth, to about eight digits, its bend to four.
// They only steer an iteration.
type differenced struct{ Section }

func (d differenced) growth(y float64) growth {
	step := min(1e-4*y, (d.Rise()*underRoof-y)/2)
	if !(step > 0) {
		step = 1e-4 * y
	}
	above, here, below := d.At(y+step), d.At(y), d.At(y-step)
	return growth{
		perimeter:     (above.Perimeter - below.Perimeter) / (2 * step),
		perimeterBend: (above.Perimeter - 2*here.Perimeter + below.Perimeter) / (step * step),
		width:         (above.TopWidth - below.TopWidth) / (2 * step),
		widthBend:     (above.TopWidth - 2*here.TopWidth + below.TopWidth) / (step * step),
	}
}

func (c Circle) growth(depth float64) growth { return arcGrowth(c.diameter, depth, c.diameter-depth) }

func (Box) growth(float64) growth { return growth{perimeter: 2} }

func (o *Outline) growth(depth float64) growth {
	p := o.pieceAt(depth)
	if p.radius == 0 {
		return growth{perimeter: 2 * p.stretch, width: 2 * p.lean}
	}
	return arcGrowth(2*p.radius, depth-p.low, p.high-depth)
}

func (e *Ellipse) growth(depth float64) growth {
	circle := arcGrowth(1, depth/e.rise, (e.rise-depth)/e.rise)
	flat := e.span / e.rise
	return wallGrowth(flat*circle.width/2, flat*circle.widthBend/2/e.rise)
}

func (c Trapezoid) growth(float64) growth {
	return growth{perimeter: c.walls(), width: c.left + c.right}
}

func (c Parabola) growth(depth float64) growth {
	lean := c.width / math.Sqrt(depth*c.depth) / 4
	return wallGrowth(lean, -lean/(2*depth))
}

// arcGrowth is that of a circle at heights below and above the water line. With x = √(below above), half the width, and
// c = (above - below)/2 the height of the centre over the line, dx/dy = c/x and d²x/dy² = -(D/2)²/x³; the wall is
// (D/2)/x long for a unit of height.
func arcGrowth(D, below, above float64) growth {
	x := math.Sqrt(below * max(above, 0))
	centre := (above - below) / 2
	return growth{
		perimeter:     D / x,
		perimeterBend: -D / x * (centre / (x * x)),
		width:         2 * centre / x,
		widthBend:     -D / x * (D / x) / (2 * x),
	}
}

// wallGrowth is that of two like walls that lean outward, given dx/dy and d²x/dy² of one of them.
func wallGrowth(lean, bend float64) growth {
	length := math.Sqrt(1 + lean*lean)
	return growth{perimeter: 2 * length, perimeterBend: 2 * lean / length * bend, width: 2 * lean, widthBend: 2 * bend}
}
