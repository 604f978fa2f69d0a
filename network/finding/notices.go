package finding

import (
	"rimfall/network"
	"rimfall/network/sweep"
)

// The notices of what was assumed and what was left unjudged.

func (j *judge) timeAssumed() {
	for i := range j.Network.Areas {
		if a := &j.Network.Areas[i]; !a.Time.OK && a.C > 0 {
			j.add("time-assumed", a.ID, network.Some(j.Storm.MinimumTime), network.Maybe{},
				"no inlet time: the minimum of %s min was used", num(j.Storm.MinimumTime, 1))
		}
	}
}

func (j *judge) rimUnknown() {
	for i := range j.Network.Structures {
		s := &j.Network.Structures[i]
		if !s.Rim.OK && s.Kind != network.Outfall {
			j.add("rim-unknown", s.ID, network.Maybe{}, network.Maybe{}, "no rim: cover and freeboard are not judged here")
		}
	}
}

func (j *judge) levelsUnknown() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if !p.InvertUpper.OK || !p.InvertLower.OK {
			j.add("levels-unknown", p.ID, network.Maybe{}, network.Maybe{}, "a slope and no inverts: flow, capacity and velocity are judged, levels are not")
		}
	})
}

// wallUnknown speaks only of pipes whose cover is judged.
func (j *judge) wallUnknown() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		judged := j.Network.Cover(p, network.Upper).OK || j.Network.Cover(p, network.Lower).OK
		if !p.HasWall && judged {
			j.add("wall-unknown", p.ID, network.Maybe{}, network.Maybe{}, "wall neither given nor in the catalogue: cover counts from the inside of the crown")
		}
	})
}

func (j *judge) unusedOutfall() {
	for i := range j.Network.Structures {
		s := &j.Network.Structures[i]
		if s.Kind == network.Outfall && len(j.Network.PipesIn(network.StructureIndex(i))) == 0 {
			j.add("unused-outfall", s.ID, network.Maybe{}, network.Maybe{}, "no pipe enters this outfall")
		}
	}
}
