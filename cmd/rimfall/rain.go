package main

import (
	"bufio"
	"bytes"
	"fmt"
	"os"
	"path/filepath"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/hydrology"
	"rimfall/hydrology/fit"
	"rimfall/hydrology/rainfile"
	"rimfall/network/analysis"
	"rimfall/network/job"
	"rimfall/network/rain"
	"rimfall/network/report/data"
	"rimfall/network/report/drawing"
	"rimfall/network/report/text"
)

// rainFlags are the flags of the command rain.
type rainFlags struct {
	format, bound, unit, method, plot, out string
	periods                                []float64
	fit, force                             bool
}

// The words of --method, in the order of fit.Methods, and of --bound, in that of the bounds.
var (
	maximaMethods = []string{"gumbel-moments", "gumbel-l-moments", "gev", "log-pearson-3"}
	rainBounds    = []string{"estimate", "upper", "lower"}
	rainUnits     = []string{"in/h", "mm/h"}
)

// rainCommand shows a rainfall file.
func (a *app) rainCommand() *cobra.Command {
	var f rainFlags
	cmd := &cobra.Command{
		Use:   "rain FILE... | JOB",
		Short: "Show a rainfall file: its table, the equations that fit it, its curves",
		Long: `rain reads a rainfall file, recognised by its content, and prints its table of intensities:
  a point file of NOAA Atlas 14, as the server sends it or as a spreadsheet saved it;
  a short-duration text of Environment and Climate Change Canada;
  a table of one's own, headed duration (min) and return periods (years);
  a list of annual maxima, headed year and durations (min), depths in inches or mm.
An estimate and its bounds in files of their own are named together. Of a job folder the rainfall
of the job is shown, in its unit and before uplift; an equation at the usual durations.

--fit fits the usual equations to the table by least squares, with the error of each at each
duration; of annual maxima it fits four distributions, with confidence limits and goodness of fit.
--out writes a table that a job can use.`,
		Example: `  rimfall rain rainfall.csv
  rimfall rain atlas14.csv --fit --plot curves.svg
  rimfall rain estimate.csv upper.csv lower.csv --bound upper
  rimfall rain maxima.csv --unit mm/h --method gev --out job/rainfall.csv`,
		RunE: func(_ *cobra.Command, args []string) error { return a.rain(args, &f) },
	}
	fl := cmd.Flags()
	fl.StringVar(&f.format, "format", "table", "how to print: "+strings.Join(formats, ", "))
	fl.StringVar(&f.bound, "bound", rainBounds[0], "which table: "+strings.Join(rainBounds, ", "))
	fl.StringVar(&f.unit, "unit", "", "`UNIT` of a file that does not state it: in/h, mm/h; else that of the job.toml beside it, else in/h")
	fl.BoolVar(&f.fit, "fit", false, "fit equations to the table, and distributions to annual maxima")
	fl.StringVar(&f.method, "method", maximaMethods[0], "distribution by which annual maxima become a table: "+strings.Join(maximaMethods, ", "))
	fl.Float64SliceVar(&f.periods, "periods", rain.UsualPeriods, "return periods of what is made of annual maxima, `YEARS`")
	fl.StringVar(&f.plot, "plot", "", "draw the curves into `FILE.svg`")
	fl.StringVar(&f.out, "out", "", "write the table as a job reads it into `FILE.csv`")
	fl.BoolVar(&f.force, "force", false, "replace the files of --plot and --out where they exist")
	complete(cmd, "format", formats)
	complete(cmd, "bound", rainBounds)
	complete(cmd, "method", maximaMethods)
	complete(cmd, "unit", rainUnits)
	return cmd
}

// options judges the words of the flags.
func (f *rainFlags) options() (o rain.Options, err error) {
	for _, w := range []struct {
		flag, word string
		words      []string
	}{{"format", f.format, formats}, {"bound", f.bound, rainBounds}, {"method", f.method, maximaMethods}} {
		if !slices.Contains(w.words, w.word) {
			return o, usageError{fmt.Sprintf("--%s %s: write one of %s", w.flag, w.word, strings.Join(w.words, ", "))}
		}
	}
	if f.unit != "" && !slices.Contains(rainUnits, f.unit) {
		return o, usageError{"--unit " + f.unit + ": write in/h or mm/h"}
	}
	for _, p := range f.periods {
		if !(p > 1 && p <= 1e6) {
			return o, usageError{fmt.Sprintf("--periods %g: annual maxima take return periods over 1 year", p)}
		}
	}
	slices.Sort(f.periods)
	return rain.Options{
		Unit: hydrology.IntensityUnit(f.unit), Bound: rainfile.Bound(slices.Index(rainBounds, f.bound)), Fit: f.fit,
		Method: fit.Method(slices.Index(maximaMethods, f.method)), Periods: slices.Compact(f.periods),
	}, nil
}

