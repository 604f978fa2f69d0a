package main

import (
	"bufio"
	"fmt"
	"os"
	"slices"
	"strings"

	"github.com/spf13/cobra"
	"github.com/spf13/pflag"

	"rimfall/network/calculator"
	"rimfall/network/job"
	"rimfall/network/report"
	"rimfall/network/report/data"
	"rimfall/network/report/text"
	"rimfall/network/units"
)

// manningFlags are the flags of the calculator.
type manningFlags struct {
	given               calculator.Given
	ground, format, svg string
	table, force        bool
}

// manningCommand answers one question of uniform flow.
func (a *app) manningCommand() *cobra.Command {
	var m manningFlags
	cmd := &cobra.Command{
		Use:   "manning",
		Short: "Solve Manning's equation for whatever is left out",
		Long: `manning finds what is left out. With section, n and slope given, one of depth, flow and
velocity gives the other two; with one of section, n and slope left out, two of depth, flow and
velocity give it. The working is printed in the order of a hand calculation, then the answer: both
where there are two, and why where there is none.

Dimensions of the shapes:
  circle                        --size 24
  box                           --size '8ft x 6ft', with filled corners --haunch 8
  ellipse, ellipse-upright      --size 60x38 (span x rise)
  arch, pipe-arch               --size 43.75x26.625, a listed size, for its radii
  trapezoid                     --bottom 4 --side 3 (horizontal for 1 vertical; --side-right where it differs)
  rectangle, triangle           --bottom 4; --side 3
  parabola                      --size 12x3 (top width x depth)
  ground                        --ground FILE.csv (station, elevation and, where it changes, n)

Sizes are in inches or millimetres, depths and widths in feet or metres, flows in cfs or m³/s;
another unit is written behind the number: 48in, 300mm, 40L/s, 900gpm, 0.5%. A depth may be
a share of the rise, 0.8D, or full. With the size left out, the next listed size is chosen;
without a depth it is one that runs full.

One value may be a list: --depth 0.1D:0.9D:0.1D (from:to:step), --size 18,24,30.`,
		Example: `  rimfall manning --size 24 --slope 0.005 --n 0.013 --flow 12
  rimfall manning --slope 0.5% --n 0.013 --flow 12
  rimfall manning --shape trapezoid --bottom 4 --side 3 --n 0.03 --slope 0.002 --depth 1.5
  rimfall manning --units si --size 600 --slope 0.004 --material concrete --depth full
  rimfall manning --size 36 --table --plot elements.svg`,
		Args: cobra.NoArgs,
		RunE: func(_ *cobra.Command, _ []string) error { return a.manning(&m) },
	}
	m.addTo(cmd.Flags())
	complete(cmd, "shape", calculator.Shapes())
	complete(cmd, "format", formats)
	complete(cmd, "units", []string{units.US.Name, units.SI.Name})
	complete(cmd, "material", materialWords())
	complete(cmd, "composite", []string{calculator.Horton, calculator.Lotter})
	return cmd
}

// addTo defines the flags.
func (m *manningFlags) addTo(f *pflag.FlagSet) {
	g := &m.given
	f.SortFlags = false
	f.StringVar(&g.Shape, "shape", "", "`SHAPE`, circle unless a ground line is given: "+strings.Join(calculator.Shapes(), ", "))
	f.StringVar(&g.Size, "size", "", "diameter, or span x rise: `SIZE`")
	f.StringVar(&g.Haunch, "haunch", "", "leg of the filled corners of a box: `SIZE`")
	f.StringVar(&g.Bottom, "bottom", "", "bottom `WIDTH` of a channel")
	f.StringVar(&g.Side, "side", "", "side slope of a channel: its `RUN` for a rise of 1")
	f.StringVar(&g.SideRight, "side-right", "", "`RUN` of the right side, where it differs from the left")
	f.StringVar(&m.ground, "ground", "", "cross-section from a CSV `FILE`: station, elevation, n up to the next point")
	f.StringVar(&g.N, "n", "", "roughness `N`")
	f.StringVar(&g.Material, "material", "", "pipe material `NAME`: gives n and the list of sizes, see rimfall sizes --materials")
	f.StringVar(&g.Slope, "slope", "", "`SLOPE` as rise over run, or percent with a % sign")
	f.StringVar(&g.Depth, "depth", "", "`DEPTH`, a share of the rise as 0.8D, or full")
	f.StringVar(&g.Flow, "flow", "", "`FLOW`")
	f.StringVar(&g.Velocity, "velocity", "", "mean `VELOCITY`")
	f.BoolVar(&g.VaryingN, "varying-n", false, "let n of a pipe vary with depth")
	f.StringVar(&g.Composite, "composite", "", "`RULE` by which the n of a ground line are joined: horton (default), lotter")
	f.BoolVar(&m.table, "table", false, "print the rating of the section: what it holds and carries at each depth")
	f.StringVar(&m.svg, "plot", "", "draw section, water line and hydraulic elements into `FILE.svg`")
	f.BoolVar(&m.force, "force", false, "replace the file of --plot where it exists")
	f.StringVar(&g.Units, "units", units.US.Name, "system of units: us, si")
	f.StringVar(&m.format, "format", "table", "how to print: "+strings.Join(formats, ", "))
}

