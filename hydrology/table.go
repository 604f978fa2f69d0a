package hydrology

import (
	"cmp"
	"math"
	"slices"
)

// Table is rainfall intensity by duration and return period. Durations are in minutes and rise; Periods are in
// years and rise; Values[row][column] is in in/h or mm/h, a row a duration and a column a period.
// NewTable makes one and checks it. The zero Table holds no storm.
type Table struct {
	Durations []float64
	Periods   []float64
	Values    [][]float64
}

// NewTable checks and copies a table; its columns may come in any order and are put in order of their periods.
// The error, where there is one, is CellFaults: every fault with its row and column as they were given.
func NewTable(durations, periods []float64, values [][]float64) (Table, error) {
	if faults := CheckTable(durations, periods, values); len(faults) > 0 {
		return Table{}, faults
	}
	order := columnsByPeriod(periods)
	t := Table{Durations: slices.Clone(durations), Periods: pick(periods, order)}
	for _, row := range values {
		t.Values = append(t.Values, pick(row, order))
	}
	return t, nil
}

// columnsByPeriod gives the column numbers in order of rising period.
func columnsByPeriod(periods []float64) []int {
	order := make([]int, len(periods))
	for k := range order {
		order[k] = k
	}
	slices.SortStableFunc(order, func(a, b int) int { return cmp.Compare(periods[a], periods[b]) })
	return order
}

func pick(row []float64, order []int) []float64 {
	picked := make([]float64, len(order))
	for k, column := range order {
		picked[k] = row[column]
	}
	return picked
}

// Curve gives the storm of a return period that has a column of its own; not ok where there is none.
func (t Table) Curve(period float64) (Curve, bool) {
	column := slices.Index(t.Periods, period)
	if column < 0 {
		return Curve{}, false
	}
	return newCurve(slices.Clone(t.Durations), t.column(column)), true
}

func (t Table) column(k int) []float64 {
	column := make([]float64, len(t.Values))
	for row := range t.Values {
		column[row] = t.Values[row][k]
	}
	return column
}

// Series is what the return periods of a table count.
type Series int8

const (
	// PartialDuration counts every storm over a threshold. It is also taken where nothing is said, because its
	// scale between columns holds for every period, 1 year and less included.
	PartialDuration Series = iota
	// AnnualMaximum counts the largest storm of each year; its periods are over 1 year.
	AnnualMaximum
)

// String gives the series in words.
func (s Series) String() string {
	if s == AnnualMaximum {
		return "annual maximum"
	}
	return "partial duration"
}

// variate is the scale on which depths of one duration lie near a straight line:
// y = −ln(−ln(1 − 1/T)) for annual maxima (Gumbel 1941), y = ln T for partial-duration series
// (the exponential excess that goes with it). Not ok where the period has none.
func (s Series) variate(period float64) (y float64, ok bool) {
	if s == AnnualMaximum {
		return -math.Log(-math.Log1p(-1 / period)), period > 1
	}
	return math.Log(period), period > 0
}

// CurveBetween gives the storm of any return period from the first column's to the last's: at each duration
// linear in the series' variate between the neighbouring columns, then log–log in duration like any other.
// A column's own period gives that column exactly. Not ok outside the columns, and, in annual maxima, between a
// column of 1 year or less and the next, for no year is without a largest storm.
func (t Table) CurveBetween(period float64, series Series) (Curve, bool) {
	if c, ok := t.Curve(period); ok {
		return c, true
	}
	upper := slices.IndexFunc(t.Periods, func(p float64) bool { return p > period })
	if upper < 1 || math.IsNaN(period) {
		return Curve{}, false
	}
	y0, ok0 := series.variate(t.Periods[upper-1])
	y1, ok1 := series.variate(t.Periods[upper])
	y, ok := series.variate(period)
	if !ok0 || !ok1 || !ok {
		return Curve{}, false
	}
	share := (y - y0) / (y1 - y0)
	intensities := t.column(upper - 1)
	for k, above := range t.column(upper) {
		intensities[k] += share * (above - intensities[k])
	}
	return newCurve(slices.Clone(t.Durations), intensities), true
}
