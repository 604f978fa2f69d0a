package rainfile

import (
	"math"
	"strconv"
	"strings"
)

// ownRows gives the lines that are neither blank nor comment, as cells: the heading, and the rows under it.
func (r *reader) ownRows() (headings []cell, rows [][]cell) {
	for k, line := range r.page.lines {
		if blankOrComment(line) {
			continue
		}
		cells := r.page.cells(k)
		if headings == nil {
			headings = cells
			continue
		}
		rows = append(rows, cells)
	}
	return headings, rows
}

// ownColumns sorts the headings: the one named key, and those with a number. Headings that start with x_ or note
// are the user's own; any other is at fault.
func (r *reader) ownColumns(key string, headings []cell) (keyColumn int, columns []int, numbers []numberCell) {
	for k, h := range headings {
		word := strings.ToLower(h.text)
		switch {
		case word == key:
			keyColumn = k
		case strings.HasPrefix(word, "x_") || strings.HasPrefix(word, "note"):
		default:
			columns = append(columns, k)
			numbers = append(numbers, r.numberIn(h))
		}
	}
	return keyColumn, columns, numbers
}

// cellOf is the cell of a row in a column; an empty one at the row's first cell where the row is too short.
func cellOf(row []cell, column int) cell {
	if column < len(row) {
		return row[column]
	}
	return cell{line: row[0].line, column: row[0].column}
}

// ownTable reads a table headed duration (minutes) and return periods (years).
func (r *reader) ownTable() {
	r.unitOrOption()
	headings, given := r.ownRows()
	key, columns, periods := r.ownColumns("duration", headings)
	var rows []tableRow
	for _, cells := range given {
		row := tableRow{duration: r.numberIn(cellOf(cells, key))}
		for _, column := range columns {
			row.values = append(row.values, r.numberIn(cellOf(cells, column)))
		}
		rows = append(rows, row)
	}
	r.file.tables[Estimate] = r.table(periods, rows)
}

// ownMaxima reads a table headed year and durations (minutes): the largest depth of each year, in inches or mm. A
// blank cell is a maximum that is not known.
func (r *reader) ownMaxima() {
	r.unitOrOption()
	headings, given := r.ownRows()
	key, columns, durations := r.ownColumns("year", headings)
	m := &r.file.Maxima
	for _, d := range durations {
		if d.good && !(d.value > 0) {
			r.fault(d.line, d.column, "duration %v: minutes greater than 0 are wanted", d.value)
		}
		m.Durations = append(m.Durations, d.value)
	}
	years := map[int]int{}
	for _, cells := range given {
		year, ok := r.year(cellOf(cells, key), years)
		if !ok {
			continue
		}
		m.Years = append(m.Years, year)
		depths, known := r.depths(cells, columns)
		m.Depths, m.Known = append(m.Depths, depths), append(m.Known, known)
	}
	if len(m.Years) == 0 || len(m.Durations) == 0 {
		r.fault(1, 0, "there are no annual maxima; a heading such as year,5,10,15 and a row a year are wanted")
	}
}

func (r *reader) year(c cell, seen map[int]int) (year int, ok bool) {
	year, err := strconv.Atoi(c.text)
	if err != nil {
		r.fault(c.line, c.column, "%q is no year", c.text)
		return 0, false
	}
	if before, twice := seen[year]; twice {
		r.fault(c.line, c.column, "year %d stands in line %d too", year, before)
		return 0, false
	}
	seen[year] = c.line
	return year, true
}

func (r *reader) depths(cells []cell, columns []int) (depths []float64, known []bool) {
	for _, column := range columns {
		c := cellOf(cells, column)
		if column >= len(cells) || c.text == "" {
			depths, known = append(depths, math.NaN()), append(known, false)
			continue
		}
		v := r.numberIn(c)
		if v.good && v.value < 0 {
			r.fault(c.line, c.column, "depth %v: 0 or more is wanted, or a blank where it is not known", v.value)
		}
		depths, known = append(depths, v.value), append(known, v.good)
	}
	return depths, known
}
