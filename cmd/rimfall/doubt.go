package main

import (
	"bufio"
	"fmt"

	"github.com/spf13/cobra"

	"rimfall/network/report/data"
	"rimfall/network/report/text"
	"rimfall/network/review"
)

// doubtFlags are the flags of the question how sure results are.
type doubtFlags struct {
	reviewPrinting
	review.DoubtOptions
	storm float64
}

// doubtCommand runs a job many times with inputs drawn anew.
func (a *app) doubtCommand() *cobra.Command {
	var d doubtFlags
	cmd := &cobra.Command{
		Use:   "doubt JOB",
		Short: "Find how sure results are, by many runs with inputs drawn anew",
		Long: `doubt runs a network many times, its pipes as they are, with Manning's n, runoff
coefficients, rain, inlet times and steady inflows drawn anew in each run. It tells
for every pipe and rim the chance that it fails, the range of depths and grade lines,
and which input matters most.

A factor on each input is lognormal with the median 1; its spread is the standard
deviation of its logarithm, 0.1 being about 10 %. A part of the variance is shared, as
nature shares it: one draw a run for the rain, one for each material's n, one for each
surface's C, one for all inlet times and one for all inflows; beside it each pipe,
area and inflow has a draw of its own. Where the rainfall file has bounds of its own the
rain is drawn within them. The spreads that stand here unless others are given are common
practice and rest on no source.

The same seed gives the same answer to the last bit, whatever the machine's threads.`,
		Example: "  rimfall doubt JOB --runs 2000 --seed 1\n  rimfall doubt JOB --spread-n 0.2 --shared 0.8\n  rimfall doubt JOB --format json",
		Args:    oneJob,
		RunE:    func(cmd *cobra.Command, args []string) error { return a.doubt(&d, cmd, args[0]) },
	}
	d.addTo(cmd, "pipes", "structures")
	f, usual := cmd.Flags(), review.UsualSpreads
	f.IntVar(&d.Runs, "runs", review.DefaultRuns, "number of runs")
	f.Uint64Var(&d.Seed, "seed", 1, "seed of the draws")
	f.Float64Var(&d.storm, "storm", 0, "design storm in `years`, in place of the job's")
	f.Float64Var(&d.Spreads.N, "spread-n", usual.N, "spread of Manning's n")
	f.Float64Var(&d.Spreads.C, "spread-c", usual.C, "spread of runoff coefficients")
	f.Float64Var(&d.Spreads.Rain, "spread-rain", usual.Rain, "spread of the rain; 0 turns off the bounds of a rainfall file too")
	f.Float64Var(&d.Spreads.Time, "spread-time", usual.Time, "spread of inlet times")
	f.Float64Var(&d.Spreads.Flow, "spread-flow", usual.Flow, "spread of steady inflows")
	f.Float64Var(&d.Shared, "shared", review.UsualShared, "part of the variance that is shared, 0 to 1")
	return cmd
}

// judgeDoubt checks the numbers of the flags.
func (d *doubtFlags) judgeDoubt(cmd *cobra.Command) error {
	const mostRuns, mostSpread = 1_000_000, 2
	for _, s := range []struct {
		name   string
		spread float64
	}{{"n", d.Spreads.N}, {"c", d.Spreads.C}, {"rain", d.Spreads.Rain}, {"time", d.Spreads.Time}, {"flow", d.Spreads.Flow}} {
		if !(s.spread >= 0 && s.spread <= mostSpread) {
			return usageError{fmt.Sprintf("--spread-%s takes a spread of 0 to %d", s.name, mostSpread)}
		}
	}
	switch {
	case !(d.Runs >= 1 && d.Runs <= mostRuns):
		return usageError{fmt.Sprintf("--runs takes a number of 1 to %d", mostRuns)}
	case !(d.Shared >= 0 && d.Shared <= 1):
		return usageError{"--shared takes a part of 0 to 1"}
	case cmd.Flags().Changed("storm") && !(d.storm > 0):
		return usageError{"--storm takes a return period in years, over 0"}
	}
	return d.judge()
}

func (a *app) doubt(d *doubtFlags, cmd *cobra.Command, dir string) error {
	if err := d.judgeDoubt(cmd); err != nil {
		return err
	}
	subject, err := a.subject(dir, d.storm)
	if err != nil {
		return err
	}
	var done func()
	d.Progress, done = a.counting("run", d.Runs)
	found, err := subject.FindDoubt(d.DoubtOptions)
	done()
	if err != nil {
		return err
	}
	r := &review.DoubtReport{Subject: subject, Doubt: found}
	return a.write(func(w *bufio.Writer) error {
		switch d.format {
		case "json":
			return data.DoubtJSON(w, r, d.table)
		case "csv":
			return data.DoubtCSV(w, r, d.table)
		}
		return text.Doubt(w, r, text.Options{Markdown: d.format == "markdown", Table: d.table})
	})
}
