package report

import (
	"strconv"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/grade"
	"rimfall/network/sweep"
)

// PipeRow is everything that is shown of one pipe for one storm.
type PipeRow struct {
	Pipe     *network.Pipe
	Run      *sweep.Pipe
	Line     *grade.Pipe
	Partial  bool // the peak is by partial area
	From, To string

	Size                   Value
	VelocityFull           network.Maybe
	CriticalDepth, Froude  network.Maybe
	CoverUpper, CoverLower network.Maybe
	Remarks                string // names of the rules that found something
}

// Pipe makes the row of pipe i in a storm of a run.
func Pipe(r *analysis.Result, storm *analysis.StormRun, i network.PipeIndex) PipeRow {
	p, run := &r.Network.Pipes[i], &storm.Flows.Pipes[i]
	row := PipeRow{
		Pipe: p, Run: run, Line: &storm.Lines.Pipes[i], Size: SizeValue(p), Partial: storm.Storm.Peak == network.PartialArea,
		From: r.Network.Structures[p.From].ID, To: r.Network.Structures[p.To].ID,
		CoverUpper: r.Network.Cover(p, network.Upper), CoverLower: r.Network.Cover(p, network.Lower),
	}
	if run.HasCapacity {
		row.VelocityFull = network.Some(run.Capacity / p.FullArea())
	}
	g := r.Job.Settings.Units.Gravity
	row.CriticalDepth, row.Froude = run.CriticalDepth(p, g), run.Froude(p, g)
	return row
}

// SizeValue is a size as it is shown: a number, or span x rise as a text.
func SizeValue(p *network.Pipe) Value {
	if p.Shape == "circle" {
		return N(p.Size.Rise)
	}
	return T(SizeText(p))
}

// SizeText is a size as it is written in pipes.csv, exactly.
func SizeText(p *network.Pipe) string {
	exact := func(v float64) string { return strconv.FormatFloat(v, 'f', -1, 64) }
	if p.Shape == "circle" {
		return exact(p.Size.Rise)
	}
	return exact(p.Size.Span) + "x" + exact(p.Size.Rise)
}

// line gives a level of the grade lines where they are known.
func line(r *PipeRow, v float64) Value { return Value{Number: v, OK: r.Line.Known} }

// running gives a value only where water flows.
func running(r *PipeRow, v float64) Value { return Value{Number: v, OK: r.Run.State != sweep.Dry} }

// Regime is how the pipe runs, in one plain word: as its grade line says, but
// "full" wherever the flow is over full-bore capacity, as the contract of results
// has it; full_length tells how much of such a pipe the grade line finds full.
func (r *PipeRow) Regime() string {
	if r.Run.State == sweep.Full && r.Run.HasCapacity {
		return grade.Full.String()
	}
	return r.Line.Regime.String()
}

// peakBy names which of the two peaks governs, where the job asks for both: that of
// all the area at the longest time, or that of a part of it at a shorter one.
func peakBy(r *PipeRow) Value {
	switch {
	case !r.Partial || !r.Run.Rained():
		return Value{}
	case r.Run.Part:
		return T(network.Peaks[network.PartialArea])
	}
	return T(network.Peaks[network.LongestTime])
}
