package formula_test

import (
	"encoding/xml"
	"errors"
	"io"
	"math"
	"strings"
	"testing"

	"rimfall/network/review/formula"
)

var values = map[string]float64{"k": 1.486, "n": 0.013, "A": 2, "R": 0.5, "S": 0.0025, "y_c": 3, "x": -2}

var shown = map[string]formula.Number{
	"k": {Text: "1.486"}, "n": {Text: "0.013"}, "A": {Text: "2", Unit: "ft²"}, "R": {Text: "0.5", Unit: "ft"}, "S": {Text: "0.0025"},
	"y_c": {Text: "3", Unit: "ft"}, "x": {Text: "−2"},
}

func TestFormulasHaveTheirValueAndAreWrittenAsOnPaper(t *testing.T) {
	for _, c := range []struct {
		text    string
		value   float64
		numbers string
	}{
		{"k/n × A × R^(2/3) × √S", 1.486 / 0.013 * 2 * math.Pow(0.5, 2.0/3) * 0.05, "1.486/0.013 × 2 ft² × (0.5 ft)^(2/3) × √0.0025"},
		{"A − (R + x)", 3.5, "2 ft² − (0.5 ft + (−2))"},
		{"A/R/60", 4.0 / 60, "(2 ft²)/(0.5 ft)/60"},
		{"A/(R × 60)", 2.0 / 30, "(2 ft²)/(0.5 ft × 60)"},
		{"A × R/y_c", 1.0 / 3, "(2 ft² × 0.5 ft)/(3 ft)"},
		{"2 × acos(1 − 2 × R/A)", 2 * math.Acos(0.5), "2 × acos(1 − (2 × 0.5 ft)/(2 ft²))"},
		{"max(A, y_c, R) + min(x, 1)", 1, "max(2 ft², 3 ft, 0.5 ft) + min(−2, 1)"},
		{"−x^2", -4, "−(−2)^2"},
		{"ln(A/R)", math.Log(4), "ln((2 ft²)/(0.5 ft))"},
		{"x × x", 4, "−2 × (−2)"},
		{"y_c", 3, "3 ft"},
	} {
		f := formula.Must(c.text)
		if got := f.Symbols(); got != c.text {
			t.Errorf("%s is written %s", c.text, got)
		}
		if got := f.Value(func(s string) float64 { return values[s] }); math.Abs(got-c.value) > 1e-12 {
			t.Errorf("%s = %g, want %g", c.text, got, c.value)
		}
		if got := f.Numbers(func(s string) formula.Number { return shown[s] }); got != c.numbers {
			t.Errorf("%s in numbers: %s, want %s", c.text, got, c.numbers)
		}
	}
}

func TestTextsThatAreNoFormulaAreRefused(t *testing.T) {
	for _, text := range []string{"", "A +", "(A", "A B", "A × × B", "max A", "1.2.3", "A)", "√"} {
		if _, err := formula.Read(text); err == nil {
			t.Errorf("%q was read", text)
		}
	}
}

func TestSumsAndTheLargestAreOfAllSymbols(t *testing.T) {
	of := func(s string) float64 { return values[s] }
	if got := formula.Sum([]string{"A", "R", "x"}); got.Symbols() != "A + R + x" || got.Value(of) != 0.5 {
		t.Errorf("%s = %g", got.Symbols(), got.Value(of))
	}
	if got := formula.Sum(nil); got.Value(of) != 0 {
		t.Errorf("the sum of nothing is %g", got.Value(of))
	}
	if got := formula.Largest([]string{"A", "y_c"}); got.Symbols() != "max(A, y_c)" || got.Value(of) != 3 {
		t.Errorf("%s = %g", got.Symbols(), got.Value(of))
	}
}

// The elements of MathML Core that a formula is made of.
func TestMathMLIsWellFormed(t *testing.T) {
	known := "math mrow mi mn mo mtext mfrac msup msub msqrt"
	for _, text := range []string{"k/n × A × R^(2/3) × √S", "(A + R)^2 × (x − 1)/(−x)", "max(A, y_c) × sin(R/2)"} {
		f := formula.Must(text)
		for _, m := range []string{f.MathML(), f.NumbersMathML(func(s string) formula.Number { return shown[s] })} {
			d := xml.NewDecoder(strings.NewReader("<math>" + m + "</math>"))
			for {
				token, err := d.Token()
				if errors.Is(err, io.EOF) {
					break
				}
				if err != nil {
					t.Fatalf("%s: %v in %s", text, err, m)
				}
				if e, ok := token.(xml.StartElement); ok && !strings.Contains(known, e.Name.Local) {
					t.Errorf("element %s in %s", e.Name.Local, m)
				}
			}
		}
	}
	want := "<mfrac><mi>k</mi><mi>n</mi></mfrac>"
	if got := formula.Must("k/n").MathML(); got != want {
		t.Errorf("k/n is %s", got)
	}
	if got := formula.NumberMathML(formula.Number{Text: "1", Unit: "<b>"}); strings.Contains(got, "<b>") {
		t.Errorf("a unit is not escaped: %s", got)
	}
}

// What is written with its symbols is read as the same formula.
func FuzzRead(f *testing.F) {
	for _, text := range []string{"k/n × A × R^(2/3) × √S", "−(a + b)/2", "max(1, 2) − ln(3)", "2^(−1)"} {
		f.Add(text)
	}
	f.Fuzz(func(t *testing.T, text string) {
		first, err := formula.Read(text)
		if err != nil {
			return
		}
		again, err := formula.Read(first.Symbols())
		if err != nil {
			t.Fatalf("%q is written %q, which is none: %v", text, first.Symbols(), err)
		}
		of := func(s string) float64 { return float64(len(s)) + 0.5 }
		if a, b := first.Value(of), again.Value(of); a != b && !(math.IsNaN(a) && math.IsNaN(b)) {
			t.Fatalf("%q is %g, %q is %g", text, a, first.Symbols(), b)
		}
	})
}
