package pipeflow_test

import (
	"errors"
	"math"
	"strings"
	"testing"

	"rimfall/pipeflow"
)

var sewer = pipeflow.Manning{Factor: 1, N: 0.013, Slope: 0.004}

const gravity = 9.80665

// pipes are closed sections of every kind.
func pipes() map[string]pipeflow.Section {
	oval, _, err := pipeflow.NewOval(38, 60, 14, 0)
	return map[string]pipeflow.Section{
		"circle":   must(pipeflow.NewCircle(1.5)),
		"box":      must(pipeflow.NewBox(8, 6)),
		"haunched": must(pipeflow.NewHaunchedBox(8, 6, 0.5)),
		"octagon":  must(pipeflow.NewHaunchedBox(6, 6, 2.4)),
		"ellipse":  must(pipeflow.NewEllipse(60, 38)),
		"arch":     must(pipeflow.NewArch(36, 22, 51, 0, 6)),
		"oval":     must(oval, err),
	}
}

func TestQuestionsWithoutAnswer(t *testing.T) {
	circle, box := must(pipeflow.NewCircle(1)), must(pipeflow.NewBox(2, 1))
	level, adverse := sewer, sewer
	level.Slope, adverse.Slope = 0, -0.01
	has := func(_ float64, ok bool) bool { return ok }
	for name, answered := range map[string]bool{
		"no uniform flow on a level pipe":             has(level.NormalDepth(circle, 0.1)),
		"no uniform flow on an adverse pipe":          has(adverse.NormalDepth(circle, 0.1)),
		"not even depth 0 on a level pipe":            has(level.NormalDepth(circle, 0)),
		"no normal depth over the largest discharge":  has(sewer.NormalDepth(circle, 1.0758*sewer.FullFlow(circle))),
		"no normal depth of a negative flow":          has(sewer.NormalDepth(circle, -0.1)),
		"no normal depth of what is no number":        has(sewer.NormalDepth(circle, math.NaN())),
		"no normal depth of an endless flow":          has(sewer.NormalDepth(circle, math.Inf(1))),
		"no critical depth where a box is too low":    has(pipeflow.CriticalDepth(box, gravity, 2*math.Sqrt(gravity))),
		"no critical depth without gravity":           has(pipeflow.CriticalDepth(circle, 0, 1)),
		"no critical depth of a negative flow":        has(pipeflow.CriticalDepth(circle, gravity, -1)),
		"no Froude number in a full pipe":             has(pipeflow.Froude(circle, gravity, 1, 1)),
		"no Froude number in a dry pipe":              has(pipeflow.Froude(circle, gravity, 0, 1)),
		"no specific energy of a flow in a dry pipe":  has(pipeflow.SpecificEnergy(circle, gravity, 0, 1)),
		"no specific force of a flow in a dry pipe":   has(pipeflow.SpecificForce(circle, gravity, 0, 1)),
		"no conjugate depth of still water":           has(pipeflow.ConjugateDepth(circle, gravity, 0.5, 0)),
		"no alternate depth of still water":           has(pipeflow.AlternateDepth(circle, gravity, 0.5, 0)),
		"no slope that carries a flow at depth 0":     has(sewer.SlopeFor(circle, 0, 1)),
		"no roughness that makes a flow 0":            has(sewer.RoughnessFor(circle, 0.5, 0)),
		"no roughness on a level pipe":                has(level.RoughnessFor(circle, 0.5, 1)),
		"no size for a depth ratio over 1":            has(sewer.ScaleFor(circle, 1.01, 1)),
		"no size for flow 0":                          has(sewer.ScaleFor(circle, 1, 0)),
		"no critical slope of flow 0":                 has(sewer.CriticalSlope(circle, gravity, 0)),
		"no velocity over the largest":                sewer.DepthsOfVelocity(circle, 1.15*sewer.FullVelocity(circle)).Count > 0,
		"no depth under the least energy":             pipeflow.DepthsOfEnergy(circle, gravity, 0.3, 1).Count > 0,
		"no depth under the least force":              pipeflow.DepthsOfForce(circle, gravity, 0.01, 1).Count > 0,
		"no roughness of a dry section":               has(pipeflow.HortonN(nil)),
		"no joint roughness where a part has none":    has(pipeflow.LotterN([]pipeflow.Lining{{Area: 1, Perimeter: 1}})),
		"no varying depth over the largest discharge": len(sewer.PartFull(circle).NormalDepths(circle, 2*sewer.FullFlow(circle))) > 0,
		"no varying depth on a level pipe":            len(level.PartFull(circle).NormalDepths(circle, 0.1)) > 0,
	} {
		if answered {
			t.Errorf("%s: got an answer", name)
		}
	}
}

