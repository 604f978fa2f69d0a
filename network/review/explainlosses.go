package review

import (
	"fmt"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/review/formula"
)

// level is the water level in a structure: the energy of the pipe out that governs, and
// what the structure adds to it.
func (s *sheet) level(at network.StructureIndex) {
	line, u := &s.Design.Lines.Structures[at], s.units.Length
	w, ok := s.Design.Lines.Working(at)
	s.part("Level")
	switch {
	case !ok:
		s.remark("Not known: a pipe below has no inverts.")
		return
	case w.By == grade.ByOutfall:
		s.given("E", "level of the receiving water, or of the water in the end of the pipe", line.Level, u, "structures, else the pipe in")
		return
	}
	out := &s.n.Pipes[w.Out]
	o := &s.Design.Lines.Pipes[w.Out]
	s.given("EGL_o", "energy line of pipe "+out.ID+", upper end", o.EGLUpper, u, "pipe "+out.ID)
	if w.By == grade.ByNothing {
		s.found("E", "level: the energy of the pipe out", "EGL_o", line.Level, u, "")
		return
	}
	s.given("HGL_o", "its grade line", o.HGLUpper, u, "pipe "+out.ID)
	s.found("h_o", "its velocity head", "EGL_o − HGL_o", w.Head, u, fromEnergy)
	if len(s.n.PipesOut(at)) > 1 {
		s.remark("Of the pipes out, pipe %s asks for the highest level, with its own flow.", out.ID)
	}
	switch w.By {
	case grade.ByGivenLoss:
		s.given("K", "loss of the structure", w.K, "", "structures")
		s.found("E", "level", "EGL_o + K × h_o", line.Level, u, "")
	case grade.ByCoefficient:
		s.given("K", "coefficient, "+s.turnWords(&w), w.K, "", fromTurn)
		s.found("E", "level", "EGL_o + K × h_o", line.Level, u, fromTurn)
	case grade.ByMomentum:
		s.momentum(&w, line)
	default:
		s.accessHole(at, &w, line)
	}
}

func (s *sheet) turnWords(w *grade.Working) string {
	if w.Main < 0 {
		return "no pipe in counts: straight"
	}
	return fmt.Sprintf("pipe %s turns by %s°", s.n.Pipes[w.Main].ID, figure(s.Design.Lines.Pipes[w.Main].Deflection, resultDigits))
}

// accessHole is the FHWA access-hole method, step by step.
func (s *sheet) accessHole(at network.StructureIndex, w *grade.Working, line *grade.Structure) {
	u, out := s.units.Length, &s.n.Pipes[w.Out]
	s.given("z_o", "invert of the pipe out", out.InvertUpper.V, u, "pipe "+out.ID)
	s.given("D_o", "its rise", out.Section.Rise(), u, "pipe "+out.ID)
	s.given("A_o", "its full area, one barrel", out.FullArea()/float64(out.Count), u+"²", "pipe "+out.ID)
	s.given("Q_o", "its flow", w.Flow, s.units.Flow, "pipe "+out.ID)
	s.given("g", "gravity", s.units.Gravity, u+"/s²", standardGravity)
	s.set("N", float64(out.Count), "")
	s.found("E_i", "energy inside the pipe, over its invert", "EGL_o − z_o", w.Energy, u, fromHole)
	s.found("DI", "discharge intensity", "Q_o/N/(A_o × √(g × D_o))", w.Intensity, "", fromHoleRead)
	s.part("Energy in the structure before its losses")
	candidates := []string{"E_i"}
	if w.Full {
		s.computed("E_1", "outlet control, full", "E_i + 0.2 × h_o", u, fromHole+", from memory")
		candidates = append(candidates, "E_1")
	}
	s.computed("E_2", "inlet control, covered", "D_o × DI^2", u, fromHole+", from memory")
	s.computed("E_3", "inlet control, open", "1.6 × D_o × DI^0.67", u, fromHole+", from memory")
	s.line("E_a", "the largest governs", formula.Largest(append(candidates, "E_2", "E_3")), w.Entry, u, fromHole)
	s.found("h_1", "entrance", "E_a − E_i", line.Parts.Entrance, u, fromHole)
	s.benching(at, w)
	s.turning(w)
	s.falling(w)
	s.part("Losses one by one, and the level")
	s.found("h_2", "benching", "C_B × h_1", line.Parts.Benching, u, fromHole)
	s.found("h_3", "angle", "C_θ × h_1", line.Parts.Angle, u, fromHole)
	s.found("h_4", "plunging", "C_P × h_1", line.Parts.Plunging, u, fromHole)
	s.found("h_5", "what keeps the level from sinking under the energy of the pipe out", "max(0, 0 − (h_1 + h_2 + h_3 + h_4))", line.Parts.Held, u, fromHole)
	s.found("E", "level", "EGL_o + h_1 + h_2 + h_3 + h_4 + h_5", line.Level, u, "")
}

// benching is the coefficient of the floor.
func (s *sheet) benching(at network.StructureIndex, w *grade.Working) {
	form := s.n.Structures[at].Benching
	covered, open := grade.BenchingCoefficients(form)
	s.part("Benching: " + form.String())
	s.given("c_s", "coefficient, submerged (E over 2.5 rises)", covered, "", fromHole+", from memory")
	s.given("c_o", "coefficient, unsubmerged (E under 1 rise)", open, "", fromHole+", from memory")
	s.computed("s", "between them", "max(0, min(1, (E_a/D_o − 1)/1.5))", "", fromHole+", from memory")
	s.found("C_B", "benching", "c_o + s × (c_s − c_o)", w.Benching, "", fromHole)
}

