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

var scheduleFormats = []string{"table", "markdown", "csv"}

// scheduleCommand prints the schedules of a plan set.
func (a *app) scheduleCommand() *cobra.Command {
	var format, table string
	var size bool
	cmd := &cobra.Command{
		Use:   "schedule JOB",
		Short: "Print the pipe schedule, the structure schedule and the quantities",
		Long: `schedule prints what a plan set's tables hold: the pipe schedule with sizes, levels,
design flow, capacity, velocities and remarks; the structure schedule with the
inverts of every pipe; lengths by size and material, structures by kind and height.`,
		Example: "  rimfall schedule orchard-rise-sized --format markdown > schedule.md\n  rimfall schedule examples/orchard-rise --size\n  rimfall schedule JOB --format csv --table quantities",
		Args:    oneJob,
		RunE: func(_ *cobra.Command, args []string) error {
			if !slices.Contains(scheduleFormats, format) {
				return usageError{fmt.Sprintf("--format %s: write one of %s", format, strings.Join(scheduleFormats, ", "))}
			}
			if table != "" && !slices.Contains(text.ScheduleTables, table) {
				return usageError{fmt.Sprintf("--table %s: write one of %s", table, strings.Join(text.ScheduleTables, ", "))}
			}
			r, err := a.runJob(args[0], analysis.Options{Size: size})
			if err != nil {
				return err
			}
			w := bufio.NewWriter(a.out)
			if format == "csv" {
				err = data.ScheduleCSV(w, r, table)
			} else {
				err = text.Schedule(w, r, text.Options{Markdown: format == "markdown", Table: table})
			}
			if err != nil {
				return err
			}
			return w.Flush()
		},
	}
	f := cmd.Flags()
	f.StringVar(&format, "format", "table", "how to print: "+strings.Join(scheduleFormats, ", ")+" (one table, the pipes, unless --table names another)")
	f.StringVar(&table, "table", "", "print one table only: "+strings.Join(text.ScheduleTables, ", "))
	f.BoolVar(&size, "size", false, "choose what is blank first, as the command size does")
	complete(cmd, "format", scheduleFormats)
	complete(cmd, "table", text.ScheduleTables)
	return cmd
}
