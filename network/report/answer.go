package report

import (
	"rimfall/network"
	"rimfall/network/calculator"
	"rimfall/network/units"
	"rimfall/pipeflow"
	"rimfall/pipeflow/catalog"
)

// Figure is a column of the calculator, whose measure gives unit and decimals.
type Figure[R any] struct {
	Column[R]
	Measure calculator.Measure
}

// AnswerRow is one answer of the calculator, or why there is none.
type AnswerRow struct {
	*calculator.Answer
	Given string // the value of a list
	Why   string // there is no answer
}

// Caution is the sentence that stands under every calculation.
var Caution = Cautions[0]

func answered(value func(a *calculator.Answer) Value) func(*AnswerRow) Value {
	return func(r *AnswerRow) Value {
		if r.Answer == nil {
			return Value{}
		}
		return value(r.Answer)
	}
}

func figure(key string, head []string, m calculator.Measure, value func(a *calculator.Answer) Value) Figure[AnswerRow] {
	return Figure[AnswerRow]{Column[AnswerRow]{key, head, Number, answered(value)}, m}
}

func words(key string, head []string, value func(a *calculator.Answer) Value) Figure[AnswerRow] {
	return Figure[AnswerRow]{Column[AnswerRow]{key, head, Text, answered(value)}, calculator.Plain}
}

// AnswerColumns are the values of an answer, in the order of a hand calculation. Those
// without a heading are left out of tables.
var AnswerColumns = []Figure[AnswerRow]{
	words("units", nil, func(a *calculator.Answer) Value { return T(a.Units.Name) }),
	words("asked", nil, func(a *calculator.Answer) Value { return T(a.Asked) }),
	words("shape", nil, func(a *calculator.Answer) Value { return T(a.Conduit.Shape) }),
	figure("size", []string{"size"}, calculator.PipeSize, answerSize),
	figure("size_exact", []string{"size,", "exact"}, calculator.PipeSize, exactSize),
	figure("bottom", []string{"bottom", "width"}, calculator.Length, func(a *calculator.Answer) Value { return M(a.Conduit.Bottom) }),
	figure("side", []string{"side"}, calculator.Plain, func(a *calculator.Answer) Value { return M(a.Conduit.Left) }),
	figure("side_right", []string{"side,", "right"}, calculator.Plain, sideRight),
	figure("n", []string{"n"}, calculator.Roughness, answerN),
	figure("n_at_depth", []string{"n at", "depth"}, calculator.Roughness, func(a *calculator.Answer) Value {
		return Value{Number: a.First.N, OK: a.VaryingN}
	}),
	figure("slope", []string{"slope"}, calculator.Gradient, func(a *calculator.Answer) Value { return N(a.Slope) }),
	figure("depth", []string{"depth"}, calculator.Length, func(a *calculator.Answer) Value { return N(a.First.Depth) }),
	figure("depth_ratio", []string{"depth /", "rise"}, calculator.Plain, func(a *calculator.Answer) Value { return M(a.First.Ratio) }),
	figure("flow", []string{"flow"}, calculator.Discharge, func(a *calculator.Answer) Value { return N(a.First.Flow) }),
	figure("velocity", []string{"velocity"}, calculator.Speed, func(a *calculator.Answer) Value { return N(a.First.Velocity) }),
	figure("depth_second", []string{"second", "depth"}, calculator.Length, ofSecond(func(s *calculator.State) float64 { return s.Depth })),
	figure("flow_second", nil, calculator.Discharge, ofSecond(func(s *calculator.State) float64 { return s.Flow })),
	figure("velocity_second", []string{"second", "velocity"}, calculator.Speed, ofSecond(func(s *calculator.State) float64 { return s.Velocity })),
	figure("area", []string{"wetted", "area"}, calculator.Area, func(a *calculator.Answer) Value { return N(a.First.Area) }),
	figure("wetted_perimeter", nil, calculator.Length, func(a *calculator.Answer) Value { return N(a.First.Perimeter) }),
	figure("hydraulic_radius", []string{"hydraulic", "radius"}, calculator.Length, func(a *calculator.Answer) Value { return N(a.First.Radius) }),
	figure("top_width", []string{"top", "width"}, calculator.Length, func(a *calculator.Answer) Value {
		return Value{Number: a.First.TopWidth, OK: a.First.TopWidth > 0}
	}),
	figure("hydraulic_depth", nil, calculator.Length, func(a *calculator.Answer) Value { return M(a.First.HydraulicDeep) }),
	figure("capacity", []string{"full-bore", "capacity"}, calculator.Discharge, func(a *calculator.Answer) Value { return M(a.First.FullFlow) }),
	figure("velocity_full", nil, calculator.Speed, func(a *calculator.Answer) Value { return M(a.First.FullVelocity) }),
	figure("largest_flow", nil, calculator.Discharge, func(a *calculator.Answer) Value { return M(a.First.LargestFlow) }),
	figure("largest_flow_depth", nil, calculator.Length, func(a *calculator.Answer) Value { return M(a.First.LargestDepth) }),
	figure("shear", nil, calculator.Stress, func(a *calculator.Answer) Value { return N(a.First.Shear) }),
	figure("critical_depth", []string{"critical", "depth"}, calculator.Length, func(a *calculator.Answer) Value { return M(a.First.CriticalDepth) }),
	figure("critical_slope", nil, calculator.Gradient, func(a *calculator.Answer) Value { return M(a.First.CriticalSlope) }),
	figure("froude", []string{"Froude", "number"}, calculator.Plain, func(a *calculator.Answer) Value { return M(a.First.Froude) }),
	figure("specific_energy", nil, calculator.Length, func(a *calculator.Answer) Value { return N(a.First.Energy) }),
	words("regime", []string{"runs"}, func(a *calculator.Answer) Value { return T(a.First.Regime) }),
	words("flow_state", []string{"state"}, func(a *calculator.Answer) Value { return T(a.First.FlowState) }),
}

