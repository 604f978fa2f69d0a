package analysis_test

import (
	"fmt"
	"math"
	"os"
	"path/filepath"
	"slices"
	"strconv"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/analysis"
)

// The units of the twins. Exact: the foot of 0.3048 m, the acre of 43 560 ft².
const (
	foot      = 0.3048
	inch      = 25.4 // mm
	acre      = 43560 * foot * foot / 10000
	cubicFoot = foot * foot * foot
)

// exactUS are the constants of the US system that agree with the metric ones to
// the last digit, in place of the rounded 1.486 and 1: ft^(1/3) in m^(1/3), and
// acre·in/h in cfs.
func exactUS() string {
	return fmt.Sprintf("manning_factor = %v\nrational_factor = %v\n", math.Cbrt(1/foot), 43560.0/43200)
}

// inFeet gives sizes that a metric job was drawn with their like in feet.
var inFeet = map[string]string{"450": "18", "0.9m x 0.6m": "3ft x 2ft"}

// A job in feet and the same job in metres are two ways through every constant:
// of the reader, Manning's equation, the Rational method and gravity.
func TestAJobInFeetAndItsTwinInMetresRunAlike(t *testing.T) {
	base := t.TempDir()
	rapid.Check(t, func(t *rapid.T) {
		dir, err := os.MkdirTemp(base, "job")
		if err != nil {
			t.Fatal(err)
		}
		defer os.RemoveAll(dir)
		d := draw{t}
		j := d.job()
		j.metric = false
		storm := j.settings[:slices.Index(j.settings, "[criteria]")]
		j.settings = append([]string{exactUS()}, storm...)
		for _, p := range j.pipes.rows {
			if p["size"] == "" || p["shape"] != "box" {
				p["shape"] = "" // other shapes have no metric sizes
			}
			p["material"] = ""
			if own, metric := inFeet[p["size"]]; metric {
				p["size"] = own
			}
		}
		feet, metres := filepath.Join(dir, "feet"), filepath.Join(dir, "metres")
		for _, folder := range []string{feet, metres} {
			if err := os.Mkdir(folder, 0o755); err != nil {
				t.Fatal(err)
			}
		}
		d.write(j, feet)
		us := runDrawn(t, feet, analysis.Options{Size: true})
		writeMetric(t, us, strings.Join(storm, "\n"), metres)
		holdTwins(t, us, runDrawn(t, metres, analysis.Options{}))
	})
}

