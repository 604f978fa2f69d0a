package review

import (
	"fmt"
	"math"

	"rimfall/network"
	"rimfall/network/report"
)

// DoubtReport is how sure the results of a job are, ready to be shown.
type DoubtReport struct {
	Subject *Subject
	*Doubt
}

// DoubtPipeRow is one pipe of it.
type DoubtPipeRow struct {
	ID       string
	From, To string
	PipeDoubt
}

// DoubtStructureRow is one structure of it.
type DoubtStructureRow struct {
	ID  string
	Rim network.Maybe
	StructureDoubt
}

// PipeRows makes a row for every pipe, in file order.
func (d *DoubtReport) PipeRows() []DoubtPipeRow {
	n := d.Subject.Network
	rows := make([]DoubtPipeRow, len(d.Pipes))
	for i := range rows {
		p := &n.Pipes[i]
		rows[i] = DoubtPipeRow{p.ID, n.Structures[p.From].ID, n.Structures[p.To].ID, d.Pipes[i]}
	}
	return rows
}

// StructureRows makes a row for every structure, in file order.
func (d *DoubtReport) StructureRows() []DoubtStructureRow {
	rows := make([]DoubtStructureRow, len(d.Structures))
	for i := range rows {
		s := &d.Subject.Network.Structures[i]
		rows[i] = DoubtStructureRow{s.ID, s.Rim, d.Structures[i]}
	}
	return rows
}

// Statement says what was drawn and how, a line each.
func (d *DoubtReport) Statement() []string {
	o, s := &d.Options, &d.Options.Spreads
	rain := fmt.Sprintf("rain lognormal, spread %g", s.Rain)
	if d.Bounds && s.Rain > 0 {
		rain = fmt.Sprintf("rain normal within the file's own %g %% bounds, in the logarithm", 100*d.Confidence)
	}
	return []string{
		fmt.Sprintf("%d runs, seed %d; %s, one draw a run", o.Runs, o.Seed, rain),
		fmt.Sprintf("Lognormal factors of median 1, spreads of the logarithm: n %g, C %g (C at most 1), inlet time %g, steady inflow %g", s.N, s.C, s.Time, s.Flow),
		fmt.Sprintf("Of their variance %g is shared: n by material, C by surface, inlet time and inflow by all; spreads are common practice unless given", o.Shared),
		fmt.Sprintf("By the number of runs alone a chance of 0.5 is known to ±%s, one of 0.1 to ±%s (95 %%)", twoDigits(samplingError(0.5, o.Runs)), twoDigits(samplingError(0.1, o.Runs))),
	}
}

// samplingError is half the width of the 95 % interval of a chance that was counted in a number of runs.
func samplingError(chance float64, runs int) float64 {
	const normal975 = 1.959964 // quantile of the normal distribution
	return normal975 * math.Sqrt(chance*(1-chance)/float64(runs))
}

func twoDigits(v float64) string { return fmt.Sprintf("%.2g", v) }

// most is the input that matters most with its correlation.
func most(c *Correlations) report.Value {
	input, ok := c.Most()
	if !ok {
		return report.Value{}
	}
	return report.T(fmt.Sprintf("%s %+.2f", inputNames[input], c[input].V))
}

// inputNames are the inputs as people call them, in the order of the constants.
var inputNames = []string{"rain", "n", "C", "inlet time", "inflow"}

func of(q Quantiles, v float64) report.Value { return report.Value{Number: v, OK: q.OK} }

// DoubtPipeColumns are the columns of the pipes, of tables and of CSV. JSON groups the quantiles.
var DoubtPipeColumns = []report.Column[DoubtPipeRow]{
	column("id", []string{"pipe"}, report.Text, func(r *DoubtPipeRow) report.Value { return report.T(r.ID) }),
	column("from", []string{"from"}, report.Text, func(r *DoubtPipeRow) report.Value { return report.T(r.From) }),
	column("to", []string{"to"}, report.Text, func(r *DoubtPipeRow) report.Value { return report.T(r.To) }),
	column("chance_over_capacity", []string{"chance over", "capacity"}, report.Number, func(r *DoubtPipeRow) report.Value { return report.M(r.OverCapacity) }),
	column("chance_surcharge", []string{"chance over", "crown"}, report.Number, func(r *DoubtPipeRow) report.Value { return report.M(r.Surcharge) }),
	column("depth_ratio_p05", []string{"depth /", "rise, 5 %"}, report.Number, func(r *DoubtPipeRow) report.Value { return of(r.DepthRatio, r.DepthRatio.P05) }),
	column("depth_ratio_p50", []string{"", "50 %"}, report.Number, func(r *DoubtPipeRow) report.Value { return of(r.DepthRatio, r.DepthRatio.P50) }),
	column("depth_ratio_p95", []string{"", "95 %"}, report.Number, func(r *DoubtPipeRow) report.Value { return of(r.DepthRatio, r.DepthRatio.P95) }),
	column("capacity_ratio_p05", []string{"flow /", "capacity, 5 %"}, report.Number, func(r *DoubtPipeRow) report.Value { return of(r.Load, r.Load.P05) }),
	column("capacity_ratio_p50", []string{"", "50 %"}, report.Number, func(r *DoubtPipeRow) report.Value { return of(r.Load, r.Load.P50) }),
	column("capacity_ratio_p95", []string{"", "95 %"}, report.Number, func(r *DoubtPipeRow) report.Value { return of(r.Load, r.Load.P95) }),
	column("", []string{"what matters most,", "rank correlation"}, report.Text, func(r *DoubtPipeRow) report.Value { return most(&r.Matters) }),
}

// DoubtStructureColumns are the same for structures.
var DoubtStructureColumns = []report.Column[DoubtStructureRow]{
	column("id", []string{"structure"}, report.Text, func(r *DoubtStructureRow) report.Value { return report.T(r.ID) }),
	column("rim", []string{"rim"}, report.Level, func(r *DoubtStructureRow) report.Value { return report.M(r.Rim) }),
	column("chance_flooding", []string{"chance", "over rim"}, report.Number, func(r *DoubtStructureRow) report.Value { return report.M(r.Flooding) }),
	column("chance_freeboard", []string{"chance of", "lacking", "freeboard"}, report.Number, func(r *DoubtStructureRow) report.Value { return report.M(r.Freeboard) }),
	column("hgl_p05", []string{"grade line,", "5 %"}, report.Level, func(r *DoubtStructureRow) report.Value { return of(r.Level, r.Level.P05) }),
	column("hgl_p50", []string{"", "50 %"}, report.Level, func(r *DoubtStructureRow) report.Value { return of(r.Level, r.Level.P50) }),
	column("hgl_p95", []string{"", "95 %"}, report.Level, func(r *DoubtStructureRow) report.Value { return of(r.Level, r.Level.P95) }),
	column("", []string{"what matters most,", "rank correlation"}, report.Text, func(r *DoubtStructureRow) report.Value { return most(&r.Matters) }),
}
