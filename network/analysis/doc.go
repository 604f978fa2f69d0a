// Package analysis is the only place where the stages are put together: a job as
// it was read, the sweep down with sizing on the way, the rules. Each stage's
// result is read-only for the next.
package analysis
