package hydrology

import "math"

// basinMethods are formulas for a whole basin: its longest flow path and that path's mean slope.
var basinMethods = []Method{
	{
		Kind: Kirpich, Title: "Kirpich", Basin: true,
		Source: "Z. P. Kirpich, Civil Engineering, vol. 10 no. 6, 1940 (six farm basins in Tennessee)",
		Limits: []Limit{
			limit(area, 1, 112, "Kirpich 1940, from memory"), limit(slope, 0.03, 0.10, "Kirpich 1940, from memory"),
		},
		needs:   []quantity{length, slope},
		formula: kirpich,
	},
	{
		Kind: FAA, Title: "FAA", Basin: true,
		Source:  "Federal Aviation Administration, Airport Drainage, AC 150/5320-5B, 1970 (airfields)",
		needs:   []quantity{length, slope, runoffC},
		check:   checkC,
		formula: faa,
	},
	{
		Kind: NRCSLag, Title: "NRCS lag", Basin: true,
		Source:  "NRCS, National Engineering Handbook, Part 630, ch. 15 (2010), eq. 15-4b",
		Limits:  []Limit{limit(curve, 50, 95, "NEH 630, ch. 15, from memory")},
		needs:   []quantity{length, slope, curve},
		check:   checkCurveNumber,
		formula: nrcsLag,
	},
	{
		Kind: Kerby, Title: "Kerby", Basin: true,
		Source: "W. S. Kerby, Civil Engineering, vol. 29 no. 3, 1959, constants from memory",
		Limits: []Limit{
			limit(length, 0, 1200, "Kerby 1959, from memory"), limit(slope, 0, 0.01, "Kerby 1959, from memory"),
		},
		needs:   []quantity{length, slope, roughness},
		formula: kerby,
	},
	{
		Kind: BransbyWilliams, Title: "Bransby Williams", Basin: true,
		Source:  "G. Bransby Williams, The Engineer, vol. 134, 1922; constant as in Australian practice, from memory",
		needs:   []quantity{length, slope, area},
		formula: bransbyWilliams,
	},
	{
		Kind: Temez, Title: "Témez", Basin: true,
		Source:  "Ministerio de Fomento, Norma 5.2-IC Drenaje superficial (Spain, 2016), from memory",
		needs:   []quantity{length, slope},
		formula: temez,
	},
}

// inMinutes makes a formula for a time in minutes.
func inMinutes(constant float64, factors ...factor) product {
	return product{"t", "min", constant, factors}
}

// kirpich: t = 0.0078·L^0.77·S^−0.385 min (ft), 0.01947 (m).
func kirpich(l Leg, s Settings) product {
	return inMinutes(in(s.System, 0.0078, 0.01947), length.to(0.77, l, s.System), slope.to(-0.385, l, s.System))
}

// faa: t = 1.8·(1.1 − C)·L^0.5/S%^(1/3) min (ft), 3.26 (m), with the slope in per cent.
func faa(l Leg, s Settings) product {
	rest := factor{Number{"1.1 less the runoff coefficient", "(1.1−C)", 1.1 - l.C, ""}, 1}
	percent := factor{Number{"slope in per cent", "S%", 100 * l.Slope, "%"}, -1.0 / 3}
	return inMinutes(in(s.System, 1.8, 3.260), rest, length.to(0.5, l, s.System), percent)
}

// nrcsLag: t = L^0.8·(S′ + 1)^0.7/(1140·Y^0.5) h (ft), S′ = 1000/CN − 10 in, Y the slope in per cent. The lag
// itself has 1900 and is 0.6 of it. In SI the constant is 1/440.7, for 1140·0.3048^0.8 = 440.7; S′ stays in inches.
func nrcsLag(l Leg, s Settings) product {
	retention := factor{Number{"potential retention, in, plus 1", "(S'+1)", 1000/l.CurveNumber - 10 + 1, ""}, 0.7}
	percent := factor{Number{"slope in per cent", "S%", 100 * l.Slope, "%"}, -0.5}
	return product{"t", "h", 1 / in(s.System, 1140, 440.7), []factor{length.to(0.8, l, s.System), retention, percent}}
}

// kerby: t = 0.828·(L·N)^0.467·S^−0.235 min (ft), 1.44 (m), with N Kerby's retardance: 0.02 smooth pavement … 0.80
// timber with deep litter.
func kerby(l Leg, s Settings) product {
	return inMinutes(in(s.System, 0.828, 1.44), length.to(0.467, l, s.System), roughness.to(0.467, l, s.System),
		slope.to(-0.235, l, s.System))
}

// bransbyWilliams: t = 58.5·L/(A^0.1·S^0.2) min with L in km, A in km², S in m/km: 0.02328 with m, ha and rise
// over run, and 0.007768 with ft and acres.
func bransbyWilliams(l Leg, s Settings) product {
	si := 58.5 / 1000 * math.Pow(100, 0.1) * math.Pow(1000, -0.2)
	us := si / feetPerMetre * math.Pow(acresPerHectare, 0.1)
	return inMinutes(rounded(in(s.System, us, si)), length.to(1, l, s.System), area.to(-0.1, l, s.System), slope.to(-0.2, l, s.System))
}

// temez: t = 0.3·L^0.76·S^−0.19 h with L in km: 18/1000^0.76 = 0.09446 min with m, 0.03829 with ft.
func temez(l Leg, s Settings) product {
	si := 0.3 * 60 * math.Pow(1000, -0.76)
	us := si * math.Pow(feetPerMetre, -0.76)
	return inMinutes(rounded(in(s.System, us, si)), length.to(0.76, l, s.System), slope.to(-0.19, l, s.System))
}

// rounded keeps four digits of a constant that was converted, so that what is printed is what was used.
func rounded(x float64) float64 {
	scale := math.Pow(10, 3-math.Floor(math.Log10(x)))
	return math.Round(x*scale) / scale
}
