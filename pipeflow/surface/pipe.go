package surface

import (
	"fmt"
	"math"

	"rimfall/pipeflow"
)

// Pipe is one barrel.
type Pipe struct {
	Section pipeflow.Section
	Manning pipeflow.Manning // Slope is upper less lower invert over the length; zero and negative are taken
	Gravity float64          // g, over 0
	Length  float64          // along the pipe, over 0
}

// Control is what holds the water at the two ends.
type Control struct {
	// Level is the height of the water below the pipe over its lower invert: over the rise where the outlet is
	// drowned, at or below 0 where it falls away.
	Level float64
	// Upper is the depth of a stream that enters at the upper end faster than critical, from a gate for one. 0, or a
	// depth that is not below critical, leaves the upper end to the pipe.
	Upper float64
}

// Depths are normal and critical depth of a flow in a pipe.
type Depths struct {
	Normal      float64
	HasNormal   bool // false: the slope is not over 0 or the flow is over the most that the pipe carries uniformly
	Critical    float64
	HasCritical bool // false: under a flat roof the flow is fast at any depth
}

// Depths solves for normal and critical depth of a flow in one barrel.
func (p Pipe) Depths(flow float64) Depths {
	var d Depths
	d.Normal, d.HasNormal = p.Manning.NormalDepth(p.Section, flow)
	d.Critical, d.HasCritical = pipeflow.CriticalDepth(p.Section, p.Gravity, flow)
	return d
}

// check refuses what is outside the stated range.
func (p Pipe) check(flow float64, c Control) error {
	switch {
	case p.Section == nil:
		return fmt.Errorf("surface: a pipe needs a section")
	case !over0(p.Length), !over0(p.Gravity), !over0(p.Manning.N), !over0(p.Manning.Factor):
		return fmt.Errorf("surface: length %v, gravity %v, n %v and Manning factor %v must be finite and over zero",
			p.Length, p.Gravity, p.Manning.N, p.Manning.Factor)
	case !finite(p.Manning.Slope), !finite(c.Level), !finite(c.Upper):
		return fmt.Errorf("surface: slope %v, level %v and upper depth %v must be finite", p.Manning.Slope, c.Level, c.Upper)
	case !finite(flow), flow < 0:
		return fmt.Errorf("surface: flow %v must be finite and not negative", flow)
	}
	return nil
}

func over0(x float64) bool { return x > 0 && finite(x) }

func finite(x float64) bool { return !math.IsNaN(x) && !math.IsInf(x, 0) }
