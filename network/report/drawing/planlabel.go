package drawing

import (
	"math"
	"strings"

	"rimfall/network"
)

// kindText is a kind in words.
func kindText(k network.Kind) string { return strings.ReplaceAll(k.String(), "-", " ") }

// structureNames writes the ids: close to their signs, else farther out with a thin line.
func (p *plan) structureNames() {
	for i := range p.r.Network.Structures {
		at, ok := p.at(network.StructureIndex(i))
		if !ok {
			continue
		}
		s := &p.r.Network.Structures[i]
		chosen, ok := p.place.choose(aroundSpots(at, symbolSize, []Label{{Text: s.ID, Size: typeSize, Bold: true}}))
		if !ok {
			p.notes.NoRoom++
			continue
		}
		p.label(chosen)
	}
}

// label writes what was placed.
func (p *plan) label(chosen spot) {
	for _, l := range chosen.labels {
		p.Text(l)
	}
	if chosen.leader {
		p.Line(chosen.from(), chosen.at, leader)
	}
}

// aroundSpots lists places for labels around a sign: eight directions close to it, then sixteen farther and farther out,
// with a leader.
func aroundSpots(at Point, radius float64, labels []Label) []spot {
	var spots []spot
	const near, far = 0.9, 15
	for out := near; out < far; out = out*1.35 + 1 {
		directions := 16
		if out == near {
			directions = 8
		}
		for d := range directions {
			// First to the upper right, then on around the sign.
			angle := -math.Pi/4 + 2*math.Pi*float64(d)/float64(directions)
			spots = append(spots, besideAt(at, radius, out, angle, labels, out > near))
		}
	}
	return spots
}

// besideAt puts labels at a distance from the edge of a sign in a direction, so that they begin, end or are centred there.
func besideAt(at Point, edge, out, angle float64, labels []Label, leader bool) spot {
	sin, cos := math.Sincos(angle)
	s := spot{leader: leader, at: Point{at.X + edge*cos, at.Y + edge*sin}}
	block := 0.0
	for _, l := range labels {
		block += l.Size * 1.15
	}
	x, y := at.X+(edge+out)*cos, at.Y+(edge+out)*sin
	top := y - block/2*(1-sin) // over the place where it looks up, under it where it looks down
	for _, l := range labels {
		top += l.Size * 1.15
		l.At, l.Anchor = Point{x, top - 0.3*l.Size}, Middle
		switch {
		case cos > 0.3:
			l.Anchor = Start
		case cos < -0.3:
			l.Anchor = End
		}
		s.labels = append(s.labels, l)
	}
	return s
}

// pipeNames writes id and size along the pipes, else the id alone, else beside the pipe with a thin line.
func (p *plan) pipeNames() {
	for i := range p.r.Network.Pipes {
		from, to, ok := p.ends(network.PipeIndex(i))
		if !ok {
			continue
		}
		given := &p.r.Network.Pipes[i]
		full := given.ID
		if given.Section != nil {
			full += ", " + sizeText(given, p.r.units.Size)
		}
		width := p.penOfSpan(given.Size.Span).Width
		gap := max(width/2, slimHead*headLength(width)) + 0.2 // off the arrow head as well
		middle := Point{(from.X + to.X) / 2, (from.Y + to.Y) / 2}
		chosen, ok := p.place.choose(alongSpots(from, to, gap, full), alongSpots(from, to, gap, given.ID),
			aroundSpots(middle, gap, []Label{{Text: given.ID, Size: smallType}}))
		if !ok {
			p.notes.NoRoom++
			continue
		}
		p.label(chosen)
	}
}

// alongSpots lists places for a text along a pipe, on both sides, in its middle and to both sides of it, never upside
// down. A text that is longer than the pipe has none.
func alongSpots(from, to Point, gap float64, text string) []spot {
	if to.X < from.X || to.X == from.X && to.Y > from.Y {
		from, to = to, from
	}
	length := math.Hypot(to.X-from.X, to.Y-from.Y)
	width := TextWidth(text, smallType, false)
	spare := length - width - 2*symbolSize - 1
	if spare < 0 {
		return nil
	}
	turn := math.Atan2(to.Y-from.Y, to.X-from.X)
	sin, cos := math.Sincos(turn)
	var spots []spot
	for _, lift := range [...]float64{-gap - below*smallType - 0.45, gap + above*smallType + 0.45} {
		for _, part := range [...]float64{0.5, 0.3, 0.7, 0.1, 0.9} {
			t := symbolSize + 0.5 + width/2 + spare*part
			at := Point{from.X + t*cos - lift*sin, from.Y + t*sin + lift*cos}
			spots = append(spots, spot{labels: []Label{{At: at, Text: text, Size: smallType, Anchor: Middle, Turn: turn * 180 / math.Pi}}})
		}
	}
	return spots
}
