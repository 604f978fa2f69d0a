package review

import (
	"math"

	"rimfall/network"
	"rimfall/network/grade"
)

// Carries is the largest storm that every place of a network still carries.
type Carries struct {
	Smallest, Largest float64 // of the storms of the rainfall, years
	Pipes             []PipeCarries
	Structures        []StructureCarries
	Runs              int // of the network, to find them
}

// PipeCarries is what one pipe carries.
type PipeCarries struct {
	Capacity Carried // flow up to full-bore capacity
	Crown    Carried // grade line up to the crown, at the upper end
}

// StructureCarries is what one structure carries, and the weakest places from here down to the outfall.
type StructureCarries struct {
	Freeboard, Rim                Carried
	WeakestCapacity, WeakestCrown Weakest // pipes on the way down
	WeakestRim                    Weakest // structures, this one included
}

// Carried is the largest storm that one limit holds in, together with every smaller one that was run.
type Carried struct {
	Judged bool    // the limit is one for the place; all else is empty where it is not
	All    bool    // it holds in the largest storm, which is then the period
	None   bool    // it breaks in the smallest storm; there is no period
	Period float64 // years
}

// Weakest is the place of the smallest period on a way down. Place is −1 where no limit on it is judged; it is a
// PipeIndex or a StructureIndex.
type Weakest struct {
	Place   int32
	Carried Carried
}

// CarriesOptions say how the storms are run.
type CarriesOptions struct {
	Threads int // 0: as many as the program may use
}

// FindCarries runs a network with storms of the whole range of its rainfall and finds for each limit the
// first that breaks it. The network runs at the intensities of every period tried; flows are not
// interpolated. The error is a fault.List.
func (s *Subject) FindCarries(o CarriesOptions) (*Carries, error) {
	c := newSearch(s, o.Threads)
	if err := c.scan(); err != nil {
		return nil, err
	}
	if err := c.refine(); err != nil {
		return nil, err
	}
	return c.result(), nil
}

// rooms lays out the limits of a network in one row: capacity and crown of every pipe, then freeboard and rim of
// every structure. NaN where a limit is none for its place.
func (r *state) rooms(row []float64) {
	put := func(k int, room float64, ok bool) {
		if row[k] = room; !ok {
			row[k] = math.NaN()
		}
	}
	k := 0
	for i := range r.network.Pipes {
		room, ok := r.capacityRoom(network.PipeIndex(i))
		put(k, room, ok)
		room, ok = r.crownRoom(network.PipeIndex(i), false)
		put(k+1, room, ok)
		k += 2
	}
	for i := range r.network.Structures {
		room, ok := r.freeboardRoom(network.StructureIndex(i))
		put(k, room, ok)
		room, ok = r.rimRoom(network.StructureIndex(i))
		put(k+1, room, ok)
		k += 2
	}
}

// result reads the brackets and finds the weakest places.
func (c *carriesSearch) result() *Carries {
	n := c.subject.Network
	out := &Carries{
		Smallest: c.tried[0], Largest: c.tried[len(c.tried)-1], Runs: c.runs,
		Pipes: make([]PipeCarries, len(n.Pipes)), Structures: make([]StructureCarries, len(n.Structures)),
	}
	for i := range out.Pipes {
		out.Pipes[i] = PipeCarries{c.carried(2 * i), c.carried(2*i + 1)}
	}
	for i := range out.Structures {
		k := 2 * (len(n.Pipes) + i)
		out.Structures[i].Freeboard, out.Structures[i].Rim = c.carried(k), c.carried(k+1)
	}
	out.weakest(n)
	return out
}

// weakest goes up from the outfalls and keeps the smallest period on each way down.
func (c *Carries) weakest(n *network.Network) {
	order, _ := n.Order()
	for i := len(order) - 1; i >= 0; i-- {
		at := &c.Structures[order[i]]
		at.WeakestCapacity.Place, at.WeakestCrown.Place, at.WeakestRim.Place = -1, -1, -1
		at.WeakestRim.keep(int32(order[i]), at.Rim)
		for _, p := range n.PipesOut(order[i]) {
			pipe, below := &c.Pipes[p], &c.Structures[n.Pipes[p].To]
			at.WeakestCapacity.keep(int32(p), pipe.Capacity)
			at.WeakestCapacity.keep(below.WeakestCapacity.Place, below.WeakestCapacity.Carried)
			at.WeakestCrown.keep(int32(p), pipe.Crown)
			at.WeakestCrown.keep(below.WeakestCrown.Place, below.WeakestCrown.Carried)
			at.WeakestRim.keep(below.WeakestRim.Place, below.WeakestRim.Carried)
		}
	}
}

// keep takes a place that carries less. Of two that carry the same the upper one stays.
func (w *Weakest) keep(place int32, c Carried) {
	if c.Judged && (w.Place < 0 || c.Period < w.Carried.Period) {
		w.Place, w.Carried = place, c
	}
}

// roomsOf runs one storm and lays out what room it leaves.
func (s *Subject) roomsOf(r *runner, period float64, row []float64) error {
	rain, err := s.rain(period)
	if err != nil {
		return err
	}
	timed, err := s.timed(rain)
	if err != nil {
		return err
	}
	copy(r.network.Areas, timed.Areas)
	storm := s.Storm
	storm.ReturnPeriod = period
	flows, problems := r.sweep.Down(&storm, rain)
	if len(problems) > 0 {
		return s.problems(problems)
	}
	lines := r.grade.Up(flows, grade.DesignTailwater)
	run := state{s.Network, &s.Job.Settings.Criteria, flows, lines}
	run.rooms(row)
	return nil
}
