package job

import (
	"cmp"
	"maps"
	"slices"
	"strconv"
	"strings"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/network/times"
)

// pathRow is a row of paths.csv as texts: one leg of the flow path of an area.
type pathRow struct {
	Area        string `csv:"area"`
	Order       string `csv:"order"`
	Kind        string `csv:"kind"`
	Length      string `csv:"length"`
	Slope       string `csv:"slope"`
	Surface     string `csv:"surface"`
	N           string `csv:"n"`
	Section     string `csv:"section"`
	Velocity    string `csv:"velocity"`
	Coefficient string `csv:"coefficient"`
	C           string `csv:"c"`
	CurveNumber string `csv:"curve_number"`
	Note        string `csv:"note"`
}

// pathLeg is a leg with its place in the path and in the file.
type pathLeg struct {
	hydrology.Leg
	order int
	line  int32
}

// pathNeeds are the columns that a kind of leg cannot do without. Where n is among
// them a surface will do as well.
var pathNeeds = map[hydrology.Kind][]string{
	hydrology.SheetKinematic:  {"length", "slope", "n"},
	hydrology.SheetNRCS:       {"length", "slope", "n"},
	hydrology.Shallow:         {"length", "slope", "surface"},
	hydrology.Gutter:          {"length", "slope", "n", "section"},
	hydrology.Channel:         {"length", "slope", "n", "section"},
	hydrology.FullPipe:        {"length", "slope", "n", "section"},
	hydrology.GivenVelocity:   {"length", "velocity"},
	hydrology.Kirpich:         {"length", "slope"},
	hydrology.FAA:             {"length", "slope"},
	hydrology.NRCSLag:         {"length", "slope", "curve_number"},
	hydrology.Kerby:           {"length", "slope", "n"},
	hydrology.BransbyWilliams: {"length", "slope"},
	hydrology.Temez:           {"length", "slope"},
}

// readPaths reads paths.csv.
func (r *reader) readPaths(t *table) []times.Path {
	legs := map[network.AreaIndex][]pathLeg{}
	broken := map[network.AreaIndex]bool{} // a leg is at fault
	eachRow(t, func(row *pathRow) {
		before := len(r.faults)
		id := strings.TrimSpace(row.Area)
		area, ok := r.areas.find(id)
		switch {
		case id == "":
			t.faultAt("area", "area is blank: name the area whose path this is")
		case !ok:
			t.faultAt("area", "unknown area %q%s", id, r.areas.nearest(id))
		}
		a := network.AreaIndex(area)
		leg := r.leg(t, row, a, ok)
		if ok {
			legs[a] = append(legs[a], leg)
			broken[a] = broken[a] || len(r.faults) > before
		}
	})
	var paths []times.Path
	for _, a := range slices.Sorted(maps.Keys(legs)) {
		if p := r.onePath(t, a, legs[a]); !broken[a] {
			paths = append(paths, p)
		}
	}
	return paths
}

// onePath puts the legs of one area in order, which counts 1, 2, 3 … without a gap.
func (r *reader) onePath(t *table, a network.AreaIndex, legs []pathLeg) times.Path {
	slices.SortStableFunc(legs, func(a, b pathLeg) int { return cmp.Compare(a.order, b.order) })
	p, id := times.Path{Area: a}, r.network.Areas[a].ID
	expected := 1
	for _, leg := range legs {
		wrong := func(format string, args ...any) {
			r.faults.Add(t.file, int(leg.line), t.columnOf(int(leg.line), "order"), format, args...)
		}
		switch {
		case leg.order == 0: // no number, which is a fault already
		case leg.order < expected:
			wrong("the path of area %s has two legs of order %d", id, leg.order)
		case leg.order > expected:
			wrong("the path of area %s has a gap: order %d is missing before %d; legs count 1, 2, 3 … from the far end down", id, expected, leg.order)
			expected = leg.order + 1
		default:
			expected++
		}
		p.Legs, p.Lines = append(p.Legs, leg.Leg), append(p.Lines, leg.line)
	}
	return p
}