func TestWhatIsWrongAndWhatWouldDo(t *testing.T) {
	circle, box := must(pipeflow.NewCircle(1)), must(pipeflow.NewBox(2, 1))
	level, adverse, rough := sewer, sewer, sewer
	level.Slope, adverse.Slope, rough.N = 0, -0.01, 0
	for _, c := range []struct {
		name  string
		err   error
		wants []string // words of the message; none: no error
	}{
		{"a flow that runs uniformly is no fault", sewer.WhyNoNormalDepth(circle, 0.1), nil},
		{"a level pipe", level.WhyNoNormalDepth(circle, 0.1), []string{"slope 0", "give a slope over 0"}},
		{"an adverse pipe", adverse.WhyNoNormalDepth(circle, 0.1), []string{"adverse slope -0.01", "give a slope over 0"}},
		{"no roughness", rough.WhyNoNormalDepth(circle, 0.1), []string{"n 0", "n must be over 0"}},
		{"a negative flow", sewer.WhyNoNormalDepth(circle, -1), []string{"flow -1", "0 or more"}},
		{"a flow beyond the peak", sewer.WhyNoNormalDepth(circle, 9), []string{"largest discharge", "full-bore capacity", "times the size"}},
		{"a velocity beyond the largest", sewer.WhyNoVelocityDepth(circle, 9), []string{"velocity 9", "largest", "slope"}},
		{"a velocity that is reached", sewer.WhyNoVelocityDepth(circle, 1), nil},
		{"a flow too large for a low box", pipeflow.WhyNoCriticalDepth(box, gravity, 9), []string{"flat roof", "use the rise"}},
		{"a flow with a critical depth", pipeflow.WhyNoCriticalDepth(box, gravity, 1), nil},
	} {
		if c.err == nil != (c.wants == nil) {
			t.Errorf("%s: got %v", c.name, c.err)
			continue
		}
		var none *pipeflow.NoAnswer
		if c.err != nil && !errors.As(c.err, &none) {
			t.Errorf("%s: the error has the wrong type", c.name)
		}
		for _, want := range c.wants {
			if !strings.Contains(c.err.Error(), want) {
				t.Errorf("%s: %q does not say %q", c.name, c.err, want)
			}
		}
	}
}

// TestRemediesWork does what the messages say would do.
func TestRemediesWork(t *testing.T) {
	for name, s := range pipes() {
		flow := 1.3 * sewer.FullFlow(s)
		steeper := sewer
		steeper.Slope, _ = sewer.SlopeFor(s, s.Rise(), flow)
		if got := steeper.FullFlow(s); math.Abs(got-flow) > 1e-12*flow {
			t.Errorf("%s on the slope found carries %v, not %v", name, got, flow)
		}
		scale, _ := sewer.ScaleFor(s, 1, flow)
		if want := math.Pow(1.3, 3./8); math.Abs(scale-want) > 1e-12 {
			t.Errorf("%s: scale %v, want %v", name, scale, want)
		}
	}
}

func TestSectionsThatCannotBe(t *testing.T) {
	line := func(v ...float64) []pipeflow.Point {
		var points []pipeflow.Point
		for i := 0; i < len(v); i += 2 {
			points = append(points, pipeflow.Point{Station: v[i], Elevation: v[i+1]})
		}
		return points
	}
	for _, c := range []struct {
		name string
		err  error
		want string
	}{
		{"a circle of diameter 0", second(pipeflow.NewCircle(0)), "diameter 0"},
		{"a circle of no number", second(pipeflow.NewCircle(math.NaN())), "diameter NaN"},
		{"a box of negative rise", second(pipeflow.NewBox(1, -1)), "rise -1"},
		{"an endless box", second(pipeflow.NewBox(math.Inf(1), 1)), "span +Inf"},
		{"haunches that meet", second(pipeflow.NewHaunchedBox(4, 2, 1.1)), "haunch of 1.1"},
		{"an ellipse flatter than 10 to 1", second(pipeflow.NewEllipse(11, 1)), "flatter than 10 to 1"},
		{"an arch with too small a bottom radius", second(pipeflow.NewArch(36, 22, 10, 0, 6)), "bottom radius"},
		{"an arch with too large corners", second(pipeflow.NewArch(36, 22, 51, 0, 17.9)), "do not close"},
		{"an arch a million times wider than high", second(pipeflow.NewArch(81081, 0.07, 113513, 0, 0.0056)), "do not close"},
		{"an arch whose crown radius is another's", second(pipeflow.NewArch(36, 22, 51, 40, 6)), "does not close"},
		{"an oval with too large a small radius", third(pipeflow.NewOval(60, 38, 0, 20)), "under 19"},
		{"a channel without width or sides", second(pipeflow.NewTrapezoid(0, 0, 0)), "over 0"},
		{"a channel with overhanging sides", second(pipeflow.NewTrapezoid(1, -1, 2)), "0 or more"},
		{"a parabola of no depth", second(pipeflow.NewParabola(1, 0)), "depth 0"},
		{"a ground line of one point", second(pipeflow.NewGround(line(0, 1))), "two points"},
		{"a ground line that goes back", second(pipeflow.NewGround(line(0, 1, 2, 0, 1, 3))), "goes back"},
		{"a ground line that falls to its end", second(pipeflow.NewGround(line(0, 1, 2, 0))), "add the bank"},
		{"a level ground line", second(pipeflow.NewGround(line(0, 1, 2, 1))), "holds no water"},
		{"a ground line with a hole in it", second(pipeflow.NewGround(line(0, 1, 2, math.NaN(), 3, 1))), "no number"},
	} {
		if c.err == nil || !strings.Contains(c.err.Error(), c.want) {
			t.Errorf("%s: got %v, want %q in it", c.name, c.err, c.want)
		}
	}
}

