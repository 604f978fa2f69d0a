package pipeflow

import "math"

// A hydraulic function is the logarithm of what a section offers at a depth over what is asked for: it passes zero at the
// depth that is sought. Given with it is its slope in the logarithm of depth, y df/dy. In these terms the functions of
// most sections are nearly straight lines, so that depths of any size come out to the same relative accuracy.
type hydraulic func(depth float64) (value, slope float64)

const (
	// lastStep ends Newton's iteration: the error left after a step in ln y is about its square, here 1e-15.
	lastStep = 3e-8
	// depthTolerance is the relative accuracy asked of the bracketed search, a few hundred times the spacing of
	// floating-point numbers, so that rounding in the section's geometry cannot stop it short.
	depthTolerance = 1e-13
	// newtonSteps bounds Newton's iteration, which from a usual start needs four; what it cannot do the bracketed search
	// finishes.
	newtonSteps = 25
)

// solveDepth is a depth in (0, high) at which f passes zero going up, from a start between. Given that f is below zero
// at small depths and not below it at high (+Inf for walls without end) there is one. Newton's steps are taken in
//
//	z = ln y - ln(1 - y/limit)
//
// with the limit +Inf, or the rise where the function is singular under a crown. A step that leaves the bracket is
// replaced by halving it.
//
// No answer: f has no zero in the range of floating-point numbers.
func solveDepth(start, high, limit float64, f hydraulic) (depth float64, ok bool) {
	low, y := 0.0, start
	for range newtonSteps {
		value, slope := f(y)
		if value == 0 {
			return y, true
		}
		if value < 0 {
			low = y
		} else {
			high = y
		}
		room := 1 - y/limit
		step := -value / (slope * room)
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
	return bracketDepth(low, high, f)
}

// between halves a bracket in ln y; from an open end it goes outward by a factor.
func between(low, high float64) float64 {
	const outward = 64
	switch {
	case low == 0:
		return high / outward
	case math.IsInf(high, 1):
		return low * outward
	}
	return math.Sqrt(low) * math.Sqrt(high)
}

// bracketDepth finds the zero of f between low and high without its slope, after closing the ends that are still open.
func bracketDepth(low, high float64, f hydraulic) (depth float64, ok bool) {
	atZ := func(z float64) float64 {
		value, _ := f(math.Exp(z))
		return value
	}
	for range 400 { // 64^400 spans all floating-point numbers
		if low > 0 && !math.IsInf(high, 1) {
			a, b := math.Log(low), math.Log(high)
			return math.Exp(root(atZ, a, b, atZ(a), atZ(b), depthTolerance)), true
		}
		y := between(low, high)
		if y == 0 || math.IsInf(y, 1) {
			break
		}
		if value, _ := f(y); value < 0 {
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
