package review

import (
	"fmt"
	"testing"

	"rimfall/network/grade"
	"rimfall/network/networktest"
)

// BenchmarkRun is one storm through an invented network of 1000 pipes, flows and grade lines, in a room made before.
func BenchmarkRun(b *testing.B) {
	for _, shape := range networktest.Shapes {
		b.Run(fmt.Sprintf("%s/1000", shape), func(b *testing.B) {
			s := invented(b, shape, 1000)
			rain, err := s.rain(10)
			if err != nil {
				b.Fatal(err)
			}
			r := newRunner(s.Network, s.settings, s.Storm.Peak)
			b.ReportAllocs()
			for b.Loop() {
				flows, problems := r.sweep.Down(&s.Storm, rain)
				if len(problems) > 0 {
					b.Fatal(problems[0].Text)
				}
				r.grade.Up(flows, grade.DesignTailwater)
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/1000, "ns/pipe")
		})
	}
}
