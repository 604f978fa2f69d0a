package review

import (
	"fmt"
	"strconv"
	"strings"

	"rimfall/network"
	"rimfall/network/job"
	"rimfall/network/report"
)

// ReliefReport is an answer about relief, ready to be shown.
type ReliefReport struct {
	Subject *Subject
	*Relief
}

// ReliefRow is the work at one pipe.
type ReliefRow struct {
	ID, Work, From, To, Shape string
	Length                    float64
	Size, New                 string
	Share                     report.Value // of the flow that the second pipe takes
	Price                     Price
	Priced                    bool // Price.First is a cost
}

// ReliefSystemRow is the answer for one system.
type ReliefSystemRow struct {
	First          string
	Pipes, Changed int
	Proof          string
	Bound          report.Value // in the measure of the price
	Price          report.Value
	Priced         bool
	Runs           int
}

// Priced tells whether costs.csv gives the prices; else they are lengths.
func (r *ReliefReport) Priced() bool { return len(r.Subject.Job.Costs) > 0 }

// Rows makes a row for every pipe that is replaced or doubled.
func (r *ReliefReport) Rows() []ReliefRow {
	n, j := r.Subject.Network, r.Subject.Job
	rows := make([]ReliefRow, len(r.Changes))
	for i, c := range r.Changes {
		p := &n.Pipes[c.Pipe]
		rows[i] = ReliefRow{
			ID: p.ID, Work: c.Choice.Work.String(), From: n.Structures[p.From].ID, To: n.Structures[p.To].ID, Shape: p.Shape, Length: p.Length,
			Size: barrels(p.Count, j.SizeText(p.Shape, p.Size)), New: j.SizeText(p.Shape, c.Choice.Size), Price: c.Choice.Price, Priced: r.Priced(),
		}
		if c.Choice.Work == Double {
			rows[i].Share = report.N(c.Share)
		} else {
			rows[i].New = barrels(p.Count, rows[i].New)
		}
	}
	return rows
}

// barrels is a size with the number of barrels before it, where there are several.
func barrels(count int32, size string) string {
	if count == 1 {
		return size
	}
	return fmt.Sprintf("%d × %s", count, size)
}

// SystemRows makes a row for every system in which a limit is broken.
func (r *ReliefReport) SystemRows() []ReliefSystemRow {
	part, _ := parts(r.Subject.Network)
	rows := make([]ReliefSystemRow, len(r.Systems))
	for i, s := range r.Systems {
		row := ReliefSystemRow{First: r.Subject.Network.Structures[s.First].ID, Pipes: s.Pipes, Proof: s.Proof(), Runs: s.Runs, Priced: r.Priced()}
		if s.Found {
			row.Price = report.N(s.Price.First)
		}
		if s.Found || !s.Least {
			row.Bound = report.N(s.Bound.First)
		}
		for _, c := range r.Changes {
			if part[r.Subject.Network.Pipes[c.Pipe].From] == part[s.First] {
				row.Changed++
			}
		}
		rows[i] = row
	}
	return rows
}

// Proof says what is known of the answer for a system.
func (s *SystemRelief) Proof() string {
	switch {
	case s.Found && s.Least:
		return "least: all that is cheaper was tried"
	case s.Found && s.Bound.First >= s.Price.First*sameSum:
		return "least; of equal ones the best found"
	case s.Found:
		return "irreducible; the best found"
	case s.Least:
		return "no choice of listed sizes holds"
	}
	return "none found"
}

// Complete tells whether all limits hold in what was found.
func (r *Relief) Complete() bool {
	for i := range r.Systems {
		if !r.Systems[i].Found {
			return false
		}
	}
	return true
}

// Total is the price of all that was found.
func (r *Relief) Total() Price {
	var sum Price
	for i := range r.Systems {
		if s := &r.Systems[i]; s.Found {
			sum = sum.plus(s.Price)
		}
	}
	return sum
}

// BrokenRows makes a row for every limit that is broken as the network is; LeftRows for what no choice was found to cure.
func (r *ReliefReport) BrokenRows() []SetAsideRow { return r.named(r.Broken) }

