package job_test

import (
	"errors"
	"os"
	"path/filepath"
	"slices"
	"testing"

	"rimfall/network"
	"rimfall/network/job"
)

// blank is the sound job without what sizing chooses.
const blank = `
-- pipes.csv --
id,from,to,length
P1,A,B,100
P2,B,O,100
`

// completed is a network of the blank job with everything chosen.
func completed(j *job.Job) *network.Network {
	n := j.Network.Clone()
	for i := range n.Pipes {
		p := &n.Pipes[i]
		p.Size = network.Size{Span: 12, Rise: 12}
		p.InvertUpper, p.InvertLower = network.Some(1.0/3), network.Some(1e-7)
		p.Slope = network.Some((p.InvertUpper.V - p.InvertLower.V) / 100)
	}
	return n
}

func TestOnlyBlankCellsAreFilledIn(t *testing.T) {
	j := read(t, folder(t, `
-- pipes.csv --
# first line
slope,id,from,to ,note,length,size,x_own

0.0500,P1,A,B,"a ""b"", c",1e2, ,?
# between
,P2,B,O,,100,15 in,
`), job.ToSize)
	out := filepath.Join(t.TempDir(), "out")
	if err := j.Write(out, completed(j), job.WriteOptions{}); err != nil {
		t.Fatal(err)
	}
	got, err := os.ReadFile(filepath.Join(out, "pipes.csv"))
	if err != nil {
		t.Fatal(err)
	}
	// A third in the shortest form that reads back to it; a small number without an exponent.
	const want = `# first line
slope,id,from,to ,note,length,size,x_own,invert_upper,invert_lower

0.0500,P1,A,B,"a ""b"", c",1e2,12,?,0.3333333333333333,0.0000001
# between
0.003333332333333333,P2,B,O,,100,15 in,,0.3333333333333333,0.0000001
`
	if string(got) != want {
		t.Errorf("got\n%s\nwant\n%s", got, want)
	}
}

func TestAFolderAppearsWholeOrNotAtAll(t *testing.T) {
	j := read(t, folder(t, blank), job.ToSize)
	parent := t.TempDir()
	names := func() []string {
		entries, err := os.ReadDir(parent)
		if err != nil {
			t.Fatal(err)
		}
		var all []string
		for _, e := range entries {
			all = append(all, e.Name())
		}
		return all
	}
	out := filepath.Join(parent, "out")
	if err := j.Write(out, completed(j), job.WriteOptions{}); err != nil {
		t.Fatal(err)
	}
	if got := names(); !slices.Equal(got, []string{"out"}) {
		t.Errorf("beside the new folder stand %v", got)
	}
	mine := filepath.Join(out, "mine.txt")
	if err := os.WriteFile(mine, []byte("kept"), 0o644); err != nil {
		t.Fatal(err)
	}
	var exists job.ExistsError
	if err := j.Write(out, completed(j), job.WriteOptions{}); !errors.As(err, &exists) {
		t.Errorf("a folder that is not empty: %v", err)
	}
	if _, err := os.Stat(mine); err != nil {
		t.Errorf("without force: %v", err)
	}
	if err := j.Write(out, completed(j), job.WriteOptions{Force: true}); err != nil {
		t.Fatal(err)
	}
	if _, err := os.Stat(mine); err != nil {
		t.Errorf("with force a file of the user's own is gone: %v", err)
	}
	if got := names(); !slices.Equal(got, []string{"out"}) {
		t.Errorf("beside the new folder stand %v", got)
	}
	if err := j.Write(j.Dir, completed(j), job.WriteOptions{Force: true}); err == nil {
		t.Error("the job that is read was overwritten")
	}
	// An empty folder that exists is a place for a job.
	empty := filepath.Join(parent, "empty")
	if err := os.Mkdir(empty, 0o755); err != nil {
		t.Fatal(err)
	}
	if err := j.Write(empty, completed(j), job.WriteOptions{}); err != nil {
		t.Error(err)
	}
}

