package hydrology

import (
	"fmt"
	"math"
	"strconv"
	"strings"
)

// Term is one term of a rainfall equation,
//
//	Numerator · T^PeriodExponent · (1 + PeriodLogarithm·lg T) · (GumbelOffset + GumbelFactor·ln ln(T/(T−1)))
//	───────────────────────────────────────────────────────────────────────────────────────────────────────
//	                                   (t + Shift)^Exponent
//
// with t the duration and T the return period in years. What is left 0 drops out: the bracket with ln ln counts
// only where one of its two numbers is given. Published forms, by what is given:
//
//	a/(t+d)         Numerator, Shift, Exponent 1
//	a/t^e           Numerator, Exponent: the power law
//	b/(t+d)^e       Numerator, Shift, Exponent
//	a·T^m/(t+d)^e   and PeriodExponent
type Term struct {
	Numerator, Shift, Exponent float64
	PeriodExponent             float64
	PeriodLogarithm            float64
	GumbelOffset, GumbelFactor float64
}

// Constants are the numbers of an equation for one return period, or for all of them where Period is 0: a sum of
// terms, or, where there are none, ln i = Cubic[0] + Cubic[1]·ln t + Cubic[2]·ln²t + Cubic[3]·ln³t.
type Constants struct {
	Period float64
	Terms  []Term
	Cubic  [4]float64
}

// Equation gives intensity by duration and return period, with the place's constants and the range that they
// were found in.
type Equation struct {
	Constants         []Constants
	Unit              IntensityUnit // what i is in
	Hours             bool          // t is in hours, not minutes
	Shortest, Longest float64       // validity, minutes; Longest 0 is: no end stated
	LeastPeriod       float64       // validity, years; 0 is: none stated
	GreatestPeriod    float64
	Source            string
}

// Storm gives the storm of a return period, with intensities in unit. The error says what is out of range, or
// lists the periods that the equation has.
func (e Equation) Storm(period float64, unit IntensityUnit) (EquationStorm, error) {
	factor, ok := e.Unit.To(unit)
	if !ok {
		return EquationStorm{}, fmt.Errorf("the equation's intensity in %q cannot be given in %q", e.Unit, unit)
	}
	constants, err := e.constantsFor(period)
	if err != nil {
		return EquationStorm{}, err
	}
	p := piece{first: e.Shortest, last: e.Longest, scale: factor, perMinute: 1, cubic: constants.Cubic}
	if e.Longest == 0 {
		p.last = math.Inf(1)
	}
	if e.Hours {
		p.perMinute = 1.0 / 60
	}
	for _, term := range constants.Terms {
		p.terms = append(p.terms, term.at(period))
	}
	if err := p.check(); err != nil {
		return EquationStorm{}, fmt.Errorf("%w for a storm of %v years", err, period)
	}
	return EquationStorm{[]piece{p}}, nil
}

func (e Equation) constantsFor(period float64) (Constants, error) {
	if period < e.LeastPeriod || e.GreatestPeriod > 0 && period > e.GreatestPeriod || !positive(period) {
		return Constants{}, fmt.Errorf("return period %v is outside the equation's range, %v to %v years",
			period, e.LeastPeriod, e.GreatestPeriod)
	}
	var known []string
	for _, c := range e.Constants {
		if c.Period == period || c.Period == 0 {
			return c, c.needs(period)
		}
		known = append(known, strconv.FormatFloat(c.Period, 'g', -1, 64))
	}
	return Constants{}, fmt.Errorf("the equation has no constants for %v years; it has them for %s", period, strings.Join(known, ", "))
}

// needs says whether a period is one that ln ln(T/(T−1)) can take.
func (c Constants) needs(period float64) error {
	for _, term := range c.Terms {
		if (term.GumbelOffset != 0 || term.GumbelFactor != 0) && period <= 1 {
			return fmt.Errorf("return period %v: an equation of annual maxima needs more than 1 year", period)
		}
	}
	return nil
}

// at puts the return period into a term, which leaves numerator, shift and exponent.
func (term Term) at(period float64) stormTerm {
	numerator := term.Numerator * math.Pow(period, term.PeriodExponent) * (1 + term.PeriodLogarithm*math.Log10(period))
	if term.GumbelOffset != 0 || term.GumbelFactor != 0 {
		numerator *= term.GumbelOffset + term.GumbelFactor*math.Log(-math.Log1p(-1/period))
	}
	return stormTerm{numerator, term.Shift, term.Exponent}
}

// Table reads an equation at durations (minutes, rising) and return periods, in unit. The error says what is out of
// the equation's range.
func (e Equation) Table(durations, periods []float64, unit IntensityUnit) (Table, error) {
	values := make([][]float64, len(durations))
	for _, period := range periods {
		storm, err := e.Storm(period, unit)
		if err != nil {
			return Table{}, err
		}
		for row, minutes := range durations {
			i, where := storm.At(minutes)
			if where != Within {
				return Table{}, fmt.Errorf("%v min is %s of the equation", minutes, where)
			}
			values[row] = append(values[row], i)
		}
	}
	return NewTable(durations, periods, values)
}
