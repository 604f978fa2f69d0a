package review_test

import (
	"fmt"
	"math"
	"strconv"
	"strings"
	"testing"
	"unicode"
	"unicode/utf8"
)

// evaluated works out the numbers of a printed line. It shares nothing with the program: a
// number may carry a unit, which is left out, and there are + − × / ^ √, brackets and functions.
func evaluated(t *testing.T, text string) float64 {
	t.Helper()
	e := evaluator{left: text}
	v := e.sum()
	e.blank()
	if e.left != "" || e.failed != "" {
		t.Errorf("%q cannot be worked out: %s, left %q", text, e.failed, e.left)
		return math.NaN()
	}
	return v
}

type evaluator struct{ left, failed string }

func (e *evaluator) blank() { e.left = strings.TrimLeft(e.left, " ") }

func (e *evaluator) next(sign string) bool {
	e.blank()
	rest, ok := strings.CutPrefix(e.left, sign)
	if ok {
		e.left = rest
	}
	return ok
}

func (e *evaluator) sum() float64 {
	v := e.product()
	for {
		switch {
		case e.next("+"):
			v += e.product()
		case e.next("−"):
			v -= e.product()
		default:
			return v
		}
	}
}

func (e *evaluator) product() float64 {
	v := e.signed()
	for {
		switch {
		case e.next("×"):
			v *= e.signed()
		case e.next("/"):
			v /= e.signed()
		default:
			return v
		}
	}
}

func (e *evaluator) signed() float64 {
	if e.next("−") {
		return -e.signed()
	}
	v := e.single()
	if e.next("^") {
		return math.Pow(v, e.single())
	}
	return v
}

func (e *evaluator) single() float64 {
	if e.next("√") {
		return math.Sqrt(e.single())
	}
	for name, f := range map[string]func([]float64) float64{
		"acos(": func(a []float64) float64 { return math.Acos(a[0]) },
		"cos(":  func(a []float64) float64 { return math.Cos(a[0]) },
		"sin(":  func(a []float64) float64 { return math.Sin(a[0]) },
		"exp(":  func(a []float64) float64 { return math.Exp(a[0]) },
		"ln(":   func(a []float64) float64 { return math.Log(a[0]) },
		"max(":  func(a []float64) float64 { return extreme(a, 1) },
		"min(":  func(a []float64) float64 { return -extreme(a, -1) },
		"(":     func(a []float64) float64 { return a[0] },
	} {
		if e.next(name) {
			args := []float64{e.sum()}
			for e.next(",") {
				args = append(args, e.sum())
			}
			if !e.next(")") {
				e.failed = "a bracket is open"
			}
			return f(args)
		}
	}
	return e.number()
}

func extreme(all []float64, sign float64) float64 {
	most := math.Inf(-1)
	for _, v := range all {
		most = max(most, sign*v)
	}
	return most
}

// number reads a number and passes over its unit, which stands behind a blank and begins with
// a letter or a degree sign; a degree is π/180.
func (e *evaluator) number() float64 {
	e.blank()
	end := 0
	for end < len(e.left) && strings.IndexByte("0123456789.", e.left[end]) >= 0 {
		end++
	}
	v, err := strconv.ParseFloat(e.left[:end], 64)
	if err != nil {
		e.failed = fmt.Sprintf("no number at %q", e.left)
	}
	e.left = e.left[end:]
	unit, isUnit := strings.CutPrefix(e.left, " ")
	if c, _ := utf8.DecodeRuneInString(unit); isUnit && (unicode.IsLetter(c) || c == '°') {
		e.left = strings.TrimLeftFunc(unit, func(c rune) bool {
			return unicode.IsLetter(c) || strings.ContainsRune("²³/°·", c)
		})
		if strings.Contains(unit[:len(unit)-len(e.left)], "°") {
			v *= math.Pi / 180
		}
	}
	return v
}

// The evaluator itself, by sums that are known.
func TestTheEvaluatorOfTheseTestsCalculates(t *testing.T) {
	for text, want := range map[string]float64{
		"2 + 3 × 4":                       14,
		"(2 ft)^2/8":                      0.5,
		"(400 ft)/(4 ft/s)/60":            400.0 / 4 / 60,
		"2 × acos(1 − (2 × 1 ft)/(2 ft))": math.Pi,
		"max(1 min, 3 min, 2 min) − 3":    0,
		"min(1, 0.5) × (−2 cfs·°)":        -math.Pi / 180,
		"√(9 ft²) + −1":                   2,
		"ln(1) + 8^(1/3)":                 2,
	} {
		if got := evaluated(t, text); math.Abs(got-want) > 1e-12 {
			t.Errorf("%s = %g, want %g", text, got, want)
		}
	}
}
