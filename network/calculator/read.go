package calculator

import (
	"fmt"
	"slices"
	"strings"

	"rimfall/network"
	"rimfall/network/job"
	"rimfall/network/units"
	"rimfall/pipeflow"
	"rimfall/pipeflow/catalog"
)

// Given is a question as it is typed. One of its values may be a list, `0.1:0.9:0.1` or
// `12,15,18`; values may have a unit where another than the system's is meant.
type Given struct {
	Units, Shape, Size, Haunch, Bottom, Side, SideRight string
	N, Slope, Depth, Flow, Velocity, Material           string
	VaryingN                                            bool
	Composite                                           string
	Points                                              []pipeflow.Point // of a ground line
}

// Series is one question, or the questions of a list.
type Series struct {
	Questions []Question
	Listed    string   // what the list is of; blank where there is one question
	Values    []string // of the list, as written
}

// Read reads a question as it is typed.
func Read(g Given) (Series, error) {
	s := Series{Questions: make([]Question, 0, 1)}
	values := []string{""}
	for _, f := range g.fields() {
		alternatives, err := expand(f.name, *f.text)
		if err != nil {
			return Series{}, err
		}
		if len(alternatives) < 2 {
			*f.text = alternatives[0]
			continue
		}
		if s.Listed != "" {
			return Series{}, refuse("two lists, "+s.Listed+" and "+f.name, "give one of them as a single value")
		}
		s.Listed, values = f.name, alternatives
	}
	for _, v := range values {
		one := g
		if s.Listed != "" {
			*one.field(s.Listed) = strings.TrimSpace(v)
		}
		q, err := one.question()
		if err != nil {
			return Series{}, err
		}
		s.Questions = append(s.Questions, q)
		s.Values = append(s.Values, strings.TrimSpace(v))
	}
	return s, nil
}

// field is a value that may be a list.
type field struct {
	name string
	text *string
}

func (g *Given) fields() []field {
	return []field{
		{Size, &g.Size},
		{Bottom, &g.Bottom},
		{Side, &g.Side},
		{N, &g.N},
		{Slope, &g.Slope},
		{Depth, &g.Depth},
		{Flow, &g.Flow},
		{"velocity", &g.Velocity},
	}
}

func (g *Given) field(name string) *string {
	all := g.fields()
	return all[slices.IndexFunc(all, func(f field) bool { return f.name == name })].text
}

// question reads single values.
func (g *Given) question() (Question, error) {
	u, ok := units.ByName(g.Units)
	if !ok {
		return Question{}, suggest("units", g.Units, []string{units.US.Name, units.SI.Name})
	}
	q := Question{Units: u, VaryingN: g.VaryingN, Composite: g.Composite}
	if g.Composite != "" && g.Composite != Horton && g.Composite != Lotter {
		return q, suggest("composite", g.Composite, []string{Horton, Lotter})
	}
	if err := g.conduit(&q); err != nil {
		return q, err
	}
	var err error
	read := func(into *network.Maybe, kind quantity, text string) {
		if err == nil {
			*into, err = kind.read(text, u)
		}
	}
	read(&q.N, aNumber.named(N), g.N)
	read(&q.Flow, aFlow.named(Flow), g.Flow)
	read(&q.Velocity, aVelocity.named("velocity"), g.Velocity)
	if err == nil {
		q.Slope, err = readSlope(g.Slope, u)
	}
	if err == nil {
		q.Depth, err = readDepth(g.Depth, u)
	}
	g.roughnessOfMaterial(&q)
	return q, err
}

// roughnessOfMaterial takes the usual n of a material where n is not given.
func (g *Given) roughnessOfMaterial(q *Question) {
	if m, ok := catalog.MaterialByName(g.Material); ok && g.N == "" {
		q.N = network.Some(m.N)
	}
}

