package review

import (
	"math"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/sweep"
	"rimfall/network/units"
)

// needs finds for every pipe of the system what it costs at least, whatever is done to the others. Where the least flow that
// any plan can bring down to a pipe is over its capacity as it lies, it must be changed, and costs no less than the cheapest
// choice that carries that flow; otherwise it may cost nothing.
//
// The least flow comes of the longest time: the largest of the inlet times and of the arrivals, each pipe taking the
// slowest of its choices. Rainfall falls with the time, and a peak by partial area, or one that is held, is no smaller.
func (f *reliever) needs() []Price {
	n, need := f.system.network, make([]Price, len(f.choices))
	if !f.asks(Capacity) {
		return need
	}
	flows, _ := sweep.Down(n, &f.subject.Storm, f.rain, nil)
	slowest := make([]float64, len(n.Pipes)) // arrival at the lower end, min
	order, _ := n.Order()
	for _, s := range order {
		time := f.longestTime(s, flows.Pipes, slowest)
		i, where := f.rain.At(time)
		if where == hydrology.Beyond {
			i = 0
		}
		for _, p := range n.PipesOut(s) {
			run := &flows.Pipes[p]
			least := sameSum * (run.Inflow + hydrology.Rational(f.subject.Storm.RationalFactor, run.CA, i))
			slowest[p] = time + f.slowestTravel(p, least)
			need[p] = f.cheapestFor(p, least)
		}
	}
	return need
}

// sameSum is the room for the arithmetic of flows that part and meet again.
const sameSum = 1 - 1e-9

func (f *reliever) asks(l LimitKind) bool {
	for _, asked := range f.options.Limits {
		if asked == l {
			return true
		}
	}
	return false
}

// longestTime is the longest time that any plan can bring to a structure.
func (f *reliever) longestTime(s network.StructureIndex, flows []sweep.Pipe, slowest []float64) float64 {
	n, time := f.system.network, f.subject.Storm.MinimumTime
	for _, a := range n.AreasAt(s) {
		if n.Areas[a].C > 0 {
			time = max(time, n.Areas[a].Time.Or(0))
		}
	}
	for _, p := range n.PipesIn(s) {
		if flows[p].Rained() {
			time = max(time, slowest[p])
		}
	}
	return time
}

// slowestTravel is the longest time that water can take in a pipe, over all choices, with at least a flow, min.
func (f *reliever) slowestTravel(i network.PipeIndex, least float64) float64 {
	slowest := 0.0
	for c := range f.choices[i] {
		choice, pipe := &f.choices[i][c], f.system.network.Pipes[i]
		flow := least
		switch choice.Work {
		case Replace:
			pipe.Section = choice.Section
		case Double:
			second, part := pipe, conveyanceShare(&pipe, choice)
			second.Section, second.Count = choice.Section, 1
			slowest = max(slowest, f.travel(&second, part*least))
			flow -= part * least
		}
		slowest = max(slowest, f.travel(&pipe, flow))
	}
	return slowest
}

// travel is the longest time in a pipe with at least a flow, min. Velocity rises with the flow while the pipe is part
// full, up to about that of the full pipe or over it; a pipe over its capacity runs no slower than at it.
func (f *reliever) travel(p *network.Pipe, least float64) float64 {
	storm := &f.subject.Storm
	full := p.FullArea()
	velocity := least / full
	capacity, ok := p.Capacity(storm.ManningFactor)
	switch {
	case !ok || storm.Travel == network.TravelFlowOverFullArea:
	case storm.Travel == network.TravelFullBore:
		velocity = capacity / full
	case least < capacity:
		velocity = capacity / full
		barrel := least / float64(p.Count)
		if depth, ok := p.Manning(storm.ManningFactor).NormalDepth(p.Section, barrel); ok {
			velocity = min(velocity, barrel/p.Section.At(depth).Area)
		}
	}
	if !(velocity > 0) {
		return math.Inf(1)
	}
	return p.Length / velocity / units.SecondsPerMinute
}

// cheapestFor is the price of the cheapest choice of a pipe that carries a flow; nothing where the pipe has no capacity or
// no choice carries it, which the search finds by itself.
func (f *reliever) cheapestFor(i network.PipeIndex, least float64) Price {
	pipe := &f.system.network.Pipes[i]
	own, ok := pipe.Capacity(f.subject.Storm.ManningFactor)
	if !ok || least <= own {
		return Price{}
	}
	for c := range f.choices[i] {
		choice, carries := &f.choices[i][c], own
		switch choice.Work {
		case Replace:
			larger := *pipe
			larger.Section = choice.Section
			carries, _ = larger.Capacity(f.subject.Storm.ManningFactor)
		case Double: // both are full together
			carries = own / (1 - conveyanceShare(pipe, choice))
		}
		if carries >= least {
			return choice.Price
		}
	}
	return Price{}
}
