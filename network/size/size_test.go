package size_test

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/size"
)

func TestTheSmallestSizeThatCarriesTheFlowWhereItLiesIsTaken(t *testing.T) {
	hold(t, []sizingCase{
		{
			// 12 in on the ground's 2 %: 35.6280 · 0.141421 = 5.0385 cfs.
			"the smallest just carries", pipeAB, 5.038, rims(100, 98), chosen{12, 97.83, 95.83},
		},
		{
			// 15 in, wall 2.25 in: 100 − 1 − 0.1875 − 1.25 = 97.5625 → 97.56, and 2 %.
			"the smallest just falls short", pipeAB, 5.039, rims(100, 98), chosen{15, 97.56, 95.56},
		},
		{
			// On level ground each size lies on its own slope for 3 ft/s and carries 3 · A: 12 in 2.356 cfs, 15 in 3.682 cfs.
			// 15 in: S = (0.039/(1.486 · 0.3125^(2/3)))² = 0.0032480; 97.56 − 0.32480 = 97.2352 → 97.23.
			"every size is tried on its own slope", pipeAB, 3, nil, chosen{15, 97.56, 97.23},
		},
		{
			// A circle half full carries half: 12 in 2.5193 cfs.
			"a depth ratio of a half takes half the capacity", pipeAB, 2.519,
			func(s *situation) { rims(100, 98)(s); s.criteria.MaxDepthRatio = 0.5 },
			chosen{12, 97.83, 95.83},
		},
		{
			"and no more than half", pipeAB, 2.52,
			func(s *situation) { rims(100, 98)(s); s.criteria.MaxDepthRatio = 0.5 },
			chosen{15, 97.56, 95.56},
		},
		{
			// 0.94 of the diameter would carry 1.0757 of full; it is never counted on.
			"the largest discharge under the crown is not counted on", pipeAB, 5.039,
			func(s *situation) { rims(100, 98)(s); s.criteria.MaxDepthRatio = 0.94 },
			chosen{15, 97.56, 95.56},
		},
		{
			// Two barrels of 12 in carry 10.077 cfs.
			"barrels carry together", pipeAB, 10, func(s *situation) { rims(100, 98)(s); s.network.Pipes[pipeAB].Count = 2 },
			chosen{12, 97.83, 95.83},
		},
		{
			// 24 in, wall 3 in: 100 − 1 − 0.25 − 2 = 96.75, and 2 %.
			"the least size of the criteria holds", pipeAB, 1,
			func(s *situation) { rims(100, 98)(s); s.criteria.MinRise = 2 },
			chosen{24, 96.75, 94.75},
		},
		{
			"nothing flows", pipeAB, 0, nil, chosen{12, 97.83, 97.39},
		},
	})
}

func TestSizesDoNotFallInTheDirectionOfFlow(t *testing.T) {
	hold(t, []sizingCase{
		{
			// 24 in enter at 90: out 24 in at 89.90, S = 0.0017357 for 3 ft/s: 89.90 − 0.17357 → 89.72.
			"a small flow below a large pipe", pipeBC, 1, func(s *situation) { s.enters(24, 90) }, chosen{24, 89.9, 89.72},
		},
		{
			// 18 in are 1.7671 ft². Two of 12 in are 1.5708, two of 15 in 2.4544 ft².
			// 15 in enter under the crown of 18 in: 90 + 1.5 − 1.25 = 90.25, so the least fall governs: 89.90 − 0.32480 → 89.57.
			"barrels are added up against the largest pipe in", pipeBC, 1,
			func(s *situation) { s.enters(18, 90); s.network.Pipes[pipeBC].Count = 2 },
			chosen{15, 89.9, 89.57},
		},
		{
			// Of two pipes out of B each may be smaller.
			"below a split they may", pipeBC, 1,
			func(s *situation) {
				s.enters(24, 90)
				s.network.Pipes[pipeBC].Share = network.Some(0.5)
				s.network.Pipes = append(s.network.Pipes, s.network.Pipes[pipeBC])
			},
			chosen{12, 89.9, 89.46},
		},
	})
}

