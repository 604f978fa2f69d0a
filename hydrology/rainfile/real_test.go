package rainfile

import (
	"fmt"
	"math"
	"os"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"rimfall/hydrology"
)

// The files in testdata/rainfall are as the agencies' servers sent them, or as a spreadsheet saved them again:
// NOAA Atlas 14 (National Weather Service, public domain) and Environment and Climate Change Canada, v3.20
// (2021/03/26). Two are transcribed: exact values, not exact bytes.
const realFiles = "../../testdata/rainfall/"

const charlottetown = "idf_v-3.20_2021_03_26_830_PE_8300301_CHARLOTTETOWN_A.txt"

func readReal(t testing.TB, name string) File {
	t.Helper()
	content, err := os.ReadFile(realFiles + name)
	if err != nil {
		t.Fatal(err)
	}
	file, faults := Read(content, Options{})
	if len(faults) > 0 {
		t.Fatalf("%s: %v", name, faults)
	}
	return file
}

// intensitiesAt gives a storm's intensities at durations in minutes, as printed digits.
func intensitiesAt(file File, b Bound, period float64, minutes ...float64) string {
	table, _ := file.Table(b)
	curve, _ := table.Curve(period)
	var printed []string
	for _, m := range minutes {
		i, _ := curve.At(m)
		printed = append(printed, strconv.FormatFloat(i, 'f', 3, 64))
	}
	return strings.Join(printed, " ")
}

// Ten-year intensities at 5, 10, 15, 30 and 60 min: the published depth · 60/minutes.
func ExampleRead_atlas14() {
	for _, name := range []string{
		"pulaski-va_PF_depth_english_pds.csv",
		"ann-arbor-mi_all-bounds_depth_english_pds.csv",
		"fort-myers-fl_PF_depth_english_pds_transcribed.csv",
	} {
		content, err := os.ReadFile(realFiles + name)
		if err != nil {
			panic(err)
		}
		file, _ := Read(content, Options{})
		fmt.Println(file.Place, "·", file.Edition, "·", file.Series, "·", file.Unit)
		fmt.Println(intensitiesAt(file, Estimate, 10, 5, 10, 15, 30, 60))
	}
	// Output:
	// Pulaski, Virginia, USA · NOAA Atlas 14 Volume 2 Version 3 · partial duration · in/h
	// 5.424 4.338 3.656 2.640 1.720
	// Ann Arbor, Michigan, USA · NOAA Atlas 14 Volume 8 Version 2 · partial duration · in/h
	// 6.636 4.860 3.952 2.660 1.700
	// 26.6, -81.9 · NOAA Atlas 14 Volume 9 Version 2 · partial duration · in/h
	// 9.864 7.200 5.880 4.740 3.130
}

// Table 2b at 1 h for 2 to 100 years, and its limits at 5 min, 2 years: 60.8 ± 10.2 mm/h.
func ExampleRead_canada() {
	content, err := os.ReadFile(realFiles + charlottetown)
	if err != nil {
		panic(err)
	}
	file, _ := Read(content, Options{})
	fmt.Println(file.Place, "·", file.Place.Latitude, "·", file.Series, "·", file.Unit)
	for _, years := range []float64{2, 5, 10, 25, 50, 100} {
		fmt.Println(years, "years:", intensitiesAt(file, Estimate, years, 60))
	}
	fmt.Println(intensitiesAt(file, Lower, 2, 5), intensitiesAt(file, Upper, 2, 5), file.Confidence)
	// Output:
	// CHARLOTTETOWN A, PE · 46 17'N · annual maximum · mm/h
	// 2 years: 18.700
	// 5 years: 24.600
	// 10 years: 28.400
	// 25 years: 33.300
	// 50 years: 36.900
	// 100 years: 40.500
	// 50.600 71.000 0.95
}

// publishedCells reads the rows of an Atlas 14 file by splitting at commas and nothing else, in order of the file:
// an independent reading of the same bytes.
func publishedCells(t *testing.T, content string) (minutes []float64, cells [][]float64) {
	t.Helper()
	row := regexp.MustCompile(`^(\d+)-(min|hr|day):`)
	scale := map[string]float64{"min": 1, "hr": 60, "day": 1440}
	for _, line := range strings.Split(content, "\n") {
		words := row.FindStringSubmatch(line)
		if words == nil {
			continue
		}
		count, _ := strconv.Atoi(words[1])
		minutes = append(minutes, float64(count)*scale[words[2]])
		var values []float64
		for _, text := range strings.Split(strings.TrimSpace(line), ",")[1:] {
			value, err := strconv.ParseFloat(strings.TrimSpace(text), 64)
			if err != nil {
				t.Fatal(err)
			}
			values = append(values, value)
		}
		cells = append(cells, values)
	}
	return minutes, cells
}

func TestEveryPublishedCellOfAtlas14IsRead(t *testing.T) {
	names, err := filepath.Glob(realFiles + "*_depth_*.csv")
	if err != nil || len(names) != 7 {
		t.Fatalf("%d files, %v", len(names), err)
	}
	for _, name := range names {
		t.Run(filepath.Base(name), func(t *testing.T) {
			content, err := os.ReadFile(name)
			if err != nil {
				t.Fatal(err)
			}
			file := readReal(t, filepath.Base(name))
			minutes, cells := publishedCells(t, string(content))
			row := 0
			for _, b := range []Bound{Estimate, Upper, Lower} { // the order within a file
				table, ok := file.Table(b)
				if !ok {
					continue
				}
				compareRows(t, table, minutes[row:row+19], cells[row:row+19])
				row += 19
			}
			if row != len(cells) {
				t.Errorf("%d rows were read of %d", row, len(cells))
			}
			if len(file.Notices) > 0 {
				t.Errorf("notices: %v", file.Notices)
			}
		})
	}
}

