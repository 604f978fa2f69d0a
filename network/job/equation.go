package job

import (
	"fmt"
	"maps"
	"math"
	"regexp"
	"slices"
	"strings"

	"rimfall/hydrology"
	"rimfall/network/fault"
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

// readEquations reads the equations of [storm.equation] or [[storm.equation]], in the order of the file.
func (r *reader) readEquations(d document, s *Settings) {
	var blocks []string
	for _, key := range d.keys {
		m := equationKey.FindStringSubmatch(key)
		switch {
		case !isEquation(key):
		case m == nil:
			d.fault(&r.faults, key, "unknown setting %q: an equation has its settings under [storm.equation], and those of several terms under [[storm.equation.term]]", key)
		case !slices.Contains(blocks, m[1]):
			blocks = append(blocks, m[1])
		}
	}
	for _, block := range blocks {
		before := len(r.faults)
		e := r.readEquation(d, block, s)
		if len(r.faults) == before {
			s.Rain.Equations = append(s.Rain.Equations, e)
		}
	}
}

// isEquation tells the keys of equations from the other settings of [storm].
func isEquation(key string) bool {
	return strings.HasPrefix(key, "storm.equation.") || strings.HasPrefix(key, "storm.equation[") || key == "storm.equation"
}

// readEquation reads one equation, whose keys begin with block.
func (r *reader) readEquation(d document, block string, s *Settings) equation {
	before := len(r.faults)
	e := equation{key: block, Equation: hydrology.Equation{Unit: hydrology.IntensityUnit(s.Units.Intensity), Constants: []hydrology.Constants{{}}}}
	terms := map[string]*hydrology.Term{}
	var order []string // prefixes of the terms, as they come
	for _, key := range d.keys {
		m := equationKey.FindStringSubmatch(key)
		if m == nil || m[1] != block {
			continue
		}
		if set, ok := termNumbers[m[3]]; ok {
			if terms[m[2]] == nil {
				terms[m[2]] = &hydrology.Term{}
				order = append(order, m[2])
			}
			r.equationNumber(d, key, func(v float64) { set(terms[m[2]], v) })
			continue
		}
		if m[2] != "" {
			d.fault(&r.faults, key, "unknown setting %q of a term: %s", m[3], fault.Suggest(m[3], slices.Collect(maps.Keys(termNumbers))))
			continue
		}
		r.equationSetting(d, key, m[3], &e)
	}
	r.applyForm(d, block, &e, terms, &order)
	for _, prefix := range order {
		e.Constants[0].Terms = append(e.Constants[0].Terms, *terms[prefix])
	}
	if len(r.faults) == before {
		r.judgeEquation(d, block, &e)
	}
	if e.Shortest == 0 && endless(e.Constants[0]) {
		e.Shortest = s.Storm.MinimumTime // no time is under it
	}
	return e
}

// endless tells equations that have no intensity at 0 min.
func endless(c hydrology.Constants) bool {
	return len(c.Terms) == 0 || slices.ContainsFunc(c.Terms, func(t hydrology.Term) bool { return t.Shift <= 0 })
}

// equationSetting reads a setting of an equation that belongs to no term.
func (r *reader) equationSetting(d document, key, name string, e *equation) {
	if set, ok := equationNumbers[name]; ok {
		r.equationNumber(d, key, func(v float64) { set(e, v) })
		return
	}
	switch name {
	case "intensity_unit":
		unit, ok := hydrology.ParseIntensityUnit(r.text(d, key))
		if !ok {
			d.fault(&r.faults, key, "intensity_unit = %v: write one of \"in/h\", \"mm/h\", \"mm/min\", \"cm/h\", \"L/s/ha\"", d.values[key])
		}
		e.Unit = unit
	case "time_unit":
		switch text := r.text(d, key); text {
		case "min":
		case "h":
			e.Hours = true
		default:
			d.fault(&r.faults, key, "time_unit = %v: write \"min\" or \"h\"", d.values[key])
		}
	case "source":
		e.source = r.text(d, key)
	case "place":
		e.place = r.text(d, key)
	case "cubic":
		r.cubic(d, key, e)
	case "form", "term": // judged with the terms
	default:
		known := slices.Concat(slices.Collect(maps.Keys(termNumbers)), slices.Collect(maps.Keys(equationNumbers)), equationTexts)
		if !strings.HasPrefix(name, "x_") && !strings.HasPrefix(name, "note") {
			d.fault(&r.faults, key, "unknown setting %q: %s", key, fault.Suggest(name, known))
		}
	}
}

// equationNumber reads a finite number.
func (r *reader) equationNumber(d document, key string, set func(v float64)) {
	v, ok := asNumber(d.values[key])
	if !ok || math.IsNaN(v) || math.IsInf(v, 0) {
		d.fault(&r.faults, key, "%s takes a finite number, not %s", key, kindOf(d.values[key]))
		return
	}
	set(v)
}

// cubic reads the four constants of ln i = c0 + c1·ln t + c2·ln²t + c3·ln³t.
func (r *reader) cubic(d document, key string, e *equation) {
	list, _ := d.values[key].([]any)
	if len(list) != 4 {
		d.fault(&r.faults, key, "cubic takes four numbers, those of ln i = c0 + c1·ln t + c2·ln²t + c3·ln³t")
		return
	}
	for i, v := range list {
		x, ok := asNumber(v)
		if !ok || math.IsNaN(x) || math.IsInf(x, 0) {
			d.fault(&r.faults, key, "cubic takes four finite numbers, not %s", kindOf(v))
			return
		}
		e.Constants[0].Cubic[i] = x
	}
}

// applyForm holds the settings against the form that is named, and fills in what the form fixes.
func (r *reader) applyForm(d document, block string, e *equation, terms map[string]*hydrology.Term, order *[]string) {
	key := block + ".form"
	if _, named := d.values[key]; !named {
		return
	}
	name := strings.ToLower(r.text(d, key))
	form, ok := equationForms[name]
	if !ok {
		d.fault(&r.faults, key, "unknown form %q: %s", name, fault.Suggest(name, slices.Collect(maps.Keys(equationForms))))
		return
	}
	for _, need := range form.needs {
		if _, given := d.values[block+"."+need]; !given {
			d.fault(&r.faults, key, "form %q needs %s", name, need)
		}
	}
	for setting := range termNumbers {
		_, given := d.values[block+"."+setting]
		_, fixed := form.fixed[setting]
		if given && (fixed || !slices.Contains(form.needs, setting)) {
			d.fault(&r.faults, block+"."+setting, "form %q takes no %s; leave out the form, or the setting", name, setting)
		}
	}
	if term := terms[""]; term != nil {
		for setting, v := range form.fixed {
			termNumbers[setting](term, v)
		}
	}
}

// judgeEquation finds what an equation lacks.
func (r *reader) judgeEquation(d document, block string, e *equation) {
	c := &e.Constants[0]
	cubic := c.Cubic != [4]float64{}
	where := block
	for _, k := range d.keys { // the first setting, to have a place
		if strings.HasPrefix(k, block+".") {
			where = k
			break
		}
	}
	switch {
	case !cubic && len(c.Terms) == 0:
		d.fault(&r.faults, where, "the equation has no constants: write numerator and exponent, or cubic")
	case cubic && len(c.Terms) > 0:
		d.fault(&r.faults, where, "the equation has both cubic and a numerator or exponent: write one of the two")
	}
	for _, t := range c.Terms {
		if t.Numerator == 0 || t.Exponent == 0 {
			d.fault(&r.faults, where, "a term of the equation has no numerator or no exponent, or it is 0: an intensity falls as numerator/(t + shift)^exponent")
		}
	}
	if e.Longest != 0 && e.Longest <= e.Shortest || e.Shortest < 0 {
		d.fault(&r.faults, where, "the equation holds from shortest = %g to longest = %g min, which is no range", e.Shortest, e.Longest)
	}
	if e.GreatestPeriod != 0 && e.GreatestPeriod < e.LeastPeriod || e.LeastPeriod < 0 || c.Period < 0 {
		d.fault(&r.faults, where, "the equation holds from least_period = %g to greatest_period = %g years, which is no range", e.LeastPeriod, e.GreatestPeriod)
	}
}

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
