package finding

import (
	"rimfall/network"
	"rimfall/network/size"
	"rimfall/network/sweep"
)

// The rules of slopes, levels and sizes.

func (j *judge) adverseSlope() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if p.Slope.OK && p.Slope.V <= 0 {
			j.add("adverse-slope", p.ID, p.Slope, network.Some(0), "slope is %s: the pipe does not fall to its lower end", percent(p.Slope.V))
		}
	})
}

func (j *judge) slope() {
	low, high := j.Criteria.MinSlope, j.Criteria.MaxSlope
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		switch s := p.Slope.V; {
		case !p.Slope.OK || s <= 0:
		case under(s, low):
			j.add("slope", p.ID, p.Slope, network.Some(low), "slope is %s, under the least of %s", percent(s), percent(low))
		case over(s, high):
			j.add("slope", p.ID, p.Slope, network.Some(high), "slope is %s, over the greatest of %s", percent(s), percent(high))
		}
	})
}

// cover holds both ends against the least and the greatest cover; an end at an
// outfall is not judged.
func (j *judge) cover() {
	least, greatest := j.Criteria.MinCover, j.Criteria.MaxCover
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		for _, e := range []network.End{network.Upper, network.Lower} {
			s := &j.Network.Structures[p.StructureAt(e)]
			c := j.Network.Cover(p, e)
			switch {
			case !c.OK || s.Kind == network.Outfall:
			case least.OK && c.V < least.V-levelRoom:
				j.add("cover", p.ID, c, least, "cover at the %s end, structure %s, is %s, under %s", e, s.ID, j.length(c.V), j.length(least.V))
			case greatest.OK && c.V > greatest.V+levelRoom:
				j.add("cover", p.ID, c, greatest, "cover at the %s end, structure %s, is %s, over %s", e, s.ID, j.length(c.V), j.length(greatest.V))
			}
		}
	})
}

func (j *judge) minSize() {
	limit := j.Criteria.MinRise
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if rise := p.Section.Rise(); under(rise, limit) {
			value, least := rise*j.Units.SizeFactor, limit*j.Units.SizeFactor
			j.add("min-size", p.ID, network.Some(value), network.Some(least), "rise of %s %s is under the least of %s %s",
				num(value, 1), j.Units.Size, num(least, 1), j.Units.Size)
		}
	})
}

func (j *judge) sizeDecrease() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if len(j.Network.PipesOut(p.From)) > 1 {
			return
		}
		largest, area, ok := j.Network.LargestIn(p.From)
		if own := p.FullArea(); ok && under(own, area) {
			j.add("size-decrease", p.ID, network.Some(own), network.Some(area), "full area of %s %s² is less than the %s %s² of pipe %s, which enters at structure %s",
				num(own, 3), j.Units.Length, num(area, 3), j.Units.Length, j.Network.Pipes[largest].ID, j.id(p.From))
		}
	})
}

// eachJoint calls a rule for every pipe out of a structure with the lowest
// invert in, where both are known.
func (j *judge) eachJoint(rule func(p *network.Pipe, lowest *network.Pipe)) {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if lowest, _, ok := j.Network.LowestIn(p.From); ok && p.InvertUpper.OK {
			rule(p, &j.Network.Pipes[lowest])
		}
	})
}

func (j *judge) invertOrder() {
	j.eachJoint(func(p, lowest *network.Pipe) {
		if p.InvertUpper.V > lowest.InvertLower.V+levelRoom {
			j.add("invert-order", p.ID, p.InvertUpper, lowest.InvertLower, "invert out of structure %s at %s is above pipe %s, which enters at %s",
				j.id(p.From), j.level(p.InvertUpper.V), lowest.ID, j.level(lowest.InvertLower.V))
		}
	})
}

