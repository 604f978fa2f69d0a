package drawing

import (
	"fmt"
	"math"
	"slices"

	"rimfall/network/units"
)

// scale is one of the customary scales: how many units of length one inch, or one unit of length, of paper shows.
type scale struct {
	ratio float64 // 40 for 1 in = 40 ft; 500 for 1:500
	mm    float64 // of paper for one foot or metre
}

// The customary scales within a power of ten: in feet those of the engineer's rule, 10 to 60, and what is read from it
// doubled or tripled; in metres those of ISO 5455 and the in-between ones of site plans (both from memory).
var (
	stepsFeet   = []float64{10, 20, 30, 40, 50, 60, 80}
	betweenFeet = []float64{12, 15} // not under 1 in = 10 ft
	stepsMetres = []float64{100, 125, 200, 250, 500}
)

// scales lists the scales from large to small, beginning at a ratio.
func scales(u units.System, first float64) []scale {
	steps := stepsFeet
	if u.Name == units.SI.Name {
		steps = stepsMetres
	}
	var list []scale
	for tens := 0.1; tens < 1e15; tens *= 10 {
		for _, s := range steps {
			list = append(list, newScale(u, s*tens))
			if u.Name == units.US.Name && s == 10 && tens >= 1 {
				list = append(list, newScale(u, betweenFeet[0]*tens), newScale(u, betweenFeet[1]*tens))
			}
		}
	}
	return slices.DeleteFunc(list, func(s scale) bool { return s.ratio < first*(1-1e-9) })
}

// firstScale is the largest scale of a drawing along the ground: 1 in = 10 ft or 1:100.
func firstScale(u units.System) float64 {
	if u.Name == units.SI.Name {
		return 100
	}
	return 10
}

func newScale(u units.System, ratio float64) scale {
	if u.Name == units.SI.Name {
		return scale{ratio, 1000 / ratio}
	}
	return scale{ratio, 25.4 / ratio}
}

// say words a scale.
func (s scale) say(u units.System) string {
	if u.Name == units.SI.Name {
		return fmt.Sprintf("1:%g", s.ratio)
	}
	return fmt.Sprintf("1 in = %g ft", s.ratio)
}

// sizeUnitWord is the unit of pipe sizes in full.
func sizeUnitWord(u units.System) string {
	if u.Name == units.SI.Name {
		return "millimetres"
	}
	return "inches"
}

// roundStep is the least of 1, 2 and 5 times a power of ten that is at least v: the step of a grid or a scale bar.
func roundStep(v float64) float64 {
	tens := math.Pow(10, math.Floor(math.Log10(v)))
	for _, s := range [...]float64{1, 2, 5} {
		if s*tens >= v*(1-1e-9) {
			return s * tens
		}
	}
	return 10 * tens
}

// stationText words a distance along a line the way stations are written: hundreds of feet or thousands of metres before
// the plus sign.
func stationText(v float64, u units.System, decimals int) string {
	whole, width := 100.0, 2
	if u.Name == units.SI.Name {
		whole, width = 1000, 3
	}
	if decimals > 0 {
		width += 1 + decimals
	}
	v = math.Round(v*math.Pow(10, float64(decimals))) / math.Pow(10, float64(decimals))
	full := math.Floor(v / whole)
	return fmt.Sprintf("%.0f+%0*.*f", full, width, decimals, v-full*whole)
}
