// Package report makes the rows and totals of a run that are ready to be shown.
// Every column stands once, in pipecolumns.go and its neighbours, with its key, heading, unit and
// decimals, so that tables, data files and pages agree. The formats are in the
// packages below this one.
package report
