package fit

import (
	"math/rand/v2"
	"slices"
)

// The parametric bootstrap draws this many samples, which gives 95 % limits to some 2 % of the interval between
// them, with a fixed seed: the same sample gives the same limits on every day and machine.
const (
	bootstrapSamples = 2000
	bootstrapSeed    = 1941 // the year of Gumbel's paper
)

// Limits are the confidence limits of the value of a return period (over 1 year): it lies between them with the
// given confidence, as far as the distribution is the right one.
//
//   - Gumbel by moments: value ± z·standard error (Kite 1977), as Environment Canada prints them;
//   - Log-Pearson III: Bulletin 17B, appendix 9;
//   - by L-moments: a parametric bootstrap, samples of the same length drawn from the fit and fitted again.
//
// Not ok for a period or a confidence out of range (0 < confidence < 1), or where the years are too few.
func (f Fitted) Limits(period, confidence float64) (lower, upper float64, ok bool) {
	value, ok := f.Quantile(period)
	if !ok || !(confidence > 0 && confidence < 1) {
		return 0, 0, false
	}
	if f.Method == GumbelMoments {
		half := normal((1+confidence)/2) * gumbelError(f.Sample, period)
		return value - half, value + half, true
	}
	if d, is := f.Distribution.(LogPearson3); is {
		return d.limits(len(f.Sample), period, confidence)
	}
	return f.bootstrap(period, confidence)
}

// bootstrap takes the limits from the spread of refitted samples. Samples that cannot be fitted are left out.
func (f Fitted) bootstrap(period, confidence float64) (lower, upper float64, ok bool) {
	source := rand.New(rand.NewPCG(bootstrapSeed, uint64(len(f.Sample))))
	sample := make([]float64, len(f.Sample))
	var values []float64
	for range bootstrapSamples {
		for k := range sample {
			// 1 − [0, 1) is never 0, and 1 only once in 2⁵³ draws, where the largest float below it serves.
			sample[k] = f.Distribution.Quantile(min(1-source.Float64(), 1-1e-16))
		}
		slices.Sort(sample)
		if d, err := distributionOf(sample, f.Method); err == nil {
			values = append(values, d.Quantile(1-1/period))
		}
	}
	if len(values) < bootstrapSamples/2 {
		return 0, 0, false
	}
	slices.Sort(values)
	at := func(p float64) float64 { return values[int(p*float64(len(values)-1)+0.5)] }
	return at((1 - confidence) / 2), at((1 + confidence) / 2), true
}
