package sweep

import (
	"rimfall/network"
	"rimfall/pipeflow"
)

// CriticalDepth is the critical depth of a pipe's design flow, of one barrel: 0
// where nothing flows, none where a flat roof leaves no room for it.
func (p *Pipe) CriticalDepth(pipe *network.Pipe, gravity float64) network.Maybe {
	depth, ok := pipeflow.CriticalDepth(pipe.Section, gravity, p.Flow/float64(pipe.Count))
	return network.Maybe{V: depth, OK: ok}
}

// Froude is the Froude number at design depth; none where the pipe is dry or full.
func (p *Pipe) Froude(pipe *network.Pipe, gravity float64) network.Maybe {
	if p.State != PartFull {
		return network.Maybe{}
	}
	f, ok := pipeflow.Froude(pipe.Section, gravity, p.Depth, p.Flow/float64(pipe.Count))
	return network.Maybe{V: f, OK: ok}
}

// Shear is the boundary shear γRS at design depth; none where nothing flows or
// the pipe does not fall.
func (p *Pipe) Shear(pipe *network.Pipe, unitWeight float64) network.Maybe {
	if p.State == Dry || !p.HasCapacity {
		return network.Maybe{}
	}
	r := pipe.Section.At(p.Depth).HydraulicRadius()
	return network.Some(pipeflow.Shear(unitWeight, r, pipe.Slope.V))
}
