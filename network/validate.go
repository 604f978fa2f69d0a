package network

import (
	"fmt"
	"math"
	"strings"
)

// Problem is a fault of the network as a whole, with the row and field to which
// it belongs; the reader of the job turns it into a file, line and column.
type Problem struct {
	Table string // "structures", "pipes", "areas" or "rainfall"
	Line  int    // of the row; 0: the whole table
	Field string
	Text  string
}

// shareTolerance is by how much the shares of a structure may miss 1: shares
// written with six decimals, as thirds are.
const shareTolerance = 2e-6

// Validate finds everything that keeps a connected network from being run: no
// outfall, pipes in a cycle, a pipe out of an outfall, several pipes out without
// shares that add up to one, structures from which no outfall can be reached.
func (n *Network) Validate() []Problem {
	var all []Problem
	all = append(all, n.outfallProblems()...)
	all = append(all, n.shareProblems()...)
	cycles := n.Cycles()
	for _, c := range cycles {
		all = append(all, n.cycleProblem(c))
	}
	return append(all, n.deadEnds()...)
}

func (n *Network) outfallProblems() []Problem {
	var all []Problem
	outfalls := 0
	for i := range n.Structures {
		s := &n.Structures[i]
		if s.Kind != Outfall {
			continue
		}
		outfalls++
		for _, p := range n.PipesOut(StructureIndex(i)) {
			all = append(all, Problem{
				"pipes", int(n.Pipes[p].Line), "from",
				fmt.Sprintf("pipe %s leaves the outfall %s; an outfall is where the water leaves the network: turn the pipe round, or make %s a manhole", n.Pipes[p].ID, s.ID, s.ID),
			})
		}
	}
	if outfalls == 0 && len(n.Structures) > 0 {
		all = append(all, Problem{"structures", 0, "", "no outfall: give the structure at which the water leaves the network the kind outfall"})
	}
	return all
}

// shareProblems checks the splits: several pipes out of one structure need a
// share each, and the shares add up to one.
func (n *Network) shareProblems() []Problem {
	var all []Problem
	for i := range n.Structures {
		out := n.PipesOut(StructureIndex(i))
		if len(out) == 0 || n.Structures[i].Kind == Outfall {
			continue
		}
		sum, missing := 0.0, false
		for _, p := range out {
			pipe := &n.Pipes[p]
			if !pipe.Share.OK && len(out) > 1 {
				missing = true
				all = append(all, Problem{
					"pipes", int(pipe.Line), "share",
					fmt.Sprintf("structure %s has %d pipes out, so pipe %s needs a share of its flow (0 to 1; the shares add up to 1)", n.Structures[i].ID, len(out), pipe.ID),
				})
			}
			sum += pipe.Share.Or(1)
		}
		if !missing && math.Abs(sum-1) > shareTolerance {
			first := &n.Pipes[out[0]]
			all = append(all, Problem{
				"pipes", int(first.Line), "share",
				fmt.Sprintf("the shares of the pipes out of structure %s add up to %.7g; they must add up to 1", n.Structures[i].ID, sum),
			})
		}
	}
	return all
}

func (n *Network) cycleProblem(cycle []PipeIndex) Problem {
	first := &n.Pipes[cycle[0]]
	if len(cycle) == 1 {
		return Problem{
			"pipes", int(first.Line), "to",
			fmt.Sprintf("pipe %s starts and ends at structure %s", first.ID, n.Structures[first.From].ID),
		}
	}
	const shown = 40
	var b strings.Builder
	for i, p := range cycle {
		if i == shown {
			fmt.Fprintf(&b, "… (%d more) → ", len(cycle)-shown)
			break
		}
		b.WriteString(n.Structures[n.Pipes[p].From].ID + " → ")
	}
	b.WriteString(n.Structures[first.From].ID)
	return Problem{"pipes", int(first.Line), "to", "pipes run in a circle: " + b.String() + "; turn one of them round"}
}

// deadEnds finds the structures, other than outfalls, that no pipe leaves. As
// every walk downstream ends at such a structure, at an outfall or in a cycle,
// these and the cycles are all the causes of water that cannot get out.
func (n *Network) deadEnds() []Problem {
	var all []Problem
	for i := range n.Structures {
		s := &n.Structures[i]
		if s.Kind == Outfall || len(n.PipesOut(StructureIndex(i))) > 0 {
			continue
		}
		what := "no pipe leaves it"
		if len(n.PipesIn(StructureIndex(i))) == 0 {
			what = "no pipe joins it to the network"
		}
		all = append(all, Problem{
			"structures", int(s.Line), "id",
			fmt.Sprintf("structure %s has no way to an outfall: %s, and its kind is %s", s.ID, what, s.Kind),
		})
	}
	return all
}
