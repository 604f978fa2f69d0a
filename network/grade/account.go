package grade

import "rimfall/network"

// Loss is one named part of the fall of the energy line through a structure.
type Loss struct {
	Name  string
	Value float64 // ft or m; negative where the line rises
}

// Account names the parts of the fall of the energy line from the lower end of a pipe in to the upper end of a pipe out of
// the same structure; they add up to it. Parts that are 0 are left out. out is -1 at an outfall: what is lost there is
// the exit into the receiving water. There is nothing where a line is not known.
func (l *Lines) Account(in, out network.PipeIndex) []Loss {
	line, pipe := &l.Pipes[in], &l.network.Pipes[in]
	at := &l.Structures[pipe.To]
	switch {
	case !line.Known || !at.Known:
		return nil
	case out == none || at.Out == none:
		return named(Loss{"exit", line.EGLLower - at.Level})
	case pipe.Loss.OK && line.End != EndsStill:
		return l.givenAccount(in, out)
	}
	set := *at
	if out != at.Out {
		set = l.ask(pipe.To, out)
	}
	p := &set.Parts
	return named(
		Loss{entryNames[line.End], line.EGLLower - at.Level},
		Loss{"held by another pipe out", at.Level - set.Level},
		Loss{"entrance", p.Entrance}, Loss{"benching", p.Benching}, Loss{"angle", p.Angle}, Loss{"plunging", p.Plunging},
		Loss{"not under the energy of the pipe out", p.Held},
		Loss{"coefficient", p.Coefficient}, Loss{"junction", p.Junction},
	)
}

// entryNames names what is lost between the end of a pipe in and the water in the structure.
var entryNames = [...]string{
	EndsStill: "dry end", EndsBacked: "exit", EndsFalling: "fall", EndsRapid: "dissipated", EndsGiven: "exit", EndsAtOutfall: "exit",
}

// givenAccount is the account of a pipe with a loss of its own, which raises its hydraulic grade line over that of the pipe
// out, whatever the level of the structure.
func (l *Lines) givenAccount(in, out network.PipeIndex) []Loss {
	line, pipe := &l.Pipes[in], &l.network.Pipes[in]
	governing, other := &l.Pipes[l.Structures[pipe.To].Out], &l.Pipes[out]
	head := governing.EGLUpper - governing.HGLUpper
	given := pipe.Loss.V * head
	return named(
		Loss{entryNames[line.End], line.HGLLower - governing.HGLUpper - given},
		Loss{"loss of the pipe", given},
		Loss{"change of velocity head", line.EGLLower - line.HGLLower - head},
		Loss{"held by another pipe out", governing.EGLUpper - other.EGLUpper},
	)
}

// named drops the parts that are 0.
func named(all ...Loss) []Loss {
	kept := all[:0]
	for _, l := range all {
		if l.Value != 0 {
			kept = append(kept, l)
		}
	}
	return kept
}
