package calculator_test

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/calculator"
	"rimfall/network/units"
)

// conduits draws a section of any shape, and a depth that it takes.
func conduits(t *rapid.T) (c calculator.Conduit, depth float64) {
	some := func(name string, low, high float64) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
	c.Shape = rapid.SampledFrom([]string{"circle", "box", "ellipse", "ellipse-upright", "trapezoid", "triangle", "rectangle", "parabola"}).Draw(t, "shape")
	rise := some("rise", 12, 120)
	depth = some("ratio", 0.02, 0.8) * rise / 12
	switch c.Shape {
	case "circle":
		c.Size = network.Size{Span: rise, Rise: rise}
	case "box":
		c.Size = network.Size{Span: rise * some("shape of box", 0.5, 2), Rise: rise}
	case "ellipse":
		c.Size = network.Size{Span: 1.5 * rise, Rise: rise}
	case "ellipse-upright":
		c.Size = network.Size{Span: 0.66 * rise, Rise: rise}
	case "parabola":
		c.Width, c.Deep = some("width", 1, 30), some("deep", 1, 10)
	default:
		if c.Shape != "triangle" {
			c.Bottom = network.Some(some("bottom", 0.5, 40))
		}
		if c.Shape != "rectangle" {
			c.Left = network.Some(some("left", 0.1, 6))
		}
	}
	return c, depth
}

func mustAsk(t *rapid.T, q calculator.Question) *calculator.Answer {
	a, err := calculator.Ask(q)
	if err != nil {
		t.Fatalf("%+v: %v", q, err)
	}
	return a
}

func same(t *rapid.T, what string, got, want float64) {
	if math.Abs(got-want) > 1e-9*math.Abs(want) {
		t.Fatalf("%s: %.15g, not %.15g", what, got, want)
	}
}

func TestWhateverIsLeftOutIsFoundAgain(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		c, depth := conduits(t)
		n, slope := rapid.Float64Range(0.008, 0.1).Draw(t, "n"), rapid.Float64Range(1e-5, 0.1).Draw(t, "slope")
		deep := calculator.Deep{V: depth, OK: true}
		given := calculator.Question{Units: units.US, Conduit: c, N: network.Some(n), Slope: network.Some(slope), Depth: deep}
		flow := network.Some(mustAsk(t, given).First.Flow)
		velocity := network.Some(mustAsk(t, given).First.Velocity)

		q := given
		q.Depth, q.Flow = calculator.Deep{}, flow
		same(t, "depth", mustAsk(t, q).First.Depth, depth)
		q.Flow, q.Velocity = network.Maybe{}, velocity
		if a := mustAsk(t, q); a.Second == nil || math.Abs(a.Second.Depth-depth) > 1e-9*depth {
			same(t, "depth of the velocity", a.First.Depth, depth)
		}
		q = given
		q.Slope, q.Flow = network.Maybe{}, flow
		same(t, "slope", mustAsk(t, q).Slope, slope)
		q.Depth, q.Velocity = calculator.Deep{}, velocity
		same(t, "slope of flow and velocity", mustAsk(t, q).Slope, slope)
		q = given
		q.N, q.Flow = network.Maybe{}, flow
		same(t, "n", mustAsk(t, q).N, n)
	})
}

func TestWidthAndSideAreFoundAgain(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		bottom, side := rapid.Float64Range(0.2, 50).Draw(t, "bottom"), rapid.Float64Range(0.2, 8).Draw(t, "side")
		q := calculator.Question{
			Units: units.SI, N: network.Some(0.03), Slope: network.Some(0.002),
			Depth:   calculator.Deep{V: rapid.Float64Range(0.1, 5).Draw(t, "depth"), OK: true},
			Conduit: calculator.Conduit{Shape: calculator.Trapezoid, Bottom: network.Some(bottom), Left: network.Some(side)},
		}
		q.Flow = network.Some(mustAsk(t, q).First.Flow)
		w := q
		w.Conduit.Bottom = network.Maybe{}
		same(t, "bottom", mustAsk(t, w).Conduit.Bottom.V, bottom)
		w = q
		w.Conduit.Left = network.Maybe{}
		same(t, "side", mustAsk(t, w).Conduit.Left.V, side)
	})
}

