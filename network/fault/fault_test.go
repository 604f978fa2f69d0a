package fault_test

import (
	"testing"

	"rimfall/network/fault"
)

func TestFaultsAreSortedByPlaceAndPrintedOnce(t *testing.T) {
	var l fault.List
	l.Add("pipes.csv", 12, 3, "size %q is no number", "x")
	l.Add("areas.csv", 2, 0, "short row")
	l.Add("pipes.csv", 4, 9, "negative length")
	l.Add("pipes.csv", 4, 9, "negative length")
	l.Add("rainfall.csv", 0, 0, "missing")
	want := "areas.csv:2: short row\npipes.csv:4:9: negative length\npipes.csv:12:3: size \"x\" is no number\nrainfall.csv: missing"
	if got := l.Err().Error(); got != want {
		t.Errorf("got\n%s\nwant\n%s", got, want)
	}
	if fault.List(nil).Err() != nil {
		t.Error("an empty list is an error")
	}
}

func TestNearestFindsASlipOfThePen(t *testing.T) {
	known := []string{"invert_upper", "invert_lower", "length", "n"}
	for word, want := range map[string]string{"invert_uper": "invert_upper", "lenght": "length", "Length": "length", "velocity": ""} {
		if got, _ := fault.Nearest(word, known); got != want {
			t.Errorf("Nearest(%q) = %q, want %q", word, got, want)
		}
	}
	if got := fault.Suggest("zzzzz", []string{"b", "a"}); got != "known: a, b" {
		t.Errorf("Suggest = %q", got)
	}
}
