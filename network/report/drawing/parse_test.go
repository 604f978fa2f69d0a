package drawing_test

import (
	"bytes"
	"encoding/xml"
	"errors"
	"fmt"
	"io"
	"math"
	"regexp"
	"strconv"
	"strings"

	"rimfall/network/analysis"
	"rimfall/network/report/drawing"
)

// The sheets are read back as any reader of SVG reads them, so that these tests know nothing of how they were drawn.

// reporter is what a test, a benchmark and a rapid check have in common.
type reporter interface {
	Helper()
	Errorf(format string, args ...any)
	Fatalf(format string, args ...any)
}

// element is one element of a sheet with its attributes and text.
type element struct {
	name       string
	attributes map[string]string
	text       string
}

// number is an attribute as a number; 0 where it is not there.
func (e *element) number(name string) float64 {
	v, _ := strconv.ParseFloat(e.attributes[name], 64)
	return v
}

// elements parses a sheet; one that is no well-formed XML fails the test. What defines the hatching is left out.
func elements(t reporter, page []byte) []element {
	t.Helper()
	var all []element
	decoder := xml.NewDecoder(bytes.NewReader(page))
	hidden, open := 0, 0 // elements that are left out; elements that hold text
	for {
		token, err := decoder.Token()
		if errors.Is(err, io.EOF) {
			return all
		}
		if err != nil {
			t.Fatalf("not well-formed: %v", err)
		}
		switch v := token.(type) {
		case xml.StartElement:
			if v.Name.Local == "defs" || hidden > 0 {
				hidden++
				continue
			}
			e := element{name: v.Name.Local, attributes: map[string]string{}}
			for _, a := range v.Attr {
				e.attributes[a.Name.Local] = a.Value
			}
			all, open = append(all, e), 1
		case xml.EndElement:
			hidden, open = max(0, hidden-1), 0
		case xml.CharData:
			if open > 0 {
				all[len(all)-1].text += string(v)
			}
		}
	}
}

// corner is a place on the sheet.
type corner struct{ x, y float64 }

var rotation = regexp.MustCompile(`^rotate\((\S+) (\S+) (\S+)\)$`)

// inkOf are the four corners of the ink of a text, by the widths of the type and 0.72 of its size over the baseline.
func inkOf(t reporter, e *element) [4]corner {
	t.Helper()
	size := e.number("font-size")
	width := drawing.TextWidth(e.text, size, e.attributes["font-weight"] == "bold")
	from := map[string]float64{"": 0, "start": 0, "middle": -width / 2, "end": -width}[e.attributes["text-anchor"]]
	angle := 0.0
	if transform := e.attributes["transform"]; transform != "" {
		parts := rotation.FindStringSubmatch(transform)
		if parts == nil || parts[2] != e.attributes["x"] || parts[3] != e.attributes["y"] {
			t.Fatalf("a text is turned by %q", transform)
		}
		angle, _ = strconv.ParseFloat(parts[1], 64)
	}
	sin, cos := math.Sincos(angle * math.Pi / 180)
	at := func(x, y float64) corner {
		return corner{e.number("x") + x*cos - y*sin, e.number("y") + x*sin + y*cos}
	}
	const up, down = 0.72, 0.2
	return [4]corner{at(from, -up*size), at(from+width, -up*size), at(from+width, down*size), at(from, down*size)}
}

// cornersOf are the places that an element reaches.
func cornersOf(t reporter, e *element) []corner {
	t.Helper()
	switch e.name {
	case "text":
		ink := inkOf(t, e)
		return ink[:]
	case "line":
		return []corner{{e.number("x1"), e.number("y1")}, {e.number("x2"), e.number("y2")}}
	case "rect":
		return []corner{{e.number("x"), e.number("y")}, {e.number("x") + e.number("width"), e.number("y") + e.number("height")}}
	case "ellipse":
		return []corner{
			{e.number("cx") - e.number("rx"), e.number("cy") - e.number("ry")},
			{e.number("cx") + e.number("rx"), e.number("cy") + e.number("ry")},
		}
	case "polyline", "polygon":
		return pointsOf(t, e)
	}
	return nil
}

func pointsOf(t reporter, e *element) []corner {
	t.Helper()
	var all []corner
	for _, pair := range strings.Fields(e.attributes["points"]) {
		var c corner
		if _, err := fmt.Sscanf(pair, "%g,%g", &c.x, &c.y); err != nil {
			t.Fatalf("points %q: %v", pair, err)
		}
		all = append(all, c)
	}
	return all
}

// holdSheet holds a sheet to what every sheet must be: well-formed, of its paper's size, with all of it inside the frame
// and no text over another.
func holdSheet(t reporter, s drawing.Sheet) {
	t.Helper()
	all := elements(t, s.Page.Bytes())
	root := all[0]
	if want := root.attributes["width"] + " " + root.attributes["height"]; root.name != "svg" ||
		strings.ReplaceAll(want, "mm", "") != strings.TrimPrefix(root.attributes["viewBox"], "0 0 ") {
		t.Errorf("%s: the page is %s and its view %s", s.Name, want, root.attributes["viewBox"])
	}
	const edge, room = 10, 0.02
	for i := range all[1:] {
		e := &all[i+1]
		if e.name == "rect" && e.attributes["x"] == "" {
			continue // the white ground of the whole page
		}
		for _, c := range cornersOf(t, e) {
			if !(c.x >= edge-room && c.x <= s.Page.Width-edge+room && c.y >= edge-room && c.y <= s.Page.Height-edge+room) {
				t.Errorf("%s: %s %q reaches (%.2f, %.2f), outside the frame", s.Name, e.name, e.text, c.x, c.y)
				break
			}
		}
	}
	for _, pair := range overlaps(t, all) {
		t.Errorf("%s: texts stand over one another: %s", s.Name, pair)
	}
}

// overlaps finds texts over other texts: convex shapes overlap unless a side of one of them separates them.
func overlaps(t reporter, all []element) []string {
	t.Helper()
	var inks [][4]corner
	var texts []string
	for i := range all {
		if all[i].name == "text" {
			inks, texts = append(inks, inkOf(t, &all[i])), append(texts, all[i].text)
		}
	}
	var pairs []string
	for i := range inks {
		for k := range inks[:i] {
			if !separated(inks[i], inks[k]) && !separated(inks[k], inks[i]) {
				pairs = append(pairs, fmt.Sprintf("%q and %q", texts[k], texts[i]))
			}
		}
	}
	return pairs
}

// separated tells whether all of b lies beyond a side of a, whose corners run clockwise on the sheet.
func separated(a, b [4]corner) bool {
	for i := range a {
		from, to := a[i], a[(i+1)%4]
		beyond := true
		for _, c := range b {
			side := (to.x-from.x)*(c.y-from.y) - (to.y-from.y)*(c.x-from.x)
			beyond = beyond && side <= 1e-9
		}
		if beyond {
			return true
		}
	}
	return false
}

// texts lists the texts of a sheet.
func texts(t reporter, s drawing.Sheet) []string {
	t.Helper()
	var list []string
	for _, e := range elements(t, s.Page.Bytes()) {
		if e.name == "text" {
			list = append(list, e.text)
		}
	}
	return list
}

// runJob sizes and runs a job folder.
func runJob(t reporter, dir string) *analysis.Result {
	t.Helper()
	o := analysis.Options{Size: true}
	j, err := analysis.Read(dir, o)
	if err != nil {
		t.Fatalf("%v", err)
	}
	r, err := analysis.Run(j, o)
	if err != nil {
		t.Fatalf("%v", err)
	}
	return r
}
