package sweep

import (
	"rimfall/hydrology"
	"rimfall/network"
)

// Again passes down one network again and again, a storm after the other, in the same room: once the first pass
// has made it, nothing more is allocated. One Again serves one thread at a time; several may share a network.
type Again struct {
	pass
	downstream []network.StructureIndex
	way        way
}

// NewAgain makes room for passes over a connected network without cycles, with one kind of peak.
func NewAgain(n *network.Network, peak network.Peak) *Again {
	a := &Again{pass: pass{n: n, flows: newFlows(n)}}
	if peak == network.PartialArea {
		a.arrivals, a.downstream = newArrivals(len(n.Pipes)), depthFirst(n)
		return a
	}
	a.downstream, _ = n.Order()
	return a
}

// Down is the function Down for pipes that all have their size, with the kind of peak that the room was made
// for. The flows are those of Again: the next pass overwrites them.
func (a *Again) Down(storm *network.Storm, rain hydrology.Intensity) (*Flows, []network.Problem) {
	a.begin(storm, rain)
	clear(a.flows.Pipes)
	clear(a.flows.Structures)
	for _, s := range a.downstream {
		a.through(s)
	}
	return a.end()
}

// Keep brings the flows back to those of an earlier pass over the same network.
func (a *Again) Keep(earlier *Flows) {
	copy(a.flows.Pipes, earlier.Pipes)
	copy(a.flows.Structures, earlier.Structures)
}

// Copy is a copy of the flows that later passes leave alone.
func (f *Flows) Copy() Flows {
	return Flows{append([]Pipe(nil), f.Pipes...), append([]Structure(nil), f.Structures...)}
}

// begin prepares a pass.
func (a *Again) begin(storm *network.Storm, rain hydrology.Intensity) {
	a.storm, a.rain, a.frequency, a.multiplied = storm, rain, 1, nil
	if storm.FrequencyFactor {
		a.frequency = hydrology.FrequencyFactor(storm.ReturnPeriod)
	}
	if a.arrivals != nil {
		a.arrivals.empty()
		a.partial.become(rain, storm.MinimumTime)
	}
}

func (a *Again) end() (*Flows, []network.Problem) {
	return &a.flows, append(a.problems(), a.multiplied...)
}

// through is the pass at one structure and in the pipes out of it.
func (a *Again) through(s network.StructureIndex) {
	a.gather(s)
	a.peak(s)
	out := a.n.PipesOut(s)
	for _, p := range out {
		a.enter(s, p)
		a.uniform(p)
		a.travel(p)
	}
	a.send(out)
}

// send sends the areas at a structure down its pipes out; where there are none they leave.
func (a *Again) send(out []network.PipeIndex) {
	if a.arrivals == nil {
		return
	}
	for k, p := range out {
		a.sendArrivals(p, a.n.Pipes[p].Share.Or(1), k == len(out)-1)
	}
	if len(out) == 0 {
		a.arrivals.release(a.reached)
	}
}

// empty makes the arrivals like new, in the room that they have.
func (a *arrivals) empty() {
	a.moments, a.unused, a.seed = a.moments[:1], 0, firstSeed
	clear(a.byPipe)
}

// firstSeed is that of newArrivals.
const firstSeed = 2463534242
