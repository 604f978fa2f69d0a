package surface

import (
	"errors"
	"fmt"
	"math"
	"testing"

	"rimfall/pipeflow"
)

// A 10 ft sewer, slope 0.0005, n 0.012, 400 cfs, free outfall, k = 1.486, g = 32.2: a direct-step solution of 20,000
// steps (recomputed for this project) has the depths 6, 7 and 8 ft at 497.8, 2,523 and 14,059 ft from the outfall;
// critical depth 4.748 ft, normal depth 8.18 ft.
func ExampleProfile_Solve() {
	circle, _ := pipeflow.NewCircle(10)
	sewer := Pipe{
		Section: circle,
		Manning: pipeflow.Manning{Factor: 1.486, N: 0.012, Slope: 0.0005},
		Gravity: 32.2,
		Length:  20000,
	}
	var p Profile
	if err := p.Solve(sewer, 400, Control{}); err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%s, %s\n", p.Regime, p.Curve)
	fmt.Printf("at the outfall %.3f ft, normal depth %.2f ft\n", p.Lower, p.Depths.Normal)
	for _, distance := range []float64{497.8, 2523, 14059} {
		fmt.Printf("%.1f ft upstream %.3f ft\n", distance, p.Depth(distance))
	}
	// Output:
	// part-full, M2
	// at the outfall 4.748 ft, normal depth 8.18 ft
	// 497.8 ft upstream 6.000 ft
	// 2523.0 ft upstream 7.000 ft
	// 14059.0 ft upstream 8.000 ft
}

// The same sewer with g = 32.174: 497.2, 2,522 and 14,056 ft, printed to the digit shown.
func TestTheSewerWithAnotherGravity(t *testing.T) {
	circle, _ := pipeflow.NewCircle(10)
	sewer := Pipe{circle, pipeflow.Manning{Factor: 1.486, N: 0.012, Slope: 0.0005}, 32.174, 20000}
	var p Profile
	if err := p.Solve(sewer, 400, Control{}); err != nil {
		t.Fatal(err)
	}
	for _, c := range []struct{ distance, half, depth float64 }{{497.2, 0.05, 6}, {2522, 0.5, 7}, {14056, 0.5, 8}} {
		if p.Depth(c.distance-c.half) > c.depth || p.Depth(c.distance+c.half) < c.depth {
			t.Errorf("depth %.5f at %g ft, want %g", p.Depth(c.distance), c.distance, c.depth)
		}
	}
}

// Texas Tech University, CE 3372 Water Systems Design, exercise set 18 with solution, 2017: a rectangular concrete
// channel 16 ft wide, slope 0.0035, 192 cfs, with a weir that holds 4.648 ft. Printed: normal depth 1.509 ft,
// critical depth 1.648 ft, 768 ft to a depth of 1.66 ft. n is not printed; 0.01296 follows from the normal depth. The
// source steps in 0.1 ft of depth; done over by its own method that is 769.4 ft, so its own error is 0.2 %. Exactly
// it is 767.6 ft.
func TestTheBackwaterOfAWeirInARectangularChannel(t *testing.T) {
	rectangle, err := pipeflow.NewRectangle(16)
	if err != nil {
		t.Fatal(err)
	}
	channel := Pipe{rectangle, pipeflow.Manning{Factor: 1.486, N: 0.01296, Slope: 0.0035}, 32.2, 0}
	var p Profile
	short, long := 700.0, 800.0
	for long-short > 0.01 {
		channel.Length = (short + long) / 2
		if err := p.Solve(channel, 192, Control{Level: 4.648}); err != nil {
			t.Fatal(err)
		}
		if p.Drowned && p.Upper > 1.66 {
			short = channel.Length
		} else {
			long = channel.Length
		}
	}
	compare(t, "normal depth", p.Depths.Normal, 1.509, 0.0005)
	compare(t, "critical depth", p.Depths.Critical, 1.648, 0.0006)
	compare(t, "distance to 1.66 ft", short, 768, 0.002*768)
	if p.Curve != S1 {
		t.Errorf("curve %s, want S1", p.Curve)
	}
}

