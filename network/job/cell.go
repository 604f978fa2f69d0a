package job

import (
	"math"
	"strconv"
	"strings"
)

// No quantity of a storm drain is larger than largest, whatever its unit, and no
// length, size or area smaller than smallest. Within them squares, cubes and
// quotients stay far from the ends of a float64, so that results are finite.
const (
	largest  = 1e15
	smallest = 1e-12
)

// parseNumber reads a plain decimal number: digits, a point, an exponent. Words,
// NaN, infinities, hexadecimal, digit groups, units and what is larger than
// largest are no numbers. Where comma is true a comma is the decimal sign as well
// as a point.
func parseNumber(text string, comma bool) (float64, bool) {
	for i := range len(text) {
		switch c := text[i]; {
		case c >= '0' && c <= '9', c == '.', c == '-', c == '+', c == 'e', c == 'E':
		case c == ',' && comma:
			return parseNumber(strings.Replace(text, ",", ".", 1), false)
		default:
			return 0, false
		}
	}
	v, err := strconv.ParseFloat(text, 64)
	if err != nil || math.Abs(v) > largest {
		return 0, false
	}
	return v, true
}

// whyNoNumber words what is wrong with a cell that is no number.
func whyNoNumber(text string, comma bool) string {
	switch lower := strings.ToLower(text); {
	case strings.HasSuffix(text, "%"):
		return "percent are not taken: write rise over run, 0.005 for 0.5 %"
	case strings.Contains(lower, "nan") || strings.Contains(lower, "inf"):
		return "write a finite number, or leave the cell blank"
	case strings.HasPrefix(strings.TrimLeft(lower, "+-"), "0x"):
		return "write it in decimal digits"
	case strings.Contains(text, ",") && !comma:
		return "write a decimal point and no digit groups"
	}
	if v, err := strconv.ParseFloat(text, 64); math.Abs(v) > largest && (err == nil || math.IsInf(v, 0)) {
		return "no quantity is that large"
	}
	return "write a plain number such as 12.5"
}