// A size that is found carries the flow at no more than the depth asked for, the exact
// one at just that depth, and the next smaller listed one does not.
func TestFoundSizeCarriesTheFlow(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		ratio := rapid.SampledFrom([]float64{0.5, 0.67, 0.8, 1}).Draw(t, "ratio")
		q := calculator.Question{
			Units: units.US, N: network.Some(0.013), Slope: network.Some(0.005),
			Conduit: calculator.Conduit{Shape: rapid.SampledFrom([]string{"circle", "ellipse", "box", "arch"}).Draw(t, "shape")},
			Depth:   calculator.Deep{V: ratio, OK: true, OfRise: true},
			Flow:    network.Some(rapid.Float64Range(5, 120).Draw(t, "flow")),
		}
		a := mustAsk(t, q)
		if !a.Exact.Listed || a.First.Ratio.V > ratio*(1+1e-9) {
			t.Fatalf("size %s runs at %g of the rise, over %g", a.Conduit.SizeLabel(), a.First.Ratio.V, ratio)
		}
		if a.Exact.Size.Rise > a.Conduit.Size.Rise*(1+1e-9) {
			t.Fatalf("exact size %v over the one taken, %v", a.Exact.Size, a.Conduit.Size)
		}
		if a.Conduit.Shape != "circle" {
			return
		}
		exact := q
		exact.Conduit.Size, exact.Flow = a.Exact.Size, network.Maybe{}
		same(t, "flow of the exact size", mustAsk(t, exact).First.Flow, q.Flow.V)
	})
}

func TestDepthInFeetLimitsTheSizeToo(t *testing.T) {
	a := ask(t, calculator.Given{N: "0.013", Slope: "0.005", Flow: "12", Depth: "1.2"})
	if a.First.Depth > 1.2 || !a.Exact.Listed {
		t.Errorf("depth %g in %s, over 1.2", a.First.Depth, a.Conduit.SizeLabel())
	}
	exact := ask(t, calculator.Given{Size: strconv.FormatFloat(a.Exact.Size.Rise, 'g', -1, 64), N: "0.013", Slope: "0.005", Depth: "1.2"})
	near(t, "flow of the exact size at that depth", exact.First.Flow, 12, 0.01)
}

func TestTwoDepthsAreBothGivenBetweenCapacityAndLargestDischarge(t *testing.T) {
	a := ask(t, calculator.Given{Size: "24", N: "0.013", Slope: "0.005", Flow: "16.8"})
	if a.Second == nil {
		t.Fatal("one depth only")
	}
	for _, depth := range []float64{a.First.Depth, a.Second.Depth} {
		again := calculator.Question{Units: units.US, Conduit: a.Conduit, N: network.Some(0.013), Slope: network.Some(0.005), Depth: calculator.Deep{V: depth, OK: true}}
		b, err := calculator.Ask(again)
		if err != nil {
			t.Fatal(err)
		}
		near(t, "flow at the depth", b.First.Flow, 16.8, 1e-9)
	}
	if !strings.Contains(strings.Join(a.Notes, " "), "Two depths carry this flow") {
		t.Errorf("no note says so: %q", a.Notes)
	}
	box := ask(t, calculator.Given{Shape: "box", Size: "8ft x 6ft", N: "0.013", Slope: "0.002", Flow: "400"})
	if box.Second != nil {
		t.Errorf("a box has a second depth %g, under a flat roof", box.Second.Depth)
	}
}

func TestVaryingRoughnessIsThatOfTheCurve(t *testing.T) {
	// 0.5 of the diameter: n is 1.24 times that of the full pipe (Camp's curve, from memory).
	one := ask(t, calculator.Given{Size: "24", N: "0.013", Slope: "0.005", Depth: "0.5D"})
	varied := ask(t, calculator.Given{Size: "24", N: "0.013", Slope: "0.005", Depth: "0.5D", VaryingN: true})
	near(t, "ratio of flows", one.First.Flow/varied.First.Flow, 1.24, 1e-12)
	back := ask(t, calculator.Given{Size: "24", Slope: "0.005", Depth: "0.5D", Flow: "6.45", VaryingN: true})
	near(t, "n of the full pipe", back.N, back.First.N/1.24, 1e-12)
	depth := ask(t, calculator.Given{Size: "24", N: "0.013", Slope: "0.005", Flow: "6.45", VaryingN: true})
	again := ask(t, calculator.Given{Size: "24", N: "0.013", Slope: "0.005", Depth: strconv.FormatFloat(depth.First.Depth, 'g', -1, 64), VaryingN: true})
	near(t, "flow at the depth found", again.First.Flow, 6.45, 1e-6)
}

// One inch is 25.4 mm and 1.486 is the cube root of 3.2808 to four digits: what is asked
// in feet and in metres differs by no more than that rounding.
func TestFeetAndMetresAgree(t *testing.T) {
	us := ask(t, calculator.Given{Size: "24", N: "0.013", Slope: "0.005", Depth: "1.2"})
	si := ask(t, calculator.Given{Units: "si", Size: "24in", N: "0.013", Slope: "0.005", Depth: "1.2ft"})
	near(t, "flow", si.First.Flow/(us.First.Flow*0.3048*0.3048*0.3048), 1, 1e-4)
	near(t, "critical depth", si.First.CriticalDepth.V/(us.First.CriticalDepth.V*0.3048), 1, 1e-4)
}
