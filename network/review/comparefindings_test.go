package review_test

import (
	"slices"
	"strings"
	"testing"

	"rimfall/network/analysis"
)

// The flow of the area is 4 in/h · C·A; it enters both pipes, whose capacity is 4.57 cfs.
func TestFindingsGrowWorseByWhatTheyMiss(t *testing.T) {
	over := func(acres string) *analysis.Result { return asRun(t, twoPipes, "F1,A,2,", "F1,A,"+acres+",") }
	accepted := "\n-- departures.csv --\nrule,subject,reason\n*,P1,agreed\n"
	for _, c := range []struct {
		name          string
		before, after *analysis.Result
		want          string
		worse         bool
	}{
		{"more over capacity is worse", over("2.5"), over("3"), "worse capacity P1", true},
		{"less over capacity is not, nor is it cured", over("3"), over("2.5"), "", false},
		{"under capacity is cured", over("2.5"), over("2"), "cured capacity P1", false},
		{
			"a larger share of a larger capacity is worse", over("2.5"), // 1.09 of 4.57 cfs; then 1.15 of 9.14
			asRun(t, twoPipes, "F1,A,2,", "F1,A,5.25,", "P1,A,B,200,15,101,100", "P1,A,B,200,15,104,100"), "worse capacity P1", true,
		},
		{
			"a new one that is accepted is told and does not count", over("2"),
			asRun(t, twoPipes+strings.ReplaceAll(accepted, "*,P1", "capacity,*")+"surcharge,*,agreed\n", "F1,A,2,", "F1,A,2.5,"), "new capacity P1", false,
		},
		{
			"one that was accepted and is no more is worse",
			asRun(t, twoPipes+strings.ReplaceAll(accepted, "*,P1", "capacity,*"), "F1,A,2,", "F1,A,2.5,"), over("2.5"), "worse capacity P1", true,
		},
	} {
		t.Run(c.name, func(t *testing.T) {
			got := asCompared(t, c.before, c.after)
			lines := told(got)
			if c.want != "" && !slices.Contains(lines, c.want) {
				t.Errorf("no %q in %q", c.want, lines)
			}
			if c.want == "" && slices.ContainsFunc(lines, func(l string) bool { return strings.Contains(l, "capacity") }) {
				t.Errorf("capacity is told of: %q", lines)
			}
			if got.Worse() != c.worse {
				t.Errorf("became worse: %t, want %t; %q", got.Worse(), c.worse, lines)
			}
		})
	}
}

// Cover speaks of both ends of a pipe: one that is cured at one end and new at the other is not the same.
func TestFindingsOfTheEndsOfAPipeAreToldApart(t *testing.T) {
	shallow := func(a, b string) *analysis.Result {
		return asRun(t, twoPipes, "A,inlet,106", "A,inlet,"+a, "B,manhole,105", "B,manhole,"+b)
	}
	lines := told(asCompared(t, shallow("102.5", "105"), shallow("106", "101.6")))
	for _, w := range []string{"new cover P1", "cured cover P1"} {
		if !slices.Contains(lines, w) {
			t.Errorf("no %q in %q", w, lines)
		}
	}
}

func TestAFindingOfARemovedPipeIsCuredByItsRemoval(t *testing.T) {
	before := asRun(t, twoPipes, "F1,A,2,", "F1,A,2.5,")
	after := asRun(t, twoPipes, "F1,A,2,", "F1,A,2.5,", "P1,A", "P9,A")
	for _, f := range asCompared(t, before, after).Findings.Cured {
		if f.Before.Rule.Name == "capacity" && f.Before.Subject == "P1" && f.Removed {
			return
		}
	}
	t.Error("the capacity finding of P1 is not cured by removal")
}

// A rule that speaks several times of one subject is known by its words: the assumed upper invert of P2 is the same
// finding in both jobs, that of its n is new.
func TestAssumptionsOfOnePipeAreToldApart(t *testing.T) {
	old := []string{"id,from,to,length,size,invert_upper,invert_lower", "id,from,to,length,size,invert_upper,invert_lower,status,n", "P1,A,B,200,15,101,100", "P1,A,B,200,15,101,,existing,0.013"}
	before := asRun(t, twoPipes, append(old, "P2,B,OUT,200,15,99.9,98.9", "P2,B,OUT,200,15,,98.9,existing,0.013")...)
	after := asRun(t, twoPipes, append(old, "P2,B,OUT,200,15,99.9,98.9", "P2,B,OUT,200,15,,98.9,existing,")...)
	c := asCompared(t, before, after)
	if len(c.Findings.New) != 1 || c.Findings.New[0].After.Rule.Name != "assumed" || len(c.Findings.Cured) != 0 || c.Worse() {
		t.Errorf("told: %q", told(c))
	}
}
