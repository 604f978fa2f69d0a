package calculator

import (
	"fmt"

	"rimfall/pipeflow"
)

// say shows a number with its unit.
func (a *Answer) say(m Measure, v float64) string { return m.With(a.Units, v) }

// refuseDepth: the depth is over the rise.
func (a *Answer) refuseDepth(rise float64) error {
	d := a.Question.Depth
	if a.Section != nil && !a.Section.Closed() {
		return refuse(fmt.Sprintf("depth %s is over the lower bank of the ground line, %s above its lowest point", a.say(Length, d.V), a.say(Length, rise)),
			"give a smaller depth, or carry the line on to higher ground")
	}
	given := a.say(Length, d.V)
	if d.OfRise {
		given = d.Written
	}
	return refuse(fmt.Sprintf("depth %s is over the rise of %s = %s", given, a.sizeWithUnit(), a.say(Length, rise)),
		fmt.Sprintf("give at most that, in %s, or as a share of the rise such as 0.8D or full", a.Units.Length))
}

// sizeWithUnit is the size of a closed shape with its unit.
func (a *Answer) sizeWithUnit() string { return a.Conduit.SizeLabel() + " " + a.Units.Size }

// refuseFlow: no depth carries the flow.
func (a *Answer) refuseFlow() error {
	q := a.Question.Flow.V
	flow := "flow " + a.say(Discharge, q)
	if !a.Section.Closed() {
		rise := a.Section.Rise()
		return refuse(fmt.Sprintf("%s is over the %s that the section carries up to its lower bank, depth %s", flow, a.say(Discharge, a.flow.flow(rise)), a.say(Length, rise)),
			"carry the ground line on to higher ground, or give a smaller flow")
	}
	most, at, _ := a.flow.largest()
	slope, _ := a.flow.at(a.Section.Rise()).SlopeFor(a.Section, a.Section.Rise(), q)
	remedy := fmt.Sprintf("this size would run full with it at a slope of %s", figure(slope))
	if next, ok := a.nextSize(); ok {
		remedy += fmt.Sprintf(", and at this slope the listed size %s %s carries it", next.Label(), a.Units.Size)
	}
	return refuse(fmt.Sprintf("%s is over the largest discharge of the section, %s at depth %s (full-bore capacity %s)",
		flow, a.say(Discharge, most), a.say(Length, at), a.say(Discharge, a.flow.flow(a.Section.Rise()))), remedy)
}

// refuseVelocity: no depth has the velocity.
func (a *Answer) refuseVelocity() error {
	v := a.Velocity.V
	velocity := "velocity " + a.say(Speed, v)
	most, at, ok := a.flow.manning.LargestVelocity(a.Section)
	if !ok {
		why := a.flow.manning.WhyNoVelocityDepth(a.Section, v)
		return refuse(velocity+" is not reached at any depth of this section on this slope", remedyOf(why))
	}
	slope := a.Slope * (v / most) * (v / most) // velocity grows like the root of the slope
	return refuse(fmt.Sprintf("%s is over the largest, %s at depth %s", velocity, a.say(Speed, most), a.say(Length, at)),
		fmt.Sprintf("a slope of %s would reach it at that depth", figure(slope)))
}

func remedyOf(err error) string {
	if none, is := err.(*pipeflow.NoAnswer); is {
		return none.Remedy
	}
	return "give another velocity"
}

// refuseArea: flow over velocity needs more area than there is.
func (a *Answer) refuseArea(area float64) error {
	return refuse(fmt.Sprintf("flow %s over velocity %s is an area of %s, and the whole section has %s",
		a.say(Discharge, a.Question.Flow.V), a.say(Speed, a.Velocity.V), a.say(Area, area), a.say(Area, a.Section.At(a.Section.Rise()).Area)),
		"give a smaller flow, a larger velocity or a larger section")
}
