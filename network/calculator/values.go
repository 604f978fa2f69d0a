package calculator

import (
	"fmt"
	"maps"
	"math"
	"slices"
	"strconv"
	"strings"

	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/network/units"
)

// Units that a value may name, in m, m³/s and m/s. The foot and the inch by the
// international agreement of 1959; the US gallon is 231 cubic inches (NIST Handbook
// 44, appendix C).
const (
	metresPerFoot = 0.3048
	metresPerInch = 0.0254
	cubicFoot     = metresPerFoot * metresPerFoot * metresPerFoot
	gallon        = 231 * metresPerInch * metresPerInch * metresPerInch
)

var (
	lengthUnits   = map[string]float64{"ft": metresPerFoot, "in": metresPerInch, "m": 1, "cm": 0.01, "mm": 0.001}
	flowUnits     = map[string]float64{"cfs": cubicFoot, "m3/s": 1, "m³/s": 1, "L/s": 0.001, "l/s": 0.001, "gpm": gallon / 60, "mgd": 1e6 * gallon / 86400}
	velocityUnits = map[string]float64{"ft/s": metresPerFoot, "fps": metresPerFoot, "m/s": 1}
)

// quantity reads a number with a unit, if another than the system's is meant.
type quantity struct {
	name  string
	like  string             // an example, for messages
	known map[string]float64 // unit → metres and seconds
	own   map[string]string  // system → its unit
}

var (
	aLength   = quantity{known: lengthUnits, own: map[string]string{"us": "ft", "si": "m"}, like: "1.5"}
	aFlow     = quantity{known: flowUnits, own: map[string]string{"us": "cfs", "si": "m3/s"}, like: "12"}
	aVelocity = quantity{known: velocityUnits, own: map[string]string{"us": "ft/s", "si": "m/s"}, like: "3"}
	aNumber   = quantity{like: "0.013"}
)

// named gives a quantity the name under which it was given.
func (q quantity) named(name string) quantity {
	q.name = name
	return q
}

// read reads a value; a blank one is "not given".
func (q quantity) read(text string, u units.System) (network.Maybe, error) {
	text = strings.TrimSpace(text)
	if text == "" {
		return network.Maybe{}, nil
	}
	digits, unit := split(text)
	v, err := strconv.ParseFloat(digits, 64)
	if err != nil || math.IsInf(v, 0) {
		return network.Maybe{}, q.noNumber(text)
	}
	own := q.own[u.Name]
	switch per, ok := q.known[unit]; {
	case unit == "" || unit == own:
		return network.Some(v), nil
	case ok:
		return network.Some(tidy(v * per / q.known[own])), nil
	case len(q.known) == 0:
		return network.Maybe{}, q.noNumber(text)
	}
	return network.Maybe{}, refuse(fmt.Sprintf("%s %q: unknown unit %q", q.name, text, unit),
		fmt.Sprintf("leave it out for %s, or write one of %s", own, list(slices.Sorted(maps.Keys(q.known)), "and")))
}

// tidy takes off the rounding of a conversion: 350 L/s are 0.35 m³/s. Fifteen digits are
// what a floating-point number holds for certain.
func tidy(v float64) float64 {
	rounded, err := strconv.ParseFloat(strconv.FormatFloat(v, 'g', 15, 64), 64)
	if err != nil {
		return v
	}
	return rounded
}

func (q quantity) noNumber(text string) error {
	return refuse(fmt.Sprintf("%s %q is no number", q.name, text), "write a plain number with a decimal point, such as "+q.like)
}

// split parts a number from its unit.
func split(text string) (digits, unit string) {
	i := 0
	for i < len(text) && strings.IndexByte("0123456789.+-", text[i]) >= 0 {
		i++
		if i < len(text)-1 && (text[i] == 'e' || text[i] == 'E') && strings.IndexByte("0123456789+-", text[i+1]) >= 0 {
			i++
		}
	}
	return text[:i], strings.TrimSpace(text[i:])
}

// readSlope reads rise over run, or percent where it says so.
func readSlope(text string, u units.System) (network.Maybe, error) {
	share, percent := strings.CutSuffix(strings.TrimSpace(text), "%")
	q := aNumber.named(Slope)
	q.like = "0.005"
	v, err := q.read(share, u)
	if err == nil && percent {
		if !v.OK {
			return v, q.noNumber(text)
		}
		v.V /= 100
	}
	return v, err
}

// readDepth reads a length, a share of the rise such as 0.8D, or the word full.
func readDepth(text string, u units.System) (Deep, error) {
	text = strings.TrimSpace(text)
	if strings.EqualFold(text, "full") {
		return Full, nil
	}
	if share, ok := strings.CutSuffix(text, "D"); ok {
		v, err := aNumber.named(Depth).read(share, u)
		if err != nil || !v.OK {
			return Deep{}, refuse(fmt.Sprintf("depth %q is no share of the rise", text), "write it as 0.8D")
		}
		return Deep{V: v.V, OK: true, OfRise: true, Written: text}, nil
	}
	v, err := aLength.named(Depth).read(text, u)
	return Deep{V: v.V, OK: v.OK, Written: text}, err
}

// readSide reads a side slope, horizontal for one vertical: 3, or 3:1.
func readSide(text string, u units.System) (network.Maybe, error) {
	bare := strings.TrimSuffix(strings.TrimSpace(text), ":1")
	if strings.Contains(bare, ":") {
		return network.Maybe{}, refuse(fmt.Sprintf("side %q", text), "write how far the side runs for 1 of height, such as 3 or 3:1")
	}
	q := aNumber.named(Side)
	q.like = "3"
	v, err := q.read(bare, u)
	if err == nil && v.V < 0 {
		return v, refuse("side "+text+" leans inward", "write 0 for an upright side, more for one that leans out")
	}
	return v, err
}

// suggest words the nearest of a list of words.
func suggest(name, word string, known []string) error {
	return refuse(fmt.Sprintf("%s %q is unknown", name, word), fault.Suggest(word, known))
}
