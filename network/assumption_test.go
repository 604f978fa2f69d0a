package network_test

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
)

// A straight old line of five pipes, whose inverts follow one slope, is drawn with some of them
// unknown: what lies between known ones comes back, what does not stays unknown.
func TestUnknownInvertsOnAStraightLineComeBack(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		const pipes = 5
		n := &network.Network{Structures: make([]network.Structure, pipes+1)}
		n.Structures[pipes].Kind = network.Outfall
		level, known := 100.0, make([]bool, 2*pipes)
		truth := make([]float64, 0, 2*pipes)
		for i := range pipes {
			length := rapid.Float64Range(10, 500).Draw(t, "length")
			p := network.Pipe{From: network.StructureIndex(i), To: network.StructureIndex(i + 1), Length: length, Existing: true}
			for _, e := range []network.End{network.Upper, network.Lower} {
				known[len(truth)] = rapid.Bool().Draw(t, "known")
				m := network.Maybe{V: level, OK: known[len(truth)]}
				if truth = append(truth, level); e == network.Upper {
					p.InvertUpper = m
					level -= 0.004 * length
				} else {
					p.InvertLower = m
				}
			}
			n.Pipes = append(n.Pipes, p)
		}
		n.Connect()
		up, down, ok := n.KnownInverts()
		if !ok {
			t.Fatal("a line is no cycle")
		}
		for i := range 2 * pipes {
			p, e := i/2, network.End(i%2)
			between := network.Between(up[p][e], down[p][e])
			above, below := known[i], known[i]
			for k := range known {
				above, below = above || known[k] && k < i, below || known[k] && k > i
			}
			if between.OK != (above && below) || between.OK && math.Abs(between.V-truth[i]) > 1e-9 {
				t.Fatalf("end %d: %v, the level is %.6f; known %v", i, between, truth[i], known)
			}
		}
	})
}

// At a structure the largest existing pipe is the main line; a lateral that enters higher, and a pipe that is still
// to be laid, do not count.
func TestTheMainLineCarriesKnownInverts(t *testing.T) {
	n := &network.Network{Structures: make([]network.Structure, 5)}
	pipe := func(from, to network.StructureIndex, lower network.Maybe, existing bool) network.Pipe {
		return network.Pipe{From: from, To: to, Length: 100, InvertUpper: network.Some(50), InvertLower: lower, Existing: existing}
	}
	n.Pipes = []network.Pipe{
		pipe(0, 2, network.Some(40), true),
		pipe(1, 2, network.Some(30), false),
		{From: 2, To: 3, Length: 100, Existing: true},
		pipe(3, 4, network.Some(20), true),
	}
	n.Pipes[3].InvertUpper = network.Some(36)
	n.Connect()
	up, down, _ := n.KnownInverts()
	if u := up[2][network.Upper]; !u.OK || u.Level != 40 || u.Distance != 0 || u.Pipe != 0 {
		t.Errorf("upstream of the unknown pipe: %+v", u)
	}
	if d := down[2][network.Upper]; !d.OK || d.Level != 36 || d.Distance != 100 || d.Pipe != 3 {
		t.Errorf("downstream of it: %+v", d)
	}
}
