package pipeflow

import "math"

// Outline is a closed inside that is symmetric about its upright axis and built of arcs and straight lines: haunched
// boxes, arches, pipe-arches and ovals. Make one with [NewHaunchedBox], [NewArch] or [NewOval].
type Outline struct {
	rise, span float64
	floor      float64 // flat width at the bottom, 0 where the lowest point is on an arc
	roof       float64 // flat width at the top, 0 where the highest point is on an arc
	pieces     []piece // of the right-hand wall, from the bottom up
	full       Geometry
	moment     float64 // first moment of the full area about the highest point
	top        crest
}

// piece is one arc or line of the right-hand wall, with what the half section holds below it.
//
// On an arc the wall stands at x = centre + √(h (2r - h)), h being the height above the lowest point of the arc's own
// circle. On a line it stands at x = foot + lean (z - bottom).
type piece struct {
	bottom, top float64 // heights between which it runs

	radius     float64 // of an arc, 0 for a line
	centre     float64 // x of the arc's centre
	low, high  float64 // heights of the lowest and the highest point of the arc's circle
	foot, lean float64 // of a line
	stretch    float64 // length of a line for a unit of height

	area, perimeter, moment float64 // of the half section up to the bottom of the piece
}

// newOutline adds up the pieces; they must run from height 0 to the rise without a gap.
func newOutline(floor, roof float64, pieces []piece) *Outline {
	o := &Outline{floor: floor, roof: roof, pieces: pieces}
	half := Geometry{Perimeter: floor / 2}
	moment := 0.0
	for i := range pieces {
		p := &pieces[i]
		p.stretch = math.Sqrt(1 + p.lean*p.lean)
		p.area, p.perimeter, p.moment = half.Area, half.Perimeter, moment
		o.span = max(o.span, 2*p.widest())
		half, moment = p.half(p.top), p.halfMoment(p.top)
	}
	o.rise = pieces[len(pieces)-1].top
	o.full = Geometry{Area: 2 * half.Area, Perimeter: 2*half.Perimeter + roof}
	o.moment = 2 * moment
	o.top = findCrest(o)
	return o
}

// Rise is the inside height on the axis.
func (o *Outline) Rise() float64 { return o.rise }

// Span is the greatest inside width.
func (o *Outline) Span() float64 { return o.span }

// Closed is true.
func (o *Outline) Closed() bool { return true }

// At measures the section at a depth: what the pieces below hold, and the wetted part of the piece at the water line.
func (o *Outline) At(depth float64) Geometry {
	y := clampDepth(depth, o.rise)
	if y == o.rise {
		return o.full
	}
	half := o.pieceAt(y).half(y)
	return Geometry{Area: 2 * half.Area, Perimeter: 2 * half.Perimeter, TopWidth: 2 * half.TopWidth}
}

// Moment is the first moment of the wetted area about the water surface.
func (o *Outline) Moment(depth float64) float64 {
	y := clampDepth(depth, o.rise)
	if y == o.rise {
		return o.moment
	}
	return 2 * o.pieceAt(y).halfMoment(y)
}

// pieceAt is the piece of wall at the water line.
func (o *Outline) pieceAt(y float64) *piece {
	last := len(o.pieces) - 1
	for i := range last {
		if y < o.pieces[i].top {
			return &o.pieces[i]
		}
	}
	return &o.pieces[last]
}

// half measures the right-hand half of the section with the water line on this piece.
func (p *piece) half(y float64) Geometry {
	rise := y - p.bottom
	if p.radius == 0 {
		return Geometry{
			Area:      p.area + rise*(p.foot+p.lean*rise/2),
			Perimeter: p.perimeter + rise*p.stretch,
			TopWidth:  p.foot + p.lean*rise,
		}
	}
	here, start := p.circle(y), p.circle(p.bottom)
	return Geometry{
		Area:      p.area + p.centre*rise + (here.Area-start.Area)/2,
		Perimeter: p.perimeter + (here.Perimeter-start.Perimeter)/2,
		TopWidth:  p.centre + here.TopWidth/2,
	}
}

// halfMoment is the first moment of the same half about the water line: ∫ x (y - z) dz over the piece, and the area
// below it carried up.
func (p *piece) halfMoment(y float64) float64 {
	rise := y - p.bottom
	below := p.moment + p.area*rise
	if p.radius == 0 {
		return below + rise*rise*(p.foot/2+p.lean*rise/6)
	}
	circle := Circle{2 * p.radius}
	start := p.circle(p.bottom)
	band := circle.Moment(y-p.low) - circle.Moment(p.bottom-p.low) - rise*start.Area
	return below + p.centre*rise*rise/2 + band/2
}

// circle measures the whole circle of an arc filled to the height z.
func (p *piece) circle(z float64) Geometry {
	return segment(2*p.radius, z-p.low, p.high-z)
}

// widest is the greatest distance of the piece from the axis.
func (p *piece) widest() float64 {
	if p.radius == 0 {
		return max(p.foot, p.foot+p.lean*(p.top-p.bottom))
	}
	if middle := (p.low + p.high) / 2; p.bottom <= middle && middle <= p.top {
		return p.centre + p.radius
	}
	return p.centre + max(p.circle(p.bottom).TopWidth, p.circle(p.top).TopWidth)/2
}
