package data

import (
	"io"

	"rimfall/network/report"
	"rimfall/network/review"
)

// CarriesJSON writes what a network carries as one object.
func CarriesJSON(w io.Writer, c *review.CarriesReport, table string) error {
	s := newSink(w)
	s.asked(c.Subject)
	s.number("smallest_period", c.Smallest)
	s.number("largest_period", c.Largest)
	s.number("runs", float64(c.Runs))
	if table == "" || table == "pipes" {
		writeFlagged(s, "pipes", review.InFiles(review.CarriesPipeColumns), review.CarriesPipeFlags, c.PipeRows())
	}
	if table == "" || table == "structures" {
		writeFlagged(s, "structures", review.InFiles(review.CarriesStructureColumns), review.CarriesStructureFlags, c.StructureRows())
	}
	return s.close()
}

// CarriesCSV writes one of its tables.
func CarriesCSV(w io.Writer, c *review.CarriesReport, table string) error {
	s := newSink(w)
	if table == "structures" {
		columns := append(review.InFiles(review.CarriesStructureColumns), review.CarriesStructureFlags...)
		writeCSV(s, listed(columns, c.StructureRows()))
		return s.err
	}
	columns := append(review.InFiles(review.CarriesPipeColumns), review.CarriesPipeFlags...)
	writeCSV(s, listed(columns, c.PipeRows()))
	return s.err
}

// asked opens the object of an answer with the job that was asked.
func (s *sink) asked(of *review.Subject) {
	set := &of.Job.Settings
	s.add("{\n\"title\":")
	s.b = appendString(s.b, set.Title)
	s.add(",\n\"units\":")
	s.b = appendString(s.b, set.Units.Name)
	s.texts("cautions", report.Cautions)
	s.assumptions(of.Network)
}

// number adds a number to an open object.
func (s *sink) number(key string, v float64) {
	s.add(",\n\"" + key + "\":")
	s.b = appendNumber(s.b, v)
}

// close ends an object and writes what is left.
func (s *sink) close() error {
	s.add("\n}\n")
	s.flush(true)
	return s.err
}

// writeFlagged writes rows as an array of objects; flags are columns that are true or left out.
func writeFlagged[R any](s *sink, key string, columns, flags []report.Column[R], all []R) {
	s.add(",\n\"" + key + "\":[")
	for i := range all {
		if i > 0 {
			s.add(",")
		}
		s.add("\n")
		s.b = appendObject(s.b, columns, &all[i])
		s.b = s.b[:len(s.b)-1] // open the object again
		for _, f := range flags {
			if f.Value(&all[i]).OK {
				s.add(",\"" + f.Key + "\":true")
			}
		}
		s.add("}")
		s.flush(false)
	}
	s.add("\n]")
}
