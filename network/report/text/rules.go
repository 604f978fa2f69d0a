package text

import (
	"io"

	"rimfall/network/finding"
	"rimfall/network/report"
)

var ruleColumns = []report.Column[finding.Rule]{
	{Key: "rule", Head: []string{"rule"}, Value: func(r *finding.Rule) report.Value { return report.T(r.Name) }},
	{Key: "severity", Head: []string{"severity"}, Value: func(r *finding.Rule) report.Value { return report.T(r.Severity.String()) }},
	{Key: "meaning", Head: []string{"found where"}, Value: func(r *finding.Rule) report.Value { return report.T(r.Meaning) }},
	{Key: "why", Head: []string{"why it matters"}, Value: func(r *finding.Rule) report.Value { return report.T(r.Why) }},
	{Key: "setting", Head: []string{"limit in"}, Value: func(r *finding.Rule) report.Value { return report.T(r.Setting) }},
	{Key: "source", Head: []string{"source"}, Value: func(r *finding.Rule) report.Value { return report.T(r.Source) }},
}

// Rules prints rules: a block each, or a Markdown table.
func Rules(w io.Writer, rules []finding.Rule, markdown bool) error {
	p := &printer{w: w, markdown: markdown}
	if markdown {
		p.table("Rules", makeGrid(report.Style{}, ruleColumns, rules))
		return p.err
	}
	for i := range rules {
		r := &rules[i]
		p.block()
		p.line("%s (%s): %s", r.Name, r.Severity, r.Title)
		p.wrapped("found where  ", r.Meaning)
		p.wrapped("why          ", r.Why)
		if r.Setting != "" {
			p.wrapped("limit in     ", r.Setting)
		}
		p.wrapped("source       ", r.Source)
	}
	return p.err
}
