package analysis

import (
	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/finding"
	"rimfall/network/job"
	"rimfall/network/times"
)

// Timed gives the areas that have a flow path their inlet times in one storm, and
// the paths worked out. The pipes of the network are shared with the one given.
// The faults, if any, are those of paths that do not settle on this storm.
func Timed(j *job.Job, n *network.Network, rain hydrology.Intensity) (*network.Network, []times.Walked, []network.Problem) {
	if len(j.Paths) == 0 {
		return n, nil, nil
	}
	walked, faults := times.Walk(j.Paths, j.GivenTime, j.PathSettings(rain))
	var problems []network.Problem
	for _, f := range faults {
		problems = append(problems, network.Problem{Table: "paths", Line: int(f.Line), Field: "kind", Text: f.Text})
	}
	return times.In(n, walked), walked, problems
}

// rainRemarks is what the rules say of the rainfall of a storm.
func rainRemarks(j *job.Job, period float64) *finding.Rain {
	rain := &finding.Rain{File: j.Rain.File, Given: string(j.Rain.Unit), Used: j.Settings.Units.Intensity, Remarks: j.Rain.Notices}
	rain.Lower, rain.Upper, _ = j.Between(period)
	if !j.Rain.Converted {
		rain.Given = rain.Used
	}
	return rain
}
