package pipeflow

import "math"

// CriticalDepth is the depth at which a flow has the least specific energy:
//
//	Q² T / (g A³) = 1    (Chow 1959, eq. 4-3)
//
// A round roof closes to no width, so there every flow has a critical depth. Under a flat roof there is none where the
// flow would need more depth than the rise; for a box that is (q²/g)^(1/3) over the rise, q being the flow a unit of
// span. Flow 0 has depth 0; a negative flow or g not over 0 has none.
func CriticalDepth(s Section, g, flow float64) (depth float64, ok bool) {
	if flow == 0 {
		return 0, true
	}
	target := flow / g * flow // A³/T to be reached
	if !(flow > 0) || !(g > 0) || math.IsInf(target, 1) {
		return 0, false
	}
	high, ok := criticalAbove(s, target)
	if !ok {
		return 0, false
	}
	return solveDepth(high, func(y float64) float64 {
		return math.Log(criticalFactor(s.At(y)) / target)
	})
}

// criticalFactor is A³/T, which equals Q²/g at the critical depth.
func criticalFactor(g Geometry) float64 {
	return g.Area * g.Area * (g.Area / g.TopWidth)
}

// criticalAbove is a depth at which A³/T is not under the target.
func criticalAbove(s Section, target float64) (depth float64, ok bool) {
	if rise := s.Rise(); !math.IsInf(rise, 1) {
		depth = rise * underRoof
		return depth, criticalFactor(s.At(depth)) >= target
	}
	depth = 1
	for criticalFactor(s.At(depth)) < target {
		depth *= 4
		if math.IsInf(depth, 1) {
			return 0, false
		}
	}
	return depth, true
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
