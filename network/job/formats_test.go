package job_test

import (
	"os"
	"path/filepath"
	"reflect"
	"strings"
	"testing"

	"rimfall/network"
	"rimfall/network/job"
)

// read reads a job that must have no fault.
func read(t testing.TB, dir string, purpose job.Purpose) *job.Job {
	t.Helper()
	j, err := job.Read(dir, purpose, rules)
	if err != nil {
		t.Fatal(err)
	}
	return j
}

// tables is a job in which every table that a spreadsheet touches is written out.
const tables = `
-- structures.csv --
id,kind,rim,note
A,,100.5,head
B,,98.25,
O,outfall,,
-- pipes.csv --
id,from,to,length,size,slope,invert_upper
P1,A,B,100.5,12,0.01,95.125
P2,B,O,100,15,0.01,93.5
`

// rewritten is the job of the tables with both files passed through a change.
func rewritten(t testing.TB, change func(string) string) string {
	t.Helper()
	dir := folder(t, tables)
	for _, name := range []string{"structures.csv", "pipes.csv"} {
		path := filepath.Join(dir, name)
		text, err := os.ReadFile(path)
		if err == nil {
			err = os.WriteFile(path, []byte(change(string(text))), 0o644)
		}
		if err != nil {
			t.Fatal(err)
		}
	}
	return dir
}

// eachLine changes every line of a text.
func eachLine(change func(string) string) func(string) string {
	return func(text string) string {
		lines := strings.Split(strings.TrimSuffix(text, "\n"), "\n")
		for i := range lines {
			lines[i] = change(lines[i])
		}
		return strings.Join(lines, "\n") + "\n"
	}
}

func TestOneTableInManyDialectsIsOneNetwork(t *testing.T) {
	swap := func(pairs ...string) func(string) string { return strings.NewReplacer(pairs...).Replace }
	want := read(t, folder(t, tables), job.ToCheck).Network
	for _, c := range []struct {
		name   string
		change func(string) string
	}{
		{"semicolons between cells", swap(",", ";")},
		{"semicolons between cells and a decimal comma", swap(",", ";", ".", ",")},
		{"tabs between cells", swap(",", "\t")},
		{"tabs between cells and a decimal comma", swap(",", "\t", ".", ",")},
		{"lines that end as in Windows", swap("\n", "\r\n")},
		{"a byte-order mark", func(s string) string { return "\ufeff" + s }},
		{"a byte-order mark, semicolons, decimal commas and lines that end as in Windows", func(s string) string {
			return "\ufeff" + swap(",", ";", ".", ",", "\n", "\r\n")(s)
		}},
		{"every cell in quotes", eachLine(func(l string) string { return `"` + strings.ReplaceAll(l, ",", `","`) + `"` })},
		{"blanks around every cell", eachLine(func(l string) string { return " " + strings.ReplaceAll(l, ",", " , ") + " " })},
		{"blank columns at the end, as spreadsheets leave them", eachLine(func(l string) string { return l + ",,," })},
		{"columns of the user's own", func(s string) string {
			return strings.Replace(eachLine(func(l string) string { return l + ",NaN" })(s), ",NaN", ",x_drawing", 1)
		}},
		{"headings in capitals", func(s string) string {
			head, rest, _ := strings.Cut(s, "\n")
			return strings.ToUpper(head) + "\n" + rest
		}},
		{"no line end after the last row", func(s string) string { return strings.TrimSuffix(s, "\n") }},
	} {
		t.Run(c.name, func(t *testing.T) {
			got := read(t, rewritten(t, c.change), job.ToCheck).Network
			if !reflect.DeepEqual(got, want) {
				t.Errorf("got\n%+v\nwant\n%+v", got, want)
			}
		})
	}
}

