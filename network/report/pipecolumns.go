package report

// PipeColumns are the columns of the table of pipes, in the order of the
// contract of results.
var PipeColumns = []Column[PipeRow]{
	{"id", []string{"pipe"}, Text, func(r *PipeRow) Value { return T(r.Pipe.ID) }},
	{"from", []string{"from"}, Text, func(r *PipeRow) Value { return T(r.From) }},
	{"to", []string{"to"}, Text, func(r *PipeRow) Value { return T(r.To) }},
	{"shape", []string{"shape"}, Text, func(r *PipeRow) Value { return T(r.Pipe.Shape) }},
	{"size", []string{"size"}, Size, func(r *PipeRow) Value { return r.Size }},
	{"length", []string{"length"}, Length, func(r *PipeRow) Value { return N(r.Pipe.Length) }},
	{"n", []string{"n"}, Roughness, func(r *PipeRow) Value { return N(r.Pipe.N) }},
	{"slope", []string{"slope"}, Percent, func(r *PipeRow) Value { return M(r.Pipe.Slope) }},
	{"invert_upper", []string{"invert,", "upper end"}, Level, func(r *PipeRow) Value { return M(r.Pipe.InvertUpper) }},
	{"invert_lower", []string{"invert,", "lower end"}, Level, func(r *PipeRow) Value { return M(r.Pipe.InvertLower) }},
	{"count", []string{"barrels"}, Count, func(r *PipeRow) Value { return N(float64(r.Pipe.Count)) }},
	{"material", []string{"material"}, Text, func(r *PipeRow) Value { return T(r.Pipe.Material) }},
	{"area", []string{"area,", "total"}, Area, func(r *PipeRow) Value { return N(r.Run.Area) }},
	{"ca", []string{"C × area,", "total"}, Area, func(r *PipeRow) Value { return N(r.Run.CA) }},
	{"ca_counted", []string{"C × area,", "counted"}, Area, func(r *PipeRow) Value { return Value{Number: r.Run.CACounted, OK: r.Partial} }},
	{"peak", []string{"peak", "by"}, Text, func(r *PipeRow) Value { return peakBy(r) }},
	{"time", []string{"time"}, Minutes, func(r *PipeRow) Value { return running(r, r.Run.Time) }},
	{"intensity", []string{"intensity"}, Intensity, func(r *PipeRow) Value { return running(r, r.Run.Intensity) }},
	{"inflow", []string{"steady", "inflow"}, Flow, func(r *PipeRow) Value { return N(r.Run.Inflow) }},
	{"flow", []string{"peak", "flow"}, Flow, func(r *PipeRow) Value { return N(r.Run.Flow) }},
	{"capacity", []string{"full-bore", "capacity"}, Flow, func(r *PipeRow) Value { return Value{Number: r.Run.Capacity, OK: r.Run.HasCapacity} }},
	{"capacity_ratio", []string{"flow /", "capacity"}, Ratio, func(r *PipeRow) Value {
		return Value{Number: r.Run.Flow / r.Run.Capacity, OK: r.Run.HasCapacity}
	}},
	{"depth", []string{"normal", "depth"}, Length, func(r *PipeRow) Value { return N(r.Run.Depth) }},
	{"depth_ratio", []string{"depth /", "rise"}, Ratio, func(r *PipeRow) Value { return N(r.Run.Depth / r.Pipe.Section.Rise()) }},
	{"velocity", []string{"velocity,", "peak flow"}, Velocity, func(r *PipeRow) Value { return running(r, r.Run.Velocity) }},
	{"velocity_full", []string{"velocity,", "flowing full"}, Velocity, func(r *PipeRow) Value { return M(r.VelocityFull) }},
	{"critical_depth", []string{"critical", "depth"}, Length, func(r *PipeRow) Value { return M(r.CriticalDepth) }},
	{"froude", []string{"Froude", "number"}, Ratio, func(r *PipeRow) Value { return M(r.Froude) }},
	{"travel_time", []string{"time", "in pipe"}, Minutes, func(r *PipeRow) Value { return N(r.Run.TravelTime) }},
	{"cover_upper", []string{"cover,", "upper end"}, Length, func(r *PipeRow) Value { return M(r.CoverUpper) }},
	{"cover_lower", []string{"cover,", "lower end"}, Length, func(r *PipeRow) Value { return M(r.CoverLower) }},
	{"hgl_upper", []string{"grade line,", "upper end"}, Level, func(r *PipeRow) Value { return line(r, r.Line.HGLUpper) }},
	{"hgl_lower", []string{"grade line,", "lower end"}, Level, func(r *PipeRow) Value { return line(r, r.Line.HGLLower) }},
	{"egl_upper", []string{"energy line,", "upper end"}, Level, func(r *PipeRow) Value { return line(r, r.Line.EGLUpper) }},
	{"egl_lower", []string{"energy line,", "lower end"}, Level, func(r *PipeRow) Value { return line(r, r.Line.EGLLower) }},
	{"regime", []string{"runs"}, Text, func(r *PipeRow) Value { return T(r.Regime()) }},
	{"jump", []string{"jump, from", "lower end"}, Length, func(r *PipeRow) Value { return M(r.Line.Jump) }},
	{"full_length", []string{"length", "flowing full"}, Length, func(r *PipeRow) Value { return line(r, r.Line.FullLength) }},
	{"bend_loss", []string{"bend", "loss"}, Length, func(r *PipeRow) Value { return Value{Number: r.Line.Bend, OK: r.Line.Bend > 0} }},
}

// PipeGroups are the tables into which the columns of a pipe are split for
// people, in the order of a hand calculation.
var PipeGroups = []Group{
	{"Flow in the pipes", []string{"id", "from", "to", "area", "ca", "ca_counted", "peak", "time", "intensity", "inflow", "flow", "travel_time"}},
	{"Section and uniform flow", []string{"id", "size", "n", "slope", "flow", "capacity", "capacity_ratio", "depth", "depth_ratio", "velocity", "velocity_full"}},
	{"Critical state and levels", []string{"id", "critical_depth", "froude", "length", "invert_upper", "invert_lower", "cover_upper", "cover_lower"}},
	{"Grade lines in the pipes", []string{"id", "hgl_upper", "hgl_lower", "egl_upper", "egl_lower", "regime", "full_length", "jump"}},
}

// CheckGroups are the tables of the check storm: what it changes.
var CheckGroups = []Group{
	{"Pipes", []string{"id", "time", "intensity", "flow", "capacity", "capacity_ratio", "depth", "depth_ratio", "velocity", "hgl_upper", "hgl_lower"}},
}

// Group is a table for people: a title and the keys of its columns.
type Group struct {
	Title string
	Keys  []string
}

// Pick finds the columns with these keys, in their order.
func Pick[R any](all []Column[R], keys []string) []Column[R] {
	var picked []Column[R]
	for _, k := range keys {
		for _, c := range all {
			if c.Key == k {
				picked = append(picked, c)
			}
		}
	}
	return picked
}
