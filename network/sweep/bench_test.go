package sweep_test

import (
	"fmt"
	"runtime"
	"testing"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/networktest"
	"rimfall/network/sweep"
	"rimfall/network/units"
)

// longRain is an invented table whose last duration no chain reaches.
func longRain(tb testing.TB) hydrology.Curve {
	tb.Helper()
	durations := []float64{5, 10, 15, 30, 60, 120, 360, 1440, 1e5, 1e7, 1e9}
	values := [][]float64{{6}, {5}, {4}, {3}, {2}, {1.2}, {0.6}, {0.2}, {0.01}, {0.001}, {0.0001}}
	table, err := hydrology.NewTable(durations, []float64{10}, values)
	if err != nil {
		tb.Fatal(err)
	}
	curve, _ := table.Curve(10)
	return curve
}

func usStorm() network.Storm {
	return network.Storm{ReturnPeriod: 10, MinimumTime: 5, Uplift: 1, RationalFactor: units.US.RationalFactor, ManningFactor: units.US.ManningFactor}
}

// BenchmarkSweep reports the cost of one pass down, by shape and number of pipes.
func BenchmarkSweep(b *testing.B) {
	rain, storm := longRain(b), usStorm()
	for _, shape := range networktest.Shapes {
		for _, pipes := range []int{1e3, 1e4, 1e5, 1e6} {
			b.Run(fmt.Sprintf("%s/%.0e", shape, float64(pipes)), func(b *testing.B) {
				n := networktest.New(shape, pipes)
				var before, after runtime.MemStats
				runtime.GC()
				runtime.ReadMemStats(&before)
				for b.Loop() {
					if _, problems := sweep.Down(n, &storm, rain, nil); len(problems) > 0 {
						b.Fatal(problems[0].Text)
					}
				}
				runtime.ReadMemStats(&after)
				b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(pipes), "ns/pipe")
				b.ReportMetric(float64(after.TotalAlloc-before.TotalAlloc)/float64(b.N)/float64(pipes), "B/pipe")
			})
		}
	}
}

// A chain of three million pipes runs in constant stack.
func TestAChainOfThreeMillionPipesRuns(t *testing.T) {
	if testing.Short() {
		t.Skip("takes seconds and 3 GB")
	}
	rain, storm := longRain(t), usStorm()
	const pipes = 3_000_000
	n := networktest.New(networktest.Chain, pipes)
	flows, problems := sweep.Down(n, &storm, rain, nil)
	if len(problems) > 0 {
		t.Fatal(problems[0].Text)
	}
	if got, want := flows.Pipes[0].Area, 0.02*pipes; got < want*(1-1e-9) || got > want*(1+1e-9) {
		t.Errorf("area at the lower end is %v, want %v", got, want)
	}
}
