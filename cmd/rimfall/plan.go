package main

import (
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/report/drawing"
)

// planCommand draws the plan.
func (a *app) planCommand() *cobra.Command {
	var d drawingFlags
	cmd := &cobra.Command{
		Use:   "plan JOB",
		Short: "Draw the plan with sizes, flow directions and findings",
		Long: `plan draws the network from the coordinates of structures.csv: pipes the wider the
larger they are, arrows the way the water runs, structures by kind, their ids and
those of the pipes with their sizes, and a numbered mark beside whatever an error or
a warning is about, with a list. Structures without coordinates are left out with
their pipes, and named.`,
		Example: "  rimfall plan examples/orchard-rise --size > plan.svg\n  rimfall plan JOB --out plan.svg --paper a1\n  rimfall plan JOB --out plan.pdf",
		Args:    oneJob,
		RunE: func(cmd *cobra.Command, args []string) error {
			r, paper, err := d.run(a, cmd, args[0])
			if err != nil {
				return err
			}
			sheet, notes, err := drawing.Plan(r, drawing.PlanOptions{Paper: paper, Scale: d.scale})
			if err != nil {
				return err
			}
			if k := len(notes.NoCoordinates); k > 0 {
				a.say("left out, having no coordinates, with their pipes: %s", strings.Join(notes.NoCoordinates, ", "))
			}
			if notes.NoRoom > 0 {
				a.say("%d labels have no room at this scale; --paper names larger paper", notes.NoRoom)
			}
			return d.draw(a, []drawing.Sheet{sheet})
		},
	}
	d.addTo(cmd)
	return cmd
}
