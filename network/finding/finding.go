package finding

import (
	"fmt"
	"math"
	"strconv"

	"rimfall/network"
	"rimfall/network/size"
	"rimfall/network/sweep"
	"rimfall/network/units"
)

// Finding is one thing that a rule found.
type Finding struct {
	Rule         *Rule
	Subject      string        // id of a pipe, structure or area
	Value, Limit network.Maybe // in job units
	Message      string
	Storm        float64 // return period, years
	Accepted     string  // the reason of a departure; "" where there is none
}

// Breaks tells whether the finding is an error that no departure accepts.
func (f *Finding) Breaks() bool { return f.Rule.Severity == Error && f.Accepted == "" }

// Run is what is judged: a complete network and what one storm does in it.
type Run struct {
	Network  *network.Network
	Criteria *network.Criteria
	Storm    *network.Storm
	Units    units.System
	FlowUnit string // in messages: "cfs", "m3/s" or "L/s"
	Flows    *sweep.Flows
	Remarks  []size.Remark
}

// Judge applies every rule. Findings come in the order of the catalogue, and
// within a rule in the order of the files.
func Judge(r Run) []Finding {
	j := &judge{Run: r}
	for _, rule := range []func(){
		j.capacity, j.depthRatio, j.noSizeCarries, j.adverseSlope, j.slope, j.cleansingVelocity, j.cleansingShear,
		j.highVelocity, j.cover, j.coverAlongPipe, j.crossingClearance, j.minSize, j.sizeDecrease, j.invertOrder, j.leastFall, j.sizeChange,
		j.lowestInvert, j.boundsCross, j.dropStructure, j.longPipe, j.outletVelocity, j.flowFalls, j.rationalArea,
		j.belowFirstDuration, j.timeAssumed, j.rimUnknown, j.levelsUnknown, j.wallUnknown, j.noFlow, j.unusedOutfall,
	} {
		rule()
	}
	return j.found
}

// judge collects findings.
type judge struct {
	Run
	found []Finding
}

// Room for the arithmetic when a value is held against its limit: levels are
// written to a hundredth of a foot or a millimetre, so a millionth of the length
// unit is never a real shortfall; other values carry sixteen digits.
const (
	levelRoom = 1e-6
	ratioRoom = 1e-7
)

func under(value, limit float64) bool { return value < limit-ratioRoom*math.Abs(limit) }
func over(value, limit float64) bool  { return value > limit+ratioRoom*math.Abs(limit) }

// add records a finding with its value and limit; the message is formatted.
func (j *judge) add(name, subject string, value, limit network.Maybe, format string, args ...any) {
	j.found = append(j.found, Finding{rule(name), subject, value, limit, fmt.Sprintf(format, args...), j.Storm.ReturnPeriod, ""})
}

// eachPipe calls a rule for every pipe with its results.
func (j *judge) eachPipe(rule func(p *network.Pipe, run *sweep.Pipe)) {
	for i := range j.Network.Pipes {
		rule(&j.Network.Pipes[i], &j.Flows.Pipes[i])
	}
}

func (j *judge) id(s network.StructureIndex) string { return j.Network.Structures[s].ID }

// The numbers of messages: enough digits to see the difference.
func num(v float64, decimals int) string { return strconv.FormatFloat(v, 'f', decimals, 64) }

func (j *judge) flow(v float64) string {
	return j.Units.ShowFlow(v, j.FlowUnit) + " " + units.FlowLabel(j.FlowUnit)
}
func (j *judge) speed(v float64) string  { return num(v, 2) + " " + j.Units.Velocity }
func (j *judge) level(v float64) string  { return num(v, j.decimals(2, 3)) }
func (j *judge) length(v float64) string { return num(v, j.decimals(2, 3)) + " " + j.Units.Length }
func percent(slope float64) string       { return num(100*slope, 3) + " %" }

func (j *judge) decimals(us, si int) int {
	if j.Units.Name == units.SI.Name {
		return si
	}
	return us
}
