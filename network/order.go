package network

// Order lists all structures so that every pipe leads from an earlier to a later
// one. ok is false where pipes run in a cycle; the structures on and below cycles
// are then missing.
//
// A queue sweep (Kahn, Communications of the ACM 5, 1962, p. 558): a structure
// joins the queue when its last pipe in has been passed. It needs no recursion,
// so a chain of any length is sorted in constant stack. Among structures that
// are free at once file order holds, so the same input gives the same order.
func (n *Network) Order() (order []StructureIndex, ok bool) {
	waiting := make([]int32, len(n.Structures)) // pipes in that are not passed yet
	order = make([]StructureIndex, 0, len(n.Structures))
	for s := range n.Structures {
		waiting[s] = int32(len(n.PipesIn(StructureIndex(s))))
		if waiting[s] == 0 {
			order = append(order, StructureIndex(s))
		}
	}
	for next := 0; next < len(order); next++ {
		for _, p := range n.PipesOut(order[next]) {
			to := n.Pipes[p].To
			if waiting[to]--; waiting[to] == 0 {
				order = append(order, to)
			}
		}
	}
	return order, len(order) == len(n.Structures)
}

// Cycles finds the pipes that run in circles: for each separate group of cycles
// one cycle, as its pipes in walking order. A pipe that starts and ends at one
// structure is a cycle of one.
//
// What the queue sweep leaves over is on a cycle or below one. Walking upstream
// from there among the leftovers must return to where it has been, since each
// of them has a pipe in from another leftover.
func (n *Network) Cycles() [][]PipeIndex {
	order, ok := n.Order()
	if ok {
		return nil
	}
	const unseen, sorted = 0, -1
	visit := make([]int32, len(n.Structures)) // the walk that saw a structure
	for _, s := range order {
		visit[s] = sorted
	}
	var cycles [][]PipeIndex
	for s := range n.Structures {
		if visit[s] != unseen {
			continue
		}
		walk := int32(s) + 1
		if cycle := n.walkUpstream(StructureIndex(s), visit, walk); cycle != nil {
			cycles = append(cycles, cycle)
		}
	}
	return cycles
}

// walkUpstream follows pipes in from s among structures that are not sorted,
// marking them with walk, until it meets one that some walk has seen. When that
// is its own, the pipes between are a cycle; another walk's cycle is known already.
func (n *Network) walkUpstream(s StructureIndex, visit []int32, walk int32) []PipeIndex {
	var path []PipeIndex // pipes walked, the downstream end first
	for visit[s] == 0 {
		visit[s] = walk
		for _, p := range n.PipesIn(s) {
			if visit[n.Pipes[p].From] >= 0 {
				path = append(path, p)
				s = n.Pipes[p].From
				break
			}
		}
	}
	if visit[s] != walk {
		return nil
	}
	var cycle []PipeIndex
	for i := len(path) - 1; i >= 0; i-- {
		cycle = append(cycle, path[i])
		if n.Pipes[path[i]].To == s {
			break
		}
	}
	return cycle
}
