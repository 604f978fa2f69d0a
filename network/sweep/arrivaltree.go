package sweep

// The tree of moments: taking a moment, sums, splitting and union.

// take makes a tree of one moment, with a random rank (Marsaglia, Journal of
// Statistical Software 8 no. 14, 2003: xorshift with 13, 17, 5). The seed is fixed, so equal
// networks give equal trees.
func (a *arrivals) take(m moment) int32 {
	a.seed ^= a.seed << 13
	a.seed ^= a.seed >> 17
	a.seed ^= a.seed << 5
	m.rank, m.treeSize, m.sum, m.steepest, m.wholes = a.seed, 1, m.own, max(0, m.own.slope), m.whole
	if tree := a.unused; tree != 0 {
		a.unused = a.moments[tree].left
		a.moments[tree] = m
		return tree
	}
	a.moments = append(a.moments, m)
	return int32(len(a.moments) - 1)
}

// addUp makes the sums of a tree from those of its branches.
func (a *arrivals) addUp(tree int32) {
	m := &a.moments[tree]
	left, right := &a.moments[m.left], &a.moments[m.right]
	here := m.upToHere(left)
	m.sum = here.plus(right.sum)
	m.steepest = max(left.steepest, here.slope+right.steepest)
	m.wholes = left.wholes + m.whole + right.wholes
	m.treeSize = left.treeSize + 1 + right.treeSize
}

// upToHere is the sum of a moment and the tree on its left.
func (m *moment) upToHere(left *moment) line { return left.sum.plus(m.own) }

// union makes one tree of two on one clock: the higher root stays, the other tree
// is split at its time. It takes O(m·log(n/m)) steps for m moments into n.
func (a *arrivals) union(p, q int32) int32 {
	if p == 0 {
		return q
	}
	if q == 0 {
		return p
	}
	if a.moments[p].rank < a.moments[q].rank {
		p, q = q, p
	}
	before, after := a.split(q, a.moments[p].time)
	left := a.union(a.moments[p].left, before)
	right := a.union(a.moments[p].right, after)
	a.moments[p].left, a.moments[p].right = left, right
	a.addUp(p)
	return p
}

// split parts a tree into what is up to a time and what is later.
func (a *arrivals) split(tree int32, time float64) (before, after int32) {
	if tree == 0 {
		return 0, 0
	}
	m := &a.moments[tree]
	if m.time <= time {
		m.right, after = a.split(m.right, time)
		before = tree
	} else {
		before, m.left = a.split(m.left, time)
		after = tree
	}
	a.addUp(tree)
	return before, after
}

// line is what counts as a function of time on a list's clock, level + slope·time,
// up to the next moment.
type line struct{ level, slope float64 }

func (l line) at(time float64) float64 { return l.level + l.slope*time }

func (l line) plus(m line) line { return line{l.level + m.level, l.slope + m.slope} }

// upTo is the line that holds at a time: the sum of all moments up to it.
func (a *arrivals) upTo(tree int32, time float64) line {
	var l line
	for tree != 0 {
		m := &a.moments[tree]
		if m.time > time {
			tree = m.left
			continue
		}
		l = l.plus(m.upToHere(&a.moments[m.left]))
		tree = m.right
	}
	return l
}
