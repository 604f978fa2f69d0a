package job_test

import (
	"testing"

	"rimfall/network/job"
)

func TestFaultsOfTheNetwork(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"pipes run in a circle", `
-- structures.csv --
id,kind
A,
B,
C,
O,outfall
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,0.01,95
P2,B,C,100,15,0.01,93.9
P3,C,A,100,15,0.01,92.8
P4,C,O,100,15,.01,91
`, `
pipes.csv:2:6: pipes run in a circle: A → B → C → A; turn one of them round
pipes.csv:4:1: structure C has 2 pipes out, so pipe P3 needs a share of its flow (0 to 1; the shares add up to 1)
pipes.csv:5:1: structure C has 2 pipes out, so pipe P4 needs a share of its flow (0 to 1; the shares add up to 1)
`},
		{"pipes run in two circles apart", `
-- structures.csv --
id,kind
A,
B,
C,
D,
O,outfall
M,
-- pipes.csv --
id,from,to,length,size,slope
P1,A,B,100,12,0.01
P2,B,A,100,15,0.01
P3,C,D,100,15,0.01
P4,D,C,100,15,.01
P5,M,O,100,12,.01
`, `
pipes.csv:2:6: pipes run in a circle: A → B → A; turn one of them round
pipes.csv:4:6: pipes run in a circle: C → D → C; turn one of them round
`},
		{"a structure has no way to an outfall", `
-- structures.csv --
id,kind,rim
A,,100
B,,98
X,inlet,90
O,outfall,
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,X,100,12,0.01,95
P2,B,O,100,15,0.01,93.9
`, `
structures.csv:4:1: structure X has no way to an outfall: no pipe leaves it, and its kind is inlet
`},
		{"a structure is joined to nothing", `
-- structures.csv --
id,kind,rim
A,,100
B,,98
X,inlet,90
O,outfall,
`, `
structures.csv:4:1: structure X has no way to an outfall: no pipe joins it to the network, and its kind is inlet
`},
		{"a pipe leaves an outfall", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,0.01,95
P2,B,O,100,15,0.01,93.9
P3,O,A,10,12,.01,90
`, `
pipes.csv:2:6: pipes run in a circle: A → B → O → A; turn one of them round
pipes.csv:4:4: pipe P3 leaves the outfall O; an outfall is where the water leaves the network: turn the pipe round, or make O a manhole
`},
		{"no structure is an outfall", `
-- structures.csv --
id,kind,rim
A,,100
B,,98
O,,
`, `
structures.csv: no outfall: give the structure at which the water leaves the network the kind outfall
structures.csv:4:1: structure O has no way to an outfall: no pipe leaves it, and its kind is manhole
`},
		{"several pipes leave a structure without shares", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,0.01,95
P2,B,O,100,15,0.01,93.9
P3,A,O,10,12,.01,90
`, `
pipes.csv:2:1: structure A has 2 pipes out, so pipe P1 needs a share of its flow (0 to 1; the shares add up to 1)
pipes.csv:4:1: structure A has 2 pipes out, so pipe P3 needs a share of its flow (0 to 1; the shares add up to 1)
`},
		{"shares do not add up to 1", `
-- pipes.csv --
id,from,to,length,size,slope,share
P1,A,B,100,12,0.01,0.6
P2,B,O,100,15,0.01,
P3,A,O,10,12,.01,0.3
`, `
pipes.csv:2:20: the shares of the pipes out of structure A add up to 0.9; they must add up to 1
`},
		{"the share of the only pipe out is not 1", `
-- pipes.csv --
id,from,to,length,size,slope,share
P1,A,B,100,12,0.01,0.6
P2,B,O,100,15,0.01,1
`, `
pipes.csv:2:20: the shares of the pipes out of structure A add up to 0.6; they must add up to 1
`},
		{"shares of thirds written with six digits are taken", `
-- pipes.csv --
id,from,to,length,size,slope,share
P1,A,B,100,12,0.01,0.333333
P2,B,O,100,15,0.01,
P3,A,O,10,12,.01,0.333333
P4,A,O,10,12,.01,0.333333
`, ""},
		{"faults of several files come in one go, in order of file and place", `
-- job.toml --
[storm]
return_period = 10
uplfit = 1.1
-- structures.csv --
id,kind,rim
A,,x
B,,98
O,outfal,
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,Q,-100,12,0.01,95
P2,B,O,100,0,0.01,93.9
-- areas.csv --
id,structure,area,c,time
a1,A,1,2,ten
a1,B,,0.5,10
-- rainfall.csv --
duration,2,10
5,3,NaN
60,1,2
`, `
areas.csv:2:8: c = 2: a runoff coefficient lies between 0 and 1
areas.csv:2:10: time: "ten" is no number: write a plain number such as 12.5
areas.csv:3:1: id "a1" stands twice, first in line 2
areas.csv:3:6: area is blank: write a number
job.toml:3:1: unknown setting "storm.uplfit": did you mean "uplift"?
pipes.csv:2:6: unknown structure "Q"; did you mean "A"?
pipes.csv:2:8: length = -100: it must be over 0
pipes.csv:3:12: size "0": a size is over 0
rainfall.csv:2:5: intensity: "NaN" is no number: write a finite number, or leave the cell blank
structures.csv: no outfall: give the structure at which the water leaves the network the kind outfall
structures.csv:2:4: rim: "x" is no number: write a plain number such as 12.5
structures.csv:4:3: kind: unknown word "outfal": did you mean "outfall"?
`},
		{"a file that is missing does not hide the faults of the others", `
-- structures.csv --
absent
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,-100,12,0.01,95
P2,B,O,100,15,0.01,93.9
-- areas.csv --
id,structure,area,c,time
a1,A,1,2,10
`, `
areas.csv:2:8: c = 2: a runoff coefficient lies between 0 and 1
pipes.csv:2:8: length = -100: it must be over 0
structures.csv: missing file
`},
	})
}
