package pipeflow_test

import (
	"math"
	"testing"

	"rimfall/pipeflow"
)

// TestTheRangeThatIsPromised measures the differences stated at NormalDepth and CriticalDepth: every closed shape, depths
// from 1e-8 of the rise, normal depth up to 0.98 of the depth of the largest discharge (nearer to it the flow itself does not
// fix the depth better), critical depth up to 0.999 of the rise.
func TestTheRangeThatIsPromised(t *testing.T) {
	const promised = 1e-13
	for name, s := range pipes() {
		_, crest, _ := sewer.LargestFlow(s)
		normal, critical := 0.0, 0.0
		for i := range 5000 {
			y := 0.98 * crest * math.Pow(1e-8, float64(i)/5000)
			got, _ := sewer.NormalDepth(s, sewer.Flow(s, y))
			normal = max(normal, math.Abs(got/y-1))

			y = 0.999 * s.Rise() * math.Pow(1e-8, float64(i)/5000)
			wet := s.At(y)
			got, _ = pipeflow.CriticalDepth(s, gravity, wet.Area*math.Sqrt(gravity*wet.Area/wet.TopWidth))
			critical = max(critical, math.Abs(got/y-1))
		}
		t.Logf("%-9s largest relative difference: normal depth %.1e, critical depth %.1e", name, normal, critical)
		if normal > promised || critical > promised {
			t.Errorf("%s: normal depth %v, critical depth %v, promised %v", name, normal, critical, promised)
		}
	}
}

// TestSpanAndRiseAreKept: whatever radii are adjusted, the two main dimensions are those asked for.
func TestSpanAndRiseAreKept(t *testing.T) {
	oval, _, err := pipeflow.NewOval(60, 38, 0, 14)
	upright, _, err2 := pipeflow.NewOval(38, 60, 14, 0)
	for name, c := range map[string]struct {
		s          pipeflow.Section
		span, rise float64
	}{
		"a haunched box":     {must(pipeflow.NewHaunchedBox(8, 6, 0.5)), 8, 6},
		"a low arch":         {must(pipeflow.NewArch(36, 22, 51, 0, 6)), 36, 22},
		"a high arch":        {must(pipeflow.NewArch(36, 28, 51, 0, 6)), 36, 28},
		"a lying oval":       {must(oval, err), 60, 38},
		"an upright oval":    {must(upright, err2), 38, 60},
		"a lying ellipse":    {must(pipeflow.NewEllipse(60, 38)), 60, 38},
		"an upright ellipse": {must(pipeflow.NewEllipse(38, 60)), 38, 60},
	} {
		widest := 0.0
		for i := range 10001 {
			widest = max(widest, c.s.At(c.rise*float64(i)/10001).TopWidth)
		}
		// The widest of ten thousand depths is off by the square of their distance.
		if math.Abs(c.s.Span()-c.span) > 1e-12*c.span || c.s.Rise() != c.rise || math.Abs(widest-c.span) > 1e-6*c.span {
			t.Errorf("%s: %v x %v, widest %v", name, c.s.Span(), c.s.Rise(), widest)
		}
	}
}

func TestTheVaryingRoughness(t *testing.T) {
	circle := must(pipeflow.NewCircle(1))
	part := sewer.PartFull(circle)
	for _, c := range []struct {
		name string
		got  float64
		want float64
	}{
		{"the ratio at a tenth is the table's", pipeflow.PartFullRatio(0.3), 1.29},
		{"between tenths it is straight", pipeflow.PartFullRatio(0.75), 1.16},
		{"below the table its end is held", pipeflow.PartFullRatio(0.01), 1.22},
		{"full it is 1", pipeflow.PartFullRatio(1), 1},
		{"a full pipe carries the same", part.Flow(circle, 1), sewer.FullFlow(circle)},
		{"a half full pipe carries 1/1.24 of half", part.Flow(circle, 0.5), sewer.FullFlow(circle) / 2 / 1.24},
		{"its velocity is that over the area", part.Velocity(circle, 0.5), part.Flow(circle, 0.5) / circle.At(0.5).Area},
	} {
		if !near(c.got, c.want, 1e-14) {
			t.Errorf("%s: got %v, want %v", c.name, c.got, c.want)
		}
	}
	for _, ratio := range []float64{0.001, 0.1, 0.5, 0.7, 0.9, 0.99} {
		flow := ratio * part.Flow(circle, 1)
		depths := part.NormalDepths(circle, flow)
		if len(depths) == 0 {
			t.Fatalf("no depth carries %v", flow)
		}
		for _, y := range depths {
			if got := part.Flow(circle, y); !near(got, flow, 1e-11) {
				t.Errorf("depth %v carries %v, not %v", y, got, flow)
			}
		}
	}
	most, depth, _ := part.LargestFlow(circle)
	for i := 1; i <= 1000; i++ {
		if flow := part.Flow(circle, float64(i)/1000); flow > most*(1+1e-4) {
			t.Errorf("depth %v carries %v, over the largest %v at %v", float64(i)/1000, flow, most, depth)
		}
	}
}

