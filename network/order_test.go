package network_test

import (
	"errors"
	"testing"

	"gonum.org/v1/gonum/graph"
	"gonum.org/v1/gonum/graph/topo"
	"gonum.org/v1/gonum/graph/traverse"
	"pgregory.net/rapid"

	"rimfall/network"
)

// drawNetwork is any connected-up network: parallel pipes, loose structures and,
// where loops is true, pipes that start and end at one structure.
func drawNetwork(t *rapid.T, loops bool) *network.Network {
	n := &network.Network{Structures: make([]network.Structure, rapid.IntRange(1, 25).Draw(t, "structures"))}
	end := rapid.IntRange(0, len(n.Structures)-1)
	for range rapid.IntRange(0, 40).Draw(t, "pipes") {
		from, to := end.Draw(t, "from"), end.Draw(t, "to")
		if from != to || loops {
			n.Pipes = append(n.Pipes, network.Pipe{From: network.StructureIndex(from), To: network.StructureIndex(to)})
		}
	}
	n.Connect()
	return n
}

// drawAcyclic is a network in which every pipe leads to a later structure, the rows
// of both tables in any order.
func drawAcyclic(t *rapid.T) *network.Network {
	count := rapid.IntRange(1, 25).Draw(t, "structures")
	place := rapid.Permutation(indexes(count)).Draw(t, "row of each structure")
	n := &network.Network{Structures: make([]network.Structure, count)}
	for range rapid.IntRange(0, 40).Draw(t, "pipes") {
		a, b := rapid.IntRange(0, count-1).Draw(t, "an end"), rapid.IntRange(0, count-1).Draw(t, "another end")
		if a != b {
			n.Pipes = append(n.Pipes, network.Pipe{From: place[min(a, b)], To: place[max(a, b)]})
		}
	}
	n.Connect()
	return n
}

func indexes(count int) []network.StructureIndex {
	all := make([]network.StructureIndex, count)
	for i := range all {
		all[i] = network.StructureIndex(i)
	}
	return all
}

// positions gives each structure its place in an order; −1 where it is missing.
func positions(n *network.Network, order []network.StructureIndex) []int {
	at := make([]int, len(n.Structures))
	for i := range at {
		at[i] = -1
	}
	for i, s := range order {
		at[s] = i
	}
	return at
}

func TestOrderAndTopologicalSortOfGonumGiveOneVerdict(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := drawNetwork(t, false) // topo.Sort passes over self-loops
		order, ok := n.Order()
		sorted, err := topo.Sort(n.Graph())
		if ok != (err == nil) {
			t.Fatalf("Order says %t, topo.Sort says %v", ok, err)
		}
		if ok && len(order) != len(sorted) {
			t.Fatalf("Order lists %d structures, topo.Sort %d", len(order), len(sorted))
		}
	})
}

func TestEveryPipeLeadsFromAnEarlierToALaterStructure(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := drawAcyclic(t)
		order, ok := n.Order()
		if !ok || len(order) != len(n.Structures) {
			t.Fatalf("ok is %t with %d of %d structures, without a cycle", ok, len(order), len(n.Structures))
		}
		sorted, err := topo.Sort(n.Graph())
		if err != nil {
			t.Fatal(err)
		}
		theirs := make([]network.StructureIndex, len(sorted))
		for i, v := range sorted {
			theirs[i] = network.StructureIndex(v.ID())
		}
		ours, gonums := positions(n, order), positions(n, theirs)
		for _, p := range n.Pipes {
			if ours[p.From] >= ours[p.To] || gonums[p.From] >= gonums[p.To] {
				t.Fatalf("pipe %d → %d: places %d, %d in Order, %d, %d in topo.Sort",
					p.From, p.To, ours[p.From], ours[p.To], gonums[p.From], gonums[p.To])
			}
		}
	})
}

func TestWhatOrderLeavesOutIsOnOrBelowTheCyclesThatGonumFinds(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := drawNetwork(t, true)
		order, _ := n.Order()
		at := positions(n, order)
		spoilt := belowCycles(n)
		for s := range n.Structures {
			if (at[s] < 0) != spoilt[s] {
				t.Fatalf("structure %d: in Order at %d, on or below a cycle: %t", s, at[s], spoilt[s])
			}
		}
	})
}

