package surface

import (
	"errors"

	"rimfall/pipeflow"
)

// Profile is a result with the surface between the ends. One profile can be solved again and again without allocating; it
// takes about 7 kB. The zero value is ready.
type Profile struct {
	Result
	pipe  Pipe
	flow  float64
	level float64  // of the water below
	held  float64  // length from the lower end over which the tranquil surface stands
	sub   tranquil // and above that the rapid one
	sup   rapid
}

// ErrOvertops is given where the water would stand over the walls of an open section.
var ErrOvertops = errors.New("surface: the water stands over the walls of the open section")

// Solve draws the surface of a flow (of one barrel, not negative) between two controls. It is an error where a number is
// outside its range, and [ErrOvertops] where an open section overflows. The profile then holds nothing of use.
func (p *Profile) Solve(pipe Pipe, flow float64, c Control) error {
	if err := pipe.check(flow, c); err != nil {
		return err
	}
	return p.SolveWith(pipe, flow, c, pipe.Depths(flow))
}

// SolveWith is [Profile.Solve] for a caller that has normal and critical depth already and vouches for its numbers.
func (p *Profile) SolveWith(pipe Pipe, flow float64, c Control, d Depths) error {
	p.Result = Result{Depths: d}
	p.pipe, p.flow, p.level, p.held = pipe, flow, c.Level, 0
	if flow == 0 {
		p.still()
		return nil
	}
	p.sub.water = newWater(pipe, flow)
	w := &p.sub.water
	d, p.Steep = w.classify(d)
	start, isRapid := c.start(d, p.Steep)
	if p.Steep && start == d.Critical && c.Level > d.Critical && w.full < w.slope {
		p.meet(d)
	} else {
		if isRapid {
			p.sup.lay(w, d, p.Steep, start, pipe.Length)
		}
		if !p.Steep || c.Level > d.Critical {
			p.sub.lay(d, p.Steep, max(c.Level, d.Critical), pipe.Length)
		}
		p.join(d, isRapid)
	}
	if !w.closed && max(p.Lower, p.Upper, p.JumpAfter) >= w.rise {
		return ErrOvertops
	}
	return nil
}

// still is a pipe without flow: a level pool, or nothing.
func (p *Profile) still() {
	p.Regime = Dry
	p.Lower, p.Upper = p.pool(0), p.pool(p.pipe.Length)
}

// pool is the depth of a level pool at a distance from the lower end.
func (p *Profile) pool(distance float64) float64 {
	return max(0, p.level-p.pipe.Manning.Slope*distance)
}

// start is the depth at which a rapid stream begins at the upper end, if there is one.
func (c Control) start(d Depths, steep bool) (depth float64, ok bool) {
	if c.Upper > 0 && c.Upper < d.Critical {
		return c.Upper, true
	}
	return d.Critical, steep
}

// join sets the tranquil surface against the rapid one: the water below holds the pipe, or stays outside, or a
// jump stands where their specific forces match.
func (p *Profile) join(d Depths, isRapid bool) {
	length := p.pipe.Length
	if !isRapid {
		p.hold(d, length)
		p.Upper = p.sub.depth(length)
		return
	}
	if p.Steep && p.level <= d.Critical {
		p.leave(d)
		return
	}
	low, high := p.sup.bottom, min(length, p.sub.end())
	excessLow, _ := p.sub.excess(&p.sup, low)
	excessHigh, _ := p.sub.excess(&p.sup, high)
	switch {
	case low == 0 && excessLow <= 0:
		p.leave(d)
	case high == length && excessHigh >= 0:
		p.hold(d, length)
		p.Upper, p.Drowned = p.sub.depth(length), p.Steep
	default:
		p.stand(d, low, high, low+(high-low)*excessLow/(excessLow-excessHigh))
	}
}

// stand puts the jump between two distances from the lower end, beginning to look at a guess.
func (p *Profile) stand(d Depths, low, high, guess float64) {
	p.Jump, p.HasJump = jump(&p.sub, &p.sup, low, high, guess), true
	p.hold(d, p.Jump)
	p.Regime, p.Upper = Jumps, p.sup.start
	p.Above = p.sub.water.rapidCurve(d, p.Steep, p.sup.start)
	p.JumpBefore, p.JumpAfter = p.sup.depth(p.Jump), p.sub.depth(p.Jump)
}

// leave is a rapid stream that runs out of the lower end.
func (p *Profile) leave(d Depths) {
	p.Regime = PartFull
	p.Lower, p.Upper = p.sup.depth(0), p.sup.start
	p.Curve = p.sub.water.rapidCurve(d, p.Steep, p.sup.start)
}

// hold is the tranquil surface over a length from the lower end.
func (p *Profile) hold(d Depths, length float64) {
	p.held = length
	p.Lower = p.sub.depth(0)
	p.FullLength = p.sub.fullLength(length)
	if p.FullLength < length {
		p.Curve = p.sub.water.tranquilCurve(d, p.Steep, min(p.sub.level, p.sub.water.rise))
	}
	switch p.FullLength {
	case 0:
		p.Regime = PartFull
	case p.pipe.Length:
		p.Regime = Full
	default:
		p.Regime = PartlyFull
	}
}

// FroudeLower is the Froude number at the lower end; none where it is dry or full.
func (p *Profile) FroudeLower() (number float64, ok bool) { return p.froude(p.Lower) }

// FroudeUpper is the Froude number at the upper end; none where it is dry or full.
func (p *Profile) FroudeUpper() (number float64, ok bool) { return p.froude(p.Upper) }

func (p *Profile) froude(depth float64) (number float64, ok bool) {
	if p.Regime == Dry {
		return 0, false
	}
	return pipeflow.Froude(p.pipe.Section, p.pipe.Gravity, depth, p.flow)
}
