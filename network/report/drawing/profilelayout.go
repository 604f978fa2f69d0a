package drawing

import (
	"fmt"
	"math"

	"rimfall/network"
	"rimfall/network/units"
)

// Room of a profile sheet, mm.
const (
	headColumn  = 44.0 // the headings of the table, and left of the graph its levels
	levelColumn = 13.0 // levels right of the graph
	sideRoom    = 14.0 // in the graph beyond the first and the last structure
	nameBand    = 11.0 // names of the structures over the graph
	stationBand = 4.5  // stations of the grid under the graph
	fanBand     = 6.0  // lines from the stations to the columns of the table
	rowHeight   = 3.9
	tableFoot   = 1.0
	spareHeight = 14.0 // in the graph over and under the levels
)

// Limits of the scales that are chosen. Beyond the smallest scale a line goes on on a further sheet; a profile is not
// drawn out of shape more than 25 times (common practice: ten is usual).
const (
	smallestScaleFeet   = 200.0
	smallestScaleMetres = 2000.0
	greatestRatio       = 25.0
)

// part is what one sheet shows of a line: structures first to last.
type part struct{ first, last int }

// layout is how a line is laid on its sheets.
type layout struct {
	parts        []part
	along, up    scale
	exaggeration float64
	gaps         []float64
	table        table
}

// across is the width of the graph between the first and the last structure.
func across(p Paper) float64 {
	return p.Width - 2*edge - headColumn - levelColumn - 2*sideRoom
}

// graphHeight is what is left for the graph over the table.
func graphHeight(p Paper, t *table) float64 {
	return p.Height - 2*edge - stripHeight - nameBand - stationBand - fanBand - float64(t.rows())*rowHeight - tableFoot
}

// NoScale says that a drawing does not fit on its paper at the scale that was asked for.
type NoScale struct{ Text string }

func (e NoScale) Error() string { return e.Text }

// newLayout chooses the scales that are not asked for: along the line the largest at which it fits on one sheet, or on the
// fewest; upright the largest at which every sheet has room for its levels.
func newLayout(r *run, l *line, o ProfileOptions) (layout, error) {
	t := newTable(r, l)
	a := layout{table: t, gaps: t.gaps()}
	height := graphHeight(o.Paper, &t) - spareHeight
	if o.Up > 0 {
		a.up = newScale(r.units, o.Up)
	}
	fits := func(p part) bool {
		low, high, ok := levels(r, l, p)
		return o.Up <= 0 || !ok || (high-low)*a.up.mm <= height
	}
	if !a.chooseAlong(l, r.units, o, fits) {
		return a, NoScale{fmt.Sprintf("a pipe of %s does not fit on %s at the scale that is asked for; take a smaller scale, that is a larger number, or larger paper",
			l.title(r.Network), o.Paper.Title)}
	}
	if o.Up <= 0 {
		a.chooseUp(r, l, height)
	}
	a.exaggeration = a.up.mm / a.along.mm
	return a, nil
}

// chooseAlong sets the scale along the line and the parts into which it is cut. ok is false where a single pipe does not
// fit at the scale that is asked for.
func (a *layout) chooseAlong(l *line, u units.System, o ProfileOptions, fits func(part) bool) (ok bool) {
	if o.Along > 0 {
		a.along = newScale(u, o.Along)
		a.parts, ok = a.split(l, a.along, across(o.Paper), fits)
		return ok
	}
	smallest := smallestScaleFeet
	if u.Name == units.SI.Name {
		smallest = smallestScaleMetres
	}
	for _, s := range scales(u, firstScale(u)) {
		parts, ok := a.split(l, s, across(o.Paper), fits)
		if ok && (a.parts == nil || len(parts) < len(a.parts)) {
			a.parts, a.along = parts, s
		}
		if len(a.parts) == 1 || a.parts != nil && s.ratio >= smallest {
			break
		}
	}
	return a.parts != nil
}

