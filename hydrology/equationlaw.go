package hydrology

import "slices"

// Law is the relation of an equation at one duration, the return period put in:
//
//	i = Scale · Σ Numerator/(t + Shift)^Exponent
//
// or, where there are no terms, i = Scale · exp(Cubic[0] + Cubic[1]·ln t + Cubic[2]·ln²t + Cubic[3]·ln³t),
// with t = PerMinute · minutes. Minutes is the duration asked for, or the shortest one where that is longer.
type Law struct {
	Terms     []Term
	Cubic     [4]float64
	Scale     float64
	PerMinute float64
	Minutes   float64
}

// Law gives the relation that holds at a duration in minutes, for those who write it out. Not ok beyond the longest.
func (s EquationStorm) Law(minutes float64) (Law, bool) {
	if len(s.pieces) == 0 {
		return Law{}, false
	}
	minutes = max(minutes, s.pieces[0].first)
	k := slices.IndexFunc(s.pieces, func(p piece) bool { return minutes <= p.last })
	if k < 0 {
		return Law{}, false
	}
	p := s.pieces[k]
	law := Law{Cubic: p.cubic, Scale: p.scale, PerMinute: p.perMinute, Minutes: minutes}
	for _, term := range p.terms {
		law.Terms = append(law.Terms, Term{Numerator: term.numerator, Shift: term.shift, Exponent: term.exponent})
	}
	return law, true
}
