package review

import (
	"strconv"

	"rimfall/network"
	"rimfall/network/report"
)

// CarriesReport is what a network carries, ready to be shown.
type CarriesReport struct {
	Subject *Subject
	*Carries
}

// CarriesPipeRow is one pipe of it.
type CarriesPipeRow struct {
	answer   *CarriesReport
	ID       string
	From, To string
	Size     report.Value
	PipeCarries
}

// CarriesStructureRow is one structure of it.
type CarriesStructureRow struct {
	answer *CarriesReport
	ID     string
	Rim    network.Maybe
	StructureCarries
}

// PipeRows makes a row for every pipe, in file order.
func (c *CarriesReport) PipeRows() []CarriesPipeRow {
	n := c.Subject.Network
	rows := make([]CarriesPipeRow, len(n.Pipes))
	for i := range rows {
		p := &n.Pipes[i]
		rows[i] = CarriesPipeRow{c, p.ID, n.Structures[p.From].ID, n.Structures[p.To].ID, report.SizeValue(p), c.Pipes[i]}
	}
	return rows
}

// StructureRows makes a row for every structure, in file order.
func (c *CarriesReport) StructureRows() []CarriesStructureRow {
	n := c.Subject.Network
	rows := make([]CarriesStructureRow, len(n.Structures))
	for i := range rows {
		rows[i] = CarriesStructureRow{c, n.Structures[i].ID, n.Structures[i].Rim, c.Structures[i]}
	}
	return rows
}

// HeadRows are the rows of the structures that no pipe enters: the heads of the paths to the outfalls.
func (c *CarriesReport) HeadRows() []CarriesStructureRow {
	var heads []CarriesStructureRow
	for i, row := range c.StructureRows() {
		s := network.StructureIndex(i)
		if len(c.Subject.Network.PipesIn(s)) == 0 && len(c.Subject.Network.PipesOut(s)) > 0 {
			heads = append(heads, row)
		}
	}
	return heads
}

// Holds tells of a row as a whole: all of its limits hold in the largest storm; one of them breaks in the smallest.
func (r *CarriesPipeRow) Holds() (all, none bool) { return holds(r.Capacity, r.Crown) }

// Holds is that of a pipe, for a structure.
func (r *CarriesStructureRow) Holds() (all, none bool) { return holds(r.Freeboard, r.CarriesRim()) }

// CarriesRim is the storm in which the grade line reaches the rim.
func (r *CarriesStructureRow) CarriesRim() Carried { return r.StructureCarries.Rim }

func holds(limits ...Carried) (all, none bool) {
	judged := false
	all = true
	for _, c := range limits {
		judged = judged || c.Judged
		all = all && (c.All || !c.Judged)
		none = none || c.None
	}
	return all && judged, none
}

// periodNumber is a period as a number; nothing where there is none.
func periodNumber(c Carried) report.Value {
	return report.Value{Number: c.Period, OK: c.Judged && !c.None}
}

// yes marks what is true with the word for it in JSON; what is not is left out.
func yes(is bool) report.Value { return report.Value{Text: "true", OK: is} }

// words is a period for people: to three digits, or that it lies outside the storms of the rainfall.
func (c *CarriesReport) words(carried Carried) report.Value {
	switch {
	case !carried.Judged:
		return report.Value{}
	case carried.All:
		return report.T("over " + exact(c.Largest))
	case carried.None:
		return report.T("under " + exact(c.Smallest))
	}
	return report.T(threeDigits(carried.Period))
}

// exact shows a number as it was given.
func exact(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }

// threeDigits shows a number over 0 with three digits, without an exponent.
func threeDigits(v float64) string {
	rounded, _ := strconv.ParseFloat(strconv.FormatFloat(v, 'g', 3, 64), 64)
	return strconv.FormatFloat(rounded, 'f', -1, 64)
}

// place is the id of a weakest place with its period.
func (c *CarriesReport) place(w Weakest, pipe bool) (id, period report.Value) {
	if w.Place < 0 {
		return report.Value{}, report.Value{}
	}
	id = report.T(c.Subject.Network.Structures[max(0, min(int(w.Place), len(c.Subject.Network.Structures)-1))].ID)
	if pipe {
		id = report.T(c.Subject.Network.Pipes[w.Place].ID)
	}
	return id, c.words(w.Carried)
}

// CarriesPipeColumns are the columns of the pipes of a report of what is carried: first those of tables, then
// those of files. Years stands for the unit in the headings.
var CarriesPipeColumns = []report.Column[CarriesPipeRow]{
	column("id", []string{"pipe"}, report.Text, func(r *CarriesPipeRow) report.Value { return report.T(r.ID) }),
	column("from", []string{"from"}, report.Text, func(r *CarriesPipeRow) report.Value { return report.T(r.From) }),
	column("to", []string{"to"}, report.Text, func(r *CarriesPipeRow) report.Value { return report.T(r.To) }),
	column("size", []string{"size"}, report.Size, func(r *CarriesPipeRow) report.Value { return r.Size }),
	column("", []string{"full-bore", "capacity,", "years"}, report.Number, func(r *CarriesPipeRow) report.Value { return r.answer.words(r.Capacity) }),
	column("", []string{"crown, upper", "end,", "years"}, report.Number, func(r *CarriesPipeRow) report.Value { return r.answer.words(r.Crown) }),
	column("capacity_period", nil, report.Number, func(r *CarriesPipeRow) report.Value { return periodNumber(r.Capacity) }),
	column("crown_period", nil, report.Number, func(r *CarriesPipeRow) report.Value { return periodNumber(r.Crown) }),
}

