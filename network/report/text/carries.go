package text

import (
	"fmt"
	"io"

	"rimfall/network/report"
	"rimfall/network/review"
)

// Carries prints what a network carries. table narrows it to "pipes" or "structures".
func Carries(w io.Writer, c *review.CarriesReport, o Options) error {
	p := reviewPrinter(w, c.Subject, o)
	p.heading([]string{
		c.Subject.Job.Settings.Title,
		fmt.Sprintf("Largest storm that still holds, of %g to %g years; rainfall %s", c.Smallest, c.Largest, c.Subject.Job.Settings.Rainfall),
		fmt.Sprintf("%d storms were run, at intensities between the columns; tailwaters and steady inflows as given", c.Runs),
	})
	if o.Table == "" || o.Table == "pipes" {
		p.table("Pipes: the storm up to which capacity and crown hold", makeGrid(p.style, review.CarriesPipeColumns, c.PipeRows()))
	}
	if o.Table == "" || o.Table == "structures" {
		p.table("Structures: the storm up to which freeboard and rim hold", makeGrid(p.style, review.CarriesStructureColumns, c.StructureRows()))
	}
	if o.Table == "" {
		p.table("The weakest places from each head to its outfall", makeGrid(p.style, review.CarriesHeadColumns, c.HeadRows()))
	}
	p.assumptions("Assumptions: what is not known", c.Subject.Network)
	p.cautions()
	return p.err
}

// reviewPrinter is a printer in the style of a job.
func reviewPrinter(w io.Writer, s *review.Subject, o Options) *printer {
	set := &s.Job.Settings
	return &printer{w: w, markdown: o.Markdown, style: report.Style{Units: set.Units, FlowUnit: set.FlowUnit}}
}
