package analysis

import (
	"fmt"

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
	if check := j.Settings.Storm.CheckPeriod; check.OK && check.V != period && sameRain(j, period, check.V) {
		rain.Remarks = append(rain.Remarks[:len(rain.Remarks):len(rain.Remarks)], fmt.Sprintf(
			"the rainfall is the same for %g and for %g years: the equation is that of one storm; give it a period_exponent, or one equation for each return_period", period, check.V))
	}
	if !j.Rain.Converted {
		rain.Given = rain.Used
	}
	return rain
}

// sameRain tells whether two storms have the same intensities at the durations of
// a drain, as an equation of one storm gives them.
func sameRain(j *job.Job, a, b float64) bool {
	first, ok1 := j.Curve(a)
	second, ok2 := j.Curve(b)
	if !ok1 || !ok2 {
		return false
	}
	for _, minutes := range []float64{5, 15, 60} {
		x, _ := first.At(minutes)
		y, _ := second.At(minutes)
		if x != y {
			return false
		}
	}
	return true
}
