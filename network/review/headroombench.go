package review

import (
	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/finding"
	"rimfall/network/grade"
	"rimfall/network/sweep"
)

// bench is one system set up to be loaded: its runs before anything is added, and what of it still holds.
type bench struct {
	*system
	part    int32
	subject *Subject
	options *HeadroomOptions
	storm   network.Storm
	rain    hydrology.Intensity
	runner  *runner
	kept    sweep.Flows // before anything is added
	live    [limits][]bool
	before  [limits][]float64 // rooms before anything is added, over their scales
	broken  []Place
	levels  bool // a limit of grade lines counts

	at      network.StructureIndex // that is loaded, in the system
	changed []bool
	path    []network.PipeIndex // below it
	runs    int
}

// newBench sets up one part of the network, with the inlet times of the storm. The error is a fault.List.
func (s *Subject) newBench(o *HeadroomOptions, part []int32, which int32) (*bench, error) {
	rain, err := s.rain(s.Storm.ReturnPeriod)
	if err != nil {
		return nil, err
	}
	timed, err := s.timed(rain)
	if err != nil {
		return nil, err
	}
	b := &bench{system: partOf(timed, part, which), part: which, subject: s, options: o, storm: s.Storm, rain: rain}
	b.storm.Peak = network.PartialArea
	b.runner = newRunner(b.network, s.settings, b.storm.Peak)
	b.network = b.runner.network
	b.changed = make([]bool, len(b.structures))
	flows, problems := b.runner.sweep.Down(&b.storm, rain)
	if len(problems) > 0 {
		return nil, s.problems(problems)
	}
	b.kept = flows.Copy()
	for _, l := range o.Limits {
		b.levels = b.levels || l != Capacity
	}
	b.sortOut(flows)
	return b, nil
}

// sortOut parts the limits that hold from those that are broken already.
func (b *bench) sortOut(flows *sweep.Flows) {
	run := b.state(flows)
	for _, l := range b.options.Limits {
		b.live[l], b.before[l] = make([]bool, b.count(l)), make([]float64, b.count(l))
		for i := range b.live[l] {
			room, scale, ok := b.room(&run, l, int32(i))
			b.live[l][i], b.before[l][i] = ok && room >= 0, room/scale-keepOff
			if ok && room < 0 {
				b.broken = append(b.broken, b.whole(Place{l, int32(i)}))
			}
		}
	}
}

// count is how many places have a limit.
func (b *bench) count(l LimitKind) int {
	if l.OfPipes() {
		return len(b.pipes)
	}
	return len(b.structures)
}

// whole is a place of the system as one of the whole network.
func (b *bench) whole(p Place) Place {
	if p.Limit.OfPipes() {
		return Place{p.Limit, int32(b.pipes[p.Index])}
	}
	return Place{p.Limit, int32(b.structures[p.Index])}
}

// state is a run, with its grade lines where they are asked for.
func (b *bench) state(flows *sweep.Flows) state {
	run := state{network: b.network, criteria: &b.subject.Job.Settings.Criteria, flows: flows}
	if b.levels {
		run.lines = b.runner.grade.Up(flows, grade.DesignTailwater)
	}
	return run
}

// room is what room a run leaves at a place, and a scale to measure it by.
func (b *bench) room(run *state, l LimitKind, i int32) (room, scale float64, ok bool) {
	switch l {
	case Capacity:
		room, ok = run.capacityRoom(network.PipeIndex(i))
		return room, max(run.flows.Pipes[i].Capacity, finding.LevelRoom), ok
	case Crown:
		room, ok = run.crownRoom(network.PipeIndex(i), true)
	case Freeboard:
		room, ok = run.freeboardRoom(network.StructureIndex(i))
	default:
		room, ok = run.rimRoom(network.StructureIndex(i))
	}
	return room, 1, ok
}

// keepOff is how far, relative to its scale, an amount that is said to hold stays off a limit: over the rounding by
// which another order of the same sums can differ.
const keepOff = 1e-9

// least is the least room of all limits that held before, over its scale, and where it is; run is nil before anything
// is added. Flows change below the structure alone. found is false where there is no such limit.
func (b *bench) least(run *state) (least float64, where Place, found bool) {
	look := func(l LimitKind, i int32) {
		if !b.live[l][i] {
			return
		}
		room := b.before[l][i]
		if run != nil {
			r, scale, _ := b.room(run, l, i)
			room = r/scale - keepOff
		}
		if !found || room < least {
			least, where, found = room, Place{l, i}, true
		}
	}
	for _, l := range b.options.Limits {
		if l == Capacity {
			for _, p := range b.path {
				look(l, int32(p))
			}
			continue
		}
		for i := range b.live[l] {
			look(l, int32(i))
		}
	}
	return least, where, found
}

// load points the bench at a structure of the system.
func (b *bench) load(at network.StructureIndex) {
	b.at, b.runs = at, 0
	b.path = b.below(at, b.changed, b.path[:0])
	b.runner.sweep.Keep(&b.kept)
	b.runner.sweep.Way(b.changed)
}

// run adds an area or a steady flow at the structure and computes what is below it; the flows are those of the
// bench until the next run. ok is false where a time goes beyond the rainfall.
func (b *bench) run(area, flow float64) (run state, ok bool) {
	b.runs++
	added, at := &b.network.Areas[b.added[b.at]], &b.network.Structures[b.at]
	given := at.Inflow
	at.Inflow += flow
	if area > 0 {
		added.Area, added.C, added.Time = area, b.options.C, network.Some(b.options.Time)
	}
	flows, problems := b.runner.sweep.Below()
	run = b.state(flows)
	at.Inflow = given
	added.Area, added.C, added.Time = 0, 0, network.Maybe{}
	return run, len(problems) == 0
}
