package hydrology_test

import (
	"math"
	"testing"

	"rimfall/hydrology"
)

// The relation, written out, gives the intensity that the storm gives: at, below and beyond its range.
func TestTheLawOfAnEquationGivesItsIntensity(t *testing.T) {
	for name, e := range map[string]hydrology.Equation{
		"one term with a return period": {
			Constants: []hydrology.Constants{{Terms: []hydrology.Term{{Numerator: 40, Shift: 9, Exponent: 0.8, PeriodExponent: 0.2}}}},
			Unit:      "in/h", Shortest: 5, Longest: 120,
		},
		"two terms in hours": {
			Constants: []hydrology.Constants{{Terms: []hydrology.Term{{Numerator: 900, Shift: 0.2, Exponent: 1}, {Numerator: 3, Exponent: 0.5}}}},
			Unit:      "mm/h", Hours: true, Shortest: 5, Longest: 1440,
		},
		"a cubic in logarithms": {
			Constants: []hydrology.Constants{{Cubic: [4]float64{5, -0.2, -0.08, 0.003}}}, Unit: "mm/h", Shortest: 15, Longest: 600,
		},
	} {
		storm, err := e.Storm(10, "in/h")
		if err != nil {
			t.Fatal(err)
		}
		for _, minutes := range []float64{1, 5, 15, 33, 120} {
			law, ok := storm.Law(minutes)
			if !ok {
				t.Fatalf("%s: no law at %g min", name, minutes)
			}
			x := law.PerMinute * law.Minutes
			got := 0.0
			for _, term := range law.Terms {
				got += term.Numerator / math.Pow(x+term.Shift, term.Exponent)
			}
			if len(law.Terms) == 0 {
				y := math.Log(x)
				got = math.Exp(law.Cubic[0] + law.Cubic[1]*y + law.Cubic[2]*y*y + law.Cubic[3]*y*y*y)
			}
			got *= law.Scale
			if want, _ := storm.At(minutes); math.Abs(got-want) > 1e-12*want {
				t.Errorf("%s at %g min: %g, want %g", name, minutes, got, want)
			}
		}
		if _, ok := storm.Law(1e4); ok {
			t.Errorf("%s: a law beyond the longest duration", name)
		}
	}
}
