package hydrology

import (
	"fmt"
	"slices"
	"strings"
)

// Method is one formula for a time of concentration: where it comes from and what it holds for.
type Method struct {
	Kind   Kind
	Title  string
	Basin  bool // of a whole basin, not of a leg
	Source string
	Limits []Limit

	needs   []quantity
	check   func(Leg, Settings) []string
	formula func(Leg, Settings) product
}

// Limit is a range outside which a formula is not backed by its source. A bound of 0 is: none on that side.
type Limit struct {
	Quantity        string
	Least, Greatest float64 // in US units
	Source          string
	of              quantity
}

// Breach is a leg that is outside a limit, in the units that it was given in.
type Breach struct {
	Limit Limit
	Value float64
	Text  string
}

// feetPerMetre and acresPerHectare: the international foot of 0.3048 m, the acre of 43,560 ft².
const (
	feetPerMetre    = 1 / 0.3048
	acresPerHectare = 1e4 * feetPerMetre * feetPerMetre / 43560
)

// usPerSI is what one SI unit of a quantity is in US units.
func (q quantity) usPerSI() float64 {
	switch q.si {
	case "m", "m/s":
		return feetPerMetre
	case "ha":
		return acresPerHectare
	}
	return 1
}

// breaches lists the limits that a leg is outside of.
func (m Method) breaches(l Leg, s System) []Breach {
	var breaches []Breach
	for _, limit := range m.Limits {
		value := limit.of.of(l)
		if value == 0 { // not given, as the area often is
			continue
		}
		inUS := value * in(s, 1, limit.of.usPerSI())
		if inUS >= limit.Least && (limit.Greatest == 0 || inUS <= limit.Greatest*(1+1e-12)) { // rounding of the units
			continue
		}
		breaches = append(breaches, Breach{limit, value, limit.text(m.Title, value, s)})
	}
	return breaches
}

func (l Limit) text(title string, value float64, s System) string {
	scale := 1 / in(s, 1, l.of.usPerSI())
	unit := strings.TrimRight(" "+in(s, l.of.us, l.of.si), " ")
	bounds := fmt.Sprintf("at most %s%s", figure(l.Greatest*scale), unit)
	switch {
	case l.Greatest == 0:
		bounds = fmt.Sprintf("at least %s%s", figure(l.Least*scale), unit)
	case l.Least > 0:
		bounds = fmt.Sprintf("from %s to %s%s", figure(l.Least*scale), figure(l.Greatest*scale), unit)
	}
	return fmt.Sprintf("%s: the %s is %s%s; it holds for %s (%s)", title, l.Quantity, figure(value), unit, bounds, l.Source)
}

// limit makes a limit on a quantity; bounds in US units.
func limit(q quantity, least, greatest float64, source string) Limit {
	return Limit{q.name, least, greatest, source, q}
}

// Methods lists every formula, legs first.
func Methods() []Method { return slices.Clone(methods) }

func methodOf(k Kind) (Method, bool) {
	at := slices.IndexFunc(methods, func(m Method) bool { return m.Kind == k })
	if at < 0 {
		return Method{}, false
	}
	return methods[at], true
}

func kindNames() string {
	var names []string
	for _, m := range methods {
		names = append(names, string(m.Kind))
	}
	return strings.Join(names, ", ")
}

var methods = slices.Concat(legMethods, basinMethods)
