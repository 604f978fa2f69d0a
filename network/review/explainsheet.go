package review

import (
	"fmt"
	"math"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/finding"
	"rimfall/network/review/formula"
	"rimfall/network/units"
)

// sheet is a page that is being written: what has been worked out so far, by symbol, and
// the lines.
type sheet struct {
	*analysis.Result
	n      *network.Network
	storm  *network.Storm
	units  units.System
	values map[string]quantity
	title  string
	parts  []Part
}

func newSheet(r *analysis.Result, title string) *sheet {
	u := r.Job.Settings.Units
	s := &sheet{Result: r, n: r.Network, storm: &r.Design.Storm, units: u, title: title, values: map[string]quantity{}}
	s.set("π", math.Pi, "")
	return s
}

func (s *sheet) explanation(k Kind, id string) Explanation {
	return Explanation{Kind: k, ID: id, Title: s.title, Parts: s.parts}
}

func (s *sheet) part(title string) { s.parts = append(s.parts, Part{Title: title}) }

func (s *sheet) put(l Line) {
	last := &s.parts[len(s.parts)-1]
	last.Lines = append(last.Lines, l)
}

// set keeps a value without writing it.
func (s *sheet) set(symbol string, v float64, unit string) { s.values[symbol] = quantity{v, unit} }

func (s *sheet) value(symbol string) float64 { return s.values[symbol].value }

// given writes a value that stands elsewhere; source says where.
func (s *sheet) given(symbol, name string, v float64, unit, source string) {
	s.set(symbol, v, unit)
	s.put(Line{Form: Given, Name: name, Symbol: symbol, Result: formula.Number{Text: s.written(v, unit), Unit: unit}, Source: source, Value: v})
}

// written is a value as a file has it, where that is short, else with the digits of a result.
func (s *sheet) written(v float64, unit string) string {
	const short = 10 // figures
	if text := figure(v, allDigits); significant(text) <= short {
		return text
	}
	return result(v, unit == s.units.Length)
}

// computed writes a line whose result is the formula's.
func (s *sheet) computed(symbol, name, text, unit, source string) {
	f := formula.Must(text)
	s.line(symbol, name, f, s.worked(f)/worth(unit), unit, source)
}

// sum writes the sum of symbols.
func (s *sheet) sum(symbol, name string, symbols []string, unit string) {
	f := formula.Sum(symbols)
	s.line(symbol, name, f, s.worked(f)/worth(unit), unit, "")
}

// worked is the value of a formula, in coherent units.
func (s *sheet) worked(f formula.Formula) float64 {
	return f.Value(func(symbol string) float64 { return s.value(symbol) * worth(s.values[symbol].unit) })
}

// found writes a line whose result the run has found, by the same formula.
func (s *sheet) found(symbol, name, text string, v float64, unit, source string) {
	s.line(symbol, name, formula.Must(text), v, unit, source)
}

// foundOr writes a line as found where the formula gives what the run has found, else the
// value alone, and how it came about.
func (s *sheet) foundOr(symbol, name, text string, v float64, unit, source, otherwise string) {
	f := formula.Must(text)
	if math.Abs(s.worked(f)/worth(unit)-v) <= sameNumber*max(1, math.Abs(v)) {
		s.line(symbol, name, f, v, unit, source)
		return
	}
	s.given(symbol, name, v, unit, otherwise)
}

// line writes a computed line and keeps its value.
func (s *sheet) line(symbol, name string, f formula.Formula, v float64, unit, source string) {
	isLength := unit == s.units.Length
	want := result(v, isLength)
	shown := show(f, s.values, want, unit)
	s.set(symbol, v, unit)
	s.put(Line{
		Form: Computed, Name: name, Symbol: symbol, Formula: f, Source: source, Value: v, Shown: shown,
		Numbers: f.Numbers(func(symbol string) formula.Number { return shown[symbol] }), Result: formula.Number{Text: want, Unit: unit},
	})
}

// solved writes a value that solves an equation: the left side has the value of the symbol
// on the right.
func (s *sheet) solved(symbol, name, left, right string, v float64, unit, source string) {
	s.set(symbol, v, unit)
	s.put(Line{
		Form: Solved, Name: name, Symbol: symbol, Formula: formula.Must(left), Numbers: right, Source: source, Value: v,
		Result: formula.Number{Text: result(v, unit == s.units.Length), Unit: unit},
	})
}

// limit writes a value against its limit, value ≥ limit or value ≤ limit.
func (s *sheet) limit(name, symbol, relation string, limit float64, setting string, holds bool) {
	q := s.values[symbol]
	isLength := q.unit == s.units.Length
	value, bound := result(q.value, isLength), figure(limit, 10)
	if relationOf(parsed(value), relation, parsed(bound)) != holds {
		value = figure(q.value, allDigits) // nearer to the limit than the digits show
	}
	s.put(Line{
		Form: Limit, Name: name, Symbol: symbol, Numbers: value + " " + relation + " " + bound, Source: setting, Holds: holds, Value: q.value,
		Result: formula.Number{Text: bound, Unit: q.unit},
	})
}

func relationOf(value float64, relation string, limit float64) bool {
	if relation == atLeast {
		return value >= limit
	}
	return value <= limit
}

// The relations of a limit.
const (
	atLeast = "≥"
	atMost  = "≤"
)

func (s *sheet) remark(format string, args ...any) {
	s.put(Line{Form: Remark, Name: fmt.Sprintf(format, args...)})
}

// findings lists what the rules say of the subject.
func (s *sheet) findings(about func(*finding.Finding) bool) {
	s.part("Findings")
	any := false
	for i := range s.Findings {
		f := &s.Findings[i]
		if !about(f) {
			continue
		}
		any = true
		text := fmt.Sprintf("%s, %s (%s): %s", f.Rule.Severity, f.Rule.Title, f.Rule.Name, f.Message)
		if f.Accepted != "" {
			text += "; accepted departure: " + f.Accepted
		}
		s.remark("%s", text)
	}
	if !any {
		s.remark("none")
	}
}

// The sources of the formulas, by the keys of the list of references.
const (
	fromRational = "HDS-2 section 5.3"
	fromManning  = "Chow eq. 5-6"
	fromCircle   = "Chow table 2-1"
	fromCritical = "Chow eq. 4-3"
	fromShear    = "Chow section 7-4"
	fromSurface  = "gradually varied flow, Chow section 9-2"
	fromEnergy   = "Chow eq. 3-5"
	fromOutfall  = "HEC-22 section 7.1.5, from memory"
	fromBend     = "HEC-22 eq. 7-9, from memory"
	fromHole     = "HEC-22 section 7.1.6.7"
	fromHoleRead = "TxDOT ch. 10 section 8"
	fromTurn     = "HEC-22 table 7-5, from memory"
	fromJunction = "HEC-22 eq. 7-10, from memory"
	fromLogLog   = "log-log, common practice"
)
