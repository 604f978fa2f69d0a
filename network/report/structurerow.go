package report

import (
	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/sweep"
)

// StructureRow is everything that is shown of one structure for one storm.
type StructureRow struct {
	Structure *network.Structure
	Run       *sweep.Structure
	LowestOut network.Maybe // the lowest invert of the pipes that leave
	LowestIn  network.Maybe
}

// Structure makes the row of structure s in a storm of a run.
func Structure(r *analysis.Result, storm *analysis.StormRun, s network.StructureIndex) StructureRow {
	row := StructureRow{Structure: &r.Network.Structures[s], Run: &storm.Flows.Structures[s]}
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
}

// StructureGroups are the tables of structures for people.
var StructureGroups = []Group{
	{"Structures", []string{"id", "kind", "rim", "area", "ca", "time", "flow", "lowest_invert_in", "lowest_invert_out", "height"}},
}
