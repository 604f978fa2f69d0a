package job

import (
	"strings"

	"rimfall/network"
)

// areaRow is a row of areas.csv as texts.
type areaRow struct {
	ID        string `csv:"id"`
	Structure string `csv:"structure"`
	Area      string `csv:"area"`
	C         string `csv:"c"`
	Surface   string `csv:"surface"`
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
		a.Area = t.needed("area", row.Area, positive)
		a.Time = t.number("time", row.Time, notNegative)
		a.C, a.Surface = r.coefficient(t, row)
		n.Areas = append(n.Areas, a)
	})
}

// coefficient is the runoff coefficient of an area, as given or by its surface.
func (r *reader) coefficient(t *table, row *areaRow) (c float64, surface string) {
	surface = note(row.Surface)
	if strings.TrimSpace(row.C) == "" {
		if surface == "" {
			t.faultAt("c", "area %s has no runoff coefficient: write c", row.ID)
			return 0, ""
		}
		return r.surfaces.lookUp(t, surface)
	}
	v := t.number("c", row.C, anySign)
	if v.OK && (v.V < 0 || v.V > 1) {
		t.faultAt("c", "c = %s: a runoff coefficient lies between 0 and 1", strings.TrimSpace(row.C))
	}
	return v.V, surface
}
