package hydrology

import (
	"fmt"
	"math"
)

// Kind is how the time of one leg of a flow path, or of a whole basin, is worked out.
type Kind string

// The kinds. Methods lists them with formula, source and limits.
const (
	SheetKinematic  Kind = "sheet"            // kinematic wave, with the storm's own intensity
	SheetNRCS       Kind = "sheet-nrcs"       // the NRCS form, with the 2-year 24-hour depth
	Shallow         Kind = "shallow"          // shallow concentrated flow by cover
	Gutter          Kind = "gutter"           // triangular gutter by spread
	Channel         Kind = "channel"          // Manning with a given hydraulic radius
	FullPipe        Kind = "pipe"             // Manning, round pipe flowing full
	GivenVelocity   Kind = "velocity"         // length over a velocity that is given
	Kirpich         Kind = "kirpich"          // whole basins, from here on
	FAA             Kind = "faa"              //
	NRCSLag         Kind = "nrcs-lag"         //
	Kerby           Kind = "kerby"            //
	BransbyWilliams Kind = "bransby-williams" //
	Temez           Kind = "temez"            //
)

// Leg is one stretch of a flow path, in the units of the System that it is worked in. What a kind does not use
// may stay 0; what it uses is greater than 0. Slopes are rise over run.
type Leg struct {
	Kind            Kind
	Length          float64 // ft, m
	Slope           float64
	N               float64 // Manning's n; Kerby's retardance
	Cover           string  // shallow flow: a name in ShallowCovers
	Coefficient     float64 // shallow flow: V = Coefficient·√S, ft/s or m/s, in place of a cover
	HydraulicRadius float64 // channel: ft, m
	Diameter        float64 // full pipe: ft, m
	CrossSlope      float64 // gutter
	Spread          float64 // gutter: mean spread along the leg, ft, m
	Velocity        float64 // ft/s, m/s
	C               float64 // FAA: runoff coefficient
	CurveNumber     float64 // NRCS lag: 0–100
	Area            float64 // Bransby-Williams: acre, ha
}

// Settings are what a path takes from the job. The zero value is US units, no storm and no rain depth.
type Settings struct {
	System         System
	Storm          Intensity // wanted by the kinematic wave
	Minimum        float64   // floor under the time at which the kinematic wave reads the storm, min
	TwoYearDay     float64   // 2-year 24-hour depth, in or mm: wanted by the NRCS sheet flow
	ManningFactor  float64   // k in V = (k/n)·R^(2/3)·√S; 0 is 1.486 (US) or 1 (SI)
	MaxTrialRounds int       // of the kinematic wave; 0 is 100
}

// ManningUS is Manning's constant as US practice rounds it (HEC-22, HDS-2); the exact one is 1/0.3048^(1/3) = 1.4859.
const ManningUS = 1.486

func (s Settings) manning() float64 {
	if s.ManningFactor > 0 {
		return s.ManningFactor
	}
	return in(s.System, ManningUS, 1.0)
}

// PathFault is one thing wrong with a path: which leg, counted from 0, and what.
type PathFault struct {
	Leg  int
	Text string
}

// quantity is a number that a leg gives, by its name.
type quantity struct {
	name, symbol string
	us, si       string // units
	of           func(Leg) float64
}

var (
	length     = quantity{"length", "L", "ft", "m", func(l Leg) float64 { return l.Length }}
	slope      = quantity{"slope", "S", "", "", func(l Leg) float64 { return l.Slope }}
	roughness  = quantity{"roughness", "n", "", "", func(l Leg) float64 { return l.N }}
	radius     = quantity{"hydraulic radius", "R", "ft", "m", func(l Leg) float64 { return l.HydraulicRadius }}
	diameter   = quantity{"diameter", "D", "ft", "m", func(l Leg) float64 { return l.Diameter }}
	crossSlope = quantity{"cross slope", "Sx", "", "", func(l Leg) float64 { return l.CrossSlope }}
	spread     = quantity{"spread", "T", "ft", "m", func(l Leg) float64 { return l.Spread }}
	velocity   = quantity{"velocity", "V", "ft/s", "m/s", func(l Leg) float64 { return l.Velocity }}
	runoffC    = quantity{"runoff coefficient", "C", "", "", func(l Leg) float64 { return l.C }}
	curve      = quantity{"curve number", "CN", "", "", func(l Leg) float64 { return l.CurveNumber }}
	area       = quantity{"area", "A", "acre", "ha", func(l Leg) float64 { return l.Area }}
)

// to gives the quantity of a leg as a factor of a formula.
func (q quantity) to(exponent float64, l Leg, s System) factor {
	return factor{Number{q.name, q.symbol, q.of(l), in(s, q.us, q.si)}, exponent}
}

// faults lists what a leg lacks for its kind, or has out of bounds.
func (l Leg) faults(s Settings) []string {
	m, known := methodOf(l.Kind)
	if !known {
		return []string{fmt.Sprintf("kind %q is not known; there are %s", l.Kind, kindNames())}
	}
	var faults []string
	for _, q := range m.needs {
		if value := q.of(l); !positive(value) {
			faults = append(faults, fmt.Sprintf("%s: the %s is %v; a number greater than 0 is wanted", m.Title, q.name, value))
		}
	}
	if m.check != nil {
		faults = append(faults, m.check(l, s)...)
	}
	return faults
}

func checkRainDepth(_ Leg, s Settings) []string {
	if positive(s.TwoYearDay) {
		return nil
	}
	return []string{"sheet flow, NRCS form: the 2-year 24-hour rain depth is wanted, from a rainfall table with 2 years and 1440 min or as a setting"}
}

func checkStorm(_ Leg, s Settings) []string {
	if s.Storm != nil {
		if first, _ := s.Storm.At(0); positive(first) {
			return nil
		}
	}
	return []string{"sheet flow, kinematic wave: a storm is wanted"}
}

func checkCover(l Leg, _ Settings) []string {
	if positive(l.Coefficient) {
		return nil
	}
	if _, known := shallowCover(l.Cover); known {
		return nil
	}
	return []string{fmt.Sprintf("shallow flow: cover %q is not known; there are %s", l.Cover, coverNames())}
}

func checkC(l Leg, _ Settings) []string {
	if l.C > 0 && l.C <= 1 || !positive(l.C) {
		return nil
	}
	return []string{fmt.Sprintf("FAA: runoff coefficient %v is over 1", l.C)}
}

func checkCurveNumber(l Leg, _ Settings) []string {
	if l.CurveNumber <= 100 || math.IsNaN(l.CurveNumber) {
		return nil
	}
	return []string{fmt.Sprintf("NRCS lag: curve number %v is over 100", l.CurveNumber)}
}
