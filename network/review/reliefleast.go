package review

import (
	"container/heap"
	"slices"
)

// partial is a plan of which the first pipes, downstream, have been decided; the others are as they are.
type partial struct {
	plan    plan
	decided int
	price   Price // of what has been decided
	atLeast Price // with what the others need
}

// partials is a heap: the cheapest first, of equal ones that of which more is decided (on the tree of decisions: Hart, Nilsson and
// Raphael, IEEE Transactions on Systems Science and Cybernetics 4, 1968).
type partials []partial

func (h partials) Len() int { return len(h) }
func (h partials) Less(i, j int) bool {
	a, b := &h[i], &h[j]
	if a.atLeast == b.atLeast {
		return a.decided > b.decided
	}
	return a.atLeast.less(b.atLeast)
}
func (h partials) Swap(i, j int) { h[i], h[j] = h[j], h[i] }
func (h *partials) Push(x any)   { *h = append(*h, x.(partial)) }
func (h *partials) Pop() any {
	old := *h
	last := old[len(old)-1]
	*h = old[:len(old)-1]
	return last
}

// enumerate runs every plan that is cheaper than the best, the cheapest first, so that the first that holds is the least. A
// plan is decided pipe by pipe downstream; as the flow of a pipe depends on nothing below it, whatever starts with a
// pipe over its capacity, or one that newly becomes smaller than a pipe that enters it, is left out whole. After so many
// runs it ends: nothing that costs less than the cheapest that was left holds.
func (f *reliever) enumerate() {
	need := f.needs()
	open := &partials{{plan: make(plan, len(f.choices)), atLeast: f.need(need, 0)}}
	last := f.runs + f.options.runsOf(len(f.order))
	for open.Len() > 0 {
		if f.runs >= last {
			f.bound = (*open)[0].atLeast
			return
		}
		next := heap.Pop(open).(partial)
		if next.decided < len(f.order) {
			f.decide(open, &next, need)
			continue
		}
		if v := f.judge(next.plan); v.holds() {
			f.found, f.best = true, next.plan
			break
		}
	}
	f.least = true
	if f.found {
		f.bound = f.price(f.best)
	}
}

// need is what the pipes from a place of the order on need together.
func (f *reliever) need(all []Price, place int) Price {
	var sum Price
	for _, i := range f.order[place:] {
		sum = sum.plus(all[i])
	}
	return sum
}

// decide puts all choices for the next pipe on the heap but those that cost as much as the best, or cannot hold.
func (f *reliever) decide(open *partials, from *partial, need []Price) {
	i := f.order[from.decided]
	others := f.need(need, from.decided+1)
	for c, choice := range f.choices[i] {
		price := from.price.plus(choice.Price)
		next := partial{slices.Clone(from.plan), from.decided + 1, price, price.plus(others)}
		if f.found && !next.atLeast.less(f.price(f.best)) {
			break // the rest costs more
		}
		next.plan[i] = int16(c)
		if f.mayHold(next.plan, from.decided) {
			heap.Push(open, next)
		}
	}
}

// mayHold tells whether a plan may hold as far as the pipe in that place of the order can tell.
func (f *reliever) mayHold(p plan, place int) bool {
	i := f.order[place]
	if !slices.Contains(f.options.Limits, Capacity) {
		f.runs++ // not a run, but counted, so that the search ends
		n, twin := f.built(p)
		return !f.fallsIn(n, twin)[i] || f.asItIs.falls[i]
	}
	v := f.judgeOnly(p, Capacity)
	if len(v.problems) > 0 {
		return true // what is below it may shorten the times
	}
	return (!v.falls[i] || f.asItIs.falls[i]) && !slices.Contains(v.broken, Place{Capacity, int32(i)})
}

// judgeOnly judges a plan by one limit.
func (f *reliever) judgeOnly(p plan, l LimitKind) verdict {
	one := *f.options
	one.Limits = []LimitKind{l}
	all := f.options
	f.options = &one
	v := f.judge(p)
	f.options = all
	return v
}
