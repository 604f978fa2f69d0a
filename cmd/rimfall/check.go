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
cover and findings. Every pipe needs a size and a slope; ` + "`rimfall size`" + ` chooses what is blank.

How a pipe runs at its design flow is one word:
  dry         no flow
  part-full   a free surface at normal depth
  full        the full area: over full-bore capacity, or the pipe does not fall`,
		Example: "  rimfall check examples/orchard-rise-sized\n  rimfall check JOB --format json --storm 25\n  rimfall check JOB --table findings --strict",
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
