package review

import (
	"fmt"
	"math"
	"slices"
	"strings"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/report"
)

// Comparison is what changed from one run to another, both in one system of units.
// Things are known by their ids: one with a new id was added, one whose id is gone
// was removed.
type Comparison struct {
	Before, After *analysis.Result

	Settings       []Change
	Added, Removed []Element
	Changed        []Changed
	Findings       FindingChanges
}

// Kind says what an element is.
type Kind int8

// The kinds of element.
const (
	OfPipe Kind = iota
	OfStructure
	OfArea
)

// Kinds lists the words for the kinds, in the order of their constants.
var Kinds = []string{"pipe", "structure", "area"}

func (k Kind) String() string { return Kinds[k] }

// Element is a pipe, a structure or an area. Before and After are its places in the
// two jobs; -1 where it is not there.
type Element struct {
	Kind          Kind
	ID            string
	Before, After int
}

// Changed is an element of both jobs in which something changed: what was given, or
// what the design storm does there.
type Changed struct {
	Element
	Given, Results []Change
}

// Change is one value in both jobs.
type Change struct {
	Key           string // as in data files
	Name          string // in words
	Quantity      report.Quantity
	Before, After report.Value
}

// Compare sets two runs side by side. Both are of the design storm; the check storm
// counts with its findings. The error says that their units differ.
func Compare(before, after *analysis.Result) (*Comparison, error) {
	b, a := before.Job.Settings.Units.Name, after.Job.Settings.Units.Name
	if b != a {
		return nil, fmt.Errorf("%s is in units %q and %s in %q: two jobs are compared in one system of units", before.Job.Dir, b, after.Job.Dir, a)
	}
	c := &Comparison{Before: before, After: after}
	c.settings()
	c.pipes()
	c.structures()
	c.areas()
	c.Findings = compareFindings(before, after, c.isRemoved())
	return c, nil
}

// Worse tells whether an error or a warning that no departure accepts is new or has
// grown worse. Notices tell how a result came about and do not count.
func (c *Comparison) Worse() bool {
	grave := func(f FindingChange) bool { return counts(f.After) }
	return slices.ContainsFunc(c.Findings.New, grave) || slices.ContainsFunc(c.Findings.Worse, grave)
}

// isRemoved tells of an element whether it was removed.
func (c *Comparison) isRemoved() func(k Kind, id string) bool {
	gone := make(map[Element]bool, len(c.Removed))
	for _, e := range c.Removed {
		gone[Element{Kind: e.Kind, ID: e.ID}] = true
	}
	return func(k Kind, id string) bool { return gone[Element{Kind: k, ID: id}] }
}

func (c *Comparison) pipes() {
	row := func(r *analysis.Result, i int) *report.PipeRow {
		row := report.Pipe(r, &r.Design, network.PipeIndex(i))
		return &row
	}
	pairs := c.pair(OfPipe, ids(c.Before.Network.Pipes, pipeID), ids(c.After.Network.Pipes, pipeID))
	columns := namedColumns(append(slices.Clone(pipeGiven), wallOf(c.After.Job.Settings.Units)))
	results := namedColumns(report.Pick(report.PipeColumns, pipeResults))
	for _, e := range pairs {
		b, a := &c.Before.Network.Pipes[e.Before], &c.After.Network.Pipes[e.After]
		given := append(c.ends(b, a), differences(columns, b, a)...)
		c.note(Changed{e, given, differences(results, row(c.Before, e.Before), row(c.After, e.After))})
	}
}

func (c *Comparison) structures() {
	row := func(r *analysis.Result, i int) *report.StructureRow {
		row := report.Structure(r, &r.Design, network.StructureIndex(i))
		return &row
	}
	pairs := c.pair(OfStructure, ids(c.Before.Network.Structures, structureID), ids(c.After.Network.Structures, structureID))
	columns := namedColumns(structureGiven)
	results := namedColumns(report.Pick(report.StructureColumns, structureResults))
	for _, e := range pairs {
		b, a := &c.Before.Network.Structures[e.Before], &c.After.Network.Structures[e.After]
		c.note(Changed{e, differences(columns, b, a), differences(results, row(c.Before, e.Before), row(c.After, e.After))})
	}
}

