package hydrology

import (
	"math"
	"slices"
)

// Step is one leg of a path worked out: what went in, the formula with symbols and with numbers, the result, and
// the limits that it is outside of.
type Step struct {
	Leg      Leg
	Method   Method
	Given    []Number
	Formula  string  // t = 0.0078·L^0.77·S^-0.385
	Working  string  // 0.0078·1200^0.77·0.02^-0.385 = 8.236 min
	Velocity float64 // ft/s or m/s, over the length of the leg
	Minutes  float64
	Breaches []Breach

	// The formula in full: Symbol, in Unit, is Constant times the numbers of Given, each to its exponent.
	Symbol, Unit string
	Constant     float64
	Exponents    []float64
}

// Trial is one round of the kinematic wave: the time of the whole path that was assumed, the storm's intensity
// there, and the time of the path that follows.
type Trial struct {
	Assumed, Intensity, Minutes float64
}

// Travel is a path worked out. Minutes is the sum of the steps, before any floor. Where says where the kinematic
// wave read the storm at last: below the first duration is worth a notice, Beyond the last there is no intensity
// and the times of those steps rest on the last one. It is Within where no step asked the storm.
type Travel struct {
	Steps   []Step
	Minutes float64
	Trials  []Trial
	Where   Range
}

// maxRounds bounds the trials. Each round multiplies the error by 0.4 times the storm's exponent at most, which is
// under 1: 100 rounds reach rounding for exponents to 1.7, and measured storms stay under 1.
const maxRounds = 100

// convergedMinutes is how near two rounds come at the end: far under a second, and over rounding.
const convergedMinutes = 1e-9

// Time works out a path from its first leg to its last. The faults are all that is wrong with the legs, and there is
// no travel then. An empty path takes no time.
func Time(path []Leg, s Settings) (Travel, []PathFault) {
	var faults []PathFault
	for k, leg := range path {
		for _, text := range leg.faults(s) {
			faults = append(faults, PathFault{k, text})
		}
	}
	if len(faults) > 0 {
		return Travel{}, faults
	}
	var t Travel
	if at := slices.IndexFunc(path, func(l Leg) bool { return l.Kind == SheetKinematic }); at >= 0 {
		steady, perRain := split(path, s)
		if t.Trials, t.Where = sheetTrials(steady, perRain, steady, s); t.Trials == nil {
			return Travel{}, []PathFault{{at, "sheet flow, kinematic wave: the time does not settle on this storm"}}
		}
	}
	for _, leg := range path {
		step := stepOf(leg, t.Trials, s)
		t.Steps = append(t.Steps, step)
		t.Minutes += step.Minutes
	}
	return t, nil
}

// split takes a path apart for the kinematic wave: it takes steady + perRain·i^−0.4 minutes.
func split(path []Leg, s Settings) (steady, perRain float64) {
	for _, leg := range path {
		m, _ := methodOf(leg.Kind)
		if minutes := m.formula(leg, s).minutes(leg); leg.Kind == SheetKinematic {
			perRain += minutes
		} else {
			steady += minutes
		}
	}
	return steady, perRain
}

func stepOf(leg Leg, trials []Trial, s Settings) Step {
	m, _ := methodOf(leg.Kind)
	p := m.formula(leg, s)
	if leg.Kind == SheetKinematic {
		p = p.raining(trials[len(trials)-1].Intensity, s.System)
	}
	step := Step{
		Leg: leg, Method: m, Formula: p.symbols(), Working: p.numbers(),
		Velocity: p.flowSpeed(leg), Minutes: p.minutes(leg), Breaches: m.breaches(leg, s.System),
		Symbol: p.symbol, Unit: p.unit, Constant: p.constant,
	}
	for _, f := range p.factors {
		step.Given = append(step.Given, f.Number)
		step.Exponents = append(step.Exponents, f.exponent)
	}
	return step
}

// sheetTrials finds the time T of a whole path that satisfies T = steady + perRain·i(T)^−0.4, from a first
// assumption. The storm is read at no less than the minimum time, and clamped to its durations. Where i falls no
// faster than T^−2.5 there is one such T, and the rounds reach it from any start. None where they do not settle.
func sheetTrials(steady, perRain, assumed float64, s Settings) (trials []Trial, where Range) {
	rounds := s.MaxTrialRounds
	if rounds == 0 {
		rounds = maxRounds
	}
	for range rounds {
		intensity, where := clamped(s.Storm, max(s.Minimum, assumed))
		next := steady + perRain*math.Pow(intensity, -0.4)
		trials = append(trials, Trial{assumed, intensity, next})
		if math.Abs(next-assumed) <= convergedMinutes {
			return trials, where
		}
		assumed = next
	}
	return nil, Within
}

// clamped reads a storm at a time, and beyond its last duration at that duration.
func clamped(storm Intensity, minutes float64) (intensity float64, where Range) {
	intensity, where = storm.At(minutes)
	if where != Beyond {
		return intensity, where
	}
	if c, ok := storm.(corners); ok {
		if durations := c.Durations(); len(durations) > 0 {
			intensity, _ = storm.At(durations[len(durations)-1])
		}
	}
	return intensity, Beyond
}
