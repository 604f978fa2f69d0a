package review

import (
	"math"
	"strconv"
	"strings"

	"rimfall/network/report"
)

// HeadroomReport is an answer about headroom, ready to be shown.
type HeadroomReport struct {
	Subject *Subject
	*Headroom
}

// HeadroomRow is one structure of it.
type HeadroomRow struct {
	report *HeadroomReport
	ID     string
	StructureHeadroom
}

// SetAsideRow is one limit that is broken already.
type SetAsideRow struct{ ID, Rule string }

// Rows makes a row for every structure that was asked.
func (h *HeadroomReport) Rows() []HeadroomRow {
	rows := make([]HeadroomRow, len(h.Structures))
	for i, s := range h.Structures {
		rows[i] = HeadroomRow{h, h.Subject.Network.Structures[s.Structure].ID, s}
	}
	return rows
}

// SetAsideRows makes a row for every limit that is broken already.
func (h *HeadroomReport) SetAsideRows() []SetAsideRow {
	rows := make([]SetAsideRow, len(h.SetAside))
	for i, p := range h.SetAside {
		rows[i] = SetAsideRow{h.Name(p), p.Limit.Rule()}
	}
	return rows
}

// Name is the id of the pipe or structure of a place.
func (h *HeadroomReport) Name(p Place) string {
	if p.Limit.OfPipes() {
		return h.Subject.Network.Pipes[p.Index].ID
	}
	return h.Subject.Network.Structures[p.Index].ID
}

// Words lists the limits that count.
func (h *HeadroomReport) Words() string {
	var words []string
	for _, l := range h.Options.Limits {
		words = append(words, l.String())
	}
	return strings.Join(words, ", ")
}

// amount is an amount as a number; nothing where there is none.
func amount(a *Amount) report.Value { return report.Value{Number: a.Value, OK: a.OK} }

// shown is an amount for people, rounded down so that what is printed holds.
func shown(a *Amount, factor float64) report.Value {
	switch {
	case !a.OK && a.Why != "":
		return report.T("not found")
	case !a.OK:
		return report.T("no limit")
	}
	return report.T(threeDigitsDown(a.Value * factor))
}

// threeDigitsDown shows a number with three digits, rounded towards 0.
func threeDigitsDown(v float64) string {
	if v == 0 {
		return "0"
	}
	step := math.Pow(10, math.Floor(math.Log10(math.Abs(v)))-2)
	return strconv.FormatFloat(math.Trunc(v/step)*step, 'f', max(0, int(math.Round(-math.Log10(step)))), 64)
}

// governing is the place and the rule that govern an amount, in words.
func (h *HeadroomReport) governing(a *Amount) report.Value {
	if !a.OK {
		return report.T(a.Why)
	}
	return report.T(h.Name(a.Governs) + ", " + a.Governs.Limit.Rule())
}

// flowFactor brings a flow of the job into the unit that its tables show.
func (h *HeadroomReport) flowFactor() float64 {
	set := &h.Subject.Job.Settings
	return set.Units.FlowFactor(set.FlowUnit)
}

// HeadroomColumns are the columns of an answer about headroom.
var HeadroomColumns = []report.Column[HeadroomRow]{
	column("id", []string{"structure"}, report.Text, func(r *HeadroomRow) report.Value { return report.T(r.ID) }),
	column("", []string{"area that", "may be added"}, report.Area, func(r *HeadroomRow) report.Value { return shown(&r.Area, 1) }),
	column("", []string{"governed by"}, report.Text, func(r *HeadroomRow) report.Value { return r.report.governing(&r.Area) }),
	column("", []string{"or a steady", "flow"}, report.Flow, func(r *HeadroomRow) report.Value { return shown(&r.Flow, r.report.flowFactor()) }),
	column("", []string{"governed by"}, report.Text, func(r *HeadroomRow) report.Value { return r.report.governing(&r.Flow) }),
	column("area", nil, report.Number, func(r *HeadroomRow) report.Value { return amount(&r.Area) }),
	column("flow", nil, report.Number, func(r *HeadroomRow) report.Value { return amount(&r.Flow) }),
	column("runs", nil, report.Count, func(r *HeadroomRow) report.Value { return report.N(float64(r.Runs)) }),
	column("why_no_area", nil, report.Text, func(r *HeadroomRow) report.Value { return report.T(r.Area.Why) }),
	column("why_no_flow", nil, report.Text, func(r *HeadroomRow) report.Value { return report.T(r.Flow.Why) }),
}

// SetAsideColumns are the columns of the limits that are broken already.
var SetAsideColumns = []report.Column[SetAsideRow]{
	column("id", []string{"pipe or", "structure"}, report.Text, func(r *SetAsideRow) report.Value { return report.T(r.ID) }),
	column("rule", []string{"broken", "already"}, report.Text, func(r *SetAsideRow) report.Value { return report.T(r.Rule) }),
}
