package job_test

import (
	"testing"

	"rimfall/network/job"
)

func TestFaultsOfTheRainfall(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"the file is missing", `
-- rainfall.csv --
absent
`, `
rainfall.csv: missing file
`},
		{"the file is empty", `
-- rainfall.csv --
`, `
rainfall.csv: empty table: it needs a heading row and at least one row below it
`},
		{"no row stands below the headings", `
-- rainfall.csv --
duration,2,10
`, `
rainfall.csv:1: empty table: no row below the headings
`},
		{"the column of durations is missing", `
-- rainfall.csv --
minutes,2,10
5,3,4
`, `
rainfall.csv:1:1: missing column "duration": durations in minutes
`},
		{"no column is a return period", `
-- rainfall.csv --
duration,note
5,wet
`, `
rainfall.csv:1:1: no return period: head a column of intensities with the number of years
`},
		{"a heading is no number of years", `
-- rainfall.csv --
duration,2,ten,10
5,3,3.5,4
60,1,1.5,2
`, `
rainfall.csv:1:12: column "ten" is no return period: head it with the number of years, or with x_ or note to keep it out
`},
		{"a return period stands twice", `
-- rainfall.csv --
duration,10,2,10
5,4,3,4
60,2,1,2
`, `
rainfall.csv:1: return period 10 stands in column 1 too
`},
		{"a cell is blank, a word, not finite or not over 0", `
-- rainfall.csv --
duration,2,10
5,3,
10,x,3
15,inf,2
20,0,1
30,-1,1
,1,1
`, `
rainfall.csv:2:5: intensity: "" is no number: write a plain number such as 12.5
rainfall.csv:3:4: intensity: "x" is no number: write a plain number such as 12.5
rainfall.csv:4:4: intensity: "inf" is no number: write a finite number, or leave the cell blank
rainfall.csv:5:4: intensity = 0: it must be over 0
rainfall.csv:6:4: intensity = -1: it must be over 0
rainfall.csv:7:1: duration: "" is no number: write a plain number such as 12.5
`},
		{"an intensity rises with duration", `
-- rainfall.csv --
duration,2,10
5,3,4
10,2.5,4.5
60,1,2
`, `
rainfall.csv:3:8: intensity rises with duration, from 4 to 4.5; it stays or falls
`},
		{"an intensity falls with return period", `
-- rainfall.csv --
duration,2,10
5,3,4
10,2.5,2.4
60,1,2
`, `
rainfall.csv:3:8: intensity falls with return period, from 2.5 at 2 years to 2.4 at 10 years; it stays or rises
`},
		{"a duration is repeated or out of order", `
-- rainfall.csv --
duration,2,10
5,3,4
5,2.9,3.9
60,1,2
30,1,2
`, `
rainfall.csv:3:1: duration 5 min is repeated
rainfall.csv:5:1: duration 30 min stands below 60 min; durations rise down the table
`},
		{"ties are allowed", `
-- rainfall.csv --
duration,2,10
5,3,3
10,3,3
60,1,2
`, ""},
	})
}
