package catalog

import (
	"fmt"
	"slices"
	"sync"
)

// Material is a pipe material with the published range of Manning's n.
type Material struct {
	Name    string  // lower case, such as "concrete" or "corrugated-metal"
	N       float64 // the usual value, s/m^(1/3) (the same number in foot units with the factor 1.486)
	Low     float64 // least published; equal to N where the source gives one value only
	High    float64 // greatest published; equal to N where the source gives one value only
	SizesOf string  // the Material of the sizes it is made in; blank: built to order, in no list
	Series  string  // name of the round series (us) its walls come from; blank: in no list
	Source  string  // agency and table
}

// Materials lists every material in the order of the table.
func Materials() []Material { return slices.Clone(standardMaterials()) }

// MaterialByName finds a material by its exact name; ok is false for any other spelling.
func MaterialByName(name string) (m Material, ok bool) {
	all := standardMaterials()
	i := slices.IndexFunc(all, func(m Material) bool { return m.Name == name })
	if i < 0 {
		return Material{}, false
	}
	return all[i], true
}

// sizesOf is the material whose sizes a pipe takes. A pipe without material is of concrete, a pipe-arch of corrugated
// metal.
func sizesOf(material string, shape Shape) (name string, ok bool) {
	switch {
	case material == "" && shape == PipeArch:
		return "corrugated-metal", true
	case material == "":
		return "concrete", true
	}
	m, ok := MaterialByName(material)
	if !ok || m.SizesOf == "" {
		return material, !ok // a name of the user's own list stands for itself
	}
	return m.SizesOf, true
}

// standardMaterials reads materials.csv once, on first use. A fault in it is a defect of this package.
var standardMaterials = sync.OnceValue(func() []Material {
	file, err := tables.Open("materials.csv")
	if err != nil {
		panic(fmt.Sprintf("catalog: %v", err))
	}
	t, faults := readTable(file)
	names := []string{"name", "sizes_of", "n", "low", "high", "source"}
	where, wrong := t.match(names, names)
	if faults = append(faults, wrong...); len(faults) > 0 {
		panic(fmt.Sprintf("catalog: materials.csv: %v", faults[0]))
	}
	materials := make([]Material, 0, len(t.rows))
	for _, cells := range t.rows {
		at, _ := t.named(cells, where)
		n := numbers{at: at}
		m := Material{
			Name: at["name"].text, SizesOf: at["sizes_of"].text, Source: at["source"].text,
			N: n.read("n"), Low: n.read("low"), High: n.read("high"),
		}
		if len(n.faults) > 0 {
			panic(fmt.Sprintf("catalog: materials.csv: %v", n.faults[0]))
		}
		if order := standard().order[kind{US, m.SizesOf, Circle}]; len(order) > 0 {
			m.Series = order[0]
		}
		materials = append(materials, m)
	}
	return materials
})
