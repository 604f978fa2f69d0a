package grade_test

import (
	"testing"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/units"
)

// A drowned manhole of the access-hole method, by hand: 24 in out with 20 cfs at 0.5 %, receiving water 105; 12 cfs straight
// in, 6 cfs at a right angle, 2 cfs that enter at the inlet itself and fall from its rim at 110. The numbers were worked
// out step by step with a pocket calculator's formulas (Texas DOT ch. 10 eqs. 10-38 to 10-46), apart from this program.
func TestAccessHoleByHand(t *testing.T) {
	d := newDrain(units.US)
	river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(105)})
	hole := d.structure(network.Structure{Kind: network.Inlet, Rim: network.Some(110), Benching: network.HalfBench})
	above, side := d.structure(network.Structure{}), d.structure(network.Structure{})
	out := d.pipe(network.Pipe{From: hole, To: river, Length: 100, Section: d.circle(24), InvertUpper: network.Some(100.5), InvertLower: network.Some(100)}, 20)
	trunk := d.pipe(network.Pipe{From: above, To: hole, Length: 100, Section: d.circle(24), InvertUpper: network.Some(101.1), InvertLower: network.Some(100.6), Angle: network.Some(0)}, 12)
	lateral := d.pipe(network.Pipe{From: side, To: hole, Length: 50, Section: d.circle(18), InvertUpper: network.Some(101.5), InvertLower: network.Some(101), Angle: network.Some(-90)}, 6)
	l := d.lines()
	at, in := &l.Structures[hole], l.Pipes
	const digits = 1e-9
	near(t, "pressure line at the upper end of the pipe out", in[out].HGLUpper, 105.7815965959558, digits)
	near(t, "energy line there", in[out].EGLUpper, 106.41142832797814, digits)
	near(t, "entrance, 0.2 velocity heads", at.Parts.Entrance, 0.1259663464044687, digits)
	near(t, "half bench, submerged, -0.05", at.Parts.Benching, -0.05*0.1259663464044687, digits)
	near(t, "angle, 150° weighted, 1.0482", at.Parts.Angle, 1.048217132665209*0.1259663464044687, digits)
	near(t, "plunging, 0.1731", at.Parts.Plunging, 0.17313026628086942*0.1259663464044687, digits)
	near(t, "level", at.Level, 106.68494502659823, digits)
	near(t, "pressure line of the trunk, 0.6 of its velocity head under the level", in[trunk].HGLLower, 106.5489013724814, digits)
	near(t, "energy line of the trunk, 0.4 over it", in[trunk].EGLLower, 106.77564079600944, digits)
	near(t, "pressure line of the lateral", in[lateral].HGLLower, 106.57745374433308, digits)
	near(t, "freeboard", at.Freeboard(&d.Structures[hole]).V, 110-106.68494502659823, digits)
}

// A head inlet over a steep 18 in pipe with 4 cfs, Do 1.5: the energy at critical depth 0.7655 ft is 1.0679 ft (both
// solved apart from this program), DI = 4/(1.7671 √(32.174 · 1.5)) = 0.32583, so that inlet control rules: Eai is the
// larger of 1.5 DI² = 0.1592 and 2.4 DI^0.67 = 1.1322. Flat: CB = -0.05. Nothing comes in: 4 cfs fall from the rim 5 ft
// over the invert, CP = (5 - 1.1322)/1.5 = 2.5785.
func TestInletControlOfASteepPipe(t *testing.T) {
	d := newDrain(units.US)
	river := d.structure(network.Structure{Kind: network.Outfall})
	head := d.structure(network.Structure{Kind: network.Inlet, Rim: network.Some(108)})
	out := d.pipe(network.Pipe{From: head, To: river, Length: 100, Section: d.circle(18), InvertUpper: network.Some(103), InvertLower: network.Some(100)}, 4)
	l := d.lines()
	at := &l.Structures[head]
	near(t, "energy at critical depth", l.Pipes[out].EGLUpper-103, 1.06787, 1e-5)
	near(t, "entrance", at.Parts.Entrance, 0.06430, 1e-5)
	near(t, "benching", at.Parts.Benching, -0.05*at.Parts.Entrance, 1e-12)
	near(t, "plunging", at.Parts.Plunging/at.Parts.Entrance, 2.57855, 1e-5)
}

