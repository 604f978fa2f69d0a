package network_test

import (
	"testing"

	"gonum.org/v1/gonum/graph"
	"gonum.org/v1/gonum/graph/testgraph"
	"pgregory.net/rapid"

	"rimfall/network"
)

// asNetwork lets gonum's own suite build a network: its nodes become structures
// in their order, its edges pipes, twice over, since parallel pipes are one edge.
func asNetwork(nodes []graph.Node, edges []testgraph.WeightedLine, self, absent float64) (graph.Graph, []graph.Node, []testgraph.Edge, float64, float64, bool) {
	n := &network.Network{Structures: make([]network.Structure, len(nodes))}
	index := map[int64]network.StructureIndex{}
	for i, v := range nodes {
		index[v.ID()] = network.StructureIndex(i)
	}
	for _, e := range edges {
		for _, end := range []graph.Node{e.From(), e.To()} {
			if _, known := index[end.ID()]; !known {
				index[end.ID()] = network.StructureIndex(len(n.Structures))
				n.Structures = append(n.Structures, network.Structure{})
			}
		}
		pipe := network.Pipe{From: index[e.From().ID()], To: index[e.To().ID()]}
		n.Pipes = append(n.Pipes, pipe, pipe)
	}
	n.Connect()
	g := n.Graph()
	var own []testgraph.Edge
	seen := map[[2]network.StructureIndex]bool{}
	for _, p := range n.Pipes {
		if ends := [2]network.StructureIndex{p.From, p.To}; !seen[ends] {
			seen[ends] = true
			own = append(own, g.Edge(int64(p.From), int64(p.To)))
		}
	}
	return g, graph.NodesOf(g.Nodes()), own, self, absent, true
}

func TestGraphObeysTheContractOfGonum(t *testing.T) {
	const useEmpty, reversedEdge = true, true
	t.Run("nodes are those it was made of", func(t *testing.T) { testgraph.ReturnAllNodes(t, asNetwork, useEmpty) })
	t.Run("a node exists when its number does", func(t *testing.T) { testgraph.NodeExistence(t, asNetwork) })
	t.Run("edges exist where pipes lead", func(t *testing.T) { testgraph.EdgeExistence(t, asNetwork, reversedEdge) })
	t.Run("neighbours are those that pipes join", func(t *testing.T) { testgraph.ReturnAdjacentNodes(t, asNetwork, useEmpty, reversedEdge) })
}

func TestGraphAndPipesTellTheSame(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := drawNetwork(t, true)
		g := n.Graph()
		lead := map[[2]int64]bool{}
		for _, p := range n.Pipes {
			lead[[2]int64{int64(p.From), int64(p.To)}] = true
		}
		for u := range int64(len(n.Structures)) {
			for v := range int64(len(n.Structures)) {
				is := lead[[2]int64{u, v}]
				if g.HasEdgeFromTo(u, v) != is || (g.Edge(u, v) != nil) != is {
					t.Fatalf("%d → %d: a pipe leads there: %t, HasEdgeFromTo %t, Edge %v", u, v, is, g.HasEdgeFromTo(u, v), g.Edge(u, v))
				}
				if g.HasEdgeBetween(u, v) != (is || lead[[2]int64{v, u}]) {
					t.Fatalf("%d and %d: HasEdgeBetween is %t", u, v, g.HasEdgeBetween(u, v))
				}
			}
		}
	})
}

func TestAdjacencyListsEveryPipeAndAreaOnce(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := drawNetwork(t, true)
		for range rapid.IntRange(0, 10).Draw(t, "areas") {
			at := rapid.IntRange(0, len(n.Structures)-1).Draw(t, "structure")
			n.Areas = append(n.Areas, network.Area{Structure: network.StructureIndex(at)})
		}
		n.Connect()
		out, in, here := 0, 0, 0
		for _, s := range indexes(len(n.Structures)) {
			for k, p := range n.PipesOut(s) {
				if out++; n.Pipes[p].From != s || k > 0 && p <= n.PipesOut(s)[k-1] {
					t.Fatalf("pipes out of %d: %v", s, n.PipesOut(s))
				}
			}
			for k, p := range n.PipesIn(s) {
				if in++; n.Pipes[p].To != s || k > 0 && p <= n.PipesIn(s)[k-1] {
					t.Fatalf("pipes into %d: %v", s, n.PipesIn(s))
				}
			}
			for _, a := range n.AreasAt(s) {
				if here++; n.Areas[a].Structure != s {
					t.Fatalf("areas at %d: %v", s, n.AreasAt(s))
				}
			}
		}
		if out != len(n.Pipes) || in != len(n.Pipes) || here != len(n.Areas) {
			t.Fatalf("%d pipes out, %d in, of %d; %d areas of %d", out, in, len(n.Pipes), here, len(n.Areas))
		}
	})
}
