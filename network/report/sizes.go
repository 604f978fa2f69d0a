package report

import (
	"rimfall/network/calculator"
	"rimfall/pipeflow/catalog"
)

// SizeColumns are the columns of the catalogue of sizes.
var SizeColumns = []Figure[catalog.Size]{
	listedWords("units", nil, func(s *catalog.Size) string { return s.Units }),
	listedWords("shape", nil, func(s *catalog.Size) string { return string(s.Shape) }),
	listedWords("material", nil, func(s *catalog.Size) string { return s.Material }),
	listedWords("series", nil, func(s *catalog.Size) string { return s.Series }),
	listed("span", []string{"span"}, func(s *catalog.Size) float64 { return s.Span }),
	listed("rise", []string{"rise"}, func(s *catalog.Size) float64 { return s.Rise }),
	listed("wall", []string{"wall"}, func(s *catalog.Size) float64 { return s.Wall }),
	listed("haunch", []string{"haunch"}, func(s *catalog.Size) float64 { return s.Haunch }),
	listed("bottom_radius", []string{"bottom", "radius"}, func(s *catalog.Size) float64 { return s.BottomRadius }),
	listed("top_radius", []string{"crown", "radius"}, func(s *catalog.Size) float64 { return s.TopRadius }),
	listed("corner_radius", []string{"corner", "radius"}, func(s *catalog.Size) float64 { return s.CornerRadius }),
	{Column[catalog.Size]{"area", []string{"full", "area"}, Number, fullArea}, calculator.Area},
	listedWords("standard", []string{"standard"}, func(s *catalog.Size) string { return s.Standard }),
	listedWords("source", []string{"source"}, func(s *catalog.Size) string { return s.Source }),
}

func listedWords(key string, head []string, value func(*catalog.Size) string) Figure[catalog.Size] {
	return Figure[catalog.Size]{Column[catalog.Size]{key, head, Text, func(s *catalog.Size) Value { return T(value(s)) }}, calculator.Plain}
}

// listed is a length of the list; 0 stands for one that the shape has not, or that the
// list does not give.
func listed(key string, head []string, value func(*catalog.Size) float64) Figure[catalog.Size] {
	return Figure[catalog.Size]{Column[catalog.Size]{key, head, Number, func(s *catalog.Size) Value {
		v := value(s)
		return Value{Number: v, OK: v > 0}
	}}, calculator.PipeSize}
}

// fullArea is the area of the whole inside, by the geometry.
func fullArea(s *catalog.Size) Value {
	section, err := s.Section()
	if err != nil {
		return Value{}
	}
	return N(section.At(section.Rise()).Area)
}

// MaterialColumns are the columns of the list of materials.
var MaterialColumns = []Figure[catalog.Material]{
	{Column[catalog.Material]{"material", []string{"material"}, Text, func(m *catalog.Material) Value { return T(m.Name) }}, calculator.Plain},
	{Column[catalog.Material]{"n_low", []string{"n,", "low"}, Number, func(m *catalog.Material) Value { return N(m.Low) }}, calculator.Roughness},
	{Column[catalog.Material]{"n", []string{"n,", "usual"}, Number, func(m *catalog.Material) Value { return N(m.N) }}, calculator.Roughness},
	{Column[catalog.Material]{"n_high", []string{"n,", "high"}, Number, func(m *catalog.Material) Value { return N(m.High) }}, calculator.Roughness},
	{Column[catalog.Material]{"sizes_of", []string{"takes the", "sizes of"}, Text, func(m *catalog.Material) Value { return T(m.SizesOf) }}, calculator.Plain},
	{Column[catalog.Material]{"source", []string{"source"}, Text, func(m *catalog.Material) Value { return T(m.Source) }}, calculator.Plain},
}
