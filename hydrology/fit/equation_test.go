package fit

import (
	"fmt"
	"math"
	"os"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/hydrology"
	"rimfall/hydrology/rainfile"
)

// A worked sheet: (10, 187), (15, 153), (30, 105) min and mm/h, i = a/(t + b) by a line of 1/i; published a 4840,
// b 16.2 and i(22) 126.7.
func ExampleEquation() {
	table, err := hydrology.NewTable([]float64{10, 15, 30}, []float64{5}, [][]float64{{187}, {153}, {105}})
	if err != nil {
		panic(err)
	}
	r, err := Equation(table, hydrology.MillimetresPerHour, ShiftedInverse)
	if err != nil {
		panic(err)
	}
	term := r.Equation.Constants[0].Terms[0]
	storm, _ := r.Equation.Storm(5, hydrology.MillimetresPerHour)
	i, _ := storm.At(22)
	fmt.Printf("a %.0f, b %.1f, i(22) %.1f\n", math.Round(term.Numerator/10)*10, term.Shift, i)
	// Output: a 4840, b 16.2, i(22) 126.7
}

// Environment Canada's Table 3, R = A·T^B with T in hours, is the line of ln R against ln T through the rates as
// they were before they were rounded for Table 2b: through Gumbel's on the annual maxima. A is printed to 0.1 and B
// to 0.001.
func TestPowerLawGivesThePublishedCanadianConstants(t *testing.T) {
	maxima, text := canadian(t)
	a := printed(t, text, "Table 3", "Mean % Error", "(A)")
	b := printed(t, text, "Table 3", "Mean % Error", "(B)")
	r, err := Equation(canadianTable(t, maxima), hydrology.MillimetresPerHour, PowerLaw)
	if err != nil || len(a) != 1 || len(b) != 1 {
		t.Fatalf("%v, %d rows of A, %d of B", err, len(a), len(b))
	}
	for k, c := range r.Equation.Constants {
		term := c.Terms[0]
		atOneHour := term.Numerator * math.Pow(60, -term.Exponent)
		if math.Abs(atOneHour-a[0][k]) > 0.0501 || math.Abs(-term.Exponent-b[0][k]) > 0.000501 {
			t.Errorf("%v years: A %.3f, B %.4f; published %v, %v", c.Period, atOneHour, -term.Exponent, a[0][k], b[0][k])
		}
	}
}

// canadianTable is Gumbel by moments on the annual maxima, as rates in mm/h.
func canadianTable(t *testing.T, maxima rainfile.Maxima) hydrology.Table {
	t.Helper()
	var depths [][]float64
	for k := range maxima.Durations {
		depths = append(depths, maxima.Of(k))
	}
	storms, err := FitStorms(maxima.Durations, depths, GumbelMoments)
	if err != nil {
		t.Fatal(err)
	}
	table, err := storms.Table(canadianPeriods)
	if err != nil {
		t.Fatal(err)
	}
	return table
}

// A table made by an equation is fitted by that equation again.
func TestFitFindsTheEquationThatMadeTheTable(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		term := hydrology.Term{
			Numerator: rapid.Float64Range(10, 5000).Draw(t, "numerator"), PeriodExponent: rapid.Float64Range(0.1, 0.4).Draw(t, "m"),
			Shift: rapid.Float64Range(0, 40).Draw(t, "shift"), Exponent: rapid.Float64Range(0.5, 1.2).Draw(t, "exponent"),
		}
		durations, periods := []float64{5, 10, 20, 40, 60, 120, 360, 1440}, []float64{2, 10, 100}
		table := tableOf(t, term, durations, periods)
		for _, form := range []Form{ShiftedPower, PeriodPower} {
			r, err := Equation(table, hydrology.InchesPerHour, form)
			if err != nil {
				t.Fatal(err)
			}
			if r.Largest > 1e-6 { // the flat minimum of the shift, 10⁻⁸, and what it costs in the rest
				t.Fatalf("%s: errors to %v for %+v, found %+v", form, r.Largest, term, r.Equation.Constants[0].Terms[0])
			}
		}
	})
}

