package analysis_test

import (
	"encoding/csv"
	"math"
	"os"
	"path/filepath"
	"strconv"
	"testing"

	"golang.org/x/tools/txtar"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/sweep"
)

// networks is where the job folders of published networks stand.
const networks = "../../testdata/networks"

// run reads and runs a job folder that must have no fault.
func run(t testing.TB, dir string, o analysis.Options) *analysis.Result {
	t.Helper()
	j, err := analysis.Read(dir, o)
	if err != nil {
		t.Fatal(err)
	}
	r, err := analysis.Run(j, o)
	if err != nil {
		t.Fatal(err)
	}
	return r
}

// folder writes the files of an archive to a new folder. Later archives lay
// their files over those of earlier ones.
func folder(t testing.TB, archives ...string) string {
	t.Helper()
	dir := t.TempDir()
	for _, archive := range archives {
		for _, f := range txtar.Parse([]byte(archive)).Files {
			if err := os.WriteFile(filepath.Join(dir, f.Name), f.Data, 0o644); err != nil {
				t.Fatal(err)
			}
		}
	}
	return dir
}

// pipeNamed finds a pipe of a result with what the design storm does in it.
func pipeNamed(t testing.TB, r *analysis.Result, id string) (*network.Pipe, *sweep.Pipe) {
	t.Helper()
	for i := range r.Network.Pipes {
		if r.Network.Pipes[i].ID == id {
			return &r.Network.Pipes[i], &r.Design.Flows.Pipes[i]
		}
	}
	t.Fatalf("no pipe %s", id)
	return nil, nil
}

// printed is a row of a published table, by heading. Blank cells are left out.
type printed map[string]float64

// readPrinted reads a published table whose first column names the rows.
func readPrinted(t testing.TB, path string) (ids []string, rows []printed) {
	t.Helper()
	f, err := os.Open(path)
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	r := csv.NewReader(f)
	r.Comment = '#'
	all, err := r.ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	for _, record := range all[1:] {
		row := printed{}
		for i, cell := range record[1:] {
			v, err := strconv.ParseFloat(cell, 64)
			if err == nil {
				row[all[0][i+1]] = v
			}
		}
		ids, rows = append(ids, record[0]), append(rows, row)
	}
	return ids, rows
}

// within holds a value against a printed one, where the table prints one.
func within(t testing.TB, row printed, key string, got, tolerance float64) {
	t.Helper()
	if want, ok := row[key]; ok && !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s is %.5g, printed %g, which allows %.3g", key, got, want, tolerance)
	}
}
