package job

import (
	"bytes"
	"encoding/csv"
	"regexp"
	"slices"
	"strconv"
	"strings"

	"rimfall/network"
	"rimfall/pipeflow/catalog"
)

// chosenFields are the columns that sizing fills in, in the order in which they
// are added to a table that lacks them.
var chosenFields = []string{"size", "slope", "invert_upper", "invert_lower"}

// completed is the text of pipes.csv with the blank cells of chosenFields filled
// in from a network. All else is copied byte by byte.
func (t *table) completed(n *network.Network) []byte {
	var b bytes.Buffer
	done := 0 // bytes of the text that are copied
	rewrite := func(line int, change func(record []string) []string) {
		start := t.lines[line-1]
		reader := csv.NewReader(bytes.NewReader(t.text[start:]))
		reader.Comma, reader.FieldsPerRecord = t.sep, -1
		record, err := reader.Read()
		if err != nil {
			return // the row was read before, so it cannot fail now
		}
		end := start + int(reader.InputOffset())
		ending := t.text[start+len(bytes.TrimRight(t.text[start:end], "\r\n")) : end]
		b.Write(t.text[done:start])
		b.Write(t.joined(change(record)))
		b.Write(ending)
		done = end
	}
	if t.lines == nil {
		t.lines = lineStarts(t.text)
	}
	t.decimalComma = t.sep != ',' && regexp.MustCompile(`\d,\d`).Match(t.text)
	if added := t.missingColumns(); len(added) > 0 {
		rewrite(t.headLine, func(record []string) []string { return append(record, t.headingsOf(added)...) })
	}
	for i := range n.Pipes {
		rewrite(int(n.Pipes[i].Line), func(record []string) []string { return t.filled(record, &n.Pipes[i]) })
	}
	b.Write(t.text[done:])
	return b.Bytes()
}

func (t *table) missingColumns() []string {
	return slices.DeleteFunc(slices.Clone(chosenFields), func(f string) bool {
		_, has := t.column[f]
		return has
	})
}

// headingsOf gives the headings of fields: the user's own where named.
func (t *table) headingsOf(fields []string) []string {
	names := slices.Clone(fields)
	for i, f := range fields {
		if h := t.renames[f]; h != "" {
			names[i] = h
		}
	}
	return names
}

// filled is a row with its blank cells filled in from its pipe.
func (t *table) filled(record []string, p *network.Pipe) []string {
	for len(record) < len(t.headings) {
		record = append(record, "")
	}
	for _, f := range chosenFields {
		i, has := t.column[f]
		switch {
		case has && assumed(f, p): // it is taken again from the same known levels
		case !has && assumed(f, p):
			record = append(record, "")
		case !has:
			record = append(record, t.chosen(f, p))
		case strings.TrimSpace(t.unlessUnknown(f, record[i])) == "":
			record[i] = t.chosen(f, p)
		}
	}
	return record
}

// assumed tells whether a field of a pipe rests on an assumption, and was not chosen.
func assumed(field string, p *network.Pipe) bool {
	switch field {
	case "invert_upper":
		return p.AssumedUpper
	case "invert_lower":
		return p.AssumedLower
	case "slope":
		return (p.AssumedUpper || p.AssumedLower) && !p.GivenSlope
	}
	return false
}

// chosen is a number of a pipe as it is written: in the shortest form that reads
// back to the same number.
func (t *table) chosen(field string, p *network.Pipe) string {
	switch field {
	case "size":
		rise := t.written(p.Size.Rise)
		switch catalog.Shape(p.Shape) {
		case catalog.Circle:
			return rise
		case catalog.Box: // a small one needs its unit
			return t.written(p.Size.Span) + t.sizeUnit + " x " + rise + t.sizeUnit
		}
		return t.written(p.Size.Span) + "x" + rise
	case "slope":
		return t.written(p.Slope.V)
	case "invert_upper":
		return t.written(p.InvertUpper.V)
	}
	return t.written(p.InvertLower.V)
}

// written is a number with the decimal sign of the table.
func (t *table) written(v float64) string {
	text := strconv.FormatFloat(v, 'f', -1, 64)
	if t.decimalComma {
		return strings.Replace(text, ".", ",", 1)
	}
	return text
}

// joined writes a record as one line of CSV, without its ending.
func (t *table) joined(record []string) []byte {
	var b bytes.Buffer
	w := csv.NewWriter(&b)
	w.Comma = t.sep
	_ = w.Write(record) // into memory
	w.Flush()
	return bytes.TrimSuffix(b.Bytes(), []byte("\n"))
}
