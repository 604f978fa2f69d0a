package main

import (
	"slices"

	"github.com/spf13/cobra"

	"rimfall/network/job"
	"rimfall/network/units"
)

// newCommand writes a small job to start from.
func (a *app) newCommand() *cobra.Command {
	systems := []string{units.US.Name, units.SI.Name}
	var system string
	var surfaces bool
	cmd := &cobra.Command{
		Use:     "new DIR",
		Short:   "Start a job: a small one that runs, every column explained",
		Long:    "new writes a job folder with a small invented drain that runs as it stands. Every setting and\ncolumn is explained in comments; put your own structures, pipes, areas and rainfall in its place.",
		Example: "  rimfall new hillside\n  rimfall new quay --units si --surfaces\n  rimfall size hillside",
		Args: func(_ *cobra.Command, args []string) error {
			if len(args) != 1 {
				return usageError{"name the folder of the new job"}
			}
			return nil
		},
		RunE: func(_ *cobra.Command, args []string) error {
			if !slices.Contains(systems, system) {
				return usageError{"--units " + system + ": write us or si"}
			}
			write := job.WriteStarter
			if surfaces {
				write = job.WriteStarterWithSurfaces
			}
			if err := write(args[0], system); err != nil {
				return err
			}
			a.say("wrote the job folder %s; run it with `rimfall size %s`", args[0], args[0])
			return nil
		},
	}
	cmd.Flags().StringVar(&system, "units", units.US.Name, "system of units: us, si")
	cmd.Flags().BoolVar(&surfaces, "surfaces", false, "with surfaces.csv: published runoff coefficients, low, usual and high, to name in areas.csv")
	complete(cmd, "units", systems)
	return cmd
}
