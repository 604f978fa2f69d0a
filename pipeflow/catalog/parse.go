package catalog

import (
	"cmp"
	"io"
	"slices"
	"strconv"
	"strings"
)

// Parse reads a list of sizes: a heading row with at least shape and span, and a row a size. A blank rise of a circle
// is its span; blank units are the ones given (pass "" to make the column required); a blank material is concrete,
// which a pipe without material takes too; a blank series is "own sizes". All faults of all rows are collected, in
// the order of the text; rows with a fault are left out.
func Parse(r io.Reader, units string) ([]Size, []Fault) {
	t, faults := readTable(r)
	if len(t.headings) == 0 {
		if faults == nil {
			faults = []Fault{{1, 1, "is empty: a heading row with shape and span, and a row a size, are wanted"}}
		}
		return nil, faults
	}
	where, wrong := t.match(columns, []string{"shape", "span"})
	if faults = append(faults, wrong...); len(wrong) > 0 {
		return nil, inOrder(faults)
	}
	var sizes []Size
	seen := make(map[Size]int)
	for _, cells := range t.rows {
		named, wrong := t.named(cells, where)
		size, more := readSize(named, units, t.decimal)
		wrong = append(wrong, more...)
		if len(wrong) == 0 {
			wrong = double(seen, size, named)
		}
		if faults = append(faults, wrong...); len(wrong) == 0 {
			sizes = append(sizes, size)
		}
	}
	return sizes, inOrder(faults)
}

// inOrder sorts faults by their place.
func inOrder(faults []Fault) []Fault {
	slices.SortStableFunc(faults, func(a, b Fault) int {
		return cmp.Or(a.Line-b.Line, a.Column-b.Column)
	})
	return faults
}

// double refuses a size that its series has already.
func double(seen map[Size]int, s Size, at row) []Fault {
	key := Size{Units: s.Units, Shape: s.Shape, Material: s.Material, Series: s.Series, Span: s.Span, Rise: s.Rise}
	if line, twice := seen[key]; twice {
		return []Fault{at["span"].fault("size %s of series %q stands in line %d already: give it another series or take "+
			"one out", s.Label(), s.Series, line)}
	}
	seen[key] = at["span"].line
	return nil
}

// readSize reads one row and judges it.
func readSize(at row, units string, decimal byte) (Size, []Fault) {
	n := numbers{at: at, decimal: decimal}
	s := Size{
		Units:        cmp.Or(at["units"].text, units),
		Shape:        Shape(strings.ToLower(at["shape"].text)),
		Material:     cmp.Or(strings.ToLower(at["material"].text), "concrete"),
		Series:       cmp.Or(at["series"].text, "own sizes"),
		Span:         n.read("span"),
		Rise:         n.read("rise"),
		Wall:         n.read("wall"),
		HasWall:      at["wall"].text != "",
		Haunch:       n.read("haunch"),
		BottomRadius: n.read("bottom_radius"),
		TopRadius:    n.read("top_radius"),
		CornerRadius: n.read("corner_radius"),
		Standard:     at["standard"].text,
		Source:       at["source"].text,
	}
	if s.Shape == Circle && at["rise"].text == "" {
		s.Rise = s.Span
	}
	if len(n.faults) > 0 {
		return s, n.faults
	}
	faults := judge(s, at)
	if len(faults) == 0 {
		if _, err := s.Section(); err != nil {
			faults = []Fault{at["span"].fault("%s makes no section: %v", s.Label(), err)}
		}
	}
	return s, faults
}

// numbers reads number cells and collects their faults.
type numbers struct {
	at      row
	decimal byte
	faults  []Fault
}

// read gives the number in a column, 0 where the cell is blank. A number is a plain decimal over zero.
func (n *numbers) read(name string) float64 {
	c := n.at[name]
	if c.text == "" {
		return 0
	}
	text := c.text
	if n.decimal == ',' {
		text = strings.ReplaceAll(text, ",", ".")
	}
	value, err := strconv.ParseFloat(text, 64)
	if strings.Trim(text, "0123456789.eE+-") != "" || err != nil {
		n.faults = append(n.faults, c.fault("%s %q is not a number: a plain decimal such as 36 or 2.5 is wanted", name, c.text))
		return 0
	}
	if value <= 0 {
		n.faults = append(n.faults, c.fault("%s %s must be over zero, or blank where there is none", name, c.text))
	}
	return value
}
