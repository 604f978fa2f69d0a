package pipeflow

import (
	"math"
	"testing"
)

// ratios are depth ratios spread evenly in their logarithm from 1e-8 to most.
func ratios(count int, most float64) []float64 {
	all := make([]float64, count)
	for i := range all {
		all[i] = most * math.Pow(1e-8/most, float64(i)/float64(count-1))
	}
	return all
}

// TestTheOneStepSolutionsOfTheCircle measures what NormalDepth and CriticalDepth of a circle promise: that the fit is near
// enough for one step everywhere, so that the search is never needed, and how good the depth is.
func TestTheOneStepSolutionsOfTheCircle(t *testing.T) {
	c := Circle{1}
	normal, critical := 0.0, 0.0
	for _, y := range append(ratios(100_000, 0.93), linspace(0.001, 0.93, 20_000)...) {
		got, ok := c.normalDepth(sectionFactor(c.At(y)))
		if !ok {
			t.Fatalf("normal depth %v needs the search", y)
		}
		normal = max(normal, math.Abs(got/y-1))
	}
	for _, y := range append(ratios(100_000, 1-1e-12), linspace(0.001, 0.9999, 20_000)...) {
		got, ok := c.criticalDepth(criticalFactor(c.At(y)))
		if !ok {
			t.Fatalf("critical depth %v needs the search", y)
		}
		critical = max(critical, math.Abs(got/y-1))
	}
	t.Logf("largest relative difference: normal depth %.2g, critical depth %.2g", normal, critical)
	// Rounding of the flow is magnified near the crest at 0.938; up to 0.93 by no more than a factor of 60.
	if normal > 3e-14 || critical > 1e-14 {
		t.Errorf("largest relative difference: normal depth %v, critical depth %v", normal, critical)
	}
}

func TestTheUpperNormalDepthOfTheCircle(t *testing.T) {
	c := Circle{1}
	worst := 0.0
	for _, y := range linspace(0.945, 1, 20_000) {
		got, ok := c.upperNormalDepth(sectionFactor(c.At(y)))
		if !ok && y < 1-1e-9 { // at full the ratio of flows may round to just under 1
			t.Fatalf("upper normal depth %v needs the search", y)
		}
		if ok {
			worst = max(worst, math.Abs(got/y-1))
		}
	}
	if t.Logf("largest relative difference %.2g", worst); worst > 3e-14 {
		t.Errorf("largest relative difference %v", worst)
	}
}

// TestTheCrestConstants holds the constants against the condition that makes them.
func TestTheCrestConstants(t *testing.T) {
	sin, cos := math.Sincos(crestAngle)
	if off := 5*crestAngle*sin*sin - lune(crestAngle, sin, cos); math.Abs(off) > 1e-15*10 {
		t.Errorf("the crest is off its condition by %v", off)
	}
	if got := depthRatio(sin, cos, 0); math.Abs(got-crestRatio) > 2e-16 {
		t.Errorf("depth ratio of the crest: got %.17g", got)
	}
	c := Circle{1}
	if got := sectionFactor(c.At(crestRatio)) / circleFactor; math.Abs(got-crestFlow) > 4e-16 {
		t.Errorf("flow ratio of the crest: got %.17g", got)
	}
	if got := sectionFactor(c.At(1)); math.Abs(got-circleFactor) > 1e-16 {
		t.Errorf("full factor: got %.17g", got)
	}
}

// TestTheNormalDepthOfACircleNearItsCrest: there the depth is as good as the flow allows, which is what it carries.
func TestTheNormalDepthOfACircleNearItsCrest(t *testing.T) {
	c := Circle{1}
	for _, y := range linspace(0.93, crestRatio, 10_000) {
		factor := min(sectionFactor(c.At(y)), c.crest().factor)
		got, ok := depthOfFactor(c, factor)
		if back := sectionFactor(c.At(got)); !ok || math.Abs(back/factor-1) > 1e-15*4 {
			t.Fatalf("depth %v: got %v, %v, which carries %v of %v", y, got, ok, back, factor)
		}
	}
}

func linspace(from, to float64, count int) []float64 {
	all := make([]float64, count)
	for i := range all {
		all[i] = from + (to-from)*float64(i)/float64(count-1)
	}
	return all
}

// TestRootsThatResist gives the bracketed search functions on which interpolation alone fails.
func TestRootsThatResist(t *testing.T) {
	for name, c := range map[string]struct {
		f    func(float64) float64
		a, b float64
		want float64
	}{
		"a step":               {func(x float64) float64 { return math.Copysign(1, x-0.3) }, 0, 1, 0.3},
		"a flat triple root":   {func(x float64) float64 { return (x - 0.3) * (x - 0.3) * (x - 0.3) }, -1, 1, 0.3},
		"a pole to one side":   {func(x float64) float64 { return 1/(1-x) - 1e6 }, 0, 1 - 1e-9, 1 - 1e-6},
		"a zero at the end":    {func(x float64) float64 { return x }, 0, 1, 0},
		"an exponential climb": {func(x float64) float64 { return math.Exp(50*x) - math.Exp(25) }, 0, 1, 0.5},
	} {
		got := root(c.f, c.a, c.b, c.f(c.a), c.f(c.b), 1e-13)
		if math.Abs(got-c.want) > 1e-5*boolean(name == "a flat triple root")+1e-12 {
			t.Errorf("%s: got %v, want %v", name, got, c.want)
		}
	}
}

func boolean(b bool) float64 {
	if b {
		return 1
	}
	return 0
}

// TestSectionsOfOthers solves a section that offers nothing but the interface, by differences and search.
func TestSectionsOfOthers(t *testing.T) {
	type bare struct{ Section }
	m := Manning{Factor: 1, N: 0.013, Slope: 0.004}
	c := Circle{1.5}
	for _, y := range ratios(200, 0.9) {
		y *= 1.5
		if got, ok := m.NormalDepth(bare{c}, m.Flow(c, y)); !ok || math.Abs(got/y-1) > 1e-12 {
			t.Errorf("normal depth %v: got %v, %v", y, got, ok)
		}
		wet := c.At(y)
		flow := wet.Area * math.Sqrt(9.81*wet.Area/wet.TopWidth)
		if got, ok := CriticalDepth(bare{c}, 9.81, flow); !ok || math.Abs(got/y-1) > 1e-12 {
			t.Errorf("critical depth %v: got %v, %v", y, got, ok)
		}
	}
	if got := crestOf(bare{c}); math.Abs(got.depth/1.5-crestRatio) > 1e-7 { // differences over 1e-4
		t.Errorf("crest found at %v", got.depth/1.5)
	}
}
