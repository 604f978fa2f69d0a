package review

import (
	"fmt"
	"math"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/sweep"
)

// pipeLines are the grade lines of a pipe, from its lower end up, and the account of what is
// lost between it and the pipe below.
func (s *sheet) pipeLines(p network.PipeIndex) {
	pipe, line := &s.n.Pipes[p], &s.Design.Lines.Pipes[p]
	s.part("Grade lines")
	switch {
	case !line.Known:
		s.remark("Not known: the inverts of this pipe or of one below it are not given.")
		return
	case s.Design.Flows.Pipes[p].State == sweep.Dry:
		s.set("HGL_u", line.HGLUpper, s.units.Length)
		s.set("HGL_l", line.HGLLower, s.units.Length)
		s.remark("No water flows: at both ends stands the water below, or the invert where that is higher.")
		return
	}
	s.lowerEnd(p)
	s.endLevels("l", pipe.InvertLower.V, line.HGLLower, line.EGLLower, 0, pipe)
	s.along(p)
	s.upperEnd(p)
	s.lossBelow(p)
}

// lowerEnd is how the water of the pipe meets what is below.
func (s *sheet) lowerEnd(p network.PipeIndex) {
	pipe, line := &s.n.Pipes[p], &s.Design.Lines.Pipes[p]
	depth := line.HGLLower - pipe.InvertLower.V
	below, u := s.structureID(pipe.To), s.units.Length
	level := s.Design.Lines.Structures[pipe.To]
	switch line.End {
	case grade.EndsAtOutfall:
		s.outfallDepth(pipe, line, depth)
	case grade.EndsFalling:
		s.foundOr("y_l", "over lower water: critical depth", "y_c", depth, u, "", "the water surface along the pipe")
	case grade.EndsRapid:
		s.given("y_l", "depth of the fast water at the lower end", depth, u, fromSurface)
	case grade.EndsGiven:
		s.givenEntry(p, depth)
	default:
		s.given("E", "level of structure "+below, level.Level, u, "structure "+below)
		s.set("w_h", level.Counted(), "")
		s.solved("y_l", "depth held by the structure", "z_l + y_l + w_h × v_l^2/(2 × g)", "E", depth, u, fromHole)
	}
}

// outfallDepth is the depth at an outfall: the receiving water, or that of a free outfall.
func (s *sheet) outfallDepth(pipe *network.Pipe, line *grade.Pipe, depth float64) {
	outfall, u := &s.n.Structures[pipe.To], s.units.Length
	free := "y_c"
	if s.Job.Settings.Grade.OutfallStart == grade.Midway.String() {
		free = "(y_c + D)/2"
	}
	if _, ok := s.values["y_c"]; !ok {
		free = "D"
	}
	if line.Steep {
		free = ""
	}
	if water := outfall.Tailwater; water.OK {
		s.given("W", "receiving water", water.V, u, "structures")
		if free == "" {
			free = "0"
		}
		s.foundOr("y_l", "depth at the outfall", "max(W − z_l, "+free+")", depth, u, fromOutfall, fromSurface)
		return
	}
	if free == "" {
		s.given("y_l", "depth of the fast water at the outfall", depth, u, fromSurface)
		return
	}
	s.foundOr("y_l", "depth at the free outfall", free, depth, u, fromOutfall, fromSurface)
}

// givenEntry is the rise that the pipe's own loss asks for, over the grade line of the pipe out.
func (s *sheet) givenEntry(p network.PipeIndex, depth float64) {
	pipe, u := &s.n.Pipes[p], s.units.Length
	out := s.Design.Lines.Structures[pipe.To].Out
	o := &s.Design.Lines.Pipes[out]
	s.given("HGL_o", "grade line of pipe "+s.n.Pipes[out].ID+", upper end", o.HGLUpper, u, "pipe "+s.n.Pipes[out].ID)
	s.given("h_o", "its velocity head", o.EGLUpper-o.HGLUpper, u, "pipe "+s.n.Pipes[out].ID)
	s.given("K", "loss of this pipe", pipe.Loss.V, "", "pipes")
	s.foundOr("y_l", "depth at the lower end", "HGL_o + K × h_o − z_l", depth, u, "", fromSurface)
}

// endLevels are the velocity and the levels at an end whose depth has the symbol y with the
// index; more is what a bend adds there.
func (s *sheet) endLevels(index string, invert, hgl, egl, bend float64, pipe *network.Pipe) {
	u, y := s.units.Length, "y_"+index
	depth, area := s.value(y), "A_f"
	if depth < pipe.Section.Rise() {
		s.wettedArea(pipe, y, index)
		area = "A_" + index
	}
	s.computed("v_"+index, "velocity there", "q/"+area, s.units.Velocity, "")
	s.computed("h_"+index, "velocity head", "v_"+index+"^2/(2 × g)", u, fromEnergy)
	level := "z_" + index + " + y_" + index
	if bend > 0 {
		s.set("Δ", pipe.Bend, "")
		s.found("h_b", "loss of the bend along the pipe, Δ in degrees", "0.0033 × Δ × h_"+index, bend, u, fromBend)
		level += " + h_b"
	}
	s.set("z_"+index, invert, u)
	s.found("HGL_"+index, "grade line", level, hgl, u, "")
	s.found("EGL_"+index, "energy line", "HGL_"+index+" + h_"+index, egl, u, fromEnergy)
	if q := s.values["E"]; q.unit != "" && index == "l" && s.values["w_h"].value > 0 {
		s.computed("E_l", "which makes the level of the structure", "HGL_l + w_h × h_l", u, fromHole)
	}
}

