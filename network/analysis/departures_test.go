package analysis_test

import (
	"slices"
	"testing"

	"rimfall/network/analysis"
	"rimfall/network/finding"
)

// elsewhere are the rules whose cases are tests of their own, below and in graderules_test.go.
var elsewhere = []string{"jump", "departure-unused"}

func TestEveryRuleOfTheCatalogueHasACase(t *testing.T) {
	tested := slices.Clone(elsewhere)
	for _, cases := range [][]ruleCase{flowRules, levelRules, noticeRules, gradeRules, rainRules} {
		for _, c := range cases {
			tested = append(tested, c.rule)
		}
	}
	for _, name := range finding.Names() {
		if !slices.Contains(tested, name) {
			t.Errorf("rule %s has no case", name)
		}
	}
	for _, name := range tested {
		if !slices.Contains(finding.Names(), name) {
			t.Errorf("a case of rule %s, which is not in the catalogue", name)
		}
	}
}

// shallow is a job with the finding cover on P1 and on nothing else, and departures.
func shallow(t *testing.T, departures string) *analysis.Result {
	t.Helper()
	text := changed(t, edits{"A,manhole,0,0,100", "A,manhole,0,0,97", "-- areas", "-- departures.csv --\nrule,subject,reason\n" + departures + "-- areas"})
	return run(t, folder(t, text), analysis.Options{})
}

func TestADepartureIsAcceptedWithItsReason(t *testing.T) {
	for _, c := range []struct {
		name, departures string
		accepted         string
		unused           []string // subjects
	}{
		{"for one subject", "cover,P1,shallow rock\n", "shallow rock", nil},
		{"for every subject", "cover,*,shallow rock\n", "shallow rock", nil},
		{"with the name of the rule in capitals", "Cover,P1,shallow rock\n", "shallow rock", nil},
		{"the first reason counts", "cover,P1,shallow rock\ncover,*,second\n", "shallow rock", nil},
		{"for another subject it is not accepted, and the departure is unused", "cover,P2,shallow rock\n", "", []string{"P2"}},
		{"for another rule it is not accepted, and the departure is unused", "slope,P1,shallow rock\n", "", []string{"P1"}},
		{"ids count in capitals and small letters", "cover,p1,shallow rock\n", "", []string{"p1"}},
	} {
		t.Run(c.name, func(t *testing.T) {
			r := shallow(t, c.departures)
			cover := ofRule(r, "cover")
			if len(cover) != 1 || cover[0].Accepted != c.accepted || cover[0].Breaks() == (c.accepted != "") {
				t.Errorf("findings %+v, want one accepted for %q", cover, c.accepted)
			}
			var unused []string
			for _, f := range ofRule(r, "departure-unused") {
				unused = append(unused, f.Subject)
			}
			if !slices.Equal(unused, c.unused) {
				t.Errorf("unused on %v, want %v", unused, c.unused)
			}
		})
	}
}

func TestNothingIsTakenAwayByADeparture(t *testing.T) {
	without, with := shallow(t, "slope,P1,x\n"), shallow(t, "cover,P1,x\n")
	if len(without.Findings) != len(with.Findings)+1 { // one notice of the departure that matches nothing
		t.Errorf("%d findings, and %d with a departure that is used", len(without.Findings), len(with.Findings))
	}
}
