package review

import (
	"cmp"
	"slices"

	"rimfall/network"
)

// ReliefOptions say which limits are to hold, what may be done, and how long the least is looked for. Its zero value asks
// for all limits by any work.
type ReliefOptions struct {
	Limits  []LimitKind // none: all of them
	Works   []Work      // none: Replace and Double
	Runs    int         // of one system in the search for the least; 0: ReliefRuns, fewer in a system of over 60 pipes
	Threads int         // 0: as many as the program may use
}

// ReliefRuns is how many runs of one system the search for the least takes at most. A pipe has up to some fifty choices,
// so that two pipes are always searched whole, and mostly far more: what costs more than the best is not run.
const ReliefRuns = 20000

// Work is what is done to a pipe.
type Work int8

// The works: the pipe stays as it is; a larger one takes its place; a second one is laid beside it.
const (
	Keep Work = iota
	Replace
	Double
)

// Works lists the words for the works, in the order of the constants.
var Works = []string{"keep", "replace", "double"}

func (w Work) String() string { return Works[w] }

// Relief is what is done so that all limits hold.
type Relief struct {
	Options ReliefOptions // with the defaults filled in
	Broken  []Place       // in the network as it is
	Changes []Alteration  // by pipe
	Systems []SystemRelief
}

// Alteration is the work at one pipe.
type Alteration struct {
	Pipe   network.PipeIndex
	Choice Choice
	Share  float64 // of the flow that the second pipe takes; 0 where the pipe is replaced
}

// Price is what work costs. The first number decides; of equal ones the second.
type Price struct {
	First  float64 // cost by costs.csv; without it the length of pipe that is laid, ft or m
	Second float64 // volume inside the pipes that are laid, ft³ or m³
}

// less tells whether a price is under another one.
func (p Price) less(q Price) bool {
	return p.First < q.First || p.First == q.First && p.Second < q.Second
}

func (p Price) plus(q Price) Price { return Price{p.First + q.First, p.Second + q.Second} }

// SystemRelief is the answer for one system of pipes that hang together, in which a limit is broken.
type SystemRelief struct {
	First network.StructureIndex // its first structure, in the order of the file
	Pipes int                    // how many it has
	Found bool                   // something was found by which all limits hold
	Least bool                   // it was proven: everything that costs less was tried and fails, or nothing at all holds
	Price Price                  // of what was found
	Bound Price                  // nothing that costs less than this holds
	Runs  int                    // of the whole system
	Left  []Place                // what was still broken in the best that was tried, where nothing was found
}

// FindRelief looks for the least work on the pipes of a network by which the limits hold in its storm, with the peaks that
// the job asks for, and no pipe becomes smaller than one that enters it where it was not so before. New pipes have the
// shape, the material, n and the inverts of the old ones. Each system of pipes is a question of its own.
// The error is a fault.List.
func (s *Subject) FindRelief(o ReliefOptions) (*Relief, error) {
	r := &Relief{Options: o.filled()}
	rain, err := s.rain(s.Storm.ReturnPeriod)
	if err != nil {
		return nil, err
	}
	timed, err := s.timed(rain)
	if err != nil {
		return nil, err
	}
	part, count := parts(timed)
	found := make([]*reliever, count)
	errs := make([]error, count)
	each(threadsOr(o.Threads, count), count, func(_, task int) {
		found[task] = s.newReliever(&r.Options, rain, partOf(timed, part, int32(task)))
		errs[task] = s.problems(found[task].asItIs.problems)
		if errs[task] == nil && len(found[task].asItIs.broken) > 0 {
			found[task].search()
		}
	})
	if err := firstError(errs); err != nil {
		return nil, err
	}
	for _, f := range found {
		if len(f.asItIs.broken) > 0 {
			f.report(r)
		}
	}
	slices.SortFunc(r.Changes, func(a, b Alteration) int { return cmp.Compare(a.Pipe, b.Pipe) })
	slices.SortFunc(r.Broken, comparePlaces)
	return r, nil
}

// filled is the options with the defaults in place of what was left out.
func (o ReliefOptions) filled() ReliefOptions {
	if len(o.Limits) == 0 {
		o.Limits = []LimitKind{Capacity, Crown, Freeboard, Rim}
	}
	if len(o.Works) == 0 {
		o.Works = []Work{Replace, Double}
	}
	return o
}

// runsOf is how many runs the search for the least takes at most in a system of so many pipes.
func (o *ReliefOptions) runsOf(pipes int) int {
	const pipeRuns = 60 * ReliefRuns // of all pipes: some ten seconds
	if o.Runs > 0 {
		return o.Runs
	}
	return min(ReliefRuns, pipeRuns/max(1, pipes))
}

func comparePlaces(a, b Place) int {
	return cmp.Or(cmp.Compare(a.Limit, b.Limit), cmp.Compare(a.Index, b.Index))
}

// report adds the answer for a system to that for the network.
func (f *reliever) report(r *Relief) {
	out := SystemRelief{
		First: f.system.structures[0], Pipes: len(f.system.pipes), Found: f.found, Least: f.least,
		Price: f.price(f.best), Bound: f.bound, Runs: f.runs, Left: f.whole(f.left),
	}
	r.Broken = append(r.Broken, f.whole(f.asItIs.broken)...)
	r.Systems = append(r.Systems, out)
	if !f.found {
		return
	}
	for i, c := range f.best {
		if choice := f.choices[i][c]; choice.Work != Keep {
			change := Alteration{Pipe: f.system.pipes[i], Choice: choice}
			if choice.Work == Double {
				change.Share = conveyanceShare(&f.system.network.Pipes[i], &choice)
			}
			r.Changes = append(r.Changes, change)
		}
	}
}

// whole gives places of a system their indexes in the whole network.
func (f *reliever) whole(places []Place) []Place {
	all := slices.Clone(places)
	for i := range all {
		if all[i].Limit.OfPipes() {
			all[i].Index = int32(f.system.pipes[all[i].Index])
		} else {
			all[i].Index = int32(f.system.structures[all[i].Index])
		}
	}
	return all
}
