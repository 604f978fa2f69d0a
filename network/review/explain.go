package review

import (
	"fmt"
	"slices"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/fault"
	"rimfall/network/finding"
	"rimfall/network/review/formula"
)

// Explanation is the whole working of one pipe, structure or area, as an engineer writes
// it by hand.
type Explanation struct {
	Kind  Kind
	ID    string
	Title string
	Parts []Part
}

// Part is one heading of the working.
type Part struct {
	Title string
	Lines []Line
}

// Form says what a line of the working is.
type Form int8

// The forms of a line.
const (
	Given    Form = iota // a value that is given, or was worked out elsewhere
	Computed             // symbol = formula = numbers = result
	Solved               // a value that solves an equation; the lines after it put it in
	Limit                // a value against its limit
	Remark               // words
)

// Line is one line of the working. The numbers, worked out with the digits that are
// printed, give the result to its last digit.
type Line struct {
	Form    Form
	Name    string
	Symbol  string
	Formula formula.Formula
	Numbers string         // the formula with numbers and units in it
	Result  formula.Number // with its unit
	Source  string         // of the formula, or where a given value stands
	Holds   bool           // of a limit

	Value float64                   // what the run found, in full
	Shown map[string]formula.Number // the numbers of the formula by symbol
}

// Explain writes the working of everything in a run that has an id, in the order of a hand
// calculation: areas, structures, pipes. kinds narrows it where there are any. The error
// says that nothing has that id.
func Explain(r *analysis.Result, id string, kinds ...Kind) ([]Explanation, error) {
	var all []Explanation
	wanted := func(k Kind) bool { return len(kinds) == 0 || slices.Contains(kinds, k) }
	for i := range r.Network.Areas {
		if r.Network.Areas[i].ID == id && wanted(OfArea) {
			all = append(all, explainArea(r, network.AreaIndex(i)))
		}
	}
	for i := range r.Network.Structures {
		if r.Network.Structures[i].ID == id && wanted(OfStructure) {
			all = append(all, explainStructure(r, network.StructureIndex(i)))
		}
	}
	for i := range r.Network.Pipes {
		if r.Network.Pipes[i].ID == id && wanted(OfPipe) {
			all = append(all, explainPipe(r, network.PipeIndex(i)))
		}
	}
	if len(all) == 0 {
		return nil, fmt.Errorf("no pipe, structure or area %q in %s%s", id, r.Job.Dir, nearestID(r, id))
	}
	return all, nil
}

// nearestID suggests the id that is nearly the one asked for; nothing where none is.
func nearestID(r *analysis.Result, id string) string {
	n := r.Network
	known := slices.Concat(ids(n.Pipes, pipeID), ids(n.Structures, structureID), ids(n.Areas, areaID))
	if near, ok := fault.Nearest(id, known); ok {
		return "; did you mean \"" + near + "\"?"
	}
	return ""
}

// explainPipe is the page of a pipe: flow, section, grade line, criteria.
func explainPipe(r *analysis.Result, p network.PipeIndex) Explanation {
	pipe := &r.Network.Pipes[p]
	s := newSheet(r, fmt.Sprintf("Pipe %s, from %s to %s", pipe.ID, structureName(r, pipe.From), structureName(r, pipe.To)))
	s.pipeGiven(p)
	s.gathered(pipe.From)
	s.arrives(pipe.From)
	s.rain(pipe.From)
	s.pipeFlow(p)
	s.capacity(p)
	s.uniformFlow(p)
	s.travelTime(p)
	s.criticalState(p)
	s.pipeLines(p)
	s.pipeCriteria(p)
	s.findings(func(f *finding.Finding) bool { return f.AboutPipe() && f.Subject == pipe.ID })
	return s.explanation(OfPipe, pipe.ID)
}

// explainStructure is the page of a structure: flow, losses, level, freeboard.
func explainStructure(r *analysis.Result, at network.StructureIndex) Explanation {
	given := &r.Network.Structures[at]
	s := newSheet(r, fmt.Sprintf("Structure %s, %s", given.ID, given.Kind))
	s.gathered(at)
	s.arrives(at)
	s.rain(at)
	s.structureFlow(at)
	s.level(at)
	s.freeboard(at)
	s.findings(func(f *finding.Finding) bool { return f.AboutStructure() && f.Subject == given.ID })
	return s.explanation(OfStructure, given.ID)
}

// explainArea is the page of an area: its coefficient, its time, what it brings by itself.
func explainArea(r *analysis.Result, a network.AreaIndex) Explanation {
	area := &r.Network.Areas[a]
	s := newSheet(r, fmt.Sprintf("Area %s, drains to %s", area.ID, structureName(r, area.Structure)))
	s.areaAlone(a)
	s.findings(func(f *finding.Finding) bool { return !f.AboutPipe() && !f.AboutStructure() && f.Subject == area.ID })
	return s.explanation(OfArea, area.ID)
}
