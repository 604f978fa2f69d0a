package drawing

import (
	"math"
	"strings"
)

// Anchor is the end of a text that stands at its place.
type Anchor int8

// The anchors.
const (
	Start Anchor = iota
	Middle
	End
)

var anchors = [...]string{"start", "middle", "end"}

// Label is one line of text; At is on its baseline.
type Label struct {
	At     Point
	Text   string
	Size   float64 // of the type, mm; capitals are 0.72 of it high
	Anchor Anchor
	Turn   float64 // degrees clockwise about At
	Bold   bool
	White  bool // on black
	Halo   bool // with a white edge, where lines may pass below
}

// Heights of the ink over and under the baseline, in parts of the size: Liberation Sans 2, capitals and descenders.
const (
	above = 0.74
	below = 0.21
)

// advances are the widths of the printable ASCII characters from the space on, in thousandths of the size, regular and
// bold: read from the tables of Liberation Sans 2, whose widths are those of Arial and Helvetica.
var advances = [2][95]int16{{
	278, 278, 355, 556, 556, 889, 667, 191, 333, 333, 389, 584, 278, 333, 278, 278, 556, 556, 556, 556, 556, 556, 556, 556, 556, 556, 278, 278, 584, 584, 584, 556,
	1015, 667, 667, 722, 722, 667, 611, 778, 722, 278, 500, 667, 556, 833, 722, 778, 667, 778, 722, 667, 611, 722, 667, 944, 667, 667, 611, 278, 278, 278, 469, 556,
	333, 556, 556, 500, 556, 556, 278, 556, 556, 222, 222, 500, 222, 833, 556, 556, 556, 556, 333, 500, 278, 556, 500, 722, 500, 500, 500, 334, 260, 334, 584,
}, {
	278, 333, 474, 556, 556, 889, 722, 238, 333, 333, 389, 584, 278, 333, 278, 278, 556, 556, 556, 556, 556, 556, 556, 556, 556, 556, 333, 333, 584, 584, 584, 611,
	975, 722, 722, 722, 722, 667, 611, 778, 722, 278, 556, 722, 611, 833, 722, 778, 667, 778, 722, 667, 611, 722, 667, 944, 667, 667, 611, 333, 278, 333, 584, 556,
	333, 556, 611, 556, 611, 556, 333, 611, 611, 278, 278, 556, 278, 889, 611, 611, 611, 611, 389, 556, 333, 611, 556, 778, 556, 556, 500, 389, 280, 389, 584,
}}

// otherAdvance stands for letters beyond ASCII: as wide as the widest common ones; signs of Asian scripts fill a square.
const otherAdvance, wideAdvance = 780, 1000

// TextWidth is the width of a text in a size.
func TextWidth(text string, size float64, bold bool) float64 {
	table := &advances[0]
	if bold {
		table = &advances[1]
	}
	sum := 0
	for _, c := range text {
		switch {
		case c >= ' ' && c <= '~':
			sum += int(table[c-' '])
		case c >= 0x1100:
			sum += wideAdvance
		default:
			sum += otherAdvance
		}
	}
	return float64(sum) / 1000 * size
}

// Shorten cuts a text to a width and ends it with an ellipsis where something was cut off.
func Shorten(text string, size, width float64, bold bool) string {
	if TextWidth(text, size, bold) <= width {
		return text
	}
	letters := []rune(text)
	for n := len(letters) - 1; n > 0; n-- {
		if cut := string(letters[:n]) + "…"; TextWidth(cut, size, bold) <= width {
			return cut
		}
	}
	return "…"
}

// fit makes a text smaller, at most to the least size, and then cuts it, so that it stays within a width.
func fit(l Label, width, least float64) Label {
	if w := TextWidth(l.Text, l.Size, l.Bold); w > width {
		l.Size = max(least, l.Size*width/w)
	}
	l.Text = Shorten(l.Text, l.Size, width, l.Bold)
	return l
}

// wrap breaks a text into lines of at most a width, between words.
func wrap(text string, size, width float64) []string {
	var lines []string
	line := ""
	for _, word := range strings.Fields(text) {
		longer := word
		if line != "" {
			longer = line + " " + word
		}
		if line != "" && TextWidth(longer, size, false) > width {
			lines = append(lines, line)
			longer = word
		}
		line = longer
	}
	return append(lines, Shorten(line, size, width, false))
}

// Box is the upright box around the ink.
func (l Label) Box() Box { return l.shape(0).box() }

// shape is the ink of the label, turned as it is, with a gap around it.
func (l Label) shape(gap float64) quad {
	width := TextWidth(l.Text, l.Size, l.Bold)
	from := -width*float64(l.Anchor)/2 - gap
	to := from + width + 2*gap
	top, bottom := -above*l.Size-gap, below*l.Size+gap
	sin, cos := math.Sincos(l.Turn * math.Pi / 180)
	turned := func(x, y float64) Point { return Point{l.At.X + x*cos - y*sin, l.At.Y + x*sin + y*cos} }
	return quad{turned(from, top), turned(to, top), turned(to, bottom), turned(from, bottom)}
}
