package report

import (
	"fmt"
	"slices"
	"strconv"
	"strings"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/finding"
)

// ScheduleRow is a row of the pipe schedule: what a plan set's table holds.
type ScheduleRow struct {
	PipeRow
	Section string // barrels, shape and size in words
	Remarks string // the rules that found something, and the user's note
}

// Schedule makes the rows of the pipe schedule.
func Schedule(r *analysis.Result) []ScheduleRow {
	remarks := remarksBySubject(r)
	rows := make([]ScheduleRow, len(r.Network.Pipes))
	for i := range rows {
		row := Pipe(r, &r.Design, network.PipeIndex(i))
		words := append([]string(nil), remarks[row.Pipe.ID]...)
		if row.Pipe.Existing {
			words = append([]string{"existing"}, words...)
		}
		if row.Pipe.Note != "" {
			words = append(words, row.Pipe.Note)
		}
		rows[i] = ScheduleRow{row, SectionWords(row.Pipe, r.Job.Settings.Units.Size), strings.Join(words, "; ")}
	}
	return rows
}

// remarksBySubject lists the titles of errors and warnings by subject, each once,
// with the storm where it is not the design storm.
func remarksBySubject(r *analysis.Result) map[string][]string {
	remarks := map[string][]string{}
	for i := range r.Findings {
		f := &r.Findings[i]
		if f.Rule.Severity == finding.Notice {
			continue
		}
		word := f.Rule.Title
		if f.Storm != r.Design.Storm.ReturnPeriod {
			word += fmt.Sprintf(" (%g years)", f.Storm)
		}
		if f.Accepted != "" {
			word += " (accepted)"
		}
		if list := remarks[f.Subject]; !slices.Contains(list, word) {
			remarks[f.Subject] = append(list, word)
		}
	}
	return remarks
}

// SectionWords is a section as a plan names it: "24 in", "2 × 96x48 in box".
func SectionWords(p *network.Pipe, unit string) string {
	text := strconv.FormatFloat(round(p.Size.Rise, 4), 'f', -1, 64)
	if p.Shape != "circle" {
		text = strconv.FormatFloat(round(p.Size.Span, 4), 'f', -1, 64) + "x" + text
	}
	text += " " + unit
	if p.Shape != "circle" {
		text += " " + p.Shape
	}
	if p.Count > 1 {
		text = fmt.Sprintf("%d × %s", p.Count, text)
	}
	return text
}

// pipeOf lets a column of the pipe table stand in the schedule.
func pipeOf(key string) Column[ScheduleRow] {
	for _, c := range PipeColumns {
		if c.Key == key {
			return Column[ScheduleRow]{c.Key, c.Head, c.Quantity, func(r *ScheduleRow) Value { return c.Value(&r.PipeRow) }}
		}
	}
	panic("no column " + key) // a slip of this file
}

// ScheduleColumns are the columns of the pipe schedule, the upper end first.
var ScheduleColumns = []Column[ScheduleRow]{
	pipeOf("id"),
	pipeOf("from"),
	pipeOf("to"),
	{"section", []string{"size"}, Text, func(r *ScheduleRow) Value { return T(r.Section) }},
	pipeOf("material"),
	pipeOf("length"),
	pipeOf("slope"),
	pipeOf("invert_upper"),
	pipeOf("invert_lower"),
	pipeOf("cover_upper"),
	pipeOf("cover_lower"),
	pipeOf("flow"),
	pipeOf("capacity"),
	pipeOf("velocity"),
	pipeOf("velocity_full"),
	pipeOf("depth_ratio"),
	{"remarks", []string{"remarks"}, Text, func(r *ScheduleRow) Value { return T(r.Remarks) }},
}

// ScheduleGroups split the pipe schedule for a terminal: what is built, and how it runs.
var ScheduleGroups = []Group{
	{"Pipe schedule: what is built", []string{"id", "from", "to", "section", "material", "length", "slope", "invert_upper", "invert_lower", "cover_upper", "cover_lower"}},
	{"Pipe schedule: how it runs", []string{"id", "flow", "capacity", "velocity", "velocity_full", "depth_ratio", "remarks"}},
}

// StructureScheduleRow is a row of the structure schedule.
type StructureScheduleRow struct {
	StructureRow
	In, Out string // pipes with their inverts
	Remarks string
}

// StructureSchedule makes the rows of the structure schedule.
func StructureSchedule(r *analysis.Result) []StructureScheduleRow {
	remarks := remarksBySubject(r)
	rows := make([]StructureScheduleRow, len(r.Network.Structures))
	for i := range rows {
		s := network.StructureIndex(i)
		row := StructureScheduleRow{StructureRow: Structure(r, &r.Design, s)}
		row.In = ends(r, r.Network.PipesIn(s), network.Lower)
		row.Out = ends(r, r.Network.PipesOut(s), network.Upper)
		words := remarks[row.Structure.ID]
		if row.Structure.Note != "" {
			words = append(words[:len(words):len(words)], row.Structure.Note)
		}
		row.Remarks = strings.Join(words, "; ")
		rows[i] = row
	}
	return rows
}

// ends words pipes with their inverts at one end: "Q4 856.88".
func ends(r *analysis.Result, pipes []network.PipeIndex, e network.End) string {
	style := Style{Units: r.Job.Settings.Units}
	var words []string
	for _, i := range pipes {
		p := &r.Network.Pipes[i]
		words = append(words, strings.TrimSpace(p.ID+" "+style.Show(Level, M(p.Invert(e)))))
	}
	return strings.Join(words, ", ")
}

// StructureScheduleGroups split the structure schedule for a terminal.
var StructureScheduleGroups = []Group{
	{"Structure schedule", []string{"id", "kind", "rim", "height", "pipes_in", "pipes_out"}},
	{"Remarks on structures", []string{"id", "remarks"}},
}

// StructureScheduleColumns are the columns of the structure schedule.
var StructureScheduleColumns = []Column[StructureScheduleRow]{
	{"id", []string{"structure"}, Text, func(r *StructureScheduleRow) Value { return T(r.Structure.ID) }},
	{"kind", []string{"kind"}, Text, func(r *StructureScheduleRow) Value { return T(r.Structure.Kind.String()) }},
	{"rim", []string{"rim"}, Level, func(r *StructureScheduleRow) Value { return M(r.Structure.Rim) }},
	{"height", []string{"height,", "invert to rim"}, Length, func(r *StructureScheduleRow) Value { return M(r.Height()) }},
	{"pipes_in", []string{"pipes in, inverts"}, Text, func(r *StructureScheduleRow) Value { return T(r.In) }},
	{"pipes_out", []string{"pipes out, inverts"}, Text, func(r *StructureScheduleRow) Value { return T(r.Out) }},
	{"remarks", []string{"remarks"}, Text, func(r *StructureScheduleRow) Value { return T(r.Remarks) }},
}
