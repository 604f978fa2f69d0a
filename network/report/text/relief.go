package text

import (
	"fmt"
	"io"
	"strconv"

	"rimfall/network/report"
	"rimfall/network/review"
)

// Relief prints which pipes are replaced or doubled so that all limits hold.
func Relief(w io.Writer, r *review.ReliefReport, o Options) error {
	p := reviewPrinter(w, r.Subject, o)
	set := &r.Subject.Job.Settings
	least := "Least length of new pipe (the job has no costs.csv), of equal lengths the least volume"
	if r.Priced() {
		least = "Least cost by " + set.Files["costs"] + ": prices are local and dated, and of pipe alone where nothing else is in them"
	}
	p.heading(append([]string{
		set.Title,
		fmt.Sprintf("Relief in the storm of %g years, rainfall %s; limits: %s", r.Subject.Storm.ReturnPeriod, r.Subject.Source(), r.Words()),
		least,
		"New pipes keep shape, material, n and inverts; a second pipe shares the flow by conveyance. Sizes newly fall nowhere",
	}, r.Subject.Grounds()...))
	if len(r.Broken) == 0 {
		p.block()
		p.line("All limits hold as the network is; nothing is to be done.")
	} else {
		reliefTables(p, r)
	}
	p.assumptions("Assumptions: what is not known", r.Subject.Network)
	p.cautions()
	return p.err
}

func reliefTables(p *printer, r *review.ReliefReport) {
	p.table(fmt.Sprintf("Broken as it is: %d limits", len(r.Broken)), setAsideGrid(p.style, r.BrokenRows()))
	if rows := r.Rows(); len(rows) > 0 {
		p.table("Pipes that are replaced or doubled", makeGrid(p.style, review.ReliefColumns, rows))
		total := fmt.Sprintf("Together %s of new pipe", p.style.Show(report.Length, report.N(r.Total().First))+" "+p.style.Units.Length)
		if r.Priced() {
			total = "Together " + strconv.FormatFloat(r.Total().First, 'f', 0, 64)
		}
		p.block()
		p.line("%s. Leave out any one of them, and a limit breaks or a size newly falls.", total)
	}
	p.table("What is proven", makeGrid(p.style, review.ReliefSystemColumns, r.SystemRows()))
	if left := r.LeftRows(); len(left) > 0 {
		p.table("Not relieved: still broken with the largest choice for every pipe", setAsideGrid(p.style, left))
	}
}
