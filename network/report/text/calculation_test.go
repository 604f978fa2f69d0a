package text_test

import (
	"bytes"
	"strings"
	"testing"
	"unicode/utf8"

	"rimfall/network/calculator"
	"rimfall/network/report"
	"rimfall/network/report/text"
	"rimfall/network/units"
)

// questions are of every shape and every unknown.
var questions = map[string]calculator.Given{
	"flow of a circle":        {Size: "24", N: "0.013", Slope: "0.005", Depth: "0.8D"},
	"two depths of a circle":  {Size: "24", N: "0.013", Slope: "0.005", Flow: "16.8"},
	"depth of a velocity":     {Size: "24", N: "0.013", Slope: "0.005", Velocity: "4"},
	"slope of a full ellipse": {Shape: "ellipse", Size: "60x38", N: "0.013", Depth: "full", Flow: "90"},
	"n of a box":              {Shape: "box", Size: "96x72", Slope: "0.002", Depth: "4", Flow: "250"},
	"a haunched box":          {Shape: "box", Size: "96x72", Haunch: "8", N: "0.013", Slope: "0.002", Depth: "4"},
	"size of an arch":         {Shape: "arch", N: "0.013", Slope: "0.005", Flow: "40"},
	"size of a circle":        {N: "0.013", Slope: "0.005", Flow: "40", Depth: "0.67D"},
	"bottom of a trapezoid":   {Shape: "trapezoid", Side: "3", N: "0.03", Slope: "0.002", Depth: "2", Flow: "80"},
	"side of a triangle":      {Shape: "triangle", N: "0.03", Slope: "0.002", Depth: "2", Flow: "20"},
	"unequal sides":           {Shape: "trapezoid", Bottom: "12.25", Side: "3.25", SideRight: "1.75", N: "0.0325", Slope: "0.00225", Depth: "2.125"},
	"a parabola":              {Shape: "parabola", Size: "12x3", N: "0.03", Slope: "0.004", Flow: "40"},
	"a rapid ditch":           {Shape: "triangle", Side: "4", N: "0.02", Slope: "0.08", Flow: "20"},
}

func ask(t *testing.T, g calculator.Given) *calculator.Answer {
	t.Helper()
	g.Units = "us"
	s, err := calculator.Read(g)
	if err != nil {
		t.Fatal(err)
	}
	a, err := calculator.Ask(s.Questions[0])
	if err != nil {
		t.Fatal(err)
	}
	return a
}

func TestWorkingHasItsPartsInOrderAndFitsATerminal(t *testing.T) {
	for name, g := range questions {
		var b bytes.Buffer
		if err := text.Answer(&b, ask(t, g), false); err != nil {
			t.Fatal(err)
		}
		place := 0
		for _, part := range []string{"\nGiven\n", "\nSection\n", "\nUniform flow\n", "\nCritical state\n", "\nAnswer\n", "\nNotes\n"} {
			at := strings.Index(b.String()[place:], part)
			if at < 0 {
				t.Fatalf("%s: no part %q in its place:\n%s", name, part, &b)
			}
			place += at
		}
		for _, l := range strings.Split(b.String(), "\n") {
			if n := utf8.RuneCountInString(l); n > 108 || strings.HasSuffix(l, " ") {
				t.Errorf("%s: a line of %d characters: %q", name, n, l)
			}
		}
		if bad := b.String(); strings.Contains(bad, "NaN") || strings.Contains(bad, "Inf") || strings.Contains(bad, "%!") {
			t.Errorf("%s prints what is no number:\n%s", name, bad)
		}
	}
}

func TestMarkdownOfAWorkingIsTables(t *testing.T) {
	var b bytes.Buffer
	if err := text.Answer(&b, ask(t, questions["flow of a circle"]), true); err != nil {
		t.Fatal(err)
	}
	for _, want := range []string{"# Uniform flow: flow asked", "## Section", "| wetted area ", "D²/8 (θ − sin θ)", "2.694 ft²", "- flow 15.64 cfs"} {
		if !strings.Contains(b.String(), want) {
			t.Errorf("no %q in\n%s", want, &b)
		}
	}
}

func TestListWithoutAnyCommonValueStillHasAHeading(t *testing.T) {
	a := ask(t, questions["flow of a circle"])
	rows := []report.AnswerRow{{Answer: a, Given: "0.8D"}, {Given: "1.2D", Why: "depth 1.2D is over the rise"}}
	var b bytes.Buffer
	if err := text.Answers(&b, "depth", rows, units.US, false); err != nil {
		t.Fatal(err)
	}
	for _, want := range []string{"a list of depth", "size 24 in", "depth 1.2D has no answer: depth 1.2D is over the rise."} {
		if !strings.Contains(b.String(), want) {
			t.Errorf("no %q in\n%s", want, &b)
		}
	}
}

type broken struct{}

func (broken) Write([]byte) (int, error) { return 0, errFull }

var errFull = errorText("the disk is full")

type errorText string

func (e errorText) Error() string { return string(e) }

func TestFirstWriteErrorIsReturned(t *testing.T) {
	if err := text.Answer(broken{}, ask(t, questions["flow of a circle"]), false); err != errFull {
		t.Errorf("got %v", err)
	}
}
