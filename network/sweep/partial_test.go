package sweep_test

import (
	"fmt"
	"math"
	"sync"
	"testing"

	"pgregory.net/rapid"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/networktest"
	"rimfall/network/sweep"
	"rimfall/pipeflow"
)

// simple is the peak by partial area as its definition says it: every area upstream, one by one,
// with the travel times that the sweep found, looked at over all times.
// It costs the square of a chain's length, and is here to hold the fast one against.
type simple struct {
	n     *network.Network
	flows *sweep.Flows
	storm *network.Storm
}

// reaching lists the areas that reach a structure, a share of each by every way.
func (o simple) reaching(s network.StructureIndex) []hydrology.Contribution {
	var all []hydrology.Contribution
	for _, p := range o.n.PipesIn(s) {
		pipe := &o.n.Pipes[p]
		for _, c := range o.reaching(pipe.From) {
			c.CA *= pipe.Share.Or(1)
			c.TravelTime += o.flows.Pipes[p].TravelTime
			all = append(all, c)
		}
	}
	for _, i := range o.n.AreasAt(s) {
		a := &o.n.Areas[i]
		if a.C > 0 {
			all = append(all, hydrology.Contribution{CA: a.C * a.Area, InletTime: a.Time.Or(o.storm.MinimumTime)})
		}
	}
	return all
}

// hold compares the peaks at every structure.
func hold(t interface{ Fatalf(string, ...any) }, n *network.Network, storm *network.Storm, rain hydrology.Intensity) {
	flows, problems := sweep.Down(n, storm, rain, nil)
	if len(problems) > 0 {
		t.Fatalf("%s", problems[0].Text)
	}
	o := simple{n, &flows, storm}
	for i := range n.Structures {
		areas := o.reaching(network.StructureIndex(i))
		want, _, ok := hydrology.PartialArea(areas, rain, storm.MinimumTime, storm.RationalFactor)
		got := &flows.Structures[i]
		if !ok {
			if got.Rained() {
				t.Fatalf("structure %s: no peak is wanted, got %v", n.Structures[i].ID, got)
			}
			continue
		}
		// 1e-12: the sums are taken in another order; no other difference is allowed.
		if near := func(a, b float64) bool { return math.Abs(a-b) <= 1e-12*math.Abs(b) }; !near(got.Flow-got.Inflow, want.Flow) {
			t.Fatalf("structure %s of %d areas: flow %.16g at %.16g min, the simple one has %.16g at %.16g min",
				n.Structures[i].ID, len(areas), got.Flow, got.Time, want.Flow, want.Time)
		}
		// The time is one at which that much counts; an area that comes in at once does so to within rounding.
		const rounding = 1e-9
		if low, high := countedAt(areas, got.Time-rounding), countedAt(areas, got.Time+rounding); got.CACounted < low*(1-1e-9) || got.CACounted > high*(1+1e-9) {
			t.Fatalf("structure %s: %v to %v counts at %v min, not %v", n.Structures[i].ID, low, high, got.Time, got.CACounted)
		}
	}
}

func countedAt(areas []hydrology.Contribution, t float64) float64 {
	sum := 0.0
	for _, a := range areas {
		if t >= a.TravelTime+a.InletTime {
			sum += a.CA
		} else {
			sum += a.CA * max(0, (t-a.TravelTime)/a.InletTime)
		}
	}
	return sum
}

// drawNetwork draws a system in which pipes meet, and part here and there.
func drawNetwork(t *rapid.T) *network.Network {
	count := rapid.IntRange(2, 40).Draw(t, "structures")
	circle, err := pipeflow.NewCircle(3)
	if err != nil {
		t.Fatal(err)
	}
	n := &network.Network{}
	for i := range count {
		n.Structures = append(n.Structures, network.Structure{ID: fmt.Sprintf("S%d", i), Line: int32(i + 2)})
		if areas := rapid.IntRange(0, 2).Draw(t, "areas"); i > 0 || areas > 0 {
			for range areas {
				n.Areas = append(n.Areas, drawArea(t, i))
			}
		}
	}
	n.Structures[0].Kind = network.Outfall
	for i := 1; i < count; i++ { // structure i drains to ones of a smaller number
		share := network.Maybe{}
		if i > 3 && rapid.IntRange(0, 5).Draw(t, "parts") == 0 {
			share = network.Some(rapid.Float64Range(0.1, 0.9).Draw(t, "share"))
			n.Pipes = append(n.Pipes, drawPipe(t, circle, i, network.Some(1-share.V)))
		}
		n.Pipes = append(n.Pipes, drawPipe(t, circle, i, share))
	}
	n.Connect()
	return n
}

func drawArea(t *rapid.T, at int) network.Area {
	times := rapid.OneOf(rapid.Just(network.Maybe{}), rapid.Just(network.Some(0)), rapid.Map(rapid.Float64Range(0.5, 60), network.Some))
	return network.Area{
		ID: "A", Structure: network.StructureIndex(at), Area: rapid.Float64Range(0.05, 20).Draw(t, "area"),
		C: rapid.SampledFrom([]float64{0, 0.1, 0.5, 1}).Draw(t, "c"), Time: times.Draw(t, "time"),
	}
}

