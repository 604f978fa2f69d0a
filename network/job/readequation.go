package job

import (
	"maps"
	"math"
	"slices"
	"strings"

	"rimfall/hydrology"
	"rimfall/network/fault"
)

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
