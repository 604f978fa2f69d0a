package catalog

import (
	"fmt"

	"rimfall/pipeflow"
)

// section builds the inside of a row, its lengths divided by per to make them coherent.
func section(s Size, per float64) (pipeflow.Section, error) {
	span, rise := s.Span/per, s.Rise/per
	switch s.Shape {
	case Circle:
		return built(pipeflow.NewCircle(rise))
	case Box:
		if s.Haunch > 0 {
			return built(pipeflow.NewHaunchedBox(span, rise, s.Haunch/per))
		}
		return built(pipeflow.NewBox(span, rise))
	case Ellipse, UprightEllipse:
		return built(pipeflow.NewEllipse(span, rise))
	case Arch, PipeArch:
		return built(pipeflow.NewArch(span, rise, s.BottomRadius/per, s.TopRadius/per, s.CornerRadius/per))
	}
	return nil, fmt.Errorf("catalog: unknown shape %q", s.Shape)
}

// built hands a section on, and no section at all (rather than an interface that holds a nil pointer) beside an error.
func built[S pipeflow.Section](section S, err error) (pipeflow.Section, error) {
	if err != nil {
		return nil, err
	}
	return section, nil
}
