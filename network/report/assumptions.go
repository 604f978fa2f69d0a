package report

import (
	"rimfall/network"
)

// AssumptionRow is a value that was not given, and what was taken in its place.
type AssumptionRow struct {
	*network.Assumption
	Pipe string
}

// Assumptions are the rows of what a run rests on without its being given; none where all
// is known.
func Assumptions(n *network.Network) []AssumptionRow {
	var rows []AssumptionRow
	for i := range n.Assumptions {
		a := &n.Assumptions[i]
		rows = append(rows, AssumptionRow{a, n.Pipes[a.Pipe].ID})
	}
	return rows
}

// AssumptionColumns are the columns of the table of assumptions.
var AssumptionColumns = []Column[AssumptionRow]{
	{"pipe", []string{"pipe"}, Text, func(r *AssumptionRow) Value { return T(r.Pipe) }},
	{"what", []string{"not known"}, Text, func(r *AssumptionRow) Value { return T(r.What) }},
	{"value", []string{"taken"}, Number, func(r *AssumptionRow) Value { return N(r.Value) }},
	{"unit", []string{"unit"}, Text, func(r *AssumptionRow) Value { return T(r.Unit) }},
	{"because", []string{"since"}, Text, func(r *AssumptionRow) Value { return T(r.Because) }},
}
