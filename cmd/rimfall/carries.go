package main

import (
	"bufio"

	"github.com/spf13/cobra"

	"rimfall/network/analysis"
	"rimfall/network/report/data"
	"rimfall/network/report/text"
	"rimfall/network/review"
)

// carriesCommand finds the largest storm that every place still carries.
func (a *app) carriesCommand() *cobra.Command {
	var p reviewPrinting
	cmd := &cobra.Command{
		Use:   "carries JOB",
		Short: "Find the largest storm that every pipe and structure still carries",
		Long: `carries runs a network, its pipes as they are, with storms of the whole range of its
rainfall, and finds for every pipe up to which return period the flow stays under its
full-bore capacity and the grade line under its crown, and for every structure up to
which the freeboard is kept and the water stays under the rim. Between the columns of
the rainfall the network is run at interpolated intensities; no flow is interpolated.

A period is the largest up to which every smaller storm holds. From each head the
weakest place on the way to the outfall is named. Tailwaters and steady inflows stay
as they are given.`,
		Example: "  rimfall carries JOB\n  rimfall carries JOB --table structures --format markdown\n  rimfall carries JOB --format json",
		Args:    oneJob,
		RunE: func(_ *cobra.Command, args []string) error {
			if err := p.judge(); err != nil {
				return err
			}
			subject, err := a.subject(args[0], 0)
			if err != nil {
				return err
			}
			done := a.progress("running storms through " + args[0])
			found, err := subject.FindCarries(review.CarriesOptions{})
			done()
			if err != nil {
				return err
			}
			c := &review.CarriesReport{Subject: subject, Carries: found}
			return a.write(func(w *bufio.Writer) error {
				switch p.format {
				case "json":
					return data.CarriesJSON(w, c, p.table)
				case "csv":
					return data.CarriesCSV(w, c, p.table)
				}
				return text.Carries(w, c, text.Options{Markdown: p.format == "markdown", Table: p.table})
			})
		},
	}
	p.addTo(cmd, "pipes", "structures")
	return cmd
}

// subject reads a job to be asked questions.
func (a *app) subject(dir string, period float64) (*review.Subject, error) {
	done := a.progress("reading " + dir)
	j, err := analysis.Read(dir, analysis.Options{})
	done()
	if err != nil {
		return nil, err
	}
	return review.Of(j, period), nil
}
