package main

import (
	"bufio"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/analysis"
	"rimfall/network/report/data"
	"rimfall/network/report/text"
)

// The formats and tables of the commands that print a run.
var (
	formats = []string{"table", "markdown", "csv", "json"}
	tables  = []string{"pipes", "structures", "findings", "areas"}
)

// say writes one line to standard error, where every word about a result goes.
func (a *app) say(format string, args ...any) {
	fmt.Fprintf(a.err, format+"\n", args...)
}

// printing are the flags of a command that prints a run.
type printing struct {
	format, table string
	storm         float64
	strict        bool
}

// addTo defines the flags.
func (p *printing) addTo(cmd *cobra.Command) {
	f := cmd.Flags()
	f.StringVar(&p.format, "format", "table", "how to print: "+strings.Join(formats, ", "))
	f.StringVar(&p.table, "table", "", "print one table only: "+strings.Join(tables, ", "))
	f.Float64Var(&p.storm, "storm", 0, "design storm in `years`, in place of the job's")
	f.BoolVar(&p.strict, "strict", false, "exit with status 1 where a finding of severity error stands that no departure accepts")
	complete(cmd, "format", formats)
	complete(cmd, "table", tables)
}

// complete offers the words of a flag to the shell.
func complete(cmd *cobra.Command, flag string, words []string) {
	err := cmd.RegisterFlagCompletionFunc(flag, cobra.FixedCompletions(words, cobra.ShellCompDirectiveNoFileComp))
	if err != nil {
		panic(err) // a flag that was not defined
	}
}

// judge checks the words of the flags.
func (p *printing) judge(cmd *cobra.Command) error {
	if !slices.Contains(formats, p.format) {
		return usageError{fmt.Sprintf("--format %s: write one of %s", p.format, strings.Join(formats, ", "))}
	}
	if p.table != "" && !slices.Contains(tables, p.table) {
		return usageError{fmt.Sprintf("--table %s: write one of %s", p.table, strings.Join(tables, ", "))}
	}
	if cmd.Flags().Changed("storm") && !(p.storm > 0) {
		return usageError{"--storm takes a return period in years, over 0"}
	}
	return nil
}

// print writes a run in the format asked for.
func (a *app) print(r *analysis.Result, p *printing) error {
	w := bufio.NewWriterSize(a.out, 1<<16)
	var err error
	switch p.format {
	case "json":
		err = data.JSON(w, r, p.table)
	case "csv":
		err = data.CSV(w, r, p.table)
	default:
		err = text.Run(w, r, text.Options{Markdown: p.format == "markdown", Table: p.table})
	}
	if err == nil {
		err = w.Flush()
	}
	return err
}

// strictly notes whether --strict has to fail.
func (a *app) strictly(r *analysis.Result, p *printing) {
	if !p.strict {
		return
	}
	for i := range r.Findings {
		if r.Findings[i].Breaks() {
			a.broken = true
			return
		}
	}
}
