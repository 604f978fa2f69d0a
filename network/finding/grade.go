package finding

import (
	"math"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/sweep"
)

// The rules of the grade lines, for the design storm and for the check storm where there is one.

// StormLines are the flows and the grade lines of one storm.
type StormLines struct {
	Storm     *network.Storm
	Flows     *sweep.Flows
	Lines     *grade.Lines
	Tailwater grade.Tailwater
}

// gradeStorms are the storms whose lines are judged.
func (j *judge) gradeStorms() []StormLines {
	var all []StormLines
	if j.Lines != nil {
		all = append(all, StormLines{j.Storm, j.Flows, j.Lines, grade.DesignTailwater})
	}
	if j.Check != nil && j.Check.Lines != nil {
		all = append(all, *j.Check)
	}
	return all
}

// addIn records a finding of one of the storms.
func (j *judge) addIn(s *StormLines, name, subject string, value, limit network.Maybe, format string, args ...any) {
	if s.Storm != j.Storm {
		format, args = "check storm, %g years: "+format, append([]any{s.Storm.ReturnPeriod}, args...)
	}
	j.add(name, subject, value, limit, format, args...)
	j.found[len(j.found)-1].Storm = s.Storm.ReturnPeriod
}

// eachLine calls a rule for every pipe whose lines are known, in every storm.
func (j *judge) eachLine(rule func(s *StormLines, i network.PipeIndex, p *network.Pipe, line *grade.Pipe)) {
	for _, s := range j.gradeStorms() {
		for i := range j.Network.Pipes {
			if line := &s.Lines.Pipes[i]; line.Known {
				rule(&s, network.PipeIndex(i), &j.Network.Pipes[i], line)
			}
		}
	}
}

// eachLevel calls a rule for every structure under the ground whose level is known, in every storm. At an outfall the
// receiving water sets the level, and the ground there is no rim.
func (j *judge) eachLevel(rule func(s *StormLines, i network.StructureIndex, given *network.Structure, at *grade.Structure)) {
	for _, s := range j.gradeStorms() {
		for i := range j.Network.Structures {
			given, at := &j.Network.Structures[i], &s.Lines.Structures[i]
			if at.Known && given.Kind != network.Outfall {
				rule(&s, network.StructureIndex(i), given, at)
			}
		}
	}
}

// surcharge speaks once of a pipe: of the end where the line stands higher over the crown.
func (j *judge) surcharge() {
	j.eachLine(func(s *StormLines, i network.PipeIndex, p *network.Pipe, line *grade.Pipe) {
		rise := p.Section.Rise()
		crown, level, end := p.InvertUpper.V+rise, line.HGLUpper, network.Upper
		if low := p.InvertLower.V + rise; line.HGLLower-low > level-crown {
			crown, level, end = low, line.HGLLower, network.Lower
		}
		if level > crown+levelRoom {
			j.addIn(s, "surcharge", p.ID, network.Some(level), network.Some(crown), "the grade line at the %s end, %s, stands %s above the crown; %s of %s run full",
				end, j.level(level), j.length(level-crown), j.length(line.FullLength), j.length(p.Length))
		}
	})
}

func (j *judge) flooding() {
	j.eachLevel(func(s *StormLines, i network.StructureIndex, given *network.Structure, at *grade.Structure) {
		if !given.Rim.OK || at.Level <= given.Rim.V+levelRoom {
			return
		}
		j.addIn(s, "flooding", given.ID, network.Some(at.Level), given.Rim, "the grade line, %s, stands %s above the rim%s",
			j.level(at.Level), j.length(at.Level-given.Rim.V), j.shutOutWords(s, at, given.Rim.V))
	})
}

func (j *judge) shutOutWords(s *StormLines, at *grade.Structure, rim float64) string {
	shut, ok := j.shutOut(s, at, rim)
	switch {
	case !ok:
		return ""
	case shut == 0:
		return "; estimate: all of its flow would get in if the water stood no higher than the rims here and at the structure below"
	}
	return "; estimate: " + j.flow(shut) + " would not get in, the water standing no higher than the rims here and at the structure below"
}

