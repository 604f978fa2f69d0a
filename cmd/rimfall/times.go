package main

import (
	"bufio"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/hydrology"
	"rimfall/network/analysis"
	"rimfall/network/report/data"
	"rimfall/network/report/text"
)

// timesCommand shows where the times of a job come from.
func (a *app) timesCommand() *cobra.Command {
	var format, table string
	var storm float64
	var size bool
	cmd := &cobra.Command{
		Use:   "times JOB",
		Short: "Show every inlet time step by step, and which branch sets each structure's time",
		Long: `times prints the flow path of every area step by step, with the formula, the numbers and
the result, and how sheet flow settles on the storm's intensity; then for every structure the
longest time and the area, pipe or minimum that sets it, with the area at the head of that branch.

A flow path stands in paths.csv, a leg a row: area, order (1, 2, 3 … from the far end down), kind,
length, slope, surface or n, section. The kinds are:
` + legKinds() + `
The section of a pipe is its diameter, of a gutter "cross 0.02 spread 6", of a channel "radius 0.95",
"area 27 perimeter 28.2" or "bottom 4 depth 1.5 side 2". A surface gives n for sheet flow (by its name in
surfaces.csv or in a published list) and the cover for shallow flow.`,
		Example: "  rimfall times examples/orchard-rise --size\n  rimfall times JOB --storm 100\n  rimfall times JOB --table structures --format markdown",
		Args:    oneJob,
		RunE: func(cmd *cobra.Command, args []string) error {
			if !slices.Contains(formats, format) {
				return usageError{fmt.Sprintf("--format %s: write one of %s", format, strings.Join(formats, ", "))}
			}
			if table != "" && !slices.Contains(text.TimesTables, table) {
				return usageError{fmt.Sprintf("--table %s: write one of %s", table, strings.Join(text.TimesTables, ", "))}
			}
			if cmd.Flags().Changed("storm") && !(storm > 0) {
				return usageError{"--storm takes a return period in years, over 0"}
			}
			r, err := a.runJob(args[0], analysis.Options{Size: size, ReturnPeriod: storm})
			if err != nil {
				return err
			}
			return a.write(func(w *bufio.Writer) error {
				switch format {
				case "json":
					return data.TimesJSON(w, r, table)
				case "csv":
					return data.TimesCSV(w, r, table)
				}
				return text.Times(w, r, text.Options{Markdown: format == "markdown", Table: table})
			})
		},
	}
	f := cmd.Flags()
	f.StringVar(&format, "format", "table", "how to print: "+strings.Join(formats, ", ")+" (csv: one table, the areas, unless --table names the other)")
	f.StringVar(&table, "table", "", "print one table only: "+strings.Join(text.TimesTables, ", "))
	f.Float64Var(&storm, "storm", 0, "design storm in `years`, in place of the job's")
	f.BoolVar(&size, "size", false, "choose what is blank first, as the command size does")
	complete(cmd, "format", formats)
	complete(cmd, "table", text.TimesTables)
	return cmd
}

// legKinds lists the kinds of legs with what each is.
func legKinds() string {
	var b strings.Builder
	for _, m := range hydrology.Methods() {
		fmt.Fprintf(&b, "  %-17s %s\n", m.Kind, m.Title)
	}
	return b.String()
}
