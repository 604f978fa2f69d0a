package drawing

import (
	"slices"

	"rimfall/network"
)

// samples is the legend: of what stands on the sheet and nothing else.
func (s *profileSheet) samples() []sample {
	var list []sample
	given, straight := s.groundKinds()
	if given {
		list = append(list, s.penSample(givenGround, "ground, as given"))
	}
	if straight {
		list = append(list, s.penSample(straightGround, "straight from rim to rim"))
	}
	for i := range s.r.storms {
		storm := &s.r.storms[i]
		if storm.lines == nil {
			continue
		}
		list = append(list,
			s.penSample(penOf(hydraulic, storm), "hydraulic grade line, "+storm.years()),
			s.penSample(penOf(energy, storm), "energy grade line, "+storm.years()))
	}
	for _, existing := range []bool{false, true} {
		if s.anyPipe(func(p *network.Pipe) bool { return p.Existing == existing }) {
			list = append(list, s.pipeSample(existing))
		}
	}
	return append(list, s.structureSamples()...)
}

// groundKinds tells which lines of ground are drawn.
func (s *profileSheet) groundKinds() (given, straight bool) {
	for _, l := range s.groundLines() {
		given, straight = given || l.given, straight || !l.given
	}
	return given, straight
}

func (s *profileSheet) anyPipe(is func(*network.Pipe) bool) bool {
	return slices.ContainsFunc(s.line.pipes[s.part.first:s.part.last], func(p network.PipeIndex) bool { return is(&s.r.Network.Pipes[p]) })
}

// structureSamples shows the tops of structures, the ends of other pipes, and services.
func (s *profileSheet) structureSamples() []sample {
	var list []sample
	middle := func(b Box) Point { return Point{(b.Left + b.Right) / 2, (b.Top + b.Bottom) / 2} }
	top := func(pen Pen, text string) sample {
		return sample{func(b Box) { s.Line(Point{b.Left + 3, middle(b).Y}, Point{b.Right - 3, middle(b).Y}, pen) }, text}
	}
	oval := func(pen Pen, fill Fill, text string) sample {
		return sample{func(b Box) { s.Ellipse(middle(b), 0.7, 1.6, pen, fill) }, text}
	}
	var others, services, covers, inlets bool
	for k := s.part.first; k <= s.part.last; k++ {
		kind := s.r.Network.Structures[s.line.structures[k]].Kind
		others = others || len(s.otherEnds(k)) > 0
		inlets = inlets || kind == network.Inlet
		covers = covers || kind == network.Manhole || kind == network.BlindJunction
	}
	s.crossingsOf(func(float64, *network.Crossing) { services = true })
	for _, entry := range []struct {
		there bool
		sample
	}{
		{covers, top(cover, "cover")},
		{inlets, top(grating, "inlet, grate")},
		{others, oval(opening, White, "other pipe")},
		{services, oval(shaft, Hatched, "crossing service")},
	} {
		if entry.there {
			list = append(list, entry.sample)
		}
	}
	return list
}

// pipeSample shows the two edges of a pipe.
func (s *sheet) pipeSample(existing bool) sample {
	pen, text := proposedPipe, "pipe, proposed"
	if existing {
		pen, text = existingPipe, "pipe, existing"
	}
	return sample{func(b Box) {
		for _, y := range [...]float64{b.Top + 1.2, b.Bottom - 1.2} {
			s.Line(Point{b.Left, y}, Point{b.Right, y}, pen)
		}
	}, text}
}
