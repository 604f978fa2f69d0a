package grade_test

import (
	"encoding/csv"
	"fmt"
	"os"
	"strconv"
	"testing"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/units"
)

// table reads a CSV of testdata, its # lines left out.
func table(t testing.TB, name string) [][]string {
	t.Helper()
	f, err := os.Open("../../testdata/grade/" + name)
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	r := csv.NewReader(f)
	r.Comment = '#'
	rows, err := r.ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	return rows
}

func number(t testing.TB, text string) float64 {
	t.Helper()
	v, err := strconv.ParseFloat(text, 64)
	if err != nil {
		t.Fatal(err)
	}
	return v
}

// Mays, Water Resources Engineering, Example 15.2.4, pp. 627-633: the pressure line through a manhole with a lateral at a
// right angle. Its coefficients, read from charts, stand in the column loss of the pipes in: a rise over the pressure line
// of the pipe out. The water level is the pressure line of the trunk; as a coefficient on the velocity head over the energy
// line, where ours starts, that is 0.84 - 1. Printed to 0.01 ft.
func TestManholeWithLateralOfTheBook(t *testing.T) {
	book := map[string]float64{}
	for _, row := range table(t, "manhole-with-lateral.csv")[1:] {
		book[row[0]] = number(t, row[1])
	}
	d := newDrain(units.US)
	level := book["pressure line of outfall pipe at manhole"]
	below := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(level)})
	manhole := d.structure(network.Structure{
		Rim:  network.Some(book["top of manhole"]),
		Loss: network.Some(book["in-line coefficient"] - 1),
	})
	above, side := d.structure(network.Structure{}), d.structure(network.Structure{})
	const short = 0.001 // ft: the pressure line at the manhole is given, so the pipe below it loses nothing
	out := d.pipe(network.Pipe{
		From: manhole, To: below, Length: short, Section: d.circle(book["outfall pipe diameter"]),
		InvertUpper: network.Some(book["bottom of manhole"]), InvertLower: network.Some(book["bottom of manhole"]),
	}, book["outfall pipe flow"])
	trunk := d.pipe(network.Pipe{
		From: above, To: manhole, Length: 100, Section: d.circle(book["upstream in-line diameter"]), Loss: network.Some(book["in-line coefficient"]),
		InvertUpper: network.Some(book["upstream in-line invert"] + 0.1), InvertLower: network.Some(book["upstream in-line invert"]),
	}, book["upstream in-line flow"])
	lateral := d.pipe(network.Pipe{
		From: side, To: manhole, Length: 50, Section: d.circle(book["lateral diameter"]), Loss: network.Some(book["lateral coefficient"]), Angle: network.Some(90),
		InvertUpper: network.Some(470.4), InvertLower: network.Some(470.3), // not printed
	}, book["lateral flow"])
	l := d.lines()
	const printed = 0.01
	head := l.Pipes[out].EGLUpper - l.Pipes[out].HGLUpper
	near(t, "velocity head in the outfall pipe", head, book["velocity head in outfall pipe"], printed)
	near(t, "pressure line of the outfall pipe", l.Pipes[out].HGLUpper, level, 1e-4)
	near(t, "lateral pressure change", l.Pipes[lateral].HGLLower-l.Pipes[out].HGLUpper, book["lateral pressure change"], printed)
	near(t, "lateral pressure line", l.Pipes[lateral].HGLLower, book["lateral pressure line"], printed)
	near(t, "in-line pressure change", l.Pipes[trunk].HGLLower-l.Pipes[out].HGLUpper, book["in-line pressure change"], printed)
	near(t, "in-line pressure line", l.Pipes[trunk].HGLLower, book["in-line pressure line = water level in manhole"], printed)
	near(t, "water level in the manhole", l.Structures[manhole].Level, book["in-line pressure line = water level in manhole"], printed)
}

// Mays, table 15.2.9, p. 623: every entry of the file, to the printed digit.
func TestSuddenContractionsOfTheBook(t *testing.T) {
	rows := table(t, "sudden-contraction.csv")
	for _, row := range rows[1:] {
		ratio := 1000.0 // "inf"
		if row[0] != "inf" {
			ratio = number(t, row[0])
		}
		for i, cell := range row[1:] {
			velocity := number(t, rows[0][i+1][1:])
			k, ok := grade.ContractionCoefficient(ratio, velocity)
			if !ok {
				t.Fatalf("no coefficient for ratio %s at %g ft/s", row[0], velocity)
			}
			near(t, fmt.Sprintf("ratio %s at %g ft/s", row[0], velocity), k, number(t, cell), 1e-12)
		}
	}
}

// Mays, Example 15.2.2: 0.3 m³/s out of 400 mm into 450 mm; printed 0.0127 m. (Unrounded 0.01279; the book rounds the
// velocities first.)
func ExampleEnlargementLoss() {
	fmt.Printf("%.4f m\n", grade.EnlargementLoss(1, 2.39, 1.89, 9.81))
	// Output: 0.0127 m
}

// Mays, Example 15.2.3: a 30° bend of the same 400 mm pipe with K = 0.25 √(Δ/90) = 0.144; printed 0.0419 m. As a
// coefficient of the structure at the bend.
func TestBendOfTheBookAsACoefficient(t *testing.T) {
	d := newDrain(units.SI)
	below := d.structure(network.Structure{Kind: network.Outfall, Tailwater: network.Some(11.0)})
	bend := d.structure(network.Structure{Loss: network.Some(0.144)})
	out := d.pipe(network.Pipe{From: bend, To: below, Length: 10, Section: d.circle(400), InvertUpper: network.Some(10.0), InvertLower: network.Some(9.99)}, 0.3)
	l := d.lines()
	near(t, "loss of the bend, m", l.Structures[bend].Level-l.Pipes[out].EGLUpper, 0.0419, 0.00006)
}

// The sewer of 10 ft, slope 0.0005, n 0.012, 400 cfs with a free outfall, g = 32.2: 497.8, 2,523 and 14,059 ft to depths of
// 6, 7 and 8 ft (a direct-step solution of 20,000 steps, recomputed for this project).
func ExampleLines_Trace() {
	d := newDrain(units.US)
	d.settings = grade.Settings{Method: grade.NoLoss, Start: grade.AtCritical, Gravity: 32.2, Manning: 1.486}
	river := d.structure(network.Structure{Kind: network.Outfall})
	shaft := d.structure(network.Structure{})
	sewer := d.pipe(network.Pipe{
		From: shaft, To: river, Length: 14059, N: 0.012, Section: d.circle(120),
		InvertUpper: network.Some(14059 * 0.0005), InvertLower: network.Some(0),
	}, 400)
	l := d.lines()
	fmt.Printf("at the outfall %.3f ft, 14,059 ft upstream %.3f ft\n", l.Pipes[sewer].HGLLower, l.Pipes[sewer].HGLUpper-14059*0.0005)
	points := l.Trace(sewer, 14059/7)
	last := 0.0
	for _, depth := range []float64{6, 7} {
		for _, p := range points {
			if p.Depth >= depth {
				fmt.Printf("%.0f ft deep between %.0f and %.0f ft\n", depth, last, p.Distance)
				break
			}
			last = p.Distance
		}
	}
	// Output:
	// at the outfall 4.748 ft, 14,059 ft upstream 8.000 ft
	// 6 ft deep between 497 and 504 ft
	// 7 ft deep between 2521 and 2528 ft
}
