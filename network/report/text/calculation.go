package text

import (
	"fmt"
	"io"
	"strings"
	"unicode/utf8"

	"rimfall/network/calculator"
	"rimfall/network/report"
	"rimfall/network/units"
)

// Answer prints one answer of the calculator: what is given, the working, the answer.
func Answer(w io.Writer, a *calculator.Answer, markdown bool) error {
	p := &printer{w: w, markdown: markdown}
	title := "Uniform flow: " + a.Named(a.Asked) + " asked"
	p.heading([]string{title})
	for _, part := range a.Working {
		if markdown {
			p.table(part.Title, workingGrid(part))
			continue
		}
		p.title(part.Title)
		for i := range part.Steps {
			p.workingLine(&part.Steps[i])
		}
	}
	p.title("Answer")
	for _, l := range a.Conclusion() {
		p.bullet(l)
	}
	p.notes(a.Notes)
	return p.err
}

// notes prints the notes and the caution that stands under every calculation.
func (p *printer) notes(notes []string) {
	p.title("Notes")
	for _, n := range append(append([]string(nil), notes...), report.Caution) {
		p.bullet(n)
	}
}

// bullet prints running text as an item.
func (p *printer) bullet(text string) {
	if p.markdown {
		p.line("- %s", text)
		return
	}
	p.wrapped("", text)
}

// workingWidth is how long a line of the working may grow before it is broken.
const workingWidth = 100

// workingLine prints name, symbol = formula = numbers = result; a long line is broken
// at an equals sign.
func (p *printer) workingLine(s *calculator.Step) {
	const nameWidth = 26
	line := "  " + s.Name + strings.Repeat(" ", max(1, nameWidth-utf8.RuneCountInString(s.Name)))
	indent := strings.Repeat(" ", utf8.RuneCountInString(line))
	first := true
	for _, piece := range pieces(s) {
		joined := line + piece
		if !first {
			joined = line + " = " + piece
		}
		if !first && utf8.RuneCountInString(joined) > workingWidth {
			p.line("%s", line)
			joined = indent + "= " + piece
		}
		line, first = joined, false
	}
	p.line("%s", strings.TrimRight(line, " "))
}

// pieces are the parts of a step between equals signs. Of a value that solves an
// equation the value stands first.
func pieces(s *calculator.Step) []string {
	if s.Solved {
		all := []string{s.Symbol, s.Result + ", where " + s.Formula}
		if s.Numbers != "" {
			all = append(all, s.Numbers)
		}
		return all
	}
	var all []string
	for _, piece := range []string{s.Symbol, s.Formula, s.Numbers, s.Result} {
		if piece != "" {
			all = append(all, piece)
		}
	}
	return all
}

func workingGrid(part calculator.Part) grid {
	g := grid{head: []string{"", "symbol", "formula", "numbers", "result"}, numbers: make([]bool, 5)}
	for _, s := range part.Steps {
		g.rows = append(g.rows, []string{s.Name, s.Symbol, s.Formula, s.Numbers, s.Result})
	}
	return g
}

// Answers prints the answers of a list as a table, a row each. What is the same in
// every row stands above it, why a row has no answer below.
func Answers(w io.Writer, listed string, rows []report.AnswerRow, u units.System, markdown bool) error {
	p := &printer{w: w, markdown: markdown}
	figures, same := partSame(report.AnswerColumns, u, rows)
	p.heading([]string{"Uniform flow, a list of " + listed, strings.Join(same, ", ")})
	g := figureGrid(u, figures, rows)
	g.head = append([]string{listed + "\ngiven"}, g.head...)
	g.numbers = append([]bool{true}, g.numbers...)
	notes := notesOf(rows)
	for i := range rows {
		g.rows[i] = append([]string{rows[i].Given}, g.rows[i]...)
		if rows[i].Why != "" {
			notes = append(notes, fmt.Sprintf("%s %s has no answer: %s.", listed, rows[i].Given, rows[i].Why))
		}
	}
	p.table("Answers", g)
	p.notes(notes)
	return p.err
}

