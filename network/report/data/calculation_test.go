package data_test

import (
	"bytes"
	"encoding/json"
	"testing"

	"rimfall/network/calculator"
	"rimfall/network/report"
	"rimfall/network/report/data"
)

func answerOf(t *testing.T, g calculator.Given) *calculator.Answer {
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

func answerObject(t *testing.T, b []byte) map[string]any {
	t.Helper()
	var o map[string]any
	if err := json.Unmarshal(b, &o); err != nil {
		t.Fatalf("%v in %s", err, b)
	}
	return o
}

func TestAnswerIsOneObjectWithTheKeysOfTheContract(t *testing.T) {
	var b bytes.Buffer
	if err := data.AnswerJSON(&b, answerOf(t, calculator.Given{Size: "24", N: "0.013", Slope: "0.005", Flow: "16.8"})); err != nil {
		t.Fatal(err)
	}
	o := answerObject(t, b.Bytes())
	for _, key := range []string{
		"shape", "size", "n", "slope", "depth", "flow", "velocity", "area", "wetted_perimeter", "hydraulic_radius",
		"top_width", "froude", "critical_depth", "capacity", "regime", "depth_second", "flow_state",
	} {
		if _, ok := o[key]; !ok {
			t.Errorf("no key %q in %s", key, &b)
		}
	}
}

func TestValuesThatDoNotApplyAreLeftOut(t *testing.T) {
	var b bytes.Buffer
	if err := data.AnswerJSON(&b, answerOf(t, calculator.Given{Shape: "triangle", Side: "4", N: "0.03", Slope: "0.01", Flow: "5"})); err != nil {
		t.Fatal(err)
	}
	o := answerObject(t, b.Bytes())
	for _, key := range []string{"size", "bottom", "capacity", "depth_second", "depth_ratio", "size_exact", "n_at_depth", "largest_flow"} {
		if v, ok := o[key]; ok {
			t.Errorf("key %q has the value %v", key, v)
		}
	}
	if o["side"] != 4.0 || o["regime"] != "subcritical" {
		t.Errorf("side %v, regime %v", o["side"], o["regime"])
	}
}

func TestSizeIsANumberForACircleAndATextForOtherShapes(t *testing.T) {
	for want, g := range map[any]calculator.Given{
		24.0:    {Size: "24", N: "0.013", Slope: "0.005", Flow: "12"},
		"60x38": {Shape: "ellipse", Size: "60 x 38", N: "0.013", Slope: "0.005", Flow: "12"},
	} {
		var b bytes.Buffer
		if err := data.AnswerJSON(&b, answerOf(t, g)); err != nil {
			t.Fatal(err)
		}
		if got := answerObject(t, b.Bytes())["size"]; got != want {
			t.Errorf("size %v, not %v", got, want)
		}
	}
}

func TestRowsWithoutAnswerSayWhy(t *testing.T) {
	rows := []report.AnswerRow{
		{Answer: answerOf(t, calculator.Given{Size: "24", N: "0.013", Slope: "0.005", Flow: "12"}), Given: "12"},
		{Given: "99", Why: `over "the" largest`},
	}
	var b bytes.Buffer
	if err := data.AnswersJSON(&b, "flow", rows); err != nil {
		t.Fatal(err)
	}
	list := answerObject(t, b.Bytes())["rows"].([]any)
	if len(list) != 2 || list[1].(map[string]any)["why"] != `over "the" largest` {
		t.Errorf("got %s", &b)
	}
}
