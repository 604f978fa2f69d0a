package drawing

import (
	"fmt"
	"slices"
	"strings"
)

// drawLine draws a line on as many sheets as it needs. Title and notes come later, when all sheets are counted.
func drawLine(r *run, l *line, o ProfileOptions) ([]profileSheet, error) {
	a, err := newLayout(r, l, o)
	if err != nil {
		return nil, err
	}
	var sheets []profileSheet
	for i, p := range a.parts {
		s := newSheet(o.Paper, "Profile of "+l.title(r.Network))
		g := newGraph(s, r, l, p, &a)
		g.draw(i)
		sheets = append(sheets, profileSheet{g, i, len(a.parts)})
	}
	return sheets, nil
}

// profileSheet is sheet i of the sheets of a line.
type profileSheet struct {
	*graph
	i, of int
}

// draw draws from the back to the front: grid, ground, pipes, water, structures; then the labels find room.
func (g *graph) draw(i int) {
	g.grid()
	g.besides()
	g.fan()
	g.stationNumbers()
	g.matchLines(i)
	g.ground()
	g.pipes()
	g.gradeLines()
	g.structures()
	g.standing()
	g.crossings()
	g.pipeNames()
	g.crossingNames()
	g.jumps()
	g.receivingNames()
	g.openingNames()
	g.tableBelow()
}

// fan leads from the structures up to their names and down to their columns in the table.
func (g *graph) fan() {
	tableTop := g.tableTop()
	for i, column := range g.columns {
		k := g.part.first + i
		x := g.x(g.line.stations[k])
		id := g.r.Network.Structures[g.line.structures[k]].ID
		room := float64(widestCell)
		if i+1 < len(g.columns) {
			room = min(room, g.columns[i+1]-column)
		}
		if i > 0 {
			room = min(room, column-g.columns[i-1])
		}
		g.Text(Label{At: Point{column, g.box.Top - 5.5}, Size: typeSize, Anchor: Middle, Bold: true, Text: Shorten(id, typeSize, room-1, true)})
		g.Polyline([]Point{{column, g.box.Top - 4.6}, {x, g.box.Top}, {x, g.box.Bottom}, {x, tableTop - fanBand}, {column, tableTop}}, fall)
	}
}

// tableTop is the upper edge of the table.
func (g *graph) tableTop() float64 { return g.box.Bottom + stationBand + fanBand }

// tableBelow draws the table of levels: values at the structures in their columns, values of the pipes between them.
func (g *graph) tableBelow() {
	y := g.tableTop()
	left, right := g.body.Left, g.body.Right
	g.Line(Point{left, y}, Point{right, y}, medium)
	for _, r := range g.layout.table.structures {
		for i, x := range g.columns {
			g.cell(x, y, r.cells[g.part.first+i], r.bold)
		}
		y = g.rowDone(y, r.head)
	}
	g.Line(Point{left, y}, Point{right, y}, medium)
	between := y
	for _, r := range g.layout.table.pipes {
		for i := 1; i < len(g.columns); i++ {
			g.cell((g.columns[i-1]+g.columns[i])/2, y, r.cells[g.part.first+i-1], r.bold)
		}
		y = g.rowDone(y, r.head)
	}
	for _, x := range g.columns {
		g.Line(Point{x, between}, Point{x, y}, thin)
	}
	g.Line(Point{g.box.Left, g.tableTop()}, Point{g.box.Left, y}, medium)
}

// cell writes one value.
func (g *graph) cell(x, y float64, text string, bold bool) {
	g.Text(Label{At: Point{x, y + 2.85}, Size: typeSize, Anchor: Middle, Bold: bold, Text: Shorten(text, typeSize, widestCell, bold)})
}

// rowDone writes the heading of a row and the line under it.
func (g *graph) rowDone(y float64, head string) float64 {
	g.Text(fit(Label{At: Point{g.body.Left + 1.5, y + 2.8}, Size: smallType, Text: head}, headColumn-2.5, 1.8))
	y += rowHeight
	g.Line(Point{g.body.Left, y}, Point{g.body.Right, y}, fine)
	return y
}

var matchPen = Pen{Width: 0.6, Dashes: []float64{8, 1.5, 1.5, 1.5}}

// matchLines end a part where the line goes on on another sheet of it.
func (g *graph) matchLines(i int) {
	draw := func(k int, text string, beyond float64) {
		x := g.x(g.line.stations[k])
		g.Line(Point{x, g.box.Top}, Point{x, g.box.Bottom}, matchPen)
		middle := (g.box.Top + g.box.Bottom) / 2
		l := Label{At: Point{x + beyond, middle}, Size: typeSize, Anchor: Middle, Turn: -90, Text: text}
		g.place.write(&spot{labels: []Label{l}})
		g.Text(l)
	}
	station := func(k int) string { return stationText(g.line.stations[k], g.r.units, 2) }
	if g.part.first > 0 {
		draw(g.part.first, fmt.Sprintf("match line %s, part %d of line %s", station(g.part.first), i, g.line.name), -4.5)
	}
	if g.part.last < len(g.line.pipes) {
		draw(g.part.last, fmt.Sprintf("match line %s, part %d of line %s", station(g.part.last), i+2, g.line.name), 6)
	}
}

// finish writes legend, notes and title, which need the count of all sheets.
func (s *profileSheet) finish(i, of int) {
	s.legend(s.samples(), s.legendBox())
	a := s.layout
	title := "Profile of " + s.line.title(s.r.Network)
	if s.of > 1 {
		title += fmt.Sprintf(", part %d of %d", s.i+1, s.of)
	}
	station, level := s.gridSteps()
	notes := []string{
		s.findings(),
		"Inverts at the structures' centres; stations run upgrade from the lower end. Pipes and structures are to scale upright; the width of structures is a sign.",
	}
	if s.cut {
		notes = append(notes, "A grade line stands higher than this drawing and is cut off at its upper edge; its levels are in the table.")
	}
	s.titled(s.r, heading{
		title: title,
		lines: []string{
			fmt.Sprintf("Scale on %s: horizontal %s, vertical %s; vertical exaggeration %.4g : 1", s.paper.Title, a.along.say(s.r.units), a.up.say(s.r.units), a.exaggeration),
			fmt.Sprintf("Grid %g %s by %g %s; levels over the datum of the job", station, s.r.units.Length, level, s.r.units.Length),
		},
		notes: notes,
		count: fmt.Sprintf("sheet %d of %d", i+1, of),
	})
}

// findings names the errors and warnings about what stands on the sheet.
func (s *profileSheet) findings() string {
	structures, pipes := s.line.structures[s.part.first:s.part.last+1], s.line.pipes[s.part.first:s.part.last]
	var names []string
	for i := range s.r.marks {
		m := &s.r.marks[i]
		if m.isPipe && slices.Contains(pipes, m.pipe) || !m.isPipe && slices.Contains(structures, m.structure) {
			names = append(names, m.names(s.r))
		}
	}
	if len(names) == 0 {
		return "No errors and no warnings on this sheet."
	}
	return "Findings here: " + strings.Join(names, "; ") + "."
}

// file names the file of the sheet.
func (s *profileSheet) file() string {
	name := "profile-" + strings.ToLower(s.line.name)
	if s.of > 1 {
		name += fmt.Sprintf("-%d", s.i+1)
	}
	return name
}
