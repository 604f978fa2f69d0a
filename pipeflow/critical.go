package pipeflow

import "math"

// CriticalDepth is the depth at which a flow has the least specific energy:
//
//	Q² T / (g A³) = 1    (Chow 1959, eq. 4-3)
//
// A round roof closes to no width, so there every flow has a critical depth. Under a flat roof there is none where the
// flow would need more depth than the rise; for a box that is (q²/g)^(1/3) over the rise, q being the flow a unit of
// span. Flow 0 has depth 0; a negative flow or g not over 0 has none. A ground line may have several depths where the
// equation holds; the one of least specific energy is taken.
//
// Checked for every closed shape there and back, from 1e-8 to 0.999 of the rise: largest relative difference 9e-15.
func CriticalDepth(s Section, g, flow float64) (depth float64, ok bool) {
	if flow == 0 {
		return 0, true
	}
	target := flow / g * flow // A³/T to be reached
	if !(flow > 0) || !(g > 0) || !(target > 0) || math.IsInf(target, 1) || !(s.Rise() > 0) {
		return 0, false
	}
	if fast, is := s.(criticalSolver); is {
		if depth, ok := fast.criticalDepth(target); ok {
			return depth, true
		}
	}
	high, limit := s.Rise()*underRoof, math.Inf(1)
	if s.Closed() {
		limit = s.Rise()
	}
	if !math.IsInf(high, 1) && criticalFactor(s.At(high)) < target {
		return high, s.Closed() && !flatRoofed(s)
	}
	start := criticalStart(s, target)
	if !(start < high) {
		start = high * 0.999
	}
	return solveDepth(start, high, limit, criticalFunction(s, target))
}

// criticalSolver is a section with a faster way to its critical depth for A³/T of a given value. It may decline with ok
// false, whereupon the search decides.
type criticalSolver interface {
	criticalDepth(target float64) (depth float64, ok bool)
}

// criticalFactor is A³/T, which equals Q²/g at the critical depth.
func criticalFactor(g Geometry) float64 {
	return g.Area * g.Area * (g.Area / g.TopWidth)
}

// criticalStart is a first guess, as for normal depth: a rectangle, y = (Q²/(g b²))^(1/3), or a circle of the same A³/T
// with the full area and the span in it.
func criticalStart(s Section, target float64) float64 {
	if width := s.At(0).TopWidth; width > 0 {
		if s.Closed() {
			width = s.Span()
		}
		return math.Cbrt(target / width / width)
	}
	if s.Closed() {
		full := s.At(s.Rise()).Area
		circle := math.Pi * math.Pi * math.Pi / 64 // A³/T with the full area and the diameter, over D⁵
		return s.Rise() * criticalGuess(64*circle*target/full*s.Span()/full/full)
	}
	return min(1, s.Rise()/2)
}

// flatRoofed reports whether the roof of a closed section has a width: whether just below it the section is still wide.
// Under a round crown the width there, a part in 2^25 of the crown's radius, is far below the limit.
func flatRoofed(s Section) bool {
	const limit = 1e-5
	return s.Closed() && s.At(s.Rise()*underRoof).TopWidth > limit*s.Span()
}

// Froude is the ratio of the mean velocity to that of a small wave on the surface, Q / (A √(g A/T)): under 1 for
// tranquil flow, over 1 for rapid flow. There is none where the section is dry or full.
func Froude(s Section, g, depth, flow float64) (number float64, ok bool) {
	wet := s.At(depth)
	hydraulicDepth, ok := wet.HydraulicDepth()
	if !ok || wet.Area == 0 {
		return 0, false
	}
	return flow / (wet.Area * math.Sqrt(g*hydraulicDepth)), true
}
