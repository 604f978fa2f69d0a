package review

import (
	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/report"
	"rimfall/network/units"
)

// What is given of each kind of element, and of a job as a whole; results are picked
// from the columns of the report.

var pipeGiven = []report.Column[network.Pipe]{
	{Key: "length", Head: []string{"length"}, Quantity: report.Length, Value: func(p *network.Pipe) report.Value { return report.N(p.Length) }},
	{Key: "shape", Head: []string{"shape"}, Quantity: report.Text, Value: func(p *network.Pipe) report.Value { return report.T(p.Shape) }},
	{Key: "size", Head: []string{"size"}, Quantity: report.Size, Value: report.SizeValue},
	{Key: "count", Head: []string{"barrels"}, Quantity: report.Count, Value: func(p *network.Pipe) report.Value { return report.N(float64(p.Count)) }},
	{Key: "material", Head: []string{"material"}, Quantity: report.Text, Value: func(p *network.Pipe) report.Value { return report.T(p.Material) }},
	{Key: "n", Head: []string{"n"}, Quantity: report.Roughness, Value: func(p *network.Pipe) report.Value { return report.N(p.N) }},
	{Key: "slope", Head: []string{"slope"}, Quantity: report.Slope, Value: func(p *network.Pipe) report.Value { return report.M(p.Slope) }},
	{Key: "invert_upper", Head: []string{"invert, upper end"}, Quantity: report.Level, Value: func(p *network.Pipe) report.Value { return report.M(p.InvertUpper) }},
	{Key: "invert_lower", Head: []string{"invert, lower end"}, Quantity: report.Level, Value: func(p *network.Pipe) report.Value { return report.M(p.InvertLower) }},
	{Key: "angle", Head: []string{"angle"}, Quantity: report.Number, Value: func(p *network.Pipe) report.Value { return report.M(p.Angle) }},
	{Key: "loss", Head: []string{"loss"}, Quantity: report.Number, Value: func(p *network.Pipe) report.Value { return report.M(p.Loss) }},
	{Key: "bend", Head: []string{"bend"}, Quantity: report.Number, Value: func(p *network.Pipe) report.Value { return report.Value{Number: p.Bend, OK: p.Bend != 0} }},
	{Key: "status", Head: []string{"status"}, Quantity: report.Text, Value: pipeStatus},
	{Key: "share", Head: []string{"share"}, Quantity: report.Number, Value: func(p *network.Pipe) report.Value { return report.M(p.Share) }},
}

// wallOf is the wall in the unit in which it is written.
func wallOf(u units.System) report.Column[network.Pipe] {
	return report.Column[network.Pipe]{Key: "wall", Head: []string{"wall"}, Quantity: report.Size, Value: func(p *network.Pipe) report.Value {
		return report.Value{Number: p.Wall * u.SizeFactor, OK: p.HasWall}
	}}
}

func pipeStatus(p *network.Pipe) report.Value {
	if p.Existing {
		return report.T("existing")
	}
	return report.T("proposed")
}

// pipeResults are the results of a pipe that are set side by side.
var pipeResults = []string{
	"area", "ca", "ca_counted", "time", "intensity", "inflow", "flow", "capacity", "capacity_ratio", "depth", "depth_ratio", "velocity",
	"velocity_full", "critical_depth", "froude", "travel_time", "cover_upper", "cover_lower", "hgl_upper", "hgl_lower", "egl_upper", "egl_lower",
	"regime", "jump", "full_length",
}

