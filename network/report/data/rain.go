package data

import (
	"io"

	"rimfall/hydrology/rainfile"
	"rimfall/network/rain"
)

// RainCSV writes the table of a rainfall file as a job reads it.
func RainCSV(w io.Writer, s *rain.Source) error { return s.WriteTable(w) }

// RainJSON writes a rainfall file as one object.
func RainJSON(w io.Writer, r *rain.Source) error {
	s := newSink(w)
	s.add("{")
	first := true
	text := func(key, value string) {
		if value == "" {
			return
		}
		if !first {
			s.add(",\n")
		}
		first = false
		s.add("\"" + key + "\":")
		s.b = appendString(s.b, value)
	}
	text("place", r.Place.String())
	text("latitude", r.Place.Latitude)
	text("longitude", r.Place.Longitude)
	if r.Kind != rainfile.Unknown {
		text("kind", r.Kind.String())
	}
	text("edition", r.Edition)
	text("series", rain.SeriesWord(r.Series))
	text("unit", string(r.Unit))
	text("bound", r.Bound.String())
	if r.Made {
		text("method", r.Method.String())
	}
	s.numbers(",\n\"periods\":", r.Table.Periods)
	s.numbers(",\n\"durations\":", r.Table.Durations)
	s.matrix(",\n\"intensity\":[", r.Table.Values)
	s.notices(r)
	s.fittedEquations(r)
	s.fittedDistributions(r)
	s.add("\n}\n")
	s.flush(true)
	return s.err
}

func (s *sink) numbers(before string, values []float64) {
	s.add(before + "[")
	for i, v := range values {
		if i > 0 {
			s.add(",")
		}
		s.b = appendNumber(s.b, v)
	}
	s.add("]")
	s.flush(false)
}

func (s *sink) matrix(before string, rows [][]float64) {
	s.add(before)
	for i, row := range rows {
		if i > 0 {
			s.add(",")
		}
		s.numbers("\n", row)
	}
	s.add("]")
}

func (s *sink) notices(r *rain.Source) {
	var texts []string
	for _, n := range r.Notices {
		texts = append(texts, n.Text)
	}
	if len(texts) > 0 {
		s.texts("notices", texts)
	}
}

// figure writes a key and its number after what stands already in an object.
func (s *sink) figure(key string, v float64) {
	s.add(",\"" + key + "\":")
	s.b = appendNumber(s.b, v)
}

// fittedEquations writes the equations with their errors, as shares of the table's intensities.
func (s *sink) fittedEquations(r *rain.Source) {
	if len(r.Equations) == 0 {
		return
	}
	s.add(",\n\"equations\":[")
	for i := range r.Equations {
		e := &r.Equations[i]
		if i > 0 {
			s.add(",")
		}
		s.add("\n{\"form\":")
		s.b = appendString(s.b, e.Form.String())
		if e.Why != "" {
			s.add(",\"why_not\":")
			s.b = appendString(s.b, e.Why)
			s.add("}")
			continue
		}
		s.figure("error_mean_square", e.RootMeanSquare)
		s.figure("error_largest", e.Largest)
		s.add(",\"constants\":[")
		for k, c := range e.Equation.Constants {
			if k > 0 {
				s.add(",")
			}
			s.add("{\"equation\":")
			s.b = appendString(s.b, c.String())
			if c.Period > 0 {
				s.figure("period", c.Period)
			}
			s.add("}")
		}
		s.matrix("],\"errors\":[", e.Errors)
		s.add("}")
	}
	s.add("]")
}

// fittedDistributions writes the distributions of annual maxima, depths in inches or mm.
func (s *sink) fittedDistributions(r *rain.Source) {
	if len(r.Distributions) == 0 {
		return
	}
	s.numbers(",\n\"distribution_periods\":", r.Periods)
	s.add(",\n\"distributions\":[")
	for i := range r.Distributions {
		d := &r.Distributions[i]
		if i > 0 {
			s.add(",")
		}
		s.add("\n{\"method\":")
		s.b = appendString(s.b, d.Method.String())
		s.figure("confidence", rain.Confidence)
		s.add(",\"durations\":[")
		for k := range d.Rows {
			if k > 0 {
				s.add(",")
			}
			s.distributionRow(&d.Rows[k])
		}
		s.add("]}")
	}
	s.add("]")
}

func (s *sink) distributionRow(row *rain.DistributionRow) {
	s.add("\n{\"duration\":")
	s.b = appendNumber(s.b, row.Duration)
	s.figure("years", float64(row.Years))
	if row.Why != "" {
		s.add(",\"why_not\":")
		s.b = appendString(s.b, row.Why)
		s.add("}")
		return
	}
	var depths, lower, upper []float64
	for _, l := range row.Depths {
		depths = append(depths, l.Depth)
		if l.HasLimits {
			lower, upper = append(lower, l.Lower), append(upper, l.Upper)
		}
	}
	s.numbers(",\"depths\":", depths)
	if len(lower) == len(depths) {
		s.numbers(",\"lower\":", lower)
		s.numbers(",\"upper\":", upper)
	}
	s.figure("kolmogorov_smirnov", row.KolmogorovSmirnov)
	s.figure("correlation", row.Correlation)
	s.figure("error_mean_square", row.RootMeanSquare)
	s.add("}")
}
