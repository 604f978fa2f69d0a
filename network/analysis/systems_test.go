package analysis

import (
	"testing"

	"rimfall/network"
	"rimfall/network/networktest"
)

// A forest comes apart into its systems, every pipe and area in one of them, joined as before.
func TestSystemsOfAForest(t *testing.T) {
	n := networktest.New(networktest.Forest, 1000)
	parts := systems(n)
	pipes, structures, areas := 0, 0, 0
	for _, part := range parts {
		pipes, structures, areas = pipes+len(part.pipes), structures+len(part.structures), areas+len(part.network.Areas)
		if _, ok := part.network.Order(); !ok || len(part.network.Pipes) != len(part.pipes) {
			t.Fatal("a system is not a network of its own")
		}
		for i, whole := range part.pipes {
			own, given := &part.network.Pipes[i], &n.Pipes[whole]
			if own.ID != given.ID || part.structures[own.From] != given.From || part.structures[own.To] != given.To {
				t.Errorf("pipe %s joins other structures", given.ID)
			}
		}
		for i := range part.network.Areas {
			a := &part.network.Areas[i]
			if n.Structures[part.structures[a.Structure]].ID != part.network.Structures[a.Structure].ID {
				t.Errorf("area %s drains elsewhere", a.ID)
			}
		}
	}
	if len(parts) != 5 || pipes != len(n.Pipes) || structures != len(n.Structures) || areas != len(n.Areas) {
		t.Errorf("%d systems of %d pipes, %d structures, %d areas", len(parts), pipes, structures, areas)
	}
}

func TestAStructureThatNoPipeJoinsIsASystem(t *testing.T) {
	n := &network.Network{Structures: make([]network.Structure, 2)}
	n.Connect()
	if parts := systems(n); len(parts) != 2 || len(parts[1].structures) != 1 {
		t.Errorf("%d systems", len(parts))
	}
}
