package analysis_test

import (
	"testing"

	"rimfall/network/analysis"
)

// At levels of 1e14 ft a hundredth of a foot is lost in rounding, so that a larger
// size seemed to lower the level by a step for ever.
func TestSizingForTheGradeLineEndsWhereAStepOfLevelIsLostInRounding(t *testing.T) {
	high := edits{
		"A,manhole,0,0,100", "A,manhole,0,0,1e14", "B,manhole,100,0,98", "B,manhole,100,0,1e14",
		"O,outfall,200,0,,,,", "O,outfall,200,0,,2e14,,", p1, "P1,A,B,100,,,,", p2, "P2,B,O,100,,,,",
	}
	r := run(t, folder(t, changed(t, with(high, criteria(`size_for = "grade-line"`)))), analysis.Options{Size: true})
	if found := ofRule(r, "flooding"); len(found) != 2 {
		t.Errorf("%d structures flooded under a receiving water of 2e14, want A and B", len(found))
	}
}
