package calculator

import (
	"fmt"

	"rimfall/pipeflow/catalog"
)

// note adds what the reader of the answer has to know.
func (a *Answer) note() {
	a.noteSize()
	a.noteDepths()
	a.noteRoughness()
	a.noteState()
}

func (a *Answer) add(format string, args ...any) {
	a.Notes = append(a.Notes, fmt.Sprintf(format, args...))
}

// noteSize says where the size comes from.
func (a *Answer) noteSize() {
	if a.fullDepth {
		a.add("No depth was given, so the size is the one that carries the flow at its full-bore capacity.")
	}
	switch {
	case a.Asked == Size && a.Exact.Listed:
		a.add("%s %s is the next listed size (%s).", a.Conduit.SizeLabel(), a.Units.Size, a.Exact.Source)
	case a.Asked == Size:
		a.add("No listed size is large enough; the exact one would be built to order.")
	case a.Conduit.Closed():
		a.noteUnlisted()
	}
	if c := a.Conduit.Shape; c == string(catalog.Ellipse) || c == string(catalog.UprightEllipse) {
		a.add("The section is a true ellipse of that span and rise; pipe that is built of arcs holds 2.5 to 4 %% more.")
	}
}

// noteUnlisted offers the nearest listed size.
func (a *Answer) noteUnlisted() {
	c := &a.Conduit
	if _, ok := c.listed(a.Units); ok || c.Haunch > 0 {
		return
	}
	near, ok := catalog.Nearest(a.Units.Name, c.Material, catalog.Shape(c.Shape), c.Size.Span, c.Size.Rise)
	if ok {
		a.add("%s %s is no listed size; the nearest is %s (%s).", c.SizeLabel(), a.Units.Size, near.Label(), near.Standard)
	}
}

// noteDepths says that there are two answers, and why.
func (a *Answer) noteDepths() {
	switch {
	case a.Second == nil:
		return
	case !a.Section.Closed():
		a.add("More than one depth carries this flow: a bench that is flooded adds more wall than area. The water stands at one of them by what lies downstream.")
		if a.More > 0 {
			a.add("There are %s depths; the two lowest are given.", number(a.More+2))
		}
	case a.Question.Flow.OK:
		a.add("Two depths carry this flow, since it lies between the full-bore capacity, %s, and the largest discharge, %s at depth %s. The upper one does not last: any wave closes the pipe. Designs count on the full-bore capacity only.",
			a.say(Discharge, a.First.FullFlow.V), a.say(Discharge, a.First.LargestFlow.V), a.say(Length, a.First.LargestDepth.V))
	default:
		a.add("Two depths have this velocity, since it lies between that of the full pipe, %s, and the largest.", a.say(Speed, a.First.FullVelocity.V))
	}
}

// noteRoughness says how n comes about where it is not one given number.
func (a *Answer) noteRoughness() {
	switch {
	case a.VaryingN:
		a.add("n is that of the full pipe times %s at this depth (Camp 1946, from memory; the curve is of circular pipes).", figure(a.First.N/a.N))
	case a.Conduit.roughSomewhere() && a.Composite == Lotter:
		a.add("The n of the parts are joined by Lotter's rule, in which their flows add up (Chow 1959, eq. 6-19).")
	case a.Conduit.roughSomewhere():
		a.add("The n of the parts are joined by Horton's and Einstein's rule, in which all have one mean velocity (Chow 1959, eq. 6-17).")
	}
}

// Near critical depth a small change of energy is a large one of depth; within a tenth
// of Froude number 1 the surface is taken to be unsteady (common practice).
const (
	unsteadyFrom = 0.9
	unsteadyTo   = 1.1
)

// noteState warns of flow near the critical state, and of a flow without one.
func (a *Answer) noteState() {
	if f := a.First.Froude; f.OK && f.V > unsteadyFrom && f.V < unsteadyTo {
		a.add("The flow is near critical (Froude number %s): the depth is unsteady, and waves stand on it.", figure(f.V))
	}
	if !a.First.CriticalDepth.OK {
		a.add("There is no critical depth below the roof: the flow would need more than the rise and is rapid at every depth.")
	}
	if ratio := a.First.Ratio; ratio.OK && ratio.V < 1 && a.First.Flow > a.First.FullFlow.V*(1+sameLength) && a.Second == nil {
		a.add("The flow is over the full-bore capacity, %s: where the water touches the roof, it fills the pipe. Designs count on the full-bore capacity only.", a.say(Discharge, a.First.FullFlow.V))
	}
}
