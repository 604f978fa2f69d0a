package drawing_test

import (
	"bytes"
	"errors"
	"os"
	"path/filepath"
	"regexp"
	"slices"
	"strconv"
	"strings"
	"testing"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/report"
	"rimfall/network/report/drawing"
)

const ferryBank = "../../../testdata/drawing/ferry-bank"

// jobs are the job of this package and all example jobs.
func jobs(t testing.TB) []string {
	t.Helper()
	dirs := []string{ferryBank}
	files, err := filepath.Glob("../../../examples/*/job.toml")
	if err != nil {
		t.Fatal(err)
	}
	for _, f := range files {
		dirs = append(dirs, filepath.Dir(f))
	}
	return dirs
}

// allSheets draws everything of a run.
func allSheets(t reporter, r *analysis.Result, paper drawing.Paper) []drawing.Sheet {
	t.Helper()
	sheets, _, err := drawing.Profiles(r, drawing.ProfileOptions{Paper: paper})
	if err != nil {
		t.Fatalf("%v", err)
	}
	plan, _, err := drawing.Plan(r, drawing.PlanOptions{Paper: paper})
	if err != nil {
		t.Fatalf("%v", err)
	}
	return append(sheets, plan)
}

func TestEverySheetIsWellFormedInsideItsFrameAndWithoutTextOverText(t *testing.T) {
	for _, dir := range jobs(t) {
		r := runJob(t, dir)
		for _, paper := range append(drawing.Papers, drawing.Paper{}) {
			for _, s := range allSheets(t, r, paper) {
				holdSheet(t, s)
			}
		}
	}
}

func TestTheSameRunGivesTheSameBytes(t *testing.T) {
	for _, dir := range jobs(t) {
		first, second := allSheets(t, runJob(t, dir), drawing.Paper{}), allSheets(t, runJob(t, dir), drawing.Paper{})
		for i := range first {
			if first[i].Name != second[i].Name || !bytes.Equal(first[i].Page.Bytes(), second[i].Page.Bytes()) {
				t.Errorf("%s: sheet %s differs from one run to the next", dir, first[i].Name)
			}
		}
	}
}

func TestTheCautionsOfEveryReportStandOnEverySheet(t *testing.T) {
	for _, s := range allSheets(t, runJob(t, ferryBank), drawing.Paper{}) {
		all := strings.Join(texts(t, s), " ")
		for _, c := range report.Cautions {
			if !strings.Contains(all, c) {
				t.Errorf("%s: no %q", s.Name, c)
			}
		}
	}
}

// A profile must show what reviewers ask of it: for every pipe of the line its size, length, slope, material, flow and
// velocity; for every structure its station, rim, inverts and grade lines. The numbers are those of the report.
func TestTheTableUnderAProfileHasTheNumbersOfTheReport(t *testing.T) {
	r := runJob(t, ferryBank)
	sheets, _, err := drawing.Profiles(r, drawing.ProfileOptions{From: "FB-1"})
	if err != nil || len(sheets) != 1 {
		t.Fatalf("%d sheets, %v", len(sheets), err)
	}
	have := texts(t, sheets[0])
	style := report.Style{Units: r.Job.Settings.Units, FlowUnit: r.Job.Settings.FlowUnit}
	for i := range r.Network.Pipes {
		p := &r.Network.Pipes[i]
		if !strings.HasPrefix(p.ID, "FB") || strings.HasPrefix(p.ID, "FB3A") || strings.HasPrefix(p.ID, "FB3B") {
			continue
		}
		flow := &r.Design.Flows.Pipes[i]
		for _, want := range []string{
			p.ID, style.Show(report.Length, report.N(p.Length)), style.Show(report.Percent, report.M(p.Slope)), p.Material,
			style.Show(report.Level, report.M(p.InvertUpper)), style.Show(report.Level, report.M(p.InvertLower)),
			style.Show(report.Flow, report.N(flow.Flow)), style.Show(report.Velocity, report.N(flow.Velocity)),
			style.Show(report.Level, report.N(r.Design.Lines.Structures[p.From].Level)),
			style.Show(report.Level, report.N(r.Check.Lines.Structures[p.From].Level)),
		} {
			if !slices.Contains(have, want) {
				t.Errorf("pipe %s: the sheet has no %q", p.ID, want)
			}
		}
	}
	for _, want := range []string{"RIVER", "0+00.00", "10+06.23", "103.00", "2 × 36x24 box", "blind junction", "water main 8 in", "top 125.30, bottom 124.55; gap 0.40"} {
		if !slices.Contains(have, want) {
			t.Errorf("the sheet has no %q", want)
		}
	}
}

var scaleLine = regexp.MustCompile(`horizontal 1 in = (\S+) ft, vertical 1 in = (\S+) ft; vertical exaggeration (\S+) : 1`)

