package main

import (
	"bufio"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/fault"
	"rimfall/network/report/data"
	"rimfall/network/report/text"
	"rimfall/network/units"
	"rimfall/pipeflow/catalog"
)

// sizesFlags are the flags of the catalogue.
type sizesFlags struct {
	shape, units, material, format string
	materials                      bool
}

// sizesCommand prints the catalogue of sizes and materials.
func (a *app) sizesCommand() *cobra.Command {
	var s sizesFlags
	cmd := &cobra.Command{
		Use:   "sizes",
		Short: "Print the listed sizes, or the materials with their roughness",
		Long: `sizes prints the catalogue from which sizes are chosen and walls are taken: every size with
its standard and where the figures come from. Figures from memory say so. The first series of a
material is the one that sizes are chosen from. A file catalog.csv in a job replaces or extends it.`,
		Example: "  rimfall sizes\n  rimfall sizes --shape arch --units si\n  rimfall sizes --material hdpe --format csv\n  rimfall sizes --materials",
		Args:    cobra.NoArgs,
		RunE:    func(_ *cobra.Command, _ []string) error { return a.sizes(&s) },
	}
	f := cmd.Flags()
	f.StringVar(&s.shape, "shape", "", "one shape only: "+strings.Join(shapeWords(), ", "))
	f.StringVar(&s.material, "material", "", "the sizes that one material takes")
	f.StringVar(&s.units, "units", units.US.Name, "system of units: us, si")
	f.BoolVar(&s.materials, "materials", false, "print the materials and their n instead")
	f.StringVar(&s.format, "format", "table", "how to print: "+strings.Join(formats, ", "))
	complete(cmd, "shape", shapeWords())
	complete(cmd, "material", materialWords())
	complete(cmd, "units", []string{units.US.Name, units.SI.Name})
	complete(cmd, "format", formats)
	return cmd
}

func shapeWords() []string {
	var words []string
	for _, s := range catalog.Shapes() {
		words = append(words, string(s))
	}
	return words
}

func materialWords() []string {
	var words []string
	for _, m := range catalog.Materials() {
		words = append(words, m.Name)
	}
	return words
}

// sizes judges the flags and prints.
func (a *app) sizes(s *sizesFlags) error {
	for _, f := range []struct {
		name, word string
		known      []string
	}{
		{"format", s.format, formats},
		{"units", s.units, []string{units.US.Name, units.SI.Name}},
		{"shape", s.shape, shapeWords()},
		{"material", s.material, materialWords()},
	} {
		if f.word != "" && !slices.Contains(f.known, f.word) {
			return usageError{fmt.Sprintf("--%s %s is unknown; %s", f.name, f.word, fault.Suggest(f.word, f.known))}
		}
	}
	if s.materials {
		return a.printMaterials(s)
	}
	listed := s.listed()
	if len(listed) == 0 {
		return usageError{s.nothingListed()}
	}
	return a.write(func(w *bufio.Writer) error {
		switch s.format {
		case "json":
			return data.SizesJSON(w, listed)
		case "csv":
			return data.SizesCSV(w, listed)
		}
		u, _ := units.ByName(s.units)
		return text.Sizes(w, listed, u, s.format == "markdown")
	})
}

// listed are the sizes of the shape that the material takes.
func (s *sizesFlags) listed() []catalog.Size {
	all := catalog.Sizes(s.units, catalog.Shape(s.shape))
	if s.material == "" {
		return all
	}
	m, _ := catalog.MaterialByName(s.material)
	return slices.DeleteFunc(all, func(size catalog.Size) bool { return size.Material != m.SizesOf })
}

// nothingListed says why there are no sizes, and where some are.
func (s *sizesFlags) nothingListed() string {
	m, _ := catalog.MaterialByName(s.material)
	if m.SizesOf == "" {
		return fmt.Sprintf("%s is built to order and in no list; write the size of such a pipe, or list sizes in catalog.csv", s.material)
	}
	return fmt.Sprintf("no %s of %s is listed; leave out --shape to see what is", s.shape, s.material)
}

func (a *app) printMaterials(s *sizesFlags) error {
	if s.shape != "" {
		return usageError{"--materials lists materials, which have no shape; leave out --shape"}
	}
	all := catalog.Materials()
	if s.material != "" {
		all = slices.DeleteFunc(all, func(m catalog.Material) bool { return m.Name != s.material })
	}
	return a.write(func(w *bufio.Writer) error {
		switch s.format {
		case "json":
			return data.MaterialsJSON(w, all)
		case "csv":
			return data.MaterialsCSV(w, all)
		}
		return text.Materials(w, all, s.format == "markdown")
	})
}
