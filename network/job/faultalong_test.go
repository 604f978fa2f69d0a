package job_test

import (
	"testing"

	"rimfall/network"
	"rimfall/network/job"
)

func TestFaultsOfGround(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"a pipe is unknown or blank", `
-- ground.csv --
pipe,station,elevation
P3,50,99
,50,99
`, `
ground.csv:2:1: unknown pipe "P3"; did you mean "P1"?
ground.csv:3:1: pipe is blank: name a pipe
`},
		{"a station is beyond the pipe, negative, blank, or a word", `
-- ground.csv --
pipe,station,elevation
P1,100.03,99
P1,-1,99
P1,,99
P1,half,99
`, `
ground.csv:2:4: station 100.03 is beyond the lower end of pipe P1, which is 100 ft long; stations count along the pipe from its upper end
ground.csv:3:4: station = -1: it must not be negative
ground.csv:4:4: station is blank: write the distance from the upper end of the pipe
ground.csv:5:4: station: "half" is no number: write a plain number such as 12.5
`},
		{"a level is blank, and one stands twice", `
-- ground.csv --
pipe,station,elevation
P1,50,
P1,60,99
P1,60.0,98
`, `
ground.csv:2:7: elevation is blank: write a number
ground.csv:4:4: pipe P1 has a ground level at 60.0 already, in line 3
`},
		{"a column is missing", `
-- ground.csv --
pipe,station
P1,50
`, `
ground.csv:1:1: missing column "elevation"
`},
	})
}

func TestFaultsOfCrossings(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"every cell that can be wrong is wrong", `
-- crossings.csv --
pipe,station,name,top,bottom
P9,50,main,97,96
P1,120,main,97,96
P1,50,,97,96
P1,50,main,,96
P1,50,main,97,NaN
P1,50,main,96,97
`, `
crossings.csv:2:1: unknown pipe "P9"; did you mean "P1"?
crossings.csv:3:4: station 120 is beyond the lower end of pipe P1, which is 100 ft long; stations count along the pipe from its upper end
crossings.csv:4:7: name is blank: say what crosses, for example "water main"
crossings.csv:5:12: top is blank: write a number
crossings.csv:6:15: bottom: "NaN" is no number: write a finite number, or leave the cell blank
crossings.csv:7:12: top 96 is under bottom 97: write the levels of the outside of the service
`},
	})
}

func TestGroundComesInTheOrderOfThePipesWhateverTheOrderOfTheRows(t *testing.T) {
	j, err := job.Read(folder(t, `
-- ground.csv --
elevation;pipe;station
97,5;P2;80
99;P1;50
98,25;P2;20
`), job.ToCheck, rules)
	if err != nil {
		t.Fatal(err)
	}
	over := j.Network.GroundOver(1)
	if len(over) != 2 || over[0].Station != 20 || over[0].Elevation != 98.25 || over[1].Station != 80 {
		t.Errorf("over P2 lies %+v", over)
	}
	if over := j.Network.GroundOver(0); len(over) != 1 || over[0].Elevation != 99 {
		t.Errorf("over P1 lies %+v", over)
	}
}

func TestCrossingsAndTheLeastGapAreRead(t *testing.T) {
	j, err := job.Read(folder(t, `
-- job.toml --
[storm]
return_period = 10
[criteria]
min_clearance = 2.5
[files]
crossings = "services.csv"
-- services.csv --
# by the water company
pipe,station,name,top,bottom,note
P1,40,water main 6 in,97.1,96.5,pot-holed
`), job.ToCheck, rules)
	if err != nil {
		t.Fatal(err)
	}
	want := network.Crossing{Pipe: 0, Station: 40, Name: "water main 6 in", Top: 97.1, Bottom: 96.5, Line: 3}
	if got := j.Network.Crossings; len(got) != 1 || got[0] != want {
		t.Errorf("crossings %+v", got)
	}
	if got := j.Settings.Criteria.MinClearance; got != network.Some(2.5) {
		t.Errorf("least gap %v", got)
	}
}
