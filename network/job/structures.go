package job

import (
	"strings"

	"rimfall/network"
)

// structureRow is a row of structures.csv as texts.
type structureRow struct {
	ID             string `csv:"id"`
	Kind           string `csv:"kind"`
	X              string `csv:"x"`
	Y              string `csv:"y"`
	Rim            string `csv:"rim"`
	Tailwater      string `csv:"tailwater"`
	TailwaterCheck string `csv:"tailwater_check"`
	Inflow         string `csv:"inflow"`
	LowestInvert   string `csv:"lowest_invert"`
	LeastFall      string `csv:"least_fall"`
	Benching       string `csv:"benching"`
	Loss           string `csv:"loss"`
	Note           string `csv:"note"`
}

// readStructures reads structures.csv into the network.
func (r *reader) readStructures(t *table) {
	n := r.network
	rows := t.rowsAtMost()
	n.Structures = make([]network.Structure, 0, rows)
	r.structures = newIDs(rows, func(i int32) (string, int32) { return n.Structures[i].ID, n.Structures[i].Line })
	eachRow(t, func(row *structureRow) {
		s := network.Structure{Line: int32(t.line), Note: note(row.Note)}
		s.Kind = network.Kind(t.word("kind", row.Kind, network.Kinds))
		s.X = t.number("x", row.X, anySign)
		s.Y = t.number("y", row.Y, anySign)
		s.Rim = t.number("rim", row.Rim, anySign)
		s.Tailwater = t.number("tailwater", row.Tailwater, anySign)
		s.TailwaterCheck = t.number("tailwater_check", row.TailwaterCheck, anySign)
		s.Inflow = t.number("inflow", row.Inflow, notNegative).V
		s.LowestInvert = t.number("lowest_invert", row.LowestInvert, anySign)
		s.LeastFall = t.number("least_fall", row.LeastFall, notNegative)
		s.Benching = network.Benching(t.word("benching", row.Benching, network.Benchings))
		s.Loss = t.number("loss", row.Loss, anySign)
		if s.X.OK != s.Y.OK {
			t.faultAt("x", "structure %s has one coordinate only: give x and y, or neither", row.ID)
		}
		if (s.Tailwater.OK || s.TailwaterCheck.OK) && s.Kind != network.Outfall {
			field := "tailwater"
			if !s.Tailwater.OK {
				field = "tailwater_check"
			}
			t.faultAt(field, "structure %s is no outfall; a tailwater stands at outfalls only", row.ID)
		}
		s.ID = r.structures.add(t, row.ID, len(n.Structures))
		n.Structures = append(n.Structures, s)
	})
}

// note keeps a user's remark apart from the text of its row.
func note(text string) string {
	if text == "" {
		return ""
	}
	return strings.Clone(strings.TrimSpace(text))
}
