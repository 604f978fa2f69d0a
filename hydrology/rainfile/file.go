package rainfile

import (
	"cmp"
	"fmt"
	"slices"
	"strings"

	"rimfall/hydrology"
)

// Kind is what a file was recognised as.
type Kind int8

const (
	// Unknown: nothing that the package reads.
	Unknown Kind = iota
	// Atlas14 is a point file of NOAA Atlas 14.
	Atlas14
	// Canada is a short-duration text of Environment and Climate Change Canada.
	Canada
	// OwnTable is a CSV table headed duration and return periods.
	OwnTable
	// OwnMaxima is a CSV table headed year and durations: the largest depth of each year.
	OwnMaxima
)

// String names the kind in words.
func (k Kind) String() string {
	return [...]string{
		"unknown", "NOAA Atlas 14 point file", "Environment Canada short-duration text", "table of intensities", "table of annual maxima",
	}[k]
}

// Bound says which of a file's tables is meant.
type Bound int8

const (
	// Estimate is the table itself.
	Estimate Bound = iota
	// Upper is the upper limit of the confidence interval.
	Upper
	// Lower is its lower limit.
	Lower
)

// String is the word that a job uses: estimate, upper, lower.
func (b Bound) String() string { return [...]string{"estimate", "upper", "lower"}[b] }

// Place is where the rain was measured, in the file's own words; empty where it says none.
type Place struct {
	Name, Station, Latitude, Longitude, Elevation string
}

// String is the name, else the station, else the coordinates.
func (p Place) String() string {
	switch {
	case p.Name != "":
		return p.Name
	case p.Station != "":
		return p.Station
	case p.Latitude != "" || p.Longitude != "":
		return p.Latitude + ", " + p.Longitude
	}
	return ""
}

// File is what a rainfall file says.
type File struct {
	Kind         Kind
	Edition      string // of the publication, as printed
	Place        Place
	Series       hydrology.Series
	SeriesStated bool
	Unit         hydrology.IntensityUnit // in/h or mm/h, of every table
	PrintsDepths bool                    // the file's cells were depths; the tables are intensities all the same
	Confidence   float64                 // of the interval between lower and upper table: 0.90, 0.95; 0 is none
	Maxima       Maxima
	PowerLaw     hydrology.Equation // fitted by the publisher; no constants where there is none
	Notices      []Fault            // not wrong, but worth knowing

	tables [3]hydrology.Table // by Bound; no rows where the file has none
}

// Table gives the intensities of a bound; not ok where the file has none.
func (f File) Table(b Bound) (hydrology.Table, bool) {
	return f.tables[b], len(f.tables[b].Durations) > 0
}

// Maxima are the largest depths of each year.
type Maxima struct {
	Years     []int
	Durations []float64 // minutes
	// Depths[year][duration] in inches or mm, to go with the file's unit. A missing one is not Known.
	Depths [][]float64
	Known  [][]bool
}

// Of gives the known maxima of one duration, in order of the years.
func (m Maxima) Of(duration int) []float64 {
	var depths []float64
	for year := range m.Years {
		if m.Known[year][duration] {
			depths = append(depths, m.Depths[year][duration])
		}
	}
	return depths
}

// Fault is one thing wrong in a file. Line and Column count from 1, columns in characters; 0 is the whole file or
// the whole line.
type Fault struct {
	Line, Column int
	Text         string
}

// Faults are all that is wrong with a file, in order of their places.
type Faults []Fault

// Error prints every fault, one a line.
func (faults Faults) Error() string {
	var lines []string
	for _, f := range faults {
		lines = append(lines, fmt.Sprintf("%d:%d: %s", f.Line, f.Column, f.Text))
	}
	return strings.Join(lines, "\n")
}

// Options say what a file leaves out.
type Options struct {
	// Unit is taken where the file does not state one: in/h, or mm/h. Depths are then inches or mm. Where it is
	// empty too, such a file is at fault.
	Unit hydrology.IntensityUnit
}

// Read recognises a file and reads it. Where there are faults, the File has only what was read before them.
func Read(content []byte, o Options) (File, Faults) {
	page := newPage(content)
	r := reader{page: page, options: o}
	switch r.file.Kind = page.recognise(); r.file.Kind {
	case Atlas14:
		r.atlas14()
	case Canada:
		r.canada()
	case OwnTable:
		r.ownTable()
	case OwnMaxima:
		r.ownMaxima()
	default:
		r.fault(1, 0, "%s", page.refusal())
	}
	slices.SortStableFunc(r.faults, func(a, b Fault) int {
		return cmp.Or(cmp.Compare(a.Line, b.Line), cmp.Compare(a.Column, b.Column))
	})
	return r.file, r.faults
}

// reader goes through a page and gathers the file and its faults.
type reader struct {
	page    page
	options Options
	file    File
	faults  Faults
}

func (r *reader) fault(line, column int, format string, arguments ...any) {
	r.faults = append(r.faults, Fault{line, column, fmt.Sprintf(format, arguments...)})
}

func (r *reader) notice(line, column int, format string, arguments ...any) {
	r.file.Notices = append(r.file.Notices, Fault{line, column, fmt.Sprintf(format, arguments...)})
}

// unitOrOption settles the unit of a file that does not state one.
func (r *reader) unitOrOption() {
	if r.file.Unit != "" {
		return
	}
	r.file.Unit = r.options.Unit
	if r.file.Unit != hydrology.InchesPerHour && r.file.Unit != hydrology.MillimetresPerHour {
		r.fault(1, 0, "the file does not say its unit; in/h or mm/h is to be given beside it")
	}
}
