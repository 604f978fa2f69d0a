package units_test

import (
	"math"
	"testing"

	"rimfall/network/units"
)

// The foot is 0.3048 m and standard gravity 9.80665 m/s² by definition; the
// contract of job folders prints g = 32.17405 ft/s².
func TestGravityOfBothSystemsIsTheSame(t *testing.T) {
	if g := units.US.Gravity; math.Abs(g-32.17405) > 5e-6 {
		t.Errorf("g = %v ft/s²", g)
	}
	if got, want := units.US.Gravity*0.3048, units.SI.Gravity; math.Abs(got-want) > 1e-12 {
		t.Errorf("%v m/s² and %v m/s²", got, want)
	}
}

// 1 ft³ is 28.3168 L (NIST Handbook 44, appendix C).
func TestFlowsAreShownInTheUnitAskedFor(t *testing.T) {
	for _, c := range []struct {
		s    units.System
		flow float64
		unit string
		want string
	}{
		{units.US, 10, "cfs", "10.00"},
		{units.US, 10, "m3/s", "0.283"},
		{units.US, 10, "L/s", "283.2"},
		{units.SI, 0.283168, "cfs", "10.00"},
		{units.SI, 0.05, "L/s", "50.0"},
		{units.SI, 0.05, "m3/s", "0.050"},
	} {
		if got := c.s.ShowFlow(c.flow, c.unit); got != c.want {
			t.Errorf("%s %v in %s: got %s, want %s", c.s.Name, c.flow, c.unit, got, c.want)
		}
	}
}
