package catalog

import "slices"

// judge holds one row against what its shape needs.
func judge(s Size, at row) []Fault {
	switch {
	case s.Units != US && s.Units != SI:
		return []Fault{at["units"].fault("units %q: us (inches) or si (millimetres) is wanted", s.Units)}
	case !slices.Contains(Shapes(), s.Shape):
		return []Fault{at["shape"].fault("unknown shape %q: one of %v is wanted", s.Shape, Shapes())}
	case s.Span == 0:
		return []Fault{at["span"].fault("span is blank: the inside width is wanted")}
	case s.Rise == 0:
		return []Fault{at["rise"].fault("rise is blank: the inside height is wanted, only a circle does without")}
	}
	return judgeProportion(s, at)
}

// judgeProportion compares span with rise, and asks for haunches and radii where they belong and nowhere else.
func judgeProportion(s Size, at row) []Fault {
	radii := s.BottomRadius > 0 && s.TopRadius > 0 && s.CornerRadius > 0
	anyRadius := s.BottomRadius > 0 || s.TopRadius > 0 || s.CornerRadius > 0
	arch := s.Shape == Arch || s.Shape == PipeArch
	switch {
	case s.Shape == Circle && s.Span != s.Rise:
		return []Fault{at["rise"].fault("rise %g of a circle differs from its span %g: leave it blank, or make the "+
			"shape an ellipse", s.Rise, s.Span)}
	case s.Shape == UprightEllipse && s.Span > s.Rise:
		return []Fault{at["span"].fault("span %g is over rise %g: an upright ellipse is higher than wide; swap "+
			"them or write %q", s.Span, s.Rise, Ellipse)}
	case (s.Shape == Ellipse || arch) && s.Span < s.Rise:
		return []Fault{at["span"].fault("span %g is under rise %g: this shape is wider than high; swap them", s.Span, s.Rise)}
	case s.Haunch > 0 && s.Shape != Box:
		return []Fault{at["haunch"].fault("only a box has haunches: leave it blank")}
	case 2*s.Haunch > min(s.Span, s.Rise):
		return []Fault{at["haunch"].fault("haunch %g is over half of the smaller of span and rise", s.Haunch)}
	case anyRadius && !arch:
		return []Fault{at["bottom_radius"].fault("only an arch or a pipe-arch has radii: leave them blank")}
	case arch && !radii:
		return []Fault{at["bottom_radius"].fault("an arch needs bottom_radius, top_radius and corner_radius")}
	}
	return nil
}
