package fit

import (
	"math"

	"gonum.org/v1/gonum/stat"
)

// eulerGamma is the Euler–Mascheroni constant; tables print 0.5772.
const eulerGamma = 0.57721566490153286

// Gumbel is the extreme value distribution of type I: F(x) = exp(−exp(−(x − Location)/Scale)).
type Gumbel struct{ Location, Scale float64 }

// Quantile inverts F.
func (g Gumbel) Quantile(p float64) float64 { return g.Location - g.Scale*math.Log(-math.Log(p)) }

// Below is F.
func (g Gumbel) Below(x float64) float64 { return math.Exp(-math.Exp(-(x - g.Location) / g.Scale)) }

// gumbelByMoments: x_T = mean + K·s with K = −(√6/π)·(0.5772 + ln ln(T/(T−1))) and s with n − 1, which is the
// distribution with scale s·√6/π. E. J. Gumbel, Annals of Mathematical Statistics 12, 1941; Environment Canada.
func gumbelByMoments(sample []float64) Gumbel {
	mean, s := stat.MeanStdDev(sample, nil)
	scale := s * math.Sqrt(6) / math.Pi
	return Gumbel{mean - eulerGamma*scale, scale}
}

// gumbelByLMoments: scale λ₂/ln 2, location λ₁ − γ·scale. J. R. M. Hosking, J. Royal Statistical Society B 52, 1990.
func gumbelByLMoments(l LMoments) Gumbel {
	scale := l.L2 / math.Ln2
	return Gumbel{l.L1 - eulerGamma*scale, scale}
}

// gumbelError is the standard error of a quantile by moments, with n years and frequency factor K:
// s/√n·√(1 + 1.1396·K + 1.1000·K²). G. W. Kite, Frequency and Risk Analyses in Hydrology, 1977.
func gumbelError(sample []float64, period float64) float64 {
	_, s := stat.MeanStdDev(sample, nil)
	k := -(math.Sqrt(6) / math.Pi) * (eulerGamma + math.Log(-math.Log1p(-1/period)))
	return s / math.Sqrt(float64(len(sample))) * math.Sqrt(1+k*(1.1396+1.1000*k))
}
