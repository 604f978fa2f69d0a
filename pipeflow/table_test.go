package pipeflow_test

import (
	"bufio"
	"math"
	"os"
	"strconv"
	"strings"
	"testing"

	"rimfall/pipeflow"
)

// table reads a file of check values: comment lines, a heading, rows. Every row is a map from heading to text.
func table(t *testing.T, name string) []map[string]string {
	t.Helper()
	file, err := os.Open("../testdata/pipeflow/" + name)
	if err != nil {
		t.Fatal(err)
	}
	defer func() { _ = file.Close() }()
	var headings []string
	var rows []map[string]string
	for lines := bufio.NewScanner(file); lines.Scan(); {
		line := lines.Text()
		if strings.HasPrefix(line, "#") || line == "" {
			continue
		}
		cells := strings.Split(line, ",")
		if headings == nil {
			headings = cells
			continue
		}
		row := map[string]string{}
		for i, heading := range headings {
			row[heading] = cells[i]
		}
		rows = append(rows, row)
	}
	if len(rows) == 0 {
		t.Fatalf("%s has no rows", name)
	}
	return rows
}

// number is a cell of a row; ok is false where the cell is blank.
func number(t *testing.T, row map[string]string, heading string) (value float64, ok bool) {
	t.Helper()
	text, known := row[heading]
	if !known {
		t.Fatalf("no column %q", heading)
	}
	if text == "" {
		return 0, false
	}
	value, err := strconv.ParseFloat(text, 64)
	if err != nil {
		t.Fatalf("%s: %v", heading, err)
	}
	return value, true
}

// hold compares a computed value with a cell, unless that is blank. The tolerance is relative to want, with a floor of
// the same share of least.
func hold(t *testing.T, row map[string]string, heading string, got, relative, least float64) {
	t.Helper()
	want, ok := number(t, row, heading)
	if ok && !(math.Abs(got-want) <= relative*max(math.Abs(want), least)) {
		t.Errorf("%s of %v: got %.12g, want %.12g", heading, row, got, want)
	}
}

// must unwraps a section that has to exist.
func must[S pipeflow.Section](s S, err error) pipeflow.Section {
	if err != nil {
		panic(err)
	}
	return s
}

// shapeOf makes the section that a name in the check values means: shape and lengths, blank between.
func shapeOf(t *testing.T, name string) pipeflow.Section {
	t.Helper()
	words := strings.Fields(name)
	v := make([]float64, 5)
	for i, word := range words[1:] {
		v[i], _ = strconv.ParseFloat(word, 64)
	}
	switch words[0] {
	case "circle":
		return must(pipeflow.NewCircle(v[0]))
	case "box":
		return must(pipeflow.NewBox(v[0], v[1]))
	case "haunched":
		return must(pipeflow.NewHaunchedBox(v[0], v[1], v[2]))
	case "ellipse":
		return must(pipeflow.NewEllipse(v[0], v[1]))
	case "arch":
		return must(pipeflow.NewArch(v[0], v[1], v[2], 0, v[3]))
	case "oval":
		crown, side := 0.0, v[2]
		if v[1] > v[0] {
			crown, side = v[2], 0
		}
		s, _, err := pipeflow.NewOval(v[0], v[1], crown, side)
		return must(s, err)
	case "trapezoid":
		return must(pipeflow.NewTrapezoid(v[0], v[1], v[1]))
	case "parabola":
		return must(pipeflow.NewParabola(v[0], v[1]))
	}
	t.Fatalf("no shape %q", name)
	return nil
}
