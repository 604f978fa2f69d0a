package hydrology

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"pgregory.net/rapid"
)

// FHWA, Highway Hydrology, HDS-2 (2nd ed. 2002), eq. 5.31: Q′ = (C₁A₁·t₂/t₁ + C₂A₂)·i₂, keep the larger of it and
// the full flow. A large flat area that takes 60 min and a small paved one of 10 min; the areas are invented, the
// rain is NOAA Atlas 14 at Pulaski, Virginia, 10 years: 4.338 in/h at 10 min, 1.720 in/h at 60.
func ExamplePartialArea() {
	storm, _ := NewTable([]float64{10, 60}, []float64{10}, [][]float64{{4.338}, {1.720}})
	tenYears, _ := storm.Curve(10)
	flat, paved := Contribution{CA: 2, InletTime: 60}, Contribution{CA: 4, InletTime: 10}
	whole, _, _ := LongestTime([]Contribution{flat, paved}, tenYears, 5, RationalFactorUS)
	part, _, _ := PartialArea([]Contribution{flat, paved}, tenYears, 5, RationalFactorUS)
	fmt.Printf("whole %.2f cfs, part %.2f cfs at %v min\n", whole.Flow, part.Flow, part.Time)
	fmt.Printf("eq. 5.31: %.2f cfs\n", (2*10.0/60+4)*4.338)
	// Output:
	// whole 10.32 cfs, part 18.80 cfs at 10 min
	// eq. 5.31: 18.80 cfs
}

// drawStorm makes a storm whose depth rises with duration while its intensity falls, as measured rain does.
func drawStorm(t *rapid.T) Curve {
	rows := rapid.IntRange(1, 10).Draw(t, "rows")
	durations, values := make([]float64, rows), make([][]float64, rows)
	intensity := rapid.Float64Range(2, 10).Draw(t, "first intensity")
	for row := range rows {
		durations[row] = 5 * math.Pow(2, float64(row))
		values[row] = []float64{intensity}
		intensity /= math.Pow(2, rapid.Float64Range(0, 1).Draw(t, "exponent"))
	}
	last := durations[rows-1]
	if rows == 1 { // so that there is room for an area
		durations, values, last = append(durations, 1000), append(values, values[0]), 1000
	}
	if last < 400 {
		durations, values = append(durations, 1000), append(values, []float64{values[rows-1][0] / 2})
	}
	table, err := NewTable(durations, []float64{10}, values)
	if err != nil {
		t.Fatal(err)
	}
	c, _ := table.Curve(10)
	return c
}

func drawAreas(t *rapid.T) []Contribution {
	time := rapid.OneOf(rapid.Just(0.0), rapid.Just(5.0), rapid.Float64Range(0.01, 90))
	area := rapid.OneOf(rapid.Just(0.0), rapid.Float64Range(0.01, 20))
	return rapid.SliceOfN(rapid.Custom(func(t *rapid.T) Contribution {
		return Contribution{CA: area.Draw(t, "CA"), InletTime: time.Draw(t, "inlet"), TravelTime: time.Draw(t, "travel")}
	}), 1, 8).Draw(t, "areas")
}

// flowAt is the definition, word by word and area by area.
func flowAt(areas []Contribution, storm Intensity, t float64) float64 {
	counted := 0.0
	for _, a := range areas {
		counted += a.counted(t)
	}
	i, _ := storm.At(t)
	return counted * i
}

