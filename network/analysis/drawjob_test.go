package analysis_test

import (
	"fmt"
	"os"
	"path/filepath"
	"slices"
	"strconv"
	"strings"

	"pgregory.net/rapid"
)

// sheet is a table of cells by heading, as a user has it in a spreadsheet.
type sheet struct {
	headings []string
	rows     []map[string]string
}

// drawnJob is a random job, before it is written down in some dialect.
type drawnJob struct {
	metric                   bool
	settings                 []string // lines of job.toml below [storm]
	structures, pipes, areas sheet
}

// draw makes numbers with few digits, as users write them.
type draw struct{ *rapid.T }

func (d draw) number(name string, low, high float64, decimals int) string {
	return strconv.FormatFloat(rapid.Float64Range(low, high).Draw(d.T, name), 'f', decimals, 64)
}

func (d draw) oneIn(n int, what string) bool { return rapid.IntRange(1, n).Draw(d.T, what) == 1 }

func (d draw) of(name string, words ...string) string {
	return rapid.SampledFrom(words).Draw(d.T, name)
}

// job draws a network that falls to its outfall, and leaves blank what a
// designer may leave blank.
func (d draw) job() drawnJob {
	j := drawnJob{metric: rapid.Bool().Draw(d.T, "metric")}
	j.structures.headings = []string{"id", "kind", "x", "y", "rim", "inflow", "lowest_invert", "least_fall", "note"}
	j.pipes.headings = []string{"id", "from", "to", "length", "shape", "size", "count", "material", "n", "invert_upper", "invert_lower", "slope", "wall", "share", "status", "note"}
	j.areas.headings = []string{"id", "structure", "area", "c", "time"}
	count := rapid.IntRange(2, 9).Draw(d.T, "structures")
	for i := range count {
		j.structures.rows = append(j.structures.rows, d.structure(i, count))
		if d.oneIn(2, "an area") || i == 0 {
			j.areas.rows = append(j.areas.rows, d.area(i))
		}
		if i == count-1 {
			break
		}
		if d.oneIn(5, "a split") {
			share := rapid.IntRange(1, 9).Draw(d.T, "tenths")
			for k, tenths := range []int{share, 10 - share} {
				p := d.pipe(j.metric, i, count, k)
				p["share"] = fmt.Sprintf("0.%d", tenths)
				j.pipes.rows = append(j.pipes.rows, p)
			}
			continue
		}
		j.pipes.rows = append(j.pipes.rows, d.pipe(j.metric, i, count, 0))
	}
	j.headsHaveRims()
	d.settings(&j)
	return j
}

// headsHaveRims: a structure that no pipe enters needs a rim, from which its line hangs.
func (j *drawnJob) headsHaveRims() {
	entered := map[string]bool{}
	for _, p := range j.pipes.rows {
		entered[p["to"]] = true
	}
	for _, s := range j.structures.rows {
		if s["rim"] == "" && !entered[s["id"]] {
			s["rim"], s["kind"] = "100", "manhole"
		}
	}
}

func (d draw) structure(i, count int) map[string]string {
	s := map[string]string{"id": fmt.Sprintf("S %d", i), "x": d.number("x", 0, 500, 2), "y": d.number("y", 0, 500, 2)}
	s["rim"] = d.number("rim", float64(100-3*i), float64(110-3*i), 2)
	s["note"] = d.of("note", "", "", "corner, north", `a "quoted" word`, "größer; früher", "two\nlines")
	switch {
	case i == count-1:
		s["kind"] = "outfall"
	case i > 0 && d.oneIn(6, "no rim"):
		s["rim"], s["kind"] = "", "blind-junction"
	}
	if d.oneIn(5, "an inflow") {
		s["inflow"] = d.number("inflow", 0, 0.5, 3)
	}
	if d.oneIn(8, "a lowest invert") {
		s["lowest_invert"] = d.number("lowest invert", 60, 99, 2)
	}
	if d.oneIn(6, "a least fall") {
		s["least_fall"] = d.number("least fall", 0, 0.3, 2)
	}
	return s
}

