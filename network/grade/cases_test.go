package grade_test

import (
	"math"
	"testing"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/units"
)

// A blind junction of 36 in with 40 cfs out, 25 cfs in the 30 in trunk and 15 cfs from a 24 in lateral at 60°, all full.
// Momentum by hand, areas 7.0686, 4.9087, 3.1416 ft², velocities 5.6588, 5.0930, 4.7746 ft/s:
//
//	(226.354 - 127.324 - 71.620 · 0.5)/(0.5 · 32.174 · 11.9773) + 0.40310 - 0.49765 = 0.23356 ft
func TestBlindJunctionByMomentum(t *testing.T) {
	d := newDrain(units.US)
	d.settings.Method = grade.Coefficient
	river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(110)})
	junction := d.structure(network.Structure{Kind: network.BlindJunction})
	above, side := d.structure(network.Structure{}), d.structure(network.Structure{})
	out := d.pipe(network.Pipe{From: junction, To: river, Length: 100, Section: d.circle(36), InvertUpper: network.Some(100.5), InvertLower: network.Some(100)}, 40)
	lateral := d.pipe(network.Pipe{From: side, To: junction, Length: 50, Section: d.circle(24), InvertUpper: network.Some(101.5), InvertLower: network.Some(101), Angle: network.Some(60)}, 18)
	trunk := d.pipe(network.Pipe{From: above, To: junction, Length: 100, Section: d.circle(30), InvertUpper: network.Some(101.1), InvertLower: network.Some(100.6), Angle: network.Some(5)}, 25)
	l := d.lines()
	near(t, "loss", l.Structures[junction].Parts.Junction, 0.23356, 2e-5)
	near(t, "energy line of the trunk", l.Pipes[trunk].EGLLower, l.Pipes[out].EGLUpper+l.Structures[junction].Parts.Junction, 1e-9)
	near(t, "energy line of the lateral", l.Pipes[lateral].EGLLower, l.Structures[junction].Level, 1e-9)

	d.Structures[river].Tailwater = network.Some(101) // no longer full: as a manhole of the method
	l = d.lines()
	if l.Structures[junction].Parts.Junction != 0 || l.Structures[junction].Parts.Coefficient == 0 {
		t.Error("a junction that is not full has no loss by momentum")
	}
}

// outfallCase is one pipe, its slope and flow, and the receiving water.
type outfallCase struct {
	name      string
	slope     float64
	flow      float64
	tailwater network.Maybe
	start     grade.Start
	depth     func(c *outfallDepths) float64 // at the lower end
	regime    grade.Regime
}

type outfallDepths struct{ normal, critical, rise float64 }

