package data

import (
	"io"

	"rimfall/network/report"
	"rimfall/network/review"
)

// HeadroomJSON writes how much more may be connected where, as one object.
func HeadroomJSON(w io.Writer, h *review.HeadroomReport) error {
	s := newSink(w)
	s.asked(h.Subject)
	s.number("return_period", h.Subject.Storm.ReturnPeriod)
	s.number("c", h.Options.C)
	s.number("time", h.Options.Time)
	var words []string
	for _, l := range h.Options.Limits {
		words = append(words, l.String())
	}
	s.texts("limits", words)
	writeArray(s, "set_aside", listed(review.SetAsideColumns, h.SetAsideRows()))
	s.add(",\n\"structures\":[")
	columns := review.InFiles(review.HeadroomColumns)
	for i, row := range h.Rows() {
		if i > 0 {
			s.add(",")
		}
		s.add("\n")
		s.b = appendObject(s.b, columns, &row)
		s.b = s.b[:len(s.b)-1] // open the object again
		s.governs("governs", h, &row.Area)
		s.governs("governs_flow", h, &row.Flow)
		s.add("}")
		s.flush(false)
	}
	s.add("\n]")
	return s.close()
}

// governs adds the place that governs an amount, where there is one, to an open object.
func (s *sink) governs(key string, h *review.HeadroomReport, a *review.Amount) {
	if !a.OK {
		return
	}
	s.add(",\"" + key + "\":{\"id\":")
	s.b = appendString(s.b, h.Name(a.Governs))
	s.add(",\"rule\":")
	s.b = appendString(s.b, a.Governs.Limit.Rule())
	s.add("}")
}

// HeadroomCSV writes the structures as a table.
func HeadroomCSV(w io.Writer, h *review.HeadroomReport) error {
	s := newSink(w)
	columns := review.InFiles(review.HeadroomColumns)
	for _, c := range []struct {
		key string
		of  func(*review.HeadroomRow) *review.Amount
	}{{"governs", func(r *review.HeadroomRow) *review.Amount { return &r.Area }}, {"governs_flow", func(r *review.HeadroomRow) *review.Amount { return &r.Flow }}} {
		columns = append(columns,
			governsColumn(c.key+"_id", c.of, func(p review.Place) string { return h.Name(p) }),
			governsColumn(c.key+"_rule", c.of, func(p review.Place) string { return p.Limit.Rule() }))
	}
	writeCSV(s, listed(columns, h.Rows()))
	return s.err
}

func governsColumn(key string, of func(*review.HeadroomRow) *review.Amount, word func(review.Place) string) report.Column[review.HeadroomRow] {
	return report.Column[review.HeadroomRow]{Key: key, Value: func(r *review.HeadroomRow) report.Value {
		if a := of(r); a.OK {
			return report.T(word(a.Governs))
		}
		return report.Value{}
	}}
}
