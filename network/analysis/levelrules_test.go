package analysis_test

import "testing"

func TestRulesOfSlopeLevelAndSize(t *testing.T) { judge(t, levelRules) }

var levelRules = []ruleCase{
	{
		rule: "adverse-slope", subject: "P1",
		found: edits{p1, "P1,A,B,100,12,2,0,95"}, value: 0, limit: 0,
		not: edits{p1, "P1,A,B,100,12,2,0.00001,95"},
	},
	{
		rule: "slope", subject: "P1",
		found: edits{p1, "P1,A,B,100,12,2,0.0009,95"}, value: 0.0009, limit: 0.001,
		not: edits{p1, "P1,A,B,100,12,2,0.001,95"},
	},
	{
		rule: "slope", subject: "P1",
		found: edits{p1, "P1,A,B,100,12,2,0.16,111"}, value: 0.16, limit: 0.15,
		not: edits{p1, "P1,A,B,100,12,2,0.15,111"},
	},
	{
		// 97 − 95 − 1 − 2/12.
		rule: "cover", subject: "P1",
		found: edits{"A,manhole,0,0,100", "A,manhole,0,0,97"}, value: 0.83333, limit: 1,
		not: edits{"A,manhole,0,0,100", "A,manhole,0,0,97.16667"},
	},
	{
		// 100 − 95 − 1 − 2/12.
		rule: "cover", subject: "P1",
		found: criteria("max_cover = 3.8"), value: 3.83333, limit: 3.8,
		not: criteria("max_cover = 3.84"),
	},
	{
		// At the outfall the pipe comes to light.
		rule: "cover", subject: "P2",
		found: edits{"B,manhole,100,0,98", "B,manhole,100,0,96.6"}, value: 0.9625, limit: 1, // 96.6 − 94.2 − 1.25 − 2.25/12
		not: edits{"O,outfall,200,0,,,,", "O,outfall,200,0,94,,,"},
	},
	{
		// The ground dips to 97 halfway, where the outside of the pipe is at 94.75 + 1 + 2/12.
		rule: "cover-along-pipe", subject: "P1",
		found: edits{"-- areas", "-- ground.csv --\npipe,station,elevation\nP1,50,96.9\n-- areas"}, value: 0.98333, limit: 1,
		not: edits{"-- areas", "-- ground.csv --\npipe,station,elevation\nP1,50,97\n-- areas"},
	},
	{
		// A water main from 96.5 up; the outside of the pipe is at 95.91667 halfway.
		rule: "crossing-clearance", subject: "P1",
		found: with(criteria("min_clearance = 0.6"), edits{"-- areas", "-- crossings.csv --\npipe,station,name,top,bottom\nP1,50,water main,97,96.5\n-- areas"}),
		value: 0.58333, limit: 0.6,
		not: with(criteria("min_clearance = 0.58"), edits{"-- areas", "-- crossings.csv --\npipe,station,name,top,bottom\nP1,50,water main,97,96.5\n-- areas"}),
	},
	{
		rule: "min-size", subject: "P1",
		found: criteria("min_size = 15"), value: 12, limit: 15,
		not: criteria("min_size = 12"),
	},
	{
		// π/4 · 1.25² against π/4 · 1.5².
		rule: "size-decrease", subject: "P2",
		found: edits{p1, "P1,A,B,100,18,2.5,0.005,95"}, value: 1.227185, limit: 1.767146,
		not: edits{p1, "P1,A,B,100,15,2.5,0.005,95"},
	},
	{
		rule: "invert-order", subject: "P2",
		found: edits{p2, "P2,B,O,100,15,2.25,0.005,94.51"}, value: 94.51, limit: 94.5,
		not: edits{p2, "P2,B,O,100,15,2.25,0.005,94.5"},
	},
	{
		rule: "least-fall", subject: "P2",
		found: edits{p2, "P2,B,O,100,15,2.25,0.005,94.45"}, value: 0.05, limit: 0.1,
		not: edits{p2, "P2,B,O,100,15,2.25,0.005,94.4"},
	},
	{
		// Crowns: 94.3 + 1.25 against 94.5 + 1.
		rule: "size-change", subject: "P2",
		found: edits{p2, "P2,B,O,100,15,2.25,0.005,94.3"}, value: 95.55, limit: 95.5,
		not: edits{p2, "P2,B,O,100,15,2.25,0.005,94.25"},
	},
	{
		// 0.8 of the rise: 94.32 + 1 against 94.5 + 0.8.
		rule: "size-change", subject: "P2",
		found: with(criteria(`size_change = "0.8-points"`), edits{p2, "P2,B,O,100,15,2.25,0.005,94.32"}), value: 95.32, limit: 95.3,
		not: with(criteria(`size_change = "0.8-points"`), edits{p2, "P2,B,O,100,15,2.25,0.005,94.3"}),
	},
	{
		rule: "lowest-invert", subject: "P1",
		found: edits{"B,manhole,100,0,98,,,0", "B,manhole,100,0,98,,94.6,0"}, value: 94.5, limit: 94.6,
		not: edits{"B,manhole,100,0,98,,,0", "B,manhole,100,0,98,,94.5,0"},
	},
	{
		// Cover would allow 100 − 1 − 2/12 − 1.
		rule: "bounds-cross", subject: "P1", size: true,
		found: edits{p1, "P1,A,B,100,12,2,,", "A,manhole,0,0,100,,,0", "A,manhole,0,0,100,,98,0"}, value: 98, limit: 97.83333,
		not: edits{p1, "P1,A,B,100,12,2,,", "A,manhole,0,0,100,,,0", "A,manhole,0,0,100,,97.83,0"},
	},
	{
		rule: "drop-structure", subject: "P1",
		found: criteria("max_drop = 0.29"), value: 0.3, limit: 0.29, // 94.5 − 94.2
		not: criteria("max_drop = 0.3"),
	},
	{
		rule: "long-pipe", subject: "P1",
		found: criteria("max_spacing = 99"), value: 100, limit: 99,
		not: criteria("max_spacing = 100"),
	},
}

