package analysis_test

import (
	"bytes"
	"math"
	"os"
	"path/filepath"
	"reflect"
	"slices"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/finding"
	"rimfall/network/job"
)

// ofSizing are the rules that speak of choosing, which check does not do.
var ofSizing = []string{"bounds-cross", "no-size-carries", "grade-line-size", "existing-chosen"}

func TestCheckRepeatsEveryNumberOfSizeToTheLastBit(t *testing.T) {
	base := t.TempDir()
	rapid.Check(t, func(t *rapid.T) {
		dir, err := os.MkdirTemp(base, "job")
		if err != nil {
			t.Fatal(err)
		}
		defer os.RemoveAll(dir)
		d := draw{t}
		given, out := filepath.Join(dir, "given"), filepath.Join(dir, "sized")
		if err := os.Mkdir(given, 0o755); err != nil {
			t.Fatal(err)
		}
		d.write(d.job(), given)
		sized := runDrawn(t, given, analysis.Options{Size: true})
		if err := sized.Job.Write(out, sized.Network, job.WriteOptions{}); err != nil {
			t.Fatal(err)
		}
		holdIdentity(t, sized, runDrawn(t, out, analysis.Options{}))
		holdFiles(t, given, out)
	})
}

func runDrawn(t *rapid.T, dir string, o analysis.Options) *analysis.Result {
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

func holdIdentity(t *rapid.T, sized, checked *analysis.Result) {
	t.Helper()
	for i := range sized.Network.Pipes {
		a, b := sized.Network.Pipes[i], checked.Network.Pipes[i]
		a.GivenSlope, b.GivenSlope = true, true // what was chosen is given now
		if !reflect.DeepEqual(a, b) {
			t.Fatalf("pipe %s: sized\n%+v\nchecked\n%+v", a.ID, a, b)
		}
	}
	if a, b := sized.Network.Structures, checked.Network.Structures; !reflect.DeepEqual(a, b) {
		t.Fatalf("structures: sized\n%+v\nchecked\n%+v", a, b)
	}
	for _, pair := range [][2]any{
		{sized.Design.Flows, checked.Design.Flows},
		{sized.Design.Lines.Pipes, checked.Design.Lines.Pipes},
		{sized.Design.Lines.Structures, checked.Design.Lines.Structures},
		{sized.Job.Settings.Title, checked.Job.Settings.Title},
		{sized.Job.Settings.Criteria, checked.Job.Settings.Criteria},
	} {
		if !reflect.DeepEqual(pair[0], pair[1]) {
			t.Fatalf("sized\n%+v\nchecked\n%+v", pair[0], pair[1])
		}
	}
	if (sized.Check == nil) != (checked.Check == nil) || sized.Check != nil && !reflect.DeepEqual(sized.Check.Flows, checked.Check.Flows) {
		t.Fatal("the check storms differ")
	}
	if a, b := alike(sized.Findings), alike(checked.Findings); !reflect.DeepEqual(a, b) {
		t.Fatalf("findings: sized\n%+v\nchecked\n%+v", a, b)
	}
}

// alike are the findings that size and check have alike. The words of the
// freeboard say in a sized job whether larger sizes were tried.
func alike(found []finding.Finding) []finding.Finding {
	var all []finding.Finding
	for _, f := range found {
		if slices.Contains(ofSizing, f.Rule.Name) {
			continue
		}
		if f.Rule.Name == "freeboard" {
			f.Message = ""
		}
		all = append(all, f)
	}
	return all
}

// holdFiles holds the new folder to the given one: what is not pipes.csv is copied
// byte by byte without its byte-order mark, but for the title of a job without one.
func holdFiles(t *rapid.T, given, out string) {
	t.Helper()
	mark := []byte("\ufeff")
	for _, name := range []string{"job.toml", "structures.csv", "areas.csv", "rainfall.csv", "pipes.csv"} {
		a, err1 := os.ReadFile(filepath.Join(given, name))
		b, err2 := os.ReadFile(filepath.Join(out, name))
		if err1 != nil || err2 != nil {
			t.Fatal(err1, err2)
		}
		if bytes.HasPrefix(b, mark) {
			t.Fatalf("%s has a byte-order mark", name)
		}
		want := bytes.TrimPrefix(a, mark)
		if name == "job.toml" {
			want = append([]byte("title = \"given\"\n"), want...)
		}
		if name != "pipes.csv" && !bytes.Equal(b, want) {
			t.Fatalf("%s became\n%q\nfrom\n%q", name, b, want)
		}
		if lines := bytes.Count(a, []byte("\n")); bytes.Count(b, []byte("\n")) != lines && name == "pipes.csv" {
			t.Fatalf("%s has other lines:\n%s\nfrom\n%s", name, b, a)
		}
	}
}

// What is given is never changed, and what is chosen is whole steps.
func TestSizingKeepsWhatIsGiven(t *testing.T) {
	base := t.TempDir()
	rapid.Check(t, func(t *rapid.T) {
		dir, err := os.MkdirTemp(base, "job")
		if err != nil {
			t.Fatal(err)
		}
		defer os.RemoveAll(dir)
		d := draw{t}
		d.write(d.job(), dir)
		r := runDrawn(t, dir, analysis.Options{Size: true})
		steps := r.Job.Settings.Units.InvertSteps
		for i := range r.Network.Pipes {
			before, after := &r.Job.Network.Pipes[i], &r.Network.Pipes[i]
			if before.Section != nil && before.Size != after.Size || altered(before.Slope, after.Slope) ||
				altered(before.InvertUpper, after.InvertUpper) || altered(before.InvertLower, after.InvertLower) {
				t.Fatalf("given %+v became %+v", before, after)
			}
			if after.Section == nil || !after.InvertUpper.OK || !after.InvertLower.OK || !after.Slope.OK {
				t.Fatalf("pipe %s is not complete: %+v", after.ID, after)
			}
			if v := after.InvertUpper.V * steps; !before.InvertUpper.OK && math.Abs(math.Round(v)-v) > 1e-6 {
				t.Fatalf("upper invert %v is no whole step", after.InvertUpper.V)
			}
		}
	})
}

// altered tells that a given number was changed.
func altered(before, after network.Maybe) bool { return before.OK && before != after }
