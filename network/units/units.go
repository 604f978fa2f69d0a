// Package units holds the two systems of units in which a job can be written
// and every constant that depends on them.
//
// The computing core works in one coherent system, feet and seconds or metres
// and seconds, as the job says, and converts nothing. Three quantities keep the
// unit in which the trade works them: sizes and walls are kept as given (inches
// or millimetres) beside the coherent section that is made of them once, and
// the Rational method keeps its own units (acre, in/h, minutes, or ha, mm/h,
// minutes), for which its factor is made. So the numbers printed are the
// numbers used.
package units

// Standard gravity, 9.80665 m/s² by definition (3rd CGPM, 1901); the same in
// feet, with the foot of 0.3048 m.
const (
	gravityMetres = 9.80665
	gravityFeet   = gravityMetres / 0.3048
)

// SecondsPerMinute turns times in seconds to minutes when they are divided by it.
const SecondsPerMinute = 60

// System is one system of units with its constants.
type System struct {
	Name string // "us" or "si", as in job.toml

	Gravity         float64 // ft/s² or m/s²
	UnitWeight      float64 // of water, lb/ft³ or N/m³
	ManningFactor   float64 // unit constant of Manning's equation, the default
	RationalFactor  float64 // unit constant of the Rational method, the default
	SizeFactor      float64 // size units in one length unit: 12 in/ft, 1000 mm/m
	InvertSteps     float64 // steps of a chosen invert in one length unit: 100 or 1000
	InvertTolerance float64 // by which two inverts and a slope may disagree, ft or m

	Length, Size, Area, Intensity, Flow, Velocity, Shear string // labels
}

// US is the US customary system: ft, in, acre, in/h, cfs, ft/s, lb/ft².
var US = System{
	Name:    "us",
	Gravity: gravityFeet,
	// 62.4 lb/ft³, the customary value; the contract of job folders fixes it.
	UnitWeight: 62.4,
	// 1.486: HEC-22 3rd ed. eq. 7-1 (1.4859 exactly).
	ManningFactor: 1.486,
	// Practice drops the exact 1.00833 (HDS-2 2nd ed. section 5.3).
	RationalFactor:  1,
	SizeFactor:      12,
	InvertSteps:     100,
	InvertTolerance: 0.02,
	Length:          "ft", Size: "in", Area: "acre", Intensity: "in/h", Flow: "cfs", Velocity: "ft/s", Shear: "lb/ft²",
}

// SI is the metric system: m, mm, ha, mm/h, m³/s, m/s, Pa.
var SI = System{
	Name:    "si",
	Gravity: gravityMetres,
	// 9806.65 N/m³: 1000 kg/m³ times standard gravity.
	UnitWeight:    1000 * gravityMetres,
	ManningFactor: 1,
	// Q[m³/s] = C·i[mm/h]·A[ha]/360, exact.
	RationalFactor:  1.0 / 360,
	SizeFactor:      1000,
	InvertSteps:     1000,
	InvertTolerance: 0.006,
	Length:          "m", Size: "mm", Area: "ha", Intensity: "mm/h", Flow: "m³/s", Velocity: "m/s", Shear: "Pa",
}

// ByName returns the system called "us" or "si".
func ByName(name string) (System, bool) {
	switch name {
	case US.Name:
		return US, true
	case SI.Name:
		return SI, true
	}
	return System{}, false
}
