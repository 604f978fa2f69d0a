package report

import (
	"cmp"
	"fmt"
	"slices"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/units"
)

// QuantityRow is one line of the quantities.
type QuantityRow struct {
	Item   string
	Status string // proposed or existing
	Amount float64
	Whole  bool // a number of pieces, not a length
	Unit   string
}

// QuantityColumns are the columns of the quantities.
var QuantityColumns = []Column[QuantityRow]{
	{"item", []string{"item"}, Text, func(r *QuantityRow) Value { return T(r.Item) }},
	{"status", []string{"status"}, Text, func(r *QuantityRow) Value { return T(r.Status) }},
	{"amount", []string{"amount"}, Number, func(r *QuantityRow) Value {
		decimals := 1
		if r.Whole {
			decimals = 0
		}
		return T(fixed(r.Amount, decimals))
	}},
	{"unit", []string{"unit"}, Text, func(r *QuantityRow) Value { return T(r.Unit) }},
}

// depthClass is the step of the classes of height in which structures are
// counted: 5 ft or 1.5 m (common practice of bid lists).
func depthClass(u units.System) float64 {
	if u.Name == units.SI.Name {
		return 1.5
	}
	return 5
}

// Quantities add up pipe lengths by size, material and status, barrels counted
// each, and structures by kind and height.
func Quantities(r *analysis.Result) []QuantityRow {
	return append(pipeQuantities(r), structureQuantities(r)...)
}

func pipeQuantities(r *analysis.Result) []QuantityRow {
	type key struct {
		existing        bool
		shape, material string
		size            network.Size
	}
	length := map[key]float64{}
	var keys []key
	for i := range r.Network.Pipes {
		p := &r.Network.Pipes[i]
		k := key{p.Existing, p.Shape, p.Material, p.Size}
		if _, seen := length[k]; !seen {
			keys = append(keys, k)
		}
		length[k] += p.Length * float64(p.Count)
	}
	slices.SortFunc(keys, func(a, b key) int {
		return cmp.Or(boolCompare(a.existing, b.existing), cmp.Compare(a.shape, b.shape), cmp.Compare(a.material, b.material),
			cmp.Compare(a.size.Rise, b.size.Rise), cmp.Compare(a.size.Span, b.size.Span))
	})
	u := r.Job.Settings.Units
	var rows []QuantityRow
	for _, k := range keys {
		item := SectionWords(&network.Pipe{Shape: k.shape, Size: k.size, Count: 1}, u.Size)
		rows = append(rows, QuantityRow{"pipe, " + item + ", " + materialWord(k.material), statusWord(k.existing), length[k], false, u.Length})
	}
	return rows
}

func structureQuantities(r *analysis.Result) []QuantityRow {
	type key struct {
		kind  network.Kind
		class int // −1: height unknown
	}
	u := r.Job.Settings.Units
	step := depthClass(u)
	count := map[key]int{}
	for i := range r.Network.Structures {
		row := Structure(r, &r.Design, network.StructureIndex(i))
		k := key{row.Structure.Kind, -1}
		if h := row.Height(); h.OK && row.Structure.Kind != network.Outfall {
			k.class = int(max(0, h.V) / step)
		}
		count[k]++
	}
	keys := make([]key, 0, len(count))
	for k := range count {
		keys = append(keys, k)
	}
	slices.SortFunc(keys, func(a, b key) int {
		return cmp.Or(cmp.Compare(a.kind, b.kind), cmp.Compare(a.class, b.class))
	})
	var rows []QuantityRow
	for _, k := range keys {
		item := k.kind.String()
		switch {
		case k.class >= 0:
			item += fmt.Sprintf(", %g to %g %s", float64(k.class)*step, float64(k.class+1)*step, u.Length)
		case k.kind != network.Outfall:
			item += ", height not known"
		}
		rows = append(rows, QuantityRow{item, "", float64(count[k]), true, "each"})
	}
	return rows
}

func boolCompare(a, b bool) int {
	switch {
	case a == b:
		return 0
	case b:
		return -1
	}
	return 1
}

func materialWord(material string) string {
	if material == "" {
		return "material not named"
	}
	return material
}

func statusWord(existing bool) string {
	if existing {
		return "existing"
	}
	return "proposed"
}
