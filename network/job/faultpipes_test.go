package job_test

import (
	"testing"

	"rimfall/network/job"
)

func TestFaultsOfPipes(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"the file is missing", `
-- pipes.csv --
absent
`, `
pipes.csv: missing file
`},
		{"columns of the ends are missing", `
-- pipes.csv --
id,length,size,slope
P1,100,12,0.01
`, `
pipes.csv:1:1: missing column "from"
pipes.csv:1:1: missing column "to"
`},
		{"a length is zero, negative, blank or a word", `
-- structures.csv --
id,kind
A,
B,
C,
D,
O,outfall
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,0,12,0.01,95
P2,B,O,-3,15,0.01,93.9
P3,C,O,,12,.01,9
P4,D,O,far,12,.01,9
`, `
pipes.csv:2:8: length = 0: it must be over 0
pipes.csv:3:8: length = -3: it must be over 0
pipes.csv:4:8: length is blank, and C and O have no coordinates to take it from
pipes.csv:5:8: length: "far" is no number: write a plain number such as 12.5
`},
		{"structures without a distance between them give no length", `
-- structures.csv --
id,kind,x,y
A,,1,1
B,,1,1
O,outfall,5,5
-- pipes.csv --
id,from,to,size,slope
P1,A,B,12,0.01
P2,B,O,12,0.01
`, `
pipes.csv:2:1: length is blank, and A and B stand at the same place
`},
		{"a size is zero, negative or a word", `
-- structures.csv --
id,kind
A,
B,
C,
O,outfall
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,0,0.01,95
P2,B,O,100,-12,0.01,93.9
P3,C,O,100,big,0.01,90
`, `
pipes.csv:2:12: size "0": a size is over 0
pipes.csv:3:12: size "-12": a size is over 0
pipes.csv:4:12: size "big": "big" is no size: write a number, if need be with in, ft, mm or m
`},
		{"a size is hexadecimal, not finite or with an unknown unit", `
-- structures.csv --
id,kind
A,
B,
C,
O,outfall
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,0x18,0.01,95
P2,B,O,100,inf,0.01,93.9
P3,C,O,100,12 furlongs,0.01,90
`, `
pipes.csv:2:12: size "0x18": a circle has one size, its diameter; for span x rise name the shape
pipes.csv:3:12: size "inf": "inf" is no size: write a number, if need be with in, ft, mm or m
pipes.csv:4:12: size "12 furlongs": "12furlongs" is no size: write a number, if need be with in, ft, mm or m
`},
		{"a size is blank and the pipe is to be checked", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,,0.01,95
P2,B,O,100,15,0.01,93.9
`, "pipes.csv:2:12: pipe P1 has no size: write it, or let `rimfall size` choose it"},
		{"a pipe to be checked has neither slope nor both inverts", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,,95
P2,B,O,100,15,,
`, "pipes.csv:2:15: pipe P1 has no slope: write the slope or both inverts, or let `rimfall size` choose them\npipes.csv:3:15: pipe P2 has no slope: write the slope or both inverts, or let `rimfall size` choose them"},
		{"a length and a size are smaller than any quantity, an invert larger", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,1e-300,1e-300,0.01,95
P2,B,O,100,1e300,0.01,-1e16
`, `
pipes.csv:2:8: length = 1e-300: no length is that small
pipes.csv:2:15: size "1e-300": a size is over 0
pipes.csv:3:12: size "1e300": "1e300" is no size: write a number, if need be with in, ft, mm or m
pipes.csv:3:23: invert_upper: "-1e16" is no number: no quantity is that large
`},
		{"n is zero or negative", `
-- pipes.csv --
id,from,to,length,size,slope,n
P1,A,B,100,12,.01,0
P2,B,O,100,12,.01,-0.013
`, `
pipes.csv:2:19: n = 0: it must be over 0
pipes.csv:3:19: n = -0.013: it must be over 0
`},
		{"slopes are in percent", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,1%,95
P2,B,O,100,15,0.01,93.9
`, `
pipes.csv:2:15: slope: "1%" is no number: percent are not taken: write rise over run, 0.005 for 0.5 %
`},
		{"a structure is unknown", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,AA,B,100,12,0.01,95
P2,B,nowhere,100,15,0.01,93.9
`, `
pipes.csv:2:4: unknown structure "AA"; did you mean "A"?
pipes.csv:3:6: unknown structure "nowhere"
`},
		{"a structure is not named", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,,B,100,12,0.01,95
P2,B,,100,15,0.01,93.9
`, `
pipes.csv:2:4: from is blank: name a structure
pipes.csv:3:6: to is blank: name a structure
`},
		{"an id stands twice", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,0.01,95
P1,B,O,100,15,0.01,93.9
`, `
pipes.csv:3:1: id "P1" stands twice, first in line 2
`},
		{"a pipe starts and ends at one structure", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,0.01,95
P2,B,O,100,15,0.01,93.9
P3,B,B,10,12,0.01,95
`, `
pipes.csv:4:6: pipe P3 starts and ends at structure B
`},
		{"three levels disagree by more than 0.02 ft", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper,invert_lower
P1,A,B,100,12,0.01,95,93.97
P2,B,O,100,15,0.01,93.9,92.915
`, `
pipes.csv:2:15: inverts and slope disagree: the inverts fall 1.03 over 100, which is a slope of 0.0103, not 0.01; leave one of the three blank
`},
		{"three levels disagree by more than 6 mm", `
-- job.toml --
units = "si"
[storm]
return_period = 10
-- pipes.csv --
id,from,to,length,size,slope,invert_upper,invert_lower
P1,A,B,100,300,0.01,95,93.993
P2,B,O,100,375,0.01,93.9,92.895
`, `
pipes.csv:2:16: inverts and slope disagree: the inverts fall 1.007 over 100, which is a slope of 0.01007, not 0.01; leave one of the three blank
`},
		{"the shape is no shape", `
-- pipes.csv --
id,from,to,length,shape,size,slope
P1,A,B,100,round,12,.01
P2,B,O,100,elipse,30x19,.01
`, `
pipes.csv:2:12: shape: unknown word "round": known: arch, box, circle, ellipse, ellipse-upright, pipe-arch
pipes.csv:3:12: shape: unknown word "elipse": did you mean "ellipse"?
pipes.csv:3:19: size "30x19": a circle has one size, its diameter; for span x rise name the shape
`},
		{"a circle has a span and a rise", `
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12x12,0.01,95
P2,B,O,100,15,0.01,93.9
`, `
pipes.csv:2:12: size "12x12": a circle has one size, its diameter; for span x rise name the shape
`},
		{"a box has one size only", `
-- pipes.csv --
id,from,to,length,shape,size,slope
P1,A,B,100,box,48,.01
P2,B,O,100,box,48x36x2,.01
`, `
pipes.csv:2:16: size "48": the size of shape box is span x rise, such as 96 x 72 or 8ft x 6ft
pipes.csv:3:16: size "48x36x2": the size of shape box is span x rise, such as 96 x 72 or 8ft x 6ft
`},
		{"a box is so small that feet were meant", `
-- pipes.csv --
id,from,to,length,shape,size,slope
P1,A,B,100,box,8x6,.01
P2,B,O,100,box,48x23,.01
`, `
pipes.csv:2:16: size "8x6": a box under 24 in: name the unit, such as 8ft x 6ft or 8in x 6in, if that is meant
pipes.csv:3:16: size "48x23": a box under 24 in: name the unit, such as 8ft x 6ft or 48in x 23in, if that is meant
`},
		{"span and rise are changed about", `
-- structures.csv --
id,kind
A,
B,
C,
O,outfall
-- pipes.csv --
id,from,to,length,shape,size,slope
P1,A,B,100,ellipse,19x30,.01
P2,B,O,100,ellipse-upright,30x19,.01
P3,C,O,100,arch,18x29,.01
`, `
pipes.csv:2:20: size "19x30": the shape ellipse is wider than high: write span x rise, 30 x 19
pipes.csv:3:28: size "30x19": an upright ellipse is higher than wide: write span x rise, 19 x 30, or name the shape ellipse
pipes.csv:4:17: size "18x29": the shape arch is wider than high: write span x rise, 29 x 18
`},
		{"the number of barrels is no whole number over 0", `
-- structures.csv --
id,kind
A,
B,
C,
D,
O,outfall
-- pipes.csv --
id,from,to,length,size,slope,count
P1,A,B,100,12,.01,0
P2,B,O,100,12,.01,1.5
P3,C,O,100,12,.01,two
P4,D,O,100,12,.01,-1
`, `
pipes.csv:2:19: count = 0: it must be over 0
pipes.csv:3:19: count = 1.5: it is a whole number of barrels
pipes.csv:4:19: count: "two" is no number: write a plain number such as 12.5
pipes.csv:5:19: count = -1: it must be over 0
`},
		{"the status is neither proposed nor existing", `
-- pipes.csv --
id,from,to,length,size,slope,status
P1,A,B,100,12,.01,old
P2,B,O,100,12,.01,existing
`, `
pipes.csv:2:19: status: unknown word "old": known: existing, proposed
`},
		{"a wall is negative or a word", `
-- pipes.csv --
id,from,to,length,size,slope,wall
P1,A,B,100,12,.01,-2
P2,B,O,100,12,.01,thick
`, `
pipes.csv:2:19: wall = -2: it must not be negative
pipes.csv:3:19: wall: "thick" is no number: write a plain number such as 12.5
`},
		{"a material has no n in the list and the pipe gives none", `
-- pipes.csv --
id,from,to,length,size,slope,material,n
P1,A,B,100,12,.01,concret,
P2,B,O,100,12,.01,oak,0.012
`, `
pipes.csv:2:19: material "concret" has no n in the list, so write n; did you mean "concrete"?
`},
	})
}
