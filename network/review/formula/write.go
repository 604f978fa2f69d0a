package formula

import (
	"strconv"
	"strings"
)

// Number is a number as it is printed, and its unit, "" where it has none.
type Number struct{ Text, Unit string }

// Symbols writes a formula with its symbols.
func (f Formula) Symbols() string {
	w := writer{func(name string) (string, bool) { return name, true }}
	return w.write(&f.top)
}

// Numbers writes a formula with numbers and units in the place of its symbols. A number
// stands in brackets where its sign or unit could be taken for part of the formula.
func (f Formula) Numbers(of func(symbol string) Number) string {
	w := writer{func(name string) (string, bool) {
		n := of(name)
		if n.Unit == "" {
			return n.Text, !strings.HasPrefix(n.Text, "−")
		}
		return n.Text + " " + n.Unit, false
	}}
	return w.write(&f.top)
}

// writer writes a formula on one line; symbol tells how a symbol looks, and whether it
// stands without brackets anywhere.
type writer struct {
	symbol func(name string) (text string, plain bool)
}

func (w *writer) write(n *node) string {
	switch n.op {
	case '+', '−':
		return w.side(n, 0, sums) + " " + string(n.op) + " " + w.side(n, 1, products)
	case '×':
		return w.side(n, 0, products) + " × " + w.side(n, 1, signs)
	case '/':
		return w.side(n, 0, products) + "/" + w.side(n, 1, signs)
	case '^':
		return w.tight(&n.args[0]) + "^" + w.tight(&n.args[1])
	case '√':
		return "√" + w.tight(&n.args[0])
	case 'n':
		return "−" + w.side(n, 0, powers)
	case 'f':
		args := make([]string, len(n.args))
		for i := range n.args {
			args[i] = w.write(&n.args[i])
		}
		return n.name + "(" + strings.Join(args, ", ") + ")"
	}
	if n.name == "" {
		return strconv.FormatFloat(n.number, 'f', -1, 64)
	}
	text, _ := w.symbol(n.name)
	return text
}

// side writes an operand, in brackets where it binds less than it must. A number with a
// unit before a stroke, and a negative one behind an operator, stand in brackets too.
func (w *writer) side(n *node, i, least int) string {
	arg := &n.args[i]
	text := w.write(arg)
	if arg.strength() < least || n.op == '/' && !w.plain(arg) || i == 1 && strings.HasPrefix(text, "−") {
		return "(" + text + ")"
	}
	return text
}

// tight writes an operand that stands close to its operator: a number or symbol as it is,
// anything else, and a number with a unit, in brackets.
func (w *writer) tight(n *node) string {
	text := w.write(n)
	if n.strength() < atoms || !w.plain(n) {
		return "(" + text + ")"
	}
	return text
}

// plain tells whether the last thing written of an operand needs no brackets of its own.
func (w *writer) plain(n *node) bool {
	switch {
	case n.op == '×':
		return w.plain(&n.args[1])
	case n.op != 0 || n.name == "":
		return true
	}
	_, plain := w.symbol(n.name)
	return plain
}
