package calculator_test

import (
	"math"
	"testing"

	"rimfall/network/calculator"
)

// By hand at depth 5 ft, elevation 103: left bench from station 13.333 to 24, channel
// to 42, right bench to 64.211.
func TestGroundLineByHand(t *testing.T) {
	a := ask(t, calculator.Given{Points: creek, Slope: "0.003", Depth: "5"})
	leftArea := 6.6666667*1/2 + 4*(1.0+2)/2
	channel := 6*(2.0+5)/2*2 + 6*5
	right := 18*(2+0.8)/2 + 0.8*(20*0.8/3.8)/2
	near(t, "area", a.First.Area, leftArea+channel+right, 1e-6)
	near(t, "top width", a.First.TopWidth, 64.2105263-13.3333333, 1e-6)
	p1 := math.Hypot(6.6666667, 1) + math.Hypot(4, 1)
	p2 := 2*math.Hypot(6, 3) + 6
	p3 := math.Hypot(18, 1.2) + 0.8/3.8*math.Hypot(20, 3.8)
	// Horton and Einstein: (Σ P n^1.5 / P)^(2/3), Chow 1959 eq. 6-17.
	n := math.Pow(((p1+p3)*math.Pow(0.06, 1.5)+p2*math.Pow(0.035, 1.5))/(p1+p2+p3), 2./3)
	near(t, "n", a.First.N, n, 1e-8)
	// Lotter: the flows of the parts add up, Chow 1959 eq. 6-19.
	b := ask(t, calculator.Given{Points: creek, Slope: "0.003", Depth: "5", Composite: "lotter"})
	part := func(area, wall, n float64) float64 {
		return 1.486 / n * area * math.Pow(area/wall, 2./3) * math.Sqrt(0.003)
	}
	near(t, "flow", b.First.Flow, part(leftArea, p1, 0.06)+part(channel, p2, 0.035)+part(right, p3, 0.06), 1e-4)
}

// Where the benches are flooded, Horton's rule lets the flow fall before it rises again.
func TestFloodedBenchHasMoreThanOneDepth(t *testing.T) {
	a := ask(t, calculator.Given{Points: creek, Slope: "0.003", Flow: "122"})
	if a.Second == nil {
		t.Fatal("one depth only")
	}
	for _, depth := range []float64{a.First.Depth, a.Second.Depth} {
		near(t, "flow at the depth", a.Section.At(depth).Area*velocityAt(t, depth), 122, 1e-3)
	}
}

func velocityAt(t *testing.T, depth float64) float64 {
	t.Helper()
	s, err := calculator.Read(calculator.Given{Units: "us", Points: creek, Slope: "0.003"})
	if err != nil {
		t.Fatal(err)
	}
	q := s.Questions[0]
	q.Depth = calculator.Deep{V: depth, OK: true}
	a, err := calculator.Ask(q)
	if err != nil {
		t.Fatal(err)
	}
	return a.First.Velocity
}

func TestPictureHoldsOutlineLevelsAndCurves(t *testing.T) {
	for _, g := range []calculator.Given{
		{Size: "24", N: "0.013", Slope: "0.005", Flow: "16.8"},
		{Shape: "box", Size: "96x72", N: "0.013", Slope: "0.002", Flow: "400"},
		{Shape: "arch", Size: "43.75x26.625", N: "0.013", Slope: "0.005", Depth: "full"},
		{Shape: "trapezoid", Bottom: "4", Side: "3", SideRight: "2", N: "0.03", Slope: "0.002", Flow: "80"},
		{Shape: "parabola", Size: "12x3", N: "0.03", Slope: "0.002", Flow: "80"},
		{Points: creek, Slope: "0.003", Flow: "400"},
	} {
		a := ask(t, g)
		p := a.Picture()
		if len(p.Outline) < 4 || len(p.Curves) != 4 || len(p.Levels) == 0 {
			t.Fatalf("%+v: an empty picture: %+v", g, p)
		}
		for _, l := range p.Levels {
			wet := 0.0
			for _, b := range l.Between {
				wet += b[1] - b[0]
			}
			if l.Depth < a.Section.Rise() {
				near(t, l.Name+": width between the banks", wet, a.Section.At(l.Depth).TopWidth, 1e-9*wet)
			}
		}
		for _, c := range p.Curves {
			for _, r := range c.Ratio {
				if math.IsNaN(r) || math.IsInf(r, 0) {
					t.Errorf("%+v: curve of %s holds %g", g, c.Name, r)
				}
			}
		}
	}
}
