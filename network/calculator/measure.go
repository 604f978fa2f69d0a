package calculator

import (
	"math"
	"strconv"
	"strings"

	"rimfall/network/units"
)

// Measure says what a number measures; it gives the unit and, in tables, the decimals.
type Measure int8

// The measures of the calculator.
const (
	Plain Measure = iota // a ratio, or a number without unit
	Length
	PipeSize
	Area
	Discharge
	Speed
	Gradient // rise over run
	Roughness
	Stress
	Radian
)

// Unit is the label; "" where there is none.
func (m Measure) Unit(u units.System) string {
	switch m {
	case Length:
		return u.Length
	case PipeSize:
		return u.Size
	case Area:
		return u.Length + "²"
	case Discharge:
		return u.Flow
	case Speed:
		return u.Velocity
	case Stress:
		return u.Shear
	case Radian:
		return "rad"
	}
	return ""
}

// Column shows a number in a table, with the same decimals in every row.
func (m Measure) Column(u units.System, v float64) string {
	decimals := 3
	switch {
	case m == Roughness && math.Abs(v*1000-math.Round(v*1000)) < 1e-6:
		return strconv.FormatFloat(v, 'f', 3, 64)
	case m == Gradient || m == Roughness || m == PipeSize:
		return strconv.FormatFloat(math.Round(v*1e7)/1e7, 'f', -1, 64)
	case m == Discharge && u.Name == units.SI.Name, m == Area && u.Name == units.SI.Name:
		decimals = 4
	case m == Speed:
		decimals = 2
	}
	return strconv.FormatFloat(v, 'f', decimals, 64)
}

// With shows a number with its unit.
func (m Measure) With(u units.System, v float64) string {
	text := figure(v)
	if m == PipeSize || m == Roughness {
		text = short(v)
	}
	if unit := m.Unit(u); unit != "" {
		return text + " " + unit
	}
	return text
}

// figures is how many digits computed numbers are shown with.
const figures = 4

// figure shows a number with four digits, and all digits before the point; one that has
// no more than four, such as a given one, as it stands.
func figure(v float64) string {
	if v == 0 || math.IsNaN(v) || math.IsInf(v, 0) {
		return strconv.FormatFloat(v, 'g', -1, 64)
	}
	if plain := short(v); len(strings.Trim(strings.Replace(plain, ".", "", 1), "-0")) <= figures {
		return plain
	}
	before := int(math.Floor(math.Log10(math.Abs(v)))) + 1
	text := strconv.FormatFloat(v, 'f', max(0, figures-before), 64)
	if rounded, err := strconv.ParseFloat(text, 64); err == nil && rounded != 0 && math.Abs(rounded) >= math.Pow10(before) {
		return strconv.FormatFloat(rounded, 'f', max(0, figures-before-1), 64) // 9.9999 becomes 10.00
	}
	return text
}

// short shows a given number as it was written, free of the rounding of a conversion.
func short(v float64) string {
	rounded, err := strconv.ParseFloat(strconv.FormatFloat(v, 'g', 10, 64), 64)
	if err != nil {
		rounded = v
	}
	return strconv.FormatFloat(rounded, 'f', -1, 64)
}