// CarriesPipeFlags are columns that hold true or nothing.
var CarriesPipeFlags = []report.Column[CarriesPipeRow]{
	column("holds_all", nil, report.Text, func(r *CarriesPipeRow) report.Value { all, _ := r.Holds(); return yes(all) }),
	column("holds_none", nil, report.Text, func(r *CarriesPipeRow) report.Value { _, none := r.Holds(); return yes(none) }),
	column("capacity_holds_all", nil, report.Text, func(r *CarriesPipeRow) report.Value { return yes(r.Capacity.All) }),
	column("capacity_holds_none", nil, report.Text, func(r *CarriesPipeRow) report.Value { return yes(r.Capacity.None) }),
	column("crown_holds_all", nil, report.Text, func(r *CarriesPipeRow) report.Value { return yes(r.Crown.All) }),
	column("crown_holds_none", nil, report.Text, func(r *CarriesPipeRow) report.Value { return yes(r.Crown.None) }),
}

// CarriesStructureColumns are the same for structures.
var CarriesStructureColumns = []report.Column[CarriesStructureRow]{
	column("id", []string{"structure"}, report.Text, func(r *CarriesStructureRow) report.Value { return report.T(r.ID) }),
	column("rim", []string{"rim"}, report.Level, func(r *CarriesStructureRow) report.Value { return report.M(r.Rim) }),
	column("", []string{"freeboard,", "years"}, report.Number, func(r *CarriesStructureRow) report.Value { return r.answer.words(r.Freeboard) }),
	column("", []string{"rim,", "years"}, report.Number, func(r *CarriesStructureRow) report.Value { return r.answer.words(r.CarriesRim()) }),
	column("freeboard_period", nil, report.Number, func(r *CarriesStructureRow) report.Value { return periodNumber(r.Freeboard) }),
	column("rim_period", nil, report.Number, func(r *CarriesStructureRow) report.Value { return periodNumber(r.CarriesRim()) }),
	column("weakest_capacity", nil, report.Text, func(r *CarriesStructureRow) report.Value { id, _ := r.answer.place(r.WeakestCapacity, true); return id }),
	column("weakest_crown", nil, report.Text, func(r *CarriesStructureRow) report.Value { id, _ := r.answer.place(r.WeakestCrown, true); return id }),
	column("weakest_rim", nil, report.Text, func(r *CarriesStructureRow) report.Value { id, _ := r.answer.place(r.WeakestRim, false); return id }),
}

// CarriesStructureFlags are columns that hold true or nothing.
var CarriesStructureFlags = []report.Column[CarriesStructureRow]{
	column("holds_all", nil, report.Text, func(r *CarriesStructureRow) report.Value { all, _ := r.Holds(); return yes(all) }),
	column("holds_none", nil, report.Text, func(r *CarriesStructureRow) report.Value { _, none := r.Holds(); return yes(none) }),
	column("freeboard_holds_all", nil, report.Text, func(r *CarriesStructureRow) report.Value { return yes(r.Freeboard.All) }),
	column("freeboard_holds_none", nil, report.Text, func(r *CarriesStructureRow) report.Value { return yes(r.Freeboard.None) }),
	column("rim_holds_all", nil, report.Text, func(r *CarriesStructureRow) report.Value { return yes(r.CarriesRim().All) }),
	column("rim_holds_none", nil, report.Text, func(r *CarriesStructureRow) report.Value { return yes(r.CarriesRim().None) }),
}

// CarriesHeadColumns are the weakest places from each head to its outfall.
var CarriesHeadColumns = []report.Column[CarriesStructureRow]{
	column("", []string{"from", "head"}, report.Text, func(r *CarriesStructureRow) report.Value { return report.T(r.ID) }),
	column("", []string{"pipe,", "capacity"}, report.Text, func(r *CarriesStructureRow) report.Value { id, _ := r.answer.place(r.WeakestCapacity, true); return id }),
	column("", []string{"", "years"}, report.Number, func(r *CarriesStructureRow) report.Value { _, t := r.answer.place(r.WeakestCapacity, true); return t }),
	column("", []string{"pipe,", "crown"}, report.Text, func(r *CarriesStructureRow) report.Value { id, _ := r.answer.place(r.WeakestCrown, true); return id }),
	column("", []string{"", "years"}, report.Number, func(r *CarriesStructureRow) report.Value { _, t := r.answer.place(r.WeakestCrown, true); return t }),
	column("", []string{"structure,", "rim"}, report.Text, func(r *CarriesStructureRow) report.Value { id, _ := r.answer.place(r.WeakestRim, false); return id }),
	column("", []string{"", "years"}, report.Number, func(r *CarriesStructureRow) report.Value { _, t := r.answer.place(r.WeakestRim, false); return t }),
}

// column is one column of a table; without a key it is not in files, without a heading not in tables.
func column[R any](key string, head []string, q report.Quantity, value func(*R) report.Value) report.Column[R] {
	return report.Column[R]{Key: key, Head: head, Quantity: q, Value: value}
}

// InFiles are the columns that have a key, for JSON and CSV.
func InFiles[R any](all []report.Column[R]) []report.Column[R] {
	var keyed []report.Column[R]
	for _, c := range all {
		if c.Key != "" {
			keyed = append(keyed, c)
		}
	}
	return keyed
}
