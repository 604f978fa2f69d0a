package text

import (
	"strings"
	"testing"
	"unicode/utf8"

	"rimfall/network/report"
	"rimfall/network/units"
)

// row is a row of the tables of this file.
type row struct {
	name  string
	level report.Value
	flow  float64
}

var columns = []report.Column[row]{
	{Key: "name", Head: []string{"name"}, Quantity: report.Text, Value: func(r *row) report.Value { return report.T(r.name) }},
	{Key: "level", Head: []string{"level,", "d/D"}, Quantity: report.Level, Value: func(r *row) report.Value { return r.level }},
	{Key: "inflow", Head: []string{"inflow"}, Quantity: report.Flow, Value: func(r *row) report.Value { return report.N(r.flow) }},
	{Key: "hidden", Value: func(r *row) report.Value { return report.N(7) }},
}

var us = report.Style{Units: units.US, FlowUnit: "cfs"}

func drawn(t *testing.T, draw func(w *strings.Builder) error) string {
	t.Helper()
	var b strings.Builder
	if err := draw(&b); err != nil {
		t.Fatal(err)
	}
	return b.String()
}

func TestABarAndALineBreakInsideACellOfMarkdownAreEscaped(t *testing.T) {
	g := makeGrid(us, columns, []row{{"A|B\nC", report.N(1), 2}})
	got := drawn(t, func(w *strings.Builder) error { return g.drawMarkdown(w) })
	lines := strings.Split(strings.TrimSpace(got), "\n")
	if len(lines) != 3 {
		t.Fatalf("%d lines:\n%s", len(lines), got)
	}
	for _, l := range lines {
		if bars := strings.Count(l, "|") - strings.Count(l, `\|`); bars != 4 {
			t.Errorf("%d bars between cells in %q", bars, l)
		}
	}
	if !strings.Contains(lines[2], `A\|B C`) {
		t.Errorf("row %q", lines[2])
	}
	if !strings.Contains(lines[0], "level, d/D ft") { // as written, with its unit
		t.Errorf("headings %q", lines[0])
	}
}

func TestNumbersAreRightAlignedAndTextsLeft(t *testing.T) {
	g := makeGrid(us, columns, []row{{"long name", report.N(1.5), 2}, {"x", report.N(100), 10.25}})
	got := drawn(t, func(w *strings.Builder) error { return g.drawText(w) })
	want := []string{"long name    1.50    2.00", "x          100.00   10.25"}
	for _, w := range want {
		if !strings.Contains(got, w) {
			t.Errorf("no line %q in\n%s", w, got)
		}
	}
	if strings.Contains(got, "hidden") || strings.Contains(got, "7") {
		t.Errorf("a column without a heading is drawn:\n%s", got)
	}
}

func TestAColumnThatTellsNothingIsLeftOut(t *testing.T) {
	for _, c := range []struct {
		name  string
		rows  []row
		level bool
		flow  bool
	}{
		{"no row has a level, and every inflow is 0", []row{{"a", report.Value{}, 0}, {"b", report.Value{}, 0}}, false, false},
		{"one row has a level of 0", []row{{"a", report.N(0), 0}, {"b", report.Value{}, 1}}, true, true},
		{"an empty table keeps its headings", nil, true, true},
	} {
		t.Run(c.name, func(t *testing.T) {
			g := makeGrid(us, columns, c.rows)
			head := strings.Join(g.head, " ")
			if strings.Contains(head, "level") != c.level || strings.Contains(head, "inflow") != c.flow {
				t.Errorf("headings %q", head)
			}
		})
	}
}

func TestTextsWrapAtBlanks(t *testing.T) {
	const text = "wheels break shallow pipes and a-word-that-is-longer-than-the-line stands alone"
	lines := wrap(text, 20)
	if strings.Join(lines, " ") != text {
		t.Errorf("words are lost: %q", lines)
	}
	for _, l := range lines {
		if utf8.RuneCountInString(l) > 20 && strings.Contains(l, " ") {
			t.Errorf("line %q is too long", l)
		}
	}
}
