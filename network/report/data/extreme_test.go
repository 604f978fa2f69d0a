package data_test

import (
	"bytes"
	"encoding/json"
	"fmt"
	"os"
	"path/filepath"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network/analysis"
	"rimfall/network/report/data"
)

// extremeJob is a job of two pipes whose numbers lie far outside of anything that
// is built: lengths and sizes from a millionth to a million, levels alike.
//
// The cleansing velocity is left at full bore: at the design depth of a trickle it
// asks for slopes that no float64 can hold beside the levels.
func extremeJob(t *rapid.T) map[string]string {
	word := func(name string, words ...string) string { return rapid.SampledFrom(words).Draw(t, name) }
	number := func(name string, more ...string) string {
		return word(name, append(more, "1e-6", "1e-3", "0.01", "1", "100", "1e6")...)
	}
	level := func(name string) string { return number(name, "", "-1e6", "0", "95.5", "1e6") }
	pipe := func(ends string) string {
		return fmt.Sprintf("%s,%s,%s,%s,%s,%s,%s\n", ends, number("length"), number("size", "", "", "12", "900"), word("n", "0.001", "0.013", "1"),
			word("slope", "", "", "-0.5", "0", "1e-6", "0.01", "10"), level("upper invert"), number("wall", ""))
	}
	toml := "units = \"" + word("units", "us", "si") + "\"\n[storm]\nreturn_period = 10\nuplift = " + number("uplift") + "\nminimum_time = " + number("minimum time") +
		"\npeak = \"" + word("peak", "longest-time", "partial-area") + "\"\ntravel_velocity = \"" + word("travel", "part-full", "full-bore", "flow-over-full-area") +
		"\"\n[criteria]\nmax_velocity = " + number("max velocity") + "\nmin_velocity = " + word("min velocity", "0", "1", "3") + "\nmin_shear = " + word("shear", "0", "0.05") +
		"\nsize_for = \"" + word("for", "capacity", "grade-line") + "\"\n[grade]\nstructure_loss = \"" + word("loss", "none", "coefficient", "access-hole") + "\"\n"
	return map[string]string{
		"job.toml":     toml,
		"rainfall.csv": "duration,10\n5,6\n60,1.5\n1e15,0.001\n",
		"structures.csv": "id,kind,rim,inflow,lowest_invert,tailwater\nA,," + level("rim of A") + "," + number("inflow", "0", "") + "," + level("lowest") + ",\n" +
			"B,," + level("rim of B") + ",,,\nO,outfall," + level("rim of O") + ",,," + level("tailwater") + "\n",
		"pipes.csv": "id,from,to,length,size,n,slope,invert_upper,wall\n" + pipe("P,A,B") + pipe("Q,B,O"),
		"areas.csv": "id,structure,area,c,time\na,A," + number("area") + "," + word("c", "0", "1e-6", "0.5", "1") + "," + number("time", "0") + "\n",
	}
}

// Whatever the reader takes runs to the end, and no result is a number that is none.
func TestNumbersOutsideOfAnythingBuiltGiveFiniteResults(t *testing.T) {
	dir := t.TempDir()
	rapid.Check(t, func(t *rapid.T) {
		files := extremeJob(t)
		for name, text := range files {
			if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
				t.Fatal(err)
			}
		}
		for _, o := range []analysis.Options{{}, {Size: true}} {
			j, err := analysis.Read(dir, o)
			if err != nil {
				continue // faults: a pipe to be sized on a slope that does not fall, and the like
			}
			r, err := analysis.Run(j, o)
			if err != nil {
				continue // a time beyond the rainfall
			}
			var b bytes.Buffer
			if err := data.JSON(&b, r, ""); err != nil || !json.Valid(b.Bytes()) || bytes.Contains(b.Bytes(), []byte(":null")) {
				t.Fatalf("%v in\n%s\nof %+v", err, b.Bytes(), files)
			}
		}
	})
}
