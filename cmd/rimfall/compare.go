package main

import (
	"bufio"
	"errors"
	"fmt"
	"slices"
	"strings"
	"sync"

	"github.com/spf13/cobra"

	"rimfall/network/analysis"
	"rimfall/network/fault"
	"rimfall/network/report/data"
	"rimfall/network/report/text"
	"rimfall/network/review"
)

var compareFormats = []string{"table", "markdown", "json"}

// compareCommand sets two jobs side by side.
func (a *app) compareCommand() *cobra.Command {
	var format string
	var o analysis.Options
	var strict bool
	cmd := &cobra.Command{
		Use:   "compare BEFORE AFTER",
		Short: "Set two jobs side by side: what changed, what became worse, what is cured",
		Long: `compare runs two jobs, or two revisions of one design, and prints what was added,
changed and removed, what that does to flows, depths and grade lines, and which
findings are new, worse or cured. Pipes, structures and areas are known by their ids.

With --strict the exit status is 1 where an error or a warning that no departure
accepts is new, or misses its limit by more than before.`,
		Example: "  rimfall compare trunk trunk-with-development\n  rimfall compare revision-a revision-b --format markdown > review.md\n  rimfall compare BEFORE AFTER --storm 25 --strict",
		Args: func(cmd *cobra.Command, args []string) error {
			if len(args) != 2 {
				return usageError{"name two job folders, the one before and the one after; see `" + cmd.CommandPath() + " --help`"}
			}
			return errors.Join(oneJob(cmd, args[:1]), oneJob(cmd, args[1:]))
		},
		RunE: func(cmd *cobra.Command, args []string) error {
			if !slices.Contains(compareFormats, format) {
				return usageError{fmt.Sprintf("--format %s: write one of %s", format, strings.Join(compareFormats, ", "))}
			}
			if cmd.Flags().Changed("storm") && !(o.ReturnPeriod > 0) {
				return usageError{"--storm takes a return period in years, over 0"}
			}
			c, err := a.compare(args[0], args[1], o)
			if err != nil {
				return err
			}
			a.broken = strict && c.Worse()
			return a.write(func(w *bufio.Writer) error {
				if format == "json" {
					return data.CompareJSON(w, c)
				}
				return text.Compare(w, c, format == "markdown")
			})
		},
	}
	f := cmd.Flags()
	f.StringVar(&format, "format", "table", "how to print: "+strings.Join(compareFormats, ", "))
	f.Float64Var(&o.ReturnPeriod, "storm", 0, "design storm in `years`, in place of each job's")
	f.BoolVar(&o.Size, "size", false, "choose what is blank first, as the command size does")
	f.BoolVar(&strict, "strict", false, "exit with status 1 where something became worse")
	complete(cmd, "format", compareFormats)
	return cmd
}

// compare reads and runs both jobs at the same time. The faults of both are told.
func (a *app) compare(before, after string, o analysis.Options) (*review.Comparison, error) {
	done := a.progress("running " + before + " and " + after)
	defer done()
	var results [2]*analysis.Result
	var failed [2]error
	var both sync.WaitGroup
	for i, dir := range []string{before, after} {
		both.Go(func() {
			j, err := analysis.Read(dir, o)
			if err == nil {
				results[i], err = analysis.Run(j, o)
			}
			failed[i] = err
		})
	}
	both.Wait()
	if err := bothFailed(failed[0], failed[1]); err != nil {
		return nil, err
	}
	return review.Compare(results[0], results[1])
}

// bothFailed joins two errors, the faults of both in one list.
func bothFailed(before, after error) error {
	var b, a fault.List
	if errors.As(before, &b) && errors.As(after, &a) {
		return append(b, a...).Err()
	}
	if before != nil {
		return before
	}
	return after
}