// writeMetric writes the network of a run in metres.
func writeMetric(t *rapid.T, r *analysis.Result, storm, dir string) {
	t.Helper()
	n := r.Network
	number := func(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }
	maybe := func(m network.Maybe, unit float64) string {
		if !m.OK {
			return ""
		}
		return number(m.V * unit)
	}
	structures, pipes, areas := "id,kind,x,y,rim,inflow\n", "id,from,to,length,shape,size,count,n,invert_upper,invert_lower,slope,wall,share\n", "id,structure,area,c,time\n"
	for _, s := range n.Structures {
		structures += strings.Join([]string{s.ID, s.Kind.String(), maybe(s.X, foot), maybe(s.Y, foot), maybe(s.Rim, foot), number(s.Inflow * cubicFoot)}, ",") + "\n"
	}
	for _, p := range n.Pipes {
		size := number(p.Size.Rise*inch) + " mm"
		if p.Shape == "box" {
			size = number(p.Size.Span*inch) + "mm x " + size
		}
		pipes += strings.Join([]string{
			p.ID, n.Structures[p.From].ID, n.Structures[p.To].ID, number(p.Length * foot), p.Shape, size, strconv.Itoa(int(p.Count)), number(p.N),
			maybe(p.InvertUpper, foot), maybe(p.InvertLower, foot), maybe(p.Slope, 1), number(p.Wall * foot * 1000), maybe(p.Share, 1),
		}, ",") + "\n"
	}
	for _, a := range n.Areas {
		areas += strings.Join([]string{a.ID, n.Structures[a.Structure].ID, number(a.Area * acre), number(a.C), maybe(a.Time, 1)}, ",") + "\n"
	}
	rainfall := "duration,10,100\n"
	for _, row := range [][3]float64{{5, 6, 8}, {15, 3.9, 5.2}, {60, 1.6, 2.2}, {1440, 0.2, 0.3}, {1e9, 0.1, 0.2}} {
		rainfall += number(row[0]) + "," + number(row[1]*inch) + "," + number(row[2]*inch) + "\n"
	}
	for name, text := range map[string]string{
		"job.toml":       "units = \"si\"\n[storm]\nreturn_period = 10\n" + storm + "\n",
		"structures.csv": structures, "pipes.csv": pipes, "areas.csv": areas, "rainfall.csv": rainfall,
	} {
		if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
}

func holdTwins(t *rapid.T, us, si *analysis.Result) {
	t.Helper()
	// 1e-8: depths are good to 1e-10 each, and their travel times add up on the way down.
	const room = 1e-8
	same := func(what, id string, feet, unit, metres float64) {
		if math.Abs(feet*unit-metres) > room*max(math.Abs(metres), 1e-3) {
			t.Fatalf("%s of %s: %v in feet is %v, in metres %v", what, id, feet, feet*unit, metres)
		}
	}
	for i := range us.Network.Pipes {
		id, a, b := us.Network.Pipes[i].ID, &us.Design.Flows.Pipes[i], &si.Design.Flows.Pipes[i]
		if a.State != b.State {
			if math.Abs(a.Flow/a.Capacity-1) < room {
				t.Skip("just at capacity, where rounding decides")
			}
			t.Fatalf("pipe %s: %+v and %+v", id, a, b)
		}
		same("flow", id, a.Flow, cubicFoot, b.Flow)
		same("capacity", id, a.Capacity, cubicFoot, b.Capacity)
		same("depth", id, a.Depth, foot, b.Depth)
		same("velocity", id, a.Velocity, foot, b.Velocity)
		same("time", id, a.Time, 1, b.Time)
		same("travel time", id, a.TravelTime, 1, b.TravelTime)
		same("intensity", id, a.Intensity, inch, b.Intensity)
		g := us.Job.Settings.Units.Gravity
		same("critical depth", id, a.CriticalDepth(&us.Network.Pipes[i], g).V, foot, b.CriticalDepth(&si.Network.Pipes[i], si.Job.Settings.Units.Gravity).V)
		same("cover", id, us.Network.Cover(&us.Network.Pipes[i], network.Upper).V, foot, si.Network.Cover(&si.Network.Pipes[i], network.Upper).V)
	}
}

// holdLevels holds the grade lines at the structures of two runs of one network,
// whose rows stand in other orders.
func holdLevels(t *rapid.T, a, b *analysis.Result) {
	t.Helper()
	row := map[string]int{}
	for i := range b.Network.Structures {
		row[b.Network.Structures[i].ID] = i
	}
	for i := range a.Network.Structures {
		id := a.Network.Structures[i].ID
		x, y := a.Design.Lines.Structures[i], b.Design.Lines.Structures[row[id]]
		// 1e-9: the surface along a pipe is followed to 1e-10 of a level or better, from flows that agree to 1e-12.
		if x.Known != y.Known || math.Abs(x.Level-y.Level) > 1e-9*max(1, math.Abs(x.Level)) {
			t.Fatalf("structure %s: grade line %v, in another order %v", id, x.Level, y.Level)
		}
	}
}

// The order of the rows changes nothing, from the reader through sizing to the findings.
func TestTheOrderOfTheRowsOfAJobChangesNoResult(t *testing.T) {
	base := t.TempDir()
	rapid.Check(t, func(t *rapid.T) {
		dir, err := os.MkdirTemp(base, "job")
		if err != nil {
			t.Fatal(err)
		}
		defer os.RemoveAll(dir)
		d := draw{t}
		j := d.job()
		var runs [2]*analysis.Result
		for k, folder := range []string{"given", "shuffled"} {
			folder = filepath.Join(dir, folder)
			if err := os.Mkdir(folder, 0o755); err != nil {
				t.Fatal(err)
			}
			d.write(j, folder)
			runs[k] = runDrawn(t, folder, analysis.Options{Size: true})
			j.structures.rows = rapid.Permutation(j.structures.rows).Draw(t, "structures")
			j.pipes.rows = rapid.Permutation(j.pipes.rows).Draw(t, "pipes")
			j.areas.rows = rapid.Permutation(j.areas.rows).Draw(t, "areas")
		}
		row := map[string]int{}
		for i, p := range runs[1].Network.Pipes {
			row[p.ID] = i
		}
		for i := range runs[0].Network.Pipes {
			a, b := &runs[0].Network.Pipes[i], &runs[1].Network.Pipes[row[runs[0].Network.Pipes[i].ID]]
			if a.Size != b.Size || a.InvertUpper != b.InvertUpper || a.InvertLower != b.InvertLower {
				t.Fatalf("pipe %s: %+v, in another order %+v", a.ID, a, b)
			}
			fa, fb := runs[0].Design.Flows.Pipes[i].Flow, runs[1].Design.Flows.Pipes[row[a.ID]].Flow
			if math.Abs(fa-fb) > 1e-12*fa {
				t.Fatalf("pipe %s: flow %v, in another order %v", a.ID, fa, fb)
			}
		}
		holdLevels(t, runs[0], runs[1])
		count := func(r *analysis.Result) map[string]int {
			m := map[string]int{}
			for _, f := range r.Findings {
				m[f.Rule.Name+" "+f.Subject]++
			}
			return m
		}
		if a, b := count(runs[0]), count(runs[1]); fmt.Sprint(a) != fmt.Sprint(b) {
			t.Fatalf("findings %v, in another order %v", a, b)
		}
	})
}
