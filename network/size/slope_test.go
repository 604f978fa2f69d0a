package size_test

import (
	"math"
	"testing"

	"rimfall/network"
	"rimfall/network/units"
)

// metric turns the situation to metres, with the limits of a metric job.
func (s *situation) metric() {
	s.units, s.sizes = units.SI, []float64{300, 375, 450}
	s.criteria.MinCover, s.criteria.LeastFall, s.criteria.MinRise = network.Some(0.3), 0.03, 0.3
	s.criteria.MinVelocity, s.criteria.MaxVelocity = 0.9, 4.5
}

// rims sets the levels of the ground at A and B.
func rims(a, b float64) func(s *situation) {
	return func(s *situation) {
		s.network.Structures[structureA].Rim, s.network.Structures[structureB].Rim = network.Some(a), network.Some(b)
	}
}

// halfFull is the flow of a 12 in pipe half full on a slope: half of 35.6280 √S,
// since A is half and R the same as full.
func halfFull(slope float64) float64 {
	return 0.5 * 1.486 / 0.013 * math.Pi / 4 * math.Pow(0.25, 2.0/3) * math.Sqrt(slope)
}

func TestTheSlopeIsTheGroundsOrTheLeastThatServes(t *testing.T) {
	hold(t, []sizingCase{
		{
			// 2 % of ground: 97.83 − 2.00. Cover at B: 98 − 95.83 − 1.1667 = 1.0033.
			"the ground's where it serves", pipeAB, 3, rims(100, 98), chosen{12, 97.83, 95.83},
		},
		{
			// The ground falls 0.2 %, 3 ft/s need 0.43736 %.
			"the cleansing velocity's on flatter ground", pipeAB, 2, rims(100, 99.8), chosen{12, 97.83, 97.39},
		},
		{
			// Ground that rises: the cleansing velocity's all the same.
			"the cleansing velocity's on rising ground", pipeAB, 2, rims(100, 103), chosen{12, 97.83, 97.39},
		},
		{
			"the least of the criteria where no velocity is asked for", pipeAB, 1,
			func(s *situation) { s.criteria.MinVelocity = 0 },
			chosen{12, 97.83, 97.73},
		},
		{
			"the least of the criteria where a rim is blank", pipeAB, 1,
			func(s *situation) {
				s.criteria.MinVelocity = 0
				s.network.Structures[structureB].Rim = network.Maybe{}
			},
			chosen{12, 97.83, 97.73},
		},
		{
			// The upper invert is given at 98.00 under a blank rim; B at 98.5 asks for 98.5 − 2.16667 = 96.3333.
			"cover at the lower end", pipeAB, 3,
			func(s *situation) {
				rims(0, 98.5)(s)
				s.network.Structures[structureA].Rim = network.Maybe{}
				s.network.Pipes[pipeAB].InvertUpper = network.Some(98)
			},
			chosen{12, 98, 96.33},
		},
		{
			// No cover is asked for where the pipe comes to light: the ground there is 97, but the slope stays the least.
			"no cover at an outfall", pipeBC, 2,
			func(s *situation) { s.network.Structures[2].Rim = network.Some(100) },
			chosen{12, 97.83, 97.39},
		},
		{
			// Half full, V = 3 ft/s at 0.39270 ft²: the flow of 1.1781 cfs makes it on S = 0.0043736.
			"the cleansing velocity at design depth", pipeAB, 3 * math.Pi / 8,
			func(s *situation) { s.criteria.VelocityBasis = network.AtDesignDepth },
			chosen{12, 97.83, 97.39},
		},
		{
			// τ = γRS with R = 0.25 ft half full: 0.156 lb/ft² is 62.4 · 0.25 · 0.01, on a slope of 1 %.
			"the cleansing shear at design depth", pipeAB, halfFull(0.01),
			func(s *situation) { s.criteria.MinVelocity, s.criteria.MinShear = 0, network.Some(0.156) },
			chosen{12, 97.83, 96.83},
		},
	})
}

