package drawing

import (
	"fmt"

	"rimfall/network"
	"rimfall/network/report"
)

// Grade lines: the water heavy, the energy thin with points between its dashes; the check storm in shorter dashes.
var (
	hydraulic = [...]Pen{{Width: 0.5, Dashes: []float64{4.5, 1}}, {Width: 0.5, Dashes: []float64{1.6, 0.9}}}
	energy    = [...]Pen{{Width: 0.2, Dashes: []float64{6, 0.9, 0.5, 0.9}}, {Width: 0.2, Dashes: []float64{6, 0.9, 0.5, 0.9, 0.5, 0.9}}}
	jumpLine  = Pen{Width: 0.35}
	waterLine = Pen{Width: 0.2}
)

// penOf picks the pen of a storm.
func penOf(pens [2]Pen, s *storm) Pen {
	if s.check {
		return pens[1]
	}
	return pens[0]
}

// gradeLines draws the grade lines along the pipes. The energy line comes first, so that the water lies over it.
func (g *graph) gradeLines() {
	for i := range g.r.storms {
		s := &g.r.storms[i]
		for k := g.part.first; k < g.part.last; k++ {
			var water, head []Point
			for _, at := range s.trace(g.line.pipes[k]) {
				station := g.line.stations[k] + at.Distance
				water, head = append(water, g.at(station, at.HGL)), append(head, g.at(station, at.EGL))
			}
			g.waterLine(head, penOf(energy, s))
			g.waterLine(water, penOf(hydraulic, s))
		}
	}
}

// waterLine draws a grade line where it is not higher than the graph, and notes where it is.
func (g *graph) waterLine(points []Point, pen Pen) {
	for _, stretch := range cutAbove(points, g.box.Top) {
		g.Polyline(stretch, pen)
		g.passes(stretch)
	}
	for _, p := range points {
		g.cut = g.cut || p.Y < g.box.Top
	}
}

// cutAbove cuts a line off at the height y and gives the stretches under it.
func cutAbove(points []Point, y float64) [][]Point {
	var all [][]Point
	inside := false
	for i, p := range points {
		if i > 0 && (points[i-1].Y < y) != (p.Y < y) { // it passes y between the two
			a := points[i-1]
			at := Point{a.X + (p.X-a.X)*(y-a.Y)/(p.Y-a.Y), y}
			if inside {
				all[len(all)-1] = append(all[len(all)-1], at)
			} else {
				all, inside = append(all, []Point{at}), true
			}
		}
		if p.Y < y {
			inside = false
			continue
		}
		if !inside {
			all, inside = append(all, nil), true
		}
		all[len(all)-1] = append(all[len(all)-1], p)
	}
	return all
}

// standing draws the water in the structures, over their shafts, and the receiving water.
func (g *graph) standing() {
	for i := range g.r.storms {
		s := &g.r.storms[i]
		for k := g.part.first; k <= g.part.last; k++ {
			x, half := g.x(g.line.stations[k]), g.shaftWidth()/2
			given := &g.r.Network.Structures[g.line.structures[k]]
			v := s.level(g.line.structures[k])
			if given.Kind == network.Outfall {
				g.receiving(x, s, s.tailwater(given))
				continue
			}
			if !v.OK || g.above(v.V) {
				continue
			}
			y := g.y(v.V)
			solid := penOf(hydraulic, s)
			solid.Dashes = nil
			g.Line(Point{x - half, y}, Point{x + half, y}, solid)
			if !s.check {
				g.waterSign(Point{x, y})
			}
		}
	}
}

// waterSign is the triangle that stands on a water surface.
func (g *graph) waterSign(at Point) {
	const half, height = 0.9, 1.5
	g.Polygon([]Point{at, {at.X - half, at.Y - height}, {at.X + half, at.Y - height}}, waterLine, White)
}

// receiving draws the water into which an outfall runs.
func (g *graph) receiving(x float64, s *storm, level network.Maybe) {
	if !level.OK || g.above(level.V) {
		return
	}
	const length = 12
	y := g.y(level.V)
	g.Line(Point{x - length, y}, Point{x, y}, penOf(hydraulic, s))
	g.waterSign(Point{x - length + 1.5, y})
	g.place.take(Box{x - length, y - 1.5, x, y + 0.3})
}

// receivingNames writes the levels of the receiving water beside it.
func (g *graph) receivingNames() {
	if g.part.first > 0 {
		return
	}
	given := &g.r.Network.Structures[g.line.structures[0]]
	x := g.x(g.line.stations[0])
	for i := range g.r.storms {
		s := &g.r.storms[i]
		v := s.tailwater(given)
		if !v.OK || g.above(v.V) {
			continue
		}
		at := Point{x - 10, g.y(v.V)}
		name := fmt.Sprintf("tailwater, %s", s.years())
		level := g.r.style.Show(report.Level, report.M(v))
		g.call(at, 2, name, level, name)
	}
}

// jumps marks where the water jumps from fast to slow, and names it.
func (g *graph) jumps() {
	for i := range g.r.storms {
		s := &g.r.storms[i]
		for k := g.part.first; k < g.part.last; k++ {
			low, high, ok := g.jump(s, k)
			if !ok || high.Y < g.box.Top {
				continue
			}
			g.zigzag(low, high)
			middle := Point{low.X, (low.Y + high.Y) / 2}
			name := "jump, " + s.years()
			where := fmt.Sprintf("%s above %s", g.r.style.Show(report.Length, report.M(s.lines.Pipes[g.line.pipes[k]].Jump))+" "+g.r.units.Length,
				g.r.Network.Structures[g.line.structures[k]].ID)
			g.call(middle, 0.5, name, where, "jump")
		}
	}
}

// jump is the place of the jump in pipe k: the water on both sides of it.
func (g *graph) jump(s *storm, k int) (low, high Point, ok bool) {
	trace := s.trace(g.line.pipes[k])
	for i := 1; i < len(trace); i++ {
		a, b := trace[i-1], trace[i]
		if a.Distance == b.Distance && a.HGL > b.HGL && s.lines.Pipes[g.line.pipes[k]].Jump.OK {
			station := g.line.stations[k] + a.Distance
			return g.at(station, b.HGL), g.at(station, a.HGL), true
		}
	}
	return low, high, false
}

// zigzag draws the jump as broken water.
func (g *graph) zigzag(low, high Point) {
	points := []Point{low}
	const teeth = 5
	for i := 1; i < teeth; i++ {
		t := float64(i) / teeth
		side := 0.6
		if i%2 == 0 {
			side = -side
		}
		points = append(points, Point{low.X + side, low.Y + t*(high.Y-low.Y)})
	}
	g.Polyline(append(points, high), jumpLine)
}
