package data_test

import (
	"bytes"
	"encoding/csv"
	"encoding/json"
	"errors"
	"os"
	"path/filepath"
	"slices"
	"strconv"
	"testing"

	"golang.org/x/tools/txtar"

	"rimfall/network/analysis"
	"rimfall/network/report/data"
)

// object is a JSON object whose values are still as they were written.
type object map[string]json.RawMessage

// document is the JSON of a run as a program outside reads it.
type document struct {
	Title      string
	Units      string
	Storm      map[string]float64
	Pipes      []object
	Structures []object
	Findings   []object
	CheckStorm *struct {
		ReturnPeriod float64 `json:"return_period"`
		Pipes        []object
		Structures   []object
	} `json:"check_storm"`
}

func run(t *testing.T, dir string, size bool) *analysis.Result {
	t.Helper()
	o := analysis.Options{Size: size}
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

func asJSON(t *testing.T, r *analysis.Result, table string) document {
	t.Helper()
	var b bytes.Buffer
	if err := data.JSON(&b, r, table); err != nil {
		t.Fatal(err)
	}
	var d document
	if err := json.Unmarshal(b.Bytes(), &d); err != nil {
		t.Fatalf("%v in\n%s", err, b.Bytes())
	}
	return d
}

// jobs are all job folders of the repository, each with whether it is to be sized.
func jobs(t *testing.T) map[string]bool {
	t.Helper()
	all := map[string]bool{}
	for _, pattern := range []string{"../../../examples/*/job.toml", "../../../testdata/networks/*/job.toml"} {
		found, err := filepath.Glob(pattern)
		if err != nil {
			t.Fatal(err)
		}
		for _, f := range found {
			dir := filepath.Dir(f)
			_, err := analysis.Read(dir, analysis.Options{})
			all[dir] = err != nil // what cannot be checked is to be sized
		}
	}
	if len(all) < 4 {
		t.Fatalf("only %d job folders", len(all))
	}
	return all
}

// The keys of the contract of results. Others may stand beside them; of these,
// the ones marked here may be left out where they do not apply.
var (
	pipeKeys    = []string{"id", "from", "to", "shape", "size", "length", "n", "count", "area", "ca", "inflow", "flow", "depth", "depth_ratio", "travel_time", "regime"}
	pipeMaybe   = []string{"slope", "invert_upper", "invert_lower", "time", "intensity", "capacity", "capacity_ratio", "velocity", "velocity_full", "critical_depth", "froude", "cover_upper", "cover_lower", "hgl_upper", "hgl_lower", "egl_upper", "egl_lower"}
	structKeys  = []string{"id", "kind", "flow"}
	structMaybe = []string{"rim", "hgl", "egl", "freeboard"}
	findingKeys = []string{"rule", "severity", "subject", "message", "storm"}
)

func TestJSONHasTheKeysOfTheContract(t *testing.T) {
	seen := map[string]bool{}
	for dir, size := range jobs(t) {
		r := run(t, dir, size)
		d := asJSON(t, r, "")
		if d.Title != r.Job.Settings.Title || d.Units != r.Job.Settings.Units.Name || len(d.Pipes) != len(r.Network.Pipes) || len(d.Structures) != len(r.Network.Structures) || len(d.Findings) != len(r.Findings) {
			t.Errorf("%s: %q in %s, %d pipes, %d structures, %d findings", dir, d.Title, d.Units, len(d.Pipes), len(d.Structures), len(d.Findings))
		}
		for _, key := range []string{"return_period", "minimum_time", "uplift"} {
			if _, ok := d.Storm[key]; !ok {
				t.Errorf("%s: storm has no %s", dir, key)
			}
		}
		hold := func(rows []object, keys []string) {
			for _, row := range rows {
				for _, key := range keys {
					if _, ok := row[key]; !ok {
						t.Errorf("%s: %s has no %s", dir, row["id"], key)
					}
				}
				for key, value := range row {
					seen[key] = true
					if string(value) == "null" || string(value) == `""` {
						t.Errorf("%s: %s has %s = %s; what does not apply is left out", dir, row["id"], key, value)
					}
				}
			}
		}
		hold(d.Pipes, pipeKeys)
		hold(d.Structures, structKeys)
		hold(d.Findings, findingKeys)
		if (d.CheckStorm != nil) != (r.Check != nil) {
			t.Errorf("%s: a check storm in the job: %t", dir, r.Check != nil)
		}
		if d.CheckStorm != nil {
			hold(d.CheckStorm.Pipes, pipeKeys)
			hold(d.CheckStorm.Structures, structKeys)
		}
	}
	for _, key := range slices.Concat(pipeMaybe, structMaybe) {
		if !seen[key] {
			t.Errorf("no job has a value for %s", key)
		}
	}
}

func TestNumbersOfJSONAreTheNumbersOfTheRun(t *testing.T) {
	for dir, size := range jobs(t) {
		r := run(t, dir, size)
		for i, row := range asJSON(t, r, "pipes").Pipes {
			p, q := &r.Network.Pipes[i], &r.Design.Flows.Pipes[i]
			for key, want := range map[string]float64{
				"length": p.Length, "n": p.N, "slope": p.Slope.V, "ca": q.CA, "flow": q.Flow, "capacity": q.Capacity,
				"depth": q.Depth, "velocity": q.Velocity, "travel_time": q.TravelTime, "time": q.Time, "intensity": q.Intensity,
			} {
				if _, given := row[key]; key == "capacity" && p.Slope.V <= 0 {
					if given {
						t.Errorf("%s: pipe %s does not fall and has a capacity of %s", dir, p.ID, row[key])
					}
					continue
				}
				if got, err := strconv.ParseFloat(string(row[key]), 64); err != nil || got != want {
					t.Errorf("%s: pipe %s: %s is %s, in the run %v", dir, p.ID, key, row[key], want)
				}
			}
		}
	}
}

func TestCSVAndJSONWriteTheSameNumbers(t *testing.T) {
	for dir, size := range jobs(t) {
		r := run(t, dir, size)
		d := asJSON(t, r, "")
		for table, rows := range map[string][]object{"pipes": d.Pipes, "structures": d.Structures, "findings": d.Findings} {
			var b bytes.Buffer
			if err := data.CSV(&b, r, table); err != nil {
				t.Fatal(err)
			}
			records, err := csv.NewReader(&b).ReadAll()
			if err != nil || len(records) != len(rows)+1 {
				t.Fatalf("%s %s: %d records for %d rows, %v", dir, table, len(records), len(rows), err)
			}
			for i, row := range rows {
				filled := 0
				for k, cell := range records[i+1] {
					key := records[0][k]
					want := string(row[key])
					if text, err := strconv.Unquote(want); err == nil {
						want = text
					}
					if cell != want {
						t.Errorf("%s %s %s: %s is %q in CSV and %q in JSON", dir, table, row["id"], key, cell, want)
					}
					if cell != "" {
						filled++
					}
				}
				if filled != len(row) {
					t.Errorf("%s %s %s: %d cells in CSV, %d keys in JSON", dir, table, row["id"], filled, len(row))
				}
			}
		}
	}
}

// edges is a job with a dry pipe, a pipe that rises, a pipe without inverts and a
// structure without a rim.
const edges = `
-- job.toml --
title = "The \"edges\""
[storm]
return_period = 10
-- structures.csv --
id,kind,rim
D,manhole,100
A,manhole,100
B,manhole,
O,outfall,
-- pipes.csv --
id,from,to,length,shape,size,slope,invert_upper
dry,D,O,100,circle,12,0.01,95
rising,A,B,100,circle,15,-0.001,94
bare,B,O,100,box,4ft x 3ft,0.01,
-- areas.csv --
id,structure,area,c,time
a,A,1,0.5,10
-- rainfall.csv --
duration,10
5,6
60,1
`

func TestWhatDoesNotApplyIsLeftOut(t *testing.T) {
	dir := t.TempDir()
	for _, f := range txtar.Parse([]byte(edges)).Files {
		if err := os.WriteFile(filepath.Join(dir, f.Name), f.Data, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	d := asJSON(t, run(t, dir, false), "")
	if d.Title != `The "edges"` {
		t.Errorf("title %q", d.Title)
	}
	for i, c := range []struct {
		absent []string
		texts  map[string]string // values as written
	}{
		{ // Q = 0
			[]string{"time", "intensity", "velocity", "froude"},
			map[string]string{"flow": "0", "depth": "0", "depth_ratio": "0", "travel_time": "0", "capacity_ratio": "0", "regime": `"dry"`, "size": "12"},
		},
		{ // slope ≤ 0
			[]string{"capacity", "capacity_ratio", "velocity_full", "froude", "cover_lower"},
			map[string]string{"depth_ratio": "1", "depth": "1.25", "count": "1"},
		},
		{ // a slope and no inverts
			[]string{"invert_upper", "invert_lower", "cover_upper", "cover_lower", "hgl_upper", "hgl_lower", "egl_upper", "egl_lower"},
			map[string]string{"size": `"48x36"`, "slope": "0.01", "shape": `"box"`},
		},
	} {
		for _, key := range c.absent {
			if v, ok := d.Pipes[i][key]; ok {
				t.Errorf("pipe %s has %s = %s", d.Pipes[i]["id"], key, v)
			}
		}
		for key, want := range c.texts {
			if got := string(d.Pipes[i][key]); got != want {
				t.Errorf("pipe %s: %s is %s, want %s", d.Pipes[i]["id"], key, got, want)
			}
		}
	}
	for _, key := range []string{"rim", "freeboard"} {
		if v, ok := d.Structures[2][key]; ok {
			t.Errorf("structure B has %s = %s", key, v)
		}
	}
}

func TestOneTableOfJSONStandsAlone(t *testing.T) {
	r := run(t, "../../../testdata/networks/nine-lines", false)
	for table, want := range map[string][3]bool{"": {true, true, true}, "pipes": {true, false, false}, "structures": {false, true, false}, "findings": {false, false, true}} {
		d := asJSON(t, r, table)
		if got := [3]bool{d.Pipes != nil, d.Structures != nil, d.Findings != nil}; got != want {
			t.Errorf("table %q has pipes, structures and findings: %v", table, got)
		}
	}
}

// full is a disk without room.
type full struct{}

var errFull = errors.New("no room")

func (full) Write([]byte) (int, error) { return 0, errFull }

func TestTheFirstErrorOfWritingIsTold(t *testing.T) {
	r := run(t, "../../../testdata/networks/nine-lines", false)
	if err := data.JSON(full{}, r, ""); !errors.Is(err, errFull) {
		t.Errorf("JSON: %v", err)
	}
	if err := data.CSV(full{}, r, "pipes"); !errors.Is(err, errFull) {
		t.Errorf("CSV: %v", err)
	}
	if err := data.ScheduleCSV(full{}, r, "quantities"); !errors.Is(err, errFull) {
		t.Errorf("schedule: %v", err)
	}
}
