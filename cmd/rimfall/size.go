package main

import (
	"github.com/spf13/cobra"

	"rimfall/network/analysis"
	"rimfall/network/job"
)

// sizeCommand chooses what is blank.
func (a *app) sizeCommand() *cobra.Command {
	var p printing
	var out string
	var force bool
	cmd := &cobra.Command{
		Use:   "size JOB",
		Short: "Choose the sizes, slopes and inverts that are blank",
		Long: `size chooses what is blank in pipes.csv: the smallest listed size that carries the
peak, the slope and the inverts under the criteria of the job. Whatever is given is
kept. With --out the result is written as a complete new job folder, in which
` + "`rimfall check`" + ` finds the same numbers.`,
		Example: "  rimfall size examples/orchard-rise\n  rimfall size examples/orchard-rise --out orchard-rise-sized\n  rimfall size JOB --format csv --table pipes > pipes-sized.csv",
		Args:    oneJob,
		RunE: func(cmd *cobra.Command, args []string) error {
			if err := p.judge(cmd); err != nil {
				return err
			}
			r, err := a.runJob(args[0], analysis.Options{Size: true, ReturnPeriod: p.storm})
			if err != nil {
				return err
			}
			if out != "" {
				if err := r.Job.Write(out, r.Network, job.WriteOptions{Force: force, ReturnPeriod: p.storm}); err != nil {
					return err
				}
				a.say("wrote the job folder %s", out)
				for _, shared := range r.Job.SharedFiles() {
					a.say("it holds a copy of %s, which the job shares with others", shared)
				}
			}
			a.strictly(r, &p)
			return a.print(r, &p)
		},
	}
	p.addTo(cmd)
	cmd.Flags().StringVar(&out, "out", "", "write a complete new job folder `DIR`")
	cmd.Flags().BoolVar(&force, "force", false, "replace the folder of --out where it exists")
	return cmd
}
