package network

// Storm says which storm is run and how the Rational method is applied.
type Storm struct {
	ReturnPeriod   float64 // years
	CheckPeriod    Maybe   // years; the check storm beside the design storm
	MinimumTime    float64 // floor under the time at every structure, min
	Uplift         float64 // factor on every intensity
	RationalFactor float64
	ManningFactor  float64
	Travel         TravelVelocity
	Peak           Peak

	HoldUpstreamPeak bool
	FrequencyFactor  bool
}

// TravelVelocity says which velocity makes the travel time.
type TravelVelocity int8

// The velocity that makes the travel time.
const (
	TravelPartFull TravelVelocity = iota
	TravelFlowOverFullArea
	TravelFullBore
)

// TravelVelocities lists the words, in the order of the constants.
var TravelVelocities = []string{"part-full", "flow-over-full-area", "full-bore"}

// Peak says which peak of the Rational method is taken.
type Peak int8

// The peaks of the Rational method.
const (
	LongestTime Peak = iota
	PartialArea
)

// Peaks lists the words, in the order of the constants.
var Peaks = []string{"longest-time", "partial-area"}
