package drawing

import (
	"fmt"

	"rimfall/network"
)

// assumedNote names the pipes of which something is assumed; nothing where all is known.
func assumedNote(n *network.Network) []string {
	var ids []string
	for i := range n.Pipes {
		if p := &n.Pipes[i]; p.AssumedUpper || p.AssumedLower || p.AssumedN {
			ids = append(ids, p.ID)
		}
	}
	if len(ids) == 0 {
		return nil
	}
	return []string{fmt.Sprintf("Assumed, not surveyed: inverts or n of %d pipes: %s; the list of findings says from what.", len(ids), shortList(ids, 12))}
}
