package main

import (
	"github.com/spf13/cobra"

	"rimfall/network/analysis"
)

// checkCommand runs the pipes of a job as they are.
func (a *app) checkCommand() *cobra.Command {
	var p printing
	cmd := &cobra.Command{
		Use:   "check JOB",
		Short: "Run the pipes of a job as they are",
		Long: `check runs the design storm, and the check storm where there is one, through the
pipes of a job as they are given, and prints flows, capacities, depths, velocities,
cover, hydraulic and energy grade lines and findings. Every pipe needs a size and a
slope; ` + "`rimfall size`" + ` chooses what is blank.

The grade lines run from the outfalls up. How a pipe then runs is one word:
  dry                  no flow
  part-full            a free surface from end to end
  full                 full from end to end
  partly-full-length   full over a part of the length
  jump                 a hydraulic jump stands in the pipe; below it the pipe may run full
A pipe without inverts, or above one, has no grade line; its word then says how it
would run by itself.`,
		Example: "  rimfall check orchard-rise-sized\n  rimfall check JOB --format json --storm 25\n  rimfall check JOB --table findings --strict",
		Args:    oneJob,
		RunE: func(cmd *cobra.Command, args []string) error {
			if err := p.judge(cmd); err != nil {
				return err
			}
			r, err := a.runJob(args[0], analysis.Options{ReturnPeriod: p.storm})
			if err != nil {
				return err
			}
			a.strictly(r, &p)
			return a.print(r, &p)
		},
	}
	p.addTo(cmd)
	return cmd
}

// runJob reads and runs a job folder, and tells how far it is where that takes long.
func (a *app) runJob(dir string, o analysis.Options) (*analysis.Result, error) {
	done := a.progress("reading " + dir)
	j, err := analysis.Read(dir, o)
	done()
	if err != nil {
		return nil, err
	}
	done = a.progress("running " + dir)
	defer done()
	return analysis.Run(j, o)
}
