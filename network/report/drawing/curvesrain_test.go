package drawing

import (
	"math"
	"os"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network/rain"
)

func TestRainCurvesOfEveryFileStayOnTheSheet(t *testing.T) {
	entries, err := os.ReadDir("../../../testdata/rainfall")
	if err != nil {
		t.Fatal(err)
	}
	for _, e := range entries {
		text, err := os.ReadFile("../../../testdata/rainfall/" + e.Name())
		if err != nil || e.Name()[0] == '.' {
			continue
		}
		s, err := rain.Read([]rain.Content{{Name: e.Name(), Text: text}}, rain.Options{})
		if err != nil {
			t.Fatal(err)
		}
		a := rainAxes(s.Table)
		for row, d := range s.Table.Durations {
			for _, i := range s.Table.Values[row] {
				p := a.at(d, i)
				if p.X < rainRoom.Left-1e-9 || p.X > rainRoom.Right+1e-9 || p.Y < rainRoom.Top-1e-9 || p.Y > rainRoom.Bottom+1e-9 {
					t.Errorf("%s: %v min, %v lies at %v", e.Name(), d, i, p)
				}
			}
		}
		first, second := RainCurves(s).Bytes(), RainCurves(s).Bytes()
		if string(first) != string(second) {
			t.Errorf("%s is drawn in two ways", e.Name())
		}
	}
}

func TestNamesAreMovedApartAndKeepTheirOrder(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		points := make([]Point, rapid.IntRange(1, 12).Draw(t, "curves"))
		for k := range points {
			points[k].Y = rapid.Float64Range(0, 5).Draw(t, "step")
			if k > 0 {
				points[k].Y += points[k-1].Y
			}
		}
		heights := spreadDown(points, 3)
		mean, given := 0.0, 0.0
		for k := range points {
			if k > 0 && heights[k]-heights[k-1] < 3-1e-9 {
				t.Fatalf("names %d and %d are %v apart", k-1, k, heights[k]-heights[k-1])
			}
			mean, given = mean+heights[k], given+points[k].Y
		}
		if math.Abs(mean-given) > 1e-6 { // blocks stand round the mean of their points
			t.Fatalf("the names have moved by %v on the whole", mean-given)
		}
	})
}
