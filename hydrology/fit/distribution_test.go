package fit

import (
	"errors"
	"math"
	"slices"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/hydrology"
)

// The definition: λ₂ is half the mean difference of two values, λ₃ a third of the mean of largest − 2·middle +
// smallest of three, over all pairs and triples (Hosking 1990).
func TestLMomentsAgainstTheirDefinition(t *testing.T) {
	maxima, _ := canadian(t)
	x := slices.Sorted(slices.Values(maxima.Of(0)))
	pairs, triples, l2, l3 := 0.0, 0.0, 0.0, 0.0
	for a := range x {
		for b := range a {
			l2, pairs = l2+(x[a]-x[b])/2, pairs+1
			for c := range b {
				l3, triples = l3+(x[a]-2*x[b]+x[c])/3, triples+1
			}
		}
	}
	got := LMomentsOf(x)
	if math.Abs(got.L2-l2/pairs) > 1e-12 || math.Abs(got.L3-l3/triples) > 1e-12 { // rounding
		t.Errorf("%+v, by definition %v and %v", got, l2/pairs, l3/triples)
	}
}

// Hosking, Wallis and Wood (1985): k ≈ 7.8590c + 2.9554c², c = 2/(3 + τ₃) − ln 2/ln 3, within 0.0009 for shapes
// of −0.5 to 0.5 (constants and range from memory).
func TestGEVShapeAgreesWithThePublishedApproximation(t *testing.T) {
	for shape := -0.5; shape <= 0.5; shape += 0.01 {
		skewness := 2*(1-math.Pow(3, -shape-1e-9))/(1-math.Pow(2, -shape-1e-9)) - 3 // beside 0/0
		g, err := gevByLMoments(LMoments{L1: 10, L2: 2, L3: 2 * skewness})
		if err != nil {
			t.Fatal(err)
		}
		c := 2/(3+skewness) - math.Ln2/math.Log(3)
		if want := 7.8590*c + 2.9554*c*c; math.Abs(g.Shape-want) > 0.0009 {
			t.Errorf("τ₃ %.2f: shape %.5f, published approximation %.5f", skewness, g.Shape, want)
		}
	}
	if _, err := gevByLMoments(LMoments{L1: 10, L2: 2, L3: 1.99}); err == nil {
		t.Error("an L-skewness of 0.995 has no GEV with a mean")
	}
}

// The L-moments of a fitted GEV, integrated over its quantiles, are those that it was fitted to:
// λ₁ = ∫x dF, λ₂ = ∫x(2F − 1)dF, λ₃ = ∫x(6F² − 6F + 1)dF.
func TestFittedGEVHasTheLMomentsOfItsSample(t *testing.T) {
	maxima, _ := canadian(t)
	for k, minutes := range maxima.Durations {
		want := LMomentsOf(slices.Sorted(slices.Values(maxima.Of(k))))
		g, err := gevByLMoments(want)
		if err != nil {
			t.Fatal(err)
		}
		var got LMoments
		const steps = 200000
		for s := range steps {
			f := (float64(s) + 0.5) / steps
			x := g.Quantile(f) / steps
			got.L1, got.L2, got.L3 = got.L1+x, got.L2+x*(2*f-1), got.L3+x*(6*f*f-6*f+1)
		}
		for _, pair := range [][2]float64{{got.L1, want.L1}, {got.L2, want.L2}, {got.L3, want.L3}} {
			if math.Abs(pair[0]-pair[1]) > 2e-3 { // the midpoint rule at the heavy end
				t.Errorf("%v min: %+v, the sample has %+v", minutes, got, want)
			}
		}
	}
}

func TestQuantileAndBelowAreInverse(t *testing.T) {
	distributions := []Distribution{
		Gumbel{10, 3},
		GEV{10, 3, 0.2},
		GEV{10, 3, -0.2},
		GEV{10, 3, 0},
		GEV{10, 3, 1e-11},
		LogPearson3{1, 0.2, 0.7},
		LogPearson3{1, 0.2, -0.7},
		LogPearson3{1, 0.2, 0},
		LogPearson3{1, 0.2, 0.002},
	}
	rapid.Check(t, func(t *rapid.T) {
		p := rapid.Float64Range(0.001, 0.999).Draw(t, "p")
		for _, d := range distributions {
			if back := d.Below(d.Quantile(p)); math.Abs(back-p) > 1e-9 { // the incomplete gamma function's inverse
				t.Fatalf("%#v: %v comes back as %v", d, p, back)
			}
		}
	})
}

