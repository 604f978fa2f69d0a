package finding

import "rimfall/network"

// The rules of what lies along a pipe between its structures.

// worst is the place along a pipe at which a limit is missed most.
type worst struct {
	value   network.Maybe
	station float64
}

// note keeps a value where it is worse: a shortfall greater than that kept.
func (w *worst) note(value, station float64, isWorse func(a, b float64) bool) {
	if !w.value.OK || isWorse(value, w.value.V) {
		w.value, w.station = network.Some(value), station
	}
}

func less(a, b float64) bool { return a < b }
func more(a, b float64) bool { return a > b }

// coverAlongPipe judges every ground level between the ends; the ends themselves
// belong to the rule of cover at structures. Ground and pipe being straight
// between levels, the least and the greatest cover stand at one of them.
func (j *judge) coverAlongPipe() {
	least, greatest := j.Criteria.MinCover, j.Criteria.MaxCover
	for i := range j.Network.Pipes {
		p := &j.Network.Pipes[i]
		var low, high worst
		ground := j.Network.GroundOver(network.PipeIndex(i))
		for k := range ground {
			g := &ground[k]
			cover := j.Network.CoverUnder(g)
			if cover.OK && g.Station > 0 && g.Station < p.Length {
				low.note(cover.V, g.Station, less)
				high.note(cover.V, g.Station, more)
			}
		}
		if least.OK && low.value.OK && low.value.V < least.V-levelRoom {
			j.add("cover-along-pipe", p.ID, low.value, least, "cover %s from the upper end is %s, under %s", j.length(low.station), j.length(low.value.V), j.length(least.V))
		}
		if greatest.OK && high.value.OK && high.value.V > greatest.V+levelRoom {
			j.add("cover-along-pipe", p.ID, high.value, greatest, "cover %s from the upper end is %s, over %s", j.length(high.station), j.length(high.value.V), j.length(greatest.V))
		}
	}
}

// crossingClearance judges every service that crosses.
func (j *judge) crossingClearance() {
	limit := j.Criteria.MinClearance
	if !limit.OK {
		return
	}
	for i := range j.Network.Crossings {
		c := &j.Network.Crossings[i]
		gap := j.Network.Clearance(c)
		p := &j.Network.Pipes[c.Pipe]
		switch {
		case !gap.OK || gap.V >= limit.V-levelRoom:
		case gap.V < 0:
			j.add("crossing-clearance", p.ID, gap, limit, "%s, %s from the upper end, meets the pipe: one of them has to move by %s to leave %s",
				c.Name, j.length(c.Station), j.length(limit.V-gap.V), j.length(limit.V))
		default:
			j.add("crossing-clearance", p.ID, gap, limit, "%s, %s from the upper end, leaves a gap of %s, under %s",
				c.Name, j.length(c.Station), j.length(gap.V), j.length(limit.V))
		}
	}
}
