package catalog

import (
	"math"
	"strings"
	"testing"
)

// Walls of round concrete pipe as a pipe maker quotes ASTM C76: wall B D/12 + 1 in, wall C D/12 + 1.75 in, 12 to 96 in,
// with 60 in printed as 6 and 6.75 in.
func TestTheWallOfRoundConcreteIsTheQuotedOne(t *testing.T) {
	cases := []struct {
		name     string
		material string
		size     float64
		want     float64
	}{
		{"60 in, the printed row", "concrete", 60, 6},
		{"12 in by the rule", "concrete", 12, 2},
		{"27 in by the rule", "concrete", 27, 3.25},
		{"96 in by the rule", "concrete", 96, 9},
		{"no material is concrete", "", 36, 4},
		{"concrete cast in place takes the sizes of concrete", "concrete-cast-in-place", 36, 4},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			got, ok := Wall(US, c.material, Circle, c.size, c.size)
			if !ok || got != c.want {
				t.Errorf("wall of %g in: %g, %v, want %g in", c.size, got, ok, c.want)
			}
		})
	}
	if c := wallOfSeries(t, "reinforced concrete, wall C", 60); c != 6.75 {
		t.Errorf("wall C of 60 in: %g, want 6.75 in", c)
	}
}

func wallOfSeries(t *testing.T, series string, size float64) float64 {
	t.Helper()
	for _, s := range Sizes(US, Circle) {
		if s.Series == series && s.Rise == size {
			return s.Wall
		}
	}
	t.Fatalf("no size %g in series %q", size, series)
	return 0
}

func TestASizeThatIsNotListedHasNoWall(t *testing.T) {
	cases := []struct {
		name, units, material string
		shape                 Shape
		span, rise            float64
	}{
		{"a size between the standard ones", US, "concrete", Circle, 37, 37},
		{"the rise of one size with the span of another", US, "concrete", Ellipse, 60, 43},
		{"a material built to order", US, "brick", Circle, 36, 36},
		{"a shape that the material is not made in", US, "pvc", Ellipse, 60, 38},
		{"a material with sizes but no walls listed", US, "clay", Circle, 12, 12},
		{"a size of the other unit", SI, "concrete", Circle, 36, 36},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			if wall, ok := Wall(c.units, c.material, c.shape, c.span, c.rise); ok {
				t.Errorf("got a wall of %g", wall)
			}
		})
	}
}

func TestASizeIsFoundAfterAConversionThereAndBack(t *testing.T) {
	for _, units := range []string{US, SI} {
		per, _ := perUnit(units)
		for _, s := range Standard().sizes {
			if s.Units != units {
				continue
			}
			span, rise := s.Span/per*per, s.Rise/per*per
			found, ok := Find(units, s.Material, s.Shape, span, rise)
			if !ok || found.Span != s.Span || found.Rise != s.Rise {
				t.Fatalf("%s %s %s: found %v, %v", units, s.Shape, s.Label(), found, ok)
			}
		}
	}
}

func TestTheDefaultSizesAreTheRoundConcreteOnes(t *testing.T) {
	us, si := Default(US), Default(SI)
	if us[0].Rise != 12 || us[len(us)-1].Rise != 144 || si[0].Rise != 300 || si[len(si)-1].Rise != 3000 {
		t.Errorf("us %g to %g, si %g to %g", us[0].Rise, us[len(us)-1].Rise, si[0].Rise, si[len(si)-1].Rise)
	}
	for _, list := range [][]Size{us, si} {
		for i, s := range list {
			if s.Series != "reinforced concrete, wall B" || !s.HasWall {
				t.Errorf("%s is of series %q, wall %v", s.Label(), s.Series, s.HasWall)
			}
			if i > 0 && s.Rise <= list[i-1].Rise {
				t.Errorf("%s after %s", s.Label(), list[i-1].Label())
			}
		}
	}
	if len(Default("furlongs")) != 0 {
		t.Error("sizes in an unknown unit")
	}
}

func TestEveryRowIsCompleteAndItsSectionStands(t *testing.T) {
	for _, s := range Sizes("", "") {
		if s.Standard == "" || s.Source == "" || s.Series == "" {
			t.Errorf("%s %s has no standard, source or series", s.Shape, s.Label())
		}
		section, err := s.Section()
		if err != nil {
			t.Errorf("%s %s %s: %v", s.Units, s.Shape, s.Label(), err)
			continue
		}
		per, _ := perUnit(s.Units)
		span, rise := s.Span/per, s.Rise/per
		if !near(section.Span(), span, 1e-12) || !near(section.Rise(), rise, 1e-12) {
			t.Errorf("%s %s: section %g x %g", s.Shape, s.Label(), section.Span(), section.Rise())
		}
		// Every inside lies within its box and holds the rhombus of its span and rise.
		if a := section.At(rise).Area; a > span*rise*(1+1e-12) || a < span*rise/2 {
			t.Errorf("%s %s: area %g", s.Shape, s.Label(), a)
		}
	}
}

func near(got, want, relative float64) bool {
	return math.Abs(got-want) <= relative*math.Abs(want)
}

