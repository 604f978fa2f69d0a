package main

import (
	"bufio"
	"fmt"
	"path/filepath"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/analysis"
	"rimfall/network/report/data"
	"rimfall/network/report/drawing"
	"rimfall/network/report/text"
	"rimfall/network/review"
)

// carriesFlags are the flags of the question which storms are carried.
type carriesFlags struct {
	reviewPrinting
	plan, by, paper string
	force           bool
}

// carriesCommand finds the largest storm that every place still carries.
func (a *app) carriesCommand() *cobra.Command {
	var c carriesFlags
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
as they are given. --plan draws a plan too, its pipes hatched the closer the less
they carry.`,
		Example: "  rimfall carries JOB\n  rimfall carries JOB --table structures --format markdown\n  rimfall carries JOB --plan carries.svg --plan-by crown",
		Args:    oneJob,
		RunE:    func(_ *cobra.Command, args []string) error { return a.carries(&c, args[0]) },
	}
	c.addTo(cmd, "pipes", "structures")
	f := cmd.Flags()
	f.StringVar(&c.plan, "plan", "", "draw a hatched plan into `FILE.svg` too")
	f.StringVar(&c.by, "plan-by", "capacity", "what the plan is hatched by: capacity, crown")
	f.StringVar(&c.paper, "paper", "", "size of its paper: "+strings.Join(paperNames(), ", "))
	f.BoolVar(&c.force, "force", false, "replace the file of --plan if it exists")
	complete(cmd, "plan-by", planLimits)
	complete(cmd, "paper", paperNames())
	return cmd
}

// planLimits are the limits of pipes, by which a plan is hatched.
var planLimits = []string{review.Capacity.String(), review.Crown.String()}

// judgePlan checks the flags.
func (c *carriesFlags) judgePlan() error {
	if c.plan != "" && !strings.EqualFold(filepath.Ext(c.plan), ".svg") {
		return usageError{"--plan takes the name of a file that ends in .svg"}
	}
	if !slices.Contains(planLimits, c.by) {
		return usageError{fmt.Sprintf("--plan-by %s: write one of %s", c.by, strings.Join(planLimits, ", "))}
	}
	return c.judge()
}

func (a *app) carries(f *carriesFlags, dir string) error {
	if err := f.judgePlan(); err != nil {
		return err
	}
	subject, err := a.subject(dir, 0)
	if err != nil {
		return err
	}
	done := a.progress("running storms through " + dir)
	found, err := subject.FindCarries(review.CarriesOptions{})
	done()
	if err != nil {
		return err
	}
	c := &review.CarriesReport{Subject: subject, Carries: found}
	if f.plan != "" {
		if err := a.carriesPlan(f, c); err != nil {
			return err
		}
	}
	return a.write(func(w *bufio.Writer) error {
		switch f.format {
		case "json":
			return data.CarriesJSON(w, c, f.table)
		case "csv":
			return data.CarriesCSV(w, c, f.table)
		}
		return text.Carries(w, c, text.Options{Markdown: f.format == "markdown", Table: f.table})
	})
}

// carriesPlan draws the hatched plan.
func (a *app) carriesPlan(f *carriesFlags, c *review.CarriesReport) error {
	paper, ok := drawing.PaperNamed(f.paper, c.Subject.Job.Settings.Units)
	if !ok {
		return usageError{fmt.Sprintf("--paper %s: write one of %s", f.paper, strings.Join(paperNames(), ", "))}
	}
	r, err := analysis.Run(c.Subject.Job, analysis.Options{})
	if err != nil {
		return err
	}
	h := drawing.Hatching{Title: "Plan of what the pipes carry", Lines: []string{"Hatched by the largest storm up to which the flow is under full-bore capacity"}}
	if f.by == review.Crown.String() {
		h.Lines[0] = "Hatched by the largest storm up to which the grade line is under the crown, upper end"
	}
	h.Classes, h.Class = c.CarriesClasses(review.LimitKind(slices.Index(review.Limits, f.by)), drawing.MostClasses)
	sheet, notes, err := drawing.HatchedPlan(r, h, drawing.PlanOptions{Paper: paper})
	if err != nil {
		return err
	}
	if k := len(notes.NoCoordinates); k > 0 {
		a.say("left out of the plan, having no coordinates, with their pipes: %s", strings.Join(notes.NoCoordinates, ", "))
	}
	return a.writeFiles([]outputFile{{f.plan, sheet.Page.Bytes()}}, f.force)
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
