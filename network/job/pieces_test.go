package job_test

import (
	"math"
	"testing"

	"rimfall/hydrology"
	"rimfall/network/job"
)

// HDS-2 (FHWA-NHI-02-001, 2nd ed. 2002), Example 5.5: 21.8, 1.5 and 20.4 ha with C 0.20, 0.95 and 0.40 make C 0.32.
const hds2Pieces = `
-- job.toml --
units = "si"
[storm]
return_period = 10
-- surfaces.csv --
surface,usual,low,high
pavement,0.95,0.90,1
lawn,0.40,0.30,0.50
-- pieces.csv --
area,extent,c,surface
a1,21.8,0.20,
a1,1.5,,pavement
a1,20.4,,lawn
`

func TestTheCompositeOfHDS2Example55(t *testing.T) {
	j := readJob(t, folder(t, hds2Pieces+"-- areas.csv --\nid,structure,area,c,time\na1,A,,,36\n"))
	a := j.Network.Areas[0]
	if math.Round(100*a.C) != 32 || math.Abs(a.Area-43.7) > 1e-12 {
		t.Errorf("C %v of %v ha", a.C, a.Area)
	}
}

func TestTheLowAndHighEndOfARangeAreTakenWhereAskedFor(t *testing.T) {
	for word, want := range map[string]float64{"usual": 0.95, "low": 0.90, "high": 1} {
		j := readJob(t, folder(t, hds2Pieces+"-- job.toml --\n[storm]\nreturn_period = 10\nsurface_c = \""+word+`"
-- pieces.csv --
absent
-- areas.csv --
id,structure,area,surface,time
a1,A,1,pavement,10
`))
		if got := j.Network.Areas[0].C; got != want {
			t.Errorf("%s: C = %v, want %v", word, got, want)
		}
	}
}

func TestTheImperviousPercentageGivesCByTheRelationOfTheJob(t *testing.T) {
	for settings, want := range map[string]float64{
		"":                                 0.05 + 0.9*0.4, // Schueler 1987
		"impervious_relation = \"linear\"": 0.05 + 0.9*0.4,
		"impervious_relation = \"cubic\"":  0.858*0.064 - 0.78*0.16 + 0.774*0.4 + 0.04, // Urbonas, Guo and Tucker 1990
		"impervious_relation = \"two-part\"\nimpervious_c = 0.9\npervious_c = 0.2": 0.4*0.9 + 0.6*0.2,
	} {
		j := readJob(t, folder(t, "-- job.toml --\n[storm]\nreturn_period = 10\n"+settings+"\n-- areas.csv --\nid,structure,area,impervious,time\na1,A,1,40,10\n"))
		if got := j.Network.Areas[0].C; math.Abs(got-want) > 1e-12 {
			t.Errorf("%s: C = %v, want %v", settings, got, want)
		}
	}
}

func TestTheStartingSurfacesAreReadAsTheyStand(t *testing.T) {
	dir := folder(t, "-- areas.csv --\nid,structure,area,surface,time\na1,A,1,Roofs,10\n")
	writeFile(t, dir, "surfaces.csv", hydrology.StartingSurfacesCSV())
	if got := readJob(t, dir).Network.Areas[0].C; got != 0.85 { // HDS-2, Table 5.7: 0.75 to 0.95
		t.Errorf("C = %v", got)
	}
}

func TestFaultsOfPiecesAndSurfaces(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"the pieces do not add up, one has no coefficient, one is of no area", hds2Pieces + `
-- areas.csv --
id,structure,area,c,time
a1,A,40,,36
-- pieces.csv --
area,extent,c,surface
a1,21.8,0.20,
a1,1.5,,
a1,20.4,,lwan
a2,1,1.2,
`, `
areas.csv:2:6: area = 40, and its pieces in pieces.csv add up to 43.7: correct one of them, or leave area blank
pieces.csv:3:8: a piece of area a1 has no runoff coefficient: write c, or a surface
pieces.csv:4:10: unknown surface "lwan": did you mean "lawn"?
pieces.csv:5:1: unknown area "a2"; did you mean "a1"?
pieces.csv:5:6: c = 1.2: a runoff coefficient lies between 0 and 1
`},
		{"an area has two coefficients", hds2Pieces + `
-- areas.csv --
id,structure,area,c,impervious,time
a1,A,43.7,0.3,,36
a3,A,1,0.3,20,10
a4,A,1,,120,10
`, `
areas.csv:2:11: area a1 has both c and rows in pieces.csv: leave one of them out
areas.csv:3:12: area a3 has both impervious and another coefficient: leave one of them out
areas.csv:4:9: impervious = 120: a percentage lies between 0 and 100
`},
		{"a surface has no such end, or its range does not hold it", `
-- job.toml --
[storm]
return_period = 10
surface_c = "low"
-- surfaces.csv --
surface,c,low
roof,0.9,
lawn,0.3,0.4
-- areas.csv --
id,structure,area,surface,time
a1,A,1,roof,10
`, `
areas.csv:2:8: surface "roof" has no low coefficient, which surface_c = "low" asks for
surfaces.csv:3:6: surface "lawn": c = 0.3 must lie between 0 and 1, and between low and high
`},
	})
}