// Inflows over the flow out, as peaks of different moments are, count for no more than it: coefficients of angle and
// plunging flow are those of the shares.
func TestInflowsCountForNoMoreThanTheFlowOut(t *testing.T) {
	level := func(scale float64) float64 {
		d := newDrain(units.US)
		river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(105)})
		hole := d.structure(network.Structure{})
		a, b := d.structure(network.Structure{}), d.structure(network.Structure{})
		d.pipe(network.Pipe{From: hole, To: river, Length: 100, Section: d.circle(24), InvertUpper: network.Some(100.5), InvertLower: network.Some(100)}, 20)
		d.pipe(network.Pipe{From: a, To: hole, Length: 100, Section: d.circle(24), InvertUpper: network.Some(101.1), InvertLower: network.Some(100.6), Angle: network.Some(60)}, 12*scale)
		d.pipe(network.Pipe{From: b, To: hole, Length: 50, Section: d.circle(18), InvertUpper: network.Some(109.5), InvertLower: network.Some(109), Angle: network.Some(90)}, 8*scale)
		return d.lines().Structures[hole].Level
	}
	// The angle's share is capped with all of it; what plunges keeps its part of the sum.
	if full, more := level(1), level(1.3); more < full || more > full+0.1 {
		t.Errorf("level %.4f with inflows as large as the flow out, %.4f with more", full, more)
	}
}

// The straight, the bent and the head structure of the coefficient method, manhole and inlet, between the rows of the table
// and beyond it.
func TestCoefficientsByTheTurn(t *testing.T) {
	cases := []struct {
		name       string
		kind       network.Kind
		deflection float64
		want       float64
	}{
		{"a straight manhole takes 0.15", network.Manhole, 0, 0.15},
		{"at 22.5° it takes 0.45", network.Manhole, 22.5, 0.45},
		{"at 30° a third of the way to 45°", network.Manhole, 30, 0.45 + (0.75-0.45)/3},
		{"at a right angle 1.00", network.Manhole, 90, 1},
		{"sharper than a right angle no more", network.Manhole, 130, 1},
		{"an angle to the other side is the same", network.Manhole, -60, 0.85},
		{"an angle of 300° is one of 60°", network.Manhole, 300, 0.85},
		{"a straight inlet takes 0.50", network.Inlet, 0, 0.5},
		{"at 52.5° halfway between 45° and 60°", network.Inlet, 52.5, (1.10 + 1.25) / 2},
		{"an inlet at a right angle 1.50", network.Inlet, 90, 1.5},
		{"a blind junction is as a manhole", network.BlindJunction, 45, 0.75},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			d := newDrain(units.US)
			d.settings.Method = grade.Coefficient
			river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(105)})
			turn, head := d.structure(network.Structure{Kind: c.kind}), d.structure(network.Structure{Kind: c.kind})
			out := d.pipe(network.Pipe{From: turn, To: river, Length: 100, Section: d.circle(24), InvertUpper: network.Some(100.5), InvertLower: network.Some(100)}, 12)
			in := d.pipe(network.Pipe{From: head, To: turn, Length: 100, Section: d.circle(24), InvertUpper: network.Some(101.1), InvertLower: network.Some(100.6), Angle: network.Some(c.deflection)}, 12)
			l := d.lines()
			velocityHead := l.Pipes[out].EGLUpper - l.Pipes[out].HGLUpper
			near(t, "coefficient", l.Structures[turn].Parts.Coefficient/velocityHead, c.want, 1e-9)
			near(t, "energy of the pipe in is the level", l.Pipes[in].EGLLower, l.Structures[turn].Level, 1e-9)
			straight := map[network.Kind]float64{network.Inlet: 0.5}[c.kind]
			if c.kind != network.Inlet {
				straight = 0.15
			}
			near(t, "coefficient of the head", l.Structures[head].Parts.Coefficient/velocityHead, straight, 1e-9)
		})
	}
}
