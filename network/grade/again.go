package grade

import (
	"rimfall/network"
	"rimfall/network/sweep"
	"rimfall/pipeflow/surface"
)

// Again draws the lines of one network again and again in the same room, so that nothing is allocated for a run.
// One Again serves one thread at a time; several may share a network.
type Again struct {
	lines      Lines
	downstream []network.StructureIndex
	profile    surface.Profile
}

// NewAgain makes room for the lines of a connected network without cycles.
func NewAgain(n *network.Network, s Settings) *Again {
	a := &Again{lines: Lines{
		Pipes: make([]Pipe, len(n.Pipes)), Structures: make([]Structure, len(n.Structures)),
		network: n, settings: s,
	}}
	a.downstream, _ = n.Order()
	return a
}

// Up is the function Up. The lines are those of Again: the next run overwrites them.
func (a *Again) Up(flows *sweep.Flows, tailwater Tailwater) *Lines {
	l := &a.lines
	l.flows = flows
	clear(l.Pipes)
	clear(l.Structures)
	l.pass(a.downstream, tailwater, &a.profile)
	return l
}
