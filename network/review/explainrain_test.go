package review_test

import (
	"fmt"
	"slices"
	"strings"
	"testing"

	"rimfall/network/review"
)

// hillside is twoPipes with an area without an inlet time, whose flow path has a leg of every kind.
const hillside = twoPipes + `
-- paths.csv --
area,order,kind,length,slope,surface,n,section,velocity,coefficient,c,curve_number
F1,1,sheet,100,0.02,,0.15,,,,,
F1,2,sheet-nrcs,40,0.02,,0.15,,,,,
F1,3,shallow,200,0.03,unpaved,,,,,,
F1,4,gutter,260,0.012,,0.016,cross 0.02 spread 5,,,,
F1,5,channel,150,0.008,,0.03,radius 0.7,,,,
F1,6,pipe,120,0.01,,0.013,12,,,,
F1,7,velocity,60,,,,,3,,,
`

func TestFlowPathsAreExplainedLegByLeg(t *testing.T) {
	r := asRun(t, hillside, "F1,A,2,0.5,10", "F1,A,2,0.5,", "return_period = 10\n", "return_period = 10\ntwo_year_day_depth = 3.1\n")
	lines := printedLines(t, r, "F1", review.OfArea)
	legs := 0
	for _, l := range lines {
		if l.part == "Flow path" && strings.HasPrefix(l.symbol, "Δt_") {
			legs++
		}
	}
	if legs != 7 {
		t.Errorf("%d legs are worked out, 7 are given", legs)
	}
	if n := recompute(t, r); n < 100 {
		t.Errorf("%d lines were worked out", n)
	}
	a := &r.Network.Areas[0]
	if !slices.ContainsFunc(lines, func(l printedLine) bool { return l.symbol == "t_1" && l.source == "flow path of area F1" }) {
		t.Errorf("the inlet time of %.4f min has no source", a.Time.V)
	}
}

// The methods for whole basins.
func TestTimesOfBasinsAreExplained(t *testing.T) {
	for kind, row := range map[string]string{
		"kirpich":          "900,0.04,,,,,,",
		"faa":              "300,0.02,,,,,,0.4,",
		"nrcs-lag":         "900,0.04,,,,,,,75",
		"kerby":            "300,0.01,,0.2,,,,,",
		"bransby-williams": "900,0.02,,,,,,,",
		"temez":            "900,0.02,,,,,,,",
	} {
		t.Run(kind, func(t *testing.T) {
			job := twoPipes + "\n-- paths.csv --\narea,order,kind,length,slope,surface,n,section,velocity,coefficient,c,curve_number\nF1,1," + kind + "," + row + "\n"
			if cells := strings.Count(row, ","); cells < 8 {
				job = strings.Replace(job, row, row+strings.Repeat(",", 8-cells), 1)
			}
			r := asRun(t, job, "F1,A,2,0.5,10", "F1,A,2,0.5,")
			recompute(t, r)
			lines := printedLines(t, r, "F1", review.OfArea)
			if !slices.ContainsFunc(lines, func(l printedLine) bool { return l.part == "Flow path" && l.symbol == "t_1" && l.numbers != "" }) {
				t.Errorf("no line of %s", kind)
			}
		})
	}
}

func TestRainfallIsExplainedInEveryForm(t *testing.T) {
	table := "duration,10\n5,4\n60,4\n"
	for _, c := range []struct {
		name    string
		replace []string
		want    string // formula of the intensity
	}{
		{"a column of a table", []string{table, "duration,10\n5,6\n60,2\n"}, "i_1 × (t/t_1)^m"},
		{"a period between two columns", []string{table, "duration,5,25\n5,6,8\n60,2,3\n"}, "i_1 × (t/t_1)^m"},
		{
			"the same with uplift, annual maxima",
			[]string{table, "duration,5,25\n5,6,8\n60,2,3\n", "return_period = 10\n", "return_period = 10\nuplift = 1.2\nseries = \"annual-maximum\"\n"},
			"i_1 × (t/t_1)^m",
		},
		{"an equation of one term", []string{"return_period = 10\n", "return_period = 10\n[storm.equation]\nform = \"sherman\"\nnumerator = 60\nshift = 10\nexponent = 0.85\n"}, "a_1/(t + d_1)^e_1"},
		{
			"an equation in another unit, in hours, with uplift",
			[]string{"return_period = 10\n", "return_period = 10\nuplift = 1.1\n[storm.equation]\nform = \"talbot\"\ntime_unit = \"h\"\nintensity_unit = \"mm/h\"\nnumerator = 47\nshift = 0.285\n"},
			"u × (a_1/(t/p + d_1)^e_1)",
		},
		{
			"a cubic in logarithms, shorter than its range",
			[]string{"return_period = 10\n", "return_period = 10\n[storm.equation]\nform = \"cubic-log\"\nintensity_unit = \"mm/h\"\nreturn_period = 10\ncubic = [5.0707, 0.6515, -0.2522, 0.0138]\nshortest = 30\nlongest = 1000\n"},
			"u × exp(c_0 + c_1 × x + c_2 × x^2 + c_3 × x^3)",
		},
	} {
		t.Run(c.name, func(t *testing.T) {
			r := asRun(t, twoPipes, c.replace...)
			if n := recompute(t, r); n < 60 {
				t.Errorf("%d lines were worked out", n)
			}
			var forms []string
			for _, l := range printedLines(t, r, "P1", review.OfPipe) {
				if l.symbol == "i" {
					forms = append(forms, l.formula)
				}
			}
			if fmt.Sprint(forms) != fmt.Sprint([]string{c.want}) {
				t.Errorf("intensity by %q, want %q", forms, c.want)
			}
		})
	}
}
