package grade

// Settings say how the lines are found, in the job's coherent units.
type Settings struct {
	Method  Method
	Start   Start
	Gravity float64 // g, ft/s² or m/s²
	Manning float64 // unit constant of Manning's equation
}

// Method says how the loss of a structure is found.
type Method int8

// The methods.
const (
	AccessHole  Method = iota // FHWA access holes: entrance, benching, angle and plunging flow
	Coefficient               // a coefficient on the velocity head of the pipe out
	NoLoss                    // the level is the energy of the pipe out
)

// Methods lists the words for the methods, in the order of their constants.
var Methods = []string{"access-hole", "coefficient", "none"}

func (m Method) String() string { return Methods[m] }

// Start says where the line starts at a free outfall of a pipe that is not steep.
type Start int8

// The starts.
const (
	Midway     Start = iota // halfway between critical depth and the crown
	AtCritical              // critical depth
)

// Starts lists the words for the starts, in the order of their constants.
var Starts = []string{"midway", "critical"}

func (s Start) String() string { return Starts[s] }

// Tailwater says which of the two levels of the receiving water holds.
type Tailwater int8

// The tailwaters.
const (
	DesignTailwater Tailwater = iota
	CheckTailwater            // where it is blank, that of the design storm
)