// manning reads, asks, prints and draws.
func (a *app) manning(m *manningFlags) error {
	if !slices.Contains(formats, m.format) {
		return usageError{fmt.Sprintf("--format %s: write one of %s", m.format, strings.Join(formats, ", "))}
	}
	if err := m.readGround(); err != nil {
		return err
	}
	s, err := calculator.Read(m.given)
	if err != nil {
		return err
	}
	if m.table {
		return a.rating(m, s)
	}
	if s.Listed != "" {
		return a.answers(m, s)
	}
	answer, err := calculator.Ask(s.Questions[0])
	if err != nil {
		return err
	}
	if err := a.plotAnswer(m, answer); err != nil {
		return err
	}
	return a.write(func(w *bufio.Writer) error {
		switch m.format {
		case "json":
			return data.AnswerJSON(w, answer)
		case "csv":
			return data.AnswersCSV(w, "", []report.AnswerRow{{Answer: answer}})
		}
		return text.Answer(w, answer, m.format == "markdown")
	})
}

// readGround reads the ground line where one is given.
func (m *manningFlags) readGround() error {
	if m.ground == "" {
		return nil
	}
	content, err := os.ReadFile(m.ground)
	if os.IsNotExist(err) {
		return usageError{m.ground + ": no such file; --ground takes a CSV file of station, elevation, n"}
	}
	if err != nil {
		return err
	}
	m.given.Points, err = job.ReadGroundLine(m.ground, content)
	return err
}

// answers answers the questions of a list. Where none has an answer, the first reason
// is the error.
func (a *app) answers(m *manningFlags, s calculator.Series) error {
	if m.svg != "" {
		return usageError{"--plot draws one answer, not a list: give one value of " + s.Listed}
	}
	rows := make([]report.AnswerRow, len(s.Questions))
	var first error
	found := false
	for i, q := range s.Questions {
		answer, err := calculator.Ask(q)
		rows[i] = report.AnswerRow{Answer: answer, Given: s.Values[i]}
		if err != nil {
			rows[i].Why = err.Error()
			if first == nil {
				first = err
			}
			continue
		}
		found = true
	}
	if !found {
		return first
	}
	return a.write(func(w *bufio.Writer) error {
		switch m.format {
		case "json":
			return data.AnswersJSON(w, s.Listed, rows)
		case "csv":
			return data.AnswersCSV(w, s.Listed, rows)
		}
		return text.Answers(w, s.Listed, rows, s.Questions[0].Units, m.format == "markdown")
	})
}

// rating prints the table of a section.
func (a *app) rating(m *manningFlags, s calculator.Series) error {
	r, err := calculator.Rate(s)
	if err != nil {
		return err
	}
	if err := a.plotRating(m, r); err != nil {
		return err
	}
	return a.write(func(w *bufio.Writer) error {
		switch m.format {
		case "json":
			return data.RatingJSON(w, r)
		case "csv":
			return data.RatingCSV(w, r)
		}
		return text.Rating(w, r, m.format == "markdown")
	})
}

// write prints through a buffer.
func (a *app) write(print func(w *bufio.Writer) error) error {
	w := bufio.NewWriter(a.out)
	if err := print(w); err != nil {
		return err
	}
	return w.Flush()
}
