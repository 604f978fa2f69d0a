package drawing

import (
	"strconv"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/grade"
	"rimfall/network/report"
	"rimfall/network/units"
)

// run is a run with what the sheets ask of it again and again.
type run struct {
	*analysis.Result
	units     units.System
	style     report.Style
	storms    []storm // the design storm and, where there is one, the check storm
	crossings map[network.PipeIndex][]*network.Crossing
	marks     []mark // of the findings
}

func newRun(r *analysis.Result) *run {
	s := &r.Job.Settings
	a := &run{Result: r, units: s.Units, style: report.Style{Units: s.Units, FlowUnit: s.FlowUnit}}
	a.storms = []storm{newStorm(&r.Design, false)}
	if r.Check != nil {
		a.storms = append(a.storms, newStorm(r.Check, true))
	}
	a.crossings = map[network.PipeIndex][]*network.Crossing{}
	for i := range r.Network.Crossings {
		c := &r.Network.Crossings[i]
		a.crossings[c.Pipe] = append(a.crossings[c.Pipe], c)
	}
	a.marks = marksOf(a)
	return a
}

// storm is one storm with its grade lines, where they are known.
type storm struct {
	*analysis.StormRun
	lines  *grade.Lines
	check  bool
	traces [][]grade.Point // of each pipe, once it has been asked for
}

func newStorm(s *analysis.StormRun, check bool) storm {
	return storm{StormRun: s, lines: s.Lines, check: check, traces: make([][]grade.Point, len(s.Flows.Pipes))}
}

// years names the storm.
func (s *storm) years() string {
	period := strconv.FormatFloat(s.Storm.ReturnPeriod, 'g', -1, 64)
	if period == "1" {
		return "1 year"
	}
	return period + " years"
}

// level is the grade line at a structure, where it is known.
func (s *storm) level(k network.StructureIndex) network.Maybe {
	if s.lines == nil || !s.lines.Structures[k].Known {
		return network.Maybe{}
	}
	return network.Some(s.lines.Structures[k].Level)
}

// tracedParts is into how many parts a water surface is cut: curves look round at a few millimetres each.
const tracedParts = 24

// trace is the water along a pipe, from its lower end; nothing where it is not known.
func (s *storm) trace(p network.PipeIndex) []grade.Point {
	if s.lines == nil || !s.lines.Pipes[p].Known {
		return nil
	}
	if s.traces[p] == nil {
		s.traces[p] = s.lines.Trace(p, tracedParts)
	}
	return s.traces[p]
}

// tailwater is the receiving water at an outfall, where there is one.
func (s *storm) tailwater(outfall *network.Structure) network.Maybe {
	which := grade.DesignTailwater
	if s.check {
		which = grade.CheckTailwater
	}
	return which.Of(outfall)
}

// crown is the level of the inside top at an end of a pipe, where it is known.
func crown(p *network.Pipe, e network.End) network.Maybe {
	invert := p.Invert(e)
	if !invert.OK || p.Section == nil {
		return network.Maybe{}
	}
	return network.Some(invert.V + p.Section.Rise())
}
