package hydrology

import (
	"fmt"
	"math"
	"strconv"
	"strings"
)

// System is the system of units that lengths, velocities and depths are in.
type System int8

const (
	// US: ft, ft/s, acre, in, in/h.
	US System = iota
	// SI: m, m/s, ha, mm, mm/h.
	SI
)

// Number is a quantity of a formula: what it is called in words, its symbol, its value and unit.
type Number struct {
	Name, Symbol string
	Value        float64
	Unit         string
}

// factor is a number of a formula to an exponent.
type factor struct {
	Number
	exponent float64
}

// product is a formula for a time or a velocity: a constant times powers. All the formulas of this package have
// this form, so that each can be shown with its symbols and with its numbers.
type product struct {
	symbol   string // t or V
	unit     string
	constant float64
	factors  []factor
}

func (p product) value() float64 {
	value := p.constant
	for _, f := range p.factors {
		value *= math.Pow(f.Value, f.exponent)
	}
	return value
}

// symbols writes the formula: t = 0.0078·L^0.77·S^-0.385.
func (p product) symbols() string {
	return p.symbol + " = " + p.write(func(f factor) string { return f.Symbol })
}

// numbers writes it with the numbers in place: 0.0078·1200^0.77·0.02^-0.385 = 8.236 min.
func (p product) numbers() string {
	return p.write(func(f factor) string { return figure(f.Value) }) + " = " + figure(p.value()) + " " + p.unit
}

func (p product) write(of func(factor) string) string {
	parts := []string{strconv.FormatFloat(p.constant, 'g', 6, 64)}
	for _, f := range p.factors {
		text := of(f)
		if f.exponent != 1 {
			text += "^" + strconv.FormatFloat(math.Round(f.exponent*1000)/1000, 'g', -1, 64)
		}
		parts = append(parts, text)
	}
	return strings.Join(parts, "·")
}

// figure prints a number to four digits.
func figure(x float64) string { return fmt.Sprintf("%.4g", x) }

// in picks the word or the constant of a system.
func in[T any](s System, us, si T) T {
	if s == SI {
		return si
	}
	return us
}
