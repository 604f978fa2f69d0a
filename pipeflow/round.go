package pipeflow

import "math"

// A circle has one shape for all diameters, so normal and critical depth are each one function of one number. Both are
// found here in the half central angle φ = θ/2 of the water line, in which neither end of the circle is singular: a
// fitted polynomial is within a few hundred-thousandths, and one third-order step makes that exact to rounding.

// lune is φ - sin φ cos φ = 4 A/D², given φ, its sine and its cosine.
//
// Below 0.45, where the difference cancels, it is the series of s - sin s with s = 2φ, nested:
//
//	(s - sin s)/2 = s³/12 (1 - s²/20 (1 - s²/42 (1 - s²/72 (…))))
func lune(angle, sin, cos float64) float64 {
	if angle > 0.45 {
		return angle - sin*cos
	}
	s2 := 4 * angle * angle
	series := 1 - s2/20*(1-s2/42*(1-s2/72*(1-s2/110*(1-s2/156*(1-s2/210*(1-s2/272))))))
	return angle * s2 / 6 * series
}

// depthRatio is y/D = sin²(φ/2) at the angle φ + step, carried from the sine and cosine of φ by Taylor's series. It is
// for steps so short that their fourth power does not count.
func depthRatio(sin, cos, step float64) float64 {
	ratio := (1 - cos) / 2
	if cos > 0 {
		ratio = sin * sin / (2 * (1 + cos)) // does not cancel at small angles
	}
	return ratio + step*(sin/2+step*(cos/4-step*sin/12))
}

// longestStep is the greatest correction of a fitted angle that is taken on trust. The fits are within 4e-5 of the angle;
// a longer step means that rounding has spoilt it, and the bracketed search answers instead.
const longestStep = 2e-4

// thirdOrder is the step to the zero of a function from its value and first two derivatives (Halley 1694).
func thirdOrder(value, first, second float64) float64 {
	if value == 0 {
		return 0
	}
	return -2 * value * first / (2*first*first - value*second)
}

// logarithm is ln r of a ratio r within a thousandth of 1, by its series to the fourth power: within 1e-15.
func logarithm(ratio float64) float64 {
	e := ratio - 1
	return e * (1 - e*(1./2-e*(1./3-e/4)))
}

// ln is the logarithm, short where the ratio is close to 1.
func ln(ratio float64) float64 {
	if math.Abs(ratio-1) < 1e-3 {
		return logarithm(ratio)
	}
	return math.Log(ratio)
}

// exp is the exponential, short for a short step: below a tenth it is within 4e-6, which the next step of an iteration
// makes good, and below a ten-thousandth exact.
func exp(step float64) float64 {
	if math.Abs(step) < 0.1 {
		return 1 + step*(1+step/2*(1+step/3))
	}
	return math.Exp(step)
}

// evaluate sums a power series in x by Horner's rule.
func evaluate(coefficients []float64, x float64) float64 {
	sum := 0.0
	for i := len(coefficients) - 1; i >= 0; i-- {
		sum = sum*x + coefficients[i]
	}
	return sum
}
