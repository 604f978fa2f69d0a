package fit

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/mathext"
	"gonum.org/v1/gonum/stat"
)

// LogPearson3 is the Pearson III distribution of decimal logarithms: their mean, standard deviation and skew.
type LogPearson3 struct{ Mean, Deviation, Skew float64 }

// logPearson3 takes the moments of the logarithms, with n − 1 in the deviation and the station's own skew
// n·Σ(x − mean)³/((n − 1)(n − 2)s³). US Water Resources Council, Bulletin 17B (1982), eqs. 2 to 4.
func logPearson3(sample []float64) (LogPearson3, error) {
	logs := make([]float64, len(sample))
	for k, x := range sample {
		if !(x > 0) {
			return LogPearson3{}, fmt.Errorf("a maximum is %v; Log-Pearson III wants them greater than 0", x)
		}
		logs[k] = math.Log10(x)
	}
	mean, s := stat.MeanStdDev(logs, nil)
	return LogPearson3{mean, s, stat.Skew(logs, nil)}, nil
}

// Quantile is 10^(mean + K·s).
func (d LogPearson3) Quantile(p float64) float64 {
	return math.Pow(10, d.Mean+Pearson3Factor(d.Skew, p)*d.Deviation)
}

// Below inverts Quantile.
func (d LogPearson3) Below(x float64) float64 {
	if !(x > 0) {
		return 0
	}
	z := (math.Log10(x) - d.Mean) / d.Deviation
	if math.Abs(d.Skew) < smallSkew {
		return d.belowNearNormal(z)
	}
	shape := 4 / (d.Skew * d.Skew)
	y := shape + z*2/d.Skew
	switch {
	case y <= 0 && d.Skew > 0:
		return 0
	case y <= 0:
		return 1
	case d.Skew > 0:
		return mathext.GammaIncReg(shape, y)
	}
	return mathext.GammaIncRegComp(shape, y)
}

// belowNearNormal halves the chance whose factor is z: the series has no inverse to write down.
func (d LogPearson3) belowNearNormal(z float64) float64 {
	low, high := 0.0, 1.0
	for range 60 { // 2⁻⁶⁰ is rounding
		if middle := (low + high) / 2; Pearson3Factor(d.Skew, middle) < z {
			low = middle
		} else {
			high = middle
		}
	}
	return (low + high) / 2
}

// smallSkew: under it the incomplete gamma function of a shape over 400,000 begins to lose digits, and the series,
// whose error is of the order of (skew/6)³, or 10⁻¹⁰, has none to lose.
const smallSkew = 0.003

// Pearson3Factor is K of the Pearson III distribution: the value not exceeded with chance p where the mean is 0 and
// the deviation 1. For skew G it is (G/2)·(y − 4/G²) with y that of a gamma variate of shape 4/G².
func Pearson3Factor(skew, p float64) float64 {
	if math.Abs(skew) < smallSkew {
		// Cornish and Fisher's expansion (Abramowitz and Stegun 1964, 26.2.49) with the cumulants of the gamma
		// distribution, to the second order in k = G/6. The formula usually printed, which has (z³ − 6z)/3 in place
		// of (z³ − 7z)/4, is Wilson and Hilferty's approximation, and 10⁻⁶ off at a skew of 0.01.
		z, k := normal(p), skew/6
		return z + (z*z-1)*k + (z*z*z-7*z)*k*k/4
	}
	shape := 4 / (skew * skew)
	if skew < 0 {
		return skew / 2 * (mathext.GammaIncRegInv(shape, 1-p) - shape)
	}
	return skew / 2 * (mathext.GammaIncRegInv(shape, p) - shape)
}

// limits are the limits of a quantile, each not passed with chance (1 + confidence)/2:
// K = (K_p ± √(K_p² − ab))/a, a = 1 − z²/(2(n − 1)), b = K_p² − z²/n.
// Bulletin 17B (1982), appendix 9, from memory. Not ok with too few years for the confidence that is asked.
func (d LogPearson3) limits(n int, period, confidence float64) (lower, upper float64, ok bool) {
	kp, z := Pearson3Factor(d.Skew, 1-1/period), normal((1+confidence)/2)
	a := 1 - z*z/(2*float64(n-1))
	b := kp*kp - z*z/float64(n)
	root := math.Sqrt(kp*kp - a*b)
	if !(a > 0) || math.IsNaN(root) {
		return 0, 0, false
	}
	return math.Pow(10, d.Mean+(kp-root)/a*d.Deviation), math.Pow(10, d.Mean+(kp+root)/a*d.Deviation), true
}
