package drawing_test

import (
	"slices"
	"testing"

	"rimfall/network"
	"rimfall/network/finding"
)

// A mark stands beside what a finding is about. A pipe and a structure may share an id, so the rule has to tell which.
func TestTheSubjectOfEveryFindingIsWhatItsRuleIsAbout(t *testing.T) {
	for _, dir := range jobs(t) {
		r := runJob(t, dir)
		n := r.Network
		for i := range r.Findings {
			f := &r.Findings[i]
			switch {
			case f.AboutStructure():
				if !slices.ContainsFunc(n.Structures, func(s network.Structure) bool { return s.ID == f.Subject }) {
					t.Errorf("%s: %s is about %s, which is no structure", dir, f.Rule.Name, f.Subject)
				}
			case f.AboutPipe():
				if !slices.ContainsFunc(n.Pipes, func(p network.Pipe) bool { return p.ID == f.Subject }) {
					t.Errorf("%s: %s is about %s, which is no pipe", dir, f.Rule.Name, f.Subject)
				}
			case f.AboutArea():
				if !slices.ContainsFunc(n.Areas, func(a network.Area) bool { return a.ID == f.Subject }) {
					t.Errorf("%s: %s is about %s, which is no area", dir, f.Rule.Name, f.Subject)
				}
			case f.Rule.Severity != finding.Notice:
				t.Errorf("%s: %s, a %s, is about %s and has no mark on the plan", dir, f.Rule.Name, f.Rule.Severity, f.Subject)
			}
		}
	}
}
