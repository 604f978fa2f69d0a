package drawing_test

import (
	"errors"
	"fmt"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"rimfall/network/report/drawing"
)

// writeJob writes an invented job of a number of structures: a chain, or a comb of short branches on a trunk, in feet.
// Every tooth of the comb is an inlet at the head of one pipe.
func writeJob(t testing.TB, structures int, comb bool, spacing float64) string {
	t.Helper()
	var s, p, a strings.Builder
	s.WriteString("id,kind,x,y,rim\n")
	p.WriteString("id,from,to,material\n")
	a.WriteString("id,structure,area,c,time\n")
	trunk := structures - 1
	if comb {
		trunk /= 2
	}
	side := func(i int) (x, y float64) { // the trunk runs to and fro, so that it fits on a plan
		row, column := i/30, i%30
		if row%2 == 1 {
			column = 29 - column
		}
		return float64(column) * spacing, float64(row) * 260
	}
	for i := range trunk {
		x, y := side(i)
		rim := 900 - 0.006*spacing*float64(i)
		fmt.Fprintf(&s, "M%d,manhole,%g,%g,%g\n", i, x, y, rim)
		fmt.Fprintf(&a, "a%d,M%d,0.02,0.6,10\n", i, i)
		to := fmt.Sprintf("M%d", i+1)
		if i == trunk-1 {
			to = "OUT"
		}
		fmt.Fprintf(&p, "P%d,M%d,%s,concrete\n", i, i, to)
		if comb {
			fmt.Fprintf(&s, "I%d,inlet,%g,%g,%g\n", i, x, y+90, rim+1)
			fmt.Fprintf(&p, "L%d,I%d,M%d,concrete\n", i, i, i)
			fmt.Fprintf(&a, "b%d,I%d,0.05,0.8,8\n", i, i)
		}
	}
	x, y := side(trunk)
	fmt.Fprintf(&s, "OUT,outfall,%g,%g,%g\n", x, y, 900-0.006*spacing*float64(trunk))
	dir := t.TempDir()
	for name, text := range map[string]string{
		"job.toml":       "title = \"Invented\"\n[storm]\nreturn_period = 10\ncheck_period = 25\n",
		"structures.csv": s.String(), "pipes.csv": p.String(), "areas.csv": a.String(),
		"rainfall.csv": "duration,10,25\n5,6,7\n1440,0.2,0.25\n",
	} {
		if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	return dir
}

// A line that is too long for one sheet goes on at match lines, and loses nothing on the way.
func TestALongLineGoesOnAtMatchLines(t *testing.T) {
	r := runJob(t, writeJob(t, 120, false, 150))
	sheets, _, err := drawing.Profiles(r, drawing.ProfileOptions{})
	if err != nil {
		t.Fatal(err)
	}
	if len(sheets) < 3 {
		t.Fatalf("119 pipes of 150 ft stand on %d sheets", len(sheets))
	}
	pipes := 0
	for i, s := range sheets {
		holdSheet(t, s)
		have := "\n" + strings.Join(texts(t, s), "\n") + "\n"
		matches := strings.Count(have, "match line")
		if want := 2; i > 0 && i < len(sheets)-1 && matches != want || matches == 0 {
			t.Errorf("sheet %s has %d match lines", s.Name, matches)
		}
		for k := range r.Network.Pipes {
			pipes += strings.Count(have, "\n"+r.Network.Pipes[k].ID+"\n")
		}
	}
	if pipes != len(r.Network.Pipes) {
		t.Errorf("the tables have %d pipes, the network %d", pipes, len(r.Network.Pipes))
	}
}

// At fixed scales a line goes on where its length or its levels no longer fit; a pipe that is too long by itself is an error.
func TestFixedScalesHoldOnEverySheet(t *testing.T) {
	r := runJob(t, writeJob(t, 60, false, 150))
	sheets, _, err := drawing.Profiles(r, drawing.ProfileOptions{Along: 40, Up: 4})
	if err != nil {
		t.Fatal(err)
	}
	if len(sheets) < 60*150/40/12 {
		t.Errorf("59 pipes of 150 ft at 1 in = 40 ft stand on %d sheets", len(sheets))
	}
	for _, s := range sheets {
		holdSheet(t, s)
		if all := strings.Join(texts(t, s), " "); !strings.Contains(all, "horizontal 1 in = 40 ft, vertical 1 in = 4 ft; vertical exaggeration 10 : 1") {
			t.Errorf("%s does not state the scales that were asked for", s.Name)
		}
	}
	var no drawing.NoScale
	if _, _, err := drawing.Profiles(r, drawing.ProfileOptions{Along: 5}); !errors.As(err, &no) {
		t.Errorf("150 ft of pipe, 30 in long on paper, gave %v", err)
	}
	if _, _, err := drawing.Plan(r, drawing.PlanOptions{Scale: 10}); !errors.As(err, &no) {
		t.Errorf("a plan too large for its paper gave %v", err)
	}
}

// Where structures stand closer than their numbers are wide, the columns of the table are spread, and when that is not
// enough a further sheet takes over.
func TestStructuresCloseTogetherKeepTheirNumbersApart(t *testing.T) {
	r := runJob(t, writeJob(t, 29, false, 9))
	sheets, _, err := drawing.Profiles(r, drawing.ProfileOptions{})
	if err != nil {
		t.Fatal(err)
	}
	if len(sheets) < 2 {
		t.Errorf("29 columns stand on one sheet")
	}
	for _, s := range sheets {
		holdSheet(t, s)
	}
}

// On a plan that is too full labels are left out and counted, never printed over one another.
func TestAFullPlanLeavesLabelsOutAndCountsThem(t *testing.T) {
	r := runJob(t, writeJob(t, 1000, true, 150))
	sheet, notes, err := drawing.Plan(r, drawing.PlanOptions{})
	if err != nil {
		t.Fatal(err)
	}
	holdSheet(t, sheet)
	if notes.NoRoom == 0 {
		t.Error("a thousand structures with two thousand labels all found room on a small sheet")
	}
}

func BenchmarkPlan(b *testing.B) {
	for _, comb := range []bool{false, true} {
		name := map[bool]string{false: "chain", true: "comb"}[comb]
		b.Run(name+"/1000", func(b *testing.B) {
			r := runJob(b, writeJob(b, 1000, comb, 150))
			for b.Loop() {
				sheet, _, err := drawing.Plan(r, drawing.PlanOptions{})
				if err != nil {
					b.Fatal(err)
				}
				b.SetBytes(int64(len(sheet.Page.Bytes())))
			}
		})
	}
}

func BenchmarkProfiles(b *testing.B) {
	for _, comb := range []bool{false, true} {
		name := map[bool]string{false: "chain", true: "comb"}[comb]
		b.Run(name+"/1000", func(b *testing.B) {
			r := runJob(b, writeJob(b, 1000, comb, 150))
			for b.Loop() {
				sheets, _, err := drawing.Profiles(r, drawing.ProfileOptions{})
				if err != nil {
					b.Fatal(err)
				}
				bytes := 0
				for _, s := range sheets {
					bytes += len(s.Page.Bytes())
				}
				b.SetBytes(int64(bytes))
				b.ReportMetric(float64(len(sheets)), "sheets")
			}
		})
	}
}
