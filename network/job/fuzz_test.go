package job

import (
	"errors"
	"math"
	"os"
	"path/filepath"
	"testing"

	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/network/units"
)

// seedFiles are the files of a small job that uses every field.
var seedFiles = map[string]string{
	"job.toml": `title = "Seed"
units = "si"
[storm]
return_period = 10
check_period = 100
[criteria]
set = "town.toml"
min_cover = 0.6
[columns.pipes]
id = "line"
`,
	"town.toml":      "title = \"Town\"\nmin_slope = 0.003\n",
	"structures.csv": "id,kind,x,y,rim,tailwater,tailwater_check,inflow,lowest_invert,least_fall,benching,loss,note\nA,inlet,0,0,100,,,0.01,98,0.05,half,0.5,\"corner, north\"\nO,outfall,30,40,,97,97.5,,,,,,\n",
	"pipes.csv":      "line;from;to;length;shape;size;count;material;n;invert_upper;invert_lower;slope;wall;angle;loss;bend;status;share;note;x_own\n1;A;O;;circle;0,3 m;2;concrete;0,013;98,5;;0,01;75;30;0,2;10;existing;1;old;?\n",
	"areas.csv":      "id,structure,area,c,surface,time,note\n1,A,0.5,,roof,10,\n2,A,0.2,0.3,,,\n3,A,0.3,,,8,\n",
	"surfaces.csv":   "surface,c,low,high,source,note\nroof,0.9,0.8,0.95,county,\n",
	"rainfall.csv":   "duration,10,100,note\n5,120,180,\n60,40,60,\n",
	"departures.csv": "rule,subject,reason\ncover,*,rock\n",
	"catalog.csv":    "shape,span,wall\ncircle,300,50\ncircle,450,60\n",
	"ground.csv":     "pipe,station,elevation,note\n1,20,101.5,ditch\n1,30,101.2,\n",
	"crossings.csv":  "pipe,station,name,top,bottom,note\n1,25,water main,100.2,100,\n",
	"pieces.csv":     "area,extent,c,surface,note\n3,0.1,0.9,,\n3,0.2,,roof,\n",
	"paths.csv":      "area,order,kind,length,slope,surface,n,section,velocity,coefficient,c,curve_number,note\n2,1,sheet,30,0.02,,0.15,,,,,,\n2,2,gutter,80,0.01,,0.016,cross 0.02 spread 2,,,,,\n2,3,velocity,100,,,,,1.2,,,,\n",
}

// equationSeed is a job whose rainfall is an equation.
const equationSeed = `units = "si"
[storm]
return_period = 10
[storm.equation]
form = "sherman"
numerator = 1200.5
shift = 8
exponent = 0.8
shortest = 5
longest = 1440
`

