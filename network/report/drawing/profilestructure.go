package drawing

import (
	"rimfall/network"
	"rimfall/network/report"
	"rimfall/network/units"
)

// Structures: their width is a sign, not a measure, since no table gives one; their heights are to scale.
var (
	shaft   = Pen{Width: 0.35}
	cover   = Pen{Width: 0.8}
	grating = Pen{Width: 0.9, Dashes: []float64{0.7, 0.35}}
	opening = Pen{Width: 0.25}
	fall    = Pen{Width: 0.13, Dashes: []float64{0.6, 0.9}} // from a structure to its column
)

// shaftWidth is the width of a structure that is drawn: 4 ft or 1.2 m to scale, within what can be read, mm.
func (g *graph) shaftWidth() float64 {
	width := 4.0
	if g.r.units.Name == units.SI.Name {
		width = 1.2
	}
	return max(2.2, min(width*g.layout.along.mm, 5))
}

// structures draws the structures of the part with the openings of all pipes that do not belong to the line.
func (g *graph) structures() {
	for k := g.part.first; k <= g.part.last; k++ {
		s := g.line.structures[k]
		bottom, top, ok := g.r.extent(s)
		if !ok {
			continue
		}
		x, half := g.x(g.line.stations[k]), g.shaftWidth()/2
		body := Box{x - half, g.y(top), x + half, g.y(bottom)}
		given := &g.r.Network.Structures[s]
		if given.Kind == network.Outfall {
			g.headwall(x, s, body)
		} else {
			g.Rect(body, shaft, White)
			g.Line(Point{body.Left - 0.4, body.Bottom}, Point{body.Right + 0.4, body.Bottom}, cover)
			g.lid(given, body)
		}
		g.place.take(body)
		g.openings(k, x, half)
	}
}

// lid closes the shaft at the top: a cover, a grate, or the roof of what is buried.
func (g *graph) lid(s *network.Structure, body Box) {
	left, right := Point{body.Left - 0.4, body.Top}, Point{body.Right + 0.4, body.Top}
	switch {
	case s.Kind == network.Inlet && s.Rim.OK:
		g.Line(left, right, grating)
	case s.Kind == network.BlindJunction || s.Rim.OK:
		g.Line(left, right, cover)
	}
}

// extent is from the lowest invert of a structure to its rim; without a rim, to a foot or 0.3 m over the highest crown.
// ok is false where no pipe end there has a level.
func (r *run) extent(s network.StructureIndex) (bottom, top float64, ok bool) {
	n := r.Network
	row := report.Structure(r.Result, &r.Design, s)
	low := row.Lowest()
	if !low.OK {
		return 0, 0, false
	}
	roof := 1.0
	if r.units.Name == units.SI.Name {
		roof = 0.3
	}
	top = low.V
	for _, p := range n.PipesIn(s) {
		top = max(top, crown(&n.Pipes[p], network.Lower).Or(top)+roof)
	}
	for _, p := range n.PipesOut(s) {
		top = max(top, crown(&n.Pipes[p], network.Upper).Or(top)+roof)
	}
	return low.V, n.Structures[s].Rim.Or(top), true
}

// headwall draws the wall in which a pipe ends at an outfall, cut through, and the apron before it.
func (g *graph) headwall(x float64, s network.StructureIndex, body Box) {
	const thick, toe, apron, slab = 1.6, 2.2, 9, 0.9
	crownY := body.Bottom
	for _, p := range g.r.Network.PipesIn(s) {
		if c := crown(&g.r.Network.Pipes[p], network.Lower); c.OK {
			crownY = min(crownY, g.y(c.V))
		}
	}
	if body.Top < crownY {
		g.Rect(Box{x, body.Top, x + thick, crownY}, shaft, Hatched)
	}
	g.Polygon([]Point{
		{x + thick, body.Bottom},
		{x + thick, body.Bottom + toe},
		{x, body.Bottom + toe},
		{x, body.Bottom + slab},
		{x - apron, body.Bottom + slab},
		{x - apron, body.Bottom},
	}, shaft, Hatched)
	g.place.take(Box{x - apron, body.Bottom, x + thick, body.Bottom + toe})
}

