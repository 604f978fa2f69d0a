package job

import (
	"bytes"

	"rimfall/network/fault"
	"rimfall/pipeflow"
)

// groundLineRow is a row of a ground line as texts.
type groundLineRow struct {
	Station   string `csv:"station"`
	Elevation string `csv:"elevation"`
	N         string `csv:"n"`
	Note      string `csv:"note"`
}

// ReadGroundLine reads a surveyed cross-section: a table of station, elevation
// and, where the roughness changes along the line, n up to the next point. Stations
// never go back, so the line cannot cross itself. All faults are reported at once.
func ReadGroundLine(file string, text []byte) ([]pipeflow.Point, error) {
	var faults fault.List
	var points []pipeflow.Point
	own := map[string]string{}
	for _, f := range csvFields[groundLineRow]() {
		own[f] = f
	}
	text = bytes.TrimPrefix(text, []byte("\xef\xbb\xbf"))
	t, ok := openTable("ground line", file, text, own, []string{"station", "elevation"}, &faults)
	if !ok {
		return nil, faults.Err()
	}
	eachRow(t, func(row *groundLineRow) {
		p := pipeflow.Point{
			Station: t.needed("station", row.Station, anySign), Elevation: t.needed("elevation", row.Elevation, anySign),
			N: t.number("n", row.N, positive).V,
		}
		if last := len(points) - 1; last >= 0 && p.Station < points[last].Station && len(faults) == 0 {
			t.faultAt("station", "station %g goes back behind %g: the line would cross itself; write the points in the order of their stations, an upright wall as two points at one station",
				p.Station, points[last].Station)
		}
		points = append(points, p)
	})
	if len(faults) == 0 && len(points) < 2 {
		faults.Add(file, t.line, 0, "a ground line of one point: write two or more, from bank to bank")
	}
	return points, faults.Err()
}
