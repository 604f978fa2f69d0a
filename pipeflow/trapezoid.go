package pipeflow

import (
	"fmt"
	"math"
)

// Trapezoid is an open channel with a level bottom and straight sides that go on without end; a triangle and a rectangle
// are of this kind.
type Trapezoid struct {
	bottom      float64
	left, right float64 // run of each side for a unit of height
}

// NewTrapezoid makes a channel of a bottom width and two side slopes, horizontal for one vertical. All are 0 or more, and
// not all 0.
func NewTrapezoid(bottom, left, right float64) (Trapezoid, error) {
	for _, value := range [...]float64{bottom, left, right} {
		if !(value >= 0) || math.IsInf(value, 1) {
			return Trapezoid{}, fmt.Errorf("pipeflow: bottom width %v and side slopes %v, %v must be finite and 0 or more",
				bottom, left, right)
		}
	}
	if bottom+left+right == 0 {
		return Trapezoid{}, fmt.Errorf("pipeflow: a channel needs a bottom width or a side slope over 0")
	}
	return Trapezoid{bottom, left, right}, nil
}

// NewTriangle makes a channel of two sides that meet at the bottom, horizontal for one vertical, not both 0.
func NewTriangle(left, right float64) (Trapezoid, error) { return NewTrapezoid(0, left, right) }

// NewRectangle makes a channel with upright sides and a width over 0.
func NewRectangle(width float64) (Trapezoid, error) { return NewTrapezoid(width, 0, 0) }

// Rise is +Inf.
func (Trapezoid) Rise() float64 { return math.Inf(1) }

// Span is the bottom width where both sides are upright, else +Inf.
func (c Trapezoid) Span() float64 {
	if c.left+c.right == 0 {
		return c.bottom
	}
	return math.Inf(1)
}

// Closed is false.
func (Trapezoid) Closed() bool { return false }

// At measures the channel at a depth (Chow 1959, table 2-1, with a slope for each side):
//
//	A = (b + z y) y    P = b + y (√(1 + z₁²) + √(1 + z₂²))    T = b + 2 z y    z = (z₁ + z₂)/2
func (c Trapezoid) At(depth float64) Geometry {
	y := clampDepth(depth, math.Inf(1))
	return Geometry{
		Area:      (c.bottom + (c.left+c.right)/2*y) * y,
		Perimeter: c.bottom + c.walls()*y,
		TopWidth:  c.bottom + (c.left+c.right)*y,
	}
}

// Moment is b y²/2 + z y³/3.
func (c Trapezoid) Moment(depth float64) float64 {
	y := clampDepth(depth, math.Inf(1))
	return y * y * (c.bottom/2 + (c.left+c.right)/6*y)
}

// walls is the length of both sides for a unit of height.
func (c Trapezoid) walls() float64 {
	return math.Sqrt(1+c.left*c.left) + math.Sqrt(1+c.right*c.right)
}
