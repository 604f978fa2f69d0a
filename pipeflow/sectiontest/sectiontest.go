// Package sectiontest is the suite that every section passes: what holds for any shape whatever its formula, by
// quadrature, by scaling and by the closed forms of dry and full.
package sectiontest

import (
	"math"
	"testing"

	"rimfall/pipeflow"
)

// Shape is a section under test.
type Shape struct {
	// New makes the shape with every length multiplied by the scale.
	New func(scale float64) (pipeflow.Section, error)
	// FullArea and FullPerimeter at scale 1, from the textbook's closed form or an independent computation; 0 where none
	// is at hand.
	FullArea, FullPerimeter float64
	// Upright: both walls are mirror images, so that the perimeter follows from the width.
	Upright bool
}

// Run holds a shape against the whole suite.
func Run(t *testing.T, shape Shape) {
	t.Helper()
	s, err := shape.New(1)
	if err != nil {
		t.Fatalf("the section cannot be made: %v", err)
	}
	depths := ladder(s)
	t.Run("a dry section holds nothing and a full one its closed form", func(t *testing.T) { checkEnds(t, s, shape) })
	t.Run("a depth outside is clamped", func(t *testing.T) { checkClamp(t, s) })
	t.Run("area, perimeter and moment grow with depth", func(t *testing.T) { checkGrowth(t, s, depths) })
	t.Run("the area is the integral of the top width", func(t *testing.T) {
		checkIntegral(t, s, depths, topWidth, area)
	})
	t.Run("the first moment is the integral of the area", func(t *testing.T) {
		checkIntegral(t, s, depths, area, func(s pipeflow.Section, y float64) float64 { return s.Moment(y) })
	})
	t.Run("the perimeter is the length of the walls", func(t *testing.T) { checkWalls(t, s, shape, depths) })
	t.Run("lengths scale by 1, areas by 2, moments by 3", func(t *testing.T) { checkScale(t, s, shape, depths) })
	t.Run("normal and critical depth come back from the flow", func(t *testing.T) { checkDepths(t, s, depths) })
	t.Run("a section is measured without allocation", func(t *testing.T) { checkAllocation(t, s, depths) })
}

// ladder is a set of depths inside, from a hundred-millionth of the rise to just below the roof; of an open section
// without end, from a hundred-millionth to a hundred.
func ladder(s pipeflow.Section) []float64 {
	rise := s.Rise()
	if math.IsInf(rise, 1) {
		return []float64{1e-8, 1e-4, 0.01, 0.1, 0.5, 1, 3, 10, 100}
	}
	ratios := []float64{
		1e-8, 1e-6, 1e-4, 1e-3, 0.01, 0.03, 0.049, 0.051, 0.1, 0.2, 0.3, 0.4, 0.5,
		0.6, 0.7, 0.8, 0.82, 0.9, 0.93, 0.96, 0.99, 0.999, 0.999999,
	}
	for i := range ratios {
		ratios[i] *= rise
	}
	return ratios
}

func area(s pipeflow.Section, y float64) float64     { return s.At(y).Area }
func topWidth(s pipeflow.Section, y float64) float64 { return s.At(y).TopWidth }

// near reports whether two values agree to a relative tolerance.
func near(got, want, tolerance float64) bool {
	return math.Abs(got-want) <= tolerance*math.Abs(want)
}

func checkEnds(t *testing.T, s pipeflow.Section, shape Shape) {
	if dry := s.At(0); dry.Area != 0 || s.Moment(0) != 0 || dry.HydraulicRadius() != 0 {
		t.Errorf("dry: got %+v, moment %v", dry, s.Moment(0))
	}
	full := s.At(s.Rise())
	if _, ok := full.HydraulicDepth(); ok && s.Closed() {
		t.Errorf("full: a closed section has no hydraulic depth, got %+v", full)
	}
	// The closed forms and the sums of pieces round differently in the last few of 16 digits.
	if shape.FullArea != 0 && !near(full.Area, shape.FullArea, 1e-13) {
		t.Errorf("full area: got %.16g, want %.16g", full.Area, shape.FullArea)
	}
	if shape.FullPerimeter != 0 && !near(full.Perimeter, shape.FullPerimeter, 1e-13) {
		t.Errorf("full perimeter: got %.16g, want %.16g", full.Perimeter, shape.FullPerimeter)
	}
}

func checkClamp(t *testing.T, s pipeflow.Section) {
	rise := s.Rise()
	if s.At(-1) != s.At(0) || s.Moment(-1) != 0 || s.At(math.NaN()) != s.At(0) {
		t.Error("a depth below 0 must count as dry")
	}
	if !math.IsInf(rise, 1) && (s.At(2*rise) != s.At(rise) || s.Moment(2*rise) != s.Moment(rise)) {
		t.Error("a depth above the rise must count as the rise")
	}
}

func checkGrowth(t *testing.T, s pipeflow.Section, depths []float64) {
	before, momentBefore := s.At(0), 0.0
	for _, y := range depths {
		now, moment := s.At(y), s.Moment(y)
		if !(now.Area > before.Area) || !(now.Perimeter > before.Perimeter) || !(moment > momentBefore) {
			t.Errorf("depth %v: area, perimeter and moment must grow: %+v then %+v", y, before, now)
		}
		if now.TopWidth > s.Span()*(1+1e-14) {
			t.Errorf("depth %v: top width %v is over the span %v", y, now.TopWidth, s.Span())
		}
		if moment > now.Area*y {
			t.Errorf("depth %v: the centroid is below the bottom", y)
		}
		before, momentBefore = now, moment
	}
}

