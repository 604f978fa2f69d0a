package review

import (
	"fmt"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/review/formula"
	"rimfall/network/sweep"
)

// rain is the intensity at the time of a structure: between two durations of the table a
// straight line in the logarithms of both.
func (s *sheet) rain(at network.StructureIndex) {
	run := &s.Design.Flows.Structures[at]
	if !run.Rained() {
		s.set("i", run.Intensity, s.units.Intensity)
		return
	}
	s.rainAt(run.Time, run.Intensity)
}

// rainAt writes how an intensity at a time came about; the time has the symbol t.
func (s *sheet) rainAt(t, intensity float64) {
	s.part(fmt.Sprintf("Rainfall of %g years", s.storm.ReturnPeriod))
	storm, ok := s.Job.Curve(s.storm.ReturnPeriod)
	durations := durationsOf(storm)
	if !ok || len(durations) == 0 {
		s.given("i", "intensity at that time", intensity, s.units.Intensity, "equation of "+s.Job.Settings.Rainfall)
		return
	}
	k := 0 // the last duration that is not over t
	for k+1 < len(durations) && durations[k+1] <= t {
		k++
	}
	s.tabulated("1", storm, durations[k])
	switch {
	case t < durations[0]:
		s.remark("The time is shorter than the first duration, whose intensity holds.")
		s.found("i", "intensity", "i_1", intensity, s.units.Intensity, "")
	case t == durations[k]:
		s.found("i", "intensity", "i_1", intensity, s.units.Intensity, "")
	default:
		s.tabulated("2", storm, durations[k+1])
		s.computed("m", "slope between them in logarithms", "ln(i_2/i_1)/ln(t_2/t_1)", "", fromLogLog)
		s.found("i", "intensity", "i_1 × (t/t_1)^m", intensity, s.units.Intensity, fromLogLog)
	}
}

// tabulated writes a duration of the table and the intensity there, with the uplift.
func (s *sheet) tabulated(k string, storm hydrology.Intensity, duration float64) {
	i, _ := storm.At(duration)
	s.given("t_"+k, "duration", duration, "min", s.Job.Settings.Rainfall)
	if s.storm.Uplift == 1 {
		s.given("i_"+k, "intensity there", i, s.units.Intensity, s.Job.Settings.Rainfall)
		return
	}
	s.set("u", s.storm.Uplift, "")
	s.set("r_"+k, i/s.storm.Uplift, s.units.Intensity)
	s.found("i_"+k, "intensity there, with uplift", "u × r_"+k, i, s.units.Intensity, s.Job.Settings.Rainfall+", uplift")
}

// pipeFlow is the peak flow of a pipe.
func (s *sheet) pipeFlow(p network.PipeIndex) {
	pipe, run := &s.n.Pipes[p], &s.Design.Flows.Pipes[p]
	s.part("Peak flow")
	if pipe.Share.OK {
		s.given("share", "share of this pipe", pipe.Share.V, "", "pipes")
		s.found("ΣCA", "C × area of this pipe", "share × ΣCA", run.CA, s.units.Area, "")
		if run.Inflow != 0 {
			s.found("ΣI", "steady inflow of this pipe", "share × ΣI", run.Inflow, s.units.Flow, "")
		}
		if s.storm.Peak == network.PartialArea {
			s.found("CA_t", "what counts of it", "share × CA_t", run.CACounted, s.units.Area, "")
		}
	}
	s.rationalPeak("Q", run.Rained(), run.Inflow, run.Flow, run.Held)
	if run.Held {
		s.heldPeak(p)
	}
}

// structureFlow is the peak flow at a structure.
func (s *sheet) structureFlow(at network.StructureIndex) {
	run := &s.Design.Flows.Structures[at]
	s.part("Peak flow")
	s.rationalPeak("Q", run.Rained(), run.Inflow, run.Flow, false)
}

// rationalPeak is Q = F ΣCA i + ΣI, the parts that are 0 left out.
func (s *sheet) rationalPeak(symbol string, rained bool, inflow, flow float64, held bool) {
	s.given("F", "factor of the Rational method", s.storm.RationalFactor, "", "rational_factor")
	counted := "ΣCA"
	if s.storm.Peak == network.PartialArea {
		counted = "CA_t"
	}
	text := "F × " + counted + " × i"
	switch {
	case !rained && inflow == 0:
		s.remark("Nothing drains here.")
		s.set(symbol, 0, s.units.Flow)
		return
	case !rained:
		text = "ΣI"
	case inflow != 0:
		text += " + ΣI"
	}
	if held {
		s.computed("Q_r", "peak of the Rational method", text, s.units.Flow, fromRational)
		return
	}
	s.found(symbol, "peak flow", text, flow, s.units.Flow, fromRational)
}

// heldPeak keeps the largest peak of a pipe upstream.
func (s *sheet) heldPeak(p network.PipeIndex) {
	pipe, run := &s.n.Pipes[p], &s.Design.Flows.Pipes[p]
	candidates := []string{"Q_r"}
	for _, in := range s.n.PipesIn(pipe.From) {
		k := fmt.Sprintf("Q_%d", len(candidates))
		v := s.Design.Flows.Pipes[in].Flow
		if pipe.Share.OK {
			s.set("Q_in", v, s.units.Flow)
			s.computed(k, "share of the peak of pipe "+s.n.Pipes[in].ID, "share × Q_in", s.units.Flow, "")
		} else {
			s.given(k, "peak of pipe "+s.n.Pipes[in].ID, v, s.units.Flow, "pipe "+s.n.Pipes[in].ID)
		}
		candidates = append(candidates, k)
	}
	s.line("Q", "the largest is held", formula.Largest(candidates), run.Flow, s.units.Flow, "hold_upstream_peak")
}

// areaAlone is an area by itself: C·A, its time, and the peak that it would have alone.
func (s *sheet) areaAlone(i network.AreaIndex) {
	a := &s.n.Areas[i]
	s.part("Area and runoff coefficient")
	if s.storm.FrequencyFactor {
		s.given("C_f", "frequency factor", s.frequency(), "", "HEC-22 ch. 3, from memory")
	}
	s.areaProduct(a, "1")
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
