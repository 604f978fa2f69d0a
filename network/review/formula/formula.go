package formula

import (
	"fmt"
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"
)

// Formula is a formula that was read.
type Formula struct{ top node }

// node is a part of a formula. What it is says op; the zero op is a symbol or, where the
// name is blank, a number.
type node struct {
	op     rune // + − × / ^ √ and n for the sign, f for a function
	name   string
	number float64
	args   []node
}

// The operators by how strongly they bind.
const (
	sums     = 1
	products = 2
	signs    = 3
	powers   = 4
	atoms    = 5
)

func (n *node) strength() int {
	switch n.op {
	case '+', '−':
		return sums
	case '×', '/':
		return products
	case 'n':
		return signs
	case '^', '√':
		return powers
	}
	return atoms
}

// Read reads a formula. The error says where it is none.
func Read(text string) (Formula, error) {
	r := reader{left: text}
	top := r.sum()
	if r.skip(); r.wrong == "" && r.left != "" {
		r.wrong = "nothing more"
	}
	if r.wrong != "" {
		return Formula{}, fmt.Errorf("formula %q: %s is expected before %q", text, r.wrong, r.left)
	}
	return Formula{top}, nil
}

// Must reads a formula of this program; one that is none is a mistake that its tests find.
func Must(text string) Formula {
	f, err := Read(text)
	if err != nil {
		panic(err)
	}
	return f
}

// Symbol is the formula of one symbol.
func Symbol(name string) Formula { return Formula{node{name: name}} }

// Sum is the sum of symbols; of none it is 0.
func Sum(symbols []string) Formula {
	if len(symbols) == 0 {
		return Formula{}
	}
	sum := node{name: symbols[0]}
	for _, s := range symbols[1:] {
		sum = node{op: '+', args: []node{sum, {name: s}}}
	}
	return Formula{sum}
}

// Largest is the largest of symbols, of which there is at least one.
func Largest(symbols []string) Formula {
	if len(symbols) == 1 {
		return Symbol(symbols[0])
	}
	n := node{op: 'f', name: "max"}
	for _, s := range symbols {
		n.args = append(n.args, node{name: s})
	}
	return Formula{n}
}

// reader reads by descent: sum, product, sign, power, atom. What it expected where it
// could not go on is kept, the first time.
type reader struct {
	left, wrong string
}

func (r *reader) skip() { r.left = strings.TrimLeft(r.left, " ") }

// take takes one of some signs off the text.
func (r *reader) take(signs string) (rune, bool) {
	r.skip()
	c, size := utf8.DecodeRuneInString(r.left)
	if size == 0 || !strings.ContainsRune(signs, c) || r.wrong != "" {
		return 0, false
	}
	r.left = r.left[size:]
	return c, true
}

func (r *reader) expect(sign string) {
	if _, ok := r.take(sign); !ok && r.wrong == "" {
		r.wrong = sign
	}
}

func (r *reader) sum() node { return r.chain("+−", r.product) }

func (r *reader) product() node { return r.chain("×/", r.sign) }

// chain is operands with operators of one strength between, from the left.
func (r *reader) chain(operators string, operand func() node) node {
	n := operand()
	for {
		op, ok := r.take(operators)
		if !ok {
			return n
		}
		n = node{op: op, args: []node{n, operand()}}
	}
}

func (r *reader) sign() node {
	if _, ok := r.take("−"); ok {
		return node{op: 'n', args: []node{r.power()}}
	}
	return r.power()
}

func (r *reader) power() node {
	base := r.root()
	if _, ok := r.take("^"); ok {
		return node{op: '^', args: []node{base, r.root()}}
	}
	return base
}

func (r *reader) root() node {
	if _, ok := r.take("√"); ok {
		return node{op: '√', args: []node{r.root()}}
	}
	return r.atom()
}

// atom is a number, a symbol, a function of some formulas or a formula in brackets.
func (r *reader) atom() node {
	if _, ok := r.take("("); ok {
		n := r.sum()
		r.expect(")")
		return n
	}
	r.skip()
	if text := r.word(func(c rune) bool { return c == '.' || unicode.IsDigit(c) }); text != "" {
		v, err := strconv.ParseFloat(text, 64)
		if err != nil {
			r.wrong = "a number"
		}
		return node{number: v}
	}
	name := r.word(func(c rune) bool { return c == '_' || unicode.IsLetter(c) || unicode.IsDigit(c) })
	if name == "" && r.wrong == "" {
		r.wrong = "a number or a symbol"
	}
	if _, known := functions[name]; !known {
		return node{name: name}
	}
	r.expect("(")
	n := node{op: 'f', name: name, args: []node{r.sum()}}
	for {
		if _, more := r.take(","); !more {
			break
		}
		n.args = append(n.args, r.sum())
	}
	r.expect(")")
	return n
}

// word takes the letters off the text that are of a kind.
func (r *reader) word(is func(rune) bool) string {
	end := strings.IndexFunc(r.left, func(c rune) bool { return !is(c) })
	if end < 0 {
		end = len(r.left)
	}
	word := r.left[:end]
	r.left = r.left[end:]
	return word
}
