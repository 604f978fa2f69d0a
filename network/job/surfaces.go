package job

import (
	"maps"
	"slices"
	"strings"

	"rimfall/network/fault"
)

// surfaceRow is a row of surfaces.csv as texts: a surface and its runoff
// coefficient. The columns low, high and source are for the reader's eye.
type surfaceRow struct {
	Surface string `csv:"surface"`
	C       string `csv:"c"`
	Low     string `csv:"low"`
	High    string `csv:"high"`
	Source  string `csv:"source"`
	Note    string `csv:"note"`
}

// surfaces gives the runoff coefficient of a surface by name.
type surfaces struct {
	file string // "" where the job has none
	c    map[string]float64
}

// readSurfaces reads surfaces.csv.
func (r *reader) readSurfaces(t *table) {
	r.surfaces = surfaces{t.file, map[string]float64{}}
	eachRow(t, func(row *surfaceRow) {
		name := strings.ToLower(note(row.Surface))
		if name == "" {
			t.faultAt("surface", "surface is blank: every row needs a name")
			return
		}
		if _, twice := r.surfaces.c[name]; twice {
			t.faultAt("surface", "surface %q stands twice", name)
			return
		}
		c := t.needed("c", row.C, notNegative)
		low, high := t.number("low", row.Low, notNegative), t.number("high", row.High, notNegative)
		if c > 1 || low.Or(0) > c || high.Or(1) < c {
			t.faultAt("c", "surface %q: c = %g must lie between 0 and 1, and between low and high", name, c)
		}
		r.surfaces.c[name] = c
	})
}

// lookUp finds the coefficient of a surface that an area names.
func (s surfaces) lookUp(t *table, name string) (float64, string) {
	if s.c == nil {
		t.faultAt("surface", "surface %q is looked up in %s, which this job does not have: add it, or write c", name, tableFiles["surfaces"])
		return 0, name
	}
	c, ok := s.c[strings.ToLower(name)]
	if !ok {
		t.faultAt("surface", "unknown surface %q: %s", name, fault.Suggest(name, slices.Collect(maps.Keys(s.c))))
	}
	return c, name
}
