package finding

import (
	"cmp"
	"fmt"
	"math"
	"slices"
	"strconv"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/size"
	"rimfall/network/sweep"
	"rimfall/network/times"
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

	Lines   *grade.Lines // of this storm; nil: the grade lines are not judged
	Check   *StormLines  // the check storm's, where there is one
	Growth  []Growth     // pipes enlarged for the freeboard
	Uncured map[network.StructureIndex]bool

	Paths []times.Walked // flow paths of areas in this storm
	Rain  *Rain          // nil: nothing is said of it
}

// Judge applies every rule. Findings come in the order of the catalogue, and
// within a rule in the order of the files.
func Judge(r Run) []Finding {
	j := &judge{Run: r}
	for _, rule := range []func(){
		j.capacity, j.surcharge, j.flooding, j.freeboard, j.depthRatio, j.noSizeCarries, j.gradeLineSize, j.adverseSlope, j.slope, j.cleansingVelocity, j.cleansingShear,
		j.highVelocity, j.cover, j.coverAlongPipe, j.crossingClearance, j.minSize, j.sizeDecrease, j.invertOrder, j.leastFall, j.sizeChange,
		j.lowestInvert, j.boundsCross, j.existingChosen, j.dropStructure, j.longPipe, j.outletVelocity,
		j.drownedOutfall, j.fastBend, j.angleAssumed, j.jump, j.lowTailwater, j.lineUnknown, j.flowFalls, j.rationalArea,
		j.belowFirstDuration, j.pathLimit, j.pathBelowFirst, j.pathUnused, j.stormBetween, j.rainfallConverted, j.rainfallRemark, j.assumed, j.timeAssumed, j.rimUnknown, j.levelsUnknown, j.wallUnknown, j.noFlow, j.unusedOutfall,
	} {
		rule()
	}
	for i := range j.Network.Pipes { // one way through memory for all rules
		for _, rule := range j.pipeRules {
			rule(&j.Network.Pipes[i], &j.Flows.Pipes[i])
		}
	}
	at := places()
	slices.SortStableFunc(j.found, func(a, b Finding) int { return cmp.Compare(at[a.Rule], at[b.Rule]) })
	return j.found
}

// judge collects findings.
type judge struct {
	Run
	found     []Finding
	pipeRules []func(p *network.Pipe, run *sweep.Pipe)
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

// eachPipe has a rule called for every pipe with its results.
func (j *judge) eachPipe(rule func(p *network.Pipe, run *sweep.Pipe)) {
	j.pipeRules = append(j.pipeRules, rule)
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
