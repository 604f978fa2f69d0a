package grade

import (
	"math"

	"rimfall/network"
	"rimfall/network/sweep"
	"rimfall/pipeflow"
	"rimfall/pipeflow/surface"
)

// barrel is one barrel of a pipe with its flow.
type barrel struct {
	surface.Pipe
	flow   float64
	depths surface.Depths
}

// barrel prepares a pipe in which water flows. The sweep has found its normal depth already where it is under capacity.
func (l *Lines) barrel(p network.PipeIndex) barrel {
	pipe, run := &l.network.Pipes[p], &l.flows.Pipes[p]
	b := barrel{
		Pipe: surface.Pipe{
			Section: pipe.Section, Manning: pipe.Manning(l.settings.Manning), Gravity: l.settings.Gravity, Length: pipe.Length,
		},
		flow: run.Flow / float64(pipe.Count),
	}
	if run.State == sweep.PartFull {
		b.depths.Normal, b.depths.HasNormal = run.Depth, true
	} else {
		b.depths.Normal, b.depths.HasNormal = b.Manning.NormalDepth(b.Section, b.flow)
	}
	b.depths.Critical, b.depths.HasCritical = pipeflow.CriticalDepth(b.Section, b.Gravity, b.flow)
	return b
}

// critical is the critical depth; under a flat roof that leaves no room for it, the rise.
func (b *barrel) critical() float64 {
	if b.depths.HasCritical {
		return b.depths.Critical
	}
	return b.Section.Rise()
}

// head is the velocity head V²/2g at a depth; over the rise that of the full section.
func (b *barrel) head(depth float64) float64 {
	v := b.flow / b.Section.At(depth).Area
	return v * v / (2 * b.Gravity)
}

// draw finds the lines of a pipe from the level of the structure below it.
func (l *Lines) draw(p network.PipeIndex, profile *surface.Profile) {
	pipe, line := &l.network.Pipes[p], &l.Pipes[p]
	below := &l.Structures[pipe.To]
	line.Regime = l.alone(p)
	line.Deflection, line.AngleAssumed = l.turn(p, below.Out)
	if !below.Known || !pipe.InvertUpper.OK || !pipe.InvertLower.OK {
		return
	}
	if line.Regime == Dry {
		l.rest(p, network.Some(below.Level))
		return
	}
	b := l.barrel(p)
	depth, end := l.meet(p, &b)
	l.run(p, &b, depth, profile)
	switch {
	case line.Steep && !line.Drowned && !line.Jump.OK:
		end = EndsRapid
	case depth < b.critical():
		end = EndsFalling
	}
	line.End = end
}

// discharge finds the lines of a pipe into an outfall. A steep pipe leaves at its own depth, unless the specific force of
// the receiving water drives a jump into it; any other at the receiving water or the depth of a free outfall.
func (l *Lines) discharge(p network.PipeIndex, water network.Maybe, profile *surface.Profile) {
	pipe, line := &l.network.Pipes[p], &l.Pipes[p]
	line.Regime = l.alone(p)
	if !pipe.InvertUpper.OK || !pipe.InvertLower.OK {
		return
	}
	if line.Regime == Dry {
		l.rest(p, water)
		return
	}
	b := l.barrel(p)
	depth := 0.0
	if water.OK {
		depth = max(0, water.V-pipe.InvertLower.V)
	}
	if !b.IsSteep(b.flow, b.depths) {
		depth = max(depth, l.settings.Start.depth(b.critical(), b.Section.Rise()))
	}
	l.run(p, &b, depth, profile)
	line.End = EndsAtOutfall
}

// depth is the depth at a free outfall of a pipe that is not steep: midway between critical depth and the crown (HEC-22
// 3rd ed. section 7.1.5: the grade line of a free outfall may be taken at (dc + D)/2, from memory), or critical depth.
func (s Start) depth(critical, rise float64) float64 {
	if s == Midway {
		return (critical + rise) / 2
	}
	return critical
}

// rest is a pipe without flow: at both ends the water below, or the invert where that is higher. Nothing is lost.
func (l *Lines) rest(p network.PipeIndex, water network.Maybe) {
	pipe, line := &l.network.Pipes[p], &l.Pipes[p]
	upper, lower := pipe.InvertUpper.V, pipe.InvertLower.V
	line.control = water.Or(math.Inf(-1)) - lower
	if water.OK {
		upper, lower = max(upper, water.V), max(lower, water.V)
	}
	line.Known, line.End = true, EndsStill
	line.HGLUpper, line.EGLUpper, line.HGLLower, line.EGLLower = upper, upper, lower, lower
}

// run draws the surface from a height of the water below the pipe and sets the levels at both ends.
func (l *Lines) run(p network.PipeIndex, b *barrel, depth float64, profile *surface.Profile) {
	pipe, line := &l.network.Pipes[p], &l.Pipes[p]
	line.control = depth
	if err := profile.SolveWith(b.Pipe, b.flow, surface.Control{Level: depth}, b.depths); err != nil {
		return // an open section that overflows; pipes are closed
	}
	line.Known, line.Regime = true, regimeOf[profile.Regime]
	line.Steep, line.Drowned = profile.Steep, profile.Drowned
	line.Jump = network.Maybe{V: profile.Jump, OK: profile.HasJump}
	line.FullLength, line.Curve, line.Above = profile.FullLength, profile.Curve, profile.Above
	lower, upper := b.head(profile.Lower), b.head(profile.Upper)
	line.HGLLower = pipe.InvertLower.V + profile.Lower
	line.EGLLower = line.HGLLower + lower
	if !line.Steep || line.Drowned {
		line.Bend = BendLoss(pipe.Bend, upper)
	}
	line.HGLUpper = pipe.InvertUpper.V + profile.Upper + line.Bend + line.skew(pipe)
	line.EGLUpper = line.HGLUpper + upper
	line.full = profile.Upper+line.Bend >= b.Section.Rise()*(1-touching)
}

// skew is by how much the invert of the upper end lies under the one that the slope gives, which may differ by the rounding
// of a table. The surface is drawn on the slope; the pressure line of a pipe that is full throughout rises by Sf L whatever
// the inverts, so there it is made up for.
func (p *Pipe) skew(given *network.Pipe) float64 {
	if p.Regime != Full {
		return 0
	}
	return given.Slope.V*given.Length - (given.InvertUpper.V - given.InvertLower.V)
}

// touching is the share of the rise within which water counts as at the crown, above the rounding of a depth there.
const touching = 1e-9

// regimeOf gives the regimes of one pipe their place in the list.
var regimeOf = map[surface.Regime]Regime{
	surface.Dry: Dry, surface.PartFull: PartFull, surface.Full: Full, surface.PartlyFull: PartlyFull, surface.Jumps: Jumps,
}

// alone is how a pipe runs by itself, at normal depth or with its full area.
func (l *Lines) alone(p network.PipeIndex) Regime {
	switch l.flows.Pipes[p].State {
	case sweep.PartFull:
		return PartFull
	case sweep.Full:
		return Full
	}
	return Dry
}
