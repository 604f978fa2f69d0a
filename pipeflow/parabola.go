package pipeflow

import "math"

// Parabola is an open channel whose top width grows like the root of the depth; its walls go on without end.
type Parabola struct{ width, depth float64 }

// NewParabola makes a channel that is as wide as width where it is as deep as depth, both over 0.
func NewParabola(width, depth float64) (Parabola, error) {
	if err := checkLength("width", width); err != nil {
		return Parabola{}, err
	}
	if err := checkLength("depth", depth); err != nil {
		return Parabola{}, err
	}
	return Parabola{width, depth}, nil
}

// Rise is +Inf.
func (Parabola) Rise() float64 { return math.Inf(1) }

// Span is +Inf.
func (Parabola) Span() float64 { return math.Inf(1) }

// Closed is false.
func (Parabola) Closed() bool { return false }

// At measures the channel at a depth (Chow 1959, table 2-1, the exact perimeter of its footnote):
//
//	A = 2/3 T y    P = T/2 (√(1 + x²) + ln(x + √(1 + x²))/x)    x = 4y/T
func (c Parabola) At(depth float64) Geometry {
	y := clampDepth(depth, math.Inf(1))
	if y == 0 {
		return Geometry{}
	}
	top := c.width * math.Sqrt(y/c.depth)
	x := 4 * y / top
	return Geometry{
		Area:      2. / 3 * top * y,
		Perimeter: top / 2 * (math.Sqrt(1+x*x) + math.Asinh(x)/x),
		TopWidth:  top,
	}
}

// Moment is 2/5 A y: the centroid lies two fifths of the depth below the surface.
func (c Parabola) Moment(depth float64) float64 {
	y := clampDepth(depth, math.Inf(1))
	return 0.4 * c.At(y).Area * y
}
