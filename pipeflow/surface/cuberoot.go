package surface

import "math"

// cubeRoot is the cube root of a finite number over 0, to 1e-14. It takes a third of the time of [math.Cbrt], which
// sees to the last digit too, and a profile is mostly cube roots.
//
// A third of the bits of a floating-point number, its exponent with them, is a first root within 4 %; two steps of
// Halley's iteration t (t³ + 2x)/(2t³ + x), each of which leaves two thirds of the cube of the relative error, do the
// rest.
func cubeRoot(x float64) float64 {
	// Two thirds of the exponent's bias 1023 in its place, less a shift that makes the errors to both sides alike.
	const bias = 0x2aa<<52 - 0x876c87d25e32
	t := math.Float64frombits(math.Float64bits(x)/3 + bias)
	for range 2 {
		cube := t * t * t
		t *= (cube + 2*x) / (2*cube + x)
	}
	return t
}
