package network

import (
	"gonum.org/v1/gonum/graph"
)

// Graph shows the network as a gonum directed graph: a node for each structure,
// its ID being the StructureIndex. Parallel pipes appear as one edge, and a
// self-loop as an edge from a node to itself. It holds no copy of the network.
type Graph struct{ n *Network }

// Graph returns the view of a connected network.
func (n *Network) Graph() Graph { return Graph{n} }

var _ graph.Directed = Graph{}

// node is a structure as gonum sees it.
type node StructureIndex

func (v node) ID() int64 { return int64(v) }

// edge joins two structures; several parallel pipes make one edge.
type edge struct{ from, to node }

func (e edge) From() graph.Node { return e.from }
func (e edge) To() graph.Node   { return e.to }

// ReversedEdge returns the edge the other way round; water does not flow along it.
func (e edge) ReversedEdge() graph.Edge { return edge{e.to, e.from} }

func (g Graph) has(id int64) bool { return id >= 0 && id < int64(len(g.n.Structures)) }

// Node returns the structure with that index, or nil where there is none.
func (g Graph) Node(id int64) graph.Node {
	if !g.has(id) {
		return nil
	}
	return node(id)
}

// Nodes iterates over all structures in file order.
func (g Graph) Nodes() graph.Nodes {
	if len(g.n.Structures) == 0 {
		return graph.Empty
	}
	return &walk{count: len(g.n.Structures), at: func(i int) node { return node(i) }, current: -1}
}

// From iterates over the structures that a pipe reaches from id.
func (g Graph) From(id int64) graph.Nodes {
	if !g.has(id) {
		return graph.Empty
	}
	pipes := g.n.PipesOut(StructureIndex(id))
	return g.ends(pipes, func(p *Pipe) StructureIndex { return p.To })
}

// To iterates over the structures from which a pipe reaches id.
func (g Graph) To(id int64) graph.Nodes {
	if !g.has(id) {
		return graph.Empty
	}
	pipes := g.n.PipesIn(StructureIndex(id))
	return g.ends(pipes, func(p *Pipe) StructureIndex { return p.From })
}

// ends lists the far ends of pipes, each once.
func (g Graph) ends(pipes []PipeIndex, end func(*Pipe) StructureIndex) graph.Nodes {
	if len(pipes) == 0 {
		return graph.Empty
	}
	once := make([]node, 0, len(pipes))
next:
	for _, p := range pipes {
		v := node(end(&g.n.Pipes[p]))
		for _, seen := range once {
			if seen == v {
				continue next
			}
		}
		once = append(once, v)
	}
	return &walk{count: len(once), at: func(i int) node { return once[i] }, current: -1}
}

// HasEdgeFromTo reports whether a pipe leads from u to v.
func (g Graph) HasEdgeFromTo(u, v int64) bool {
	if !g.has(u) || !g.has(v) {
		return false
	}
	for _, p := range g.n.PipesOut(StructureIndex(u)) {
		if int64(g.n.Pipes[p].To) == v {
			return true
		}
	}
	return false
}

// HasEdgeBetween reports whether a pipe joins x and y, either way.
func (g Graph) HasEdgeBetween(x, y int64) bool {
	return g.HasEdgeFromTo(x, y) || g.HasEdgeFromTo(y, x)
}

// Edge returns the edge from u to v, or nil where no pipe leads there.
func (g Graph) Edge(u, v int64) graph.Edge {
	if !g.HasEdgeFromTo(u, v) {
		return nil
	}
	return edge{node(u), node(v)}
}

// walk iterates over nodes by position.
type walk struct {
	count, current int
	at             func(int) node
}

func (w *walk) Next() bool {
	if w.current+1 >= w.count {
		w.current = w.count
		return false
	}
	w.current++
	return true
}

func (w *walk) Len() int {
	if w.current >= w.count {
		return 0
	}
	return w.count - w.current - 1
}

func (w *walk) Reset() { w.current = -1 }

func (w *walk) Node() graph.Node {
	if w.current < 0 || w.current >= w.count {
		return nil
	}
	return w.at(w.current)
}
