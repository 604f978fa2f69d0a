package job

import (
	"fmt"
	"strings"

	"rimfall/network"
	"rimfall/network/units"
	"rimfall/pipeflow/catalog"
)

// millimetres in the units that a size cell may name; 25.4 mm to the inch by the
// international yard and pound agreement of 1959.
var sizeUnits = map[string]float64{
	"in": 25.4, "inch": 25.4, "\"": 25.4, "ft": 304.8, "'": 304.8, "mm": 1, "cm": 10, "m": 1000,
}

// parseSize reads a size cell, a diameter or `span x rise`, each with a unit if
// another than the job's is meant. why says what would be right where ok is false.
func parseSize(text, shape string, comma bool, u units.System) (size network.Size, why string) {
	round := shape == string(catalog.Circle)
	if v, ok := parseNumber(text, comma); ok && round && v >= smallest { // nearly every pipe of a large job
		return network.Size{Span: v, Rise: v}, ""
	}
	parts := strings.Split(foldSize.Replace(strings.ToLower(text)), "x")
	switch {
	case round && len(parts) != 1:
		return size, "a circle has one size, its diameter; for span x rise name the shape"
	case !round && len(parts) != 2:
		return size, fmt.Sprintf("the size of shape %s is span x rise, such as %s", shape, exampleSize(u))
	}
	if len(parts) == 2 { // 8x6ft: the unit at the end is for both
		parts[0] = withUnitOf(parts[0], parts[1])
	}
	lengths, named := make([]float64, 2), false
	for i, p := range parts {
		v, hasUnit, ok := parseLength(p, comma, u)
		if !ok {
			return size, fmt.Sprintf("%q is no size: write a number, if need be with in, ft, mm or m", p)
		}
		if v < smallest {
			return size, "a size is over 0"
		}
		lengths[i], named = v, named || hasUnit
	}
	if round {
		return network.Size{Span: lengths[0], Rise: lengths[0]}, ""
	}
	size = network.Size{Span: lengths[0], Rise: lengths[1]}
	return size, sizeOddity(size, shape, named, u)
}

// foldSize writes every way of saying "by" as x, without blanks.
var foldSize = strings.NewReplacer("×", "x", "*", "x", " ", "")

// withUnitOf gives a length without a unit the unit of another.
func withUnitOf(bare, other string) string {
	if strings.TrimRight(bare, unitLetters) != bare {
		return bare
	}
	return bare + other[len(strings.TrimRight(other, unitLetters)):]
}

const unitLetters = "abcdefghijklmnopqrstuvwxyz\"'"

// parseLength reads one length and turns it to the job's size unit.
func parseLength(text string, comma bool, u units.System) (v float64, hasUnit, ok bool) {
	digits := strings.TrimRight(text, unitLetters)
	unit := text[len(digits):]
	v, ok = parseNumber(digits, comma)
	if !ok || unit == "" {
		return v, false, ok
	}
	mm, known := sizeUnits[unit]
	if !known {
		return 0, true, false
	}
	own := 1.0
	if u.Name == units.US.Name {
		own = sizeUnits["in"]
	}
	if mm == own {
		return v, true, true
	}
	if unit == "ft" && own != 1 {
		return v * 12, true, true // exact where mm would round
	}
	return v * mm / own, true, true
}

// sizeOddity finds sizes that were probably meant otherwise: spans and rises
// changed about, and a box in feet or metres that would be read as inches or
// millimetres.
func sizeOddity(size network.Size, shape string, hasUnit bool, u units.System) string {
	leastBox := 24.0
	if u.Name == units.SI.Name {
		leastBox = 600
	}
	switch catalog.Shape(shape) {
	case catalog.Box:
		if !hasUnit && min(size.Span, size.Rise) < leastBox {
			return fmt.Sprintf("a box under %g %s: name the unit, such as 8ft x 6ft or %gin x %gin, if that is meant", leastBox, u.Size, size.Span, size.Rise)
		}
	case catalog.UprightEllipse:
		if size.Span > size.Rise {
			return fmt.Sprintf("an upright ellipse is higher than wide: write span x rise, %g x %g, or name the shape ellipse", size.Rise, size.Span)
		}
	case catalog.Ellipse, catalog.Arch, catalog.PipeArch:
		if size.Span < size.Rise {
			return fmt.Sprintf("the shape %s is wider than high: write span x rise, %g x %g", shape, size.Rise, size.Span)
		}
	}
	return ""
}

func exampleSize(u units.System) string {
	if u.Name == units.SI.Name {
		return "2400 x 1800 or 2.4m x 1.8m"
	}
	return "96 x 72 or 8ft x 6ft"
}
