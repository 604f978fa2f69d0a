package job

import (
	"math"
	"strings"

	"rimfall/network"
	"rimfall/pipeflow/catalog"
)

// pipeRow is a row of pipes.csv as texts.
type pipeRow struct {
	ID          string `csv:"id"`
	From        string `csv:"from"`
	To          string `csv:"to"`
	Length      string `csv:"length"`
	Shape       string `csv:"shape"`
	Size        string `csv:"size"`
	Count       string `csv:"count"`
	Material    string `csv:"material"`
	N           string `csv:"n"`
	InvertUpper string `csv:"invert_upper"`
	InvertLower string `csv:"invert_lower"`
	Slope       string `csv:"slope"`
	Wall        string `csv:"wall"`
	Angle       string `csv:"angle"`
	Loss        string `csv:"loss"`
	Bend        string `csv:"bend"`
	Status      string `csv:"status"`
	Share       string `csv:"share"`
	Note        string `csv:"note"`
}

var statuses = []string{"proposed", "existing"}

// shapeWords are the shapes of closed conduits that a pipe can have.
var shapeWords = func() []string {
	var words []string
	for _, s := range catalog.Shapes() {
		words = append(words, string(s))
	}
	return words
}()

// readPipes reads pipes.csv into the network.
func (r *reader) readPipes(t *table) {
	n := r.network
	rows := t.rowsAtMost()
	n.Pipes = make([]network.Pipe, 0, rows)
	r.pipes = newIDs(rows, func(i int32) (string, int32) { return n.Pipes[i].ID, n.Pipes[i].Line })
	eachRow(t, func(row *pipeRow) {
		p := network.Pipe{Line: int32(t.line), Note: note(row.Note)}
		p.ID = r.pipes.add(t, row.ID, len(n.Pipes))
		p.From = r.structure(t, "from", row.From)
		p.To = r.structure(t, "to", row.To)
		if from := strings.TrimSpace(row.From); from != "" && from == strings.TrimSpace(row.To) {
			t.faultAt("to", "pipe %s starts and ends at structure %s", p.ID, from)
		}
		p.Length = r.length(t, row, &p)
		p.Count = r.barrels(t, row.Count)
		p.Shape = shapeWords[t.word("shape", row.Shape, shapeWords)]
		p.Existing = t.word("status", row.Status, statuses) == 1
		p.Angle = t.number("angle", row.Angle, anySign)
		p.Loss = t.number("loss", row.Loss, anySign)
		p.Bend = t.number("bend", row.Bend, notNegative).V
		p.Share = t.number("share", row.Share, notNegative)
		r.levels(t, row, &p)
		r.materialAndN(t, row, &p)
		r.sizeAndWall(t, row, &p)
		n.Pipes = append(n.Pipes, p)
	})
}

// length is the given length, or the distance of the ends in plan.
func (r *reader) length(t *table, row *pipeRow, p *network.Pipe) float64 {
	if strings.TrimSpace(row.Length) != "" {
		return t.number("length", row.Length, positive).V
	}
	if p.From < 0 || p.To < 0 {
		return 0
	}
	a, b := &r.network.Structures[p.From], &r.network.Structures[p.To]
	if !a.X.OK || !a.Y.OK || !b.X.OK || !b.Y.OK {
		t.faultAt("length", "length is blank, and %s and %s have no coordinates to take it from", a.ID, b.ID)
		return 0
	}
	d := math.Hypot(a.X.V-b.X.V, a.Y.V-b.Y.V)
	if d == 0 && p.From != p.To {
		t.faultAt("length", "length is blank, and %s and %s stand at the same place", a.ID, b.ID)
	}
	return d
}

func (r *reader) barrels(t *table, text string) int32 {
	v := t.number("count", text, positive)
	if v.OK && (v.V != math.Trunc(v.V) || v.V > 1000) {
		t.faultAt("count", "count = %s: it is a whole number of barrels", strings.TrimSpace(text))
	}
	return int32(v.Or(1))
}

// levels reads inverts and slope; two of them give the third.
func (r *reader) levels(t *table, row *pipeRow, p *network.Pipe) {
	before := len(r.faults)
	up := t.number("invert_upper", row.InvertUpper, anySign)
	low := t.number("invert_lower", row.InvertLower, anySign)
	slope := t.number("slope", row.Slope, anySign)
	p.GivenSlope = slope.OK
	if p.Length > 0 {
		switch {
		case up.OK && low.OK && slope.OK:
			gap := up.V - low.V - slope.V*p.Length
			if math.Abs(gap) > r.settings.Units.InvertTolerance {
				t.faultAt("slope", "inverts and slope disagree: the inverts fall %.6g over %.6g, which is a slope of %.6g, not %s; leave one of the three blank",
					up.V-low.V, p.Length, (up.V-low.V)/p.Length, strings.TrimSpace(row.Slope))
			}
		case up.OK && low.OK:
			slope = network.Some((up.V - low.V) / p.Length)
		case up.OK && slope.OK:
			low = network.Some(up.V - slope.V*p.Length)
		case low.OK && slope.OK:
			up = network.Some(low.V + slope.V*p.Length)
		}
	}
	p.InvertUpper, p.InvertLower, p.Slope = up, low, slope
	if len(r.faults) == before && p.Length > 0 {
		r.judgeSlope(t, row, p)
	}
}

// judgeSlope: a pipe that is checked needs a slope; one that is to be sized, a
// fall where it has a slope.
func (r *reader) judgeSlope(t *table, row *pipeRow, p *network.Pipe) {
	blankSize := strings.TrimSpace(t.unlessUnknown("size", row.Size)) == ""
	switch {
	case r.purpose == ToCheck && !p.Slope.OK && !p.Existing: // of existing pipes see judgeSlopes
		t.faultAt("slope", "pipe %s has no slope: write the slope or both inverts, or let `rimfall size` choose them", p.ID)
	case r.purpose == ToSize && blankSize && p.Slope.OK && p.Slope.V <= 0:
		t.faultAt("slope", "pipe %s is to be sized on a slope of %.6g; a size can be chosen only where the pipe falls to its lower end", p.ID, p.Slope.V)
	}
}

// materialAndN reads the material and Manning's n: as given, else the
// material's, else the criterion.
func (r *reader) materialAndN(t *table, row *pipeRow, p *network.Pipe) {
	p.N, p.AssumedN = r.settings.Criteria.N, p.Existing
	if name := strings.ToLower(strings.TrimSpace(row.Material)); name != "" && name != unknownMaterial {
		p.AssumedN = false
		m, ok := catalog.MaterialByName(name)
		if ok {
			p.Material, p.N = m.Name, m.N
		} else {
			p.Material = strings.Clone(name)
			if strings.TrimSpace(row.N) == "" {
				t.faultAt("material", "material %q has no n in the list, so write n; %s", name, suggestMaterial(name))
			}
		}
	}
	if v := t.number("n", row.N, positive); v.OK {
		p.N, p.AssumedN = v.V, false
	}
}
