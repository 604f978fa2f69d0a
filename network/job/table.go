package job

import (
	"bytes"
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"maps"
	"slices"
	"strings"
	"unicode/utf8"

	"github.com/jszwec/csvutil"

	"rimfall/network/fault"
)

// tableFields are the fields of every table with free column order.
var tableFields = map[string][]string{
	"structures": csvFields[structureRow](),
	"pipes":      csvFields[pipeRow](),
	"areas":      csvFields[areaRow](),
	"departures": csvFields[departureRow](),
	"surfaces":   csvFields[surfaceRow](),
	"rainfall":   {"duration"},
	"ground":     csvFields[groundRow](),
	"crossings":  csvFields[crossingRow](),
	"pieces":     csvFields[pieceRow](),
	"paths":      csvFields[pathRow](),
	"costs":      csvFields[costRow](),
}

func csvFields[R any]() []string {
	var row R
	fields, err := csvutil.Header(row, "csv")
	if err != nil {
		panic(err) // a row struct of this package that csvutil cannot take
	}
	return fields
}

// table reads the rows of one CSV file: headings are judged first, then each row
// is handed on as texts by field, with the place of every cell.
//
// It stands between encoding/csv and csvutil as the latter's Reader: it skips
// comment and blank rows and evens out short rows, since csvutil would read a
// missing cell as an error of the whole file.
type table struct {
	name   string // "pipes"
	file   string // as printed
	text   []byte
	comma  bool // a comma is a decimal sign
	sep    rune
	csv    *csv.Reader
	faults *fault.List

	fields   []string       // field of each column; "" where the heading is passed over
	headings []string       // as written
	column   map[string]int // field → column
	headLine int
	line     int      // of the current row
	cells    int      // that the current row really has
	broken   bool     // a row was no CSV, so rows are missing
	record   []string // of the current row, evened out
	lines    []int    // start of each line in text, made when a place is asked for

	renames      map[string]string // field → the user's heading
	sizeUnit     string            // of sizes that are written
	unknown      []float64         // numbers that stand for "not known"
	decimalComma bool              // numbers are written with a comma
}

// place is a line and a column of a file, both from 1, in characters.
type place struct{ line, column int }

func newTable(name, file string, text []byte, faults *fault.List) *table {
	t := &table{name: name, file: file, text: text, faults: faults, column: map[string]int{}}
	t.sep = separator(text)
	t.comma = t.sep != ','
	t.csv = csv.NewReader(bytes.NewReader(text))
	t.csv.Comma, t.csv.Comment, t.csv.FieldsPerRecord, t.csv.ReuseRecord = t.sep, '#', -1, true
	return t
}

// openTable reads and judges the heading row. ok is false, with faults, where
// the table has none, or headings that are unknown, missing or repeated.
func openTable(name, file string, text []byte, renames map[string]string, required []string, faults *fault.List) (t *table, ok bool) {
	t = newTable(name, file, text, faults)
	t.renames = renames
	return t, t.readHeadings() && t.judgeHeadings(required)
}

// readHeadings takes the first row that is neither blank nor a comment.
func (t *table) readHeadings() bool {
	head, err := t.next()
	if err != nil {
		t.faults.Add(t.file, 0, 0, "empty table: it needs a heading row and at least one row below it")
		return false
	}
	t.headLine = t.line
	for _, h := range head {
		t.headings = append(t.headings, strings.TrimSpace(strings.Clone(h)))
	}
	return true
}

// rowsAtMost is a number of rows that the table does not exceed, for making room.
func (t *table) rowsAtMost() int { return bytes.Count(t.text, []byte("\n")) + 1 }

// separator takes the one of tab, semicolon and comma that the heading row has most of.
func separator(text []byte) rune {
	for line := range bytes.Lines(text) {
		line = bytes.TrimSpace(line)
		if len(line) == 0 || line[0] == '#' || bytes.HasPrefix(line, []byte(`"#`)) {
			continue
		}
		best, most := ',', bytes.Count(line, []byte(","))
		for _, sep := range "\t;" {
			if n := bytes.Count(line, []byte(string(sep))); n > most {
				best, most = sep, n
			}
		}
		return best
	}
	return ','
}

// judgeHeadings matches headings with fields. A wrong heading is a fault; the rows
// are read all the same, so that their faults are reported with it, and a heading
// that is nearly a field that is missing is read as that field.
func (t *table) judgeHeadings(required []string) bool {
	byHeading := t.knownHeadings()
	t.fields = make([]string, len(t.headings))
	for i, h := range t.headings {
		f, ok := byHeading[strings.ToLower(h)]
		switch {
		case !ok && (passedOver(h) || h == ""): // spreadsheets append empty columns; a cell in one is a fault, see Read
			continue
		case !ok:
			known := slices.Collect(maps.Keys(byHeading))
			t.fault(i, "unknown column %q: %s", h, fault.Suggest(h, known))
			near, found := fault.Nearest(h, known)
			if f = byHeading[near]; !found || t.has(f) || slices.Contains(t.headings, near) {
				continue
			}
		case t.has(f):
			t.fault(i, "column %q stands twice, first as column %d", h, t.column[f]+1)
			continue
		}
		t.column[f], t.fields[i] = i, f
	}
	return t.judgeRequired(required)
}

// knownHeadings gives the field of each heading that the table may have, in small letters.
func (t *table) knownHeadings() map[string]string {
	byHeading := map[string]string{}
	for _, f := range tableFields[t.name] {
		byHeading[strings.ToLower(f)] = f
	}
	for f, h := range t.renames {
		delete(byHeading, f)
		byHeading[strings.ToLower(h)] = f
	}
	return byHeading
}

