package text

import (
	"fmt"
	"io"
	"slices"
	"strconv"

	"rimfall/network/report"
	"rimfall/network/units"
	"rimfall/pipeflow/catalog"
)

// Sizes prints a list of sizes: a table a series, with the sources numbered and named
// below.
func Sizes(w io.Writer, sizes []catalog.Size, u units.System, markdown bool) error {
	p := &printer{w: w, markdown: markdown}
	var sources []string
	for _, series := range bySeries(sizes) {
		first := &series[0]
		rows := slices.Clone(series)
		for i := range rows {
			rows[i].Source = sourceNumber(&sources, rows[i].Source)
		}
		p.table(seriesTitle(first), figureGrid(u, columnsOf(first.Shape), rows))
	}
	p.title("Sources")
	for i, s := range sources {
		p.bullet(fmt.Sprintf("%d  %s", i+1, s))
	}
	p.bullet("Full areas are those of the geometry. Blank: not in the source.")
	return p.err
}

// sourceNumber is the place of a source in the list, to which a new one is added.
func sourceNumber(sources *[]string, source string) string {
	i := slices.Index(*sources, source)
	if i < 0 {
		i = len(*sources)
		*sources = append(*sources, source)
	}
	return strconv.Itoa(i + 1)
}

// bySeries parts sizes into series: by shape, by material, and first the series that
// sizes are chosen from.
func bySeries(sizes []catalog.Size) [][]catalog.Size {
	type key struct{ shape, material, series string }
	place := map[key]int{}
	var parts [][]catalog.Size
	for _, s := range sizes {
		k := key{string(s.Shape), s.Material, s.Series}
		i, ok := place[k]
		if !ok {
			i = len(parts)
			place[k] = i
			parts = append(parts, nil)
		}
		parts[i] = append(parts[i], s)
	}
	slices.SortStableFunc(parts, func(a, b []catalog.Size) int {
		return slices.Compare(seriesOrder(&a[0]), seriesOrder(&b[0]))
	})
	return parts
}

// seriesOrder is the place of a series: shape, material, whether sizes are chosen from it.
func seriesOrder(s *catalog.Size) []int {
	order := []int{
		slices.Index(catalog.Shapes(), s.Shape),
		slices.IndexFunc(catalog.Materials(), func(m catalog.Material) bool { return m.Name == s.Material }), 1,
	}
	if chosenFrom(s) {
		order[2] = 0
	}
	return order
}

// chosenFrom reports whether sizes of the material and shape are chosen from the series.
func chosenFrom(s *catalog.Size) bool {
	first := catalog.ForMaterial(s.Units, s.Material, s.Shape)
	return len(first) > 0 && first[0].Series == s.Series
}

func seriesTitle(s *catalog.Size) string {
	title := fmt.Sprintf("%s, %s: %s", s.Shape, s.Material, s.Series)
	if chosenFrom(s) {
		title += " (sizes are chosen from these)"
	}
	return title
}

// columnsOf are the columns of a shape: a circle has one size.
func columnsOf(shape catalog.Shape) []report.Figure[catalog.Size] {
	if shape != catalog.Circle {
		return report.SizeColumns
	}
	var columns []report.Figure[catalog.Size]
	for _, f := range report.SizeColumns {
		switch f.Key {
		case "span":
			continue
		case "rise":
			f.Head = []string{"diameter"}
		}
		columns = append(columns, f)
	}
	return columns
}

// Materials prints the materials with their range of n.
func Materials(w io.Writer, materials []catalog.Material, markdown bool) error {
	p := &printer{w: w, markdown: markdown}
	p.table("Materials and their roughness", figureGrid(units.US, report.MaterialColumns, materials))
	p.title("Notes")
	p.bullet("n is the same number in feet and in metres. Low and high are the least and the greatest of the sources named.")
	p.bullet("HDM: California Department of Transportation, Highway Design Manual, table 851.2. Winchester: City of Winchester, Indiana, stormwater code, table 4. Austin: City of Austin, Drainage Criteria Manual, table 5-2.")
	return p.err
}
