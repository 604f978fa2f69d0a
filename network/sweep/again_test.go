package sweep_test

import (
	"reflect"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/networktest"
	"rimfall/network/sweep"
)

// below marks a structure and all on the way down from it.
func below(n *network.Network, from network.StructureIndex) []bool {
	marked := make([]bool, len(n.Structures))
	marked[from] = true
	order, _ := n.Order()
	for _, s := range order {
		for _, p := range n.PipesIn(s) {
			marked[s] = marked[s] || marked[n.Pipes[p].From]
		}
	}
	return marked
}

func TestPassesInOneRoomGiveWhatFreshPassesGive(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n, storm := anyNetwork(t), drawStorm(t)
		again := sweep.NewAgain(n, storm.Peak)
		for _, uplift := range []float64{1, 3, 0.2} {
			r := endlessRain.Scaled(uplift)
			got, problems := again.Down(&storm, r)
			if want := down(t, n, storm, r); len(problems) > 0 || !reflect.DeepEqual(*got, want) {
				t.Fatalf("uplift %g: %+v\nfresh: %+v", uplift, *got, want)
			}
		}
	})
}

func TestARepeatedWayDownGivesWhatAWholePassGives(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n, storm := anyNetwork(t), drawStorm(t)
		again := sweep.NewAgain(n, storm.Peak)
		flows, _ := again.Down(&storm, endlessRain)
		kept := flows.Copy()
		for range 2 {
			at := network.StructureIndex(rapid.IntRange(0, len(n.Structures)-1).Draw(t, "changed"))
			again.Keep(&kept)
			again.Way(below(n, at))
			given := n.Structures[at].Inflow
			for range 2 { // changes on one way
				n.Structures[at].Inflow = given + rapid.Float64Range(0.01, 10).Draw(t, "more inflow")
				for _, a := range n.AreasAt(at) {
					n.Areas[a].Area *= 2
				}
				got, _ := again.Below()
				samePass(t, n, got, down(t, n, storm, endlessRain))
			}
			n.Structures[at].Inflow = given
			for _, a := range n.AreasAt(at) {
				n.Areas[a].Area /= 4
			}
		}
	})
}

// samePass holds flows and times of travel against a whole pass, to the rounding of sums in another order.
func samePass(t *rapid.T, n *network.Network, got *sweep.Flows, want sweep.Flows) {
	const tolerance = 1e-9
	for i := range n.Pipes {
		a, b := &got.Pipes[i], &want.Pipes[i]
		if !near(a.Flow, b.Flow, tolerance) || !near(a.TravelTime, b.TravelTime, tolerance) || !near(a.CA, b.CA, tolerance) {
			t.Fatalf("pipe %s: %+v, a whole pass gives %+v", n.Pipes[i].ID, *a, *b)
		}
	}
	for i := range n.Structures {
		if a, b := &got.Structures[i], &want.Structures[i]; !near(a.Flow, b.Flow, tolerance) || !near(a.Area, b.Area, tolerance) {
			t.Fatalf("structure %d: %+v, a whole pass gives %+v", i, *a, *b)
		}
	}
}

func TestFurtherPassesAllocateNothing(t *testing.T) {
	n := networktest.New(networktest.Forest, 1000)
	storm, r := usStorm(), longRain(t)
	again := sweep.NewAgain(n, storm.Peak)
	once := func() {
		if _, problems := again.Down(&storm, &r); len(problems) > 0 {
			t.Fatal(problems[0].Text)
		}
	}
	if perRun := testing.AllocsPerRun(5, once); perRun != 0 {
		t.Errorf("%g allocations a pass", perRun)
	}
}
