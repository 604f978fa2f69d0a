package drawing_test

import (
	"path/filepath"
	"slices"
	"testing"

	"rimfall/network/report/drawing"
)

// classes are those of a hatching with as many as there may be.
var classes = []string{"under 2 years", "2 to 5 years", "5 to 10 years", "10 to 25 years", "25 to 100 years", "100 years and more"}

func hatched(t *testing.T, paper string, class func(pipe int) int) drawing.Sheet {
	t.Helper()
	r := runJob(t, filepath.Join("..", "..", "..", "testdata", "review", "mill-street"))
	p, ok := drawing.PaperNamed(paper, r.Job.Settings.Units)
	if !ok {
		t.Fatal("no paper ", paper)
	}
	h := drawing.Hatching{Title: "Plan of what the pipes carry", Lines: []string{"By capacity"}, Classes: classes}
	for i := range r.Network.Pipes {
		h.Class = append(h.Class, class(i))
	}
	s, notes, err := drawing.HatchedPlan(r, h, drawing.PlanOptions{Paper: p})
	if err != nil || len(notes.NoCoordinates) > 0 {
		t.Fatal(err, notes)
	}
	return s
}

func TestAHatchedPlanStaysInsideItsFrameAndExplainsEveryClass(t *testing.T) {
	if len(classes) != drawing.MostClasses {
		t.Fatalf("%d classes, there may be %d", len(classes), drawing.MostClasses)
	}
	for _, paper := range drawing.Papers {
		s := hatched(t, paper.Name, func(pipe int) int { return pipe%(len(classes)+1) - 1 })
		holdSheet(t, s)
		written := texts(t, s)
		for _, words := range append([]string{"Plan of what the pipes carry", "By capacity"}, classes...) {
			if !slices.Contains(written, words) {
				t.Errorf("%s: %q does not stand on the sheet", paper.Name, words)
			}
		}
	}
}

func TestAWeakerPipeHasMoreStrokesAndTheStrongestNone(t *testing.T) {
	lines := func(class int) int {
		s := hatched(t, "ansi-b", func(pipe int) int {
			if pipe == 0 {
				return class
			}
			return -1
		})
		count := 0
		for _, e := range elements(t, s.Page.Bytes()) {
			if e.name == "line" {
				count++
			}
		}
		return count
	}
	plain := lines(-1)
	last := lines(0)
	for class := 1; class < len(classes); class++ {
		now := lines(class)
		if now >= last || now < plain {
			t.Errorf("class %d has %d lines, the weaker one %d, a plan without hatching %d", class, now, last, plain)
		}
		last = now
	}
	if last != plain {
		t.Errorf("the strongest class has %d lines more than a plan without hatching", last-plain)
	}
}
