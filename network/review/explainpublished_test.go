package review_test

import (
	"encoding/csv"
	"math"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"

	"rimfall/network/analysis"
	"rimfall/network/review"
)

// published reads a published table: a row by the id in its first column, its numbers by heading.
func published(t *testing.T, path string) map[string]map[string]float64 {
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
	rows := map[string]map[string]float64{}
	for _, record := range all[1:] {
		rows[record[0]] = map[string]float64{}
		for i, cell := range record {
			if v, err := strconv.ParseFloat(cell, 64); err == nil && i > 0 {
				rows[record[0]][all[0][i]] = v
			}
		}
	}
	return rows
}

// onPage is the last result that stands behind a symbol on the page of a pipe, before its grade
// lines: what is printed, as a reader takes it from there.
func onPage(t *testing.T, r *analysis.Result, id string) map[string]float64 {
	t.Helper()
	values := map[string]float64{}
	for _, l := range printedLines(t, r, id, review.OfPipe) {
		number, _, _ := strings.Cut(l.result, " ")
		v, err := strconv.ParseFloat(strings.Replace(number, "−", "-", 1), 64)
		if err != nil || l.part == "Criteria" {
			continue
		}
		values[l.symbol] = v
	}
	return values
}

// held says which symbol of a page a column of a published table is, and what the printed figures allow; share is
// of the printed value.
type held struct {
	column, symbol   string
	factor           float64 // the table's unit in the page's
	tolerance, share float64
}

// holdPage holds the pages of all pipes against a published table.
func holdPage(t *testing.T, r *analysis.Result, rows map[string]map[string]float64, columns []held, except map[string]string) {
	t.Helper()
	if len(rows) != len(r.Network.Pipes) {
		t.Fatalf("%d rows printed, %d pipes", len(rows), len(r.Network.Pipes))
	}
	for id, row := range rows {
		page := onPage(t, r, id)
		for _, c := range columns {
			want, printed := row[c.column]
			if !printed || except[id+" "+c.column] != "" {
				continue
			}
			got, ok := page[c.symbol]
			got *= c.factor
			if !ok || math.Abs(got-want) > c.tolerance+c.share*want {
				t.Errorf("%s, %s: %s on the page is %g, published %g", id, c.column, c.symbol, got, want)
			}
		}
	}
}

// V. M. Ponce, Engineering Hydrology, 2nd ed., ch. 4, Table 4-2: every column of the table stands on the
// page of its pipe. The tolerances are those of the test of the run (times to a decimal, a chart for
// part-full flow); what they allow is said there.
func TestThePagesOfTheNineLinesReproduceTheirTable(t *testing.T) {
	const dir = "../../testdata/networks/nine-lines"
	r := asRunOf(t, dir, analysis.Options{})
	holdPage(t, r, published(t, filepath.Join(dir, "published.csv")), []held{
		{"area", "ΣA", 1, 1e-9, 1e-4},
		{"time", "t", 1, 0.1, 0},
		{"travel_time", "Δt", 1, 0.1, 0},
		{"intensity", "i", 1, 0, 0.0035},
		{"flow", "Q", 1, 0, 0.0035},
		{"capacity", "Q_f", 1, 0, 0.016},
		{"velocity_full", "V_f", 1, 0, 0.05},
		{"velocity", "V", 1, 0, 0.03},
		{"depth_in", "y", 12, 1.3, 0},
		{"slope_percent", "S", 100, 0.005, 0},
		{"diameter_in", "d", 1, 0, 0},
		{"invert_upper", "z_u", 1, 0.005, 0},
		{"invert_lower", "z_l", 1, 0.005, 0},
	}, map[string]string{
		"2-1 capacity": "printed 3.2 cfs of a pipe whose formula gives 3.38: the table is rounded at 0.9 %",
	})
}

// L. W. Mays, Water Resources Engineering, Table 15.2.6. Velocities and times of the table are of the flow
// over the full area, which the job asks for.
func TestThePagesOfTheTwelveSewersReproduceTheirTable(t *testing.T) {
	const folder = "../../testdata/networks/"
	r := asRunOf(t, folder+"twelve-sewers-printed", analysis.Options{})
	holdPage(t, r, published(t, folder+"twelve-sewers/published.csv"), []held{
		{"ca", "ΣCA", 1, 0.01, 0},
		{"time", "t", 1, 0.1, 0},
		{"intensity", "i", 1, 0, 0.004},
		{"flow", "Q", 1, 0, 0.005},
		{"diameter_ft", "D", 1, 0.005, 0},
		{"travel_time", "Δt", 1, 0.03, 0},
	}, map[string]string{
		"5.2 flow": "0.46 · 3.9 = 1.79 of a ΣCA that is exactly 0.455",
	})
}
