package job

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network/units"
)

func TestOnlyPlainDecimalNumbersAreNumbers(t *testing.T) {
	for _, c := range []struct {
		text  string
		comma bool // a comma is a decimal sign
		want  float64
		ok    bool
	}{
		{"12.5", false, 12.5, true},
		{"-0.5", false, -0.5, true},
		{"+3", false, 3, true},
		{".5", false, 0.5, true},
		{"5.", false, 5, true},
		{"1e-3", false, 0.001, true},
		{"1E3", false, 1000, true},
		{"1,5", true, 1.5, true},
		{"1.5", true, 1.5, true},
		{"-,5", true, -0.5, true},
		{"1,5", false, 0, false},
		{"1,000,000", true, 0, false},
		{"1.000,5", true, 0, false},
		{"NaN", false, 0, false},
		{"nan", true, 0, false},
		{"inf", false, 0, false},
		{"-Infinity", false, 0, false},
		{"1e999", false, 0, false},
		{"1e15", false, 1e15, true},
		{"-1.1e15", false, 0, false}, // no quantity is that large
		{"1e-320", false, 1e-320, true},
		{"0x1p4", false, 0, false},
		{"0x10", false, 0, false},
		{"1_0", false, 0, false},
		{"1 000", false, 0, false},
		{"12ft", false, 0, false},
		{"50%", false, 0, false},
		{"--5", false, 0, false},
		{"1e", false, 0, false},
		{"e5", false, 0, false},
		{".", false, 0, false},
		{"", false, 0, false},
		{"½", false, 0, false},
		{"١٢", false, 0, false},
		{"12\u00a0", false, 0, false}, // a blank that does not break, as spreadsheets write it
	} {
		got, ok := parseNumber(c.text, c.comma)
		if got != c.want || ok != c.ok {
			t.Errorf("parseNumber(%q, %t) = %v, %t, want %v, %t", c.text, c.comma, got, ok, c.want, c.ok)
		}
	}
}

func TestEveryNumberOfAJobComesBackAsItWasWritten(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		v := math.Float64frombits(rapid.Uint64().Draw(t, "bits"))
		if math.IsNaN(v) || math.Abs(v) > largest {
			t.Skip("no number of a job")
		}
		for _, format := range []byte{'f', 'g', 'e'} {
			text := strconv.FormatFloat(v, format, -1, 64)
			if got, ok := parseNumber(text, false); !ok || math.Float64bits(got) != math.Float64bits(v) {
				t.Fatalf("%v written %s reads back as %v, %t", v, text, got, ok)
			}
			comma := strings.Replace(text, ".", ",", 1)
			if got, ok := parseNumber(comma, true); !ok || got != v {
				t.Fatalf("%v written %s reads back as %v, %t", v, comma, got, ok)
			}
		}
	})
}

func TestSizesAreReadWithAndWithoutUnits(t *testing.T) {
	for _, c := range []struct {
		name, text, shape string
		comma             bool
		units             units.System
		span, rise        float64
	}{
		{"inches without a unit", "18", "circle", false, units.US, 18, 18},
		{"inches by name", "18in", "circle", false, units.US, 18, 18},
		{"inches by their mark", `18"`, "circle", false, units.US, 18, 18},
		{"feet", "1.5ft", "circle", false, units.US, 18, 18},
		{"feet by their mark", "4'", "circle", false, units.US, 48, 48},
		{"millimetres in a job in feet: 457.2 mm are 18 in", "457.2mm", "circle", false, units.US, 18, 18},
		{"millimetres without a unit", "450", "circle", false, units.SI, 450, 450},
		{"metres", "0.45 m", "circle", false, units.SI, 450, 450},
		{"metres with a decimal comma", "0,45 m", "circle", true, units.SI, 450, 450},
		{"centimetres", "45cm", "circle", false, units.SI, 450, 450},
		{"inches in a metric job: 18 in are 457.2 mm", "18 in", "circle", false, units.SI, 457.2, 457.2},
		{"feet in a metric job: 4 ft are 1219.2 mm", "4 ft", "circle", false, units.SI, 1219.2, 1219.2},
		{"a box in feet", "8ft x 6ft", "box", false, units.US, 96, 72},
		{"a box whose unit stands once, at the end", "8 x 6 ft", "box", false, units.US, 96, 72},
		{"a box in two units", "8ft x 72in", "box", false, units.US, 96, 72},
		{"a box with a multiplication sign", "96×72", "box", false, units.US, 96, 72},
		{"a box with a star", "96*72", "box", false, units.US, 96, 72},
		{"a box with a capital X", "2400 X 1800", "box", false, units.SI, 2400, 1800},
		{"a small box whose unit is named", "20in x 12in", "box", false, units.US, 20, 12},
		{"a box of just 24 in", "24x24", "box", false, units.US, 24, 24},
		{"a box of just 600 mm", "600x600", "box", false, units.SI, 600, 600},
		{"a lying ellipse", "38x24", "ellipse", false, units.US, 38, 24},
		{"an upright ellipse", "24x38", "ellipse-upright", false, units.US, 24, 38},
	} {
		t.Run(c.name, func(t *testing.T) {
			got, why := parseSize(c.text, c.shape, c.comma, c.units)
			// 1e-15: one rounding of a product or quotient.
			if why != "" || math.Abs(got.Span-c.span) > 1e-15*c.span || math.Abs(got.Rise-c.rise) > 1e-15*c.rise {
				t.Errorf("%q is %v x %v, want %v x %v; %s", c.text, got.Span, got.Rise, c.span, c.rise, why)
			}
		})
	}
}

func TestTheSeparatorIsTheOneThatTheHeadingsHaveMostOf(t *testing.T) {
	for _, c := range []struct {
		text string
		want rune
	}{
		{"id,kind,rim\nA;;;;\n", ','},
		{"id;kind;rim\nA,,,,\n", ';'},
		{"id\tkind\trim\n", '\t'},
		{"# a remark; with; semicolons\n\nid,kind\n", ','},
		{"\"# a remark; quoted by; a spreadsheet\"\nid,kind\n", ','},
		{"id;\"rim, ft\"\n", ','}, // a tie goes to the comma
		{"id;kind;\"rim, ft\"\n", ';'},
		{"id\n", ','},
		{"", ','},
	} {
		if got := separator([]byte(c.text)); got != c.want {
			t.Errorf("separator(%q) = %q, want %q", c.text, got, c.want)
		}
	}
}
