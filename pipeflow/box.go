package pipeflow

import "math"

// Box is a rectangular conduit with a flat roof. The zero value carries nothing.
type Box struct{ span, rise float64 }

// NewBox makes a box of an inside span and rise, both over zero; anything else is an error.
func NewBox(span, rise float64) (Box, error) {
	if err := checkLength("span", span); err != nil {
		return Box{}, err
	}
	if err := checkLength("rise", rise); err != nil {
		return Box{}, err
	}
	return Box{span, rise}, nil
}

// Rise is the inside height.
func (b Box) Rise() float64 { return b.rise }

// Span is the inside width.
func (b Box) Span() float64 { return b.span }

// Closed is true.
func (b Box) Closed() bool { return true }

// At measures the box at a depth. The roof is wetted at the rise and not before, so the perimeter jumps there by the
// span: a box carries most just below its roof.
func (b Box) At(depth float64) Geometry {
	y := clampDepth(depth, b.rise)
	if y == b.rise {
		return Geometry{Area: b.span * b.rise, Perimeter: 2 * (b.span + b.rise)}
	}
	if y == 0 {
		return Geometry{TopWidth: b.span, Perimeter: b.span}
	}
	return Geometry{Area: b.span * y, Perimeter: b.span + 2*y, TopWidth: b.span}
}

// Moment is b y²/2.
func (b Box) Moment(depth float64) float64 {
	y := clampDepth(depth, b.rise)
	return b.span * y * y / 2
}

// criticalDepth is (q²/g)^(1/3), q being the flow a unit of span; target is Q²/g. None where it is over the rise.
func (b Box) criticalDepth(target float64) (depth float64, ok bool) {
	depth = math.Cbrt(target / b.span / b.span)
	return depth, depth < b.rise
}

// normalDepth solves for v = y/b
//
//	v⁵/(1 + 2v)² = c    c = K³/b⁸
//
// which is K = A R^(2/3) of the rectangle, cubed. From the start, two third-order steps on the logarithm in ln v leave
// 1e-6, then less than rounding.
func (b Box) normalDepth(factor float64) (depth float64, ok bool) {
	c := rectangleConstant(b.span, factor)
	v := rectangleStart(c)
	v *= boxStep(v, math.Log(boxRatio(v, c)))
	v *= boxStep(v, logarithm(boxRatio(v, c)))
	depth = b.span * v
	return depth, depth < b.rise
}

// rectangleConstant is K³/b⁸.
func rectangleConstant(width, factor float64) float64 {
	share := factor / (width * width)
	return share * share * share / (width * width)
}

// rectangleStart is w (1 + 2.4 w + 4 w²)^(1/3), w = c^(1/5): it has the right first two terms for wide flow and the right
// limit (4c)^(1/3) for deep flow; between it is up to 4.8 % high.
func rectangleStart(c float64) float64 {
	w := math.Exp(math.Log(c) / 5)
	return w * math.Cbrt(1+2.4*w+4*w*w)
}

// boxRatio is v⁵/(1 + 2v)² over c.
func boxRatio(v, c float64) float64 {
	r := v / (1 + 2*v)
	return v * v / c * v * r * r
}

// boxStep is the factor by which the third-order step on the logarithm of the ratio changes v. The exponential is cut
// after the cube, which for a step of 5 % leaves 3e-7.
func boxStep(v, off float64) float64 {
	deep := 2 * v / (1 + 2*v)
	step := thirdOrder(off, 5-2*deep, -2*deep*(1-deep))
	return 1 + step*(1+step/2*(1+step/3))
}