func TestTheJobThatIsFuzzedHasNoFault(t *testing.T) {
	dir := t.TempDir()
	for file, text := range seedFiles {
		if err := os.WriteFile(filepath.Join(dir, file), []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	for _, purpose := range []Purpose{ToCheck, ToSize} {
		j, err := Read(dir, purpose, []string{"cover"})
		if err != nil {
			t.Fatal(err)
		}
		judgeSound(t, j.Network)
	}
}

// fuzzFile feeds any bytes to the reader of one file of an otherwise sound job:
// the answer is a network or a list of faults, each with a text and a place that
// is not negative, and never a panic.
func fuzzFile(f *testing.F, name string, more ...string) {
	f.Add([]byte(seedFiles[name]))
	for _, text := range more {
		f.Add([]byte(text))
	}
	for _, odd := range []string{"", "\ufeff", "\xff\xfe", "\"", "#\n", "\r\n\r\n", ",,,\n,,,\n", "a\n\"b\nc", "id;id\n1;1\n", "\x00\n\x00"} {
		f.Add([]byte(odd))
	}
	dir := f.TempDir()
	for file, text := range seedFiles {
		if err := os.WriteFile(filepath.Join(dir, file), []byte(text), 0o644); err != nil {
			f.Fatal(err)
		}
	}
	f.Fuzz(func(t *testing.T, text []byte) {
		if err := os.WriteFile(filepath.Join(dir, name), text, 0o644); err != nil {
			t.Fatal(err)
		}
		for _, purpose := range []Purpose{ToCheck, ToSize} {
			j, err := Read(dir, purpose, []string{"cover"})
			if err == nil {
				judgeSound(t, j.Network)
				continue
			}
			judgeFaults(t, err)
		}
	})
}

func judgeFaults(t *testing.T, err error) {
	t.Helper()
	var list fault.List
	if !errors.As(err, &list) || len(list) == 0 {
		t.Fatalf("%v is no list of faults", err)
	}
	for _, f := range list {
		if f.File == "" || f.Text == "" || f.Line < 0 || f.Column < 0 {
			t.Errorf("a fault without a place: %+v", f)
		}
	}
}

// judgeSound holds a network that was taken to what every later stage counts on.
func judgeSound(t *testing.T, n *network.Network) {
	t.Helper()
	if _, ok := n.Order(); !ok || len(n.Structures) == 0 || len(n.Pipes) == 0 {
		t.Fatalf("%d structures, %d pipes, in order: %t", len(n.Structures), len(n.Pipes), ok)
	}
	for i := range n.Pipes {
		p := &n.Pipes[i]
		if !(p.Length > 0) || !(p.N > 0) || p.Count < 1 || p.Section != nil && !(p.FullArea() > 0) {
			t.Errorf("pipe %q: length %v, n %v, %d barrels, full area %v", p.ID, p.Length, p.N, p.Count, p.FullArea())
		}
		for _, v := range []network.Maybe{p.Slope, p.InvertUpper, p.InvertLower} {
			if math.IsNaN(v.V) || math.IsInf(v.V, 0) {
				t.Errorf("pipe %q: slope or inverts %+v", p.ID, v)
			}
		}
	}
	for i := range n.Areas {
		if a := &n.Areas[i]; !(a.Area > 0) || !(a.C >= 0 && a.C <= 1) {
			t.Errorf("area %q: %v with C %v", a.ID, a.Area, a.C)
		}
	}
}

func FuzzSettings(f *testing.F) {
	fuzzFile(f, "job.toml", equationSeed, "[[storm.equation]]\n[[storm.equation.term]]\n")
}
func FuzzCriteriaSet(f *testing.F) { fuzzFile(f, "town.toml") }
func FuzzStructures(f *testing.F)  { fuzzFile(f, "structures.csv") }
func FuzzPipes(f *testing.F)       { fuzzFile(f, "pipes.csv") }
func FuzzAreas(f *testing.F)       { fuzzFile(f, "areas.csv") }
func FuzzSurfaces(f *testing.F)    { fuzzFile(f, "surfaces.csv") }
func FuzzRainfall(f *testing.F)    { fuzzFile(f, "rainfall.csv") }
func FuzzDepartures(f *testing.F)  { fuzzFile(f, "departures.csv") }
func FuzzGround(f *testing.F)      { fuzzFile(f, "ground.csv") }
func FuzzCrossings(f *testing.F)   { fuzzFile(f, "crossings.csv") }
func FuzzPieces(f *testing.F)      { fuzzFile(f, "pieces.csv") }
func FuzzPaths(f *testing.F)       { fuzzFile(f, "paths.csv") }
func FuzzCatalog(f *testing.F)     { fuzzFile(f, "catalog.csv") }

func FuzzNumber(f *testing.F) {
	for _, text := range []string{"12.5", "1,5", "NaN", "0x1p4", "1_0", "1e999", "-", "1.2.3"} {
		f.Add(text, true)
		f.Add(text, false)
	}
	f.Fuzz(func(t *testing.T, text string, comma bool) {
		v, ok := parseNumber(text, comma)
		switch {
		case ok && (math.IsNaN(v) || math.IsInf(v, 0)):
			t.Errorf("%q is %v", text, v)
		case !ok && v != 0:
			t.Errorf("%q is no number and %v", text, v)
		case !ok && whyNoNumber(text, comma) == "":
			t.Errorf("%q is no number, and nothing says why", text)
		}
	})
}

func FuzzSize(f *testing.F) {
	for _, text := range []string{"18", "8ft x 6ft", "1200mm", "8x6ft", `48"`, "x", "1x2x3", "0", "-3in", "9e307ft", "1,5 m"} {
		for k := range shapeWords {
			f.Add(text, uint8(k), k%2 == 0)
		}
	}
	f.Fuzz(func(t *testing.T, text string, shape uint8, metric bool) {
		u := units.US
		if metric {
			u = units.SI
		}
		size, why := parseSize(text, shapeWords[int(shape)%len(shapeWords)], metric, u)
		if why == "" && !(size.Span > 0 && size.Rise > 0) {
			t.Errorf("%q is %+v", text, size)
		}
	})
}
