package surface

import "math"

// tranquil is the surface from the lower end up: a stretch under the pressure line of the water below, a free
// surface, and a full stretch above where that meets the crown. Any of them may be missing.
type tranquil struct {
	water   water
	level   float64 // height of the water at the lower end over the invert there
	drowned float64 // length that runs full from the lower end
	top     float64 // distance at which the free surface ends; +Inf where it goes on to the upper end
	goal    goal    // what the free surface tends to
	free    curve
}

// goal is what a free surface tends to away from its control.
type goal int

const (
	toNormal   goal = iota // normal depth, never quite reached
	toCritical             // critical depth, where the surface ends
	toRoof                 // the crown, above which the pipe runs full; the rim of an open section, where it ends
	unbounded              // ever greater depths in an open section
)

// touching is the share of the rise within which a level counts as at the crown: above the rounding of a depth there.
const touching = 1e-9

// lay draws the surface from a level that is at critical depth or over it. On a steep slope it falls to critical depth,
// where it ends; on others it tends to normal depth or to the crown.
func (t *tranquil) lay(d Depths, steep bool, level, length float64) {
	w := &t.water
	t.level, t.drowned, t.top = level, 0, math.Inf(1)
	start := level
	if w.closed && level >= w.rise*(1-touching) {
		t.drowned = length
		if w.full < w.slope {
			// The pressure line comes down on the crown.
			t.drowned = max(0, min(length, (level-w.rise)/(w.slope-w.full)))
		}
		start = w.rise
	}
	t.free.count, t.free.reach = 0, 0
	if t.drowned == length {
		return
	}
	var way path
	way, t.goal = w.course(d, steep, start)
	way.critical = start == d.Critical
	t.free.lay(w, way, 1, length-t.drowned)
	if t.goal != toNormal && t.drowned+t.free.reach < length {
		t.top = t.drowned + t.free.reach
	}
}

// course is the way of a tranquil free surface up the pipe from a depth.
func (w *water) course(d Depths, steep bool, start float64) (path, goal) {
	switch {
	case d.HasNormal && nearly(start, d.Normal):
		return w.toNormal(d.Normal, d.Normal), toNormal
	case d.HasNormal && start < d.Normal:
		return w.toNormal(start, d.Normal), toNormal
	case !d.HasNormal || start < w.rise && w.rises(start):
		if math.IsInf(w.rise, 1) {
			return w.upward(start), unbounded
		}
		return w.newPath(start, w.rise), toRoof
	case steep:
		return w.toCritical(start, d), toCritical
	}
	return w.toNormal(start, d.Normal), toNormal
}

// depth is the height of the surface, or of the pressure line, over the invert at a distance from the lower end.
func (t *tranquil) depth(distance float64) float64 {
	w := &t.water
	switch {
	case t.drowned > 0 && distance <= t.drowned:
		return t.level + (w.full-w.slope)*distance
	case t.fills() && distance > t.top:
		return w.rise + (w.full-w.slope)*(distance-t.top)
	}
	return t.free.depth(distance - t.drowned)
}

// fills reports whether the pipe runs full above the free surface.
func (t *tranquil) fills() bool { return t.goal == toRoof && t.water.closed }

// end is the distance from the lower end at which the surface ends; +Inf where it goes on to the upper end.
func (t *tranquil) end() float64 {
	if t.fills() {
		return math.Inf(1)
	}
	return t.top
}

// fullLength is the length that runs full up to a distance from the lower end.
func (t *tranquil) fullLength(distance float64) float64 {
	full := min(t.drowned, distance)
	if t.fills() && distance > t.top {
		full += distance - t.top
	}
	return full
}
