package job

import (
	"bytes"
	"fmt"
	"os"
	"slices"
	"strconv"
	"strings"

	"rimfall/hydrology"
	"rimfall/hydrology/rainfile"
	"rimfall/network/fault"
)

// Rain is the rainfall of a job: a table of intensities in the job's unit, or
// equations, and where it comes from.
type Rain struct {
	File   string // as printed: a rainfall file, or job.toml where it has an equation
	Kind   string // what the file is, in words
	Place  string // where the file says so
	Source string // edition of the file, or source of the equation
	Table  hydrology.Table
	Series hydrology.Series

	Unit       hydrology.IntensityUnit // in which the source prints
	Bound      rainfile.Bound
	Confidence float64 // of the interval whose limit the bound is, 0.90 or 0.95; 0 where it is the estimate
	Converted  bool    // Unit is not the job's
	Notices    []string

	equations []equation
}

// Equation tells whether the rainfall is one or more equations instead of a table.
func (rain *Rain) Equation() bool { return len(rain.equations) > 0 }

// SeriesWord is the series as job.toml writes it.
func (rain *Rain) SeriesWord() string { return seriesNames[rain.Series] }

// readRain reads the rainfall, whatever its kind.
func (r *reader) readRain(j *Job) (rain Rain, ok bool) {
	if equations := r.settings.Rain.Equations; len(equations) > 0 {
		return r.equationRain(equations), true
	}
	name := r.settings.Rainfall
	content, err := os.ReadFile(r.path(name))
	if err == nil {
		file, faults := rainfile.Read(content, rainfile.Options{Unit: r.jobIntensity()})
		switch kind := file.Kind; {
		case kind == rainfile.Atlas14 || kind == rainfile.Canada:
			r.files[name] = content
			return r.agencyRain(j, file, faults)
		case kind == rainfile.OwnMaxima:
			r.faults.Add(r.path(name), 0, 0, "is a list of annual maxima; `rimfall rain %s --out rainfall.csv` makes a table of it", r.path(name))
			return rain, false
		case kind == rainfile.Unknown && !r.looksLikeTable(name, content):
			r.addRainFaults(name, faults)
			return rain, false
		}
	}
	text, ok := r.readFile(name) // says why, where it cannot be read
	if !ok {
		return rain, false
	}
	rain = r.readRainfall(name, text)
	rain.Kind, rain.Unit, rain.Series = "table", r.jobIntensity(), r.settings.Rain.Series
	if r.settings.Rain.Bound != rainfile.Estimate {
		j.settings.fault(&r.faults, "storm.bound", "bound = %q: a plain table has no bounds; name an agency's file, or leave it out", r.settings.Rain.Bound)
	}
	return rain, true
}

func (r *reader) jobIntensity() hydrology.IntensityUnit {
	return hydrology.IntensityUnit(r.settings.Units.Intensity)
}

// looksLikeTable tells a table with a slip in its headings from a file of
// another kind: one of its headings is a number of years, or "duration" by the job's own name for it.
func (r *reader) looksLikeTable(name string, content []byte) bool {
	wide := strings.HasPrefix(string(content), "\xff\xfe") || strings.HasPrefix(string(content), "\xfe\xff") // UTF-16, which readFile names
	if wide || len(strings.TrimSpace(string(content))) == 0 {
		return true
	}
	var ignored fault.List
	t := newTable("rainfall", name, bytes.TrimPrefix(content, []byte("\xef\xbb\xbf")), &ignored)
	if !t.readHeadings() {
		return true
	}
	own := durationHeading(r.settings.Columns["rainfall"])
	return slices.ContainsFunc(t.headings, func(h string) bool {
		v, ok := parseNumber(h, t.comma)
		return ok && v > 0 || strings.EqualFold(h, own)
	})
}

func (r *reader) addRainFaults(name string, faults rainfile.Faults) {
	for _, f := range faults {
		r.faults.Add(r.path(name), f.Line, f.Column, "%s", f.Text)
	}
}

// agencyRain takes the table of an agency's file that the job asks for, in the job's unit.
func (r *reader) agencyRain(j *Job, file rainfile.File, faults rainfile.Faults) (rain Rain, ok bool) {
	name := r.settings.Rainfall
	if len(faults) > 0 {
		r.addRainFaults(name, faults)
		return rain, false
	}
	bound := r.settings.Rain.Bound
	rain = Rain{
		File: r.path(name), Kind: file.Kind.String(), Place: file.Place.String(), Source: file.Edition,
		Series: file.Series, Unit: file.Unit, Bound: bound,
	}
	table, ok := file.Table(bound)
	if !ok {
		r.noBound(j, file, bound)
		return rain, false
	}
	if bound != rainfile.Estimate {
		rain.Confidence = file.Confidence
	}
	if given := r.settings.Rain; given.SeriesGiven && file.SeriesStated && given.Series != file.Series {
		j.settings.fault(&r.faults, "storm.series", "the file states its series: %s; leave the setting out", file.Series)
	} else if given.SeriesGiven && !file.SeriesStated {
		rain.Series = given.Series
	}
	for _, n := range file.Notices {
		rain.Notices = append(rain.Notices, fmt.Sprintf("line %d: %s", n.Line, n.Text))
	}
	factor, _ := file.Unit.To(r.jobIntensity())
	rain.Table, rain.Converted = table, factor != 1
	if rain.Converted {
		rain.Table = table.Scaled(factor)
	}
	return rain, true
}

// noBound says which tables a file has instead of the one asked for.
func (r *reader) noBound(j *Job, file rainfile.File, asked rainfile.Bound) {
	var has []string
	for _, b := range []rainfile.Bound{rainfile.Estimate, rainfile.Upper, rainfile.Lower} {
		if _, ok := file.Table(b); ok {
			has = append(has, strconv.Quote(b.String()))
		}
	}
	j.settings.fault(&r.faults, "storm.bound", "%s has no table for bound = %q; it has %s", r.settings.Rainfall, asked, strings.Join(has, ", "))
}

// equationRain is the rainfall of a job with equations of its own.
func (r *reader) equationRain(equations []equation) Rain {
	rain := Rain{File: r.path(File), Kind: "equation", Unit: equations[0].Unit, Series: r.settings.Rain.Series, equations: equations}
	for _, e := range equations {
		if rain.Place == "" {
			rain.Place = e.place
		}
		if rain.Source == "" {
			rain.Source = e.source
		}
		rain.Converted = rain.Converted || e.Unit != r.jobIntensity()
	}
	return rain
}
