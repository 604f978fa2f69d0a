package network

// Criteria are the limits that a design is held against, in the job's coherent
// units. A limit that is not set is not judged.
type Criteria struct {
	Title string // of the set they come from; "" where none was named
	File  string // of that set

	MinCover, MaxCover Maybe // rim to the outside of the pipe
	MinSlope, MaxSlope float64
	SizeChange         SizeChange
	LeastFall          float64 // lowest invert in to invert out of a structure
	MinRise            float64
	MaxDepthRatio      float64
	SizeFor            SizeFor
	MinVelocity        float64
	VelocityBasis      VelocityBasis
	MinShear           Maybe // boundary shear at design depth, lb/ft² or Pa
	MaxVelocity        float64
	Freeboard          float64
	FreeboardCheck     Maybe   // in the check storm; not given: the same
	N                  float64 // for a pipe with neither n nor material

	MinClearance      Maybe // upright gap to a crossing service
	MaxDrop           Maybe // fall through a structure above which a drop structure is called for
	MaxSpacing        Maybe // length of a pipe between structures
	MaxOutletVelocity Maybe // at an outfall without protection
	MaxRationalArea   Maybe // total area upstream to which the Rational method is trusted
}

// SizeChange says what lines up where sizes change.
type SizeChange int8

// What lines up where sizes change.
const (
	MatchCrowns SizeChange = iota
	MatchInverts
	MatchPoint8 // the points at 0.8 of the rise
)

// SizeChanges lists the words, in the order of the constants.
var SizeChanges = []string{"crowns", "inverts", "0.8-points"}

func (s SizeChange) String() string { return SizeChanges[s] }

// Height is the part of the rise at which the matched point lies.
func (s SizeChange) Height() float64 {
	switch s {
	case MatchCrowns:
		return 1
	case MatchPoint8:
		return 0.8
	}
	return 0
}

// SizeFor says what a size must serve.
type SizeFor int8

// What a size must serve.
const (
	ForCapacity SizeFor = iota
	ForGradeLine
)

// SizeFors lists the words, in the order of the constants.
var SizeFors = []string{"capacity", "grade-line"}

// VelocityBasis says which velocity is held against the cleansing velocity.
type VelocityBasis int8

// The velocity that is held against the cleansing velocity.
const (
	FullBore VelocityBasis = iota
	AtDesignDepth
)

// VelocityBases lists the words, in the order of the constants.
var VelocityBases = []string{"full-bore", "design"}
