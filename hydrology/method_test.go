package hydrology

import (
	"math"
	"slices"
	"testing"
)

// One leg in both systems of units, within what the sources' rounding of their pairs of constants allows: most of it
// the kinematic wave's, whose 0.933 (ft) is 6.944 in SI where the source prints 6.92, 0.35 %.
func TestUnitSystemsAgree(t *testing.T) {
	const foot = 0.3048
	us := Leg{
		Length: 90, Slope: 0.02, N: 0.2, Cover: "unpaved", HydraulicRadius: 1.2, Diameter: 2, CrossSlope: 0.02,
		Spread: 6, Velocity: 3, C: 0.5, CurveNumber: 75, Area: 10,
	}
	si := us
	si.Length, si.HydraulicRadius, si.Diameter, si.Spread, si.Velocity = 90*foot, 1.2*foot, 2*foot, 6*foot, 3*foot
	si.Area = 10 / acresPerHectare
	storm := pulaskiCurve(t)
	inUS := Settings{Storm: storm, TwoYearDay: 2.37}
	inSI := Settings{System: SI, Storm: storm.Scaled(25.4), TwoYearDay: 2.37 * 25.4}
	for _, m := range Methods() {
		t.Run(m.Title, func(t *testing.T) {
			us.Kind, si.Kind = m.Kind, m.Kind
			a, b := mustTime([]Leg{us}, inUS), mustTime([]Leg{si}, inSI)
			if math.Abs(a.Minutes/b.Minutes-1) > 0.0035 {
				t.Errorf("%v min in US units, %v in SI", a.Minutes, b.Minutes)
			}
			if math.Abs(a.Steps[0].Velocity*foot/b.Steps[0].Velocity-1) > 0.0035 {
				t.Errorf("%v ft/s in US units, %v m/s in SI", a.Steps[0].Velocity, b.Steps[0].Velocity)
			}
			if len(a.Steps[0].Breaches) != len(b.Steps[0].Breaches) {
				t.Errorf("limits: %v in US units, %v in SI", a.Steps[0].Breaches, b.Steps[0].Breaches)
			}
		})
	}
}

// The formulas for whole basins, each worked on paper for 2000 ft at 0.02, n 0.1, C 0.5, CN 75, 40 acres.
func TestBasinFormulas(t *testing.T) {
	leg := Leg{Length: 2000, Slope: 0.02, N: 0.1, C: 0.5, CurveNumber: 75, Area: 40}
	cases := []struct {
		kind Kind
		want float64
	}{
		{Kirpich, 12.25},         // 0.0078·348.2·4.509
		{FAA, 38.34},             // 1.8·0.6·44.72/1.2599
		{NRCSLag, 45.43},         // 60·437.35·2.7907/(1140·1.41421)
		{Kerby, 24.66},           // 0.828·200^0.467·0.02^−0.235 = 0.828·11.876·2.5076
		{BransbyWilliams, 23.49}, // 0.007768·2000·40^−0.1·0.02^−0.2
		{Temez, 25.98},           // 0.03829·322.7·2.1029
	}
	for _, k := range cases {
		leg.Kind = k.kind
		got := mustTime([]Leg{leg}, Settings{}).Minutes
		if math.Abs(got-k.want) > 0.001*k.want { // the paper's four digits
			t.Errorf("%s: %.3f min, on paper %v", k.kind, got, k.want)
		}
	}
}

func TestEveryMethodHasItsSource(t *testing.T) {
	var kinds []Kind
	for _, m := range Methods() {
		if m.Title == "" || m.Source == "" || slices.Contains(kinds, m.Kind) {
			t.Errorf("%+v", m)
		}
		kinds = append(kinds, m.Kind)
	}
	if travel, faults := Time(nil, Settings{}); travel.Minutes != 0 || len(faults) > 0 {
		t.Errorf("an empty path: %v, %v", travel, faults)
	}
}

// NRCS NEH 630, ch. 15, Table 15-3 is what the covers hold; HDS-2, Table 2.2 is another agency's rounding of the same
// velocities as 33·k, within 1 % but for row crops, 3.2 %.
func TestShallowCoversAgreeWithBothAgencies(t *testing.T) {
	inNEH := map[float64]bool{}
	for _, row := range publishedRows("shallow-flow-velocity.csv")[1:] {
		if row[3] == "" {
			continue // HDS-2 only
		}
		coefficient, hds2 := number(row[3]), number(row[5])
		inNEH[coefficient] = true
		if math.Abs(coefficient/hds2-1) > 0.032 {
			t.Errorf("%s: %v in one source, %v in the other", row[0], coefficient, hds2)
		}
	}
	for _, c := range ShallowCovers() {
		if !inNEH[c.Coefficient] && !inNEH[math.Round(c.Coefficient*1000)/1000] { // TR-55 prints one digit more
			t.Errorf("%s: %v is in no source", c.Name, c.Coefficient)
		}
	}
}

// HDS-2, Table 2.1, row by row.
func TestSheetCoversAreThePublishedTable(t *testing.T) {
	rows := publishedRows("manning-n-sheet-flow.csv")[1:]
	covers := SheetCovers()
	if len(rows) != len(covers) {
		t.Fatalf("%d covers, %d published", len(covers), len(rows))
	}
	for k, row := range rows {
		if covers[k].Coefficient != number(row[1]) {
			t.Errorf("%s: %v, published %s for %s", covers[k].Name, covers[k].Coefficient, row[1], row[0])
		}
	}
}
