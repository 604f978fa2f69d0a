package sweep

import "rimfall/hydrology"

// arrivals are the lists of moments at which areas begin to come in and are all
// in, one list for each pipe that has been passed and not yet been left behind.
//
// A list is a binary tree in order of time, kept even by random ranks (a treap:
// Seidel and Aragon, Algorithmica 16, 1996), so that one moment is added to a
// million in some twenty steps. Every tree node holds the sums below it, so that
// what counts at a time is read off one way down. A list has a shift of its own,
// which is all that a pipe's travel time changes.
type arrivals struct {
	moments []moment // by tree index; 0 is the empty tree, whose sums are 0
	unused  int32    // a tree of moments to be taken again, linked by left; 0: none
	seed    uint32
	byPipe  []list // at the lower end
}

// moment is where the slope of what counts changes: from it on, level + slope·time
// of the area counts besides what counted before.
type moment struct {
	time           float64 // on the clock of its list
	own            line    // of the moment itself
	whole          float64 // the area, where it comes in at once
	sum            line    // of all moments of the tree
	steepest       float64 // largest slope anywhere in the tree, of its own moments; not under 0
	wholes         float64 // ΣCA of its areas that come in at once
	left, right    int32
	rank, treeSize uint32
}

// list is a tree of moments and its clock: time here = time of the moment + shift.
type list struct {
	root        int32
	shift, last float64 // last: the latest moment, on the clock of the list
}

func newArrivals(pipes int) *arrivals {
	return &arrivals{moments: make([]moment, 1, 1024), seed: 2463534242, byPipe: make([]list, pipes)}
}

// size is how many moments a list has.
func (a *arrivals) size(l list) uint32 { return a.moments[l.root].treeSize }

// add puts an area into a list: nothing counts before it begins, all of it when
// it is in, and a part that grows evenly between.
func (a *arrivals) add(l list, c hydrology.Contribution) list {
	start := c.TravelTime - l.shift
	end := start + c.InletTime
	if l.root == 0 || end > l.last {
		l.last = end
	}
	if !(end > start) { // it comes in at once
		l.root = a.union(l.root, a.take(moment{time: end, own: line{level: c.CA}, whole: c.CA}))
		return l
	}
	rate := c.CA / (end - start)
	l.root = a.union(l.root, a.take(moment{time: start, own: line{-rate * start, rate}}))
	l.root = a.union(l.root, a.take(moment{time: end, own: line{c.CA + rate*start, -rate}}))
	return l
}

// join makes one list of two. The smaller is put on the clock of the larger.
func (a *arrivals) join(l, m list) list {
	if a.size(l) < a.size(m) {
		l, m = m, l
	}
	if m.root == 0 {
		return l
	}
	later := m.shift - l.shift
	a.move(m.root, later)
	l.last = max(l.last, m.last+later)
	l.root = a.union(l.root, m.root)
	return l
}

// move puts a tree on another clock, on which every moment is later.
func (a *arrivals) move(tree int32, later float64) {
	if tree == 0 {
		return
	}
	m := &a.moments[tree]
	m.time += later
	m.own.level -= m.own.slope * later
	m.sum.level -= m.sum.slope * later
	a.move(m.left, later)
	a.move(m.right, later)
}

// copied is a list of its own with a share of every area.
func (a *arrivals) copied(l list, share float64) list {
	l.root = a.copiedTree(l.root, share)
	return l
}

func (a *arrivals) copiedTree(tree int32, share float64) int32 {
	if tree == 0 {
		return 0
	}
	m := a.moments[tree]
	left, right := a.copiedTree(m.left, share), a.copiedTree(m.right, share)
	rank := m.rank
	fresh := a.take(moment{time: m.time, own: line{share * m.own.level, share * m.own.slope}, whole: share * m.whole})
	a.moments[fresh].left, a.moments[fresh].right, a.moments[fresh].rank = left, right, rank
	a.addUp(fresh)
	return fresh
}

// release hands the moments of a list back for others.
func (a *arrivals) release(l list) { a.releaseTree(l.root) }

func (a *arrivals) releaseTree(tree int32) {
	if tree == 0 {
		return
	}
	left, right := a.moments[tree].left, a.moments[tree].right
	a.moments[tree].left, a.unused = a.unused, tree
	a.releaseTree(left)
	a.releaseTree(right)
}
