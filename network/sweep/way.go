package sweep

import "rimfall/network"

// way is the way down from a structure at which something changes again and again. What enters it from aside stays the
// same, and is kept.
type way struct {
	structures []network.StructureIndex // downstream
	aside      []asideList
	kept       int // moments of those lists stand under this number
}

// asideList is what a pipe from aside brings.
type asideList struct {
	pipe network.PipeIndex
	list list
}

// Way prepares for changes at one structure after a pass: for changes of its areas and its inflow. The structures on the
// way down from it, and it itself, are marked in changed.
func (a *Again) Way(changed []bool) {
	a.begin(a.storm, a.rain)
	w := &a.way
	w.structures, w.aside = w.structures[:0], w.aside[:0]
	for _, s := range a.downstream {
		if !changed[s] {
			a.hand(s)
			continue
		}
		w.structures = append(w.structures, s)
		if a.arrivals == nil {
			continue
		}
		for _, p := range a.n.PipesIn(s) {
			if !changed[a.n.Pipes[p].From] {
				w.aside = append(w.aside, asideList{p, a.arrivals.byPipe[p]})
			}
		}
	}
	if a.arrivals != nil {
		w.kept = len(a.arrivals.moments)
	}
}

// hand hands the areas on at a structure whose flows stay.
func (a *Again) hand(s network.StructureIndex) {
	if a.arrivals != nil {
		a.reached = a.gatherArrivals(s)
		a.send(a.n.PipesOut(s))
	}
}

// Below repeats the pass on the way that was prepared; elsewhere the flows stay as they are. Peaks by partial area agree
// with those of a whole pass to rounding.
func (a *Again) Below() (*Flows, []network.Problem) {
	a.multiplied = nil
	if a.arrivals != nil {
		a.arrivals.moments, a.arrivals.unused = a.arrivals.moments[:a.way.kept], 0
		for _, from := range a.way.aside {
			a.arrivals.byPipe[from.pipe] = a.arrivals.copied(from.list, 1)
		}
	}
	beyond := false
	for _, s := range a.way.structures {
		a.flows.Structures[s] = Structure{}
		for _, p := range a.n.PipesOut(s) {
			a.flows.Pipes[p] = Pipe{}
		}
		a.through(s)
		beyond = beyond || a.flows.Structures[s].Beyond
	}
	if beyond || a.multiplied != nil {
		return a.end()
	}
	return &a.flows, nil
}
