package surface

import (
	"fmt"
	"math"
	"testing"

	"rimfall/pipeflow"
)

// The seven-point rule is exact for powers up to 11: ∫ t^k over (-1, 1) is 2/(k+1) for even k and 0 for odd. Of the
// twelfth it is not, so the test can tell.
func TestTheRuleIsExactToTheEleventhDegree(t *testing.T) {
	for k := range 13 {
		sum := 0.0
		for i, node := range nodes {
			value := weights[i] * math.Pow(node, float64(k))
			switch {
			case i == 0:
				sum += value
			case k%2 == 0:
				sum += 2 * value
			}
		}
		want := 0.0
		if k%2 == 0 {
			want = 2 / float64(k+1)
		}
		if exact := math.Abs(sum-want) < 1e-15; exact != (k < 12) {
			t.Errorf("power %d: %.17g, want %.17g", k, sum, want)
		}
	}
}

// A panel laid over values of a polynomial of the fifth degree gives its integral to any place, and the place back.
func TestAPanelGivesBackAPolynomial(t *testing.T) {
	value := func(t float64) float64 { return 3 + t - t*t + 0.5*t*t*t + 0.2*math.Pow(t, 4) - 0.3*math.Pow(t, 5) }
	integral := func(t float64) float64 {
		return 3*t + t*t/2 - t*t*t/3 + math.Pow(t, 4)/8 + 0.04*math.Pow(t, 5) - 0.05*math.Pow(t, 6)
	}
	var m panel
	m.add(0, weights[0]*value(0), 0)
	for i := 1; i < len(nodes); i++ {
		behind, ahead := weights[i]*value(-nodes[i]), weights[i]*value(nodes[i])
		m.add(nodes[i], ahead+behind, ahead-behind)
	}
	m.finish()
	for place := -1.0; place <= 1; place += 0.125 {
		distance, rate := m.along(place)
		compare(t, "distance", distance, integral(place)-integral(-1), 1e-14)
		compare(t, "rate", rate, value(place), 1e-13)
		compare(t, "place", m.find(distance), place, 1e-8)
	}
	compare(t, "length", m.length, integral(1)-integral(-1), 1e-14)
}

func TestTheCubeRootIsThatOfTheLibrary(t *testing.T) {
	for x := 1e-200; x < 1e200; x *= 1.37 {
		if off := math.Abs(cubeRoot(x)/math.Cbrt(x) - 1); off > 2e-14 {
			t.Fatalf("cube root of %g is %g off", x, off)
		}
	}
}

func TestSolvingDoesNotAllocate(t *testing.T) {
	var p Profile
	mild, steep := metric(0.001), metric(0.02)
	allocations := testing.AllocsPerRun(100, func() {
		if p.Solve(mild, 0.5, Control{Level: 1.02}) != nil || p.Solve(steep, 1, Control{Level: 1.5}) != nil {
			t.Fatal("no profile")
		}
	})
	if allocations != 0 {
		t.Errorf("%g allocations", allocations)
	}
}

// At the slope on which a flow runs uniformly at critical depth, found to the last digits, the surface below a pool
// is C1 and keeps normal depth above it; a hair steeper or flatter the depths hardly change.
func TestACriticalSlopeIsTakenAsMild(t *testing.T) {
	pipe := metric(0)
	critical, _ := pipeflow.CriticalDepth(pipe.Section, pipe.Gravity, 1)
	w := newWater(pipe, 1)
	pipe.Manning.Slope = w.friction(pipe.Section.At(critical))
	var p Profile
	for _, c := range []struct {
		name    string
		control Control
		curve   Curve
		above   Curve
	}{
		{"above a fall", Control{}, Uniform, ""},
		{"above a pool", Control{Level: 0.9}, C1, ""},
	} {
		t.Run(c.name, func(t *testing.T) {
			for _, factor := range []float64{1 - 1e-4, 1, 1 + 1e-4} {
				near := pipe
				near.Manning.Slope *= factor
				if err := p.Solve(near, 1, c.control); err != nil {
					t.Fatal(err)
				}
				if factor == 1 && (p.Steep || p.Curve != c.curve) {
					t.Errorf("curve %s, steep %v", p.Curve, p.Steep)
				}
				compare(t, "depth at the upper end", p.Upper, critical, 1e-3)
				holdsTogether(t, &p)
			}
		})
	}
}

