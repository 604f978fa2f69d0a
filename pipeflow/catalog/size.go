package catalog

import (
	"fmt"

	"rimfall/pipeflow"
)

// Shape is the form of the inside, in the words of a job's pipes.csv.
type Shape string

// The closed shapes that have standard sizes.
const (
	Circle         Shape = "circle"
	Box            Shape = "box"
	Ellipse        Shape = "ellipse"         // lying: wider than high
	UprightEllipse Shape = "ellipse-upright" // higher than wide
	Arch           Shape = "arch"            // concrete
	PipeArch       Shape = "pipe-arch"       // corrugated metal
)

// Shapes lists every shape in the order in which they are printed.
func Shapes() []Shape {
	return []Shape{Circle, Box, Ellipse, UprightEllipse, Arch, PipeArch}
}

// The two unit systems of a row.
const (
	US = "us" // inches
	SI = "si" // millimetres
)

// perUnit gives inches in a foot and millimetres in a metre.
func perUnit(units string) (float64, bool) {
	switch units {
	case US:
		return 12, true
	case SI:
		return 1000, true
	}
	return 0, false
}

// Size is one row: one standard size of one series. All lengths are in inches or millimetres as Units says.
type Size struct {
	Units    string
	Shape    Shape
	Material string // whose sizes these are, a name that Material.SizesOf refers to
	Series   string // plain words, such as "reinforced concrete, wall B"

	Span, Rise float64 // inside width and height; equal for a circle
	Wall       float64 // thickness above the crown
	HasWall    bool    // false where the list gives no wall

	Haunch                                float64 // leg of the corner fillets of a box, 0 for none
	BottomRadius, TopRadius, CornerRadius float64 // of an arch or pipe-arch, 0 for other shapes

	Standard string // such as "ASTM C76"
	Source   string // where the figures were taken from
}

// Label is the size as a job writes it: the diameter of a circle, else span x rise.
func (s Size) Label() string {
	if s.Shape == Circle {
		return fmt.Sprintf("%g", s.Rise)
	}
	return fmt.Sprintf("%gx%g", s.Span, s.Rise)
}

// Section is the inside in feet (us) or metres (si). It is an error where the dimensions make no such shape, an arch
// without radii for one.
func (s Size) Section() (pipeflow.Section, error) {
	per, ok := perUnit(s.Units)
	if !ok {
		return nil, fmt.Errorf("catalog: unknown units %q, want %q or %q", s.Units, US, SI)
	}
	return section(s, per)
}
