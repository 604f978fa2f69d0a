package drawing

import (
	"math"
	"slices"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
)

// Columns of a table are moved apart as little as can be: no other arrangement that keeps the gaps and the bounds has a
// smaller sum of squared moves, tried against random ones.
func TestSpreadKeepsGapsAndBoundsAndMovesTheLeast(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := rapid.IntRange(1, 8).Draw(t, "columns")
		gap := rapid.SliceOfN(rapid.Float64Range(0, 10), n-1, n-1).Draw(t, "gaps")
		places := rapid.SliceOfN(rapid.Float64Range(0, 100), n, n).Draw(t, "places")
		slices.Sort(places)
		got := spread(places, gap, 0, 100)
		other := arrangement(rapid.SliceOfN(rapid.Float64Range(0, 100), n, n).Draw(t, "other"), gap)
		const room = 1e-9 // of sums of a few numbers up to 100
		for i, x := range got {
			if x < -room || x > 100+room || i > 0 && x < got[i-1]+gap[i-1]-room {
				t.Fatalf("%v does not keep gaps %v between 0 and 100", got, gap)
			}
		}
		if other[n-1] <= 100 && moves(places, got) > moves(places, other)*(1+1e-12)+room {
			t.Fatalf("%v moves more than %v", got, other)
		}
	})
}

// arrangement is some arrangement that keeps the gaps and begins at 0 or above.
func arrangement(places, gap []float64) []float64 {
	slices.Sort(places)
	for i := 1; i < len(places); i++ {
		places[i] = max(places[i], places[i-1]+gap[i-1])
	}
	return places
}

func moves(a, b []float64) float64 {
	sum := 0.0
	for i := range a {
		sum += (a[i] - b[i]) * (a[i] - b[i])
	}
	return sum
}

func TestSpreadLeavesPlacesThatAreFarEnoughApart(t *testing.T) {
	got := spread([]float64{10, 30, 60}, []float64{15, 15}, 0, 100)
	if !slices.Equal(got, []float64{10, 30, 60}) {
		t.Errorf("moved to %v", got)
	}
	for _, c := range []struct{ places, want []float64 }{
		{[]float64{10, 10}, []float64{6, 14}},
		{[]float64{97, 99}, []float64{92, 100}}, // not beyond the upper end
		{[]float64{1, 2}, []float64{0, 8}},      // nor the lower one
	} {
		if got := spread(c.places, []float64{8}, 0, 100); !slices.Equal(got, c.want) {
			t.Errorf("%v go to %v, want %v", c.places, got, c.want)
		}
	}
}

func TestTurnedShapesMeetOnlyWhereTheyOverlap(t *testing.T) {
	slanting := band(Point{0, 0}, Point{10, 10}, 1)
	for _, c := range []struct {
		name string // a sentence
		box  Box
		want bool
	}{
		{"a box in the corner of the box around a slanting line is free", Box{6, 0, 9, 3}, false},
		{"a box on the line meets it", Box{4, 4, 6, 6}, true},
		{"a box that only touches the end does not overlap", Box{10.36, 10.36, 12, 12}, false},
		{"a box that holds the line meets it", Box{-5, -5, 20, 20}, true},
	} {
		t.Run(c.name, func(t *testing.T) {
			if got := slanting.meets(c.box.quad()); got != c.want || c.box.quad().meets(slanting) != c.want {
				t.Errorf("meets: %v, want %v", got, c.want)
			}
		})
	}
}

func TestALabelFindsTheFirstFreePlaceThatCrossesTheFewestLines(t *testing.T) {
	at := func(y float64) spot {
		return spot{labels: []Label{{At: Point{10, y}, Text: "label", Size: 3}}}
	}
	p := newPlacer(Box{0, 0, 50, 50})
	p.take(Box{5, 5, 30, 15})
	p.passLine(Point{0, 29}, Point{50, 29})
	got, ok := p.choose([]spot{at(10), at(30), at(40)}, []spot{at(48)})
	if !ok || got.labels[0].At.Y != 40 {
		t.Errorf("placed at %v", got.labels)
	}
	if _, ok := p.choose([]spot{at(40), at(52)}); ok {
		t.Error("a label stands on another one, or outside the area")
	}
}

