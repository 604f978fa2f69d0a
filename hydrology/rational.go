package hydrology

import "math"

// The factor of the Rational method in the two systems of units.
const (
	// RationalFactorUS: cfs from acres and in/h. The exact figure is 43560/(12·3600) = 1.00833; practice drops
	// the 0.8 % (WSDOT Hydraulics Manual M 23-03, eq. 2-1: Kc = 1).
	RationalFactorUS = 1.0
	// RationalFactorSI: m³/s from hectares and mm/h (WSDOT M 23-03, eq. 2-1: Kc = 360). It is exact.
	RationalFactorSI = 1.0 / 360
)

// Rational is the peak flow from rain of an intensity on areas whose sum of C·A is ca.
func Rational(factor, ca, intensity float64) float64 {
	// WSDOT Hydraulics Manual M 23-03, eq. 2-1: Q = C·I·A/Kc.
	return factor * ca * intensity
}

// frequencyFactors: HEC-22 ch. 3 (from memory): the rarer the storm, the wetter and the fuller the ground.
var frequencyFactors = []struct{ period, factor float64 }{{10, 1.0}, {25, 1.1}, {50, 1.2}, {100, 1.25}}

// FrequencyFactor is Cf by which C is raised in rare storms: 1.0 up to 10 years, 1.1 at 25, 1.2 at 50, 1.25 from
// 100 years on, linear in ln T between. C·Cf is not more than 1. The period is in years, greater than 0.
func FrequencyFactor(period float64) float64 {
	last := len(frequencyFactors) - 1
	for k := range last {
		lower, upper := frequencyFactors[k], frequencyFactors[k+1]
		if period <= lower.period {
			return lower.factor
		}
		if period < upper.period {
			share := math.Log(period/lower.period) / math.Log(upper.period/lower.period)
			return lower.factor + share*(upper.factor-lower.factor)
		}
	}
	return frequencyFactors[last].factor
}
