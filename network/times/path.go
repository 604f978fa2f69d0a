package times

import (
	"slices"

	"rimfall/hydrology"
	"rimfall/network"
)

// Path is the flow path of one area as it was given, from its far end down.
type Path struct {
	Area  network.AreaIndex
	Legs  []hydrology.Leg
	Lines []int32 // of each leg in its file
}

// Walked is a path worked out for one storm, in minutes.
type Walked struct {
	Path *Path
	hydrology.Travel
	Used bool // false where the area has an inlet time of its own, which holds
}

// Fault is one thing wrong with a path: its line, and what.
type Fault struct {
	Path *Path
	Line int32
	Text string
}

// Walk works out all paths for one storm. given tells the areas that have an inlet
// time of their own. The faults are all that is wrong with the legs.
func Walk(paths []Path, given func(network.AreaIndex) bool, s hydrology.Settings) (walked []Walked, faults []Fault) {
	for i := range paths {
		p := &paths[i]
		travel, bad := hydrology.Time(p.Legs, s)
		for _, f := range bad {
			faults = append(faults, Fault{p, p.Lines[f.Leg], f.Text})
		}
		walked = append(walked, Walked{p, travel, !given(p.Area)})
	}
	return walked, faults
}

// In is a network with the inlet times of the paths that are used. The network
// that was given stays as it is; the pipes are shared by both.
func In(n *network.Network, walked []Walked) *network.Network {
	timed := *n
	timed.Areas = slices.Clone(n.Areas)
	for _, w := range walked {
		if w.Used {
			timed.Areas[w.Path.Area].Time = network.Some(w.Minutes)
		}
	}
	return &timed
}