// forest draws trees that run down to outfalls 0 … roots-1; a structure leads to one with a lower number.
func forest(t *rapid.T) *network.Network {
	roots := rapid.IntRange(1, 3).Draw(t, "outfalls")
	count := rapid.IntRange(roots+1, 40).Draw(t, "structures")
	n := &network.Network{Structures: make([]network.Structure, count)}
	for s := range count {
		if s < roots {
			n.Structures[s].Kind = network.Outfall
			continue
		}
		n.Pipes = append(n.Pipes, network.Pipe{
			From: network.StructureIndex(s), To: network.StructureIndex(rapid.IntRange(0, s-1).Draw(t, "to")),
			Length: rapid.Float64Range(1, 100).Draw(t, "length"),
		})
	}
	n.Connect()
	return n
}

func TestLinesShowEveryPipeOnceAndTheFirstIsTheLongestWay(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := forest(t)
		seen := make([]int, len(n.Pipes))
		all := lines(n)
		for _, l := range all {
			for i, p := range l.pipes {
				seen[p]++
				pipe := &n.Pipes[p]
				if pipe.To != l.structures[i] || pipe.From != l.structures[i+1] || l.stations[i+1] != l.stations[i]+pipe.Length {
					t.Fatalf("line %s: pipe %d does not follow", l.name, p)
				}
			}
		}
		for p, times := range seen {
			if times != 1 {
				t.Fatalf("pipe %d stands on %d lines", p, times)
			}
		}
		longest := 0.0
		for s := range n.Structures {
			if way, outfall := wayDown(n, network.StructureIndex(s)); outfall == all[0].structures[0] {
				longest = max(longest, way)
			}
		}
		if got := all[0].stations[len(all[0].stations)-1]; math.Abs(got-longest) > 1e-9 {
			t.Fatalf("line A is %v long, the longest way to its outfall %v", got, longest)
		}
	})
}

// wayDown walks from a structure to its outfall.
func wayDown(n *network.Network, s network.StructureIndex) (length float64, outfall network.StructureIndex) {
	for len(n.PipesOut(s)) > 0 {
		p := &n.Pipes[n.PipesOut(s)[0]]
		length, s = length+p.Length, p.To
	}
	return length, s
}

func TestLinesAreLetteredOnAfterZ(t *testing.T) {
	var got []string
	for _, i := range []int{0, 25, 26, 51, 52, 701, 702} {
		got = append(got, letters(i))
	}
	if want := "A Z AA AZ BA ZZ AAA"; strings.Join(got, " ") != want {
		t.Errorf("%v, want %s", got, want)
	}
}

func TestMillimetresAreWrittenShortAndNeverAsMinusZero(t *testing.T) {
	for v, want := range map[float64]string{0: "0", -0.001: "0", 12.345678: "12.35", -1.5: "-1.5", 431.8: "431.8", 1e-9: "0"} {
		if got := number(v); got != want {
			t.Errorf("number(%v) = %q, want %q", v, got, want)
		}
	}
}

func TestTextsAreCutAndWrappedToTheirWidth(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		text := rapid.StringMatching(`[A-Za-z0-9 .,-]{0,60}`).Draw(t, "text")
		width := rapid.Float64Range(5, 60).Draw(t, "width")
		if got := Shorten(text, 2.6, width, false); TextWidth(got, 2.6, false) > width {
			t.Fatalf("%q is wider than %v", got, width)
		}
		lines := wrap(text, 2.6, width)
		for i, l := range lines {
			if strings.Contains(l, " ") && TextWidth(l, 2.6, false) > width {
				t.Fatalf("line %d, %q, is wider than %v", i, l, width)
			}
		}
	})
}

// A grade line is cut off where it leaves the drawing, at the very height, and comes back where it returns.
func TestALineIsCutOffAtTheUpperEdge(t *testing.T) {
	got := cutAbove([]Point{{0, 20}, {10, 0}, {20, 0}, {30, 40}, {40, 40}}, 10)
	want := [][]Point{{{0, 20}, {5, 10}}, {{22.5, 10}, {30, 40}, {40, 40}}}
	if len(got) != 2 || !slices.Equal(got[0], want[0]) || !slices.Equal(got[1], want[1]) {
		t.Errorf("%v, want %v", got, want)
	}
	if got := cutAbove([]Point{{0, 1}, {5, 2}}, 10); len(got) != 0 {
		t.Errorf("%v of a line that is above from end to end", got)
	}
}
