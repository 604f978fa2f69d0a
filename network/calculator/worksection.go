package calculator

import (
	"fmt"
	"math"

	"rimfall/network"
	"rimfall/pipeflow"
	"rimfall/pipeflow/catalog"
)

// riseSymbol is D for a circle, H for any other closed shape.
func (s *sheet) riseSymbol() string {
	if s.Conduit.Shape == string(catalog.Circle) {
		return "D"
	}
	return "H"
}

// givenSection lists the given dimensions.
func (s *sheet) givenSection() {
	c := &s.Question.Conduit
	s.put(Step{Name: "shape", Result: s.shapeWords()})
	switch {
	case c.Closed():
		s.givenSize(c.Size, c.Haunch)
	case c.Shape == Parabola:
		s.put(Step{Name: "top width", Symbol: "W", Result: withUnit(short(c.Width), s.Units.Length)})
		s.put(Step{Name: "at a depth of", Symbol: "Y", Result: withUnit(short(c.Deep), s.Units.Length)})
	case c.Shape == Ground:
		s.put(Step{Name: "ground line", Result: fmt.Sprintf("%d points, lowest %s, lower bank %s above it", len(c.Points), s.say(Length, s.lowest()), s.say(Length, s.Section.Rise()))})
	}
	if c.Bottom.OK {
		s.put(Step{Name: "bottom width", Symbol: "b", Result: withUnit(short(c.Bottom.V), s.Units.Length)})
	}
	s.givenSides(c)
}

func (s *sheet) shapeWords() string {
	if s.Conduit.Material != "" {
		return s.Conduit.Shape + ", " + s.Conduit.Material
	}
	return s.Conduit.Shape
}

func (s *sheet) givenSize(size network.Size, haunch float64) {
	line := func(name, symbol string, v float64) {
		if v > 0 {
			s.put(Step{Name: name, Symbol: symbol, Result: fmt.Sprintf("%s %s = %s", short(v), s.Units.Size, s.say(Length, v/s.Units.SizeFactor))})
		}
	}
	if s.Conduit.Shape == string(catalog.Circle) {
		line("diameter", "D", size.Rise)
		return
	}
	line("span", "B", size.Span)
	line("rise", "H", size.Rise)
	line("haunch", "h", haunch)
}

func (s *sheet) givenSides(c *Conduit) {
	left, right := c.Left.Or(c.Right.V), c.Right.Or(c.Left.V)
	switch {
	case !c.Left.OK && !c.Right.OK:
	case left == right:
		s.put(Step{Name: "sides, horizontal for 1", Symbol: "z", Result: short(left)})
	default:
		s.put(Step{Name: "left side, horizontal for 1", Symbol: "z₁", Result: short(left)})
		s.put(Step{Name: "right side", Symbol: "z₂", Result: short(right)})
	}
}

// lowest is the lowest elevation of the ground line.
func (s *sheet) lowest() float64 { return lowestOf(s.Conduit.Points) }

// section is area, perimeter and width with the formula of the shape, then radius and
// hydraulic depth.
func (s *sheet) section(st *State) {
	full := s.Section.Closed() && st.Depth >= s.Section.Rise()
	switch c := &s.Conduit; {
	case c.Shape == string(catalog.Circle):
		s.circle(st, full)
	case c.Shape == string(catalog.Box) && c.Haunch == 0:
		s.box(st, full)
	case c.Shape == string(catalog.Ellipse) || c.Shape == string(catalog.UprightEllipse):
		s.ellipse(st, full)
	case c.Closed():
		s.measured(st)
	case c.Shape == Parabola:
		s.parabola(st)
	case c.Shape == Ground:
		s.ground(st)
	default:
		s.channelSection(st)
	}
	s.step("hydraulic radius", "R", "A/P", figure(st.Area)+"/"+figure(st.Perimeter), Length, st.Radius)
	if st.HydraulicDeep.OK {
		s.step("hydraulic depth", "ym", "A/T", figure(st.Area)+"/"+figure(st.TopWidth), Length, st.HydraulicDeep.V)
	}
}

func (s *sheet) area(formula, numbers string, st *State) {
	s.step("wetted area", "A", formula, numbers, Area, st.Area)
}

func (s *sheet) perimeter(formula, numbers string, st *State) {
	s.step("wetted perimeter", "P", formula, numbers, Length, st.Perimeter)
}

func (s *sheet) top(formula, numbers string, st *State) {
	if st.TopWidth > 0 {
		s.step("top width", "T", formula, numbers, Length, st.TopWidth)
	}
}

// circle: θ = 2 acos(1 - 2y/D), A = D²/8 (θ - sin θ), P = Dθ/2, T = D sin(θ/2)
// (Chow 1959, table 2-1).
func (s *sheet) circle(st *State, full bool) {
	d := figure(s.Section.Rise())
	if full {
		s.area("π D²/4", "π × "+d+"²/4", st)
		s.perimeter("π D", "π × "+d, st)
		return
	}
	t := figure(s.angle(st))
	s.area("D²/8 (θ − sin θ)", fmt.Sprintf("%s²/8 × (%s − sin %s)", d, t, t), st)
	s.perimeter("D θ/2", d+" × "+t+"/2", st)
	s.top("D sin(θ/2)", fmt.Sprintf("%s × sin(%s/2)", d, t), st)
}

// angle is the angle that the water surface spans at the centre.
func (s *sheet) angle(st *State) float64 {
	angle := 2 * math.Acos(1-2*st.Depth/s.Section.Rise())
	h := s.riseSymbol()
	s.step("angle at the centre", "θ", "2 acos(1 − 2y/"+h+")", fmt.Sprintf("2 acos(1 − 2 × %s/%s)", figure(st.Depth), figure(s.Section.Rise())), Radian, angle)
	return angle
}

