package job_test

import (
	"errors"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"golang.org/x/tools/txtar"

	"rimfall/network/fault"
	"rimfall/network/job"
)

// sound is a small job without a fault; each case lays its own files over it.
const sound = `
-- job.toml --
title = "Two pipes"
[storm]
return_period = 10
-- structures.csv --
id,kind,rim
A,,100
B,,98
O,outfall,
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100,12,0.01,95
P2,B,O,100,15,0.01,93.9
-- areas.csv --
id,structure,area,c,time
a1,A,1,0.5,10
-- rainfall.csv --
duration,2,10
5,3,4
60,1,2
`

// rules are names that departures.csv may use.
var rules = []string{"cover", "slope"}

// folder lays the files of an archive over the sound job and writes it all to a
// new folder. A file that holds nothing but the word "absent" is left out.
func folder(t testing.TB, changed string) string {
	t.Helper()
	files := map[string][]byte{}
	for _, text := range []string{sound, changed} {
		for _, f := range txtar.Parse([]byte(text)).Files {
			files[f.Name] = f.Data
		}
	}
	dir := t.TempDir()
	for name, data := range files {
		if string(data) == "absent\n" {
			continue
		}
		path := filepath.Join(dir, name)
		if err := os.MkdirAll(filepath.Dir(path), 0o755); err != nil {
			t.Fatal(err)
		}
		if err := os.WriteFile(path, data, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	return dir
}

// faults reads a job and gives its faults as they are printed, without the folder.
func faults(t testing.TB, dir string, purpose job.Purpose) string {
	t.Helper()
	_, err := job.Read(dir, purpose, rules)
	if err == nil {
		return ""
	}
	var list fault.List
	if !errors.As(err, &list) {
		t.Fatalf("%v is no list of faults", err)
	}
	return strings.ReplaceAll(list.Error(), dir+string(filepath.Separator), "")
}

// faultCase is a fault as a user makes it, and what he is told.
type faultCase struct {
	name    string // a sentence
	changed string // files in place of those of the sound job
	want    string // the faults, one a line
}

func check(t *testing.T, purpose job.Purpose, cases []faultCase) {
	t.Helper()
	for _, c := range cases {
		t.Run(c.name, func(t *testing.T) {
			got := faults(t, folder(t, c.changed), purpose)
			if want := strings.TrimSpace(c.want); got != want {
				t.Errorf("got\n%s\nwant\n%s", got, want)
			}
		})
	}
}

func TestTheSoundJobHasNoFault(t *testing.T) {
	for _, purpose := range []job.Purpose{job.ToCheck, job.ToSize} {
		if got := faults(t, folder(t, ""), purpose); got != "" {
			t.Errorf("purpose %d: %s", purpose, got)
		}
	}
}