// turning is the coefficient of the pipes in that do not plunge.
func (s *sheet) turning(w *grade.Working) {
	s.part("Inflows that turn")
	s.set("half", 180, "°") // half a turn: straight on
	var flows, turned []string
	for i, in := range w.Inflows {
		if in.Plunges {
			continue
		}
		k, id := fmt.Sprint(i+1), s.n.Pipes[in.Pipe].ID
		s.given("Q_"+k, "flow of pipe "+id, in.Flow, s.units.Flow, "pipe "+id)
		s.given("Δ_"+k, "its deflection", in.Deflection, "°", s.turnSource(in.Pipe))
		s.computed("θ_"+k, "its angle", "half − Δ_"+k, "°", fromHoleRead)
		s.computed("M_"+k, "flow times angle", "Q_"+k+" × θ_"+k, s.units.Flow+"·°", fromHoleRead)
		flows, turned = append(flows, "Q_"+k), append(turned, "M_"+k)
	}
	if len(flows) == 0 {
		s.remark("none")
		s.set("C_θ", 0, "")
		return
	}
	s.sum("ΣQ", "their flow", flows, s.units.Flow)
	s.sum("ΣM", "their sum", turned, s.units.Flow+"·°")
	s.computed("θ_w", "mean angle by flow", "ΣM/ΣQ", "°", fromHoleRead)
	s.found("C_θ", "angle", "4.5 × min(1, ΣQ/Q_o) × cos(θ_w/2)", w.Angle, "", fromHole+", 4.5 from memory")
}

// turnSource is where the deflection of a pipe in is from.
func (s *sheet) turnSource(in network.PipeIndex) string {
	if s.Design.Lines.Pipes[in].AngleAssumed {
		return "assumed"
	}
	return "coordinates or angle"
}

// falling is the coefficient of what plunges into the structure.
func (s *sheet) falling(w *grade.Working) {
	s.part("Inflows that fall")
	var symbols []string
	add := func(what string, flow, height, share float64) {
		k := fmt.Sprint(len(symbols) + 1)
		s.set("Q_"+k, flow, s.units.Flow)
		s.set("f_"+k, share, "")
		s.given("η_"+k, "height over the energy, in rises, "+what, height, "", fromHoleRead)
		s.computed("G_"+k, "flow that counts times height", "Q_"+k+" × f_"+k+" × η_"+k, s.units.Flow, fromHoleRead)
		symbols = append(symbols, "G_"+k)
	}
	for _, in := range w.Inflows {
		if in.Plunges {
			add("pipe "+s.n.Pipes[in.Pipe].ID, in.Flow, in.Height, in.Share)
		}
	}
	if w.Own > 0 {
		add("own flow of the inlet, from its rim", w.Own, w.OwnHeight, 1)
	}
	if len(symbols) == 0 {
		s.remark("none")
		s.set("C_P", 0, "")
		return
	}
	s.sum("ΣG", "their sum", symbols, s.units.Flow)
	s.found("C_P", "plunging", "ΣG/Q_o", w.Plunging, "", fromHoleRead)
}

// momentum is the loss of a blind junction of a trunk and one lateral, all full.
func (s *sheet) momentum(w *grade.Working, line *grade.Structure) {
	u := s.units.Length
	for _, p := range []struct {
		index string
		pipe  network.PipeIndex
	}{{"o", w.Out}, {"i", w.Trunk}, {"l", w.Lateral}} {
		pipe := &s.n.Pipes[p.pipe]
		s.given("A_"+p.index, "full area of pipe "+pipe.ID, pipe.FullArea(), u+"²", "pipe "+pipe.ID)
		s.given("Q_"+p.index, "its flow", s.Design.Flows.Pipes[p.pipe].Flow, s.units.Flow, "pipe "+pipe.ID)
	}
	s.given("g", "gravity", s.units.Gravity, u+"/s²", standardGravity)
	s.computed("Q_j", "flow of the lateral, the rest", "max(0, Q_o − Q_i)", s.units.Flow, fromJunction)
	s.computed("V_o", "velocity out", "Q_o/A_o", s.units.Velocity, "")
	s.computed("V_i", "velocity of the trunk", "Q_i/A_i", s.units.Velocity, "")
	s.computed("V_j", "velocity of the lateral", "Q_j/A_l", s.units.Velocity, "")
	s.given("Δ", "deflection of the lateral", w.Deflection, "°", s.turnSource(w.Lateral))
	s.computed("h_O", "velocity head out", "V_o^2/(2 × g)", u, "")
	s.computed("h_i", "velocity head of the trunk", "V_i^2/(2 × g)", u, "")
	s.found("h_1", "loss by momentum", "(Q_o × V_o − Q_i × V_i − Q_j × V_j × cos(Δ))/(0.5 × g × (A_o + A_i)) + h_i − h_O", line.Parts.Junction, u, fromJunction)
	s.found("E", "level", "EGL_o + h_1", line.Level, u, "")
}