func compareRows(t *testing.T, table hydrology.Table, minutes []float64, depths [][]float64) {
	t.Helper()
	if len(table.Durations) != 19 || len(table.Periods) != 10 {
		t.Fatalf("%d durations, %d periods", len(table.Durations), len(table.Periods))
	}
	for row := range minutes {
		for column, depth := range depths[row] {
			got := table.Values[row][column] * table.Durations[row] / 60
			if table.Durations[row] != minutes[row] || math.Abs(got-depth) > 1e-12*depth { // there and back
				t.Errorf("%v min, column %d: %v, published %v", minutes[row], column, got, depth)
			}
		}
	}
}

func TestThreeFilesJoinToOne(t *testing.T) {
	estimate := readReal(t, "pulaski-va_PF_depth_english_pds.csv")
	upper := readReal(t, "pulaski-va_UCL_depth_english_pds.csv")
	lower := readReal(t, "pulaski-va_LCL_depth_english_pds.csv")
	joined, err := Join(upper, estimate, lower)
	if err != nil {
		t.Fatal(err)
	}
	// 10 years, 60 min: 1.55, 1.72 and 1.91 in, which in an hour are in/h.
	for b, want := range map[Bound]string{Lower: "1.550", Estimate: "1.720", Upper: "1.910"} {
		if got := intensitiesAt(joined, b, 10, 60); got != want {
			t.Errorf("%s: %s, want %s", b, got, want)
		}
	}
	if joined.Confidence != 0.90 {
		t.Errorf("confidence %v", joined.Confidence)
	}
	if _, err := Join(estimate, estimate); err == nil {
		t.Error("two estimates were joined")
	}
	if _, err := Join(estimate, readReal(t, "mount-sunapee-nh_LCL_depth_english_pds.csv")); err == nil {
		t.Error("two places were joined")
	}
}

func TestCanadianFileIsReadToItsPublishedCells(t *testing.T) {
	file := readReal(t, charlottetown)
	m := file.Maxima
	if len(m.Years) != 32 || len(m.Durations) != 9 || len(m.Of(0)) != 31 || len(m.Of(8)) != 32 {
		t.Fatalf("%d years, %d durations, %d and %d known", len(m.Years), len(m.Durations), len(m.Of(0)), len(m.Of(8)))
	}
	// Table 1, "Mean": 5.5 8.2 10.0 13.8 19.8 28.8 45.7 56.4 63.9; printed to 0.1.
	for k, want := range []float64{5.5, 8.2, 10.0, 13.8, 19.8, 28.8, 45.7, 56.4, 63.9} {
		sum := 0.0
		for _, depth := range m.Of(k) {
			sum += depth
		}
		if mean := sum / float64(len(m.Of(k))); math.Abs(mean-want) > 0.05 {
			t.Errorf("mean at %v min %.3f, published %v", m.Durations[k], mean, want)
		}
	}
	// Table 2b, first and last row, and the limits of the last: 0.3 0.5 0.6 0.8 1.0 1.2.
	for k, years := range []float64{2, 5, 10, 25, 50, 100} {
		want5 := []float64{60.8, 88.5, 106.9, 130.2, 147.4, 164.6}[k]
		want1440 := []float64{2.5, 3.3, 3.8, 4.4, 4.9, 5.3}[k]
		limit := []float64{0.3, 0.5, 0.6, 0.8, 1.0, 1.2}[k]
		got := intensitiesAt(file, Estimate, years, 5, 1440) + " " + intensitiesAt(file, Upper, years, 1440)
		if want := fmt.Sprintf("%.3f %.3f %.3f", want5, want1440, want1440+limit); got != want {
			t.Errorf("%v years: %s, published %s", years, got, want)
		}
	}
}

// Table 3 of the file: A 17.4 … 40.1, B −0.551 … −0.578, T in hours; at 1 h the rate is A itself. At 5 minutes and
// 2 years the fitted line gives 68.4 mm/h where the table has 60.8: 12 % more.
func TestPublishedPowerLawIsAnEquation(t *testing.T) {
	file := readReal(t, charlottetown)
	for k, years := range []float64{2, 5, 10, 25, 50, 100} {
		storm, err := file.PowerLaw.Storm(years, hydrology.MillimetresPerHour)
		if err != nil {
			t.Fatal(err)
		}
		want := []float64{17.4, 23.5, 27.5, 32.6, 36.4, 40.1}[k]
		if i, where := storm.At(60); math.Abs(i-want) > 1e-9 || where != hydrology.Within {
			t.Errorf("%v years: %v, %v; published %v", years, i, where, want)
		}
	}
	storm, _ := file.PowerLaw.Storm(2, hydrology.MillimetresPerHour)
	if i, _ := storm.At(5); math.Abs(i/60.8-1.125) > 0.002 { // recomputed: 17.4·(5/60)^−0.551 = 68.42
		t.Errorf("5 min, 2 years: %v", i)
	}
}