func TestPartialAreaAgainstBruteForce(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		storm, areas := drawStorm(t), drawAreas(t)
		minimum := rapid.Float64Range(1, 20).Draw(t, "minimum")
		peak, _, ok := PartialArea(areas, storm, minimum, 1)
		longest, total := longestTime(areas, minimum)
		if ok != (total > 0) {
			t.Fatalf("ok is %v with ΣCA %v", ok, total)
		}
		if !ok {
			return
		}
		// The points of the definition, area by area.
		best := 0.0
		points := append(storm.Durations(), minimum)
		for _, a := range areas {
			if a.CA > 0 {
				points = append(points, a.TravelTime, a.TravelTime+a.InletTime)
			}
		}
		for _, p := range points {
			if p >= minimum && p <= longest {
				best = max(best, flowAt(areas, storm, p))
			}
		}
		if math.Abs(peak.Flow-best) > 1e-10*best { // sums in another order, with differences
			t.Fatalf("peak %v, the points of the definition give %v", peak.Flow, best)
		}
		for k := range 1001 { // and no other time gives more
			time := minimum + (longest-minimum)*float64(k)/1000
			if flow := flowAt(areas, storm, time); flow > peak.Flow*(1+1e-10) {
				t.Fatalf("%v at %v min is more than the peak %v at %v min", flow, time, peak.Flow, peak.Time)
			}
		}
		if whole, _, _ := LongestTime(areas, storm, minimum, 1); whole.Flow > peak.Flow*(1+1e-10) {
			t.Fatalf("the whole area gives %v, more than %v", whole.Flow, peak.Flow)
		}
	})
}

// An exponent over 1 far out makes the flow turn between the points of a table: an equation's peak is looked for
// there too.
func TestPartialAreaFindsTurningPointsOfEquations(t *testing.T) {
	e := Equation{Unit: InchesPerHour, Shortest: 1, Longest: 600, Constants: []Constants{
		{Terms: []Term{{Numerator: 4000, Shift: 20, Exponent: 1.6}}},
	}}
	storm := mustStorm(e, 10, InchesPerHour)
	// One area of 300 min from τ = 10: counted ∝ t − 10; (t − 10)/(t + 20)^1.6 is largest where
	// t + 20 = 1.6·(t − 10), at t = 60.
	area := []Contribution{{CA: 1, InletTime: 300, TravelTime: 10}}
	peak, _, ok := PartialArea(area, storm, 5, 1)
	if !ok || math.Abs(peak.Time-60) > 1e-6 { // a flat top: the time is known to the root of rounding
		t.Errorf("%+v, %v; want the peak at 60 min", peak, ok)
	}
	if raised, _, _ := PartialArea(area, Uplifted{storm, 1.2}, 5, 1); math.Abs(raised.Flow-1.2*peak.Flow) > 1e-9*peak.Flow {
		t.Errorf("uplifted by 1.2 from %v to %v", peak.Flow, raised.Flow)
	}
}

func TestNoPeakBeyondTheTable(t *testing.T) {
	storm := pulaskiCurve(t) // to 60 min
	areas := []Contribution{{CA: 1, InletTime: 10}, {CA: 1, InletTime: 30, TravelTime: 31}}
	if _, where, ok := PartialArea(areas, storm, 5, 1); ok || where != Beyond {
		t.Errorf("61 min: ok %v, %v", ok, where)
	}
	if _, where, ok := LongestTime(areas, storm, 5, 1); ok || where != Beyond {
		t.Errorf("61 min: ok %v, %v", ok, where)
	}
	areas[1].CA = 0 // an area that sheds nothing sets no time
	if peak, _, ok := PartialArea(areas, storm, 5, 1); !ok || peak.Time != 10 {
		t.Errorf("%+v, %v", peak, ok)
	}
	if _, where, ok := PartialArea(areas[:1], storm, 2, 1); !ok || where != Within {
		t.Errorf("10 min: ok %v, %v", ok, where)
	}
	if _, where, ok := PartialArea([]Contribution{{CA: 1}}, storm, 2, 1); !ok || where != Below {
		t.Errorf("2 min: ok %v, %v", ok, where)
	}
}

func BenchmarkPartialArea(b *testing.B) {
	storm := twelveDurations(b)
	for _, n := range []int{10, 1000, 100000} {
		source := rand.New(rand.NewPCG(1, 2))
		areas := make([]Contribution, n)
		for k := range areas {
			areas[k] = Contribution{CA: source.Float64(), InletTime: 5 + 20*source.Float64(), TravelTime: 60 * source.Float64()}
		}
		b.Run(fmt.Sprintf("areas/%.0e", float64(n)), func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				if _, _, ok := PartialArea(areas, storm, 5, 1); !ok {
					b.Fatal("no peak")
				}
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(n), "ns/area")
		})
	}
}
