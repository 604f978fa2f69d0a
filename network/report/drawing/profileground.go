package drawing

import (
	"math"

	"rimfall/network"
)

// The ground: a full line with the earth under it where it was given, dashes where it is only drawn straight from one
// rim to the next.
var (
	givenGround    = Pen{Width: 0.35}
	straightGround = Pen{Width: 0.25, Dashes: []float64{3, 1.2}}
	earth          = Pen{Width: 0.13}
)

// groundLine is a stretch of ground on the sheet.
type groundLine struct {
	points []Point
	given  bool
}

// groundLines lists the ground of the part from its lower end up. A structure without a rim is passed over.
func (g *graph) groundLines() []groundLine {
	n := g.r.Network
	var all []groundLine
	var last []Point // the last place that is known
	add := func(p Point, given bool) {
		if k := len(all) - 1; len(last) > 0 && (k < 0 || all[k].given != given) {
			all = append(all, groundLine{last, given})
		}
		if len(last) > 0 {
			all[len(all)-1].points = append(all[len(all)-1].points, p)
		}
		last = []Point{p}
	}
	rim := func(k int, given bool) {
		if v := n.Structures[g.line.structures[k]].Rim; v.OK {
			add(g.at(g.line.stations[k], v.V), given)
		}
	}
	rim(g.part.first, false)
	for k := g.part.first; k < g.part.last; k++ {
		over := n.GroundOver(g.line.pipes[k])
		for i := len(over) - 1; i >= 0; i-- {
			add(g.at(g.line.stations[k+1]-over[i].Station, over[i].Elevation), true)
		}
		rim(k+1, len(over) > 0)
	}
	return all
}

// ground draws it and notes it as a thin line that labels avoid.
func (g *graph) ground() {
	for _, l := range g.groundLines() {
		pen := straightGround
		if l.given {
			pen = givenGround
			g.earth(l.points)
		}
		g.Polyline(l.points, pen)
		g.passes(l.points)
	}
}

// passes notes a line for the placing of labels.
func (g *graph) passes(points []Point) {
	for i := 1; i < len(points); i++ {
		g.place.passLine(points[i-1], points[i])
	}
}

// earth draws groups of three slanting strokes under a line, the old sign of natural ground.
func (g *graph) earth(points []Point) {
	const every, stroke, apart = 9.0, 1.7, 0.7
	next := every / 2
	for i := 1; i < len(points); i++ {
		a, b := points[i-1], points[i]
		length := math.Hypot(b.X-a.X, b.Y-a.Y)
		for ; next < length; next += every {
			for k := range 3 {
				t := min(1, (next+float64(k)*apart)/length)
				p := Point{a.X + t*(b.X-a.X), a.Y + t*(b.Y-a.Y)}
				g.Line(p, Point{p.X - stroke*0.7, p.Y + stroke*0.7}, earth)
			}
		}
		next -= length
	}
}

// crossingsOf calls do for every crossing service of the part with its station on the line.
func (g *graph) crossingsOf(do func(station float64, c *network.Crossing)) {
	for k := g.part.first; k < g.part.last; k++ {
		for _, c := range g.r.crossings[g.line.pipes[k]] {
			do(g.line.stations[k+1]-c.Station, c)
		}
	}
}
