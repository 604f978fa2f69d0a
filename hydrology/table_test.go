package hydrology

import (
	"fmt"
	"math"
	"slices"
	"testing"

	"pgregory.net/rapid"
)

func TestTableFaultsAreAllListedWithTheirPlaces(t *testing.T) {
	nan := math.NaN()
	cases := []struct {
		name               string
		durations, periods []float64
		values             [][]float64
		want               [][2]int
	}{
		{"ties in both directions are allowed", []float64{5, 10}, []float64{2, 5}, [][]float64{{4, 4}, {4, 4}}, nil},
		{"columns in any order are allowed", []float64{5, 10}, []float64{10, 2}, [][]float64{{4, 3}, {3, 2}}, nil},
		{"an empty table lacks rows and periods", nil, nil, nil, [][2]int{{-1, -1}, {-1, -1}}},
		{"more durations than rows", []float64{5, 10}, []float64{2}, [][]float64{{4}}, [][2]int{{-1, -1}}},
		{"intensity that rises with duration", []float64{5, 10}, []float64{2, 5}, [][]float64{{4, 5}, {4, 6}}, [][2]int{{1, 1}}},
		{"intensity that falls with return period", []float64{5, 10}, []float64{5, 2}, [][]float64{{4, 5}, {3, 3}}, [][2]int{{0, 0}}},
		{"a duration twice, and one that falls", []float64{5, 5, 4}, []float64{2}, [][]float64{{4}, {3}, {2}}, [][2]int{{1, -1}, {2, -1}}},
		{"a period twice, and one below zero", []float64{5}, []float64{2, 2, -1}, [][]float64{{4, 4, 4}}, [][2]int{{-1, 1}, {-1, 2}}},
		{
			"what is no number, zero, or without end",
			[]float64{nan, 0, 5},
			[]float64{2, 5},
			[][]float64{{nan, 6}, {0, math.Inf(1)}, {-4, 5}},
			[][2]int{{0, -1}, {0, 0}, {1, -1}, {1, 0}, {1, 1}, {2, 0}},
		},
		{"a row too short and a row too long", []float64{5, 10}, []float64{2, 5}, [][]float64{{4}, {3, 4, 5}}, [][2]int{{0, 1}, {1, 2}}},
	}
	for _, k := range cases {
		t.Run(k.name, func(t *testing.T) {
			_, err := NewTable(k.durations, k.periods, k.values)
			var places [][2]int
			if err != nil {
				for _, f := range err.(CellFaults) {
					places = append(places, [2]int{f.Row, f.Column})
				}
			}
			if !slices.Equal(places, k.want) {
				t.Errorf("faults at %v, want %v\n%v", places, k.want, err)
			}
		})
	}
}

func TestColumnsGoInOrderOfTheirPeriods(t *testing.T) {
	table, err := NewTable([]float64{5, 10}, []float64{10, 2}, [][]float64{{4, 3}, {3.5, 2}})
	if err != nil {
		t.Fatal(err)
	}
	c, ok := table.Curve(10)
	if i, _ := c.At(10); !ok || i != 3.5 {
		t.Errorf("10 years, 10 min: %v, %v; want 3.5", i, ok)
	}
	if _, ok := table.Curve(5); ok {
		t.Error("a storm of 5 years was found in a table without one")
	}
}

func TestBetweenColumns(t *testing.T) {
	gumbel := func(T float64) float64 { return -math.Log(-math.Log(1 - 1/T)) }
	rows := func(y func(float64) float64) [][]float64 { // i = 20 + 10·y at 5 min, half of it at 10
		return [][]float64{{20 + 10*y(2), 20 + 10*y(10)}, {10 + 5*y(2), 10 + 5*y(10)}}
	}
	cases := []struct {
		name   string
		series Series
		y      func(float64) float64
	}{
		{"annual maxima lie on a straight line in Gumbel's variate", AnnualMaximum, gumbel},
		{"partial durations lie on a straight line in ln T", PartialDuration, math.Log},
	}
	for _, k := range cases {
		t.Run(k.name, func(t *testing.T) {
			table, err := NewTable([]float64{5, 10}, []float64{2, 10}, rows(k.y))
			if err != nil {
				t.Fatal(err)
			}
			c, ok := table.CurveBetween(5, k.series)
			got, _ := c.At(5)
			if want := 20 + 10*k.y(5); !ok || math.Abs(got-want) > 1e-12*want { // rounding of a few logarithms
				t.Errorf("5 years: %v, %v; want %v", got, ok, want)
			}
		})
	}
}

// NOAA Atlas 14, Pulaski, Virginia, 60 min, partial duration: 1.72 in at 10 years and 2.31 at 50. Between them at 25
// years 2.06 is published; the line in ln T is not the atlas's own, and lands on its digits here.
func ExampleTable_CurveBetween() {
	table, err := NewTable([]float64{60}, []float64{10, 50}, [][]float64{{1.72, 2.31}})
	if err != nil {
		panic(err)
	}
	curve, _ := table.CurveBetween(25, PartialDuration)
	i, _ := curve.At(60)
	fmt.Printf("%.2f in/h\n", i)
	// Output: 2.06 in/h
}

func TestNoStormOutsideTheColumns(t *testing.T) {
	table, err := NewTable([]float64{5}, []float64{1, 2, 10}, [][]float64{{3, 4, 5}})
	if err != nil {
		t.Fatal(err)
	}
	for _, period := range []float64{0, 0.5, 10.1, 100, math.NaN(), math.Inf(1)} {
		if _, ok := table.CurveBetween(period, PartialDuration); ok {
			t.Errorf("a storm of %v years came of columns 1 to 10", period)
		}
	}
	if _, ok := table.CurveBetween(1.5, AnnualMaximum); ok {
		t.Error("a storm of 1.5 years came of annual maxima of 1 and 2 years")
	}
	if _, ok := (Table{}).CurveBetween(10, PartialDuration); ok {
		t.Error("a storm came of the zero Table")
	}
}

func TestLongerPeriodsNeverRainLess(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		table := drawTable(t)
		first, last := table.Periods[0], table.Periods[len(table.Periods)-1]
		period := rapid.Float64Range(first, last)
		a, b := period.Draw(t, "a"), period.Draw(t, "b")
		series := rapid.SampledFrom([]Series{PartialDuration, AnnualMaximum}).Draw(t, "series")
		rarely, ok1 := table.CurveBetween(max(a, b), series)
		often, ok2 := table.CurveBetween(min(a, b), series)
		if !ok1 || !ok2 {
			t.Fatalf("no storm for %v or %v years", a, b)
		}
		for _, d := range table.Durations {
			more, _ := rarely.At(d)
			if less, _ := often.At(d); less > more*(1+1e-15) { // one step of rounding
				t.Fatalf("%v min: %v in the commoner storm, %v in the rarer", d, less, more)
			}
		}
	})
}
