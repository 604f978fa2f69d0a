package surface

import (
	"math"
	"testing"

	"rimfall/pipeflow"
)

// metric is a round pipe of 1 m, n 0.013, 100 m long, at a slope.
func metric(slope float64) Pipe {
	circle, _ := pipeflow.NewCircle(1)
	return Pipe{circle, pipeflow.Manning{Factor: 1, N: 0.013, Slope: slope}, 9.80665, 100}
}

// Full-bore capacity of the metric pipe at 0.001 is 0.758 m³/s, its largest flow 0.815; at 0.02 they are 3.39 and 3.65.
func TestEachRegimeComesFromItsControls(t *testing.T) {
	cases := []struct {
		name    string
		slope   float64
		flow    float64
		control Control
		regime  Regime
		curve   Curve
		above   Curve
	}{
		{"no flow and no water below is dry", 0.001, 0, Control{}, Dry, "", ""},
		{"a mild pipe above a fall is drawn down", 0.001, 0.5, Control{Level: -3}, PartFull, M2, ""},
		{"a mild pipe above deep water is backed up", 0.001, 0.5, Control{Level: 0.9}, PartFull, M1, ""},
		{"a mild pipe whose water below stands at normal depth is uniform", 0.001, 0.5, Control{Level: normalDepth(0.001, 0.5)}, PartFull, Uniform, ""},
		{"a drowned mild pipe is full until the pressure line meets the crown", 0.001, 0.5, Control{Level: 1.02}, PartlyFull, M1, ""},
		{"a deeply drowned mild pipe is full", 0.001, 0.5, Control{Level: 1.5}, Full, "", ""},
		{"a flow over the largest fills the pipe above a drawn-down end", 0.001, 1.6, Control{}, PartlyFull, M2, ""},
		{"a flow over the largest in a drowned pipe is full", 0.001, 0.9, Control{Level: 1}, Full, "", ""},
		{"between capacity and largest flow a low level tends to the lower normal depth", 0.001, 0.79, Control{Level: 0.9}, PartFull, M1, ""},
		{"between capacity and largest flow a level over the upper normal depth rises", 0.001, 0.79, Control{Level: 0.999}, PartlyFull, M2, ""},
		{"a level pipe", 0, 0.5, Control{}, PartFull, H2, ""},
		{"an adverse pipe fills at its upper end", -0.005, 0.5, Control{}, PartlyFull, A2, ""},
		{"a steep pipe above a fall runs to its normal depth", 0.02, 1, Control{}, PartFull, S2, ""},
		{"a steep pipe takes no notice of water below with less force", 0.02, 1, Control{Level: 0.6}, PartFull, S2, ""},
		{"a steep pipe with deep water below has a jump", 0.02, 1, Control{Level: 0.95}, Jumps, S1, S2},
		{"a steep pipe with a drowned end has a jump above a full stretch", 0.02, 1, Control{Level: 1.5}, Jumps, S1, S2},
		{"a steep pipe whose inlet is drowned is full", 0.02, 1, Control{Level: 4}, Full, "", ""},
		{"a steep pipe at nearly its capacity jumps against water under pressure", 0.02, 2.5, Control{Level: 1.5}, Jumps, "", S2},
		{"a gate at the head of a mild pipe drives a jump down it", 0.001, 0.5, Control{Upper: 0.15}, Jumps, M2, M3},
		{"a gate at the head of a level pipe drives a jump down it", 0, 0.5, Control{Upper: 0.15}, Jumps, H2, H3},
		{"a gate at the head of an adverse pipe drives a jump down it", -0.001, 0.5, Control{Upper: 0.15}, Jumps, A2, A3},
		{"a gate at the head of a steep pipe lets the water rise to normal depth", 0.02, 1, Control{Upper: 0.2}, PartFull, S3, ""},
	}
	var p Profile
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			if err := p.Solve(metric(c.slope), c.flow, c.control); err != nil {
				t.Fatal(err)
			}
			if p.Regime != c.regime || p.Curve != c.curve || p.Above != c.above {
				t.Errorf("%s %s %s, want %s %s %s; %+v", p.Regime, p.Curve, p.Above, c.regime, c.curve, c.above, p.Result)
			}
			holdsTogether(t, &p)
		})
	}
}

func normalDepth(slope, flow float64) float64 {
	pipe := metric(slope)
	depth, _ := pipe.Manning.NormalDepth(pipe.Section, flow)
	return depth
}

