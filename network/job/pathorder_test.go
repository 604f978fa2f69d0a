package job_test

import (
	"strings"
	"testing"

	"pgregory.net/rapid"
)

// The order of the rows is not that of the legs: the column order says how the water goes.
func TestTheOrderOfRowsDoesNotChangeAPath(t *testing.T) {
	rows := []string{
		"a1,1,sheet,90,0.01,0.15,,",
		"a1,2,shallow,300,0.02,,unpaved,",
		"a1,3,gutter,150,0.01,0.016,,cross 0.02 spread 5",
		"a1,4,pipe,200,0.008,0.013,,380mm",
	}
	const head = "area,order,kind,length,slope,n,surface,section\n"
	dir := folder(t, pathJob("us", "", head+strings.Join(rows, "\n")+"\n"))
	want := walk(t, readJob(t, dir))[0]
	rapid.Check(t, func(rt *rapid.T) {
		writeFile(t, dir, "paths.csv", head+strings.Join(rapid.Permutation(rows).Draw(rt, "rows"), "\n")+"\n")
		got := walk(t, readJob(t, dir))[0]
		if got.Minutes != want.Minutes || len(got.Steps) != len(rows) {
			rt.Fatalf("%v min in %d steps, want %v", got.Minutes, len(got.Steps), want.Minutes)
		}
		for k := range rows {
			if got.Steps[k].Working != want.Steps[k].Working {
				rt.Fatalf("step %d is %s", k+1, got.Steps[k].Working)
			}
		}
	})
}