// shutOut estimates the flow that would not get into a structure if water could rise no higher than the rims, here and at
// the structure below: what the pipe out that sets the level carries now, less what it carries with the head that is then
// left. Under pressure every loss grows with the square of the flow, so that
//
//	Q at the rims = Q √(head at the rims / (level - level below))
//
// Pipe by pipe, with the flows of the run in which all water gets in; there is none where no water flows.
func (j *judge) shutOut(s *StormLines, at *grade.Structure, rim float64) (flow float64, ok bool) {
	if at.Out < 0 {
		return 0, false
	}
	flow = s.Flows.Pipes[at.Out].Flow
	below := j.Network.Pipes[at.Out].To
	level := s.Lines.Structures[below].Level
	if flow <= 0 || at.Level <= level {
		return 0, false
	}
	loss := at.Level - level
	if given := &j.Network.Structures[below]; given.Kind != network.Outfall {
		level = min(level, given.Rim.Or(level))
	}
	return flow * max(0, 1-math.Sqrt(max(0, rim-level)/loss)), true
}

func (j *judge) freeboard() {
	j.eachLevel(func(s *StormLines, i network.StructureIndex, given *network.Structure, at *grade.Structure) {
		limit := j.Criteria.Freeboard
		if s.Storm != j.Storm {
			limit = j.Criteria.FreeboardCheck.Or(limit)
		}
		free := at.Freeboard(given)
		if !BreaksFreeboard(free, limit) {
			return
		}
		where := "rim is " + j.length(free.V) + " above the grade line"
		if free.V < 0 {
			where = "grade line is " + j.length(-free.V) + " above the rim"
		}
		j.addIn(s, "freeboard", given.ID, free, network.Some(limit), "the %s; %s of freeboard is asked%s", where, j.length(limit), j.cure(s, i))
	})
}

// BreaksFreeboard tells whether a freeboard is under its limit; not where it is not known.
func BreaksFreeboard(free network.Maybe, limit float64) bool {
	return free.OK && free.V < limit-levelRoom
}

// cure tells what could be done about a lack of freeboard in the design storm.
func (j *judge) cure(s *StormLines, i network.StructureIndex) string {
	switch {
	case s.Storm != j.Storm:
		return ""
	case j.Criteria.SizeFor != network.ForGradeLine:
		return `; size_for = "grade-line" lets sizes that are chosen grow until it holds`
	case j.Uncured[i]:
		return "; no larger size of a chosen pipe from here to the outfall lowers it"
	}
	return ""
}

func (j *judge) drownedOutfall() {
	j.eachLine(func(s *StormLines, i network.PipeIndex, p *network.Pipe, line *grade.Pipe) {
		outfall := &j.Network.Structures[p.To]
		water, crown := s.Tailwater.Of(outfall), p.InvertLower.V+p.Section.Rise()
		if outfall.Kind == network.Outfall && water.OK && water.V > crown+levelRoom {
			j.addIn(s, "drowned-outfall", p.ID, water, network.Some(crown), "the receiving water at outfall %s, %s, stands %s above the crown of the pipe",
				outfall.ID, j.level(water.V), j.length(water.V-crown))
		}
	})
}

func (j *judge) lowTailwater() {
	j.eachLine(func(s *StormLines, i network.PipeIndex, p *network.Pipe, line *grade.Pipe) {
		outfall := &j.Network.Structures[p.To]
		water := s.Tailwater.Of(outfall)
		if outfall.Kind == network.Outfall && water.OK && water.V < p.InvertLower.V-levelRoom {
			j.addIn(s, "low-tailwater", p.ID, water, p.InvertLower, "the receiving water at outfall %s, %s, is %s below the invert of the pipe: a free outfall",
				outfall.ID, j.level(water.V), j.length(p.InvertLower.V-water.V))
		}
	})
}

