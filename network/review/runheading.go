package review

import "fmt"

// Source is the rainfall that a question was put with, in the words of check.
func (s *Subject) Source() string {
	source := s.Job.Settings.Rainfall
	if s.Job.Rain.Equation() {
		source = "by equation"
	}
	if uplift := s.Storm.Uplift; uplift != 1 {
		source += ", intensities × " + exact(uplift)
	}
	return source
}

// Grounds is what else an answer rests on, a line each: where the rainfall is from, and the criteria.
func (s *Subject) Grounds() []string {
	var lines []string
	if from := s.Job.Rain.Describe(); from != "" {
		lines = append(lines, "Rainfall: "+from)
	}
	if c := &s.Job.Settings.Criteria; c.File != "" {
		return append(lines, fmt.Sprintf("Criteria: %s (%s)", c.Title, c.File))
	}
	return append(lines, "Criteria: of this job, no named set")
}
