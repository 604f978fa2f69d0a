package review

import (
	"slices"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/sweep"
)

// How the search for an amount goes.
const (
	// amountTolerance is how near, relative, the largest amount that holds comes to the least that breaks: two fifths
	// of the 0.1 % that is asked for.
	amountTolerance = 4e-4
	// least amounts are those under smallest of the first guess: they count as nothing.
	smallest = 1e-9
	// mostGrowth is how often an amount grows, up to fourfold, before it is taken that no limit ever
	// breaks: 4^20 of the first guess.
	mostGrowth = 20
	// mostTrials bounds the closing of a bracket; halving every third time takes 3 · 30 from the first guess down to
	// smallest of it.
	mostTrials = 100
)

// insideParts are the parts of an answer at which it is looked whether levels hold there too: a level does not always
// rise with the flow. A band of amounts that breaks a limit between them and is narrower than
// insideStep of the answer may be missed.
var insideParts = []float64{0.25, 0.5, 0.75}

const insideStep = 0.25

// trial is an amount that was tried.
type trial struct {
	amount float64
	room   float64 // the least, over its scale; negative where a limit breaks
	where  Place
	failed bool // a time went beyond the rainfall
}

// headroom answers for one structure of the whole network.
func (b *bench) headroom(at network.StructureIndex) StructureHeadroom {
	for i, s := range b.structures {
		if s == at {
			b.load(network.StructureIndex(i))
		}
	}
	out := StructureHeadroom{Structure: at}
	out.Area = b.most(func(x float64) (state, bool) { return b.run(x, 0) }, b.guess(b.rateOfArea))
	out.Flow = b.most(func(x float64) (state, bool) { return b.run(0, x) }, b.guess(func(network.PipeIndex) float64 { return 1 }))
	out.Runs = b.runs
	return out
}

// rateOfArea is about by how much the flow in a pipe grows with the area that is added.
func (b *bench) rateOfArea(p network.PipeIndex) float64 {
	i, where := b.rain.At(max(b.kept.Pipes[p].Time, b.options.Time, b.storm.MinimumTime))
	if where == hydrology.Beyond {
		i, _ = b.rain.At(b.storm.MinimumTime)
	}
	return hydrology.Rational(b.storm.RationalFactor, b.options.C, i)
}

// guess is an amount to begin with: what would bring the first pipe to its capacity, or where none is under its
// capacity a tenth of the largest.
func (b *bench) guess(rate func(network.PipeIndex) float64) float64 {
	guess, largest := 0.0, 0.0
	for _, p := range b.path {
		run := &b.kept.Pipes[p]
		largest = max(largest, run.Capacity/rate(p))
		if room := (run.Capacity - run.Flow) / rate(p); run.HasCapacity && room > 0 && (guess == 0 || room < guess) {
			guess = room
		}
	}
	switch {
	case guess > 0:
		return guess
	case largest > 0:
		return largest / 10
	}
	return 1
}

// most finds the largest amount that holds with all smaller ones.
func (b *bench) most(run func(float64) (state, bool), guess float64) Amount {
	probe := func(x float64) trial {
		r, ok := run(x)
		room, where, _ := b.least(&r)
		return trial{x, room, where, !ok}
	}
	room, where, found := b.least(nil)
	low := trial{room: room, where: where}
	switch {
	case !found:
		return Amount{}
	case room < 0:
		return Amount{OK: true, Governs: b.whole(where)}
	}
	low, high, found := grow(low, guess, probe)
	if !found {
		return Amount{Why: whyNone(high)}
	}
	low, high = closeIn(low, high, guess, probe)
	if b.levels && !high.failed {
		low, high = b.inside(low, high, guess, run, probe)
	}
	if high.failed {
		return Amount{Why: whyNone(high)}
	}
	return Amount{OK: true, Value: low.amount, Governs: b.whole(high.where)}
}

// whyNone says why there is no amount, where that is not because nothing ever breaks.
func whyNone(t trial) string {
	if t.failed {
		return "with more the time goes beyond the last duration of the rainfall"
	}
	return ""
}

// grow raises an amount until a limit breaks. found is false where none does, or where a time goes beyond the rainfall.
func grow(low trial, x float64, probe func(float64) trial) (holds, breaks trial, found bool) {
	for range mostGrowth {
		t := probe(x)
		if t.failed {
			return low, t, false
		}
		if t.room < 0 {
			return low, t, true
		}
		next := 4 * x
		if fall := (low.room - t.room) / (t.amount - low.amount); fall > 0 { // a straight line on to where it breaks
			next = min(next, x+t.room/fall)
		}
		low, x = t, max(next, x)*(1+amountTolerance/2)
	}
	return low, trial{}, false
}

