package review

import "rimfall/network"

// system is one part of a network that hangs together, as a network of its own that may be changed: the places of the
// whole network by those of the part, and at every structure one more area, of no size, that a question may fill.
type system struct {
	network    *network.Network
	structures []network.StructureIndex
	pipes      []network.PipeIndex
	added      []network.AreaIndex
}

// parts tells for every structure the part of the network that it hangs together with, numbered from 0 in the
// order of their first structures, by joining the ends of every pipe (disjoint sets with halving of paths: Tarjan
// and van Leeuwen, Journal of the ACM 31, 1984).
func parts(n *network.Network) (part []int32, count int) {
	parent := make([]int32, len(n.Structures))
	for i := range parent {
		parent[i] = int32(i)
	}
	root := func(i int32) int32 {
		for parent[i] != i {
			parent[i] = parent[parent[i]]
			i = parent[i]
		}
		return i
	}
	for i := range n.Pipes {
		a, b := root(int32(n.Pipes[i].From)), root(int32(n.Pipes[i].To))
		parent[max(a, b)] = min(a, b)
	}
	part = make([]int32, len(parent))
	for i := range part {
		if r := root(int32(i)); r == int32(i) {
			part[i] = int32(count)
			count++
		} else {
			part[i] = part[r] // the root is the first structure of its part
		}
	}
	return part, count
}

// partOf copies one part of a network. Rows keep their order, so the part runs as it does in the whole.
func partOf(n *network.Network, part []int32, which int32) *system {
	s := &system{network: &network.Network{}}
	inside := make(map[network.StructureIndex]network.StructureIndex)
	for i := range n.Structures {
		if part[i] == which {
			inside[network.StructureIndex(i)] = network.StructureIndex(len(s.structures))
			s.structures = append(s.structures, network.StructureIndex(i))
			s.network.Structures = append(s.network.Structures, n.Structures[i])
		}
	}
	for i, p := range n.Pipes {
		if part[p.From] == which {
			p.From, p.To = inside[p.From], inside[p.To]
			s.pipes = append(s.pipes, network.PipeIndex(i))
			s.network.Pipes = append(s.network.Pipes, p)
		}
	}
	for _, a := range n.Areas {
		if part[a.Structure] == which {
			a.Structure = inside[a.Structure]
			s.network.Areas = append(s.network.Areas, a)
		}
	}
	for i := range s.structures {
		s.added = append(s.added, network.AreaIndex(len(s.network.Areas)))
		s.network.Areas = append(s.network.Areas, network.Area{Structure: network.StructureIndex(i)})
	}
	s.network.Connect()
	return s
}

// below marks a structure and all that its water passes, in changed, and lists the pipes on the way.
func (s *system) below(from network.StructureIndex, changed []bool, path []network.PipeIndex) []network.PipeIndex {
	clear(changed)
	changed[from] = true
	queue := []network.StructureIndex{from}
	for next := 0; next < len(queue); next++ {
		for _, p := range s.network.PipesOut(queue[next]) {
			path = append(path, p)
			if to := s.network.Pipes[p].To; !changed[to] {
				changed[to] = true
				queue = append(queue, to)
			}
		}
	}
	return path
}
