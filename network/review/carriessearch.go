package review

import (
	"math"
	"slices"

	"rimfall/network/fault"
)

// How the search goes.
const (
	// scanParts is into how many storms, evenly in ln T, the step between two columns of the rainfall is divided to look
	// for the first that breaks a limit. A limit that breaks and holds again within one part is not seen.
	scanParts = 16
	// periodTolerance is how near the periods that hold and that break come to each other, relative: under the
	// digits that are printed.
	periodTolerance = 1e-6
	// batch is how many storms run between two looks at what they tell about all limits. It is no setting, so that
	// a result does not depend on the machine.
	batch = 64
	// mostRounds bounds the search of one limit: halving alone closes a bracket from 1000 to the tolerance in 40
	// rounds, and at least one round in three halves.
	mostRounds = 120
)

// bracket is what is known of one limit: the largest storm run in which it and all smaller ones hold, and the
// smallest in which it breaks.
type bracket struct {
	holds, breaks          float64 // years; 0: none
	roomHolds, roomBreaks  float64 // in those storms; NaN: not known
	judged                 bool
	rounds, sameSide, side int // of refining; sameSide: how often in a row the same end moved
}

// carriesSearch closes the brackets of all limits together: every storm that is run tells about all of them.
type carriesSearch struct {
	subject  *Subject
	runners  []*runner
	brackets []bracket
	tried    []float64 // periods run, ascending
	rows     [][]float64
	runs     int
}

func newSearch(s *Subject, threads int) *carriesSearch {
	targets := 2 * (len(s.Network.Pipes) + len(s.Network.Structures))
	c := &carriesSearch{subject: s, brackets: make([]bracket, targets), rows: make([][]float64, batch)}
	c.runners = s.runners(threadsOr(threads, batch), s.Storm.Peak)
	for i := range c.rows {
		c.rows[i] = make([]float64, targets)
	}
	return c
}

// scan runs the columns of the rainfall and the storms between them.
func (c *carriesSearch) scan() error {
	columns := c.subject.columns()
	if len(columns) == 0 {
		return fault.List{{File: c.subject.Job.Rain.File, Text: "has no storms to run: a table of return periods, or an equation for some of 2 to 100 years, is wanted"}}
	}
	periods := []float64{columns[0]}
	for k := 1; k < len(columns); k++ {
		for part := 1; part < scanParts; part++ {
			share := float64(part) / scanParts
			periods = append(periods, columns[k-1]*math.Pow(columns[k]/columns[k-1], share))
		}
		periods = append(periods, columns[k])
	}
	return c.run(periods)
}

// usual are the periods between which an equation is looked at, years: those that agencies tabulate.
var usual = []float64{2, 5, 10, 25, 50, 100}

// columns are the return periods of the rainfall between which every period has a storm, ascending. A first column of
// annual maxima of one year has none above it, and is left out.
func (s *Subject) columns() []float64 {
	columns := s.Job.Rain.Table.Periods
	if len(columns) == 0 {
		columns = usual
	}
	has := func(period float64) bool { _, ok := s.Job.Curve(period); return ok }
	for len(columns) > 0 && !has(columns[0]) || len(columns) > 1 && !has(math.Sqrt(columns[0]*columns[1])) {
		columns = columns[1:]
	}
	for len(columns) > 0 && !has(columns[len(columns)-1]) {
		columns = columns[:len(columns)-1]
	}
	return columns
}

// refine closes the brackets round by round.
func (c *carriesSearch) refine() error {
	for {
		var next []float64
		for k := range c.brackets {
			if t, open := c.brackets[k].next(); open {
				next = append(next, t)
			}
		}
		if len(next) == 0 {
			return nil
		}
		slices.Sort(next)
		if err := c.run(slices.Compact(next)); err != nil {
			return err
		}
	}
}

// run runs storms of ascending periods, a batch at a time.
func (c *carriesSearch) run(periods []float64) error {
	for len(periods) > 0 {
		now := periods[:min(batch, len(periods))]
		periods = periods[len(now):]
		errs := make([]error, len(now))
		each(len(c.runners), len(now), func(thread, task int) {
			errs[task] = c.subject.roomsOf(c.runners[thread], now[task], c.rows[task])
		})
		if err := firstError(errs); err != nil {
			return err
		}
		c.runs += len(now)
		c.tried = append(c.tried, now...)
		slices.Sort(c.tried)
		for task, t := range now {
			for k := range c.brackets {
				c.brackets[k].take(t, c.rows[task][k], c.tried)
			}
		}
	}
	return nil
}

// take learns from a storm. Where it breaks the limit under a storm that held, all that is known to hold is the
// storm before it.
func (b *bracket) take(t, room float64, tried []float64) {
	switch {
	case math.IsNaN(room):
		return
	case room >= 0:
		if t > b.holds && (b.breaks == 0 || t < b.breaks) {
			b.holds, b.roomHolds = t, room
			b.count(+1)
		}
	case b.breaks == 0 || t < b.breaks:
		b.breaks, b.roomBreaks = t, room
		b.count(-1)
		if t <= b.holds {
			b.holds, b.roomHolds = before(tried, t), math.NaN()
		}
	}
	b.judged = true
}

// count counts how often the same end of the bracket moved.
func (b *bracket) count(side int) {
	if b.sameSide++; b.side != side {
		b.side, b.sameSide = side, 1
	}
}

// before is the period tried before t; 0 where there is none.
func before(tried []float64, t float64) float64 {
	if at, _ := slices.BinarySearch(tried, t); at > 0 {
		return tried[at-1]
	}
	return 0
}

// next is the storm to be run next for a limit; open is false where its bracket is closed.
//
// It is where a straight line between the room at both ends meets 0, in ln T. Where one end stays
// for long, its room counts half (the Illinois rule: Dowell and Jarratt, BIT 11, 1971), and every third
// round halves the bracket, since room may jump. A step keeps half the tolerance from the ends, so that
// a good guess is closed in from both sides.
func (b *bracket) next() (t float64, open bool) {
	if b.holds == 0 || b.breaks == 0 || b.breaks <= b.holds*(1+periodTolerance) || b.rounds >= mostRounds {
		return 0, false
	}
	if b.rounds++; b.rounds == 1 {
		b.sameSide = 0 // the scan does not count
	}
	low, high := math.Log(b.holds), math.Log(b.breaks)
	share := 0.5
	if holds, breaks := b.roomHolds, b.roomBreaks; b.rounds%3 != 0 && !math.IsNaN(holds) {
		if b.sameSide > 1 && b.side > 0 {
			breaks /= 2
		} else if b.sameSide > 1 {
			holds /= 2
		}
		share = holds / (holds - breaks)
	}
	const half = periodTolerance / 2
	at := low + share*(high-low)
	at = min(max(at, low+half), high-half)
	return math.Exp(at), true
}

// carried reads a bracket.
func (c *carriesSearch) carried(k int) Carried {
	b := &c.brackets[k]
	switch {
	case !b.judged:
		return Carried{}
	case b.breaks == 0:
		return Carried{Judged: true, All: true, Period: b.holds}
	case b.holds == 0:
		return Carried{Judged: true, None: true}
	}
	return Carried{Judged: true, Period: b.holds}
}
