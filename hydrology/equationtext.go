package hydrology

import (
	"strconv"
	"strings"
)

// String writes the constants as the equation that they make, with i, t and T: i = 762/(t + 10).
func (c Constants) String() string {
	if len(c.Terms) == 0 {
		return "ln i = " + decimal(c.Cubic[0]) + signed(c.Cubic[1]) + "·ln t" + signed(c.Cubic[2]) + "·ln²t" + signed(c.Cubic[3]) + "·ln³t"
	}
	var terms []string
	for _, term := range c.Terms {
		terms = append(terms, term.String())
	}
	return "i = " + strings.Join(terms, " + ")
}

// String writes a term: 2001·(1 + 0.811·lg T)/(t + 8)^0.711. What drops out is not written.
func (term Term) String() string {
	text := decimal(term.Numerator)
	if term.PeriodExponent != 0 {
		text += "·T^" + decimal(term.PeriodExponent)
	}
	if term.PeriodLogarithm != 0 {
		text += "·(1" + signed(term.PeriodLogarithm) + "·lg T)"
	}
	if term.GumbelOffset != 0 || term.GumbelFactor != 0 {
		text += "·(" + decimal(term.GumbelOffset) + signed(term.GumbelFactor) + "·ln ln(T/(T−1)))"
	}
	if term.Exponent == 0 {
		return text
	}
	text += "/" + shifted(term.Shift)
	if term.Exponent != 1 {
		text += "^" + decimal(term.Exponent)
	}
	return text
}

func shifted(shift float64) string {
	if shift == 0 {
		return "t"
	}
	return "(t" + signed(shift) + ")"
}

// decimal writes a number to six digits, with a minus sign as print has it.
func decimal(x float64) string {
	return strings.Replace(strconv.FormatFloat(x, 'g', 6, 64), "-", "−", 1)
}

// signed writes a number that is added.
func signed(x float64) string {
	if x < 0 {
		return " − " + decimal(-x)
	}
	return " + " + decimal(x)
}
