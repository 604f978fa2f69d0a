package drawing_test

import (
	"bytes"
	"encoding/xml"
	"io"
	"strconv"
	"strings"
	"testing"

	"rimfall/network/calculator"
	"rimfall/network/report/drawing"
	"rimfall/pipeflow"
)

// answers are questions of every kind of section, all invented.
var answers = map[string]calculator.Given{
	"a circle with two depths":      {Size: "24", N: "0.013", Slope: "0.005", Flow: "16.8"},
	"a full circle":                 {Size: "24", N: "0.013", Slope: "0.005", Depth: "full"},
	"a box near its roof":           {Shape: "box", Size: "8ft x 6ft", N: "0.013", Slope: "0.002", Flow: "400"},
	"an arch":                       {Shape: "arch", Size: "43.75x26.625", N: "0.013", Slope: "0.005", Flow: "20"},
	"a steep upright ellipse":       {Shape: "ellipse-upright", Size: "38x60", N: "0.013", Slope: "0.08", Flow: "90"},
	"a channel of unequal sides":    {Shape: "trapezoid", Bottom: "4", Side: "3", SideRight: "1", N: "0.03", Slope: "0.002", Flow: "80"},
	"a wide, shallow channel":       {Shape: "trapezoid", Bottom: "200", Side: "3", N: "0.03", Slope: "0.002", Flow: "80"},
	"a ditch":                       {Shape: "triangle", Side: "4", N: "0.03", Slope: "0.01", Flow: "5"},
	"a parabola":                    {Shape: "parabola", Size: "12x3", N: "0.03", Slope: "0.01", Flow: "25"},
	"a ground line with two lows":   {N: "0.035", Slope: "0.002", Depth: "3", Points: twoLows},
	"a channel close to critical":   {Shape: "rectangle", Bottom: "6", N: "0.013", Slope: "0.0037", Flow: "69"},
	"a thread of water in a circle": {Size: "72", N: "0.013", Slope: "0.02", Flow: "0.01"},
}

var twoLows = []pipeflow.Point{
	{Station: 0, Elevation: 20},
	{Station: 10, Elevation: 15},
	{Station: 20, Elevation: 17},
	{Station: 25, Elevation: 17.5},
	{Station: 30, Elevation: 16},
	{Station: 45, Elevation: 21},
}

func answer(t testing.TB, g calculator.Given) *calculator.Answer {
	t.Helper()
	g.Units = "us"
	s, err := calculator.Read(g)
	if err != nil {
		t.Fatal(err)
	}
	a, err := calculator.Ask(s.Questions[0])
	if err != nil {
		t.Fatal(err)
	}
	return a
}

func TestEveryCalculationStaysOnItsPage(t *testing.T) {
	for name, g := range answers {
		t.Run(name, func(t *testing.T) {
			page := drawing.Calculation(answer(t, g).Picture())
			insidePage(t, page)
			again := drawing.Calculation(answer(t, g).Picture())
			if !bytes.Equal(page.Bytes(), again.Bytes()) {
				t.Error("the same answer is drawn in two ways")
			}
		})
	}
}

// insidePage reads the document and holds every place of it against the page.
func insidePage(t *testing.T, page *drawing.Canvas) {
	t.Helper()
	decoder := xml.NewDecoder(bytes.NewReader(page.Bytes()))
	elements := 0
	for {
		token, err := decoder.Token()
		if err == io.EOF {
			break
		}
		if err != nil {
			t.Fatalf("not well formed: %v", err)
		}
		start, is := token.(xml.StartElement)
		if !is {
			continue
		}
		elements++
		for _, a := range start.Attr {
			holdPlaces(t, start.Name.Local, a, page)
		}
	}
	if elements < 60 {
		t.Errorf("%d elements: the page is nearly empty", elements)
	}
}

func holdPlaces(t *testing.T, element string, a xml.Attr, page *drawing.Canvas) {
	t.Helper()
	limit := map[string]float64{"x": page.Width, "x1": page.Width, "x2": page.Width, "y": page.Height, "y1": page.Height, "y2": page.Height}
	if most, is := limit[a.Name.Local]; is {
		hold(t, element+" "+a.Name.Local, a.Value, most)
	}
	if a.Name.Local != "points" {
		return
	}
	for _, pair := range strings.Fields(a.Value) {
		x, y, _ := strings.Cut(pair, ",")
		hold(t, element+" x", x, page.Width)
		hold(t, element+" y", y, page.Height)
	}
}

func hold(t *testing.T, what, text string, most float64) {
	t.Helper()
	v, err := strconv.ParseFloat(text, 64)
	if err != nil || v < 0 || v > most {
		t.Errorf("%s %q is not between 0 and %g", what, text, most)
	}
}

func TestRatingIsDrawnWithoutWater(t *testing.T) {
	s, err := calculator.Read(calculator.Given{Units: "us", Shape: "box", Size: "96x72"})
	if err != nil {
		t.Fatal(err)
	}
	r, err := calculator.Rate(s)
	if err != nil {
		t.Fatal(err)
	}
	page := drawing.Calculation(r.Picture())
	insidePage(t, page)
	if strings.Contains(string(page.Bytes()), "depth y") {
		t.Error("a rating shows a water level")
	}
}

// The levels of a picture have names that do not stand on one another.
func TestNamesOfLevelsAreKeptApart(t *testing.T) {
	for name, g := range answers {
		page := string(drawing.Calculation(answer(t, g).Picture()).Bytes())
		var last float64
		for _, line := range strings.Split(page, "\n") {
			if !strings.HasPrefix(line, "<text") || !strings.Contains(line, "depth") || !strings.Contains(line, `x="81"`) {
				continue
			}
			_, rest, _ := strings.Cut(line, ` y="`)
			text, _, _ := strings.Cut(rest, `"`)
			y, err := strconv.ParseFloat(text, 64)
			if err != nil {
				t.Fatal(err)
			}
			if last > 0 && y-last < 3.2 {
				t.Errorf("%s: two names %.2f mm apart", name, y-last)
			}
			last = y
		}
		if last == 0 {
			t.Errorf("%s: no level is named", name)
		}
	}
}
