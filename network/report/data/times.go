package data

import (
	"io"

	"rimfall/network/analysis"
	"rimfall/network/report"
)

// TimesCSV writes one table of the times of the design storm: "areas" or "structures".
func TimesCSV(w io.Writer, r *analysis.Result, table string) error {
	s := newSink(w)
	if table == "structures" {
		writeCSV(s, listed(report.BranchColumns, report.Branches(&r.Design)))
	} else {
		writeCSV(s, listed(report.LegColumns, report.Legs(&r.Design)))
	}
	return s.err
}

// TimesJSON writes the times of a run as one object: the steps of every area and what
// sets the time of every structure.
func TimesJSON(w io.Writer, r *analysis.Result, table string) error {
	s := newSink(w)
	s.add("{\n\"title\":")
	s.b = appendString(s.b, r.Job.Settings.Title)
	s.add(",\n\"units\":")
	s.b = appendString(s.b, r.Job.Settings.Units.Name)
	s.storm(&r.Design)
	s.rainfall(r.Job)
	s.times(&r.Design, table)
	if r.Check != nil {
		s.add(",\n\"check_storm\":{\"return_period\":")
		s.b = appendNumber(s.b, r.Check.Storm.ReturnPeriod)
		s.times(r.Check, table)
		s.add("}")
	}
	s.add("\n}\n")
	s.flush(true)
	return s.err
}

func (s *sink) times(run *analysis.StormRun, table string) {
	if table != "structures" {
		writeArray(s, "areas", listed(report.LegColumns, report.Legs(run)))
	}
	if rounds := report.Trials(run); table != "structures" && len(rounds) > 0 {
		writeArray(s, "rounds", listed(report.TrialColumns, rounds))
	}
	if table != "areas" {
		writeArray(s, "structures", listed(report.BranchColumns, report.Branches(run)))
	}
}
