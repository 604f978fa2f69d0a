package review

import (
	"fmt"
	"strconv"
	"strings"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/review/formula"
	"rimfall/network/sweep"
	"rimfall/network/times"
)

// areaAlone is an area by itself: C·A, its flow path, its time, and the peak that it would have alone.
func (s *sheet) areaAlone(i network.AreaIndex) {
	a := &s.n.Areas[i]
	s.part("Area and runoff coefficient")
	if s.storm.FrequencyFactor {
		s.given("C_f", "frequency factor", s.frequency(), "", "HEC-22 ch. 3, from memory")
	}
	s.areaProduct(a, "1")
	s.flowPath(i)
	s.part("Inlet time")
	s.given("t_min", "minimum time", s.storm.MinimumTime, "min", "minimum_time")
	candidates := []string{"t_min"}
	if a.Time.OK {
		s.given("t_1", "inlet time", a.Time.V, "min", s.timeSource(i))
		candidates = append(candidates, "t_1")
	} else {
		s.remark("No inlet time is given: the minimum time is taken.")
	}
	t := max(s.storm.MinimumTime, a.Time.Or(0))
	s.line("t", "time", formula.Largest(candidates), t, "min", fromRational)
	storm, ok := s.Job.Curve(s.storm.ReturnPeriod)
	if sweep.Coefficient(a.C, s.frequency()) == 0 || !ok {
		return
	}
	intensity, where := storm.At(t)
	if where == hydrology.Beyond {
		return
	}
	s.rainAt(t, intensity)
	s.part("Peak of the area alone")
	s.given("F", "factor of the Rational method", s.storm.RationalFactor, "", "rational_factor")
	s.computed("Q", "peak flow", "F × CA_1 × i", s.units.Flow, fromRational)
	s.remark("Peaks of different areas do not add: further down the sum of C × area counts, at a longer time.")
}

// walked is the flow path of an area in this storm, where it has one that is used.
func (s *sheet) walked(i network.AreaIndex) (w *times.Walked, ok bool) {
	for k := range s.Design.Paths {
		if w := &s.Design.Paths[k]; w.Path.Area == i && w.Used {
			return w, true
		}
	}
	return nil, false
}

// timeSource is where the inlet time of an area stands.
func (s *sheet) timeSource(i network.AreaIndex) string {
	if _, ok := s.walked(i); ok {
		return "flow path of area " + s.n.Areas[i].ID
	}
	return "areas"
}

// flowPath is the path of the water to the structure, step by step, and its time.
func (s *sheet) flowPath(i network.AreaIndex) {
	w, ok := s.walked(i)
	if !ok {
		return
	}
	s.part("Flow path")
	if n := len(w.Trials); n > 0 {
		last := w.Trials[n-1]
		s.remark("The intensity of sheet flow is that at the time of the whole path, %s min, found in %d trials.", result(last.Minutes, false), n)
	}
	var symbols []string
	for k := range w.Steps {
		index := fmt.Sprint(k + 1)
		s.step(&w.Steps[k], index)
		symbols = append(symbols, "Δt_"+index)
	}
	s.line("t_p", "time of the whole path", formula.Sum(symbols), w.Minutes, "min", "")
}

// step is one leg of a flow path.
func (s *sheet) step(step *hydrology.Step, index string) {
	title := step.Method.Title
	s.set("κ", step.Constant, "")
	text := "κ"
	for k, given := range step.Given {
		base := s.factor(step, given, index)
		text += " × " + base
		if e := step.Exponents[k]; e != 1 {
			text += "^" + exponentText(e)
		}
	}
	symbol := step.Symbol + "_" + index
	v, minutes := formula.Must(text), "Δt_"+index
	source := step.Method.Source
	s.line(symbol, title, v, s.worked(v), step.Unit, source)
	switch {
	case step.Symbol == "V":
		s.set("L_"+index, step.Leg.Length, s.units.Length)
		s.found(minutes, "time over the length", "L_"+index+"/V_"+index+"/60", step.Minutes, "min", "")
	case step.Unit == "h":
		s.found(minutes, "in minutes", "t_"+index+" × 60", step.Minutes, "min", "")
	default:
		s.found(minutes, "time of this leg", "t_"+index, step.Minutes, "min", "")
	}
	for _, b := range step.Breaches {
		s.remark("Outside its range: %s", b.Text)
	}
}

// factor writes what a formula of a leg takes, and gives its symbol, or the bracket that is
// made of it.
func (s *sheet) factor(step *hydrology.Step, given hydrology.Number, index string) string {
	leg := &step.Leg
	switch {
	case strings.HasPrefix(given.Symbol, "(1.1"):
		s.given("C_"+index, "runoff coefficient", leg.C, "", "paths")
		return "(1.1 − C_" + index + ")"
	case strings.HasPrefix(given.Symbol, "(S'"):
		s.given("CN_"+index, "curve number", leg.CurveNumber, "", "paths")
		return "(1000/CN_" + index + " − 10 + 1)"
	case strings.HasPrefix(given.Symbol, "(D"):
		s.given("D_"+index, "diameter", leg.Diameter, given.Unit, "paths")
		return "(D_" + index + "/4)"
	case given.Symbol == "S%":
		s.given("S_"+index, "slope", leg.Slope, "", "paths")
		return "(100 × S_" + index + ")"
	}
	symbol := given.Symbol + "_" + index
	if given.Symbol == "V" {
		symbol = "v_" + index
	}
	source := "paths"
	if given.Symbol == "i" || given.Symbol == "P2" {
		source = s.Job.Rain.File
	}
	s.given(symbol, given.Name, given.Value, given.Unit, source)
	return symbol
}

// exponentText writes an exponent: thirds as fractions.
func exponentText(e float64) string {
	for third, text := range map[float64]string{1.0 / 3: "(1/3)", 2.0 / 3: "(2/3)", -1.0 / 3: "(−1/3)"} {
		if e == third {
			return text
		}
	}
	text := strconv.FormatFloat(e, 'f', -1, 64)
	if e < 0 {
		return "(−" + text[1:] + ")"
	}
	return text
}
