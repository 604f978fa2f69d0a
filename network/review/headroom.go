package review

import (
	"fmt"
	"slices"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/fault"
)

// HeadroomOptions say what is to be added, and which limits count. Its zero value asks at every structure, for all
// limits and for an area of DefaultC and DefaultTime.
type HeadroomOptions struct {
	At      string      // id of one structure; "": every one
	Limits  []LimitKind // none: all of them
	C       float64     // runoff coefficient of the area, over 0 to 1; 0: DefaultC
	Time    float64     // its inlet time, min; 0: DefaultTime
	Threads int         // 0: as many as the program may use
}

// The area that is added where nothing else is said: a mixed development with ten minutes of way over its ground and
// gutters, common practice.
const (
	DefaultC    = 0.7
	DefaultTime = 12
)

// Headroom is how much more may be connected where.
type Headroom struct {
	Options    HeadroomOptions // with the defaults filled in
	SetAside   []Place         // limits that are broken already; they count no more
	Structures []StructureHeadroom
}

// Place is one limit of one pipe or structure.
type Place struct {
	Limit LimitKind
	Index int32 // a PipeIndex or a StructureIndex
}

// StructureHeadroom is the answer for one structure. Runs is how many times the way below it was computed.
type StructureHeadroom struct {
	Structure  network.StructureIndex
	Area, Flow Amount // of the area alone; of a steady flow instead
	Runs       int
}

// Amount is the largest that may be added such that it and every smaller one holds. Where OK is false no limit was
// found that ever breaks, or Why says what kept it from being found.
type Amount struct {
	OK      bool
	Value   float64 // acre or ha; cfs or m³/s
	Governs Place   // what breaks first beyond it
	Why     string
}

// FindHeadroom asks at structures how much more they can take before the first limit breaks anywhere in their system.
// All is computed anew for every amount tried, times, intensities and grade lines. Peaks are by partial area, whatever
// the job says: in every pipe they are the larger of the peak at the longest time and any at a shorter
// one, so that a slow area that is added cannot lower a flow. An outfall is not asked. The error is a fault.List.
func (s *Subject) FindHeadroom(o HeadroomOptions) (*Headroom, error) {
	h := &Headroom{Options: o.filled()}
	at, err := s.asked(o.At)
	if err != nil {
		return nil, err
	}
	h.Structures = make([]StructureHeadroom, len(at))
	if err := s.knows(h.Options.Time); err != nil {
		return nil, err
	}
	part, count := parts(s.Network)
	slices.SortStableFunc(at, func(a, b network.StructureIndex) int { return int(part[a]) - int(part[b]) })
	if h.SetAside, err = s.setAside(&h.Options, part, count); err != nil {
		return nil, err
	}
	threads := threadsOr(o.Threads, len(at))
	benches := make([]*bench, threads)
	errs := make([]error, len(at))
	each(threads, len(at), func(thread, task int) {
		b := benches[thread]
		if b == nil || b.part != part[at[task]] {
			if b, errs[task] = s.newBench(&h.Options, part, part[at[task]]); errs[task] != nil {
				return
			}
			benches[thread] = b
		}
		h.Structures[task] = b.headroom(at[task])
	})
	slices.SortFunc(h.Structures, func(a, b StructureHeadroom) int { return int(a.Structure - b.Structure) })
	return h, firstError(errs)
}

// filled is the options with the defaults in place of what was left out.
func (o HeadroomOptions) filled() HeadroomOptions {
	if len(o.Limits) == 0 {
		o.Limits = []LimitKind{Capacity, Crown, Freeboard, Rim}
	}
	if o.C == 0 {
		o.C = DefaultC
	}
	if o.Time == 0 {
		o.Time = DefaultTime
	}
	return o
}

// knows tells whether the rainfall is known for an inlet time.
func (s *Subject) knows(minutes float64) error {
	rain, err := s.rain(s.Storm.ReturnPeriod)
	if err != nil {
		return err
	}
	if _, where := rain.At(minutes); where == hydrology.Beyond {
		return fault.List{{File: s.Job.Rain.File, Text: fmt.Sprintf("an inlet time of %g min is beyond the last duration of the rainfall; take a shorter one, or add longer durations", minutes)}}
	}
	return nil
}

// asked lists the structures that are asked: one by its id, or all but outfalls.
func (s *Subject) asked(id string) ([]network.StructureIndex, error) {
	var all []network.StructureIndex
	var ids []string
	for i := range s.Network.Structures {
		at := &s.Network.Structures[i]
		if at.Kind == network.Outfall {
			continue
		}
		ids = append(ids, at.ID)
		if id == "" || at.ID == id {
			all = append(all, network.StructureIndex(i))
		}
	}
	if len(all) == 0 && id != "" {
		return nil, fault.List{{Text: fmt.Sprintf("no structure %s that can be added to; %s", id, fault.Suggest(id, ids))}}
	}
	return all, nil
}

// setAside lists the limits that are broken already, in the order of the files.
func (s *Subject) setAside(o *HeadroomOptions, part []int32, count int) ([]Place, error) {
	var all []Place
	for which := range count {
		b, err := s.newBench(o, part, int32(which))
		if err != nil {
			return nil, err
		}
		all = append(all, b.broken...)
	}
	slices.SortFunc(all, func(a, b Place) int {
		if a.Limit != b.Limit {
			return int(a.Limit) - int(b.Limit)
		}
		return int(a.Index - b.Index)
	})
	return all, nil
}
