package drawing

import (
	"fmt"
	"strings"

	"rimfall/network"
	"rimfall/network/report"
)

// row is a line of the table under a profile: a value at each structure, or one for each pipe between two of them.
type row struct {
	head  string
	cells []string
	bold  bool
}

// table is what a profile sheet shows in numbers, for a whole line.
type table struct {
	structures, pipes []row
}

// newTable fills the table of a line.
func newTable(r *run, l *line) table {
	t := table{structures: structureRows(r, l), pipes: pipeRows(r, l)}
	for i := range r.storms {
		s := &r.storms[i]
		t.structures = append(t.structures, gradeRow(r, l, s))
		t.pipes = append(t.pipes, flowRows(r, l, s, i == 0)...)
	}
	return t
}

// structureRows are the levels at the structures that no storm changes.
func structureRows(r *run, l *line) []row {
	style, u := r.style, r.units
	level := func(m network.Maybe) string { return style.Show(report.Level, report.M(m)) }
	rows := []row{
		{head: "structure", bold: true},
		{head: "kind"},
		{head: "station"},
		{head: "rim, " + u.Length},
		{head: "invert in, " + u.Length},
		{head: "invert out, " + u.Length},
		{head: "rim to lowest invert, " + u.Length},
	}
	decimals := 2
	for k, s := range l.structures {
		given := report.Structure(r.Result, &r.Design, s)
		cells := []string{
			given.Structure.ID, strings.ReplaceAll(given.Structure.Kind.String(), "-", " "), stationText(l.stations[k], u, decimals), level(given.Structure.Rim),
			level(l.invertIn(r.Network, k)), level(l.invertOut(r.Network, k)), level(given.Height()),
		}
		for i, c := range cells {
			rows[i].cells = append(rows[i].cells, c)
		}
	}
	return rows
}

// invertIn is the lower invert of the line's own pipe into structure k, at its head of the lowest pipe in.
func (l *line) invertIn(n *network.Network, k int) network.Maybe {
	if k < len(l.pipes) {
		return n.Pipes[l.pipes[k]].InvertLower
	}
	_, v, ok := n.LowestIn(l.structures[k])
	return network.Maybe{V: v, OK: ok}
}

// invertOut is the upper invert of the line's own pipe out of structure k, at its lower end that of the next pipe.
func (l *line) invertOut(n *network.Network, k int) network.Maybe {
	if k > 0 {
		return n.Pipes[l.pipes[k-1]].InvertUpper
	}
	for _, p := range n.PipesOut(l.structures[k]) {
		return n.Pipes[p].InvertUpper
	}
	return network.Maybe{}
}

// pipeRows are what no storm changes along the pipes.
func pipeRows(r *run, l *line) []row {
	style, u := r.style, r.units
	rows := []row{
		{head: "pipe", bold: true},
		{head: "length, " + u.Length},
		{head: "size, " + u.Size},
		{head: "slope, %"},
		{head: "material"},
	}
	for _, p := range l.pipes {
		pipe := &r.Network.Pipes[p]
		cells := []string{
			pipe.ID, style.Show(report.Length, report.N(pipe.Length)), sizeText(pipe, ""),
			style.Show(report.Percent, report.M(pipe.Slope)), pipe.Material,
		}
		for i, c := range cells {
			rows[i].cells = append(rows[i].cells, c)
		}
	}
	return rows
}

// sizeText is the size of a pipe with its unit, shape and barrels: "24 in", "2 × 60x38 in box". Under a heading that has
// the unit, the unit is left out.
func sizeText(p *network.Pipe, unit string) string {
	text := report.SizeText(p)
	if unit != "" {
		text += " " + unit
	}
	if p.Shape != "circle" {
		text += " " + p.Shape
	}
	if p.Count > 1 {
		text = fmt.Sprintf("%d × %s", p.Count, text)
	}
	return text
}

// gradeRow is the hydraulic grade line at the structures for one storm.
func gradeRow(r *run, l *line, s *storm) row {
	level := row{head: "grade line, " + s.years() + ", " + r.units.Length}
	for _, k := range l.structures {
		level.cells = append(level.cells, r.style.Show(report.Level, report.M(s.level(k))))
	}
	return level
}

// flowRows are flow and velocity for one storm, and capacity with the first.
func flowRows(r *run, l *line, s *storm, first bool) []row {
	style := r.style
	rows := []row{
		{head: fmt.Sprintf("flow, %s, %s", s.years(), style.Unit(report.Flow))},
		{head: fmt.Sprintf("velocity, %s, %s", s.years(), style.Unit(report.Velocity))},
	}
	capacity := row{head: "full-bore capacity, " + style.Unit(report.Flow)}
	for _, p := range l.pipes {
		flow := &s.Flows.Pipes[p]
		rows[0].cells = append(rows[0].cells, style.Show(report.Flow, report.N(flow.Flow)))
		rows[1].cells = append(rows[1].cells, style.Show(report.Velocity, report.Value{Number: flow.Velocity, OK: flow.Flow > 0}))
		capacity.cells = append(capacity.cells, style.Show(report.Flow, report.Value{Number: flow.Capacity, OK: flow.HasCapacity}))
	}
	if first {
		rows = append(rows, capacity)
	}
	return rows
}

// widest is the width of the widest text of rows in column i.
func widest(rows []row, i int) float64 {
	w := 0.0
	for _, r := range rows {
		w = max(w, TextWidth(r.cells[i], typeSize, r.bold))
	}
	return min(w, widestCell)
}

// widestCell is where longer texts are cut, mm.
const widestCell = 34

// gaps are the least distances between the columns of neighbouring structures: their own values and those of the pipe
// between them must fit.
func (t *table) gaps() []float64 {
	const room = 2.4
	gaps := make([]float64, len(t.pipes[0].cells))
	for i := range gaps {
		between := (widest(t.structures, i)+widest(t.structures, i+1))/2 + room
		gaps[i] = max(between, widest(t.pipes, i)+room)
	}
	return gaps
}

// rows counts the lines of the table.
func (t *table) rows() int { return len(t.structures) + len(t.pipes) }
