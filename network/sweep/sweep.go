package sweep

import (
	"fmt"

	"rimfall/hydrology"
	"rimfall/network"
)

// Chooser fills in the size, slope and inverts of a pipe for its peak flow.
type Chooser interface {
	Choose(pipe network.PipeIndex, flow float64)
}

// Down makes one pass over a connected network without cycles. choose may be nil
// where every pipe has a size and a slope; otherwise it completes the pipes of n
// as they are reached. The problems are structures at which the time is beyond
// the rainfall; where there are any, the flows mean nothing.
func Down(n *network.Network, storm *network.Storm, rain hydrology.Intensity, choose Chooser) (Flows, []network.Problem) {
	d := pass{n: n, storm: storm, rain: rain, flows: newFlows(n), frequency: 1}
	if storm.FrequencyFactor {
		d.frequency = hydrology.FrequencyFactor(storm.ReturnPeriod)
	}
	for _, s := range d.order() {
		d.gather(s)
		d.peak(s)
		out := n.PipesOut(s)
		for k, p := range out {
			d.enter(s, p)
			if choose != nil {
				choose.Choose(p, d.flows.Pipes[p].Flow)
			}
			d.uniform(p)
			d.travel(p)
			if d.arrivals != nil {
				d.sendArrivals(p, n.Pipes[p].Share.Or(1), k == len(out)-1)
			}
		}
		if d.arrivals != nil && len(out) == 0 {
			d.arrivals.release(d.reached)
		}
	}
	return d.flows, append(d.problems(), d.multiplied...)
}

// order is the order of the pass; with peaks by partial area it goes down branch by branch.
func (d *pass) order() []network.StructureIndex {
	if d.storm.Peak == network.PartialArea {
		d.arrivals, d.partial = newArrivals(len(d.n.Pipes)), newStorm(d.rain, d.storm.MinimumTime)
		return depthFirst(d.n)
	}
	order, _ := d.n.Order()
	return order
}

// pass is one pass on its way down.
type pass struct {
	n         *network.Network
	storm     *network.Storm
	rain      hydrology.Intensity
	flows     Flows
	frequency float64 // Cf on every runoff coefficient

	arrivals   *arrivals         // nil with longest-time peaks; what follows is for the others
	partial    storm             // as the search sees it
	reached    list              // at the structure in hand
	multiplied []network.Problem // structures that areas reach over too many ways
}

// Coefficient is C·Cf of an area, not over 1.
func Coefficient(c, frequency float64) float64 { return min(1, c*frequency) }

// gather adds up what drains to a structure, and takes the longest time.
func (d *pass) gather(s network.StructureIndex) {
	at := &d.flows.Structures[s]
	at.Inflow = d.n.Structures[s].Inflow
	at.Time = d.storm.MinimumTime
	for _, a := range d.n.AreasAt(s) {
		area := &d.n.Areas[a]
		at.Area += area.Area
		if c := Coefficient(area.C, d.frequency); c > 0 {
			at.CA += c * area.Area
			at.Time = max(at.Time, area.Time.Or(0))
		}
	}
	for _, p := range d.n.PipesIn(s) {
		in := &d.flows.Pipes[p]
		at.Area += in.Area
		at.Inflow += in.Inflow
		if in.Rained() {
			at.CA += in.CA
			at.Time = max(at.Time, in.Time+in.TravelTime)
		}
	}
}

// peak is the Rational peak at a structure. Where only steady inflow arrives, the
// time is the minimum and rain adds nothing.
func (d *pass) peak(s network.StructureIndex) {
	at := &d.flows.Structures[s]
	i, where := d.rain.At(at.Time)
	at.Intensity, at.CACounted = i, at.CA
	at.Flow = at.Inflow + hydrology.Rational(d.storm.RationalFactor, at.CA, i)
	if d.arrivals != nil {
		d.partialPeak(s)
		return
	}
	at.BelowFirst, at.Beyond = where == hydrology.Below, where == hydrology.Beyond
}

// enter gives a pipe its share of what has gathered at its upper structure.
func (d *pass) enter(s network.StructureIndex, p network.PipeIndex) {
	at, out := &d.flows.Structures[s], &d.flows.Pipes[p]
	share := d.n.Pipes[p].Share.Or(1)
	out.Area, out.CA, out.Inflow = share*at.Area, share*at.CA, share*at.Inflow
	out.Time, out.Intensity, out.BelowFirst = at.Time, at.Intensity, at.BelowFirst
	out.Part = at.Part
	out.CACounted = share * at.CACounted
	out.Flow = out.Inflow + hydrology.Rational(d.storm.RationalFactor, out.CACounted, out.Intensity)
	if d.storm.HoldUpstreamPeak {
		for _, in := range d.n.PipesIn(s) {
			if held := share * d.flows.Pipes[in].Flow; held > out.Flow {
				out.Flow, out.Held = held, true
			}
		}
	}
}

// problems lists the structures at which the time first goes beyond the rainfall:
// those that no such structure drains to.
func (d *pass) problems() []network.Problem {
	var all []network.Problem
	for i := range d.flows.Structures {
		at := &d.flows.Structures[i]
		if !at.Beyond || d.beyondUpstream(network.StructureIndex(i)) {
			continue
		}
		s := &d.n.Structures[i]
		all = append(all, network.Problem{
			Table: "structures", Line: int(s.Line), Field: "id",
			Text: fmt.Sprintf("the time at structure %s is %.4g min, which is beyond the last duration of the rainfall; add longer durations to the table", s.ID, at.Time),
		})
	}
	return all
}

func (d *pass) beyondUpstream(s network.StructureIndex) bool {
	for _, p := range d.n.PipesIn(s) {
		if d.flows.Structures[d.n.Pipes[p].From].Beyond {
			return true
		}
	}
	return false
}
