package grade

// The losses of bends and of changes of size along a line, where no structure stands. The pass adds the bend of a pipe from
// its column. Sizes change at structures, whose method covers them: what a change costs by itself a designer finds here, and
// enters in the column loss.

// BendLoss is the loss of a bend along a pipe that turns by a deflection in degrees, on the velocity head:
//
//	Hb = 0.0033 Δ V²/2g    (HEC-22 3rd ed. section 7.1.6.4, from memory)
//
// Other sources take more of a sharp bend: 0.25 √(Δ/90) V²/2g (Mays, Water Resources Engineering, Example 15.2.3).
func BendLoss(deflection, head float64) float64 { return 0.0033 * deflection * head }

// EnlargementLoss is what is lost where the flow slows down from one velocity to another, with a coefficient: 1 for a sudden
// enlargement (by momentum), less for a gradual one.
//
//	He = Ke (V1 - V2)²/2g
func EnlargementLoss(coefficient, upstream, downstream, gravity float64) float64 {
	change := upstream - downstream
	return coefficient * change * change / (2 * gravity)
}

// ContractionLoss is what is lost at a sudden contraction, on the velocity head in the narrower pipe:
//
//	Hc = Kc V²/2g
//
// There is none where [ContractionCoefficient] has none.
func ContractionLoss(diameterRatio, velocity, gravity, lengthUnit float64) (loss float64, ok bool) {
	k, ok := ContractionCoefficient(diameterRatio, velocity/lengthUnit)
	return k * velocity * velocity / (2 * gravity), ok
}

// Foot and Metre are the length units of velocities in feet: a velocity over them is in ft/s.
const (
	Foot  = 1.0
	Metre = 0.3048
)

// contractionVelocities are the columns of the table below, ft/s.
var contractionVelocities = [...]float64{2, 3, 4, 5, 6, 7, 8, 10, 12, 15, 20, 30, 40}

// contractions are coefficients by the ratio of the larger to the smaller diameter (Mays, Water Resources Engineering, table
// 15.2.9, p. 623, from American Iron and Steel Institute 1995). A ratio of 1 loses nothing; the last row is for any ratio
// over 10.
var contractions = [...]struct {
	ratio        float64
	coefficients [13]float64
}{
	{1, [13]float64{}},
	{1.1, [13]float64{0.03, 0.04, 0.04, 0.04, 0.04, 0.04, 0.04, 0.04, 0.04, 0.04, 0.05, 0.05, 0.06}},
	{1.2, [13]float64{0.07, 0.07, 0.07, 0.07, 0.07, 0.07, 0.07, 0.08, 0.08, 0.08, 0.09, 0.1, 0.11}},
	{1.4, [13]float64{0.17, 0.17, 0.17, 0.17, 0.17, 0.17, 0.17, 0.18, 0.18, 0.18, 0.18, 0.19, 0.2}},
	{1.6, [13]float64{0.26, 0.26, 0.26, 0.26, 0.26, 0.26, 0.26, 0.26, 0.26, 0.25, 0.25, 0.25, 0.24}},
	{1.8, [13]float64{0.34, 0.34, 0.34, 0.34, 0.34, 0.34, 0.33, 0.33, 0.32, 0.32, 0.31, 0.29, 0.27}},
	{2, [13]float64{0.38, 0.38, 0.37, 0.37, 0.37, 0.37, 0.36, 0.36, 0.35, 0.34, 0.33, 0.31, 0.29}},
	{2.2, [13]float64{0.4, 0.4, 0.4, 0.39, 0.39, 0.39, 0.39, 0.38, 0.37, 0.37, 0.35, 0.33, 0.3}},
	{2.5, [13]float64{0.42, 0.42, 0.42, 0.41, 0.41, 0.41, 0.4, 0.4, 0.39, 0.38, 0.37, 0.34, 0.31}},
	{3, [13]float64{0.44, 0.44, 0.44, 0.43, 0.43, 0.43, 0.42, 0.42, 0.41, 0.4, 0.39, 0.36, 0.33}},
	{4, [13]float64{0.47, 0.46, 0.46, 0.46, 0.45, 0.45, 0.45, 0.44, 0.43, 0.42, 0.41, 0.37, 0.34}},
	{5, [13]float64{0.48, 0.48, 0.47, 0.47, 0.47, 0.46, 0.46, 0.45, 0.45, 0.44, 0.42, 0.38, 0.35}},
	{10, [13]float64{0.49, 0.48, 0.48, 0.48, 0.48, 0.47, 0.47, 0.46, 0.46, 0.45, 0.43, 0.4, 0.36}},
}

// endlessContraction is the last row: out of a body of water.
var endlessContraction = [13]float64{0.49, 0.49, 0.48, 0.48, 0.48, 0.47, 0.47, 0.47, 0.46, 0.45, 0.44, 0.41, 0.38}

// ContractionCoefficient is Kc at a ratio of the larger to the smaller diameter and a velocity in the smaller pipe in ft/s,
// straight between the entries of the table; over a ratio of 10, that of a pipe out of a body of water. There is none for a
// ratio under 1 or a velocity over 40 ft/s; under 2 ft/s that of 2 ft/s holds.
func ContractionCoefficient(diameterRatio, velocityFeet float64) (k float64, ok bool) {
	last := contractionVelocities[len(contractionVelocities)-1]
	if !(diameterRatio >= 1) || !(velocityFeet >= 0) || velocityFeet > last {
		return 0, false
	}
	for i := 1; i < len(contractions); i++ {
		a, b := &contractions[i-1], &contractions[i]
		if diameterRatio <= b.ratio {
			share := (diameterRatio - a.ratio) / (b.ratio - a.ratio)
			low, high := atVelocity(&a.coefficients, velocityFeet), atVelocity(&b.coefficients, velocityFeet)
			return low + share*(high-low), true
		}
	}
	return atVelocity(&endlessContraction, velocityFeet), true
}

// atVelocity takes a coefficient from a row of the table.
func atVelocity(row *[13]float64, velocity float64) float64 {
	v := contractionVelocities[:]
	for i := 1; i < len(v); i++ {
		if velocity <= v[i] {
			share := max(0, (velocity-v[i-1])/(v[i]-v[i-1]))
			return row[i-1] + share*(row[i]-row[i-1])
		}
	}
	return row[len(v)-1]
}
