package fit

import (
	"fmt"

	"rimfall/hydrology"
)

// Storms are the annual maxima of several durations, fitted one by one.
type Storms struct {
	Durations []float64 // minutes
	Fits      []Fitted  // one a duration
}

// FitStorms fits every duration's maxima (depths, in or mm) by one method. The error names each duration that
// cannot be fitted.
func FitStorms(durations []float64, depths [][]float64, m Method) (Storms, error) {
	if len(durations) != len(depths) {
		return Storms{}, fmt.Errorf("%d durations stand beside %d lists of maxima", len(durations), len(depths))
	}
	s := Storms{Durations: durations}
	var faults []error
	for k, sample := range depths {
		f, err := Fit(sample, m)
		if err != nil {
			faults = append(faults, fmt.Errorf("%v min: %w", durations[k], err))
		}
		s.Fits = append(s.Fits, f)
	}
	return s, joinErrors(faults)
}

// Table makes the table of intensities (in/h from inches, mm/h from mm) for return periods over 1 year. Durations
// are fitted by themselves, and so a rare storm may come out harder at a longer duration: the error is then
// hydrology.CellFaults, with the places.
func (s Storms) Table(periods []float64) (hydrology.Table, error) {
	values := make([][]float64, len(s.Fits))
	for row, f := range s.Fits {
		for _, period := range periods {
			depth, ok := f.Quantile(period)
			if !ok {
				return hydrology.Table{}, fmt.Errorf("return period %v: annual maxima want more than 1 year", period)
			}
			values[row] = append(values[row], depth*60/s.Durations[row])
		}
	}
	return hydrology.NewTable(s.Durations, periods, values)
}
