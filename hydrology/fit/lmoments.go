package fit

// LMoments are the first three: mean, scale, and the third, which over L2 is the L-skewness.
type LMoments struct{ L1, L2, L3 float64 }

// LMomentsOf takes the unbiased estimates from a rising sample of at least three: with probability-weighted moments
// b_r = (1/n)·Σ x_j·C(j−1, r)/C(n−1, r), λ₁ = b₀, λ₂ = 2b₁ − b₀, λ₃ = 6b₂ − 6b₁ + b₀.
// J. R. M. Hosking, Journal of the Royal Statistical Society B 52, 1990.
func LMomentsOf(rising []float64) LMoments {
	n := float64(len(rising))
	var b0, b1, b2 float64
	for k, x := range rising {
		j := float64(k)
		b0 += x / n
		b1 += x / n * j / (n - 1)
		b2 += x / n * j * (j - 1) / ((n - 1) * (n - 2))
	}
	return LMoments{b0, 2*b1 - b0, 6*b2 - 6*b1 + b0}
}
