package drawing

import (
	"math"
	"slices"

	"rimfall/network"
)

// Pipes are drawn wider the wider they are, between these widths of line, mm.
const thinnestPipe, widestPipe = 0.3, 1.5

// symbolSize is half the width of the sign of a structure, mm.
const symbolSize = 1.25

// spans notes the least and the greatest span.
func (p *plan) spans() {
	p.least, p.greatest = math.Inf(1), 0
	for i := range p.r.Network.Pipes {
		v := p.r.Network.Pipes[i].Size.Span
		p.least, p.greatest = min(p.least, v), max(p.greatest, v)
	}
}

// penOfSpan is the line of a pipe of a span: the width runs evenly from the least to the greatest.
func (p *plan) penOfSpan(span float64) Pen {
	if p.greatest <= p.least {
		return Pen{Width: 0.6}
	}
	return Pen{Width: thinnestPipe + (widestPipe-thinnestPipe)*(span-p.least)/(p.greatest-p.least)}
}

// pipe draws a pipe and the way of the water.
func (p *plan) pipe(i network.PipeIndex) {
	from, to, ok := p.ends(i)
	if !ok {
		return
	}
	given := &p.r.Network.Pipes[i]
	pen := p.penOfSpan(given.Size.Span)
	if given.Existing {
		pen.Dashes = []float64{2.4, 1}
	}
	p.Line(from, to, pen)
	p.place.takeLine(from, to, pen.Width+0.3)
	p.flowHead(from, to, pen.Width)
}

// slimHead is half the width of an arrow head in parts of its length.
const slimHead = 0.32

func headLength(width float64) float64 { return 2 + width }

// flowHead draws an arrow head a little below the middle of a pipe; a pipe that is too short on paper has none.
func (p *plan) flowHead(from, to Point, width float64) {
	length := math.Hypot(to.X-from.X, to.Y-from.Y)
	head := headLength(width)
	if length < head+2*symbolSize+1 {
		return
	}
	ux, uy := (to.X-from.X)/length, (to.Y-from.Y)/length
	tip := Point{from.X + ux*(length+head)/2, from.Y + uy*(length+head)/2}
	half := head * slimHead
	base := Point{tip.X - head*ux, tip.Y - head*uy}
	points := []Point{tip, {base.X - half*uy, base.Y + half*ux}, {base.X + half*uy, base.Y - half*ux}}
	p.Polygon(points, Pen{Width: 0.1}, Black)
	p.place.takeLine(base, tip, 2*half)
}

// structure draws the sign of a structure; one without coordinates is noted.
func (p *plan) structure(i network.StructureIndex) {
	at, ok := p.at(i)
	s := &p.r.Network.Structures[i]
	if !ok {
		p.notes.NoCoordinates = append(p.notes.NoCoordinates, s.ID)
		return
	}
	p.symbol(at, s.Kind, p.outward(i))
	room := symbolSize + 0.1
	if s.Kind == network.Outfall {
		room = 2 * symbolSize // its wings reach farther
	}
	p.place.take(Box{at.X, at.Y, at.X, at.Y}.grown(room))
}

// outward is the direction in which the water leaves at an outfall, in radians from the right, clockwise.
func (p *plan) outward(s network.StructureIndex) float64 {
	for _, i := range p.r.Network.PipesIn(s) {
		if from, to, ok := p.ends(i); ok {
			return math.Atan2(to.Y-from.Y, to.X-from.X)
		}
	}
	return 0
}

// symbol draws the sign of a kind: a ring for a manhole, a barred square for an inlet, a black dot for a buried junction,
// a wall with wings across the flow for an outfall.
func (s *sheet) symbol(at Point, kind network.Kind, outward float64) {
	const r = symbolSize
	switch kind {
	case network.Inlet:
		s.Rect(Box{at.X - r, at.Y - r, at.X + r, at.Y + r}, medium, White)
		for _, d := range [...]float64{-0.4, 0.4} {
			s.Line(Point{at.X + d, at.Y - r}, Point{at.X + d, at.Y + r}, thin)
		}
	case network.BlindJunction:
		s.Ellipse(at, r*0.7, r*0.7, medium, Black)
	case network.Outfall:
		sin, cos := math.Sincos(outward)
		turn := func(x, y float64) Point { return Point{at.X + x*cos - y*sin, at.Y + x*sin + y*cos} }
		s.Polyline([]Point{turn(1.6*r, -1.9*r), turn(0, -r), turn(0, r), turn(1.6*r, 1.9*r)}, Pen{Width: 0.7})
	default:
		s.Ellipse(at, r, r, medium, White)
	}
}

// samples is the legend: kinds, lines, and widths of pipes.
func (p *plan) samples() []sample {
	var list []sample
	for _, k := range [...]network.Kind{network.Manhole, network.Inlet, network.BlindJunction, network.Outfall} {
		list = append(list, sample{func(b Box) {
			p.symbol(Point{(b.Left + b.Right) / 2, (b.Top + b.Bottom) / 2}, k, 0)
		}, kindText(k)})
	}
	existing := Pen{Width: 0.5, Dashes: []float64{2.4, 1}}
	list = append(list, p.penSample(existing, "existing pipe"))
	if len(p.marks) > 0 {
		list = append(list, sample{func(b Box) {
			p.drawMark(Point{b.Left + 3.5, (b.Top + b.Bottom) / 2}, 1, true)
			p.drawMark(Point{b.Left + 9.5, (b.Top + b.Bottom) / 2}, 2, false)
		}, "error, warning"})
	}
	for _, span := range p.spanSamples() {
		list = append(list, p.penSample(p.penOfSpan(span), number(span)+" "+p.r.units.Size))
	}
	return list
}

// spanSamples picks at most five of the spans, from the least to the greatest.
func (p *plan) spanSamples() []float64 {
	var all []float64
	for i := range p.r.Network.Pipes {
		if v := p.r.Network.Pipes[i].Size.Span; v > 0 {
			all = append(all, v)
		}
	}
	slices.Sort(all)
	all = slices.Compact(all)
	const most = 5
	if len(all) <= most {
		return all
	}
	picked := make([]float64, most)
	for i := range most {
		picked[i] = all[i*(len(all)-1)/(most-1)]
	}
	return picked
}
