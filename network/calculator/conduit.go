package calculator

import (
	"fmt"
	"slices"

	"rimfall/network"
	"rimfall/network/job"
	"rimfall/network/units"
	"rimfall/pipeflow"
	"rimfall/pipeflow/catalog"
)

// The open shapes; the closed ones are those of the catalogue.
const (
	Trapezoid = "trapezoid"
	Triangle  = "triangle"
	Rectangle = "rectangle"
	Parabola  = "parabola"
	Ground    = "ground"
)

// Shapes lists the words for a shape in the order in which they are printed.
func Shapes() []string {
	var words []string
	for _, s := range catalog.Shapes() {
		words = append(words, string(s))
	}
	return append(words, Trapezoid, Triangle, Rectangle, Parabola, Ground)
}

// Conduit is a shape with those of its dimensions that are given.
type Conduit struct {
	Shape    string
	Material string // blank: concrete, of a pipe-arch corrugated metal

	Size   network.Size // inside of a closed shape, in or mm; zero: not given
	Haunch float64      // leg of the corner fillets of a box, in or mm; 0: corners are square

	Bottom      network.Maybe // of a trapezoid or rectangle, ft or m
	Left, Right network.Maybe // horizontal for one vertical, of a trapezoid or triangle

	// A parabola is Width wide where it is Deep deep, ft or m.
	Width, Deep float64
	Points      []pipeflow.Point // of a ground line, ft or m
}

// Closed reports whether the shape has a roof.
func (c *Conduit) Closed() bool {
	return slices.Contains(catalog.Shapes(), catalog.Shape(c.Shape))
}

// missing names the dimensions that are not given.
func (c *Conduit) missing() []string {
	var names []string
	if c.Closed() && c.Size == (network.Size{}) || c.Shape == Parabola && c.Width == 0 {
		names = append(names, Size)
	}
	if (c.Shape == Trapezoid || c.Shape == Rectangle) && !c.Bottom.OK {
		names = append(names, Bottom)
	}
	if (c.Shape == Trapezoid || c.Shape == Triangle) && !c.Left.OK && !c.Right.OK {
		names = append(names, Side)
	}
	return names
}

// section makes the section in coherent units; every dimension must be given.
func (c *Conduit) section(u units.System) (pipeflow.Section, error) {
	if c.Closed() {
		return c.pipe(u)
	}
	bottom, left, right := c.Bottom.V, c.Left.Or(c.Right.V), c.Right.Or(c.Left.V)
	var s pipeflow.Section
	var err error
	switch c.Shape {
	case Ground:
		s, err = pipeflow.NewGround(c.Points)
	case Parabola:
		s, err = pipeflow.NewParabola(c.Width, c.Deep)
	case Triangle:
		s, err = pipeflow.NewTriangle(left, right)
	default:
		s, err = pipeflow.NewTrapezoid(bottom, left, right)
	}
	if err != nil {
		return nil, refusePlain(err, "give dimensions over 0")
	}
	return s, nil
}

// pipe makes a closed section: by the row of the catalogue where it has one, else
// by span and rise.
func (c *Conduit) pipe(u units.System) (pipeflow.Section, error) {
	if c.Haunch > 0 {
		s, err := pipeflow.NewHaunchedBox(c.Size.Span/u.SizeFactor, c.Size.Rise/u.SizeFactor, c.Haunch/u.SizeFactor)
		if err != nil {
			return nil, refusePlain(err, "give a haunch under half the span and half the rise")
		}
		return s, nil
	}
	made := job.MakeSection(catalog.Standard(), u.Name, u.SizeFactor, c.Shape, c.Material, c.Size)
	if made.Why != "" {
		return nil, c.refuseSize(u, made.Why)
	}
	return made.Section, nil
}

// refuseSize offers the nearest listed size where a size makes no section.
func (c *Conduit) refuseSize(u units.System, why string) error {
	near, ok := catalog.Nearest(u.Name, c.Material, catalog.Shape(c.Shape), c.Size.Span, c.Size.Rise)
	if !ok {
		return refuse(fmt.Sprintf("size %s: %s", c.SizeLabel(), why), "see what is listed with `rimfall sizes --shape "+c.Shape+"`")
	}
	return refuse(fmt.Sprintf("size %s is no listed %s, and its radii are in no other place than the list", c.SizeLabel(), c.Shape),
		fmt.Sprintf("the nearest is %s; `rimfall sizes --shape %s` prints all", near.Label(), c.Shape))
}

// listed is the row of the catalogue that a size is.
func (c *Conduit) listed(u units.System) (catalog.Size, bool) {
	if c.Haunch > 0 {
		return catalog.Size{}, false
	}
	return catalog.Find(u.Name, c.Material, catalog.Shape(c.Shape), c.Size.Span, c.Size.Rise)
}

// SizeLabel is the size as pipes.csv has it: a diameter, else span x rise; blank
// where the shape has no size.
func (c *Conduit) SizeLabel() string {
	switch {
	case c.Shape == Parabola:
		return short(c.Width) + "x" + short(c.Deep)
	case !c.Closed():
		return ""
	case c.Shape == string(catalog.Circle):
		return short(c.Size.Rise)
	}
	return short(c.Size.Span) + "x" + short(c.Size.Rise)
}

// roughEverywhere reports whether a ground line brings an n for every stretch.
func (c *Conduit) roughEverywhere() bool {
	if c.Shape != Ground || len(c.Points) < 2 {
		return false
	}
	return !slices.ContainsFunc(c.Points[:len(c.Points)-1], func(p pipeflow.Point) bool { return p.N == 0 })
}

// roughSomewhere reports whether a ground line brings an n for any stretch.
func (c *Conduit) roughSomewhere() bool {
	return slices.ContainsFunc(c.Points, func(p pipeflow.Point) bool { return p.N > 0 })
}
