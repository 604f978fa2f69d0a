package analysis

import (
	"cmp"
	"slices"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/finding"
	"rimfall/network/grade"
	"rimfall/network/job"
	"rimfall/network/size"
	"rimfall/network/sweep"
)

// Sizes for the grade line: where the line of the design storm breaks the freeboard, chosen pipes are enlarged one size at a
// time, and everything is sized again after each. Systems that no pipe joins are worked one by one.

// enlargement is what it comes to, for a whole network.
type enlargement struct {
	atLeast []float64 // full area under which a pipe's size is not chosen; 0: no limit
	growth  []finding.Growth
	uncured map[network.StructureIndex]bool
}

// enlarge finds it for a network as it was given. A storm that cannot be swept, because a time is beyond the rainfall, is
// left to the run itself, which says so.
func enlarge(j *job.Job, storm network.Storm, candidates func(shape, material string) []size.Candidate) enlargement {
	e := enlargement{atLeast: make([]float64, len(j.Network.Pipes)), uncured: map[network.StructureIndex]bool{}}
	rain, ok := j.Curve(storm.ReturnPeriod)
	if !ok {
		return e
	}
	for _, part := range systems(j.Network) {
		w := enlarger{job: j, storm: storm, rain: rain, candidates: candidates, system: part, atLeast: make([]float64, len(part.pipes))}
		if w.work() {
			w.report(&e)
		}
	}
	return e
}

// enlarger works on one system.
type enlarger struct {
	job        *job.Job
	storm      network.Storm
	rain       hydrology.Intensity
	candidates func(shape, material string) []size.Candidate
	system     system

	atLeast []float64
	first   attempt // before anything was enlarged
	now     attempt
	grewFor []network.StructureIndex // by pipe, the structure for which it was last enlarged; -1: none
	stuck   map[network.StructureIndex]bool
}

// attempt is a system, sized, with its grade lines.
type attempt struct {
	network *network.Network
	lines   *grade.Lines
}

// try sizes the system with the least areas as they stand.
func (w *enlarger) try() (attempt, bool) {
	n := w.system.network.Clone()
	s := &w.job.Settings
	chooser := size.New(n, &s.Criteria, s.Units, w.storm.ManningFactor, w.candidates)
	chooser.AtLeast = w.atLeast
	flows, problems := sweep.Down(n, &w.storm, w.rain, chooser)
	if len(problems) > 0 {
		return attempt{}, false
	}
	return attempt{n, grade.Up(n, gradeSettings(w.job), &flows, grade.DesignTailwater)}, true
}

// work enlarges pipes until every freeboard holds or nothing lowers what is left. It ends, since a pipe that grew stays at
// least so large and the list of sizes is finite. It tells whether the system could be run.
func (w *enlarger) work() (ok bool) {
	if w.first, ok = w.try(); !ok {
		return false
	}
	w.now, w.stuck = w.first, map[network.StructureIndex]bool{}
	w.grewFor = make([]network.StructureIndex, len(w.atLeast))
	for i := range w.grewFor {
		w.grewFor[i] = -1
	}
	fromBelow := upstreamOrder(w.system.network)
	for {
		s, broken := w.governing(fromBelow)
		if !broken {
			return true
		}
		if !w.lower(s) {
			w.stuck[s] = true
		}
	}
}

// governing is the structure farthest downstream whose freeboard is broken and may yet be cured: its level drives those
// above it.
func (w *enlarger) governing(fromBelow []network.StructureIndex) (s network.StructureIndex, broken bool) {
	for _, s := range fromBelow {
		if !w.stuck[s] && w.breaks(s) {
			return s, true
		}
	}
	return 0, false
}

// upstreamOrder lists all structures from the outfalls up: by the number of pipes on the longest way down, then by id, so
// that the order of the rows changes no result.
func upstreamOrder(n *network.Network) []network.StructureIndex {
	order, _ := n.Order()
	steps := make([]int, len(n.Structures))
	for _, s := range slices.Backward(order) {
		for _, p := range n.PipesOut(s) {
			steps[s] = max(steps[s], 1+steps[n.Pipes[p].To])
		}
	}
	slices.SortFunc(order, func(a, b network.StructureIndex) int {
		return cmp.Or(cmp.Compare(steps[a], steps[b]), cmp.Compare(n.Structures[a].ID, n.Structures[b].ID))
	})
	return order
}

// breaks tells whether the freeboard is broken at a structure.
func (w *enlarger) breaks(s network.StructureIndex) bool {
	given := &w.now.network.Structures[s]
	free := w.now.lines.Structures[s].Freeboard(given)
	return given.Kind != network.Outfall && finding.BreaksFreeboard(free, w.job.Settings.Criteria.Freeboard)
}

// lower enlarges by one size the first pipe, from the one that sets the level of a structure down to the outfall, that
// lowers the level so. What does not is undone.
func (w *enlarger) lower(s network.StructureIndex) bool {
	level := w.now.lines.Structures[s].Level
	for at := s; ; {
		p := w.now.lines.Structures[at].Out
		if p < 0 {
			return false
		}
		if w.system.network.Pipes[p].Section == nil && w.grow(p, s, level) {
			return true
		}
		at = w.now.network.Pipes[p].To
	}
}

// grow enlarges one pipe, and keeps that where it lowers the level by more than a step of the chosen inverts. Where levels
// are so high that a step is lost in their rounding, the level has to fall all the same, else the work would not end.
func (w *enlarger) grow(p network.PipeIndex, s network.StructureIndex, level float64) bool {
	before := w.atLeast[p]
	w.atLeast[p] = w.now.network.Pipes[p].FullArea() * overSame
	after, ok := w.try()
	sinks := 1 / w.job.Settings.Units.InvertSteps
	reached := after.levelAt(s)
	if !ok || !reached.OK || !(reached.V <= level-sinks && reached.V < level) {
		w.atLeast[p] = before
		return false
	}
	for i := range w.grewFor {
		if after.network.Pipes[i].FullArea() > w.now.network.Pipes[i].FullArea()*overSame {
			w.grewFor[i] = s
		}
	}
	w.now = after
	return true
}

// levelAt is the grade line at a structure; none where it is not known.
func (a *attempt) levelAt(s network.StructureIndex) network.Maybe {
	if a.lines == nil || !a.lines.Structures[s].Known {
		return network.Maybe{}
	}
	return network.Some(a.lines.Structures[s].Level)
}

// overSame is beyond the room that counts two areas as the same.
const overSame = 1 + 1e-6

// report adds what came out of the system to that of the whole network.
func (w *enlarger) report(e *enlargement) {
	for i, p := range w.system.pipes {
		e.atLeast[p] = w.atLeast[i]
		first, last := &w.first.network.Pipes[i], &w.now.network.Pipes[i]
		if w.grewFor[i] >= 0 && last.FullArea() > first.FullArea()*overSame {
			e.growth = append(e.growth, finding.Growth{Pipe: p, From: first.Size, For: w.system.structures[w.grewFor[i]]})
		}
	}
	for i, s := range w.system.structures {
		if w.stuck[network.StructureIndex(i)] && w.breaks(network.StructureIndex(i)) {
			e.uncured[s] = true
		}
	}
}
