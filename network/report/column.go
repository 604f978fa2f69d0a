package report

import (
	"math"
	"strconv"

	"rimfall/network"
	"rimfall/network/units"
)

// Quantity says what a number measures; it gives the unit and the decimals.
type Quantity int8

// The quantities that are shown.
const (
	Text Quantity = iota
	Number
	Length
	Level
	Size
	Area
	Intensity
	Flow
	Velocity
	Minutes
	Slope   // rise over run
	Percent // of slope
	Ratio
	Roughness
	Count
)

// Value is one cell: a text, a number or nothing.
type Value struct {
	Text   string
	Number float64
	OK     bool // there is a value
}

// T is a text cell; an empty text is nothing.
func T(text string) Value { return Value{Text: text, OK: text != ""} }

// N is a number cell.
func N(v float64) Value { return Value{Number: v, OK: true} }

// M is a number that may be missing.
func M(m network.Maybe) Value { return Value{Number: m.V, OK: m.OK} }

// Column is one column of a table of rows R.
type Column[R any] struct {
	Key      string   // in JSON and CSV
	Head     []string // words of the heading, a line each; nil: not in tables
	Quantity Quantity
	Value    func(*R) Value
}

// Style is how numbers are shown to people.
type Style struct {
	Units    units.System
	FlowUnit string // "cfs", "m3/s" or "L/s"
}

// Unit is the label of a quantity; "" where it has none.
func (s Style) Unit(q Quantity) string {
	u := s.Units
	switch q {
	case Length, Level:
		return u.Length
	case Size:
		return u.Size
	case Area:
		return u.Area
	case Intensity:
		return u.Intensity
	case Flow:
		return units.FlowLabel(s.FlowUnit)
	case Velocity:
		return u.Velocity
	case Minutes:
		return "min"
	case Percent:
		return "%"
	}
	return ""
}

// decimals for people, US and SI. Flows depend on their unit.
var decimals = map[Quantity][2]int{
	Number: {3, 3}, Length: {2, 3}, Level: {2, 3}, Size: {0, 0}, Area: {2, 3}, Intensity: {2, 1}, Velocity: {2, 2},
	Minutes: {2, 2}, Slope: {5, 5}, Percent: {2, 2}, Ratio: {2, 2}, Roughness: {3, 3}, Count: {0, 0},
}

// Show prints a cell for people; "" where there is nothing.
func (s Style) Show(q Quantity, v Value) string {
	switch {
	case !v.OK:
		return ""
	case v.Text != "" || q == Text:
		return v.Text
	case q == Flow:
		return s.Units.ShowFlow(v.Number, s.FlowUnit)
	case q == Size || q == Roughness:
		return strconv.FormatFloat(round(v.Number, 4), 'f', -1, 64)
	case q == Percent:
		return fixed(100*v.Number, 2)
	}
	d := decimals[q]
	if s.Units.Name == units.SI.Name {
		return fixed(v.Number, d[1])
	}
	return fixed(v.Number, d[0])
}

// fixed prints with a number of decimals and never as minus zero.
func fixed(v float64, decimals int) string {
	t := strconv.FormatFloat(v, 'f', decimals, 64)
	for _, c := range t {
		if c >= '1' && c <= '9' {
			return t
		}
	}
	if t[0] == '-' {
		return t[1:]
	}
	return t
}

func round(v float64, decimals int) float64 {
	p := math.Pow(10, float64(decimals))
	return math.Round(v*p) / p
}