func (s *sheet) box(st *State, full bool) {
	b, y := figure(s.Section.Span()), figure(st.Depth)
	s.area("B y", b+" × "+y, st)
	if full {
		s.perimeter("2 (B + H)", fmt.Sprintf("2 × (%s + %s)", b, y), st)
		return
	}
	s.perimeter("B + 2y", b+" + 2 × "+y, st)
	s.top("B", "", st)
}

// ellipse is a circle of diameter 1 stretched to span and rise; only its perimeter has
// no closed form.
func (s *sheet) ellipse(st *State, full bool) {
	b, h := figure(s.Section.Span()), figure(s.Section.Rise())
	if full {
		s.area("π B H/4", fmt.Sprintf("π × %s × %s/4", b, h), st)
		s.integrated(st)
		return
	}
	t := figure(s.angle(st))
	s.area("B H/8 (θ − sin θ)", fmt.Sprintf("%s × %s/8 × (%s − sin %s)", b, h, t, t), st)
	s.integrated(st)
	s.top("B sin(θ/2)", fmt.Sprintf("%s × sin(%s/2)", b, t), st)
}

// integrated is a perimeter without a closed form.
func (s *sheet) integrated(st *State) {
	s.put(Step{Name: "wetted perimeter", Symbol: "P", Result: s.say(Length, st.Perimeter) + ", integrated along the wall"})
}

// measured lists the values of a shape that is put together of pieces.
func (s *sheet) measured(st *State) {
	if row, ok := s.Conduit.listed(s.Units); ok && row.BottomRadius > 0 {
		s.put(Step{Name: "radii", Result: fmt.Sprintf("bottom %s, crown %s, corner %s %s", short(row.BottomRadius), short(row.TopRadius), short(row.CornerRadius), s.Units.Size)})
	}
	s.put(Step{Name: "summed over its arcs and straight pieces:"})
	s.area("", "", st)
	s.perimeter("", "", st)
	s.top("", "", st)
}

// channelSection: A = (b + z y) y, P = b + 2y √(1 + z²), T = b + 2 z y (Chow 1959,
// table 2-1); the general form serves rectangle and triangle as well, without the
// parts that are zero.
func (s *sheet) channelSection(st *State) {
	c := &s.Conduit
	b, y := figure(c.Bottom.V), figure(st.Depth)
	left, right := c.Left.Or(c.Right.V), c.Right.Or(c.Left.V)
	z := figure(left)
	switch {
	case c.Shape == Rectangle:
		s.area("b y", b+" × "+y, st)
		s.perimeter("b + 2y", b+" + 2 × "+y, st)
		s.top("b", "", st)
	case left != right:
		s.unequalSides(st, left, right)
	case c.Shape == Triangle:
		s.area("z y²", z+" × "+y+"²", st)
		s.perimeter("2y √(1 + z²)", fmt.Sprintf("2 × %s × √(1 + %s²)", y, z), st)
		s.top("2 z y", fmt.Sprintf("2 × %s × %s", z, y), st)
	default:
		s.area("(b + z y) y", fmt.Sprintf("(%s + %s × %s) × %s", b, z, y, y), st)
		s.perimeter("b + 2y √(1 + z²)", fmt.Sprintf("%s + 2 × %s × √(1 + %s²)", b, y, z), st)
		s.top("b + 2 z y", fmt.Sprintf("%s + 2 × %s × %s", b, z, y), st)
	}
}

func (s *sheet) unequalSides(st *State, left, right float64) {
	b, y, z1, z2 := figure(s.Conduit.Bottom.V), figure(st.Depth), figure(left), figure(right)
	s.area("(b + (z₁ + z₂)/2 y) y", fmt.Sprintf("(%s + (%s + %s)/2 × %s) × %s", b, z1, z2, y, y), st)
	s.perimeter("b + y (√(1 + z₁²) + √(1 + z₂²))", fmt.Sprintf("%s + %s × (√(1 + %s²) + √(1 + %s²))", b, y, z1, z2), st)
	s.top("b + (z₁ + z₂) y", fmt.Sprintf("%s + (%s + %s) × %s", b, z1, z2, y), st)
}

// parabola: T = W √(y/Y), A = 2/3 T y, P with x = 4y/T (Chow 1959, table 2-1).
func (s *sheet) parabola(st *State) {
	y, t := figure(st.Depth), figure(st.TopWidth)
	s.top("W √(y/Y)", fmt.Sprintf("%s × √(%s/%s)", figure(s.Conduit.Width), y, figure(s.Conduit.Deep)), st)
	s.area("2/3 T y", fmt.Sprintf("2/3 × %s × %s", t, y), st)
	x := figure(4 * st.Depth / st.TopWidth)
	s.perimeter("T/2 (√(1 + x²) + ln(x + √(1 + x²))/x), x = 4y/T", fmt.Sprintf("%s/2 × (√(1 + %s²) + ln(%s + √(1 + %s²))/%s)", t, x, x, x, x), st)
}

// ground lists the parts between upright lines, then the sums.
func (s *sheet) ground(st *State) {
	s.put(Step{Name: "water level", Result: s.say(Length, s.lowest()+st.Depth)})
	if line, is := s.Section.(*pipeflow.Ground); is && s.Conduit.roughSomewhere() {
		for i, part := range line.Linings(st.Depth) {
			n := part.N
			if n == 0 {
				n = s.N
			}
			s.put(Step{Name: fmt.Sprintf("part %d", i+1), Result: fmt.Sprintf("A %s, P %s, n %s", s.say(Area, part.Area), s.say(Length, part.Perimeter), short(n))})
		}
	}
	s.put(Step{Name: "summed from point to point:"})
	s.area("", "", st)
	s.perimeter("", "", st)
	s.top("", "", st)
}
