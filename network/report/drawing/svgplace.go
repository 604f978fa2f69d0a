package drawing

import (
	"math"
	"slices"
)

// Box is an upright rectangle on the sheet.
type Box struct{ Left, Top, Right, Bottom float64 }

func (b Box) with(p Point) Box {
	return Box{min(b.Left, p.X), min(b.Top, p.Y), max(b.Right, p.X), max(b.Bottom, p.Y)}
}

func (b Box) grown(by float64) Box {
	return Box{b.Left - by, b.Top - by, b.Right + by, b.Bottom + by}
}

func (b Box) meets(o Box) bool {
	return b.Left < o.Right && o.Left < b.Right && b.Top < o.Bottom && o.Top < b.Bottom
}

func (b Box) holds(o Box) bool {
	return b.Left <= o.Left && b.Top <= o.Top && o.Right <= b.Right && o.Bottom <= b.Bottom
}

func (b Box) width() float64  { return b.Right - b.Left }
func (b Box) height() float64 { return b.Bottom - b.Top }

// placer finds room for labels. What stands on the sheet is kept in squares of a coarse grid, so that a question costs
// the same on a full sheet as on an empty one.
type placer struct {
	area  Box   // labels stay inside
	taken index // what no label may touch
	texts index // of taken, the labels: leaders keep off them
	lines index // thin lines, which a label crosses only where it must
}

// index finds shapes by the squares that they may touch.
type index map[square][]boxed

// boxed is a shape with the box around it, which settles most questions.
type boxed struct {
	quad
	box Box
}

type square struct{ column, row int32 }

const squareSize = 8 // mm; about the length of a short label

// clear is the gap kept between labels, mm.
const clear = 0.35

func newPlacer(area Box) *placer { return &placer{area, index{}, index{}, index{}} }

// squares calls do for each square that a box touches, until it returns false.
func squares(b Box, do func(square) bool) {
	for row := int32(math.Floor(b.Top / squareSize)); float64(row)*squareSize <= b.Bottom; row++ {
		for column := int32(math.Floor(b.Left / squareSize)); float64(column)*squareSize <= b.Right; column++ {
			if !do(square{column, row}) {
				return
			}
		}
	}
}

func (x index) add(q quad) {
	b := q.box()
	squares(b, func(s square) bool {
		x[s] = append(x[s], boxed{q, b})
		return true
	})
}

// addLine adds a line in stretches, so that a long slanting one does not fill every square around it.
func (x index) addLine(a, b Point, width float64) {
	for _, q := range stretches(a, b, width) {
		x.add(q)
	}
}

// count counts what meets a shape, until it is enough. A shape in several squares counts in each.
func (x index) count(q quad, enough int) int {
	n, b := 0, q.box()
	squares(b, func(s square) bool {
		for i := range x[s] {
			if o := &x[s][i]; b.meets(o.box) && q.meets(o.quad) {
				if n++; n >= enough {
					return false
				}
			}
		}
		return true
	})
	return n
}

func stretches(a, b Point, width float64) []quad {
	n := max(1, int(math.Ceil(math.Hypot(b.X-a.X, b.Y-a.Y)/squareSize)))
	at := func(i int) Point {
		t := float64(i) / float64(n)
		return Point{a.X + t*(b.X-a.X), a.Y + t*(b.Y-a.Y)}
	}
	list := make([]quad, n)
	for i := range n {
		list[i] = band(at(i), at(i+1), width)
	}
	return list
}

// take marks a box as full.
func (p *placer) take(b Box) { p.taken.add(b.quad()) }

// takeLine marks a line of some width as full.
func (p *placer) takeLine(a, b Point, width float64) { p.taken.addLine(a, b, width) }

// passLine notes a thin line.
func (p *placer) passLine(a, b Point) { p.lines.addLine(a, b, 0.2) }

// free tells whether shapes are inside the area and meet nothing that is taken. From other labels even the upright boxes
// keep apart: a label in the corner of the box around a turned one would be hard to read.
func (p *placer) free(shapes []quad) bool {
	for _, q := range shapes {
		if !p.area.holds(q.box()) || p.taken.count(q, 1) > 0 || p.texts.touches(q.box()) {
			return false
		}
	}
	return true
}

// touches tells whether the box around a shape meets a box.
func (x index) touches(b Box) (found bool) {
	squares(b, func(s square) bool {
		found = slices.ContainsFunc(x[s], func(o boxed) bool { return b.meets(o.box) })
		return !found
	})
	return found
}

// crossed counts thin lines under shapes.
func (p *placer) crossed(shapes []quad) int {
	n := 0
	for _, q := range shapes {
		n += p.lines.count(q, math.MaxInt)
	}
	return n
}

// spot is a place that a label may take.
type spot struct {
	labels []Label // one under the other
	room   []Box   // further room that goes with them
	leader bool    // a thin line leads from it to the point at
	at     Point
}

// shapes is the room of the labels with a gap around them.
func (s *spot) shapes() []quad {
	var shapes []quad
	for _, b := range s.room {
		shapes = append(shapes, b.grown(clear).quad())
	}
	for _, l := range s.labels {
		shapes = append(shapes, l.shape(clear))
	}
	return shapes
}

// from is where the leader leaves the labels: the middle of the side that is nearest to its point.
func (s *spot) from() Point {
	all := s.shapes()
	b := all[0].box()
	for _, q := range all[1:] {
		o := q.box()
		b = b.with(Point{o.Left, o.Top}).with(Point{o.Right, o.Bottom})
	}
	x, y := (b.Left+b.Right)/2, (b.Top+b.Bottom)/2
	best := Point{b.Left, y}
	for _, p := range [...]Point{{b.Right, y}, {x, b.Top}, {x, b.Bottom}} {
		if math.Hypot(p.X-s.at.X, p.Y-s.at.Y) < math.Hypot(best.X-s.at.X, best.Y-s.at.Y) {
			best = p
		}
	}
	return best
}

// leads tells whether the leader, if there is one, meets no label.
func (p *placer) leads(s *spot) bool {
	if !s.leader {
		return true
	}
	for _, q := range stretches(s.from(), s.at, 0.2) {
		if p.texts.count(q, 1) > 0 {
			return false
		}
	}
	return true
}

// choose takes a spot of the first group that has a free one: of that group, the one that crosses the fewest lines, an
// earlier one before a later one. ok is false where none is free.
func (p *placer) choose(groups ...[]spot) (chosen spot, ok bool) {
	for _, spots := range groups {
		if s := p.best(spots); s != nil {
			p.write(s)
			return *s, true
		}
	}
	return spot{}, false
}

// best is the free spot that crosses the fewest lines; nil where none is free.
func (p *placer) best(spots []spot) (best *spot) {
	fewest := math.MaxInt
	for i := range spots {
		s := &spots[i]
		shapes := s.shapes()
		if !p.free(shapes) || !p.leads(s) {
			continue
		}
		if n := p.crossed(shapes); n < fewest {
			best, fewest = s, n
		}
		if fewest == 0 {
			break
		}
	}
	return best
}

// write marks the room of a spot as taken.
func (p *placer) write(s *spot) {
	for _, q := range s.shapes() {
		p.taken.add(q)
		p.texts.add(q)
	}
	if s.leader {
		p.takeLine(s.from(), s.at, 0.2)
	}
}
