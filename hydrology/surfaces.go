package hydrology

import (
	_ "embed"
	"encoding/csv"
	"math"
	"slices"
	"strconv"
	"strings"
)

//go:embed surfaces.csv
var startingSurfaces string

//go:embed surfacesbyperiod.csv
var surfacesByPeriod string

// Surface is a kind of ground and its runoff coefficient: the usual one, and the published range.
type Surface struct {
	Name         string
	C, Low, High float64
	Source       string
}

// StartingSurfacesCSV is the text of a surfaces.csv to start from: published ranges of C, a source in each row.
func StartingSurfacesCSV() string { return startingSurfaces }

// StartingSurfaces lists the same.
func StartingSurfaces() []Surface {
	var surfaces []Surface
	for _, row := range rowsOf(startingSurfaces)[1:] {
		surfaces = append(surfaces, Surface{row[0], parsed(row[1]), parsed(row[2]), parsed(row[3]), row[4]})
	}
	return surfaces
}

// CByPeriod gives C of a surface for a return period from 2 to 500 years (City of Austin): as published at its
// periods, linear in ln T between them, which is ours. Not ok for another surface or period.
func CByPeriod(surface string, period float64) (c float64, ok bool) {
	rows := rowsOf(surfacesByPeriod)
	at := slices.IndexFunc(rows[1:], func(row []string) bool { return strings.EqualFold(row[0], surface) })
	if at < 0 || math.IsNaN(period) {
		return 0, false
	}
	row := rows[1+at]
	for k := 1; k < len(row); k++ {
		upper := parsed(rows[0][k])
		if period == upper {
			return parsed(row[k]), true
		}
		if period > upper || k == 1 {
			continue
		}
		lower := parsed(rows[0][k-1])
		if period < lower {
			break
		}
		share := math.Log(period/lower) / math.Log(upper/lower)
		return parsed(row[k-1]) + share*(parsed(row[k])-parsed(row[k-1])), true
	}
	return 0, false
}

// SurfacesByPeriod lists the names that CByPeriod knows.
func SurfacesByPeriod() []string {
	var names []string
	for _, row := range rowsOf(surfacesByPeriod)[1:] {
		names = append(names, row[0])
	}
	return names
}

// rowsOf reads one of our own embedded tables; a test reads each of them whole.
func rowsOf(text string) [][]string {
	reader := csv.NewReader(strings.NewReader(text))
	reader.Comment = '#'
	rows, err := reader.ReadAll()
	if err != nil {
		panic(err) // the table was built in
	}
	return rows
}

func parsed(text string) float64 {
	x, err := strconv.ParseFloat(text, 64)
	if err != nil {
		panic(err) // the table was built in
	}
	return x
}