func TestRemarksAndBlankLinesArePassedOver(t *testing.T) {
	want := read(t, folder(t, ""), job.ToCheck).Network
	got := read(t, folder(t, `
-- structures.csv --
# surveyed in March
"# a remark that a spreadsheet put in quotes, because of its comma"

id,kind,rim
# between rows
A,,100
,,
B,,98
"#, another",,

O,outfall,
`), job.ToCheck).Network
	if len(got.Structures) != 3 {
		t.Fatalf("%d structures", len(got.Structures))
	}
	for i := range got.Structures {
		got.Structures[i].Line = want.Structures[i].Line // they stand in other lines
	}
	if !reflect.DeepEqual(got.Structures, want.Structures) {
		t.Errorf("got\n%+v\nwant\n%+v", got.Structures, want.Structures)
	}
}

func TestColumnOrderIsFree(t *testing.T) {
	got := read(t, folder(t, `
-- pipes.csv --
invert_upper,slope,size,length,to,from,id
95,0.01,12,100,B,A,P1
93.9,0.01,15,100,O,B,P2
`), job.ToCheck).Network
	if want := read(t, folder(t, ""), job.ToCheck).Network; !reflect.DeepEqual(got, want) {
		t.Errorf("got\n%+v\nwant\n%+v", got, want)
	}
}

func TestHeadingsAndFilesOfTheUsersOwn(t *testing.T) {
	got := read(t, folder(t, `
-- job.toml --
title = "Two pipes"
[storm]
return_period = 10
[files]
pipes = "export/lines.txt"
[columns.pipes]
id = "Line No."
invert_upper = "IE up"
[columns.rainfall]
duration = "min"
-- pipes.csv --
absent
-- export/lines.txt --
Line No.;from;to;length;size;slope;IE up
P1;A;B;100;12;0,01;95
P2;B;O;100;15;0,01;93,9
-- rainfall.csv --
min,2,10
5,3,4
60,1,2
`), job.ToCheck)
	if want := read(t, folder(t, ""), job.ToCheck); !reflect.DeepEqual(got.Network, want.Network) || !reflect.DeepEqual(got.Rain.Table, want.Rain.Table) {
		t.Errorf("got\n%+v\nwant\n%+v", got.Network, want.Network)
	}
}

func TestAHeadingThatWasRenamedIsMissedByItsNewName(t *testing.T) {
	got := faults(t, folder(t, `
-- job.toml --
[storm]
return_period = 10
[columns.pipes]
id = "Line No."
`), job.ToCheck)
	want := `pipes.csv:1:1: missing column "Line No."
pipes.csv:1:1: unknown column "id": `
	if !strings.HasPrefix(got, want) {
		t.Errorf("got\n%s\nwant\n%s…", got, want)
	}
}

func TestTextsThatAreNoUTF8AreFaults(t *testing.T) {
	for _, c := range []struct{ name, text, want string }{
		{"UTF-16 as some editors save it", "\xff\xfei\x00d\x00", "areas.csv: is UTF-16 text; save it as UTF-8"},
		{"a letter in an old code page", "id,structure,area,c,note\na1,A,1,0.5,h\xf6fe\n", "areas.csv:2:13: is not UTF-8 text; save it as UTF-8"},
	} {
		t.Run(c.name, func(t *testing.T) {
			dir := folder(t, "")
			if err := os.WriteFile(filepath.Join(dir, "areas.csv"), []byte(c.text), 0o644); err != nil {
				t.Fatal(err)
			}
			if got := faults(t, dir, job.ToCheck); got != c.want {
				t.Errorf("got %q, want %q", got, c.want)
			}
		})
	}
}

func TestABlankCellIsNotGivenAndNotZero(t *testing.T) {
	n := read(t, folder(t, `
-- structures.csv --
id,kind,rim,lowest_invert,least_fall,loss
A,,100,,,
B,,,0,0,0
O,outfall,,,,
`), job.ToCheck).Network
	a, b := n.Structures[0], n.Structures[1]
	if a.LowestInvert.OK || a.LeastFall.OK || a.Loss.OK || b.Rim.OK {
		t.Errorf("a blank cell was given: %+v %+v", a, b)
	}
	if zero := network.Some(0); b.LowestInvert != zero || b.LeastFall != zero || b.Loss != zero {
		t.Errorf("a 0 was not given: %+v", b)
	}
}
