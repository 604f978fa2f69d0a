package calculator

import (
	"math"
	"slices"

	"rimfall/network/units"
	"rimfall/pipeflow"
)

// Picture is what is drawn of a section: its outline, the levels of the water, and the
// curves of what it holds and carries.
type Picture struct {
	Units    units.System
	Title    string
	Lines    []string // under the title
	Foot     []string // under the drawing
	Outline  []Place  // of the inside, all around where it has a roof, else from bank to bank
	Closed   bool
	Levels   []Level
	Rise     float64 // to which the curves go, ft or m
	Curves   []Curve
	Against  string  // what the curves are ratios to
	DepthsIn string  // what the depths of the curves are
	Axis     Measure // of those depths
}

// Place is a point of the outline: across and up from the lowest point, ft or m.
type Place struct{ X, Y float64 }

// Level is a water level with the stretches across that are under water.
type Level struct {
	Name    string
	Depth   float64
	Water   bool // the water itself, not the critical depth for comparison
	Between [][2]float64
}

// Curve is a ratio at depths; from the bottom up.
type Curve struct {
	Name          string
	Ratio, Depths []float64
}

// curvePoints is into how many points outlines and curves are cut: the chord of a circle
// drawn 90 mm high then is within 0.01 mm of its arc.
const curvePoints = 160

// openHeight is how high an open section is drawn over the deepest water.
const openHeight = 1.25

// Picture draws an answer.
func (a *Answer) Picture() Picture {
	p := Picture{Units: a.Units, Title: "Uniform flow: " + a.Named(a.Asked), Lines: []string{a.givenLine()}, Foot: a.Conclusion()}
	deepest := a.First.Depth
	p.Levels = append(p.Levels, a.level("depth y", a.First.Depth, true))
	if a.Second != nil {
		deepest = max(deepest, a.Second.Depth)
		p.Levels = append(p.Levels, a.level("second depth", a.Second.Depth, true))
	}
	if yc := a.First.CriticalDepth; yc.OK {
		deepest = max(deepest, yc.V)
		p.Levels = append(p.Levels, a.level("critical depth", yc.V, false))
	}
	top := min(a.Section.Rise(), deepest*openHeight)
	if a.Section.Closed() {
		top = a.Section.Rise()
	}
	p.outline(&a.Conduit, a.Section, top)
	p.curves(a.flow, top, a.First.Depth)
	return p
}

// Picture draws a section without a flow.
func (r *Rating) Picture() Picture {
	q := &r.Question
	a := Answer{Question: *q, Conduit: q.Conduit, Section: r.Section}
	p := Picture{Units: q.Units, Title: "Hydraulic elements", Lines: []string{a.givenLine()}, Foot: r.Notes}
	top := r.Section.Rise()
	if !r.Section.Closed() {
		for _, row := range r.Rows {
			top = min(r.Section.Rise(), row.Depth)
		}
	}
	p.outline(&q.Conduit, r.Section, top)
	p.curves(q.uniformIn(r.Section, q.N.Or(1), q.Slope.Or(1)), top, top)
	return p
}

// givenLine is shape, dimensions and what else is given, in one line.
func (a *Answer) givenLine() string {
	q := &a.Question
	text := a.Conduit.Shape
	add := func(ok bool, name, value string) {
		if ok {
			text += ", " + name + value
		}
	}
	add(a.Conduit.Closed(), "", a.sizeWithUnit())
	add(a.Conduit.Shape == Parabola, "", a.Conduit.SizeLabel()+" "+a.Units.Length)
	add(a.Conduit.Bottom.OK, "bottom ", a.say(Length, a.Conduit.Bottom.V))
	add(a.Conduit.Left.OK, "side ", figure(a.Conduit.Left.V))
	add(a.Conduit.Right.OK, "right side ", figure(a.Conduit.Right.V))
	add(q.N.OK, "n ", short(q.N.V))
	add(q.VaryingN, "", "n varying with depth")
	add(q.Slope.OK, "slope ", short(q.Slope.V))
	add(q.Flow.OK, "flow ", withUnit(short(q.Flow.V), a.Units.Flow))
	return text
}

