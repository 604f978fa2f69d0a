package review

import (
	"slices"

	"rimfall/network"
)

// search looks for a plan that holds step by step, makes it irreducible, and then runs what is cheaper, the cheapest first.
func (f *reliever) search() {
	p, v := f.stepByStep()
	if !v.holds() {
		p = f.largest()
		v = f.judge(p)
	}
	if v.holds() {
		f.found, f.best = true, f.irreducible(p)
	} else {
		f.left = v.broken
	}
	f.enumerate()
	if f.found {
		f.left = nil
	}
}

// stepByStep goes from the network as it is to one that holds: first every pipe over its capacity, downstream, takes the
// cheapest choice by which it is not; then, from the place farthest downstream whose level is too high, the pipes below it
// take what lowers the levels most for its price. The plan that it returns need not hold.
func (f *reliever) stepByStep() (plan, verdict) {
	p, v := make(plan, len(f.choices)), f.asItIs
	f.until = f.runs + f.spent + f.options.runsOf(len(p))
	for f.runs+f.spent < f.until && !v.holds() && len(v.problems) == 0 { // it ends: every step takes a run or more
		next, ok := f.step(p, &v)
		if !ok {
			break
		}
		p = next
		v = f.judge(p)
	}
	return p, v
}

// step is one of these steps.
func (f *reliever) step(p plan, v *verdict) (plan, bool) {
	for _, i := range f.order {
		if slices.Contains(v.broken, Place{Capacity, int32(i)}) {
			if next, ok := f.cure(p, i); ok {
				return next, true
			}
		}
	}
	return f.lower(p, v)
}

// cure takes the cheapest choice of a pipe by which it carries its flow.
func (f *reliever) cure(p plan, i network.PipeIndex) (plan, bool) {
	for c := int(p[i]) + 1; c < len(f.choices[i]) && f.runs+f.spent < f.until; c++ {
		next := f.with(p, i, int16(c))
		if next == nil {
			continue
		}
		if v := f.judgeOnly(next, Capacity); len(v.problems) == 0 && !v.newFall && !slices.Contains(v.broken, Place{Capacity, int32(i)}) {
			return next, true
		}
	}
	return nil, false
}

// lower takes, of all choices of the pipes from a place down to the outfall, the one that lowers the shortage most for its
// price. There is none where nothing lowers it.
func (f *reliever) lower(p plan, v *verdict) (plan, bool) {
	var best plan
	most := 0.0
	paid := f.price(p).First
	for _, i := range f.below(v.broken) {
		for c := int(p[i]) + 1; c < len(f.choices[i]) && f.runs+f.spent < f.until; c++ {
			next := f.with(p, i, int16(c))
			if next == nil {
				continue
			}
			after := f.judge(next)
			if len(after.problems) > 0 || after.newFall {
				continue
			}
			more := max(f.price(next).First-paid, 1e-9*paid, 1e-9) // it may even save
			if gain := (v.shortage - after.shortage) / more; gain > most {
				most, best = gain, next
			}
		}
	}
	return best, best != nil
}

// below lists the pipes on the ways down from the place farthest downstream of those that are broken.
func (f *reliever) below(broken []Place) []network.PipeIndex {
	n := f.system.network
	rank := make([]int, len(n.Structures))
	order, _ := n.Order()
	for k, s := range order {
		rank[s] = k
	}
	var at network.StructureIndex
	last := -1
	for _, b := range broken {
		s := network.StructureIndex(b.Index)
		if b.Limit.OfPipes() {
			s = n.Pipes[b.Index].From
		}
		if rank[s] > last {
			last, at = rank[s], s
		}
	}
	if last < 0 {
		return nil
	}
	way := f.system.below(at, make([]bool, len(n.Structures)), nil)
	slices.Sort(way)
	return slices.Compact(way)
}

// with is a plan with another choice for one pipe, and for those below it the cheapest by which no pipe newly becomes
// smaller than one that enters it; nil where the list has none.
func (f *reliever) with(p plan, i network.PipeIndex, c int16) plan {
	next := slices.Clone(p)
	next[i] = c
	n, twin := f.built(next)
	falls := f.fallsIn(n, twin)
	for _, q := range f.order {
		if q == i || !falls[q] || f.asItIs.falls[q] {
			continue
		}
		for next[q]++; int(next[q]) < len(f.choices[q]); next[q]++ {
			f.spent++ // no run, but counted, so that the steps end
			n, twin = f.built(next)
			if falls = f.fallsIn(n, twin); !falls[q] {
				break
			}
		}
		if int(next[q]) == len(f.choices[q]) {
			return nil
		}
	}
	return next
}

// largest takes for every pipe, from the outfalls up, the largest choice that does not make the pipe below it newly smaller
// than a pipe that enters it.
func (f *reliever) largest() plan {
	p, area := make(plan, len(f.choices)), make([]float64, len(f.choices))
	for _, i := range slices.Backward(f.order) {
		out := f.system.network.PipesOut(f.system.network.Pipes[i].To)
		limited := len(out) == 1 && !f.asItIs.falls[out[0]]
		for c := range f.choices[i] {
			all, largest := f.areas(i, c)
			if all > area[i] && (!limited || largest <= area[out[0]]*overSameArea) {
				p[i], area[i] = int16(c), all
			}
		}
	}
	return p
}

// areas are the full area of all that lies in the place of a pipe by a choice, and of the largest of it.
func (f *reliever) areas(i network.PipeIndex, c int) (all, largest float64) {
	choice, own := &f.choices[i][c], f.system.network.Pipes[i].FullArea()
	switch choice.Work {
	case Replace:
		own = float64(f.system.network.Pipes[i].Count) * choice.Section.At(choice.Section.Rise()).Area
	case Double:
		second := choice.Section.At(choice.Section.Rise()).Area
		return own + second, max(own, second)
	}
	return own, own
}

// irreducible makes a plan that holds cheaper, pipe by pipe from the dearest, until no single pipe can be left as it is or
// take a cheaper choice. In a large system, after as many runs as the search may take, it is only asked whether a pipe can
// be left as it is.
func (f *reliever) irreducible(p plan) plan {
	p = slices.Clone(p)
	last := f.runs + f.options.runsOf(len(p))
	for changed := true; changed; {
		changed = false
		for _, i := range f.dearest(p) {
			own := p[i]
			for p[i] = 0; p[i] < own; p[i]++ {
				if v := f.judge(p); v.holds() {
					changed = true
					break
				}
				if f.runs >= last {
					p[i] = own
					break
				}
			}
		}
	}
	return p
}

// dearest lists the pipes that a plan changes, the dearest first.
func (f *reliever) dearest(p plan) []network.PipeIndex {
	var all []network.PipeIndex
	for i, c := range p {
		if f.choices[i][c].Work != Keep {
			all = append(all, network.PipeIndex(i))
		}
	}
	slices.SortStableFunc(all, func(a, b network.PipeIndex) int {
		if f.choices[b][p[b]].Price.less(f.choices[a][p[a]].Price) {
			return -1
		}
		return 1
	})
	return all
}
