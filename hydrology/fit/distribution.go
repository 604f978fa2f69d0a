package fit

import (
	"fmt"
	"math"
	"slices"

	"gonum.org/v1/gonum/stat"
	"gonum.org/v1/gonum/stat/distuv"
)

// Method is a distribution and the way in which it is fitted.
type Method int8

// The methods.
const (
	GumbelMoments Method = iota
	GumbelLMoments
	GEVLMoments
	LogPearson3Moments
)

// Methods lists them all.
func Methods() []Method {
	return []Method{GumbelMoments, GumbelLMoments, GEVLMoments, LogPearson3Moments}
}

// String names the method in words.
func (m Method) String() string {
	return [...]string{"Gumbel by moments", "Gumbel by L-moments", "GEV by L-moments", "Log-Pearson III by moments"}[m]
}

// Distribution is a fitted distribution of annual maxima. Quantile takes the chance of not being exceeded in a
// year, 0 < p < 1; Below gives that chance for a value.
type Distribution interface {
	Quantile(p float64) float64
	Below(x float64) float64
}

// fewest is how many years are wanted: under 10 a distribution says next to nothing of rare storms (common
// practice; agencies publish from 10 years on).
const fewest = 10

// Fitted is a distribution fitted to a sample.
type Fitted struct {
	Method       Method
	Distribution Distribution
	Sample       []float64 // rising
}

// Fit fits a distribution to a sample of annual maxima, in any order and unit. The error says what the sample
// lacks: ten finite values, not all equal, and for Log-Pearson III greater than 0.
func Fit(sample []float64, m Method) (Fitted, error) {
	sorted := slices.Sorted(slices.Values(sample))
	if len(sorted) < fewest {
		return Fitted{}, fmt.Errorf("%d years; %d are wanted for a distribution", len(sorted), fewest)
	}
	for _, x := range sorted {
		if math.IsNaN(x) || math.IsInf(x, 0) {
			return Fitted{}, fmt.Errorf("a maximum is %v", x)
		}
	}
	if sorted[0] == sorted[len(sorted)-1] {
		return Fitted{}, fmt.Errorf("all maxima are %v; a distribution wants them to differ", sorted[0])
	}
	d, err := distributionOf(sorted, m)
	return Fitted{m, d, sorted}, err
}

func distributionOf(sorted []float64, m Method) (Distribution, error) {
	switch m {
	case GumbelMoments:
		return gumbelByMoments(sorted), nil
	case GumbelLMoments:
		return gumbelByLMoments(LMomentsOf(sorted)), nil
	case GEVLMoments:
		return gevByLMoments(LMomentsOf(sorted))
	}
	return logPearson3(sorted)
}

// Quantile is the value that is exceeded once in period years on average, period > 1; not ok for others.
func (f Fitted) Quantile(period float64) (value float64, ok bool) {
	if !(period > 1) || math.IsInf(period, 1) {
		return 0, false
	}
	return f.Distribution.Quantile(1 - 1/period), true
}

// Goodness says how well a distribution fits its sample.
type Goodness struct {
	// KolmogorovSmirnov is the largest distance between the sample's steps and the distribution, 0 to 1.
	KolmogorovSmirnov float64
	// Correlation is that of the sample with the distribution's values at Cunnane's plotting positions; 1 is a
	// straight probability plot.
	Correlation float64
	// RootMeanSquare is the error of those values, in the sample's unit.
	RootMeanSquare float64
}

// Goodness works out the figures.
func (f Fitted) Goodness() Goodness {
	n := float64(len(f.Sample))
	var g Goodness
	expected := make([]float64, len(f.Sample))
	for k, x := range f.Sample {
		below := f.Distribution.Below(x)
		g.KolmogorovSmirnov = max(g.KolmogorovSmirnov, below-float64(k)/n, float64(k+1)/n-below)
		// C. Cunnane, Journal of Hydrology 37, 1978: p = (k − 0.4)/(n + 0.2), k from 1.
		expected[k] = f.Distribution.Quantile((float64(k) + 0.6) / (n + 0.2))
		g.RootMeanSquare += (x - expected[k]) * (x - expected[k]) / n
	}
	g.RootMeanSquare = math.Sqrt(g.RootMeanSquare)
	g.Correlation = stat.Correlation(f.Sample, expected, nil)
	return g
}

// normal gives the standard normal value that is not exceeded with chance p.
func normal(p float64) float64 { return distuv.UnitNormal.Quantile(p) }
