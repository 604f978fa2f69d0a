package hydrology

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

// NOAA Atlas 14 volume 2 version 3, Pulaski, Virginia, partial duration, 10 years: depth·60/minutes, in/h.
var pulaski10 = struct{ durations, intensities []float64 }{
	[]float64{5, 10, 15, 30, 60},
	[]float64{5.424, 4.338, 3.656, 2.640, 1.720},
}

func pulaskiCurve(t testing.TB) Curve {
	t.Helper()
	var values [][]float64
	for _, i := range pulaski10.intensities {
		values = append(values, []float64{i})
	}
	table, err := NewTable(pulaski10.durations, []float64{10}, values)
	if err != nil {
		t.Fatal(err)
	}
	curve, ok := table.Curve(10)
	if !ok {
		t.Fatal("the table has no column for 10 years")
	}
	return curve
}

func TestCurveGivesTabulatedValuesExactly(t *testing.T) {
	c := pulaskiCurve(t)
	for k, d := range pulaski10.durations {
		if i, where := c.At(d); i != pulaski10.intensities[k] || where != Within {
			t.Errorf("At(%v) = %v, %v; the table has %v", d, i, where, pulaski10.intensities[k])
		}
	}
}

func TestCurveRange(t *testing.T) {
	c := pulaskiCurve(t)
	cases := []struct {
		name      string
		minutes   float64
		intensity float64
		where     Range
	}{
		{"below the first duration the first intensity holds", 3, 5.424, Below},
		{"no time at all is below the first duration", 0, 5.424, Below},
		{"just past the last duration there is no intensity", math.Nextafter(60, 61), 0, Beyond},
		{"an endless storm has no intensity", math.Inf(1), 0, Beyond},
		{"a time that is not a number has no intensity", math.NaN(), 0, Beyond},
	}
	for _, k := range cases {
		t.Run(k.name, func(t *testing.T) {
			if i, where := c.At(k.minutes); i != k.intensity || where != k.where {
				t.Errorf("got %v, %v; want %v, %v", i, where, k.intensity, k.where)
			}
		})
	}
}

func TestZeroCurveKnowsNothing(t *testing.T) {
	var c Curve
	if _, where := c.At(10); where != Beyond {
		t.Errorf("At(10) is %v", where)
	}
	if _, _, ok := c.First(); ok {
		t.Error("it has a first duration")
	}
	if _, _, ok := c.Last(); ok {
		t.Error("it has a last duration")
	}
}

func TestCurveIsLogLogBetweenDurations(t *testing.T) {
	c := pulaskiCurve(t)
	// Halfway in ln t lies halfway in ln i: at √(10·15) min stands √(4.338·3.656) in/h. Rounding only.
	want := math.Sqrt(4.338 * 3.656)
	if got, _ := c.At(math.Sqrt(150)); math.Abs(got-want) > 1e-14*want {
		t.Errorf("got %v, want %v", got, want)
	}
}

// drawTable makes a lawful table: durations rise, intensities fall down and rise across, ties now and then.
func drawTable(t *rapid.T) Table {
	rows, columns := rapid.IntRange(1, 12).Draw(t, "rows"), rapid.IntRange(1, 6).Draw(t, "columns")
	step := rapid.OneOf(rapid.Just(0.0), rapid.Float64Range(0.001, 1))
	durations, periods, values := make([]float64, rows), make([]float64, columns), make([][]float64, rows)
	for k := range periods {
		periods[k] = 2 + float64(k)*rapid.Float64Range(1, 20).Draw(t, "period step")
		if k > 0 {
			periods[k] = max(periods[k], periods[k-1]+1)
		}
	}
	for row := rows - 1; row >= 0; row-- {
		durations[row] = 5 * math.Pow(1.7, float64(row))
		values[row] = make([]float64, columns)
		for column := range columns {
			least := 0.1
			if row < rows-1 {
				least = values[row+1][column]
			}
			if column > 0 {
				least = max(least, values[row][column-1])
			}
			values[row][column] = least + step.Draw(t, "step")
		}
	}
	table, err := NewTable(durations, periods, values)
	if err != nil {
		t.Fatal(err)
	}
	return table
}

func TestCurveNeverRisesWithDuration(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		table := drawTable(t)
		c, _ := table.Curve(table.Periods[0])
		last := table.Durations[len(table.Durations)-1]
		a, b := rapid.Float64Range(1, last).Draw(t, "a"), rapid.Float64Range(1, last).Draw(t, "b")
		a, b = min(a, b), max(a, b)
		atA, _ := c.At(a)
		atB, _ := c.At(b)
		if atB > atA*(1+1e-15) { // one step of rounding
			t.Fatalf("%v at %v min, %v at %v min", atA, a, atB, b)
		}
	})
}

func TestScaledCurveScalesEveryIntensity(t *testing.T) {
	c := pulaskiCurve(t)
	scaled := c.Scaled(1.2)
	for _, d := range []float64{2, 5, 7, 22, 60} {
		plain, _ := c.At(d)
		if got, where := scaled.At(d); math.Abs(got-1.2*plain) > 1e-14*got || where == Beyond {
			t.Errorf("At(%v) = %v, %v; want %v", d, got, where, 1.2*plain)
		}
	}
}

func TestLookUpAllocatesNothing(t *testing.T) {
	var storm Intensity = pulaskiCurve(t)
	if n := testing.AllocsPerRun(100, func() { storm.At(12.3) }); n != 0 {
		t.Errorf("%v allocations a look-up", n)
	}
}

// twelveDurations is NOAA Atlas 14 volume 2 version 3, Pulaski, Virginia, 10 years, 5 min to 3 days, in/h.
func twelveDurations(b *testing.B) Curve {
	durations := []float64{5, 10, 15, 30, 60, 120, 180, 360, 720, 1440, 2880, 4320}
	depths := []float64{0.452, 0.723, 0.914, 1.32, 1.72, 2.00, 2.09, 2.42, 2.83, 3.49, 4.12, 4.36}
	values := make([][]float64, len(depths))
	for k := range depths {
		values[k] = []float64{depths[k] * 60 / durations[k]}
	}
	table, err := NewTable(durations, []float64{10}, values)
	if err != nil {
		b.Fatal(err)
	}
	curve, _ := table.Curve(10)
	return curve
}

func BenchmarkIntensity(b *testing.B) {
	curve := twelveDurations(b)
	times := make([]float64, 1024) // spread over the table, so that no branch is always the same
	for k := range times {
		times[k] = 5 * math.Exp(6.7*math.Mod(float64(k)*0.6180339887, 1))
	}
	b.Run("table/12", func(b *testing.B) { lookUp(b, curve, times) })
}

func lookUp(b *testing.B, storm Intensity, times []float64) {
	b.ReportAllocs()
	sum := 0.0
	for k := 0; b.Loop(); k++ {
		i, _ := storm.At(times[k&1023])
		sum += i
	}
	if !(sum > 0) {
		b.Fatal("no rain")
	}
}
