package hydrology

import "strings"

// IntensityUnit names what intensities are in. The zero value is: not stated.
type IntensityUnit string

// The units in which the published tables and equations stand.
const (
	InchesPerHour      IntensityUnit = "in/h"
	MillimetresPerHour IntensityUnit = "mm/h"
	MillimetresPerMin  IntensityUnit = "mm/min"
	CentimetresPerHour IntensityUnit = "cm/h"
	LitresPerSecondHa  IntensityUnit = "L/s/ha"
)

// MinutesPerDay is 24 hours.
const MinutesPerDay = 1440

// MillimetresPerInch is exact (international inch, 1959).
const MillimetresPerInch = 25.4

// inMillimetresPerHour: 1 L/(s·ha) is 10⁻³ m³/s on 10⁴ m², or 10⁻⁷ m/s, or 0.36 mm/h. All are exact.
var inMillimetresPerHour = map[IntensityUnit]float64{
	InchesPerHour:      MillimetresPerInch,
	MillimetresPerHour: 1,
	MillimetresPerMin:  60,
	CentimetresPerHour: 10,
	LitresPerSecondHa:  0.36,
}

// ParseIntensityUnit reads a unit as people write it: L/(s·ha) and l/s/ha are the same. Not ok for any other word.
func ParseIntensityUnit(text string) (IntensityUnit, bool) {
	plain := strings.NewReplacer(" ", "", "(", "", ")", "", "·", "/", "*", "/").Replace(strings.ToLower(text))
	plain = strings.Replace(plain, "l/s/ha", "L/s/ha", 1)
	unit := IntensityUnit(plain)
	_, known := inMillimetresPerHour[unit]
	return unit, known
}

// To gives the factor that turns intensities of this unit into another; not ok where either is not known.
func (u IntensityUnit) To(other IntensityUnit) (factor float64, ok bool) {
	from, known := inMillimetresPerHour[u]
	to, knownToo := inMillimetresPerHour[other]
	if !known || !knownToo {
		return 0, false
	}
	if u == other {
		return 1, true // exactly, whatever the two divide to
	}
	return from / to, true
}

// Scaled is the table with every intensity times a factor greater than 0: another unit, or an allowance for a
// changing climate.
func (t Table) Scaled(factor float64) Table {
	scaled := Table{Durations: t.Durations, Periods: t.Periods}
	for _, row := range t.Values {
		values := make([]float64, len(row))
		for column, value := range row {
			values[column] = value * factor
		}
		scaled.Values = append(scaled.Values, values)
	}
	return scaled
}

// Depth gives the rain that falls in a whole duration that the table has, in a period that it has: in or mm.
// Sheet flow by the NRCS form wants Depth(1440, 2).
func (t Table) Depth(minutes, period float64) (depth float64, ok bool) {
	c, ok := t.Curve(period)
	if !ok {
		return 0, false
	}
	intensity, where := c.At(minutes)
	return intensity * minutes / 60, where == Within
}

// Uplifted is a storm with every intensity times Factor: an allowance for a changing climate, greater than 0.
type Uplifted struct {
	Storm  Intensity
	Factor float64
}

// At gives the storm's intensity times the factor.
func (u Uplifted) At(minutes float64) (intensity float64, where Range) {
	intensity, where = u.Storm.At(minutes)
	return u.Factor * intensity, where
}

// Durations are those of the storm: the corners of its curve, where it has any.
func (u Uplifted) Durations() []float64 {
	if c, ok := u.Storm.(corners); ok {
		return c.Durations()
	}
	return nil
}

// Exponent is that of the storm, which a factor does not change; not ok where the storm has none.
func (u Uplifted) Exponent(minutes float64) (float64, bool) {
	if e, ok := u.Storm.(exponent); ok {
		return e.Exponent(minutes)
	}
	return 0, false
}
