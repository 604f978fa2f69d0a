package text

import (
	"fmt"
	"io"

	"rimfall/network/review"
)

// Doubt prints how sure the results of a job are. table narrows it to "pipes" or "structures".
func Doubt(w io.Writer, d *review.DoubtReport, o Options) error {
	p := reviewPrinter(w, d.Subject, o)
	set := &d.Subject.Job.Settings
	lines := []string{set.Title, fmt.Sprintf("Doubt about the storm of %g years, rainfall %s", d.Subject.Storm.ReturnPeriod, d.Subject.Source())}
	p.heading(append(append(lines, d.Statement()...), d.Subject.Grounds()...))
	if o.Table == "" || o.Table == "pipes" {
		p.table("Pipes: chances and quantiles", makeGrid(p.style, review.DoubtPipeColumns, d.PipeRows()))
	}
	if o.Table == "" || o.Table == "structures" {
		p.table("Structures: chances and quantiles", makeGrid(p.style, review.DoubtStructureColumns, d.StructureRows()))
	}
	p.assumptions("Assumptions: what is not known", d.Subject.Network)
	p.cautions()
	return p.err
}
