package finding

import (
	"slices"
	"testing"
)

func TestTheListsOfSubjectsNameRulesOfTheCatalogue(t *testing.T) {
	for _, name := range slices.Concat(structureRules, areaRules, otherRules) {
		if !slices.Contains(Names(), name) {
			t.Errorf("no rule %s", name)
		}
	}
}
