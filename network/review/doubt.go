package review

import (
	"fmt"
	"math"
	"sync/atomic"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/network/grade"
)

// DoubtOptions say how many runs are made and how far the inputs vary. Its zero value makes DefaultRuns of seed 0
// without any spread; UsualSpreads are those of practice.
type DoubtOptions struct {
	Runs    int // 0: DefaultRuns
	Seed    uint64
	Spreads Spreads
	Shared  float64 // part of the variance of each input that nature shares, 0 to 1
	Threads int     // 0: as many as the program may use

	Progress func(done int) // called now and then, from any thread; may be nil
}

// DefaultRuns is enough to tell a chance of one in ten to about ±0.013.
const DefaultRuns = 2000

// Spreads are standard deviations of the natural logarithm of a factor on each input, so that a spread of 0.1 is about
// ±10 %. The factor is lognormal with the median 1: one run in two has more than was given.
type Spreads struct {
	N    float64 // on Manning's n
	C    float64 // on the runoff coefficient, which stays at most 1
	Rain float64 // on every intensity, where the rainfall has no bounds of its own
	Time float64 // on the inlet time
	Flow float64 // on the steady flow that enters
}

// UsualSpreads are spreads of common practice for pipes that were not inspected and areas that were measured from
// maps; they rest on no source, and stand in every answer.
var UsualSpreads = Spreads{N: 0.10, C: 0.12, Rain: 0.12, Time: 0.20, Flow: 0.20}

// UsualShared is the part of the variance that is shared, common practice.
const UsualShared = 0.5

// Doubt is how sure the results of a check are.
type Doubt struct {
	Options    DoubtOptions // with the defaults filled in
	Bounds     bool         // the rainfall has bounds of its own, which stand for the spread
	Confidence float64      // of those
	Pipes      []PipeDoubt
	Structures []StructureDoubt
}

// PipeDoubt is what many runs tell of one pipe.
type PipeDoubt struct {
	OverCapacity network.Maybe // share of runs; none where the pipe does not fall
	Surcharge    network.Maybe // grade line over the crown at either end; none where it is not known
	DepthRatio   Quantiles     // depth at design flow over the rise
	Load         Quantiles     // flow over capacity; none where the pipe does not fall
	Matters      Correlations  // of the load
}

// StructureDoubt is what many runs tell of one structure.
type StructureDoubt struct {
	Flooding  network.Maybe // share of runs in which the grade line is over the rim; none where there is no rim
	Freeboard network.Maybe // share of runs in which the freeboard is not kept
	Level     Quantiles     // of the grade line; none where it is not known
	Matters   Correlations  // of the level
}

// FindDoubt runs a network many times with inputs drawn anew, and counts. The runs depend on their number and the seed
// alone, not on the number of threads. The error is a fault.List.
func (s *Subject) FindDoubt(o DoubtOptions) (*Doubt, error) {
	if o.Runs == 0 {
		o.Runs = DefaultRuns
	}
	if err := s.roomFor(o.Runs); err != nil {
		return nil, err
	}
	rain, err := s.rain(s.Storm.ReturnPeriod)
	if err != nil {
		return nil, err
	}
	timed, err := s.timed(rain)
	if err != nil {
		return nil, err
	}
	d := &Doubt{Options: o}
	threads := threadsOr(o.Threads, o.Runs)
	kept := newSample(timed, o.Runs)
	draws := make([]*draw, threads)
	bounds := s.bounds()
	d.Bounds, d.Confidence = bounds.confidence > 0, bounds.confidence
	for i := range draws {
		draws[i] = newDraw(newRunner(timed, s.settings, s.Storm.Peak), &d.Options, drawnRainOf(rain, bounds), &s.Storm)
	}
	if err := s.makeRuns(draws, kept, &d.Options); err != nil {
		return nil, err
	}
	d.Pipes, d.Structures = kept.statistics(threads)
	return d, nil
}

// mostKept is how many results of pipes and structures are kept at most, over all runs: about 1.4 GB.
const mostKept = 80_000_000

// roomFor refuses more runs than memory holds, since every run of every place is kept for its quantiles and ranks.
func (s *Subject) roomFor(runs int) error {
	places := len(s.Network.Pipes) + len(s.Network.Structures)
	if places*runs <= mostKept {
		return nil
	}
	return fault.List{{Text: fmt.Sprintf("%d runs of %d pipes and structures are more than are kept in memory; take at most %d runs", runs, places, mostKept/places)}}
}

// makeRuns makes all runs and keeps what they show.
func (s *Subject) makeRuns(draws []*draw, kept *sample, o *DoubtOptions) error {
	var made atomic.Int64
	beyond := make([]bool, o.Runs)
	criteria := &s.Job.Settings.Criteria
	each(len(draws), o.Runs, func(thread, task int) {
		d := draws[thread]
		d.draw(o.Seed, task)
		flows, problems := d.runner.sweep.Down(&s.Storm, &d.rain)
		if len(problems) > 0 {
			beyond[task] = true
			return
		}
		lines := d.runner.grade.Up(flows, grade.DesignTailwater)
		kept.keep(task, &state{d.runner.network, criteria, flows, lines}, d)
		if now := made.Add(1); o.Progress != nil && now%16 == 0 {
			o.Progress(int(now))
		}
	})
	failed := 0
	for _, b := range beyond {
		if b {
			failed++
		}
	}
	if failed > 0 {
		return fault.List{{File: s.Job.Rain.File, Text: fmt.Sprintf("in %d of %d runs a time is beyond the last duration of the rainfall; add longer durations", failed, o.Runs)}}
	}
	return nil
}

// drawnRain is a storm whose intensities are drawn: times a factor, or where the rainfall has bounds, between the
// estimate and one of them, evenly in the logarithm:
//
//	i = e (b/e)^w
//
// Both fall with duration, and so does what lies between.
type drawnRain struct {
	estimate     hydrology.Intensity
	upper, lower hydrology.Intensity // nil: no bounds
	confidence   float64             // of the bounds
	corners      []float64

	factor float64 // without bounds
	weight float64 // with bounds: w, negative towards the lower one
}

// At is the drawn intensity.
func (r *drawnRain) At(minutes float64) (intensity float64, where hydrology.Range) {
	intensity, where = r.estimate.At(minutes)
	if r.upper == nil {
		return intensity * r.factor, where
	}
	bound, weight := r.upper, r.weight
	if weight < 0 {
		bound, weight = r.lower, -weight
	}
	if weight == 0 || where == hydrology.Beyond {
		return intensity, where
	}
	limit, _ := bound.At(minutes)
	return intensity * math.Pow(limit/intensity, weight), where
}

// Durations are the corners of the storm. They are shared; nobody may change them.
func (r *drawnRain) Durations() []float64 { return r.corners }

// Exponent is that of an equation, which a factor leaves as it is.
func (r *drawnRain) Exponent(minutes float64) (float64, bool) {
	if e, ok := r.estimate.(interface {
		Exponent(minutes float64) (float64, bool)
	}); ok {
		return e.Exponent(minutes)
	}
	return 0, false
}
