package job_test

import (
	"testing"

	"rimfall/network/job"
)

func TestFaultsThatKeepAJobFromBeingSized(t *testing.T) {
	check(t, job.ToSize, []faultCase{
		{"a size is to be chosen on a level pipe or a rising one", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper,invert_lower
P1,A,B,100,,0,,
P2,B,O,100,,,90,90.5
`, `
pipes.csv:2:13: pipe P1 is to be sized on a slope of 0; a size can be chosen only where the pipe falls to its lower end
pipes.csv:3:13: pipe P2 is to be sized on a slope of -0.005; a size can be chosen only where the pipe falls to its lower end
`},
		{"a head has neither rim nor upper invert", `
-- structures.csv --
id,kind,rim
A,,
B,,98
O,outfall,
-- pipes.csv --
id,from,to,length
P1,A,B,100
P2,B,O,100
`, `
structures.csv:2:4: structure A is the head of pipe P1 and has no rim, and the pipe has no upper invert: give one of them
`},
		{"no size of the shape is in the catalogue", `
-- pipes.csv --
id,from,to,length,shape,material
P1,A,B,100,arch,brick
P2,B,O,100,circle,cast-iron
`, `
pipes.csv:2:1: pipe P1 has no size, and no arch of brick is in the catalogue to choose from: write the size, or list sizes in catalog.csv
pipes.csv:3:1: pipe P2 has no size, and no circle of cast-iron is in the catalogue to choose from: write the size, or list sizes in catalog.csv
`},
		{"the list of sizes has a bad number and a size twice", `
-- catalog.csv --
shape,span,wall
circle,12,2
circle,twelve,2
circle,12,3
-- pipes.csv --
id,from,to,length
P1,A,B,100
P2,B,O,100
`, `
catalog.csv:3:8: span "twelve" is not a number: a plain decimal such as 36 or 2.5 is wanted
catalog.csv:4:8: size 12 of series "own sizes" stands in line 2 already: give it another series or take one out
`},
		{"blank sizes, slopes and inverts are taken", `
-- pipes.csv --
id,from,to,length
P1,A,B,100
P2,B,O,100
`, ""},
		{"a size that is given on a level pipe is taken", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,0,95
P2,B,O,100,15,,
`, ""},
	})
}
