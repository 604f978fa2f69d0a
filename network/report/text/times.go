package text

import (
	"fmt"
	"io"
	"strconv"

	"rimfall/network/analysis"
	"rimfall/network/report"
	"rimfall/network/times"
)

// TimesTables are the tables of the times of a run.
var TimesTables = []string{"areas", "structures"}

// Times prints where the times of a run come from: the steps of every area, and what
// sets the time of every structure; for the check storm too where there is one.
func Times(w io.Writer, r *analysis.Result, o Options) error {
	p := &printer{w: w, markdown: o.Markdown, style: StyleOf(r)}
	p.heading(report.Heading(r))
	p.timesOf(r, &r.Design, o, "")
	if r.Check != nil {
		if len(r.Check.Paths) == 0 && o.Table == "" {
			o.Table = "structures" // the inlet times are those of the design storm
		}
		p.timesOf(r, r.Check, o, fmt.Sprintf(", check storm of %g years", r.Check.Storm.ReturnPeriod))
	}
	p.assumptions("Assumptions: what is not known", r.Network)
	p.cautions()
	return p.err
}

func (p *printer) timesOf(r *analysis.Result, run *analysis.StormRun, o Options, suffix string) {
	if o.Table == "" || o.Table == "areas" {
		rows := report.Legs(run)
		if o.Markdown {
			p.table("Inlet times"+suffix, makeGrid(p.style, report.LegColumns, rows))
		} else {
			p.title("Inlet times" + suffix)
			for i := range rows {
				p.leg(&rows[i], i == 0 || rows[i].Area != rows[i-1].Area)
			}
		}
		p.rounds(r, run)
	}
	if o.Table == "" || o.Table == "structures" {
		p.table("Times at the structures"+suffix, makeGrid(p.style, report.BranchColumns, report.Branches(run)))
	}
}

// leg prints a step of an area: what it is, the formula, the numbers, the result.
func (p *printer) leg(l *report.LegRow, first bool) {
	if first {
		p.line("  area %s, to structure %s", l.Area, l.Structure)
	}
	minutes := strconv.FormatFloat(l.Minutes, 'f', 2, 64)
	if l.Step == nil {
		p.line("    %s: %s min", l.What, minutes)
		return
	}
	s := l.Step
	p.line("    %d. %s: %s min", l.Leg, l.What, minutes)
	p.line("       %s = %s", s.Formula, s.Working)
	if s.Formula[0] == 'V' {
		p.line("       t = L/V = %.4g/%.4g/60 = %s min", s.Leg.Length, s.Velocity, minutes)
	}
	p.wrapped("     ", l.Source)
	for _, b := range s.Breaches {
		p.wrapped("     outside its limits: ", b.Text)
	}
	if l.Total.OK {
		p.line("    time of the path: %s min", strconv.FormatFloat(l.Total.V, 'f', 2, 64))
	}
}

// rounds prints how the kinematic wave settled on the storm's intensity.
func (p *printer) rounds(r *analysis.Result, run *analysis.StormRun) {
	for i := range run.Paths {
		w := &run.Paths[i]
		if !w.Used || len(w.Trials) == 0 {
			continue
		}
		id := run.Network.Areas[w.Path.Area].ID
		p.table(fmt.Sprintf("Sheet flow of area %s: the time assumed, the intensity then, the time that follows", id), trialGrid(r, w))
	}
}

// shownTrials is how many rounds are printed; the last always is.
const shownTrials = 5

func trialGrid(r *analysis.Result, w *times.Walked) grid {
	g := grid{head: []string{"round", "assumed\nmin", "intensity\n" + r.Job.Settings.Units.Intensity, "follows\nmin"}, numbers: allNumbers(4)}
	for i, t := range w.Trials {
		if i >= shownTrials && i < len(w.Trials)-1 {
			continue
		}
		g.rows = append(g.rows, []string{
			strconv.Itoa(i + 1), strconv.FormatFloat(t.Assumed, 'f', 3, 64), strconv.FormatFloat(t.Intensity, 'f', 3, 64), strconv.FormatFloat(t.Minutes, 'f', 3, 64),
		})
	}
	return g
}
