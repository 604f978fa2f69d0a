package hydrology

// Piece is a part of an area with one runoff coefficient. Area is in any unit, C from 0 to 1.
type Piece struct {
	Area, C float64
}

// CompositeC is the mean of the pieces' coefficients by area, and their area. Not ok where they have none.
func CompositeC(pieces ...Piece) (c, area float64, ok bool) {
	// FHWA HDS-2, 2nd ed. (2002), Example 5.5: C = Σ(C·A)/ΣA.
	sum := 0.0
	for _, p := range pieces {
		sum += p.C * p.Area
		area += p.Area
	}
	if !positive(area) {
		return 0, 0, false
	}
	return sum / area, area, true
}

// RaisedC is C·Cf for a storm of a return period in years, at most 1.
func RaisedC(c, period float64) float64 {
	return min(1, c*FrequencyFactor(period))
}

// ImperviousC is C of an area whose impervious share (0 to 1) and pervious rest have each their own coefficient.
func ImperviousC(share, impervious, pervious float64) float64 {
	c, _, _ := CompositeC(Piece{share, impervious}, Piece{1 - share, pervious})
	return c
}

// CubicImperviousC is C from the impervious share (0 to 1) by the regression on some 60 American basins and storms
// of up to two years: 0.04 with nothing paved, 0.892 with everything.
func CubicImperviousC(share float64) float64 {
	// WEF Manual of Practice 23 / ASCE Manual 87 (1998), after Urbonas, Guo and Tucker (1990), from memory:
	// C = 0.858·i³ − 0.78·i² + 0.774·i + 0.04.
	return 0.04 + share*(0.774+share*(-0.78+share*0.858))
}

// LinearImperviousC is the volumetric coefficient from the impervious share (0 to 1): 0.05 with nothing paved, 0.95
// with everything.
func LinearImperviousC(share float64) float64 {
	// T. R. Schueler, Controlling Urban Runoff (Metropolitan Washington Council of Governments, 1987), from memory:
	// Rv = 0.05 + 0.9·i.
	return 0.05 + 0.9*share
}

// The areas to which agencies hold the Rational method, for a notice past them. Agencies differ, from 20 acres to
// 200; this is the upper one.
const (
	// RationalMostAcres: FHWA HEC-22, 3rd ed. (2009), sec. 3.2.2, from memory.
	RationalMostAcres = 200.0
	// RationalMostHectares: the same in SI.
	RationalMostHectares = 80.0
)
