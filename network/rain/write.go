package rain

import (
	"encoding/csv"
	"fmt"
	"io"
	"strconv"
	"strings"

	"rimfall/hydrology"
	"rimfall/hydrology/rainfile"
)

// tableDigits is how many digits of an intensity are written: far more than any
// table has, and so few that 5.424 is not written with what rounding left of it.
const tableDigits = 10

// WriteTable writes the table as a job reads it, with where it is from in comments.
func (s *Source) WriteTable(w io.Writer) error {
	var b strings.Builder
	for _, line := range s.comments() {
		fmt.Fprintf(&b, "# %s\n", strings.Join(strings.Fields(line), " "))
	}
	c := csv.NewWriter(&b)
	head := []string{"duration"}
	for _, p := range s.Table.Periods {
		head = append(head, figure(p))
	}
	_ = c.Write(head) // into memory
	for row, minutes := range s.Table.Durations {
		record := []string{figure(minutes)}
		for _, i := range s.Table.Values[row] {
			record = append(record, figure(i))
		}
		_ = c.Write(record)
	}
	c.Flush()
	_, err := io.WriteString(w, b.String())
	return err
}

func figure(v float64) string {
	short, _ := strconv.ParseFloat(strconv.FormatFloat(v, 'g', tableDigits, 64), 64)
	return strconv.FormatFloat(short, 'f', -1, 64)
}

// comments say where a table is from, and what a job has to be told with it.
func (s *Source) comments() []string {
	lines := []string{fmt.Sprintf("Intensities in %s by duration in minutes and return period in years.", s.Unit), s.Describe()}
	if s.Series == hydrology.AnnualMaximum {
		lines = append(lines, `Annual maxima: write series = "annual-maximum" in [storm].`)
	}
	return lines
}

// Describe says in one line what the table is and where it is from.
func (s *Source) Describe() string {
	if s.described != "" {
		return s.described
	}
	var parts []string
	for _, p := range []string{s.Place.String(), s.Kind.String(), s.Edition} {
		if p != "" {
			parts = append(parts, p)
		}
	}
	series := s.Series.String() + " series"
	if !s.SeriesStated {
		series = "taken as " + series
	}
	parts = append(parts, series, string(s.Unit))
	switch {
	case s.Made:
		parts = append(parts, s.Method.String())
	case s.Bound != rainfile.Estimate && s.Confidence > 0:
		parts = append(parts, fmt.Sprintf("%s bound of the %g %% interval", s.Bound, 100*s.Confidence))
	case s.Bound != rainfile.Estimate:
		parts = append(parts, s.Bound.String()+" bound")
	}
	return strings.Join(parts, " · ")
}

// SeriesWord is the series as job.toml writes it.
func SeriesWord(s hydrology.Series) string {
	if s == hydrology.AnnualMaximum {
		return "annual-maximum"
	}
	return "partial-duration"
}
