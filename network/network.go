package network

import "rimfall/pipeflow"

// Dense indexes into the slices of a Network.
type (
	StructureIndex int32
	PipeIndex      int32
	AreaIndex      int32
)

// Kind says what a structure is.
type Kind int8

// The kinds of structure. A blind junction is buried and has no rim.
const (
	Manhole Kind = iota
	Inlet
	BlindJunction
	Outfall
)

// Kinds lists the words for the kinds, in the order of their constants.
var Kinds = []string{"manhole", "inlet", "blind-junction", "outfall"}

func (k Kind) String() string { return Kinds[k] }

// Benching says how the floor of a structure is shaped.
type Benching int8

// The forms of benching, as in the FHWA access-hole method.
const (
	Flat Benching = iota
	Depressed
	HalfBench
	FullBench
	ImprovedBench
)

// Benchings lists the words for the benchings, in the order of their constants.
var Benchings = []string{"flat", "depressed", "half", "full", "improved"}

func (b Benching) String() string { return Benchings[b] }

// Structure is a node of the network: where pipes meet and water enters.
type Structure struct {
	ID   string
	Kind Kind
	X, Y Maybe // plan coordinates

	Rim            Maybe // level at which water would leave; ground at an outfall
	Tailwater      Maybe // level of the receiving water, design storm; outfalls
	TailwaterCheck Maybe // the same for the check storm

	Inflow       float64 // steady flow that enters here, cfs or m³/s
	LowestInvert Maybe   // no pipe end here below it
	LeastFall    Maybe   // in place of the criterion
	Benching     Benching
	Loss         Maybe // on the velocity head of the pipe out, in place of the method

	Note string
	Line int32 // in its file
}

// Pipe is an edge of the network, of one or several equal barrels.
type Pipe struct {
	ID       string
	From, To StructureIndex
	Length   float64 // in plan, centre to centre

	Shape    string           // "circle", "box", …
	Section  pipeflow.Section // of one barrel; nil: to be sized
	Size     Size             // as given or chosen
	Count    int32            // barrels
	Material string
	N        float64 // Manning's n

	// Inverts at the structures' centres and the hydraulic slope. Any two give the
	// third; what is neither given nor follows is left out.
	InvertUpper, InvertLower, Slope Maybe
	// GivenSlope: the slope stands in the file; a lower invert then follows it exactly.
	GivenSlope bool

	Wall     float64 // thickness, ft or m
	HasWall  bool    // given, or in the catalogue
	Angle    Maybe   // degrees from the line of the pipe out of To, 0 straight on
	Loss     Maybe   // of the entry into To, velocity heads of the pipe out
	Bend     float64 // total deflection along the pipe, degrees
	Existing bool
	Share    Maybe // of the flow where a structure has several pipes out

	// What was not given and was assumed in its place; Network.Assumptions says from what.
	AssumedUpper, AssumedLower, AssumedN bool

	Note string
	Line int32
}

// Size is the inside size of a barrel in the job's size unit, inches or
// millimetres. Span equals Rise for a circle.
type Size struct{ Span, Rise float64 }

// FullArea is the area of all barrels flowing full; 0 while the pipe has no size.
func (p *Pipe) FullArea() float64 {
	if p.Section == nil {
		return 0
	}
	return float64(p.Count) * p.Section.At(p.Section.Rise()).Area
}

// Area is one catchment, or a piece of one, that drains to a structure.
type Area struct {
	ID        string
	Structure StructureIndex
	Area      float64 // acre or ha
	C         float64 // runoff coefficient, 0 to 1
	Surface   string  // the surface that C was looked up from, if any
	Time      Maybe   // inlet time, min
	Note      string
	Line      int32
}

// Network is a whole storm drain as it was given. Its adjacency is made by
// Connect and is read-only afterwards.
type Network struct {
	Structures []Structure
	Pipes      []Pipe
	Areas      []Area
	Ground     []GroundPoint // between structures, in the order of SortGround
	Crossings  []Crossing

	Assumptions []Assumption // what was not given, in the order of the pipes

	out, in adjacency[PipeIndex]
	here    adjacency[AreaIndex]
}

// Connect builds the adjacency from the ends of the pipes and the structures of
// the areas. Call it again after pipes or areas were added.
func (n *Network) Connect() {
	count := len(n.Structures)
	n.out = group[PipeIndex](count, len(n.Pipes), func(i int) StructureIndex { return n.Pipes[i].From })
	n.in = group[PipeIndex](count, len(n.Pipes), func(i int) StructureIndex { return n.Pipes[i].To })
	n.here = group[AreaIndex](count, len(n.Areas), func(i int) StructureIndex { return n.Areas[i].Structure })
}

// PipesOut lists the pipes that leave structure s, in file order.
func (n *Network) PipesOut(s StructureIndex) []PipeIndex { return n.out.of(s) }

// PipesIn lists the pipes that enter structure s, in file order.
func (n *Network) PipesIn(s StructureIndex) []PipeIndex { return n.in.of(s) }

// AreasAt lists the areas that drain to structure s, in file order.
func (n *Network) AreasAt(s StructureIndex) []AreaIndex { return n.here.of(s) }

// LeastFallAt is the least fall through structure s, from its own column or the
// criteria.
func (n *Network) LeastFallAt(s StructureIndex, c *Criteria) float64 {
	return n.Structures[s].LeastFall.Or(c.LeastFall)
}

// Clone copies the pipes, so that they can be completed, and shares the rest.
func (n *Network) Clone() *Network {
	c := *n
	c.Pipes = append([]Pipe(nil), n.Pipes...)
	return &c
}
