package calculator

import (
	"fmt"
	"math"
	"strconv"
	"strings"

	"rimfall/network"
	"rimfall/network/units"
	"rimfall/pipeflow"
)

// What can be asked for. The state of flow has three parts, depth, flow and
// velocity, of which any two give the third in a known section.
const (
	Flow   = "flow" // and velocity, at a depth
	Depth  = "depth"
	Slope  = "slope"
	N      = "n"
	Size   = "size"
	Bottom = "bottom"
	Side   = "side"
)

// The rules that join the roughness of several linings.
const (
	Horton = "horton" // one mean velocity in every part: Horton and Einstein
	Lotter = "lotter" // the flows of the parts add up
)

// Question is what is given. Exactly one of section, N, Slope and the state of flow
// is left open.
type Question struct {
	Units   units.System
	Conduit Conduit

	N, Slope       network.Maybe
	Depth          Deep
	Flow, Velocity network.Maybe

	VaryingN  bool   // n of a closed section grows as it runs less full (pipeflow.PartFullRatio)
	Composite string // how the roughness of a ground line is joined; blank: Horton
}

// Deep is a depth as it is given: as a length, or as a share of the rise of a closed
// section. The zero value is "not given".
type Deep struct {
	V       float64 // ft or m, or a share
	OK      bool
	OfRise  bool
	Written string // as typed, for messages
}

// Full is the depth of a closed section that runs full.
var Full = Deep{V: 1, OK: true, OfRise: true, Written: "full"}

// asked finds what is unknown. It is an error where that is not exactly one thing.
func (q *Question) asked() (string, error) {
	open := q.Conduit.missing()
	if !q.N.OK && !q.Conduit.roughEverywhere() {
		open = append(open, N)
	}
	if !q.Slope.OK {
		open = append(open, Slope)
	}
	state := q.stateGiven()
	switch {
	case len(open) == 0 && len(state) == 1:
		if q.Depth.OK {
			return Flow, nil
		}
		return Depth, nil
	case len(open) == 1 && len(state) == 2, q.sizeForFull(open, state):
		return open[0], nil
	case len(state)-len(open) > 1:
		return "", q.nothingOpen(open, state)
	}
	return "", q.tooMuchOpen(open, state)
}

// sizeForFull: for the size of a closed section the depth may stay open; it is then
// sized to run full.
func (q *Question) sizeForFull(open, state []string) bool {
	return len(open) == 1 && open[0] == Size && q.Conduit.Closed() && len(state) == 1 && !q.Depth.OK
}

// stateGiven names the parts of the state of flow that are given.
func (q *Question) stateGiven() []string {
	var names []string
	for _, part := range []struct {
		name  string
		given bool
	}{{Depth, q.Depth.OK}, {Flow, q.Flow.OK}, {"velocity", q.Velocity.OK}} {
		if part.given {
			names = append(names, part.name)
		}
	}
	return names
}

// nothingOpen refuses a question that gives too much.
func (q *Question) nothingOpen(open, state []string) error {
	if len(open) == 0 {
		return refuse("nothing is left to find: section, n, slope and "+state[0]+" give the whole state of flow",
			"leave out the one that you ask for: "+list(append(q.fixed(), state...), "or")+oneTooMany(len(state)))
	}
	return refuse(open[0]+" is unknown, but depth, flow and velocity are too much: any two of them give the third", "leave out one of the three")
}

func oneTooMany(state int) string {
	if state > 2 {
		return "; and of depth, flow and velocity one more"
	}
	return ""
}

// fixed names what is given besides the state of flow.
func (q *Question) fixed() []string {
	var names []string
	switch q.Conduit.Shape {
	case Trapezoid:
		names = []string{Bottom, Side}
	case Triangle:
		names = []string{Side}
	case Rectangle:
		names = []string{Bottom}
	case Parabola, Ground:
	default:
		names = []string{Size}
	}
	if q.N.OK {
		names = append(names, N)
	}
	return append(names, Slope)
}

// tooMuchOpen refuses a question with more than one unknown.
func (q *Question) tooMuchOpen(open, state []string) error {
	unknown := open
	if len(state) < 2 && !q.Depth.OK {
		unknown = append(unknown, Depth)
	}
	if len(state) == 0 || len(state) == 1 && q.Depth.OK {
		unknown = append(unknown, Flow)
	}
	wrong := fmt.Sprintf("%s unknowns, %s", number(len(unknown)), list(unknown, "and"))
	switch {
	case len(open) == 0 && q.Conduit.Closed():
		return refuse(wrong, "give one of depth, flow and velocity (depth full for the full-bore capacity)")
	case len(open) == 0:
		return refuse(wrong, "give one of depth, flow and velocity")
	case len(open) == 1:
		return refuse(wrong, "give two of depth, flow and velocity to find "+open[0]+", or give "+open[0])
	}
	return refuse(wrong, "give "+number(len(unknown)-1)+" of them, and the last is found")
}

// number is a count in words.
func number(n int) string {
	words := [...]string{"no", "one", "two", "three", "four", "five"}
	if n < len(words) {
		return words[n]
	}
	return strconv.Itoa(n)
}

// list joins words: a, b and c.
func list(words []string, last string) string {
	if len(words) < 2 {
		return strings.Join(words, "")
	}
	return strings.Join(words[:len(words)-1], ", ") + " " + last + " " + words[len(words)-1]
}

// judge refuses numbers that no question can have.
func (q *Question) judge() error {
	for _, g := range []struct {
		name  string
		value network.Maybe
		like  string
	}{
		{N, q.N, "0.013"}, {Flow, q.Flow, "12"}, {"velocity", q.Velocity, "3"}, {Depth, network.Maybe{V: q.Depth.V, OK: q.Depth.OK}, "1.5"},
	} {
		if g.value.OK && (!(g.value.V > 0) || math.IsInf(g.value.V, 1)) {
			return refuse(fmt.Sprintf("%s %s", g.name, short(g.value.V)), "it must be over 0, such as "+g.like)
		}
	}
	if q.Slope.OK && !(q.Slope.V > 0) {
		return q.refuseSlope()
	}
	if q.VaryingN && !q.Conduit.Closed() {
		return refuse("n that varies with depth is published for pipes, not for a "+q.Conduit.Shape, "leave out varying-n")
	}
	return nil
}

func (q *Question) refuseSlope() error {
	what := "slope 0: on a level line no flow is uniform and none has a normal depth"
	if q.Slope.V < 0 {
		what = fmt.Sprintf("adverse slope %s: water that climbs has no uniform flow and no normal depth", short(q.Slope.V))
	}
	return refuse(what, "give a slope over 0 as rise over run (0.005, or 0.5%), or leave it out and give depth and flow to find the friction slope")
}

// refuse is a question without an answer: what stands in the way, what would do.
func refuse(wrong, remedy string) error { return &pipeflow.NoAnswer{Wrong: wrong, Remedy: remedy} }

// refusePlain is an error of package pipeflow as a refusal. Where its text has a remedy
// behind a semicolon that one holds.
func refusePlain(err error, remedy string) error {
	wrong, own, found := strings.Cut(plainError(err), "; ")
	if found {
		remedy = own
	}
	return refuse(wrong, remedy)
}

// plainError is the text of an error of package pipeflow without its name.
func plainError(err error) string { return strings.TrimPrefix(err.Error(), "pipeflow: ") }
