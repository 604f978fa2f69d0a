package size_test

import (
	"math"
	"testing"

	"rimfall/network"
)

func TestTheUpperInvertIsAsHighAsAllAllow(t *testing.T) {
	hold(t, []sizingCase{
		{
			// 97.8333 → 97.83. The ground is level, so the slope is the least, 0.0043736 for 3 ft/s:
			// 97.83 − 0.43736 = 97.39264 → 97.39.
			"cover governs at a head", pipeAB, 2, nil, chosen{12, 97.83, 97.39},
		},
		{
			// A wall of 6 in: 100 − 1 − 0.5 − 1 = 97.5; 97.5 − 0.43736 → 97.06.
			"a given wall counts in place of the catalogue's", pipeAB, 2,
			func(s *situation) { s.network.Pipes[pipeAB].Wall, s.network.Pipes[pipeAB].HasWall = 0.5, true },
			chosen{12, 97.5, 97.06},
		},
		{
			// 12 in enter at 90.00. Crowns: 90 + 1 − 1.5 = 89.50; the least fall would allow 89.90.
			// 18 in at 3 ft/s: S = (0.039/(1.486 · 0.375^(2/3)))² = 0.0025472; 89.50 − 0.25472 → 89.24.
			"crowns line up where sizes change", pipeBC, 3,
			func(s *situation) { s.enters(12, 90); s.criteria.MinRise = 1.5 },
			chosen{18, 89.5, 89.24},
		},
		{
			// 0.8 of the rise: 90 + 0.8 · (1 − 1.5) = 89.60; 89.60 − 0.25472 → 89.34.
			"0.8-points line up where sizes change", pipeBC, 3,
			func(s *situation) {
				s.enters(12, 90)
				s.criteria.MinRise, s.criteria.SizeChange = 1.5, network.MatchPoint8
			},
			chosen{18, 89.6, 89.34},
		},
		{
			// Inverts: 90.00, but the least fall asks for 89.90; 89.90 − 0.25472 → 89.64.
			"inverts line up, and the least fall is under them", pipeBC, 3,
			func(s *situation) {
				s.enters(12, 90)
				s.criteria.MinRise, s.criteria.SizeChange = 1.5, network.MatchInverts
			},
			chosen{18, 89.9, 89.64},
		},
		{
			// Inverts without a least fall: 90.00; 90 − 0.25472 → 89.74.
			"inverts line up exactly without a least fall", pipeBC, 3,
			func(s *situation) {
				s.enters(12, 90)
				s.criteria.MinRise, s.criteria.SizeChange, s.criteria.LeastFall = 1.5, network.MatchInverts, 0
			},
			chosen{18, 90, 89.74},
		},
		{
			// 90.00 − 0.10; 89.90 − 0.43736 = 89.46264.
			"the least fall governs where the size stays", pipeBC, 2,
			func(s *situation) { s.enters(12, 90) },
			chosen{12, 89.9, 89.46},
		},
		{
			// 90.00 − 0.25; 89.75 − 0.43736 = 89.31264.
			"a structure has a least fall of its own", pipeBC, 2,
			func(s *situation) { s.enters(12, 90); s.network.Structures[structureB].LeastFall = network.Some(0.25) },
			chosen{12, 89.75, 89.31},
		},
		{
			// Crown of the 12 in: 90 + 1 − 2 = 89.00; the 24 in enters at 89.50, which allows 89.40.
			// 24 in at 3 ft/s: S = (0.039/(1.486 · 0.5^(2/3)))² = 0.0017357; 89.00 − 0.17357 → 88.82.
			"every pipe in is matched, and the lowest bound holds", pipeBC, 3,
			func(s *situation) { s.enters(12, 90); s.enters(24, 89.5) },
			chosen{24, 89, 88.82},
		},
		{
			// Cover would allow 97.83, the pipe in is deeper: 92.00 − 0.10.
			"cover does not lift a pipe above those that enter", pipeBC, 2,
			func(s *situation) { s.enters(12, 92) },
			chosen{12, 91.9, 91.46},
		},
		{
			// B has a rim of 91: 91 − 2.16667 = 88.8333 is lower than 89.90; 88.83 − 0.43736 = 88.39264.
			"cover pushes a pipe below those that enter", pipeBC, 2,
			func(s *situation) { s.enters(12, 90); s.network.Structures[structureB].Rim = network.Some(91) },
			chosen{12, 88.83, 88.39},
		},
		{
			"a blank rim bounds nothing", pipeBC, 2,
			func(s *situation) { s.enters(12, 90); s.network.Structures[structureB].Rim = network.Maybe{} },
			chosen{12, 89.9, 89.46},
		},
	})
}

// In metres inverts are whole millimetres.
func TestMetricInvertsAreWholeMillimetres(t *testing.T) {
	s := level()
	s.metric()
	// 300 mm, wall 300/12 + 25.4 = 50.4 mm: 100 − 0.3 − 0.0504 − 0.3 = 99.3496 → 99.349.
	// 0.9 m/s full with k = 1.486, as this file's chooser has it: S = (0.013 · 0.9/(1.486 · 0.075^(2/3)))²
	// = 0.00195988; on 100 m 0.195988: 99.349 − 0.195988 = 99.153012 → 99.153.
	p, _ := s.choose(pipeAB, 0.02)
	if p.Size.Rise != 300 || math.Abs(p.InvertUpper.V-99.349) > 1e-9 || math.Abs(p.InvertLower.V-99.153) > 1e-9 {
		t.Errorf("%g mm from %.6f to %.6f, want 300 mm from 99.349 to 99.153", p.Size.Rise, p.InvertUpper.V, p.InvertLower.V)
	}
}
