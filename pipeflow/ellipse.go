package pipeflow

import (
	"fmt"
	"math"
)

// Ellipse is a true ellipse, lying where the span is over the rise, upright where it is under. Elliptical pipe as made is
// built of arcs ([NewOval]) and holds 2.5 to 4 % more.
type Ellipse struct {
	span, rise float64
	arc        []float64 // Fourier coefficients of the arc length
	full       Geometry
	top        crest
}

// flattest is the largest ratio of the two axes that is still a conduit; the arc length series grows with it.
const flattest = 10

// NewEllipse makes an ellipse of an inside span and rise.
//
// Error: a length that is none, or one axis over ten times the other.
func NewEllipse(span, rise float64) (*Ellipse, error) {
	if _, err := NewBox(span, rise); err != nil {
		return nil, err
	}
	if max(span, rise) > flattest*min(span, rise) {
		return nil, fmt.Errorf("pipeflow: an ellipse of %v x %v is flatter than %d to 1", span, rise, flattest)
	}
	e := &Ellipse{span: span, rise: rise, arc: arcSeries(span/2, rise/2)}
	e.full = Geometry{Area: math.Pi / 4 * span * rise, Perimeter: 2 * math.Pi * e.arc[0]}
	e.top = findCrest(e)
	return e, nil
}

// Rise is the upright axis.
func (e *Ellipse) Rise() float64 { return e.rise }

// Span is the lying axis.
func (e *Ellipse) Span() float64 { return e.span }

// Closed is true.
func (e *Ellipse) Closed() bool { return true }

// At measures the ellipse at a depth. It is the circle of diameter 1 stretched to span and rise, which carries the area
// and the width over; only the wetted perimeter is its own.
func (e *Ellipse) At(depth float64) Geometry {
	y := clampDepth(depth, e.rise)
	if y == e.rise {
		return e.full
	}
	unit := segment(1, y/e.rise, (e.rise-y)/e.rise)
	return Geometry{
		Area:      e.span * e.rise * unit.Area,
		Perimeter: 2 * arcLength(e.arc, unit.Perimeter, unit.TopWidth, 1-2*y/e.rise),
		TopWidth:  e.span * unit.TopWidth,
	}
}

// Moment is that of the unit circle, stretched once across and twice upward.
func (e *Ellipse) Moment(depth float64) float64 {
	y := clampDepth(depth, e.rise)
	return e.span * e.rise * e.rise * Circle{1}.Moment(y/e.rise)
}

// arcSeries expands the speed at which a point moves along the half axes a (across) and b (up) as its angle φ grows:
//
//	√(a² cos²φ + b² sin²φ) = (a+b)/2 |1 + h e^(2iφ)|    h = (a-b)/(a+b)
//
// which by the binomial series of √(1 + z), with coefficients B, is c₀/1 + Σ c_k cos 2kφ with
//
//	c₀ = (a+b)/2 Σ B_j² h^(2j)    c_k = (a+b) h^k Σ B_j B_(j+k) h^(2j)
//
// The terms fall faster than h^k; they are kept until one is below 1e-17 of the first, so the arc length is exact to the
// last digits (c₀ is Ivory's series of 1796 for the whole perimeter). Integrated: s(φ) = c₀ φ + Σ c_k/(2k) sin 2kφ, of
// which the coefficients are returned.
func arcSeries(a, b float64) []float64 {
	const negligible = 1e-17
	h := (a - b) / (a + b)
	binomial := []float64{1}
	for power := 1.0; power > negligible*(1-math.Abs(h)); power *= math.Abs(h) {
		j := float64(len(binomial))
		binomial = append(binomial, binomial[len(binomial)-1]*(1.5-j)/j)
	}
	series := []float64{0}
	for k := range binomial {
		sum, power := 0.0, (a+b)*math.Pow(h, float64(k))
		for j := 0; j+k < len(binomial); j++ {
			sum += binomial[j] * binomial[j+k] * math.Pow(h, float64(2*j))
		}
		switch {
		case k == 0:
			series[0] = power * sum / 2
		case math.Abs(power*sum) < negligible*series[0]:
			return series
		default:
			series = append(series, power*sum/float64(2*k))
		}
	}
	return series
}

// arcLength sums c₀ φ + Σ s_k sin 2kφ by Clenshaw's recurrence, given φ with its sine and cosine.
func arcLength(series []float64, angle, sine, cosine float64) float64 {
	double := 1 - 2*sine*sine // cos 2φ
	b1, b2 := 0.0, 0.0
	for k := len(series) - 1; k > 0; k-- {
		b1, b2 = series[k]+2*double*b1-b2, b1
	}
	return series[0]*angle + b1*2*sine*cosine
}