// One 36 in pipe of 200 ft, n 0.013, to an outfall at 100.
func TestOutfalls(t *testing.T) {
	midway := func(c *outfallDepths) float64 { return (c.critical + c.rise) / 2 }
	critical := func(c *outfallDepths) float64 { return c.critical }
	normal := func(c *outfallDepths) float64 { return c.normal }
	tailwater := func(level float64) func(*outfallDepths) float64 {
		return func(*outfallDepths) float64 { return level - 100 }
	}
	for _, c := range []outfallCase{
		{"a mild pipe starts midway", 0.001, 12, network.Maybe{}, grade.Midway, midway, grade.PartFull},
		{"or at critical depth", 0.001, 12, network.Maybe{}, grade.AtCritical, critical, grade.PartFull},
		{"a tailwater below the invert is a free outfall", 0.001, 12, network.Some(97), grade.Midway, midway, grade.PartFull},
		{"a low tailwater does not count", 0.001, 12, network.Some(101), grade.Midway, midway, grade.PartFull},
		{"a higher tailwater does", 0.001, 12, network.Some(102.7), grade.Midway, tailwater(102.7), grade.PartFull},
		{"one above the crown fills the pipe", 0.001, 12, network.Some(106), grade.Midway, tailwater(106), grade.Full},
		{"a level pipe starts midway", 0, 12, network.Maybe{}, grade.Midway, midway, grade.PartFull},
		{"a rising pipe starts midway", -0.001, 12, network.Maybe{}, grade.Midway, midway, grade.PartFull},
		{"an overcharged pipe starts midway and fills", 0.001, 60, network.Maybe{}, grade.Midway, midway, grade.PartlyFull},
		{"a steep pipe leaves at its own depth", 0.02, 12, network.Maybe{}, grade.Midway, normal, grade.PartFull},
		{"a tailwater that has less force stays outside", 0.02, 12, network.Some(101.4), grade.Midway, normal, grade.PartFull},
		{"one that has more drives a jump into it", 0.02, 12, network.Some(103.5), grade.Midway, tailwater(103.5), grade.Jumps},
		{"one above everything drowns it", 0.02, 12, network.Some(112), grade.Midway, tailwater(112), grade.Full},
	} {
		t.Run(c.name, func(t *testing.T) {
			d := newDrain(units.US)
			d.settings.Start = c.start
			river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: c.tailwater})
			head := d.structure(network.Structure{})
			p := d.pipe(network.Pipe{From: head, To: river, Length: 200, Section: d.circle(36), InvertUpper: network.Some(100 + 200*c.slope), InvertLower: network.Some(100)}, c.flow)
			l := d.lines()
			depths := outfallDepths{d.flows().Pipes[p].Depth, d.criticalDepth(p), 3}
			near(t, "depth at the lower end", l.Pipes[p].HGLLower-100, c.depth(&depths), 1e-3) // a steep pipe of 200 ft is nearly at normal depth
			if l.Pipes[p].Regime != c.regime {
				t.Errorf("it runs %v, want %v", l.Pipes[p].Regime, c.regime)
			}
			near(t, "level of the outfall", l.Structures[river].Level, max(l.Pipes[p].HGLLower, c.tailwater.Or(math.Inf(-1))), 0)
		})
	}
}

// criticalDepth is where Q² T = g A³ of a circle, by halving.
func (d *drain) criticalDepth(p network.PipeIndex) float64 {
	s, q := d.Pipes[p].Section, d.flow[p]
	low, high := 0.0, s.Rise()
	for range 100 {
		y := (low + high) / 2
		if g := s.At(y); q*q*g.TopWidth > d.settings.Gravity*g.Area*g.Area*g.Area {
			low = y
		} else {
			high = y
		}
	}
	return low
}

func TestTheCheckStormHasItsOwnTailwater(t *testing.T) {
	d := newDrain(units.US)
	river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(103), TailwaterCheck: network.Some(105)})
	head := d.structure(network.Structure{})
	p := d.pipe(network.Pipe{From: head, To: river, Length: 200, Section: d.circle(24), InvertUpper: network.Some(101), InvertLower: network.Some(100)}, 5)
	d.Connect()
	check := grade.Up(&d.Network, d.settings, d.flows(), grade.CheckTailwater)
	near(t, "check storm", check.Pipes[p].HGLLower, 105, 0)
	near(t, "design storm", d.lines().Pipes[p].HGLLower, 103, 0)
	d.Structures[river].TailwaterCheck = network.Maybe{}
	near(t, "a blank one is that of the design storm", grade.Up(&d.Network, d.settings, d.flows(), grade.CheckTailwater).Pipes[p].HGLLower, 103, 0)
}

func TestAPipeWithoutFlowStandsAtTheLevelBelowItOrItsInvert(t *testing.T) {
	d := newDrain(units.US)
	river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(101.5)})
	a, b := d.structure(network.Structure{}), d.structure(network.Structure{})
	low := d.pipe(network.Pipe{From: a, To: river, Length: 100, Section: d.circle(24), InvertUpper: network.Some(101), InvertLower: network.Some(100)}, 0)
	high := d.pipe(network.Pipe{From: b, To: a, Length: 100, Section: d.circle(24), InvertUpper: network.Some(103), InvertLower: network.Some(102)}, 0)
	l := d.lines()
	for _, c := range []struct {
		name      string
		got, want float64
	}{
		{"lower end under the receiving water", l.Pipes[low].HGLLower, 101.5},
		{"upper end under it", l.Pipes[low].EGLUpper, 101.5},
		{"level above", l.Structures[a].Level, 101.5},
		{"a higher pipe is at its inverts", l.Pipes[high].HGLLower, 102},
		{"at both ends", l.Pipes[high].EGLUpper, 103},
		{"and so is its structure", l.Structures[b].Level, 103},
	} {
		near(t, c.name, c.got, c.want, 0)
	}
	if l.Pipes[low].Regime != grade.Dry {
		t.Errorf("it runs %v", l.Pipes[low].Regime)
	}
}