// level is a water level in the section.
func (a *Answer) level(name string, depth float64, water bool) Level {
	return Level{name + " " + a.say(Length, depth), depth, water, between(&a.Conduit, a.Section, depth)}
}

// between are the stretches across that a level wets.
func between(c *Conduit, s pipeflow.Section, depth float64) [][2]float64 {
	switch s.(type) {
	case *pipeflow.Ground:
		return groundBetween(c.Points, depth)
	case pipeflow.Trapezoid:
		half := c.Bottom.V / 2
		return [][2]float64{{-half - c.Left.Or(c.Right.V)*depth, half + c.Right.Or(c.Left.V)*depth}}
	}
	half := halfWidth(s, depth)
	return [][2]float64{{-half, half}}
}

// halfWidth is half the width of a section that is symmetric, at the roof that of just
// below it.
func halfWidth(s pipeflow.Section, depth float64) float64 {
	return s.At(min(depth, s.Rise()*(1-sameLength))).TopWidth / 2
}

// groundBetween are the stretches of a ground line below a level.
func groundBetween(points []pipeflow.Point, depth float64) [][2]float64 {
	lowest := lowestOf(points)
	var all [][2]float64
	for i := range points[1:] {
		a, b := points[i], points[i+1]
		left, right := a.Elevation-lowest, b.Elevation-lowest
		if min(left, right) >= depth {
			continue
		}
		cut := func() float64 { return a.Station + (b.Station-a.Station)*(depth-left)/(right-left) }
		from, to := a.Station, b.Station
		if left > depth {
			from = cut()
		}
		if right > depth {
			to = cut()
		}
		if last := len(all) - 1; last >= 0 && all[last][1] == from {
			all[last][1] = to
			continue
		}
		all = append(all, [2]float64{from, to})
	}
	return all
}

// lowestOf is the lowest elevation of a ground line.
func lowestOf(points []pipeflow.Point) float64 {
	low := math.Inf(1)
	for _, p := range points {
		low = min(low, p.Elevation)
	}
	return low
}

// outline draws the inside up to a height.
func (p *Picture) outline(c *Conduit, s pipeflow.Section, top float64) {
	p.Closed, p.Rise = s.Closed(), top
	if ground, is := s.(*pipeflow.Ground); is {
		p.Rise = min(top, ground.Rise())
		lowest := lowestOf(c.Points)
		for _, point := range c.Points {
			p.Outline = append(p.Outline, Place{point.Station, point.Elevation - lowest})
		}
		return
	}
	var left, right []Place
	for i := range curvePoints + 1 {
		y := top * (1 - math.Cos(math.Pi*float64(i)/curvePoints)) / 2
		edge := between(c, s, y)[0]
		left = append(left, Place{edge[0], y})
		right = append(right, Place{edge[1], y})
	}
	slices.Reverse(left)
	p.Outline = append(left, right...)
}

// curves are area, hydraulic radius, velocity and flow as ratios to those of a depth, up
// to the top.
func (p *Picture) curves(u uniform, top, reference float64) {
	p.Against, p.DepthsIn, p.Axis = "ratio to the value at depth "+Length.With(p.Units, reference), "depth, "+p.Units.Length, Length
	if p.Closed {
		p.Against, p.DepthsIn, p.Axis, reference = "ratio to the full section", "depth / rise", Plain, top
	}
	for _, of := range []struct {
		name  string
		value func(y float64) float64
	}{
		{"area", func(y float64) float64 { return u.section.At(y).Area }},
		{"hydraulic radius", func(y float64) float64 { return u.section.At(y).HydraulicRadius() }},
		{"velocity", u.velocity},
		{"flow", u.flow},
	} {
		c := Curve{Name: of.name}
		for i := range curvePoints + 1 {
			y := top * (1 - math.Cos(math.Pi*float64(i)/curvePoints)) / 2
			if i == curvePoints && p.Closed { // just below the roof, which a flat one wets at once
				c.Ratio = append(c.Ratio, of.value(y*(1-sameLength))/of.value(reference))
				c.Depths = append(c.Depths, y)
			}
			c.Ratio = append(c.Ratio, of.value(y)/of.value(reference))
			c.Depths = append(c.Depths, y)
		}
		p.Curves = append(p.Curves, c)
	}
}
