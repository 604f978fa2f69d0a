package pipeflow

import (
	"math"
	"testing"
)

func TestDepthsComeBack(t *testing.T) {
	circle, _ := NewCircle(1.5)
	box, _ := NewBox(2, 1.5)
	m := Manning{Factor: 1, N: 0.013, Slope: 0.004}
	for name, s := range map[string]Section{"circle": circle, "box": box} {
		for _, ratio := range []float64{1e-8, 1e-5, 0.01, 0.049, 0.05, 0.3, 0.5, 0.8, 0.9, 0.93} {
			y := ratio * s.Rise()
			if got, ok := m.NormalDepth(s, m.Flow(s, y)); !ok || math.Abs(got-y) > 1e-12*y {
				t.Errorf("%s: normal depth at %v of the rise: got %v, want %v", name, ratio, got, y)
			}
			wet := s.At(y)
			flow := math.Sqrt(9.80665 * wet.Area * wet.Area * wet.Area / wet.TopWidth)
			if got, ok := CriticalDepth(s, 9.80665, flow); !ok || math.Abs(got-y) > 1e-12*y {
				t.Errorf("%s: critical depth at %v of the rise: got %v, want %v", name, ratio, got, y)
			}
		}
	}
}
