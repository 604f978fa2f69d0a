package calculator_test

import (
	"strings"
	"testing"

	"rimfall/network/calculator"
	"rimfall/pipeflow"
)

// creek is an invented ground line: a channel with two rough benches, ft.
var creek = []pipeflow.Point{
	{Station: 0, Elevation: 105, N: 0.06},
	{Station: 20, Elevation: 102, N: 0.06},
	{Station: 24, Elevation: 101, N: 0.035},
	{Station: 30, Elevation: 98, N: 0.035},
	{Station: 36, Elevation: 98, N: 0.035},
	{Station: 42, Elevation: 101, N: 0.06},
	{Station: 60, Elevation: 102.2, N: 0.06},
	{Station: 80, Elevation: 106},
}

func TestQuestionsWithoutAnswerSayWhatIsWrongAndWhatWouldDo(t *testing.T) {
	pipe := calculator.Given{Size: "24", N: "0.013", Slope: "0.005"}
	with := func(change func(g *calculator.Given)) calculator.Given {
		g := pipe
		change(&g)
		return g
	}
	for _, c := range []struct {
		name          string
		g             calculator.Given
		wrong, remedy string
	}{
		{"a depth over the rise", with(func(g *calculator.Given) { g.Depth = "2.5" }), "depth 2.5 ft is over the rise of 24 in = 2 ft", "0.8D or full"},
		{"a share of the rise over one", with(func(g *calculator.Given) { g.Depth = "1.2D" }), "depth 1.2D is over the rise", "at most that"},
		{"a flow over the largest discharge", with(func(g *calculator.Given) { g.Flow = "20" }), "over the largest discharge of the section, 17.21 cfs at depth 1.876 ft", "a slope of 0.007816, and at this slope the listed size 27 in"},
		{"a velocity over the largest", with(func(g *calculator.Given) { g.Velocity = "7" }), "velocity 7 ft/s is over the largest, 5.805 ft/s at depth 1.626 ft", "a slope of 0.007271"},
		{"a level pipe", with(func(g *calculator.Given) { g.Slope, g.Flow = "0", "5" }), "slope 0", "give a slope over 0"},
		{"an adverse pipe", with(func(g *calculator.Given) { g.Slope, g.Flow = "-0.01", "5" }), "adverse slope -0.01", "give a slope over 0"},
		{"nothing of the flow", pipe, "two unknowns, depth and flow", "give one of depth, flow and velocity"},
		{"n and slope unknown", calculator.Given{Size: "24", Flow: "3"}, "three unknowns, n, slope and depth", "give two of them"},
		{"slope unknown and one part of the flow", calculator.Given{Size: "24", N: "0.013", Flow: "3"}, "two unknowns, slope and depth", "two of depth, flow and velocity"},
		{"nothing given", calculator.Given{}, "five unknowns", "give four of them"},
		{"nothing unknown", with(func(g *calculator.Given) { g.Depth, g.Flow = "1", "5" }), "nothing is left to find", "leave out"},
		{"slope unknown but too much of the flow", calculator.Given{Size: "24", N: "0.013", Depth: "1", Flow: "3", Velocity: "2"}, "any two of them give the third", "leave out one"},
		{"flow and velocity that need more than the section", calculator.Given{Size: "24", N: "0.013", Flow: "12", Velocity: "1"}, "an area of 12 ft², and the whole section has 3.142 ft²", "larger section"},
		{"a size from flow and velocity", calculator.Given{N: "0.013", Slope: "0.005", Flow: "12", Velocity: "1"}, "not sought from flow and velocity alone", "give the depth too"},
		{"an arch that is not listed", calculator.Given{Shape: "arch", Size: "44x27", N: "0.013", Slope: "0.005", Depth: "full"}, "no listed arch", "the nearest is 43.75x26.625"},
		{"a material without sizes", calculator.Given{Material: "brick", Slope: "0.005", Flow: "3"}, "no circle of brick is listed", "give the size"},
		{"a bottom width that even nothing is too wide for", calculator.Given{Shape: "trapezoid", Side: "3", N: "0.03", Slope: "0.002", Flow: "8", Depth: "2"}, "carries 25.67 cfs with bottom 0 already", "smaller depth"},
		{"a share of the rise of a channel", calculator.Given{Shape: "rectangle", Bottom: "3", N: "0.03", Slope: "0.002", Depth: "0.5D"}, "which an open section has not", "give the depth in ft"},
		{"a flow over the bank of a ground line", calculator.Given{Points: creek, Slope: "0.003", Flow: "2000"}, "up to its lower bank, depth 7 ft", "higher ground"},
		{"a depth over the bank of a ground line", calculator.Given{Points: creek, Slope: "0.003", Depth: "7.5"}, "over the lower bank", "smaller depth"},
		{"a velocity in a ground line of several n", calculator.Given{Points: creek, Slope: "0.003", Velocity: "2"}, "not sought from a velocity where n changes", "give the flow"},
		{"a ground line that holds no water", calculator.Given{Points: creek[:5], Slope: "0.003", Depth: "1"}, "holds no water", "add the bank"},
		{"n that varies in a channel", calculator.Given{Shape: "rectangle", Bottom: "3", N: "0.03", Slope: "0.002", Depth: "1", VaryingN: true}, "published for pipes", "leave out varying-n"},
	} {
		t.Run(c.name, func(t *testing.T) {
			c.g.Units = "us"
			s, err := calculator.Read(c.g)
			if err == nil {
				_, err = calculator.Ask(s.Questions[0])
			}
			refused(t, err, c.wrong, c.remedy)
		})
	}
}

