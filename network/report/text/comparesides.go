package text

import (
	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/report"
	"rimfall/network/review"
)

// side is a row in both jobs; one of them may be missing.
type side[R any] struct{ before, after *R }

// sideBySide makes two columns of one.
func sideBySide[R any](c report.Column[R]) []report.Column[side[R]] {
	pick := func(word string, of func(*side[R]) *R) report.Column[side[R]] {
		return report.Column[side[R]]{Key: c.Key, Head: append(append([]string(nil), c.Head...), word), Quantity: c.Quantity, Value: func(s *side[R]) report.Value {
			if row := of(s); row != nil {
				return c.Value(row)
			}
			return report.Value{}
		}}
	}
	return []report.Column[side[R]]{
		pick("before", func(s *side[R]) *R { return s.before }),
		pick("after", func(s *side[R]) *R { return s.after }),
	}
}

// showSides prints the rows in which a shown digit changed, with an id before them.
func showSides[R any](p *printer, title string, columns []report.Column[R], ids []string, rows []side[R]) {
	all := []report.Column[side[R]]{}
	for _, c := range columns {
		all = append(all, sideBySide(c)...)
	}
	var kept []side[R]
	var keptIDs []string
	for i := range rows {
		for k := 0; k < len(all); k += 2 {
			if p.style.Show(all[k].Quantity, all[k].Value(&rows[i])) != p.style.Show(all[k].Quantity, all[k+1].Value(&rows[i])) {
				kept, keptIDs = append(kept, rows[i]), append(keptIDs, ids[i])
				break
			}
		}
	}
	if len(kept) == 0 {
		p.title(title)
		p.bullet("no shown digit changed")
		return
	}
	g := makeGrid(p.style, all, kept)
	g.head, g.numbers = append([]string{"id"}, g.head...), append([]bool{false}, g.numbers...)
	for i := range g.rows {
		g.rows[i] = append([]string{keptIDs[i]}, g.rows[i]...)
	}
	p.table(title, g)
}

// The columns that are set side by side for people; data files have them all.
var (
	sidePipes      = []string{"flow", "capacity_ratio", "depth", "hgl_upper", "hgl_lower"}
	sideStructures = []string{"flow", "hgl", "freeboard"}
)

func (p *printer) pipesSideBySide(c *review.Comparison) {
	row := func(r *analysis.Result, i int) *report.PipeRow {
		row := report.Pipe(r, &r.Design, network.PipeIndex(i))
		return &row
	}
	ids, rows := sidesOf(c, review.OfPipe, row)
	showSides(p, "Pipes: what the design storm does", report.Pick(report.PipeColumns, sidePipes), ids, rows)
}

func (p *printer) structuresSideBySide(c *review.Comparison) {
	row := func(r *analysis.Result, i int) *report.StructureRow {
		row := report.Structure(r, &r.Design, network.StructureIndex(i))
		return &row
	}
	ids, rows := sidesOf(c, review.OfStructure, row)
	showSides(p, "Structures: what the design storm does", report.Pick(report.StructureColumns, sideStructures), ids, rows)
}

// sidesOf are the rows of the elements that changed, then of those added and removed.
func sidesOf[R any](c *review.Comparison, k review.Kind, row func(r *analysis.Result, i int) *R) (ids []string, rows []side[R]) {
	add := func(e review.Element) {
		if e.Kind != k {
			return
		}
		var s side[R]
		if e.Before >= 0 {
			s.before = row(c.Before, e.Before)
		}
		if e.After >= 0 {
			s.after = row(c.After, e.After)
		}
		ids, rows = append(ids, e.ID), append(rows, s)
	}
	for i := range c.Changed {
		if len(c.Changed[i].Results) > 0 {
			add(c.Changed[i].Element)
		}
	}
	for _, e := range c.Added {
		add(e)
	}
	for _, e := range c.Removed {
		add(e)
	}
	return ids, rows
}
