package sweep_test

import (
	"math"
	"strings"
	"testing"

	"rimfall/network"
	"rimfall/network/sweep"
)

// A 12 in pipe of n 0.013 on 1 %: full-bore capacity
// 1.486/0.013 · 0.785398 ft² · (0.25 ft)^(2/3) · √0.01 = 3.562805 cfs, velocity 4.536305 ft/s.
const (
	capacity12 = 3.562805
	velocity12 = 4.536305
)

// chain is a line of structures A, B, C … in 12 in pipes of 300 ft on 1 %.
func chain(pipes int) *network.Network {
	n := &network.Network{}
	for i := range pipes {
		n.Structures = append(n.Structures, network.Structure{ID: string(rune('A' + i))})
		n.Pipes = append(n.Pipes, network.Pipe{
			ID: string(rune('a' + i)), From: network.StructureIndex(i), To: network.StructureIndex(i + 1),
			Length: 300, Section: circle(1), Count: 1, N: 0.013, Slope: network.Some(0.01),
		})
	}
	n.Structures = append(n.Structures, network.Structure{ID: "O", Kind: network.Outfall})
	return n
}

// area drains to structure at with an inlet time.
func area(at network.StructureIndex, acres, c, minutes float64) network.Area {
	return network.Area{Structure: at, Area: acres, C: c, Time: network.Some(minutes)}
}

// steps is a rainfall with round numbers at 5, 10, 20 and 40 min.
var steps = rain([]float64{5, 10, 20, 40}, []float64{6, 4, 3, 2})

func TestTravelTimeIsByTheVelocityThatTheJobNames(t *testing.T) {
	for _, c := range []struct {
		name   string
		travel network.TravelVelocity
		flow   float64
		want   float64 // min
	}{
		// Half full carries half of the capacity at the velocity of the full pipe: 300/4.536305/60.
		{"at design depth, half full", network.TravelPartFull, capacity12 / 2, 1.102219},
		{"of the flow over the full area, half full", network.TravelFlowOverFullArea, capacity12 / 2, 2.204438},
		{"full-bore, whatever the flow", network.TravelFullBore, capacity12 / 2, 1.102219},
		// Twice the capacity in the full area runs twice as fast.
		{"at design depth, over capacity", network.TravelPartFull, capacity12 * 2, 0.551110},
		{"of the flow over the full area, over capacity", network.TravelFlowOverFullArea, capacity12 * 2, 0.551110},
		{"full-bore, over capacity", network.TravelFullBore, capacity12 * 2, 1.102219},
		{"none where nothing flows", network.TravelPartFull, 0, 0},
	} {
		t.Run(c.name, func(t *testing.T) {
			n, s := chain(1), storm()
			n.Structures[0].Inflow, s.Travel = c.flow, c.travel
			n.Connect()
			figure(t, "travel time", down(t, n, s, steps).Pipes[0].TravelTime, c.want, 2e-6) // the digits of capacity12
		})
	}
}

func TestHowAPipeRuns(t *testing.T) {
	for _, c := range []struct {
		name     string
		flow     float64
		slope    float64
		count    int32
		state    sweep.State
		depth    float64 // ft
		velocity float64 // ft/s
		capacity float64 // cfs; 0: none
	}{
		{"dry", 0, 0.01, 1, sweep.Dry, 0, 0, capacity12},
		{"half full at half its capacity", capacity12 / 2, 0.01, 1, sweep.PartFull, 0.5, velocity12, capacity12},
		// At 0.82 of the diameter, where a circle first carries its full-bore capacity (HDS-5 and any table of part-full
		// circles: Q/Qfull 1.00 at 0.82), the velocity is 1.14 of full.
		{"just at capacity", capacity12 * (1 - 1e-6), 0.01, 1, sweep.PartFull, 0.8196, 1.140 * velocity12, capacity12},
		{"over capacity: the rise, and the velocity in the full area", 2 * capacity12, 0.01, 1, sweep.Full, 1, 2 * velocity12, capacity12},
		{"two barrels share the flow", capacity12, 0.01, 2, sweep.PartFull, 0.5, velocity12, 2 * capacity12},
		{"level: the full area and no capacity", math.Pi / 4, 0, 1, sweep.Full, 1, 1, 0},
		{"rising: the full area and no capacity", math.Pi / 2, -0.01, 1, sweep.Full, 1, 2, 0},
	} {
		t.Run(c.name, func(t *testing.T) {
			n := chain(1)
			n.Structures[0].Inflow = c.flow
			n.Pipes[0].Slope, n.Pipes[0].Count = network.Some(c.slope), c.count
			n.Connect()
			q := down(t, n, storm(), steps).Pipes[0]
			if q.State != c.state || q.HasCapacity != (c.capacity > 0) {
				t.Errorf("state %d, has capacity: %t, want %d", q.State, q.HasCapacity, c.state)
			}
			// 2e-4: four digits of the depth ratio just at capacity.
			figure(t, "depth", q.Depth, c.depth, 2e-4)
			figure(t, "velocity", q.Velocity, c.velocity, 2e-4)
			figure(t, "capacity", q.Capacity, c.capacity, 1e-6)
		})
	}
}

