package main

import (
	"bufio"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/report/data"
	"rimfall/network/report/text"
	"rimfall/network/review"
)

// headroomFlags are the flags of the question how much more can be connected.
type headroomFlags struct {
	reviewPrinting
	at      string
	limits  []string
	c, time float64
	storm   float64
}

// headroomCommand finds how much more may be connected where.
func (a *app) headroomCommand() *cobra.Command {
	var h headroomFlags
	cmd := &cobra.Command{
		Use:   "headroom JOB",
		Short: "Find how much more area or flow each structure can take",
		Long: `headroom adds an area, or a steady flow in its place, at each structure until the first
limit breaks anywhere in its system, upstream and aside too, and names the pipe or rim
that governs. Times, intensities and grade lines are computed anew for every amount
tried. The amount is the largest such that every smaller one holds.

Peaks are by partial area, whatever the job says: in every pipe the larger of the peak
at the longest time and any at a shorter one; else a slow area that is added would
lower the flows below it. What is broken already is listed and set aside.

  capacity    flow not over full-bore capacity     rule capacity
  crown       grade line not over the crown        rule surcharge
  freeboard   the freeboard asked for is kept      rule freeboard
  rim         grade line not over the rim          rule flooding`,
		Example: "  rimfall headroom JOB\n  rimfall headroom JOB --at M12 --c 0.7 --time 12\n  rimfall headroom JOB --limit capacity --format json",
		Args:    oneJob,
		RunE:    func(cmd *cobra.Command, args []string) error { return a.headroom(&h, cmd, args[0]) },
	}
	h.addTo(cmd)
	f := cmd.Flags()
	f.StringVar(&h.at, "at", "", "one structure only, by its `id`")
	f.StringSliceVar(&h.limits, "limit", nil, "what may not break: "+strings.Join(review.Limits, ", ")+" (several with commas; all of them unless it is given)")
	f.Float64Var(&h.c, "c", review.DefaultC, "runoff coefficient of the area")
	f.Float64Var(&h.time, "time", review.DefaultTime, "inlet time of the area, `minutes`")
	f.Float64Var(&h.storm, "storm", 0, "design storm in `years`, in place of the job's")
	complete(cmd, "limit", review.Limits)
	return cmd
}

// options reads the flags.
func (h *headroomFlags) options(cmd *cobra.Command) (review.HeadroomOptions, error) {
	o := review.HeadroomOptions{At: h.at, C: h.c, Time: h.time}
	for _, word := range h.limits {
		i := slices.Index(review.Limits, word)
		if i < 0 {
			return o, usageError{fmt.Sprintf("--limit %s: write one of %s", word, strings.Join(review.Limits, ", "))}
		}
		o.Limits = append(o.Limits, review.LimitKind(i))
	}
	slices.Sort(o.Limits)
	o.Limits = slices.Compact(o.Limits)
	switch {
	case !(h.c > 0 && h.c <= 1):
		return o, usageError{"--c takes a runoff coefficient over 0, at most 1"}
	case !(h.time > 0 && h.time <= 1e6):
		return o, usageError{"--time takes an inlet time in minutes, over 0"}
	case cmd.Flags().Changed("storm") && !(h.storm > 0):
		return o, usageError{"--storm takes a return period in years, over 0"}
	}
	return o, h.judge()
}

func (a *app) headroom(h *headroomFlags, cmd *cobra.Command, dir string) error {
	o, err := h.options(cmd)
	if err != nil {
		return err
	}
	subject, err := a.subject(dir, h.storm)
	if err != nil {
		return err
	}
	done := a.progress("adding to the structures of " + dir)
	found, err := subject.FindHeadroom(o)
	done()
	if err != nil {
		return err
	}
	r := &review.HeadroomReport{Subject: subject, Headroom: found}
	return a.write(func(w *bufio.Writer) error {
		switch h.format {
		case "json":
			return data.HeadroomJSON(w, r)
		case "csv":
			return data.HeadroomCSV(w, r)
		}
		return text.Headroom(w, r, text.Options{Markdown: h.format == "markdown"})
	})
}
