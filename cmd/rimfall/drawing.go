package main

import (
	"fmt"
	"os"
	"path/filepath"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/analysis"
	"rimfall/network/job"
	"rimfall/network/report/drawing"
)

// drawingFlags are the flags of the commands that draw.
type drawingFlags struct {
	out, paper       string
	storm, scale     float64
	size, pdf, force bool
}

// addTo defines the flags.
func (d *drawingFlags) addTo(cmd *cobra.Command) {
	papers := paperNames()
	f := cmd.Flags()
	f.StringVar(&d.out, "out", "", "write to `FILE.svg`, or the sheets into a folder; without it a single sheet goes to standard output")
	f.StringVar(&d.paper, "paper", "", "size of the paper: "+strings.Join(papers, ", ")+" (default by the job's units: a3 or ansi-b)")
	f.Float64Var(&d.storm, "storm", 0, "design storm in `years`, in place of the job's")
	f.Float64Var(&d.scale, "scale", 0, "scale along the ground: 40 for 1 in = 40 ft, 500 for 1:500 (default: the largest that fits)")
	f.BoolVar(&d.size, "size", false, "choose first what is blank, as the command size does")
	f.BoolVar(&d.pdf, "pdf", false, "make PDF by Debian's rsvg-convert (package "+converterPackage+"); text stays text")
	f.BoolVar(&d.force, "force", false, "replace files of --out that exist")
	complete(cmd, "paper", papers)
}

func paperNames() []string {
	var names []string
	for _, p := range drawing.Papers {
		names = append(names, p.Name)
	}
	return names
}

// run runs the job that is to be drawn and finds the paper.
func (d *drawingFlags) run(a *app, cmd *cobra.Command, dir string) (*analysis.Result, drawing.Paper, error) {
	if cmd.Flags().Changed("storm") && !(d.storm > 0) {
		return nil, drawing.Paper{}, usageError{"--storm takes a return period in years, over 0"}
	}
	for _, name := range []string{"scale", "vertical-scale"} {
		if v, err := cmd.Flags().GetFloat64(name); err == nil && cmd.Flags().Changed(name) && !(v > 0) {
			return nil, drawing.Paper{}, usageError{"--" + name + " takes a number over 0: 40 for 1 in = 40 ft, 500 for 1:500"}
		}
	}
	d.pdf = d.pdf || strings.EqualFold(filepath.Ext(d.out), ".pdf")
	r, err := a.runJob(dir, analysis.Options{Size: d.size, ReturnPeriod: d.storm})
	if err != nil {
		return nil, drawing.Paper{}, err
	}
	paper, ok := drawing.PaperNamed(d.paper, r.Job.Settings.Units)
	if !ok {
		return nil, paper, usageError{fmt.Sprintf("--paper %s: write one of %s", d.paper, strings.Join(paperNames(), ", "))}
	}
	return r, paper, nil
}

// draw writes finished sheets where the flags say.
func (d *drawingFlags) draw(a *app, sheets []drawing.Sheet) error {
	isFile := strings.EqualFold(filepath.Ext(d.out), ".svg") || strings.EqualFold(filepath.Ext(d.out), ".pdf")
	if len(sheets) > 1 && !d.pdf && (d.out == "" || isFile) {
		return usageError{fmt.Sprintf("%d sheets: name a folder with --out, make one file of them with --pdf, or draw one line with --from", len(sheets))}
	}
	files, err := d.files(sheets, d.out == "" || isFile)
	if err != nil {
		return err
	}
	if d.out == "" {
		_, err := a.out.Write(files[0].content)
		return err
	}
	if isFile {
		files[0].path = d.out
	}
	return a.writeFiles(files, d.force)
}

// outputFile is a file that is about to be written.
type outputFile struct {
	path    string
	content []byte
}

// files makes the content of every file: one a sheet, or all sheets in one.
func (d *drawingFlags) files(sheets []drawing.Sheet, together bool) ([]outputFile, error) {
	var files []outputFile
	for _, s := range sheets {
		files = append(files, outputFile{filepath.Join(d.out, s.Name+".svg"), s.Page.Bytes()})
	}
	switch {
	case !d.pdf:
		return files, nil
	case together:
		content, err := toPDF(files)
		return []outputFile{{content: content}}, err
	}
	for i, f := range files {
		content, err := toPDF(files[i : i+1])
		if err != nil {
			return nil, err
		}
		files[i] = outputFile{strings.TrimSuffix(f.path, ".svg") + ".pdf", content}
	}
	return files, nil
}

// writeFiles writes files whole: all of them beside their places first, then each to its place by renaming. None that
// exists is replaced without force.
func (a *app) writeFiles(files []outputFile, force bool) error {
	for _, f := range files {
		if _, err := os.Lstat(f.path); err == nil && !force {
			return job.ExistsError{Path: f.path}
		}
	}
	temporary := make([]string, len(files))
	defer func() {
		for _, name := range temporary {
			if name != "" {
				_ = os.Remove(name) // gone already where all went well
			}
		}
	}()
	for i, f := range files {
		name, err := writeBeside(f)
		if err != nil {
			return err
		}
		temporary[i] = name
	}
	for i, f := range files {
		if err := os.Rename(temporary[i], f.path); err != nil {
			return err
		}
		a.say("wrote %s", f.path)
	}
	return nil
}

// writeBeside writes a file under a temporary name in its folder, which is made where it is missing.
func writeBeside(f outputFile) (name string, err error) {
	dir := filepath.Dir(f.path)
	if err := os.MkdirAll(dir, 0o755); err != nil {
		return "", err
	}
	file, err := os.CreateTemp(dir, ".new-"+filepath.Base(f.path)+"-")
	if err != nil {
		return "", err
	}
	_, err = file.Write(f.content)
	if err == nil {
		err = file.Chmod(0o644)
	}
	if closing := file.Close(); err == nil {
		err = closing
	}
	if err != nil {
		_ = os.Remove(file.Name()) // the first error is told
		return "", err
	}
	return file.Name(), nil
}
