package text

import (
	"fmt"
	"slices"
	"strings"

	"rimfall/network/finding"
	"rimfall/network/review"
)

// findingChanges prints the findings that came, grew worse or went.
func (p *printer) findingChanges(f *review.FindingChanges) {
	p.findingList("New findings", f.New)
	p.findingList("Findings that grew worse", f.Worse)
	p.findingList("Findings that are cured", f.Cured)
}

func (p *printer) findingList(title string, changes []review.FindingChange) {
	if len(changes) == 0 {
		p.title(title + ": none")
		return
	}
	title = fmt.Sprintf("%s: %d", title, len(changes))
	if p.markdown {
		p.table(title, findingGrid(changes))
		return
	}
	p.title(title)
	for i := 0; i < len(changes); {
		rule, end := latest(changes[i]).Rule, i
		for end < len(changes) && latest(changes[end]).Rule == rule {
			end++
		}
		p.line("  %s, %s (%s)", rule.Severity, rule.Title, rule.Name)
		p.changesOfRule(changes[i:end])
		i = end
	}
}

// changesOfRule prints the changes of one rule; of notices, which no one has to act on,
// the subjects alone.
func (p *printer) changesOfRule(changes []review.FindingChange) {
	var subjects []string
	for _, c := range changes {
		f := latest(c)
		if f.Rule.Severity == finding.Notice {
			subjects = append(subjects, f.Subject)
			continue
		}
		p.wrapped(fmt.Sprintf("  %-8s  ", f.Subject), told(c))
	}
	if len(subjects) > 0 {
		p.wrapped("  at ", strings.Join(slices.Compact(subjects), ", "))
	}
}

func findingGrid(changes []review.FindingChange) grid {
	g := grid{head: []string{"severity", "rule", "subject", "what was found"}, numbers: make([]bool, 4)}
	for _, c := range changes {
		f := latest(c)
		g.rows = append(g.rows, []string{f.Rule.Severity.String(), f.Rule.Name, f.Subject, told(c)})
	}
	return g
}

// latest is the finding as it stands now, or stood where it is cured.
func latest(c review.FindingChange) *finding.Finding {
	if c.After != nil {
		return c.After
	}
	return c.Before
}

// told is the message, with what was found before where that is another one.
func told(c review.FindingChange) string {
	text := latest(c).Message
	switch {
	case c.Removed:
		text += "; it was removed"
	case c.Before != nil && c.After != nil:
		text += "; before: " + c.Before.Message
	}
	if c.After != nil && c.After.Accepted != "" {
		text += "; accepted departure: " + c.After.Accepted
	}
	return text
}
