package grade_test

import (
	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/sweep"
	"rimfall/network/units"
	"rimfall/pipeflow"
)

// drain is a network with a flow for every pipe, as a sweep would have found it.
type drain struct {
	network.Network
	flow     []float64 // of all barrels
	settings grade.Settings
	units    units.System
}

func newDrain(u units.System) *drain {
	return &drain{units: u, settings: grade.Settings{Gravity: u.Gravity, Manning: u.ManningFactor}}
}

// structure adds a structure and returns its index.
func (d *drain) structure(s network.Structure) network.StructureIndex {
	d.Structures = append(d.Structures, s)
	return network.StructureIndex(len(d.Structures) - 1)
}

// pipe adds a pipe with its flow. Its slope follows from its inverts; one barrel and n 0.013 where not given.
func (d *drain) pipe(p network.Pipe, flow float64) network.PipeIndex {
	if p.Count == 0 {
		p.Count = 1
	}
	if p.N == 0 {
		p.N = 0.013
	}
	if p.InvertUpper.OK && p.InvertLower.OK {
		p.Slope = network.Some((p.InvertUpper.V - p.InvertLower.V) / p.Length)
	}
	d.Pipes = append(d.Pipes, p)
	d.flow = append(d.flow, flow)
	return network.PipeIndex(len(d.Pipes) - 1)
}

// flows are the results of a sweep with the given peaks.
func (d *drain) flows() *sweep.Flows {
	f := &sweep.Flows{Pipes: make([]sweep.Pipe, len(d.Pipes)), Structures: make([]sweep.Structure, len(d.Structures))}
	for i := range d.Pipes {
		p, run := &d.Pipes[i], &f.Pipes[i]
		run.Flow = d.flow[i]
		run.Capacity, run.HasCapacity = p.Capacity(d.settings.Manning)
		switch {
		case run.Flow <= 0:
			run.State = sweep.Dry
		case run.HasCapacity && run.Flow <= run.Capacity:
			depth, ok := p.Manning(d.settings.Manning).NormalDepth(p.Section, run.Flow/float64(p.Count))
			if run.State = sweep.Full; ok {
				run.State, run.Depth = sweep.PartFull, depth
			}
		default:
			run.State, run.Depth = sweep.Full, p.Section.Rise()
		}
	}
	return f
}

// lines draws the lines for the design storm.
func (d *drain) lines() *grade.Lines {
	d.Connect()
	return grade.Up(&d.Network, d.settings, d.flows(), grade.DesignTailwater)
}

// circle is a round section of a diameter in the size unit.
func (d *drain) circle(size float64) pipeflow.Section {
	c, err := pipeflow.NewCircle(size / d.units.SizeFactor)
	if err != nil {
		panic(err)
	}
	return c
}

// complainer is a test, or a property in one.
type complainer interface {
	Helper()
	Errorf(format string, args ...any)
}

// near complains where two numbers are farther apart than a tolerance.
func near(t complainer, what string, got, want, tolerance float64) {
	t.Helper()
	if !(got-want <= tolerance) || !(want-got <= tolerance) {
		t.Errorf("%s: %.9g, want %.9g within %g", what, got, want, tolerance)
	}
}