// chooseUp sets the upright scale.
func (a *layout) chooseUp(r *run, l *line, height float64) {
	tallest := a.tallest(r, l)
	for _, s := range scales(r.units, firstScale(r.units)/10) {
		a.up = s
		if s.mm/a.along.mm <= greatestRatio*(1+1e-9) && tallest*s.mm <= height {
			return
		}
	}
}

// split cuts a line at structures into parts that fit on a sheet at a scale: each as long as it can be. ok is false where a
// single pipe does not fit.
func (a *layout) split(l *line, s scale, width float64, fits func(part) bool) (parts []part, ok bool) {
	first, columns := 0, 0.0
	room := func(k int) bool {
		return (l.stations[k+1]-l.stations[first])*s.mm <= width && columns <= width && fits(part{first, k + 1})
	}
	for k := range l.pipes {
		columns += a.gaps[k]
		if room(k) {
			continue
		}
		if k > first {
			parts = append(parts, part{first, k})
			first, columns = k, a.gaps[k]
		}
		if !room(k) {
			return nil, false
		}
	}
	return append(parts, part{first, len(l.pipes)}), true
}

// tallest is the greatest range of levels of any part.
func (a *layout) tallest(r *run, l *line) float64 {
	most := 0.0
	for _, p := range a.parts {
		if low, high, ok := levels(r, l, p); ok {
			most = max(most, high-low)
		}
	}
	return most
}

// levelRange is a range of levels that grows.
type levelRange struct{ low, high float64 }

func newLevelRange() levelRange { return levelRange{math.Inf(1), math.Inf(-1)} }

func (l *levelRange) note(values ...network.Maybe) {
	for _, v := range values {
		if v.OK {
			l.low, l.high = min(l.low, v.V), max(l.high, v.V)
		}
	}
}

// levels is the range of what is drawn of a part: all of the ground and of what is built, and grade lines as high as that
// is tall over it; a line that stands higher still would only make the rest too small to read, and is cut off. ok is false
// where no level is known.
func levels(r *run, l *line, p part) (low, high float64, ok bool) {
	built, water := newLevelRange(), newLevelRange()
	for k := p.first; k <= p.last; k++ {
		noteBuilt(r, l.structures[k], &built)
		for i := range r.storms {
			s := &r.storms[i]
			water.note(s.level(l.structures[k]), s.tailwater(&r.Network.Structures[l.structures[k]]))
		}
	}
	for k := p.first; k < p.last; k++ {
		noteAlong(r, l.pipes[k], &built)
		for i := range r.storms {
			for _, at := range r.storms[i].trace(l.pipes[k]) {
				water.note(network.Some(at.HGL), network.Some(at.EGL))
			}
		}
	}
	high = built.high
	if water.high > high {
		high = min(water.high, 2*built.high-built.low)
	}
	return min(built.low, water.low), high, built.low <= built.high
}

// noteBuilt notes the levels of a structure and the pipes that end there.
func noteBuilt(r *run, s network.StructureIndex, built *levelRange) {
	n := r.Network
	built.note(n.Structures[s].Rim)
	if bottom, top, ok := r.extent(s); ok {
		built.note(network.Some(bottom), network.Some(top))
	}
	for _, i := range n.PipesIn(s) {
		built.note(crown(&n.Pipes[i], network.Lower))
	}
	for _, i := range n.PipesOut(s) {
		built.note(crown(&n.Pipes[i], network.Upper))
	}
}

// noteAlong notes the levels along a pipe: its own, the ground, services.
func noteAlong(r *run, p network.PipeIndex, built *levelRange) {
	pipe := &r.Network.Pipes[p]
	built.note(pipe.InvertUpper, pipe.InvertLower, crown(pipe, network.Upper), crown(pipe, network.Lower))
	for _, g := range r.Network.GroundOver(p) {
		built.note(network.Some(g.Elevation))
	}
	for _, c := range r.crossings[p] {
		built.note(network.Some(c.Top), network.Some(c.Bottom))
	}
}
