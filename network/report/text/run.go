package text

import (
	"fmt"
	"io"
	"strings"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/report"
)

// Options say what is printed of a run.
type Options struct {
	Markdown bool
	Table    string // "areas", "pipes", "structures", "findings", or "" for all
}

// Run prints a run.
func Run(w io.Writer, r *analysis.Result, o Options) error {
	p := &printer{w: w, markdown: o.Markdown, style: StyleOf(r)}
	p.heading(report.Heading(r))
	if o.Table == "" || o.Table == "areas" {
		p.table("Areas", makeGrid(p.style, report.AreaColumns, report.Areas(r, &r.Design)))
	}
	if o.Table == "" || o.Table == "pipes" {
		pipeTables(p, r, &r.Design, report.PipeGroups, "")
		if r.Check != nil {
			pipeTables(p, r, r.Check, report.CheckGroups, fmt.Sprintf(", check storm of %g years", r.Check.Storm.ReturnPeriod))
		}
	}
	if o.Table == "" || o.Table == "structures" {
		structureTables(p, r, &r.Design, report.StructureGroups, "")
		if r.Check != nil {
			structureTables(p, r, r.Check, report.StructureCheckGroups, fmt.Sprintf(", check storm of %g years", r.Check.Storm.ReturnPeriod))
		}
	}
	if o.Table == "" || o.Table == "findings" {
		p.findings(r.Findings, r.Design.Storm.ReturnPeriod, o.Table == "")
	}
	p.assumptions("Assumptions: what is not known", r.Network)
	p.cautions()
	return p.err
}

// StyleOf is how a run's numbers are shown.
func StyleOf(r *analysis.Result) report.Style {
	return report.Style{Units: r.Job.Settings.Units, FlowUnit: r.Job.Settings.FlowUnit}
}

func pipeTables(p *printer, r *analysis.Result, storm *analysis.StormRun, groups []report.Group, suffix string) {
	rows := make([]report.PipeRow, len(r.Network.Pipes))
	for i := range rows {
		rows[i] = report.Pipe(r, storm, network.PipeIndex(i))
	}
	for _, g := range groups {
		p.table(g.Title+suffix, makeGrid(p.style, report.Pick(report.PipeColumns, g.Keys), rows))
	}
}

func structureTables(p *printer, r *analysis.Result, storm *analysis.StormRun, groups []report.Group, suffix string) {
	rows := make([]report.StructureRow, len(r.Network.Structures))
	for i := range rows {
		rows[i] = report.Structure(r, storm, network.StructureIndex(i))
	}
	for _, g := range groups {
		p.table(g.Title+suffix, makeGrid(p.style, report.Pick(report.StructureColumns, g.Keys), rows))
	}
}

// printer writes blocks with a blank line between and keeps the first error.
type printer struct {
	w        io.Writer
	markdown bool
	style    report.Style
	blocks   int
	err      error
}

// block starts a block after a blank line.
func (p *printer) block() {
	if p.blocks++; p.blocks > 1 {
		p.line("")
	}
}

func (p *printer) line(format string, args ...any) {
	if p.err == nil {
		_, p.err = fmt.Fprintf(p.w, format+"\n", args...)
	}
}

// heading prints the title of a report and the lines under it.
func (p *printer) heading(lines []string) {
	p.block()
	if !p.markdown {
		for _, l := range lines {
			p.line("%s", l)
		}
		return
	}
	p.line("# %s", lines[0])
	p.line("")
	for i, l := range lines[1:] {
		end := "  "
		if i == len(lines)-2 {
			end = ""
		}
		p.line("%s%s", l, end)
	}
}

// title prints the title of a table.
func (p *printer) title(text string) {
	p.block()
	if p.markdown {
		p.line("## %s", text)
		p.line("")
		return
	}
	p.line("%s", strings.ToUpper(text[:1])+text[1:])
}

func (p *printer) table(title string, g grid) {
	p.title(title)
	if p.err != nil {
		return
	}
	if p.markdown {
		p.err = g.drawMarkdown(p.w)
		return
	}
	var b strings.Builder
	p.err = g.drawText(&b)
	for _, l := range strings.Split(strings.TrimRight(b.String(), "\n"), "\n") {
		p.line("%s", strings.TrimRight(l, " "))
	}
}

// cautions close every report.
func (p *printer) cautions() {
	p.block()
	for _, c := range report.Cautions {
		if p.markdown {
			p.line("- %s", c)
			continue
		}
		p.line("%s", c)
	}
}
