package fit

import (
	"errors"
	"math"

	"rimfall/hydrology"
)

func logs(x []float64) []float64 {
	l := make([]float64, len(x))
	for k, v := range x {
		l[k] = math.Log(v)
	}
	return l
}

// powerLaw: ln i = ln a − e·ln t.
func powerLaw(p points) (hydrology.Constants, error) {
	return shifted(p, 0)
}

// shifted fits a/(t + d)^e with the shift given: ln i = ln a − e·ln(t + d).
func shifted(p points, d float64) (hydrology.Constants, error) {
	x, _, err := leastSquares(shiftedRows(p.t, d), logs(p.i))
	if err != nil {
		return hydrology.Constants{}, err
	}
	return one(hydrology.Term{Numerator: math.Exp(x[0]), Shift: d, Exponent: -x[1]}), nil
}

func shiftedRows(t []float64, d float64) [][]float64 {
	var rows [][]float64
	for _, minutes := range t {
		rows = append(rows, []float64{1, math.Log(minutes + d)})
	}
	return rows
}

func one(term hydrology.Term) hydrology.Constants {
	return hydrology.Constants{Terms: []hydrology.Term{term}}
}

// shiftedInverse: 1/i = t/a + d/a, a straight line.
func shiftedInverse(p points) (hydrology.Constants, error) {
	var rows [][]float64
	var right []float64
	for k, minutes := range p.t {
		rows = append(rows, []float64{minutes, 1})
		right = append(right, 1/p.i[k])
	}
	x, _, err := leastSquares(rows, right)
	if err != nil {
		return hydrology.Constants{}, err
	}
	if !(x[0] > 0) {
		return hydrology.Constants{}, errors.New("1/i does not rise with duration")
	}
	return one(hydrology.Term{Numerator: 1 / x[0], Shift: x[1] / x[0], Exponent: 1}), nil
}

// shiftedPower: for each shift the rest is a straight line; the shift is searched.
func shiftedPower(p points) (hydrology.Constants, error) {
	right := logs(p.i)
	d := bestShift(p.t, func(d float64) float64 {
		_, left, err := leastSquares(shiftedRows(p.t, d), right)
		return leftOr(left, err)
	})
	return shifted(p, d)
}

// periodPower: ln i = ln a + m·ln T − e·ln(t + d) over the whole table; the shift is searched.
func periodPower(t hydrology.Table) (hydrology.Constants, error) {
	var right []float64
	for _, row := range t.Values {
		right = append(right, logs(row)...)
	}
	rows := func(d float64) [][]float64 {
		var rows [][]float64
		for _, minutes := range t.Durations {
			for _, period := range t.Periods {
				rows = append(rows, []float64{1, math.Log(period), math.Log(minutes + d)})
			}
		}
		return rows
	}
	d := bestShift(t.Durations, func(d float64) float64 {
		_, left, err := leastSquares(rows(d), right)
		return leftOr(left, err)
	})
	x, _, err := leastSquares(rows(d), right)
	if err != nil {
		return hydrology.Constants{}, err
	}
	return one(hydrology.Term{Numerator: math.Exp(x[0]), PeriodExponent: x[1], Shift: d, Exponent: -x[2]}), nil
}

// cubicLog: ln i against 1, ln t, ln²t, ln³t.
func cubicLog(p points) (hydrology.Constants, error) {
	var rows [][]float64
	for _, x := range logs(p.t) {
		rows = append(rows, []float64{1, x, x * x, x * x * x})
	}
	x, _, err := leastSquares(rows, logs(p.i))
	if err != nil {
		return hydrology.Constants{}, err
	}
	return hydrology.Constants{Cubic: [4]float64(x)}, nil
}

func leftOr(left float64, err error) float64 {
	if err != nil {
		return math.Inf(1)
	}
	return left
}

// The search for a shift: first shiftGrid places from −0.9 of the first duration to ten times the last, evenly in
// ln(t₁ + d); then golden section around the best, shiftRounds times, each leaving 0.618 of the stretch: to 10⁻¹² of
// it, which is more than a flat minimum in 64 bits can tell (some 10⁻⁸).
const (
	shiftGrid   = 80
	shiftRounds = 58
	golden      = 0.6180339887498949
)

// bestShift gives the shift with the least squares left.
func bestShift(t []float64, left func(d float64) float64) float64 {
	first, last := t[0], t[len(t)-1]
	low, high := math.Log(0.1*first), math.Log(first+10*last)
	at := func(u float64) float64 { return left(math.Exp(u) - first) }
	best, least := low, math.Inf(1)
	step := (high - low) / shiftGrid
	for k := range shiftGrid + 1 {
		u := low + float64(k)*step
		if here := at(u); here < least {
			best, least = u, here
		}
	}
	a, b := max(low, best-step), min(high, best+step)
	for range shiftRounds {
		u, v := b-golden*(b-a), a+golden*(b-a)
		if at(u) < at(v) {
			b = v
		} else {
			a = u
		}
	}
	return math.Exp((a+b)/2) - first
}
