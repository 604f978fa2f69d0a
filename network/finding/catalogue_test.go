package finding_test

import (
	"regexp"
	"slices"
	"testing"

	"rimfall/network/finding"
)

func TestEveryRuleSaysAllThatAReaderNeeds(t *testing.T) {
	name := regexp.MustCompile(`^[a-z]+(-[a-z]+)*$`)
	seen := map[string]bool{}
	for _, r := range finding.Catalogue() {
		if !name.MatchString(r.Name) || seen[r.Name] {
			t.Errorf("rule %q: its name is not in small letters with hyphens, or stands twice", r.Name)
		}
		seen[r.Name] = true
		for what, text := range map[string]string{"title": r.Title, "meaning": r.Meaning, "reason": r.Why, "source": r.Source} {
			if text == "" {
				t.Errorf("rule %s has no %s", r.Name, what)
			}
		}
	}
	if names := finding.Names(); len(names) != len(seen) {
		t.Errorf("%d names, %d rules", len(names), len(seen))
	}
}

// The names that the contract of job folders promises, which are never given another meaning.
func TestTheCatalogueHasTheRulesOfTheContract(t *testing.T) {
	severity := map[string]finding.Severity{}
	for _, r := range finding.Catalogue() {
		severity[r.Name] = r.Severity
	}
	for _, name := range []string{
		"capacity", "surcharge", "flooding", "freeboard", "cleansing-velocity", "cleansing-shear", "high-velocity",
		"cover", "slope", "adverse-slope", "size-decrease", "invert-order", "below-first-duration",
	} {
		if _, ok := severity[name]; !ok {
			t.Errorf("no rule %s", name)
		}
	}
	for s, word := range map[finding.Severity]string{finding.Notice: "notice", finding.Warning: "warning", finding.Error: "error"} {
		if s.String() != word {
			t.Errorf("severity %d is %q, want %q", s, s, word)
		}
	}
}

func TestAcceptTakesNothingAwayAndTellsWhatIsUnused(t *testing.T) {
	all := []finding.Finding{{Rule: rule("adverse-slope"), Subject: "P", Storm: 25}}
	got := finding.Accept(slices.Clone(all), []finding.Departure{{Rule: "adverse-slope", Subject: "P", Reason: "a siphon"}, {Rule: "cover", Subject: "P", Reason: "rock"}}, 25)
	if len(got) != 2 || got[0].Accepted != "a siphon" || got[0].Breaks() || got[1].Rule.Name != "departure-unused" || got[1].Subject != "P" || got[1].Storm != 25 {
		t.Errorf("findings %+v", got)
	}
	if !all[0].Breaks() {
		t.Error("an error without a departure does not break the strict run")
	}
}

func rule(name string) *finding.Rule {
	rules := finding.Catalogue()
	for i := range rules {
		if rules[i].Name == name {
			return &rules[i]
		}
	}
	panic("no rule " + name)
}
