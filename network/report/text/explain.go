package text

import (
	"io"
	"strings"
	"unicode/utf8"

	"rimfall/network/analysis"
	"rimfall/network/report"
	"rimfall/network/review"
)

// Explain prints the working of what has an id in a run.
func Explain(w io.Writer, r *analysis.Result, pages []review.Explanation, markdown bool) error {
	p := &printer{w: w, markdown: markdown, style: StyleOf(r)}
	for i := range pages {
		e := &pages[i]
		p.heading(append([]string{e.Title}, report.Heading(r)...))
		for k := range e.Parts {
			p.explainPart(&e.Parts[k])
		}
	}
	p.assumptions("Assumptions of the job: what is not known", r.Network)
	p.title("Notes")
	p.bullet("Each line holds by itself: its numbers, worked out with the digits that are printed, give its result to the last digit.")
	for _, c := range report.Cautions {
		p.bullet(c)
	}
	return p.err
}

func (p *printer) explainPart(part *review.Part) {
	if !p.markdown {
		p.title(part.Title)
		for i := range part.Lines {
			p.explainLine(&part.Lines[i])
		}
		return
	}
	var remarks []string
	g := grid{head: []string{"", "symbol", "formula", "numbers", "result", "source"}, numbers: make([]bool, 6)}
	for i := range part.Lines {
		l := &part.Lines[i]
		if l.Form == review.Remark {
			remarks = append(remarks, l.Name)
			continue
		}
		g.rows = append(g.rows, explainCells(l))
	}
	if len(g.rows) > 0 {
		p.table(part.Title, g)
	} else {
		p.title(part.Title)
	}
	if len(g.rows) > 0 && len(remarks) > 0 {
		p.line("")
	}
	for _, text := range remarks {
		p.bullet(text)
	}
}

// explainCells are the cells of a line: name, symbol, formula, numbers, result, source.
func explainCells(l *review.Line) []string {
	value := withUnit(l.Result.Text, l.Result.Unit)
	switch l.Form {
	case review.Computed:
		return []string{l.Name, l.Symbol, l.Formula.Symbols(), l.Numbers, value, l.Source}
	case review.Solved:
		return []string{l.Name, l.Symbol, l.Formula.Symbols() + " = " + l.Numbers, "", value, l.Source}
	case review.Limit:
		return []string{l.Name, l.Symbol, "", l.Numbers + withBlank(l.Result.Unit), holdsWord(l), l.Source}
	}
	return []string{l.Name, l.Symbol, "", "", value, l.Source}
}

func withUnit(text, unit string) string { return text + withBlank(unit) }

func holdsWord(l *review.Line) string {
	if l.Holds {
		return "holds"
	}
	return "is broken"
}

// explainLine prints a line of the working, broken at an equals sign where it is long.
func (p *printer) explainLine(l *review.Line) {
	const nameWidth = 34
	if l.Form == review.Remark {
		p.wrapped("", l.Name)
		return
	}
	name := "  " + l.Name
	if utf8.RuneCountInString(l.Name) > nameWidth-2 {
		p.line("%s", name)
		name = ""
	}
	line := name + strings.Repeat(" ", nameWidth+2-utf8.RuneCountInString(name))
	indent := strings.Repeat(" ", nameWidth+2)
	all := explainPieces(l)
	for i, piece := range all {
		if i == len(all)-1 && l.Source != "" {
			piece += "  [" + l.Source + "]"
		}
		switch {
		case i == 0:
			line += piece
		case utf8.RuneCountInString(line+piece)+3 <= workingWidth+nameWidth-26:
			line += " = " + piece
		default:
			p.line("%s", line)
			line = indent + "= " + piece
		}
	}
	p.line("%s", line)
}

// explainPieces are the parts of a line between equals signs.
func explainPieces(l *review.Line) []string {
	value := withUnit(l.Result.Text, l.Result.Unit)
	switch l.Form {
	case review.Computed:
		if l.Formula.IsSymbol() {
			return []string{l.Symbol, l.Formula.Symbols(), value}
		}
		return []string{l.Symbol, l.Formula.Symbols(), l.Numbers, value}
	case review.Solved:
		return []string{l.Symbol, value + ", where " + l.Formula.Symbols(), l.Numbers}
	case review.Limit:
		return []string{l.Symbol, l.Numbers + withBlank(l.Result.Unit) + ": " + holdsWord(l)}
	}
	return []string{l.Symbol, value}
}
