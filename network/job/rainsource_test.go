package job_test

import (
	"fmt"
	"math"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"

	"rimfall/hydrology"
	"rimfall/network/job"
)

const realRain = "../../testdata/rainfall/"

const charlottetown = "idf_v-3.20_2021_03_26_830_PE_8300301_CHARLOTTETOWN_A.txt"

func number(v float64) string { return strconv.FormatFloat(v, 'f', -1, 64) }

// withRain is the sound job with an agency's file and settings of [storm] in front.
func withRain(t testing.TB, file, units, storm string) string {
	t.Helper()
	dir := folder(t, "-- job.toml --\nunits = \""+units+"\"\n[storm]\nrainfall = \""+file+"\"\n"+storm+"\n")
	content, err := os.ReadFile(realRain + file)
	if err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(filepath.Join(dir, file), content, 0o644); err != nil {
		t.Fatal(err)
	}
	return dir
}

func readJob(t testing.TB, dir string) *job.Job {
	t.Helper()
	j, err := job.Read(dir, job.ToSize, rules)
	if err != nil {
		t.Fatal(err)
	}
	return j
}

// intensities gives a job's storm at durations in minutes.
func intensities(t testing.TB, j *job.Job, period float64, minutes ...float64) string {
	t.Helper()
	storm, ok := j.Curve(period)
	if !ok {
		t.Fatal(j.NoSuchPeriod(period))
	}
	var printed []string
	for _, m := range minutes {
		i, _ := storm.At(m)
		printed = append(printed, fmt.Sprintf("%.3f", i))
	}
	return strings.Join(printed, " ")
}

// NOAA Atlas 14: Pulaski, Virginia, volume 2 version 3, 10 years: published depths times 60/minutes.
func TestAJobTakesAnAtlas14FileAsItIs(t *testing.T) {
	j := readJob(t, withRain(t, "pulaski-va_PF_depth_english_pds.csv", "us", "return_period = 10"))
	if got, want := intensities(t, j, 10, 5, 10, 15, 30, 60), "5.424 4.338 3.656 2.640 1.720"; got != want {
		t.Errorf("got %s, want %s", got, want)
	}
	if got, want := j.Rain.Describe(), "Pulaski, Virginia, USA · NOAA Atlas 14 point file · NOAA Atlas 14 Volume 2 Version 3 · partial duration series · in/h"; got != want {
		t.Errorf("got %s, want %s", got, want)
	}
	depth, _, ok := j.TwoYearDay() // the file's 24-hr row, column of 2 years: 2.41 in
	if !ok || math.Abs(depth-twoYearDayOf(t)) > 1e-9 {
		t.Errorf("2-year 24-hour depth %v, want %v", depth, twoYearDayOf(t))
	}
}

// twoYearDayOf reads the published cell from the file's own row.
func twoYearDayOf(t *testing.T) float64 {
	t.Helper()
	content, err := os.ReadFile(realRain + "pulaski-va_PF_depth_english_pds.csv")
	if err != nil {
		t.Fatal(err)
	}
	for line := range strings.Lines(string(content)) {
		if rest, ok := strings.CutPrefix(line, "24-hr:,"); ok {
			v, err := strconv.ParseFloat(strings.TrimSpace(strings.Split(rest, ",")[1]), 64)
			if err != nil {
				t.Fatal(err)
			}
			return v
		}
	}
	t.Fatal("no row of 24 h")
	return 0
}

func TestTheBoundsOfOneFileAreTaken(t *testing.T) {
	const file = "ann-arbor-mi_all-bounds_depth_english_pds.csv"
	estimate := intensities(t, readJob(t, withRain(t, file, "us", "return_period = 10")), 10, 5)
	if estimate != "6.636" { // 0.553 in · 12
		t.Errorf("estimate %s", estimate)
	}
	upper := readJob(t, withRain(t, file, "us", "return_period = 10\nbound = \"upper\""))
	lower := readJob(t, withRain(t, file, "us", "return_period = 10\nbound = \"lower\""))
	if u, l := intensities(t, upper, 10, 5), intensities(t, lower, 10, 5); !(l < estimate && estimate < u) {
		t.Errorf("lower %s, estimate %s, upper %s", l, estimate, u)
	}
	if got := upper.Rain.Describe(); !strings.HasSuffix(got, "upper bound of the 90 % interval") {
		t.Errorf("described as %s", got)
	}
}

// Table 2b of the file, 10 years: 106.9 mm/h at 5 min, 28.4 at 1 h; in inches 4.209 and 1.118.
func TestAMetricFileInAJobOfInchesIsConvertedAndSaidSo(t *testing.T) {
	j := readJob(t, withRain(t, charlottetown, "us", "return_period = 10"))
	if got, want := intensities(t, j, 10, 5, 60), "4.209 1.118"; got != want {
		t.Errorf("got %s, want %s", got, want)
	}
	if !j.Rain.Converted || j.Rain.Series != hydrology.AnnualMaximum {
		t.Errorf("converted %v, series %v", j.Rain.Converted, j.Rain.Series)
	}
}

