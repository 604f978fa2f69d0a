package catalog

import (
	"fmt"
	"slices"
	"strings"
)

// columns are the headings of a list of sizes; shape and span are required.
var columns = []string{
	"units", "shape", "material", "series", "span", "rise", "wall", "haunch",
	"bottom_radius", "top_radius", "corner_radius", "standard", "source",
}

// row gives the cells of one row by heading; a column that the list has not gives an empty cell at the row's start.
type row map[string]cell

// match reads the headings: which column is which, and a fault for each that is unknown, double or missing.
func (t table) match(known, required []string) (where map[string]int, faults []Fault) {
	where = make(map[string]int)
	for i, h := range t.headings {
		name := strings.ToLower(h.text)
		_, double := where[name]
		switch {
		case strings.HasPrefix(name, "x_"), strings.HasPrefix(name, "note"), name == "":
		case !slices.Contains(known, name):
			faults = append(faults, h.fault("unknown column %q: did you mean %q? (a heading that starts with x_ or note is "+
				"left alone)", h.text, nearest(name, known)))
		case double:
			faults = append(faults, h.fault("column %q stands twice: keep one", name))
		default:
			where[name] = i
		}
	}
	for _, name := range required {
		if _, ok := where[name]; !ok {
			faults = append(faults, Fault{t.headingLine(), 1, fmt.Sprintf("column %q is missing", name)})
		}
	}
	return where, faults
}

// headingLine is the line of the heading row, 1 in an empty text.
func (t table) headingLine() int {
	if len(t.headings) == 0 {
		return 1
	}
	return t.headings[0].line
}

// named gives the cells of a row their headings, and a fault where the row is longer than the headings.
func (t table) named(cells []cell, where map[string]int) (row, []Fault) {
	named := make(row, len(where))
	start := cell{line: cells[0].line, column: cells[0].column}
	for _, name := range columns {
		named[name] = start
	}
	for name, i := range where {
		if i < len(cells) {
			named[name] = cells[i]
		}
	}
	if len(cells) > len(t.headings) {
		extra := cells[len(t.headings)]
		return named, []Fault{extra.fault("%d cells under %d headings: quote a cell that holds the separator",
			len(cells), len(t.headings))}
	}
	return named, nil
}

// nearest is the known name with the least edits from a word.
func nearest(word string, known []string) string {
	return slices.MinFunc(known, func(a, b string) int { return edits(word, a) - edits(word, b) })
}

// edits counts the insertions, deletions and changes of a letter between two words (Levenshtein 1966).
func edits(a, b string) int {
	row := make([]int, len(b)+1)
	for j := range row {
		row[j] = j
	}
	for i := range len(a) {
		diagonal := row[0]
		row[0] = i + 1
		for j := range len(b) {
			change := diagonal
			if a[i] != b[j] {
				change++
			}
			diagonal = row[j+1]
			row[j+1] = min(change, row[j]+1, row[j+1]+1)
		}
	}
	return row[len(b)]
}
