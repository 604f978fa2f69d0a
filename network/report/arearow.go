package report

import (
	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/sweep"
)

// AreaRow is everything that is shown of one area for one storm.
type AreaRow struct {
	Area        *network.Area
	Structure   string
	Coefficient float64       // C times the frequency factor, not over 1
	Time        float64       // inlet time, min
	Counts      bool          // it has runoff, so that its time counts
	Given       network.Maybe // the inlet time that was given or worked out
}

// Areas makes the rows of all areas in a storm of a run.
func Areas(r *analysis.Result, storm *analysis.StormRun) []AreaRow {
	frequency := 1.0
	if storm.Storm.FrequencyFactor {
		frequency = hydrology.FrequencyFactor(storm.Storm.ReturnPeriod)
	}
	n := storm.Network
	rows := make([]AreaRow, len(n.Areas))
	for i := range rows {
		a := &n.Areas[i]
		c := sweep.Coefficient(a.C, frequency)
		rows[i] = AreaRow{a, n.Structures[a.Structure].ID, c, a.Time.Or(storm.Storm.MinimumTime), c > 0, a.Time}
	}
	return rows
}

// AreaColumns are the columns of the table of areas: what adds up at a structure.
var AreaColumns = []Column[AreaRow]{
	{"id", []string{"area"}, Text, func(r *AreaRow) Value { return T(r.Area.ID) }},
	{"structure", []string{"structure"}, Text, func(r *AreaRow) Value { return T(r.Structure) }},
	{"surface", []string{"surface"}, Text, func(r *AreaRow) Value { return T(r.Area.Surface) }},
	{"area", []string{"area"}, Area, func(r *AreaRow) Value { return N(r.Area.Area) }},
	{"c", []string{"C"}, Ratio, func(r *AreaRow) Value { return N(r.Coefficient) }},
	{"ca", []string{"C × area"}, Area, func(r *AreaRow) Value { return N(r.Coefficient * r.Area.Area) }},
	{"time", []string{"inlet", "time"}, Minutes, func(r *AreaRow) Value { return Value{Number: r.Time, OK: r.Counts} }},
	{"note", []string{"note"}, Text, func(r *AreaRow) Value { return T(r.Area.Note) }},
}
