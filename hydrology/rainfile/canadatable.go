package rainfile

import (
	"math"
	"strconv"

	"rimfall/hydrology"
)

// missing is what Table 1 prints for a maximum that is not known.
const missing = -99.9

// minutesOf reads a label such as "5 min" or "24 h", which canadaRow and canadaHours have let through.
func minutesOf(label cell) numberCell {
	words := canadaHours.FindStringSubmatch(label.text)
	count, err := strconv.Atoi(words[1])
	minutes := float64(count)
	if words[2] == "h" {
		minutes *= 60
	}
	return numberCell{cell: label, value: minutes, good: err == nil && count > 0}
}

// maxima reads Table 1: the line of durations, then a line a year.
func (c *canadian) maxima(line string, k int) {
	m := &c.file.Maxima
	if headings := canadaHours.FindAllStringIndex(line, -1); len(headings) > 1 {
		for _, place := range headings {
			m.Durations = append(m.Durations, minutesOf(cellAt(line, place[0], place[1], k)).value)
		}
		return
	}
	place := canadaYear.FindStringSubmatchIndex(line)
	if place == nil {
		return
	}
	label := cellAt(line, place[2], place[3], k)
	values := c.numbers(line, place[4], place[5], k)
	if len(values) != len(m.Durations) {
		c.fault(label.line, label.column, "%d numbers in the row; one for each of %d durations is wanted", len(values), len(m.Durations))
		return
	}
	year, _ := strconv.Atoi(label.text)
	m.Years = append(m.Years, year)
	depths, known := make([]float64, len(values)), make([]bool, len(values))
	for column, v := range values {
		depths[column], known[column] = v.value, v.good && v.value != missing
		if known[column] && v.value < 0 {
			c.fault(v.line, v.column, "a depth of %v mm; 0 or more is wanted, or %v where it is missing", v.value, missing)
		}
	}
	m.Depths, m.Known = append(m.Depths, depths), append(m.Known, known)
}

// finish makes the tables and the equation of what was gathered.
func (c *canadian) finish() {
	if len(c.rates) == 0 {
		c.fault(1, 0, "there is no Table 2b (rainfall rates) with rows in the text")
		return
	}
	c.file.tables[Estimate] = c.table(c.periods, c.rates)
	if len(c.file.tables[Estimate].Durations) == 0 {
		return
	}
	c.limitTable(Upper, +1)
	c.limitTable(Lower, -1)
	c.powerEquation()
}

// limitTable adds or takes off the ± rows. Limits need not make a table that falls with duration and rises with
// period; where they do not, there is none, and a notice says why.
func (c *canadian) limitTable(b Bound, sign float64) {
	if len(c.limits) != len(c.rates) {
		c.notice(c.rates[0].duration.line, 0, "%d rows of limits under %d rows of rates; there is no table of the %s limit",
			len(c.limits), len(c.rates), b)
		return
	}
	durations, years, values := plain(c.periods, c.rates)
	for row, limits := range c.limits {
		for column, limit := range limits.values {
			// The rates are printed to 0.1 mm/h, and so is what is added to them.
			values[row][column] = math.Round((values[row][column]+sign*limit.value)*10) / 10
		}
	}
	table, err := hydrology.NewTable(durations, years, values)
	if err != nil {
		c.notice(c.limits[0].duration.line, 0, "the %s limits are no table: %v", b, err)
		return
	}
	c.file.Confidence = confidenceCanada
	c.file.tables[b] = table
}

// powerEquation is Table 3 as an equation, valid over the durations of the table that it was fitted to.
func (c *canadian) powerEquation() {
	if len(c.a) == 0 || len(c.a) != len(c.years) || len(c.b) != len(c.years) {
		return
	}
	durations := c.file.tables[Estimate].Durations
	e := hydrology.Equation{
		Unit: hydrology.MillimetresPerHour, Hours: true,
		Shortest: durations[0], Longest: durations[len(durations)-1],
		Source: "Environment Canada, Table 3 of the station's short-duration text",
	}
	for k, year := range c.years {
		e.Constants = append(e.Constants, hydrology.Constants{
			Period: year.value,
			Terms:  []hydrology.Term{{Numerator: c.a[k].value, Exponent: -c.b[k].value}},
		})
	}
	c.file.PowerLaw = e
}
