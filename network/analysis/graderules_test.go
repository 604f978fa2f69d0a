package analysis_test

import (
	"testing"

	"rimfall/network/analysis"
)

// The lines of these cases are straight: half of the capacity of P2 runs under a
// receiving water above its crown, so that it is full throughout. Sf = 0.25 · 0.005,
// which is 0.125 ft on 100 ft; V = 2.283895/1.227185 = 1.861085 ft/s, V²/2g = 0.053826 ft.
// Without a loss the level at B is that of the energy line: the tailwater + 0.178826.
func TestRulesOfTheGradeLine(t *testing.T) { judge(t, gradeRules) }

var gradeRules = []ruleCase{
	{
		// The crown at the lower end is 93.7 + 1.25 = 94.95; at the upper end 95.45 under 96.125.
		rule: "surcharge", subject: "P2",
		found: inflowB("96"), value: 96, limit: 94.95,
		not: inflowB("94"),
	},
	{
		rule: "drowned-outfall", subject: "P2",
		found: inflowB("94.96"), value: 94.96, limit: 94.95,
		not: inflowB("94.95"),
	},
	{
		rule: "low-tailwater", subject: "P2",
		found: inflowB("93.69"), value: 93.69, limit: 93.7,
		not: inflowB("93.7"),
	},
	{
		rule: "flooding", subject: "B",
		found: inflowB("97.9"), value: 98.078826, limit: 98,
		not: inflowB("97.8"), // 97.978826
	},
	{
		rule: "freeboard", subject: "B",
		found: inflowB("96.9"), value: 0.921174, limit: 1, // 98 − 97.078826
		not: inflowB("96.8"), // 1.021174
	},
	{
		// At 96.95 the level at B is that plus friction and velocity head: for 12 in 97.49, 15 in 97.13, 18 in 97.0232,
		// a freeboard of 0.9768. 21 in: capacity 11.204 cfs, Sf = (2.283895/11.204)² · 0.005, 0.0208 ft on 100 ft;
		// 2.283895/2.40528 = 0.9495 ft/s, 0.0140 ft: 96.9848, a freeboard of 1.0152.
		rule: "grade-line-size", subject: "P2", size: true,
		found: with(inflowB("96.95"), criteria(`size_for = "grade-line"`), edits{p2, "P2,B,O,100,,,0.005,94.2"}), value: 21, limit: 12,
		not: with(inflowB("96.95"), edits{p2, "P2,B,O,100,,,0.005,94.2"}),
	},
	{
		rule: "grade-line-unknown", subject: "P1",
		found: edits{p2, "P2,B,O,100,15,2.25,0.005,"}, value: open, limit: open,
		not: edits{},
	},
	{
		rule: "angle-assumed", subject: "P1",
		found: edits{`"none"`, `"access-hole"`, "A,manhole,0,0", "A,manhole,,", "B,manhole,100,0", "B,manhole,,"}, value: 0, limit: open,
		not: edits{`"none"`, `"access-hole"`},
	},
	{
		// P1 on 3 % is rapid and runs out freely; B stands off the line by 45°.
		rule: "fast-bend", subject: "P1",
		found: edits{p1, "P1,A,B,100,12,2,0.03,98", "O,outfall,200,0", "O,outfall,200,100"}, value: 45, limit: 10,
		not: edits{p1, "P1,A,B,100,12,2,0.03,98"},
	},
}

// P1 on 1.5 % is rapid, and the water at B stands above its normal depth but not above its upper end, so it jumps
// somewhere in between; on 0.5 % it is tranquil.
func TestAHydraulicJumpIsFound(t *testing.T) {
	steep := edits{p1, "P1,A,B,100,12,2,0.03,97.5", "O,outfall,200,0,,,,", "O,outfall,200,0,,95.3,,"}
	found := ofRule(run(t, folder(t, changed(t, steep)), analysis.Options{}), "jump")
	if len(found) != 1 || found[0].Subject != "P1" || !found[0].Value.OK || found[0].Value.V <= 0 || found[0].Value.V >= 100 {
		t.Errorf("jumps %+v", found)
	}
	if found := ofRule(run(t, folder(t, sound), analysis.Options{}), "jump"); len(found) != 0 {
		t.Errorf("jumps in a tranquil line %+v", found)
	}
}