// opening is the end of a pipe of another line in a structure.
type pipeEnd struct {
	pipe *network.Pipe
	end  network.End
}

// otherEnds lists the pipe ends in structure k that do not belong to the line.
func (g *graph) otherEnds(k int) []pipeEnd {
	n, s := g.r.Network, g.line.structures[k]
	var ends []pipeEnd
	for _, p := range n.PipesIn(s) {
		if k >= len(g.line.pipes) || g.line.pipes[k] != p {
			ends = append(ends, pipeEnd{&n.Pipes[p], network.Lower})
		}
	}
	for _, p := range n.PipesOut(s) {
		if k == 0 || g.line.pipes[k-1] != p {
			ends = append(ends, pipeEnd{&n.Pipes[p], network.Upper})
		}
	}
	return ends
}

// openings draws the other pipes in a structure as what is seen of them: an ellipse, since the drawing is taller than
// true.
func (g *graph) openings(k int, x, half float64) {
	for _, e := range g.otherEnds(k) {
		invert := e.pipe.Invert(e.end)
		if !invert.OK || e.pipe.Section == nil {
			continue
		}
		ry := e.pipe.Section.Rise() / 2 * g.layout.up.mm
		rx := max(0.4, min(e.pipe.Section.Span()/2*g.layout.along.mm, half-0.3))
		g.Ellipse(Point{x, g.y(invert.V) - ry}, rx, ry, opening, White)
	}
}

// openingNames names the other pipes beside the structure where there is room; the sheets of their own lines have them all.
func (g *graph) openingNames() {
	for k := g.part.first; k <= g.part.last; k++ {
		x, half := g.x(g.line.stations[k]), g.shaftWidth()/2
		for _, e := range g.otherEnds(k) {
			invert := e.pipe.Invert(e.end)
			if !invert.OK || e.pipe.Section == nil {
				continue
			}
			direction := "from " + g.r.Network.Structures[e.pipe.From].ID
			if e.end == network.Upper {
				direction = "to " + g.r.Network.Structures[e.pipe.To].ID
			}
			full := e.pipe.ID + ", " + sizeText(e.pipe, g.r.units.Size) + " " + direction
			level := "invert " + g.r.style.Show(report.Level, report.M(invert))
			middle := Point{x, g.y(invert.V + e.pipe.Section.Rise()/2)}
			g.call(middle, half+0.3, full, level, e.pipe.ID)
		}
	}
}

// besideSpots are places for lines of text beside a point: close to it, then farther out.
func besideSpots(at Point, gap float64, texts ...string) []spot {
	const step = 3.0
	var spots []spot
	for _, out := range [...]float64{5, 9, 14, 20} {
		for _, rise := range [...]float64{0, 4, -4, 8, -8, 12, -12, 18, -18} {
			for _, right := range [...]bool{true, false} {
				s := spot{leader: true, at: at}
				for i, text := range texts {
					l := Label{At: Point{at.X + gap + out, at.Y + rise + 0.9 + float64(i)*step}, Size: smallType, Text: text}
					if !right {
						l.At.X, l.Anchor = at.X-gap-out, End
					}
					s.labels = append(s.labels, l)
				}
				spots = append(spots, s)
			}
		}
	}
	return spots
}

// call writes two lines beside a point, or where these have no room a short one, and leads a thin line to it.
func (g *graph) call(at Point, gap float64, first, second, short string) {
	chosen, ok := g.place.choose(besideSpots(at, gap, first, second), besideSpots(at, gap, short))
	if !ok {
		return // the table, or the sheet of the other line, has it
	}
	for _, l := range chosen.labels {
		l.Halo = true
		g.Text(l)
	}
	g.Line(chosen.from(), chosen.at, leader)
	g.Ellipse(chosen.at, 0.3, 0.3, noEdge, Black)
}
