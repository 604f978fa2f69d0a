package review

import (
	"rimfall/network"
	"rimfall/network/sweep"
	"rimfall/pipeflow"
)

// pipeGiven is what is given of a pipe, or was chosen.
func (s *sheet) pipeGiven(p network.PipeIndex) {
	pipe, was, u := &s.n.Pipes[p], &s.Job.Network.Pipes[p], s.units
	s.part("Given")
	s.given("L", "length", pipe.Length, u.Length, "pipes, else coordinates")
	if pipe.InvertUpper.OK {
		s.given("z_u", "invert, upper end", pipe.InvertUpper.V, u.Length, levelSource(pipe.AssumedUpper, was.InvertUpper.OK))
	}
	if pipe.InvertLower.OK {
		s.given("z_l", "invert, lower end", pipe.InvertLower.V, u.Length, levelSource(pipe.AssumedLower, was.InvertLower.OK))
	}
	s.slope(pipe, orChosen(was.Slope.OK))
	s.given("n", "roughness"+ofMaterial(pipe), pipe.N, "", nSource(pipe))
	s.given("k", "Manning's unit constant", s.storm.ManningFactor, "", "manning_factor")
	s.given("g", "gravity", u.Gravity, u.Length+"/s²", standardGravity)
	s.given("N", "barrels", float64(pipe.Count), "", "pipes")
	s.size(pipe, orChosen(was.Section != nil))
}

const standardGravity = "standard gravity, 9.80665 m/s²"

// orChosen is where a value stands: in pipes.csv, or nowhere yet.
func orChosen(given bool) string {
	if given {
		return "pipes"
	}
	return "chosen"
}

// levelSource is where an invert stands, or that it is not known.
func levelSource(assumed, given bool) string {
	if assumed {
		return "assumed, see the list of assumptions"
	}
	return orChosen(given)
}

func nSource(pipe *network.Pipe) string {
	if pipe.AssumedN {
		return "assumed: n of the criteria"
	}
	return "pipes, else the material's, else the criteria's"
}

// size is the size as it is written and in the unit of lengths.
func (s *sheet) size(pipe *network.Pipe, source string) {
	u := s.units
	s.set("f", u.SizeFactor, "")
	if isRound(pipe) {
		s.given("d", "diameter", pipe.Size.Rise, u.Size, source)
		s.found("D", "diameter", "d/f", pipe.Section.Rise(), u.Length, "")
		return
	}
	s.given("b", "span of the "+pipe.Shape, pipe.Size.Span, u.Size, source)
	s.given("d", "rise", pipe.Size.Rise, u.Size, source)
	s.foundOr("B", "span", "b/f", pipe.Section.Span(), u.Length, "", "catalogue")
	s.foundOr("D", "rise", "d/f", pipe.Section.Rise(), u.Length, "", "catalogue")
}

// slope is given, or the fall between the inverts over the length.
func (s *sheet) slope(pipe *network.Pipe, source string) {
	switch {
	case !pipe.Slope.OK:
	case pipe.GivenSlope || !pipe.InvertUpper.OK || !pipe.InvertLower.OK:
		s.given("S", "slope", pipe.Slope.V, "", source)
	default:
		s.foundOr("S", "slope", "(z_u − z_l)/L", pipe.Slope.V, "", "", source)
	}
}

func ofMaterial(p *network.Pipe) string {
	if p.Material == "" {
		return ""
	}
	return " of " + p.Material
}

func isRound(p *network.Pipe) bool {
	_, round := p.Section.(pipeflow.Circle)
	return round
}

func isBox(p *network.Pipe) bool {
	_, box := p.Section.(pipeflow.Box)
	return box
}

// fullSection is the full area, wetted perimeter and hydraulic radius of one barrel.
func (s *sheet) fullSection(pipe *network.Pipe) {
	u, full := s.units, pipe.Section.At(pipe.Section.Rise())
	switch {
	case isRound(pipe):
		s.found("A_f", "full area", "π × D^2/4", full.Area, u.Length+"²", fromCircle)
		s.found("P_f", "full perimeter", "π × D", full.Perimeter, u.Length, fromCircle)
	case isBox(pipe):
		s.found("A_f", "full area", "B × D", full.Area, u.Length+"²", "")
		s.found("P_f", "full perimeter", "2 × (B + D)", full.Perimeter, u.Length, "")
	default:
		s.given("A_f", "full area", full.Area, u.Length+"²", overWall)
		s.given("P_f", "full perimeter", full.Perimeter, u.Length, overWall)
	}
	s.computed("R_f", "hydraulic radius, full", "A_f/P_f", u.Length, "")
}

// capacity is the full-bore capacity of all barrels at the pipe's own slope.
func (s *sheet) capacity(p network.PipeIndex) {
	pipe, run := &s.n.Pipes[p], &s.Design.Flows.Pipes[p]
	s.part("Full-bore capacity")
	s.fullSection(pipe)
	if !run.HasCapacity {
		s.remark("The pipe does not fall to its lower end: it has no capacity of its own.")
		return
	}
	s.found("Q_f", "capacity", "N × k/n × A_f × R_f^(2/3) × √S", run.Capacity, s.units.Flow, fromManning)
	s.found("V_f", "velocity flowing full", "Q_f/(N × A_f)", run.Capacity/pipe.FullArea(), s.units.Velocity, "")
	if run.State != sweep.Dry {
		s.computed("e", "flow over capacity", "Q/Q_f", "", "")
	}
}

