// Package finding judges a run by rules. Each rule stands in the catalogue with
// its name, what it means, why it matters, how grave it is, and the setting that
// holds its limit; the command that prints the rules, the help and the reports
// all read it there.
//
// A finding is a result, not a fault: the run went through, and this is what a
// reviewer would mark in it.
package finding
