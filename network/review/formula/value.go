package formula

import "math"

// functions are those that a formula may name.
var functions = map[string]func(args []float64) float64{
	"sin":  func(a []float64) float64 { return math.Sin(a[0]) },
	"cos":  func(a []float64) float64 { return math.Cos(a[0]) },
	"acos": func(a []float64) float64 { return math.Acos(a[0]) },
	"exp":  func(a []float64) float64 { return math.Exp(a[0]) },
	"ln":   func(a []float64) float64 { return math.Log(a[0]) },
	"min":  func(a []float64) float64 { return fold(a, math.Min) },
	"max":  func(a []float64) float64 { return fold(a, math.Max) },
}

func fold(all []float64, f func(a, b float64) float64) float64 {
	v := all[0]
	for _, w := range all[1:] {
		v = f(v, w)
	}
	return v
}

// Value is the value of a formula with the values of its symbols; NaN where one of them
// is not known.
func (f Formula) Value(of func(symbol string) float64) float64 { return f.top.value(of) }

func (n *node) value(of func(string) float64) float64 {
	var a [2]float64
	args := a[:0]
	for i := range n.args {
		args = append(args, n.args[i].value(of))
	}
	switch n.op {
	case '+':
		return args[0] + args[1]
	case '−':
		return args[0] - args[1]
	case '×':
		return args[0] * args[1]
	case '/':
		return args[0] / args[1]
	case '^':
		return math.Pow(args[0], args[1])
	case '√':
		return math.Sqrt(args[0])
	case 'n':
		return -args[0]
	case 'f':
		return functions[n.name](args)
	}
	if n.name != "" {
		return of(n.name)
	}
	return n.number
}

// Names lists the symbols of a formula in the order in which they stand, each once.
func (f Formula) Names() []string {
	var names []string
	seen := map[string]bool{}
	f.top.each(func(n *node) {
		if n.op == 0 && n.name != "" && !seen[n.name] {
			seen[n.name] = true
			names = append(names, n.name)
		}
	})
	return names
}

func (n *node) each(do func(*node)) {
	do(n)
	for i := range n.args {
		n.args[i].each(do)
	}
}

// IsSymbol tells whether a formula is one symbol alone.
func (f Formula) IsSymbol() bool { return f.top.op == 0 && f.top.name != "" }
