package pipeflow

import "fmt"

// NewHaunchedBox makes a box whose four corners are filled at 45 degrees, each haunch taking the same length off wall and
// slab. A haunch of 0 is a plain box.
//
// Error: a length that is none, or haunches that meet, twice the haunch being over the span or the rise.
func NewHaunchedBox(span, rise, haunch float64) (*Outline, error) {
	if _, err := NewBox(span, rise); err != nil {
		return nil, err
	}
	if !(haunch >= 0) || !(2*haunch <= min(span, rise)) {
		return nil, fmt.Errorf("pipeflow: a haunch of %v must be between 0 and half the smaller of span %v and rise %v",
			haunch, span, rise)
	}
	flat, half := span/2-haunch, span/2
	pieces := []piece{
		{bottom: 0, top: haunch, foot: flat, lean: 1},
		{bottom: haunch, top: rise - haunch, foot: half},
		{bottom: rise - haunch, top: rise, foot: half, lean: -1},
	}
	return newOutline(2*flat, 2*flat, pieces), nil
}
