// Package fit makes rainfall tables and equations out of measurements: distributions of annual maxima, and the
// equations that engineers write rainfall in, by least squares.
//
// Annual maxima: Gumbel by the method of moments (Gumbel 1941; Environment Canada's short-duration tables) and by
// L-moments (Hosking 1990), the generalised extreme value distribution by L-moments (Hosking, Wallis and Wood
// 1985), Log-Pearson III by moments of the logarithms (US Water Resources Council, Bulletin 17B, 1982, without its
// regional skew and outlier tests). Each with confidence limits and figures of how well it fits. Trends,
// mixed populations and neighbours of the gauge are left out.
//
// Equations: i = a/t^e, a/(t + d), a/(t + d)^e, a·T^m/(t + d)^e, and the cubic in ln t, with the error of each at
// each duration.
package fit
