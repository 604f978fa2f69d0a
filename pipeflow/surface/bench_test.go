package surface

import (
	"testing"
	"time"

	"rimfall/pipeflow"
)

// BenchmarkProfile measures one profile against one normal depth of the same pipe.
func BenchmarkProfile(b *testing.B) {
	circle, _ := pipeflow.NewCircle(3)
	box, _ := pipeflow.NewBox(6, 3)
	mild := pipeflow.Manning{Factor: 1.486, N: 0.013, Slope: 0.002}
	steep, level := mild, mild
	steep.Slope, level.Slope = 0.02, 0
	cases := []struct {
		name    string
		section pipeflow.Section
		manning pipeflow.Manning
		length  float64
		flow    float64
		level   float64
	}{
		{"circle/M1", circle, mild, 300, 20, 2.8},
		{"circle/M2", circle, mild, 300, 20, 0},
		{"circle/M2-long", circle, mild, 10000, 20, 0},
		{"circle/M2-midway", circle, mild, 300, 20, 2.2},
		{"circle/partly-full", circle, mild, 1000, 20, 4},
		{"circle/full", circle, mild, 300, 60, 4},
		{"circle/H2", circle, level, 300, 20, 0},
		{"circle/S2", circle, steep, 300, 40, 0},
		{"circle/jump", circle, steep, 300, 40, 4},
		{"box/M2", box, mild, 300, 40, 0},
		{"box/jump", box, steep, 300, 80, 4},
	}
	for _, c := range cases {
		pipe := Pipe{Section: c.section, Manning: c.manning, Gravity: 32.174, Length: c.length}
		b.Run(c.name, func(b *testing.B) {
			b.ReportAllocs()
			measureProfile(b, pipe, c.flow, Control{Level: c.level})
		})
	}
}

// measureProfile solves profiles, and in turn with them as many normal depths of a circle, so that both meet the same
// load of the machine; it reports their ratio.
func measureProfile(b *testing.B, pipe Pipe, flow float64, c Control) {
	const batch = 100
	round, _ := pipeflow.NewCircle(3)
	var circle pipeflow.Section = round
	uniform := pipeflow.Manning{Factor: 1.486, N: 0.013, Slope: 0.002}
	var p Profile
	var surfaces, depths time.Duration
	for i := 0; b.Loop(); i++ {
		if i%batch != 0 {
			continue
		}
		start := time.Now()
		for range batch {
			if err := p.Solve(pipe, flow, c); err != nil {
				b.Fatal(err)
			}
		}
		middle := time.Now()
		for range batch {
			uniform.NormalDepth(circle, 20)
		}
		surfaces += middle.Sub(start)
		depths += time.Since(middle)
	}
	b.ReportMetric(float64(surfaces)/float64(depths), "normal-depths")
	b.ReportMetric(float64(surfaces)/float64(batch*((b.N+batch-1)/batch)), "ns/profile")
}
