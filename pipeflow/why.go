package pipeflow

import (
	"fmt"
	"math"
)

// NoAnswer says why a question has no answer, and what would do.
type NoAnswer struct {
	Wrong  string // what stands in the way
	Remedy string // what would give an answer
}

// Error is both in one line.
func (e *NoAnswer) Error() string { return e.Wrong + "; " + e.Remedy }

// WhyNoNormalDepth is why [Manning.NormalDepth] has no answer, nil where it has one.
func (m Manning) WhyNoNormalDepth(s Section, flow float64) error {
	if err := m.whyNone(); err != nil {
		return err
	}
	if !(flow >= 0) || math.IsInf(flow, 1) {
		return &NoAnswer{fmt.Sprintf("flow %.6g is no flow downstream", flow), "give a flow of 0 or more"}
	}
	if _, ok := m.NormalDepth(s, flow); ok {
		return nil
	}
	if most, depth, ok := m.LargestFlow(s); ok {
		return &NoAnswer{
			fmt.Sprintf("flow %.6g is over the largest discharge %.6g, at depth %.6g; full-bore capacity is %.6g",
				flow, most, depth, m.FullFlow(s)),
			m.whatCarries(s, flow),
		}
	}
	return &NoAnswer{
		fmt.Sprintf("flow %.6g is over the %.6g that the section carries up to depth %.6g", flow, m.FullFlow(s), s.Rise()),
		"describe the section higher up, or give a smaller flow",
	}
}

// whyNone is why no uniform flow exists at all.
func (m Manning) whyNone() error {
	switch {
	case !(m.N > 0) || math.IsInf(m.N, 1):
		return &NoAnswer{fmt.Sprintf("roughness n %.6g", m.N), "n must be over 0, such as 0.013"}
	case m.Slope == 0:
		return &NoAnswer{"on slope 0 no flow is uniform", "give a slope over 0, as rise over run"}
	case !(m.Slope > 0) || math.IsInf(m.Slope, 1):
		return &NoAnswer{
			fmt.Sprintf("on the adverse slope %.6g no flow is uniform", m.Slope),
			"give a slope over 0, as rise over run",
		}
	}
	return nil
}

// whatCarries says what slope or what larger size of the same shape runs full at a flow.
func (m Manning) whatCarries(s Section, flow float64) string {
	slope, _ := m.SlopeFor(s, s.Rise(), flow)
	scale, _ := m.ScaleFor(s, 1, flow)
	return fmt.Sprintf("slope %.6g or %.4g times the size would carry it full", slope, scale)
}

// WhyNoVelocityDepth is why [Manning.DepthsOfVelocity] has no answer, nil where it has one.
func (m Manning) WhyNoVelocityDepth(s Section, velocity float64) error {
	if err := m.whyNone(); err != nil {
		return err
	}
	if !(velocity >= 0) || math.IsInf(velocity, 1) {
		return &NoAnswer{fmt.Sprintf("velocity %.6g is no flow downstream", velocity), "give a velocity of 0 or more"}
	}
	if m.DepthsOfVelocity(s, velocity).Count > 0 {
		return nil
	}
	most, depth, ok := m.LargestVelocity(s)
	if !ok {
		return &NoAnswer{
			fmt.Sprintf("velocity %.6g is not reached in this section", velocity),
			"give a steeper slope or a smaller velocity",
		}
	}
	slope, _ := m.SlopeForVelocity(s, depth*underRoof, velocity)
	return &NoAnswer{
		fmt.Sprintf("velocity %.6g is over the largest, %.6g at depth %.6g", velocity, most, depth),
		fmt.Sprintf("slope %.6g would reach it", slope),
	}
}

// WhyNoCriticalDepth is why [CriticalDepth] has no answer, nil where it has one.
func WhyNoCriticalDepth(s Section, g, flow float64) error {
	if !(flow >= 0) || math.IsInf(flow, 1) || !(g > 0) {
		return &NoAnswer{fmt.Sprintf("flow %.6g with gravity %.6g", flow, g), "give a flow of 0 or more and g over 0"}
	}
	if _, ok := CriticalDepth(s, g, flow); ok {
		return nil
	}
	wet := s.At(s.Rise() * underRoof)
	most := wet.Area * math.Sqrt(g*wet.Area/wet.TopWidth)
	where := "below the flat roof"
	if !s.Closed() {
		where = "within the described section"
	}
	return &NoAnswer{
		fmt.Sprintf("flow %.6g has no critical depth %s: the rise %.6g is reached at %.6g", flow, where, s.Rise(), most),
		"the flow is rapid at every depth inside; use the rise, or a higher section",
	}
}
