package sweep_test

import (
	"fmt"
	"math"
	"testing"

	"pgregory.net/rapid"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/sweep"
	"rimfall/pipeflow"
)

func circle(diameter float64) pipeflow.Section {
	c, err := pipeflow.NewCircle(diameter)
	if err != nil {
		panic(err) // a diameter of these tests
	}
	return c
}

// storm is a 10-year storm in US units with the constants of practice.
func storm() network.Storm {
	return network.Storm{ReturnPeriod: 10, MinimumTime: 5, Uplift: 1, RationalFactor: 1, ManningFactor: 1.486}
}

// rain is a rainfall curve through pairs of minutes and in/h.
func rain(durations, intensities []float64) hydrology.Curve {
	values := make([][]float64, len(intensities))
	for k, i := range intensities {
		values[k] = []float64{i}
	}
	table, err := hydrology.NewTable(durations, []float64{10}, values)
	if err != nil {
		panic(err) // pairs of these tests
	}
	curve, _ := table.Curve(10)
	return curve
}

// endlessRain reaches far beyond any time of a drawn network.
var endlessRain = rain([]float64{5, 10, 30, 60, 1440, 1e12}, []float64{6, 4.5, 2.5, 1.6, 0.2, 0.2})

// anyNetwork is a network in which every pipe leads to a later structure: with
// branches that meet, splits that meet again, barrels, areas and steady inflows.
func anyNetwork(t *rapid.T) *network.Network {
	number := func(low, high float64, name string) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
	count := rapid.IntRange(2, 12).Draw(t, "structures")
	n := &network.Network{Structures: make([]network.Structure, count)}
	for i := range count {
		s := &n.Structures[i]
		s.ID = fmt.Sprintf("S%d", i)
		if rapid.IntRange(0, 3).Draw(t, "one in four has an inflow") == 0 {
			s.Inflow = number(0.01, 5, "inflow")
		}
		if i == count-1 {
			s.Kind = network.Outfall
			break
		}
		ways := rapid.IntRange(1, 2).Draw(t, "pipes out")
		for k := range ways {
			to := rapid.IntRange(i+1, count-1).Draw(t, "to")
			p := network.Pipe{ID: fmt.Sprintf("P%d.%d", i, k), From: network.StructureIndex(i), To: network.StructureIndex(to)}
			p.Length, p.N = number(5, 500, "length"), number(0.01, 0.025, "n")
			p.Section, p.Count = circle(number(1, 6, "diameter")), int32(rapid.IntRange(1, 3).Draw(t, "barrels"))
			p.Slope = network.Some(number(0.0001, 0.05, "slope"))
			if rapid.IntRange(0, 9).Draw(t, "one in ten does not fall") == 0 {
				p.Slope.V = number(-0.001, 0, "adverse slope")
			}
			n.Pipes = append(n.Pipes, p)
		}
		if ways == 2 {
			share := number(0.01, 0.99, "share")
			last := len(n.Pipes) - 1
			n.Pipes[last-1].Share, n.Pipes[last].Share = network.Some(share), network.Some(1-share)
		}
	}
	for range rapid.IntRange(0, 2*count).Draw(t, "areas") {
		c := 0.0 // one in five sheds nothing
		if rapid.IntRange(0, 4).Draw(t, "c is over 0") > 0 {
			c = number(0.05, 1, "c")
		}
		time := 0.0 // one in five runs off at once
		if rapid.IntRange(0, 4).Draw(t, "there is an inlet time") > 0 {
			time = number(1, 60, "inlet time")
		}
		n.Areas = append(n.Areas, network.Area{
			Structure: network.StructureIndex(rapid.IntRange(0, count-1).Draw(t, "at")),
			Area:      number(0.01, 20, "area"), C: c, Time: network.Some(time),
		})
	}
	n.Connect()
	return n
}

func drawStorm(t *rapid.T) network.Storm {
	s := storm()
	s.Peak = rapid.SampledFrom([]network.Peak{network.LongestTime, network.PartialArea}).Draw(t, "peak")
	s.Travel = rapid.SampledFrom([]network.TravelVelocity{network.TravelPartFull, network.TravelFlowOverFullArea, network.TravelFullBore}).Draw(t, "travel velocity")
	s.HoldUpstreamPeak = rapid.Bool().Draw(t, "hold upstream peak")
	return s
}

// down sweeps, and lets no time be beyond the rainfall.
func down(t rapid.TB, n *network.Network, s network.Storm, r hydrology.Intensity) sweep.Flows {
	t.Helper()
	flows, problems := sweep.Down(n, &s, r, nil)
	if len(problems) > 0 {
		t.Fatalf("problems %+v", problems)
	}
	return flows
}

// near tells whether two numbers agree to a relative tolerance.
func near(got, want, tolerance float64) bool {
	return math.Abs(got-want) <= tolerance*max(math.Abs(got), math.Abs(want))
}

func figure(t testing.TB, what string, got, want, tolerance float64) {
	t.Helper()
	if !near(got, want, tolerance) {
		t.Errorf("%s is %.10g, want %.10g", what, got, want)
	}
}