func TestBoundsOfDistributions(t *testing.T) {
	cases := []struct {
		name string
		d    Distribution
		x    float64
		want float64
	}{
		{"over the upper bound of a GEV of positive shape", GEV{10, 3, 0.2}, 26, 1},
		{"under the lower bound of a GEV of negative shape", GEV{10, 3, -0.2}, -6, 0},
		{"under the lower bound of a Log-Pearson III of positive skew", LogPearson3{1, 0.2, 1}, 1, 0},
		{"over the upper bound of a Log-Pearson III of negative skew", LogPearson3{1, 0.2, -1}, 100, 1},
		{"Log-Pearson III has nothing below 0", LogPearson3{1, 0.2, 1}, -1, 0},
	}
	for _, k := range cases {
		if got := k.d.Below(k.x); got != k.want {
			t.Errorf("%s: %v", k.name, got)
		}
	}
}

// The series near no skew and the gamma function beyond it meet.
func TestPearson3FactorHasNoStep(t *testing.T) {
	for _, p := range []float64{0.01, 0.5, 0.9, 0.99, 0.999} {
		for _, sign := range []float64{-1, 1} {
			below, above := Pearson3Factor(sign*smallSkew*(1-1e-9), p), Pearson3Factor(sign*smallSkew*(1+1e-9), p)
			if math.Abs(below-above) > 1e-8 { // 10⁻¹⁰ of the series, 10⁻⁹ of the inverse
				t.Errorf("p %v: %v and %v on the two sides of skew %v", p, below, above, sign*smallSkew)
			}
		}
	}
}

// Formulas for limits against the parametric bootstrap, which is independent of them. Kite's is of first order and
// 31 years are few: 15 % of the interval's width.
func TestLimitsAgreeWithTheBootstrap(t *testing.T) {
	maxima, _ := canadian(t)
	for _, m := range []Method{GumbelMoments, LogPearson3Moments} {
		f, err := Fit(maxima.Of(4), m)
		if err != nil {
			t.Fatal(err)
		}
		for _, period := range []float64{2, 10} {
			lower, upper, ok := f.Limits(period, 0.90)
			low, high, ok2 := f.bootstrap(period, 0.90)
			if !ok || !ok2 || math.Abs((upper-lower)/(high-low)-1) > 0.15 {
				t.Errorf("%s, %v years: %.2f to %.2f, bootstrap %.2f to %.2f", m, period, lower, upper, low, high)
			}
		}
	}
}

func TestEveryMethodFitsTheCanadianMaxima(t *testing.T) {
	maxima, _ := canadian(t)
	for _, m := range Methods() {
		f, err := Fit(maxima.Of(4), m)
		if err != nil {
			t.Fatal(err)
		}
		value, _ := f.Quantile(100)
		lower, upper, ok := f.Limits(100, 0.95)
		again, _, _ := f.Limits(100, 0.95)
		if !ok || !(lower < value && value < upper) || again != lower {
			t.Errorf("%s: %v in %v to %v, then %v", m, value, lower, upper, again)
		}
		// The 5 % limit of Kolmogorov and Smirnov's distance for 31 years is 1.36/√31 = 0.244 (Massey 1951, for
		// distributions not fitted to the sample): no method may come near it here.
		if g := f.Goodness(); g.KolmogorovSmirnov > 0.2 || g.Correlation < 0.97 || !(g.RootMeanSquare > 0) {
			t.Errorf("%s: %+v", m, g)
		}
	}
}

// A sample that stands at Cunnane's plotting positions, (k − 0.4)/(n + 0.2), lies on the straight line; the largest
// distance to its steps is that of the first and last point, 0.6/(n + 0.2).
func TestGoodnessOfAPerfectSample(t *testing.T) {
	f := Fitted{Distribution: Gumbel{10, 3}}
	for k := range 20 {
		f.Sample = append(f.Sample, Gumbel{10, 3}.Quantile((float64(k+1)-0.4)/20.2))
	}
	g := f.Goodness()
	if math.Abs(g.Correlation-1) > 1e-12 || g.RootMeanSquare > 1e-12 || math.Abs(g.KolmogorovSmirnov-0.6/20.2) > 1e-12 {
		t.Errorf("%+v", g)
	}
}

