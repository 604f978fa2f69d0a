package sweep

import "rimfall/network"

// Flows are the results of one pass, by index. They are read-only afterwards.
type Flows struct {
	Pipes      []Pipe
	Structures []Structure
}

// State is how a pipe runs at its design flow, taken by itself.
type State int8

// The states: no flow; a free surface at normal depth; the full area, because
// the flow is over the full-bore capacity or the pipe does not fall.
const (
	Dry State = iota
	PartFull
	Full
)

// Pipe is what the pass finds for one pipe. Flows and capacity are of all
// barrels together, depth and velocity of one.
type Pipe struct {
	Area, CA  float64 // totals upstream, acre or ha
	CACounted float64 // what counts at the peak: CA with longest-time peaks
	Inflow    float64 // steady flows upstream, cfs or m³/s
	Time      float64 // that governs at the upper end, min; the minimum where CA is 0
	Intensity float64 // at that time, in/h or mm/h, uplift included
	Flow      float64 // peak
	Held      bool    // Flow is the larger peak of a pipe upstream

	State       State
	HasCapacity bool    // the pipe falls to its lower end
	Capacity    float64 // full-bore, all barrels
	Depth       float64 // normal depth; the rise where over capacity; none where Full by adverse slope
	Velocity    float64 // at that depth; none where Dry
	TravelTime  float64 // min
	Part        bool    // by partial area, a time shorter than the longest governs
	BelowFirst  bool    // the time is shorter than the first duration of the rainfall
}

// Rained tells whether any area with runoff drains to the pipe; only then is its
// time handed on.
func (p *Pipe) Rained() bool { return p.CA > 0 }

// Structure is what the pass finds at one structure.
type Structure struct {
	Area, CA, Inflow float64 // totals upstream and here
	CACounted        float64 // what counts at the peak
	Time, Intensity  float64 // that govern; the minimum time where CA is 0
	Flow             float64 // factor·CACounted·i + inflow
	BelowFirst       bool
	Part             bool // by partial area, a time shorter than the longest governs
	Beyond           bool // the time is beyond the rainfall: there is no flow
}

// Rained tells whether any area drains to the structure.
func (s *Structure) Rained() bool { return s.CA > 0 }

// newFlows makes room for the results of a network.
func newFlows(n *network.Network) Flows {
	return Flows{make([]Pipe, len(n.Pipes)), make([]Structure, len(n.Structures))}
}