func refused(t *testing.T, err error, wrong, remedy string) {
	t.Helper()
	none, is := err.(*pipeflow.NoAnswer)
	if !is {
		t.Fatalf("got %v, not a refusal", err)
	}
	if !strings.Contains(none.Wrong, wrong) || !strings.Contains(none.Remedy, remedy) {
		t.Errorf("got  %q\n     %q\nwant %q, %q", none.Wrong, none.Remedy, wrong, remedy)
	}
}

func TestTypedValuesThatCannotBeReadAreRefused(t *testing.T) {
	for _, c := range []struct {
		name          string
		g             calculator.Given
		wrong, remedy string
	}{
		{"a word for a number", calculator.Given{N: "rough"}, `n "rough" is no number`, "0.013"},
		{"a number that is none", calculator.Given{N: "NaN"}, `n "NaN" is no number`, "0.013"},
		{"a hexadecimal number", calculator.Given{N: "0x1p4"}, `n "0x1p4" is no number`, "0.013"},
		{"an infinite number", calculator.Given{Flow: "1e999"}, `flow "1e999" is no number`, "12"},
		{"a unit that is none of its kind", calculator.Given{Flow: "3ft"}, `unknown unit "ft"`, "cfs"},
		{"a decimal comma", calculator.Given{Slope: "0,005"}, `slope "0,005"`, "0.005"},
		{"an unknown shape", calculator.Given{Shape: "cirle"}, `shape "cirle" is unknown`, `"circle"`},
		{"an unknown material", calculator.Given{Material: "concret"}, "is unknown", `"concrete"`},
		{"unknown units", calculator.Given{Units: "metric"}, `units "metric" is unknown`, "si, us"},
		{"a dimension of another shape", calculator.Given{Size: "24", Bottom: "3"}, "the shape circle has no bottom", "it takes size"},
		{"a small box without a unit", calculator.Given{Shape: "box", Size: "8x6"}, `size "8x6"`, "8ft x 6ft"},
		{"a side that leans inward", calculator.Given{Shape: "triangle", Side: "-1"}, "leans inward", "0 for an upright side"},
		{"a side the wrong way round", calculator.Given{Shape: "triangle", Side: "1:3"}, `side "1:3"`, "3:1"},
		{"a channel without width", calculator.Given{Shape: "rectangle", Bottom: "0"}, "bottom 0", "over 0"},
		{"a parabola of one number", calculator.Given{Shape: "parabola", Size: "12"}, `size "12"`, "12x3"},
		{"a haunch that is no length", calculator.Given{Shape: "box", Size: "96x72", Haunch: "big"}, `haunch "big"`, "such as 8"},
		{"two lists", calculator.Given{Slope: "0.001,0.002", Flow: "1:5:1"}, "two lists, slope and flow", "single value"},
		{"a list without a step", calculator.Given{Flow: "1:5"}, "is no list", "from:to:step"},
		{"a list that never ends", calculator.Given{Flow: "1:5:0"}, "no or too many values", "10000 steps"},
		{"a list that runs away", calculator.Given{Flow: "1:5:-1"}, "no or too many values", "a step that leads"},
		{"an unknown rule for linings", calculator.Given{Points: creek, Composite: "lottr"}, "is unknown", `"lotter"`},
	} {
		t.Run(c.name, func(t *testing.T) {
			if c.g.Units == "" {
				c.g.Units = "us"
			}
			_, err := calculator.Read(c.g)
			refused(t, err, c.wrong, c.remedy)
		})
	}
}