func tableOf(t *rapid.T, term hydrology.Term, durations, periods []float64) hydrology.Table {
	e := hydrology.Equation{Constants: []hydrology.Constants{{Terms: []hydrology.Term{term}}}, Unit: hydrology.InchesPerHour, Shortest: 1}
	values := make([][]float64, len(durations))
	for _, period := range periods {
		storm, err := e.Storm(period, hydrology.InchesPerHour)
		if err != nil {
			t.Fatal(err)
		}
		for row, minutes := range durations {
			i, _ := storm.At(minutes)
			values[row] = append(values[row], i)
		}
	}
	table, err := hydrology.NewTable(durations, periods, values)
	if err != nil {
		t.Fatal(err)
	}
	return table
}

// Every form on NOAA Atlas 14 at Pulaski, Virginia, 5 min to 24 h. More constants fit no worse, and the errors are
// those of the equation at the table's cells.
func TestFormsOnARealTable(t *testing.T) {
	content, err := os.ReadFile("../../testdata/rainfall/pulaski-va_PF_depth_english_pds.csv")
	if err != nil {
		t.Fatal(err)
	}
	file, _ := rainfile.Read(content, rainfile.Options{})
	whole, _ := file.Table(rainfile.Estimate)
	table, err := hydrology.NewTable(whole.Durations[:10], whole.Periods, whole.Values[:10])
	if err != nil {
		t.Fatal(err)
	}
	rms := map[Form]float64{}
	for _, form := range Forms() {
		r, err := Equation(table, hydrology.InchesPerHour, form)
		if err != nil {
			t.Fatal(err)
		}
		rms[form] = r.RootMeanSquare
		storm, err := r.Equation.Storm(10, hydrology.InchesPerHour)
		if err != nil {
			t.Fatal(err)
		}
		i, _ := storm.At(60)
		if want := i/table.Values[4][3] - 1; math.Abs(r.Errors[4][3]-want) > 1e-12 {
			t.Errorf("%s: error %v at 60 min, 10 years; want %v", form, r.Errors[4][3], want)
		}
	}
	if !(rms[ShiftedPower] <= rms[PowerLaw] && rms[ShiftedPower] <= rms[PeriodPower] && rms[CubicLog] < rms[PowerLaw]) {
		t.Errorf("errors %v", rms)
	}
}

func TestTablesTooSmallToFit(t *testing.T) {
	small, err := hydrology.NewTable([]float64{5, 10}, []float64{10}, [][]float64{{4}, {3}})
	if err != nil {
		t.Fatal(err)
	}
	three, err := hydrology.NewTable([]float64{5, 10, 20}, []float64{10}, [][]float64{{4}, {3}, {2}})
	if err != nil {
		t.Fatal(err)
	}
	for form, want := range map[Form]string{ShiftedPower: "3 are wanted", CubicLog: "4 are wanted", PeriodPower: "3 are wanted"} {
		if _, err := Equation(small, hydrology.InchesPerHour, form); err == nil || !strings.Contains(err.Error(), want) {
			t.Errorf("%s: %v", form, err)
		}
	}
	if _, err := Equation(three, hydrology.InchesPerHour, PeriodPower); err == nil || !strings.Contains(err.Error(), "one return period") {
		t.Errorf("one period: %v", err)
	}
}

func BenchmarkEquation(b *testing.B) {
	content, err := os.ReadFile(charlottetown)
	if err != nil {
		b.Fatal(err)
	}
	file, _ := rainfile.Read(content, rainfile.Options{})
	table, _ := file.Table(rainfile.Estimate)
	for _, form := range Forms() {
		b.Run(form.String(), func(b *testing.B) {
			for b.Loop() {
				if _, err := Equation(table, hydrology.MillimetresPerHour, form); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}
