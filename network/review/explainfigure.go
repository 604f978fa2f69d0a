package review

import (
	"math"
	"strconv"
	"strings"

	"rimfall/network/review/formula"
)

// The digits of a working. A result has resultDigits figures, levels and lengths at least
// levelDecimals decimals; one that ends within exactDigits is printed as it is, so that
// nothing is rounded that lies halfway. The numbers of a line have as many figures as its result needs to
// come out to the last digit, operandDigits at least and allDigits at most, which is a
// float64 in full.
const (
	resultDigits  = 5
	exactDigits   = 8
	levelDecimals = 4
	operandDigits = 6
	allDigits     = 17
	mostDecimals  = 12    // what rounds to 0 with them is printed as 0
	halfway       = 1e-12 // by this share numbers keep off the half of a last digit, where rounding could go either way
)

// figure prints a number with some significant digits; a number that has fewer is printed
// as it is.
func figure(v float64, digits int) string {
	if v == 0 {
		return "0"
	}
	text := plainText(v)
	if significant(text) > digits {
		text = strconv.FormatFloat(math.Abs(v), 'f', decimalsFor(v, digits), 64)
	}
	return signed(text, v)
}

// result prints a result of a line.
func result(v float64, isLength bool) string {
	if v == 0 {
		return "0"
	}
	if text := plainText(v); significant(text) <= exactDigits {
		return signed(text, v)
	}
	decimals := decimalsFor(v, resultDigits)
	if isLength {
		decimals = max(decimals, levelDecimals)
	}
	return signed(strconv.FormatFloat(math.Abs(v), 'f', decimals, 64), v)
}

// plainText is a number without its sign, as short as it is: digits that are rounding alone,
// from the thirteenth on, are no digits.
func plainText(v float64) string {
	const carried = 12
	rounded, _ := strconv.ParseFloat(strconv.FormatFloat(math.Abs(v), 'e', carried-1, 64), 64)
	if text := strconv.FormatFloat(rounded, 'f', -1, 64); significant(text) < carried {
		return text
	}
	return strconv.FormatFloat(math.Abs(v), 'f', -1, 64)
}

// decimalsFor are the decimals that show some significant digits of a number.
func decimalsFor(v float64, digits int) int {
	return min(mostDecimals, max(0, digits-1-int(math.Floor(math.Log10(math.Abs(v))))))
}

// signed puts the sign before a number; what is 0 has none.
func signed(text string, v float64) string {
	if strings.Trim(text, "0.") == "" {
		return "0"
	}
	if v < 0 {
		return "−" + text
	}
	return text
}

// significant counts the digits of a number from its first that is not 0.
func significant(text string) int {
	digits := strings.TrimLeft(strings.Replace(text, ".", "", 1), "0")
	if !strings.Contains(text, ".") {
		digits = strings.TrimRight(digits, "0")
	}
	return len(digits)
}

// parsed is the number that a reader of the page sees.
func parsed(text string) float64 {
	v, _ := strconv.ParseFloat(strings.Replace(text, "−", "-", 1), 64)
	return v
}

// quantity is a value of the working with its unit.
type quantity struct {
	value float64
	unit  string
}

// worth is what a unit counts in a formula: a degree is π/180, all else is coherent.
func worth(unit string) float64 {
	if strings.Contains(unit, "°") {
		return math.Pi / 180
	}
	return 1
}

// show prints the numbers of a formula with as few digits as give its result.
func show(f formula.Formula, values map[string]quantity, want, unit string) map[string]formula.Number {
	names := f.Names()
	shown := make(map[string]formula.Number, len(names))
	for digits := operandDigits; digits <= allDigits; digits++ {
		for _, n := range names {
			shown[n] = formula.Number{Text: figure(values[n].value, digits), Unit: values[n].unit}
		}
		got := f.Value(func(symbol string) float64 { return parsed(shown[symbol].Text) * worth(shown[symbol].Unit) }) / worth(unit)
		if sameDigits(got*(1-halfway), want) && sameDigits(got*(1+halfway), want) {
			return shown
		}
	}
	return shown
}

// sameDigits tells whether a value, printed with the decimals of a text, is that text; 0 stands for
// what rounds to it with the most decimals.
func sameDigits(v float64, text string) bool {
	if text == "0" {
		return math.Abs(v) < 0.5*math.Pow(10, -mostDecimals)
	}
	_, after, _ := strings.Cut(text, ".")
	return signed(strconv.FormatFloat(math.Abs(v), 'f', len(after), 64), v) == text
}