func (j *judge) jump() {
	j.eachLine(func(s *StormLines, i network.PipeIndex, p *network.Pipe, line *grade.Pipe) {
		if line.Jump.OK {
			j.addIn(s, "jump", p.ID, line.Jump, network.Maybe{}, "a hydraulic jump stands in the pipe, %s above its lower end at structure %s", j.length(line.Jump.V), j.id(p.To))
		}
	})
}

// gentle is the deflection up to which fast water follows a bend: common practice.
const gentle = 10

// fastBend looks for rapid water that has to turn: at the lower structure, or along the pipe.
func (j *judge) fastBend() {
	j.eachLine(func(s *StormLines, i network.PipeIndex, p *network.Pipe, line *grade.Pipe) {
		rapid := line.Steep && !line.Drowned
		switch {
		case line.End == grade.EndsRapid && line.Deflection > gentle:
			j.addIn(s, "fast-bend", p.ID, network.Some(line.Deflection), network.Some(gentle), "the water enters structure %s faster than critical and has to turn by %s°%s",
				j.id(p.To), num(line.Deflection, 0), assumedWord(line))
		case rapid && p.Bend > gentle:
			j.addIn(s, "fast-bend", p.ID, network.Some(p.Bend), network.Some(gentle), "the water runs faster than critical in a pipe that bends by %s°", num(p.Bend, 0))
		}
	})
}

func assumedWord(line *grade.Pipe) string {
	if line.AngleAssumed {
		return " (assumed)"
	}
	return ""
}

// angleAssumed speaks of pipes whose turn changes a loss: not where no loss is asked for, nor where a coefficient of the
// structure or the pipe takes its place, nor of dry pipes.
func (j *judge) angleAssumed() {
	if j.Lines == nil || j.Lines.Method() == grade.NoLoss {
		return
	}
	for i := range j.Network.Pipes {
		p, line := &j.Network.Pipes[i], &j.Lines.Pipes[i]
		if !line.Known || !line.AngleAssumed || line.Regime == grade.Dry || p.Loss.OK || j.Network.Structures[p.To].Loss.OK {
			continue
		}
		j.add("angle-assumed", p.ID, network.Some(line.Deflection), network.Maybe{},
			"neither coordinates nor the angle column tell how the pipe meets the pipe out of structure %s: %s° from straight on was taken", j.id(p.To), num(line.Deflection, 0))
	}
}

// lineUnknown speaks of pipes that have their levels, over water that is not known.
func (j *judge) lineUnknown() {
	if j.Lines == nil {
		return
	}
	for i := range j.Network.Pipes {
		p := &j.Network.Pipes[i]
		if !j.Lines.Pipes[i].Known && p.InvertUpper.OK && p.InvertLower.OK {
			j.add("grade-line-unknown", p.ID, network.Maybe{}, network.Maybe{}, "no grade line: the level at structure %s is not known, since a pipe below it has no inverts", j.id(p.To))
		}
	}
}

// gradeLineSize tells which pipes grew for the sake of the freeboard.
func (j *judge) gradeLineSize() {
	for _, g := range j.Growth {
		p := &j.Network.Pipes[g.Pipe]
		j.add("grade-line-size", p.ID, network.Some(p.Size.Rise), network.Some(g.From.Rise), "the size grew from %s to %s %s to lower the grade line at structure %s",
			sizeWord(g.From), sizeWord(p.Size), j.Units.Size, j.id(g.For))
	}
}

// sizeWord is a rise, or span and rise where they differ.
func sizeWord(s network.Size) string {
	if s.Span == s.Rise {
		return num(s.Rise, 0)
	}
	return num(s.Span, 0) + "x" + num(s.Rise, 0)
}

// Growth is a pipe that was enlarged for the sake of the freeboard.
type Growth struct {
	Pipe network.PipeIndex
	From network.Size // that it had for its flow alone
	For  network.StructureIndex
}
