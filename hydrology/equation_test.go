package hydrology

import (
	"fmt"
	"math"
	"os"
	"strconv"
	"strings"
	"testing"

	"pgregory.net/rapid"
)

func mustStorm(e Equation, period float64, unit IntensityUnit) EquationStorm {
	storm, err := e.Storm(period, unit)
	if err != nil {
		panic(err)
	}
	return storm
}

// malaysia reads the constants of one town: Urban Stormwater Management Manual for Malaysia (Department of
// Irrigation and Drainage, 2000), Table 13.A1: ln i = a + b·ln t + c·ln²t + d·ln³t, mm/h, min, 30 < t < 1000.
func malaysia(town string) Equation {
	rows := publishedRows("malaysia_1951-1990_cubic-in-ln-t.csv")
	e := Equation{Unit: MillimetresPerHour, Shortest: 30, Longest: 1000, Source: "DID Malaysia 2000, Table 13.A1"}
	for _, row := range rows[1:] {
		if row[1] == town {
			var c Constants
			c.Period = number(row[2])
			for k := range c.Cubic {
				c.Cubic[k] = number(row[3+k])
			}
			e.Constants = append(e.Constants, c)
		}
	}
	return e
}

// publishedRows reads a table of published values with its heading; the source stands in its first lines.
func publishedRows(name string) [][]string {
	content, err := os.ReadFile("../testdata/hydrology/" + name)
	if err != nil {
		panic(err)
	}
	return rowsOf(string(content))
}

func number(text string) float64 {
	x, err := strconv.ParseFloat(text, 64)
	if err != nil {
		panic(err)
	}
	return x
}

// Constants published (DID Malaysia 2000, Table 13.A1), intensities recomputed from them by hand calculation.
func ExampleEquation_cubicInLnT() {
	ipoh, _ := mustStorm(malaysia("Ipoh"), 10, MillimetresPerHour).At(30)
	kangar, _ := mustStorm(malaysia("Kangar"), 2, MillimetresPerHour).At(360)
	fmt.Printf("%.1f %.1f mm/h\n", ipoh, kangar)
	// Output: 135.9 15.2 mm/h
}

// andradina: DAEE, São Paulo (1999): mm/min, 10–1440 min.
var andradina = Equation{
	Unit: MillimetresPerMin, Shortest: 10, Longest: 1440, Source: "DAEE, São Paulo, 1999",
	Constants: []Constants{{Terms: []Term{
		{Numerator: 34.5743, Shift: 20, Exponent: 0.8809},
		{Numerator: 2.6906, Shift: 10, Exponent: 0.6683, GumbelOffset: -0.4766, GumbelFactor: -0.8977},
	}}},
}

// Constants published (DAEE, São Paulo, 1999); the intensity is recomputed from them.
func ExampleEquation_sumOfTerms() {
	i, _ := mustStorm(andradina, 10, MillimetresPerHour).At(60)
	fmt.Printf("%.1f mm/h\n", i)
	// Output: 58.3 mm/h
}

// Constants published for Beijing, q = 2001·(1 + 0.811·lg P)/(t + 8)^0.711 in L/(s·ha); values recomputed.
func ExampleEquation_logarithmOfPeriod() {
	beijing := Equation{Unit: LitresPerSecondHa, Constants: []Constants{{Terms: []Term{
		{Numerator: 2001, Shift: 8, Exponent: 0.711, PeriodLogarithm: 0.811},
	}}}}
	q, _ := mustStorm(beijing, 1, LitresPerSecondHa).At(10)
	i, _ := mustStorm(beijing, 1, MillimetresPerHour).At(10)
	rare, _ := mustStorm(beijing, 10, LitresPerSecondHa).At(10) // 1.811 times as much
	fmt.Printf("%.1f L/s/ha, %.1f mm/h; in 10 years %.1f L/s/ha\n", q, i, rare)
	// Output: 256.3 L/s/ha, 92.3 mm/h; in 10 years 464.2 L/s/ha
}

