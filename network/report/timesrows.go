package report

import (
	"strings"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/times"
)

// LegRow is one step of an area's time: a leg of its flow path, or the whole time
// where it is given or assumed.
type LegRow struct {
	Area, Structure string
	Leg             int // from 1; 0 where there is no path
	What            string
	Step            *hydrology.Step // nil where there is no path
	Minutes         float64
	Total           network.Maybe // of the path, on its last row
	Source          string
}

// LegColumns are the columns of the steps of all areas.
var LegColumns = []Column[LegRow]{
	{"area", []string{"area"}, Text, func(r *LegRow) Value { return T(r.Area) }},
	{"structure", []string{"structure"}, Text, func(r *LegRow) Value { return T(r.Structure) }},
	{"leg", []string{"leg"}, Count, func(r *LegRow) Value { return Value{Number: float64(r.Leg), OK: r.Leg > 0} }},
	{"what", []string{"kind"}, Text, func(r *LegRow) Value { return T(r.What) }},
	{"formula", []string{"formula"}, Text, func(r *LegRow) Value { return r.text(func(s *hydrology.Step) string { return s.Formula }) }},
	{"working", []string{"with numbers"}, Text, func(r *LegRow) Value { return r.text(func(s *hydrology.Step) string { return s.Working }) }},
	{"length", []string{"length"}, Length, func(r *LegRow) Value {
		return r.number(func(s *hydrology.Step) float64 { return s.Leg.Length })
	}},
	{"velocity", []string{"velocity"}, Velocity, func(r *LegRow) Value {
		return r.number(func(s *hydrology.Step) float64 { return s.Velocity })
	}},
	{"minutes", []string{"time"}, Minutes, func(r *LegRow) Value { return N(r.Minutes) }},
	{"total", []string{"time of", "the path"}, Minutes, func(r *LegRow) Value { return M(r.Total) }},
	{"source", nil, Text, func(r *LegRow) Value { return T(r.Source) }},
	{"limits", nil, Text, func(r *LegRow) Value { return r.text(breaches) }},
}

func (r *LegRow) text(of func(*hydrology.Step) string) Value {
	if r.Step == nil {
		return Value{}
	}
	return T(of(r.Step))
}

func (r *LegRow) number(of func(*hydrology.Step) float64) Value {
	if r.Step == nil {
		return Value{}
	}
	return N(of(r.Step))
}

// breaches words the limits that a step is outside of.
func breaches(s *hydrology.Step) string {
	var all []string
	for _, b := range s.Breaches {
		all = append(all, b.Text)
	}
	return strings.Join(all, "; ")
}

// Legs lists the steps of every area in one storm of a run, in the order of areas.csv.
func Legs(run *analysis.StormRun) []LegRow {
	n := run.Network
	walked := map[network.AreaIndex]*times.Walked{}
	for i := range run.Paths {
		walked[run.Paths[i].Path.Area] = &run.Paths[i]
	}
	var rows []LegRow
	for i := range n.Areas {
		a := &n.Areas[i]
		row := LegRow{Area: a.ID, Structure: n.Structures[a.Structure].ID}
		w := walked[network.AreaIndex(i)]
		switch {
		case w != nil && w.Used:
			rows = append(rows, pathRows(row, w)...)
		case a.Time.OK:
			row.What, row.Minutes, row.Total, row.Source = "inlet time as given", a.Time.V, a.Time, "areas.csv"
			rows = append(rows, row)
		default:
			m := run.Storm.MinimumTime
			row.What, row.Minutes, row.Total, row.Source = "minimum time: none is given", m, network.Some(m), "job.toml"
			rows = append(rows, row)
		}
	}
	return rows
}

func pathRows(row LegRow, w *times.Walked) []LegRow {
	var rows []LegRow
	for k := range w.Steps {
		step := &w.Steps[k]
		row.Leg, row.What, row.Step, row.Minutes, row.Source = k+1, step.Method.Title, step, step.Minutes, step.Method.Source
		rows = append(rows, row)
	}
	rows[len(rows)-1].Total = network.Some(w.Minutes)
	return rows
}

// BranchRow is what sets the time of a structure.
type BranchRow struct {
	ID     string
	Branch times.Branch
	SetBy  string // in words
	Head   string // area, or structure where no area sets the time
	Peak   network.Maybe
	PeakBy string
}

// BranchColumns are the columns of the structures' times.
var BranchColumns = []Column[BranchRow]{
	{"id", []string{"structure"}, Text, func(r *BranchRow) Value { return T(r.ID) }},
	{"longest_time", []string{"longest", "time"}, Minutes, func(r *BranchRow) Value { return N(r.Branch.Time) }},
	{"set_by", []string{"set by"}, Text, func(r *BranchRow) Value { return T(r.SetBy) }},
	{"head", []string{"head of", "the branch"}, Text, func(r *BranchRow) Value { return T(r.Head) }},
	{"time", []string{"time of", "the peak"}, Minutes, func(r *BranchRow) Value { return M(r.Peak) }},
	{"peak", []string{"peak by"}, Text, func(r *BranchRow) Value { return T(r.PeakBy) }},
}

// Branches lists what sets the time of every structure in one storm of a run.
func Branches(run *analysis.StormRun) []BranchRow {
	n, storm := run.Network, &run.Storm
	frequency := 1.0
	if storm.FrequencyFactor {
		frequency = hydrology.FrequencyFactor(storm.ReturnPeriod)
	}
	var rows []BranchRow
	for i, b := range times.Branches(n, &run.Flows, storm.MinimumTime, frequency) {
		s := &run.Flows.Structures[i]
		row := BranchRow{ID: n.Structures[i].ID, Branch: b, SetBy: "minimum time", Head: "structure " + n.Structures[b.Head].ID}
		switch {
		case b.Area >= 0:
			row.SetBy = "area " + n.Areas[b.Area].ID
		case b.Pipe >= 0:
			row.SetBy = "pipe " + n.Pipes[b.Pipe].ID + " from " + n.Structures[n.Pipes[b.Pipe].From].ID
		}
		if b.From >= 0 {
			row.Head = "area " + n.Areas[b.From].ID
		}
		if storm.Peak == network.PartialArea && s.Rained() {
			row.Peak, row.PeakBy = network.Some(s.Time), network.Peaks[network.LongestTime]
			if s.Part {
				row.PeakBy = network.Peaks[network.PartialArea]
			}
		}
		rows = append(rows, row)
	}
	return rows
}

// TrialRow is one round in which the sheet flow of an area settles on the storm.
type TrialRow struct {
	Area  string
	Round int
	hydrology.Trial
}

// TrialColumns are the columns of the rounds.
var TrialColumns = []Column[TrialRow]{
	{"area", []string{"area"}, Text, func(r *TrialRow) Value { return T(r.Area) }},
	{"round", []string{"round"}, Count, func(r *TrialRow) Value { return N(float64(r.Round)) }},
	{"assumed", []string{"assumed"}, Minutes, func(r *TrialRow) Value { return N(r.Assumed) }},
	{"intensity", []string{"intensity"}, Intensity, func(r *TrialRow) Value { return N(r.Intensity) }},
	{"minutes", []string{"follows"}, Minutes, func(r *TrialRow) Value { return N(r.Minutes) }},
}

// Trials lists the rounds of all areas with sheet flow by the kinematic wave.
func Trials(run *analysis.StormRun) []TrialRow {
	var rows []TrialRow
	for _, w := range run.Paths {
		for k, trial := range w.Trials {
			rows = append(rows, TrialRow{run.Network.Areas[w.Path.Area].ID, k + 1, trial})
		}
	}
	return rows
}
