package network

// Assumption is a value that was not given, and what was taken in its place.
type Assumption struct {
	Pipe    PipeIndex
	What    string  // in words: "invert, upper end"
	Value   float64 // ft or m for levels
	Unit    string  // "" where there is none
	Because string  // what it rests on
}

// Reach is how far a known level is from the end of a pipe along the main line, and where it
// stands.
type Reach struct {
	Level    float64
	Distance float64
	Pipe     PipeIndex
	End      End
	OK       bool
}

// on is a reach farther along a pipe.
func (r Reach) on(length float64) Reach {
	r.Distance += length
	return r
}

// Between is the level on the straight line between what is known upstream and downstream;
// none where one of them is not.
func Between(up, down Reach) Maybe {
	switch length := up.Distance + down.Distance; {
	case !up.OK || !down.OK:
		return Maybe{}
	case length == 0:
		return Some(down.Level)
	default:
		return Some(up.Level + (down.Level-up.Level)*up.Distance/length)
	}
}

// KnownInverts finds, for both ends of every pipe of a connected network, the nearest known
// invert upstream and downstream along the main line: at a structure it goes on in the largest
// existing pipe in, and in the largest one out. Levels of pipes that are still to be laid do not
// count. An end that is known is its own reach. ok is false where pipes run in a cycle.
func (n *Network) KnownInverts() (up, down [][2]Reach, ok bool) {
	order, ok := n.Order()
	if !ok {
		return nil, nil, false
	}
	up, down = make([][2]Reach, len(n.Pipes)), make([][2]Reach, len(n.Pipes))
	for _, s := range order {
		above := n.largestExisting(n.PipesIn(s))
		for _, p := range n.PipesOut(s) {
			pipe := &n.Pipes[p]
			if above >= 0 {
				up[p][Upper] = up[above][Lower]
			}
			up[p][Upper] = n.own(p, Upper).or(up[p][Upper])
			up[p][Lower] = n.own(p, Lower).or(up[p][Upper].on(pipe.Length))
		}
	}
	for i := len(order) - 1; i >= 0; i-- {
		below := n.largestExisting(n.PipesOut(order[i]))
		for _, p := range n.PipesIn(order[i]) {
			pipe := &n.Pipes[p]
			if below >= 0 {
				down[p][Lower] = down[below][Upper]
			}
			down[p][Lower] = n.own(p, Lower).or(down[p][Lower])
			down[p][Upper] = n.own(p, Upper).or(down[p][Lower].on(pipe.Length))
		}
	}
	return up, down, true
}

// own is the invert of an existing pipe at an end, where it is known.
func (n *Network) own(p PipeIndex, e End) Reach {
	pipe := &n.Pipes[p]
	invert := pipe.Invert(e)
	return Reach{Level: invert.V, Pipe: p, End: e, OK: invert.OK && pipe.Existing}
}

func (r Reach) or(other Reach) Reach {
	if r.OK {
		return r
	}
	return other
}

// largestExisting is the existing pipe of the largest full area, the first of equal ones; -1
// where none is existing.
func (n *Network) largestExisting(pipes []PipeIndex) PipeIndex {
	largest, most := PipeIndex(-1), 0.0
	for _, p := range pipes {
		if pipe := &n.Pipes[p]; pipe.Existing && (largest < 0 || pipe.FullArea() > most) {
			largest, most = p, pipe.FullArea()
		}
	}
	return largest
}
