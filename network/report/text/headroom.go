package text

import (
	"fmt"
	"io"

	"rimfall/network/report"
	"rimfall/network/review"
)

// Headroom prints how much more may be connected where.
func Headroom(w io.Writer, h *review.HeadroomReport, o Options) error {
	p := reviewPrinter(w, h.Subject, o)
	set := &h.Subject.Job.Settings
	p.heading(append([]string{
		set.Title,
		fmt.Sprintf("Headroom in the storm of %g years, rainfall %s; limits: %s", h.Subject.Storm.ReturnPeriod, h.Subject.Source(), h.Words()),
		fmt.Sprintf("An area of C %g and %g min, or a steady flow in its place, until the first limit breaks anywhere in the system", h.Options.C, h.Options.Time),
		"Peaks by partial area, whatever the job says: the larger of the longest time and any shorter one. Rounded down",
	}, h.Subject.Grounds()...))
	p.table("Headroom at the structures", makeGrid(p.style, review.HeadroomColumns, h.Rows()))
	p.setAside(h.SetAsideRows())
	p.assumptions("Assumptions: what is not known", h.Subject.Network)
	p.cautions()
	return p.err
}

// ofRule are the places of one rule.
type ofRule struct{ rule, places string }

// byRule gathers what is broken already by rule.
func byRule(aside []review.SetAsideRow) []ofRule {
	var rules []ofRule
	for _, a := range aside {
		if k := len(rules) - 1; k >= 0 && rules[k].rule == a.Rule {
			rules[k].places += ", " + a.ID
			continue
		}
		rules = append(rules, ofRule{a.Rule, a.ID})
	}
	return rules
}

// setAside lists what is broken already: wrapped in a terminal, as a table in Markdown.
func (p *printer) setAside(aside []review.SetAsideRow) {
	if len(aside) == 0 {
		return
	}
	title := fmt.Sprintf("Set aside: %d limits are broken already, and count no more", len(aside))
	if p.markdown {
		p.table(title, setAsideGrid(p.style, aside))
		return
	}
	p.title(title)
	for _, r := range byRule(aside) {
		p.wrapped(fmt.Sprintf("%-10s  ", r.rule), r.places)
	}
}

// setAsideGrid lists what is set aside by rule, the places of a rule in a row.
func setAsideGrid(style report.Style, aside []review.SetAsideRow) grid {
	return makeGrid(style, []report.Column[ofRule]{
		{Key: "rule", Head: []string{"rule"}, Value: func(r *ofRule) report.Value { return report.T(r.rule) }},
		{Key: "places", Head: []string{"places"}, Value: func(r *ofRule) report.Value { return report.T(r.places) }},
	}, byRule(aside))
}