// answerSize is the diameter as a number, any other size as a text, as in a job.
func answerSize(a *calculator.Answer) Value {
	if a.Conduit.Shape == string(catalog.Circle) {
		return N(a.Conduit.Size.Rise)
	}
	return T(a.Conduit.SizeLabel())
}

func exactSize(a *calculator.Answer) Value {
	c := a.Conduit
	c.Size = a.Exact.Size
	switch {
	case a.Exact.Size == (network.Size{}):
		return Value{}
	case c.Shape == string(catalog.Circle):
		return N(c.Size.Rise)
	}
	return T(c.SizeLabel())
}

// sideRight is the right side where it is another than the left one.
func sideRight(a *calculator.Answer) Value {
	if a.Conduit.Right == a.Conduit.Left {
		return Value{}
	}
	return M(a.Conduit.Right)
}

// answerN is the n of the full pipe where it varies, of a ground line that of all its
// parts together.
func answerN(a *calculator.Answer) Value {
	if _, ground := a.Section.(*pipeflow.Ground); ground {
		return N(a.First.N)
	}
	return N(a.N)
}

func ofSecond(value func(*calculator.State) float64) func(a *calculator.Answer) Value {
	return func(a *calculator.Answer) Value {
		if a.Second == nil {
			return Value{}
		}
		return N(value(a.Second))
	}
}

// RatingColumns are the columns of the table of a section.
var RatingColumns = []Figure[calculator.RatingRow]{
	rated("depth", []string{"depth"}, calculator.Length, func(r *calculator.RatingRow) Value { return N(r.Depth) }),
	rated("area", []string{"wetted", "area"}, calculator.Area, func(r *calculator.RatingRow) Value { return N(r.Area) }),
	rated("wetted_perimeter", []string{"wetted", "perimeter"}, calculator.Length, func(r *calculator.RatingRow) Value { return N(r.Perimeter) }),
	rated("hydraulic_radius", []string{"hydraulic", "radius"}, calculator.Length, func(r *calculator.RatingRow) Value { return N(r.Radius) }),
	rated("top_width", []string{"top", "width"}, calculator.Length, func(r *calculator.RatingRow) Value {
		return Value{Number: r.TopWidth, OK: r.TopWidth > 0}
	}),
	rated("flow", []string{"flow"}, calculator.Discharge, func(r *calculator.RatingRow) Value { return M(r.Flow) }),
	rated("velocity", []string{"velocity"}, calculator.Speed, func(r *calculator.RatingRow) Value { return M(r.Velocity) }),
	rated("depth_ratio", []string{"depth /", "rise"}, calculator.Plain, func(r *calculator.RatingRow) Value { return M(r.DepthRatio) }),
	rated("area_ratio", []string{"area /", "full"}, calculator.Plain, func(r *calculator.RatingRow) Value { return M(r.AreaRatio) }),
	rated("radius_ratio", []string{"radius /", "full"}, calculator.Plain, func(r *calculator.RatingRow) Value { return M(r.RadiusRatio) }),
	rated("velocity_ratio", []string{"velocity /", "full"}, calculator.Plain, func(r *calculator.RatingRow) Value { return M(r.VelocityRatio) }),
	rated("flow_ratio", []string{"flow /", "full"}, calculator.Plain, func(r *calculator.RatingRow) Value { return M(r.FlowRatio) }),
}

func rated(key string, head []string, m calculator.Measure, value func(*calculator.RatingRow) Value) Figure[calculator.RatingRow] {
	return Figure[calculator.RatingRow]{Column[calculator.RatingRow]{key, head, Number, value}, m}
}

// HeadOf is the heading of a figure with its unit, a line each; nil where it is not
// shown in tables.
func HeadOf[R any](f *Figure[R], u units.System) []string {
	unit := f.Measure.Unit(u)
	if f.Head == nil || unit == "" {
		return f.Head
	}
	return append(append([]string(nil), f.Head...), unit)
}
