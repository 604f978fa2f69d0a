package catalog

import (
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"slices"
	"strings"
	"unicode/utf8"
)

// Fault is what is wrong in a list, with its place: line and column count from 1, the column in characters.
type Fault struct {
	Line, Column int
	Text         string // what is wrong and what would be right
}

// String is the fault as line:column: text.
func (f Fault) String() string { return fmt.Sprintf("%d:%d: %s", f.Line, f.Column, f.Text) }

// cell is one field with its place.
type cell struct {
	text         string
	line, column int
}

// fault makes a fault at the cell.
func (c cell) fault(format string, args ...any) Fault {
	return Fault{c.line, c.column, fmt.Sprintf(format, args...)}
}

// table is a CSV text cut into cells: one heading row and the rows below it.
type table struct {
	headings []cell
	rows     [][]cell
	decimal  byte // the character that may stand for the decimal point beside '.': ',' where the separator is another
}

// readTable cuts a text into cells. The separator is a tab, a semicolon or a comma, whichever the heading row has, in
// that order; a '#' starts a comment line; a byte-order mark and CRLF are taken. A text that is not CSV is cut up to
// its fault.
func readTable(r io.Reader) (table, []Fault) {
	raw, err := io.ReadAll(r)
	if err != nil {
		return table{}, []Fault{{1, 1, fmt.Sprintf("cannot be read: %v", err)}}
	}
	text := strings.TrimPrefix(string(raw), "\ufeff")
	if !utf8.ValidString(text) {
		return table{}, []Fault{{1, 1, "is not UTF-8 text: save it as UTF-8"}}
	}
	lines := strings.Split(text, "\n")
	separator := separatorOf(lines)
	reader := csv.NewReader(strings.NewReader(text))
	reader.Comma, reader.Comment, reader.FieldsPerRecord = separator, '#', -1
	t, faults := cut(reader, lines)
	if separator != ',' {
		t.decimal = ','
	}
	return t, faults
}

// separatorOf looks at the heading row, the first line that is neither blank nor a comment.
func separatorOf(lines []string) rune {
	for _, line := range lines {
		if strings.TrimSpace(line) == "" || strings.HasPrefix(line, "#") {
			continue
		}
		for _, s := range "\t;" {
			if strings.ContainsRune(line, s) {
				return s
			}
		}
		break
	}
	return ','
}

// cut reads records into cells until the end or the first fault of form.
func cut(reader *csv.Reader, lines []string) (table, []Fault) {
	var t table
	for {
		record, err := reader.Read()
		if errors.Is(err, io.EOF) {
			return t, nil
		}
		var broken *csv.ParseError
		if errors.As(err, &broken) {
			return t, []Fault{{broken.Line, max(1, broken.Column), "is not CSV: a quote is open or stands inside a cell"}}
		}
		row := make([]cell, len(record))
		for i, field := range record {
			line, column := reader.FieldPos(i)
			row[i] = cell{strings.TrimSpace(field), line, characters(lines, line, column)}
		}
		switch {
		case t.headings == nil:
			t.headings = row
		case slices.ContainsFunc(row, func(c cell) bool { return c.text != "" }):
			t.rows = append(t.rows, row)
		}
	}
}

// characters turns a column counted in bytes into one counted in characters.
func characters(lines []string, line, column int) int {
	if line < 1 || line > len(lines) || column < 1 || column-1 > len(lines[line-1]) {
		return column
	}
	return utf8.RuneCountInString(lines[line-1][:column-1]) + 1
}
