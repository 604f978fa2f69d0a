package grade_test

import (
	"fmt"
	"testing"
	"time"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/networktest"
	"rimfall/network/sweep"
	"rimfall/network/units"
	"rimfall/pipeflow"
)

// BenchmarkUp measures the pass up through networks of 10³ to 10⁶ pipes, with the losses of access holes, part full and
// under pressure. normal-depths is its time for a pipe over that of one normal depth of a circle, measured beside it.
func BenchmarkUp(b *testing.B) {
	for _, shape := range networktest.Shapes {
		for _, size := range []int{1e3, 1e4, 1e5, 1e6} {
			n := networktest.New(shape, size)
			for _, storm := range []struct {
				name   string
				uplift float64
			}{{"part-full", 1}, {"surcharged", 1.5}} {
				flows := benchFlows(b, n, storm.uplift)
				b.Run(fmt.Sprintf("%s/%.0e/%s", shape, float64(size), storm.name), func(b *testing.B) {
					measureUp(b, n, flows)
				})
			}
		}
	}
}

// benchFlows sweeps an invented storm down a network.
func benchFlows(b *testing.B, n *network.Network, uplift float64) *sweep.Flows {
	b.Helper()
	rain, err := hydrology.NewTable([]float64{5, 60, 1e4, 1e8}, []float64{10}, [][]float64{{6}, {2}, {0.01}, {0.001}})
	if err != nil {
		b.Fatal(err)
	}
	curve, _ := rain.Curve(10)
	storm := network.Storm{ReturnPeriod: 10, MinimumTime: 5, RationalFactor: 1, ManningFactor: units.US.ManningFactor}
	flows, problems := sweep.Down(n, &storm, curve.Scaled(uplift), nil)
	if len(problems) > 0 {
		b.Fatal(problems[0].Text)
	}
	return &flows
}

// measureUp draws lines, and in turn solves as many normal depths; of both the quickest round counts, as a machine with other
// work delays now the one, now the other.
func measureUp(b *testing.B, n *network.Network, flows *sweep.Flows) {
	settings := grade.Settings{Gravity: units.US.Gravity, Manning: units.US.ManningFactor}
	round, _ := pipeflow.NewCircle(3)
	var circle pipeflow.Section = round
	uniform := pipeflow.Manning{Factor: units.US.ManningFactor, N: 0.013, Slope: 0.002}
	b.ReportAllocs()
	up, depths := time.Hour, time.Hour
	for b.Loop() {
		start := time.Now()
		grade.Up(n, settings, flows, grade.DesignTailwater)
		middle := time.Now()
		for range n.Pipes {
			uniform.NormalDepth(circle, 20)
		}
		up, depths = min(up, middle.Sub(start)), min(depths, time.Since(middle))
	}
	b.ReportMetric(float64(up)/float64(len(n.Pipes)), "ns/pipe")
	b.ReportMetric(float64(up)/float64(depths), "normal-depths")
}
