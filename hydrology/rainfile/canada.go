package rainfile

import (
	"regexp"
	"strings"

	"rimfall/hydrology"
)

// confidenceCanada is that of the limits in Table 2b, by its title.
const confidenceCanada = 0.95

var (
	canadaSection  = regexp.MustCompile(`^\s*Table (\d+[a-z]?) ?:`)
	canadaStation  = regexp.MustCompile(`^ ?(\S.*?)\s{2,}([A-Z]{2})\s+(\S+)\s*$`)
	canadaPosition = regexp.MustCompile(`Latitude:\s*(\d+\s+\d+'[NS])\s+Longitude:\s*(\d+\s+\d+'[EW])\s+Elevation/Altitude:\s*(-?[\d.]+)`)
	canadaEdition  = regexp.MustCompile(`^\s*(\d{4}/\d{2}/\d{2})\s*$`)
	canadaPeriods  = regexp.MustCompile(`^\s*(?:Duration/|Statistics/)\S*((?:\s+\d+)+)`)
	canadaRow      = regexp.MustCompile(`^\s*(\d+ (?:min|h))\s+(\S.*)$`)
	canadaLimits   = regexp.MustCompile(`^\s*\+/-`)
	canadaYear     = regexp.MustCompile(`^\s*(\d{4})\s+(\S.*)$`)
	canadaConstant = regexp.MustCompile(`^.*\((A|B)\)\s*(.*)$`)
	canadaHours    = regexp.MustCompile(`(\d+) (min|h)\b`)
)

// canadian gathers the tables of the text while its lines go by.
type canadian struct {
	*reader
	section string
	periods []numberCell
	years   []numberCell // periods of Table 3
	rates   []tableRow   // Table 2b
	limits  []tableRow   // the ± rows under them
	a, b    []numberCell // Table 3
}

// canada reads the short-duration text: fixed width and bilingual. The table of intensities is Table 2b, the rates
// in mm/h; Table 3 is a power law fitted to it, which may lie 12 % above it at five minutes, and is given apart.
func (r *reader) canada() {
	r.file.Unit, r.file.PrintsDepths = hydrology.MillimetresPerHour, false
	r.file.Series, r.file.SeriesStated = hydrology.AnnualMaximum, true // Table 1 and its title
	c := canadian{reader: r}
	for k, line := range r.page.lines {
		if words := canadaSection.FindStringSubmatch(line); words != nil {
			c.section = words[1]
			continue
		}
		switch c.section {
		case "":
			c.head(line)
		case "1":
			c.maxima(line, k)
		case "2b":
			c.rate(line, k)
		case "3":
			c.powerLaw(line, k)
		}
	}
	c.finish()
}

func (c *canadian) head(line string) {
	place := &c.file.Place
	if words := canadaPosition.FindStringSubmatch(line); words != nil {
		place.Latitude, place.Longitude, place.Elevation = words[1], words[2], words[3]+" m"
	} else if words := canadaEdition.FindStringSubmatch(line); words != nil {
		c.file.Edition = words[1]
	} else if words := canadaStation.FindStringSubmatch(line); words != nil {
		place.Name, place.Station = words[1]+", "+words[2], words[3]
	}
}

// rate reads a row of Table 2b, or the row of ± limits under it. The last number of each is the count of years.
func (c *canadian) rate(line string, k int) {
	if place := canadaPeriods.FindStringSubmatchIndex(line); place != nil {
		c.periods = c.numbers(line, place[2], place[3], k)
		return
	}
	if place := canadaRow.FindStringSubmatchIndex(line); place != nil {
		label := cellAt(line, place[2], place[3], k)
		values := c.withoutCount(c.numbers(line, place[4], place[5], k), label)
		c.rates = append(c.rates, tableRow{minutesOf(label), values})
		return
	}
	if canadaLimits.MatchString(line) && len(c.rates) > 0 {
		start := strings.Index(line, "+/-")
		// A limit may touch the next column's sign: the sign parts the numbers, blanks or not.
		values := c.numbers(strings.ReplaceAll(line, "+/-", "   "), start, len(line), k)
		above := c.rates[len(c.rates)-1].duration
		c.limits = append(c.limits, tableRow{above, c.withoutCount(values, cellAt(line, start, len(line), k))})
	}
}

// withoutCount drops the count of years behind the values.
func (c *canadian) withoutCount(values []numberCell, label cell) []numberCell {
	if len(values) != len(c.periods)+1 {
		c.fault(label.line, label.column, "%d numbers in the row; one for each of %d return periods and the count of years are wanted",
			len(values), len(c.periods))
		return nil
	}
	return values[:len(values)-1]
}

// powerLaw reads Table 3, R = A·T^B with T in hours.
func (c *canadian) powerLaw(line string, k int) {
	if place := canadaPeriods.FindStringSubmatchIndex(line); place != nil {
		c.years = c.numbers(line, place[2], place[3], k)
	} else if place := canadaConstant.FindStringSubmatchIndex(line); place != nil {
		values := c.numbers(line, place[4], place[5], k)
		if line[place[2]:place[3]] == "A" {
			c.a = values
		} else {
			c.b = values
		}
	}
}

// numbers reads the numbers of a stretch of a line, parted by blanks.
func (c *canadian) numbers(line string, start, end, k int) []numberCell {
	var numbers []numberCell
	for start < end {
		blanks := len(line[start:end]) - len(strings.TrimLeft(line[start:end], " \t"))
		start += blanks
		word, _, _ := strings.Cut(strings.ReplaceAll(line[start:end], "\t", " "), " ")
		if word == "" {
			break
		}
		numbers = append(numbers, c.numberIn(cellAt(line, start, start+len(word), k)))
		start += len(word)
	}
	return numbers
}

func cellAt(line string, start, end, k int) cell {
	return cell{line[start:end], k + 1, len([]rune(line[:start])) + 1}
}