func TestSamplesThatCannotBeFitted(t *testing.T) {
	ten := []float64{1, 2, 3, 4, 5, 6, 7, 8, 9, 10}
	with := func(x float64) []float64 { return append(slices.Clone(ten), x) }
	cases := []struct {
		name   string
		sample []float64
		m      Method
		want   string
	}{
		{"nine years", ten[:9], GumbelMoments, "10 are wanted"},
		{"a maximum that is no number", with(math.NaN()), GumbelLMoments, "NaN"},
		{"a maximum without end", with(math.Inf(1)), GEVLMoments, "Inf"},
		{"all the same", slices.Repeat([]float64{4}, 12), GumbelMoments, "differ"},
		{"a year without rain has no logarithm", with(0), LogPearson3Moments, "greater than 0"},
	}
	for _, k := range cases {
		t.Run(k.name, func(t *testing.T) {
			if _, err := Fit(k.sample, k.m); err == nil || !strings.Contains(err.Error(), k.want) {
				t.Errorf("got %v, want %q in it", err, k.want)
			}
		})
	}
	f, err := Fit(ten, GumbelMoments)
	if err != nil {
		t.Fatal(err)
	}
	for _, period := range []float64{0, 1, math.NaN(), math.Inf(1)} {
		if value, ok := f.Quantile(period); ok {
			t.Errorf("%v years: %v", period, value)
		}
	}
	if _, _, ok := f.Limits(10, 1); ok {
		t.Error("limits of certainty")
	}
}

func TestTablesOfFittedStorms(t *testing.T) {
	maxima, _ := canadian(t)
	table := canadianTable(t, maxima)
	curve, _ := table.Curve(100)
	if i, _ := curve.At(60); math.Abs(i-40.5) > 0.05 { // published 40.5 mm in 1 h
		t.Errorf("1 h, 100 years: %v mm/h", i)
	}
	// Between columns a table of annual maxima is linear in Gumbel's variate, and so is Gumbel's distribution: a storm
	// of 40 years read between 25 and 50 is the distribution's own, but for rounding.
	between, ok := table.CurveBetween(40, hydrology.AnnualMaximum)
	f, err := Fit(maxima.Of(4), GumbelMoments)
	if err != nil {
		t.Fatal(err)
	}
	want, _ := f.Quantile(40)
	if i, _ := between.At(60); !ok || math.Abs(i-want) > 1e-9 {
		t.Errorf("1 h, 40 years: %v mm/h between the columns, %v by the distribution", i, want)
	}
	// Invented: the longer duration spreads so much that its rare storms are harder than the shorter one's.
	steady := []float64{10, 10.1, 10.2, 10.3, 10.4, 10.5, 10.6, 10.7, 10.8, 10.9}
	wild := []float64{1, 2, 3, 5, 8, 12, 16, 22, 30, 60}
	storms, err := FitStorms([]float64{5, 10}, [][]float64{steady, wild}, GumbelMoments)
	if err != nil {
		t.Fatal(err)
	}
	var faults hydrology.CellFaults
	if _, err := storms.Table([]float64{2, 100}); !errors.As(err, &faults) || faults[0].Row != 1 || faults[0].Column != 1 {
		t.Errorf("intensities that rise with duration: %v", err)
	}
	if _, err := FitStorms([]float64{5, 10}, [][]float64{steady[:3], wild[:4]}, GumbelMoments); err == nil || strings.Count(err.Error(), "are wanted") != 2 {
		t.Errorf("two short records: %v", err)
	}
	if _, err := storms.Table([]float64{1}); err == nil {
		t.Error("a storm of 1 year came of annual maxima")
	}
}

func BenchmarkLimits(b *testing.B) {
	maxima, _ := canadian(b)
	for _, m := range Methods() {
		f, err := Fit(maxima.Of(4), m)
		if err != nil {
			b.Fatal(err)
		}
		b.Run(m.String(), func(b *testing.B) {
			for b.Loop() {
				if _, _, ok := f.Limits(100, 0.95); !ok {
					b.Fatal("no limits")
				}
			}
		})
	}
}
