package times_test

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/networktest"
	"rimfall/network/sweep"
	"rimfall/network/times"
	"rimfall/network/units"
)

func rain(tb testing.TB) hydrology.Curve {
	tb.Helper()
	table, err := hydrology.NewTable([]float64{5, 60, 1440, 1e6}, []float64{10}, [][]float64{{6}, {2}, {0.2}, {0.001}})
	if err != nil {
		tb.Fatal(err)
	}
	curve, _ := table.Curve(10)
	return curve
}

func usStorm() network.Storm {
	return network.Storm{ReturnPeriod: 10, MinimumTime: 5, Uplift: 1, RationalFactor: units.US.RationalFactor, ManningFactor: units.US.ManningFactor}
}

// The longest time is that of the sweep itself, at every structure, and the branch leads to an area whose inlet
// time and travel times add up to it.
func TestTheBranchLeadsToTheAreaWhoseWaterArrivesLast(t *testing.T) {
	storm := usStorm()
	curve := rain(t)
	rapid.Check(t, func(t *rapid.T) {
		n := networktest.New(rapid.SampledFrom(networktest.Shapes).Draw(t, "shape"), rapid.IntRange(1, 60).Draw(t, "pipes"))
		for i := range n.Areas {
			n.Areas[i].Time = network.Some(rapid.Float64Range(0, 40).Draw(t, "time"))
			n.Areas[i].C = rapid.SampledFrom([]float64{0, 0.5}).Draw(t, "c")
		}
		flows, problems := sweep.Down(n, &storm, curve, nil)
		if len(problems) > 0 {
			t.Fatal(problems[0].Text)
		}
		for i, b := range times.Branches(n, &flows, storm.MinimumTime, 1) {
			if got, want := b.Time, flows.Structures[i].Time; got != want {
				t.Fatalf("structure %d: %v min, the sweep has %v", i, got, want)
			}
			if b.From < 0 {
				continue
			}
			sum := max(storm.MinimumTime, n.Areas[b.From].Time.V)
			for s := n.Areas[b.From].Structure; s != network.StructureIndex(i); {
				p := n.PipesOut(s)[0]
				sum += flows.Pipes[p].TravelTime
				s = n.Pipes[p].To
			}
			if math.Abs(sum-b.Time) > 1e-9 {
				t.Fatalf("structure %d: the branch of area %d adds up to %v min, not %v", i, b.From, sum, b.Time)
			}
		}
	})
}

func TestTheMinimumTimeGovernsWhereNoAreaTakesLonger(t *testing.T) {
	n := &network.Network{Structures: []network.Structure{{ID: "A"}}, Areas: []network.Area{{ID: "a", Area: 1, C: 0.5, Time: network.Some(3)}}}
	n.Connect()
	storm := usStorm()
	flows, _ := sweep.Down(n, &storm, rain(t), nil)
	b := times.Branches(n, &flows, storm.MinimumTime, 1)[0]
	if b.Time != 5 || b.Area != -1 || b.Pipe != -1 || b.From != -1 {
		t.Errorf("%+v", b)
	}
}

func TestAPathGivesItsAreaATimeUnlessTheAreaHasOne(t *testing.T) {
	n := &network.Network{Structures: []network.Structure{{ID: "A"}}, Areas: []network.Area{{ID: "a", Area: 1, C: 1}, {ID: "b", Area: 1, C: 1, Time: network.Some(7)}}}
	leg := hydrology.Leg{Kind: hydrology.GivenVelocity, Length: 600, Velocity: 1}
	paths := []times.Path{{Area: 0, Legs: []hydrology.Leg{leg, leg}, Lines: []int32{2, 3}}, {Area: 1, Legs: []hydrology.Leg{leg}, Lines: []int32{4}}}
	given := func(a network.AreaIndex) bool { return n.Areas[a].Time.OK }
	walked, faults := times.Walk(paths, given, hydrology.Settings{})
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	timed := times.In(n, walked)
	if a, b := timed.Areas[0].Time, timed.Areas[1].Time; a != network.Some(20) || b != network.Some(7) {
		t.Errorf("%v and %v", a, b)
	}
	if n.Areas[0].Time.OK {
		t.Error("the network that was given has changed")
	}
}

func TestAFaultOfALegHasItsLine(t *testing.T) {
	paths := []times.Path{{Legs: []hydrology.Leg{{Kind: hydrology.GivenVelocity, Length: 600, Velocity: 1}, {Kind: hydrology.Kirpich}}, Lines: []int32{2, 9}}}
	_, faults := times.Walk(paths, func(network.AreaIndex) bool { return false }, hydrology.Settings{})
	if len(faults) != 2 || faults[0].Line != 9 { // length and slope
		t.Errorf("%v", faults)
	}
}

// BenchmarkWalk reports the cost of a path of three legs with sheet flow, which settles in some fifteen rounds.
func BenchmarkWalk(b *testing.B) {
	path := times.Path{Lines: []int32{2, 3, 4}, Legs: []hydrology.Leg{
		{Kind: hydrology.SheetKinematic, Length: 100, Slope: 0.02, N: 0.15},
		{Kind: hydrology.Shallow, Length: 400, Slope: 0.02, Cover: "unpaved"},
		{Kind: hydrology.Gutter, Length: 250, Slope: 0.01, N: 0.016, CrossSlope: 0.02, Spread: 5},
	}}
	settings := hydrology.Settings{Storm: rain(b), Minimum: 5}
	paths := []times.Path{path}
	for b.Loop() {
		if _, faults := times.Walk(paths, func(network.AreaIndex) bool { return false }, settings); len(faults) > 0 {
			b.Fatal(faults)
		}
	}
}