// rain reads, prints, writes and draws.
func (a *app) rain(names []string, f *rainFlags) error {
	o, err := f.options()
	if err != nil {
		return err
	}
	if f.fit && f.format == "csv" {
		return usageError{"--fit prints as table, markdown or json; csv holds the table of intensities alone"}
	}
	s, err := a.readRain(names, o)
	if err != nil {
		return err
	}
	if err := a.writeRain(s, f); err != nil {
		return err
	}
	return a.write(func(w *bufio.Writer) error {
		switch f.format {
		case "json":
			return data.RainJSON(w, s)
		case "csv":
			return data.RainCSV(w, s)
		}
		return text.Rain(w, s, f.format == "markdown")
	})
}

// readRain reads the files named, or the rainfall of the job whose folder is named.
func (a *app) readRain(names []string, o rain.Options) (*rain.Source, error) {
	if len(names) == 0 {
		return nil, usageError{"name a rainfall file, or a job folder; see `rimfall rain --help`"}
	}
	if info, err := os.Stat(names[0]); len(names) == 1 && err == nil && info.IsDir() {
		if o.Bound != rainfile.Estimate {
			return nil, usageError{"a job names the bound that it runs on, in [storm] bound; --bound is for a file"}
		}
		return rainOfJob(names[0], o)
	}
	contents, err := readContents(names)
	if err != nil {
		return nil, err
	}
	if o.Unit == "" {
		o.Unit = unitBeside(names[0])
	}
	return rain.Read(contents, o)
}

// rainOfJob is the rainfall that a job runs on, before uplift: its table, or its equation at the usual durations.
func rainOfJob(dir string, o rain.Options) (*rain.Source, error) {
	j, err := analysis.Read(dir, analysis.Options{Size: true})
	if err != nil {
		return nil, err
	}
	table, err := j.RainTable()
	if err != nil {
		return nil, err
	}
	unit := hydrology.IntensityUnit(j.Settings.Units.Intensity)
	described := j.Rain.Describe()
	if described == "" {
		described = fmt.Sprintf("%s · %s series · %s", j.Rain.File, j.Rain.Series, unit)
	}
	source := rain.OfTable(table, unit, j.Rain.Series, j.Rain.Place, described, o)
	source.Bound = j.Rain.Bound
	return source, nil
}

// writeRain writes the files that --out and --plot ask for.
func (a *app) writeRain(s *rain.Source, f *rainFlags) error {
	var files []outputFile
	if f.out != "" {
		var b bytes.Buffer
		if err := s.WriteTable(&b); err != nil {
			return err
		}
		files = append(files, outputFile{f.out, b.Bytes()})
	}
	if f.plot != "" {
		files = append(files, outputFile{f.plot, drawing.RainCurves(s).Bytes()})
	}
	return a.writeFiles(files, f.force)
}

// readContents reads the files named.
func readContents(names []string) ([]rain.Content, error) {
	var all []rain.Content
	for _, name := range names {
		content, err := os.ReadFile(name)
		if info, bad := os.Stat(name); bad == nil && info.IsDir() {
			return nil, usageError{name + " is a folder; name its rainfall file"}
		}
		if os.IsNotExist(err) {
			return nil, usageError{name + ": no such file"}
		}
		if err != nil {
			return nil, err
		}
		all = append(all, rain.Content{Name: name, Text: content})
	}
	return all, nil
}

// unitBeside is the unit of intensities of the job in whose folder a file lies, else in/h.
func unitBeside(name string) hydrology.IntensityUnit {
	if u, ok := job.UnitsOf(filepath.Dir(name)); ok {
		return hydrology.IntensityUnit(u.Intensity)
	}
	return hydrology.InchesPerHour
}
