package review_test

import (
	"slices"
	"strings"
	"testing"

	"rimfall/network/analysis"
	"rimfall/network/review"
)

// rulesOf are the rules whose limit a line of the criteria holds something against.
var rulesOf = map[string][]string{
	"capacity": {"capacity"}, "max_depth_ratio": {"depth-ratio"}, "min_velocity": {"cleansing-velocity"}, "min_shear": {"cleansing-shear"},
	"max_velocity": {"high-velocity"}, "max_outlet_velocity": {"outlet-velocity"}, "min_slope": {"slope", "adverse-slope"}, "max_slope": {"slope"},
	"min_size": {"min-size"}, "min_cover": {"cover"}, "max_cover": {"cover"}, "surcharge": {"surcharge"}, "least_fall": {"least-fall", "invert-order"},
	"freeboard": {"freeboard"}, "flooding": {"flooding"},
}

// A line says that a limit is broken exactly where the rule of that limit has found something.
func TestCriteriaOnThePagesAgreeWithTheFindings(t *testing.T) {
	settings := "minimum_time = 6\n[criteria]\nmin_shear = 0.1\nmax_outlet_velocity = 5\nmax_cover = 6\nmax_depth_ratio = 0.8\nmax_velocity = 6\nmin_size = 15\nfreeboard = 3"
	r := asRun(t, anyKind, "SETTINGS", settings)
	broken, limits := 0, 0
	for _, kind := range []review.Kind{review.OfPipe, review.OfStructure} {
		for _, id := range idsOf(r, kind) {
			lines := printedLines(t, r, id, kind)
			for setting, rules := range rulesOf {
				says := slices.ContainsFunc(lines, func(l printedLine) bool { return l.source == setting && l.result == "is broken" })
				judged := slices.ContainsFunc(lines, func(l printedLine) bool {
					return l.source == setting && (l.result == "holds" || l.result == "is broken")
				})
				if !judged {
					continue
				}
				found := foundBy(r, kind, id, setting, rules)
				if limits++; says {
					broken++
				}
				if says != found {
					t.Errorf("%s %s, %s: the page says broken: %t, the rules find something: %t", kind, id, setting, says, found)
				}
			}
		}
	}
	if broken < 20 || limits < 150 {
		t.Errorf("only %d limits, %d of them broken", limits, broken)
	}
}

// foundBy tells whether one of some rules has found something of a subject; of rules with a least and a greatest
// limit, at that end.
func foundBy(r *analysis.Result, kind review.Kind, id, setting string, rules []string) bool {
	for i := range r.Findings {
		f := &r.Findings[i]
		sameKind := f.AboutStructure() == (kind == review.OfStructure)
		if f.Subject != id || !sameKind || !slices.Contains(rules, f.Rule.Name) {
			continue
		}
		over := f.Limit.OK && f.Value.V > f.Limit.V
		if strings.HasPrefix(setting, "max_") == over || setting == "capacity" || setting == "surcharge" || setting == "flooding" || setting == "least_fall" {
			return true
		}
	}
	return false
}

func idsOf(r *analysis.Result, kind review.Kind) []string {
	var ids []string
	if kind == review.OfPipe {
		for i := range r.Network.Pipes {
			ids = append(ids, r.Network.Pipes[i].ID)
		}
		return ids
	}
	for i := range r.Network.Structures {
		ids = append(ids, r.Network.Structures[i].ID)
	}
	return ids
}

// A drowned trunk fills the pipes at the blind junction C, where momentum then gives the loss.
func TestABlindJunctionIsExplainedByMomentum(t *testing.T) {
	r := asRun(t, anyKind, "SETTINGS", "", ",,108,,", ",,118,,")
	lines := printedLines(t, r, "C", review.OfStructure)
	if !slices.ContainsFunc(lines, func(l printedLine) bool { return l.name == "loss by momentum" && l.numbers != "" }) {
		t.Error("no line of momentum on the page of C")
	}
	if n := recompute(t, r); n < 700 {
		t.Errorf("%d lines were worked out", n)
	}
}

func TestWhatHasNoSuchIDIsRefused(t *testing.T) {
	r := asRun(t, twoPipes)
	if _, err := review.Explain(r, "P7"); err == nil || !strings.Contains(err.Error(), `"P7"`) {
		t.Errorf("error: %v", err)
	}
	if _, err := review.Explain(r, "P1", review.OfArea); err == nil {
		t.Error("pipe P1 is explained as an area")
	}
}

// A line whose formula does not give what the run has found is written without one. That is meant for the depths that
// a water surface sets, so these lines must have their formula: friction in a full pipe, the account of the losses, the
// depth at an outfall, and all of a circle.
func TestLinesThatHaveAFormulaAreWrittenWithIt(t *testing.T) {
	worked := map[string]int{}
	for _, settings := range []string{"", "[grade]\nstructure_loss = \"coefficient\"\noutfall_start = \"critical\""} {
		r := asRun(t, anyKind, "SETTINGS", settings)
		for i := range r.Network.Pipes {
			round := r.Network.Pipes[i].Shape == "circle"
			for _, l := range printedLines(t, r, r.Network.Pipes[i].ID, review.OfPipe) {
				circle := round && (strings.HasPrefix(l.name, "wetted") || l.name == "top width")
				switch l.name {
				case "height of the grade line, upper end", "and losses make the energy line, lower end", "depth at the outfall", "depth at the free outfall", "fast water starts at critical depth", "depth at the lower end":
				default:
					if !circle {
						continue
					}
				}
				if worked[l.name]++; l.numbers == "" {
					t.Errorf("%s: %s has no formula: %s = %s [%s]", l.page, l.name, l.symbol, l.result, l.source)
				}
			}
		}
	}
	for name, least := range map[string]int{"height of the grade line, upper end": 6, "and losses make the energy line, lower end": 15, "depth at the outfall": 2, "fast water starts at critical depth": 2, "wetted area": 30, "depth at the lower end": 2} {
		if worked[name] < least {
			t.Errorf("%s: %d lines, want %d at least", name, worked[name], least)
		}
	}
}
