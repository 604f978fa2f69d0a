package job

import (
	"fmt"
	"math"
	"slices"
	"strings"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/pipeflow/catalog"
)

// sectionForms are the ways to write the section of a leg, by kind: words, each followed by its number.
var sectionForms = map[hydrology.Kind][]sectionForm{
	hydrology.Gutter: {{[]string{"cross", "spread"}, func(l *hydrology.Leg, v []float64) { l.CrossSlope, l.Spread = v[0], v[1] }}},
	hydrology.Channel: {
		{[]string{"radius"}, func(l *hydrology.Leg, v []float64) { l.HydraulicRadius = v[0] }},
		{[]string{"area", "perimeter"}, func(l *hydrology.Leg, v []float64) { l.HydraulicRadius = v[0] / v[1] }},
		{[]string{"bottom", "depth", "side"}, func(l *hydrology.Leg, v []float64) { l.HydraulicRadius = trapezoidRadius(v[0], v[1], v[2]) }},
	},
}

type sectionForm struct {
	words []string
	set   func(l *hydrology.Leg, values []float64)
}

func (f sectionForm) String() string { return strings.Join(f.words, " … ") + " …" }

// trapezoidRadius is the hydraulic radius A/P of a trapezoid: A = (b + z·y)·y, P = b + 2y·√(1 + z²).
func trapezoidRadius(bottom, depth, side float64) float64 {
	return (bottom + side*depth) * depth / (bottom + 2*depth*math.Sqrt(1+side*side))
}

// pathSection reads the section of a leg: the diameter of a pipe as pipes.csv has
// it, or words with numbers, `cross 0.02 spread 6`.
func (r *reader) pathSection(t *table, row *pathRow, l *hydrology.Leg) {
	text := strings.ToLower(strings.TrimSpace(row.Section))
	if text == "" {
		return
	}
	if l.Kind == hydrology.FullPipe {
		size, why := parseSize(text, string(catalog.Circle), t.comma, r.settings.Units)
		if why != "" {
			t.faultAt("section", "section %q: %s", text, why)
		}
		l.Diameter = size.Rise / r.settings.Units.SizeFactor
		return
	}
	forms := sectionForms[l.Kind]
	if forms == nil {
		return // the kind has no section; the cell is for the reader's eye
	}
	words, values, ok := t.wordsAndNumbers(text)
	for _, f := range forms {
		if ok && sameWords(words, f.words) {
			f.set(l, inOrder(words, values, f.words))
			return
		}
	}
	var ways []string
	for _, f := range forms {
		ways = append(ways, fmt.Sprintf("%q", f.String()))
	}
	t.faultAt("section", "section %q of a leg of kind %s is not understood: write %s, each word with a number over 0 after it", text, l.Kind, strings.Join(ways, " or "))
}

// wordsAndNumbers reads `cross 0.02 spread 6`; an equals sign between may stand.
func (t *table) wordsAndNumbers(text string) (words []string, values []float64, ok bool) {
	parts := strings.Fields(strings.ReplaceAll(text, "=", " "))
	if len(parts)%2 != 0 {
		return nil, nil, false
	}
	for i := 0; i < len(parts); i += 2 {
		v := network.Maybe{}
		v.V, v.OK = parseNumber(parts[i+1], t.comma)
		if !v.OK || v.V <= 0 && parts[i] != "side" && parts[i] != "bottom" || v.V < 0 {
			return nil, nil, false
		}
		words, values = append(words, parts[i]), append(values, v.V)
	}
	return words, values, true
}

func sameWords(a, b []string) bool {
	x, y := slices.Sorted(slices.Values(a)), slices.Sorted(slices.Values(b))
	return slices.Equal(x, y)
}

// inOrder gives the values in the order of the words wanted.
func inOrder(words []string, values []float64, wanted []string) []float64 {
	ordered := make([]float64, len(wanted))
	for i, w := range wanted {
		ordered[i] = values[slices.Index(words, w)]
	}
	return ordered
}
