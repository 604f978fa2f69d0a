package text

import (
	"fmt"
	"io"

	"rimfall/network"
	"rimfall/network/report"
	"rimfall/network/review"
)

// Compare prints what changed from one job to another.
func Compare(w io.Writer, c *review.Comparison, markdown bool) error {
	p := &printer{w: w, markdown: markdown, style: StyleOf(c.After)}
	p.heading(compareHeading(c))
	p.elements(c, "Added", c.Added)
	p.elements(c, "Removed", c.Removed)
	if len(c.Settings) > 0 {
		p.table("Settings that changed", p.changeGrid([]string{"setting"}, settingRows(c.Settings)))
	}
	if rows := givenRows(c); len(rows) > 0 {
		p.table("Given data that changed", p.changeGrid([]string{"", "id", "what"}, rows))
	}
	p.pipesSideBySide(c)
	p.structuresSideBySide(c)
	p.findingChanges(&c.Findings)
	p.title("Conclusion")
	p.bullet(conclusion(c))
	p.assumptions("Assumptions before: what is not known", c.Before.Network)
	p.assumptions("Assumptions after: what is not known", c.After.Network)
	p.cautions()
	return p.err
}

func compareHeading(c *review.Comparison) []string {
	b, a := report.Heading(c.Before), report.Heading(c.After)
	return []string{
		"Comparison of two jobs",
		"Before: " + b[0] + " (" + c.Before.Job.Dir + ")", "  " + b[1],
		"After: " + a[0] + " (" + c.After.Job.Dir + ")", "  " + a[1],
	}
}

// conclusion counts what became worse.
func conclusion(c *review.Comparison) string {
	f := &c.Findings
	counts := fmt.Sprintf("%d new, %d worse, %d cured findings", len(f.New), len(f.Worse), len(f.Cured))
	switch {
	case c.Worse():
		return counts + ". Something became worse: an error or a warning that no departure accepts is new, or misses its limit by more than before."
	case len(f.New)+len(f.Worse) > 0:
		return counts + ". Nothing became worse but notices and accepted departures."
	}
	return counts + ". Nothing became worse."
}

// elements lists what was added or removed, an element a line.
func (p *printer) elements(c *review.Comparison, title string, all []review.Element) {
	p.title(title)
	if len(all) == 0 {
		p.bullet("nothing")
	}
	for _, e := range all {
		p.bullet(e.Kind.String() + " " + e.ID + ": " + p.described(c, e))
	}
}

// described is an element in short: of the job after, or of the one before where it was removed.
func (p *printer) described(c *review.Comparison, e review.Element) string {
	r, i := c.After, e.After
	if i < 0 {
		r, i = c.Before, e.Before
	}
	n := r.Network
	switch e.Kind {
	case review.OfPipe:
		pipe := &n.Pipes[i]
		return fmt.Sprintf("%s of %s %s, %s %s, from %s to %s", pipe.Shape, report.SizeText(pipe), p.style.Units.Size,
			p.style.Show(report.Length, report.N(pipe.Length)), p.style.Units.Length, n.Structures[pipe.From].ID, n.Structures[pipe.To].ID)
	case review.OfStructure:
		s := &n.Structures[i]
		return s.Kind.String() + p.withRim(s)
	}
	a := &n.Areas[i]
	return fmt.Sprintf("%s %s, C %g, drains to %s", p.style.Show(report.Area, report.N(a.Area)), p.style.Units.Area, a.C, n.Structures[a.Structure].ID)
}

func (p *printer) withRim(s *network.Structure) string {
	if !s.Rim.OK {
		return ""
	}
	return ", rim " + p.style.Show(report.Level, report.M(s.Rim))
}

// changeRow is a change with the words that stand before it.
type changeRow struct {
	words  []string
	change review.Change
}

func settingRows(changes []review.Change) []changeRow {
	rows := make([]changeRow, len(changes))
	for i, c := range changes {
		rows[i] = changeRow{[]string{c.Name}, c}
	}
	return rows
}

func givenRows(c *review.Comparison) []changeRow {
	var rows []changeRow
	for _, e := range c.Changed {
		for _, g := range e.Given {
			rows = append(rows, changeRow{[]string{e.Kind.String(), e.ID, g.Name}, g})
		}
	}
	return rows
}

// changeGrid shows changes with their units, before and after.
func (p *printer) changeGrid(head []string, rows []changeRow) grid {
	g := grid{head: append(append([]string(nil), head...), "before", "after", "unit"), numbers: make([]bool, len(head)+3)}
	g.numbers[len(head)], g.numbers[len(head)+1] = true, true
	for _, r := range rows {
		b, a := p.style.ShowBoth(r.change.Quantity, r.change.Before, r.change.After)
		g.rows = append(g.rows, append(append([]string(nil), r.words...), b, a, p.style.Unit(r.change.Quantity)))
	}
	return g
}
