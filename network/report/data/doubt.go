package data

import (
	"io"

	"rimfall/network"
	"rimfall/network/report"
	"rimfall/network/review"
)

// DoubtJSON writes how sure the results of a job are, as one object.
func DoubtJSON(w io.Writer, d *review.DoubtReport, table string) error {
	s := newSink(w)
	s.asked(d.Subject)
	s.number("return_period", d.Subject.Storm.ReturnPeriod)
	s.number("runs", float64(d.Options.Runs))
	s.number("seed", float64(d.Options.Seed))
	s.texts("drawn", d.Statement())
	if table == "" || table == "pipes" {
		objects(s, "pipes", d.PipeRows(), func(r *review.DoubtPipeRow) {
			s.member("id", report.T(r.ID))
			s.member("chance_over_capacity", report.M(r.OverCapacity))
			s.member("chance_surcharge", report.M(r.Surcharge))
			s.quantiles("depth_ratio", r.DepthRatio)
			s.quantiles("capacity_ratio", r.Load)
			s.correlations(&r.Matters)
		})
	}
	if table == "" || table == "structures" {
		objects(s, "structures", d.StructureRows(), func(r *review.DoubtStructureRow) {
			s.member("id", report.T(r.ID))
			s.member("chance_flooding", report.M(r.Flooding))
			s.member("chance_freeboard", report.M(r.Freeboard))
			s.quantiles("hgl", r.Level)
			s.correlations(&r.Matters)
		})
	}
	return s.close()
}

// DoubtCSV writes one of its tables.
func DoubtCSV(w io.Writer, d *review.DoubtReport, table string) error {
	s := newSink(w)
	if table == "structures" {
		columns := report.Pick(review.DoubtStructureColumns, keysOf(review.DoubtStructureColumns))
		writeCSV(s, listed(columns, d.StructureRows()))
		return s.err
	}
	writeCSV(s, listed(report.Pick(review.DoubtPipeColumns, keysOf(review.DoubtPipeColumns)), d.PipeRows()))
	return s.err
}

func keysOf[R any](columns []report.Column[R]) []string {
	var keys []string
	for _, c := range review.InFiles(columns) {
		keys = append(keys, c.Key)
	}
	return keys
}

// objects writes rows as an array of objects whose members are added one by one.
func objects[R any](s *sink, key string, all []R, members func(*R)) {
	s.add(",\n\"" + key + "\":[")
	for i := range all {
		if i > 0 {
			s.add(",")
		}
		s.add("\n{")
		members(&all[i])
		s.add("}")
		s.flush(false)
	}
	s.add("\n]")
}

// member adds a member to an open object, where there is a value.
func (s *sink) member(key string, v report.Value) {
	if !v.OK {
		return
	}
	s.key(key)
	if v.Text != "" {
		s.b = appendString(s.b, v.Text)
		return
	}
	s.b = appendNumber(s.b, v.Number)
}

// key adds a key, after a comma where it is not the first of its object.
func (s *sink) key(key string) {
	if s.b[len(s.b)-1] != '{' {
		s.add(",")
	}
	s.add("\"" + key + "\":")
}

func (s *sink) quantiles(key string, q review.Quantiles) {
	if !q.OK {
		return
	}
	s.key(key)
	s.add("{")
	s.member("p05", report.N(q.P05))
	s.member("p50", report.N(q.P50))
	s.member("p95", report.N(q.P95))
	s.add("}")
}

// correlations adds the rank correlations and the input that matters most.
func (s *sink) correlations(c *review.Correlations) {
	most, ok := c.Most()
	if !ok {
		return
	}
	s.member("matters_most", report.T(most.String()))
	s.key("rank_correlation")
	s.add("{")
	for i := range c {
		s.member(review.Inputs[i], report.M(network.Maybe(c[i])))
	}
	s.add("}")
}