func (t *table) has(field string) bool {
	_, ok := t.column[field]
	return ok
}

func (t *table) judgeRequired(required []string) bool {
	good := true
	for _, f := range required {
		if t.has(f) {
			continue
		}
		heading := f
		if h := t.renames[f]; h != "" {
			heading = h
		}
		t.faults.Add(t.file, t.headLine, 1, "missing column %q", heading)
		good = false
	}
	return good
}

// passedOver: columns for the user's own use.
func passedOver(heading string) bool {
	h := strings.ToLower(heading)
	return strings.HasPrefix(h, "x_") || strings.HasPrefix(h, "note")
}

// Read gives csvutil the next row, evened out to the number of headings.
func (t *table) Read() ([]string, error) {
	record, err := t.next()
	if err != nil {
		return nil, err
	}
	n := len(t.headings)
	for i := n; i < len(record); i++ {
		if strings.TrimSpace(record[i]) != "" {
			t.fault(i, "a cell %q beyond the last heading: is there a separator too many in this row?", record[i])
		}
	}
	t.record = t.record[:0]
	t.record = append(t.record, record[:min(n, len(record))]...)
	for len(t.record) < n {
		t.record = append(t.record, "")
	}
	for i, f := range t.fields {
		if f == "" && t.headings[i] == "" && strings.TrimSpace(t.record[i]) != "" {
			t.fault(i, "a cell %q in a column without a heading", t.record[i])
		}
	}
	return t.record, nil
}

// next reads the next row that is neither blank nor a comment. Rows that are no
// CSV are faults and passed over.
func (t *table) next() ([]string, error) {
	for {
		record, err := t.csv.Read()
		var bad *csv.ParseError
		if errors.As(err, &bad) {
			t.broken = true
			line, column := bad.Line, bad.Column
			if bad.StartLine < bad.Line { // a quote that is never closed takes in the rows below it
				line, column = bad.StartLine, 1
			}
			t.faults.Add(t.file, line, t.runes(line, column), "not valid CSV: %s", whyNoCSV(bad))
			continue
		}
		if err != nil {
			return nil, err
		}
		if strings.HasPrefix(strings.TrimSpace(record[0]), "#") || isBlank(record) {
			continue
		}
		t.line, _ = t.csv.FieldPos(0)
		t.cells = len(record)
		return record, nil
	}
}

func whyNoCSV(bad *csv.ParseError) string {
	if errors.Is(bad.Err, csv.ErrQuote) {
		return "a quoted cell goes on after its closing quote, or has none; a quote inside quotes is written twice"
	}
	if errors.Is(bad.Err, csv.ErrBareQuote) {
		return "a quote inside a cell; put the whole cell in quotes and write the inner quote twice"
	}
	return bad.Err.Error()
}

func isBlank(record []string) bool {
	for _, cell := range record {
		if strings.TrimSpace(cell) != "" {
			return false
		}
	}
	return true
}

// fault records what is wrong with column i of the current row.
func (t *table) fault(i int, format string, args ...any) {
	at := t.placeOf(i)
	t.faults.Add(t.file, at.line, at.column, format, args...)
}

// placeOf is where column i of the current row stands; in a row that is too
// short, its last cell, which the missing one would follow.
func (t *table) placeOf(i int) place {
	line, column := t.csv.FieldPos(min(i, t.cells-1))
	return place{line, t.runes(line, column)}
}

// faultAt records what is wrong with a field of the current row; where the table
// has no such column, the row's start is named.
func (t *table) faultAt(field, format string, args ...any) {
	i, ok := t.column[field]
	if !ok {
		t.faults.Add(t.file, t.line, 1, format, args...)
		return
	}
	t.fault(i, format, args...)
}

// runes turns a column in bytes, as encoding/csv counts, to one in characters.
func (t *table) runes(line, column int) int {
	if t.lines == nil {
		t.lines = lineStarts(t.text)
	}
	if line < 1 || line > len(t.lines) {
		return column
	}
	rest := t.text[t.lines[line-1]:]
	return 1 + utf8.RuneCount(rest[:min(len(rest), column-1)])
}

func lineStarts(text []byte) []int {
	starts := []int{0}
	for i, c := range text {
		if c == '\n' {
			starts = append(starts, i+1)
		}
	}
	return starts
}

// eachRow decodes every row into R, a struct of texts, and hands it on.
func eachRow[R any](t *table, judge func(row *R)) {
	decoder, err := csvutil.NewDecoder(t, uniqueFields(t.fields)...)
	if err != nil {
		t.faults.Add(t.file, 0, 0, "cannot be read: %v", err)
		return
	}
	rows := 0
	var row R // one for all rows: every field that has a column is set anew
	for {
		err := decoder.Decode(&row)
		if errors.Is(err, io.EOF) {
			break
		}
		if err != nil {
			t.faults.Add(t.file, t.line, 0, "cannot be read: %v", err)
			continue
		}
		rows++
		judge(&row)
	}
	if rows == 0 {
		t.faults.Add(t.file, t.headLine, 0, "empty table: no row below the headings")
	}
}

// uniqueFields gives columns that are passed over a name that no row struct has.
func uniqueFields(fields []string) []string {
	names := slices.Clone(fields)
	for i, f := range names {
		if f == "" {
			names[i] = fmt.Sprintf("\x00%d", i)
		}
	}
	return names
}
