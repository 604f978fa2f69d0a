package hydrology

import (
	"fmt"
	"math"
	"slices"
	"strings"
)

// Heading and DurationColumn stand in a CellFault for what is not a value: the row of the return periods above
// the table, and the column of the durations beside it.
const (
	Heading        = -1
	DurationColumn = -1
)

// CellFault is one thing wrong with a table. Row counts from 0, or is Heading; Column counts from 0 in the order
// in which the columns were given, or is DurationColumn. Both −1 is the table as a whole.
type CellFault struct {
	Row, Column int
	Text        string
}

// CellFaults are all that is wrong with a table, from the heading down, each row from the left.
type CellFaults []CellFault

// Error prints every fault, one a line, rows and columns counted from 1.
func (faults CellFaults) Error() string {
	var lines []string
	for _, f := range faults {
		lines = append(lines, f.place()+f.Text)
	}
	return strings.Join(lines, "\n")
}

func (f CellFault) place() string {
	switch {
	case f.Row == Heading && f.Column == DurationColumn:
		return ""
	case f.Row == Heading:
		return fmt.Sprintf("period %d: ", f.Column+1)
	case f.Column == DurationColumn:
		return fmt.Sprintf("row %d, duration: ", f.Row+1)
	}
	return fmt.Sprintf("row %d, column %d: ", f.Row+1, f.Column+1)
}

// CheckTable lists everything wrong with a table: no rows or columns; a duration, period or intensity that is not
// a finite number greater than 0; durations that do not rise strictly; a period twice; a row too short or too
// long; an intensity that rises with duration or falls with return period. Equal neighbours are allowed, and
// columns may stand in any order. Nil where all is well.
func CheckTable(durations, periods []float64, values [][]float64) CellFaults {
	c := tableCheck{durations: durations, periods: periods, values: values, order: columnsByPeriod(periods)}
	c.order = slices.DeleteFunc(c.order, func(column int) bool { return !positive(periods[column]) })
	c.shape()
	c.headings()
	for row := range values {
		c.duration(row)
		c.row(row)
	}
	return c.faults
}

type tableCheck struct {
	durations, periods []float64
	values             [][]float64
	order              []int // columns by rising period; those without a lawful period left out
	faults             CellFaults
}

func (c *tableCheck) add(row, column int, format string, arguments ...any) {
	c.faults = append(c.faults, CellFault{row, column, fmt.Sprintf(format, arguments...)})
}

func positive(x float64) bool { return x > 0 && !math.IsInf(x, 1) }

func (c *tableCheck) shape() {
	if len(c.values) == 0 {
		c.add(Heading, DurationColumn, "the table has no rows; one row for each duration is wanted")
	}
	if len(c.periods) == 0 {
		c.add(Heading, DurationColumn, "the table has no return periods; one column for each is wanted")
	}
	if len(c.durations) != len(c.values) {
		c.add(Heading, DurationColumn, "%d durations stand beside %d rows", len(c.durations), len(c.values))
	}
}

func (c *tableCheck) headings() {
	first := map[float64]int{}
	for column, period := range c.periods {
		if !positive(period) {
			c.add(Heading, column, "return period %v: a number of years greater than 0 is wanted", period)
		} else if earlier, twice := first[period]; twice {
			c.add(Heading, column, "return period %v stands in column %d too", period, earlier+1)
		} else {
			first[period] = column
		}
	}
}

func (c *tableCheck) duration(row int) {
	if row >= len(c.durations) {
		return
	}
	d := c.durations[row]
	if !positive(d) {
		c.add(row, DurationColumn, "duration %v: minutes greater than 0 are wanted", d)
		return
	}
	if before, found := c.lastGoodDuration(row); found && d == before {
		c.add(row, DurationColumn, "duration %v min is repeated", d)
	} else if found && d < before {
		c.add(row, DurationColumn, "duration %v min stands below %v min; durations rise down the table", d, before)
	}
}

func (c *tableCheck) lastGoodDuration(row int) (minutes float64, found bool) {
	for row--; row >= 0; row-- {
		if positive(c.durations[row]) {
			return c.durations[row], true
		}
	}
	return 0, false
}

func (c *tableCheck) row(row int) {
	if have, want := len(c.values[row]), len(c.periods); have != want {
		c.add(row, min(have, want), "%d intensities where there are %d return periods", have, want)
	}
	for column, value := range c.values[row] {
		if !positive(value) {
			c.add(row, column, "intensity %v: a number greater than 0 is wanted", value)
			continue
		}
		c.risesWithDuration(row, column)
		c.fallsWithPeriod(row, column)
	}
}

func (c *tableCheck) value(row, column int) (value float64, ok bool) {
	if row < 0 || column >= len(c.values[row]) {
		return 0, false
	}
	return c.values[row][column], positive(c.values[row][column])
}

func (c *tableCheck) risesWithDuration(row, column int) {
	value := c.values[row][column]
	if above, ok := c.value(row-1, column); ok && value > above {
		c.add(row, column, "intensity rises with duration, from %.6g to %.6g; it stays or falls", above, value)
	}
}

func (c *tableCheck) fallsWithPeriod(row, column int) {
	if column >= len(c.periods) {
		return
	}
	for k, here := range c.order {
		if here != column || k == 0 {
			continue
		}
		shorter := c.order[k-1]
		if less, ok := c.value(row, shorter); ok && c.values[row][column] < less {
			c.add(row, column, "intensity falls with return period, from %.6g at %v years to %.6g at %v years; it stays or rises",
				less, c.periods[shorter], c.values[row][column], c.periods[column])
		}
	}
}
