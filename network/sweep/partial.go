package sweep

import (
	"rimfall/hydrology"
	"rimfall/network"
)

// arrivals keeps, for the peak by partial area, every area upstream with its
// inlet time and its travel time down to here: by pipe, at the lower end.
type arrivals [][]hydrology.Contribution

// gatherArrivals lists the areas that reach a structure. The longest list of the
// pipes in is taken over, the others are appended to it.
func (d *pass) gatherArrivals(s network.StructureIndex) []hydrology.Contribution {
	var all []hydrology.Contribution
	for _, p := range d.n.PipesIn(s) {
		list := d.arrivals[p]
		d.arrivals[p] = nil
		if len(list) > len(all) {
			all, list = list, all
		}
		all = append(all, list...)
	}
	for _, a := range d.n.AreasAt(s) {
		area := &d.n.Areas[a]
		if c := Coefficient(area.C, d.frequency); c > 0 {
			all = append(all, hydrology.Contribution{CA: c * area.Area, InletTime: area.Time.Or(d.storm.MinimumTime)})
		}
	}
	return all
}

// partialPeak is the largest flow at a structure over all durations, when of each
// area only what has had time to arrive counts.
func (d *pass) partialPeak(s network.StructureIndex) {
	at := &d.flows.Structures[s]
	d.reached = d.gatherArrivals(s)
	if !at.Rained() {
		return
	}
	peak, where, ok := hydrology.PartialArea(d.reached, d.rain, d.storm.MinimumTime, d.storm.RationalFactor)
	at.BelowFirst, at.Beyond = where == hydrology.Below, !ok
	at.Time, at.Intensity, at.CACounted = peak.Time, peak.Intensity, peak.CACounted
	at.Flow = at.Inflow + peak.Flow
}

// sendArrivals hands the areas at a structure down a pipe of it, of which they
// are a share, once its travel time is known. The last pipe out takes the list itself.
func (d *pass) sendArrivals(p network.PipeIndex, share float64, last bool) {
	list := d.reached
	if !last {
		list = append([]hydrology.Contribution(nil), list...)
	}
	for i := range list {
		list[i].CA *= share
		list[i].TravelTime += d.flows.Pipes[p].TravelTime
	}
	d.arrivals[p] = list
}
