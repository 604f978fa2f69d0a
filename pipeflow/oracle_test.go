package pipeflow_test

import (
	"math"
	"testing"

	"rimfall/pipeflow"
)

// TestGeometryAgainstQuadrature holds every shape against integrals over its wall in 30 digits (testdata/pipeflow,
// oracle.py). What is left is the rounding of the sums of pieces; the top width near a crown takes up that of the depth.
func TestGeometryAgainstQuadrature(t *testing.T) {
	worst := 0.0
	for _, row := range table(t, "geometry.csv") {
		s := shapeOf(t, row["shape"])
		y, _ := number(t, row, "depth")
		wet := s.At(y)
		for heading, got := range map[string]float64{
			"area": wet.Area, "perimeter": wet.Perimeter, "top_width": wet.TopWidth, "moment": s.Moment(y),
		} {
			want, _ := number(t, row, heading)
			worst = max(worst, math.Abs(got/want-1))
			hold(t, row, heading, got, 2e-14, 0)
		}
	}
	t.Logf("largest relative difference %.2g", worst)
}

// TestDepthsAgainstScipy holds normal, critical, conjugate and alternate depth against roots by scipy's brentq of the
// same integrals (oracle.py). Its tolerance is 1e-15; energy and force are flat near critical depth, so the two derived
// depths keep half the digits there and about 1e-11 elsewhere.
func TestDepthsAgainstScipy(t *testing.T) {
	const g = 9.80665
	m := pipeflow.Manning{Factor: 1, N: 0.013, Slope: 0.004}
	worst := 0.0
	for _, row := range table(t, "depths.csv") {
		s := shapeOf(t, row["shape"])
		flow, _ := number(t, row, "flow")
		normal, _ := m.NormalDepth(s, flow)
		hold(t, row, "normal", normal, 1e-12, 0)
		want, _ := number(t, row, "normal")
		worst = max(worst, math.Abs(normal/want-1))
		critical, ok := pipeflow.CriticalDepth(s, g, flow)
		if want, found := number(t, row, "critical"); found {
			hold(t, row, "critical", critical, 1e-12, 0)
			worst = max(worst, math.Abs(critical/want-1))
		} else if ok {
			t.Errorf("%v: critical depth %v where none is inside", row, critical)
		}
		conjugate, _ := pipeflow.ConjugateDepth(s, g, normal, flow)
		holdOrOver(t, row, "conjugate", conjugate, s.Rise())
		alternate, _ := pipeflow.AlternateDepth(s, g, normal, flow)
		holdOrOver(t, row, "alternate", alternate, s.Rise())
	}
	t.Logf("largest relative difference of normal and critical depth %.2g", worst)
}

// holdOrOver holds a depth against its cell; a blank one stands for a pressure head over the rise.
func holdOrOver(t *testing.T, row map[string]string, heading string, depth, rise float64) {
	t.Helper()
	if row[heading] == "" && depth <= rise {
		t.Errorf("%s of %v: got %v, want more than the rise", heading, row, depth)
	}
	hold(t, row, heading, depth, 1e-10, 0)
}
