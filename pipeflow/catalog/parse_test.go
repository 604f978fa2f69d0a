package catalog

import (
	"fmt"
	"strings"
	"testing"
)

func TestAListIsReadInAnyOfItsForms(t *testing.T) {
	want := Size{Units: US, Shape: Box, Material: "concrete", Series: "own sizes", Span: 60.5, Rise: 36, Wall: 6, HasWall: true}
	cases := []struct{ name, text string }{
		{"comma separated", "shape,span,rise,wall\nbox,60.5,36,6\n"},
		{"semicolons and decimal commas", "shape;span;rise;wall\nbox;60,5;36;6\n"},
		{"tabs, a byte-order mark, CRLF, no last line end", "\ufeffshape\tspan\trise\twall\r\nbox\t60.5\t36\t6"},
		{"columns in another order, comments, a note and a column of the user's", "# ours\nwall,rise,x_bin,note,span,shape\n# boxes\n6,36,a,b,60.5,BOX\n\n,,,,,\n"},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			sizes, faults := Parse(strings.NewReader(c.text), US)
			if len(faults) > 0 || len(sizes) != 1 || sizes[0] != want {
				t.Errorf("got %+v, %v, want %+v", sizes, faults, want)
			}
		})
	}
}

func TestEveryFaultHasItsPlaceAndSaysWhatWouldDo(t *testing.T) {
	cases := []struct{ name, text, want string }{
		{"an empty text", "", "1:1: is empty"},
		{"only comments", "# nothing\n", "1:1: is empty"},
		{"a missing column", "shape,rise\ncircle,12\n", `1:1: column "span" is missing`},
		{"a misspelt column", "shape,spam\ncircle,12\n", `1:7: unknown column "spam": did you mean "span"?`},
		{"a column twice", "shape,span,span\ncircle,12,12\n", `1:12: column "span" stands twice`},
		{"a word for a number", "shape,span\ncircle,large\n", `2:8: span "large" is not a number`},
		{"not a number", "shape,span\ncircle,NaN\n", `2:8: span "NaN" is not a number`},
		{"a hexadecimal number", "shape,span\ncircle,0x1p4\n", `2:8: span "0x1p4" is not a number`},
		{"a number with underscores", "shape,span\ncircle,1_0\n", `2:8: span "1_0" is not a number`},
		{"a number too large to hold", "shape,span\ncircle,1e999\n", `2:8: span "1e999" is not a number`},
		{"a negative wall", "shape,span,wall\ncircle,12,-2\n", "2:11: wall -2 must be over zero"},
		{"a zero span", "shape,span\ncircle,0\n", "2:8: span 0 must be over zero"},
		{"the column is counted in characters", "series,shape,span\nröhren,circle,x\n", `2:15: span "x"`},
		{"an unknown shape", "shape,span\nround,12\n", `2:1: unknown shape "round"`},
		{"an unknown unit", "shape,span,units\ncircle,12,cm\n", `2:11: units "cm"`},
		{"no span", "shape,span,rise\nbox,,12\n", "2:5: span is blank"},
		{"a box without a rise", "shape,span\nbox,12\n", "2:1: rise is blank"},
		{"a circle wider than high", "shape,span,rise\ncircle,12,13\n", "2:11: rise 13 of a circle differs"},
		{"a lying ellipse that stands", "shape,span,rise\nellipse,12,19\n", "2:9: span 12 is under rise 19"},
		{"an upright ellipse that lies", "shape,span,rise\nellipse-upright,19,12\n", "2:17: span 19 is over rise 12"},
		{"an arch without radii", "shape,span,rise\narch,60,36\n", "2:1: an arch needs bottom_radius"},
		{"an arch whose radii do not close", "shape,span,rise,bottom_radius,top_radius,corner_radius\narch,60,36,84,90,9\n", "2:6: 60x36 makes no section"},
		{"a circle with radii", "shape,span,top_radius\ncircle,60,36\n", "only an arch or a pipe-arch has radii"},
		{"a circle with haunches", "shape,span,haunch\ncircle,60,6\n", "2:11: only a box has haunches"},
		{"haunches that meet", "shape,span,rise,haunch\nbox,60,36,19\n", "2:11: haunch 19 is over half"},
		{"a size twice", "shape,span\ncircle,12\ncircle,12.0\n", "3:8: size 12 of series"},
		{"more cells than headings", "shape,span\ncircle,12,3\n", "2:11: 3 cells under 2 headings"},
		{"an open quote", "shape,span\n\"circle,12\n", "is not CSV"},
		{"a text that is not UTF-8", "shape,span\ncircle,\xff\n", "1:1: is not UTF-8"},
	}
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			sizes, faults := Parse(strings.NewReader(c.text), US)
			if !strings.Contains(fmt.Sprint(faults), c.want) {
				t.Errorf("got %v, want %q", faults, c.want)
			}
			if len(sizes) > 1 {
				t.Errorf("a row at fault was kept: %v", sizes)
			}
		})
	}
}

func TestAllFaultsAreCollectedInTheOrderOfTheText(t *testing.T) {
	_, faults := Parse(strings.NewReader("shape,span,rise\nround,x,y\ncircle,12,\nbox,3\n"), US)
	var places []string
	for _, f := range faults {
		places = append(places, f.String()[:4])
	}
	if got := strings.Join(places, " "); got != "2:7: 2:9: 4:1:" {
		t.Errorf("places %s of %v", got, faults)
	}
}

func TestUnitsAreWantedWhereNoneAreGiven(t *testing.T) {
	if _, faults := Parse(strings.NewReader("shape,span\ncircle,12\n"), ""); len(faults) != 1 {
		t.Errorf("faults %v", faults)
	}
}

// Whatever the text, a size that comes out can be used: it has a unit, a known shape and dimensions over zero.
func FuzzParse(f *testing.F) {
	f.Add("shape,span,rise,wall\nbox,60.5,36,6\n")
	f.Add("\ufeffshape;span\r\ncircle;60,5\n\"")
	f.Add("shape,span,rise,bottom_radius,top_radius,corner_radius\narch,58.5,36,84,30,8.75\n")
	f.Fuzz(func(t *testing.T, text string) {
		sizes, faults := Parse(strings.NewReader(text), SI)
		for _, s := range sizes {
			if _, ok := perUnit(s.Units); !ok || !(s.Span > 0) || !(s.Rise > 0) || s.Material == "" {
				t.Errorf("%q gives %+v", text, s)
			}
		}
		for i, fault := range faults {
			if fault.Line < 1 || fault.Column < 1 || fault.Text == "" {
				t.Errorf("%q gives fault %v", text, fault)
			}
			if i > 0 && faults[i-1].Line > fault.Line {
				t.Errorf("%q gives faults out of order: %v", text, faults)
			}
		}
	})
}
