package main

import (
	"errors"
	"fmt"
	"path/filepath"

	"github.com/spf13/cobra"

	"rimfall/network/fault"
	"rimfall/network/report/drawing"
)

// profileCommand draws profiles.
func (a *app) profileCommand() *cobra.Command {
	var d drawingFlags
	var from string
	var up float64
	cmd := &cobra.Command{
		Use:   "profile JOB",
		Short: "Draw profiles with their grade lines and tables of levels",
		Long: `profile draws a profile sheet for every line of the network, or for the way from one
structure to its outfall: ground, structures, pipes to scale with their walls, the
hydraulic and energy grade lines of both storms, jumps, crossing services, and under
it a table of levels. Line A is the longest way to the first outfall; the longest way up
each branch is a line of its own, so that every pipe is drawn once. A line that is too
long for one sheet goes on at a match line.

Ground between structures comes from ground.csv (pipe, station, elevation), crossing
services from crossings.csv (pipe, station, name, top, bottom), where the job has them;
their stations count along the pipe from its upper end.`,
		Example: "  rimfall profile examples/orchard-rise --size --from Q-1 > profile.svg\n  rimfall profile orchard-rise-sized --out profiles\n  rimfall profile JOB --scale 40 --vertical-scale 4 --out profiles.pdf",
		Args:    oneJob,
		RunE: func(cmd *cobra.Command, args []string) error {
			r, paper, err := d.run(a, cmd, args[0])
			if err != nil {
				return err
			}
			sheets, unknown, err := drawing.Profiles(r, drawing.ProfileOptions{Paper: paper, From: from, Along: d.scale, Up: up})
			var noSuch drawing.UnknownStructure
			if errors.As(err, &noSuch) {
				return fault.List{{File: filepath.Join(args[0], r.Job.Settings.Files["structures"]), Text: noSuch.Error()}}
			}
			if err != nil {
				return err
			}
			for _, name := range unknown {
				a.say("left out, since none of its levels is known: %s", name)
			}
			if len(sheets) == 0 {
				return fmt.Errorf("no level of the job is known, so there is no profile to draw; give inverts, or --size to choose them")
			}
			return d.draw(a, sheets)
		},
	}
	d.addTo(cmd)
	cmd.Flags().Float64Var(&up, "vertical-scale", 0, "upright scale: 4 for 1 in = 4 ft, 50 for 1:50 (default: the largest that fits)")
	cmd.Flags().StringVar(&from, "from", "", "draw the way from the structure `ID` to its outfall only")
	return cmd
}
