package review

import (
	"math"

	"rimfall/network"
	"rimfall/network/sweep"
)

// pipeCriteria holds a pipe against every limit that is set and applies.
func (s *sheet) pipeCriteria(p network.PipeIndex) {
	pipe, run, c := &s.n.Pipes[p], &s.Design.Flows.Pipes[p], &s.Job.Settings.Criteria
	s.part("Criteria")
	if run.HasCapacity && run.State != sweep.Dry {
		s.limit("flow against capacity", "Q", atMost, run.Capacity, "capacity", run.Flow <= run.Capacity)
	}
	if run.State == sweep.PartFull {
		s.limit("depth over rise", "r", atMost, c.MaxDepthRatio, "max_depth_ratio", s.value("r") <= c.MaxDepthRatio*(1+room))
	}
	s.velocityCriteria(pipe, run, c)
	if pipe.Slope.OK {
		s.limit("slope", "S", atLeast, c.MinSlope, "min_slope", pipe.Slope.V >= c.MinSlope*(1-room))
		s.limit("slope", "S", atMost, c.MaxSlope, "max_slope", pipe.Slope.V <= c.MaxSlope*(1+room))
	}
	s.limit("rise", "D", atLeast, c.MinRise, "min_size", pipe.Section.Rise() >= c.MinRise*(1-room))
	s.cover(pipe, network.Upper, "u")
	s.cover(pipe, network.Lower, "l")
	s.crown(p)
	s.joint(pipe)
}

// room is the share by which a value may miss a limit by the arithmetic alone, as in the rules.
const room = 1e-7

func (s *sheet) velocityCriteria(pipe *network.Pipe, run *sweep.Pipe, c *network.Criteria) {
	atPeak := run.State != sweep.Dry
	switch {
	case !run.HasCapacity:
	case c.VelocityBasis == network.FullBore:
		s.limit("velocity flowing full", "V_f", atLeast, c.MinVelocity, "min_velocity", s.value("V_f") >= c.MinVelocity*(1-room))
	case atPeak:
		s.limit("velocity at the peak", "V", atLeast, c.MinVelocity, "min_velocity", run.Velocity >= c.MinVelocity*(1-room))
	}
	if shear := run.Shear(pipe, s.units.UnitWeight); shear.OK && c.MinShear.OK && run.State == sweep.PartFull {
		s.limit("boundary shear", "σ", atLeast, c.MinShear.V, "min_shear", shear.V >= c.MinShear.V*(1-room))
	}
	if !atPeak {
		return
	}
	s.limit("velocity at the peak", "V", atMost, c.MaxVelocity, "max_velocity", run.Velocity <= c.MaxVelocity*(1+room))
	if outlet := c.MaxOutletVelocity; outlet.OK && s.n.Structures[pipe.To].Kind == network.Outfall {
		s.limit("velocity at the outfall", "V", atMost, outlet.V, "max_outlet_velocity", run.Velocity <= outlet.V*(1+room))
	}
}

// cover is the rim less the outside of the pipe, at an end that is no outfall.
func (s *sheet) cover(pipe *network.Pipe, end network.End, index string) {
	at, c := &s.n.Structures[pipe.StructureAt(end)], &s.Job.Settings.Criteria
	cover := s.n.Cover(pipe, end)
	if !cover.OK || at.Kind == network.Outfall || !c.MinCover.OK && !c.MaxCover.OK {
		return
	}
	s.given("rim_"+index, "rim of structure "+at.ID, at.Rim.V, s.units.Length, "structures")
	if _, known := s.values["w"]; !known {
		s.given("w", "wall", pipe.Wall, s.units.Length, wallSource(pipe))
	}
	s.found("c_"+index, "cover, "+end.String()+" end", "rim_"+index+" − (z_"+index+" + D + w)", cover.V, s.units.Length, "")
	if c.MinCover.OK {
		s.limit("cover, "+end.String()+" end", "c_"+index, atLeast, c.MinCover.V, "min_cover", cover.V >= c.MinCover.V-levelRoom)
	}
	if c.MaxCover.OK {
		s.limit("cover, "+end.String()+" end", "c_"+index, atMost, c.MaxCover.V, "max_cover", cover.V <= c.MaxCover.V+levelRoom)
	}
}

// levelRoom is by how much a level may miss its limit by the arithmetic alone, as in the rules.
const levelRoom = 1e-6

func wallSource(p *network.Pipe) string {
	if p.HasWall {
		return "pipes, else the catalogue"
	}
	return "not known: nothing is counted"
}

// crown holds the grade line against the crown at both ends.
func (s *sheet) crown(p network.PipeIndex) {
	pipe, line := &s.n.Pipes[p], &s.Design.Lines.Pipes[p]
	if !line.Known || s.Design.Flows.Pipes[p].State == sweep.Dry {
		return
	}
	for _, e := range []struct {
		index  string
		invert float64
		level  float64
		end    network.End
	}{{"u", pipe.InvertUpper.V, line.HGLUpper, network.Upper}, {"l", pipe.InvertLower.V, line.HGLLower, network.Lower}} {
		s.computed("crown_"+e.index, "crown, "+e.end.String()+" end", "z_"+e.index+" + D", s.units.Length, "")
		crown := s.value("crown_" + e.index)
		s.limit("grade line below the crown, "+e.end.String()+" end", "HGL_"+e.index, atMost, math.Round(crown*1e9)/1e9, "surcharge", e.level <= crown+levelRoom)
	}
}

// joint holds the fall through the upper structure against the least fall.
func (s *sheet) joint(pipe *network.Pipe) {
	lowest, invert, ok := s.n.LowestIn(pipe.From)
	if !ok || !pipe.InvertUpper.OK {
		return
	}
	s.given("z_in", "lowest invert in, pipe "+s.n.Pipes[lowest].ID, invert, s.units.Length, "pipes")
	s.computed("fall", "fall through structure "+s.structureID(pipe.From), "z_in − z_u", s.units.Length, "")
	least := s.n.LeastFallAt(pipe.From, &s.Job.Settings.Criteria)
	s.limit("fall through the structure", "fall", atLeast, least, "least_fall", invert-pipe.InvertUpper.V >= least-levelRoom)
}
