package job

import (
	"strings"

	"rimfall/network"
)

// groundRow is a row of ground.csv as texts: the ground between structures.
type groundRow struct {
	Pipe      string `csv:"pipe"`
	Station   string `csv:"station"`
	Elevation string `csv:"elevation"`
	Note      string `csv:"note"`
}

// readAlong reads what lies along the pipes, where the job has it.
func (r *reader) readAlong() {
	if r.has(r.settings.Files["ground"]) {
		if t, ok := r.open("ground", "pipe", "station", "elevation"); ok {
			r.readGround(t)
		}
	}
	if r.has(r.settings.Files["crossings"]) {
		if t, ok := r.open("crossings", "pipe", "station", "name", "top", "bottom"); ok {
			r.readCrossings(t)
		}
	}
}

// readGround reads ground.csv into the network. Stations count along the pipe
// from its upper structure.
func (r *reader) readGround(t *table) {
	type spot struct {
		pipe    network.PipeIndex
		station float64
	}
	seen := map[spot]int{}
	eachRow(t, func(row *groundRow) {
		p, ok := r.pipe(t, row.Pipe)
		before := len(r.faults)
		station := r.station(t, row.Station, p, ok)
		elevation := t.needed("elevation", row.Elevation, anySign)
		if !ok || len(r.faults) > before {
			return
		}
		at := spot{p, station}
		if first, twice := seen[at]; twice {
			t.faultAt("station", "pipe %s has a ground level at %s already, in line %d", strings.TrimSpace(row.Pipe), strings.TrimSpace(row.Station), first)
			return
		}
		seen[at] = t.line
		r.network.Ground = append(r.network.Ground, network.GroundPoint{Pipe: p, Station: station, Elevation: elevation, Line: int32(t.line)})
	})
	r.network.SortGround()
}

// pipe looks up the pipe that a cell names. ok is false, with a fault, where
// there is none.
func (r *reader) pipe(t *table, text string) (p network.PipeIndex, ok bool) {
	text = strings.TrimSpace(text)
	if i, found := r.pipes.find(text); found {
		return network.PipeIndex(i), true
	}
	switch {
	case r.pipes.slots == nil: // the table of pipes could not be read, which is a fault already
	case text == "":
		t.faultAt("pipe", "pipe is blank: name a pipe")
	default:
		t.faultAt("pipe", "unknown pipe %q%s", text, r.pipes.nearest(text))
	}
	return 0, false
}

// station reads a distance along a pipe from its upper structure and holds it
// against the length of the pipe, where the pipe is known.
func (r *reader) station(t *table, text string, p network.PipeIndex, known bool) float64 {
	if strings.TrimSpace(text) == "" {
		t.faultAt("station", "station is blank: write the distance from the upper end of the pipe")
		return 0
	}
	v := t.number("station", text, notNegative)
	if !v.OK || !known {
		return v.V
	}
	pipe := &r.network.Pipes[p]
	if over := v.V - pipe.Length; over > r.settings.Units.InvertTolerance && pipe.Length > 0 {
		t.faultAt("station", "station %s is beyond the lower end of pipe %s, which is %.6g %s long; stations count along the pipe from its upper end",
			strings.TrimSpace(text), pipe.ID, pipe.Length, r.settings.Units.Length)
	}
	return v.V
}
