package job

import (
	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/times"
	"rimfall/network/units"
)

// PathSettings is what the formulas of flow paths take from the job, for one storm.
func (j *Job) PathSettings(storm hydrology.Intensity) hydrology.Settings {
	s := hydrology.Settings{Storm: storm, Minimum: j.Settings.Storm.MinimumTime, ManningFactor: j.Settings.Storm.ManningFactor}
	if j.Settings.Units.Name == units.SI.Name {
		s.System = hydrology.SI
	}
	s.TwoYearDay, _, _ = j.TwoYearDay()
	return s
}

// GivenTime tells whether an area that has a path also has an inlet time of its own,
// which holds whatever the path says.
func (j *Job) GivenTime(a network.AreaIndex) bool { return j.givenTime[a] }

// walkPaths works out the paths for the storms of the job, so that what is wrong with them is
// told with all other faults, and gives the areas their inlet times in the design storm.
func (r *reader) walkPaths(j *Job) {
	if len(j.Paths) == 0 {
		return
	}
	j.givenTime = make([]bool, len(j.Network.Areas))
	for i := range j.Network.Areas {
		j.givenTime[i] = j.Network.Areas[i].Time.OK
	}
	period := j.Settings.Storm.ReturnPeriod
	if storm, ok := j.Curve(period); ok && period > 0 {
		walked, faults := times.Walk(j.Paths, j.GivenTime, j.PathSettings(storm))
		for _, f := range faults {
			r.faults = append(r.faults, j.Locate(network.Problem{Table: "paths", Line: int(f.Line), Field: "kind", Text: f.Text}))
		}
		if len(faults) == 0 {
			j.Network.Areas = times.In(j.Network, walked).Areas
		}
	}
}
