package data

import (
	"io"

	"rimfall/network/calculator"
	"rimfall/network/report"
)

// AnswerJSON writes one answer of the calculator as one object.
func AnswerJSON(w io.Writer, a *calculator.Answer) error {
	s := newSink(w)
	s.answer(report.AnswerRow{Answer: a})
	s.b = s.b[:len(s.b)-1] // open the object again
	s.texts("cautions", []string{report.Caution})
	s.add("}\n")
	s.flush(true)
	return s.err
}

// answer writes an answer as an object, with its notes where it has any.
func (s *sink) answer(row report.AnswerRow) {
	columns := plain(report.AnswerColumns)
	s.b = appendObject(s.b, columns, &row)
	if row.Answer == nil || len(row.Notes) == 0 {
		return
	}
	s.b = s.b[:len(s.b)-1] // open the object again
	s.texts("notes", row.Notes)
	s.add("}")
}

// AnswersJSON writes the answers of a list as one object with an array of rows; a row
// without an answer says why.
func AnswersJSON(w io.Writer, listed string, rows []report.AnswerRow) error {
	s := newSink(w)
	s.add("{\"list\":")
	s.b = appendString(s.b, listed)
	s.add(",\"rows\":[")
	for i, row := range rows {
		if i > 0 {
			s.add(",")
		}
		s.add("\n")
		if row.Answer == nil {
			s.add("{\"given\":")
			s.b = appendString(s.b, row.Given)
			s.add(",\"why\":")
			s.b = appendString(s.b, row.Why)
			s.add("}")
			continue
		}
		s.answer(row)
		s.flush(false)
	}
	s.add("\n]}\n")
	s.flush(true)
	return s.err
}

// AnswersCSV writes answers as a table, with the value of the list first and the reason
// where there is no answer last.
func AnswersCSV(w io.Writer, listed string, rows []report.AnswerRow) error {
	s := newSink(w)
	columns := plain(report.AnswerColumns)
	if listed != "" {
		columns = append([]report.Column[report.AnswerRow]{{Key: "given", Value: func(r *report.AnswerRow) report.Value { return report.T(r.Given) }}}, columns...)
		columns = append(columns, report.Column[report.AnswerRow]{Key: "why", Value: func(r *report.AnswerRow) report.Value { return report.T(r.Why) }})
	}
	writeCSV(s, list(columns, rows))
	return s.err
}

// RatingJSON writes the table of a section as one object.
func RatingJSON(w io.Writer, r *calculator.Rating) error {
	s := newSink(w)
	q := &r.Question
	s.add("{\"units\":")
	s.b = appendString(s.b, q.Units.Name)
	s.add(",\"shape\":")
	s.b = appendString(s.b, q.Conduit.Shape)
	s.texts("notes", r.Notes)
	writeArray(s, "rows", list(plain(report.RatingColumns), r.Rows))
	s.add("\n}\n")
	s.flush(true)
	return s.err
}

// RatingCSV writes the table of a section.
func RatingCSV(w io.Writer, r *calculator.Rating) error {
	s := newSink(w)
	writeCSV(s, list(plain(report.RatingColumns), r.Rows))
	return s.err
}

// plain takes the columns out of figures.
func plain[R any](figures []report.Figure[R]) []report.Column[R] {
	columns := make([]report.Column[R], len(figures))
	for i := range figures {
		columns[i] = figures[i].Column
	}
	return columns
}

func list[R any](columns []report.Column[R], all []R) rows[R] {
	return rows[R]{columns, len(all), func(i int) R { return all[i] }}
}