// TestTwoLowsOfOneGroundLine: a channel within a wide flat. Where the flat is just covered the perimeter jumps, so that a
// flow can have more than one depth; the lowest is the normal depth, the one of least energy the critical depth.
func TestTwoLowsOfOneGroundLine(t *testing.T) {
	g := must(pipeflow.NewGround([]pipeflow.Point{
		{Station: 0, Elevation: 4},
		{Station: 0, Elevation: 2},
		{Station: 50, Elevation: 2},
		{Station: 51, Elevation: 0},
		{Station: 53, Elevation: 0},
		{Station: 54, Elevation: 2},
		{Station: 104, Elevation: 2},
		{Station: 104, Elevation: 4},
	}))
	m := pipeflow.Manning{Factor: 1, N: 0.03, Slope: 0.002}
	bank := m.Flow(g, 1.999999)
	depth, ok := m.NormalDepth(g, 0.9*bank)
	if !ok || depth >= 2 || !near(m.Flow(g, depth), 0.9*bank, 1e-12) {
		t.Errorf("normal depth within the banks: got %v, %v", depth, ok)
	}
	depth, ok = m.NormalDepth(g, 2*bank)
	if !ok || depth <= 2 || !near(m.Flow(g, depth), 2*bank, 1e-12) {
		t.Errorf("normal depth on the flat: got %v, %v", depth, ok)
	}
	for _, flow := range []float64{1, 5, 12, 15, 20, 40, 100} {
		critical, ok := pipeflow.CriticalDepth(g, gravity, flow)
		if !ok {
			t.Errorf("no critical depth of %v", flow)
			continue
		}
		least, _ := pipeflow.SpecificEnergy(g, gravity, critical, flow)
		for i := 1; i <= 4000; i++ {
			y := g.Rise() * float64(i) / 4000
			if e, ok := pipeflow.SpecificEnergy(g, gravity, y, flow); ok && e < least-1e-9 {
				t.Errorf("flow %v: energy %v at %v is under that of the critical depth %v, %v", flow, e, y, critical, least)
				break
			}
		}
	}
}

// TestTheEndsOfTheFallingBranch: with a round crown two depths carry full-bore capacity, the upper being the rise, and at
// the largest discharge they are one. Under a flat roof there is one depth only, all the way up to the roof.
func TestTheEndsOfTheFallingBranch(t *testing.T) {
	for name, s := range pipes() {
		full, largest, crest := sewer.FullFlow(s), 0.0, 0.0
		largest, crest, _ = sewer.LargestFlow(s)
		under := sewer.Flow(s, s.Rise()*(1-1e-6)) // what it carries just before the roof is wet
		atFull, between := sewer.NormalDepths(s, full), sewer.NormalDepths(s, under+0.9*(largest-under))
		flat := name == "box" || name == "haunched"
		switch {
		case flat && (atFull.Count != 1 || between.Count != 1 || crest != s.Rise()):
			t.Errorf("%s: %+v at full-bore capacity, %+v above, largest at %v", name, atFull, between, crest)
		case name == "octagon": // its crest is below a small flat roof: two depths only above what it carries under the roof
			if between.Count != 2 || between.Upper >= s.Rise() || crest >= s.Rise() {
				t.Errorf("%s: %+v above full-bore capacity, largest at %v", name, between, crest)
			}
		case !flat && (atFull.Count != 2 || !near(atFull.Upper, s.Rise(), 1e-12) || between.Count != 2):
			t.Errorf("%s: %+v at full-bore capacity, %+v above", name, atFull, between)
		}
		top := sewer.NormalDepths(s, largest*(1-1e-13))
		if !flat && (top.Count != 2 || !near(top.Lower, crest, 1e-5) || !near(top.Upper, crest, 1e-5)) {
			t.Errorf("%s: %+v at the largest discharge, which is at %v", name, top, crest)
		}
		if fast := sewer.DepthsOfVelocity(s, sewer.FullVelocity(s)); !flat && name != "octagon" &&
			(fast.Count != 2 || !near(fast.Upper, s.Rise(), 1e-12)) {
			t.Errorf("%s: %+v at full-bore velocity", name, fast)
		}
	}
}
