package network

// Maybe is a number that may not have been given. Its zero value is "not given".
type Maybe struct {
	V  float64
	OK bool
}

// Some is a given number.
func Some(v float64) Maybe { return Maybe{v, true} }

// Or returns the number, or other where it was not given.
func (m Maybe) Or(other float64) float64 {
	if m.OK {
		return m.V
	}
	return other
}