func drawPipe(t *rapid.T, s pipeflow.Section, from int, share network.Maybe) network.Pipe {
	to := rapid.IntRange(max(0, from-3), from-1).Draw(t, "to")
	return network.Pipe{
		ID: fmt.Sprintf("P%d-%d", from, to), From: network.StructureIndex(from), To: network.StructureIndex(to), Share: share,
		Length: rapid.Float64Range(20, 3000).Draw(t, "length"), Section: s, Count: 1, N: 0.013, Slope: network.Some(0.005),
	}
}

func partialStorm() network.Storm {
	storm := usStorm()
	storm.Peak = network.PartialArea
	return storm
}

func TestTheFastPartialAreaGivesThePeaksOfTheSimpleOneOnATable(t *testing.T) {
	rain, storm := longRain(t), partialStorm()
	rapid.Check(t, func(t *rapid.T) { hold(t, drawNetwork(t), &storm, rain) })
}

// An equation has turning points between the moments of arrival. 762/(t + 10) mm/h: Ministry of Health, 1930; here
// in in/h for US units and without its end. The second falls faster than 1/t, so depth falls with duration.
func TestTheFastPartialAreaGivesThePeaksOfTheSimpleOneOnAnEquation(t *testing.T) {
	storm := partialStorm()
	for _, term := range []hydrology.Term{{Numerator: 762 / 25.4, Shift: 10, Exponent: 1}, {Numerator: 300, Shift: 12, Exponent: 1.4}} {
		e := hydrology.Equation{Unit: hydrology.InchesPerHour, Constants: []hydrology.Constants{{Terms: []hydrology.Term{term}}}}
		rain, err := e.Storm(10, hydrology.InchesPerHour)
		if err != nil {
			t.Fatal(err)
		}
		rapid.Check(t, func(t *rapid.T) { hold(t, drawNetwork(t), &storm, hydrology.Uplifted{Storm: rain, Factor: 1.1}) })
	}
}

func TestTheFastPartialAreaGivesThePeaksOfTheSimpleOneInEveryShape(t *testing.T) {
	rain, storm := longRain(t), partialStorm()
	for _, shape := range networktest.Shapes {
		hold(t, networktest.New(shape, 400), &storm, rain)
	}
}

// Each pair of ways doubles the ways: thirty pairs are a thousand million.
func TestWaysThatMultiplyAreRefusedAndNotFollowed(t *testing.T) {
	circle, err := pipeflow.NewCircle(3)
	if err != nil {
		t.Fatal(err)
	}
	n := &network.Network{Structures: []network.Structure{{ID: "S0"}}}
	n.Areas = []network.Area{{ID: "A", Area: 1, C: 1, Time: network.Some(7)}}
	for i := range 30 {
		n.Structures = append(n.Structures, network.Structure{ID: fmt.Sprintf("S%d", i+1)})
		for k := range 2 {
			n.Pipes = append(n.Pipes, network.Pipe{
				ID: fmt.Sprintf("P%d-%d", i, k), From: network.StructureIndex(i), To: network.StructureIndex(i + 1), Share: network.Some(0.5),
				Length: 100 + 17*float64(k) + float64(i), Section: circle, Count: 1, N: 0.013, Slope: network.Some(0.005),
			})
		}
	}
	n.Structures[30].Kind = network.Outfall
	n.Connect()
	storm := partialStorm()
	_, problems := sweep.Down(n, &storm, longRain(t), nil)
	if len(problems) == 0 {
		t.Fatal("a thousand million ways were followed")
	}
}

// HDS-2 (FHWA-NHI-02-001, 2nd ed. 2002), eq. 5.31: two areas, the near one with the shorter time t2. When rain lasts
// t2, the share t2/t1 of the far area counts: Q' = (C1·A1·t2/t1 + C2·A2)·i2; the larger of Q' and the full flow is kept.
func TestThePeakOfTwoAreasIsThePublishedRule(t *testing.T) {
	n := &network.Network{
		Structures: []network.Structure{{ID: "S"}},
		Areas: []network.Area{
			{ID: "far", Area: 10, C: 0.2, Time: network.Some(60)},
			{ID: "near", Area: 5, C: 0.9, Time: network.Some(10)},
		},
	}
	n.Connect()
	storm, rain := partialStorm(), longRain(t) // 5 in/h at 10 min, 2 at 60
	flows, _ := sweep.Down(n, &storm, rain, nil)
	want := (0.2*10*10/60.0 + 0.9*5) * 5 // 24.17 cfs against (2 + 4.5)·2 = 13
	if got := flows.Structures[0]; math.Abs(got.Flow-want) > 1e-12*want || got.Time != 10 || !got.Part {
		t.Errorf("%v cfs at %v min, part %v; want %v at 10 min", got.Flow, got.Time, got.Part, want)
	}
}

// BenchmarkPartialSweep is BenchmarkSweep with peaks by partial area.
func BenchmarkPartialSweep(b *testing.B) {
	rain := longRain(b)
	for _, shape := range networktest.Shapes {
		for _, pipes := range []int{1e3, 1e4, 1e5, 1e6} {
			made := sync.OnceValue(func() *network.Network { return networktest.New(shape, pipes) })
			for k, storm := range []network.Storm{usStorm(), partialStorm()} {
				b.Run(fmt.Sprintf("%s/%.0e/%s", shape, float64(pipes), network.Peaks[k]), func(b *testing.B) {
					n := made()
					for b.Loop() {
						if _, problems := sweep.Down(n, &storm, rain, nil); len(problems) > 0 {
							b.Fatal(problems[0].Text)
						}
					}
					b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(pipes), "ns/pipe")
				})
			}
		}
	}
}
