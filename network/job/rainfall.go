package job

import (
	"errors"
	"slices"
	"strings"

	"rimfall/hydrology"
	"rimfall/network/fault"
)

// readRainfall reads a plain rainfall table: durations in minutes, then a column
// for each return period, headed by the number of years.
func (r *reader) readRainfall(name string, text []byte) Rain {
	file := r.path(name)
	rain := Rain{File: file}
	renames := r.settings.Columns["rainfall"]
	t := newTable("rainfall", file, text, &r.faults)
	if !t.readHeadings() {
		return rain
	}
	duration := slices.IndexFunc(t.headings, func(h string) bool { return strings.EqualFold(h, durationHeading(renames)) })
	if duration < 0 {
		r.faults.Add(file, t.headLine, 1, "missing column %q: durations in minutes", durationHeading(renames))
		return rain
	}
	periods, columns := t.periods(duration)
	if len(columns) == 0 {
		r.faults.Add(file, t.headLine, 1, "no return period: head a column of intensities with the number of years")
		return rain
	}
	before := len(r.faults)
	durations, values, places := t.intensities(duration, columns)
	if len(r.faults) > before {
		return rain
	}
	if len(durations) == 0 {
		r.faults.Add(file, t.headLine, 0, "empty table: no row below the headings")
		return rain
	}
	made, err := hydrology.NewTable(durations, periods, values)
	rain.Table = made
	t.judgeTable(err, duration, columns, places, &r.faults)
	return rain
}

func durationHeading(renames map[string]string) string {
	if h := renames["duration"]; h != "" {
		return h
	}
	return "duration"
}

// periods reads the headings that are return periods.
func (t *table) periods(duration int) (years []float64, columns []int) {
	for i, h := range t.headings {
		if i == duration || passedOver(h) || h == "" {
			continue
		}
		v, ok := parseNumber(h, t.comma)
		if !ok || v <= 0 {
			t.fault(i, "column %q is no return period: head it with the number of years, or with x_ or note to keep it out", h)
			continue
		}
		years, columns = append(years, v), append(columns, i)
	}
	return years, columns
}

// intensities reads the rows; places holds line and column of every cell.
func (t *table) intensities(duration int, columns []int) (durations []float64, values [][]float64, places [][]place) {
	for {
		record, err := t.Read()
		if err != nil {
			return durations, values, places
		}
		row, at := make([]float64, len(columns)), make([]place, len(t.headings))
		for i := range t.headings {
			at[i] = t.placeOf(i)
		}
		durations = append(durations, t.cell(record, duration, "duration"))
		for k, i := range columns {
			row[k] = t.cell(record, i, "intensity")
		}
		values, places = append(values, row), append(places, at)
	}
}

// cell reads a number that must be there.
func (t *table) cell(record []string, i int, what string) float64 {
	text := strings.TrimSpace(record[i])
	v, ok := parseNumber(text, t.comma)
	switch {
	case !ok:
		t.fault(i, "%s: %q is no number: %s", what, text, whyNoNumber(text, t.comma))
	case v <= 0:
		t.fault(i, "%s = %s: it must be over 0", what, text)
	}
	return v
}

// judgeTable gives the faults of the table as a whole their places.
func (t *table) judgeTable(err error, duration int, columns []int, places [][]place, faults *fault.List) {
	var bad hydrology.CellFaults
	if !errors.As(err, &bad) {
		return
	}
	for _, f := range bad {
		if f.Row < 0 || f.Row >= len(places) {
			faults.Add(t.file, t.headLine, 0, "%s", f.Text)
			continue
		}
		i := duration
		if f.Column >= 0 && f.Column < len(columns) {
			i = columns[f.Column]
		}
		at := places[f.Row][i]
		faults.Add(t.file, at.line, at.column, "%s", f.Text)
	}
}