// along is what the water does along the pipe: friction where it runs full, else the surface
// at some places.
func (s *sheet) along(p network.PipeIndex) {
	pipe, line := &s.n.Pipes[p], &s.Design.Lines.Pipes[p]
	if line.Regime == grade.Full {
		s.computed("S_f", "friction slope, full", "(q × n/(k × A_f × R_f^(2/3)))^2", "", fromManning)
		s.computed("h_f", "friction over the length", "S_f × L", s.units.Length, "")
		return
	}
	s.remark("How it runs: %s. %s", line.Regime, surfaceWords(line, s.units.Length))
	s.set("fall", pipe.InvertUpper.V-pipe.InvertLower.V, s.units.Length)
	const parts = 4
	for i, at := range s.Design.Lines.Trace(p, parts) {
		if at.Distance == 0 || at.Distance == pipe.Length {
			continue
		}
		k := fmt.Sprint(i)
		s.set("x_"+k, at.Distance, s.units.Length)
		s.set("y_"+k, at.Depth, s.units.Length)
		s.computed("HGL_"+k, fmt.Sprintf("grade line %s %s from the lower end", result(at.Distance, false), s.units.Length),
			"z_l + (z_u − z_l) × x_"+k+"/L + y_"+k, s.units.Length, fromSurface)
	}
}

func surfaceWords(line *grade.Pipe, unit string) string {
	text := "dy/dx = (S − Sf)/(1 − Fr²) is followed step by step, Sf by Manning's equation"
	if line.Curve != "" {
		text += fmt.Sprintf("; the surface is of the kind %s", line.Curve)
	}
	if line.Jump.OK {
		text += fmt.Sprintf("; a jump stands %s %s from the lower end, where the specific forces match", result(line.Jump.V, false), unit)
	}
	if line.FullLength > 0 {
		text += fmt.Sprintf("; %s %s run full", result(line.FullLength, false), unit)
	}
	return text + "."
}

// upperEnd is the depth and the levels at the upper end.
func (s *sheet) upperEnd(p network.PipeIndex) {
	pipe, line, u := &s.n.Pipes[p], &s.Design.Lines.Pipes[p], s.units.Length
	depth := line.HGLUpper - pipe.InvertUpper.V - line.Bend
	switch {
	case line.Regime == grade.Full:
		s.foundOr("y_u", "height of the grade line, upper end", "HGL_l + h_f − z_u", depth, u, "", fromSurface)
	case line.Steep && !line.Drowned:
		s.foundOr("y_u", "fast water starts at critical depth", "y_c", depth, u, "", fromSurface)
	default:
		s.given("y_u", "depth at the upper end", depth, u, fromSurface)
	}
	s.endLevels("u", pipe.InvertUpper.V, line.HGLUpper, line.EGLUpper, line.Bend, pipe)
}

// lossBelow is the account of the energy line between the lower end and the pipe out of the
// structure there: named parts that add up.
func (s *sheet) lossBelow(p network.PipeIndex) {
	pipe, u := &s.n.Pipes[p], s.units.Length
	out := s.Design.Lines.Structures[pipe.To].Out
	parts := s.Design.Lines.Account(p, out)
	below := "structure " + s.structureID(pipe.To)
	s.part("Losses at " + below)
	if len(parts) == 0 {
		s.remark("none")
		return
	}
	sum, total := "", 0.0
	for i, part := range parts {
		k := fmt.Sprintf("h_%d", i+1)
		s.given(k, part.Name, part.Value, u, below)
		if i > 0 {
			sum += " + "
		}
		sum, total = sum+k, total+part.Value
	}
	s.computed("Σh", "all of them", sum, u, "")
	if out < 0 {
		s.set("W_s", s.Design.Lines.Structures[pipe.To].Level, u)
		s.checked("EGL_l", "still water and losses make the energy line", "W_s + Σh", u)
		return
	}
	s.given("EGL_o", "energy line of pipe "+s.n.Pipes[out].ID+", upper end", s.Design.Lines.Pipes[out].EGLUpper, u, "pipe "+s.n.Pipes[out].ID)
	s.checked("EGL_l", "and losses make the energy line, lower end", "EGL_o + Σh", u)
}

// checked writes once more, by another formula, what is known already.
func (s *sheet) checked(symbol, name, text, unit string) {
	v := s.value(symbol)
	s.foundOr(symbol, name, text, v, unit, "", "the water surface along the pipe")
}

// freeboard is the rim less the level.
func (s *sheet) freeboard(at network.StructureIndex) {
	given, line := &s.n.Structures[at], &s.Design.Lines.Structures[at]
	free := line.Freeboard(given)
	if !free.OK || given.Kind == network.Outfall {
		return
	}
	s.part("Criteria")
	s.given("rim", "rim", given.Rim.V, s.units.Length, "structures")
	s.found("free", "freeboard", "rim − E", free.V, s.units.Length, "")
	limit := s.Job.Settings.Criteria.Freeboard
	s.limit("freeboard", "free", atLeast, limit, "freeboard", free.V >= limit-levelRoom)
	s.limit("no flooding: level below the rim", "E", atMost, math.Round(given.Rim.V*1e9)/1e9, "flooding", line.Level <= given.Rim.V+levelRoom)
}
