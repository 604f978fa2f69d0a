package drawing

import (
	"math"
	"strconv"
)

// graph is the drawing of one part of a line on its sheet.
type graph struct {
	*sheet
	r       *run
	line    *line
	part    part
	layout  *layout
	box     Box       // frame of the graph
	left    float64   // where the first structure stands
	low     float64   // level of the lower edge
	columns []float64 // of the table, one for each structure of the part
	place   *placer
	cut     bool // a grade line is higher than the graph
}

// newGraph lays a part of a line on a sheet: in the middle of the width, and with more of the spare height under the
// levels than over them, where the pipes are named.
func newGraph(s *sheet, r *run, l *line, p part, a *layout) *graph {
	g := &graph{sheet: s, r: r, line: l, part: p, layout: a}
	top := s.body.Top + nameBand
	g.box = Box{s.body.Left + headColumn, top, s.body.Right - levelColumn, top + graphHeight(s.paper, &a.table)}
	length := (l.stations[p.last] - l.stations[p.first]) * a.along.mm
	g.left = (g.box.Left + g.box.Right - length) / 2
	low, high, ok := levels(r, l, p)
	if !ok { // nothing is known on this sheet; the line as a whole has levels
		low, high, _ = levels(r, l, part{0, len(l.pipes)})
	}
	spare := g.box.height()/a.up.mm - (high - low)
	g.low = low - 0.6*spare
	places := make([]float64, p.last-p.first+1)
	for i := range places {
		places[i] = g.x(l.stations[p.first+i])
	}
	g.columns = spread(places, a.gaps[p.first:p.last], g.box.Left+sideRoom, g.box.Right-sideRoom)
	g.place = newPlacer(g.box.grown(-0.5))
	return g
}

// x is where a station of the line stands on the sheet.
func (g *graph) x(station float64) float64 {
	return g.left + (station-g.line.stations[g.part.first])*g.layout.along.mm
}

// y is where a level stands on the sheet.
func (g *graph) y(level float64) float64 { return g.box.Bottom - (level-g.low)*g.layout.up.mm }

// above tells whether a level has no room in the graph.
func (g *graph) above(level float64) bool { return g.y(level) < g.box.Top+2 }

// at is the place of a level at a station.
func (g *graph) at(station, level float64) Point { return Point{g.x(station), g.y(level)} }

// gridSteps are the steps of stations and levels: round numbers, not closer than they can be read.
func (g *graph) gridSteps() (station, level float64) {
	const leastAcross, leastUp = 18, 7.5
	return roundStep(leastAcross / g.layout.along.mm), roundStep(leastUp / g.layout.up.mm)
}

// grid draws levels and stations as fine lines with their numbers, and the frame.
func (g *graph) grid() {
	stationStep, levelStep := g.gridSteps()
	decimals := max(0, -int(math.Floor(math.Log10(levelStep)+1e-9)))
	highest := g.low + g.box.height()/g.layout.up.mm
	for i := math.Ceil(g.low / levelStep); i*levelStep <= highest; i++ {
		y := g.y(i * levelStep)
		g.Line(Point{g.box.Left, y}, Point{g.box.Right, y}, fine)
		if y < g.box.Top+1 || y > g.box.Bottom-1 {
			continue
		}
		text := strconv.FormatFloat(i*levelStep+0, 'f', decimals, 64)
		g.Text(Label{At: Point{g.box.Left - 1.2, y + 0.9}, Size: smallType, Anchor: End, Text: text})
		g.words(g.box.Right+1.2, y+0.9, smallType, text)
	}
	first := g.line.stations[g.part.first] - (g.left-g.box.Left)/g.layout.along.mm
	last := first + g.box.width()/g.layout.along.mm
	for i := math.Ceil(first / stationStep); i*stationStep <= last; i++ {
		x := g.x(i * stationStep)
		g.Line(Point{x, g.box.Top}, Point{x, g.box.Bottom}, fine)
	}
	g.Rect(g.box, medium, Empty)
}

// stationNumbers writes the stations of the grid under the graph; none before the beginning of the line.
func (g *graph) stationNumbers() {
	step, _ := g.gridSteps()
	decimals := max(0, -int(math.Floor(math.Log10(step)+1e-9)))
	y := g.box.Bottom + stationBand - 1.2
	last := g.line.stations[g.part.last] + (g.box.Right-g.x(g.line.stations[g.part.last]))/g.layout.along.mm
	first := g.line.stations[g.part.first] - (g.left-g.box.Left)/g.layout.along.mm
	for i := max(0, math.Ceil(first/step)); i*step <= last; i++ {
		l := Label{At: Point{g.x(i * step), y}, Size: smallType, Anchor: Middle, Text: stationText(i*step, g.r.units, decimals)}
		if b := l.Box(); b.Left > g.box.Left-2 && b.Right < g.box.Right+2 {
			g.Rect(b.grown(0.3), noEdge, White)
			g.Text(l)
		}
	}
}

// besides writes what the numbers beside the graph are, and which way the water runs.
func (g *graph) besides() {
	x := g.body.Left + 2
	g.words(x, g.box.Top+5, typeSize, "levels in "+g.r.units.Length)
	g.words(x+10, g.box.Top+10, typeSize, "flow")
	g.arrow(Point{x + 9, g.box.Top + 9.1}, Point{x, g.box.Top + 9.1}, 2.2)
	g.words(x, g.box.Bottom+stationBand-1.2, smallType, "stations from the lower end")
}

// arrow draws a line with a filled head.
func (s *sheet) arrow(from, to Point, head float64) {
	length := math.Hypot(to.X-from.X, to.Y-from.Y)
	ux, uy := (to.X-from.X)/length, (to.Y-from.Y)/length
	base := Point{to.X - head*ux, to.Y - head*uy}
	s.Line(from, base, medium)
	const slim = 0.28 // half the width of the head in parts of its length
	s.Polygon([]Point{to, {base.X - slim*head*uy, base.Y + slim*head*ux}, {base.X + slim*head*uy, base.Y - slim*head*ux}}, noEdge, Black)
}
