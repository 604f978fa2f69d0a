package calculator_test

import (
	"math"
	"slices"
	"testing"

	"rimfall/network/calculator"
)

func TestValuesMayHaveAnotherUnit(t *testing.T) {
	read := func(g calculator.Given) calculator.Question {
		s, err := calculator.Read(g)
		if err != nil {
			t.Fatal(err)
		}
		return s.Questions[0]
	}
	us := read(calculator.Given{Units: "us", Size: "4ft", Depth: "18in", Flow: "40L/s", Velocity: "1m/s", Slope: "0.5%"})
	near(t, "4 ft in inches", us.Conduit.Size.Rise, 48, 0)
	near(t, "18 in in feet", us.Depth.V, 1.5, 1e-15)
	near(t, "40 L/s in cfs", us.Flow.V, 0.04/0.028316846592, 1e-12) // 1 ft³ is 0.028316846592 m³ exactly
	near(t, "1 m/s in ft/s", us.Velocity.V, 1/0.3048, 1e-14)        // to fifteen digits
	near(t, "0.5 percent", us.Slope.V, 0.005, 1e-18)
	si := read(calculator.Given{Units: "si", Size: "24in", Depth: "300mm", Flow: "900gpm"})
	near(t, "24 in in mm", si.Conduit.Size.Rise, 609.6, 1e-12)
	near(t, "300 mm in m", si.Depth.V, 0.3, 1e-15)
	near(t, "900 gpm in m³/s", si.Flow.V, 900*0.003785411784/60, 1e-12) // 1 US gallon is 3.785411784 L exactly
	day := read(calculator.Given{Units: "us", Flow: "1mgd"})
	near(t, "1 mgd in cfs", day.Flow.V, 1.5472, 5e-5) // 1.5472 cfs, the usual rounding
}

func TestListsCountFromOneValueToTheOther(t *testing.T) {
	s, err := calculator.Read(calculator.Given{Units: "us", Size: "24", N: "0.013", Slope: "0.005", Depth: "0.1D:0.9D:0.1D"})
	if err != nil {
		t.Fatal(err)
	}
	want := []string{"0.1D", "0.2D", "0.3D", "0.4D", "0.5D", "0.6D", "0.7D", "0.8D", "0.9D"}
	if s.Listed != calculator.Depth || !slices.Equal(s.Values, want) {
		t.Errorf("list of %s: %v", s.Listed, s.Values)
	}
	for i, q := range s.Questions {
		if q.Depth.V != math.Round(float64(i+1))/10 || !q.Depth.OfRise {
			t.Errorf("question %d has depth %+v", i, q.Depth)
		}
	}
	down, err := calculator.Read(calculator.Given{Units: "us", Flow: "5:1:-2"})
	if err != nil || !slices.Equal(down.Values, []string{"5", "3", "1"}) {
		t.Errorf("downward: %v, %v", down.Values, err)
	}
	sizes, err := calculator.Read(calculator.Given{Units: "us", Shape: "ellipse", Size: "60x38, 68x43"})
	if err != nil || len(sizes.Questions) != 2 || sizes.Questions[1].Conduit.Size.Span != 68 {
		t.Errorf("sizes: %+v, %v", sizes, err)
	}
}

func TestRoughnessOfAMaterialHoldsWhereNoneIsGiven(t *testing.T) {
	a := ask(t, calculator.Given{Size: "24", Material: "corrugated-metal", Slope: "0.01", Depth: "full"})
	near(t, "n", a.N, 0.024, 0)
	a = ask(t, calculator.Given{Size: "24", Material: "corrugated-metal", N: "0.02", Slope: "0.01", Depth: "full"})
	near(t, "n", a.N, 0.02, 0)
}

// FuzzRead: no text makes the reader panic, and what it takes can be asked.
func FuzzRead(f *testing.F) {
	f.Add("24", "0.013", "0.005", "0.1D:0.9D:0.1D", "", "circle")
	f.Add("8ft x 6ft", "0.013", "0.5%", "", "40L/s", "box")
	f.Add("12x3", "1e-2", "1", "full", "1,2", "parabola")
	f.Fuzz(func(t *testing.T, size, n, slope, depth, flow, shape string) {
		s, err := calculator.Read(calculator.Given{Units: "us", Size: size, N: n, Slope: slope, Depth: depth, Flow: flow, Shape: shape})
		if err != nil {
			return
		}
		for _, q := range s.Questions[:min(3, len(s.Questions))] {
			a, err := calculator.Ask(q)
			if err == nil && (math.IsNaN(a.First.Flow) || math.IsNaN(a.First.Depth)) {
				t.Errorf("%q %q %q %q %q %q: %+v", size, n, slope, depth, flow, shape, a.First)
			}
		}
	})
}
