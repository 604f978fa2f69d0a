package formula

import (
	"html"
	"strconv"
	"strings"
)

// MathML writes a formula with its symbols as the inside of a math element.
func (f Formula) MathML() string {
	return mathWriter{SymbolMathML}.row(&f.top)
}

// NumbersMathML writes a formula with numbers and units in the place of its symbols.
func (f Formula) NumbersMathML(of func(symbol string) Number) string {
	return mathWriter{func(name string) string { return NumberMathML(of(name)) }}.row(&f.top)
}

// SymbolMathML is a symbol, its index below; a word of several letters stands upright.
func SymbolMathML(name string) string {
	letter, index, has := strings.Cut(name, "_")
	if has {
		return "<msub>" + identifier(letter) + identifier(index) + "</msub>"
	}
	return identifier(letter)
}

func identifier(name string) string {
	if _, err := strconv.Atoi(name); err == nil {
		return "<mn>" + name + "</mn>"
	}
	return "<mi>" + html.EscapeString(name) + "</mi>"
}

// NumberMathML is a number with its unit.
func NumberMathML(n Number) string {
	text := "<mn>" + html.EscapeString(n.Text) + "</mn>"
	if n.Unit == "" {
		return text
	}
	return "<mrow>" + text + "<mtext> " + html.EscapeString(n.Unit) + "</mtext></mrow>"
}

// mathWriter writes a formula as MathML; symbol writes a symbol.
type mathWriter struct {
	symbol func(name string) string
}

// row writes a part of a formula as one element.
func (w mathWriter) row(n *node) string {
	switch n.op {
	case '+', '−':
		return "<mrow>" + w.side(&n.args[0], sums) + "<mo>" + string(n.op) + "</mo>" + w.side(&n.args[1], products) + "</mrow>"
	case '×':
		return "<mrow>" + w.side(&n.args[0], products) + "<mo>×</mo>" + w.side(&n.args[1], signs) + "</mrow>"
	case '/':
		return "<mfrac>" + w.row(&n.args[0]) + w.row(&n.args[1]) + "</mfrac>"
	case '^':
		return "<msup>" + w.base(&n.args[0]) + w.row(&n.args[1]) + "</msup>"
	case '√':
		return "<msqrt>" + w.row(&n.args[0]) + "</msqrt>"
	case 'n':
		return "<mrow><mo>−</mo>" + w.side(&n.args[0], powers) + "</mrow>"
	case 'f':
		return w.function(n)
	}
	if n.name == "" {
		return "<mn>" + strconv.FormatFloat(n.number, 'f', -1, 64) + "</mn>"
	}
	return w.symbol(n.name)
}

func (w mathWriter) function(n *node) string {
	args := make([]string, len(n.args))
	for i := range n.args {
		args[i] = w.row(&n.args[i])
	}
	return "<mrow><mi>" + n.name + "</mi><mo>(</mo>" + strings.Join(args, "<mo>,</mo>") + "<mo>)</mo></mrow>"
}

// side writes an operand, in brackets where it binds less than it must; a fraction binds
// by its line.
func (w mathWriter) side(n *node, least int) string {
	if n.strength() < least && n.op != '/' {
		return fenced(w.row(n))
	}
	return w.row(n)
}

// base writes what is raised to a power: anything but a lone symbol or number in brackets.
func (w mathWriter) base(n *node) string {
	text := w.row(n)
	if n.strength() < atoms || n.op == 'f' || strings.HasPrefix(text, "<mrow>") {
		return fenced(text)
	}
	return text
}

func fenced(text string) string { return "<mrow><mo>(</mo>" + text + "<mo>)</mo></mrow>" }