func TestSizesAscendByRiseThenSpan(t *testing.T) {
	for _, shape := range Shapes() {
		for _, units := range []string{US, SI} {
			list := Sizes(units, shape)
			if len(list) == 0 {
				t.Errorf("no %s in %s", shape, units)
			}
			for i := 1; i < len(list); i++ {
				if byRise(list[i-1], list[i]) > 0 {
					t.Errorf("%s %s before %s", shape, list[i-1].Label(), list[i].Label())
				}
			}
		}
	}
}

// The three agencies' tables are named at the head of materials.csv.
func TestRoughnessIsTheAgenciesAndLiesInItsRange(t *testing.T) {
	want := map[string]float64{
		"concrete":             0.013, // Winchester table 4
		"hdpe":                 0.012, // HDM table 851.2, plastic smooth interior
		"corrugated-metal":     0.024, // Winchester table 4, annular unpaved
		"corrugated-metal-3x1": 0.028, // HDM table 851.2
		"clay":                 0.013, // HDM table 851.2
		"brick":                0.015, // Winchester table 4
	}
	for name, n := range want {
		if m, ok := MaterialByName(name); !ok || m.N != n {
			t.Errorf("%s: n %g, %v, want %g", name, m.N, ok, n)
		}
	}
	for _, m := range Materials() {
		if m.Low <= 0 || m.Low > m.N || m.N > m.High || m.Source == "" {
			t.Errorf("%s: %g not in %g to %g, or no source", m.Name, m.N, m.Low, m.High)
		}
		if m.SizesOf != "" && (m.Series == "" || len(ForMaterial(US, m.Name, Circle)) == 0) {
			t.Errorf("%s has no round sizes", m.Name)
		}
	}
	if _, ok := MaterialByName("Concrete"); ok {
		t.Error("a name in capitals was taken")
	}
}

func TestAUsersSeriesIsChosenFromAndReplacesItsNamesake(t *testing.T) {
	own, faults := Parse(strings.NewReader("shape,series,span,wall\ncircle,stock yard,18,3\ncircle,\"reinforced concrete, wall C\",24,5\n"), US)
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	c := Standard().With(own)
	if list := c.Default(US); len(list) != 1 || list[0].Rise != 18 {
		t.Errorf("sizes to choose from: %v", list)
	}
	if wall, ok := c.Wall(US, "concrete", Circle, 36, 36); !ok || wall != 4 {
		t.Errorf("a standard size that the user's list has not: wall %g, %v", wall, ok)
	}
	for _, s := range c.Sizes(US, Circle) {
		if s.Series == "reinforced concrete, wall C" && s.Rise != 24 {
			t.Errorf("%s is still in the series that was replaced", s.Label())
		}
	}
	if wall, _ := Wall(US, "concrete", Circle, 18, 18); wall != 2.5 {
		t.Errorf("the standard catalogue has changed: %g", wall)
	}
}

func TestAnArchIsFoundByItsSizeWhateverItsMaterial(t *testing.T) {
	cases := []struct {
		name, material string
		shape          Shape
		span, rise     float64
		series         string
	}{
		{"a pipe-arch without material", "", PipeArch, 57, 38, "corrugated metal pipe-arch 2-2/3 x 1/2 in"},
		{"a pipe-arch of another corrugation", "corrugated-metal", PipeArch, 58.5, 48.5, "corrugated metal pipe-arch 3 x 1 in"},
		{"an arch without material", "", Arch, 58.5, 36, "arch reinforced concrete"},
		{"an arch of cast iron", "cast-iron", Arch, 58.5, 36, "arch reinforced concrete"},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			if s, ok := Find(US, c.material, c.shape, c.span, c.rise); !ok || s.Series != c.series {
				t.Errorf("%q, %v, want %q", s.Series, ok, c.series)
			}
		})
	}
	if list := ForMaterial(US, "", PipeArch); len(list) != 12 {
		t.Errorf("%d pipe-arches to choose from", len(list))
	}
}

func TestTheZeroCatalogIsEmpty(t *testing.T) {
	var c Catalog
	if _, ok := c.Wall(US, "", Circle, 12, 12); ok || len(c.Sizes("", "")) > 0 || len(c.Default(US)) > 0 {
		t.Error("the zero catalogue has sizes")
	}
}

func TestTheNearestListedSizeIsOffered(t *testing.T) {
	cases := []struct {
		name       string
		shape      Shape
		span, rise float64
		want       string
	}{
		{"a diameter between two sizes", Circle, 37, 37, "36"},
		{"an arch with its span rounded", Arch, 58, 36, "58.5x36"},
		{"a diameter far over the largest", Circle, 900, 900, "144"},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			if s, ok := Nearest(US, "", c.shape, c.span, c.rise); !ok || s.Label() != c.want {
				t.Errorf("%s, %v, want %s", s.Label(), ok, c.want)
			}
		})
	}
	if _, ok := Nearest(US, "brick", Circle, 36, 36); ok {
		t.Error("a size of brick, which is in no list")
	}
}
