package hydrology

import (
	"fmt"
	"math"
	"testing"

	"pgregory.net/rapid"
)

// FHWA, Highway Hydrology, HDS-2 (2nd ed. 2002), Example 5.5: 21.8, 1.5 and 20.4 ha with C 0.20, 0.95 and 0.40.
// Published: C 0.32, and at 85 mm/h 3.3 m³/s.
func ExampleCompositeC() {
	c, area, _ := CompositeC(Piece{21.8, 0.20}, Piece{1.5, 0.95}, Piece{20.4, 0.40})
	fmt.Printf("C %.2f, %.1f m³/s\n", c, Rational(RationalFactorSI, c*area, 85))
	// Output: C 0.32, 3.3 m³/s
}

func TestCompositeLiesBetweenItsPieces(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		piece := rapid.Custom(func(t *rapid.T) Piece {
			return Piece{rapid.Float64Range(0.01, 100).Draw(t, "area"), rapid.Float64Range(0, 1).Draw(t, "C")}
		})
		pieces := rapid.SliceOfN(piece, 1, 8).Draw(t, "pieces")
		low, high := 1.0, 0.0
		for _, p := range pieces {
			low, high = min(low, p.C), max(high, p.C)
		}
		if c, _, ok := CompositeC(pieces...); !ok || c < low-1e-15 || c > high+1e-15 { // rounding
			t.Fatalf("%v, %v; the pieces have %v to %v", c, ok, low, high)
		}
	})
	if _, _, ok := CompositeC(Piece{0, 0.5}); ok {
		t.Error("no area has a composite C")
	}
}

func TestImperviousRelations(t *testing.T) {
	cases := []struct {
		name      string
		got, want float64
	}{
		{"the cubic with nothing paved", CubicImperviousC(0), 0.04},
		{"the cubic with everything paved", CubicImperviousC(1), 0.892},
		{"the cubic half paved: 0.10725 − 0.195 + 0.387 + 0.04", CubicImperviousC(0.5), 0.33925},
		{"the linear half paved", LinearImperviousC(0.5), 0.5},
		{"by pieces, a third paved", ImperviousC(1.0/3, 0.9, 0.3), 0.5},
	}
	for _, k := range cases {
		if math.Abs(k.got-k.want) > 1e-12 { // rounding
			t.Errorf("%s: %v, want %v", k.name, k.got, k.want)
		}
	}
}

func TestRaisedCIsNotOverOne(t *testing.T) {
	if c := RaisedC(0.9, 100); c != 1 {
		t.Errorf("0.9·1.25 is held at %v", c)
	}
	if c := RaisedC(0.4, 25); math.Abs(c-0.44) > 1e-15 {
		t.Errorf("0.4·1.1 = %v", c)
	}
}

func TestStartingSurfaces(t *testing.T) {
	surfaces := StartingSurfaces()
	if len(surfaces) != 24 { // the rows of HDS-2 Table 5.7
		t.Errorf("%d surfaces", len(surfaces))
	}
	seen := map[string]bool{}
	for _, s := range surfaces {
		if !(0 < s.Low && s.Low <= s.C && s.C <= s.High && s.High <= 1) || s.Source == "" || seen[s.Name] {
			t.Errorf("%+v", s)
		}
		seen[s.Name] = true
	}
}

func TestCByPeriodAtPublishedPeriods(t *testing.T) {
	cases := []struct {
		surface      string
		period, want float64
	}{
		{"asphalt", 2, 0.73},
		{"asphalt", 500, 1.0},
		{"grass fair 2-7%", 10, 0.38},
		{"forest >7%", 100, 0.52},
		{"pasture 0-2%", math.Sqrt(50), 0.29}, // halfway in ln T between 0.28 and 0.30
	}
	for _, k := range cases {
		if c, ok := CByPeriod(k.surface, k.period); !ok || math.Abs(c-k.want) > 1e-12 {
			t.Errorf("%s, %v years: %v, %v; published %v", k.surface, k.period, c, ok, k.want)
		}
	}
	for _, outside := range []float64{1, 501, math.NaN()} {
		if c, ok := CByPeriod("asphalt", outside); ok {
			t.Errorf("%v years: %v", outside, c)
		}
	}
	if _, ok := CByPeriod("moss", 10); ok || len(SurfacesByPeriod()) != 20 {
		t.Errorf("moss is known, or there are %d surfaces", len(SurfacesByPeriod()))
	}
}
