package analysis

import (
	"strings"
	"testing"

	"rimfall/network"
)

// Two branches meet: what is worked on first may not depend on which branch stands
// first in the file, since enlarging one changes what the other needs.
func TestStructuresAreWorkedFromTheOutfallUpWhateverTheOrderOfTheRows(t *testing.T) {
	for _, rows := range []string{"A B C D O", "D C B A O", "O D B C A", "B O A D C"} {
		n := &network.Network{}
		index := map[string]network.StructureIndex{}
		for i, id := range strings.Fields(rows) {
			n.Structures = append(n.Structures, network.Structure{ID: id})
			index[id] = network.StructureIndex(i)
		}
		for _, ends := range []string{"AC", "BC", "CO", "DO"} { // A and B meet at C; D goes to the outfall by itself
			n.Pipes = append(n.Pipes, network.Pipe{From: index[ends[:1]], To: index[ends[1:]]})
		}
		n.Connect()
		var got []string
		for _, s := range upstreamOrder(n) {
			got = append(got, n.Structures[s].ID)
		}
		if want := "O C D A B"; strings.Join(got, " ") != want {
			t.Errorf("rows %s: %v, want %s", rows, got, want)
		}
	}
}
