package pipeflow

// A hydraulic function is the logarithm of what a section offers at a depth over what is asked for: it passes zero at the
// depth that is sought. Given with it are its first two derivatives in the logarithm of depth. In these terms the
// functions of most sections are nearly straight lines, so that few steps are needed and depths of any size come out to
// the same relative accuracy.
//
// The functions below are made of elasticities, such as a = y T/A of the area, whose growth is the top width T; it changes
// with ln y by a + (y²/A) dT/dy - a².
type hydraulic func(depth float64) (value, slope, bend float64)

// elasticity is (y/F) dF/dy and its derivative in ln y, of a quantity F from its first two derivatives in y.
func elasticity(y, f, first, second float64) (value, bend float64) {
	value = y * first / f
	return value, value + y*(y*second/f) - value*value
}

// normalFunction is ln(A R^(2/3) / factor), a third of the logarithm of its cube, which needs no root.
func normalFunction(s Section, factor float64) hydraulic {
	grower := growthOf(s)
	return func(y float64) (value, slope, bend float64) {
		wet, grows := s.At(y), grower.growth(y)
		area, areaBend := elasticity(y, wet.Area, wet.TopWidth, grows.width)
		wall, wallBend := elasticity(y, wet.Perimeter, grows.perimeter, grows.perimeterBend)
		r, share := wet.Area/wet.Perimeter, wet.Area/factor
		return ln(r*share*r*share*share) / 3, (5*area - 2*wall) / 3, (5*areaBend - 2*wallBend) / 3
	}
}

// radiusFunction is ln(R^(2/3) / factor).
func radiusFunction(s Section, factor float64) hydraulic {
	grower := growthOf(s)
	return func(y float64) (value, slope, bend float64) {
		wet, grows := s.At(y), grower.growth(y)
		area, areaBend := elasticity(y, wet.Area, wet.TopWidth, grows.width)
		wall, wallBend := elasticity(y, wet.Perimeter, grows.perimeter, grows.perimeterBend)
		return ln(radiusFactor(wet) / factor), (area - wall) * 2 / 3, (areaBend - wallBend) * 2 / 3
	}
}

// criticalFunction is ln(A³/T / target).
func criticalFunction(s Section, target float64) hydraulic {
	grower := growthOf(s)
	return func(y float64) (value, slope, bend float64) {
		wet, grows := s.At(y), grower.growth(y)
		area, areaBend := elasticity(y, wet.Area, wet.TopWidth, grows.width)
		top, topBend := elasticity(y, wet.TopWidth, grows.width, grows.widthBend)
		return ln(criticalFactor(wet) / target), 3*area - top, 3*areaBend - topBend
	}
}
