// Package data writes the results of a run for programs: one JSON object, or one
// table as CSV. Numbers keep their full precision, in the shortest form that
// reads back to the same number; a value that does not apply is left out of JSON
// and blank in CSV.
package data
