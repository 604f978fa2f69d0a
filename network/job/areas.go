package job

import (
	"strings"

	"rimfall/hydrology"
	"rimfall/network"
)

// areaRow is a row of areas.csv as texts.
type areaRow struct {
	ID        string `csv:"id"`
	Structure string `csv:"structure"`
	Area      string `csv:"area"`
	C         string `csv:"c"`
	Surface   string `csv:"surface"`
	Paved     string `csv:"impervious"`
	Time      string `csv:"time"`
	Note      string `csv:"note"`
}

// readAreas reads areas.csv into the network.
func (r *reader) readAreas(t *table) {
	n := r.network
	rows := t.rowsAtMost()
	n.Areas = make([]network.Area, 0, rows)
	seen := newIDs(rows, func(i int32) (string, int32) { return n.Areas[i].ID, n.Areas[i].Line })
	eachRow(t, func(row *areaRow) {
		a := network.Area{Line: int32(t.line), Note: note(row.Note)}
		a.ID = seen.add(t, row.ID, len(n.Areas))
		a.Structure = r.structure(t, "structure", row.Structure)
		a.Area = r.extent(t, row, a.ID)
		a.Time = t.number("time", row.Time, notNegative)
		a.C, a.Surface = r.coefficient(t, row)
		n.Areas = append(n.Areas, a)
	})
	r.areas = seen
	r.judgePieces()
}

// coefficient is the runoff coefficient of an area: as given, of its surface, by
// its impervious percentage, or the mean of its pieces.
func (r *reader) coefficient(t *table, row *areaRow) (c float64, surface string) {
	surface = note(row.Surface)
	pieces := r.pieces[strings.TrimSpace(row.ID)]
	given, paved := strings.TrimSpace(row.C) != "", strings.TrimSpace(row.Paved) != ""
	switch {
	case paved && (given || surface != "" || pieces != nil):
		t.faultAt("impervious", "area %s has both impervious and another coefficient: leave one of them out", row.ID)
	case given && pieces != nil:
		t.faultAt("c", "area %s has both c and rows in %s: leave one of them out", row.ID, r.settings.Files["pieces"])
	case given:
		return t.share("c", row.C), surface
	case paved:
		return r.imperviousC(t, row.Paved), surface
	case pieces != nil:
		return pieces.c(), surface
	case surface != "":
		return r.lookUp(t, surface), surface
	default:
		t.faultAt("c", "area %s has no runoff coefficient: write c", row.ID)
	}
	return 0, surface
}

// share reads a runoff coefficient.
func (t *table) share(field, text string) float64 {
	v := t.number(field, text, anySign)
	if v.OK && (v.V < 0 || v.V > 1) {
		t.faultAt(field, "%s = %s: a runoff coefficient lies between 0 and 1", field, strings.TrimSpace(text))
	}
	return v.V
}

// imperviousC is the coefficient of an impervious percentage by the job's relation.
func (r *reader) imperviousC(t *table, text string) float64 {
	v := t.number("impervious", text, notNegative)
	if v.V > 100 {
		t.faultAt("impervious", "impervious = %s: a percentage lies between 0 and 100", strings.TrimSpace(text))
	}
	part, rain := v.V/100, &r.settings.Rain
	switch rain.Impervious {
	case CubicRelation:
		return hydrology.CubicImperviousC(part)
	case TwoPartRelation:
		if !rain.ImperviousC.OK || !rain.PerviousC.OK {
			t.faultAt("impervious", "impervious_relation = \"two-part\" needs impervious_c and pervious_c in [storm]")
		}
		return hydrology.ImperviousC(part, rain.ImperviousC.V, rain.PerviousC.V)
	}
	return hydrology.LinearImperviousC(part)
}