// leg reads one leg. Its faults are recorded.
func (r *reader) leg(t *table, row *pathRow, area network.AreaIndex, known bool) pathLeg {
	l := pathLeg{line: int32(t.line)}
	order, err := strconv.Atoi(strings.TrimSpace(row.Order))
	if err != nil || order < 1 {
		t.faultAt("order", "order: %q is no place in the path: legs count 1, 2, 3 … from the far end down", strings.TrimSpace(row.Order))
		order = 0
	}
	l.order = order
	kinds := legKinds()
	text := strings.ToLower(strings.TrimSpace(row.Kind))
	if !slices.Contains(kinds, text) {
		t.faultAt("kind", "unknown kind %q: %s", text, fault.Suggest(text, kinds))
		return l
	}
	l.Kind = hydrology.Kind(text)
	r.lacks(t, row, l.Kind)
	l.Length = t.number("length", row.Length, positive).V
	l.Slope = t.number("slope", row.Slope, positive).V
	l.N = t.number("n", row.N, positive).V
	l.Velocity = t.number("velocity", row.Velocity, positive).V
	l.Coefficient = t.number("coefficient", row.Coefficient, positive).V
	l.CurveNumber = t.number("curve_number", row.CurveNumber, positive).V
	l.C = t.number("c", row.C, positive).V
	if known {
		r.ofArea(&l.Leg, area)
	}
	r.pathSurface(t, row, &l.Leg)
	r.pathSection(t, row, &l.Leg)
	return l
}

// legKinds lists the words of the column kind.
func legKinds() []string {
	var kinds []string
	for _, m := range hydrology.Methods() {
		kinds = append(kinds, string(m.Kind))
	}
	return kinds
}

// lacks finds the cells that a kind needs and that are blank.
func (r *reader) lacks(t *table, row *pathRow, kind hydrology.Kind) {
	cells := map[string]string{
		"length": row.Length, "slope": row.Slope, "n": row.N + row.Surface, "surface": row.Surface + row.Coefficient,
		"section": row.Section, "velocity": row.Velocity, "curve_number": row.CurveNumber,
	}
	instead := map[string]string{"n": ", or a surface", "surface": ", or a coefficient: velocity = coefficient · √slope"}
	for _, field := range pathNeeds[kind] {
		if strings.TrimSpace(cells[field]) == "" {
			t.faultAt(field, "a leg of kind %s needs %s: it is blank%s", kind, field, instead[field])
		}
	}
}

// ofArea takes what a formula for a whole basin wants from its area.
func (r *reader) ofArea(l *hydrology.Leg, a network.AreaIndex) {
	area := &r.network.Areas[a]
	l.Area = area.Area
	if l.C == 0 {
		l.C = area.C
	}
}

// pathSurface gives a leg the n or the cover of its surface: of surfaces.csv, else
// of the published lists.
func (r *reader) pathSurface(t *table, row *pathRow, l *hydrology.Leg) {
	name := strings.ToLower(strings.TrimSpace(row.Surface))
	if name == "" {
		return
	}
	if l.Kind == hydrology.Shallow {
		l.Cover = name
		if known := coverNames(hydrology.ShallowCovers()); l.Coefficient == 0 && !slices.Contains(known, name) {
			t.faultAt("surface", "unknown cover of shallow flow %q: %s", name, fault.Suggest(name, known))
		}
		return
	}
	if l.N > 0 {
		return // the surface is a label
	}
	covers := hydrology.SheetCovers()
	if own, ok := r.surfaces[name]; ok && own.n.OK {
		l.N = own.n.V
	} else if i := slices.IndexFunc(covers, func(c hydrology.Cover) bool { return strings.EqualFold(c.Name, name) }); i >= 0 {
		l.N = covers[i].Coefficient
	} else {
		if _, listed := r.surfaces[name]; listed {
			t.faultAt("surface", "surface %q of %s has no n for sheet flow: write it in its column n, or in this row", name, r.settings.Files["surfaces"])
			return
		}
		known := coverNames(covers)
		for own, s := range r.surfaces {
			if s.n.OK {
				known = append(known, own)
			}
		}
		t.faultAt("surface", "surface %q has no n: %s; or write n", name, fault.Suggest(name, known))
	}
}

func coverNames(covers []hydrology.Cover) []string {
	var names []string
	for _, c := range covers {
		names = append(names, strings.ToLower(c.Name))
	}
	return names
}
