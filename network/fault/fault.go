// Package fault holds what a user wrote that cannot be run: each fault with its
// file, line and column, what is wrong and what would be right. All faults of
// all files are collected first and reported together.
package fault

import (
	"cmp"
	"fmt"
	"slices"
	"strings"
)

// Fault is one place that cannot be run. Line and Column count from one, in
// characters; 0 means that the fault concerns the whole file (or, for Column,
// the whole line).
type Fault struct {
	File   string
	Line   int
	Column int
	Text   string
}

// String prints the fault as `file:line:column: text`, without the parts that
// are not known.
func (f Fault) String() string {
	switch {
	case f.Line == 0:
		return fmt.Sprintf("%s: %s", f.File, f.Text)
	case f.Column == 0:
		return fmt.Sprintf("%s:%d: %s", f.File, f.Line, f.Text)
	}
	return fmt.Sprintf("%s:%d:%d: %s", f.File, f.Line, f.Column, f.Text)
}

// List collects faults. It is an error when it is not empty.
type List []Fault

// Add appends one fault; the text is formatted as fmt.Sprintf does.
func (l *List) Add(file string, line, column int, format string, args ...any) {
	*l = append(*l, Fault{file, line, column, fmt.Sprintf(format, args...)})
}

// Sort orders the faults by file, line, column and text, and drops repetitions.
func (l *List) Sort() {
	slices.SortStableFunc(*l, func(a, b Fault) int {
		return cmp.Or(
			cmp.Compare(a.File, b.File), cmp.Compare(a.Line, b.Line),
			cmp.Compare(a.Column, b.Column), cmp.Compare(a.Text, b.Text))
	})
	*l = slices.Compact(*l)
}

// Err returns the sorted list as an error, or nil when it is empty.
func (l List) Err() error {
	if len(l) == 0 {
		return nil
	}
	l.Sort()
	return l
}

// Error prints one fault a line.
func (l List) Error() string {
	var b strings.Builder
	for i, f := range l {
		if i > 0 {
			b.WriteByte('\n')
		}
		b.WriteString(f.String())
	}
	return b.String()
}
