package job

import (
	"bytes"
	"maps"
	"path/filepath"
	"slices"

	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/network/times"
	"rimfall/pipeflow/catalog"
)

// File is the name of the settings in every job folder.
const File = "job.toml"

// Job is a job folder as it was read: what was given, nothing computed.
type Job struct {
	Dir        string
	Settings   Settings
	Network    *network.Network
	Rain       Rain
	Catalog    catalog.Catalog
	Departures []Departure
	Costs      Costs
	Paths      []times.Path // flow paths of areas, in the order of the areas

	givenTime []bool            // of each area
	settings  document          // job.toml with places
	files     map[string][]byte // text of every file
	tables    map[string]*table // by name, for places and for writing back
}

// Purpose says what a job is read for; it decides what may be left blank.
type Purpose int8

const (
	// ToCheck: every pipe needs a size and a slope.
	ToCheck Purpose = iota
	// ToSize: sizes, slopes and inverts may be blank, and are chosen.
	ToSize
)

// Read reads the job folder dir. rules are the names that departures.csv may
// use. The error is a fault.List with every fault of every file.
func Read(dir string, purpose Purpose, rules []string) (*Job, error) {
	r := &reader{dir: dir, purpose: purpose, files: map[string][]byte{}, tables: map[string]*table{}, sections: map[sectionKey]Made{}, network: &network.Network{}, catalog: catalog.Standard()}
	j := &Job{Dir: dir, Network: r.network, files: r.files, tables: r.tables}
	text, ok := r.readFile(File)
	if !ok {
		return nil, r.faults.Err()
	}
	j.settings = parseTOML(r.path(File), text, &r.faults)
	if len(r.faults) > 0 { // not TOML: its settings are unknown, so are the names of the tables
		return nil, r.faults.Err()
	}
	j.Settings = r.readSettings(j.settings)
	r.settings, r.document = &j.Settings, &j.settings
	r.readCatalog()
	r.readTables(j, rules)
	r.walkPaths(j)
	r.judgeNetwork(j, purpose)
	j.Catalog = r.catalog
	return j, r.faults.Err()
}

// readTables reads every table that is needed or there.
func (r *reader) readTables(j *Job, rules []string) {
	if t, ok := r.open("structures", "id"); ok {
		r.readStructures(t)
	}
	if t, ok := r.open("pipes", "id", "from", "to"); ok {
		r.readPipes(t)
	}
	if r.has(r.settings.Files["surfaces"]) {
		if t, ok := r.open("surfaces", "surface"); ok {
			r.readSurfaces(t)
		}
	}
	if r.has(r.settings.Files["pieces"]) {
		if t, ok := r.open("pieces", "area", "extent"); ok {
			r.readPieces(t)
		}
	}
	if t, ok := r.open("areas", "id", "structure", "area"); ok {
		r.readAreas(t)
	}
	if rain, ok := r.readRain(j); ok {
		j.Rain = rain
		r.judgePeriods(j)
	}
	if r.has(r.settings.Files["paths"]) && r.areas.slots != nil {
		if t, ok := r.open("paths", "area", "order", "kind"); ok {
			j.Paths = r.readPaths(t)
		}
	}
	r.readAlong()
	r.readCosts(j)
	if r.has(r.settings.Files["departures"]) {
		if t, ok := r.open("departures", "rule", "subject", "reason"); ok {
			j.Departures = r.readDepartures(t, rules)
		}
	}
}

// open reads the file of a table and its headings.
func (r *reader) open(name string, required ...string) (*table, bool) {
	file := r.settings.Files[name]
	text, ok := r.readFile(file)
	if !ok {
		return nil, false
	}
	t, ok := openTable(name, r.path(file), text, r.settings.Columns[name], required, &r.faults)
	if !ok {
		return t, false
	}
	t.sizeUnit, t.unknown = r.settings.Units.Size, r.settings.Unknown
	r.tables[name] = t
	for _, field := range slices.Sorted(maps.Keys(t.renames)) {
		if !t.has(field) {
			r.document.fault(&r.faults, "columns."+name+"."+field, "%s has no heading %q, which is named here for %s", t.file, t.renames[field], field)
		}
	}
	return t, true
}

// readCatalog lays the job's own list of sizes, if it has one, over the standard sizes.
func (r *reader) readCatalog() {
	name := r.settings.Files["catalog"]
	if !r.has(name) {
		return
	}
	text, ok := r.readFile(name)
	if !ok {
		return
	}
	own, bad := catalog.Parse(bytes.NewReader(text), r.settings.Units.Name)
	for _, f := range bad {
		r.faults.Add(r.path(name), f.Line, f.Column, "%s", f.Text)
	}
	r.catalog = r.catalog.With(own)
}

// Locate gives a problem of the network its file, line and column.
func (j *Job) Locate(p network.Problem) fault.Fault {
	if p.Table == "rainfall" {
		return fault.Fault{File: j.Rain.File, Text: p.Text}
	}
	t := j.tables[p.Table]
	f := fault.Fault{Line: p.Line, Text: p.Text, File: filepath.Join(j.Dir, j.Settings.Files[p.Table])}
	if t != nil && p.Line > 0 {
		f.Column = t.columnOf(p.Line, p.Field)
	}
	return f
}