func (j *judge) leastFall() {
	j.eachJoint(func(p, lowest *network.Pipe) {
		fall, least := lowest.InvertLower.V-p.InvertUpper.V, j.Network.LeastFallAt(p.From, j.Criteria)
		if fall >= -levelRoom && fall < least-levelRoom {
			j.add("least-fall", p.ID, network.Some(fall), network.Some(least), "fall through structure %s from pipe %s is %s, under %s",
				j.id(p.From), lowest.ID, j.length(fall), j.length(least))
		}
	})
}

func (j *judge) sizeChange() {
	height := j.Criteria.SizeChange.Height()
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		for _, i := range j.Network.PipesIn(p.From) {
			in := &j.Network.Pipes[i]
			rise, riseIn := p.Section.Rise(), in.Section.Rise()
			if !p.InvertUpper.OK || !in.InvertLower.OK || rise == riseIn {
				continue
			}
			point, pointIn := p.InvertUpper.V+height*rise, in.InvertLower.V+height*riseIn
			if point > pointIn+levelRoom {
				j.add("size-change", p.ID, network.Some(point), network.Some(pointIn), "at structure %s the %s lie at %s out and %s in (pipe %s): the pipe out is too high by %s",
					j.id(p.From), j.Criteria.SizeChange, j.level(point), j.level(pointIn), in.ID, j.length(point-pointIn))
			}
		}
	})
}

func (j *judge) lowestInvert() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		for _, e := range []network.End{network.Upper, network.Lower} {
			s := &j.Network.Structures[p.StructureAt(e)]
			if v := p.Invert(e); v.OK && s.LowestInvert.OK && v.V < s.LowestInvert.V-levelRoom {
				j.add("lowest-invert", p.ID, v, s.LowestInvert, "invert at the %s end, structure %s, is %s, below %s", e, s.ID, j.level(v.V), j.level(s.LowestInvert.V))
			}
		}
	})
}

func (j *judge) boundsCross() {
	for _, r := range j.Remarks {
		if r.Kind == size.BoundsCross {
			j.add("bounds-cross", j.Network.Pipes[r.Pipe].ID, network.Some(r.Value), network.Some(r.Limit),
				"upper invert %s is above %s, to which cover, matched points or least fall would hold it, by %s", j.level(r.Value), j.level(r.Limit), j.length(r.Value-r.Limit))
		}
	}
}

func (j *judge) existingChosen() {
	for _, r := range j.Remarks {
		if r.Kind == size.ExistingChosen {
			j.add("existing-chosen", j.Network.Pipes[r.Pipe].ID, network.Maybe{}, network.Maybe{}, "the pipe is existing, and its size or levels were blank and have been chosen: survey them")
		}
	}
}

// dropStructure measures from each pipe in to the lowest invert out.
func (j *judge) dropStructure() {
	limit := j.Criteria.MaxDrop
	if !limit.OK {
		return
	}
	j.eachPipe(func(in *network.Pipe, run *sweep.Pipe) {
		out, ok := j.lowestOut(in.To)
		if !ok || !in.InvertLower.OK {
			return
		}
		if drop := in.InvertLower.V - out; drop > limit.V+levelRoom {
			j.add("drop-structure", in.ID, network.Some(drop), limit, "the pipe enters structure %s %s above the lowest invert out, over %s", j.id(in.To), j.length(drop), j.length(limit.V))
		}
	})
}

func (j *judge) lowestOut(s network.StructureIndex) (invert float64, ok bool) {
	for _, i := range j.Network.PipesOut(s) {
		if v := j.Network.Pipes[i].InvertUpper; v.OK && (!ok || v.V < invert) {
			invert, ok = v.V, true
		}
	}
	return invert, ok
}

func (j *judge) longPipe() {
	limit := j.Criteria.MaxSpacing
	if !limit.OK {
		return
	}
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if over(p.Length, limit.V) {
			j.add("long-pipe", p.ID, network.Some(p.Length), limit, "length of %s between structures is over %s", j.length(p.Length), j.length(limit.V))
		}
	})
}
