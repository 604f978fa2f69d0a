package review

import (
	"slices"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/grade"
	"rimfall/network/sweep"
)

// plan says for every pipe of a system which of its choices is taken.
type plan []int16

// reliever looks for the relief of one system.
type reliever struct {
	subject *Subject
	options *ReliefOptions
	rain    hydrology.Intensity
	system  *system
	order   []network.PipeIndex // of the pipes, downstream
	choices [][]Choice          // by pipe
	asItIs  verdict

	runs  int
	spent int // networks that were made and not run
	until int // the count of both at which the steps end
	found bool
	least bool
	best  plan
	bound Price
	left  []Place
}

// verdict is what a plan comes to.
type verdict struct {
	problems []network.Problem // the system cannot be run: a time is beyond the rainfall
	broken   []Place           // limits that do not hold
	shortage float64           // of all of them: parts of the capacity, and ft or m
	falls    []bool            // by pipe: it is smaller than one that enters
	newFall  bool
}

// holds tells whether a plan may be built.
func (v *verdict) holds() bool { return len(v.problems) == 0 && len(v.broken) == 0 && !v.newFall }

// newReliever lists the choices of a system, and judges it as it is.
func (s *Subject) newReliever(o *ReliefOptions, rain hydrology.Intensity, part *system) *reliever {
	f := &reliever{subject: s, options: o, rain: rain, system: part}
	candidates := analysis.Candidates(s.Job)
	n := part.network
	f.choices = make([][]Choice, len(n.Pipes))
	for i := range n.Pipes {
		p := &n.Pipes[i]
		f.choices[i] = s.choicesFor(n, p, o, candidates(p.Shape, p.Material))
	}
	order, _ := n.Order()
	for _, at := range order {
		f.order = append(f.order, n.PipesOut(at)...)
	}
	f.best = make(plan, len(n.Pipes))
	f.asItIs = f.judge(f.best)
	return f
}

// built is the system with a plan carried out; twin gives for each second pipe, in the order in which they stand after
// the pipes of the system, the pipe beside which it lies.
func (f *reliever) built(p plan) (n *network.Network, twin []network.PipeIndex) {
	n = f.system.network.Clone()
	for i, c := range p {
		choice := &f.choices[i][c]
		pipe := &n.Pipes[i]
		switch choice.Work {
		case Replace:
			pipe.Size, pipe.Section, pipe.Wall, pipe.HasWall = choice.Size, choice.Section, choice.Wall, choice.HasWall
		case Double:
			f.turnAsItWas(pipe, network.PipeIndex(i))
			second := *pipe
			part, share := conveyanceShare(pipe, choice), pipe.Share.Or(1)
			second.Size, second.Section, second.Wall, second.HasWall = choice.Size, choice.Section, choice.Wall, choice.HasWall
			second.Count, second.Share = 1, network.Some(share*part)
			pipe.Share = network.Some(share - share*part)
			n.Pipes = append(n.Pipes, second)
			twin = append(twin, network.PipeIndex(i))
		}
	}
	n.Connect()
	return n, twin
}

// turnAsItWas gives a pipe that is doubled the angle that it is taken to have, so that its second pipe is not taken
// to enter from the side.
func (f *reliever) turnAsItWas(pipe *network.Pipe, i network.PipeIndex) {
	pipe.Angle = assumedAngle(f.system.network, i)
}

// assumedAngle is the angle of a pipe as its column has it; where neither that nor coordinates give it, what the grade
// lines take: the largest pipe in straight on, any other at a right angle.
func assumedAngle(n *network.Network, i network.PipeIndex) network.Maybe {
	pipe := &n.Pipes[i]
	if pipe.Angle.OK || len(n.PipesOut(pipe.To)) == 0 {
		return pipe.Angle
	}
	placed := func(s network.StructureIndex) bool { return n.Structures[s].X.OK && n.Structures[s].Y.OK }
	if placed(pipe.From) && placed(pipe.To) && placed(n.Pipes[n.PipesOut(pipe.To)[0]].To) {
		return pipe.Angle
	}
	if largest, _, ok := n.LargestIn(pipe.To); ok && largest == i {
		return network.Some(0)
	}
	return network.Some(90)
}

// judge runs a plan and holds it against the limits.
func (f *reliever) judge(p plan) verdict {
	f.runs++
	n, twin := f.built(p)
	v := verdict{falls: f.fallsIn(n, twin)}
	for i, falls := range v.falls {
		v.newFall = v.newFall || falls && f.asItIs.falls != nil && !f.asItIs.falls[i]
	}
	flows, problems := sweep.Down(n, &f.subject.Storm, f.rain, nil)
	if v.problems = problems; len(problems) > 0 {
		return v
	}
	run := state{network: n, criteria: &f.subject.Job.Settings.Criteria, flows: &flows}
	if slices.ContainsFunc(f.options.Limits, func(l LimitKind) bool { return l != Capacity }) {
		run.lines = grade.Up(n, f.subject.settings, &flows, grade.DesignTailwater)
	}
	for _, l := range f.options.Limits {
		f.hold(&v, &run, l, twin)
	}
	return v
}

// hold adds the places at which a limit is broken in a run to a verdict.
func (f *reliever) hold(v *verdict, run *state, l LimitKind, twin []network.PipeIndex) {
	if !l.OfPipes() {
		for i := range run.network.Structures {
			room, ok := run.rimRoom(network.StructureIndex(i))
			if l == Freeboard {
				room, ok = run.freeboardRoom(network.StructureIndex(i))
			}
			v.add(Place{l, int32(i)}, room, ok)
		}
		return
	}
	for i := range run.network.Pipes {
		p := network.PipeIndex(i)
		room, ok := run.capacityRoom(p)
		if l == Crown {
			room, ok = run.crownRoom(p, true)
		} else if ok {
			room /= run.flows.Pipes[i].Capacity
		}
		own := p
		if second := i - len(f.system.pipes); second >= 0 {
			own = twin[second]
		}
		v.add(Place{l, int32(own)}, room, ok)
	}
}

func (v *verdict) add(at Place, room float64, ok bool) {
	if !ok || room >= 0 {
		return
	}
	v.shortage -= room
	if !slices.Contains(v.broken, at) {
		v.broken = append(v.broken, at)
	}
}

// fallsIn tells for every pipe of the system whether it, with its second pipe, is smaller than the largest pipe that enters
// its upper structure. Below a split of the network as it was no fall is judged, as in a check.
func (f *reliever) fallsIn(n *network.Network, twin []network.PipeIndex) []bool {
	falls := make([]bool, len(f.system.pipes))
	area := make([]float64, len(falls))
	for i := range n.Pipes {
		own := i
		if i >= len(area) {
			own = int(twin[i-len(area)])
		}
		area[own] += n.Pipes[i].FullArea()
	}
	for i := range falls {
		from := n.Pipes[i].From
		if _, largest, ok := n.LargestIn(from); ok && len(f.system.network.PipesOut(from)) == 1 {
			falls[i] = area[i]*overSameArea < largest
		}
	}
	return falls
}

// price is what a plan costs.
func (f *reliever) price(p plan) Price {
	var sum Price
	for i, c := range p {
		sum = sum.plus(f.choices[i][c].Price)
	}
	return sum
}
