package report

import (
	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/grade"
	"rimfall/network/sweep"
)

// StructureRow is everything that is shown of one structure for one storm.
type StructureRow struct {
	Structure *network.Structure
	Run       *sweep.Structure
	Line      *grade.Structure
	LowestOut network.Maybe // the lowest invert of the pipes that leave
	LowestIn  network.Maybe
}

// Structure makes the row of structure s in a storm of a run.
func Structure(r *analysis.Result, storm *analysis.StormRun, s network.StructureIndex) StructureRow {
	row := StructureRow{Structure: &r.Network.Structures[s], Run: &storm.Flows.Structures[s], Line: &storm.Lines.Structures[s]}
	if _, v, ok := r.Network.LowestIn(s); ok {
		row.LowestIn = network.Some(v)
	}
	for _, p := range r.Network.PipesOut(s) {
		v := r.Network.Pipes[p].InvertUpper
		if v.OK && (!row.LowestOut.OK || v.V < row.LowestOut.V) {
			row.LowestOut = v
		}
	}
	return row
}

// Lowest is the lowest invert at the structure.
func (r *StructureRow) Lowest() network.Maybe {
	switch {
	case !r.LowestOut.OK:
		return r.LowestIn
	case !r.LowestIn.OK || r.LowestOut.V < r.LowestIn.V:
		return r.LowestOut
	}
	return r.LowestIn
}

// Height is from the lowest invert to the rim.
func (r *StructureRow) Height() network.Maybe {
	if low := r.Lowest(); low.OK && r.Structure.Rim.OK {
		return network.Some(r.Structure.Rim.V - low.V)
	}
	return network.Maybe{}
}

// level is the grade line at the structure, the energy line alike.
func (r *StructureRow) level() Value { return Value{Number: r.Line.Level, OK: r.Line.Known} }

// part is a part of the loss at the structure, where there is one.
func (r *StructureRow) part(v float64) Value { return Value{Number: v, OK: r.Line.Known && v != 0} }

// StructureColumns are the columns of the table of structures.
var StructureColumns = []Column[StructureRow]{
	{"id", []string{"structure"}, Text, func(r *StructureRow) Value { return T(r.Structure.ID) }},
	{"kind", []string{"kind"}, Text, func(r *StructureRow) Value { return T(r.Structure.Kind.String()) }},
	{"rim", []string{"rim"}, Level, func(r *StructureRow) Value { return M(r.Structure.Rim) }},
	{"area", []string{"area,", "total"}, Area, func(r *StructureRow) Value { return N(r.Run.Area) }},
	{"ca", []string{"C × area,", "total"}, Area, func(r *StructureRow) Value { return N(r.Run.CA) }},
	{"time", []string{"time"}, Minutes, func(r *StructureRow) Value { return Value{Number: r.Run.Time, OK: r.Run.Flow > 0} }},
	{"flow", []string{"flow"}, Flow, func(r *StructureRow) Value { return N(r.Run.Flow) }},
	{"lowest_invert_in", []string{"lowest", "invert in"}, Level, func(r *StructureRow) Value { return M(r.LowestIn) }},
	{"lowest_invert_out", []string{"lowest", "invert out"}, Level, func(r *StructureRow) Value { return M(r.LowestOut) }},
	{"height", []string{"height,", "invert to rim"}, Length, func(r *StructureRow) Value { return M(r.Height()) }},
	{"hgl", []string{"grade", "line"}, Level, func(r *StructureRow) Value { return r.level() }},
	{"egl", nil, Level, func(r *StructureRow) Value { return r.level() }},
	{"freeboard", []string{"freeboard"}, Length, func(r *StructureRow) Value { return M(r.Line.Freeboard(r.Structure)) }},
	{"loss_entrance", []string{"entrance"}, Length, func(r *StructureRow) Value { return r.part(r.Line.Parts.Entrance) }},
	{"loss_benching", []string{"benching"}, Length, func(r *StructureRow) Value { return r.part(r.Line.Parts.Benching) }},
	{"loss_angle", []string{"angle"}, Length, func(r *StructureRow) Value { return r.part(r.Line.Parts.Angle) }},
	{"loss_plunging", []string{"plunging"}, Length, func(r *StructureRow) Value { return r.part(r.Line.Parts.Plunging) }},
	{"loss_held", []string{"held", "up by"}, Length, func(r *StructureRow) Value { return r.part(r.Line.Parts.Held) }},
	{"loss_coefficient", []string{"coeffi-", "cient"}, Length, func(r *StructureRow) Value { return r.part(r.Line.Parts.Coefficient) }},
	{"loss_junction", []string{"junction"}, Length, func(r *StructureRow) Value { return r.part(r.Line.Parts.Junction) }},
}

// StructureGroups are the tables of structures for people.
var StructureGroups = []Group{
	{"Structures", []string{"id", "kind", "rim", "area", "ca", "time", "flow", "lowest_invert_in", "lowest_invert_out", "height"}},
	{"Grade line and losses at the structures", []string{"id", "rim", "hgl", "freeboard", "loss_entrance", "loss_benching", "loss_angle", "loss_plunging", "loss_held", "loss_coefficient", "loss_junction"}},
}

// StructureCheckGroups are the tables of structures of the check storm: what it changes.
var StructureCheckGroups = []Group{
	{"Structures", []string{"id", "kind", "rim", "flow", "hgl", "freeboard"}},
}
