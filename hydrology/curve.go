package hydrology

import (
	"math"
	"slices"
)

// Range says where a duration stands against what is known of a storm.
type Range int8

const (
	// Within: the duration is one that the storm is known for.
	Within Range = iota
	// Below: shorter than the first duration; the first intensity holds, which is the smallest it can be.
	Below
	// Beyond: longer than the last duration, or no duration at all (NaN, or nothing is known): there is no intensity.
	Beyond
)

// String gives the range in words.
func (r Range) String() string {
	switch r {
	case Within:
		return "within the durations"
	case Below:
		return "shorter than the first duration"
	}
	return "longer than the last duration"
}

// Intensity is how hard it rains in one storm, against duration. At takes minutes and gives in/h or mm/h.
// Where the range is Beyond there is no intensity, and the number means nothing.
type Intensity interface {
	At(minutes float64) (intensity float64, where Range)
}

// Curve is one column of a rainfall table: intensity against duration for one storm, log–log between the
// tabulated durations. It never rises with duration. The zero Curve knows nothing: every duration is Beyond.
type Curve struct {
	durations []float64
	segments  []segment
}

// segment is the curve from one tabulated duration to the next: i = intensity·(t/duration)^exponent.
type segment struct {
	duration  float64
	intensity float64 // at the duration that it starts from
	exponent  float64 // 0 or negative; 0 in the last, which is a point
	next      float64 // intensity at the next duration, under which rounding may not fall
}

// newCurve joins the points of one storm. Durations rise and are positive, intensities are positive and do not
// rise; Check has seen to that.
func newCurve(durations, intensities []float64) Curve {
	segments := make([]segment, len(durations))
	for k := range segments {
		segments[k] = segment{duration: durations[k], intensity: intensities[k], next: intensities[k]}
		if k+1 < len(durations) {
			segments[k].next = intensities[k+1]
			segments[k].exponent = math.Log(intensities[k+1]/intensities[k]) / math.Log(durations[k+1]/durations[k])
		}
	}
	return Curve{durations: durations, segments: segments}
}

// At gives the intensity at a duration in minutes. At a tabulated duration it is the tabulated value itself.
// It costs one logarithm and one exponential at most, and allocates nothing.
func (c Curve) At(minutes float64) (intensity float64, where Range) {
	last := len(c.durations) - 1
	if last < 0 || !(minutes <= c.durations[last]) {
		return 0, Beyond
	}
	if minutes < c.durations[0] {
		return c.segments[0].intensity, Below
	}
	// The largest k with durations[k] <= minutes. One assignment in the loop, so that no branch is mispredicted.
	k := 0
	for left := last + 1; left > 1; {
		half := left / 2
		if c.durations[k+half] <= minutes {
			k += half
		}
		left -= half
	}
	s := &c.segments[k]
	if minutes == s.duration || s.exponent == 0 {
		return s.intensity, Within
	}
	intensity = s.intensity * math.Exp(s.exponent*math.Log(minutes/s.duration))
	if intensity < s.next {
		intensity = s.next
	}
	return intensity, Within
}

// Durations gives the tabulated durations in minutes, rising: the corners of the curve. It is a copy.
func (c Curve) Durations() []float64 { return slices.Clone(c.durations) }

// First gives the shortest duration, in minutes, and its intensity; not ok for the zero Curve.
func (c Curve) First() (minutes, intensity float64, ok bool) {
	if len(c.durations) == 0 {
		return 0, 0, false
	}
	return c.durations[0], c.segments[0].intensity, true
}

// Last gives the longest duration, in minutes, and its intensity; not ok for the zero Curve.
func (c Curve) Last() (minutes, intensity float64, ok bool) {
	last := len(c.durations) - 1
	if last < 0 {
		return 0, 0, false
	}
	return c.durations[last], c.segments[last].intensity, true
}

// Scaled is the curve with every intensity times a factor greater than 0: an allowance for a changing climate.
func (c Curve) Scaled(factor float64) Curve {
	intensities := make([]float64, len(c.segments))
	for k, s := range c.segments {
		intensities[k] = s.intensity * factor
	}
	return newCurve(c.durations, intensities)
}
