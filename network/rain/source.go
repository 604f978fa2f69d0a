package rain

import (
	"errors"
	"fmt"
	"strings"

	"rimfall/hydrology"
	"rimfall/hydrology/fit"
	"rimfall/hydrology/rainfile"
	"rimfall/network/fault"
)

// Options say what is wanted of a rainfall file.
type Options struct {
	Unit    hydrology.IntensityUnit // where the file states none
	Bound   rainfile.Bound
	Fit     bool       // equations, and distributions of annual maxima
	Method  fit.Method // by which a table is made of annual maxima alone
	Periods []float64  // of that table and of the distributions, years; none: UsualPeriods
}

// UsualPeriods are the return periods that agencies print of annual maxima.
var UsualPeriods = []float64{2, 5, 10, 25, 50, 100}

// Content is a file as it was read.
type Content struct {
	Name string
	Text []byte
}

// Source is a rainfall file, read, with what was asked for.
type Source struct {
	rainfile.File
	Bound   rainfile.Bound
	Table   hydrology.Table // of the bound
	Made    bool            // the table was made of annual maxima, by Method
	Method  fit.Method
	Periods []float64 // of the distributions

	Equations     []Equation
	Distributions []Distribution

	described string // of a table that is of no file of its own
}

// OfTable shows a table of intensities in a unit, with where it is from in words.
func OfTable(t hydrology.Table, unit hydrology.IntensityUnit, series hydrology.Series, place, described string, o Options) *Source {
	s := &Source{Table: t, described: described}
	s.Unit, s.Series, s.Place.Name = unit, series, place
	if o.Fit {
		s.fitEquations()
	}
	return s
}

// Read reads one file, or an estimate and its bounds sent as files of their own.
// The error is a fault.List with every fault of every file.
func Read(contents []Content, o Options) (*Source, error) {
	var files []rainfile.File
	var faults fault.List
	for _, c := range contents {
		file, bad := rainfile.Read(c.Text, rainfile.Options{Unit: o.Unit})
		for _, f := range bad {
			faults.Add(c.Name, f.Line, f.Column, "%s", f.Text)
		}
		files = append(files, file)
	}
	if len(faults) > 0 {
		return nil, faults.Err()
	}
	file := files[0]
	if len(files) > 1 {
		var err error
		if file, err = rainfile.Join(files...); err != nil {
			return nil, err
		}
	}
	s := &Source{File: file, Bound: o.Bound, Method: o.Method, Periods: o.Periods}
	if len(s.Periods) == 0 {
		s.Periods = UsualPeriods
	}
	if err := s.takeTable(contents[0].Name, o); err != nil {
		return nil, err
	}
	if o.Fit {
		s.fitEquations()
		s.fitDistributions()
	}
	return s, nil
}

// takeTable takes the table of the bound that is asked for. A single file of a
// bound is taken as it is; a list of annual maxima becomes a table.
func (s *Source) takeTable(name string, o Options) error {
	table, ok := s.File.Table(o.Bound)
	if ok {
		s.Table = table
		return nil
	}
	if s.Kind == rainfile.OwnMaxima && o.Bound == rainfile.Estimate {
		return s.makeTable(name)
	}
	var has []string
	for _, b := range []rainfile.Bound{rainfile.Estimate, rainfile.Upper, rainfile.Lower} {
		if t, ok := s.File.Table(b); ok {
			has = append(has, b.String())
			s.Bound, s.Table = b, t
		}
	}
	if len(has) == 1 && o.Bound == rainfile.Estimate { // a file of one bound only
		return nil
	}
	return fault.List{{File: name, Text: fmt.Sprintf("has no table of the bound %q; it has %s", o.Bound, strings.Join(has, ", "))}}
}

// makeTable fits every duration and makes a table of it.
func (s *Source) makeTable(name string) error {
	m := &s.Maxima
	depths := make([][]float64, len(m.Durations))
	for i := range m.Durations {
		depths[i] = m.Of(i)
	}
	storms, err := fit.FitStorms(m.Durations, depths, s.Method)
	if err == nil {
		s.Table, err = storms.Table(s.Periods)
	}
	if err != nil {
		var faults fault.List
		for _, text := range strings.Split(messageOf(err, m.Durations, s.Periods), "\n") {
			faults = append(faults, fault.Fault{File: name, Text: text})
		}
		return faults.Err()
	}
	s.Made, s.Series, s.SeriesStated = true, hydrology.AnnualMaximum, true
	return nil
}

// messageOf names the places of a table that cannot be made by duration and period.
func messageOf(err error, durations, periods []float64) string {
	var cells hydrology.CellFaults
	if !errors.As(err, &cells) {
		return err.Error()
	}
	var lines []string
	for _, c := range cells {
		line := c.Text
		if c.Row >= 0 && c.Row < len(durations) && c.Column >= 0 && c.Column < len(periods) {
			line = fmt.Sprintf("%g min, %g years: %s", durations[c.Row], periods[c.Column], c.Text)
		}
		lines = append(lines, line)
	}
	return strings.Join(lines, "\n")
}
