package finding

import (
	"rimfall/hydrology"
	"rimfall/network"
)

// Rain is what is worth saying of the rainfall of a run.
type Rain struct {
	File         string
	Lower, Upper float64 // columns between which the storm is interpolated, years; 0 where it is not
	Given, Used  string  // units of the source and of the job, where they differ
	Remarks      []string
}

// stormBetween and its neighbours are the rules of rainfall and of flow paths.
func (j *judge) stormBetween() {
	if j.Rain != nil && j.Rain.Upper > 0 {
		j.add("storm-between-columns", "rainfall", network.Some(j.Storm.ReturnPeriod), network.Maybe{},
			"the storm of %g years is interpolated between the columns of %g and %g years", j.Storm.ReturnPeriod, j.Rain.Lower, j.Rain.Upper)
	}
}

func (j *judge) rainfallConverted() {
	if j.Rain != nil && j.Rain.Given != j.Rain.Used {
		j.add("rainfall-converted", "rainfall", network.Maybe{}, network.Maybe{},
			"%s gives intensities in %s; they were converted to %s", j.Rain.File, j.Rain.Given, j.Rain.Used)
	}
}

func (j *judge) rainfallRemark() {
	if j.Rain == nil {
		return
	}
	for _, text := range j.Rain.Remarks {
		j.add("rainfall-remark", "rainfall", network.Maybe{}, network.Maybe{}, "%s", text)
	}
}

// pathLimit tells of every step that is outside the limits of its formula.
func (j *judge) pathLimit() {
	for _, w := range j.Paths {
		if !w.Used {
			continue
		}
		for k, step := range w.Steps {
			for _, b := range step.Breaches {
				j.add("path-limit", j.Network.Areas[w.Path.Area].ID, network.Some(b.Value), network.Maybe{}, "leg %d of the flow path: %s", k+1, b.Text)
			}
		}
	}
}

// pathBelowFirst tells of sheet flow that read the rainfall below its first duration.
func (j *judge) pathBelowFirst() {
	for _, w := range j.Paths {
		if w.Used && w.Where == hydrology.Below {
			j.add("path-below-first-duration", j.Network.Areas[w.Path.Area].ID, network.Some(w.Minutes), network.Maybe{},
				"the sheet flow of a path of %s min took the intensity of the first duration of the rainfall", num(w.Minutes, 2))
		}
	}
}

func (j *judge) pathUnused() {
	for _, w := range j.Paths {
		if a := &j.Network.Areas[w.Path.Area]; !w.Used {
			j.add("path-unused", a.ID, a.Time, network.Some(w.Minutes),
				"the area has an inlet time, %s min, which holds; its flow path gives %s min", num(a.Time.V, 2), num(w.Minutes, 2))
		}
	}
}
