package surface

// Curve is the usual name of a free surface: a letter for the slope and a figure for the zone (Chow 1959, section 9-3).
// Letters: M mild (also where no uniform flow exists), C critical, S steep, H horizontal, A adverse. Figures: 1 above
// normal and critical depth, 2 between them, 3 below both.
type Curve string

// The curves, with Uniform for a surface at normal depth.
const (
	M1, M2, M3 Curve = "M1", "M2", "M3"
	C1, C3     Curve = "C1", "C3"
	S1, S2, S3 Curve = "S1", "S2", "S3"
	H2, H3     Curve = "H2", "H3"
	A2, A3     Curve = "A2", "A3"
	Uniform    Curve = "uniform"
)

// tranquilCurve names the free surface that begins at a depth and goes up the pipe. Above the upper of two normal
// depths the surface is drawn down as on a mild slope, whatever the slope.
func (w *water) tranquilCurve(d Depths, steep bool, start float64) Curve {
	drawn := !d.HasNormal || start < d.Normal || start < w.rise && w.rises(start)
	switch {
	case w.slope < 0:
		return A2
	case w.slope == 0:
		return H2
	case d.HasNormal && nearly(start, d.Normal):
		return Uniform
	case drawn:
		return M2
	case steep:
		return S1
	case w.isCritical(d):
		return C1
	}
	return M1
}

// rapidCurve names the free surface that begins at a depth and goes down the pipe.
func (w *water) rapidCurve(d Depths, steep bool, start float64) Curve {
	switch {
	case w.slope < 0:
		return A3
	case w.slope == 0:
		return H3
	case d.HasNormal && nearly(start, d.Normal):
		return Uniform
	case steep && start > d.Normal:
		return S2
	case steep:
		return S3
	case w.isCritical(d):
		return C3
	}
	return M3
}