func (d draw) pipe(metric bool, i, count, k int) map[string]string {
	to := rapid.IntRange(i+1, count-1).Draw(d.T, "to")
	p := map[string]string{"id": fmt.Sprintf("P%d.%d", i, k), "from": fmt.Sprintf("S %d", i), "to": fmt.Sprintf("S %d", to)}
	p["length"] = d.number("length", 20, 200, 1)
	p["material"] = d.of("material", "", "", "concrete", "hdpe", "pvc")
	p["status"] = d.of("status", "", "", "proposed", "existing")
	p["note"] = d.of("note", "", "", "under the road; keep", "=1+1")
	if d.oneIn(4, "n is given") {
		p["n"] = d.number("n", 0.009, 0.024, 4)
	}
	if d.oneIn(6, "two barrels") {
		p["count"] = "2"
	}
	if d.oneIn(6, "a wall") {
		p["wall"] = d.of("wall", "3.25", "75", "2")
	}
	switch rapid.IntRange(0, 7).Draw(d.T, "what is given") {
	case 0:
		p["size"] = map[bool]string{false: "18", true: "450"}[metric]
	case 1:
		p["size"], p["shape"] = map[bool]string{false: "3ft x 2ft", true: "0.9m x 0.6m"}[metric], "box"
	case 2:
		p["slope"] = d.number("slope", 0.001, 0.04, 5)
	case 3:
		p["invert_upper"] = d.number("upper invert", 60, 98, 3)
	case 4:
		p["size"], p["slope"] = map[bool]string{false: "24in", true: "24 in"}[metric], d.number("slope", 0.001, 0.04, 5)
	case 5:
		p["shape"], p["material"] = d.of("shape", "box", "ellipse", "arch"), ""
		if metric {
			p["shape"] = "circle"
		}
	}
	return p
}

func (d draw) area(i int) map[string]string {
	a := map[string]string{"id": fmt.Sprintf("a%d", i), "structure": fmt.Sprintf("S %d", i)}
	a["area"], a["c"] = d.number("area", 0.05, 3, 3), d.number("c", 0, 1, 2)
	if !d.oneIn(4, "no inlet time") {
		a["time"] = d.number("inlet time", 0, 30, 1)
	}
	return a
}

// settings draws lines of job.toml.
func (d draw) settings(j *drawnJob) {
	storm := map[string][]string{
		"travel_velocity": {`"flow-over-full-area"`, `"full-bore"`}, "peak": {`"partial-area"`}, "hold_upstream_peak": {"true"},
		"frequency_factor": {"true"}, "check_period": {"100"}, "uplift": {"1.2"},
	}
	criteria := map[string][]string{
		"size_change": {`"inverts"`, `"0.8-points"`}, "velocity_basis": {`"design"`}, "max_depth_ratio": {"0.5", "0.8"}, "max_velocity": {"3", "6"},
		"max_slope": {"0.02"}, "least_fall": {"0", "0.05"}, "min_cover": {"0.5", "2.005"}, "size_for": {`"grade-line"`},
	}
	pick := func(from map[string][]string) {
		for _, key := range []string{"check_period", "frequency_factor", "hold_upstream_peak", "least_fall", "max_depth_ratio", "max_slope", "max_velocity", "min_cover", "peak", "size_change", "size_for", "travel_velocity", "uplift", "velocity_basis"} {
			if words, ok := from[key]; ok && d.oneIn(3, key) {
				j.settings = append(j.settings, key+" = "+d.of(key, words...))
			}
		}
	}
	pick(storm)
	j.settings = append(j.settings, "[criteria]")
	pick(criteria)
	if d.oneIn(2, "another loss") {
		j.settings = append(j.settings, "[grade]", "structure_loss = "+d.of("loss", `"none"`, `"coefficient"`))
	}
}

// dialect is how a sheet is written down.
type dialect struct {
	separator      string
	comma          bool // a decimal comma
	windows, mark  bool // line ends, byte-order mark
	remarks        bool
	own            bool // a column of the user's own, and blank ones at the end
	blankLeftOut   bool // columns that are blank in every row are not there
	quoteEverySeed int
}

