package job_test

import (
	"fmt"
	"math"
	"strings"
	"testing"

	"rimfall/network"
	"rimfall/network/job"
)

// oldLine is an invented survey: 0 and 9999 stand for what is not known.
const oldLine = `
-- job.toml --
[storm]
return_period = 10
[unknown]
values = [0, 9999]
-- structures.csv --
id,kind,rim
A,,9999
B,,98
C,,97
O,outfall,
-- pipes.csv --
id,from,to,length,size,material,n,invert_upper,invert_lower,slope,status
P1,A,B,100,12,unknown,0,95,0,,existing
P2,B,C,300,12,concrete,,9999,9999,,existing
P3,C,O,100,15,,0.015,,91,,existing
-- areas.csv --
id,structure,area,c,time
a1,A,1,0.5,0
`

// On the straight line from 95 to 91 over 500 ft, 0.008: 94.2 at B, 91.8 at C.
func TestWhatASurveyDoesNotKnowIsAssumedAndListed(t *testing.T) {
	j, err := job.Read(folder(t, oldLine), job.ToCheck, rules)
	if err != nil {
		t.Fatal(err)
	}
	n := j.Network
	for i, want := range []struct{ upper, lower, n float64 }{{95, 94.2, 0.013}, {94.2, 91.8, 0.013}, {91.8, 91, 0.015}} {
		p := &n.Pipes[i]
		if math.Abs(p.InvertUpper.V-want.upper) > 1e-9 || math.Abs(p.InvertLower.V-want.lower) > 1e-9 || math.Abs(p.Slope.V-0.008) > 1e-12 || p.N != want.n {
			t.Errorf("pipe %s: inverts %v, %v, slope %v, n %g; want %+v", p.ID, p.InvertUpper, p.InvertLower, p.Slope, p.N, want)
		}
	}
	if n.Structures[0].Rim.OK || n.Areas[0].Time.OK {
		t.Error("a rim of 9999 or an inlet time of 0 was taken as known")
	}
	var got []string
	for _, a := range n.Assumptions {
		got = append(got, fmt.Sprintf("%s %s %.2f", n.Pipes[a.Pipe].ID, a.What, a.Value))
	}
	want := "P1 n 0.01|P1 invert, lower end 94.20|P2 invert, upper end 94.20|P2 invert, lower end 91.80|P3 invert, upper end 91.80"
	if strings.Join(got, "|") != want {
		t.Errorf("assumptions %q, want %s", got, want)
	}
}

// Without [unknown] 0 is a level; a proposed pipe is never filled in.
func TestNothingIsAssumedOfWhatIsKnownOrProposed(t *testing.T) {
	known := strings.NewReplacer("[unknown]\nvalues = [0, 9999]", "", ",9999,9999,", ",94.2,91.8,", "unknown,0,95,0,", "concrete,,95,0,").Replace(oldLine)
	j, err := job.Read(folder(t, known), job.ToCheck, rules)
	if err != nil {
		t.Fatal(err)
	}
	if p := &j.Network.Pipes[0]; p.InvertLower != network.Some(0) || len(j.Network.Assumptions) != 1 { // the blank invert of P3
		t.Errorf("invert %v, assumptions %v", p.InvertLower, j.Network.Assumptions)
	}
	proposed := strings.ReplaceAll(oldLine, "existing", "proposed")
	_, err = job.Read(folder(t, proposed), job.ToCheck, rules)
	for _, pipe := range []string{"P1", "P2", "P3"} {
		if err == nil || !strings.Contains(err.Error(), "pipe "+pipe+" has no slope") {
			t.Errorf("pipe %s is proposed and has no slope: %v", pipe, err)
		}
	}
}

func TestFaultsOfWhatIsNotKnown(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"no known invert lies upstream", strings.Replace(oldLine, ",0,95,0,", ",0,9999,0,", 1), `
pipes.csv:2:32: pipe P1 has no slope, and its inverts do not lie between known ones of existing pipes: write the slope or both inverts, or a known invert farther up and farther down
pipes.csv:3:35: pipe P2 has no slope, and its inverts do not lie between known ones of existing pipes: write the slope or both inverts, or a known invert farther up and farther down
pipes.csv:4:26: pipe P3 has no slope, and its inverts do not lie between known ones of existing pipes: write the slope or both inverts, or a known invert farther up and farther down
`},
		{"the values that stand for not known are no numbers", strings.Replace(oldLine, "[0, 9999]", `["none"]`, 1), `
job.toml:4:1: values takes numbers that stand for "not known", such as [0, 9999], not the text "none"
pipes.csv:2:23: n = 0: it must be over 0
`},
		{"a size that is not known cannot be run", strings.Replace(oldLine, "P1,A,B,100,12", "P1,A,B,100,0", 1), `
pipes.csv:2:12: pipe P1 has no size: write it, or let ` + "`rimfall size`" + ` choose it
`},
	})
}
