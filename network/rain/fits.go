package rain

import (
	"rimfall/hydrology/fit"
)

// Equation is a form fitted to the table; Why says why it cannot be.
type Equation struct {
	fit.Result
	Why string
}

// fitEquations fits every form to the table.
func (s *Source) fitEquations() {
	for _, form := range fit.Forms() {
		r, err := fit.Equation(s.Table, s.Unit, form)
		e := Equation{Result: r}
		if err != nil {
			e.Form, e.Why = form, err.Error()
		}
		s.Equations = append(s.Equations, e)
	}
}

// Worst is the error of an equation at a duration of the table, over all periods, that is
// farthest from 0.
func (e *Equation) Worst(row int) float64 {
	worst := 0.0
	for _, v := range e.Errors[row] {
		if max(v, -v) > max(worst, -worst) {
			worst = v
		}
	}
	return worst
}

// Distribution is one method fitted to the annual maxima of every duration.
type Distribution struct {
	Method fit.Method
	Rows   []DistributionRow
}

// DistributionRow is one duration: depths in inches or mm with their confidence
// limits by return period, and how well the distribution fits.
type DistributionRow struct {
	Duration float64 // min
	Years    int
	Depths   []Limited // by period
	fit.Goodness
	Why string // why it cannot be fitted
}

// Limited is a depth and the limits between which it lies with Confidence.
type Limited struct {
	Depth, Lower, Upper float64
	HasLimits           bool
}

// Confidence is that of the limits: 95 %, as Environment Canada prints them.
const Confidence = 0.95

// fitDistributions fits every method to the annual maxima, where the file has any.
func (s *Source) fitDistributions() {
	if len(s.Maxima.Durations) == 0 {
		return
	}
	for _, m := range fit.Methods() {
		d := Distribution{Method: m}
		for i := range s.Maxima.Durations {
			d.Rows = append(d.Rows, s.fitDuration(m, i))
		}
		s.Distributions = append(s.Distributions, d)
	}
}

func (s *Source) fitDuration(m fit.Method, i int) DistributionRow {
	sample := s.Maxima.Of(i)
	row := DistributionRow{Duration: s.Maxima.Durations[i], Years: len(sample)}
	f, err := fit.Fit(sample, m)
	if err != nil {
		row.Why = err.Error()
		return row
	}
	row.Goodness = f.Goodness()
	for _, period := range s.Periods {
		var l Limited
		l.Depth, _ = f.Quantile(period)
		l.Lower, l.Upper, l.HasLimits = f.Limits(period, Confidence)
		row.Depths = append(row.Depths, l)
	}
	return row
}
