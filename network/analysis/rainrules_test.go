package analysis_test

import "testing"

// Rainfall and flow paths of the cases.
const (
	table = "duration,10\n5,6\n10,4\n60,1\n"
	// An agency's table as it comes, its head cut off: depths in inches, 0.667 in in 10 min are 4 in/h.
	headless = "by duration for ARI (years):, 5,10\n5-min:, 0.4,0.5\n10-min:, 0.5,0.667\n60-min:, 0.8,1.0\n60-day:, 8,10\n"
	whole    = "Point precipitation frequency estimates (inches)\nData type: Precipitation depth\nTime series type: Partial duration\nPRECIPITATION FREQUENCY ESTIMATES\n" + headless
)

func TestRulesOfTheRainfallAndOfFlowPaths(t *testing.T) { judge(t, rainRules) }

var rainRules = []ruleCase{
	{
		rule: "storm-between-columns", subject: "rainfall",
		found: edits{table, "duration,5,20\n5,5,7\n10,3,5\n60,0.9,1.2\n"}, value: 10, limit: open,
		not: edits{table, "duration,5,10,20\n5,5,6,7\n10,3,4,5\n60,0.9,1,1.2\n"},
	},
	{
		rule: "rainfall-converted", subject: "rainfall",
		found: edits{table, whole, "[storm]", "units = \"si\"\n[storm]"}, value: open, limit: open,
		not: edits{table, whole},
	},
	{
		rule: "rainfall-remark", subject: "rainfall",
		found: edits{table, headless}, value: open, limit: open,
		not: edits{table, whole},
	},
	{
		// NEH 630 ch. 15 gives its sheet flow for 100 ft at most.
		rule: "path-limit", subject: "a1",
		found: with(path("sheet-nrcs,120,0.02,0.15"), edits{a1, "a1,A,1,0.4,"}), value: 120, limit: open,
		not: with(path("sheet-nrcs,100,0.02,0.15"), edits{a1, "a1,A,1,0.4,"}),
	},
	{
		// Kinematic wave: 0.933/6^0.4 · (0.011 · 10/√0.05)^0.6 = 0.933/2.047672 · 0.653348 = 0.297692 min, with the 6 in/h of
		// the first 5 min in place of those of the minimum of 4 min.
		rule: "path-below-first-duration", subject: "a1",
		found: with(path("sheet,10,0.05,0.011"), edits{a1, "a1,A,1,0.4,", "[criteria]", "minimum_time = 4\n[criteria]"}), value: 0.297692, limit: open,
		not: with(path("sheet,10,0.05,0.011"), edits{a1, "a1,A,1,0.4,"}),
	},
	{
		rule: "path-unused", subject: "a1",
		found: path("sheet,10,0.05,0.011"), value: 10, limit: 0.297692,
		not: with(path("sheet,10,0.05,0.011"), edits{a1, "a1,A,1,0.4,"}),
	},
}

// path adds a flow path of one leg to the area a1.
func path(leg string) edits {
	return edits{"-- areas", "-- paths.csv --\narea,order,kind,length,slope,n\na1,1," + leg + "\n-- areas", "[criteria]", "two_year_day_depth = 3\n[criteria]"}
}
