package pipeflow_test

import (
	"math"
	"testing"

	"rimfall/pipeflow"
	"rimfall/pipeflow/sectiontest"
)

// TestEverySection holds each shape against the common suite. Dimensions are round numbers near pipes that are made.
func TestEverySection(t *testing.T) {
	shapes := map[string]sectiontest.Shape{
		"a circle": {
			New:      func(k float64) (pipeflow.Section, error) { return pipeflow.NewCircle(1.5 * k) },
			FullArea: math.Pi * 1.5 * 1.5 / 4, FullPerimeter: math.Pi * 1.5, Upright: true,
		},
		"a box": {
			New:      func(k float64) (pipeflow.Section, error) { return pipeflow.NewBox(8*k, 6*k) },
			FullArea: 48, FullPerimeter: 28, Upright: true,
		},
		"a haunched box": {
			New:      func(k float64) (pipeflow.Section, error) { return pipeflow.NewHaunchedBox(8*k, 6*k, 0.5*k) },
			FullArea: 48 - 4*0.125, FullPerimeter: 28 - 8*0.5 + 4*0.5*math.Sqrt2, Upright: true,
		},
		"a haunched box without haunches": {
			New:      func(k float64) (pipeflow.Section, error) { return pipeflow.NewHaunchedBox(8*k, 6*k, 0) },
			FullArea: 48, FullPerimeter: 28, Upright: true,
		},
		"a lying ellipse": {
			New:      func(k float64) (pipeflow.Section, error) { return pipeflow.NewEllipse(60*k, 38*k) },
			FullArea: math.Pi / 4 * 60 * 38, Upright: true,
		},
		"an upright ellipse": {
			New:      func(k float64) (pipeflow.Section, error) { return pipeflow.NewEllipse(38*k, 60*k) },
			FullArea: math.Pi / 4 * 60 * 38, Upright: true,
		},
		"an arch whose corner arcs are the widest": {
			New:     func(k float64) (pipeflow.Section, error) { return pipeflow.NewArch(36*k, 22*k, 51*k, 0, 6*k) },
			Upright: true,
		},
		"an arch with a round crown": {
			New:     func(k float64) (pipeflow.Section, error) { return pipeflow.NewArch(36*k, 28*k, 51*k, 0, 6*k) },
			Upright: true,
		},
		"a lying oval of arcs": {
			New: func(k float64) (pipeflow.Section, error) {
				s, _, err := pipeflow.NewOval(60*k, 38*k, 0, 14*k)
				return s, err
			},
			Upright: true,
		},
		"an upright oval of arcs": {
			New: func(k float64) (pipeflow.Section, error) {
				s, _, err := pipeflow.NewOval(38*k, 60*k, 14*k, 0)
				return s, err
			},
			Upright: true,
		},
		"a trapezoid": {
			New: func(k float64) (pipeflow.Section, error) { return pipeflow.NewTrapezoid(3*k, 2, 1.5) },
		},
		"a triangle": {
			New:     func(k float64) (pipeflow.Section, error) { return pipeflow.NewTriangle(3, 3) },
			Upright: true,
		},
		"a rectangle": {
			New:     func(k float64) (pipeflow.Section, error) { return pipeflow.NewRectangle(16 * k) },
			Upright: true,
		},
		"a parabola": {
			New:     func(k float64) (pipeflow.Section, error) { return pipeflow.NewParabola(4*k, 1*k) },
			Upright: true,
		},
		"a ground line with a bench and two lows": {New: func(k float64) (pipeflow.Section, error) {
			return pipeflow.NewGround([]pipeflow.Point{
				{Station: 0, Elevation: 105 * k},
				{Station: 4 * k, Elevation: 101 * k},
				{Station: 6 * k, Elevation: 100 * k},
				{Station: 8 * k, Elevation: 100.5 * k},
				{Station: 8 * k, Elevation: 102 * k},
				{Station: 15 * k, Elevation: 101.5 * k},
				{Station: 20 * k, Elevation: 106 * k},
			})
		}},
	}
	for name, shape := range shapes {
		t.Run(name, func(t *testing.T) { sectiontest.Run(t, shape) })
	}
}

// TestShapesThatCoincide: the same inside made in two ways has the same geometry and the same depths.
func TestShapesThatCoincide(t *testing.T) {
	bank := []pipeflow.Point{
		{Station: 0, Elevation: 14}, {Station: 8, Elevation: 10}, {Station: 11, Elevation: 10}, {Station: 19, Elevation: 14},
	}
	for name, pair := range map[string][2]pipeflow.Section{
		"an ellipse of equal axes is a circle": {must(pipeflow.NewEllipse(1.5, 1.5)), must(pipeflow.NewCircle(1.5))},
		"a haunch of 0 leaves a box":           {must(pipeflow.NewHaunchedBox(3, 2, 0)), must(pipeflow.NewBox(3, 2))},
		"a channel below a roof is a box":      {must(pipeflow.NewBox(3, 2)), must(pipeflow.NewRectangle(3))},
		"a triangle has no bottom":             {must(pipeflow.NewTriangle(1, 2)), must(pipeflow.NewTrapezoid(0, 2, 1))},
		"a surveyed trapezoid is a trapezoid":  {must(pipeflow.NewGround(bank)), must(pipeflow.NewTrapezoid(3, 2, 2))},
	} {
		for _, y := range []float64{1e-6, 0.01, 0.3, 0.7, 1.3, 1.49} {
			a, b := pair[0].At(y), pair[1].At(y)
			flow := sewer.Flow(pair[0], y)
			normal, _ := sewer.NormalDepth(pair[1], flow)
			lower, _ := sewer.NormalDepth(pair[0], flow)
			critical, _ := pipeflow.CriticalDepth(pair[0], gravity, flow)
			other, _ := pipeflow.CriticalDepth(pair[1], gravity, flow)
			if !near(a.Area, b.Area, 1e-14) || !near(a.Perimeter, b.Perimeter, 1e-14) || !near(a.TopWidth, b.TopWidth, 1e-14) ||
				!near(pair[0].Moment(y), pair[1].Moment(y), 1e-14) || !near(lower, normal, 1e-11) || !near(critical, other, 1e-12) {
				t.Errorf("%s: depth %v: %+v and %+v, normal depths %v, %v, critical depths %v, %v",
					name, y, a, b, lower, normal, critical, other)
			}
		}
	}
}