func TestFilesSharedWithOtherJobsAreCopiedIntoTheNewFolder(t *testing.T) {
	dir := folder(t, blank+`
-- one/job.toml --
title = "One"
[storm]
return_period = 10
rainfall = "../rainfall.csv"
[criteria]
set = "../town.toml"
[files]
structures = "../structures.csv"
areas = "../areas.csv"
pipes = "sub/lines.csv"
-- one/sub/lines.csv --
id,from,to,length
P1,A,B,100
P2,B,O,100
-- town.toml --
title = "Town, invented"
min_slope = 0.004
`)
	j := read(t, filepath.Join(dir, "one"), job.ToSize)
	out := filepath.Join(t.TempDir(), "far", "away")
	if err := j.Write(out, completed(j), job.WriteOptions{}); err != nil {
		t.Fatal(err)
	}
	if err := os.RemoveAll(dir); err != nil { // the new folder needs nothing of the old ones
		t.Fatal(err)
	}
	again := read(t, out, job.ToCheck)
	if again.Settings.Criteria.MinSlope != 0.004 || again.Settings.Criteria.Title != "Town, invented" || len(again.Network.Structures) != 3 || again.Network.Pipes[1].Size.Rise != 12 {
		t.Errorf("settings %+v, network %+v", again.Settings.Criteria, again.Network)
	}
}

func TestABoxIsWrittenSoThatItReadsBack(t *testing.T) {
	for _, c := range []struct{ units, shape string }{{"us", "box"}, {"si", "box"}, {"us", "ellipse"}, {"si", "ellipse-upright"}} {
		j := read(t, folder(t, `
-- job.toml --
units = "`+c.units+`"
[storm]
return_period = 10
-- catalog.csv --
units,shape,span,rise
us,box,20,15
us,ellipse,20,15
si,box,500,400
si,ellipse-upright,400,500
-- pipes.csv --
id,from,to,length,shape
P1,A,B,100,`+c.shape+`
P2,B,O,100,`+c.shape+`
`), job.ToSize)
		n := completed(j)
		size := network.Size{Span: 20, Rise: 15}
		if c.units == "si" {
			size = network.Size{Span: 500, Rise: 400}
			if c.shape == "ellipse-upright" {
				size = network.Size{Span: 400, Rise: 500}
			}
		}
		for i := range n.Pipes {
			n.Pipes[i].Size = size
		}
		out := filepath.Join(t.TempDir(), "out")
		if err := j.Write(out, n, job.WriteOptions{}); err != nil {
			t.Fatal(err)
		}
		if got := read(t, out, job.ToCheck).Network.Pipes[1]; got.Size != size || got.Shape != c.shape {
			t.Errorf("%s in %s: %+v, want %+v", c.shape, c.units, got.Size, size)
		}
	}
}

// A folder that is no job is not replaced, nor one that holds the job that is read;
// files of the user's own in a job folder that is replaced stay.
func TestForceTakesNothingThatIsTheUsersOwn(t *testing.T) {
	parent := t.TempDir()
	inner := filepath.Join(parent, "inner")
	if err := job.WriteStarter(inner, "us"); err != nil {
		t.Fatal(err)
	}
	j, err := job.Read(inner, job.ToSize, nil)
	if err != nil {
		t.Fatal(err)
	}
	force := job.WriteOptions{Force: true}
	if err := j.Write(parent, completed(j), force); err == nil {
		t.Error("the folder that holds the job was replaced")
	}
	precious := filepath.Join(t.TempDir(), "precious")
	if err := os.MkdirAll(precious, 0o755); err != nil {
		t.Fatal(err)
	}
	notes := filepath.Join(precious, "notes.txt")
	if err := os.WriteFile(notes, []byte("keep"), 0o644); err != nil {
		t.Fatal(err)
	}
	if err := j.Write(precious, completed(j), force); err == nil {
		t.Error("a folder that is no job was replaced")
	}
	if err := os.WriteFile(filepath.Join(precious, job.File), nil, 0o644); err != nil {
		t.Fatal(err)
	}
	if err := j.Write(precious, completed(j), force); err != nil {
		t.Fatal(err)
	}
	if text, err := os.ReadFile(notes); err != nil || string(text) != "keep" {
		t.Errorf("the user's own file is gone: %v", err)
	}
}
