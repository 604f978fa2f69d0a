package job

import (
	"math"
	"strings"

	"rimfall/network"
)

// Cost is a row of costs.csv: what a length of pipe costs, laid or taken out. Prices are local and dated; the program has
// none of its own.
type Cost struct {
	Removal  bool          // of taking out a pipe; else of laying one
	Shape    string        // "circle", …
	Material string        // "": any
	Size     network.Size  // in the job's size unit; zero: any, of a removal only
	Depth    network.Maybe // greatest depth, rim to invert, ft or m, for which it holds; not given: any
	Cost     float64       // per ft or m of length
	Line     int
}

// Costs are the rows of costs.csv; none where the job has no such file.
type Costs []Cost

// costRow is a row of costs.csv as texts.
type costRow struct {
	Work     string `csv:"work"`
	Shape    string `csv:"shape"`
	Material string `csv:"material"`
	Size     string `csv:"size"`
	Depth    string `csv:"depth"`
	Cost     string `csv:"cost"`
	Note     string `csv:"note"`
}

// costWorks are the words for what is paid for.
var costWorks = []string{"laying", "removal"}

// readCosts reads costs.csv, where the job has one.
func (r *reader) readCosts(j *Job) {
	if !r.has(r.settings.Files["costs"]) {
		return
	}
	t, ok := r.open("costs", "size", "cost")
	if !ok {
		return
	}
	eachRow(t, func(row *costRow) {
		c := Cost{
			Removal: t.word("work", row.Work, costWorks) == 1, Shape: shapeWords[t.word("shape", row.Shape, shapeWords)],
			Material: strings.ToLower(strings.TrimSpace(strings.Clone(row.Material))),
			Depth:    t.number("depth", row.Depth, positive), Cost: t.needed("cost", row.Cost, positive), Line: t.line,
		}
		c.Size = r.costSize(t, row, &c)
		j.Costs = append(j.Costs, c)
	})
}

// costSize reads the size of a row; that of a removal may be blank.
func (r *reader) costSize(t *table, row *costRow, c *Cost) network.Size {
	text := strings.TrimSpace(row.Size)
	if text == "" {
		if !c.Removal {
			t.faultAt("size", "size is blank: write the size that is laid at this cost; only a removal may be of any size")
		}
		return network.Size{}
	}
	size, why := parseSize(text, c.Shape, t.comma, r.settings.Units)
	if why != "" {
		t.faultAt("size", "size %q: %s", text, why)
	}
	return size
}

// Laying is the cost of a length of pipe laid at a depth; there is none where no row lists the size so deep.
func (c Costs) Laying(shape, material string, size network.Size, depth network.Maybe) (cost float64, ok bool) {
	return c.find(func(row *Cost) bool {
		return !row.Removal && row.Shape == shape && row.Size == size && (row.Material == "" || row.Material == material)
	}, depth)
}

// Removal is the cost of a length of pipe taken out; there is none where no row lists it.
func (c Costs) Removal(shape, material string, size network.Size, depth network.Maybe) (cost float64, ok bool) {
	return c.find(func(row *Cost) bool {
		anySize := row.Size == network.Size{}
		return row.Removal && (anySize || row.Shape == shape && row.Size == size) && (row.Material == "" || row.Material == material)
	}, depth)
}

// find takes, of the rows that fit, the one of the least depth that is not under the depth asked for; the deepest where the
// depth is not known.
func (c Costs) find(fits func(*Cost) bool, depth network.Maybe) (cost float64, ok bool) {
	best := math.Inf(1)
	if !depth.OK {
		best = math.Inf(-1)
	}
	for i := range c {
		row := &c[i]
		if !fits(row) {
			continue
		}
		holds := row.Depth.Or(math.MaxFloat64)
		switch {
		case depth.OK && (holds < depth.V || holds >= best):
		case !depth.OK && holds <= best:
		default:
			best, cost, ok = holds, row.Cost, true
		}
	}
	return cost, ok
}
