package calculator

import (
	"fmt"

	"rimfall/network"
	"rimfall/pipeflow"
)

// findChannel finds the bottom width of a trapezoid or rectangle, or the side slope of
// a trapezoid or triangle, with which a flow runs at a depth.
func (a *Answer) findChannel() error {
	d := a.Question.Depth
	if !d.OK || !a.Question.Flow.OK {
		return refuse(a.Asked+" is sought from depth and flow", "give both, and leave out the velocity")
	}
	if d.OfRise {
		return refuse("depth "+d.Written+" is a share of the rise, which an open section has not", "give the depth in "+a.Units.Length)
	}
	m := pipeflow.Manning{Factor: a.Units.ManningFactor, N: a.N, Slope: a.Slope}
	length, ok := m.LengthFor(a.Question.Flow.V, 0, a.widest(m), func(v float64) (pipeflow.Section, float64, error) {
		s, err := a.channel(v)
		return s, d.V, err
	})
	if !ok {
		return a.refuseChannel(m)
	}
	if a.Asked == Bottom {
		a.Conduit.Bottom = network.Some(length)
	} else {
		a.Conduit.Left, a.Conduit.Right = network.Some(length), network.Some(length)
	}
	s, err := a.channel(length)
	if err != nil {
		return err
	}
	a.setSection(s)
	a.First = a.state(d.V, a.Question.Flow.V)
	return nil
}

// widest is a length with which the channel carries more than the flow, found by
// doubling; the bound is far beyond any channel.
func (a *Answer) widest(m pipeflow.Manning) float64 {
	const bound = 1e12
	length := 1.0
	for length < bound {
		if s, err := a.channel(length); err == nil && m.Flow(s, a.Question.Depth.V) > a.Question.Flow.V {
			break
		}
		length *= 2
	}
	return length
}

// channel is the section with the length that is sought.
func (a *Answer) channel(length float64) (pipeflow.Section, error) {
	c := a.Conduit
	if a.Asked == Bottom {
		return pipeflow.NewTrapezoid(length, c.Left.Or(c.Right.V), c.Right.Or(c.Left.V))
	}
	return pipeflow.NewTrapezoid(c.Bottom.V, length, length)
}

// refuseChannel: without the length that is sought the section carries the flow.
func (a *Answer) refuseChannel(m pipeflow.Manning) error {
	s, err := a.channel(0)
	if err != nil || m.Flow(s, a.Question.Depth.V) < a.Question.Flow.V { // the flow is beyond any width
		return refuse(fmt.Sprintf("no %s of the channel carries %s at depth %s", a.Asked, a.say(Discharge, a.Question.Flow.V), a.say(Length, a.Question.Depth.V)),
			"give another depth")
	}
	return refuse(fmt.Sprintf("at depth %s the channel carries %s with %s 0 already, over the %s asked for",
		a.say(Length, a.Question.Depth.V), a.say(Discharge, m.Flow(s, a.Question.Depth.V)), a.Asked, a.say(Discharge, a.Question.Flow.V)),
		"give a smaller depth, a larger flow, or steeper sides")
}
