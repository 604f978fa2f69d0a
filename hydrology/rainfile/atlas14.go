package rainfile

import (
	"regexp"
	"strings"

	"rimfall/hydrology"
)

// The head of an Atlas 14 point file, and the lines that structure it, by their own words.
var (
	unitLine    = regexp.MustCompile(`(?i)^point precipitation frequency estimates \(([^)]*)\)`)
	titleLine   = regexp.MustCompile(`(?i)^precipitation frequency estimates(.*)$`)
	periodsLine = regexp.MustCompile(`(?i)^(?:by duration for (ARI|AEP)\b.*|duration):?$`)
	footerLine  = regexp.MustCompile(`(?i)^(date/time|pyRunTime)`)
	headLine    = regexp.MustCompile(`^([A-Za-z][^:]*):\s*(.*)$`)
)

// block is one titled table of the file, still as it stands there.
type block struct {
	bound   Bound
	line    int // of the title, or of the heading where there is no title
	periods []cell
	annual  bool // headed by exceedance probabilities
	rows    []blockRow
}

type blockRow struct {
	label  cell
	values []cell
}

// atlas14 reads a point file: the head, then one table or three.
func (r *reader) atlas14() {
	r.file.Series, r.file.Confidence = hydrology.PartialDuration, 0
	var blocks []*block
	for k := range r.page.lines {
		cells := r.page.cells(k)
		if len(cells) == 0 {
			continue
		}
		first := cells[0]
		switch {
		case unitLine.MatchString(first.text):
			r.unitAndQuantity(unitLine.FindStringSubmatch(first.text)[1], first)
		case titleLine.MatchString(first.text):
			blocks = append(blocks, &block{bound: boundOf(first.text), line: first.line})
		case periodsLine.MatchString(first.text):
			blocks = r.headBlock(blocks, cells)
		case atlas14Row.MatchString(first.text):
			r.addRow(blocks, cells)
		case footerLine.MatchString(first.text):
		default:
			r.headOrStray(len(blocks) > 0, k, first)
		}
	}
	r.finishAtlas14(blocks)
}

func boundOf(title string) Bound {
	switch title = strings.ToUpper(title); {
	case strings.Contains(title, "UPPER"):
		return Upper
	case strings.Contains(title, "LOWER"):
		return Lower
	}
	return Estimate
}

// unitAndQuantity reads inches, inches/hour, millimeters or millimeters/hour.
func (r *reader) unitAndQuantity(text string, at cell) {
	length, _, perHour := strings.Cut(strings.ToLower(text), "/")
	r.file.PrintsDepths = !perHour
	switch strings.TrimSpace(length) {
	case "inches":
		r.file.Unit = hydrology.InchesPerHour
	case "millimeters":
		r.file.Unit = hydrology.MillimetresPerHour
	default:
		r.fault(at.line, at.column, "estimates in %q: inches, inches/hour, millimeters or millimeters/hour are wanted", text)
	}
}

// headBlock starts a table at its line of periods; a table without a title is the estimate.
func (r *reader) headBlock(blocks []*block, cells []cell) []*block {
	words := periodsLine.FindStringSubmatch(cells[0].text)
	if len(blocks) == 0 || blocks[len(blocks)-1].periods != nil {
		blocks = append(blocks, &block{line: cells[0].line})
	}
	b := blocks[len(blocks)-1]
	b.periods = cells[1:]
	b.annual = strings.EqualFold(words[1], "AEP")
	if b.annual {
		r.series(hydrology.AnnualMaximum, cells[0])
	}
	return blocks
}

func (r *reader) addRow(blocks []*block, cells []cell) {
	if len(blocks) == 0 || blocks[len(blocks)-1].periods == nil {
		r.fault(cells[0].line, cells[0].column, "a row of values stands above the line of return periods (by duration for ARI …)")
		return
	}
	b := blocks[len(blocks)-1]
	b.rows = append(b.rows, blockRow{cells[0], cells[1:]})
}

// series notes the kind of series; two lines that disagree are at fault.
func (r *reader) series(s hydrology.Series, at cell) {
	if r.file.SeriesStated && r.file.Series != s {
		r.fault(at.line, at.column, "this says the series is %s, where a line before says %s", s, r.file.Series)
	}
	r.file.Series, r.file.SeriesStated = s, true
}

// headOrStray reads a line of the head, such as "Station Name: PULASKI"; below the first table no such line is
// expected. The whole line is read, for a place's name has commas in it.
func (r *reader) headOrStray(inTables bool, line int, first cell) {
	if inTables {
		r.fault(first.line, first.column, "%q is no duration; rows such as 5-min:, 2-hr: or 10-day: are wanted", first.text)
		return
	}
	whole := strings.Trim(r.page.lines[line], "\"\t ,;")
	if strings.HasPrefix(strings.ToUpper(whole), "NOAA ATLAS") {
		r.file.Edition = whole
		return
	}
	words := headLine.FindStringSubmatch(whole)
	if words == nil {
		return
	}
	key, value := strings.ToLower(words[1]), words[2]
	if strings.HasPrefix(value, "None") {
		value = ""
	}
	r.headEntry(key, value, first)
}

func (r *reader) headEntry(key, value string, at cell) {
	place := &r.file.Place
	switch {
	case strings.HasPrefix(key, "location name"):
		place.Name = value
	case strings.HasPrefix(key, "station name"):
		place.Station = value
	case key == "latitude":
		place.Latitude = degrees(value)
	case key == "longitude":
		place.Longitude = degrees(value)
	case strings.HasPrefix(key, "elevation"):
		place.Elevation = value
	case strings.HasPrefix(key, "time series"):
		switch strings.ToLower(value) {
		case "partial duration":
			r.series(hydrology.PartialDuration, at)
		case "annual maximum":
			r.series(hydrology.AnnualMaximum, at)
		default:
			r.fault(at.line, at.column, "time series %q: Partial duration or Annual maximum is wanted", value)
		}
	case strings.HasPrefix(key, "data type"):
		r.checkQuantity(value, at)
	}
}

// degrees drops the degree sign: one character, or the word.
func degrees(text string) string {
	return strings.TrimSpace(strings.TrimSuffix(strings.TrimSuffix(text, "°"), "Degree"))
}

func (r *reader) checkQuantity(value string, at cell) {
	saysDepth := strings.Contains(strings.ToLower(value), "depth")
	if r.file.Unit != "" && saysDepth != r.file.PrintsDepths {
		r.fault(at.line, at.column, "data type %q does not go with the unit of the first line", value)
	}
}
