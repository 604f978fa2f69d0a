package surface

// Regime is one plain word for how a pipe runs.
type Regime string

// The regimes.
const (
	PartFull   Regime = "part-full"          // a free surface from end to end
	Full       Regime = "full"               // full from end to end
	PartlyFull Regime = "partly-full-length" // full over a part of the length
	Jumps      Regime = "jump"               // a jump stands in the pipe; below it the pipe may run full
	Dry        Regime = "dry"                // no flow
)

// Result is the water surface of one pipe as the network needs it. Depths are heights of the surface over the invert at
// that place; over the rise they are the height of the pressure line.
type Result struct {
	Regime     Regime
	Lower      float64 // depth at the lower end
	Upper      float64 // depth at the upper end
	FullLength float64 // length that runs full
	Depths     Depths  // normal and critical depth

	Steep   bool // the slope is steep for this flow; false where there is none
	Drowned bool // a steep pipe in which the water below reaches the upper end

	HasJump    bool
	Jump       float64 // distance of the jump from the lower end
	JumpBefore float64 // depth above the jump, where the water arrives
	JumpAfter  float64 // depth below it

	Curve Curve // of the free surface, below a jump where there is one; blank where that runs full
	Above Curve // of the surface above a jump; blank without one
}
