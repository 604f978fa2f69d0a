package pipeflow

import (
	"fmt"
	"math"
	"testing"
)

var sink float64

func BenchmarkCircle(b *testing.B) {
	pipe, _ := NewCircle(1.5)
	var s Section = pipe
	m := Manning{Factor: 1, N: 0.013, Slope: 0.004}
	var depths, flows [64]float64
	for i := range depths {
		depths[i] = s.Rise() * (float64(i) + 0.5) / 64 * 0.82
		flows[i] = m.Flow(s, depths[i])
	}
	b.Run("flow at a depth", func(b *testing.B) {
		for i := 0; b.Loop(); i++ {
			sink = m.Flow(s, depths[i&63])
		}
	})
	b.Run("full-bore capacity", func(b *testing.B) {
		for b.Loop() {
			sink = m.FullFlow(s)
		}
	})
	b.Run("normal depth", func(b *testing.B) {
		for i := 0; b.Loop(); i++ {
			sink, _ = m.NormalDepth(s, flows[i&63])
		}
	})
	b.Run("critical depth", func(b *testing.B) {
		for i := 0; b.Loop(); i++ {
			sink, _ = CriticalDepth(s, 9.80665, flows[i&63])
		}
	})
}

func BenchmarkOthers(b *testing.B) {
	arch, _ := NewArch(36, 22, 51, 0, 6)
	ell, _ := NewEllipse(60, 38)
	box, _ := NewBox(8, 6)
	hb, _ := NewHaunchedBox(8, 6, 0.5)
	for name, s := range map[string]Section{"arch": arch, "ellipse": ell, "box": box, "haunched": hb} {
		m := Manning{Factor: 1, N: 0.013, Slope: 0.004}
		var depths, flows [64]float64
		for i := range depths {
			depths[i] = s.Rise() * (float64(i) + 0.5) / 64 * 0.82
			flows[i] = m.Flow(s, depths[i])
		}
		b.Run(name+"/flow at a depth", func(b *testing.B) {
			for i := 0; b.Loop(); i++ {
				sink = m.Flow(s, depths[i&63])
			}
		})
		b.Run(name+"/normal depth", func(b *testing.B) {
			for i := 0; b.Loop(); i++ {
				sink, _ = m.NormalDepth(s, flows[i&63])
			}
		})
		b.Run(name+"/critical depth", func(b *testing.B) {
			for i := 0; b.Loop(); i++ {
				sink, _ = CriticalDepth(s, 9.80665, flows[i&63])
			}
		})
	}
}

func TestFits(t *testing.T) {
	c := Circle{1}
	worstN, worstC := 0.0, 0.0
	for i := 0; i < 200000; i++ {
		y := math.Pow(10, -8*float64(i)/200000) * 0.938
		n, ok := c.normalDepth(sectionFactor(c.At(y)))
		if !ok {
			t.Fatal("normal", y)
		}
		worstN = max(worstN, math.Abs(n/y-1))
		k, ok := c.criticalDepth(criticalFactor(c.At(y)))
		if !ok {
			t.Fatal("crit", y)
		}
		worstC = max(worstC, math.Abs(k/y-1))
	}
	fmt.Println(worstN, worstC)
}
