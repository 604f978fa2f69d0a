package calculator

import (
	"fmt"
	"math"
)

// Part is one heading of the working.
type Part struct {
	Title string
	Steps []Step
}

// Step is one line of the working: symbol = formula = numbers = result.
type Step struct {
	Name    string // in words
	Symbol  string
	Formula string // blank where the value is given
	Numbers string // the formula with the numbers in it; blank where there is no closed form
	Solved  bool   // the formula is an equation that the symbol solves, Numbers its right side
	Result  string // with its unit
}

// sheet gathers the working.
type sheet struct {
	*Answer
	parts []Part
}

// work writes the working in the order of a hand calculation.
func (a *Answer) work() {
	s := &sheet{Answer: a}
	s.given()
	s.sizeFound()
	s.part("Section")
	s.depthFound(&a.First)
	s.section(&a.First)
	s.part("Uniform flow")
	s.uniformFlow(&a.First)
	s.part("Critical state")
	s.criticalState(&a.First)
	if a.Second != nil {
		s.part("At the second depth")
		s.secondDepth(a.Second)
	}
	a.Working = s.parts
}

func (s *sheet) part(title string) { s.parts = append(s.parts, Part{Title: title}) }

// step adds a computed line.
func (s *sheet) step(name, symbol, formula, numbers string, m Measure, v float64) {
	s.put(Step{Name: name, Symbol: symbol, Formula: formula, Numbers: numbers, Result: s.say(m, v)})
}

func (s *sheet) put(step Step) {
	last := &s.parts[len(s.parts)-1]
	last.Steps = append(last.Steps, step)
}

// given lists what was given, in the units of the working.
func (s *sheet) given() {
	s.part("Given")
	s.givenSection()
	n := func(symbol, name string, m Measure, given bool, v float64) {
		if given {
			s.put(Step{Name: name, Symbol: symbol, Result: withUnit(short(v), m.Unit(s.Units))})
		}
	}
	q := &s.Question
	n("n", s.roughnessName(), Roughness, q.N.OK, q.N.V)
	n("S", "slope", Gradient, q.Slope.OK, q.Slope.V)
	s.givenDepth()
	n("Q", "flow", Discharge, q.Flow.OK, q.Flow.V)
	n("V", "velocity", Speed, q.Velocity.OK, q.Velocity.V)
	n("k", "Manning's unit constant", Plain, true, s.Units.ManningFactor)
	s.put(Step{Name: "gravity", Symbol: "g", Result: figure(s.Units.Gravity) + " " + s.Units.Length + "/s²"})
}

func (s *sheet) roughnessName() string {
	switch {
	case s.VaryingN:
		return "roughness, running full"
	case s.Question.Conduit.roughSomewhere():
		return "roughness where the line gives none"
	}
	return "roughness"
}

func (s *sheet) givenDepth() {
	d := s.Question.Depth
	switch {
	case !d.OK:
	case s.fullDepth:
		s.put(Step{Name: "depth", Symbol: "y", Result: "full, as none is given"})
	case d == Full || d.OfRise && d.V == 1:
		s.put(Step{Name: "depth", Symbol: "y", Result: "full"})
	case d.OfRise:
		s.put(Step{Name: "depth", Symbol: "y", Result: short(d.V) + " of the rise"})
	default:
		s.put(Step{Name: "depth", Symbol: "y", Result: withUnit(short(d.V), s.Units.Length)})
	}
}

func withUnit(text, unit string) string {
	if unit == "" {
		return text
	}
	return text + " " + unit
}

// manningFormula is what is solved for a depth or a width.
const manningFormula = "(k/n) A R^(2/3) √S = Q"

// sizeFound is the exact size and the listed one, or the width that was found.
func (s *sheet) sizeFound() {
	switch s.Asked {
	case Size:
		s.part("Size")
		s.sizeSteps()
	case Bottom:
		s.part("Size")
		s.solved("bottom width", "b", manningFormula, s.flowGiven(), s.say(Length, s.Conduit.Bottom.V))
	case Side:
		s.part("Size")
		s.solved("side slope", "z", manningFormula, s.flowGiven(), figure(s.Conduit.Left.V))
	}
}

// flowGiven is the right side of Manning's equation.
func (s *sheet) flowGiven() string { return s.say(Discharge, s.Question.Flow.V) }

// solved adds a value that solves an equation.
func (s *sheet) solved(name, symbol, equation, right, result string) {
	s.put(Step{Name: name, Symbol: symbol, Formula: equation, Numbers: right, Result: result, Solved: true})
}

