package review

import (
	"rimfall/network"
	"rimfall/network/finding"
	"rimfall/network/grade"
	"rimfall/network/sweep"
)

// LimitKind is what a place must hold. They are the rules of the same meaning in a check, to the last digit.
type LimitKind int8

// The limits.
const (
	Capacity  LimitKind = iota // flow not over full-bore capacity
	Crown                      // grade line not over the crown of a pipe
	Freeboard                  // rim less grade line not under the criterion
	Rim                        // grade line not over the rim
	limits
)

// Limits lists the words for the limits, in the order of the constants.
var Limits = []string{"capacity", "crown", "freeboard", "rim"}

func (l LimitKind) String() string { return Limits[l] }

// Rule is the rule of a check that speaks where the limit is broken.
func (l LimitKind) Rule() string {
	return [...]string{"capacity", "surcharge", "freeboard", "flooding"}[l]
}

// OfPipes tells whether the limit is one of pipes, or else of structures.
func (l LimitKind) OfPipes() bool { return l == Capacity || l == Crown }

// state is one run of one network, with what its limits are judged by.
type state struct {
	network  *network.Network
	criteria *network.Criteria
	flows    *sweep.Flows
	lines    *grade.Lines // nil where only capacity is asked for
}

// capacityRoom is what a pipe could carry besides its flow, cfs or m³/s: negative where it is over capacity.
// There is none where the pipe does not fall.
func (r *state) capacityRoom(p network.PipeIndex) (room float64, ok bool) {
	run := &r.flows.Pipes[p]
	return run.Capacity - run.Flow, run.HasCapacity
}

// crownRoom is the height of a crown over the grade line, at the upper end alone or at the worse of both ends;
// negative where the line stands over it, in a dry pipe too. There is none where the line is not known.
func (r *state) crownRoom(p network.PipeIndex, bothEnds bool) (room float64, ok bool) {
	pipe, line := &r.network.Pipes[p], &r.lines.Pipes[p]
	if !line.Known {
		return 0, false
	}
	rise := pipe.Section.Rise()
	room = pipe.InvertUpper.V + rise + finding.LevelRoom - line.HGLUpper
	if bothEnds {
		room = min(room, pipe.InvertLower.V+rise+finding.LevelRoom-line.HGLLower)
	}
	return room, true
}

// rimRoom is the height of a rim over the grade line, and freeboardRoom that height less the criterion. There is
// none at an outfall, nor where the rim or the line is not known.
func (r *state) rimRoom(s network.StructureIndex) (room float64, ok bool) {
	given, at := &r.network.Structures[s], &r.lines.Structures[s]
	if given.Kind == network.Outfall || !given.Rim.OK || !at.Known {
		return 0, false
	}
	return given.Rim.V + finding.LevelRoom - at.Level, true
}

func (r *state) freeboardRoom(s network.StructureIndex) (room float64, ok bool) {
	given, at := &r.network.Structures[s], &r.lines.Structures[s]
	if free := at.Freeboard(given); free.OK && given.Kind != network.Outfall {
		return free.V - (r.criteria.Freeboard - finding.LevelRoom), true
	}
	return 0, false
}
