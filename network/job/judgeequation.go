package job

import (
	"maps"
	"slices"
	"strings"

	"rimfall/hydrology"
	"rimfall/network/fault"
)

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
