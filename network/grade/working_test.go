package grade_test

import (
	"math"
	"testing"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/networktest"
	"rimfall/network/sweep"
	"rimfall/network/units"

	"rimfall/hydrology"
)

// What a structure's level was made of makes that level: with every method, in an invented tree.
func TestTheWorkingOfAStructureMakesItsLevel(t *testing.T) {
	n := networktest.New(networktest.Tree, 60)
	table, err := hydrology.NewTable([]float64{5, 1440}, []float64{10}, [][]float64{{9}, {0.4}})
	if err != nil {
		t.Fatal(err)
	}
	rain, _ := table.Curve(10)
	storm := network.Storm{ReturnPeriod: 10, MinimumTime: 5, Uplift: 1, RationalFactor: 1, ManningFactor: units.US.ManningFactor}
	flows, _ := sweep.Down(n, &storm, rain, nil)
	for method := range grade.Methods {
		s := grade.Settings{Method: grade.Method(method), Gravity: units.US.Gravity, Manning: units.US.ManningFactor}
		l := grade.Up(n, s, &flows, grade.DesignTailwater)
		seen := 0
		for i := range n.Structures {
			w, ok := l.Working(network.StructureIndex(i))
			if !ok || w.By == grade.ByOutfall {
				continue
			}
			seen++
			entry := w.Entry - w.Energy
			losses := map[grade.By]float64{
				grade.ByAccessHole:  max(0, entry+(w.Benching+w.Angle+w.Plunging)*entry),
				grade.ByCoefficient: w.K * w.Head,
			}
			level := l.Pipes[w.Out].EGLUpper + losses[w.By]
			if math.Abs(level-l.Structures[i].Level) > 1e-9 {
				t.Errorf("%s, structure %s: %.6f by its working, %.6f", grade.Method(method), n.Structures[i].ID, level, l.Structures[i].Level)
			}
		}
		if seen < 50 {
			t.Errorf("%s: only %d levels", grade.Method(method), seen)
		}
	}
}

func TestALevelThatIsNotKnownHasNoWorking(t *testing.T) {
	n := networktest.New(networktest.Chain, 2)
	for i := range n.Pipes {
		n.Pipes[i].InvertUpper, n.Pipes[i].InvertLower = network.Maybe{}, network.Maybe{}
	}
	flows := sweep.Flows{Pipes: make([]sweep.Pipe, len(n.Pipes)), Structures: make([]sweep.Structure, len(n.Structures))}
	l := grade.Up(n, grade.Settings{Gravity: units.US.Gravity, Manning: units.US.ManningFactor}, &flows, grade.DesignTailwater)
	if w, ok := l.Working(0); ok {
		t.Errorf("a working of a level that is not known: %+v", w)
	}
}