func TestTimesAndFlows(t *testing.T) {
	type pipe struct{ time, ca, flow float64 }
	for _, c := range []struct {
		name  string
		areas []network.Area
		set   func(n *network.Network, s *network.Storm)
		want  []pipe // of a, b
	}{
		{
			"the longest inlet time of a structure governs",
			[]network.Area{area(0, 1, 0.5, 10), area(0, 1, 0.3, 20)},
			nil,
			[]pipe{{20, 0.8, 2.4}}, // 0.8 · 3
		},
		{
			"an area that sheds nothing sets no time",
			[]network.Area{area(0, 1, 0.5, 10), area(0, 9, 0, 40)},
			nil,
			[]pipe{{10, 0.5, 2}}, // 0.5 · 4
		},
		{
			"the minimum time is a floor",
			[]network.Area{area(0, 1, 0.5, 2)},
			nil,
			[]pipe{{5, 0.5, 3}}, // 0.5 · 6
		},
		{
			"an area without a time has the minimum",
			[]network.Area{{Structure: 0, Area: 1, C: 0.5}},
			nil,
			[]pipe{{5, 0.5, 3}},
		},
		{
			"an inlet further down with a longer time governs there",
			[]network.Area{area(0, 1, 0.25, 5), area(1, 1, 0.25, 20)},
			nil,
			[]pipe{{5, 0.25, 1.5}, {20, 0.5, 1.5}}, // 0.25 · 6; 0.5 · 3
		},
		{
			// Half full by 1.78140 cfs in all, of which the rain brings 0.1 · 4; 10 + 1.102219 min. Log–log between 10 and
			// 20 min: i = 4 · (11.102219/10)^(ln 0.75/ln 2) = 3.830127; 0.2 · 3.830127 + 1.381403 = 2.147428.
			"the arrival from above governs",
			[]network.Area{area(0, 1, 0.1, 10), area(1, 1, 0.1, 5)},
			func(n *network.Network, s *network.Storm) { n.Structures[0].Inflow = capacity12/2 - 0.4 },
			[]pipe{{10, 0.1, capacity12 / 2}, {11.102219, 0.2, 2.147428}},
		},
		{
			"a steady inflow alone has the minimum time and hands no time on",
			[]network.Area{area(1, 1, 0.5, 10)},
			func(n *network.Network, s *network.Storm) { n.Structures[0].Inflow, n.Pipes[0].Length = 0.001, 1e5 },
			[]pipe{{5, 0, 0.001}, {10, 0.5, 2.001}},
		},
		{
			"the factor of the method counts",
			[]network.Area{area(0, 1, 0.5, 10)},
			func(n *network.Network, s *network.Storm) { s.RationalFactor = 1.00833 },
			[]pipe{{10, 0.5, 2.01666}},
		},
		{
			// Cf = 1.25 from 100 years on (HEC-22 ch. 3, from memory): 0.5 → 0.625, 0.9 → 1 and not 1.125.
			"the frequency factor raises C to 1 at most",
			[]network.Area{area(0, 1, 0.5, 10), area(0, 1, 0.9, 10)},
			func(n *network.Network, s *network.Storm) { s.FrequencyFactor, s.ReturnPeriod = true, 100 },
			[]pipe{{10, 1.625, 6.5}},
		},
	} {
		t.Run(c.name, func(t *testing.T) {
			n, s := chain(2), storm()
			n.Areas = c.areas
			if c.set != nil {
				c.set(n, &s)
			}
			n.Connect()
			flows := down(t, n, s, steps)
			for i, want := range c.want {
				q := flows.Pipes[i]
				figure(t, "time", q.Time, want.time, 2e-6)
				figure(t, "ΣCA", q.CA, want.ca, 1e-12)
				figure(t, "flow", q.Flow, want.flow, 2e-6)
			}
		})
	}
}

