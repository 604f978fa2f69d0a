package catalog

import (
	"embed"
	"fmt"
	"sync"
)

//go:embed *.csv
var tables embed.FS

// sizeTables are the embedded lists, in the order in which their series come to be chosen.
var sizeTables = []string{"concrete_circle.csv", "concrete_shapes.csv", "metal.csv", "plastic_clay.csv"}

// Standard is the catalogue of the standards.
func Standard() Catalog { return standard() }

// standard reads the embedded lists once, on first use. A fault in them is a defect of this package.
var standard = sync.OnceValue(func() Catalog {
	var all []Size
	for _, name := range sizeTables {
		file, err := tables.Open(name)
		if err != nil {
			panic(fmt.Sprintf("catalog: %v", err))
		}
		sizes, faults := Parse(file, "")
		if len(faults) > 0 {
			panic(fmt.Sprintf("catalog: %s: %v", name, faults[0]))
		}
		all = append(all, sizes...)
	}
	return New(all)
})

// Sizes is [Catalog.Sizes] of the standard catalogue.
func Sizes(units string, shape Shape) []Size { return Standard().Sizes(units, shape) }

// Default is [Catalog.Default] of the standard catalogue: reinforced concrete, wall B.
func Default(units string) []Size { return Standard().Default(units) }

// ForMaterial is [Catalog.ForMaterial] of the standard catalogue.
func ForMaterial(units, material string, shape Shape) []Size {
	return Standard().ForMaterial(units, material, shape)
}

// Find is [Catalog.Find] of the standard catalogue.
func Find(units, material string, shape Shape, span, rise float64) (Size, bool) {
	return Standard().Find(units, material, shape, span, rise)
}

// Wall is [Catalog.Wall] of the standard catalogue.
func Wall(units, material string, shape Shape, span, rise float64) (thickness float64, ok bool) {
	return Standard().Wall(units, material, shape, span, rise)
}

// Nearest is [Catalog.Nearest] of the standard catalogue.
func Nearest(units, material string, shape Shape, span, rise float64) (Size, bool) {
	return Standard().Nearest(units, material, shape, span, rise)
}
