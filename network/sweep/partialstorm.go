package sweep

import (
	"math"

	"rimfall/hydrology"
)

// storm is one storm as the search for the peak by partial area sees it.
type storm struct {
	rain    hydrology.Intensity
	smooth  exponent  // nil for a table
	corners []float64 // durations at which the law of the storm changes, min
	falling []float64 // intensities there
	minimum float64   // shortest time that is looked at, min
	convex  bool      // between corners, intensity against duration sags under its chords
}

// exponent is a storm whose local exponent −d ln i/d ln t is known: an equation.
type exponent interface {
	Exponent(minutes float64) (float64, bool)
}

func newStorm(rain hydrology.Intensity, minimum float64) storm {
	var s storm
	s.become(rain, minimum)
	return s
}

// become makes the storm another one, in the room that it has. The corners of rain
// must not be changed by others.
func (s *storm) become(rain hydrology.Intensity, minimum float64) {
	s.rain, s.minimum, s.smooth, s.corners, s.falling = rain, minimum, nil, nil, s.falling[:0]
	if c, ok := rain.(interface{ Durations() []float64 }); ok {
		s.corners = c.Durations()
	}
	for _, t := range s.corners {
		i, _ := rain.At(t)
		s.falling = append(s.falling, i)
	}
	if e, ok := rain.(exponent); ok {
		if _, known := e.Exponent(minimum); known {
			s.smooth = e
		}
	}
	s.convex = s.smooth == nil || sags(rain, s.smooth, minimum)
}

// A table is convex between its durations, since a power law i = a·t^−e is. An
// equation is looked at in sagLooks places up to sagLongest, evenly in ln t: its
// fall −di/dt = i·e/t must nowhere grow.
const (
	sagLooks   = 100
	sagLongest = 1e6 // min, two years
)

func sags(rain hydrology.Intensity, e exponent, minimum float64) bool {
	before := math.Inf(1)
	for k := range sagLooks {
		t := minimum * math.Pow(sagLongest/minimum, float64(k)/(sagLooks-1))
		i, where := rain.At(t)
		falls, ok := e.Exponent(t)
		if where == hydrology.Beyond || !ok {
			break
		}
		if where == hydrology.Below {
			continue
		}
		fall := i * falls / t
		if fall > before {
			return false
		}
		before = fall
	}
	return true
}

// turnSteps is into how many parts a stretch without moments is divided to look for turning
// points, and turnHalvings how often a part is then halved: to 2⁻⁵⁰ of it, which is rounding.
// They are those of hydrology.PartialArea.
const (
	turnSteps    = 8
	turnHalvings = 50
)

// turn looks where counted·intensity stops rising inside a stretch in which what
// counts grows evenly: where its own growth, slope·t/counted, comes down to the
// storm's exponent. On a table there is no such place as long as depth rises with
// duration.
func (s *search) turn(in stretch, counts line) {
	if s.smooth == nil || counts.slope <= 0 {
		return
	}
	rising := func(t float64) bool {
		e, ok := s.smooth.Exponent(t)
		return ok && counts.slope*t > e*counts.at(t-s.list.shift)
	}
	from, width := in.from.time, in.to.time-in.from.time
	for k := range turnSteps {
		low, high := from+width*float64(k)/turnSteps, from+width*float64(k+1)/turnSteps
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
		i, _ := s.rain.At(low)
		s.look(peakTime{low, i, s.within(counts.at(low - s.list.shift))})
		return
	}
}