// Where a flow is a little over the largest, the surface squeezes past the depth that carries most, over a long way:
// the distance there grows like 1/√excess. It is held against a sum of 20,000 steps.
func TestAFlowALittleOverTheLargestIsFollowed(t *testing.T) {
	pipe := metric(0.001)
	pipe.Length = 1e5
	most := pipe.Manning.Flow(pipe.Section, 0.93818112)
	var p Profile
	for _, excess := range []float64{1e-2, 1e-3, 1e-4} {
		t.Run(fmt.Sprintf("by %g", excess), func(t *testing.T) {
			if err := p.Solve(pipe, most*(1+excess), Control{}); err != nil {
				t.Fatal(err)
			}
			want := pipe.Length - fineSum(&p.sub.water, p.Lower, 1)
			compare(t, "length that runs full", p.FullLength, want, 2e-3*(pipe.Length-want))
		})
	}
}

func TestPointsFollowTheSurface(t *testing.T) {
	var p Profile
	cases := []struct {
		name    string
		slope   float64
		flow    float64
		control Control
		points  int // four parts have five, and each place of its own one, a jump two
	}{
		{"a free surface", 0.001, 0.5, Control{}, 5},
		{"the pressure line comes down on the crown", 0.001, 0.5, Control{Level: 1.02}, 6},
		{"a jump", 0.02, 1, Control{Level: 0.95}, 7},
		{"a jump above a full stretch", 0.02, 1, Control{Level: 1.5}, 8},
		{"no flow", 0.001, 0, Control{Level: 0.2}, 5},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			if err := p.Solve(metric(c.slope), c.flow, c.control); err != nil {
				t.Fatal(err)
			}
			points := p.AppendPoints(nil, 4)
			if len(points) != c.points {
				t.Errorf("%d points, want %d: %v", len(points), c.points, points)
			}
			last := points[len(points)-1]
			if points[0] != (Point{0, p.Lower}) || last.Distance != 100 || math.Abs(last.Depth-p.Upper) > 1e-9 {
				t.Errorf("ends %v and %v", points[0], last)
			}
			for i := 1; i < len(points); i++ {
				if points[i].Distance < points[i-1].Distance {
					t.Errorf("%v after %v", points[i], points[i-1])
				}
			}
		})
	}
}

// Whatever the numbers, a profile is refused or holds no number that is none.
func FuzzSolve(f *testing.F) {
	f.Add(1.0, 0.013, 0.001, 100.0, 0.5, 0.9, 0.0)
	f.Add(1.0, 0.013, 0.02, 100.0, 1.0, 1.5, 0.0)
	f.Add(0.3, 0.009, -0.01, 1e6, 0.5, -5.0, 0.1)
	f.Add(3.0, 0.03, 0.0, 1e-3, 1e-9, 2.999999, 1e-7)
	f.Fuzz(func(t *testing.T, rise, n, slope, length, flow, level, upper float64) {
		if !(rise > 1e-3) || rise > 1e3 || n > 10 || n < 1e-5 || length > 1e9 || length < 1e-6 || math.Abs(slope) > 10 || flow > 1e6 || math.Abs(level) > 1e6 {
			t.Skip("beyond any pipe")
		}
		if flow > 0 && flow < 1e-12*math.Pow(rise, 2.5) || slope != 0 && math.Abs(slope) < 1e-12 {
			t.Skip("nothing to speak of")
		}
		circle, _ := pipeflow.NewCircle(rise)
		box, _ := pipeflow.NewBox(2*rise, rise)
		for _, s := range []pipeflow.Section{circle, box} {
			var p Profile
			pipe := Pipe{s, pipeflow.Manning{Factor: 1, N: n, Slope: slope}, 9.80665, length}
			if p.Solve(pipe, flow, Control{Level: level, Upper: upper}) != nil {
				continue
			}
			for _, v := range []float64{p.Lower, p.Upper, p.FullLength, p.Jump, p.Depth(length / 3)} {
				if math.IsNaN(v) || math.IsInf(v, 0) || v < 0 {
					t.Fatalf("%v: %+v", pipe, p.Result)
				}
			}
		}
	})
}
