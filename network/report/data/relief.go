package data

import (
	"io"

	"rimfall/network/review"
)

// ReliefJSON writes which pipes are replaced or doubled, as one object.
func ReliefJSON(w io.Writer, r *review.ReliefReport) error {
	s := newSink(w)
	s.asked(r.Subject)
	s.number("return_period", r.Subject.Storm.ReturnPeriod)
	var words []string
	for _, l := range r.Options.Limits {
		words = append(words, l.String())
	}
	s.texts("limits", words)
	measure := "length"
	if r.Priced() {
		measure = "cost"
	}
	s.add(",\n\"measure\":\"" + measure + "\"")
	if r.Complete() {
		s.add(",\n\"complete\":true")
	} else {
		s.add(",\n\"complete\":false")
	}
	s.number("total", r.Total().First)
	writeArray(s, "broken", listed(review.SetAsideColumns, r.BrokenRows()))
	writeArray(s, "pipes", listed(review.InFiles(review.ReliefColumns), r.Rows()))
	writeArray(s, "systems", listed(review.InFiles(review.ReliefSystemColumns), r.SystemRows()))
	writeArray(s, "not_relieved", listed(review.SetAsideColumns, r.LeftRows()))
	return s.close()
}

// ReliefCSV writes the pipes that are replaced or doubled as a table.
func ReliefCSV(w io.Writer, r *review.ReliefReport) error {
	s := newSink(w)
	writeCSV(s, listed(review.InFiles(review.ReliefColumns), r.Rows()))
	return s.err
}
