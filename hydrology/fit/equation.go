package fit

import (
	"errors"
	"fmt"
	"math"

	"gonum.org/v1/gonum/mat"

	"rimfall/hydrology"
)

// Form is an equation that rainfall is written in.
type Form int8

// The forms; i is the intensity, t the duration in minutes, T the return period in years.
const (
	PowerLaw       Form = iota // i = a/t^e, each period by itself
	ShiftedInverse             // i = a/(t + d), each period by itself
	ShiftedPower               // i = b/(t + d)^e, each period by itself
	PeriodPower                // i = a·T^m/(t + d)^e, all periods together
	CubicLog                   // ln i = a + b·ln t + c·ln²t + d·ln³t, each period by itself
)

// Forms lists them all.
func Forms() []Form { return []Form{PowerLaw, ShiftedInverse, ShiftedPower, PeriodPower, CubicLog} }

// String writes the form.
func (f Form) String() string {
	return [...]string{
		"i = a/t^e", "i = a/(t + d)", "i = b/(t + d)^e", "i = a·T^m/(t + d)^e", "ln i = a + b·ln t + c·ln²t + d·ln³t",
	}[f]
}

// Result is an equation fitted to a table.
type Result struct {
	Form     Form
	Equation hydrology.Equation
	// Errors[row][column] is the equation over the table, less 1.
	Errors [][]float64
	// RootMeanSquare and Largest are of those errors; Largest without its sign.
	RootMeanSquare, Largest float64
}

// Equation fits a form to a table by least squares of ln i, which weighs errors as shares of the intensity;
// a/(t + d) by a straight line of 1/i against t, as it is fitted on paper. The equation holds from the table's first
// duration to its last. The error says what the table lacks: 2 durations (power law, shifted inverse), 3, or 4
// (cubic), two periods for T^m.
func Equation(t hydrology.Table, unit hydrology.IntensityUnit, f Form) (Result, error) {
	wanted := [...]int{2, 2, 3, 3, 4}[f]
	if len(t.Durations) < wanted {
		return Result{}, fmt.Errorf("%s: %d durations; %d are wanted", f, len(t.Durations), wanted)
	}
	if f == PeriodPower && len(t.Periods) < 2 {
		return Result{}, fmt.Errorf("%s: the table has one return period; two are wanted", f)
	}
	constants, err := constantsOf(t, f)
	if err != nil {
		return Result{}, fmt.Errorf("%s: %w", f, err)
	}
	e := hydrology.Equation{
		Constants: constants, Unit: unit, Source: "least squares on the table",
		Shortest: t.Durations[0], Longest: t.Durations[len(t.Durations)-1],
	}
	if f == PeriodPower {
		e.LeastPeriod, e.GreatestPeriod = t.Periods[0], t.Periods[len(t.Periods)-1]
	}
	return judge(Result{Form: f, Equation: e}, t)
}

func constantsOf(t hydrology.Table, f Form) ([]hydrology.Constants, error) {
	if f == PeriodPower {
		c, err := periodPower(t)
		return []hydrology.Constants{c}, err
	}
	fits := [...]func(points) (hydrology.Constants, error){powerLaw, shiftedInverse, shiftedPower, nil, cubicLog}
	var all []hydrology.Constants
	var faults []error
	for column, period := range t.Periods {
		c, err := fits[f](columnOf(t, column))
		if err != nil {
			faults = append(faults, fmt.Errorf("%v years: %w", period, err))
		}
		c.Period = period
		all = append(all, c)
	}
	return all, joinErrors(faults)
}

// judge works out the errors. An equation that rises with duration within the table, or gives no intensity, is
// refused by its own check, and so is a fit of it.
func judge(r Result, t hydrology.Table) (Result, error) {
	for range t.Durations {
		r.Errors = append(r.Errors, make([]float64, len(t.Periods)))
	}
	for column, period := range t.Periods {
		storm, err := r.Equation.Storm(period, r.Equation.Unit)
		if err != nil {
			return Result{}, fmt.Errorf("%s: %w", r.Form, err)
		}
		for row, minutes := range t.Durations {
			i, _ := storm.At(minutes)
			e := i/t.Values[row][column] - 1
			r.Errors[row][column] = e
			r.RootMeanSquare += e * e / float64(len(t.Durations)*len(t.Periods))
			r.Largest = max(r.Largest, math.Abs(e))
		}
	}
	r.RootMeanSquare = math.Sqrt(r.RootMeanSquare)
	return r, nil
}

// points are durations and intensities of one storm.
type points struct{ t, i []float64 }

func columnOf(t hydrology.Table, column int) points {
	p := points{t: t.Durations}
	for _, row := range t.Values {
		p.i = append(p.i, row[column])
	}
	return p
}

// leastSquares solves rows·x ≈ right by QR, and gives the sum of the squares that are left.
func leastSquares(rows [][]float64, right []float64) (x []float64, left float64, err error) {
	a := mat.NewDense(len(rows), len(rows[0]), nil)
	for k, row := range rows {
		a.SetRow(k, row)
	}
	b, v := mat.NewVecDense(len(right), right), new(mat.VecDense)
	// A Condition error only warns of lost digits; what is left of the squares tells whether they mattered.
	var condition mat.Condition
	if err := v.SolveVec(a, b); err != nil && !errors.As(err, &condition) {
		return nil, 0, err
	}
	residual := new(mat.VecDense)
	residual.MulVec(a, v)
	residual.SubVec(residual, b)
	return v.RawVector().Data, mat.Dot(residual, residual), nil
}

func joinErrors(faults []error) error { return errors.Join(faults...) }
