package review

import (
	"fmt"

	"rimfall/network"
	"rimfall/network/review/formula"
	"rimfall/network/sweep"
)

// reach is an area on one of its ways down to a structure.
type reach struct {
	area   network.AreaIndex
	travel float64 // in pipes, min
	share  float64 // of it that comes this way
}

// reaches lists the areas that drain to a structure with their travel times in pipes. The
// stack is a slice: a chain may have any length. Where pipes part and meet again an area
// comes once by each way.
func (s *sheet) reaches(at network.StructureIndex) []reach {
	type stop struct {
		structure network.StructureIndex
		travel    float64
		share     float64
	}
	var all []reach
	for stack := []stop{{at, 0, 1}}; len(stack) > 0; {
		here := stack[len(stack)-1]
		stack = stack[:len(stack)-1]
		for _, a := range s.n.AreasAt(here.structure) {
			if sweep.Coefficient(s.n.Areas[a].C, s.frequency()) > 0 {
				all = append(all, reach{a, here.travel, here.share})
			}
		}
		for _, p := range s.n.PipesIn(here.structure) {
			pipe, run := &s.n.Pipes[p], &s.Design.Flows.Pipes[p]
			if run.Rained() {
				stack = append(stack, stop{pipe.From, here.travel + run.TravelTime, here.share * pipe.Share.Or(1)})
			}
		}
	}
	return all
}

// partialArea is what counts at the time that governs: of every area the part that has had
// time to arrive, C·A · min(1, (t − τ)/inlet time).
func (s *sheet) partialArea(at network.StructureIndex) {
	run := &s.Design.Flows.Structures[at]
	s.given("t", "the time at which the flow is largest", run.Time, "min", "search over all durations")
	var counted []string
	for k, r := range s.reaches(at) {
		a, i := &s.n.Areas[r.area], fmt.Sprint(k+1)
		s.set("CA_"+i, r.share*sweep.Coefficient(a.C, s.frequency())*a.Area, s.units.Area)
		s.set("τ_"+i, r.travel, "min")
		s.set("T_"+i, a.Time.Or(s.storm.MinimumTime), "min")
		text := "CA_" + i + " × min(1, max(0, (t − τ_" + i + ")/T_" + i + "))"
		if s.value("T_"+i) == 0 { // all of it comes at once
			text = "CA_" + i
			if run.Time < r.travel {
				text = "0 × CA_" + i
			}
		}
		s.computed("c_"+i, "of area "+a.ID, text, s.units.Area, "HDS-2 eq. 5.31")
		counted = append(counted, "c_"+i)
	}
	s.line("CA_t", "C × area that counts", formula.Sum(counted), run.CACounted, s.units.Area, "HDS-2 eq. 5.31")
}
