package main

import (
	"bufio"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/job"
	"rimfall/network/report/data"
	"rimfall/network/report/text"
	"rimfall/network/review"
)

// reliefFlags are the flags of the question what must be replaced or doubled.
type reliefFlags struct {
	reviewPrinting
	limits, works []string
	runs          int
	storm         float64
	out           string
	force         bool
}

// reliefCommand finds which pipes must be replaced or doubled.
func (a *app) reliefCommand() *cobra.Command {
	var r reliefFlags
	cmd := &cobra.Command{
		Use:   "relief JOB",
		Short: "Find the pipes to replace or double so that all limits hold",
		Long: `relief finds which pipes must be replaced by a larger listed size, or doubled by a
second pipe beside them, so that all limits hold in the design storm (a check storm is
not asked). It is the least
cost by costs.csv (size, cost per length, and if need be shape, material, depth up to
which the cost holds, and work: laying or removal); without that file the least length
of new pipe, of equal lengths the least volume.

A new pipe has the shape, material, n and inverts of the old one. A second pipe shares
the flow by conveyance, A R^(2/3) / n of the full section. No pipe becomes smaller than
one that enters it where it was not so before, and no cover that held is broken.
Each system of pipes is a question of its own. What is proven is said of each: least,
where every choice that is cheaper was tried (or cannot hold whatever lies below it);
else irreducible, since no single work can be left out or made cheaper, with a price
under which nothing holds. --runs sets how long the proof is looked for: 20000 runs are
enough for two pipes of 50 choices, and mostly for far more.

With --out the job is written as a new folder with the pipes marked in the column note.

  capacity    flow not over full-bore capacity     rule capacity
  crown       grade line not over the crown        rule surcharge
  freeboard   the freeboard asked for is kept      rule freeboard
  rim         grade line not over the rim          rule flooding`,
		Example: "  rimfall relief JOB\n  rimfall relief JOB --limit capacity,rim --work replace\n  rimfall relief JOB --out JOB-relieved",
		Args:    oneJob,
		RunE:    func(cmd *cobra.Command, args []string) error { return a.relief(&r, cmd, args[0]) },
	}
	r.addTo(cmd)
	f := cmd.Flags()
	f.StringSliceVar(&r.limits, "limit", nil, "what must hold: "+strings.Join(review.Limits, ", ")+" (several with commas; all of them unless it is given)")
	f.StringSliceVar(&r.works, "work", nil, "what may be done: "+strings.Join(review.Works[1:], ", ")+" (both unless it is given)")
	f.IntVar(&r.runs, "runs", 0, fmt.Sprintf("the most runs of one system in the search for the least (0: %d, fewer in a system of over 60 pipes)", review.ReliefRuns))
	f.Float64Var(&r.storm, "storm", 0, "design storm in `years`, in place of the job's")
	f.StringVar(&r.out, "out", "", "write a complete new job folder `DIR`")
	f.BoolVar(&r.force, "force", false, "replace the folder of --out where it exists")
	complete(cmd, "limit", review.Limits)
	complete(cmd, "work", review.Works[1:])
	return cmd
}

// options reads the flags.
func (r *reliefFlags) options(cmd *cobra.Command) (review.ReliefOptions, error) {
	o := review.ReliefOptions{Runs: r.runs}
	for _, word := range r.limits {
		i := slices.Index(review.Limits, word)
		if i < 0 {
			return o, usageError{fmt.Sprintf("--limit %s: write one of %s", word, strings.Join(review.Limits, ", "))}
		}
		o.Limits = append(o.Limits, review.LimitKind(i))
	}
	for _, word := range r.works {
		i := slices.Index(review.Works, word)
		if i < 1 {
			return o, usageError{fmt.Sprintf("--work %s: write one of %s", word, strings.Join(review.Works[1:], ", "))}
		}
		o.Works = append(o.Works, review.Work(i))
	}
	slices.Sort(o.Limits)
	slices.Sort(o.Works)
	o.Limits, o.Works = slices.Compact(o.Limits), slices.Compact(o.Works)
	switch {
	case r.runs < 0:
		return o, usageError{"--runs takes a number of runs"}
	case cmd.Flags().Changed("storm") && !(r.storm > 0):
		return o, usageError{"--storm takes a return period in years, over 0"}
	}
	return o, r.judge()
}

func (a *app) relief(f *reliefFlags, cmd *cobra.Command, dir string) error {
	o, err := f.options(cmd)
	if err != nil {
		return err
	}
	subject, err := a.subject(dir, f.storm)
	if err != nil {
		return err
	}
	done := a.progress("relieving " + dir)
	found, err := subject.FindRelief(o)
	done()
	if err != nil {
		return err
	}
	r := &review.ReliefReport{Subject: subject, Relief: found}
	if err := a.writeRelief(f, r); err != nil {
		return err
	}
	return a.write(func(w *bufio.Writer) error {
		switch f.format {
		case "json":
			return data.ReliefJSON(w, r)
		case "csv":
			return data.ReliefCSV(w, r)
		}
		return text.Relief(w, r, text.Options{Markdown: f.format == "markdown"})
	})
}

// writeRelief writes the job with its relief; nothing where there is none.
func (a *app) writeRelief(f *reliefFlags, r *review.ReliefReport) error {
	switch {
	case f.out == "":
		return nil
	case len(r.Changes) == 0:
		a.say("no relief to write; %s was not made", f.out)
		return nil
	}
	if err := r.Subject.Job.WriteAmended(f.out, r.Amendments(), job.WriteOptions{Force: f.force, ReturnPeriod: f.storm}); err != nil {
		return err
	}
	a.say("wrote the job folder %s", f.out)
	if !r.Complete() {
		a.say("it is not relieved whole: limits are still broken in a system for which nothing was found")
	}
	return nil
}
