// Package review answers questions that are asked of whole runs: what changed
// between two jobs, and how each number of one came about.
//
// Compare sets two runs side by side. Explain writes the working of a pipe, a
// structure or an area as an engineer does by hand: every formula in symbols with
// its source, then with numbers and units, then the result.
//
// Nothing is computed here that the stages of a run do not compute; their
// equations and sources stand in their packages, and are named line by line in
// an explanation.
package review