func TestWhatCannotBeKeptIsRemarked(t *testing.T) {
	for _, c := range []struct {
		name string
		flow float64
		set  func(s *situation)
		want chosen
		kind size.RemarkKind
		// value and limit of the remark
		value, limit float64
	}{
		{
			// 18 in is the largest: 100 − 1 − 0.20833 − 1.5 = 97.29167, 2 %; it carries
			// 1.486/0.013 · 1.767146 · 0.375^(2/3) · √0.02 = 14.8554 cfs.
			"no size carries the flow, and the largest is taken", 16,
			func(s *situation) { rims(100, 98)(s); s.sizes = []float64{12, 15, 18} },
			chosen{18, 97.29, 95.29},
			size.NoSizeCarries, 16, 14.8554,
		},
		{
			// The crossing service is at 98.00, cover allows 97.8333. 98 − 0.43736 = 97.56264.
			"a lowest invert is above what cover allows", 2,
			func(s *situation) { s.network.Structures[structureA].LowestInvert = network.Some(98) },
			chosen{12, 98, 97.56},
			size.BoundsCross, 98, 97.83333,
		},
		{
			// 98.00 + 0.10 is above the 97.8333 of the cover: the lower bound wins, and the pipe has its least slope:
			// 98.10 + 0.43736 = 98.53736 → 98.54.
			"a given invert downstream is above what cover allows", 2,
			func(s *situation) { s.network.Pipes[pipeBC].InvertUpper = network.Some(98) },
			chosen{12, 98.54, 98.1},
			size.BoundsCross, 98.54, 97.83333,
		},
	} {
		t.Run(c.name, func(t *testing.T) {
			s := level()
			c.set(&s)
			p, remarks := s.choose(pipeAB, c.flow)
			if p.Size.Rise != c.want.size || math.Abs(p.InvertUpper.V-c.want.upper) > 1e-9 || math.Abs(p.InvertLower.V-c.want.lower) > 1e-9 {
				t.Errorf("%g in from %.4f to %.4f, want %+v", p.Size.Rise, p.InvertUpper.V, p.InvertLower.V, c.want)
			}
			if len(remarks) != 1 || remarks[0].Pipe != pipeAB || remarks[0].Kind != c.kind ||
				math.Abs(remarks[0].Value-c.value) > 1e-4 || math.Abs(remarks[0].Limit-c.limit) > 1e-4 {
				t.Errorf("remarks %+v, want kind %d, %g against %g", remarks, c.kind, c.value, c.limit)
			}
		})
	}
}

// A larger catalogue holds all sizes of the smaller one. Where some size of the
// smaller carries the flow, the larger gives none that is larger. (Where none
// does, the largest is taken, and a larger catalogue has a larger one.)
func TestALargerCatalogueNeverGivesALargerPipe(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		slope := math.Pow(10, rapid.Float64Range(-3, -1).Draw(t, "power of the slope"))
		flow := math.Pow(10, rapid.Float64Range(-1, 2.5).Draw(t, "power of the flow"))
		upstream := rapid.SampledFrom([]float64{0, 12, 24, 36, 48}).Draw(t, "upstream size")
		chosen := func(sizes []float64) (*network.Pipe, []size.Remark) {
			s := level()
			s.sizes = sizes
			s.network.Pipes[pipeBC].Slope = network.Some(slope)
			if upstream > 0 {
				s.enters(upstream, 80)
			}
			return s.choose(pipeBC, flow)
		}
		var few, many []float64
		for d := 12.0; d <= 96; d += 3 {
			if rapid.Bool().Draw(t, "listed") {
				many = append(many, d)
				if rapid.Bool().Draw(t, "in the smaller list too") {
					few = append(few, d)
				}
			}
		}
		few, many = append(few, 120), append(many, 120)
		small, remarks := chosen(few)
		if large, _ := chosen(many); len(remarks) == 0 && large.FullArea() > small.FullArea() {
			t.Fatalf("%g in from %v, %g in from %v", small.Size.Rise, few, large.Size.Rise, many)
		}
	})
}

// Whatever is blank, the levels that come out hold every bound, unless a remark says which gave way.
func TestChosenLevelsHoldEveryBound(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := level()
		level := func(name string, low, high float64) network.Maybe {
			return network.Some(rapid.Float64Range(low, high).Draw(t, name))
		}
		s.network.Structures[structureA].Rim = level("rim of A", 90, 110)
		s.network.Structures[structureB].Rim = level("rim of B", 90, 110)
		s.criteria.MaxSlope = rapid.Float64Range(0.02, 0.2).Draw(t, "greatest slope")
		anyVelocity := rapid.Bool().Draw(t, "any velocity is allowed")
		if anyVelocity {
			s.criteria.MaxVelocity = 1e6
		}
		if rapid.Bool().Draw(t, "an upper invert is given") {
			s.network.Pipes[pipeAB].InvertUpper = level("upper invert", 80, 100)
		}
		given := s.network.Pipes[pipeAB].InvertUpper.OK
		flow := rapid.Float64Range(0, 200).Draw(t, "flow")
		p, remarks := s.choose(pipeAB, flow)
		for _, r := range remarks {
			if r.Kind == size.BoundsCross {
				t.Fatal("no lower bound was set, and a remark says that one holds")
			}
		}
		const room = 1e-6
		if cover := s.network.Cover(p, network.Upper); !given && cover.V < 1-room {
			t.Errorf("cover at the upper end %v", cover.V)
		}
		// Manning full at the cleansing velocity. Where water is too fast even on that slope, no slope serves, and the
		// rounding of the lower invert may go to either side of it: a hundredth of a foot.
		root := 0.013 * 3 / (1.486 * math.Pow(p.Section.Rise()/4, 2.0/3))
		need, step := max(0.001, root*root), 0.01/p.Length
		if p.Slope.V < need-step {
			t.Errorf("slope %v, needed %v", p.Slope.V, need)
		}
		if p.Slope.V > max(s.criteria.MaxSlope, need)+step {
			t.Errorf("slope %v, greatest %v", p.Slope.V, s.criteria.MaxSlope)
		}
		if cover := s.network.Cover(p, network.Lower); anyVelocity && p.Slope.V < s.criteria.MaxSlope-step && cover.V < 1-room {
			t.Errorf("cover at the lower end %v, on a slope of %v that could be steeper", cover.V, p.Slope.V)
		}
	})
}
