package pipeflow

import (
	"math"
	"testing"
	"time"
)

// The benchmark table, in ns/op and in flows, the time of one evaluation of flow at a depth of the same section: for every kind of section one evaluation of flow at a depth, beside normal and critical depth from
// a thousandth of the rise to full-bore capacity; for the circle also what a plain bisection and Newton's method from half
// depth take for the same 1e-12. Every operation takes another depth, so that nothing can be learnt by heart.

// sink keeps results alive.
var sink float64

var benchManning = Manning{Factor: 1, N: 0.013, Slope: 0.004}

func benchSections() map[string]Section {
	circle, _ := NewCircle(1.5)
	box, _ := NewBox(8, 6)
	haunched, _ := NewHaunchedBox(8, 6, 0.5)
	ellipse, _ := NewEllipse(60, 38)
	arch, _ := NewArch(36, 22, 51, 0, 6)
	return map[string]Section{"circle": circle, "box": box, "haunched": haunched, "ellipse": ellipse, "arch": arch}
}

// work is a set of depths with the flows that run uniformly and critically at them.
type work struct{ depths, normal, critical [256]float64 }

func benchWork(s Section) *work {
	var w work
	for i := range w.depths {
		y := s.Rise() * (0.001 + 0.8*float64(i)/float64(len(w.depths)))
		wet := s.At(y)
		w.depths[i] = y
		w.normal[i] = benchManning.Flow(s, y)
		w.critical[i] = wet.Area * math.Sqrt(9.80665*wet.Area/wet.TopWidth)
	}
	return &w
}

func BenchmarkSection(b *testing.B) {
	for name, s := range benchSections() {
		w := benchWork(s)
		m := benchManning
		b.Run(name+"/flow-at-depth", func(b *testing.B) {
			for i := 0; b.Loop(); i++ {
				sink = m.Flow(s, w.depths[i&255])
			}
		})
		b.Run(name+"/full-bore-capacity", func(b *testing.B) {
			for b.Loop() {
				sink = m.FullFlow(s)
			}
		})
		b.Run(name+"/normal-depth", func(b *testing.B) {
			for i := 0; b.Loop(); i++ {
				sink, _ = m.NormalDepth(s, w.normal[i&255])
			}
			inFlows(b, s, w)
		})
		b.Run(name+"/critical-depth", func(b *testing.B) {
			for i := 0; b.Loop(); i++ {
				sink, _ = CriticalDepth(s, 9.80665, w.critical[i&255])
			}
			inFlows(b, s, w)
		})
	}
}

func BenchmarkCircleOtherwise(b *testing.B) {
	s := benchSections()["circle"]
	w := benchWork(s)
	b.Run("bisection", func(b *testing.B) {
		for i := 0; b.Loop(); i++ {
			sink = bisection(benchManning, s, w.normal[i&255])
		}
		inFlows(b, s, w)
	})
	b.Run("newton-from-half-depth", func(b *testing.B) {
		for i := 0; b.Loop(); i++ {
			sink = newtonFromHalf(benchManning, s, w.normal[i&255])
		}
		inFlows(b, s, w)
	})
}

// inFlows reports the time of an operation as a multiple of one evaluation of flow, measured there and then; the best of
// ten rounds, as a machine that does other work only ever makes it longer.
func inFlows(b *testing.B, s Section, w *work) {
	b.StopTimer()
	const rounds = 20_000
	flow := math.Inf(1)
	for range 10 {
		start := time.Now()
		for i := range rounds {
			sink = benchManning.Flow(s, w.depths[i&255])
		}
		flow = min(flow, float64(time.Since(start).Nanoseconds())/rounds)
	}
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/flow, "flows")
}

// bisection is the plain way: halve the depth between nothing and full-bore capacity's until it stands to 1e-12.
func bisection(m Manning, s Section, flow float64) float64 {
	low, high := 0.0, 0.82*s.Rise()
	for high-low > 1e-12*high {
		middle := (low + high) / 2
		if m.Flow(s, middle) < flow {
			low = middle
		} else {
			high = middle
		}
	}
	return high
}

// newtonFromHalf is Newton's method on the flow as it stands, with the exact slope, and the depth kept inside.
func newtonFromHalf(m Manning, s Section, flow float64) float64 {
	y := s.Rise() / 2
	for range 100 {
		at, wet, grows := m.Flow(s, y), s.At(y), growthOf(s).growth(y)
		slope := at * (5*wet.TopWidth/wet.Area - 2*grows.perimeter/wet.Perimeter) / 3
		step := (flow - at) / slope
		next := min(max(y+step, y/10), 0.93*s.Rise())
		if math.Abs(next-y) <= 1e-12*y {
			return next
		}
		y = next
	}
	return y
}

// TestTheOtherWaysAgree: what the benchmark compares with finds the same depths.
func TestTheOtherWaysAgree(t *testing.T) {
	s := benchSections()["circle"]
	w := benchWork(s)
	for i, flow := range w.normal {
		depth, _ := benchManning.NormalDepth(s, flow)
		for name, other := range map[string]float64{
			"bisection": bisection(benchManning, s, flow), "Newton": newtonFromHalf(benchManning, s, flow),
		} {
			if math.Abs(other/depth-1) > 3e-12 {
				t.Errorf("depth %v: %s finds %v", w.depths[i], name, other)
			}
		}
	}
}