// ministryOfHealth1930: UK, Ministry of Health (1930), mm/h, min.
func ministryOfHealth1930() []EquationStorm {
	shiftedInverse := func(numerator, shift, first, last float64) EquationStorm {
		return mustStorm(Equation{
			Unit: MillimetresPerHour, Shortest: first, Longest: last,
			Constants: []Constants{{Terms: []Term{{Numerator: numerator, Shift: shift, Exponent: 1}}}},
		}, 1, MillimetresPerHour)
	}
	return []EquationStorm{shiftedInverse(1016, 20, 20, 100), shiftedInverse(762, 10, 5, 20)}
}

// UK, Ministry of Health (1930): 762/(t+10) for 5–20 min and 1016/(t+20) for 20–100 min, both 25.4 mm/h at 20.
func ExampleJoin() {
	storm, err := Join(ministryOfHealth1930()...)
	if err != nil {
		panic(err)
	}
	for _, t := range []float64{5, 20, 100} {
		i, _ := storm.At(t)
		fmt.Printf("%v min: %.1f mm/h\n", t, i)
	}
	// Output:
	// 5 min: 50.8 mm/h
	// 20 min: 25.4 mm/h
	// 100 min: 8.5 mm/h
}

func TestEquationRange(t *testing.T) {
	storm, err := Join(ministryOfHealth1930()...)
	if err != nil {
		t.Fatal(err)
	}
	if i, where := storm.At(1); i != 762.0/15 || where != Below {
		t.Errorf("1 min: %v, %v; want what holds at 5 min", i, where)
	}
	if _, where := storm.At(101); where != Beyond {
		t.Errorf("101 min is %v", where)
	}
	if _, where := storm.At(math.NaN()); where != Beyond {
		t.Errorf("no number of minutes is %v", where)
	}
	if _, where := (EquationStorm{}).At(10); where != Beyond {
		t.Errorf("the zero storm is %v", where)
	}
}

func TestEquationsOutsideWhatTheyAreFor(t *testing.T) {
	power := Term{Numerator: 20, Exponent: 0.6, PeriodExponent: 0.2}
	one := func(t Term) []Constants { return []Constants{{Terms: []Term{t}}} }
	cases := []struct {
		name   string
		e      Equation
		period float64
		want   string
	}{
		{"a period that has no constants lists those that have", malaysia("Ipoh"), 25, "2, 5, 10, 20, 50, 100"},
		{"a period outside the stated range", Equation{Unit: InchesPerHour, Shortest: 5, LeastPeriod: 2, GreatestPeriod: 100, Constants: one(power)}, 200, "2 to 100 years"},
		{"annual maxima have no storm of one year", andradina, 1, "more than 1 year"},
		{"a power law has no intensity at no duration", Equation{Unit: InchesPerHour, Constants: one(power)}, 10, "shortest duration"},
		{"an intensity that rises with duration", Equation{Unit: InchesPerHour, Shortest: 5, Constants: one(Term{Numerator: 1, Exponent: -0.5})}, 10, "rises with duration"},
		{"a negative intensity", Equation{Unit: InchesPerHour, Shortest: 5, Constants: one(Term{Numerator: -1, Exponent: 0.5})}, 10, "gives -"},
		{"a cubic that turns up at long durations", Equation{Unit: InchesPerHour, Shortest: 5, Longest: 1440, Constants: []Constants{{Cubic: [4]float64{3, 0, -0.3, 0.05}}}}, 10, "rises with duration"},
		{"a range that ends before it starts", Equation{Unit: InchesPerHour, Shortest: 60, Longest: 5, Constants: one(power)}, 10, "no range"},
		{"a unit that is not stated", Equation{Shortest: 5, Constants: one(power)}, 10, "cannot be given"},
	}
	for _, k := range cases {
		t.Run(k.name, func(t *testing.T) {
			_, err := k.e.Storm(k.period, InchesPerHour)
			if err == nil || !strings.Contains(err.Error(), k.want) {
				t.Errorf("got %v, want %q in it", err, k.want)
			}
		})
	}
}

