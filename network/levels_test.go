package network_test

import (
	"testing"

	"rimfall/network"
	"rimfall/pipeflow"
)

// twoIn is a structure that two pipes enter, of diameters in feet and at inverts.
func twoIn(t *testing.T, first, second network.Pipe) *network.Network {
	t.Helper()
	n := &network.Network{Structures: make([]network.Structure, 3), Pipes: []network.Pipe{first, second}}
	n.Pipes[0].To, n.Pipes[1].From, n.Pipes[1].To = 2, 1, 2
	n.Connect()
	return n
}

func pipe(t *testing.T, id string, diameter, invert float64) network.Pipe {
	t.Helper()
	s, err := pipeflow.NewCircle(diameter)
	if err != nil {
		t.Fatal(err)
	}
	return network.Pipe{ID: id, Count: 1, Section: s, InvertLower: network.Some(invert)}
}

func TestTheLargestAndTheLowestPipeInDoNotDependOnTheOrderOfTheRows(t *testing.T) {
	for _, c := range []struct {
		name            string
		a, b            network.Pipe
		largest, lowest string
	}{
		{"one is larger, the other lower", pipe(t, "A", 1, 90), pipe(t, "B", 2, 91), "B", "A"},
		{"they are equal, and the id that comes first counts", pipe(t, "A", 1, 90), pipe(t, "B", 1, 90), "A", "A"},
	} {
		for _, order := range [][2]network.Pipe{{c.a, c.b}, {c.b, c.a}} {
			n := twoIn(t, order[0], order[1])
			largest, _, ok1 := n.LargestIn(2)
			lowest, _, ok2 := n.LowestIn(2)
			if !ok1 || !ok2 || n.Pipes[largest].ID != c.largest || n.Pipes[lowest].ID != c.lowest {
				t.Errorf("%s: largest %s, lowest %s, want %s and %s", c.name, n.Pipes[largest].ID, n.Pipes[lowest].ID, c.largest, c.lowest)
			}
		}
	}
}

func TestCoverIsFromTheRimToTheOutsideOfThePipe(t *testing.T) {
	p := pipe(t, "A", 1, 90)
	p.InvertUpper, p.Wall, p.HasWall = network.Some(95), 0.25, true
	n := &network.Network{Structures: []network.Structure{{Rim: network.Some(100)}, {}}, Pipes: []network.Pipe{p}}
	n.Pipes[0].To = 1
	if c := n.Cover(&n.Pipes[0], network.Upper); c != network.Some(3.75) { // 100 − 95 − 1 − 0.25
		t.Errorf("cover %+v, want 3.75", c)
	}
	if c := n.Cover(&n.Pipes[0], network.Lower); c.OK {
		t.Errorf("cover %+v under no rim", c)
	}
}