// closeIn brings the amounts that hold and that break together: on a straight line between both, the end that stays
// counting half (the Illinois rule, as in carriesSearch), and by halving where two such steps have not halved the
// bracket, since room may jump. Steps keep half the tolerance off the ends.
func closeIn(low, high trial, guess float64, probe func(float64) trial) (holds, breaks trial) {
	roomLow, roomHigh, side := low.room, high.room, 0
	width, steps := high.amount-low.amount, 0
	for k := 0; k < mostTrials && !closed(low, high, guess); k++ {
		x := low.amount + roomLow/(roomLow-roomHigh)*(high.amount-low.amount)
		if now := high.amount - low.amount; steps == 2 {
			if now > width/2 {
				x = low.amount + now/2
			}
			width, steps = now, 0
		}
		steps++
		x = min(max(x, low.amount*(1+amountTolerance/2)), high.amount*(1-amountTolerance/2))
		t := probe(x)
		switch {
		case t.failed:
			return low, t
		case t.room >= 0:
			if low, roomLow = t, t.room; side > 0 {
				roomHigh /= 2
			}
			side = +1
		default:
			if high, roomHigh = t, t.room; side < 0 {
				roomLow /= 2
			}
			side = -1
		}
	}
	return low, high
}

func closed(low, high trial, guess float64) bool {
	return high.amount <= low.amount*(1+amountTolerance) || high.amount <= smallest*guess
}

// inside looks for smaller amounts that break a limit of levels: at some parts of the answer, and where a pipe comes
// to its capacity, beyond which its water is slower and the flows below it fall. Where one is
// found the answer is sought again below it.
func (b *bench) inside(low, high trial, guess float64, run func(float64) (state, bool), probe func(float64) trial) (holds, breaks trial) {
	start := trial{}
	start.room, start.where, _ = b.least(nil)
	if holds, breaks, found := dip(start, low, probe); found {
		return closeIn(holds, breaks, guess, probe)
	}
	if slices.Contains(b.options.Limits, Capacity) {
		return low, high // no pipe that is under capacity has come over it
	}
	for _, p := range b.crossings(low.amount, run) {
		filled, _ := b.filling(p, low.amount, guess, run)
		if t := probe(filled); !t.failed && t.room < 0 {
			low, high = closeIn(start, t, guess, probe)
		}
	}
	return low, high
}

// dip looks between two amounts that hold for one that breaks: at some parts of the way, and where the room is less
// than on a straight line, on both sides of the worst part too.
func dip(start, low trial, probe func(float64) trial) (holds, breaks trial, found bool) {
	tried := []trial{start}
	look := func(x float64) bool {
		breaks = probe(x)
		if found = breaks.failed || breaks.room < 0; !found {
			tried = append(tried, breaks)
		}
		return found
	}
	worst, under := 0.0, 0.0
	for _, part := range insideParts {
		if look(part * low.amount) {
			return tried[len(tried)-1], breaks, true
		}
		if below := start.room + part*(low.room-start.room) - breaks.room; below > under {
			worst, under = part, below
		}
	}
	if under == 0 || look((worst-insideStep/2)*low.amount) || look((worst+insideStep/2)*low.amount) {
		return start, breaks, found
	}
	return low, trial{}, false
}

// crossings are the pipes that are not over capacity before an amount is added and over capacity with it.
func (b *bench) crossings(amount float64, run func(float64) (state, bool)) []network.PipeIndex {
	var all []network.PipeIndex
	r, _ := run(amount)
	for _, p := range b.path {
		if b.kept.Pipes[p].State != sweep.Full && b.kept.Pipes[p].HasCapacity && r.flows.Pipes[p].State == sweep.Full {
			all = append(all, p)
		}
	}
	return all
}

// filling is the amount with which a pipe just does not run over its capacity.
func (b *bench) filling(p network.PipeIndex, most, guess float64, run func(float64) (state, bool)) (amount float64, ok bool) {
	probe := func(x float64) trial {
		r, ok := run(x)
		room, _ := r.capacityRoom(p)
		return trial{amount: x, room: room, failed: !ok}
	}
	kept := &b.kept.Pipes[p]
	low, high := closeIn(trial{room: kept.Capacity - kept.Flow}, probe(most), guess, probe)
	return low.amount, !high.failed
}