func (c *Comparison) areas() {
	pairs := c.pair(OfArea, ids(c.Before.Network.Areas, areaID), ids(c.After.Network.Areas, areaID))
	columns := namedColumns(areaGiven)
	for _, e := range pairs {
		b, a := &c.Before.Network.Areas[e.Before], &c.After.Network.Areas[e.After]
		drains := between("structure", "drains to", structureName(c.Before, b.Structure), structureName(c.After, a.Structure))
		c.note(Changed{e, append(drains, differences(columns, b, a)...), nil})
	}
}

// note keeps an element in which something changed.
func (c *Comparison) note(e Changed) {
	if len(e.Given) > 0 || len(e.Results) > 0 {
		c.Changed = append(c.Changed, e)
	}
}

// ends are the structures that a pipe joins, where another one stands there now.
func (c *Comparison) ends(b, a *network.Pipe) []Change {
	return append(
		between("from", "from", structureName(c.Before, b.From), structureName(c.After, a.From)),
		between("to", "to", structureName(c.Before, b.To), structureName(c.After, a.To))...)
}

func between(key, name, before, after string) []Change {
	if before == after {
		return nil
	}
	return []Change{{key, name, report.Text, report.T(before), report.T(after)}}
}

// pair matches the ids of both jobs. What stands in one alone is added or removed; the
// rest comes in the order of the second job.
func (c *Comparison) pair(k Kind, before, after []string) []Element {
	place := make(map[string]int, len(before))
	for i, id := range before {
		place[id] = i
	}
	both := make([]Element, 0, min(len(before), len(after)))
	for i, id := range after {
		b, ok := place[id]
		if !ok {
			c.Added = append(c.Added, Element{k, id, -1, i})
			continue
		}
		delete(place, id)
		both = append(both, Element{k, id, b, i})
	}
	if len(place) == 0 {
		return both
	}
	for i, id := range before {
		if _, left := place[id]; left {
			c.Removed = append(c.Removed, Element{k, id, i, -1})
		}
	}
	return both
}

func ids[R any](rows []R, id func(*R) string) []string {
	all := make([]string, len(rows))
	for i := range rows {
		all[i] = id(&rows[i])
	}
	return all
}

func pipeID(p *network.Pipe) string           { return p.ID }
func structureID(s *network.Structure) string { return s.ID }
func areaID(a *network.Area) string           { return a.ID }

func structureName(r *analysis.Result, s network.StructureIndex) string {
	return r.Network.Structures[s].ID
}

// named is a column with its heading in one line.
type named[R any] struct {
	*report.Column[R]
	name string
}

func namedColumns[R any](columns []report.Column[R]) []named[R] {
	all := make([]named[R], len(columns))
	for i := range columns {
		all[i] = named[R]{&columns[i], strings.Join(columns[i].Head, " ")}
	}
	return all
}

// differences are the columns in which two rows differ. They are gathered aside first, so
// that what is kept of a large job has no room to spare.
func differences[R any](columns []named[R], before, after *R) []Change {
	var room [mostColumns]Change
	all := room[:0]
	for i := range columns {
		c := &columns[i]
		if b, a := c.Value(before), c.Value(after); !same(b, a) {
			all = append(all, Change{c.Key, c.name, c.Quantity, b, a})
		}
	}
	if len(all) == 0 {
		return nil
	}
	return append(make([]Change, 0, len(all)), all...)
}

// mostColumns is at least the number of columns of any list here.
const mostColumns = 48

// sameNumber is the share by which two results may differ and be one: rows in another
// order add up to other last digits, some 1e-15, which levels and iterations multiply.
const sameNumber = 1e-9

func same(b, a report.Value) bool {
	if b.OK != a.OK || b.Text != a.Text {
		return false
	}
	return math.Abs(b.Number-a.Number) <= sameNumber*max(math.Abs(b.Number), math.Abs(a.Number))
}
