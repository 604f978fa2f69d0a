package calculator_test

import (
	"encoding/csv"
	"math"
	"os"
	"strconv"
	"testing"

	"rimfall/network/calculator"
)

// readTable reads a table of testdata as maps from heading to text.
func readTable(t *testing.T, path string) []map[string]string {
	t.Helper()
	file, err := os.Open("../../testdata/" + path)
	if err != nil {
		t.Fatal(err)
	}
	defer file.Close()
	r := csv.NewReader(file)
	r.Comment = '#'
	records, err := r.ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	var rows []map[string]string
	for _, record := range records[1:] {
		row := map[string]string{}
		for i, h := range records[0] {
			row[h] = record[i]
		}
		rows = append(rows, row)
	}
	return rows
}

func num(t *testing.T, text string) float64 {
	t.Helper()
	v, err := strconv.ParseFloat(text, 64)
	if err != nil {
		t.Fatal(err)
	}
	return v
}

// ask asks one typed question that must have an answer.
func ask(t *testing.T, g calculator.Given) *calculator.Answer {
	t.Helper()
	if g.Units == "" {
		g.Units = "us"
	}
	s, err := calculator.Read(g)
	if err != nil {
		t.Fatalf("%+v: %v", g, err)
	}
	a, err := calculator.Ask(s.Questions[0])
	if err != nil {
		t.Fatalf("%+v: %v", g, err)
	}
	return a
}

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s: got %.6g, published %.6g, tolerance %.2g", what, got, want, tolerance)
	}
}

func TestPublishedExamplesComeOutAsPrinted(t *testing.T) {
	for _, r := range readTable(t, "manning/published.csv") {
		a := ask(t, calculator.Given{
			Shape: r["shape"], Size: r["size"], Bottom: r["bottom"], Side: r["side"], N: r["n"],
			Slope: r["slope"], Depth: r["depth"], Flow: r["flow"], Velocity: r["velocity"],
		})
		got := map[string]float64{
			"velocity": a.First.Velocity, "flow": a.First.Flow, "depth": a.First.Depth, "critical_depth": a.First.CriticalDepth.V,
		}[r["want"]]
		near(t, r["source"]+" "+r["want"], got, num(t, r["published"]), num(t, r["tolerance"]))
	}
}

// The agency's table of least slopes prints two figures; half of the last one is the
// tolerance.
func TestSlopeForCleansingVelocityIsThatOfTheTable(t *testing.T) {
	for _, r := range readTable(t, "pipeflow/minimum-slopes.csv") {
		for _, c := range []struct{ velocity, column string }{{"2.5", "published_slope_2_5_fps"}, {"3", "published_slope_3_fps"}} {
			if r[c.column] == "" {
				continue
			}
			a := ask(t, calculator.Given{Size: r["diameter_in"], N: "0.013", Depth: "full", Velocity: c.velocity})
			near(t, r["diameter_in"]+" in at "+c.velocity+" ft/s", a.Slope, num(t, r[c.column]), 0.00005)
		}
	}
}

// Mays prints the computed diameters to 0.01 ft; his 2.16 for 3.208/1.486 = 2.159 moves
// none of them by more than 0.0004 ft.
func TestDiametersOfThePublishedSewersAreFound(t *testing.T) {
	rows := readTable(t, "pipeflow/sewer-diameters.csv")
	if len(rows) != 12 {
		t.Fatalf("%d sewers, not 12", len(rows))
	}
	for _, r := range rows {
		a := ask(t, calculator.Given{N: "0.014", Slope: r["slope"], Flow: r["flow_cfs"]})
		near(t, "sewer "+r["sewer"], a.Exact.Size.Rise/12, num(t, r["computed_diameter_ft"]), 0.01)
		if a.Exact.Listed && a.Conduit.Size.Rise < a.Exact.Size.Rise {
			t.Errorf("sewer %s: the listed size %g is under the exact %g", r["sewer"], a.Conduit.Size.Rise, a.Exact.Size.Rise)
		}
	}
}

// Ponce reads depth and velocity from a chart: 1.3 in and 3 %.
func TestDepthsAndVelocitiesOfThePublishedLinesAreFound(t *testing.T) {
	for _, r := range readTable(t, "pipeflow/line-depths.csv") {
		a := ask(t, calculator.Given{Size: r["diameter_in"], N: "0.013", Slope: r["slope_percent"] + "%", Flow: r["flow_cfs"]})
		what := "line " + r["line"] + " from " + r["from_manhole"]
		near(t, what+", depth in", 12*a.First.Depth, num(t, r["depth_in"]), 1.3)
		velocity := num(t, r["velocity_design_fps"])
		near(t, what+", velocity", a.First.Velocity, velocity, 0.03*velocity)
	}
}

// The exact columns of the table of a circle, to their last digit.
func TestRatingOfACircleIsTheTableOfHydraulicElements(t *testing.T) {
	rows := readTable(t, "pipeflow/circle-geometry.csv")
	var depths string
	for i, r := range rows {
		if i > 0 {
			depths += ","
		}
		depths += r["y_over_D"] + "D"
	}
	s, err := calculator.Read(calculator.Given{Units: "us", Size: "12", Depth: depths})
	if err != nil {
		t.Fatal(err)
	}
	rating, err := calculator.Rate(s)
	if err != nil {
		t.Fatal(err)
	}
	for i, r := range rows {
		got := rating.Rows[i]
		near(t, r["y_over_D"]+" area", got.Area, num(t, r["A_over_D2"]), 6e-7)
		near(t, r["y_over_D"]+" radius", got.Radius, num(t, r["R_over_D"]), 6e-7)
		near(t, r["y_over_D"]+" velocity", got.VelocityRatio.V, num(t, r["V_over_Vfull_constant_n"]), 6e-7)
		near(t, r["y_over_D"]+" flow", got.FlowRatio.V, num(t, r["Q_over_Qfull_constant_n"]), 6e-7)
	}
}
