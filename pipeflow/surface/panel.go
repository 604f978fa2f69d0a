package surface

import "math"

// panel is a part of a curve: a stretch of the parameter u of its path, on which ds/du is a short series of Legendre
// polynomials in t, the place in the panel from -1 to 1.
type panel struct {
	from, width   float64         // of u
	start, length float64         // distance at its beginning, and along it
	series        [degree]float64 // coefficients of P0 … P5 in the distance a unit of t
}

// degree is the number of Legendre polynomials kept. The rule below integrates their products exactly (degree 10 of 11).
const degree = 6

// The seven-point Gauss–Kronrod rule on (-1, 1), exact to degree 11 (Kronrod, Nodes and Weights of Quadrature Formulas,
// 1965; the digits worked out anew from the condition of exactness, see the test).
var (
	nodes = [4]float64{
		0, 0.434243749346802558002071502844628, 0.774596669241483377035853079956480,
		0.960491268708020283423507092629080,
	}
	weights = [4]float64{
		0.450916538658474142345110087045571, 0.401397414775962222905051818618432,
		0.268488089868333440728569280666710, 0.104656226026467265193823857192073,
	}
)

// measure lays a panel over a stretch of a path: seven sections. sign is 1 where distance counts upstream, -1 downstream.
func (w *water) measure(p *path, sign, from, width float64) panel {
	m := panel{from: from, width: width}
	half := width / 2
	middle := from + half
	m.add(0, weights[0]*half*sign*w.speed(p, middle), 0)
	for i := 1; i < len(nodes); i++ {
		reach, weight := half*nodes[i], weights[i]*half*sign
		behind, ahead := weight*w.speed(p, middle-reach), weight*w.speed(p, middle+reach)
		m.add(nodes[i], ahead+behind, ahead-behind)
	}
	m.finish()
	return m
}

// speed is ds/du, the distance upstream for a unit of the parameter.
func (w *water) speed(p *path, u float64) float64 {
	depth, rate := p.at(u)
	return w.run(depth) * rate
}

// add projects the values at t and -t, given by their sum and difference, on the polynomials P0 … P5 at t.
func (m *panel) add(t, sum, difference float64) {
	t2 := t * t
	m.series[0] += sum
	m.series[1] += difference * t
	m.series[2] += sum * (3*t2 - 1) / 2
	m.series[3] += difference * t * (5*t2 - 3) / 2
	m.series[4] += sum * ((35*t2-30)*t2 + 3) / 8
	m.series[5] += difference * t * ((63*t2-70)*t2 + 15) / 8
}

// finish turns the projections into coefficients: the square of P[j] has the integral 2/(2j+1).
func (m *panel) finish() {
	for j := range m.series {
		m.series[j] *= float64(2*j+1) / 2
	}
	m.length = 2 * m.series[0]
}

// roughness is the size of the last two terms against the mean: how far the series is from having died away.
func (m *panel) roughness() float64 {
	return (math.Abs(m.series[4]) + math.Abs(m.series[5])) / math.Abs(m.series[0])
}

// smooth is the roughness that is let pass. The error of the distance is far below it: the tests measure it against a
// fine solution.
const smooth = 1e-2

// fitting is the factor to the width at which the roughness would come to smooth, by the fifth power that the first
// term dropped goes with; a tenth less for safety, and within limits.
func fitting(roughness float64) float64 {
	factor := 0.9 * math.Pow(smooth/roughness, 1./5)
	if !(factor > 0.1) {
		return 0.1
	}
	return min(factor, 4)
}

// legendre holds the numbers of Bonnet's recursion P[j+1] = up t P[j] - down P[j-1], up = (2j+1)/(j+1) and
// down = j/(j+1), and share = 1/(2j+1), with which the integral of P[j] is share (P[j+1] - P[j-1]).
var legendre = [degree]struct{ up, down, share float64 }{
	{1, 0, 1},
	{3. / 2, 1. / 2, 1. / 3},
	{5. / 3, 2. / 3, 1. / 5},
	{7. / 4, 3. / 4, 1. / 7},
	{9. / 5, 4. / 5, 1. / 9},
	{11. / 6, 5. / 6, 1. / 11},
}

// along is the distance from the beginning of the panel to t, and its derivative. -1 is a zero of the integral of every
// Legendre polynomial but the first.
func (m *panel) along(t float64) (distance, rate float64) {
	before, here := 1.0, t
	distance, rate = m.series[0]*(t+1), m.series[0]
	for j := 1; j < degree; j++ {
		l := &legendre[j]
		after := l.up*t*here - l.down*before
		distance += m.series[j] * l.share * (after - before)
		rate += m.series[j] * here
		before, here = here, after
	}
	return distance, rate
}

// speedAtEnd is ds/du at the end of the panel, where every Legendre polynomial is 1.
func (m *panel) speedAtEnd() float64 {
	sum := 0.0
	for _, c := range m.series {
		sum += c
	}
	return 2 * sum / m.width
}

// find is the place t at a distance from the beginning of the panel, by Newton's method kept between bounds that close
// in. Distance grows along a panel, so there is one. The end 1e-9 of the panel is far below the error of the series.
func (m *panel) find(distance float64) float64 {
	low, high := -1.0, 1.0
	t := 2*distance/m.length - 1
	for range 60 {
		if !(t > low) || !(t < high) {
			t = low + (high-low)/2
		}
		reached, rate := m.along(t)
		if reached < distance {
			low = t
		} else {
			high = t
		}
		step := (distance - reached) / rate
		if math.Abs(step) <= 1e-9 || high-low <= 1e-9 {
			break
		}
		t += step
	}
	return t
}