// Sequent depths of a jump on a rectangular floor, y2/y1 = (√(1 + 8 Fr1²) - 1)/2 (Chow 1959, eq. 3-21).
func TestTheJumpInABoxHasTheSequentDepths(t *testing.T) {
	box, _ := pipeflow.NewBox(2, 2)
	var p Profile
	for _, level := range []float64{1.3, 1.5, 1.7, 1.9} {
		pipe := Pipe{box, pipeflow.Manning{Factor: 1, N: 0.013, Slope: 0.02}, 9.80665, 100}
		if err := p.Solve(pipe, 4, Control{Level: level}); err != nil {
			t.Fatal(err)
		}
		if !p.HasJump || p.JumpAfter >= 2 {
			t.Fatalf("level %g: no jump with a free surface on both sides: %+v", level, p.Result)
		}
		froude, _ := pipeflow.Froude(box, 9.80665, p.JumpBefore, 4)
		want := p.JumpBefore * (math.Sqrt(1+8*froude*froude) - 1) / 2
		compare(t, "depth below the jump", p.JumpAfter, want, 1e-5*2)
	}
}

// wide is a channel whose walls do not count: the closed forms below hold in it exactly.
type wide struct{ width float64 }

func (s wide) Rise() float64 { return math.Inf(1) }
func (s wide) Span() float64 { return s.width }
func (s wide) Closed() bool  { return false }
func (s wide) At(y float64) pipeflow.Geometry {
	return pipeflow.Geometry{Area: s.width * y, Perimeter: s.width, TopWidth: s.width}
}
func (s wide) Moment(y float64) float64 { return s.width * y * y / 2 }

// On a level floor of great width ds = (1 - (yc/y)³)/Sf dy with Sf = (q n/k)² y^(-10/3) is
//
//	s = (k/(q n))² (3/13 y^(13/3) - 3/4 yc³ y^(4/3))    between two depths
func TestALevelWideChannelHasTheClosedForm(t *testing.T) {
	const flow, n, g = 3.0, 0.02, 9.80665
	critical := math.Cbrt(flow * flow / g)
	toCritical := func(y float64) float64 {
		form := func(y float64) float64 {
			return 3./13*math.Pow(y, 13./3) - 3./4*math.Pow(critical, 3)*math.Pow(y, 4./3)
		}
		return (form(y) - form(critical)) / (flow * n) / (flow * n)
	}
	channel := Pipe{wide{1}, pipeflow.Manning{Factor: 1, N: n}, g, 20000}
	var p Profile
	t.Run("tranquil, from critical depth up", func(t *testing.T) {
		if err := p.Solve(channel, flow, Control{}); err != nil {
			t.Fatal(err)
		}
		if p.Curve != H2 {
			t.Errorf("curve %s", p.Curve)
		}
		for _, y := range []float64{1.01, 1.1, 1.5, 2, 2.5, 3} {
			compare(t, "depth", p.Depth(toCritical(y)), y, 2e-5*y)
		}
	})
	t.Run("rapid from a gate, jumping on the way", func(t *testing.T) {
		channel.Length = 120
		if err := p.Solve(channel, flow, Control{Upper: 0.25}); err != nil {
			t.Fatal(err)
		}
		if !p.HasJump || p.Above != H3 || p.Curve != H2 || p.Upper != 0.25 {
			t.Fatalf("%+v", p.Result)
		}
		fromGate := 120 - p.Jump
		compare(t, "depth above the jump", toCritical(0.25)-toCritical(p.JumpBefore), fromGate, 1e-4*120)
		compare(t, "depth below the jump", toCritical(p.JumpAfter), p.Jump, 1e-4*120)
		froude := flow / p.JumpBefore / math.Sqrt(g*p.JumpBefore)
		compare(t, "sequent depth", p.JumpAfter, p.JumpBefore*(math.Sqrt(1+8*froude*froude)-1)/2, 1e-4)
	})
}

// The water over an open section of bounded height is refused, and neither a number nor a crash.
func TestAnOpenSectionThatOverflowsIsRefused(t *testing.T) {
	parabola, err := pipeflow.NewParabola(4, 1)
	if err != nil {
		t.Fatal(err)
	}
	channel := Pipe{parabola, pipeflow.Manning{Factor: 1, N: 0.03, Slope: -0.01}, 9.80665, 200}
	var p Profile
	if err := p.Solve(channel, 1, Control{Level: 0.9}); !errors.Is(err, ErrOvertops) && !math.IsInf(parabola.Rise(), 1) {
		t.Errorf("error %v, depth %g", err, p.Upper)
	}
}
