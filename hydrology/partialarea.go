package hydrology

import (
	"cmp"
	"slices"
)

// Contribution is an area as a point on the drain sees it: CA = C·A, the inlet time over which the area comes in
// from nothing to all of it, and the travel time in pipes from its inlet down to the point. Times in minutes, not
// negative; an inlet time of 0 brings the whole area at once.
type Contribution struct {
	CA, InletTime, TravelTime float64
}

// counted is how much of CA runs off at the point when rain has lasted for t minutes.
func (c Contribution) counted(t float64) float64 {
	if t >= c.TravelTime+c.InletTime {
		return c.CA
	}
	return c.CA * max(0, (t-c.TravelTime)/c.InletTime)
}

// Peak is the largest flow at a point, and what makes it: the duration that governs in minutes, the intensity
// there, and how much of ΣCA counted.
type Peak struct {
	Time, Intensity, CACounted, Flow float64
}

// LongestTime is the usual Rational peak: all of ΣCA at the longest time, which is at least minimum. Areas with
// CA = 0 set no time. Not ok where there is no CA, or where the time is Beyond what is known of the storm.
func LongestTime(areas []Contribution, storm Intensity, minimum, factor float64) (peak Peak, where Range, ok bool) {
	longest, total := longestTime(areas, minimum)
	peak = peakAt(longest, total, storm, factor)
	_, where = storm.At(longest)
	return peak, where, total > 0 && where != Beyond
}

func longestTime(areas []Contribution, minimum float64) (longest, total float64) {
	longest = minimum
	for _, a := range areas {
		if a.CA > 0 {
			total += a.CA
			longest = max(longest, a.TravelTime+a.InletTime)
		}
	}
	return longest, total
}

func peakAt(t, counted float64, storm Intensity, factor float64) Peak {
	intensity, _ := storm.At(t)
	return Peak{t, intensity, counted, Rational(factor, counted, intensity)}
}

// PartialArea is the largest Rational flow over all durations, when of each area only as much counts as has had
// time to arrive: a share (t − τ)/t_inlet of it between its travel time τ and τ + t_inlet. A short hard storm on the
// near areas may give more than a long one on all of them.
//
// The flow is looked at where it can be largest: at minimum; at every τ and τ + t_inlet; at every tabulated duration
// between minimum and the longest time; and, with an equation, where the flow has a turning point. Between these
// points a flow on a log–log curve has none as long as depth rises with duration. For two areas it is the published
// rule Q′ = (C₁A₁·t₂/t₁ + C₂A₂)·i₂ or the full flow, whichever is larger (FHWA HDS-2, 2nd ed. 2002, eq. 5.31).
//
// The time is the shortest that gives the largest flow. Not ok where there is no CA, or where the longest time is
// Beyond what is known of the storm. It takes O(n log n) in the number of areas. Rounding costs about 10⁻¹⁶ times the
// longest time over the shortest inlet time that is not 0.
func PartialArea(areas []Contribution, storm Intensity, minimum, factor float64) (peak Peak, where Range, ok bool) {
	longest, total := longestTime(areas, minimum)
	if _, end := storm.At(longest); !(total > 0) || end == Beyond {
		return Peak{}, end, false
	}
	arrivals := arrivalsOf(areas)
	times := candidates(arrivals, storm, minimum, longest)
	now, next := arriving{}, 0
	for k, t := range times {
		for ; next < len(arrivals) && arrivals[next].time <= t; next++ {
			now.take(arrivals[next])
		}
		if here := peakAt(t, now.counted(t), storm, factor); here.Flow > peak.Flow {
			peak = here
		}
		if e, smooth := storm.(exponent); smooth && k+1 < len(times) {
			if turn, found := turningPoint(now, e, t, times[k+1]); found {
				if here := peakAt(turn, now.counted(turn), storm, factor); here.Flow > peak.Flow {
					peak = here
				}
			}
		}
	}
	_, where = storm.At(peak.Time)
	return peak, where, true
}

// arrival is a moment at which an area begins to come in, or at which all of it is in.
type arrival struct {
	time, ca, rate float64
	ends           bool
}

// arrivalsOf lists both moments of each area in order of time. An area that comes in at once only ends.
func arrivalsOf(areas []Contribution) []arrival {
	arrivals := make([]arrival, 0, 2*len(areas))
	for _, a := range areas {
		start, end := a.TravelTime, a.TravelTime+a.InletTime
		if !(a.CA > 0) {
			continue
		}
		rate := 0.0
		if end > start {
			rate = a.CA / (end - start)
			arrivals = append(arrivals, arrival{start, a.CA, rate, false})
		}
		arrivals = append(arrivals, arrival{end, a.CA, rate, true})
	}
	slices.SortStableFunc(arrivals, func(a, b arrival) int { return cmp.Compare(a.time, b.time) })
	return arrivals
}

// arriving is what counts from a time on: whole areas, and a part that grows at a rate while areas are partly in.
type arriving struct {
	time, whole, part, rate float64
	partly                  int // areas that are partly in
}

// take takes an arrival into account. Where no area is partly in, the part is 0 and not what rounding left of it.
func (a *arriving) take(b arrival) {
	a.part += a.rate * (b.time - a.time)
	a.time = b.time
	switch {
	case !b.ends:
		a.rate, a.partly = a.rate+b.rate, a.partly+1
	case b.rate == 0:
		a.whole += b.ca
	default:
		a.whole, a.part = a.whole+b.ca, a.part-b.ca
		a.rate, a.partly = a.rate-b.rate, a.partly-1
	}
	if a.partly == 0 {
		a.part, a.rate = 0, 0
	}
}

func (a arriving) counted(t float64) float64 { return max(a.whole, a.whole+a.part+a.rate*(t-a.time)) }

// candidates are the times at which the flow is looked at, in order.
func candidates(arrivals []arrival, storm Intensity, minimum, longest float64) []float64 {
	times := []float64{minimum, longest}
	for _, a := range arrivals {
		times = append(times, a.time)
	}
	if c, ok := storm.(corners); ok {
		times = append(times, c.Durations()...)
	}
	times = slices.DeleteFunc(times, func(t float64) bool { return t < minimum || t > longest })
	slices.Sort(times)
	return slices.Compact(times)
}

// corners is a storm that changes its law at certain durations.
type corners interface{ Durations() []float64 }

// exponent is a storm whose local exponent −d ln i/d ln t is known: an equation.
type exponent interface {
	Exponent(minutes float64) (float64, bool)
}

// turnSteps is into how many parts a stretch is divided to look for turning points, and turnHalvings how often a
// part is then halved: to 2⁻⁵⁰ of it, which is rounding.
const (
	turnSteps    = 8
	turnHalvings = 50
)

// turningPoint finds where counted(t)·i(t) stops rising between two times: where the area's own growth
// rate·t/counted comes down to the storm's exponent. Not found where the flow has no such point inside.
func turningPoint(now arriving, storm exponent, from, to float64) (t float64, found bool) {
	rising := func(t float64) bool {
		e, ok := storm.Exponent(t)
		return ok && now.rate*t > e*now.counted(t)
	}
	for k := range turnSteps {
		low := from + (to-from)*float64(k)/turnSteps
		high := from + (to-from)*float64(k+1)/turnSteps
		if !rising(low) || rising(high) {
			continue
		}
		for range turnHalvings {
			if middle := low + (high-low)/2; rising(middle) {
				low = middle
			} else {
				high = middle
			}
		}
		return low, true
	}
	return 0, false
}
