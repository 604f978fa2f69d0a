package network_test

import (
	"fmt"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
)

// drawValid is a network that can be run: sinks are outfalls, splits have shares.
func drawValid(t *rapid.T) *network.Network {
	n := drawAcyclic(t)
	for i := range n.Structures {
		s := network.StructureIndex(i)
		n.Structures[i].ID, n.Structures[i].Line = fmt.Sprintf("S%d", i), int32(i+2)
		out := n.PipesOut(s)
		if len(out) == 0 {
			n.Structures[i].Kind = network.Outfall
		}
		for _, p := range out {
			if len(out) > 1 {
				n.Pipes[p].Share = network.Some(1 / float64(len(out)))
			}
			n.Pipes[p].ID, n.Pipes[p].Line = fmt.Sprintf("P%d", p), int32(p+2)
		}
	}
	return n
}

func TestANetworkThatCanBeRunHasNoProblem(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		if problems := drawValid(t).Validate(); len(problems) > 0 {
			t.Fatalf("problems %+v", problems)
		}
	})
}

// Each way to spoil a network is told, at the row that is to be changed.
func TestOneSlipIsToldAtItsRow(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := drawValid(t)
		s := rapid.IntRange(0, len(n.Structures)-1).Draw(t, "structure")
		out := n.PipesOut(network.StructureIndex(s))
		table, line, words := "structures", s+2, "no way to an outfall"
		switch {
		case n.Structures[s].Kind == network.Outfall:
			n.Structures[s].Kind = network.Manhole
		case len(out) == 1:
			n.Structures[s].Kind = network.Outfall
			table, line, words = "pipes", int(n.Pipes[out[0]].Line), "leaves the outfall"
		default:
			n.Pipes[out[1]].Share = network.Maybe{}
			table, line, words = "pipes", int(n.Pipes[out[1]].Line), "needs a share"
		}
		for _, p := range n.Validate() {
			if p.Table == table && p.Line == line && strings.Contains(p.Text, words) {
				return
			}
		}
		t.Fatalf("no problem %q in line %d of %s, but %+v", words, line, table, n.Validate())
	})
}

func TestALongCircleIsShownByItsFirstStructures(t *testing.T) {
	const count = 1000
	n := &network.Network{}
	for i := range count {
		n.Structures = append(n.Structures, network.Structure{ID: fmt.Sprint(i)})
		n.Pipes = append(n.Pipes, network.Pipe{From: network.StructureIndex(i), To: network.StructureIndex((i + 1) % count)})
	}
	n.Connect()
	for _, p := range n.Validate() {
		if strings.Contains(p.Text, "run in a circle") {
			if shown := strings.Count(p.Text, "→"); shown < 10 || shown > 60 || !strings.Contains(p.Text, "(960 more)") {
				t.Errorf("%d arrows: %s", shown, p.Text)
			}
			return
		}
	}
	t.Error("the circle is not told")
}
