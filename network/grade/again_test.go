package grade_test

import (
	"reflect"
	"testing"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/networktest"
	"rimfall/network/sweep"
	"rimfall/network/units"
)

func TestLinesInOneRoomAreThoseOfAFreshRunAndAllocateNothing(t *testing.T) {
	n := networktest.New(networktest.Forest, 1000)
	settings := grade.Settings{Gravity: units.US.Gravity, Manning: units.US.ManningFactor}
	table, err := hydrology.NewTable([]float64{5, 60, 1e4}, []float64{10}, [][]float64{{6}, {2}, {0.01}})
	if err != nil {
		t.Fatal(err)
	}
	curve, _ := table.Curve(10)
	storm := network.Storm{ReturnPeriod: 10, MinimumTime: 5, RationalFactor: 1, ManningFactor: units.US.ManningFactor}
	again := grade.NewAgain(n, settings)
	for _, uplift := range []float64{1, 20, 0.3} { // 20 fills pipes
		flows, problems := sweep.Down(n, &storm, curve.Scaled(uplift), nil)
		if len(problems) > 0 {
			t.Fatal(problems[0].Text)
		}
		got, want := again.Up(&flows, grade.DesignTailwater), grade.Up(n, settings, &flows, grade.DesignTailwater)
		if !reflect.DeepEqual(got.Pipes, want.Pipes) || !reflect.DeepEqual(got.Structures, want.Structures) {
			t.Errorf("uplift %g: the lines differ", uplift)
		}
		if perRun := testing.AllocsPerRun(3, func() { again.Up(&flows, grade.DesignTailwater) }); perRun != 0 {
			t.Errorf("uplift %g: %g allocations a run", uplift, perRun)
		}
	}
}
