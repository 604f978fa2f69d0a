package main

import (
	"bufio"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/analysis"
	"rimfall/network/report/page"
	"rimfall/network/report/text"
	"rimfall/network/review"
)

var explainFormats = []string{"text", "markdown", "html"}

// explainFlags are the flags of an explanation.
type explainFlags struct {
	format, kind string
	run          analysis.Options
}

// explainCommand writes the working of a pipe, a structure or an area.
func (a *app) explainCommand() *cobra.Command {
	var e explainFlags
	cmd := &cobra.Command{
		Use:   "explain JOB ID",
		Short: "Write the whole working of a pipe, a structure or an area, as by hand",
		Long: `explain writes how every number of a pipe, a structure or an area came about: each
formula in symbols with its source, then with numbers and units, then the result. The
printed numbers, worked out with the digits that are printed, give the printed result.

Sources are named by the keys of the list of references. Where a pipe and a structure
share an id both are explained; --kind names one.`,
		Example: "  rimfall explain examples/orchard-rise Q7 --size\n  rimfall explain JOB MH-4 --storm 25\n  rimfall explain JOB P3 --format html > p3.html",
		Args: func(cmd *cobra.Command, args []string) error {
			if len(args) != 2 {
				return usageError{"name a job folder and the id of a pipe, a structure or an area; see `" + cmd.CommandPath() + " --help`"}
			}
			return oneJob(cmd, args[:1])
		},
		RunE: func(cmd *cobra.Command, args []string) error {
			if cmd.Flags().Changed("storm") && !(e.run.ReturnPeriod > 0) {
				return usageError{"--storm takes a return period in years, over 0"}
			}
			return a.explain(args[0], args[1], &e)
		},
	}
	f := cmd.Flags()
	f.StringVar(&e.format, "format", "text", "how to print: "+strings.Join(explainFormats, ", "))
	f.StringVar(&e.kind, "kind", "", "what has the id: "+strings.Join(review.Kinds, ", "))
	f.Float64Var(&e.run.ReturnPeriod, "storm", 0, "design storm in `years`, in place of the job's")
	f.BoolVar(&e.run.Size, "size", false, "choose what is blank first, as the command size does")
	complete(cmd, "format", explainFormats)
	complete(cmd, "kind", review.Kinds)
	return cmd
}

// explain judges the flags, runs the job and prints.
func (a *app) explain(dir, id string, e *explainFlags) error {
	if !slices.Contains(explainFormats, e.format) {
		return usageError{fmt.Sprintf("--format %s: write one of %s", e.format, strings.Join(explainFormats, ", "))}
	}
	kinds, err := oneKind(e.kind)
	if err != nil {
		return err
	}
	r, err := a.runJob(dir, e.run)
	if err != nil {
		return err
	}
	pages, err := review.Explain(r, id, kinds...)
	if err != nil {
		return err
	}
	return a.write(func(w *bufio.Writer) error {
		if e.format == "html" {
			return page.Explain(w, r, pages)
		}
		return text.Explain(w, r, pages, e.format == "markdown")
	})
}

// oneKind is the kind that a word names; none where it is blank.
func oneKind(word string) ([]review.Kind, error) {
	if word == "" {
		return nil, nil
	}
	k := slices.Index(review.Kinds, word)
	if k < 0 {
		return nil, usageError{fmt.Sprintf("--kind %s: write one of %s", word, strings.Join(review.Kinds, ", "))}
	}
	return []review.Kind{review.Kind(k)}, nil
}