// holdsTogether checks what every profile must fulfil whatever its numbers.
func holdsTogether(t *testing.T, p *Profile) {
	t.Helper()
	rise, length := p.pipe.Section.Rise(), p.pipe.Length
	for _, v := range []float64{p.Lower, p.Upper, p.FullLength} {
		if math.IsNaN(v) || math.IsInf(v, 0) || v < 0 {
			t.Fatalf("a number that is none: %+v", p.Result)
		}
	}
	compare(t, "surface at the lower end", p.Depth(0), p.Lower, 1e-9*rise)
	compare(t, "surface at the upper end", p.Depth(length), p.Upper, 1e-9*rise)
	if p.Regime == Dry {
		return
	}
	if p.FullLength < 0 || p.FullLength > length || (p.Regime == Full) != (p.FullLength == length) {
		t.Errorf("%s with %g of %g full", p.Regime, p.FullLength, length)
	}
	if p.HasJump {
		if p.Jump < 0 || p.Jump > length || p.JumpBefore >= p.JumpAfter {
			t.Errorf("jump at %g from %g to %g", p.Jump, p.JumpBefore, p.JumpAfter)
		}
		above, _ := p.sub.water.force(p.JumpBefore)
		below, _ := p.sub.water.force(p.JumpAfter)
		compare(t, "specific force below the jump", below, above, 1e-3*above)
	}
	_, full := p.FroudeLower()
	if full == (p.Lower >= rise) {
		t.Errorf("a Froude number at a depth of %g: %v", p.Lower, full)
	}
}

func TestWaterThatStandsInAPipeWithoutFlowIsLevel(t *testing.T) {
	var p Profile
	for _, c := range []struct {
		name                       string
		slope, level, lower, upper float64
	}{
		{"nothing below", 0.01, -1, 0, 0},
		{"a pool that ends in the pipe", 0.01, 0.5, 0.5, 0},
		{"a pool over the crown", 0.01, 3, 3, 2},
		{"a pool in an adverse pipe lies at its upper end", -0.01, -0.4, 0, 0.6},
	} {
		t.Run(c.name, func(t *testing.T) {
			if err := p.Solve(metric(c.slope), 0, Control{Level: c.level}); err != nil {
				t.Fatal(err)
			}
			if math.Abs(p.Lower-c.lower) > 1e-12 || math.Abs(p.Upper-c.upper) > 1e-12 {
				t.Errorf("%g and %g, want %g and %g", p.Lower, p.Upper, c.lower, c.upper)
			}
			holdsTogether(t, &p)
		})
	}
}

// The roof of a box is wetted only when the water touches it: 3 m × 2 m, n 0.015, slope 0.002.
func TestUnderAFlatRoof(t *testing.T) {
	box, _ := pipeflow.NewBox(3, 2)
	pipe := Pipe{box, pipeflow.Manning{Factor: 1, N: 0.015, Slope: 0.002}, 9.80665, 400}
	full := pipe.Manning.FullFlow(box)
	most := pipe.Manning.Flow(box, 2*(1-1e-12))
	between := (full + most) / 2
	var p Profile
	cases := []struct {
		name   string
		slope  float64
		flow   float64
		level  float64
		regime Regime
	}{
		{"over capacity, water that touches the roof fills the pipe", 0.002, between, 2, Full},
		{"over capacity, water below the roof tends to normal depth", 0.002, between, 1.99, PartFull},
		{"over the largest flow the water comes to the roof", 0.002, most * 1.1, 0, PartlyFull},
		{"under capacity, the pressure line comes down from the roof", 0.002, full * 0.9, 2.05, PartlyFull},
		{"no critical depth inside, steep, above a fall", 0.06, 40, 0, PartFull},
		{"no critical depth inside, steep, drowned below: the jump stands in the full stretch", 0.06, 40, 12, Jumps},
		{"no critical depth inside and over the largest flow: full from the fall up", 0.002, 40, 0, Full},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			pipe.Manning.Slope = c.slope
			if err := p.Solve(pipe, c.flow, Control{Level: c.level}); err != nil {
				t.Fatal(err)
			}
			if p.Regime != c.regime {
				t.Errorf("%+v, want %s", p.Result, c.regime)
			}
			holdsTogether(t, &p)
		})
	}
}

func TestWhatIsOutsideTheRangeIsRefused(t *testing.T) {
	bad := math.NaN()
	cases := []struct {
		name    string
		change  func(*Pipe)
		flow    float64
		control Control
	}{
		{"no section", func(p *Pipe) { p.Section = nil }, 1, Control{}},
		{"no length", func(p *Pipe) { p.Length = 0 }, 1, Control{}},
		{"a negative n", func(p *Pipe) { p.Manning.N = -0.013 }, 1, Control{}},
		{"no Manning factor", func(p *Pipe) { p.Manning.Factor = 0 }, 1, Control{}},
		{"an infinite gravity", func(p *Pipe) { p.Gravity = math.Inf(1) }, 1, Control{}},
		{"a slope that is not a number", func(p *Pipe) { p.Manning.Slope = bad }, 1, Control{}},
		{"a negative flow", func(*Pipe) {}, -1, Control{}},
		{"a flow that is not a number", func(*Pipe) {}, bad, Control{}},
		{"a level that is not a number", func(*Pipe) {}, 1, Control{Level: bad}},
	}
	var p Profile
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			pipe := metric(0.001)
			c.change(&pipe)
			if err := p.Solve(pipe, c.flow, c.control); err == nil {
				t.Errorf("got %+v", p.Result)
			}
		})
	}
}
