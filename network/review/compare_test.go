package review_test

import (
	"fmt"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"

	"golang.org/x/tools/txtar"
	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/networktest"
	"rimfall/network/review"
)

// twoPipes is an invented job: 2 acres of C 0.5 to the head, rain of 4 in/h at any time, so
// 4 cfs. A 15 in pipe at 0.005 carries (1.486/0.013) · 1.2272 ft² · (0.3125 ft)^(2/3) · √0.005 = 4.57 cfs.
const twoPipes = `
-- job.toml --
title = "Two pipes"
units = "us"
[storm]
return_period = 10
-- structures.csv --
id,kind,rim
A,inlet,106
B,manhole,105
OUT,outfall,103
-- pipes.csv --
id,from,to,length,size,invert_upper,invert_lower
P1,A,B,200,15,101,100
P2,B,OUT,200,15,99.9,98.9
-- areas.csv --
id,structure,area,c,time
F1,A,2,0.5,10
-- rainfall.csv --
duration,10
5,4
60,4
`

// asRun writes a job folder from an archive, in which texts are replaced pair by pair, and runs it.
func asRun(t testing.TB, archive string, replace ...string) *analysis.Result {
	t.Helper()
	for i := 0; i < len(replace); i += 2 {
		if !strings.Contains(archive, replace[i]) {
			t.Fatalf("no %q in the archive", replace[i])
		}
	}
	dir := t.TempDir()
	for _, f := range txtar.Parse([]byte(strings.NewReplacer(replace...).Replace(archive))).Files {
		if err := os.WriteFile(filepath.Join(dir, f.Name), f.Data, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	return asRunOf(t, dir, analysis.Options{})
}

func asRunOf(t testing.TB, dir string, o analysis.Options) *analysis.Result {
	t.Helper()
	j, err := analysis.Read(dir, o)
	if err != nil {
		t.Fatal(err)
	}
	r, err := analysis.Run(j, o)
	if err != nil {
		t.Fatal(err)
	}
	return r
}

func asCompared(t testing.TB, before, after *analysis.Result) *review.Comparison {
	t.Helper()
	c, err := review.Compare(before, after)
	if err != nil {
		t.Fatal(err)
	}
	return c
}

// told lists everything that a comparison found, a line each.
func told(c *review.Comparison) []string {
	var all []string
	for _, s := range c.Settings {
		all = append(all, "setting "+s.Key)
	}
	for _, e := range c.Added {
		all = append(all, "added "+e.Kind.String()+" "+e.ID)
	}
	for _, e := range c.Removed {
		all = append(all, "removed "+e.Kind.String()+" "+e.ID)
	}
	for _, e := range c.Changed {
		for _, g := range e.Given {
			all = append(all, fmt.Sprintf("given %s %s %s", e.Kind, e.ID, g.Key))
		}
	}
	for _, f := range c.Findings.New {
		all = append(all, "new "+f.After.Rule.Name+" "+f.After.Subject)
	}
	for _, f := range c.Findings.Worse {
		all = append(all, "worse "+f.After.Rule.Name+" "+f.After.Subject)
	}
	for _, f := range c.Findings.Cured {
		all = append(all, "cured "+f.Before.Rule.Name+" "+f.Before.Subject)
	}
	return all
}

// comparedCase is a change to twoPipes and what a comparison with it tells.
type comparedCase struct {
	name    string
	replace []string
	want    []string // these stand in what is told
	not     []string // and no line begins with these
	worse   bool
}

var comparedCases = []comparedCase{
	{
		"a job is like itself", nil, nil,
		[]string{"setting", "added", "removed", "given", "new", "worse", "cured"},
		false,
	},
	{
		"rows in another order change nothing",
		[]string{"P1,A,B,200,15,101,100\nP2,B,OUT,200,15,99.9,98.9\n", "P2,B,OUT,200,15,99.9,98.9\nP1,A,B,200,15,101,100\n"},
		nil,
		[]string{"setting", "added", "removed", "given", "new", "worse", "cured"},
		false,
	},
	{
		"an area that comes brings 5 cfs, over 4.57",
		[]string{"F1,A,2,0.5,10\n", "F1,A,2,0.5,10\nF2,A,0.5,0.5,10\n"},
		[]string{"added area F2", "new capacity P1", "new capacity P2"},
		[]string{"removed", "given", "cured capacity"},
		true,
	},
	{
		"a pipe of another size is given and cures nothing that was not there",
		[]string{"P2,B,OUT,200,15", "P2,B,OUT,200,18"},
		[]string{"given pipe P2 size"},
		[]string{"added", "removed", "worse"},
		true, // crowns no longer line up
	},
	{
		"a pipe under another id was removed and added",
		[]string{"P2,B", "P9,B"},
		[]string{"added pipe P9", "removed pipe P2"},
		[]string{"given pipe"},
		false,
	},
	{
		"a pipe that leads elsewhere is the same pipe with another end",
		[]string{"OUT,outfall", "OUT,outfall,103\nELSE,outfall", "B,OUT", "B,ELSE"},
		[]string{"added structure ELSE", "given pipe P2 to", "new unused-outfall OUT"},
		[]string{"removed"},
		false, // the notice does not count
	},
	{
		"other criteria are settings",
		[]string{"return_period = 10", "return_period = 10\n[criteria]\nmin_cover = 8"},
		[]string{"setting min_cover", "new cover P1", "new cover P2"},
		[]string{"given"},
		true,
	},
	{
		"other rain under the same name is told", []string{"5,4\n", "5,4.1\n"}, []string{"setting intensities"}, []string{"given", "setting rainfall"}, false,
	},
}

func TestComparisonNamesWhatChanged(t *testing.T) {
	for _, c := range comparedCases {
		t.Run(c.name, func(t *testing.T) {
			got := asCompared(t, asRun(t, twoPipes), asRun(t, twoPipes, c.replace...))
			lines := told(got)
			for _, w := range c.want {
				if !slices.Contains(lines, w) {
					t.Errorf("no %q in %q", w, lines)
				}
			}
			for _, n := range c.not {
				if slices.ContainsFunc(lines, func(l string) bool { return strings.HasPrefix(l, n) }) {
					t.Errorf("a line with %q in %q", n, lines)
				}
			}
			if got.Worse() != c.worse {
				t.Errorf("became worse: %t, want %t; %q", got.Worse(), c.worse, lines)
			}
		})
	}
}

func TestJobsInTwoSystemsOfUnitsAreNotCompared(t *testing.T) {
	si := asRun(t, twoPipes, `units = "us"`, `units = "si"`, "15,101", "375,101", "15,99.9", "375,99.9")
	if _, err := review.Compare(asRun(t, twoPipes), si); err == nil || !strings.Contains(err.Error(), "units") {
		t.Errorf("error: %v", err)
	}
}

// What is added one way is removed the other way, and what is new is cured.
func TestComparisonTurnsAround(t *testing.T) {
	rapid.Check(t, func(rt *rapid.T) {
		draw := func(name string) *analysis.Result {
			n := networktest.New(networktest.Forest, rapid.IntRange(2, 12).Draw(rt, name))
			for i := range n.Areas {
				n.Areas[i].Area *= float64(rapid.IntRange(1, 40).Draw(rt, name+" area"))
			}
			return ofNetwork(t, n)
		}
		a, b := draw("before"), draw("after")
		there, back := asCompared(t, a, b), asCompared(t, b, a)
		if len(there.Added) != len(back.Removed) || len(there.Removed) != len(back.Added) || len(there.Changed) != len(back.Changed) {
			rt.Fatalf("added %d, removed %d, changed %d; the other way %d, %d, %d", len(there.Added), len(there.Removed), len(there.Changed),
				len(back.Added), len(back.Removed), len(back.Changed))
		}
		if len(there.Findings.New) != len(back.Findings.Cured) || len(there.Findings.Cured) != len(back.Findings.New) {
			rt.Fatalf("findings %d new, %d cured; the other way %d, %d", len(there.Findings.New), len(there.Findings.Cured), len(back.Findings.New), len(back.Findings.Cured))
		}
	})
}

func ofNetwork(t testing.TB, n *network.Network) *analysis.Result {
	t.Helper()
	dir, err := os.MkdirTemp(t.TempDir(), "job")
	if err != nil {
		t.Fatal(err)
	}
	if err := networktest.WriteFolder(dir, n); err != nil {
		t.Fatal(err)
	}
	return asRunOf(t, dir, analysis.Options{})
}
