package job_test

import (
	"reflect"
	"testing"

	"rimfall/network/job"
)

// A byte-order mark before a comment, as spreadsheets save it, hides neither the
// comment nor the heading of the user's own below it.
func TestARainfallTableWithAMarkACommentAndItsOwnHeading(t *testing.T) {
	got := read(t, folder(t, `
-- job.toml --
title = "Two pipes"
[storm]
return_period = 10
[columns.rainfall]
duration = "D min"
-- rainfall.csv --
`+"\uFEFF"+`# a table, with commas, and; semicolons
D min	2	10
5	3	4
60	1	2
`), job.ToCheck)
	if want := read(t, folder(t, ""), job.ToCheck); !reflect.DeepEqual(got.Rain.Table, want.Rain.Table) {
		t.Errorf("got %+v, want %+v", got.Rain.Table, want.Rain.Table)
	}
}