func (d draw) dialect() dialect {
	yes := func(what string) bool { return rapid.Bool().Draw(d.T, what) }
	s := dialect{separator: d.of("separator", ",", ";", "\t"), windows: yes("CRLF"), mark: yes("byte-order mark"), remarks: yes("remarks"), own: yes("own columns"), blankLeftOut: yes("blank columns are left out")}
	s.comma = s.separator != "," && yes("decimal comma")
	s.quoteEverySeed = rapid.IntRange(1, 7).Draw(d.T, "quoted cells")
	return s
}

// columns are the headings that are written.
func (s dialect) columns(table sheet) []string {
	if !s.blankLeftOut {
		return table.headings
	}
	return slices.DeleteFunc(slices.Clone(table.headings), func(h string) bool {
		return !slices.ContainsFunc(table.rows, func(r map[string]string) bool { return r[h] != "" })
	})
}

// write writes a sheet as CSV text; rename gives fields headings of the user's own.
func (s dialect) write(table sheet, rename map[string]string) string {
	var b strings.Builder
	columns := s.columns(table)
	if s.mark {
		b.WriteString("\ufeff")
	}
	if s.remarks {
		b.WriteString("# a remark; with, separators\n\"# another, quoted\"\n\n")
	}
	line := func(cell func(k int, h string) string, own string) {
		cells := make([]string, len(columns))
		for k, h := range columns {
			cells[k] = cell(k, h)
		}
		if s.own {
			cells = append(cells, own, "", "")
		}
		b.WriteString(strings.Join(cells, s.separator) + "\n")
	}
	line(func(_ int, h string) string {
		if own := rename[h]; own != "" {
			return own
		}
		return h
	}, "x_drawing")
	for i, r := range table.rows {
		line(func(k int, h string) string { return s.cell(r[h], (i*len(columns)+k)%7 == s.quoteEverySeed) }, "sheet 4")
		if s.remarks && i == 0 {
			b.WriteString("# between rows\n")
		}
	}
	if s.windows {
		return strings.ReplaceAll(b.String(), "\n", "\r\n")
	}
	return b.String()
}

// cell writes one cell, in quotes where it must be or as it happens.
func (s dialect) cell(text string, quote bool) string {
	if _, err := strconv.ParseFloat(text, 64); err == nil && s.comma {
		text = strings.Replace(text, ".", ",", 1)
	}
	if quote && text != "" || strings.ContainsAny(text, s.separator+"\"\n") {
		return `"` + strings.ReplaceAll(text, `"`, `""`) + `"`
	}
	return text
}

// ownHeadings are headings of a user's own for fields of pipes.csv.
var ownHeadings = map[string]string{"invert_upper": "IL up", "size": "Ø", "slope": "fall, 1", "from": "upstream end"}

// write writes a drawn job to a new folder, each table in a dialect of its own.
func (d draw) write(j drawnJob, dir string) {
	units, rainfall := "us", "duration,10,100\n5,6,8\n15,3.9,5.2\n60,1.6,2.2\n1440,0.2,0.3\n1e9,0.1,0.2\n"
	if j.metric {
		units, rainfall = "si", "duration;10;100\n5;150;200\n15;98;130\n60;40;55\n1440;5;7,5\n1e9;3;4\n"
	}
	toml := "units = \"" + units + "\"\n[storm]\nreturn_period = 10\n" + strings.Join(j.settings, "\n") + "\n"
	pipes := d.dialect()
	quoted := map[string]string{} // a heading with a comma is quoted where a comma separates
	if rapid.Bool().Draw(d.T, "own headings") {
		toml += "[columns.pipes]\n"
		for _, field := range pipes.columns(j.pipes) { // a heading that is named has to be there
			if own := ownHeadings[field]; own != "" {
				toml += field + " = \"" + own + "\"\n"
				quoted[field] = pipes.cell(own, false)
			}
		}
	}
	files := map[string]string{"job.toml": toml, "rainfall.csv": rainfall}
	files["structures.csv"] = d.dialect().write(j.structures, nil)
	files["pipes.csv"] = pipes.write(j.pipes, quoted)
	files["areas.csv"] = d.dialect().write(j.areas, nil)
	for name, text := range files {
		if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
			d.T.Fatal(err)
		}
	}
}
