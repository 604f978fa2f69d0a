package hydrology

import (
	"cmp"
	"errors"
	"fmt"
	"math"
	"slices"
)

// EquationStorm is one storm of an equation, or of several that follow each other in duration. It implements
// Intensity: below the shortest duration of the first equation the intensity there holds, beyond the longest of
// the last there is none. The zero EquationStorm knows nothing.
//
// An equation of one term costs a logarithm and an exponential a look-up; a sum of terms costs that for each.
type EquationStorm struct {
	pieces []piece // in order of duration, each from where the one before ends
}

// piece is the relation on one range of durations. perMinute turns minutes into the equation's time, scale its
// intensity into the unit that was asked for.
type piece struct {
	first, last      float64 // minutes
	scale, perMinute float64
	terms            []stormTerm
	cubic            [4]float64 // where there are no terms
}

// stormTerm is numerator/(t + shift)^exponent.
type stormTerm struct{ numerator, shift, exponent float64 }

// At gives the intensity at a duration in minutes.
func (s EquationStorm) At(minutes float64) (intensity float64, where Range) {
	for k := range s.pieces {
		p := &s.pieces[k]
		if k == 0 && minutes < p.first {
			return p.intensity(p.first), Below
		}
		if minutes <= p.last {
			return p.intensity(minutes), Within
		}
	}
	return 0, Beyond
}

func (p *piece) intensity(minutes float64) float64 {
	t := minutes * p.perMinute
	if len(p.terms) == 0 {
		x := math.Log(t)
		return p.scale * math.Exp(p.cubic[0]+x*(p.cubic[1]+x*(p.cubic[2]+x*p.cubic[3])))
	}
	sum := 0.0
	for _, term := range p.terms {
		sum += term.numerator * math.Exp(-term.exponent*math.Log(t+term.shift))
	}
	return p.scale * sum
}

// Exponent is by how many per cent intensity falls where duration grows by one per cent: −d ln i/d ln t. It is 0
// below the shortest duration; not ok beyond the longest.
func (s EquationStorm) Exponent(minutes float64) (exponent float64, ok bool) {
	for k := range s.pieces {
		if k == 0 && minutes < s.pieces[k].first {
			return 0, true
		}
		if minutes <= s.pieces[k].last {
			return s.pieces[k].exponent(minutes), true
		}
	}
	return 0, false
}

func (p *piece) exponent(minutes float64) float64 {
	t := minutes * p.perMinute
	if len(p.terms) == 0 {
		x := math.Log(t)
		return -(p.cubic[1] + x*(2*p.cubic[2]+x*3*p.cubic[3]))
	}
	sum, falling := 0.0, 0.0
	for _, term := range p.terms {
		i := term.numerator * math.Pow(t+term.shift, -term.exponent)
		sum += i
		falling += i * term.exponent * t / (t + term.shift)
	}
	return falling / sum
}

// Durations gives the ends of the ranges in minutes, where the relation changes. A range without an end has none.
func (s EquationStorm) Durations() []float64 {
	var ends []float64
	for _, p := range s.pieces {
		ends = append(ends, p.first, p.last)
	}
	ends = slices.DeleteFunc(ends, func(m float64) bool { return math.IsInf(m, 1) })
	return slices.Compact(ends)
}

// checkPoints: where the relation is looked at for a rise, evenly in ln t. A cubic has two turns at most, and a
// sum of powers changes slowly in ln t, so that 200 points leave no turn of any size between them.
const checkPoints = 200

// endless stands for the end of a range without one when the relation is checked: a year, in minutes.
const endless = 366 * 1440

// check says whether the piece is an intensity: positive, finite, and never rising, over its whole range.
func (p *piece) check() error {
	last := min(p.last, max(endless, 2*p.first))
	if !(p.first >= 0) || !(last > p.first) {
		return fmt.Errorf("the equation holds from %v to %v min, which is no range", p.first, p.last)
	}
	first := p.first
	if first == 0 {
		first = 1e-3 // and 0 itself, next
		if i := p.intensity(0); !positive(i) {
			return errors.New("the equation has no intensity at 0 min; its shortest duration is wanted")
		}
	}
	before := math.Inf(1)
	for k := range checkPoints + 1 {
		t := min(last, first*math.Pow(last/first, float64(k)/checkPoints))
		i := p.intensity(t)
		if !positive(i) {
			return fmt.Errorf("the equation gives %.4g at %.4g min", i, t)
		}
		if i > before*(1+1e-12) { // above rounding
			return fmt.Errorf("the equation rises with duration, near %.4g min", t)
		}
		before = i
	}
	return nil
}

// jointStep: by how much published neighbours may differ where they meet, before it is called a fault.
// The Ministry of Health's two (1930) meet exactly; constants rounded to three digits may miss by 1 %.
const jointStep = 0.01

// Join puts storms of equations end to end, in any order. It is an error where their ranges leave a gap or
// overlap, and where the intensity steps at a joint by over 1 %, or would rise there.
func Join(storms ...EquationStorm) (EquationStorm, error) {
	var joined EquationStorm
	for _, s := range storms {
		joined.pieces = append(joined.pieces, s.pieces...)
	}
	slices.SortStableFunc(joined.pieces, func(a, b piece) int { return cmp.Compare(a.first, b.first) })
	for k := 1; k < len(joined.pieces); k++ {
		before, after := &joined.pieces[k-1], &joined.pieces[k]
		if before.last != after.first {
			return EquationStorm{}, fmt.Errorf("an equation ends at %v min and the next starts at %v min", before.last, after.first)
		}
		ends, starts := before.intensity(before.last), after.intensity(after.first)
		if starts < ends*(1-jointStep) || starts > ends*(1+1e-9) { // a rise above rounding
			return EquationStorm{}, fmt.Errorf("at %v min one equation ends at %.4g and the next starts at %.4g", after.first, ends, starts)
		}
	}
	return joined, nil
}