// checkIntegral compares a function of depth with the integral of its derivative from the dry section up.
func checkIntegral(t *testing.T, s pipeflow.Section, depths []float64,
	derivative, integral func(pipeflow.Section, float64) float64,
) {
	for _, y := range depths {
		// With z = y sin²(u) the root-like ends of a round section become smooth.
		got := quadrature(func(u float64) float64 {
			sin, cos := math.Sincos(u)
			return derivative(s, y*sin*sin) * 2 * y * sin * cos
		}, 0, math.Pi/2)
		// The quadrature stops at 1e-12 of the whole a panel; corners of the shape cost it some hundred panels.
		if want := integral(s, y); !near(got, want, 1e-9) {
			t.Errorf("depth %v: integral %.14g, section says %.14g", y, got, want)
		}
	}
}

// checkWalls holds the perimeter against straight chords between close depths. The chord of two walls together is never
// longer than they are (triangle inequality); for mirror-image walls it tends to their length.
func checkWalls(t *testing.T, s pipeflow.Section, shape Shape, depths []float64) {
	const slices = 20000
	top := depths[len(depths)-1]
	length, before := s.At(0).Perimeter, s.At(0)
	below := 0.0
	for i := 1; i <= slices; i++ {
		sin := math.Sin(math.Pi / 2 * float64(i) / slices)
		y := top * sin * sin
		now := s.At(y)
		length += math.Hypot(2*(y-below), now.TopWidth-before.TopWidth)
		if now.Perimeter < length*(1-1e-12) {
			t.Fatalf("depth %v: perimeter %v is shorter than the chords %v", y, now.Perimeter, length)
		}
		before, below = now, y
	}
	if shape.Upright && !near(length, before.Perimeter, 1e-5) { // a chord that cuts a corner loses part of a slice
		t.Errorf("chords add up to %.10g, the perimeter is %.10g", length, before.Perimeter)
	}
}

func checkScale(t *testing.T, s pipeflow.Section, shape Shape, depths []float64) {
	const scale = 12 // feet to inches
	large, err := shape.New(scale)
	if err != nil {
		t.Fatal(err)
	}
	for _, y := range depths {
		small, got := s.At(y), large.At(scale*y)
		same := near(got.Area, scale*scale*small.Area, 1e-12) &&
			near(got.Perimeter, scale*small.Perimeter, 1e-12) &&
			near(large.Moment(scale*y), scale*scale*scale*s.Moment(y), 1e-11)
		if !same { // rounding of the joints' heights is magnified where a piece has only just begun
			t.Errorf("depth %v: %+v scaled by %v gives %+v", y, small, scale, got)
		}
	}
}

func checkDepths(t *testing.T, s pipeflow.Section, depths []float64) {
	m := pipeflow.Manning{Factor: 1, N: 0.013, Slope: 0.004}
	const g = 9.80665
	for _, y := range depths {
		flow := m.Flow(s, y)
		depth, ok := m.NormalDepth(s, flow)
		if !ok || depth > y*(1+1e-9) { // above the crest the lower of two depths is the answer
			t.Errorf("depth %v carries %v, but the normal depth is %v, %v", y, flow, depth, ok)
		} else if back := m.Flow(s, depth); !near(back, flow, 4e-12) { // 8/3 of the tolerance of the depth
			t.Errorf("normal depth %v of flow %v carries %v", depth, flow, back)
		}
		wet := s.At(y)
		critical := wet.Area * math.Sqrt(g*wet.Area/wet.TopWidth)
		depth, ok = pipeflow.CriticalDepth(s, g, critical)
		number, _ := pipeflow.Froude(s, g, depth, critical)
		if !ok || math.Abs(number-1) > 1e-6 { // the width below a crown grows like a root, so the Froude number is steep there
			t.Errorf("critical depth at %v: got %v, %v with Froude number %v", y, depth, ok, number)
		}
	}
}

func checkAllocation(t *testing.T, s pipeflow.Section, depths []float64) {
	m := pipeflow.Manning{Factor: 1, N: 0.013, Slope: 0.004}
	for _, y := range depths {
		flow := m.Flow(s, y)
		n := testing.AllocsPerRun(10, func() {
			m.NormalDepth(s, flow)
			pipeflow.CriticalDepth(s, 9.80665, flow)
			s.Moment(y)
		})
		if n != 0 {
			t.Errorf("depth %v: %v allocations", y, n)
		}
	}
}

// quadrature integrates f from a to b by adaptive Simpson halving.
func quadrature(f func(float64) float64, a, b float64) float64 {
	fa, fm, fb := f(a), f((a+b)/2), f(b)
	whole := (b - a) / 6 * (fa + 4*fm + fb)
	rough := 0.0
	for i := range 64 {
		rough += math.Abs(f(a+(b-a)*(float64(i)+0.5)/64)) / 64 * (b - a)
	}
	return simpson(f, a, b, fa, fm, fb, whole, 1e-12*rough, 40)
}

func simpson(f func(float64) float64, a, b, fa, fm, fb, whole, tolerance float64, levels int) float64 {
	m := (a + b) / 2
	fl, fr := f((a+m)/2), f((m+b)/2)
	left, right := (m-a)/6*(fa+4*fl+fm), (b-m)/6*(fm+4*fr+fb)
	if miss := left + right - whole; levels == 0 || (levels < 35 && math.Abs(miss) <= 15*tolerance) {
		return left + right + miss/15
	}
	return simpson(f, a, m, fa, fl, fm, left, tolerance, levels-1) +
		simpson(f, m, b, fm, fr, fb, right, tolerance, levels-1)
}
