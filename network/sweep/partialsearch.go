package sweep

import "rimfall/hydrology"

// peakTime is a time, the intensity of the storm then and the C·area that counts then.
type peakTime struct{ time, intensity, counted float64 }

func (p peakTime) product() float64 { return p.counted * p.intensity }

// search looks for the time at which counted·intensity is largest, by branch and
// bound: a stretch of time in which the product cannot reach the best found is
// passed over with all that is in it.
type search struct {
	*arrivals
	storm
	list  list
	total float64 // ΣCA
	best  peakTime
}

// stretch is a part of the time axis between two corners of the storm, with what is
// known at its ends.
type stretch struct{ from, to peakTime }

// peak searches a list of areas whose ΣCA is total. ok is false where the longest
// time is beyond what is known of the storm.
func (a *arrivals) peak(l list, total float64, st storm) (best peakTime, where hydrology.Range, ok bool) {
	longest := max(st.minimum, l.last+l.shift)
	intensity, where := st.rain.At(longest)
	if where == hydrology.Beyond {
		return peakTime{time: longest}, where, false
	}
	s := search{arrivals: a, storm: st, list: l, total: total, best: peakTime{longest, intensity, total}}
	s.overCorners(longest)
	_, where = st.rain.At(s.best.time)
	return s.best, where, true
}

// overCorners looks at the corners of the storm between the shortest and the
// longest time, and searches the stretches between them, the later ones first:
// there most counts.
func (s *search) overCorners(longest float64) {
	later := s.best
	for k := len(s.corners) - 1; k >= 0; k-- {
		if s.corners[k] < longest && s.corners[k] > s.minimum {
			later = s.between(peakTime{s.corners[k], s.falling[k], s.countedAt(s.corners[k])}, later)
		}
	}
	if later.time > s.minimum {
		i, _ := s.rain.At(s.minimum)
		s.between(peakTime{s.minimum, i, s.countedAt(s.minimum)}, later)
	}
}

// between looks at a time and at the stretch from it to a later one.
func (s *search) between(earlier, later peakTime) peakTime {
	s.look(earlier)
	s.visit(s.list.root, stretch{earlier, later}, line{})
	return earlier
}

// look keeps a time that gives more than the best so far, and of equal ones the shortest.
func (s *search) look(p peakTime) {
	if now, best := p.product(), s.best.product(); now > best || now == best && p.time < s.best.time {
		s.best = p
	}
}

func (s *search) countedAt(t float64) float64 {
	time := t - s.list.shift
	return s.within(s.upTo(s.list.root, time).at(time))
}

// within takes off what rounding puts over ΣCA or under nothing.
func (s *search) within(counted float64) float64 { return min(s.total, max(0, counted)) }

// bound is a number that the product is nowhere over in a stretch in which what
// counts rises no steeper than slope, but for wholes that come in at once.
//
// Rain falls off with duration and what counts grows, so it is not over what
// counts at the later end times the intensity at the earlier one. Where the storm
// sags under its chord, it is not over the chord times the line of the steepest
// rise either, a parabola. The first bound is out by the width of the stretch,
// this one by its square, so that round the flat top of a smooth flow few
// stretches are left.
func (s *search) bound(in stretch, slope, wholes float64) float64 {
	most, hardest := in.to.counted, in.from.intensity
	counted, width := in.from.counted+wholes, in.to.time-in.from.time
	if !s.convex || counted >= most || width <= 0 {
		return most * hardest
	}
	if slope <= 0 {
		return counted * hardest
	}
	drop := (hardest - in.to.intensity) / width
	x := min(width, (most-counted)/slope) // there the line reaches most
	if drop > 0 {
		x = min(x, max(0, (slope*hardest-drop*counted)/(2*slope*drop)))
	}
	return (counted + slope*x) * (hardest - drop*x)
}

// visit searches the moments of a tree in a stretch; before is the line of all
// moments before the tree.
func (s *search) visit(tree int32, in stretch, before line) {
	m := &s.moments[tree]
	if s.bound(in, before.slope+m.steepest, m.wholes) < s.best.product() {
		return
	}
	if tree == 0 {
		s.turn(in, before)
		return
	}
	t := m.time + s.list.shift
	here := before.plus(m.upToHere(&s.moments[m.left]))
	if t <= in.from.time {
		s.visit(m.right, in, here)
		return
	}
	if t >= in.to.time {
		s.visit(m.left, in, before)
		return
	}
	i, _ := s.rain.At(t)
	p := peakTime{t, i, s.within(here.at(m.time))}
	s.look(p)
	early, late := stretch{in.from, p}, stretch{p, in.to}
	if p.counted*in.from.intensity > in.to.counted*i {
		s.visit(m.left, early, before)
		s.visit(m.right, late, here)
		return
	}
	s.visit(m.right, late, here)
	s.visit(m.left, early, before)
}
