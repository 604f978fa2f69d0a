package pipeflow_test

import (
	"math"
	"testing"

	"rimfall/pipeflow"
)

// FuzzDepths gives every closed shape any numbers. Whatever a constructor lets through must have depths inside that are
// numbers, and a normal depth that carries the flow.
func FuzzDepths(f *testing.F) {
	f.Add(uint8(0), 1.5, 1.0, 0.1, 0.004, 1.0)
	f.Add(uint8(1), 8.0, 6.0, 0.5, 0.1, 900.0)
	f.Add(uint8(2), 36.0, 22.0, 6.0, 1e-5, 1e-9)
	f.Add(uint8(3), 60.0, 38.0, 14.0, -1.0, 1e300)
	f.Add(uint8(4), 1e-3, 1e-2, 0.0, 1e-300, 1e-300)
	f.Fuzz(func(t *testing.T, shape uint8, span, rise, third, slope, flow float64) {
		s, err := anyPipe(shape, span, rise, third)
		if err != nil || !(span < 1e6) || !(span > 1e-6) {
			return // lengths beyond any pipe leave the range of floating-point areas
		}
		m := pipeflow.Manning{Factor: 1.486, N: 0.013, Slope: slope}
		depth, ok := m.NormalDepth(s, flow)
		if ok && !(depth >= 0 && depth <= s.Rise()) {
			t.Fatalf("normal depth %v outside 0..%v", depth, s.Rise())
		}
		if back := m.Flow(s, depth); ok && math.Abs(back-flow) > 1e-11*flow+1e-200 {
			t.Fatalf("normal depth %v of %v carries %v", depth, flow, back)
		}
		if ok == (m.WhyNoNormalDepth(s, flow) != nil) {
			t.Fatalf("an answer is %v, but the reason against it is %v", ok, m.WhyNoNormalDepth(s, flow))
		}
		for name, of := range map[string]func(pipeflow.Section, float64, float64, float64) (float64, bool){
			"conjugate": pipeflow.ConjugateDepth, "alternate": pipeflow.AlternateDepth, "energy": pipeflow.SpecificEnergy,
		} {
			if value, ok := of(s, 9.80665, depth, flow); ok && !(value >= 0) {
				t.Fatalf("%s of depth %v and flow %v is %v", name, depth, flow, value)
			}
		}
		critical, ok := pipeflow.CriticalDepth(s, 9.80665, flow)
		if ok && !(critical >= 0 && critical <= s.Rise()) {
			t.Fatalf("critical depth %v outside 0..%v", critical, s.Rise())
		}
	})
}

func anyPipe(shape uint8, span, rise, third float64) (pipeflow.Section, error) {
	switch shape % 6 {
	case 1:
		return pipeflow.NewHaunchedBox(span, rise, third)
	case 2:
		return pipeflow.NewArch(span, rise, 1.4*span, 0, third)
	case 3:
		s, _, err := pipeflow.NewOval(span, rise, third, third)
		return s, err
	case 4:
		return pipeflow.NewEllipse(span, rise)
	case 5:
		return pipeflow.NewBox(span, rise)
	}
	return pipeflow.NewCircle(span)
}

// FuzzGround gives a ground line any bytes for heights and widths. Whatever line is let through must hold more water the
// deeper it is, and have depths inside.
func FuzzGround(f *testing.F) {
	f.Add([]byte{9, 1, 5, 2, 0, 3, 4, 1, 8}, 1.0)
	f.Add([]byte{9, 0, 0, 9, 0, 0, 9}, 100.0)
	f.Add([]byte{5, 1, 0, 1, 5, 1, 0, 1, 5}, 1e-6)
	f.Fuzz(func(t *testing.T, steps []byte, flow float64) {
		var points []pipeflow.Point
		station := 0.0
		for i := 0; i+1 < len(steps) && i < 60; i += 2 {
			points = append(points, pipeflow.Point{Station: station, Elevation: float64(steps[i]) / 16, N: 0.03})
			station += float64(steps[i+1]) / 16
		}
		g, err := pipeflow.NewGround(points)
		if err != nil {
			return
		}
		before := g.At(0)
		for i := 1; i <= 50; i++ {
			y := g.Rise() * float64(i) / 50
			now := g.At(y)
			if !(now.Area >= before.Area) || !(now.Perimeter >= before.Perimeter) || !(g.Moment(y) <= now.Area*y*(1+1e-12)) {
				t.Fatalf("depth %v: %+v after %+v", y, now, before)
			}
			before = now
		}
		m := pipeflow.Manning{Factor: 1, N: 0.03, Slope: 0.01}
		depth, ok := m.NormalDepth(g, flow)
		if ok && !(depth >= 0 && depth <= g.Rise()) {
			t.Fatalf("normal depth %v outside 0..%v", depth, g.Rise())
		}
		if critical, ok := pipeflow.CriticalDepth(g, 9.8, flow); ok && !(critical >= 0 && critical <= g.Rise()) {
			t.Fatalf("critical depth %v outside 0..%v", critical, g.Rise())
		}
		m.Composite(g, pipeflow.LotterN).NormalDepths(g, flow)
	})
}
