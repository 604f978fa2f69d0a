package network

import (
	"cmp"
	"slices"
)

// GroundPoint is one surveyed or designed level of the ground over a pipe.
type GroundPoint struct {
	Pipe      PipeIndex
	Station   float64 // along the pipe in plan, from the centre of its upper structure
	Elevation float64
	Line      int32 // in its file
}

// Crossing is another service that crosses a pipe: its outside, seen along the service.
type Crossing struct {
	Pipe        PipeIndex
	Station     float64 // as of a GroundPoint
	Name        string
	Top, Bottom float64 // levels of its outside; Top is not under Bottom
	Line        int32
}

// SortGround brings the ground into the order that GroundOver needs: by pipe,
// downstream along each.
func (n *Network) SortGround() {
	slices.SortStableFunc(n.Ground, func(a, b GroundPoint) int {
		return cmp.Or(cmp.Compare(a.Pipe, b.Pipe), cmp.Compare(a.Station, b.Station))
	})
}

// GroundOver lists the ground points over a pipe, downstream. There are none
// where no ground was given.
func (n *Network) GroundOver(p PipeIndex) []GroundPoint {
	first, _ := slices.BinarySearchFunc(n.Ground, p, func(g GroundPoint, p PipeIndex) int { return cmp.Compare(g.Pipe, p) })
	end := first
	for end < len(n.Ground) && n.Ground[end].Pipe == p {
		end++
	}
	return n.Ground[first:end]
}

// InvertAt is the invert at a distance from the upper end, on the straight line
// between both inverts; there is none where one of them is not known.
func (p *Pipe) InvertAt(station float64) Maybe {
	if !p.InvertUpper.OK || !p.InvertLower.OK || p.Length <= 0 {
		return Maybe{}
	}
	return Some(p.InvertUpper.V + (p.InvertLower.V-p.InvertUpper.V)*station/p.Length)
}

// outside is the level of the outside of the pipe at a station, below and above.
// An unknown wall counts nothing.
func (p *Pipe) outside(station float64) (bottom, top float64, ok bool) {
	invert := p.InvertAt(station)
	if !invert.OK || p.Section == nil {
		return 0, 0, false
	}
	return invert.V - p.Wall, invert.V + p.Section.Rise() + p.Wall, true
}

// CoverUnder is the height of a ground point over the outside of its pipe;
// negative where the pipe stands out of the ground. There is none where the
// pipe's levels or its size are not known.
func (n *Network) CoverUnder(g *GroundPoint) Maybe {
	_, top, ok := n.Pipes[g.Pipe].outside(g.Station)
	if !ok {
		return Maybe{}
	}
	return Some(g.Elevation - top)
}

// Clearance is the upright gap between the outsides of a crossing service and its
// pipe; negative where they meet, by how much one of them has to move. There is
// none where the pipe's levels or its size are not known.
func (n *Network) Clearance(c *Crossing) Maybe {
	bottom, top, ok := n.Pipes[c.Pipe].outside(c.Station)
	if !ok {
		return Maybe{}
	}
	return Some(max(c.Bottom-top, bottom-c.Top))
}
