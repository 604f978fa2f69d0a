package analysis_test

import (
	"math"
	"slices"
	"strings"
	"testing"

	"rimfall/network/analysis"
	"rimfall/network/finding"
)

// sound is a job in which no rule finds anything: A → B → O, the outfall, in a
// straight line. Both pipes are flatter than critical.
//
// The numbers of the cases rest on these, for n 0.013 and k 1.486:
//   - 12 in on S: capacity 35.6280 √S cfs, full (and half full) velocity 45.3630 √S ft/s; on 0.005 2.51928 cfs, 3.20764 ft/s;
//   - 15 in on 0.005: 52.6394 √S = 3.72217 ft/s, times 1.227185 ft² = 4.56779 cfs;
//   - half full a circle carries half of its capacity, at R = D/4.
const sound = `
-- job.toml --
[storm]
return_period = 10
[criteria]
[grade]
structure_loss = "none"
-- structures.csv --
id,kind,x,y,rim,tailwater,lowest_invert,inflow
A,manhole,0,0,100,,,0
B,manhole,100,0,98,,,0
O,outfall,200,0,,,,
-- pipes.csv --
id,from,to,length,size,wall,slope,invert_upper
P1,A,B,100,12,2,0.005,95
P2,B,O,100,15,2.25,0.005,94.2
-- areas.csv --
id,structure,area,c,time
a1,A,1,0.4,10
a2,B,1,0.4,10
-- rainfall.csv --
duration,10
5,6
10,4
60,1
`

// edits change the sound job: old text, new text, old text, …
type edits []string

// changed is the sound job with edits, each of which must find its text.
func changed(t *testing.T, e edits) string {
	t.Helper()
	text := sound
	for i := 0; i < len(e); i += 2 {
		if !strings.Contains(text, e[i]) {
			t.Fatalf("the job has no text %q to change", e[i])
		}
		text = strings.Replace(text, e[i], e[i+1], 1)
	}
	return text
}

// open is a value or a limit that a finding does not have.
var open = math.NaN()

// ruleCase is a rule with a job in which it is found, and a job next to it in
// which it is not.
type ruleCase struct {
	rule, subject string
	found         edits
	value, limit  float64
	not           edits
	size          bool // the job is sized and not checked
}

func TestTheSoundJobHasNoFinding(t *testing.T) {
	for _, f := range run(t, folder(t, sound), analysis.Options{}).Findings {
		t.Errorf("%s on %s: %s", f.Rule.Name, f.Subject, f.Message)
	}
}

func judge(t *testing.T, cases []ruleCase) {
	t.Helper()
	for _, c := range cases {
		t.Run(c.rule, func(t *testing.T) {
			o := analysis.Options{Size: c.size}
			found := ofRule(run(t, folder(t, changed(t, c.found)), o), c.rule)
			i := slices.IndexFunc(found, func(f finding.Finding) bool { return f.Subject == c.subject })
			if i < 0 {
				t.Fatalf("not found on %s, but %d others", c.subject, len(found))
			}
			f := found[i]
			number(t, "value", f.Value.V, f.Value.OK, c.value)
			number(t, "limit", f.Limit.V, f.Limit.OK, c.limit)
			if f.Message == "" || f.Storm != 10 {
				t.Errorf("storm %v, message %q", f.Storm, f.Message)
			}
			for _, f := range ofRule(run(t, folder(t, changed(t, c.not)), o), c.rule) {
				if f.Subject == c.subject {
					t.Errorf("found where it should not be: %s", f.Message)
				}
			}
		})
	}
}

func ofRule(r *analysis.Result, rule string) []finding.Finding {
	return slices.DeleteFunc(slices.Clone(r.Findings), func(f finding.Finding) bool { return f.Rule.Name != rule })
}

// number holds a number that may be absent, to the five or six digits of the comments.
func number(t *testing.T, what string, got float64, ok bool, want float64) {
	t.Helper()
	if ok == math.IsNaN(want) || ok && !(math.Abs(got-want) <= 2e-5*max(1, math.Abs(want))) {
		t.Errorf("%s %v (given: %t), want %v", what, got, ok, want)
	}
}

// P1 and a1 as they stand in the sound job, for the edits.
const (
	pipeHeading = "id,from,to,length,size,wall,slope,invert_upper"

	p1 = "P1,A,B,100,12,2,0.005,95"
	p2 = "P2,B,O,100,15,2.25,0.005,94.2"
	a1 = "a1,A,1,0.4,10"
	a2 = "a2,B,1,0.4,10"
)

// criteria adds a line to the criteria.
func criteria(line string) edits { return edits{"[criteria]\n", "[criteria]\n" + line + "\n"} }

// inflowB makes 2.283895 cfs, half the capacity of P2, the only flow of the job,
// under a receiving water.
func inflowB(tailwater string) edits {
	return edits{
		a1, "a1,A,1,0,10", a2, "a2,B,1,0,10", "B,manhole,100,0,98,,,0", "B,manhole,100,0,98,,,2.283895",
		"O,outfall,200,0,,,,", "O,outfall,200,0,," + tailwater + ",,",
	}
}

func with(all ...edits) edits { return slices.Concat(all...) }
