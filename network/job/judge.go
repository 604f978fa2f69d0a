package job

import (
	"bytes"
	"encoding/csv"
	"fmt"

	"rimfall/network"
)

// judgeNetwork finds what is wrong with the network as a whole, and what is
// missing for the purpose. Pipes and areas whose structure is not known are left
// out; they are faults already.
func (r *reader) judgeNetwork(j *Job, purpose Purpose) {
	n := r.network
	if len(n.Structures) == 0 || len(n.Pipes) == 0 {
		return
	}
	whole := r.dropLoose()
	n.Connect()
	if r.tables["structures"].broken || r.tables["pipes"].broken {
		return // rows are missing, so what the others are joined to is not known
	}
	r.assume()
	r.judgeSlopes(j)
	told := r.places()
	for _, p := range n.Validate() {
		if p.Table == "structures" && p.Line > 0 && !whole {
			continue // a pipe that is left out may be the way to the outfall
		}
		f := j.Locate(p)
		if f.Line > 0 && told[filePlace{f.File, place{f.Line, f.Column}}] {
			continue // a row whose name is a fault is joined to nothing because of that
		}
		r.faults = append(r.faults, f)
	}
	if purpose == ToSize {
		r.judgeHeads(j, told)
	}
}

// filePlace is a place in one of the files.
type filePlace struct {
	file string
	place
}

// places are those at which a fault was found so far.
func (r *reader) places() map[filePlace]bool {
	at := map[filePlace]bool{}
	for _, f := range r.faults {
		at[filePlace{f.File, place{f.Line, f.Column}}] = true
	}
	return at
}

// dropLoose leaves out pipes and areas at unknown structures; whole tells that
// there were no such pipes.
func (r *reader) dropLoose() (whole bool) {
	n := r.network
	pipes, areas := n.Pipes[:0], n.Areas[:0]
	for _, p := range n.Pipes {
		if p.From >= 0 && p.To >= 0 && p.From != p.To {
			pipes = append(pipes, p)
		}
	}
	for _, a := range n.Areas {
		if a.Structure >= 0 {
			areas = append(areas, a)
		}
	}
	whole = len(pipes) == len(n.Pipes)
	n.Pipes, n.Areas = pipes, areas
	return whole
}

// judgeHeads: sizing hangs the levels of a branch on the rim or the given invert
// at its head.
func (r *reader) judgeHeads(j *Job, told map[filePlace]bool) {
	n := r.network
	for i := range n.Pipes {
		p := &n.Pipes[i]
		s := &n.Structures[p.From]
		if p.InvertUpper.OK || s.Rim.OK || len(n.PipesIn(p.From)) > 0 {
			continue
		}
		f := j.Locate(network.Problem{
			Table: "structures", Line: int(s.Line), Field: "rim",
			Text: fmt.Sprintf("structure %s is the head of pipe %s and has no rim, and the pipe has no upper invert: give one of them", s.ID, p.ID),
		})
		if !told[filePlace{f.File, place{f.Line, f.Column}}] {
			r.faults = append(r.faults, f)
		}
	}
}

// columnOf finds the column, in characters, of a field in the row that starts at
// a line. It reads that row again, since places are kept only of cells that are
// faults by themselves.
func (t *table) columnOf(line int, field string) int {
	if t.lines == nil {
		t.lines = lineStarts(t.text)
	}
	i, ok := t.column[field]
	if !ok || line > len(t.lines) {
		return 1
	}
	again := csv.NewReader(bytes.NewReader(t.text[t.lines[line-1]:]))
	again.Comma, again.FieldsPerRecord = t.sep, -1
	record, err := again.Read()
	if err != nil {
		return 1
	}
	row, column := again.FieldPos(min(i, len(record)-1))
	return t.runes(line+row-1, column)
}
