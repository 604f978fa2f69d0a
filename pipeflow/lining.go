package pipeflow

import "math"

// Lining is a part of a wetted section that has one roughness.
type Lining struct {
	Area      float64 // of the part, between upright lines
	Perimeter float64 // of the wall only, not of the lines between parts
	N         float64
}

// HortonN is the roughness of the whole section where every part is taken to have the same mean velocity:
//
//	n = (Σ Pᵢ nᵢ^(3/2) / P)^(2/3)    (Horton 1933 and Einstein 1934; Chow 1959, eq. 6-17)
//
// Areas do not enter. None where no part is wet.
func HortonN(parts []Lining) (n float64, ok bool) {
	sum, perimeter := 0.0, 0.0
	for _, part := range parts {
		sum += part.Perimeter * part.N * math.Sqrt(part.N)
		perimeter += part.Perimeter
	}
	if perimeter == 0 {
		return 0, false
	}
	root := math.Cbrt(sum / perimeter)
	return root * root, true
}

// LotterN is the roughness of the whole section where the flow is the sum of the flows of its parts:
//
//	n = P R^(5/3) / Σ (Pᵢ Rᵢ^(5/3) / nᵢ)    (Lotter 1933; Chow 1959, eq. 6-19)
//
// None where no part is wet or a part has no roughness.
func LotterN(parts []Lining) (n float64, ok bool) {
	var whole Geometry
	sum := 0.0
	for _, part := range parts {
		if part.N <= 0 {
			return 0, false
		}
		wet := Geometry{Area: part.Area, Perimeter: part.Perimeter}
		sum += sectionFactor(wet) / part.N // P R^(5/3) is A R^(2/3)
		whole.Area += wet.Area
		whole.Perimeter += wet.Perimeter
	}
	if whole.Perimeter == 0 || sum == 0 {
		return 0, false
	}
	return sectionFactor(whole) / sum, true
}

// Linings are the wet parts of the section at a depth, a part to each stretch of one roughness between upright lines.
func (g *Ground) Linings(depth float64) []Lining {
	y := clampDepth(depth, g.rise)
	var parts []Lining
	for i := range g.slabs {
		s := &g.slabs[i]
		wet := s.at(y)
		if i == 0 || s.n != g.slabs[i-1].n {
			parts = append(parts, Lining{N: s.n})
		}
		last := &parts[len(parts)-1]
		last.Area += wet.Area
		last.Perimeter += wet.Perimeter
	}
	wet := parts[:0]
	for _, part := range parts {
		if part.Perimeter > 0 {
			wet = append(wet, part)
		}
	}
	return wet
}
