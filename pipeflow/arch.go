package pipeflow

import (
	"fmt"
	"math"
)

// Arch is an inside of three arcs to each side, tangent to one another: bottom, corner, crown. Concrete arch pipe and
// corrugated pipe-arch are both of this kind.
type Arch struct {
	*Outline

	// TopRadius is the crown radius that closes the shape exactly. Four published lengths fix the shape once too
	// often, and printed radii are rounded; span, rise, bottom and corner radius are kept, and the crown radius gives.
	TopRadius float64
	// GivenTopRadius is the crown radius asked for, 0 where it was left to be found.
	GivenTopRadius float64
}

// closureLimit is how far the crown radius may be off the published one before the dimensions are taken to be wrong
// rather than rounded: radii printed to the quarter inch or the whole millimetre close within it (common practice).
const closureLimit = 0.2

// NewArch makes an arch from its inside span and rise and the radii of bottom, crown and corner arcs. A crown radius of
// 0 is found from the others.
//
// With (c, v) the centre of the right-hand corner arc, that arc touches the bottom and the crown arc from inside where
//
//	c² + (Rb - v)² = (Rb - Rc)²    and    c² + (Rt - (rise - v))² = (Rt - Rc)²
//
// Where the corner arc holds the widest point, c = span/2 - Rc, v follows from the first and Rt from the second. Where
// that puts the crown's centre above the corner's, the crown is more than a half circle and holds it instead: Rt =
// span/2, and both give c and v.
//
// Error: a length that is none, radii that leave no room for the corner arcs, or a crown radius that would have to
// change by more than a fifth.
func NewArch(span, rise, bottomRadius, topRadius, cornerRadius float64) (*Arch, error) {
	if err := checkArch(span, rise, bottomRadius, topRadius, cornerRadius); err != nil {
		return nil, err
	}
	across := span/2 - cornerRadius
	lift := (bottomRadius-cornerRadius)*(bottomRadius-cornerRadius) - across*across
	if lift < 0 {
		return nil, fmt.Errorf("pipeflow: an arch of span %v needs a bottom radius of %v or more, not %v",
			span, span/2, bottomRadius)
	}
	up := bottomRadius - math.Sqrt(lift)
	closing := touchingRadius(across, rise-up, cornerRadius)
	closes := closing > cornerRadius
	if up < rise-closing { // the crown's centre is above the corner's, so the crown is wider
		across, up, closing = roundCrown(span, rise, bottomRadius, cornerRadius)
		closes = up < rise-closing
	}
	if !closes || !(up > cornerRadius) || !(rise-up > cornerRadius) || !(across >= 0) {
		return nil, fmt.Errorf("pipeflow: span %v, rise %v, bottom radius %v and corner radius %v do not close to an arch",
			span, rise, bottomRadius, cornerRadius)
	}
	if topRadius != 0 && math.Abs(closing-topRadius) > closureLimit*topRadius {
		return nil, fmt.Errorf("pipeflow: a top radius of %v does not close an arch of %v x %v, %.4g would",
			topRadius, span, rise, closing)
	}
	pieces := threeArcs(rise, bottomRadius, closing, cornerRadius, across, up)
	return &Arch{newOutline(0, 0, pieces), closing, topRadius}, nil
}

func checkArch(span, rise, bottom, top, corner float64) error {
	lengths := [...]struct {
		name  string
		value float64
	}{{"span", span}, {"rise", rise}, {"bottom radius", bottom}, {"corner radius", corner}}
	for _, length := range lengths {
		if err := checkLength(length.name, length.value); err != nil {
			return err
		}
	}
	if top != 0 {
		return checkLength("top radius", top)
	}
	return nil
}

// touchingRadius is the radius R of a circle through a point on the axis at the distance d from the level of the corner's
// centre that the corner circle touches from inside: c² + (R - d)² = (R - r)².
func touchingRadius(c, d, r float64) float64 {
	return (c*c + d*d - r*r) / (2 * (d - r))
}

// roundCrown is the closure where the crown arc holds the widest points: Rt = span/2, and the corner's centre lies where
// both circles touch. Subtracting the two conditions leaves v, the first then c.
func roundCrown(span, rise, bottom, corner float64) (across, up, top float64) {
	top = span / 2
	crown := rise - top // height of the crown arc's centre
	// c² = (Rb-Rc)² - (v-Rb)² = (Rt-Rc)² - (v-crown)²
	inside := (bottom-corner)*(bottom-corner) - (top-corner)*(top-corner)
	up = (inside + crown*crown - bottom*bottom) / (2 * (crown - bottom))
	return math.Sqrt((top-corner)*(top-corner) - (up-crown)*(up-crown)), up, top
}

// threeArcs lays bottom, corner and crown arc on one another; (across, up) is the centre of the corner arc. Two arcs
// touch on the line through their centres.
func threeArcs(rise, bottom, top, corner, across, up float64) []piece {
	touch := func(r, centre float64) float64 { // height at which an arc on the axis meets the corner arc
		return up + corner*(up-centre)/(r-corner)
	}
	first, second := touch(bottom, bottom), touch(top, rise-top)
	return []piece{
		{bottom: 0, top: first, radius: bottom, low: 0, high: 2 * bottom},
		{bottom: first, top: second, radius: corner, centre: across, low: up - corner, high: up + corner},
		{bottom: second, top: rise, radius: top, low: rise - 2*top, high: rise},
	}
}

// NewOval makes an elliptical pipe as it is built, of four arcs: one radius at invert and crown, the other at both sides.
// A lying oval (span over rise) has the larger radius at invert and crown, an upright one at the sides. Span, rise and
// the smaller radius are kept; the larger one is what closes the shape and is reported as closing, the given one being
// rounded.
//
// Error: a length that is none, a smaller radius over half the smaller dimension, or a larger radius that would have to
// change by more than a fifth. A larger radius of 0 is found from the others.
func NewOval(span, rise, crownRadius, sideRadius float64) (oval *Outline, closing float64, err error) {
	if _, err := NewBox(span, rise); err != nil {
		return nil, 0, err
	}
	long, short := max(span, rise), min(span, rise)
	small, given := sideRadius, crownRadius
	if rise > span {
		small, given = crownRadius, sideRadius
	}
	if !(small > 0) || !(small < short/2) {
		return nil, 0, fmt.Errorf("pipeflow: the smaller radius of an oval of %v x %v must be over 0 and under %v, not %v",
			span, rise, short/2, small)
	}
	closing = touchingRadius(long/2-small, short/2, small)
	if given != 0 && !(math.Abs(closing-given) <= closureLimit*given) {
		return nil, 0, fmt.Errorf("pipeflow: a larger radius of %v does not close an oval of %v x %v, %.4g would",
			given, span, rise, closing)
	}
	crown, side := closing, small
	if rise > span {
		crown, side = small, closing
	}
	return newOutline(0, 0, threeArcs(rise, crown, crown, side, span/2-side, rise/2)), closing, nil
}
