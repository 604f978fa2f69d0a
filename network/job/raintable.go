package job

import (
	"errors"
	"slices"

	"rimfall/hydrology"
)

// The durations, min, and return periods at which an equation is tabulated: those
// that agencies print up to a day.
var (
	usualDurations = []float64{5, 10, 15, 20, 30, 45, 60, 90, 120, 180, 360, 720, 1440}
	usualPeriods   = []float64{2, 5, 10, 25, 50, 100}
)

// RainTable is the rainfall as a table in the job's unit, before uplift. An equation
// is read at the usual durations and periods that lie in its range, and at the
// storms of the job. The error says that no such duration or period does.
func (j *Job) RainTable() (hydrology.Table, error) {
	if !j.Rain.Equation() {
		return j.Rain.Table, nil
	}
	periods := slices.Clone(usualPeriods)
	for _, e := range j.Rain.equations {
		periods = append(periods, e.Constants[0].Period)
	}
	periods = append(periods, j.Settings.Storm.ReturnPeriod, j.Settings.Storm.CheckPeriod.V)
	slices.Sort(periods)
	periods = slices.DeleteFunc(slices.Compact(periods), func(p float64) bool {
		_, err := j.storm(p)
		return p <= 0 || err != nil
	})
	if len(periods) == 0 {
		return hydrology.Table{}, errors.New("the equation gives no storm of 2 to 100 years")
	}
	return j.tabulate(periods)
}

func (j *Job) tabulate(periods []float64) (hydrology.Table, error) {
	var durations []float64
	var values [][]float64
	for _, minutes := range usualDurations {
		var row []float64
		for _, p := range periods {
			storm, _ := j.storm(p)
			if i, where := storm.At(minutes); where == hydrology.Within {
				row = append(row, i)
			}
		}
		if len(row) == len(periods) {
			durations, values = append(durations, minutes), append(values, row)
		}
	}
	if len(durations) == 0 {
		return hydrology.Table{}, errors.New("the equation's range holds none of the usual durations, 5 min to 24 h")
	}
	return hydrology.NewTable(durations, periods, values)
}
