package grade

import (
	"rimfall/network"
	"rimfall/network/sweep"
	"rimfall/pipeflow/surface"
)

// Up draws the lines of a connected network without cycles for the flows of one storm: from the outfalls up, every
// structure when all pipes out of it are drawn, then the pipes that enter it. The order is that of the sweep, backwards;
// nothing recurses, and nothing is allocated for a pipe.
func Up(n *network.Network, s Settings, flows *sweep.Flows, tailwater Tailwater) *Lines {
	l := &Lines{
		Pipes: make([]Pipe, len(n.Pipes)), Structures: make([]Structure, len(n.Structures)),
		network: n, flows: flows, settings: s,
	}
	order, _ := n.Order()
	l.pass(order, tailwater, new(surface.Profile)) // 7 kB, for one pipe after another
	return l
}

// pass goes up a network whose structures are listed in the order of flow.
func (l *Lines) pass(downstream []network.StructureIndex, tailwater Tailwater, profile *surface.Profile) {
	for i := len(downstream) - 1; i >= 0; i-- {
		s := downstream[i]
		if l.network.Structures[s].Kind == network.Outfall {
			l.receive(s, tailwater, profile)
			continue
		}
		l.stand(s)
		for _, p := range l.network.PipesIn(s) {
			l.draw(p, profile)
		}
	}
}

// receive draws the pipes into an outfall, and sets its level: the receiving water, or the water in the end of a pipe
// where that stands higher.
func (l *Lines) receive(s network.StructureIndex, which Tailwater, profile *surface.Profile) {
	at := &l.Structures[s]
	at.Out = none
	water := which.Of(&l.network.Structures[s])
	if water.OK {
		at.Known, at.Level = true, water.V
	}
	for _, p := range l.network.PipesIn(s) {
		l.discharge(p, water, profile)
		if line := &l.Pipes[p]; line.Known && (!at.Known || line.HGLLower > at.Level) {
			at.Known, at.Level = true, line.HGLLower
		}
	}
}

// none stands for no pipe.
const none network.PipeIndex = -1

// Of is the tailwater of an outfall; none where it is blank, or the structure is no outfall.
func (t Tailwater) Of(outfall *network.Structure) network.Maybe {
	if t == CheckTailwater && outfall.TailwaterCheck.OK {
		return outfall.TailwaterCheck
	}
	return outfall.Tailwater
}
