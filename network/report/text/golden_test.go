package text_test

import (
	"flag"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"golang.org/x/tools/txtar"

	"rimfall/network/analysis"
	"rimfall/network/report/text"
)

var update = flag.Bool("update", false, "write the output of today to testdata")

// small is a job of two pipes with a finding, a departure and a bar in a name.
const small = `
-- job.toml --
title = "Two pipes"
[storm]
return_period = 10
[criteria]
min_cover = 4
[grade]
structure_loss = "none"
-- structures.csv --
id,kind,x,y,rim
A|1,inlet,0,0,100
B,manhole,100,0,98
O,outfall,200,0,
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A|1,B,100,12,0.005,95
P2,B,O,100,15,0.005,94.2
-- areas.csv --
id,structure,area,c,time
a1,A|1,1,0.4,10
a2,B,1,0.4,10
-- rainfall.csv --
duration,10
5,6
10,4
60,1
-- departures.csv --
rule,subject,reason
cover,P2,"under the park, no wheels"
`

func smallRun(t *testing.T) *analysis.Result {
	t.Helper()
	dir := t.TempDir()
	for _, f := range txtar.Parse([]byte(small)).Files {
		if err := os.WriteFile(filepath.Join(dir, f.Name), f.Data, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	j, err := analysis.Read(dir, analysis.Options{})
	if err != nil {
		t.Fatal(err)
	}
	r, err := analysis.Run(j, analysis.Options{})
	if err != nil {
		t.Fatal(err)
	}
	return r
}

// The layout of one small job stands in testdata, to be looked at; no number is
// tested by it. `go test ./network/report/text -update` writes it anew.
func TestTheLayoutOfASmallJob(t *testing.T) {
	r := smallRun(t)
	for file, o := range map[string]text.Options{"small.txt": {}, "small.md": {Markdown: true}} {
		t.Run(file, func(t *testing.T) {
			var b strings.Builder
			if err := text.Run(&b, r, o); err != nil {
				t.Fatal(err)
			}
			path := filepath.Join("testdata", file)
			if *update {
				if err := os.MkdirAll("testdata", 0o755); err != nil {
					t.Fatal(err)
				}
				if err := os.WriteFile(path, []byte(b.String()), 0o644); err != nil {
					t.Fatal(err)
				}
			}
			want, err := os.ReadFile(path)
			if err != nil {
				t.Fatal(err)
			}
			if b.String() != string(want) {
				t.Errorf("%s differs from the output; look at both, and write it anew with -update:\n%s", path, b.String())
			}
		})
	}
}

func TestEveryOutputNamesItsStormCriteriaAndCautions(t *testing.T) {
	r := smallRun(t)
	for _, o := range []text.Options{{}, {Markdown: true}, {Table: "findings"}, {Table: "structures", Markdown: true}} {
		var b strings.Builder
		if err := text.Run(&b, r, o); err != nil {
			t.Fatal(err)
		}
		for _, want := range []string{"Two pipes", "Design storm: 10 years", "Criteria: ", "a licensed engineer checks and signs", "peaks of different pipes do not add"} {
			if !strings.Contains(b.String(), want) {
				t.Errorf("%+v: no %q in\n%s", o, want, b.String())
			}
		}
	}
}

func TestOneTableStandsAlone(t *testing.T) {
	r := smallRun(t)
	for table, want := range map[string][3]bool{"": {true, true, true}, "pipes": {true, false, false}, "structures": {false, true, false}, "findings": {false, false, true}} {
		var b strings.Builder
		if err := text.Run(&b, r, text.Options{Table: table}); err != nil {
			t.Fatal(err)
		}
		has := func(words string) bool { return strings.Contains(b.String(), words) }
		if got := [3]bool{has("Flow in the pipes"), has("\nStructures\n"), has("\nFindings: ")}; got != want {
			t.Errorf("table %q has pipes, structures and findings: %v", table, got)
		}
	}
}
