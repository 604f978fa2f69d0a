package drawing

import (
	"bytes"
	"encoding/xml"
	"io"
	"math"
	"strconv"
)

// Point is a place on the sheet: millimetres from its upper left corner, y downwards.
type Point struct{ X, Y float64 }

// Pen draws a line: its width in millimetres and its dashes, lengths of line and gap in turn. No dashes: a full line.
type Pen struct {
	Width  float64
	Dashes []float64
	Grey   bool // a line that only guides the eye
}

// Fill is what a closed shape is filled with.
type Fill string

// The fills.
const (
	Empty   Fill = "none"
	White   Fill = "#fff"
	Black   Fill = "#000"
	Hatched Fill = "url(#hatch)" // fine lines at 45 degrees: material that is cut through
)

const grey = "#8a8a8a"

// Canvas collects the elements of one SVG page. All lengths are millimetres. Text stays text.
type Canvas struct {
	Width, Height float64
	Title         string
	body          bytes.Buffer
}

// NewCanvas is an empty white page.
func NewCanvas(width, height float64, title string) *Canvas {
	return &Canvas{Width: width, Height: height, Title: title}
}

// The families of type, the first one being free; the others have the same widths.
const family = "Liberation Sans, Arimo, Arial, Helvetica, sans-serif"

// hatch is the pattern of Hatched: lines 0.09 mm wide, 0.7 mm apart.
const hatch = `<defs><pattern id="hatch" width="0.7" height="0.7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">` +
	`<rect width="0.7" height="0.7" fill="#fff"/><line x1="0" y1="0" x2="0" y2="0.7" stroke="#000" stroke-width="0.18"/></pattern></defs>` + "\n"

// WriteTo writes the page as one SVG document of its true size on paper.
func (c *Canvas) WriteTo(w io.Writer) (int64, error) {
	var b bytes.Buffer
	b.WriteString(xml.Header)
	b.WriteString(`<svg xmlns="http://www.w3.org/2000/svg" width="` + number(c.Width) + `mm" height="` + number(c.Height) +
		`mm" viewBox="0 0 ` + number(c.Width) + " " + number(c.Height) + `" font-family="` + family + `">` + "\n<title>")
	escape(&b, c.Title)
	b.WriteString("</title>\n" + hatch)
	b.WriteString(`<rect width="` + number(c.Width) + `" height="` + number(c.Height) + `" fill="#fff"/>` + "\n")
	b.Write(c.body.Bytes())
	b.WriteString("</svg>\n")
	return b.WriteTo(w)
}

// Bytes is the whole document.
func (c *Canvas) Bytes() []byte {
	var b bytes.Buffer
	_, _ = c.WriteTo(&b) // memory takes everything
	return b.Bytes()
}

// Line draws a straight line.
func (c *Canvas) Line(a, b Point, pen Pen) {
	c.body.WriteString("<line")
	c.numbers("x1", a.X, "y1", a.Y, "x2", b.X, "y2", b.Y)
	c.end(pen, "")
}

// Polyline draws a line through points; fewer than two draw nothing.
func (c *Canvas) Polyline(points []Point, pen Pen) {
	if len(points) < 2 {
		return
	}
	c.body.WriteString("<polyline")
	c.points(points)
	c.end(pen, Empty)
}

// Polygon draws a closed shape. A pen of no width leaves it without an edge.
func (c *Canvas) Polygon(points []Point, pen Pen, fill Fill) {
	c.body.WriteString("<polygon")
	c.points(points)
	c.end(pen, fill)
}

// Rect draws an upright rectangle.
func (c *Canvas) Rect(b Box, pen Pen, fill Fill) {
	c.body.WriteString("<rect")
	c.numbers("x", b.Left, "y", b.Top, "width", b.Right-b.Left, "height", b.Bottom-b.Top)
	c.end(pen, fill)
}

// Ellipse draws an ellipse by its half axes; equal ones make a circle.
func (c *Canvas) Ellipse(centre Point, rx, ry float64, pen Pen, fill Fill) {
	c.body.WriteString("<ellipse")
	c.numbers("cx", centre.X, "cy", centre.Y, "rx", rx, "ry", ry)
	c.end(pen, fill)
}

// Text draws a label.
func (c *Canvas) Text(l Label) {
	if l.Text == "" {
		return
	}
	b := &c.body
	b.WriteString("<text")
	c.numbers("x", l.At.X, "y", l.At.Y, "font-size", l.Size)
	if l.Anchor != Start {
		b.WriteString(` text-anchor="` + anchors[l.Anchor] + `"`)
	}
	if l.Bold {
		b.WriteString(` font-weight="bold"`)
	}
	if l.Turn != 0 {
		b.WriteString(` transform="rotate(` + number(l.Turn) + " " + number(l.At.X) + " " + number(l.At.Y) + `)"`)
	}
	if l.Halo {
		b.WriteString(` paint-order="stroke" stroke="#fff" stroke-width="0.8" stroke-linejoin="round"`)
	}
	if l.White {
		b.WriteString(` fill="#fff"`)
	}
	b.WriteString(">")
	escape(b, l.Text)
	b.WriteString("</text>\n")
}

// numbers writes attributes, a name and a value in turn.
func (c *Canvas) numbers(pairs ...any) {
	for i := 0; i < len(pairs); i += 2 {
		c.body.WriteString(" " + pairs[i].(string) + `="` + number(pairs[i+1].(float64)) + `"`)
	}
}

func (c *Canvas) points(points []Point) {
	c.body.WriteString(` points="`)
	for i, p := range points {
		if i > 0 {
			c.body.WriteByte(' ')
		}
		c.body.WriteString(number(p.X) + "," + number(p.Y))
	}
	c.body.WriteByte('"')
}

// end writes pen and fill and closes the element.
func (c *Canvas) end(pen Pen, fill Fill) {
	b := &c.body
	if fill != "" {
		b.WriteString(` fill="` + string(fill) + `"`)
	}
	if pen.Width > 0 {
		stroke := "#000"
		if pen.Grey {
			stroke = grey
		}
		b.WriteString(` stroke="` + stroke + `" stroke-width="` + number(pen.Width) + `"`)
	}
	for i, d := range pen.Dashes {
		if i == 0 {
			b.WriteString(` stroke-dasharray="`)
		} else {
			b.WriteByte(' ')
		}
		b.WriteString(number(d))
	}
	if len(pen.Dashes) > 0 {
		b.WriteByte('"')
	}
	b.WriteString("/>\n")
}

// number prints millimetres to a hundredth, which is finer than any printer, in the shortest form.
func number(v float64) string {
	v = math.Round(v*100) / 100
	if v == 0 {
		return "0" // never minus zero
	}
	return strconv.FormatFloat(v, 'f', -1, 64)
}

func escape(b *bytes.Buffer, text string) {
	_ = xml.EscapeText(b, []byte(text)) // memory takes everything
}
