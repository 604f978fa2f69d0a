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
	p.heading(append([]string{
		c.Subject.Job.Settings.Title,
		fmt.Sprintf("Largest storm that still holds, of %s; rainfall %s", rangeOfPeriods(c.Smallest, c.Largest), c.Subject.Source()),
		fmt.Sprintf("Storms run: %d, with intensities between the columns; tailwaters and steady inflows as given", c.Runs),
	}, c.Subject.Grounds()...))
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

func rangeOfPeriods(smallest, largest float64) string {
	if smallest == largest {
		return fmt.Sprintf("%g years, the only one", largest)
	}
	return fmt.Sprintf("%g to %g years", smallest, largest)
}

// reviewPrinter is a printer in the style of a job.
func reviewPrinter(w io.Writer, s *review.Subject, o Options) *printer {
	set := &s.Job.Settings
	return &printer{w: w, markdown: o.Markdown, style: report.Style{Units: set.Units, FlowUnit: set.FlowUnit}}
}
