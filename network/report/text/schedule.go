package text

import (
	"fmt"
	"io"

	"rimfall/network/analysis"
	"rimfall/network/report"
)

// ScheduleTables are the tables of a schedule.
var ScheduleTables = []string{"pipes", "structures", "quantities"}

// Schedule prints the pipe schedule, the structure schedule and the quantities.
// In Markdown the pipe schedule is one table, as in a plan set; in a terminal it
// is split in two.
func Schedule(w io.Writer, r *analysis.Result, o Options) error {
	p := &printer{w: w, markdown: o.Markdown, style: StyleOf(r)}
	p.heading(report.Heading(r))
	if o.Table == "" || o.Table == "pipes" {
		rows := report.Schedule(r)
		if o.Markdown {
			p.table("Pipe schedule", makeGrid(p.style, report.ScheduleColumns, rows))
		} else {
			for _, g := range report.ScheduleGroups {
				p.table(g.Title, makeGrid(p.style, report.Pick(report.ScheduleColumns, g.Keys), rows))
			}
		}
	}
	if o.Table == "" || o.Table == "structures" {
		p.structureSchedule(report.StructureSchedule(r))
	}
	if o.Table == "" || o.Table == "quantities" {
		p.table("Quantities", makeGrid(p.style, report.QuantityColumns, report.Quantities(r)))
	}
	p.assumptions("Assumptions: what is not known", r.Network)
	p.cautions()
	return p.err
}

// structureSchedule prints one table in Markdown; in a terminal the remarks follow
// by themselves.
func (p *printer) structureSchedule(rows []report.StructureScheduleRow) {
	groups := report.StructureScheduleGroups
	if p.markdown {
		p.table(groups[0].Title, makeGrid(p.style, report.StructureScheduleColumns, rows))
		return
	}
	p.table(groups[0].Title, makeGrid(p.style, report.Pick(report.StructureScheduleColumns, groups[0].Keys), rows))
	p.title(groups[1].Title)
	for i := range rows {
		if rows[i].Remarks != "" {
			p.hanging(fmt.Sprintf("  %-10s", rows[i].Structure.ID), rows[i].Remarks)
		}
	}
}
