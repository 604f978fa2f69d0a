package pipeflow

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
