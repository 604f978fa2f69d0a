package rainfile

import (
	"os"
	"slices"
	"strings"
	"testing"

	"rimfall/hydrology"
)

// The texts here are invented; their form is that of the servers' answers.

const metricIntensity = `Point precipitation frequency estimates (millimeters/hour)
NOAA Atlas 14 Volume 2 Version 3
Data type: Precipitation intensity
Time series type: Annual maximum
Latitude: 37.0 Degree
Longitude: -80.8 Degree


PRECIPITATION FREQUENCY ESTIMATES
by duration for AEP:, '1/2,'1/5,'1/10
5-min:, 100,120,140
60-min:, 30,36,40
24-hr:, 3,3,4
60-day:, 0,0,1
`

func TestMetricIntensitiesOfZeroAreLeftOut(t *testing.T) {
	file, faults := Read([]byte(metricIntensity), Options{})
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	table, _ := file.Table(Estimate)
	if !slices.Equal(table.Durations, []float64{5, 60, 1440}) {
		t.Errorf("durations %v", table.Durations)
	}
	if !slices.Equal(table.Periods, []float64{2, 5, 10}) || file.Series != hydrology.AnnualMaximum {
		t.Errorf("periods %v, %s", table.Periods, file.Series)
	}
	if file.Unit != hydrology.MillimetresPerHour || file.PrintsDepths {
		t.Errorf("unit %s, depths %v", file.Unit, file.PrintsDepths)
	}
	if len(file.Notices) != 1 || file.Notices[0].Line != 14 {
		t.Errorf("notices %v", file.Notices)
	}
}

// mangled turns the Pulaski file into what people make of it.
func mangled(t *testing.T, mangle func(string) string) (File, Faults) {
	t.Helper()
	content, err := os.ReadFile(realFiles + "pulaski-va_PF_depth_english_pds.csv")
	if err != nil {
		t.Fatal(err)
	}
	return Read([]byte(mangle(string(content))), Options{Unit: hydrology.InchesPerHour})
}

func TestMangledFilesReadTheSame(t *testing.T) {
	decimalComma := func(s string) string {
		head, rows, _ := strings.Cut(s, "by duration")
		rows = "by duration" + strings.NewReplacer(",", ";", ".", ",").Replace(rows)
		return head + rows
	}
	cases := []struct {
		name    string
		mangle  func(string) string
		notices int
	}{
		{"with CRLF", func(s string) string { return strings.ReplaceAll(s, "\n", "\r\n") }, 0},
		{"with a byte-order mark", func(s string) string { return "\ufeff" + s }, 0},
		{"with the degree sign as one Latin-1 byte", func(s string) string { return strings.ReplaceAll(s, "\u00b0", "\xb0") }, 0},
		{"with the degree sign as a word", func(s string) string { return strings.ReplaceAll(s, "\u00b0", " Degree") }, 0},
		{"padded with commas", func(s string) string { return strings.ReplaceAll(s, "\n", ",,,,\n") }, 0},
		{"with quotes round the place", func(s string) string {
			return strings.Replace(s, "Location name (ESRI Maps): Pulaski, Virginia, USA", `"Location name (ESRI Maps): Pulaski, Virginia, USA",,`, 1)
		}, 0},
		{"with semicolons and decimal commas", decimalComma, 0},
		{"with tabs", func(s string) string { return strings.ReplaceAll(s, ",", "\t") }, 0},
		{"without its footer", func(s string) string { return s[:strings.Index(s, "Date/time")] }, 0},
		{"with its head replaced by one line", func(s string) string {
			return "Duration,1,2,5,10,25,50,100,200,500,1000\n" + s[strings.Index(s, "5-min"):strings.Index(s, "Date/time")]
		}, 1},
		{"cut off after 24 hours", func(s string) string { return s[:strings.Index(s, "2-day")] }, 1},
	}
	want := intensitiesAt(readReal(t, "pulaski-va_PF_depth_english_pds.csv"), Estimate, 25, 5, 17, 60, 1440)
	for _, k := range cases {
		t.Run(k.name, func(t *testing.T) {
			file, faults := mangled(t, k.mangle)
			if len(faults) > 0 {
				t.Fatal(faults)
			}
			if got := intensitiesAt(file, Estimate, 25, 5, 17, 60, 1440); got != want || file.Unit != hydrology.InchesPerHour {
				t.Errorf("%s in %s, want %s", got, file.Unit, want)
			}
			if len(file.Notices) != k.notices {
				t.Errorf("notices: %v", file.Notices)
			}
		})
	}
}

func TestRefusals(t *testing.T) {
	cases := []struct{ name, content, want string }{
		{"the server's refusal", "result = 'none';\nErrorMsg = 'Error 3.0: Selected location is not within a project area';\n", "not within a project area"},
		{"a web page", "<!DOCTYPE html><html><body>by duration for ARI</body></html>", "web page"},
		{"some other file says what was looked for", "a,b,c\n1,2,3\n", "looked for"},
		{"an empty file", "", "unknown kind"},
		{"an own table beside which no unit is given", "duration,2,5\n5,4,5\n", "unit"},
		{"a table of depths that fall", strings.Replace(metricIntensity, "60-min:, 30,36,40", "60-min:, 30,36,30", 1), "falls with return period, from 36"},
	}
	for _, k := range cases {
		t.Run(k.name, func(t *testing.T) {
			_, faults := Read([]byte(k.content), Options{})
			if len(faults) != 1 || !strings.Contains(faults[0].Text, k.want) {
				t.Errorf("faults %v, want one with %q", faults, k.want)
			}
		})
	}
}

