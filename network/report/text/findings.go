package text

import (
	"fmt"
	"strings"

	"rimfall/network/finding"
	"rimfall/network/report"
)

// findings prints them by rule, with the counts. In brief, what a rule found in
// another storm than the design storm is one list of subjects, errors apart.
func (p *printer) findings(found []finding.Finding, design float64, brief bool) {
	if len(found) == 0 {
		p.title("Findings: none")
		return
	}
	title := "Findings: " + report.CountFindings(found).String()
	if p.markdown {
		p.table(title, makeGrid(p.style, report.FindingColumns, found))
		return
	}
	p.title(title)
	for i := 0; i < len(found); {
		end := i
		for end < len(found) && found[end].Rule == found[i].Rule {
			end++
		}
		p.line("  %s, %s (%s)", found[i].Rule.Severity, found[i].Rule.Title, found[i].Rule.Name)
		p.ofRule(found[i:end], design, brief)
		i = end
	}
}

// ofRule prints the findings of one rule.
func (p *printer) ofRule(found []finding.Finding, design float64, brief bool) {
	var others []string // subjects in the check storm
	for i := range found {
		f := &found[i]
		if brief && f.Storm != design && !f.Breaks() && f.Accepted == "" {
			others = append(others, f.Subject)
			continue
		}
		p.hanging(fmt.Sprintf("    %-8s  ", f.Subject), f.Message)
		if f.Accepted != "" {
			p.hanging(fmt.Sprintf("    %-8s  ", ""), "accepted departure: "+f.Accepted)
		}
	}
	if len(others) > 0 {
		p.hanging("    in the check storm at ", strings.Join(others, ", "))
	}
}
