package pipeflow

import "math"

// growth is how fast wetted perimeter and top width grow with depth, dP/dy and dT/dy; that of the area is the top width.
type growth struct{ perimeter, width float64 }

// growing is a section that knows its growth. Others are differenced.
type growing interface{ growth(depth float64) growth }

// growthOf is the way to the growth of a section.
func growthOf(s Section) growing {
	if known, ok := s.(growing); ok {
		return known
	}
	return differenced{s}
}

// differenced measures growth by differences over a hundred-thousandth of the depth. They serve Newton's iteration, which
// does not need more; the bracket keeps it safe.
type differenced struct{ Section }

func (d differenced) growth(y float64) growth {
	high, low := min(y*(1+1e-5), d.Rise()*underRoof), y*(1-1e-5)
	above, below := d.At(high), d.At(low)
	return growth{
		perimeter: (above.Perimeter - below.Perimeter) / (high - low),
		width:     (above.TopWidth - below.TopWidth) / (high - low),
	}
}

func (c Circle) growth(depth float64) growth { return arcGrowth(c.diameter, depth, c.diameter-depth) }

func (Box) growth(float64) growth { return growth{perimeter: 2} }

func (o *Outline) growth(depth float64) growth {
	p := o.pieceAt(depth)
	if p.radius == 0 {
		return growth{2 * p.stretch, 2 * p.lean}
	}
	return arcGrowth(2*p.radius, depth-p.low, p.high-depth)
}

func (e *Ellipse) growth(depth float64) growth {
	circle := arcGrowth(1, depth/e.rise, (e.rise-depth)/e.rise)
	return wallGrowth(e.span / e.rise * circle.width / 2)
}

// arcGrowth is that of a circle at heights below and above the water line: dT/dy = 2 cot φ, dP/dy = 2/sin φ, with
// sin φ = T/D and cos φ = (above - below)/D.
func arcGrowth(D, below, above float64) growth {
	half := math.Sqrt(below * max(above, 0)) // T/2
	return growth{perimeter: D / half, width: (above - below) / half}
}

// wallGrowth is that of two like walls that lean outward by x' for a unit of height.
func wallGrowth(lean float64) growth {
	return growth{perimeter: 2 * math.Sqrt(1+lean*lean), width: 2 * lean}
}

// normalFunction is ln(A R^(2/3) / factor), a third of the logarithm of its cube, which needs no root; its slope is
// y (5/3 T/A - 2/3 P'/P).
func normalFunction(s Section, factor float64) hydraulic {
	grower := growthOf(s)
	return func(y float64) (value, slope float64) {
		wet, grows := s.At(y), grower.growth(y)
		r, share := wet.Area/wet.Perimeter, wet.Area/factor
		value = ln(r*share*r*share*share) / 3
		return value, y * (5*wet.TopWidth/wet.Area - 2*grows.perimeter/wet.Perimeter) / 3
	}
}

// criticalFunction is ln(A³/T / target); its slope is y (3 T/A - T'/T).
func criticalFunction(s Section, target float64) hydraulic {
	grower := growthOf(s)
	return func(y float64) (value, slope float64) {
		wet, grows := s.At(y), grower.growth(y)
		value = ln(criticalFactor(wet) / target)
		return value, y * (3*wet.TopWidth/wet.Area - grows.width/wet.TopWidth)
	}
}
