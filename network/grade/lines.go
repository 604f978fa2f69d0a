package grade

import (
	"rimfall/network"
	"rimfall/network/sweep"
	"rimfall/pipeflow/surface"
)

// Lines are the grade lines of one storm, by index. They are read-only once made.
type Lines struct {
	Pipes      []Pipe
	Structures []Structure

	network  *network.Network
	flows    *sweep.Flows
	settings Settings
}

// Pipe is the grade line along one pipe. Where Known is false an invert of it, or the level of the water below it, is not
// known; then Regime alone holds, and it tells how the pipe would run by itself.
type Pipe struct {
	Known  bool
	Regime Regime

	HGLUpper, HGLLower float64 // level of the water, or of the pressure line, in the ends of the pipe
	EGLUpper, EGLLower float64 // the same with the velocity head

	Steep      bool          // normal depth is under critical depth
	Drowned    bool          // steep, and the water below reaches the upper end
	Jump       network.Maybe // distance of a hydraulic jump from the lower end
	FullLength float64       // length that runs full
	Curve      surface.Curve // usual name of the free surface, below a jump where there is one; "" where there is none
	Above      surface.Curve // of the surface above a jump

	End          End     // how it ends at its lower structure
	Bend         float64 // loss of the bend along the pipe, part of the levels of the upper end
	Deflection   float64 // degrees from straight on into the pipe out that governs, 0 to 180
	AngleAssumed bool    // Deflection is neither given nor known from coordinates

	full    bool    // full at the upper end
	control float64 // height of the water below the pipe over its lower invert; -Inf under a dry pipe over none
}

// Regime is how a pipe runs.
type Regime int8

// The regimes.
const (
	Dry        Regime = iota // no flow
	PartFull                 // a free surface from end to end
	Full                     // full from end to end
	PartlyFull               // full over a part of the length
	Jumps                    // a jump stands in the pipe; below it the pipe may run full
)

// Regimes lists the words for the regimes, in the order of their constants.
var Regimes = []string{"dry", "part-full", "full", "partly-full-length", "jump"}

func (r Regime) String() string { return Regimes[r] }

// End is how a pipe ends at its lower structure.
type End int8

// The ends.
const (
	EndsStill     End = iota // no flow: the level below it, or its own invert
	EndsBacked               // the level of the structure holds the water in the pipe
	EndsFalling              // at critical depth, over lower water
	EndsRapid                // faster than critical, out of a steep pipe
	EndsGiven                // at the rise of the grade line that its own loss asks for
	EndsAtOutfall            // in the receiving water, or at the depth of a free outfall
)

// Structure is the grade line at one structure. Where Known is false its level is not known, and the rest says nothing.
type Structure struct {
	Known bool
	Level float64           // of the water in the structure: hydraulic and energy grade line alike
	Out   network.PipeIndex // the pipe out that sets the level; -1 at an outfall
	Parts Parts             // of the loss from there to the energy in the upper end of that pipe

	plunge  float64 // level over which a pipe in plunges
	counted float64 // part of the velocity head of a pipe in that makes up the level with its depth
}

// Freeboard is the rim less the level; none where the rim or the level is not known. It is negative where the line stands
// above the rim.
func (s *Structure) Freeboard(given *network.Structure) network.Maybe {
	if !s.Known || !given.Rim.OK {
		return network.Maybe{}
	}
	return network.Some(given.Rim.V - s.Level)
}

// Parts are the named parts of the fall of the energy line from a structure's level to the upper end of a pipe out. They
// add up to it.
type Parts struct {
	Entrance    float64 // into the pipe: Eai - Ei
	Benching    float64 // shape of the floor
	Angle       float64 // inflows that turn
	Plunging    float64 // inflows that fall
	Held        float64 // what keeps the level from sinking under the energy of the pipe out
	Coefficient float64 // a coefficient on the velocity head of the pipe out
	Junction    float64 // momentum at a blind junction
}

// Sum is the whole fall.
func (p Parts) Sum() float64 {
	return p.Entrance + p.Benching + p.Angle + p.Plunging + p.Held + p.Coefficient + p.Junction
}

// Method is the method of the structures' losses.
func (l *Lines) Method() Method { return l.settings.Method }
