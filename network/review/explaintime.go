package review

import (
	"fmt"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/review/formula"
	"rimfall/network/sweep"
)

// frequency is Cf on every runoff coefficient.
func (s *sheet) frequency() float64 {
	if s.storm.FrequencyFactor {
		return hydrology.FrequencyFactor(s.storm.ReturnPeriod)
	}
	return 1
}

// gathered adds up what drains to a structure: its own areas, and what its pipes in bring.
func (s *sheet) gathered(at network.StructureIndex) {
	s.part("Areas that drain to structure " + s.structureID(at))
	run := &s.Design.Flows.Structures[at]
	if s.storm.FrequencyFactor {
		s.given("C_f", "frequency factor", s.frequency(), "", "HEC-22 ch. 3, from memory")
	}
	var products, areas []string
	for _, i := range s.n.AreasAt(at) {
		k := fmt.Sprint(len(areas) + 1)
		s.areaProduct(&s.n.Areas[i], k)
		products, areas = append(products, "CA_"+k), append(areas, "A_"+k)
	}
	for _, p := range s.n.PipesIn(at) {
		k, id, in := fmt.Sprint(len(areas)+1), s.n.Pipes[p].ID, &s.Design.Flows.Pipes[p]
		s.given("A_"+k, "area of pipe "+id, in.Area, s.units.Area, "pipe "+id)
		s.given("CA_"+k, "C × area of pipe "+id, in.CA, s.units.Area, "pipe "+id)
		products, areas = append(products, "CA_"+k), append(areas, "A_"+k)
	}
	if len(areas) == 0 {
		s.remark("none")
	}
	s.line("ΣA", "area, total", formula.Sum(areas), run.Area, s.units.Area, fromRational)
	s.line("ΣCA", "C × area, total", formula.Sum(products), run.CA, s.units.Area, fromRational)
	s.inflows(at)
}

// areaProduct is C·A of one area, its symbols with the index k.
func (s *sheet) areaProduct(a *network.Area, k string) {
	s.given("A_"+k, "area "+a.ID, a.Area, s.units.Area, "areas")
	s.given("C_"+k, "runoff coefficient"+ofSurface(a), a.C, "", "areas")
	if s.storm.FrequencyFactor {
		s.computed("CA_"+k, "C × area, not over the area", "min(1, C_f × C_"+k+") × A_"+k, s.units.Area, fromRational)
		return
	}
	s.computed("CA_"+k, "C × area", "C_"+k+" × A_"+k, s.units.Area, fromRational)
}

func ofSurface(a *network.Area) string {
	if a.Surface == "" {
		return ""
	}
	return ", " + a.Surface
}

// inflows adds up the steady inflows, where there are any.
func (s *sheet) inflows(at network.StructureIndex) {
	total := s.Design.Flows.Structures[at].Inflow
	if total == 0 {
		return
	}
	var symbols []string
	if own := s.n.Structures[at].Inflow; own != 0 {
		s.given("I_1", "steady inflow here", own, s.units.Flow, "structures")
		symbols = append(symbols, "I_1")
	}
	for _, p := range s.n.PipesIn(at) {
		if v := s.Design.Flows.Pipes[p].Inflow; v != 0 {
			k := fmt.Sprintf("I_%d", len(symbols)+1)
			s.given(k, "steady inflow of pipe "+s.n.Pipes[p].ID, v, s.units.Flow, "pipe "+s.n.Pipes[p].ID)
			symbols = append(symbols, k)
		}
	}
	s.line("ΣI", "steady inflow, total", formula.Sum(symbols), total, s.units.Flow, "")
}

// arrives is the time that governs at a structure.
func (s *sheet) arrives(at network.StructureIndex) {
	run := &s.Design.Flows.Structures[at]
	s.part("Time at structure " + s.structureID(at))
	s.given("t_min", "minimum time", s.storm.MinimumTime, "min", "minimum_time")
	if !run.Rained() {
		s.remark("No area with runoff drains here: the minimum time is taken, and rain adds nothing.")
		s.set("t", run.Time, "min")
		return
	}
	if s.storm.Peak == network.PartialArea {
		s.partialArea(at)
		return
	}
	candidates := []string{"t_min"}
	for _, i := range s.n.AreasAt(at) {
		a := &s.n.Areas[i]
		if !a.Time.OK || sweep.Coefficient(a.C, s.frequency()) == 0 {
			continue
		}
		k := fmt.Sprintf("t_%d", len(candidates))
		s.given(k, "inlet time, area "+a.ID, a.Time.V, "min", s.timeSource(i))
		candidates = append(candidates, k)
	}
	for _, p := range s.n.PipesIn(at) {
		in := &s.Design.Flows.Pipes[p]
		if !in.Rained() {
			continue
		}
		k, from := fmt.Sprint(len(candidates)), "pipe "+s.n.Pipes[p].ID
		s.given("T_"+k, "time at the upper end, "+from, in.Time, "min", from)
		s.given("Δt_"+k, "time in the pipe, "+from, in.TravelTime, "min", from)
		s.computed("t_"+k, "arrival, "+from, "T_"+k+" + Δt_"+k, "min", fromRational)
		candidates = append(candidates, "t_"+k)
	}
	s.line("t", "the longest time governs", formula.Largest(candidates), run.Time, "min", fromRational)
}

func (s *sheet) structureID(at network.StructureIndex) string { return s.n.Structures[at].ID }
