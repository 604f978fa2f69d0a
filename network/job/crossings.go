package job

import (
	"rimfall/network"
)

// crossingRow is a row of crossings.csv as texts: the services that cross a pipe.
type crossingRow struct {
	Pipe    string `csv:"pipe"`
	Station string `csv:"station"`
	Name    string `csv:"name"`
	Top     string `csv:"top"`
	Bottom  string `csv:"bottom"`
	Note    string `csv:"note"`
}

// readCrossings reads crossings.csv into the network.
func (r *reader) readCrossings(t *table) {
	eachRow(t, func(row *crossingRow) {
		p, ok := r.pipe(t, row.Pipe)
		before := len(r.faults)
		c := network.Crossing{Pipe: p, Name: note(row.Name), Line: int32(t.line)}
		c.Station = r.station(t, row.Station, p, ok)
		c.Top = t.needed("top", row.Top, anySign)
		c.Bottom = t.needed("bottom", row.Bottom, anySign)
		if c.Name == "" {
			t.faultAt("name", "name is blank: say what crosses, for example \"water main\"")
		}
		if len(r.faults) > before || !ok {
			return
		}
		if c.Top < c.Bottom {
			t.faultAt("top", "top %g is under bottom %g: write the levels of the outside of the service", c.Top, c.Bottom)
			return
		}
		r.network.Crossings = append(r.network.Crossings, c)
	})
}
