package job

import (
	"maps"
	"slices"
	"strings"

	"rimfall/network"
	"rimfall/network/fault"
)

// surfaceRow is a row of surfaces.csv as texts: a surface, its runoff
// coefficient and, for flow paths, its Manning's n in a thin sheet.
type surfaceRow struct {
	Surface string `csv:"surface"`
	C       string `csv:"c"`
	Usual   string `csv:"usual"`
	Low     string `csv:"low"`
	High    string `csv:"high"`
	CLow    string `csv:"c_low"`
	CHigh   string `csv:"c_high"`
	N       string `csv:"n"`
	Source  string `csv:"source"`
	Note    string `csv:"note"`
}

// surface is what is known of one.
type surface struct {
	c network.Maybe // the usual, low or high one, as the job asks
	n network.Maybe
}

// surfaces gives what is known of a surface by name, in small letters.
type surfaces map[string]surface

// readSurfaces reads surfaces.csv.
func (r *reader) readSurfaces(t *table) {
	r.surfaces = surfaces{}
	for _, pair := range [][2]string{{"c", "usual"}, {"low", "c_low"}, {"high", "c_high"}} {
		if t.has(pair[0]) && t.has(pair[1]) {
			t.faults.Add(t.file, t.headLine, 1, "columns %q and %q mean the same: leave one of them out", pair[0], pair[1])
		}
	}
	if !t.has("c") && !t.has("usual") {
		t.faults.Add(t.file, t.headLine, 1, "missing column %q", "c")
		return
	}
	eachRow(t, func(row *surfaceRow) {
		name := strings.ToLower(note(row.Surface))
		if name == "" {
			t.faultAt("surface", "surface is blank: every row needs a name")
			return
		}
		if _, twice := r.surfaces[name]; twice {
			t.faultAt("surface", "surface %q stands twice", name)
			return
		}
		r.surfaces[name] = surface{r.surfaceC(t, name, row), t.number("n", row.N, positive)}
	})
}

// surfaceC judges the coefficients of a row and takes the one that the job asks for.
func (r *reader) surfaceC(t *table, name string, row *surfaceRow) network.Maybe {
	field := func(one, other string) string {
		if t.has(other) {
			return other
		}
		return one
	}
	usual := t.needed(field("c", "usual"), row.C+row.Usual, notNegative)
	low := t.number(field("low", "c_low"), row.Low+row.CLow, notNegative)
	high := t.number(field("high", "c_high"), row.High+row.CHigh, notNegative)
	if usual > 1 || low.Or(0) > usual || high.Or(1) < usual || high.Or(1) > 1 {
		t.faultAt(field("c", "usual"), "surface %q: c = %g must lie between 0 and 1, and between low and high", name, usual)
	}
	switch r.settings.Rain.SurfaceC {
	case LowC:
		return low
	case HighC:
		return high
	}
	return network.Some(usual)
}

// lookUp finds the coefficient of a surface that an area or a piece of one names.
func (r *reader) lookUp(t *table, name string) float64 {
	if r.surfaces == nil {
		t.faultAt("surface", "surface %q is looked up in %s, which this job does not have: add it, or write c", name, tableFiles["surfaces"])
		return 0
	}
	found, ok := r.surfaces[strings.ToLower(name)]
	switch {
	case !ok:
		t.faultAt("surface", "unknown surface %q: %s", name, fault.Suggest(name, slices.Collect(maps.Keys(r.surfaces))))
	case !found.c.OK:
		t.faultAt("surface", "surface %q has no %s coefficient, which surface_c = %q asks for", name, surfaceCs[r.settings.Rain.SurfaceC], surfaceCs[r.settings.Rain.SurfaceC])
	}
	return found.c.V
}
