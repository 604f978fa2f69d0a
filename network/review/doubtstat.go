package review

import (
	"math"
	"sort"

	"gonum.org/v1/gonum/stat"

	"rimfall/network"
)

// Quantiles are the values that one run in twenty, one in two and nineteen in twenty do not exceed. Where OK is false
// there was nothing to count.
type Quantiles struct {
	P05, P50, P95 float64
	OK            bool
}

// quantiles sorts a copy. Between two runs a quantile lies on a straight line: of values x1 … xn in order the quantile of
// a part f is at the place 1 + f·(n − 1) (definition 7 of Hyndman and Fan, The American Statistician 50, 1996).
func quantiles(all []float64) Quantiles {
	if len(all) == 0 {
		return Quantiles{}
	}
	sorted := append([]float64(nil), all...)
	sort.Float64s(sorted)
	return Quantiles{quantile(sorted, 0.05), quantile(sorted, 0.50), quantile(sorted, 0.95), true}
}

func quantile(sorted []float64, part float64) float64 {
	place := part * float64(len(sorted)-1)
	k := min(int(place), len(sorted)-1)
	if k+1 == len(sorted) {
		return sorted[k]
	}
	return sorted[k] + (place-float64(k))*(sorted[k+1]-sorted[k])
}

// ranks gives each value its place in order, from 1; equal values share the mean of their places.
func ranks(all []float64) []float64 {
	order := make([]int, len(all))
	for i := range order {
		order[i] = i
	}
	sort.Slice(order, func(a, b int) bool { return all[order[a]] < all[order[b]] })
	ranked := make([]float64, len(all))
	for from := 0; from < len(order); {
		to := from + 1
		for to < len(order) && all[order[to]] == all[order[from]] {
			to++
		}
		for _, i := range order[from:to] {
			ranked[i] = float64(from+to+1) / 2
		}
		from = to
	}
	return ranked
}

// correlation is Spearman's: the correlation of two lists of ranks (Spearman, American Journal of Psychology 15, 1904).
// There is none where either list never changes.
func correlation(a, b []float64) network.Maybe {
	r := stat.Correlation(a, b, nil)
	if math.IsNaN(r) {
		return network.Maybe{}
	}
	return network.Some(r)
}
