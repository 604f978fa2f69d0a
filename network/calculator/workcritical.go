package calculator

import "fmt"

// criticalState is the critical depth and slope, and how the flow stands to them.
func (s *sheet) criticalState(st *State) {
	g := figure(s.Units.Gravity)
	if st.CriticalDepth.OK {
		s.criticalDepth(st)
	} else {
		s.put(Step{Name: "critical depth", Symbol: "yc", Result: "none below the roof"})
	}
	if st.Froude.OK {
		s.step("Froude number", "F", "Q/(A √(g A/T))", fmt.Sprintf("%s/(%s × √(%s × %s))", figure(st.Flow), figure(st.Area), g, figure(st.HydraulicDeep.V)), Plain, st.Froude.V)
		s.put(Step{Name: "state of flow", Result: st.FlowState})
	}
	s.step("specific energy", "E", "y + V²/2g", fmt.Sprintf("%s + %s²/(2 × %s)", figure(st.Depth), figure(st.Velocity), g), Length, st.Energy)
	if st.Conjugate.OK {
		name := "depth behind a jump"
		if st.Conjugate.V > s.Section.Rise() {
			name = "head behind a jump, full"
		}
		s.solved(name, "y₂", "Q²/(g A) + A ȳ as before it", "", s.say(Length, st.Conjugate.V))
	}
}

// criticalDepth is checked with the area and width that belong to it.
func (s *sheet) criticalDepth(st *State) {
	yc := st.CriticalDepth.V
	s.solved("critical depth", "yc", "Q² T/(g A³) = 1", "", s.say(Length, yc))
	wet := s.Section.At(yc)
	if wet.Area > 0 {
		s.step("critical velocity", "Vc", "Q/Ac", figure(st.Flow)+"/"+figure(wet.Area), Speed, st.Flow/wet.Area)
	}
	if st.CriticalSlope.OK {
		n := figure(s.flow.at(yc).N)
		s.step("critical slope", "Sc", "(Q n/(k Ac Rc^(2/3)))²", fmt.Sprintf("(%s × %s/(%s × %s × %s^(2/3)))²", figure(st.Flow), n,
			figure(s.Units.ManningFactor), figure(wet.Area), figure(wet.HydraulicRadius())), Gradient, st.CriticalSlope.V)
	}
}
