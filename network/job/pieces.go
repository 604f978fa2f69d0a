package job

import (
	"math"
	"strings"

	"rimfall/hydrology"
)

// pieceRow is a row of pieces.csv as texts: a part of an area with one coefficient.
type pieceRow struct {
	Area    string `csv:"area"`
	Extent  string `csv:"extent"`
	C       string `csv:"c"`
	Surface string `csv:"surface"`
	Note    string `csv:"note"`
}

// pieces are the parts of one area.
type pieces []piece

type piece struct {
	hydrology.Piece
	at place // of the id of its area
}

// composite is the mean coefficient of the pieces and their extent.
func (p pieces) composite() (c, extent float64) {
	all := make([]hydrology.Piece, len(p))
	for i := range p {
		all[i] = p[i].Piece
	}
	c, extent, _ = hydrology.CompositeC(all...)
	return c, extent
}

func (p pieces) c() float64 { c, _ := p.composite(); return c }

// readPieces reads pieces.csv.
func (r *reader) readPieces(t *table) {
	r.pieces, r.piecesFile = map[string]pieces{}, t.file
	eachRow(t, func(row *pieceRow) {
		id := strings.Clone(strings.TrimSpace(row.Area))
		if id == "" {
			t.faultAt("area", "area is blank: name the area of which this is a piece")
			return
		}
		p := piece{at: t.placeOf(t.column["area"])}
		p.Area = t.needed("extent", row.Extent, positive)
		surface := note(row.Surface)
		switch given := strings.TrimSpace(row.C) != ""; {
		case given:
			p.C = t.share("c", row.C)
		case surface != "":
			p.C = r.lookUp(t, surface)
		default:
			t.faultAt("c", "a piece of area %s has no runoff coefficient: write c, or a surface", id)
		}
		r.pieces[id] = append(r.pieces[id], p)
	})
}

// pieceRoom is by how much an area and the sum of its pieces may differ: both are measured on a plan
// and rounded (common practice).
const pieceRoom = 0.005

// extent is the size of an area, given or the sum of its pieces.
func (r *reader) extent(t *table, row *areaRow, id string) float64 {
	list := r.pieces[id]
	if list == nil {
		return t.needed("area", row.Area, positive)
	}
	_, sum := list.composite()
	given := t.number("area", row.Area, positive)
	if !given.OK {
		return sum
	}
	if math.Abs(given.V-sum) > pieceRoom*sum {
		t.faultAt("area", "area = %g, and its pieces in %s add up to %.6g: correct one of them, or leave area blank", given.V, r.settings.Files["pieces"], sum)
	}
	return given.V
}

// judgePieces finds pieces of areas that there are not.
func (r *reader) judgePieces() {
	for id, list := range r.pieces {
		if _, ok := r.areas.find(id); !ok {
			r.faults.Add(r.piecesFile, list[0].at.line, list[0].at.column, "unknown area %q%s", id, r.areas.nearest(id))
		}
	}
}