func TestTableOfAnEquation(t *testing.T) {
	table, err := andradina.Table([]float64{10, 60, 1440}, []float64{2, 10}, MillimetresPerHour)
	if err != nil {
		t.Fatal(err)
	}
	if math.Abs(table.Values[1][1]-58.3) > 0.05 { // 60 min, 10 years, as in the example
		t.Errorf("60 min, 10 years: %v mm/h", table.Values[1][1])
	}
	if _, err := andradina.Table([]float64{5, 60}, []float64{2}, MillimetresPerHour); err == nil {
		t.Error("5 min came of an equation that starts at 10")
	}
}

func TestEquationsInWords(t *testing.T) {
	cases := []struct {
		c    Constants
		want string
	}{
		{Constants{Terms: []Term{{Numerator: 2001, Shift: 8, Exponent: 0.711, PeriodLogarithm: 0.811}}}, "i = 2001·(1 + 0.811·lg T)/(t + 8)^0.711"},
		{Constants{Terms: []Term{{Numerator: 20, Exponent: 0.6, PeriodExponent: 0.2}}}, "i = 20·T^0.2/t^0.6"},
		{Constants{Terms: []Term{{Numerator: 762, Shift: 10, Exponent: 1}}}, "i = 762/(t + 10)"},
		{Constants{Cubic: [4]float64{5.0707, 0.6515, -0.2522, 0.0138}}, "ln i = 5.0707 + 0.6515·ln t − 0.2522·ln²t + 0.0138·ln³t"},
		{andradina.Constants[0], "i = 34.5743/(t + 20)^0.8809 + 2.6906·(−0.4766 − 0.8977·ln ln(T/(T−1)))/(t + 10)^0.6683"},
	}
	for _, k := range cases {
		if got := k.c.String(); got != k.want {
			t.Errorf("got %q, want %q", got, k.want)
		}
	}
}

func TestJoinRefusesGapsAndSteps(t *testing.T) {
	storms := ministryOfHealth1930()
	if _, err := Join(storms[1], mustStorm(andradina, 10, MillimetresPerHour)); err == nil {
		t.Error("an equation from 5 to 20 min was joined to one from 10 to 1440")
	}
	flat := Equation{Unit: MillimetresPerHour, Shortest: 20, Longest: 60, Constants: []Constants{{Terms: []Term{{Numerator: 30}}}}}
	if _, err := Join(storms[1], mustStorm(flat, 1, MillimetresPerHour)); err == nil {
		t.Error("25.4 mm/h was joined to 30 mm/h")
	}
}

// The exponent is the slope of ln i against ln t, found here by central differences of 1e-4 in ln t: their error is
// of the order of its square.
func TestExponentIsTheLogarithmicSlope(t *testing.T) {
	storms := map[string]EquationStorm{
		"cubic": mustStorm(malaysia("Ipoh"), 10, MillimetresPerHour),
		"sum":   mustStorm(andradina, 25, MillimetresPerHour),
	}
	for name, storm := range storms {
		rapid.Check(t, func(t *rapid.T) {
			m := rapid.Float64Range(31, 990).Draw(t, "minutes")
			up, _ := storm.At(m * math.Exp(1e-4))
			down, _ := storm.At(m * math.Exp(-1e-4))
			want := -math.Log(up/down) / 2e-4
			if got, ok := storm.Exponent(m); !ok || math.Abs(got-want) > 1e-6 {
				t.Fatalf("%s at %v min: %v, %v; want %v", name, m, got, ok, want)
			}
		})
	}
}

func TestUnitsGoThereAndBack(t *testing.T) {
	for from := range inMillimetresPerHour {
		for to := range inMillimetresPerHour {
			there, _ := from.To(to)
			back, ok := to.To(from)
			if !ok || math.Abs(there*back-1) > 1e-15 { // two roundings
				t.Errorf("%s to %s and back is %v", from, to, there*back)
			}
		}
	}
	if _, ok := IntensityUnit("").To(InchesPerHour); ok {
		t.Error("a unit that is not stated was turned into in/h")
	}
	if u, ok := ParseIntensityUnit("L/(s·ha)"); !ok || u != LitresPerSecondHa {
		t.Errorf("L/(s·ha) is read as %q, %v", u, ok)
	}
}
