package review

import (
	"math"
	"regexp"
	"slices"

	"rimfall/network/analysis"
	"rimfall/network/finding"
)

// FindingChanges are the findings that came, grew worse or went. What stands in both
// jobs no worse than before is in none of the lists.
type FindingChanges struct {
	New   []FindingChange
	Worse []FindingChange
	Cured []FindingChange
}

// FindingChange is a finding in both jobs. A new one has no Before, a cured one no After.
type FindingChange struct {
	Before, After *finding.Finding
	Removed       bool // cured, since its subject was removed
}

// counts tells whether a finding is for the engineer to act on: an error or a warning
// that no departure accepts.
func counts(f *finding.Finding) bool { return f.Rule.Severity > finding.Notice && f.Accepted == "" }

// findingKey is what makes two findings the same one: rule, subject, design or check
// storm, and for rules that may speak of a subject more than once, the place.
type findingKey struct {
	rule, subject, place string
	design               bool
}

// severalTimes are the rules that may speak of one subject more than once, of its ends or its
// neighbours. Their messages differ then by more than numbers.
var severalTimes = []string{"cover", "cover-along-pipe", "crossing-clearance", "lowest-invert", "size-change", "drop-structure", "assumed", "path-limit", "rainfall-remark"}

var numbers = regexp.MustCompile(`-?[0-9]+(\.[0-9]+)?`)

func keyOf(f *finding.Finding, design float64) findingKey {
	k := findingKey{rule: f.Rule.Name, subject: f.Subject, design: f.Storm == design}
	if slices.Contains(severalTimes, f.Rule.Name) {
		k.place = numbers.ReplaceAllString(f.Message, "#")
	}
	return k
}

// compareFindings pairs the findings of two runs, in their order where a key stands
// more than once.
func compareFindings(before, after *analysis.Result, removed func(Kind, string) bool) FindingChanges {
	was := map[findingKey][]int{}
	for i := range before.Findings {
		k := keyOf(&before.Findings[i], before.Design.Storm.ReturnPeriod)
		was[k] = append(was[k], i)
	}
	var c FindingChanges
	left := make([]bool, len(before.Findings))
	for i := range left {
		left[i] = true
	}
	for i := range after.Findings {
		now := &after.Findings[i]
		k := keyOf(now, after.Design.Storm.ReturnPeriod)
		at := was[k]
		if len(at) == 0 {
			c.New = append(c.New, FindingChange{After: now})
			continue
		}
		then := &before.Findings[at[0]]
		was[k], left[at[0]] = at[1:], false
		if worse(then, now) {
			c.Worse = append(c.Worse, FindingChange{Before: then, After: now})
		}
	}
	for i := range before.Findings {
		if f := &before.Findings[i]; left[i] {
			c.Cured = append(c.Cured, FindingChange{Before: f, Removed: removed(subjectKind(f), f.Subject)})
		}
	}
	return c
}

// subjectKind is the kind of the subject of a finding.
func subjectKind(f *finding.Finding) Kind {
	switch {
	case f.AboutStructure():
		return OfStructure
	case f.AboutPipe():
		return OfPipe
	}
	return OfArea
}

// worse tells whether a finding misses its limit by more than before, or has lost the
// departure that accepted it.
func worse(then, now *finding.Finding) bool {
	if then.Accepted != "" && now.Accepted == "" {
		return true
	}
	b, okB := miss(then)
	a, okA := miss(now)
	return okB && okA && a > b+missRoom*max(1, math.Abs(b))
}

// missRoom is the least by which a miss has to grow, of itself or of the job unit: a millionth, below what is written.
const missRoom = 1e-6

// miss is by how much a limit is missed: of a capacity or an area as a ratio, so that a
// larger pipe of a larger flow can be told from a smaller one, of all else as a difference.
func miss(f *finding.Finding) (amount float64, ok bool) {
	if !f.Value.OK || !f.Limit.OK {
		return 0, false
	}
	switch f.Rule.Name {
	case "capacity", "no-size-carries":
		return f.Value.V / f.Limit.V, f.Limit.V > 0
	case "size-decrease":
		return f.Limit.V / f.Value.V, f.Value.V > 0
	}
	return math.Abs(f.Value.V - f.Limit.V), true
}