// A flow of 0.5 · 6 = 3 cfs from 5 min; one acre more of lawn at B with 20 min of
// inlet time makes 0.55 · 3 = 1.65 cfs there.
func TestAPeakUpstreamIsHeldWhereTheJobAsksForIt(t *testing.T) {
	fall := func(hold bool) sweep.Flows {
		n, s := chain(2), storm()
		n.Areas = []network.Area{area(0, 1, 0.5, 5), area(1, 1, 0.05, 20)}
		s.HoldUpstreamPeak = hold
		n.Connect()
		return down(t, n, s, steps)
	}
	free, held := fall(false).Pipes[1], fall(true).Pipes[1]
	figure(t, "free flow", free.Flow, 1.65, 1e-12)
	figure(t, "held flow", held.Flow, 3, 1e-12)
	if free.Held || !held.Held || held.Time != 20 || held.Intensity != 3 {
		t.Errorf("held: %t and %t; time %v, intensity %v stay those of the pipe's own peak", free.Held, held.Held, held.Time, held.Intensity)
	}
}

func TestASplitSharesAreaFlowAndInflowAlike(t *testing.T) {
	n, s := chain(2), storm()
	n.Areas = []network.Area{area(0, 2, 0.5, 10), area(1, 3, 0.5, 10)}
	n.Structures[0].Inflow = 1
	n.Pipes[1].Share = network.Some(0.25)
	branch := n.Pipes[1]
	branch.ID, branch.Share = "branch", network.Some(0.75)
	n.Pipes = append(n.Pipes, branch)
	n.Connect()
	flows := down(t, n, s, steps)
	at, small, large, out := flows.Structures[1], flows.Pipes[1], flows.Pipes[2], flows.Structures[2]
	figure(t, "ΣCA at the split", at.CA, 2.5, 1e-12)
	for _, c := range []struct {
		what      string
		got, want float64
	}{
		{"a quarter of the area", small.Area, 1.25},
		{"a quarter of ΣCA", small.CA, 0.625},
		{"a quarter of the inflow", small.Inflow, 0.25},
		{"a quarter of the flow", small.Flow, at.Flow / 4},
		{"three quarters of the flow", large.Flow, 0.75 * at.Flow},
		{"ΣCA where they meet again", out.CA, 2.5},
		{"inflow where they meet again", out.Inflow, 1},
		{"area where they meet again", out.Area, 5},
	} {
		figure(t, c.what, c.got, c.want, 1e-12)
	}
	if small.Time != at.Time || large.Time != at.Time {
		t.Errorf("times %v and %v of the branches, %v at the split", small.Time, large.Time, at.Time)
	}
}

// Below a split a held peak is the share of the largest flow that enters.
func TestAHeldPeakIsSharedAtASplit(t *testing.T) {
	n, s := chain(2), storm()
	n.Areas = []network.Area{area(0, 1, 0.5, 5), area(1, 1, 0.05, 20)}
	s.HoldUpstreamPeak = true
	n.Pipes[1].Share = network.Some(0.4)
	branch := n.Pipes[1]
	branch.Share = network.Some(0.6)
	n.Pipes = append(n.Pipes, branch)
	n.Connect()
	flows := down(t, n, s, steps)
	figure(t, "held flow of the smaller branch", flows.Pipes[1].Flow, 0.4*3, 1e-12)
	figure(t, "held flow of the larger branch", flows.Pipes[2].Flow, 0.6*3, 1e-12)
}

func TestTimesOutsideTheRainfall(t *testing.T) {
	n, s := chain(3), storm()
	s.MinimumTime = 3
	n.Areas = []network.Area{area(0, 1, 0.5, 3), area(1, 1, 0.5, 41), area(2, 1, 0.5, 50)}
	n.Structures[0].Line, n.Structures[1].Line, n.Structures[2].Line = 2, 3, 4
	n.Connect()
	flows, problems := sweep.Down(n, &s, steps, nil)
	if q := flows.Pipes[0]; !q.BelowFirst || q.Intensity != 6 {
		t.Errorf("3 min: below the first duration %t, intensity %v, want the first, 6", q.BelowFirst, q.Intensity)
	}
	// 41 min at B is the cause; C below it is not named again.
	if len(problems) != 1 || problems[0].Table != "structures" || problems[0].Line != 3 || problems[0].Field != "id" ||
		!strings.Contains(problems[0].Text, "structure B is 41 min, which is beyond the last duration") {
		t.Errorf("problems %+v", problems)
	}
}
