package job

import (
	"fmt"
	"regexp"
	"strings"

	"rimfall/hydrology"
)

// equation is one [storm.equation] of job.toml.
type equation struct {
	hydrology.Equation
	place, source string
	key           string // where it stands, for faults
}

// equationForm names a published form by its author, and says which settings it takes.
type equationForm struct {
	needs []string
	fixed map[string]float64
}

// The forms that may be named instead of leaving settings out. A. N. Talbot 1891
// (a/(t + d)), C. W. Sherman 1931 (a/(t + d)^e), M. M. Bernard 1932 (a·T^m/t^e); the
// attributions are from memory.
var equationForms = map[string]equationForm{
	"power-law": {[]string{"numerator", "exponent"}, nil},
	"talbot":    {[]string{"numerator", "shift"}, map[string]float64{"exponent": 1}},
	"sherman":   {[]string{"numerator", "shift", "exponent"}, nil},
	"bernard":   {[]string{"numerator", "exponent", "period_exponent"}, nil},
	"cubic-log": {[]string{"cubic"}, nil},
}

// The settings of one term of an equation.
var termNumbers = map[string]func(t *hydrology.Term, v float64){
	"numerator":       func(t *hydrology.Term, v float64) { t.Numerator = v },
	"shift":           func(t *hydrology.Term, v float64) { t.Shift = v },
	"exponent":        func(t *hydrology.Term, v float64) { t.Exponent = v },
	"period_exponent": func(t *hydrology.Term, v float64) { t.PeriodExponent = v },
	"period_factor":   func(t *hydrology.Term, v float64) { t.PeriodLogarithm = v },
	"gumbel_offset":   func(t *hydrology.Term, v float64) { t.GumbelOffset = v },
	"gumbel_factor":   func(t *hydrology.Term, v float64) { t.GumbelFactor = v },
}

// The settings of an equation as a whole: its validity, min and years, and the
// return period that its constants are for.
var equationNumbers = map[string]func(e *equation, v float64){
	"shortest":        func(e *equation, v float64) { e.Shortest = v },
	"longest":         func(e *equation, v float64) { e.Longest = v },
	"least_period":    func(e *equation, v float64) { e.LeastPeriod = v },
	"greatest_period": func(e *equation, v float64) { e.GreatestPeriod = v },
	"return_period":   func(e *equation, v float64) { e.Constants[0].Period = v },
}

// The settings of an equation that are no numbers.
var equationTexts = []string{"form", "intensity_unit", "time_unit", "source", "place", "cubic", "term"}

// equationKey takes the key of a setting apart: which equation, which term, which setting.
var equationKey = regexp.MustCompile(`^(storm\.equation(?:\[\d+\])?)\.(term(?:\[\d+\])?\.)?([^.]*)$`)

// stormOf joins the equations that hold for a return period into its storm.
func stormOf(equations []equation, period float64, unit hydrology.IntensityUnit) (hydrology.EquationStorm, error) {
	var storms []hydrology.EquationStorm
	var refused []string
	for _, e := range equations {
		if c := e.Constants[0]; c.Period != 0 && c.Period != period {
			refused = append(refused, fmt.Sprintf("one is for %g years only", c.Period))
			continue
		}
		storm, err := e.Storm(period, unit)
		if err != nil {
			refused = append(refused, err.Error())
			continue
		}
		storms = append(storms, storm)
	}
	if len(storms) == 0 {
		return hydrology.EquationStorm{}, fmt.Errorf("no equation gives a storm of %g years: %s", period, strings.Join(refused, "; "))
	}
	return hydrology.Join(storms...)
}