// belowCycles marks the structures on or below a cycle by gonum's own means:
// strongly connected groups, self-loops, and a walk downstream from them.
func belowCycles(n *network.Network) []bool {
	spoilt := make([]bool, len(n.Structures))
	walk := traverse.DepthFirst{Visit: func(v graph.Node) { spoilt[v.ID()] = true }}
	for _, group := range topo.TarjanSCC(n.Graph()) {
		if id := group[0].ID(); len(group) > 1 || n.Graph().HasEdgeFromTo(id, id) {
			walk.Walk(n.Graph(), group[0], nil)
		}
	}
	return spoilt
}

func TestCyclesArePipesInWalkingOrderThatCloseACircle(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := drawNetwork(t, true)
		_, ok := n.Order()
		cycles := n.Cycles()
		if ok != (len(cycles) == 0) {
			t.Fatalf("Order says %t, and there are %d cycles", ok, len(cycles))
		}
		for _, cycle := range cycles {
			seen := map[network.StructureIndex]bool{}
			for i, p := range cycle {
				next := cycle[(i+1)%len(cycle)]
				if n.Pipes[p].To != n.Pipes[next].From {
					t.Fatalf("cycle %v: pipe %d ends at %d, the next starts at %d", cycle, p, n.Pipes[p].To, n.Pipes[next].From)
				}
				if seen[n.Pipes[p].From] {
					t.Fatalf("cycle %v passes structure %d twice", cycle, n.Pipes[p].From)
				}
				seen[n.Pipes[p].From] = true
			}
		}
	})
}

// Whoever turns round one pipe of each cycle printed, again and again, must get
// to the end: so every group of structures that hangs together and has a cycle
// shows at least one.
func TestEverySeparateGroupOfCyclesShowsOne(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := drawNetwork(t, false)
		_, err := topo.Sort(n.Graph())
		var groups topo.Unorderable
		if err != nil && !errors.As(err, &groups) {
			t.Fatal(err)
		}
		shown := map[int64]bool{} // structures on the cycles that are shown
		for _, cycle := range n.Cycles() {
			for _, p := range cycle {
				shown[int64(n.Pipes[p].From)] = true
			}
		}
		for _, group := range groups { // one shows itself, or a group upstream of it does
			if !anyUpstream(n, group[0], shown) {
				t.Fatalf("no cycle shown at or above the structures %v", group)
			}
		}
	})
}

func anyUpstream(n *network.Network, from graph.Node, marked map[int64]bool) bool {
	found := false
	walk := traverse.BreadthFirst{Visit: func(v graph.Node) { found = found || marked[v.ID()] }}
	walk.Walk(upstream{n.Graph()}, from, nil)
	return found
}

// upstream is a network seen against the flow.
type upstream struct{ network.Graph }

func (u upstream) From(id int64) graph.Nodes  { return u.Graph.To(id) }
func (u upstream) Edge(a, b int64) graph.Edge { return u.Graph.Edge(b, a) }

func TestFreeStructuresKeepTheOrderOfTheFile(t *testing.T) {
	n := &network.Network{Structures: make([]network.Structure, 4)}
	n.Pipes = []network.Pipe{{From: 2, To: 1}, {From: 0, To: 1}, {From: 3, To: 1}}
	n.Connect()
	order, ok := n.Order()
	if want := []network.StructureIndex{0, 2, 3, 1}; !ok || len(order) != 4 || order[0] != want[0] || order[1] != want[1] || order[2] != want[2] || order[3] != want[3] {
		t.Errorf("order %v, want %v", order, want)
	}
}

// A recursive sort dies on such a chain of a stack overflow that nothing catches.
func TestAChainOfThreeMillionPipesIsSorted(t *testing.T) {
	const count = 3_000_000
	n := &network.Network{Structures: make([]network.Structure, count+1), Pipes: make([]network.Pipe, count)}
	for i := range n.Pipes { // the outfall first, so that file order does not help
		n.Pipes[i] = network.Pipe{From: network.StructureIndex(i + 1), To: network.StructureIndex(i)}
	}
	n.Connect()
	order, ok := n.Order()
	if !ok || order[0] != count || order[count] != 0 {
		t.Errorf("ok is %t, from %d to %d", ok, order[0], order[len(order)-1])
	}
	if cycles := n.Cycles(); cycles != nil {
		t.Errorf("%d cycles in a chain", len(cycles))
	}
}
