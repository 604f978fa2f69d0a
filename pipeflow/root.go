package pipeflow

import "math"

// depthTolerance is the relative accuracy of a depth found by iteration. It is a few hundred times the spacing of
// floating-point numbers, so that rounding in the section's geometry cannot stop the iteration short of it.
const depthTolerance = 1e-13

// solveDepth is the depth in (0, high] at which an increasing function passes zero, given f(high) not under zero and
// f below zero at small depths. It works in ln y, in which the logarithms of hydraulic functions are nearly straight,
// so that depths of any size come out to the same relative accuracy.
//
// No answer: f stays over zero down to the smallest depths, which no finite flow does.
func solveDepth(high float64, f func(depth float64) float64) (depth float64, ok bool) {
	atHigh := f(high)
	if atHigh <= 0 {
		return high, true
	}
	low := high
	for range 1100 { // 2^-1100 is below the least floating-point number
		// Hydraulic functions of depth grow at least like y^(3/2), so this step lands below the answer or near it.
		low = high * max(math.Exp(-atHigh/1.5), 1e-3) / 2
		atLow := f(low)
		if !(atLow > 0) {
			z := root(func(z float64) float64 { return f(math.Exp(z)) },
				math.Log(low), math.Log(high), atLow, atHigh, depthTolerance)
			return math.Exp(z), true
		}
		if low == 0 {
			break
		}
		high, atHigh = low, atLow
	}
	return 0, false
}

// root is the place between a and b where f passes zero, to the absolute tolerance; f(a) and f(b) have opposite signs.
//
// Chandrupatla's method: inverse quadratic interpolation through the last three points where these are known to lie on
// a curve that may be inverted, halving otherwise (T. R. Chandrupatla, Advances in Engineering Software 28, 1997,
// 145-149). The bracket never opens; it halves at least every other step in the worst case, hence the bound on the loop.
func root(f func(float64) float64, a, b, fa, fb, tolerance float64) float64 {
	c, fc := a, fa
	t := 0.5
	for range 200 {
		x := a + t*(b-a)
		fx := f(x)
		if math.Signbit(fx) == math.Signbit(fa) {
			c, fc = a, fa
		} else {
			c, b, fc, fb = b, a, fb, fa
		}
		a, fa = x, fx
		best, fbest := a, fa
		if math.Abs(fb) < math.Abs(fa) {
			best, fbest = b, fb
		}
		margin := tolerance / math.Abs(b-a)
		if fbest == 0 || margin > 0.5 {
			return best
		}
		t = 0.5
		xi, phi := (a-b)/(c-b), (fa-fb)/(fc-fb)
		if phi*phi < xi && (1-phi)*(1-phi) < 1-xi {
			t = fa/(fb-fa)*fc/(fb-fc) + (c-a)/(b-a)*fa/(fc-fa)*fb/(fc-fb)
		}
		t = min(1-margin, max(margin, t))
	}
	return a
}
