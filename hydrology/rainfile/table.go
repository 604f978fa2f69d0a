package rainfile

import (
	"math"

	"rimfall/hydrology"
)

// numberCell is a cell and the number in it. A cell that holds none is not good; its fault is reported where it
// was read, and not again as a number out of place.
type numberCell struct {
	cell
	value float64
	good  bool
}

// tableRow is one duration, in minutes, and its intensities.
type tableRow struct {
	duration numberCell
	values   []numberCell
}

// numberIn reads the number of a cell, or reports that there is none.
func (r *reader) numberIn(c cell) numberCell {
	value, ok := r.page.number(c.text)
	if !ok || math.IsInf(value, 0) {
		r.fault(c.line, c.column, "%q is no number", c.text)
		return numberCell{cell: c, value: math.NaN()}
	}
	return numberCell{c, value, true}
}

// table checks what was read and makes a table of it. Faults of the table are given at the places of their cells;
// a cell that held no number has been reported already.
func (r *reader) table(periods []numberCell, rows []tableRow) hydrology.Table {
	durations, years, values := plain(periods, rows)
	for _, f := range hydrology.CheckTable(durations, years, values) {
		at := placeOf(f, periods, rows)
		if at.good {
			r.fault(at.line, at.column, "%s", f.Text)
		}
	}
	table, err := hydrology.NewTable(durations, years, values)
	if err != nil {
		return hydrology.Table{}
	}
	return table
}

func plain(periods []numberCell, rows []tableRow) (durations, years []float64, values [][]float64) {
	for _, p := range periods {
		years = append(years, p.value)
	}
	for _, row := range rows {
		var intensities []float64
		for _, v := range row.values {
			intensities = append(intensities, v.value)
		}
		durations = append(durations, row.duration.value)
		values = append(values, intensities)
	}
	return durations, years, values
}

// placeOf finds the cell of a fault; a row that is too short is reported at its duration, a table without rows at
// the first period.
func placeOf(f hydrology.CellFault, periods []numberCell, rows []tableRow) numberCell {
	switch {
	case f.Row >= 0 && f.Column >= 0 && f.Column < len(rows[f.Row].values):
		return rows[f.Row].values[f.Column]
	case f.Row >= 0:
		return rows[f.Row].duration
	case f.Column >= 0:
		return periods[f.Column]
	case len(periods) > 0:
		return numberCell{cell: periods[0].cell, good: true}
	case len(rows) > 0:
		return rows[0].duration
	}
	return numberCell{cell: cell{line: 1}, good: true}
}