// Between 10 and 25 years of annual maxima, at 5 min: linear in y = −ln(−ln(1 − 1/T)); y(10) = 2.2504, y(20) =
// 2.9702, y(25) = 3.1985: 106.9 + 0.7592·(130.2 − 106.9) = 124.6 mm/h (worked by hand).
func TestAStormBetweenTheColumnsIsOnTheScaleOfItsSeries(t *testing.T) {
	j := readJob(t, withRain(t, charlottetown, "si", "return_period = 20"))
	storm, _ := j.Curve(20)
	if got, _ := storm.At(5); math.Abs(got-124.59) > 0.01 {
		t.Errorf("%v mm/h", got)
	}
	if lower, upper, ok := j.Between(20); !ok || lower != 10 || upper != 25 {
		t.Errorf("between %v and %v, %v", lower, upper, ok)
	}
}

// The sound job's table at 5 min: 3 at 2 years, 4 at 10. At 5 years ln 5/2 over ln 10/2 is 0.5693 for partial durations.
func TestATableOfOnesOwnIsPartialDurationUnlessItSaysOtherwise(t *testing.T) {
	partial := readJob(t, folder(t, ""))
	if got := intensities(t, partial, 5, 5); got != "3.569" {
		t.Errorf("partial duration: %s", got)
	}
	annual := readJob(t, folder(t, "-- job.toml --\n[storm]\nreturn_period = 10\nseries = \"annual-maximum\"\n"))
	// y(2) = 0.3665, y(5) = 1.4999, y(10) = 2.2504: 3 + 1.1334/1.8839 = 3.602.
	if got := intensities(t, annual, 5, 5); got != "3.602" {
		t.Errorf("annual maximum: %s", got)
	}
}

func TestUpliftFallsOnEveryIntensityAndNotOnTheTwoYearDepth(t *testing.T) {
	const file = "pulaski-va_PF_depth_english_pds.csv"
	j := readJob(t, withRain(t, file, "us", "return_period = 10\nuplift = 1.25"))
	if got := intensities(t, j, 10, 5); got != "6.780" { // 5.424 · 1.25
		t.Errorf("%s in/h", got)
	}
	if depth, _, _ := j.TwoYearDay(); math.Abs(depth-twoYearDayOf(t)) > 1e-9 {
		t.Errorf("depth %v", depth)
	}
}

func TestFaultsOfRainfallSources(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"a plain table has no bounds", `
-- job.toml --
[storm]
return_period = 10
bound = "upper"
`, `
job.toml:3:1: bound = "upper": a plain table has no bounds; name an agency's file, or leave it out
`},
		{"the file is of an unknown kind", `
-- rainfall.csv --
Dear sir,
please find the rainfall attached.
`, `
rainfall.csv:1: the file is of an unknown kind; looked for were a NOAA Atlas 14 point file (by duration for ARI …), an Environment Canada short-duration text (Table 2b …), and a CSV table headed duration or year
`},
		{"the server's refusal was saved", `
-- rainfall.csv --
result = 'none';
ErrorMsg = 'Error 3.0: Selected location is not within a project area';
`, `
rainfall.csv:1: this is the server's refusal saved as a file, and no rainfall; it says: Error 3.0: Selected location is not within a project area
`},
		{"it is a list of annual maxima", `
-- rainfall.csv --
year,5,10
1990,0.5,0.8
1991,0.4,0.7
`, `
rainfall.csv: is a list of annual maxima; ` + "`rimfall rain rainfall.csv --out rainfall.csv`" + ` makes a table of it
`},
		{"words of settings are unknown", `
-- job.toml --
[storm]
return_period = 10
bound = "uper"
series = "annual"
surface_c = "middle"
impervious_relation = "square"
two_year_day_depth = -1
`, `
job.toml:3:1: storm.bound = uper: write one of "estimate", "upper", "lower"
job.toml:4:1: storm.series = annual: write one of "partial-duration", "annual-maximum"
job.toml:5:1: storm.surface_c = middle: write one of "usual", "low", "high"
job.toml:6:1: storm.impervious_relation = square: write one of "linear", "cubic", "two-part"
job.toml:7:1: storm.two_year_day_depth = -1: it takes a depth over 0, in or mm
`},
	})
	only := faults(t, withRain(t, "pulaski-va_LCL_depth_english_pds.csv", "us", "return_period = 10"), job.ToSize)
	if !strings.Contains(only, `has no table for bound = "estimate"; it has "lower"`) {
		t.Errorf("a file of one bound: %s", only)
	}
	other := faults(t, withRain(t, charlottetown, "si", "return_period = 10\nseries = \"partial-duration\""), job.ToSize)
	if !strings.Contains(other, "job.toml:5:1: the file states its series: annual maximum; leave the setting out") {
		t.Errorf("a series that contradicts the file: %s", other)
	}
}

func writeFile(t testing.TB, dir, name, text string) {
	t.Helper()
	if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
		t.Fatal(err)
	}
}
