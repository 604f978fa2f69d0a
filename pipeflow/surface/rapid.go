package surface

import "math"

// rapid is the surface from the upper end down, faster than critical.
type rapid struct {
	length float64 // of the pipe
	start  float64 // depth at the upper end
	bottom float64 // distance from the lower end at which it comes to critical depth and ends; 0 where it does not
	curve  curve
}

// lay draws the surface from a depth at the upper end: to normal depth on a steep slope, else up to critical depth.
func (r *rapid) lay(w *water, d Depths, steep bool, start, length float64) {
	r.length, r.start, r.bottom = length, start, 0
	var way path
	switch below := d.HasNormal && d.Normal <= d.Critical; {
	case below && nearly(start, d.Normal):
		way = w.toNormal(d.Normal, d.Normal)
	case below && (steep || start < d.Normal || !w.rises(start)):
		way = w.toNormal(start, d.Normal)
	default:
		way = w.newPath(start, d.Critical)
	}
	way.critical = start == d.Critical && d.HasCritical
	r.curve.lay(w, way, -1, length)
	if !way.endless {
		r.bottom = max(0, length-r.curve.reach)
	}
}

// depth is the depth at a distance from the lower end.
func (r *rapid) depth(distance float64) float64 {
	if distance >= r.length {
		return r.start
	}
	return r.curve.depth(r.length - distance)
}

// jump finds where the specific forces of the two surfaces are the same, between two distances from the lower end at
// which the tranquil one has more (low) and less (high), beginning with a guess. Newton's method, kept between bounds
// that close in and halving them where it leaves them; distance to 1e-7 of the pipe.
func jump(t *tranquil, r *rapid, low, high, guess float64) float64 {
	tolerance := 1e-7 * r.length
	for range 100 {
		if !(guess > low) || !(guess < high) {
			guess = low + (high-low)/2
		}
		excess, change := t.excess(r, guess)
		if excess > 0 {
			low = guess
		} else {
			high = guess
		}
		step := -excess / change
		if math.Abs(step) <= tolerance && guess+step >= low && guess+step <= high {
			return guess + step
		}
		if high-low <= tolerance {
			break
		}
		guess += step
	}
	return low + (high-low)/2
}

// excess is the specific force of the tranquil surface over that of the rapid one at a distance from the lower end, and
// its change upstream.
func (t *tranquil) excess(r *rapid, distance float64) (excess, change float64) {
	above, lost := t.water.force(r.depth(distance))
	below, gained := t.water.force(t.depth(distance))
	return below - above, gained - lost
}
