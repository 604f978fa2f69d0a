package review

import (
	"cmp"
	"math"
	"slices"

	"rimfall/network"
	"rimfall/network/finding"
	"rimfall/network/size"
)

// Choice is one thing that may be done to a pipe.
type Choice struct {
	Work Work
	size.Candidate
	Price Price
}

// choicesFor lists what may be done to a pipe, the cheapest first; the first is to keep it. A larger listed size may take
// its place, or a listed size of at least the least rise may be laid beside it, of the same shape and material, where
// the job has a cost for it and it breaks no cover that held.
func (s *Subject) choicesFor(n *network.Network, p *network.Pipe, o *ReliefOptions, candidates []size.Candidate) []Choice {
	all := []Choice{{Work: Keep}}
	for _, c := range candidates {
		area := c.Section.At(c.Section.Rise()).Area
		if !s.coverHolds(n, p, &c) {
			continue
		}
		for _, w := range o.Works {
			choice := Choice{Work: w, Candidate: c}
			barrels := 1.0
			switch {
			case w == Replace && float64(p.Count)*area <= p.FullArea()*overSameArea:
				continue
			case w == Double && c.Section.Rise() < s.Job.Settings.Criteria.MinRise*(1-1e-9):
				continue
			case w == Replace:
				barrels = float64(p.Count)
			}
			var ok bool
			if choice.Price, ok = s.priceOf(n, p, &choice, barrels); ok {
				choice.Price.Second = p.Length * barrels * area
				all = append(all, choice)
			}
		}
	}
	slices.SortStableFunc(all[1:], func(a, b Choice) int {
		return cmp.Or(cmp.Compare(a.Price.First, b.Price.First), cmp.Compare(a.Price.Second, b.Price.Second))
	})
	return all
}

// overSameArea is beyond the room that counts two full areas as the same.
const overSameArea = 1 + 1e-9

// coverHolds tells whether the top of a pipe of another size, on the same inverts, stays under the rims: by the least cover,
// or under the rim alone where the pipe that lies has less than that already.
func (s *Subject) coverHolds(n *network.Network, p *network.Pipe, c *size.Candidate) bool {
	least := s.Job.Settings.Criteria.MinCover.Or(0)
	wall := c.Wall
	for _, end := range []struct {
		at     network.StructureIndex
		invert network.Maybe
	}{{p.From, p.InvertUpper}, {p.To, p.InvertLower}} {
		at := &n.Structures[end.at]
		if !at.Rim.OK || !end.invert.OK || at.Kind == network.Outfall {
			continue
		}
		depth := at.Rim.V - end.invert.V
		asked := least
		if depth-p.Section.Rise()-p.Wall < least-finding.LevelRoom {
			asked = 0
		}
		if depth-c.Section.Rise()-wall < asked-finding.LevelRoom {
			return false
		}
	}
	return true
}

// priceOf is the first part of the price of a choice: by costs.csv for all barrels, taking out the old pipe included where
// a row lists that; without the file the length.
func (s *Subject) priceOf(n *network.Network, p *network.Pipe, c *Choice, barrels float64) (Price, bool) {
	costs := s.Job.Costs
	if len(costs) == 0 {
		return Price{First: p.Length}, true
	}
	depth := meanDepth(n, p)
	laying, ok := costs.Laying(p.Shape, p.Material, c.Size, depth)
	if !ok {
		return Price{}, false
	}
	each := laying
	if c.Work == Replace {
		removal, _ := costs.Removal(p.Shape, p.Material, p.Size, depth)
		each += removal
	}
	return Price{First: each * barrels * p.Length}, true
}

// meanDepth is the mean of the depths from rim to invert at the ends of a pipe; of one end where the other's is not known.
func meanDepth(n *network.Network, p *network.Pipe) network.Maybe {
	sum, ends := 0.0, 0.0
	for _, end := range []struct {
		at     network.StructureIndex
		invert network.Maybe
	}{{p.From, p.InvertUpper}, {p.To, p.InvertLower}} {
		if rim := n.Structures[end.at].Rim; rim.OK && end.invert.OK {
			sum, ends = sum+rim.V-end.invert.V, ends+1
		}
	}
	if ends == 0 {
		return network.Maybe{}
	}
	return network.Some(sum / ends)
}

// conveyanceShare is the part of the flow that the second pipe takes: on one slope and with one n the flows of two full
// pipes are as their conveyances, K = A·R^(2/3)/n (Manning's equation; common practice for parallel pipes).
func conveyanceShare(p *network.Pipe, c *Choice) float64 {
	full := c.Section.At(c.Section.Rise())
	own := p.Section.At(p.Section.Rise())
	second := full.Area * math.Pow(full.HydraulicRadius(), 2.0/3)
	first := float64(p.Count) * own.Area * math.Pow(own.HydraulicRadius(), 2.0/3)
	return second / (first + second)
}
