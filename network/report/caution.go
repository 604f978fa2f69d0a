package report

import (
	"fmt"
	"strconv"

	"rimfall/network/analysis"
	"rimfall/network/finding"
)

// Cautions stand on every report.
var Cautions = []string{
	"Design values come from the local code; a licensed engineer checks and signs.",
	"The Rational method is for small areas without storage; peaks of different pipes do not add.",
	"All of an area enters at its structure: inlets and what passes them by are not computed.",
}

// Heading is the title line of a run and what it rests on, a line each.
func Heading(r *analysis.Result) []string {
	s := &r.Job.Settings
	lines := []string{s.Title, stormLine(r)}
	if from := r.Job.Rain.Describe(); from != "" {
		lines = append(lines, "Rainfall: "+from)
	}
	if c := s.Criteria; c.File != "" {
		lines = append(lines, fmt.Sprintf("Criteria: %s (%s)", c.Title, c.File))
	} else {
		lines = append(lines, "Criteria: of this job, no named set")
	}
	return lines
}

func stormLine(r *analysis.Result) string {
	s := r.Design.Storm
	source := r.Job.Settings.Rainfall
	if r.Job.Rain.Equation() {
		source = "by equation"
	}
	line := fmt.Sprintf("Design storm: %s years, rainfall %s", years(s.ReturnPeriod), source)
	if s.Uplift != 1 {
		line += fmt.Sprintf(", intensities × %s", years(s.Uplift))
	}
	if r.Check != nil {
		line += fmt.Sprintf("; check storm: %s years", years(r.Check.Storm.ReturnPeriod))
	}
	return line
}

func years(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }

// Counts is how many findings there are of each severity, accepted ones apart.
type Counts struct{ Errors, Warnings, Notices, Accepted int }

// CountFindings counts findings.
func CountFindings(found []finding.Finding) Counts {
	var c Counts
	for i := range found {
		switch f := &found[i]; {
		case f.Accepted != "":
			c.Accepted++
		case f.Rule.Severity == finding.Error:
			c.Errors++
		case f.Rule.Severity == finding.Warning:
			c.Warnings++
		default:
			c.Notices++
		}
	}
	return c
}

// String words the counts.
func (c Counts) String() string {
	return fmt.Sprintf("%s, %s, %s, %s", plural(c.Errors, "error"), plural(c.Warnings, "warning"),
		plural(c.Notices, "notice"), plural(c.Accepted, "accepted departure"))
}

func plural(n int, word string) string {
	if n == 1 {
		return "1 " + word
	}
	return fmt.Sprintf("%d %ss", n, word)
}