// wettedArea is the wetted area of one barrel at a depth whose symbol is y; the symbols of
// what is written have an index.
func (s *sheet) wettedArea(pipe *network.Pipe, y, index string) {
	square, depth := s.units.Length+"²", s.value(y)
	area, angle := pipe.Section.At(depth).Area, "θ_"+index
	switch {
	case isRound(pipe):
		s.computed(angle, "angle of the wetted arc", "2 × acos(1 − 2 × "+y+"/D)", "rad", fromCircle)
		s.foundOr("A_"+index, "wetted area", "D^2/8 × ("+angle+" − sin("+angle+"))", area, square, fromCircle, "the section")
	case isBox(pipe):
		s.found("A_"+index, "wetted area", "B × "+y, area, square, "")
	default:
		s.given("A_"+index, "wetted area", area, square, overWall)
	}
}

const overWall = "the section, summed over its wall"

// wettedPerimeter follows wettedArea.
func (s *sheet) wettedPerimeter(pipe *network.Pipe, y, index string) {
	perimeter, u, name := pipe.Section.At(s.value(y)).Perimeter, s.units.Length, "wetted perimeter"
	switch {
	case isRound(pipe):
		s.foundOr("P_"+index, name, "D × θ_"+index+"/2", perimeter, u, fromCircle, "the section")
	case isBox(pipe):
		s.foundOr("P_"+index, name, "B + 2 × "+y, perimeter, u, "", "the section")
	default:
		s.given("P_"+index, name, perimeter, u, overWall)
	}
}

// topWidth follows wettedArea.
func (s *sheet) topWidth(pipe *network.Pipe, y, index string) {
	width, u := pipe.Section.At(s.value(y)).TopWidth, s.units.Length
	switch {
	case isRound(pipe):
		s.foundOr("T_"+index, "top width", "D × sin(θ_"+index+"/2)", width, u, fromCircle, "the section")
	case isBox(pipe):
		s.foundOr("T_"+index, "top width", "B", width, u, "", "the section")
	default:
		s.given("T_"+index, "top width", width, u, "the section")
	}
}

// uniformFlow is how the pipe runs at its peak: at normal depth, or with the full area.
func (s *sheet) uniformFlow(p network.PipeIndex) {
	pipe, run, u := &s.n.Pipes[p], &s.Design.Flows.Pipes[p], s.units
	s.part("Depth and velocity at the peak")
	if run.State == sweep.Dry {
		s.remark("No water flows.")
		return
	}
	s.found("q", "flow of one barrel", "Q/N", run.Flow/float64(pipe.Count), u.Flow, "")
	if run.State == sweep.Full {
		s.found("y", "the full area is taken", "D", run.Depth, u.Length, "")
		s.found("V", "velocity", "Q/(N × A_f)", run.Velocity, u.Velocity, "")
		return
	}
	s.solved("y", "normal depth", "k/n × A × R^(2/3) × √S", "q", run.Depth, u.Length, fromManning)
	s.wettedArea(pipe, "y", "y")
	s.wettedPerimeter(pipe, "y", "y")
	s.computed("R", "hydraulic radius", "A_y/P_y", u.Length, "")
	s.computed("q_y", "which carries", "k/n × A_y × R^(2/3) × √S", u.Flow, fromManning)
	s.found("V", "velocity", "q/A_y", run.Velocity, u.Velocity, "")
	s.computed("r", "depth over rise", "y/D", "", "")
	s.topWidth(pipe, "y", "y")
	if froude := run.Froude(pipe, u.Gravity); froude.OK {
		s.found("Fr", "Froude number", "V/√(g × A_y/T_y)", froude.V, "", fromCritical)
	}
	if shear := run.Shear(pipe, u.UnitWeight); shear.OK {
		s.set("γ", u.UnitWeight, u.Shear+"/"+u.Length)
		s.found("σ", "boundary shear", "γ × R × S", shear.V, u.Shear, fromShear)
	}
}

// travelTime is the time in the pipe, by the velocity that the job asks for.
func (s *sheet) travelTime(p network.PipeIndex) {
	run := &s.Design.Flows.Pipes[p]
	if run.State == sweep.Dry {
		return
	}
	s.part("Time in the pipe")
	velocity, source := "V", `travel_velocity = "`+network.TravelVelocities[s.storm.Travel]+`"`
	switch {
	case s.storm.Travel == network.TravelFullBore && run.HasCapacity:
		velocity = "V_f"
	case s.storm.Travel != network.TravelPartFull:
		s.computed("V_a", "flow over the full area", "Q/(N × A_f)", s.units.Velocity, "")
		velocity = "V_a"
	}
	s.found("Δt", "travel time", "L/"+velocity+"/60", run.TravelTime, "min", source)
}

// criticalState is the critical depth of the peak, of one barrel.
func (s *sheet) criticalState(p network.PipeIndex) {
	pipe, run := &s.n.Pipes[p], &s.Design.Flows.Pipes[p]
	if run.State == sweep.Dry {
		return
	}
	s.part("Critical state")
	critical := run.CriticalDepth(pipe, s.units.Gravity)
	if !critical.OK {
		s.remark("A flat roof leaves no room for a critical depth inside.")
		return
	}
	s.set("1", 1, "")
	s.solved("y_c", "critical depth", "q^2 × T_c/(g × A_c^3)", "1", critical.V, s.units.Length, fromCritical)
	s.wettedArea(pipe, "y_c", "c")
	s.topWidth(pipe, "y_c", "c")
	s.computed("E_c", "which gives", "q^2 × T_c/(g × A_c^3)", "", fromCritical)
	if run.State == sweep.PartFull {
		if run.Depth < critical.V {
			s.remark("Normal depth is under critical depth: by itself the pipe runs fast.")
		} else {
			s.remark("Normal depth is not under critical depth: by itself the pipe runs tranquil.")
		}
	}
}