// LeftRows makes a row for every limit that was still broken in the systems for which nothing was found.
func (r *ReliefReport) LeftRows() []SetAsideRow {
	var all []SetAsideRow
	for i := range r.Systems {
		all = append(all, r.named(r.Systems[i].Left)...)
	}
	return all
}

func (r *ReliefReport) named(places []Place) []SetAsideRow {
	h := HeadroomReport{Subject: r.Subject}
	rows := make([]SetAsideRow, len(places))
	for i, p := range places {
		rows[i] = SetAsideRow{h.Name(p), p.Limit.Rule()}
	}
	return rows
}

// Words lists the limits that hold.
func (r *Relief) Words() string {
	var words []string
	for _, l := range r.Options.Limits {
		words = append(words, l.String())
	}
	return strings.Join(words, ", ")
}

// sizeCell is a size as a number where it is one, that of one round pipe.
func sizeCell(text string) report.Value {
	if v, err := strconv.ParseFloat(text, 64); err == nil {
		return report.N(v)
	}
	return report.T(text)
}

// cost is a cost for people, in whole units of the money of costs.csv.
func cost(v float64) report.Value { return report.T(strconv.FormatFloat(v, 'f', 0, 64)) }

// ReliefColumns are the columns of the pipes that are replaced or doubled.
var ReliefColumns = []report.Column[ReliefRow]{
	column("id", []string{"pipe"}, report.Text, func(r *ReliefRow) report.Value { return report.T(r.ID) }),
	column("from", []string{"from"}, report.Text, func(r *ReliefRow) report.Value { return report.T(r.From) }),
	column("to", []string{"to"}, report.Text, func(r *ReliefRow) report.Value { return report.T(r.To) }),
	column("length", []string{"length"}, report.Length, func(r *ReliefRow) report.Value { return report.N(r.Length) }),
	column("shape", []string{"shape"}, report.Text, func(r *ReliefRow) report.Value { return report.T(r.Shape) }),
	column("size", []string{"size", "that lies"}, report.Size, func(r *ReliefRow) report.Value { return sizeCell(r.Size) }),
	column("work", []string{"work"}, report.Text, func(r *ReliefRow) report.Value { return report.T(r.Work) }),
	column("new_size", []string{"new pipe"}, report.Size, func(r *ReliefRow) report.Value { return sizeCell(r.New) }),
	column("share", []string{"its share", "of the flow"}, report.Number, func(r *ReliefRow) report.Value { return r.Share }),
	column("", []string{"cost"}, report.Number, func(r *ReliefRow) report.Value {
		if !r.Priced {
			return report.Value{}
		}
		return cost(r.Price.First)
	}),
	column("cost", nil, report.Number, func(r *ReliefRow) report.Value { return report.Value{Number: r.Price.First, OK: r.Priced} }),
}

// ReliefSystemColumns are the columns of the systems.
var ReliefSystemColumns = []report.Column[ReliefSystemRow]{
	column("first", []string{"system of", "structure"}, report.Text, func(r *ReliefSystemRow) report.Value { return report.T(r.First) }),
	column("pipes", []string{"pipes"}, report.Count, func(r *ReliefSystemRow) report.Value { return report.N(float64(r.Pipes)) }),
	column("changed", []string{"changed"}, report.Count, func(r *ReliefSystemRow) report.Value { return report.N(float64(r.Changed)) }),
	column("proof", []string{"what is proven"}, report.Text, func(r *ReliefSystemRow) report.Value { return report.T(r.Proof) }),
	column("", []string{"cost"}, report.Number, func(r *ReliefSystemRow) report.Value { return money(r, r.Price, true) }),
	column("", []string{"nothing under", "this cost holds"}, report.Number, func(r *ReliefSystemRow) report.Value { return money(r, r.Bound, true) }),
	column("", []string{"new pipe"}, report.Length, func(r *ReliefSystemRow) report.Value { return money(r, r.Price, false) }),
	column("", []string{"nothing under", "this length holds"}, report.Length, func(r *ReliefSystemRow) report.Value { return money(r, r.Bound, false) }),
	column("price", nil, report.Number, func(r *ReliefSystemRow) report.Value { return r.Price }),
	column("bound", nil, report.Number, func(r *ReliefSystemRow) report.Value { return r.Bound }),
	column("runs", []string{"runs"}, report.Count, func(r *ReliefSystemRow) report.Value { return report.N(float64(r.Runs)) }),
}

