package pipeflow

import "math"

// The crest of the circle with constant n, where d(A^5/P^2)/dφ = 0, that is 5 φ sin²φ = φ - sin φ cos φ. Solved to 30
// digits; the rounded values are well known (Chow 1959, section 6-4: depth 0.938 D, 1.076 of full-bore capacity).
const (
	crestAngle = 2.6390535689668978 // φ
	crestRatio = 0.9381812161606071 // y/D
	crestFlow  = 1.0757061294004648 // Q/Qfull
)

// circleFactor is A R^(2/3) of a full circle of diameter 1: (π/4) (1/4)^(2/3).
const circleFactor = 0.31168546769775035

// The fits of the angle φ to the flow ratio q = Q/Qfull. Minimax in relative error, by Chebyshev polynomials with
// Lawson's reweighting on 3,000 points; the error beside each is the largest on those points.
var (
	// risingLow: φ = t Σ c_k t^(2k), t = q^(3/13), for q up to splitFlow. q = φ^(13/3) (2/3)^(5/3)/π at small angles.
	// Error 8.3e-6.
	risingLow = [...]float64{
		1.522126309, 0.2730678585, 0.08278857727, 0.4276587091,
		-1.410292244, 3.150655989, -3.323895946, 1.490736291,
	}
	// risingHigh: φ = crestAngle - u Σ c_k u^k, u = √(1 - q/crestFlow), from splitFlow up to the crest. Error 1.9e-6 of
	// the distance from the crest.
	risingHigh = [...]float64{
		1.523361401, -0.6835659082, 1.347809451, -1.891700445, 2.806069748, -2.571198134, 1.246738833,
	}
	// beyondCrest: the same beyond the crest, where u counts as negative, down to q = 1 at φ = π. Error 1.5e-5 of the distance.
	beyondCrest = [...]float64{
		1.523388134, -0.6763120084, 1.785743896, 6.136242948, 78.9014604, 307.6183167, 555.8680782,
	}
)

// splitFlow is the flow ratio at which the two fits of the rising branch meet.
const splitFlow = 0.65

// normalDepth is the lower normal depth of the circle for A R^(2/3) of the given value.
func (c Circle) normalDepth(factor float64) (depth float64, ok bool) {
	q := c.flowRatio(factor)
	if !(q <= crestFlow) {
		return 0, false
	}
	ratio, ok := polishNormal(q, normalAngle(q))
	return c.diameter * ratio, ok
}

// normalAngle is the fitted angle of a flow ratio up to that of the crest.
func normalAngle(q float64) float64 {
	if q <= splitFlow {
		t := math.Exp(3. / 13 * math.Log(q))
		return t * evaluate(risingLow[:], t*t)
	}
	u := math.Sqrt(1 - q/crestFlow)
	return crestAngle - u*evaluate(risingHigh[:], u)
}

// circleStart is the fitted depth ratio of a flow ratio up to that of the crest.
func circleStart(q float64) float64 {
	half := math.Sin(normalAngle(q) / 2)
	return half * half
}

// upperNormalDepth is the other depth that carries the same: it exists from full-bore capacity to the crest.
func (c Circle) upperNormalDepth(factor float64) (depth float64, ok bool) {
	q := c.flowRatio(factor)
	if !(q >= 1) || !(q <= crestFlow) {
		return 0, false
	}
	u := -math.Sqrt(1 - q/crestFlow)
	ratio, ok := polishNormal(q, crestAngle-u*evaluate(beyondCrest[:], u))
	return c.diameter * min(ratio, 1), ok
}

// flowRatio is Q/Qfull, the share of the full A R^(2/3).
func (c Circle) flowRatio(factor float64) float64 {
	root := math.Cbrt(c.diameter)
	return factor / (circleFactor * c.diameter * c.diameter * root * root)
}

// polishNormal takes one third-order step on
//
//	ln [a^5 / (φ² (π q)³)] = 0    a = φ - sin φ cos φ
//
// which is Q/Qfull = (A/Afull)^(5/3) / (P/Pfull)^(2/3), cubed, so that it needs no root. No answer where the step is too
// long to be trusted.
func polishNormal(q, angle float64) (ratio float64, ok bool) {
	sin, cos := math.Sincos(angle)
	a := lune(angle, sin, cos)
	k := math.Pi * q
	off := logarithm(a * a / k * (a / angle) * (a / angle) / k * (a / k))
	growth, bend := 2*sin*sin/a, 4*sin*cos/a // a'/a, a''/a
	first := 5*growth - 2/angle
	second := 5*(bend-growth*growth) + 2/(angle*angle)
	step := thirdOrder(off, first, second)
	return depthRatio(sin, cos, step), math.Abs(step) <= longestStep*angle
}
