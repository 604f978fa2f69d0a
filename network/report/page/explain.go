package page

import (
	_ "embed"
	"fmt"
	"html"
	"html/template"
	"io"
	"strings"

	"rimfall/network/analysis"
	"rimfall/network/report"
	"rimfall/network/review"
	"rimfall/network/review/formula"
)

//go:embed explain.html
var explainHTML string

// sheets is what the page of an explanation is made of.
type sheets struct {
	Title   string
	Heading []string
	Pages   []sheet
	Assumed []string
	Notes   []string
}

type sheet struct {
	Title string
	Parts []part
}

type part struct {
	Title   string
	Rows    []row
	Remarks []string
}

// row is a line of the working: Maths is MathML, Words stand after it.
type row struct {
	Name   string
	Maths  template.HTML
	Words  string
	Source string
}

// Broken tells whether the words say that a limit is broken.
func (sheets) Broken(words string) bool { return words == brokenWords }

const (
	holdsWords  = "holds"
	brokenWords = "is broken"
)

// Explain writes the working of what has an id in a run as one web page.
func Explain(w io.Writer, r *analysis.Result, pages []review.Explanation) error {
	t, err := template.New("explain").Parse(explainHTML)
	if err != nil {
		return err
	}
	s := sheets{
		Heading: report.Heading(r),
		Notes:   append([]string{"Each line holds by itself: its numbers, worked out with the digits that are printed, give its result to the last digit."}, report.Cautions...),
	}
	for _, a := range report.Assumptions(r.Network) {
		s.Assumed = append(s.Assumed, fmt.Sprintf("Pipe %s, %s is not known: %.6g %s was taken, %s.", a.Pipe, a.What, a.Value, a.Unit, a.Because))
	}
	for i := range pages {
		s.Pages = append(s.Pages, sheetOf(&pages[i]))
	}
	if len(pages) > 0 {
		s.Title = pages[0].Title
	}
	return t.Execute(w, s)
}

func sheetOf(e *review.Explanation) sheet {
	s := sheet{Title: e.Title}
	for i := range e.Parts {
		p := part{Title: e.Parts[i].Title}
		for k := range e.Parts[i].Lines {
			l := &e.Parts[i].Lines[k]
			if l.Form == review.Remark {
				p.Remarks = append(p.Remarks, l.Name)
				continue
			}
			p.Rows = append(p.Rows, rowOf(l))
		}
		s.Parts = append(s.Parts, p)
	}
	return s
}

// rowOf makes a row of a line: symbol = formula = numbers = result.
func rowOf(l *review.Line) row {
	r := row{Name: l.Name, Source: l.Source}
	value := formula.NumberMathML(l.Result)
	pieces := []string{formula.SymbolMathML(l.Symbol)}
	switch l.Form {
	case review.Computed:
		pieces = append(pieces, l.Formula.MathML())
		if !l.Formula.IsSymbol() {
			pieces = append(pieces, l.Formula.NumbersMathML(func(symbol string) formula.Number { return l.Shown[symbol] }))
		}
		pieces = append(pieces, value)
	case review.Solved:
		r.Maths = maths(pieces[0], value) + " where " + maths(l.Formula.MathML(), right(l.Numbers))
		return r
	case review.Limit:
		r.Words = holdsWords
		if !l.Holds {
			r.Words = brokenWords
		}
		pieces = append(pieces, relation(l))
	default:
		pieces = append(pieces, value)
	}
	r.Maths = maths(pieces...)
	return r
}

// right is the right side of an equation that was solved: a symbol, or a number.
func right(text string) string {
	if strings.Trim(text, "0123456789.") == "" {
		return formula.NumberMathML(formula.Number{Text: text})
	}
	return formula.SymbolMathML(text)
}

// relation is a value and its limit, value ≥ limit.
func relation(l *review.Line) string {
	value, rest, _ := strings.Cut(l.Numbers, " ")
	sign, _, _ := strings.Cut(rest, " ")
	return "<mrow><mn>" + html.EscapeString(value) + "</mn><mo>" + html.EscapeString(sign) + "</mo>" + formula.NumberMathML(l.Result) + "</mrow>"
}

// maths joins pieces of MathML by equals signs. The pieces are made by package formula,
// which escapes what it is given.
func maths(pieces ...string) template.HTML {
	return template.HTML("<math>" + strings.Join(pieces, "<mo>=</mo>") + "</math>")
}
