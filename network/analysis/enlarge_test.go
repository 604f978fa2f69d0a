package analysis_test

import (
	"slices"
	"strings"
	"testing"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/finding"
)

// brokenFreeboards are the findings of the design storm.
func brokenFreeboards(r *analysis.Result) []finding.Finding {
	return slices.DeleteFunc(ofRule(r, "freeboard"), func(f finding.Finding) bool { return f.Storm != r.Design.Storm.ReturnPeriod })
}

// The invented subdivision breaks the freeboard at three structures when its sizes serve the flow alone. With sizes for the
// grade line it holds everywhere, and the findings name the pipes that grew.
func TestSizesForTheGradeLineHoldTheFreeboard(t *testing.T) {
	size := func(purpose network.SizeFor) *analysis.Result {
		o := analysis.Options{Size: true}
		j, err := analysis.Read("../../examples/orchard-rise", o)
		if err != nil {
			t.Fatal(err)
		}
		j.Settings.Criteria.SizeFor = purpose
		r, err := analysis.Run(j, o)
		if err != nil {
			t.Fatal(err)
		}
		return r
	}
	alone, cured := size(network.ForCapacity), size(network.ForGradeLine)
	broken := brokenFreeboards(alone)
	if len(broken) == 0 {
		t.Fatal("nothing to cure")
	}
	if !strings.Contains(broken[0].Message, `size_for = "grade-line"`) {
		t.Errorf("the finding does not name the setting: %s", broken[0].Message)
	}
	if left := brokenFreeboards(cured); len(left) != 0 {
		t.Errorf("%d structures still break it, the first: %s", len(left), left[0].Message)
	}
	grew := map[string]bool{}
	for _, f := range ofRule(cured, "grade-line-size") {
		grew[f.Subject] = true
	}
	for i := range cured.Network.Pipes {
		p, before := &cured.Network.Pipes[i], &alone.Network.Pipes[i]
		if larger := p.FullArea() > before.FullArea()*1.0001; larger != grew[p.ID] {
			t.Errorf("pipe %s: larger %v, named %v", p.ID, larger, grew[p.ID])
		}
	}
}

// Under a receiving water within the freeboard of B no size helps: nothing grows, and the finding says so.
func TestALevelBeyondCureIsSaid(t *testing.T) {
	r := run(t, folder(t, changed(t, with(inflowB("97.5"), criteria(`size_for = "grade-line"`), edits{p2, "P2,B,O,100,,,0.005,94.2"}))), analysis.Options{Size: true})
	found := brokenFreeboards(r)
	if len(found) != 1 || !strings.Contains(found[0].Message, "no larger size of a chosen pipe") {
		t.Errorf("findings %+v", found)
	}
}
