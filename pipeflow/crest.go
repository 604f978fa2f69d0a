package pipeflow

// crest is the largest A R^(2/3) of a closed section and its depth, kept by sections that are solved often.
type crest struct{ depth, factor float64 }

// crested is a section that knows its crest.
type crested interface{ crest() crest }

func (c Circle) crest() crest {
	return crest{crestRatio * c.diameter, crestFlow * sectionFactor(c.At(c.diameter))}
}

func (b Box) crest() crest {
	depth := b.rise * underRoof
	return crest{depth, sectionFactor(b.At(depth))}
}

func (o *Outline) crest() crest { return o.top }

func (e *Ellipse) crest() crest { return e.top }

// underRoof is the greatest depth ratio that still counts as below a roof: one part in 2^50, near the spacing of
// floating-point numbers, so that a section is measured there as it is just before it fills.
const underRoof = 1 - 1./(1<<50)

// crestOf is the largest A R^(2/3) of a closed section and its depth.
func crestOf(s Section) crest {
	if known, ok := s.(crested); ok {
		return known.crest()
	}
	return findCrest(s)
}

// findCrest looks for the crest by golden-section search over the upper half of the rise, which places it to about 1e-8,
// the top of a curve being flat, and then takes the zero of the slope there.
func findCrest(s Section) crest {
	best := searchCrest(s)
	_, slope, _ := normalFunction(s, best.factor)(s.Rise() * underRoof)
	if slope > 0 {
		return best // it still rises below a flat roof
	}
	const near = 1e-6
	rate := func(y float64) float64 {
		_, slope, _ := normalFunction(s, best.factor)(y)
		return -slope
	}
	low, high := best.depth*(1-near), min(best.depth*(1+near), s.Rise()*underRoof)
	atLow, atHigh := rate(low), rate(high)
	if !(atLow < 0 && atHigh > 0) {
		return best
	}
	depth := root(rate, low, high, atLow, atHigh, 1e-13*high)
	return crest{depth, max(best.factor, sectionFactor(s.At(depth)))}
}

// searchCrest is the golden-section search, with the depth just below the roof as a further candidate.
func searchCrest(s Section) crest {
	const golden = 0.6180339887498949 // (√5 - 1)/2
	low, high := s.Rise()/2, s.Rise()*underRoof
	left, right := high-golden*(high-low), low+golden*(high-low)
	atLeft, atRight := sectionFactor(s.At(left)), sectionFactor(s.At(right))
	for high-low > 1e-9*high {
		if atLeft > atRight {
			high, right, atRight = right, left, atLeft
			left = high - golden*(high-low)
			atLeft = sectionFactor(s.At(left))
		} else {
			low, left, atLeft = left, right, atRight
			right = low + golden*(high-low)
			atRight = sectionFactor(s.At(right))
		}
	}
	best := crest{}
	for _, y := range [...]float64{left, right, s.Rise() * underRoof} {
		if factor := sectionFactor(s.At(y)); factor > best.factor {
			best = crest{y, factor}
		}
	}
	return best
}
