package size

import (
	"rimfall/network"
	"rimfall/network/units"
	"rimfall/pipeflow"
)

// Candidate is a size that may be chosen.
type Candidate struct {
	Size    network.Size
	Section pipeflow.Section
	Wall    float64 // ft or m; 0 where unknown
	HasWall bool
}

// Chooser fills in what is blank in the pipes of a network, one pipe at a time,
// when everything upstream of it has been filled in.
type Chooser struct {
	Network  *network.Network // its pipes are filled in
	Criteria *network.Criteria
	Units    units.System
	Factor   float64 // of Manning's equation

	// Candidates lists the sizes of a shape and material, ascending by area.
	Candidates func(shape, material string) []Candidate

	// AtLeast is a full area of all barrels, by pipe, under which no size is chosen, beside the other limits; nil: none.
	AtLeast []float64

	given   []network.Pipe // as they were before anything was chosen
	step    step
	remarks []Remark
}

// Remark is what was found while choosing and cannot be seen in the result.
type Remark struct {
	Pipe  network.PipeIndex
	Kind  RemarkKind
	Value float64 // the flow that is to be carried, or the level that holds
	Limit float64 // the flow that the largest size carries, or the level that gave way
}

// RemarkKind says what was found.
type RemarkKind int8

// What can be found while choosing.
const (
	NoSizeCarries  RemarkKind = iota // the largest size was taken
	BoundsCross                      // an upper bound of the upper invert gave way to a lower one
	ExistingChosen                   // something of a pipe that lies already was chosen
)

// New prepares a chooser; the pipes of n, as they are now, count as given.
func New(n *network.Network, c *network.Criteria, u units.System, factor float64, candidates func(shape, material string) []Candidate) *Chooser {
	return &Chooser{
		Network: n, Criteria: c, Units: u, Factor: factor, Candidates: candidates,
		given: append([]network.Pipe(nil), n.Pipes...), step: step(u.InvertSteps),
	}
}

// Remarks are what was found so far, in the order of the sweep.
func (c *Chooser) Remarks() []Remark { return c.remarks }

// Choose fills in pipe i for a peak flow of all its barrels.
func (c *Chooser) Choose(i network.PipeIndex, flow float64) {
	p := &c.Network.Pipes[i]
	if p.Section != nil {
		if !p.InvertUpper.OK || !p.InvertLower.OK {
			c.settle(i, p, c.try(p, Candidate{p.Size, p.Section, p.Wall, p.HasWall}, flow))
		}
		return
	}
	all := c.Candidates(p.Shape, p.Material)
	least := c.leastArea(p)
	if c.AtLeast != nil {
		least = max(least, c.AtLeast[i])
	}
	var last trial
	for k, candidate := range all {
		isLast := k == len(all)-1
		if !isLast && c.tooSmall(p, candidate, least) {
			continue
		}
		last = c.try(p, candidate, flow)
		if last.carries >= flow {
			break
		}
	}
	if last.carries < flow {
		c.remarks = append(c.remarks, Remark{i, NoSizeCarries, flow, last.carries})
	}
	c.settle(i, p, last)
}

// levelRoom is the room left for the arithmetic when two levels are compared, ft or m.
const levelRoom = 1e-6

// sameArea is the room left for the arithmetic when two full areas are compared.
const sameArea = 1 - 1e-9

// tooSmall: under the least size of the criteria, or smaller than upstream.
func (c *Chooser) tooSmall(p *network.Pipe, candidate Candidate, least float64) bool {
	s := candidate.Section
	area := float64(p.Count) * s.At(s.Rise()).Area
	return s.Rise() < c.Criteria.MinRise*sameArea || area < least*sameArea
}

// leastArea is the largest full area of the pipes that enter the pipe's upper
// structure; 0 below a split, where sizes may fall.
func (c *Chooser) leastArea(p *network.Pipe) float64 {
	if len(c.Network.PipesOut(p.From)) > 1 {
		return 0
	}
	area := 0.0
	for _, i := range c.Network.PipesIn(p.From) {
		area = max(area, c.Network.Pipes[i].FullArea())
	}
	return area
}

// trial is one size with its own slope and inverts.
type trial struct {
	Candidate
	laid
	bounds  bounds
	carries float64 // flow of all barrels
}

// try lays a size and finds what it carries there. A given wall is kept.
func (c *Chooser) try(p *network.Pipe, candidate Candidate, flow float64) trial {
	if p.HasWall {
		candidate.Wall, candidate.HasWall = p.Wall, true
	}
	barrels := float64(p.Count)
	h := hydraulics{candidate.Section, flow / barrels, p.N, c.Factor, c.Units.UnitWeight}
	b := c.bounds(p, candidate.Section.Rise(), candidate.Wall)
	t := trial{Candidate: candidate, bounds: b}
	t.laid = c.lay(p, b, h.leastSlope(c.Criteria), h.steepestSlope(c.Criteria))
	if t.slope > 0 {
		t.carries = barrels * h.carries(t.slope, c.Criteria.MaxDepthRatio)
	}
	return t
}

// settle writes a trial into its pipe.
func (c *Chooser) settle(i network.PipeIndex, p *network.Pipe, t trial) {
	if p.Existing {
		c.remarks = append(c.remarks, Remark{Pipe: i, Kind: ExistingChosen})
	}
	if !p.InvertUpper.OK && t.upper > t.bounds.upperHigh+levelRoom {
		c.remarks = append(c.remarks, Remark{i, BoundsCross, t.upper, t.bounds.upperHigh})
	}
	p.Size, p.Section, p.Wall, p.HasWall = t.Size, t.Section, t.Wall, t.HasWall
	p.InvertUpper, p.InvertLower, p.Slope = network.Some(t.upper), network.Some(t.lower), network.Some(t.slope)
}