// Of two pipes out the higher level holds, and the account of the other says by how much. A third without flow, higher than
// both, holds nothing back.
func TestOfSeveralPipesOutTheHighestLevelHolds(t *testing.T) {
	d := newDrain(units.US)
	river := d.structure(network.Structure{Kind: network.Outfall})
	split, head := d.structure(network.Structure{}), d.structure(network.Structure{})
	low := d.pipe(network.Pipe{From: split, To: river, Length: 100, Section: d.circle(24), InvertUpper: network.Some(101), InvertLower: network.Some(100)}, 6)
	high := d.pipe(network.Pipe{From: split, To: river, Length: 100, Section: d.circle(18), InvertUpper: network.Some(102), InvertLower: network.Some(100)}, 4)
	spare := d.pipe(network.Pipe{From: split, To: river, Length: 100, Section: d.circle(18), InvertUpper: network.Some(106), InvertLower: network.Some(100)}, 0)
	in := d.pipe(network.Pipe{From: head, To: split, Length: 100, Section: d.circle(24), InvertUpper: network.Some(102.5), InvertLower: network.Some(102.1)}, 10)
	l := d.lines()
	at := &l.Structures[split]
	if at.Out != high {
		t.Fatalf("pipe %d sets the level, want %d", at.Out, high)
	}
	held := 0.0
	for _, loss := range l.Account(in, low) {
		if loss.Name == "held by another pipe out" {
			held = loss.Value
		}
	}
	if held <= 0 {
		t.Error("the account of the lower pipe does not say what the other holds")
	}
	near(t, "its sum", sum(l.Account(in, low)), l.Pipes[in].EGLLower-l.Pipes[low].EGLUpper, 1e-9)
	if at.Level >= l.Pipes[spare].HGLUpper {
		t.Errorf("the level %.3f is at the invert of a pipe that carries nothing", at.Level)
	}
}

func TestLevelsAreUnknownAboveAPipeWithoutInverts(t *testing.T) {
	d := newDrain(units.US)
	river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(101)})
	a, b, c := d.structure(network.Structure{}), d.structure(network.Structure{}), d.structure(network.Structure{})
	known := d.pipe(network.Pipe{From: a, To: river, Length: 100, Section: d.circle(24), InvertUpper: network.Some(100.5), InvertLower: network.Some(100)}, 5)
	blank := d.pipe(network.Pipe{From: b, To: a, Length: 100, Section: d.circle(24), Slope: network.Some(0.01)}, 4)
	above := d.pipe(network.Pipe{From: c, To: b, Length: 100, Section: d.circle(24), InvertUpper: network.Some(103), InvertLower: network.Some(102)}, 3)
	l := d.lines()
	if !l.Pipes[known].Known || !l.Structures[a].Known {
		t.Error("below it they are known")
	}
	if l.Pipes[blank].Known || l.Structures[b].Known || l.Pipes[above].Known || l.Structures[c].Known {
		t.Error("at it and above it they are not")
	}
	if l.Pipes[blank].Regime != grade.PartFull || l.Trace(blank, 3) != nil || l.Account(blank, known) != nil {
		t.Error("such a pipe tells how it runs by itself and nothing else")
	}
}

