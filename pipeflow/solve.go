package pipeflow

import "math"

// SlopeFor is the slope at which a flow runs uniformly at a depth, Manning's equation solved for S; the receiver's own
// slope does not enter. At the rise it is the friction slope of the pipe flowing full. Flow 0 has slope 0; there is none
// at depth 0, nor for a negative flow.
func (m Manning) SlopeFor(s Section, depth, flow float64) (slope float64, ok bool) {
	factor := sectionFactor(s.At(depth))
	if factor == 0 || !(flow >= 0) {
		return 0, false
	}
	root := flow * m.N / (m.Factor * factor)
	return root * root, true
}

// SlopeForVelocity is the slope at which uniform flow at a depth has a mean velocity. There is none at depth 0, nor for a
// negative velocity.
func (m Manning) SlopeForVelocity(s Section, depth, velocity float64) (slope float64, ok bool) {
	return m.SlopeFor(s, depth, velocity*s.At(depth).Area)
}

// RoughnessFor is the n with which a flow runs uniformly at a depth; the receiver's own n does not enter. There is none
// at depth 0, for a flow not over 0 or a slope not over 0.
func (m Manning) RoughnessFor(s Section, depth, flow float64) (n float64, ok bool) {
	factor := sectionFactor(s.At(depth))
	if factor == 0 || !(flow > 0) || !(m.Slope > 0) {
		return 0, false
	}
	return m.Factor * factor * math.Sqrt(m.Slope) / flow, true
}

// ScaleFor is by how much all lengths of a closed section must be multiplied so that it carries a flow at a depth ratio
// (depth over rise, over 0 and up to 1): a circle of diameter 1 has the diameter for an answer. Similar sections carry
// flows like the power 8/3 of their lengths.
//
// With the depth ratio 1 that is the size for full-bore capacity, D = (3.208 n Q/(k √S))^(3/8) for a circle. There is none
// for an open section, a flow or a slope not over 0, or a depth ratio outside.
func (m Manning) ScaleFor(s Section, depthRatio, flow float64) (scale float64, ok bool) {
	unit, ok := m.atRatio(s, depthRatio, flow, m.Flow)
	if !ok {
		return 0, false
	}
	return math.Pow(flow/unit, 3./8), true
}

// ScaleForVelocity is by how much all lengths of a closed section must be multiplied so that uniform flow at a depth ratio
// has a mean velocity, which grows like the power 2/3 of lengths. No answer is as for [Manning.ScaleFor].
func (m Manning) ScaleForVelocity(s Section, depthRatio, velocity float64) (scale float64, ok bool) {
	unit, ok := m.atRatio(s, depthRatio, velocity, m.Velocity)
	if !ok {
		return 0, false
	}
	return math.Pow(velocity/unit, 3./2), true
}

// atRatio is flow or velocity of the section as it is at a depth ratio, where all that is given makes sense.
func (m Manning) atRatio(s Section, ratio, given float64, of func(Section, float64) float64) (float64, bool) {
	inside := ratio > 0 && ratio <= 1 && s.Closed()
	if !inside || !(m.Slope > 0) || !(given > 0) || math.IsInf(given, 1) {
		return 0, false
	}
	return of(s, ratio*s.Rise()), true
}

// LengthFor is the value of one length of a section, such as the diameter at a given depth, the rise of a box of a given
// span or the bottom width of a channel, with which a flow runs uniformly at a depth. The caller says how the section is
// made from the length and how deep it then runs; the flow must grow with the length. The answer is between least (0 or
// more) and most (+Inf allowed).
//
// There is none where the flow at least is already over the one asked for, the flow at most is under it, a length makes no
// section, or flow or slope is not over 0.
func (m Manning) LengthFor(flow, least, most float64, of func(length float64) (s Section, depth float64, err error)) (
	length float64, ok bool,
) {
	if !(flow > 0) || math.IsInf(flow, 1) || !(m.Slope > 0) || !(least >= 0) || !(most > least) {
		return 0, false
	}
	f := func(length float64) float64 {
		s, depth, err := of(length)
		if err != nil {
			return math.NaN()
		}
		return math.Log(m.Flow(s, depth) / flow)
	}
	if least > 0 && !(f(least) <= 0) {
		return 0, false
	}
	if !math.IsInf(most, 1) && !(f(most) >= 0) {
		return 0, false
	}
	length, ok = bracketDepth(least, most, f)
	return length, ok && math.Abs(f(length)) < reached
}

// reached is how near to the flow asked for a solution must come; farther off it is a jump over the flow.
const reached = 1e-9
