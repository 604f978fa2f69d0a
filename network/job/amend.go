package job

import (
	"bytes"
	"encoding/csv"
	"maps"
	"regexp"
	"slices"

	"rimfall/network"
)

// Amendment is a change of a row of pipes.csv: cells by field, and a second row below it that is the row as it was with
// cells of its own.
type Amendment struct {
	Pipe  network.PipeIndex
	Cells map[string]Cell
	Twin  map[string]Cell // nil: no second row
}

// Cell is what is written into a cell: a text, or a number where there is none. The zero value makes the cell blank.
type Cell struct {
	Text   string
	Number network.Maybe
	After  bool // the text is put after what stands in the cell
}

// WriteAmended writes a complete new job folder as Write does, with rows of pipes.csv changed. All else is copied
// byte by byte.
func (j *Job) WriteAmended(dir string, changes []Amendment, o WriteOptions) error {
	changed, pipes := *j, j.Settings.Files["pipes"]
	changed.files, changed.Settings.Files = maps.Clone(j.files), maps.Clone(j.Settings.Files)
	changed.files[pipes] = j.tables["pipes"].amended(j.Network, changes)
	delete(changed.Settings.Files, "pipes") // it is complete, so nothing is to be filled in
	return changed.Write(dir, nil, o)
}

// SizeText is a size as pipes.csv has it.
func (j *Job) SizeText(shape string, size network.Size) string {
	return j.tables["pipes"].chosen("size", &network.Pipe{Shape: shape, Size: size})
}

// amended is the text of pipes.csv with rows changed.
func (t *table) amended(n *network.Network, changes []Amendment) []byte {
	t.decimalComma = t.sep != ',' && regexp.MustCompile(`\d,\d`).Match(t.text)
	if t.lines == nil {
		t.lines = lineStarts(t.text)
	}
	column, added := t.columnsFor(changes)
	byLine := map[int]*Amendment{t.headLine: nil}
	for i := range changes {
		byLine[int(n.Pipes[changes[i].Pipe].Line)] = &changes[i]
	}
	var b bytes.Buffer
	done := 0
	for _, line := range slices.Sorted(maps.Keys(byLine)) {
		start := t.lines[line-1]
		reader := csv.NewReader(bytes.NewReader(t.text[start:]))
		reader.Comma, reader.FieldsPerRecord = t.sep, -1
		record, err := reader.Read()
		if err != nil {
			continue // the row was read before, so it cannot fail now
		}
		end := start + int(reader.InputOffset())
		row := t.text[start:end]
		ending := row[len(bytes.TrimRight(row, "\r\n")):]
		b.Write(t.text[done:start])
		done = end
		switch a := byLine[line]; {
		case a == nil && len(added) == 0:
			b.Write(row)
		case a == nil:
			b.Write(t.joined(append(record, t.headingsOf(added)...)))
			b.Write(ending)
		default:
			t.writeAmendment(&b, record, a, column, ending)
		}
	}
	b.Write(t.text[done:])
	return b.Bytes()
}

// writeAmendment writes a changed row, and the second one below it.
func (t *table) writeAmendment(b *bytes.Buffer, record []string, a *Amendment, column map[string]int, ending []byte) {
	if len(ending) == 0 { // the last line of a file that ends without one
		ending = []byte("\n")
	}
	b.Write(t.joined(t.withCells(record, a.Cells, column)))
	b.Write(ending)
	if a.Twin != nil {
		b.Write(t.joined(t.withCells(record, a.Twin, column)))
		b.Write(ending)
	}
}

// columnsFor gives the column of every field, with those that changes need and the table lacks put last.
func (t *table) columnsFor(changes []Amendment) (column map[string]int, added []string) {
	column = maps.Clone(t.column)
	last := len(t.headings)
	need := map[string]bool{}
	for _, a := range changes {
		for _, cells := range []map[string]Cell{a.Cells, a.Twin} {
			for f, c := range cells {
				need[f] = need[f] || c.Text != "" || c.Number.OK
			}
		}
	}
	for _, f := range slices.Sorted(maps.Keys(need)) {
		if _, has := column[f]; !has && need[f] {
			column[f] = last
			last++
			added = append(added, f)
		}
	}
	return column, added
}

// withCells is a copy of a row with cells set.
func (t *table) withCells(record []string, cells map[string]Cell, column map[string]int) []string {
	row := slices.Clone(record)
	for f, c := range cells {
		i, has := column[f]
		if !has {
			continue // it has no column and is to be blank
		}
		for len(row) <= i {
			row = append(row, "")
		}
		switch {
		case c.Number.OK:
			row[i] = t.written(c.Number.V)
		case c.After && row[i] != "":
			row[i] += "; " + c.Text
		default:
			row[i] = c.Text
		}
	}
	return row
}
