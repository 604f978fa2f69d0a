package drawing

import (
	"fmt"
	"math"

	"rimfall/network"
	"rimfall/network/report"
)

// Pipes: what is proposed in full lines, what exists in dashes; walls that are cut through hatched.
var (
	proposedPipe = Pen{Width: 0.35}
	existingPipe = Pen{Width: 0.3, Dashes: []float64{2, 0.8}}
	wallLine     = Pen{Width: 0.15}
)

// leastWall is the height under which a wall is drawn as one line, mm.
const leastWall = 0.25

// drawn is a pipe on the sheet: its lower and upper end, left and right.
type drawn struct {
	pipe       *network.Pipe
	index      network.PipeIndex
	left       Point // invert at the lower end
	right      Point // invert at the upper end
	rise, wall float64
}

// pipeAt lays pipe k of the line on the sheet; ok is false where its levels are not known.
func (g *graph) pipeAt(k int) (d drawn, ok bool) {
	d.index = g.line.pipes[k]
	d.pipe = &g.r.Network.Pipes[d.index]
	p := d.pipe
	if !p.InvertLower.OK || !p.InvertUpper.OK || p.Section == nil {
		return d, false
	}
	d.left, d.right = g.at(g.line.stations[k], p.InvertLower.V), g.at(g.line.stations[k+1], p.InvertUpper.V)
	d.rise, d.wall = p.Section.Rise()*g.layout.up.mm, p.Wall*g.layout.up.mm
	return d, true
}

// edge is a line along the pipe at a height over its invert.
func (d *drawn) edge(height float64) (left, right Point) {
	return Point{d.left.X, d.left.Y - height}, Point{d.right.X, d.right.Y - height}
}

// band is the shape between two heights over the invert.
func (d *drawn) band(low, high float64) []Point {
	a, b := d.edge(low)
	c, e := d.edge(high)
	return []Point{a, b, e, c}
}

// pipes draws the pipes of the part to scale, and keeps labels off them.
func (g *graph) pipes() {
	for k := g.part.first; k < g.part.last; k++ {
		d, ok := g.pipeAt(k)
		if !ok {
			continue
		}
		pen := proposedPipe
		if d.pipe.Existing {
			pen = existingPipe
		}
		g.Polygon(d.band(0, d.rise), noEdge, White)
		if d.wall >= leastWall {
			g.Polygon(d.band(-d.wall, 0), noEdge, Hatched)
			g.Polygon(d.band(d.rise, d.rise+d.wall), noEdge, Hatched)
			for _, h := range [...]float64{-d.wall, d.rise + d.wall} {
				a, b := d.edge(h)
				g.Line(a, b, wallLine)
			}
		}
		for _, h := range [...]float64{0, d.rise} {
			a, b := d.edge(h)
			g.Line(a, b, pen)
		}
		a, b := d.edge(d.rise / 2)
		g.place.takeLine(a, b, d.rise+2*d.wall+0.3)
	}
}

// pipeNames writes along each pipe what it is, in full or as much as there is room for; the table has all of it.
func (g *graph) pipeNames() {
	for k := g.part.first; k < g.part.last; k++ {
		d, ok := g.pipeAt(k)
		if !ok {
			continue
		}
		style, p := g.r.style, d.pipe
		size := sizeText(p, g.r.units.Size)
		slope := style.Show(report.Percent, report.M(p.Slope)) + " %"
		length := style.Show(report.Length, report.N(p.Length)) + " " + g.r.units.Length
		var groups [][]spot
		for _, text := range []string{
			fmt.Sprintf("%s: %s %s, %s at %s", p.ID, size, p.Material, length, slope),
			fmt.Sprintf("%s: %s at %s", p.ID, size, slope),
			fmt.Sprintf("%s: %s", p.ID, size), p.ID,
		} {
			groups = append(groups, d.along(text))
		}
		if s, ok := g.place.choose(groups...); ok {
			g.Text(s.labels[0])
		}
	}
}

// along lists places for a text along the pipe: under it, then over it, in the middle, then towards the ends. A text
// longer than the pipe has none.
func (d *drawn) along(text string) []spot {
	length := math.Hypot(d.right.X-d.left.X, d.right.Y-d.left.Y)
	width := TextWidth(text, typeSize, false)
	spare := length - width - 5
	if spare < 0 {
		return nil
	}
	var spots []spot
	for _, height := range [...]float64{-d.wall - above*typeSize - 0.9, d.rise + d.wall + below*typeSize + 0.8, -d.wall - above*typeSize - 4.5} {
		for _, part := range [...]float64{0.5, 0.25, 0.75} {
			a, b := d.edge(height)
			t := (3 + width/2 + spare*part) / length
			at := Point{a.X + t*(b.X-a.X), a.Y + t*(b.Y-a.Y)}
			turn := math.Atan2(b.Y-a.Y, b.X-a.X) * 180 / math.Pi
			spots = append(spots, spot{labels: []Label{{At: at, Text: text, Size: typeSize, Anchor: Middle, Turn: turn}}})
		}
	}
	return spots
}
