package calculator

import (
	"fmt"

	"rimfall/pipeflow/catalog"
)

// sizeSteps: the exact size, and the listed one that is taken.
func (s *sheet) sizeSteps() {
	exact := s.Exact.Size
	per := s.Units.SizeFactor
	if s.Conduit.Shape == string(catalog.Circle) {
		result := fmt.Sprintf("%s = %s %s", s.say(Length, exact.Rise/per), figure(exact.Rise), s.Units.Size)
		if equation, numbers, ok := s.fullDiameter(); ok {
			s.put(Step{Name: "exact diameter", Symbol: "D", Formula: equation, Numbers: numbers, Result: result})
		} else {
			s.solved("exact diameter", "D", s.sizeEquation(), s.sizeNumbers(), result)
		}
	} else {
		s.solved("exact size, so shaped", "B × H", s.sizeEquation(), s.sizeNumbers(),
			fmt.Sprintf("%s × %s %s", figure(exact.Span), figure(exact.Rise), s.Units.Size))
	}
	if s.Exact.Listed {
		s.put(Step{Name: "next listed size", Result: fmt.Sprintf("%s %s (%s)", s.Conduit.SizeLabel(), s.Units.Size, s.Exact.Source)})
	}
	s.givenSize(s.Conduit.Size, s.Conduit.Haunch)
}

// fullDiameter is the closed form for a round pipe that runs full: Manning's equation
// with A = πD²/4 and R = D/4, in which 4^(5/3)/π = 3.208.
func (s *sheet) fullDiameter() (formula, numbers string, ok bool) {
	if d := s.Question.Depth; s.Velocity.OK || !d.OfRise || d.V != 1 {
		return "", "", false
	}
	return "(3.208 n Q/(k √S))^(3/8)", fmt.Sprintf("(3.208 × %s × %s/(%s × √%s))^(3/8)",
		figure(s.N), figure(s.Question.Flow.V), figure(s.Units.ManningFactor), figure(s.Slope)), true
}

// sizeEquation is what the size solves.
func (s *sheet) sizeEquation() string {
	if s.Velocity.OK {
		return "(k/n) R^(2/3) √S = V"
	}
	return manningFormula
}

// sizeNumbers is the right side of it, and at what depth.
func (s *sheet) sizeNumbers() string {
	at := ", running full"
	if d := s.Question.Depth; d.OfRise && d.V < 1 {
		at = " at y/" + s.riseSymbol() + " = " + short(d.V)
	} else if !d.OfRise {
		at = " at y = " + withUnit(short(d.V), s.Units.Length)
	}
	if s.Velocity.OK {
		return s.say(Speed, s.Velocity.V) + at
	}
	return s.flowGiven() + at
}
