package hydrology

import "math"

// legMethods are the formulas for one leg of a flow path. The pairs of constants are the sources' own, rounded by
// them; within a pair they agree to 0.3 %.
var legMethods = []Method{
	{
		Kind: SheetKinematic, Title: "sheet flow, kinematic wave",
		Source:  "FHWA HEC-22, 3rd ed. (2009), eq. 3-2",
		Limits:  []Limit{limit(length, 0, 130, "HEC-22, 3rd ed., sec. 3.2.2.3, from memory")},
		needs:   []quantity{length, slope, roughness},
		check:   checkStorm,
		formula: func(l Leg, s Settings) product { return kinematic(l, s) },
	},
	{
		Kind: SheetNRCS, Title: "sheet flow, NRCS form",
		Source:  "NRCS, National Engineering Handbook, Part 630, ch. 15 (2010), eq. 15-8; TR-55 (1986), eq. 3-3",
		Limits:  []Limit{limit(length, 0, 100, "NEH 630, ch. 15")},
		needs:   []quantity{length, slope, roughness},
		check:   checkRainDepth,
		formula: sheetNRCS,
	},
	{
		Kind: Shallow, Title: "shallow concentrated flow",
		Source:  "NEH 630, ch. 15, Table 15-3; TR-55 (1986), appendix F",
		needs:   []quantity{length, slope},
		check:   checkCover,
		formula: shallow,
	},
	{
		Kind: Gutter, Title: "gutter flow",
		Source:  "FHWA HEC-22, 3rd ed. (2009), ch. 4, from memory",
		needs:   []quantity{length, slope, roughness, crossSlope, spread},
		formula: gutter,
	},
	{
		Kind: Channel, Title: "channel flow by Manning",
		Source:  "Manning's equation; TR-55 (1986), eq. 3-4",
		needs:   []quantity{length, slope, roughness, radius},
		formula: channel,
	},
	{
		Kind: FullPipe, Title: "pipe flowing full by Manning",
		Source:  "Manning's equation with R = D/4",
		needs:   []quantity{length, slope, roughness, diameter},
		formula: fullPipe,
	},
	{
		Kind: GivenVelocity, Title: "travel at a given velocity",
		Source:  "definition",
		needs:   []quantity{length, velocity},
		formula: func(l Leg, s Settings) product { return speed(s, 1, velocity.to(1, l, s.System)) },
	},
}

// kinematic is the kinematic wave without its intensity, which the path puts in:
// t = 0.933/i^0.4·(nL/√S)^0.6 min (ft, in/h), 6.92 (m, mm/h). HEC-22, 3rd ed., eq. 3-2.
func kinematic(l Leg, s Settings) product {
	return product{"t", "min", in(s.System, 0.933, 6.92), []factor{
		roughness.to(0.6, l, s.System), length.to(0.6, l, s.System), slope.to(-0.3, l, s.System),
	}}
}

// raining puts an intensity into the kinematic wave.
func (p product) raining(intensity float64, s System) product {
	i := factor{Number{"intensity", "i", intensity, in(s, "in/h", "mm/h")}, -0.4}
	p.factors = append(p.factors[:len(p.factors):len(p.factors)], i)
	return p
}

// sheetNRCS: t = 0.007·(nL)^0.8/(P₂^0.5·S^0.4) h (ft, in); NEH 630, ch. 15, eq. 15-8. In SI 0.0913 (m, mm),
// which is 0.007·0.3048^−0.8·25.4^0.5.
func sheetNRCS(l Leg, s Settings) product {
	depth := factor{Number{"2-year 24-hour depth", "P2", s.TwoYearDay, in(s.System, "in", "mm")}, -0.5}
	return product{"t", "h", in(s.System, 0.007, 0.0913), []factor{
		roughness.to(0.8, l, s.System), length.to(0.8, l, s.System), slope.to(-0.4, l, s.System), depth,
	}}
}

// speed makes a formula for a velocity.
func speed(s Settings, constant float64, factors ...factor) product {
	return product{"V", in(s.System, "ft/s", "m/s"), constant, factors}
}

// shallow: V = c·√S. NEH 630, ch. 15, Table 15-3.
func shallow(l Leg, s Settings) product {
	coefficient := l.Coefficient
	if !positive(coefficient) {
		cover, _ := shallowCover(l.Cover)
		coefficient = cover.Coefficient * in(s.System, 1, 1/feetPerMetre)
	}
	c := factor{Number{"velocity coefficient", "c", coefficient, in(s.System, "ft/s", "m/s")}, 1}
	return speed(s, 1, c, slope.to(0.5, l, s.System))
}

// gutter: V = 1.11/n·Sx^0.67·√S·T^0.67 ft/s, 0.752 in SI: flow over area of a triangular gutter of spread T.
// HEC-22, 3rd ed., ch. 4, from memory.
func gutter(l Leg, s Settings) product {
	return speed(s, in(s.System, 1.11, 0.752), roughness.to(-1, l, s.System), crossSlope.to(0.67, l, s.System),
		slope.to(0.5, l, s.System), spread.to(0.67, l, s.System))
}

// channel: V = (k/n)·R^(2/3)·√S, k = 1.486 (US) or 1 (SI).
func channel(l Leg, s Settings) product {
	return speed(s, s.manning(), roughness.to(-1, l, s.System), radius.to(2.0/3, l, s.System), slope.to(0.5, l, s.System))
}

// fullPipe: the same with R = D/4.
func fullPipe(l Leg, s Settings) product {
	quarter := factor{Number{"hydraulic radius", "(D/4)", l.Diameter / 4, in(s.System, "ft", "m")}, 2.0 / 3}
	return speed(s, s.manning(), roughness.to(-1, l, s.System), quarter, slope.to(0.5, l, s.System))
}

// minutes turns what a formula gives into minutes on a leg.
func (p product) minutes(l Leg) float64 {
	switch p.symbol {
	case "V":
		return l.Length / p.value() / 60
	}
	if p.unit == "h" {
		return 60 * p.value()
	}
	return p.value()
}

// flowSpeed is the velocity on a leg: what the formula gives, or length over its time.
func (p product) flowSpeed(l Leg) float64 {
	if p.symbol == "V" {
		return p.value()
	}
	return l.Length / math.Max(60*p.minutes(l), math.SmallestNonzeroFloat64)
}
