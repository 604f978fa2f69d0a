package sweep

import (
	"fmt"

	"rimfall/hydrology"
	"rimfall/network"
)

// gatherArrivals makes one list of the areas that reach a structure: those of
// every pipe in, and its own.
func (d *pass) gatherArrivals(s network.StructureIndex) list {
	var all list
	for _, p := range d.n.PipesIn(s) {
		all = d.arrivals.join(all, d.arrivals.byPipe[p])
		d.arrivals.byPipe[p] = list{}
	}
	for _, i := range d.n.AreasAt(s) {
		area := &d.n.Areas[i]
		if c := Coefficient(area.C, d.frequency); c > 0 {
			all = d.arrivals.add(all, hydrology.Contribution{CA: c * area.Area, InletTime: area.Time.Or(d.storm.MinimumTime)})
		}
	}
	return all
}

// partialPeak is the largest flow at a structure over all durations, when of each
// area only what has had time to arrive counts.
func (d *pass) partialPeak(s network.StructureIndex) {
	at := &d.flows.Structures[s]
	d.reached = d.gatherArrivals(s)
	if d.tooManyWays(s) || !at.Rained() {
		return
	}
	peak, where, ok := d.arrivals.peak(d.reached, at.CA, d.partial)
	at.BelowFirst, at.Beyond = where == hydrology.Below, !ok
	at.Time, at.Intensity, at.CACounted = peak.time, peak.intensity, peak.counted
	at.Flow = at.Inflow + hydrology.Rational(d.storm.RationalFactor, peak.counted, peak.intensity)
	at.Part = ok && peak.time < max(d.storm.MinimumTime, d.reached.last+d.reached.shift)
}

// sendArrivals hands the areas at a structure down a pipe of it, of which they
// are a share, once its travel time is known. The last pipe out takes the list itself.
func (d *pass) sendArrivals(p network.PipeIndex, share float64, last bool) {
	sent := d.reached
	if !last || share != 1 {
		sent = d.arrivals.copied(sent, share)
		if last {
			d.arrivals.release(d.reached)
		}
	}
	sent.shift += d.flows.Pipes[p].TravelTime
	d.arrivals.byPipe[p] = sent
}

// An area that passes splits arrives over several ways, each with its own travel
// time; where branches meet and part again they multiply. leastWays moments, and
// waysPerArea for each area, are let through; over that the exact answer is out of reach.
const (
	leastWays   = 1 << 18
	waysPerArea = 32
)

// tooManyWays gives up on partial areas where splits have multiplied them.
func (d *pass) tooManyWays(s network.StructureIndex) bool {
	if int(d.arrivals.size(d.reached)) <= leastWays+waysPerArea*len(d.n.Areas) {
		return false
	}
	d.arrivals.release(d.reached)
	d.reached = list{}
	at := &d.n.Structures[s]
	d.multiplied = append(d.multiplied, network.Problem{
		Table: "structures", Line: int(at.Line), Field: "id",
		Text: fmt.Sprintf("the areas upstream reach structure %s over more ways than can be followed one by one, since pipes part and meet so often; take peak = \"longest-time\"", at.ID),
	})
	return true
}

// depthFirst lists all structures so that every pipe leads from an earlier to a
// later one, one branch after the other from its head down, so that few lists of
// arrivals stand at a time. The stack is a slice: a chain may have any length.
func depthFirst(n *network.Network) []network.StructureIndex {
	order := make([]network.StructureIndex, 0, len(n.Structures))
	passed := make([]int32, len(n.Structures)) // pipes in that have been followed
	listed := make([]bool, len(n.Structures))
	var stack []network.StructureIndex
	for end := range n.Structures {
		if len(n.PipesOut(network.StructureIndex(end))) > 0 {
			continue
		}
		stack = append(stack, network.StructureIndex(end))
		for len(stack) > 0 {
			s := stack[len(stack)-1]
			in := n.PipesIn(s)
			if k := passed[s]; int(k) < len(in) {
				passed[s]++
				if above := n.Pipes[in[k]].From; !listed[above] {
					stack = append(stack, above)
				}
				continue
			}
			stack = stack[:len(stack)-1]
			listed[s] = true
			order = append(order, s)
		}
	}
	return order
}