// partSame takes out the columns that have one value in all rows, and words it.
func partSame(figures []report.Figure[report.AnswerRow], u units.System, rows []report.AnswerRow) (varied []report.Figure[report.AnswerRow], same []string) {
	for i := range figures {
		f := figures[i]
		cells, filled := figureCells(&f, u, rows)
		if f.Head == nil && f.Key != "shape" || !filled {
			continue
		}
		if value, one := oneValue(cells); one {
			same = append(same, strings.Join(f.Head, " ")+withBlank(value)+withBlank(f.Measure.Unit(u)))
			continue
		}
		varied = append(varied, f)
	}
	for i := range same {
		same[i] = strings.TrimSpace(same[i])
	}
	return varied, same
}

// oneValue is the value of cells that are all the same; blank ones, of rows without an
// answer, do not count.
func oneValue(cells []string) (value string, one bool) {
	for _, c := range cells {
		if value == "" {
			value = c
		}
		if c != "" && c != value {
			return "", false
		}
	}
	return value, value != ""
}

func withBlank(text string) string {
	if text == "" {
		return ""
	}
	return " " + text
}

// notesOf are the notes that hold for every row with an answer.
func notesOf(rows []report.AnswerRow) []string {
	count, answered := map[string]int{}, 0
	var first []string
	for i := range rows {
		if rows[i].Answer == nil {
			continue
		}
		if answered++; answered == 1 {
			first = rows[i].Notes
		}
		for _, n := range rows[i].Notes {
			count[n]++
		}
	}
	var notes []string
	for _, n := range first {
		if count[n] == answered {
			notes = append(notes, n)
		}
	}
	return notes
}

// Rating prints the table of a section.
func Rating(w io.Writer, r *calculator.Rating, markdown bool) error {
	p := &printer{w: w, markdown: markdown}
	p.table("Rating of "+ratingTitle(r), figureGrid(r.Question.Units, report.RatingColumns, r.Rows))
	p.notes(r.Notes)
	return p.err
}

func ratingTitle(r *calculator.Rating) string {
	q := &r.Question
	words := []string{q.Conduit.Shape}
	if label := q.Conduit.SizeLabel(); label != "" {
		words = append(words, label+" "+q.Units.Size)
	}
	for _, g := range []struct {
		name string
		v    float64
		ok   bool
	}{{"bottom", q.Conduit.Bottom.V, q.Conduit.Bottom.OK}, {"side", q.Conduit.Left.V, q.Conduit.Left.OK}, {"n", q.N.V, q.N.OK}, {"slope", q.Slope.V, q.Slope.OK}} {
		if g.ok {
			words = append(words, fmt.Sprintf("%s %g", g.name, g.v))
		}
	}
	return strings.Join(words, ", ")
}

// figureGrid shows rows in the columns of the calculator; a column that is blank in
// every row is left out.
func figureGrid[R any](u units.System, figures []report.Figure[R], rows []R) grid {
	var g grid
	g.rows = make([][]string, len(rows))
	for i := range figures {
		f := &figures[i]
		cells, filled := figureCells(f, u, rows)
		if f.Head == nil || !filled {
			continue
		}
		g.head = append(g.head, strings.Join(report.HeadOf(f, u), "\n"))
		g.numbers = append(g.numbers, f.Quantity != report.Text)
		for j := range rows {
			g.rows[j] = append(g.rows[j], cells[j])
		}
	}
	return g
}

func figureCells[R any](f *report.Figure[R], u units.System, rows []R) (cells []string, filled bool) {
	for i := range rows {
		v := f.Value(&rows[i])
		cell := v.Text
		if v.OK && v.Text == "" {
			cell = f.Measure.Column(u, v.Number)
		}
		filled = filled || cell != ""
		cells = append(cells, cell)
	}
	return cells, filled
}