// conduit reads shape and dimensions.
func (g *Given) conduit(q *Question) error {
	c := &q.Conduit
	c.Shape, c.Material, c.Points = g.Shape, g.Material, g.Points
	switch {
	case c.Shape == "" && len(g.Points) > 0:
		c.Shape = Ground
	case c.Shape == "":
		c.Shape = string(catalog.Circle)
	case !slices.Contains(Shapes(), c.Shape):
		return suggest("shape", c.Shape, Shapes())
	}
	if _, ok := catalog.MaterialByName(c.Material); c.Material != "" && !ok {
		return suggest("material", c.Material, materialNames())
	}
	if err := g.foreign(c.Shape); err != nil {
		return err
	}
	return g.dimensions(q)
}

func materialNames() []string {
	var names []string
	for _, m := range catalog.Materials() {
		names = append(names, m.Name)
	}
	return names
}

// takes are the dimensions of the open shapes; a closed one takes its size.
var takes = map[string][]string{
	Trapezoid: {Bottom, Side}, Triangle: {Side}, Rectangle: {Bottom}, Parabola: {Size}, Ground: {Ground},
}

// foreign refuses a dimension that the shape has not.
func (g *Given) foreign(shape string) error {
	own, open := takes[shape]
	if !open {
		own = []string{Size}
	}
	if shape == string(catalog.Box) {
		own = append(own, "haunch")
	}
	for _, d := range []struct {
		name  string
		given bool
	}{{Size, g.Size != ""}, {Bottom, g.Bottom != ""}, {Side, g.Side != "" || g.SideRight != ""}, {"haunch", g.Haunch != ""}, {Ground, len(g.Points) > 0}} {
		if d.given && !slices.Contains(own, d.name) {
			return refuse(fmt.Sprintf("the shape %s has no %s", shape, d.name), fmt.Sprintf("it takes %s: leave out %s, or name another shape", list(own, "and"), d.name))
		}
	}
	if shape == Ground && len(g.Points) == 0 {
		return refuse("the shape ground has no ground line", "name its file with ground")
	}
	return nil
}

// dimensions reads the dimensions of the shape.
func (g *Given) dimensions(q *Question) (err error) {
	c, u := &q.Conduit, q.Units
	if g.Size != "" && c.Shape == Parabola {
		return g.parabola(q)
	}
	if g.Size != "" {
		if c.Size, err = job.ReadSize(g.Size, c.Shape, u); err != nil {
			return refuse(fmt.Sprintf("size %q", g.Size), err.Error())
		}
	}
	if g.Haunch != "" {
		size, err := job.ReadSize(g.Haunch, string(catalog.Circle), u)
		if err != nil {
			return refuse(fmt.Sprintf("haunch %q", g.Haunch), "write the leg of the corner fillet in "+u.Size+", such as 8")
		}
		c.Haunch = size.Rise
	}
	if c.Bottom, err = aLength.named(Bottom).read(g.Bottom, u); err != nil {
		return err
	}
	if c.Bottom.OK && (c.Bottom.V < 0 || c.Bottom.V == 0 && c.Shape == Rectangle) {
		return refuse("bottom "+g.Bottom, "write a bottom width over 0")
	}
	if c.Left, err = readSide(g.Side, u); err != nil {
		return err
	}
	c.Right, err = readSide(g.SideRight, u)
	return err
}

// parabola reads the top width and the depth at which it holds.
func (g *Given) parabola(q *Question) error {
	fold := strings.NewReplacer("×", "x", "X", "x", " ", "").Replace(g.Size)
	parts := strings.Split(fold, "x")
	if len(parts) == 2 {
		width, err1 := aLength.named(Size).read(parts[0], q.Units)
		deep, err2 := aLength.named(Size).read(parts[1], q.Units)
		if err1 == nil && err2 == nil && width.V > 0 && deep.V > 0 {
			q.Conduit.Width, q.Conduit.Deep = width.V, deep.V
			return nil
		}
	}
	return refuse(fmt.Sprintf("size %q", g.Size), fmt.Sprintf("the size of a parabola is its top width x the depth at which it is that wide, in %s, such as 12x3", q.Units.Length))
}
