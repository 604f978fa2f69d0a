package text

import (
	"rimfall/network"
	"rimfall/network/report"
)

// assumptions prints what a run rests on without its being given, under a title.
func (p *printer) assumptions(title string, n *network.Network) {
	if rows := report.Assumptions(n); len(rows) > 0 {
		p.table(title, makeGrid(p.style, report.AssumptionColumns, rows))
	}
}
