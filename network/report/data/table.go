package data

import (
	"io"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/finding"
	"rimfall/network/report"
)

// chunk is how many bytes gather before they are written.
const chunk = 1 << 16

// sink writes gathered bytes and keeps the first error.
type sink struct {
	w   io.Writer
	b   []byte
	err error
}

func newSink(w io.Writer) *sink { return &sink{w: w, b: make([]byte, 0, chunk+1<<13)} }

// flush writes when enough has gathered, or when it must.
func (s *sink) flush(must bool) {
	if len(s.b) < chunk && !must {
		return
	}
	if s.err == nil {
		_, s.err = s.w.Write(s.b)
	}
	s.b = s.b[:0]
}

func (s *sink) add(text string) { s.b = append(s.b, text...) }

// rows makes the rows of one table one after the other, so that a million of
// them never stand in memory together.
type rows[R any] struct {
	columns []report.Column[R]
	count   int
	at      func(i int) R
}

func pipes(r *analysis.Result, storm *analysis.StormRun) rows[report.PipeRow] {
	return rows[report.PipeRow]{report.PipeColumns, len(r.Network.Pipes), func(i int) report.PipeRow {
		return report.Pipe(r, storm, network.PipeIndex(i))
	}}
}

func structures(r *analysis.Result, storm *analysis.StormRun) rows[report.StructureRow] {
	return rows[report.StructureRow]{report.StructureColumns, len(r.Network.Structures), func(i int) report.StructureRow {
		return report.Structure(r, storm, network.StructureIndex(i))
	}}
}

func findings(r *analysis.Result) rows[finding.Finding] {
	return rows[finding.Finding]{report.FindingColumns, len(r.Findings), func(i int) finding.Finding { return r.Findings[i] }}
}

func areas(r *analysis.Result, storm *analysis.StormRun) rows[report.AreaRow] {
	all := report.Areas(r, storm)
	return rows[report.AreaRow]{report.AreaColumns, len(all), func(i int) report.AreaRow { return all[i] }}
}

// CSV writes one table: "pipes", "structures", "areas" or "findings", of the design storm.
func CSV(w io.Writer, r *analysis.Result, table string) error {
	s := newSink(w)
	switch table {
	case "structures":
		writeCSV(s, structures(r, &r.Design))
	case "areas":
		writeCSV(s, areas(r, &r.Design))
	case "findings":
		writeCSV(s, findings(r))
	default:
		writeCSV(s, pipes(r, &r.Design))
	}
	return s.err
}

func writeCSV[R any](s *sink, t rows[R]) {
	for i, c := range t.columns {
		if i > 0 {
			s.b = append(s.b, ',')
		}
		s.add(c.Key)
	}
	s.b = append(s.b, '\n')
	for i := range t.count {
		row := t.at(i)
		s.b = appendRecord(s.b, t.columns, &row)
		s.flush(false)
	}
	s.flush(true)
}
