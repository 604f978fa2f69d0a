package size_test

import (
	"math"
	"testing"

	"rimfall/network"
	"rimfall/network/size"
	"rimfall/network/units"
	"rimfall/pipeflow"
)

// Indexes of the network of the cases: A → B → C, the outfall, in pipes of 100 ft
// on level ground at 100 ft, with n = 0.013 and k = 1.486.
//
// The numbers below come back in every case, so they are worked out once:
//   - concrete pipe of wall B, D/12 + 1 in: 12 in has 2 in, 15 in 2.25 in, 18 in 2.5 in, 24 in 3 in;
//   - 12 in under 1 ft of cover: upper invert 100 − 1 − 2/12 − 1 = 97.8333, in whole hundredths 97.83;
//   - 12 in full (or half full: R = D/4 in both) at 3 ft/s: S = (0.013 · 3/(1.486 · 0.25^(2/3)))² = 0.0043736;
//   - 12 in full on S: 1.486/0.013 · 0.785398 · 0.25^(2/3) · √S = 35.6280 √S cfs.
const (
	structureA, structureB = 0, 1
	pipeAB, pipeBC         = 0, 1
)

type situation struct {
	network  network.Network
	criteria network.Criteria
	units    units.System
	sizes    []float64 // of the catalogue, in or mm
}

// level is the situation before a case changes it.
func level() situation {
	s := situation{
		criteria: network.Criteria{
			MinCover: network.Some(1), MinSlope: 0.001, MaxSlope: 0.15, LeastFall: 0.1,
			MinRise: 1, MaxDepthRatio: 1, MinVelocity: 3, MaxVelocity: 15,
		},
		units: units.US,
		sizes: []float64{12, 15, 18, 24, 30, 36},
	}
	rim := network.Some(100)
	s.network.Structures = []network.Structure{{ID: "A", Rim: rim}, {ID: "B", Rim: rim}, {ID: "C", Kind: network.Outfall}}
	pipe := network.Pipe{Length: 100, Shape: "circle", Count: 1, N: 0.013}
	s.network.Pipes = []network.Pipe{pipe, pipe}
	s.network.Pipes[pipeAB].ID, s.network.Pipes[pipeBC].ID = "AB", "BC"
	s.network.Pipes[pipeAB].To = structureB
	s.network.Pipes[pipeBC].From, s.network.Pipes[pipeBC].To = structureB, 2
	return s
}

// enters gives a pipe that reaches B from a structure of its own: its size is
// given, and it lies on 1 %.
func (s *situation) enters(inches, invertLower float64) {
	s.network.Structures = append(s.network.Structures, network.Structure{ID: "X"})
	s.network.Pipes = append(s.network.Pipes, network.Pipe{
		ID: "X", From: network.StructureIndex(len(s.network.Structures) - 1), To: structureB, Length: 100, Shape: "circle", Count: 1, N: 0.013,
		Size: network.Size{Span: inches, Rise: inches}, Section: circle(inches / 12),
		InvertLower: network.Some(invertLower), InvertUpper: network.Some(invertLower + 1), Slope: network.Some(0.01),
	})
}

func circle(diameter float64) pipeflow.Section {
	c, err := pipeflow.NewCircle(diameter)
	if err != nil {
		panic(err) // a diameter of this file
	}
	return c
}

// candidates are round pipes of wall B.
func (s *situation) candidates(string, string) []size.Candidate {
	var list []size.Candidate
	for _, d := range s.sizes {
		wall := (d/12 + 1) / s.units.SizeFactor
		if s.units.Name == units.SI.Name {
			wall = (d/12 + 25.4) / s.units.SizeFactor
		}
		list = append(list, size.Candidate{Size: network.Size{Span: d, Rise: d}, Section: circle(d / s.units.SizeFactor), Wall: wall, HasWall: true})
	}
	return list
}

// choose completes one pipe for a flow.
func (s *situation) choose(pipe network.PipeIndex, flow float64) (*network.Pipe, []size.Remark) {
	s.network.Connect()
	c := size.New(&s.network, &s.criteria, s.units, 1.486, s.candidates)
	c.Choose(pipe, flow)
	return &s.network.Pipes[pipe], c.Remarks()
}

// chosen is what a case expects.
type chosen struct {
	size, upper, lower float64
}

type sizingCase struct {
	name string
	pipe network.PipeIndex
	flow float64
	set  func(s *situation)
	want chosen
}

func hold(t *testing.T, cases []sizingCase) {
	t.Helper()
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			s := level()
			if c.set != nil {
				c.set(&s)
			}
			p, remarks := s.choose(c.pipe, c.flow)
			if p.Size.Rise != c.want.size {
				t.Errorf("size %g, want %g", p.Size.Rise, c.want.size)
			}
			// 1e-9 ft: levels are hundredths, and sums of hundredths are good to 1e-14 of them.
			if math.Abs(p.InvertUpper.V-c.want.upper) > 1e-9 || math.Abs(p.InvertLower.V-c.want.lower) > 1e-9 {
				t.Errorf("inverts %.6f and %.6f, want %g and %g", p.InvertUpper.V, p.InvertLower.V, c.want.upper, c.want.lower)
			}
			if slope := (p.InvertUpper.V - p.InvertLower.V) / p.Length; math.Abs(p.Slope.V-slope) > 1e-12 {
				t.Errorf("slope %v, and the inverts make %v", p.Slope.V, slope)
			}
			if len(remarks) > 0 {
				t.Errorf("remarks %+v", remarks)
			}
		})
	}
}