func TestAllFaultsComeInOneGoWithTheirPlaces(t *testing.T) {
	content := `Point precipitation frequency estimates (inches)
Data type: Precipitation intensity
Time series type: Partial duration
by duration for ARI (years):, 1,2,x
5-min:, 0.3,0.4,0.5
10-min:, 0.5,NaN,0.9
about an hour:, 1,2,3
2-hr:, 0.9,0x1p4,1_0
3-hr:, 0.1,0.2,
`
	_, faults := Read([]byte(content), Options{})
	var places [][2]int
	for _, f := range faults {
		places = append(places, [2]int{f.Line, f.Column})
	}
	// Line 9 has two values where there are three periods; its column is that of the row.
	want := [][2]int{{2, 1}, {4, 35}, {6, 14}, {7, 1}, {8, 12}, {8, 18}, {9, 1}}
	if !slices.Equal(places, want) {
		t.Errorf("places %v, want %v\n%v", places, want, faults)
	}
}

func TestOwnTable(t *testing.T) {
	content := "# invented\nnote;2;duration;10\nfirst;4,5;5;6\n;3;10;4,25\n"
	file, faults := Read([]byte(content), Options{Unit: hydrology.InchesPerHour})
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	if file.Kind != OwnTable {
		t.Errorf("kind %s", file.Kind)
	}
	if got := intensitiesAt(file, Estimate, 10, 5, 10); got != "6.000 4.250" {
		t.Errorf("10 years: %s", got)
	}
	if _, faults := Read([]byte("duration,2,2,ten\n5,4,4,4\n5,3,9,3\n"), Options{Unit: hydrology.InchesPerHour}); len(faults) != 4 {
		t.Errorf("4 faults are in it (2 twice, no number, 5 twice, a rise); found: %v", faults)
	}
}

func TestOwnMaxima(t *testing.T) {
	content := "year,5,10,note\n1990,4.1,6.2,\n1991,,7,gauge blocked\n1992,3.9,5.5,\n"
	file, faults := Read([]byte(content), Options{Unit: hydrology.MillimetresPerHour})
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	if got := file.Maxima.Of(0); !slices.Equal(got, []float64{4.1, 3.9}) {
		t.Errorf("maxima of 5 min: %v", got)
	}
	_, faults = Read([]byte("year,5,0\n1990,-1,6\n1990,2,3\nlast,2,3\n"), Options{Unit: hydrology.MillimetresPerHour})
	if len(faults) != 4 {
		t.Errorf("4 faults are in it (duration 0, depth −1, 1990 twice, no year); found: %v", faults)
	}
}

// FuzzRead: no bytes make the reader fail; what it reads without fault is a lawful table or a list of maxima.
func FuzzRead(f *testing.F) {
	entries, err := os.ReadDir(realFiles)
	if err != nil {
		f.Fatal(err)
	}
	for _, e := range entries {
		content, err := os.ReadFile(realFiles + e.Name())
		if err != nil {
			f.Fatal(err)
		}
		f.Add(content)
	}
	f.Add([]byte(metricIntensity))
	f.Add([]byte("duration,2,5\n5,4,5\n"))
	f.Add([]byte("year,5,10\n1990,4,5\n"))
	f.Fuzz(func(t *testing.T, content []byte) {
		file, faults := Read(content, Options{Unit: hydrology.InchesPerHour})
		if len(faults) > 0 {
			if faults.Error() == "" {
				t.Error("faults without words")
			}
			return
		}
		table, ok := file.Table(Estimate)
		for _, b := range []Bound{Upper, Lower} {
			if bound, has := file.Table(b); has {
				table, ok = bound, true
			}
		}
		if ok == (len(file.Maxima.Years) > 0) && file.Kind != Canada {
			t.Errorf("a %s with table %v and %d years", file.Kind, ok, len(file.Maxima.Years))
		}
		if ok && hydrology.CheckTable(table.Durations, table.Periods, table.Values) != nil {
			t.Errorf("an unlawful table was read without fault")
		}
	})
}

func BenchmarkRead(b *testing.B) {
	for _, name := range []string{"ann-arbor-mi_all-bounds_depth_english_pds.csv", charlottetown} {
		content, err := os.ReadFile(realFiles + name)
		if err != nil {
			b.Fatal(err)
		}
		b.Run(name[:9], func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				if _, faults := Read(content, Options{}); len(faults) > 0 {
					b.Fatal(faults)
				}
			}
		})
	}
}

func TestATableThatNamesItsSourceInACommentIsATable(t *testing.T) {
	file, faults := Read([]byte("# depth x 60 / minutes of NOAA Atlas 14, and of Environment Canada\nduration,2,10\n5,4.5,6.6\n60,1.1,1.7\n"), Options{Unit: "in/h"})
	if file.Kind != OwnTable || len(faults) > 0 {
		t.Errorf("%v, %v", file.Kind, faults)
	}
}