// depthFound is the depth, where it was asked for or follows from Q = A V.
func (s *sheet) depthFound(st *State) {
	switch {
	case s.Asked == Depth && s.Question.Flow.OK, s.Asked == Size && s.Exact.Listed && s.Question.Flow.OK:
		s.solved("normal depth", "y", manningFormula, s.flowGiven(), s.say(Length, st.Depth))
	case s.Asked == Depth:
		s.solved("depth", "y", "(k/n) R^(2/3) √S = V", s.say(Speed, s.Velocity.V), s.say(Length, st.Depth))
	case !s.Question.Depth.OK:
		area := s.Question.Flow.V / s.Velocity.V
		s.solved("depth", "y", "A = Q/V", fmt.Sprintf("%s/%s = %s", figure(s.Question.Flow.V), figure(s.Velocity.V), s.say(Area, area)), s.say(Length, st.Depth))
	case s.Question.Depth.OfRise && s.Question.Depth.V == 1:
		s.step("depth", "y", s.riseSymbol(), "", Length, st.Depth)
	case s.Question.Depth.OfRise:
		s.step("depth", "y", "(y/"+s.riseSymbol()+") "+s.riseSymbol(), figure(s.Question.Depth.V)+" × "+figure(s.Section.Rise()), Length, st.Depth)
	}
	if st.Ratio.OK {
		s.step("depth ratio", "y/"+s.riseSymbol(), "", figure(st.Depth)+"/"+figure(s.Section.Rise()), Plain, st.Ratio.V)
	}
}

// uniformFlow is Manning's equation, solved for what was asked.
func (s *sheet) uniformFlow(st *State) {
	k, n, r, root := figure(s.Units.ManningFactor), figure(st.N), figure(st.Radius), figure(s.Slope)
	if s.flow.varying != nil {
		s.step("roughness at this depth", "n", "", "", Roughness, math.Round(st.N*1e5)/1e5)
	}
	switch s.Asked {
	case Slope:
		s.step("slope", "S", "(Q n/(k A R^(2/3)))²", fmt.Sprintf("(%s × %s/(%s × %s × %s^(2/3)))²", figure(st.Flow), n, k, figure(st.Area), r), Gradient, s.Slope)
	case N:
		s.step("roughness", "n", "k A R^(2/3) √S/Q", fmt.Sprintf("%s × %s × %s^(2/3) × √%s/%s", k, figure(st.Area), r, root, figure(st.Flow)), Plain, st.N)
	}
	s.step("velocity", "V", "(k/n) R^(2/3) √S", fmt.Sprintf("(%s/%s) × %s^(2/3) × √%s", k, figure(st.N), r, figure(s.Slope)), Speed, st.Velocity)
	s.step("flow", "Q", "A V", figure(st.Area)+" × "+figure(st.Velocity), Discharge, st.Flow)
	s.fullBore(st)
	s.step("boundary shear", "τ", "γ R S", fmt.Sprintf("%s × %s × %s", figure(s.Units.UnitWeight), r, figure(s.Slope)), Stress, st.Shear)
}

// fullBore is the capacity of a pipe, the ratios to it, and the most that it carries.
func (s *sheet) fullBore(st *State) {
	if !st.FullFlow.OK {
		return
	}
	full := s.Section.At(s.Section.Rise())
	s.step("full-bore capacity", "Qfull", "(k/n) A R^(2/3) √S, full", fmt.Sprintf("(%s/%s) × %s × %s^(2/3) × √%s", figure(s.Units.ManningFactor),
		figure(s.flow.at(s.Section.Rise()).N), figure(full.Area), figure(full.HydraulicRadius()), figure(s.Slope)), Discharge, st.FullFlow.V)
	s.step("flow ratio", "Q/Qfull", "", figure(st.Flow)+"/"+figure(st.FullFlow.V), Plain, st.Flow/st.FullFlow.V)
	s.step("velocity ratio", "V/Vfull", "", figure(st.Velocity)+"/"+figure(st.FullVelocity.V), Plain, st.Velocity/st.FullVelocity.V)
	if !st.LargestFlow.OK {
		return
	}
	at := "at depth " + s.say(Length, st.LargestDepth.V)
	if st.LargestDepth.V == s.Section.Rise() {
		at = "just below the roof"
	}
	s.put(Step{Name: "largest discharge", Symbol: "Qmax", Result: s.say(Discharge, st.LargestFlow.V) + ", " + at})
}

// secondDepth is the state at the other depth in short.
func (s *sheet) secondDepth(st *State) {
	s.step("depth", "y", "", "", Length, st.Depth)
	s.step("wetted area", "A", "", "", Area, st.Area)
	s.step("hydraulic radius", "R", "", "", Length, st.Radius)
	s.step("velocity", "V", "(k/n) R^(2/3) √S", fmt.Sprintf("(%s/%s) × %s^(2/3) × √%s", figure(s.Units.ManningFactor), figure(st.N), figure(st.Radius), figure(s.Slope)), Speed, st.Velocity)
	s.step("flow", "Q", "A V", figure(st.Area)+" × "+figure(st.Velocity), Discharge, st.Flow)
	if st.Froude.OK {
		s.step("Froude number", "F", "Q/(A √(g A/T))", "", Plain, st.Froude.V)
	}
}
