package review

import (
	"fmt"

	"rimfall/network"
	"rimfall/network/review/formula"
)

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
