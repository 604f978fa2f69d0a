package data

import (
	"io"

	"rimfall/network/analysis"
	"rimfall/network/report"
)

// ScheduleCSV writes one table of the schedule: "pipes", "structures" or "quantities".
func ScheduleCSV(w io.Writer, r *analysis.Result, table string) error {
	s := newSink(w)
	switch table {
	case "structures":
		writeCSV(s, listed(report.StructureScheduleColumns, report.StructureSchedule(r)))
	case "quantities":
		writeCSV(s, listed(report.QuantityColumns, report.Quantities(r)))
	default:
		writeCSV(s, listed(report.ScheduleColumns, report.Schedule(r)))
	}
	return s.err
}

// listed are rows that stand in memory.
func listed[R any](columns []report.Column[R], all []R) rows[R] {
	return rows[R]{columns, len(all), func(i int) R { return all[i] }}
}
