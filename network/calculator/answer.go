package calculator

import (
	"rimfall/network"
	"rimfall/pipeflow"
)

// Answer is a question with what was found and the whole state of flow.
type Answer struct {
	Question        // as given
	Asked    string // what was unknown

	// What the state of flow rests on; of these one may be found, the rest is given.
	Conduit   Conduit
	Section   pipeflow.Section
	N, Slope  float64 // n of the full pipe where it varies with depth
	First     State
	Second    *State // a second depth that answers the same question
	More      int    // further depths beyond the second, along a ground line
	Exact     Exact  // of a size that was asked for
	Notes     []string
	Working   []Part
	flow      uniform
	fullDepth bool // the depth was left open and taken as full
}

// Exact is the size that answers to the digit, beside the listed one that is taken.
type Exact struct {
	Size   network.Size // in or mm; zero where no size was asked for
	Listed bool         // the answer is a listed size; false: none is large enough, and the exact size is taken
	Source string       // standard and series of the listed size
}

// Ask answers a question. The error says why there is no answer and what would do.
func Ask(q Question) (*Answer, error) {
	if err := q.judge(); err != nil {
		return nil, err
	}
	asked, err := q.asked()
	if err != nil {
		return nil, err
	}
	a := &Answer{Question: q, Asked: asked, Conduit: q.Conduit, N: q.N.V, Slope: q.Slope.V}
	if err := a.find(); err != nil {
		return nil, err
	}
	a.note()
	a.work()
	return a, nil
}

// find finds the unknown and the state of flow.
func (a *Answer) find() error {
	switch a.Asked {
	case Size:
		return a.findSize()
	case Bottom, Side:
		return a.findChannel()
	}
	s, err := a.Conduit.section(a.Units)
	if err != nil {
		return err
	}
	a.setSection(s)
	switch {
	case a.Asked == Flow:
		return a.findFlow()
	case a.Asked == Slope:
		return a.findSlope()
	case a.Asked == N:
		return a.findN()
	case a.Question.Flow.OK:
		return a.findDepth()
	}
	return a.findDepthOfVelocity()
}

// setSection takes the section, and the uniform flow in it.
func (a *Answer) setSection(s pipeflow.Section) {
	a.Section = s
	a.flow = a.uniformIn(s, a.N, a.Slope)
}

func (a *Answer) findFlow() error {
	depth, err := a.depthIn(a.Section)
	if err != nil {
		return err
	}
	a.First = a.state(depth, a.flow.flow(depth))
	return nil
}

// findDepth finds every depth that carries the flow.
func (a *Answer) findDepth() error {
	depths := a.flow.depths(a.Question.Flow.V)
	if len(depths) == 0 {
		return a.refuseFlow()
	}
	a.setDepths(depths, func(float64) float64 { return a.Question.Flow.V })
	return nil
}

func (a *Answer) findDepthOfVelocity() error {
	if a.flow.varying != nil {
		return refuse("a depth is not sought from a velocity where n changes with depth", "give the flow, or a list of depths to read the velocity from")
	}
	depths := ascending(a.flow.manning.DepthsOfVelocity(a.Section, a.Velocity.V))
	if len(depths) == 0 {
		return a.refuseVelocity()
	}
	a.setDepths(depths, a.flow.flow)
	return nil
}

// setDepths takes the states at the depths that were found.
func (a *Answer) setDepths(depths []float64, flow func(depth float64) float64) {
	a.First = a.state(depths[0], flow(depths[0]))
	if len(depths) > 1 {
		second := a.state(depths[1], flow(depths[1]))
		a.Second, a.More = &second, len(depths)-2
	}
}

func (a *Answer) findSlope() error {
	depth, flow, err := a.depthAndFlow()
	if err != nil {
		return err
	}
	slope, _ := a.flow.at(depth).SlopeFor(a.Section, depth, flow)
	a.Slope = slope
	a.setSection(a.Section)
	a.First = a.state(depth, flow)
	return nil
}

func (a *Answer) findN() error {
	depth, flow, err := a.depthAndFlow()
	if err != nil {
		return err
	}
	n, _ := a.flow.at(depth).RoughnessFor(a.Section, depth, flow)
	if a.VaryingN {
		n /= pipeflow.PartFullRatio(depth / a.Section.Rise())
	}
	a.N = n
	a.setSection(a.Section)
	a.First = a.state(depth, flow)
	return nil
}

// depthAndFlow makes depth and flow of two of depth, flow and velocity: Q = A V.
func (a *Answer) depthAndFlow() (depth, flow float64, err error) {
	flow = a.Question.Flow.V
	if !a.Question.Depth.OK {
		area := flow / a.Velocity.V
		depth, ok := depthOfArea(a.Section, area)
		if !ok {
			return 0, 0, a.refuseArea(area)
		}
		return depth, flow, nil
	}
	depth, err = a.depthIn(a.Section)
	if a.Velocity.OK {
		flow = a.Velocity.V * a.Section.At(depth).Area
	}
	return depth, flow, err
}

// depthIn is the given depth in a section.
func (a *Answer) depthIn(s pipeflow.Section) (float64, error) {
	d, rise := a.Question.Depth, s.Rise()
	switch {
	case d.OfRise && !s.Closed():
		return 0, refuse("depth "+d.Written+" is a share of the rise, which an open section has not", "give the depth in "+a.Units.Length)
	case d.OfRise && d.V <= 1:
		return d.V * rise, nil
	case d.OfRise || d.V > rise*(1+sameLength):
		return 0, a.refuseDepth(rise)
	}
	if d.V >= rise*(1-sameLength) {
		return rise, nil
	}
	return d.V, nil
}