func TestNoticesOfWhatWasAssumedOrNotJudged(t *testing.T) { judge(t, noticeRules) }

var noticeRules = []ruleCase{
	{
		rule: "existing-chosen", subject: "P1", size: true,
		found: edits{pipeHeading, pipeHeading + ",status", p1, "P1,A,B,100,12,2,,,existing"}, value: open, limit: open,
		not: edits{pipeHeading, pipeHeading + ",status", p1, p1 + ",existing"},
	},
	{
		rule: "assumed", subject: "P1",
		found: edits{pipeHeading, pipeHeading + ",status", p1, p1 + ",existing"}, value: 0.013, limit: open,
		not: edits{pipeHeading, pipeHeading + ",status,n", p1, p1 + ",existing,0.013"},
	},
	{
		rule: "time-assumed", subject: "a1",
		found: edits{a1, "a1,A,1,0.4,"}, value: 5, limit: open,
		not: edits{a1, "a1,A,1,0,"}, // an area that sheds nothing sets no time
	},
	{
		rule: "rim-unknown", subject: "B",
		found: edits{"B,manhole,100,0,98", "B,blind-junction,100,0,"}, value: open, limit: open,
		not: edits{"B,manhole,100,0,98", "B,blind-junction,100,0,98"},
	},
	{
		rule: "levels-unknown", subject: "P2",
		found: edits{p2, "P2,B,O,100,15,2.25,0.005,"}, value: open, limit: open,
		not: edits{},
	},
	{
		rule: "wall-unknown", subject: "P1",
		found: edits{p1, "P1,A,B,100,13,,0.005,95"}, value: open, limit: open,
		not: edits{p1, "P1,A,B,100,12,,0.005,95"}, // the catalogue has its wall
	},
	{
		rule: "unused-outfall", subject: "O2",
		found: edits{"O,outfall", "O2,outfall,300,0,,,,\nO,outfall"}, value: open, limit: open,
		not: edits{"O,outfall", "O2,outfall,300,0,,,,\nO,outfall", p2, p2 + "\nP3,A,O2,100,15,2,0.005,94.2", "invert_upper\n", "invert_upper,share\n", p1, p1 + ",0.5", "94.2\n-- areas", "94.2,0.5\n-- areas"},
	},
}