var structureGiven = []report.Column[network.Structure]{
	{Key: "kind", Head: []string{"kind"}, Quantity: report.Text, Value: func(s *network.Structure) report.Value { return report.T(s.Kind.String()) }},
	{Key: "x", Head: []string{"x"}, Quantity: report.Length, Value: func(s *network.Structure) report.Value { return report.M(s.X) }},
	{Key: "y", Head: []string{"y"}, Quantity: report.Length, Value: func(s *network.Structure) report.Value { return report.M(s.Y) }},
	{Key: "rim", Head: []string{"rim"}, Quantity: report.Level, Value: func(s *network.Structure) report.Value { return report.M(s.Rim) }},
	{Key: "tailwater", Head: []string{"tailwater"}, Quantity: report.Level, Value: func(s *network.Structure) report.Value { return report.M(s.Tailwater) }},
	{Key: "tailwater_check", Head: []string{"tailwater, check storm"}, Quantity: report.Level, Value: func(s *network.Structure) report.Value { return report.M(s.TailwaterCheck) }},
	{Key: "inflow", Head: []string{"steady inflow"}, Quantity: report.Flow, Value: func(s *network.Structure) report.Value { return report.N(s.Inflow) }},
	{Key: "lowest_invert", Head: []string{"lowest invert"}, Quantity: report.Level, Value: func(s *network.Structure) report.Value { return report.M(s.LowestInvert) }},
	{Key: "least_fall", Head: []string{"least fall"}, Quantity: report.Length, Value: func(s *network.Structure) report.Value { return report.M(s.LeastFall) }},
	{Key: "benching", Head: []string{"benching"}, Quantity: report.Text, Value: func(s *network.Structure) report.Value { return report.T(s.Benching.String()) }},
	{Key: "loss", Head: []string{"loss"}, Quantity: report.Number, Value: func(s *network.Structure) report.Value { return report.M(s.Loss) }},
}

// structureResults are the results of a structure that are set side by side.
var structureResults = []string{"area", "ca", "time", "flow", "hgl", "freeboard"}

var areaGiven = []report.Column[network.Area]{
	{Key: "area", Head: []string{"area"}, Quantity: report.Area, Value: func(a *network.Area) report.Value { return report.N(a.Area) }},
	{Key: "c", Head: []string{"C"}, Quantity: report.Number, Value: func(a *network.Area) report.Value { return report.N(a.C) }},
	{Key: "surface", Head: []string{"surface"}, Quantity: report.Text, Value: func(a *network.Area) report.Value { return report.T(a.Surface) }},
	{Key: "time", Head: []string{"inlet time"}, Quantity: report.Minutes, Value: func(a *network.Area) report.Value { return report.M(a.Time) }},
}

// settings compares the storms, the rainfall and the criteria of both jobs. The design
// storm is that of the run.
func (c *Comparison) settings() {
	b, a := c.Before.Job.Settings, c.After.Job.Settings
	b.Storm.ReturnPeriod, a.Storm.ReturnPeriod = c.Before.Design.Storm.ReturnPeriod, c.After.Design.Storm.ReturnPeriod
	c.Settings = differences(namedColumns(settingColumns), &b, &a)
	if !c.sameRain() {
		c.Settings = append(c.Settings, Change{"intensities", "intensities of the design storm", report.Text, report.T("as given"), report.T("others")})
	}
}

// sameRain tells whether both design storms rain alike: at the durations of each, and at
// some between, since an equation has ends only.
func (c *Comparison) sameRain() bool {
	b, okB := c.Before.Job.Curve(c.Before.Design.Storm.ReturnPeriod)
	a, okA := c.After.Job.Curve(c.After.Design.Storm.ReturnPeriod)
	if !okB || !okA {
		return okB == okA
	}
	return rainsAlike(b, a, durationsOf(b)) && rainsAlike(b, a, durationsOf(a)) && rainsAlike(b, a, sampled)
}

func rainsAlike(b, a hydrology.Intensity, durations []float64) bool {
	for _, t := range durations {
		ib, whereB := b.At(t)
		ia, whereA := a.At(t)
		if whereB != whereA || !same(report.N(ib), report.N(ia)) {
			return false
		}
	}
	return true
}

// sampled are durations at which two storms are looked at, min.
var sampled = []float64{5, 10, 15, 30, 60, 120, 360}

// durationsOf are the durations of a storm that are known: of a table all, of an equation
// the ends of its range.
func durationsOf(rain any) []float64 {
	if table, ok := rain.(interface{ Durations() []float64 }); ok {
		return table.Durations()
	}
	return nil
}
