package catalog

import (
	"fmt"
	"testing"
)

// Areas in ft² as the standards' tables print them, from memory of ASTM C506 and C1577 and of AASHTO M36 handbooks.
// They were not used to make the rows: the rows hold span, rise, radii and haunches, and the area follows.
func TestAreasComeOutAsTheTablesPrintThem(t *testing.T) {
	cases := []struct {
		shape      Shape
		span, rise float64
		area       float64
		tolerance  float64 // share; half a digit of the print, and what the radii do not close
	}{
		{Arch, 18, 11, 1.1, 0.03},
		{Arch, 22, 13.5, 1.65, 0.03},
		{Arch, 36.25, 22.5, 4.4, 0.02},
		{Arch, 43.75, 26.625, 6.4, 0.02},
		{Arch, 51.125, 31.3125, 8.8, 0.02},
		{Arch, 58.5, 36, 11.4, 0.01},
		{Arch, 65, 40, 14.3, 0.02},
		{Arch, 73, 45, 17.7, 0.02},
		{Arch, 88, 54, 25.6, 0.02},
		{Arch, 102, 62, 34.6, 0.02},
		{Arch, 122, 77.25, 51.7, 0.01},
		{Arch, 138, 87.125, 66, 0.01},
		{Arch, 154, 96.875, 81.8, 0.01},
		{Arch, 168.75, 106.5, 99.1, 0.01},
		{PipeArch, 58.5, 48.5, 15.6, 0.01},
		{PipeArch, 65, 54, 19.3, 0.01},
		{PipeArch, 79, 62.5, 27.4, 0.01},
		{PipeArch, 101.5, 76, 42.4, 0.01},
		{PipeArch, 138.5, 98, 74.5, 0.01},
		{PipeArch, 49, 33, 8.9, 0.02},
		{PipeArch, 71, 47, 18.1, 0.02},
		{Box, 96, 48, 31.1, 0.002},
		{Box, 120, 120, 98.6, 0.001},
	}
	for _, c := range cases {
		t.Run(fmt.Sprintf("%s %gx%g", c.shape, c.span, c.rise), func(t *testing.T) {
			for _, s := range Sizes(US, c.shape) {
				if s.Span != c.span || s.Rise != c.rise || s.Shape == Box && s.Haunch == 0 {
					continue
				}
				section, err := s.Section()
				if err != nil {
					t.Fatal(err)
				}
				if area := section.At(section.Rise()).Area; !near(area, c.area, c.tolerance) {
					t.Errorf("area %.3f ft², want %g within %g %%", area, c.area, 100*c.tolerance)
				}
				return
			}
			t.Error("not listed")
		})
	}
}

// The round areas and radii of the wall table: 12 in 0.785 ft² and 0.25 ft, 60 in 19.635 and 1.25, 96 in 50.265 and 2.0.
func ExampleSize_Section() {
	for _, s := range Default(US) {
		if s.Rise != 12 && s.Rise != 60 && s.Rise != 96 {
			continue
		}
		section, err := s.Section()
		if err != nil {
			fmt.Println(err)
			return
		}
		full := section.At(section.Rise())
		fmt.Printf("%s in: wall %.2f in, %.3f ft², radius %.4g ft\n", s.Label(), s.Wall, full.Area, full.HydraulicRadius())
	}
	// Output:
	// 12 in: wall 2.00 in, 0.785 ft², radius 0.25 ft
	// 60 in: wall 6.00 in, 19.635 ft², radius 1.25 ft
	// 96 in: wall 9.00 in, 50.265 ft², radius 2 ft
}

// A pipe of a material is chosen from that material's own sizes.
func ExampleForMaterial() {
	for _, s := range ForMaterial(SI, "hdpe", Circle)[4:8] {
		fmt.Println(s.Label(), s.Standard)
	}
	fmt.Println(len(ForMaterial(SI, "brick", Circle)), "sizes of brick: it is built to order")
	// Output:
	// 300 AASHTO M294
	// 375 AASHTO M294
	// 450 AASHTO M294
	// 600 AASHTO M294
	// 0 sizes of brick: it is built to order
}

func BenchmarkWall(b *testing.B) {
	b.ReportAllocs()
	for b.Loop() {
		if _, ok := Wall(US, "concrete", Circle, 48, 48); !ok {
			b.Fatal("no wall")
		}
	}
}