func second[S any](_ S, err error) error { return err }

func third[S, T any](_ S, _ T, err error) error { return err }

func TestZeroValuesCarryNothing(t *testing.T) {
	for name, s := range map[string]pipeflow.Section{"circle": pipeflow.Circle{}, "box": pipeflow.Box{}} {
		if s.At(1) != (pipeflow.Geometry{}) || s.Moment(1) != 0 || sewer.FullFlow(s) != 0 {
			t.Errorf("%s: %+v, moment %v, flow %v", name, s.At(1), s.Moment(1), sewer.FullFlow(s))
		}
		if _, ok := sewer.NormalDepth(s, 1); ok {
			t.Errorf("%s: has a normal depth", name)
		}
		if _, ok := pipeflow.CriticalDepth(s, gravity, 1); ok {
			t.Errorf("%s: has a critical depth", name)
		}
	}
	if n := (pipeflow.Geometry{}).HydraulicRadius(); n != 0 {
		t.Errorf("hydraulic radius of nothing: %v", n)
	}
}

func TestTheEdgesOfTheQuestions(t *testing.T) {
	circle, channel := must(pipeflow.NewCircle(1)), must(pipeflow.NewTrapezoid(2, 1, 1))
	ground := must(pipeflow.NewGround([]pipeflow.Point{{Elevation: 1}, {Station: 1}, {Station: 2}, {Station: 3, Elevation: 1}}))
	level := sewer
	level.Slope = 0
	largest, crest, _ := sewer.LargestFlow(circle)
	atLargest, _ := sewer.NormalDepth(circle, largest)
	first := func(value float64, _ bool) float64 { return value }
	for _, c := range []struct {
		name      string
		got, want float64
	}{
		{"flow 0 has depth 0", first(sewer.NormalDepth(circle, 0)), 0},
		{"velocity 0 has depth 0", sewer.DepthsOfVelocity(circle, 0).Lower, 0},
		{"flow 0 has critical depth 0", first(pipeflow.CriticalDepth(circle, gravity, 0)), 0},
		{"the largest discharge runs at its depth", atLargest, crest},
		{"still water has the energy of its depth", first(pipeflow.SpecificEnergy(circle, gravity, 0.4, 0)), 0.4},
		{"a pressure head counts in the energy", first(pipeflow.SpecificEnergy(circle, gravity, 3, 0)), 3},
		{"a pressure head presses on the whole section", first(pipeflow.SpecificForce(circle, gravity, 3, 0)), math.Pi / 4 * 2.5},
		{"a level pipe has no capacity", level.FullFlow(circle), 0},
		{"nor has a level channel", level.FullFlow(channel), 0},
		{"a channel without end has no bound", sewer.FullFlow(channel), math.Inf(1)},
		{"flow 0 needs no slope", first(sewer.SlopeFor(circle, 0.5, 0)), 0},
		{"critical flow at its depth has Froude number 1", first(pipeflow.Froude(circle, gravity,
			first(pipeflow.CriticalDepth(circle, gravity, 0.3)), 0.3)), 1},
		{"a velocity comes back in a channel", sewer.Velocity(channel, sewer.DepthsOfVelocity(channel, 3).Lower), 3},
		{"a velocity comes back on a ground line", sewer.Velocity(ground, sewer.DepthsOfVelocity(ground, 1).Lower), 1},
		{"a ground line is full at its lower end", sewer.FullFlow(ground), sewer.Flow(ground, 1)},
		{"the flow of its end comes back from a ground line", first(sewer.NormalDepth(ground, sewer.FullFlow(ground))), 1},
	} {
		if c.got != c.want && !(math.Abs(c.got-c.want) <= 1e-12*c.want) {
			t.Errorf("%s: got %v, want %v", c.name, c.got, c.want)
		}
	}
	if both := sewer.NormalDepths(circle, largest); both.Count != 2 || !near(both.Lower, crest, 1e-7) || !near(both.Upper, crest, 1e-7) {
		t.Errorf("both depths of the largest discharge, at %v, are %+v", crest, both)
	}
	if _, ok := sewer.NormalDepth(ground, 1.001*sewer.FullFlow(ground)); ok {
		t.Error("a ground line carries more than up to its lower end")
	}
}
