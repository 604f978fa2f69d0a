package job_test

import (
	"testing"

	"rimfall/network/job"
)

func TestFaultsOfStructures(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"the file is missing", `
-- structures.csv --
absent
`, `
structures.csv: missing file
`},
		{"the file is empty", `
-- structures.csv --
`, `
structures.csv: empty table: it needs a heading row and at least one row below it
`},
		{"no row stands below the headings", `
-- structures.csv --
# a remark
id,kind,rim
`, `
structures.csv:2: empty table: no row below the headings
`},
		{"the column of the ids is missing", `
-- structures.csv --
name,kind,rim
A,,100
B,,98
O,outfall,
`, `
structures.csv:1:1: missing column "id"
structures.csv:1:1: unknown column "name": known: benching, id, inflow, kind, least_fall, loss, lowest_invert, note, rim, tailwater, tailwater_check, x, y
`},
		{"a column is misspelt", `
-- structures.csv --
id,kind,rimm
A,,100
B,,98
O,outfall,
`, `
structures.csv:1:9: unknown column "rimm": did you mean "rim"?
`},
		{"a column stands twice", `
-- structures.csv --
id,kind,rim,rim
A,,100,100
B,,98,98
O,outfall,,
`, `
structures.csv:1:13: column "rim" stands twice, first as column 3
`},
		{"a word stands where a level belongs", `
-- structures.csv --
id,kind,rim
A,,high
B,,98
O,outfall,
`, `
structures.csv:2:4: rim: "high" is no number: write a plain number such as 12.5
`},
		{"a level is not finite", `
-- structures.csv --
id,kind,rim
A,,NaN
B,,-Inf
O,outfall,inf
`, `
structures.csv:2:4: rim: "NaN" is no number: write a finite number, or leave the cell blank
structures.csv:3:4: rim: "-Inf" is no number: write a finite number, or leave the cell blank
structures.csv:4:11: rim: "inf" is no number: write a finite number, or leave the cell blank
`},
		{"a level is hexadecimal, grouped or an expression", `
-- structures.csv --
id,kind,rim
A,,0x1p4
B,,1_000
O,outfall,1e999
`, `
structures.csv:2:4: rim: "0x1p4" is no number: write it in decimal digits
structures.csv:3:4: rim: "1_000" is no number: write a plain number such as 12.5
structures.csv:4:11: rim: "1e999" is no number: no quantity is that large
`},
		{"a level has a unit or a percent sign", `
-- structures.csv --
id,kind,rim
A,,100ft
B,,98%
O,outfall,
`, `
structures.csv:2:4: rim: "100ft" is no number: write a plain number such as 12.5
structures.csv:3:4: rim: "98%" is no number: percent are not taken: write rise over run, 0.005 for 0.5 %
`},
		{"digits of another script are no number", `
-- structures.csv --
id,kind,rim
A,,١٢
B,,98½
O,outfall,
`, `
structures.csv:2:4: rim: "١٢" is no number: write a plain number such as 12.5
structures.csv:3:4: rim: "98½" is no number: write a plain number such as 12.5
`},
		{"a level has a decimal comma in a comma-separated file", `
-- structures.csv --
id,kind,rim
A,,"100,5"
B,,98
O,outfall,
`, `
structures.csv:2:4: rim: "100,5" is no number: write a decimal point and no digit groups
`},
		{"an id is blank", `
-- structures.csv --
id,kind,rim
,,100
A,,99
B,,98
O,outfall,
`, `
structures.csv:2:1: id is blank: every row needs a name of its own
`},
		{"an id stands twice", `
-- structures.csv --
id,kind,rim
A,,100
B,,98
A,,97
O,outfall,
`, `
structures.csv:4:1: id "A" stands twice, first in line 2
`},
		{"the kind is no kind of structure", `
-- structures.csv --
id,kind,rim
A,catchbasin,100
B,manhol,98
O,outfall,
`, `
structures.csv:2:3: kind: unknown word "catchbasin": known: blind-junction, inlet, manhole, outfall
structures.csv:3:3: kind: unknown word "manhol": did you mean "manhole"?
`},
		{"an inflow is negative", `
-- structures.csv --
id,kind,inflow,least_fall
A,,-0.5,
B,,,-1
O,outfall,,
`, `
structures.csv:2:4: inflow = -0.5: it must not be negative
structures.csv:3:5: least_fall = -1: it must not be negative
`},
		{"one coordinate stands alone", `
-- structures.csv --
id,kind,x,y
A,,10,
B,,,20
O,outfall,1,1
`, `
structures.csv:2:4: structure A has one coordinate only: give x and y, or neither
structures.csv:3:4: structure B has one coordinate only: give x and y, or neither
`},
		{"a tailwater stands at a structure that is no outfall", `
-- structures.csv --
id,kind,tailwater,tailwater_check
A,,90,
B,,,91
O,outfall,89,90
`, `
structures.csv:2:4: structure A is no outfall; a tailwater stands at outfalls only
structures.csv:3:5: structure B is no outfall; a tailwater stands at outfalls only
`},
		{"the benching is none that is known", `
-- structures.csv --
id,kind,benching
A,,round
B,,half
O,outfall,
`, `
structures.csv:2:4: benching: unknown word "round": known: depressed, flat, full, half, improved
`},
		{"a row has a separator too many", `
-- structures.csv --
id,kind,rim
A,,100,7
B,,98,,,
O,outfall,
`, `
structures.csv:2:8: a cell "7" beyond the last heading: is there a separator too many in this row?
`},
		{"a cell stands under no heading", `
-- structures.csv --
id,kind,rim,
A,,100,
B,,98,x
O,outfall,,
`, `
structures.csv:3:7: a cell "x" in a column without a heading
`},
		{"a quote is not closed", `
-- structures.csv --
id,kind,rim
A,,100
B,"man"hole,98
O,outfall,
`, `
structures.csv:3:7: not valid CSV: a quoted cell goes on after its closing quote, or has none; a quote inside quotes is written twice
`},
		{"a bare quote stands in a cell", `
-- structures.csv --
id,kind,rim
A,,100
B,man"hole,98
O,outfall,
`, `
structures.csv:3:6: not valid CSV: a quote inside a cell; put the whole cell in quotes and write the inner quote twice
`},
		{"columns count in characters, not in bytes", `
-- structures.csv --
id,kind,note,rim
A,,größer als früher,x
B,,,98
O,outfall,,
`, `
structures.csv:2:22: rim: "x" is no number: write a plain number such as 12.5
`},
		{"a fault in a quoted cell of several lines has the line of its cell", `
-- structures.csv --
id,kind,note,rim
A,,"first
second",x
B,,,98
O,outfall,,
`, `
structures.csv:3:9: rim: "x" is no number: write a plain number such as 12.5
`},
	})
}
