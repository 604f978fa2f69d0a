package analysis

import "rimfall/network"

// system is one part of a network that no pipe joins to the rest, as a network of its own, with the places of its pipes and
// structures in the whole.
type system struct {
	network    *network.Network
	pipes      []network.PipeIndex
	structures []network.StructureIndex
}

// systems takes a connected network apart. What is computed in one system does not depend on the others.
func systems(n *network.Network) []system {
	label := make([]int32, len(n.Structures)) // the number of the system, from 1
	place := make([]network.StructureIndex, len(n.Structures))
	var all []system
	for s := range n.Structures {
		if label[s] == 0 {
			all = append(all, gather(n, network.StructureIndex(s), int32(len(all)+1), label, place))
		}
	}
	for i := range n.Pipes {
		p := n.Pipes[i]
		part := &all[label[p.From]-1]
		part.pipes = append(part.pipes, network.PipeIndex(i))
		p.From, p.To = place[p.From], place[p.To]
		part.network.Pipes = append(part.network.Pipes, p)
	}
	for i := range n.Areas {
		a := n.Areas[i]
		part := all[label[a.Structure]-1].network
		a.Structure = place[a.Structure]
		part.Areas = append(part.Areas, a)
	}
	for i := range all {
		all[i].network.Connect()
	}
	return all
}

// gather lists the structures that pipes join to a first one, by a queue, and notes their label and their place in the list.
func gather(n *network.Network, first network.StructureIndex, number int32, label []int32, place []network.StructureIndex) system {
	part := system{network: &network.Network{}}
	join := func(s network.StructureIndex) {
		if label[s] == 0 {
			label[s], place[s] = number, network.StructureIndex(len(part.structures))
			part.structures = append(part.structures, s)
			part.network.Structures = append(part.network.Structures, n.Structures[s])
		}
	}
	join(first)
	for next := 0; next < len(part.structures); next++ {
		for _, p := range n.PipesOut(part.structures[next]) {
			join(n.Pipes[p].To)
		}
		for _, p := range n.PipesIn(part.structures[next]) {
			join(n.Pipes[p].From)
		}
	}
	return part
}
