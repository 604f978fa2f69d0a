package fit

import (
	"fmt"
	"math"
	"os"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"rimfall/hydrology/rainfile"
)

const charlottetown = "../../testdata/rainfall/idf_v-3.20_2021_03_26_830_PE_8300301_CHARLOTTETOWN_A.txt"

var canadianPeriods = []float64{2, 5, 10, 25, 50, 100}

// canadian reads the annual maxima of Environment and Climate Change Canada's file of Charlottetown A (v3.20,
// 2021/03/26), and its text.
func canadian(t testing.TB) (rainfile.Maxima, string) {
	t.Helper()
	content, err := os.ReadFile(charlottetown)
	if err != nil {
		t.Fatal(err)
	}
	file, faults := rainfile.Read(content, rainfile.Options{})
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	return file.Maxima, string(content)
}

// printed finds rows of six numbers between two words of the file: an independent reading.
func printed(t *testing.T, text, from, to, row string) [][]float64 {
	t.Helper()
	_, text, _ = strings.Cut(text, from)
	text, _, _ = strings.Cut(text, to)
	number := regexp.MustCompile(`-?\d+\.\d+`)
	var rows [][]float64
	for _, line := range strings.Split(text, "\n") {
		if !strings.Contains(line, row) && row != "" || len(number.FindAllString(line, -1)) != 6 {
			continue
		}
		var values []float64
		for _, word := range number.FindAllString(line, -1) {
			value, err := strconv.ParseFloat(word, 64)
			if err != nil {
				t.Fatal(err)
			}
			values = append(values, value)
		}
		rows = append(rows, values)
	}
	return rows
}

// Gumbel by moments on Table 1 gives the 54 values of Table 2a, which is printed to 0.1 mm.
func TestGumbelByMomentsGivesThePublishedCanadianTable(t *testing.T) {
	maxima, text := canadian(t)
	want := printed(t, text, "Table 2a", "Table 2b", "")
	if len(want) != 9 {
		t.Fatalf("%d rows in Table 2a", len(want))
	}
	for row := range maxima.Durations {
		f, err := Fit(maxima.Of(row), GumbelMoments)
		if err != nil {
			t.Fatal(err)
		}
		for column, period := range canadianPeriods {
			got, ok := f.Quantile(period)
			if !ok || math.Abs(got-want[row][column]) > 0.0501 {
				t.Errorf("%v min, %v years: %.3f mm, published %v", maxima.Durations[row], period, got, want[row][column])
			}
		}
	}
}

// The ± rows of Table 2b are 95 % limits in mm/h, printed to 0.1.
func TestGumbelLimitsGiveThePublishedCanadianOnes(t *testing.T) {
	maxima, text := canadian(t)
	want := printed(t, text, "Table 2b", "Table 3", "+/-")
	if len(want) != 9 {
		t.Fatalf("%d rows of limits", len(want))
	}
	for row, minutes := range maxima.Durations {
		f, err := Fit(maxima.Of(row), GumbelMoments)
		if err != nil {
			t.Fatal(err)
		}
		for column, period := range canadianPeriods {
			lower, upper, ok := f.Limits(period, 0.95)
			got := (upper - lower) / 2 * 60 / minutes
			if !ok || math.Abs(got-want[row][column]) > 0.0501 {
				t.Errorf("%v min, %v years: ±%.3f mm/h, published ±%v", minutes, period, got, want[row][column])
			}
		}
	}
}

// Environment Canada, Charlottetown A, 1 h, 100 years: published 40.5 mm ± 9.1.
func ExampleFit() {
	content, err := os.ReadFile(charlottetown)
	if err != nil {
		panic(err)
	}
	file, _ := rainfile.Read(content, rainfile.Options{})
	f, err := Fit(file.Maxima.Of(4), GumbelMoments)
	if err != nil {
		panic(err)
	}
	value, _ := f.Quantile(100)
	_, upper, _ := f.Limits(100, 0.95)
	fmt.Printf("%.1f ± %.1f mm\n", value, upper-value)
	// Output: 40.5 ± 9.1 mm
}

// Factors of the Pearson III distribution: US Water Resources Council, Bulletin 17B (1982), appendix 3, from memory.
func TestPearson3Factors(t *testing.T) {
	cases := []struct{ skew, p, want float64 }{
		{0, 0.99, 2.32635},
		{0.2, 0.99, 2.47226},
		{0.5, 0.99, 2.68572},
		{1, 0.99, 3.02256},
		{2, 0.99, 3.60517},
		{3, 0.99, 4.05138},
		{1, 0.9, 1.34039},
		{1, 0.5, -0.16397},
		{-1, 0.99, 1.58838},
	}
	for _, k := range cases {
		if got := Pearson3Factor(k.skew, k.p); math.Abs(got-k.want) > 6e-6 { // the printed digits
			t.Errorf("skew %v, p %v: %.6f, published %v", k.skew, k.p, got, k.want)
		}
	}
}
