package pipeflow

import "math"

// The fits of the angle φ of critical flow to W = 64 Q²/(g D⁵) = (φ - sin φ cos φ)³/sin φ, made like those of the normal
// depth.
var (
	// criticalLow: φ = t Σ c_k t^(2k), t = W^(1/8), for W up to splitCritical. W = (2/3)³ φ⁸ at small angles. Error 1.1e-5.
	criticalLow = [...]float64{
		1.164230133, 0.08483167926, 0.0203956625, -0.01403034686,
		0.0267581363, -0.02027710439, 0.008086005552, -0.001279228575,
	}
	// criticalHigh: φ = π - r Σ c_k r^k, r = 1/W, beyond. Error 3.4e-5 of the distance from π.
	criticalHigh = [...]float64{
		31.00732523, -2.281932976, 5648.822776, -596675.7685, -12817251.3, 1202063253, -1.752044233e+10,
	}
)

// splitCritical is the W at which the two fits meet, at a depth of about 0.87 D.
const splitCritical = 36

// farUnderCrown is the W over which the fitted angle is within 1e-12 of the exact one without a further step.
const farUnderCrown = 1e9

// criticalDepth is the critical depth of the circle; target is Q²/g.
func (c Circle) criticalDepth(target float64) (depth float64, ok bool) {
	D := c.diameter
	w := 64 * target / (D * D * D * D * D)
	if w > farUnderCrown {
		return D * depthRatio(0, -1, math.Pi*math.Pi*math.Pi/w), true
	}
	ratio, ok := polishCritical(w, criticalAngle(w))
	return D * ratio, ok
}

// criticalAngle is the fitted angle of W.
func criticalAngle(w float64) float64 {
	if w <= splitCritical {
		t := math.Sqrt(math.Sqrt(math.Sqrt(w)))
		return t * evaluate(criticalLow[:], t*t)
	}
	r := 1 / w
	return math.Pi - r*evaluate(criticalHigh[:], r)
}

// criticalGuess is the fitted depth ratio of W.
func criticalGuess(w float64) float64 {
	half := math.Sin(criticalAngle(w) / 2)
	return half * half
}

// polishCritical takes one third-order step on ln [a³ / (W sin φ)] = 0, a = φ - sin φ cos φ. No answer where the step is
// too long to be trusted.
func polishCritical(w, angle float64) (ratio float64, ok bool) {
	sin, cos := math.Sincos(angle)
	a := lune(angle, sin, cos)
	off := logarithm(a / w * a * (a / sin))
	growth, bend := 2*sin*sin/a, 4*sin*cos/a // a'/a, a''/a
	cotangent := cos / sin
	first := 3*growth - cotangent
	second := 3*(bend-growth*growth) + 1 + cotangent*cotangent
	step := thirdOrder(off, first, second)
	return depthRatio(sin, cos, step), math.Abs(step) <= longestStep*angle
}
