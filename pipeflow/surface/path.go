package surface

import "math"

// path is the way of the depth along a surface as a function of a parameter u from 0 up. Its coordinate z is √(rise -
// y), in which the width of a closed section is smooth up to the crown, or the depth itself.
type path struct {
	rise   float64
	rooted bool // z = √(rise - y), else z = y

	from, to float64 // z at u = 0, and at the end
	decays   bool    // z - to falls off as exp(-u), to being normal depth; else z goes to its end evenly with u
	end      float64 // u at the end of the path
	critical bool    // it begins at critical depth, where the surface is upright
	endless  bool    // what is left at the end goes on for ever, at normal depth
}

// settled is the share of the depth within which a surface counts as having come to normal depth.
const settled = 1e-6

// nearly reports whether a depth cannot be told from normal depth.
func nearly(depth, normal float64) bool {
	return math.Abs(depth-normal) <= settled*max(depth, normal)
}

// newPath goes from a depth to another, evenly.
func (w *water) newPath(from, to float64) path {
	// Close to an empty pipe √(rise - y) would lose digits, and the crown is far.
	p := path{rise: w.rise, rooted: w.closed && max(from, to) > w.rise/2, end: 1}
	p.from, p.to = p.coordinate(from), p.coordinate(to)
	return p
}

// toNormal goes from a depth to normal depth, which it never quite reaches; it ends where the rest no longer counts.
func (w *water) toNormal(from, normal float64) path {
	p := w.newPath(from, normal)
	p.decays, p.endless = true, true
	p.end = max(0, math.Log(math.Abs(from-normal)/(settled*max(from, normal))))
	return p
}

// toCritical goes from a depth down to critical depth on a steep slope. It is laid towards normal depth, a little below,
// near which the distance grows fast, and ends on the way.
func (w *water) toCritical(from float64, d Depths) path {
	p := w.newPath(from, d.Normal)
	p.decays = true
	if from <= d.Critical {
		p.end = 0
		return p
	}
	p.end = math.Log((p.from - p.to) / (p.coordinate(d.Critical) - p.to))
	return p
}

// upward goes from a depth to greater ones without end, for an open section.
func (w *water) upward(from float64) path {
	return path{from: from, to: 2 * from, end: math.Inf(1)}
}

func (p *path) coordinate(depth float64) float64 {
	if p.rooted {
		return math.Sqrt(max(0, p.rise-depth))
	}
	return depth
}

// at gives the depth at a parameter, and its derivative.
func (p *path) at(u float64) (depth, rate float64) {
	z, dz := 0.0, p.to-p.from
	if p.decays {
		rest := math.Exp(-u)
		z, dz = p.to-dz*rest, dz*rest
	} else {
		z = p.from + dz*u
	}
	if p.rooted {
		return p.rise - z*z, -2 * z * dz
	}
	return z, dz
}
