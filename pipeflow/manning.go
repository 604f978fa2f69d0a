package pipeflow

import "math"

// Manning is uniform flow by Manning's equation in a conduit of one roughness and one slope:
//
//	Q = (k/n) A R^(2/3) S^(1/2)    (Chow 1959, eq. 5-6 and 5-7)
type Manning struct {
	Factor float64 // unit constant k: 1 for metres, 1.486 for feet; over 0
	N      float64 // roughness coefficient n, over 0
	Slope  float64 // rise over run; uniform flow exists only over 0
}

// Flow is the uniform flow at a depth: 0 at depth 0, and 0 where the slope is not over 0. At the rise of a closed
// section it is the full-bore capacity.
func (m Manning) Flow(s Section, depth float64) float64 {
	if !(m.Slope > 0) {
		return 0
	}
	return m.strength() * sectionFactor(s.At(depth))
}

// Velocity is the mean velocity of the uniform flow at a depth, 0 at depth 0.
func (m Manning) Velocity(s Section, depth float64) float64 {
	if !(m.Slope > 0) {
		return 0
	}
	return m.strength() * radiusFactor(s.At(depth))
}

// FullFlow is the capacity of a closed section running full without pressure, its full-bore capacity; 0 where the slope
// is not over 0. An open section is taken at its described rise; without end it is +Inf.
func (m Manning) FullFlow(s Section) float64 {
	rise := s.Rise()
	if m.Slope > 0 && math.IsInf(rise, 1) {
		return rise
	}
	return m.Flow(s, rise)
}

// FullVelocity is the velocity at full-bore capacity; 0 where the slope is not over 0. An open section is as for
// [Manning.FullFlow].
func (m Manning) FullVelocity(s Section) float64 {
	rise := s.Rise()
	if m.Slope > 0 && math.IsInf(rise, 1) {
		return rise
	}
	return m.Velocity(s, rise)
}

// strength is (k/n) √S, what Manning's equation holds besides the section.
func (m Manning) strength() float64 {
	return m.Factor / m.N * math.Sqrt(m.Slope)
}

// sectionFactor is A R^(2/3), what the section contributes to Manning's equation (Chow 1959, section 6-2).
func sectionFactor(g Geometry) float64 {
	return g.Area * radiusFactor(g)
}

// radiusFactor is R^(2/3).
func radiusFactor(g Geometry) float64 {
	if g.Perimeter == 0 {
		return 0
	}
	root := math.Cbrt(g.Area / g.Perimeter)
	return root * root
}
