package surface

import "math"

// maxPanels bounds the panels of a curve. Smooth ones take two to six; one that squeezes past a depth at which it would
// almost stand still takes some more for every halving of the gap.
const maxPanels = 40

// maxTrials bounds the panels that are laid and laid again narrower.
const maxTrials = 200

// curve is a free surface from its control on: depth against distance, upstream or downstream as it was laid.
type curve struct {
	path   path
	start  float64 // depth at the control
	count  int
	reach  float64 // distance that the panels cover
	panels [maxPanels]panel
}

// lay measures the path until it covers a distance or comes to its end. A panel over which the series does not die away
// is laid again narrower. The last one is laid again over the part that is used, until that is most of it: so its error
// is a share of the distance asked for and not of a panel that may be a thousand times as long. At the bound on
// panels or trials, which a million fuzzed pipes have not met, one panel takes the rest as it is.
func (c *curve) lay(w *water, p path, sign, distance float64) {
	c.path, c.count, c.reach = p, 0, 0
	c.start, _ = p.at(0)
	at, width := 0.0, w.firstWidth(&p, sign, distance)
	for trial := 1; at < p.end && c.count < maxPanels; trial++ {
		last := c.count == maxPanels-1 || trial >= maxTrials
		if width = min(width, p.end-at); last && !math.IsInf(p.end, 1) {
			width = p.end - at
		}
		m := w.measure(&p, sign, at, width)
		narrower, reached := c.narrower(&m, distance)
		if narrower < 1 && width > narrowest && !last {
			width *= narrower
			continue
		}
		m.start = c.reach
		c.panels[c.count] = m
		c.count++
		c.reach += m.length
		if reached {
			return
		}
		at += width
		width *= max(1, fitting(m.roughness()))
		if ahead := ample * (distance - c.reach) / m.speedAtEnd(); ahead > 0 {
			width = min(width, ahead)
		}
	}
}

// firstWidth is the width of the first panel, at most 1.5: what the distance takes by the speed near the control. At
// critical depth the speed is 0 and grows evenly, elsewhere it hardly changes.
func (w *water) firstWidth(p *path, sign, distance float64) float64 {
	const near = 0.02
	widest := min(1.5, p.end)
	probe := near * widest
	if probe == 0 {
		return 0
	}
	width := distance / (sign * w.speed(p, probe))
	if p.critical {
		width = math.Sqrt(2 * probe * width)
	}
	if !(width > 0) {
		return widest
	}
	return max(probe, min(ample*width, widest))
}

// ample is the factor by which a panel is laid wider than the distance seems to take, so that it covers it in one.
const ample = 1.3

// narrower is the share of its width to which a panel is to be cut, 1 where it stands; reached tells whether it takes
// the curve over the distance asked for.
func (c *curve) narrower(m *panel, distance float64) (share float64, reached bool) {
	if rough := m.roughness(); !(rough <= smooth) {
		return min(0.7, fitting(rough)), false
	}
	if c.reach+m.length < distance {
		return 1, false
	}
	if used := (m.find(distance-c.reach) + 1) / 2; used < 0.3 {
		return max(1.2*used, 0.02), true
	}
	return 1, true
}

// narrowest is the least width of a panel, in the parameter: there the depth changes by a millionth of its range at most.
const narrowest = 1e-6

// depth is the depth at a distance from the control; beyond the reach of the curve its last depth.
func (c *curve) depth(distance float64) float64 {
	if distance <= 0 && c.path.end > 0 {
		return c.start
	}
	if distance >= c.reach {
		depth, _ := c.path.at(c.ending())
		return depth
	}
	i := c.count - 1
	for i > 0 && c.panels[i].start > distance {
		i--
	}
	m := &c.panels[i]
	depth, _ := c.path.at(m.from + m.width*(m.find(distance-m.start)+1)/2)
	return depth
}

// ending is the parameter at the end of the last panel; without bound where the surface has come to normal depth.
func (c *curve) ending() float64 {
	end := 0.0
	if c.count > 0 {
		last := &c.panels[c.count-1]
		end = last.from + last.width
	}
	if c.path.endless && end >= c.path.end {
		return math.Inf(1)
	}
	return end
}
