package drawing

import (
	"rimfall/network"
	"rimfall/network/sweep"
)

// line is a run of pipes that is drawn as one profile. It begins at its lower end: stations run upgrade (Vernonia OR,
// Public Works Design Standards, as practice there asks).
type line struct {
	name       string // "A"
	structures []network.StructureIndex
	pipes      []network.PipeIndex // pipe i joins structure i+1 to structure i
	stations   []float64           // of the structures, from the lower end of the line
	joins      string              // name of the line into which it runs; "" at an outfall
}

// add lengthens the line by a pipe at its upper end.
func (l *line) add(n *network.Network, p network.PipeIndex) {
	l.pipes = append(l.pipes, p)
	l.structures = append(l.structures, n.Pipes[p].From)
	l.stations = append(l.stations, l.stations[len(l.stations)-1]+n.Pipes[p].Length)
}

func newLine(n *network.Network, lower network.StructureIndex) line {
	return line{structures: []network.StructureIndex{lower}, stations: []float64{0}}
}

// lineFrom is the way of the water from a structure to its outfall; at a split it follows the pipe with the most flow.
func lineFrom(n *network.Network, flows *sweep.Flows, from network.StructureIndex) line {
	var down []network.PipeIndex
	for s := from; len(n.PipesOut(s)) > 0; {
		most := n.PipesOut(s)[0]
		for _, p := range n.PipesOut(s)[1:] {
			if flows.Pipes[p].Flow > flows.Pipes[most].Flow {
				most = p
			}
		}
		down = append(down, most)
		s = n.Pipes[most].To
	}
	lower := from
	if len(down) > 0 {
		lower = n.Pipes[down[len(down)-1]].To
	}
	l := newLine(n, lower)
	for i := len(down) - 1; i >= 0; i-- {
		l.add(n, down[i])
	}
	l.name = "A"
	return l
}

// lines divides the network into lines, so that every pipe stands on one of them: from each outfall the longest way up,
// then from each structure on it, from the lower end up, the longest way up each branch, and so on.
func lines(n *network.Network) []line {
	reach := longestWays(n)
	drawn := make([]bool, len(n.Pipes))
	var all []line
	climb := func(lower network.StructureIndex, joins string) bool {
		l := newLine(n, lower)
		for s := lower; ; {
			p, ok := longestIn(n, s, reach, drawn)
			if !ok {
				break
			}
			drawn[p] = true
			l.add(n, p)
			s = n.Pipes[p].From
		}
		if len(l.pipes) == 0 {
			return false
		}
		l.name, l.joins = letters(len(all)), joins
		all = append(all, l)
		return true
	}
	for s := range n.Structures {
		for n.Structures[s].Kind == network.Outfall && climb(network.StructureIndex(s), "") {
		}
	}
	for i := 0; i < len(all); i++ { // all grows while it is gone through
		for k := range all[i].structures {
			for climb(all[i].structures[k], all[i].name) {
			}
		}
	}
	return all
}

// longestWays gives for each structure the greatest length of pipe above it.
func longestWays(n *network.Network) []float64 {
	reach := make([]float64, len(n.Structures))
	order, _ := n.Order() // without cycles, which were faults
	for _, s := range order {
		for _, p := range n.PipesOut(s) {
			pipe := &n.Pipes[p]
			reach[pipe.To] = max(reach[pipe.To], reach[s]+pipe.Length)
		}
	}
	return reach
}

// longestIn is the pipe into a structure, of those not yet drawn, above which the longest way lies; the first of equals.
func longestIn(n *network.Network, s network.StructureIndex, reach []float64, drawn []bool) (best network.PipeIndex, ok bool) {
	length := 0.0
	for _, p := range n.PipesIn(s) {
		if way := reach[n.Pipes[p].From] + n.Pipes[p].Length; !drawn[p] && (!ok || way > length) {
			best, length, ok = p, way, true
		}
	}
	return best, ok
}

// letters names the lines A to Z, then AA, AB and so on.
func letters(i int) string {
	name := ""
	for i++; i > 0; i = (i - 1) / 26 {
		name = string(rune('A'+(i-1)%26)) + name
	}
	return name
}
