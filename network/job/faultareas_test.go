package job_test

import (
	"testing"

	"rimfall/network/job"
)

func TestFaultsOfAreas(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"the file is missing", `
-- areas.csv --
absent
`, `
areas.csv: missing file
`},
		{"the column of the area is missing", `
-- areas.csv --
id,structure,c
a1,A,0.5
`, `
areas.csv:1:1: missing column "area"
`},
		{"no row stands below the headings", `
-- areas.csv --
id,structure,area,c,time
`, `
areas.csv:1: empty table: no row below the headings
`},
		{"an area is zero, negative, blank or a word", `
-- areas.csv --
id,structure,area,c,time
a1,A,0,0.5,10
a2,A,-1,0.5,10
a3,A,,0.5,10
a4,A,an acre,0.5,10
`, `
areas.csv:2:6: area = 0: it must be over 0
areas.csv:3:6: area = -1: it must be over 0
areas.csv:4:6: area is blank: write a number
areas.csv:5:6: area: "an acre" is no number: write a plain number such as 12.5
`},
		{"C lies outside 0 to 1", `
-- areas.csv --
id,structure,area,c,time
a1,A,1,1.01,10
a2,A,1,-0.1,10
a3,A,1,65,10
`, `
areas.csv:2:8: c = 1.01: a runoff coefficient lies between 0 and 1
areas.csv:3:8: c = -0.1: a runoff coefficient lies between 0 and 1
areas.csv:4:8: c = 65: a runoff coefficient lies between 0 and 1
`},
		{"C is blank, a word or not finite", `
-- areas.csv --
id,structure,area,c,time
a1,A,1,,10
a2,A,1,grass,10
a3,A,1,nan,10
`, `
areas.csv:2:8: area a1 has no runoff coefficient: write c
areas.csv:3:8: c: "grass" is no number: write a plain number such as 12.5
areas.csv:4:8: c: "nan" is no number: write a finite number, or leave the cell blank
`},
		{"a structure is unknown or not named", `
-- areas.csv --
id,structure,area,c,time
a1,C,1,0.5,10
a2,,1,0.5,10
`, `
areas.csv:2:4: unknown structure "C"; did you mean "A"?
areas.csv:3:4: structure is blank: name a structure
`},
		{"an id stands twice", `
-- areas.csv --
id,structure,area,c,time
a1,A,1,0.5,10
a1,B,1,0.5,10
`, `
areas.csv:3:1: id "a1" stands twice, first in line 2
`},
		{"an inlet time is negative or a word", `
-- areas.csv --
id,structure,area,c,time
a1,A,1,0.5,-1
a2,A,1,0.5,ten
`, `
areas.csv:2:12: time = -1: it must not be negative
areas.csv:3:12: time: "ten" is no number: write a plain number such as 12.5
`},
		{"a surface is named without a table of surfaces", `
-- areas.csv --
id,structure,area,surface
a1,A,1,lawn
`, `
areas.csv:2:8: surface "lawn" is looked up in surfaces.csv, which this job does not have: add it, or write c
`},
		{"a surface is not in the table of surfaces", `
-- areas.csv --
id,structure,area,surface
a1,A,1,lawns
-- surfaces.csv --
surface,c
lawn,0.2
roof,0.9
`, `
areas.csv:2:8: unknown surface "lawns": did you mean "lawn"?
`},
		{"a table of surfaces has a name twice, a blank one and a C out of range", `
-- areas.csv --
id,structure,area,surface
a1,A,1,lawn
-- surfaces.csv --
surface,c,low,high
lawn,0.2,,
Lawn,0.3,,
,0.4,,
roof,1.2,,
park,0.5,0.1,0.4
`, `
surfaces.csv:3:1: surface "lawn" stands twice
surfaces.csv:4:1: surface is blank: every row needs a name
surfaces.csv:5:6: surface "roof": c = 1.2 must lie between 0 and 1, and between low and high
surfaces.csv:6:6: surface "park": c = 0.5 must lie between 0 and 1, and between low and high
`},
	})
}
