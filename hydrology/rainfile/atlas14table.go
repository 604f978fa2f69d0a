package rainfile

import (
	"strconv"
	"strings"

	"rimfall/hydrology"
)

// lastRow is the longest duration that the server sends; a file that ends before it was cut off.
const lastRow = "60-day"

// confidence14 is that of the interval between the bounds, by their titles.
const confidence14 = 0.90

// finishAtlas14 turns the blocks into tables of intensities.
func (r *reader) finishAtlas14(blocks []*block) {
	r.guessQuantity(blocks)
	r.unitOrOption()
	if len(blocks) == 0 {
		r.fault(1, 0, "there is no table in the file; a line \"by duration for ARI (years):\" and rows under it are wanted")
	}
	seen := map[Bound]int{}
	for _, b := range blocks {
		if before, twice := seen[b.bound]; twice {
			r.fault(b.line, 1, "a second table of the %s; the first is in line %d", b.bound, before)
			continue
		}
		seen[b.bound] = b.line
		r.finishBlock(b)
	}
}

func (r *reader) finishBlock(b *block) {
	if len(b.rows) == 0 {
		r.fault(b.line, 1, "the table of the %s has no rows", b.bound)
		return
	}
	if end := b.rows[len(b.rows)-1].label; !strings.HasPrefix(end.text, lastRow) {
		r.notice(end.line, end.column, "the table of the %s ends at %s; the server sends rows to %s", b.bound, strings.TrimSuffix(end.text, ":"), lastRow)
	}
	if b.bound != Estimate {
		r.file.Confidence = confidence14
	}
	r.file.tables[b.bound] = r.table(r.periodsOf(b), r.rowsOf(b))
}

// guessQuantity settles a file whose head was replaced: depths rise with duration, intensities fall.
func (r *reader) guessQuantity(blocks []*block) {
	if r.file.Unit != "" || len(blocks) == 0 || len(blocks[0].rows) < 2 {
		return
	}
	rows := blocks[0].rows
	if len(rows[0].values) == 0 || len(rows[len(rows)-1].values) == 0 {
		return
	}
	first, ok1 := r.page.number(rows[0].values[0].text)
	last, ok2 := r.page.number(rows[len(rows)-1].values[0].text)
	if !ok1 || !ok2 {
		return
	}
	r.file.PrintsDepths = last > first
	word := "intensities, for they fall"
	if r.file.PrintsDepths {
		word = "depths, for they rise"
	}
	r.notice(blocks[0].line, 0, "the head of the file is lost; the values are taken as %s with duration", word)
}

// periodsOf reads the return periods: years, or exceedance probabilities such as '1/25.
func (r *reader) periodsOf(b *block) []numberCell {
	var periods []numberCell
	for _, c := range b.periods {
		text := strings.TrimSpace(strings.TrimLeft(c.text, "'’"))
		if b.annual {
			fraction, found := strings.CutPrefix(text, "1/")
			if !found {
				r.fault(c.line, c.column, "%q is no exceedance probability; '1/25 and the like are wanted", c.text)
				fraction = "0"
			}
			text = fraction
		}
		periods = append(periods, r.numberIn(cell{text, c.line, c.column}))
	}
	return periods
}

// rowsOf reads the rows, as intensities. A row of intensities with a 0 in it is left out: the server prints metric
// intensities in whole mm/h, and 0 is then less than a half, not none.
func (r *reader) rowsOf(b *block) []tableRow {
	var rows []tableRow
	for _, given := range b.rows {
		row := tableRow{duration: r.duration(given.label)}
		zeros := 0
		for _, c := range given.values {
			value := r.numberIn(c)
			value.good = value.good && row.duration.good
			if r.file.PrintsDepths {
				value.value *= 60 / row.duration.value
			} else if value.value == 0 && value.good {
				zeros++
			}
			row.values = append(row.values, value)
		}
		if zeros > 0 {
			r.notice(given.label.line, given.label.column, "%s is left out: intensities that print as 0 are no intensities",
				strings.TrimSuffix(given.label.text, ":"))
			continue
		}
		rows = append(rows, row)
	}
	return rows
}

// duration reads 5-min:, 2-hr: or 10-day: into minutes.
func (r *reader) duration(label cell) numberCell {
	words := atlas14Row.FindStringSubmatch(label.text)
	count, err := strconv.Atoi(words[1])
	if err != nil || count == 0 {
		r.fault(label.line, label.column, "%q is no duration", label.text)
		return numberCell{cell: label}
	}
	minutes := map[string]float64{"min": 1, "hr": 60, "day": hydrology.MinutesPerDay}[strings.ToLower(words[2])]
	return numberCell{cell: label, value: float64(count) * minutes, good: true}
}
