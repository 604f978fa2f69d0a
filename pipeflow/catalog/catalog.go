package catalog

import (
	"cmp"
	"math"
	"slices"
)

// Catalog is a list of sizes, indexed for look-up. It is read-only and safe for concurrent use. The zero value is empty.
type Catalog struct {
	sizes  []Size            // as listed: the first series of a material and shape is the one that sizes are chosen from
	groups map[group][]Size  // sorted by rise, then span, one series a slice
	order  map[kind][]string // series of a material and shape in the order of the list
}

// kind is a material's shape in one unit system; group is one of its series.
type kind struct {
	units    string
	material string
	shape    Shape
}

type group struct {
	kind
	series string
}

// New indexes a list of sizes.
func New(sizes []Size) Catalog {
	c := Catalog{
		sizes:  slices.Clone(sizes),
		groups: make(map[group][]Size),
		order:  make(map[kind][]string),
	}
	for _, s := range c.sizes {
		k := kind{s.Units, s.Material, s.Shape}
		g := group{k, s.Series}
		if _, seen := c.groups[g]; !seen {
			c.order[k] = append(c.order[k], s.Series)
		}
		c.groups[g] = append(c.groups[g], s)
	}
	for _, rows := range c.groups {
		slices.SortStableFunc(rows, byRise)
	}
	return c
}

// byRise orders by rise, then by span.
func byRise(a, b Size) int {
	return cmp.Or(cmp.Compare(a.Rise, b.Rise), cmp.Compare(a.Span, b.Span))
}

// With lays a user's rows over the catalogue: a series that has the name, shape, material and units of a listed one takes
// its place, and every series of the user's is put before the listed ones, so that sizes are chosen from it.
func (c Catalog) With(own []Size) Catalog {
	replaced := make(map[group]bool)
	for _, s := range own {
		replaced[group{kind{s.Units, s.Material, s.Shape}, s.Series}] = true
	}
	all := slices.Clone(own)
	for _, s := range c.sizes {
		if !replaced[group{kind{s.Units, s.Material, s.Shape}, s.Series}] {
			all = append(all, s)
		}
	}
	return New(all)
}

// Sizes lists every series of a shape, ascending by rise, then span; equal sizes stay in the order of the list. A blank
// shape or units lists all of them.
func (c Catalog) Sizes(units string, shape Shape) []Size {
	var found []Size
	for _, s := range c.sizes {
		if (units == "" || s.Units == units) && (shape == "" || s.Shape == shape) {
			found = append(found, s)
		}
	}
	slices.SortStableFunc(found, byRise)
	return found
}

// Default lists the round sizes from which a blank size is chosen where the pipe has no material.
func (c Catalog) Default(units string) []Size { return c.ForMaterial(units, "", Circle) }

// ForMaterial lists the sizes of a shape from which a pipe of a material is chosen, ascending by rise, then span: its
// first series, which is the user's own where there is one. A blank material is concrete, of a pipe-arch corrugated
// metal. The list is empty where the material is made to order or not in that shape.
func (c Catalog) ForMaterial(units, material string, shape Shape) []Size {
	name, ok := sizesOf(material, shape)
	if !ok {
		return nil
	}
	k := kind{units, name, shape}
	order := c.order[k]
	if len(order) == 0 {
		return nil
	}
	return slices.Clone(c.groups[group{k, order[0]}])
}

// Find looks up a size of a material by span and rise in inches or millimetres, to a millionth of them (room for a
// conversion there and back). The material's first series is asked first, then its others. An arch, whose radii are in
// no other place, is then looked for in every material.
func (c Catalog) Find(units, material string, shape Shape, span, rise float64) (Size, bool) {
	if name, ok := sizesOf(material, shape); ok {
		k := kind{units, name, shape}
		for _, series := range c.order[k] {
			if s, ok := find(c.groups[group{k, series}], span, rise); ok {
				return s, true
			}
		}
	}
	if shape != Arch && shape != PipeArch {
		return Size{}, false
	}
	return find(c.Sizes(units, shape), span, rise)
}

// find looks up a span and rise in rows sorted by rise, then span.
func find(rows []Size, span, rise float64) (Size, bool) {
	first, _ := slices.BinarySearchFunc(rows, rise*(1-same), func(s Size, rise float64) int {
		return cmp.Compare(s.Rise, rise)
	})
	for _, s := range rows[first:] {
		if s.Rise > rise*(1+same) {
			break
		}
		if math.Abs(s.Span-span) <= same*span {
			return s, true
		}
	}
	return Size{}, false
}

// same is the relative difference within which two dimensions are one: far above rounding, far below any step of sizes.
const same = 1e-6

// Wall is the thickness above the crown of that size, inches or millimetres. There is no answer where the size is not
// listed for the material or has no wall.
func (c Catalog) Wall(units, material string, shape Shape, span, rise float64) (thickness float64, ok bool) {
	s, ok := c.Find(units, material, shape, span, rise)
	if !ok || !s.HasWall {
		return 0, false
	}
	return s.Wall, true
}

// Nearest is the listed size of a material's first series whose span and rise are least off by their ratios: what to
// offer for a size that is not listed. There is none where the material is not made in that shape.
func (c Catalog) Nearest(units, material string, shape Shape, span, rise float64) (Size, bool) {
	rows := c.ForMaterial(units, material, shape)
	if len(rows) == 0 || !(span > 0) || !(rise > 0) {
		return Size{}, false
	}
	off := func(s Size) float64 {
		return math.Abs(math.Log(s.Span/span)) + math.Abs(math.Log(s.Rise/rise))
	}
	return slices.MinFunc(rows, func(a, b Size) int { return cmp.Compare(off(a), off(b)) }), true
}
