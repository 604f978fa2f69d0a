package surface

import "math"

// IsSteep reports whether a flow in one barrel is controlled at the upper end: normal depth lies below critical
// depth. Where it is not, or there is no normal depth, the water below controls.
func (p Pipe) IsSteep(flow float64, d Depths) bool {
	if !(flow > 0) {
		return false
	}
	w := newWater(p, flow)
	_, steep := w.classify(d)
	return steep
}

// sameDepth is the share of the rise within which normal and critical depth count as one: the slope is critical, and the
// surface is found as on a mild one.
const sameDepth = 1e-6

// classify puts the rise in place of a critical depth that there is not, and tells whether the slope is steep: normal
// depth is below critical depth, and at critical depth the flow uses less slope than the pipe has. (Between full-bore
// capacity and the largest flow both normal depths may lie below critical depth; the pipe then acts as a mild one.)
func (w *water) classify(d Depths) (known Depths, steep bool) {
	if !d.HasCritical {
		d.Critical = w.rise
	}
	if !d.HasNormal {
		return d, false
	}
	if w.isCritical(d) {
		d.Critical = min(d.Critical, d.Normal)
		return d, false
	}
	return d, d.Normal < d.Critical && !(d.HasCritical && w.rises(d.Critical))
}

// isCritical reports whether normal and critical depth count as one.
func (w *water) isCritical(d Depths) bool {
	scale := w.rise
	if !w.closed {
		scale = d.Critical
	}
	return d.HasNormal && math.Abs(d.Normal-d.Critical) < sameDepth*scale
}
