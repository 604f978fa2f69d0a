package data

import (
	"rimfall/network"
	"rimfall/network/report"
)

// assumptions writes what a run rests on without its being given, where there is any.
func (s *sink) assumptions(n *network.Network) {
	if rows := report.Assumptions(n); len(rows) > 0 {
		writeArray(s, "assumptions", list(report.AssumptionColumns, rows))
	}
}
