package pipeflow

import "math"

const (
	// lastStep ends the third-order iteration: the error left after a step in ln y is about its cube, and a thousand times
	// that close to the largest discharge, here 1e-14.
	lastStep = 2e-6
	// depthTolerance is the relative accuracy asked of the bracketed search, a few hundred times the spacing of
	// floating-point numbers, so that rounding in the section's geometry cannot stop it short.
	depthTolerance = 1e-13
	// freeSteps bounds the third-order iteration, which from a usual start needs two or three; what it cannot do the
	// bracketed search finishes.
	freeSteps = 20
)

// solveDepth is a depth in (0, high) at which f passes zero going up, from a start between. Given that f is below zero
// at small depths and not below it at high (+Inf for walls without end) there is one. Third-order steps are taken in
//
//	z = ln y - ln(1 - y/limit)
//
// with the limit +Inf, or the rise where the function is singular under a crown. With r = 1 - y/limit, derivatives in z
// are f_z = r f_1 and f_zz = r² f_2 - r (1 - r) f_1, with f_1 and f_2 those in ln y. A step that leaves the bracket is
// replaced by halving it.
//
// No answer: f has no zero in the range of floating-point numbers.
func solveDepth(start, high, limit float64, f hydraulic) (depth float64, ok bool) {
	low, y := 0.0, start
	for range freeSteps {
		value, slope, bend := f(y)
		if value == 0 {
			return y, true
		}
		if value < 0 {
			low = y
		} else {
			high = y
		}
		room := 1 - y/limit
		step := thirdOrder(value, room*slope, room*(room*bend-(1-room)*slope))
		odds := y / room * exp(step)
		next := odds / (1 + odds/limit)
		if math.Abs(step) < lastStep {
			return next, true
		}
		if !(next > low && next < high) {
			next = between(low, high)
		}
		if next == y {
			return y, true
		}
		y = next
	}
	return bracketDepth(low, high, valueOf(f))
}

// valueOf is the value of a hydraulic function alone.
func valueOf(f hydraulic) func(depth float64) float64 {
	return func(y float64) float64 {
		v, _, _ := f(y)
		return v
	}
}

// between halves a bracket in ln y; from an open end it goes outward by a factor.
func between(low, high float64) float64 {
	const outward = 64
	switch {
	case low == 0 && math.IsInf(high, 1):
		return 1 // anywhere to begin with
	case low == 0:
		return high / outward
	case math.IsInf(high, 1):
		return low * outward
	}
	return math.Sqrt(low) * math.Sqrt(high)
}

// bracketDepth finds the zero of f between low and high by its values alone, after closing the ends that are still open.
func bracketDepth(low, high float64, f func(depth float64) float64) (depth float64, ok bool) {
	atZ := func(z float64) float64 { return f(math.Exp(z)) }
	for range 400 { // 64^400 spans all floating-point numbers
		if low > 0 && !math.IsInf(high, 1) {
			a, b := math.Log(low), math.Log(high)
			return math.Exp(root(atZ, a, b, atZ(a), atZ(b), depthTolerance)), true
		}
		y := between(low, high)
		if y == 0 || math.IsInf(y, 1) {
			break
		}
		if f(y) < 0 {
			low = y
		} else {
			high = y
		}
	}
	return 0, false
}

// root is the place between a and b where f passes zero, to the absolute tolerance; f(a) and f(b) have opposite signs,
// or one of them is zero.
//
// Chandrupatla's method: inverse quadratic interpolation through the last three points where these are known to lie on
// a curve that may be inverted, halving otherwise (T. R. Chandrupatla, Advances in Engineering Software 28, 1997,
// 145-149). The bracket never opens, and halving alone reaches any tolerance within the bound on the loop.
func root(f func(float64) float64, a, b, fa, fb, tolerance float64) float64 {
	if fa == 0 {
		return a
	}
	if fb == 0 {
		return b
	}
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
		best, atBest := a, fa
		if math.Abs(fb) < math.Abs(fa) {
			best, atBest = b, fb
		}
		margin := tolerance / math.Abs(b-a)
		if atBest == 0 || margin > 0.5 {
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