// Coordinates, then the column, then the assumption.
func TestWhereAnglesComeFrom(t *testing.T) {
	d := newDrain(units.US)
	place := func(x, y float64) network.Structure {
		return network.Structure{X: network.Some(x), Y: network.Some(y)}
	}
	outfall := place(100, 0)
	outfall.Kind = network.Outfall
	river := d.structure(outfall)
	middle := d.structure(place(0, 0))
	west, north, nowhere := d.structure(place(-100, 0)), d.structure(place(0, 50)), d.structure(network.Structure{})
	pipe := func(from, to network.StructureIndex, inches float64, angle network.Maybe) network.PipeIndex {
		rise := 100.5 + float64(len(d.Pipes))/10
		return d.pipe(network.Pipe{From: from, To: to, Length: 100, Section: d.circle(inches), InvertUpper: network.Some(rise + 0.5), InvertLower: network.Some(rise), Angle: angle}, 2)
	}
	pipe(middle, river, 36, network.Maybe{})
	straight := pipe(west, middle, 18, network.Maybe{})
	square := pipe(north, middle, 18, network.Maybe{})
	column := pipe(north, middle, 18, network.Some(35))
	largest := pipe(nowhere, middle, 30, network.Maybe{})
	other := pipe(nowhere, middle, 18, network.Maybe{})
	l := d.lines()
	for _, c := range []struct {
		name    string
		pipe    network.PipeIndex
		want    float64
		assumed bool
	}{
		{"straight on by coordinates", straight, 0, false},
		{"a right angle by coordinates", square, 90, false},
		{"the column goes before coordinates", column, 35, false},
		{"the largest pipe in is taken straight", largest, 0, true},
		{"any other at a right angle", other, 90, true},
	} {
		near(t, c.name, l.Pipes[c.pipe].Deflection, c.want, 1e-12)
		if l.Pipes[c.pipe].AngleAssumed != c.assumed {
			t.Errorf("%s: assumed %v", c.name, l.Pipes[c.pipe].AngleAssumed)
		}
	}
}

// Two barrels carry half the flow each: all levels are those of one barrel alone with half the flow.
func TestBarrelsShareTheFlow(t *testing.T) {
	level := func(count int32, flow float64) float64 {
		d := newDrain(units.US)
		river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(101)})
		head := d.structure(network.Structure{})
		d.pipe(network.Pipe{From: head, To: river, Length: 200, Section: d.circle(24), Count: count, InvertUpper: network.Some(100.4), InvertLower: network.Some(100)}, flow)
		return d.lines().Structures[head].Level
	}
	near(t, "level", level(3, 24), level(1, 8), 1e-12)
}

// Rapid water out of a steep pipe keeps nothing: what it has over the level is dissipated.
func TestRapidInflowIsDissipated(t *testing.T) {
	d := newDrain(units.US)
	river := d.structure(network.Structure{Kind: network.Outfall})
	manhole, head := d.structure(network.Structure{}), d.structure(network.Structure{})
	out := d.pipe(network.Pipe{From: manhole, To: river, Length: 100, Section: d.circle(36), InvertUpper: network.Some(100.2), InvertLower: network.Some(100)}, 10)
	in := d.pipe(network.Pipe{From: head, To: manhole, Length: 100, Section: d.circle(18), InvertUpper: network.Some(107), InvertLower: network.Some(101.7)}, 10)
	l := d.lines()
	if l.Pipes[in].End != grade.EndsRapid {
		t.Fatalf("it ends %v", l.Pipes[in].End)
	}
	account := l.Account(in, out)
	if account[0].Name != "dissipated" || account[0].Value <= 1 {
		t.Errorf("the account begins with %v", account[0])
	}
}

// Inverts written to a hundredth and a slope beside them: the pressure line of a full pipe rises by the friction slope
// times the length, not by what the rounding of the inverts adds.
func TestRoundedInvertsDoNotBendThePressureLine(t *testing.T) {
	d := newDrain(units.US)
	river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(110)})
	head := d.structure(network.Structure{})
	p := d.pipe(network.Pipe{From: head, To: river, Length: 100, Section: d.circle(24), InvertUpper: network.Some(100.51), InvertLower: network.Some(100)}, 10)
	d.Pipes[p].Slope = network.Some(0.005)
	l := d.lines()
	friction, _ := d.Pipes[p].Manning(d.settings.Manning).SlopeFor(d.Pipes[p].Section, 2, 10)
	near(t, "rise of the pressure line", l.Pipes[p].HGLUpper-l.Pipes[p].HGLLower, 100*friction, 1e-12)
	points := l.Trace(p, 4)
	near(t, "the traced line ends there", points[len(points)-1].HGL, l.Pipes[p].HGLUpper, 1e-12)
}
