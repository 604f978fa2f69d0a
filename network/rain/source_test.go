package rain_test

import (
	"fmt"
	"math"
	"os"
	"strings"
	"testing"

	"rimfall/hydrology"
	"rimfall/hydrology/rainfile"
	"rimfall/network/rain"
)

const realFiles = "../../testdata/rainfall/"

const charlottetown = "idf_v-3.20_2021_03_26_830_PE_8300301_CHARLOTTETOWN_A.txt"

func content(t testing.TB, name string) rain.Content {
	t.Helper()
	text, err := os.ReadFile(realFiles + name)
	if err != nil {
		t.Fatal(err)
	}
	return rain.Content{Name: name, Text: text}
}

func read(t testing.TB, o rain.Options, contents ...rain.Content) *rain.Source {
	t.Helper()
	s, err := rain.Read(contents, o)
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// Environment and Climate Change Canada, Charlottetown A, v3.20 (2021/03/26): Gumbel by moments on Table 1 gives the
// 54 depths of Table 2a to their last digit, 0.1 mm; Table 2a is Table 2b times the duration.
func TestGumbelByMomentsGivesTheCanadianTable(t *testing.T) {
	s := read(t, rain.Options{Fit: true}, content(t, charlottetown))
	d := s.Distributions[0]
	if d.Method.String() != "Gumbel by moments" || len(d.Rows) != len(s.Table.Durations) {
		t.Fatalf("%v, %d rows", d.Method, len(d.Rows))
	}
	for row := range d.Rows {
		for k := range s.Periods {
			rate := d.Rows[row].Depths[k].Depth * 60 / d.Rows[row].Duration
			printed := s.Table.Values[row][k]
			// The rate is printed to 0.1 mm/h and so is its depth to 0.1 mm: half of each.
			if room := 0.05 + 0.05*60/d.Rows[row].Duration; math.Abs(rate-printed) > room {
				t.Errorf("%v min, %v years: %.3f mm/h, printed %v", d.Rows[row].Duration, s.Periods[k], rate, printed)
			}
		}
	}
}

// A table that is written and read again is the same to its ten digits, for every file there is.
func TestEveryFileBecomesATableThatReadsBack(t *testing.T) {
	entries, err := os.ReadDir(realFiles)
	if err != nil {
		t.Fatal(err)
	}
	seen := 0
	for _, e := range entries {
		if strings.HasPrefix(e.Name(), ".") {
			continue
		}
		seen++
		s := read(t, rain.Options{}, content(t, e.Name()))
		var b strings.Builder
		if err := s.WriteTable(&b); err != nil {
			t.Fatal(err)
		}
		again := read(t, rain.Options{Unit: s.Unit}, rain.Content{Name: "rainfall.csv", Text: []byte(b.String())})
		for row := range s.Table.Values {
			for k, want := range s.Table.Values[row] {
				if got := again.Table.Values[row][k]; math.Abs(got-want) > 1e-9*want {
					t.Errorf("%s: %v became %v", e.Name(), want, got)
				}
			}
		}
	}
	if seen < 8 {
		t.Errorf("%d files only", seen)
	}
}

// NOAA Atlas 14, volume 2 version 3, Pulaski: one file a bound, as the server sends them.
func TestAnEstimateAndItsBoundsAreJoined(t *testing.T) {
	files := []rain.Content{
		content(t, "pulaski-va_LCL_depth_english_pds.csv"), content(t, "pulaski-va_PF_depth_english_pds.csv"), content(t, "pulaski-va_UCL_depth_english_pds.csv"),
	}
	at := map[rainfile.Bound]float64{}
	for _, b := range []rainfile.Bound{rainfile.Estimate, rainfile.Upper, rainfile.Lower} {
		at[b] = read(t, rain.Options{Bound: b}, files...).Table.Values[0][3] // 5 min, 10 years
	}
	// 0.452, 0.500 and 0.406 in · 12
	for b, want := range map[rainfile.Bound]float64{rainfile.Estimate: 5.424, rainfile.Upper: 6.0, rainfile.Lower: 4.872} {
		if math.Abs(at[b]-want) > 1e-9 {
			t.Errorf("%v: %v in/h, want %v", b, at[b], want)
		}
	}
}

func TestAnnualMaximaThatMakeNoTableSayWhere(t *testing.T) {
	// Invented: in every year as much falls in 10 min as in 5 but for one, in which 60 times as much does.
	var b strings.Builder
	b.WriteString("year,5,10\n")
	for y := range 12 {
		longer := float64(20 + y)
		if y == 0 {
			longer = 1200
		}
		fmt.Fprintf(&b, "%d,%d,%g\n", 1990+y, 20+y, longer)
	}
	_, err := rain.Read([]rain.Content{{Name: "maxima.csv", Text: []byte(b.String())}}, rain.Options{Unit: hydrology.MillimetresPerHour})
	if err == nil || !strings.Contains(err.Error(), "maxima.csv: 10 min, 100 years: intensity rises with duration") {
		t.Errorf("%v", err)
	}
	_, err = rain.Read([]rain.Content{{Name: "maxima.csv", Text: []byte("year,5,10\n1990,4,5\n1991,5,6\n")}}, rain.Options{Unit: hydrology.MillimetresPerHour})
	if err == nil || !strings.Contains(err.Error(), "maxima.csv: 5 min: 2 years; 10 are wanted") || !strings.Contains(err.Error(), "10 min: 2 years") {
		t.Errorf("%v", err)
	}
}