func TestGroundThatIsTooSteepLeavesADropAtTheUpperStructure(t *testing.T) {
	hold(t, []sizingCase{
		{
			// The ground falls 10 ft: the lower end at 97.83 − 10 = 87.83 (cover 90 − 87.83 − 1.1667 = 1.0033), 5 % back up
			// to 92.83, and 5.00 ft of drop.
			"for the greatest slope", pipeAB, 3,
			func(s *situation) { rims(100, 90)(s); s.criteria.MaxSlope = 0.05 },
			chosen{12, 92.83, 87.83},
		},
		{
			// 10 ft/s half full: S = (0.013 · 10/(1.486 · 0.25^(2/3)))² = 0.0485956; 87.83 + 4.85956 = 92.68956 → 92.68.
			"for the greatest velocity", pipeAB, 10 * math.Pi / 8,
			func(s *situation) { rims(100, 90)(s); s.criteria.MaxVelocity = 10 },
			chosen{12, 92.68, 87.83},
		},
		{
			// Without the limit: 10 % of ground.
			"and none where the ground is just as steep as allowed", pipeAB, 3,
			func(s *situation) { rims(100, 90)(s); s.criteria.MaxSlope = 0.1 },
			chosen{12, 97.83, 87.83},
		},
	})
}

func TestLowerBoundsCapTheSlope(t *testing.T) {
	hold(t, []sizingCase{
		{
			// 2 % of ground would end at 95.83; the bed of the receiving stream is at 97.
			"a lowest invert", pipeAB, 2,
			func(s *situation) { rims(100, 98)(s); s.network.Structures[structureB].LowestInvert = network.Some(97) },
			chosen{12, 97.83, 97},
		},
		{
			// The pipe out of B is given at 96.80: 96.80 + 0.10.
			"a given invert downstream and the least fall above it", pipeAB, 2,
			func(s *situation) { rims(100, 98)(s); s.network.Pipes[pipeBC].InvertUpper = network.Some(96.8) },
			chosen{12, 97.83, 96.9},
		},
		{
			// Of two pipes out of B the higher one counts: 97.20 + 0.10.
			"the highest given invert downstream of a split", pipeAB, 2,
			func(s *situation) {
				rims(100, 98)(s)
				s.network.Pipes[pipeBC].InvertUpper = network.Some(96.8)
				s.network.Pipes = append(s.network.Pipes, s.network.Pipes[pipeBC])
				s.network.Pipes[2].InvertUpper = network.Some(97.2)
			},
			chosen{12, 97.83, 97.3},
		},
		{
			// 97.005 is no whole hundredth: the lower bound is rounded up.
			"a lowest invert between two hundredths", pipeAB, 2,
			func(s *situation) {
				rims(100, 98)(s)
				s.network.Structures[structureB].LowestInvert = network.Some(97.005)
			},
			chosen{12, 97.83, 97.01},
		},
	})
}

func TestWhatIsGivenIsKept(t *testing.T) {
	given := func(change func(p *network.Pipe)) func(s *situation) {
		return func(s *situation) { rims(100, 98)(s); change(&s.network.Pipes[pipeAB]) }
	}
	hold(t, []sizingCase{
		{
			// The rims fall to 98.5. Cover at B: 98.5 − 2.16667 = 96.3333, 1 ft higher at A: 97.3333 → 97.33, under the
			// 97.83 that A allows; the lower invert follows the slope exactly.
			"the slope alone", pipeAB, 2,
			func(s *situation) { rims(100, 98.5)(s); s.network.Pipes[pipeAB].Slope = network.Some(0.01) },
			chosen{12, 97.33, 96.33},
		},
		{
			// As high as cover allows at A.
			"the lower invert alone", pipeAB, 2,
			given(func(p *network.Pipe) { p.InvertLower = network.Some(96) }),
			chosen{12, 97.83, 96},
		},
		{
			// 96 + 0.01 · 100.
			"the lower invert alone under a greatest slope", pipeAB, 2,
			func(s *situation) {
				s.network.Pipes[pipeAB].InvertLower = network.Some(96)
				s.criteria.MaxSlope = 0.01
			},
			chosen{12, 97, 96},
		},
		{
			// The ground's 2 % down from 97.005, which is no whole hundredth: 95.005 → 95.00.
			"the upper invert alone", pipeAB, 2,
			given(func(p *network.Pipe) { p.InvertUpper = network.Some(97.005) }),
			chosen{12, 97.005, 95},
		},
		{
			"both inverts", pipeAB, 2,
			given(func(p *network.Pipe) {
				p.InvertUpper, p.InvertLower, p.Slope = network.Some(97), network.Some(96.123), network.Some((97-96.123)/100)
			}),
			chosen{12, 97, 96.123},
		},
		{
			// 18 in, wall 2.5 in: 100 − 1 − 0.20833 − 1.5 = 97.29167; the ground's 2 %.
			"the size, though a smaller one would do", pipeAB, 1,
			given(func(p *network.Pipe) {
				p.Size, p.Section, p.Wall, p.HasWall = network.Size{Span: 18, Rise: 18}, circle(1.5), 2.5/12, true
			}),
			chosen{18, 97.29, 95.29},
		},
	})
}