// The scale that is stated is the one that is drawn: the bottom of a pipe is found among the lines at its length and fall.
func TestPipesAreDrawnToTheStatedScale(t *testing.T) {
	r := runJob(t, ferryBank)
	sheets, _, err := drawing.Profiles(r, drawing.ProfileOptions{From: "FB-1"})
	if err != nil {
		t.Fatal(err)
	}
	parts := scaleLine.FindStringSubmatch(strings.Join(texts(t, sheets[0]), "\n"))
	if parts == nil {
		t.Fatal("no scale is stated")
	}
	number := func(text string) float64 {
		v, err := strconv.ParseFloat(text, 64)
		if err != nil {
			t.Fatal(err)
		}
		return v
	}
	along, up, exaggeration := 25.4/number(parts[1]), 25.4/number(parts[2]), number(parts[3])
	if ratio := up / along; ratio/exaggeration-1 > 5e-4 || 1-ratio/exaggeration > 5e-4 {
		t.Errorf("exaggeration %v is stated, %v drawn", exaggeration, ratio)
	}
	all := elements(t, sheets[0].Page.Bytes())
	for _, id := range []string{"FB1", "FB2", "FB3", "FB4", "FB5", "FB6"} {
		i := slices.IndexFunc(r.Network.Pipes, func(p network.Pipe) bool { return p.ID == id })
		p := &r.Network.Pipes[i]
		width, height := p.Length*along, (p.InvertUpper.V-p.InvertLower.V)*up
		drawn := 0
		for k := range all {
			c := cornersOf(t, &all[k])
			if all[k].name == "line" && near(c[1].x-c[0].x, width) && near(c[0].y-c[1].y, height) {
				drawn++
			}
		}
		if drawn < 2 { // invert and crown
			t.Errorf("%d lines have the length and fall of pipe %s on paper, %.2f by %.2f mm", drawn, id, width, height)
		}
	}
}

// near allows for two ends that are each rounded to a hundredth of a millimetre.
func near(a, b float64) bool { return a-b < 0.0101 && b-a < 0.0101 }

func TestAStructureThatIsNotThereIsNamedWithTheNearestOne(t *testing.T) {
	r := runJob(t, ferryBank)
	_, _, err := drawing.Profiles(r, drawing.ProfileOptions{From: "FB-33"})
	var noSuch drawing.UnknownStructure
	if !errors.As(err, &noSuch) || noSuch.Error() != `no structure "FB-33"; did you mean "FB-3"?` {
		t.Errorf("error %v", err)
	}
	if _, _, err := drawing.Profiles(r, drawing.ProfileOptions{From: "RIVER"}); err == nil {
		t.Error("a profile from an outfall, which no pipe leaves")
	}
}

func TestThePlanNamesWhatItLeavesOut(t *testing.T) {
	sheet, notes, err := drawing.Plan(runJob(t, ferryBank), drawing.PlanOptions{})
	if err != nil {
		t.Fatal(err)
	}
	if !slices.Equal(notes.NoCoordinates, []string{"SHED"}) || notes.NoRoom != 0 {
		t.Errorf("notes %+v", notes)
	}
	have := texts(t, sheet)
	if slices.Contains(have, "S1, 15 in") || !slices.Contains(have, "FB-3A") || !slices.Contains(have, "FB3, 18 in") {
		t.Errorf("texts %.300q", have)
	}
	if all := strings.Join(have, " "); !strings.Contains(all, "Left out, having no coordinates, with their pipes (1): SHED.") {
		t.Error("the sheet does not say what is left out")
	}
}

func TestAPlanWithoutAnyCoordinatesIsAnError(t *testing.T) {
	r := runJob(t, ferryBank)
	for i := range r.Network.Structures {
		r.Network.Structures[i].X, r.Network.Structures[i].Y = network.Maybe{}, network.Maybe{}
	}
	if _, _, err := drawing.Plan(r, drawing.PlanOptions{}); !errors.Is(err, drawing.ErrNoCoordinates) {
		t.Errorf("error %v", err)
	}
}

// Names that break XML, run from right to left or are long change nothing but themselves.
func TestStrangeNamesStayTextAndInTheirPlaces(t *testing.T) {
	dir := t.TempDir()
	if err := os.CopyFS(dir, os.DirFS(ferryBank)); err != nil {
		t.Fatal(err)
	}
	for _, file := range []string{"structures.csv", "pipes.csv", "areas.csv"} {
		path := filepath.Join(dir, file)
		text, err := os.ReadFile(path)
		if err != nil {
			t.Fatal(err)
		}
		for old, strange := range map[string]string{
			"FB-2,": "<b>&amp;,", "FB-4,": "שער 4 / Überlauf ‹nördlich› of the very long embankment,", "SHED,": "]]>,", "FB-6,": "\"he said \"\"no\"\"\",",
		} {
			text = bytes.ReplaceAll(text, []byte(old), []byte(strange))
		}
		if err := os.WriteFile(path, text, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	sheets := allSheets(t, runJob(t, dir), drawing.Paper{})
	for _, s := range sheets {
		holdSheet(t, s)
	}
	if have := texts(t, sheets[0]); !slices.Contains(have, "<b>&amp;") || !slices.Contains(have, `he said "no"`) {
		t.Errorf("texts %q", have)
	}
}
