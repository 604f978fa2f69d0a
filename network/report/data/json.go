package data

import (
	"io"

	"rimfall/network/analysis"
	"rimfall/network/report"
)

// JSON writes a run as one object. table narrows it to one of its arrays,
// "pipes", "structures", "areas" or "findings"; "" writes all.
func JSON(w io.Writer, r *analysis.Result, table string) error {
	s := newSink(w)
	set := &r.Job.Settings
	s.add("{\n\"title\":")
	s.b = appendString(s.b, set.Title)
	s.add(",\n\"units\":")
	s.b = appendString(s.b, set.Units.Name)
	s.storm(&r.Design)
	s.rainfall(r.Job)
	s.criteria(r)
	s.texts("cautions", report.Cautions)
	s.assumptions(r.Network)
	if table == "" || table == "pipes" {
		writeArray(s, "pipes", pipes(r, &r.Design))
	}
	if table == "" || table == "structures" {
		writeArray(s, "structures", structures(r, &r.Design))
	}
	if table == "" || table == "areas" {
		writeArray(s, "areas", areas(r, &r.Design))
	}
	if table == "" || table == "findings" {
		writeArray(s, "findings", findings(r))
	}
	if r.Check != nil && table != "findings" && table != "areas" {
		s.checkStorm(r, table)
	}
	s.add("\n}\n")
	s.flush(true)
	return s.err
}

func (s *sink) storm(run *analysis.StormRun) {
	s.add(",\n\"storm\":{\"return_period\":")
	s.b = appendNumber(s.b, run.Storm.ReturnPeriod)
	s.add(",\"minimum_time\":")
	s.b = appendNumber(s.b, run.Storm.MinimumTime)
	s.add(",\"uplift\":")
	s.b = appendNumber(s.b, run.Storm.Uplift)
	s.add("}")
}

// criteria names the set that the findings were judged by.
func (s *sink) criteria(r *analysis.Result) {
	c := &r.Job.Settings.Criteria
	if c.File == "" {
		return
	}
	s.add(",\n\"criteria\":{\"title\":")
	s.b = appendString(s.b, c.Title)
	s.add(",\"set\":")
	s.b = appendString(s.b, c.File)
	s.add("}")
}

func (s *sink) texts(key string, texts []string) {
	s.add(",\n\"" + key + "\":[")
	for i, t := range texts {
		if i > 0 {
			s.add(",")
		}
		s.b = appendString(s.b, t)
	}
	s.add("]")
}

func (s *sink) checkStorm(r *analysis.Result, table string) {
	s.add(",\n\"check_storm\":{\"return_period\":")
	s.b = appendNumber(s.b, r.Check.Storm.ReturnPeriod)
	if table != "structures" {
		writeArray(s, "pipes", pipes(r, r.Check))
	}
	if table != "pipes" {
		writeArray(s, "structures", structures(r, r.Check))
	}
	s.add("}")
}

// writeArray writes the rows of a table as an array, an object a line.
func writeArray[R any](s *sink, key string, t rows[R]) {
	s.add(",\n\"" + key + "\":[")
	for i := range t.count {
		if i > 0 {
			s.add(",")
		}
		s.add("\n")
		row := t.at(i)
		s.b = appendObject(s.b, t.columns, &row)
		s.flush(false)
	}
	s.add("\n]")
}