// money is a price for people in one of its two measures; nothing in the other one.
func money(r *ReliefSystemRow, v report.Value, priced bool) report.Value {
	switch {
	case r.Priced != priced || !v.OK:
		return report.Value{}
	case priced:
		return cost(v.Number)
	}
	return v
}

// Amendments are the changes of pipes.csv by which the job has the relief, marked in the column note.
func (r *ReliefReport) Amendments() []job.Amendment {
	n, j := r.Subject.Network, r.Subject.Job
	all := make([]job.Amendment, len(r.Changes))
	for i, c := range r.Changes {
		p := &n.Pipes[c.Pipe]
		all[i] = job.Amendment{Pipe: c.Pipe, Cells: map[string]job.Cell{}}
		was, is := j.SizeText(p.Shape, p.Size)+" "+j.Settings.Units.Size, j.SizeText(p.Shape, c.Choice.Size)
		if c.Choice.Work == Replace {
			if all[i].Cells["wall"] = (job.Cell{}); !levelsAssumed(n) {
				laidNew(all[i].Cells, p)
			}
			all[i].Cells["size"] = job.Cell{Text: is}
			all[i].Cells["note"] = job.Cell{Text: "relief: replaces " + was, After: true}
			continue
		}
		second := r.secondID(p.ID)
		share := p.Share.Or(1)
		all[i].Cells["share"] = numberCell(share - share*c.Share)
		all[i].Cells["note"] = job.Cell{Text: "relief: " + second + " laid beside it", After: true}
		twin := map[string]job.Cell{
			"id": {Text: second}, "size": {Text: is}, "count": {}, "share": numberCell(share * c.Share),
			"note": {Text: "relief: laid beside " + p.ID + " of " + was},
		}
		laidNew(twin, p)
		if angle := assumedAngle(n, c.Pipe); angle.OK && !p.Angle.OK {
			all[i].Cells["angle"], twin["angle"] = job.Cell{Number: angle}, job.Cell{Number: angle}
		}
		all[i].Twin = twin
	}
	return all
}

func numberCell(v float64) job.Cell { return job.Cell{Number: network.Some(v)} }

// levelsAssumed tells whether levels of existing pipes are taken from those of others. A pipe that is replaced then stays an
// existing one in the table, since its levels may be what others rest on.
func levelsAssumed(n *network.Network) bool {
	for i := range n.Pipes {
		if n.Pipes[i].AssumedUpper || n.Pipes[i].AssumedLower {
			return true
		}
	}
	return false
}

// laidNew sets the cells of a row that stands for a new pipe: its wall is that of the catalogue, and what was assumed
// of the old pipe is written down, since it is known of a new one.
func laidNew(cells map[string]job.Cell, p *network.Pipe) {
	cells["wall"], cells["status"] = job.Cell{}, job.Cell{Text: "proposed"}
	if p.AssumedN {
		cells["n"] = numberCell(p.N)
	}
	if (p.AssumedUpper || p.AssumedLower) && p.InvertUpper.OK && p.InvertLower.OK {
		cells["invert_upper"], cells["invert_lower"] = numberCell(p.InvertUpper.V), numberCell(p.InvertLower.V)
		if !p.GivenSlope {
			cells["slope"] = job.Cell{}
		}
	}
}

// secondID is an id for the pipe beside another one that no pipe has.
func (r *ReliefReport) secondID(id string) string {
	taken := map[string]bool{}
	for i := range r.Subject.Network.Pipes {
		taken[r.Subject.Network.Pipes[i].ID] = true
	}
	for k := 2; ; k++ {
		if second := fmt.Sprintf("%s-%d", id, k); !taken[second] {
			return second
		}
	}
}
