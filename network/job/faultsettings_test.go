package job_test

import (
	"testing"

	"rimfall/network/job"
)

func TestFaultsOfTheSettings(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"job.toml is missing", `
-- job.toml --
absent
`, `
job.toml: missing file
`},
		{"job.toml is no TOML", `
-- job.toml --
[storm
return_period = 10
`, `
job.toml:1:7: not valid TOML: expected ']' to close table name
`},
		{"the design storm is not named", `
-- job.toml --
title = "No storm"
`, `
job.toml: no return_period in [storm]: name the design storm in years, for example return_period = 10
`},
		{"no storm of that return period is in the rainfall", `
-- job.toml --
[storm]
return_period = 25
check_period = 500
`, `
job.toml:2:1: no storm of 25 years in rainfall.csv; there are 2, 10 years
job.toml:3:1: no storm of 500 years in rainfall.csv; there are 2, 10 years
`},
		{"the units are no system of units", `
-- job.toml --
units = "metric"
[storm]
return_period = 10
`, `
job.toml:1:1: units = "metric": write "us" or "si"
`},
		{"a setting is misspelt", `
-- job.toml --
[storm]
return_period = 10
minimum_tim = 5
[criteria]
min_covr = 2
`, `
job.toml:3:1: unknown setting "storm.minimum_tim": did you mean "minimum_time"?
job.toml:5:1: unknown setting "criteria.min_covr": did you mean "min_cover"?
`},
		{"a table of settings is misspelt", `
-- job.toml --
[storm]
return_period = 10
[criterea]
min_cover = 2
`, `
job.toml:4:1: unknown table [criterea]: did you mean "criteria"?
`},
		{"a word stands where a number belongs", `
-- job.toml --
[storm]
return_period = "ten"
minimum_time = true
uplift = [1.2]
`, `
job.toml:2:1: storm.return_period takes a return period in years, not the text "ten"
job.toml:3:1: storm.minimum_time takes a time in minutes, over 0, not true
job.toml:4:1: storm.uplift takes a factor over 0, not a list
`},
		{"a number is not finite", `
-- job.toml --
[storm]
return_period = 10
uplift = nan
minimum_time = inf
`, `
job.toml:3:1: storm.uplift = NaN: it takes a factor over 0
job.toml:4:1: storm.minimum_time = +Inf: it takes a time in minutes, over 0
`},
		{"a number is out of its range", `
-- job.toml --
[storm]
return_period = 10
minimum_time = 0
uplift = -1
[criteria]
max_depth_ratio = 1.1
n = 0
least_fall = -0.1
freeboard = -1
min_size = 0
`, `
job.toml:3:1: storm.minimum_time = 0: it takes a time in minutes, over 0
job.toml:4:1: storm.uplift = -1: it takes a factor over 0
job.toml:6:1: criteria.max_depth_ratio = 1.1: it takes a ratio over 0, at most 1
job.toml:7:1: criteria.n = 0: it takes a Manning's n, over 0
job.toml:8:1: criteria.least_fall = -0.1: it takes a height, 0 or more
job.toml:9:1: criteria.freeboard = -1: it takes a height, 0 or more
job.toml:10:1: criteria.min_size = 0: it takes a size over 0
`},
		{"the least slope is over the greatest", `
-- job.toml --
[storm]
return_period = 10
[criteria]
min_slope = 0.02
max_slope = 0.01
`, `
job.toml: min_slope 0.02 is over max_slope 0.01
`},
		{"a word is none of those that the setting takes", `
-- job.toml --
[storm]
return_period = 10
travel_velocity = "fast"
peak = 3
[criteria]
size_change = "crown"
[output]
flow = "gpm"
`, `
job.toml:3:1: storm.travel_velocity = fast: write one of "part-full", "flow-over-full-area", "full-bore"
job.toml:4:1: storm.peak = 3: write one of "longest-time", "partial-area"
job.toml:6:1: criteria.size_change = crown: write one of "crowns", "inverts", "0.8-points"
job.toml:8:1: output.flow = gpm: write one of "cfs", "m3/s", "L/s"
`},
		{"a number stands where true or false belongs", `
-- job.toml --
[storm]
return_period = 10
hold_upstream_peak = 1
frequency_factor = "yes"
`, `
job.toml:3:1: hold_upstream_peak is true or false, not the number 1
job.toml:4:1: frequency_factor is true or false, not the text "yes"
`},
		{"the title is a number", `
-- job.toml --
title = 12
[storm]
return_period = 10
`, `
job.toml:1:1: title takes a text in quotes, not the number 12
`},
		{"a file is named for a table that does not exist", `
-- job.toml --
[storm]
return_period = 10
[files]
pipe = "p.csv"
`, `
job.toml:4:1: unknown table "pipe": did you mean "pipes"?
`},
		{"a heading is named for a field that does not exist", `
-- job.toml --
[storm]
return_period = 10
[columns.pipes]
invert_uper = "IE up"
[columns.pipe]
id = "Nr"
`, `
job.toml:4:1: pipes has no field "invert_uper": did you mean "invert_upper"?
job.toml:6:1: unknown table "pipe": did you mean "pipes"?
`},
		{"the criteria set is missing", `
-- job.toml --
[storm]
return_period = 10
[criteria]
set = "town.toml"
`, `
town.toml: missing file
`},
		{"the criteria set has no title, an unknown key and a bad number", `
-- job.toml --
[storm]
return_period = 10
[criteria]
set = "town.toml"
-- town.toml --
min_cover = "one foot"
min_velocty = 2
`, `
town.toml: a criteria set needs a title, which is printed on every output
town.toml:1:1: min_cover takes a length, not the text "one foot"
town.toml:2:1: unknown setting "min_velocty": did you mean "min_velocity"?
`},
		{"settings of the user's own are let be", `
-- job.toml --
[storm]
return_period = 10
note = "from the county"
x_sheet = 4
`, ""},
	})
}
