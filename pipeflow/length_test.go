package pipeflow_test

import (
	"math"
	"testing"

	"rimfall/pipeflow"
)

// Both ends of the range may be open. A wide rectangle of depth 1 carries Q/b =
// (k/n) √S to each unit of width but for its two walls, so the width is found from
// the flow of a known one.
func TestALengthIsFoundBetweenNothingAndInfinity(t *testing.T) {
	m := pipeflow.Manning{Factor: 1, N: 0.02, Slope: 0.001}
	of := func(width float64) (pipeflow.Section, float64, error) {
		s, err := pipeflow.NewRectangle(width)
		return s, 1, err
	}
	known, _, err := of(7)
	if err != nil {
		t.Fatal(err)
	}
	width, ok := m.LengthFor(m.Flow(known, 1), 0, math.Inf(1), of)
	if !ok || math.Abs(width-7) > 1e-9 {
		t.Errorf("width %v, %v; want 7", width, ok)
	}
}
