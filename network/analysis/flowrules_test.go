package analysis_test

import "testing"

func TestRulesOfFlowAndVelocity(t *testing.T) { judge(t, flowRules) }

// halfP1 makes 1.259640 cfs, half of 2.51928, of the area at A.
var halfP1 = edits{a1, "a1,A,0.787275,0.4,10"}

var flowRules = []ruleCase{
	{
		rule: "capacity", subject: "P1",
		found: edits{a1, "a1,A,2,0.4,10"}, value: 3.2, limit: 2.51928, // 0.8 · 4
		not: edits{a1, "a1,A,1.57,0.4,10"}, // 2.512
	},
	{
		rule: "depth-ratio", subject: "P1",
		found: with(halfP1, criteria("max_depth_ratio = 0.49")), value: 0.5, limit: 0.49,
		not: with(halfP1, criteria("max_depth_ratio = 0.51")),
	},
	{
		rule: "no-size-carries", subject: "P1", size: true,
		found: edits{a1, "a1,A,2,0.4,10", p1, "P1,A,B,100,,,0.005,95", "-- areas", "-- catalog.csv --\nshape,span\ncircle,12\n-- areas"},
		value: 3.2, limit: 2.51928,
		not: edits{p1, "P1,A,B,100,,,0.005,95", "-- areas", "-- catalog.csv --\nshape,span\ncircle,12\n-- areas"},
	},
	{
		rule: "cleansing-velocity", subject: "P1",
		found: edits{p1, "P1,A,B,100,12,2,0.004,95"}, value: 2.86900, limit: 3, // 45.3630 · √0.004
		not: edits{p1, "P1,A,B,100,12,2,0.0044,95"}, // 3.009
	},
	{
		rule: "cleansing-shear", subject: "P1",
		found: with(halfP1, criteria("min_shear = 0.0781")), value: 0.078, limit: 0.0781, // 62.4 · 0.25 · 0.005
		not: with(halfP1, criteria("min_shear = 0.0779")),
	},
	{
		rule: "high-velocity", subject: "P1",
		found: with(halfP1, criteria("max_velocity = 3.2")), value: 3.20764, limit: 3.2,
		not: with(halfP1, criteria("max_velocity = 3.21")),
	},
	{
		rule: "outlet-velocity", subject: "P2",
		found: with(inflowB(""), criteria("max_outlet_velocity = 3.7")), value: 3.72217, limit: 3.7,
		not: with(inflowB(""), criteria("max_outlet_velocity = 3.73")),
	},
	{
		// (0.4 + 0.1) ac · 1 in/h at 60 min is less than 0.4 · 4.
		rule: "flow-falls", subject: "P2",
		found: edits{a2, "a2,B,1,0.1,60", "60,1", "60,1\n90,1"}, value: 0.5, limit: 1.6,
		not: edits{a2, "a2,B,1,0.1,60", "60,1", "60,1\n90,1", "[criteria]", "hold_upstream_peak = true\n[criteria]"},
	},
	{
		rule: "rational-area", subject: "P2",
		found: criteria("max_rational_area = 1.5"), value: 2, limit: 1.5,
		not: criteria("max_rational_area = 2"),
	},
	{
		rule: "below-first-duration", subject: "P1",
		found: edits{a1, "a1,A,1,0.4,4.5", "[criteria]", "minimum_time = 4\n[criteria]"}, value: 4.5, limit: open,
		not: edits{a1, "a1,A,1,0.4,5", "[criteria]", "minimum_time = 4\n[criteria]"},
	},
	{
		rule: "no-flow", subject: "P1",
		found: edits{a1, "a1,A,1,0,10"}, value: open, limit: open,
		not: edits{a1, "a1,A,1,0,10", "A,manhole,0,0,100,,,0", "A,manhole,0,0,100,,,0.1"},
	},
}

// The cleansing velocity can be that at design depth: half full it is the same as full.
func TestTheCleansingVelocityAtDesignDepth(t *testing.T) {
	design := criteria(`velocity_basis = "design"`)
	judge(t, []ruleCase{{
		rule: "cleansing-velocity", subject: "P1",
		found: with(design, edits{p1, "P1,A,B,100,12,2,0.004,95", a1, "a1,A,0.704161,0.4,10"}), value: 2.86900, limit: 3, // 1.126657 cfs
		not: with(design, edits{a1, "a1,A,0.787275,0.4,10"}), // 3.208 on 0.005
	}})
}

// A dry pipe has a velocity full bore and none at design depth; a pipe that does
// not fall is judged by adverse-slope alone.
func TestPipesThatOtherRulesLeaveAlone(t *testing.T) {
	judge(t, []ruleCase{{
		rule: "cleansing-velocity", subject: "P1",
		found: edits{p1, "P1,A,B,100,12,2,0.004,95", a1, "a1,A,1,0,10"}, value: 2.86900, limit: 3,
		not: edits{"[criteria]", "[criteria]\nvelocity_basis = \"design\"", p1, "P1,A,B,100,12,2,0.004,95", a1, "a1,A,1,0,10"},
	}, {
		rule: "slope", subject: "P1",
		found: edits{p1, "P1,A,B,100,12,2,0.0005,95"}, value: 0.0005, limit: 0.001,
		not: edits{p1, "P1,A,B,100,12,2,-0.0005,95"},
	}, {
		rule: "cleansing-velocity", subject: "P1",
		found: edits{p1, "P1,A,B,100,12,2,0.004,95"}, value: 2.86900, limit: 3,
		not: edits{p1, "P1,A,B,100,12,2,-0.004,95"},
	}, {
		rule: "capacity", subject: "P1",
		found: edits{a1, "a1,A,2,0.4,10"}, value: 3.2, limit: 2.51928,
		not: edits{a1, "a1,A,2,0.4,10", p1, "P1,A,B,100,12,2,-0.005,95"},
	}})
}
