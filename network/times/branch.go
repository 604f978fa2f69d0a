package times

import (
	"rimfall/network"
	"rimfall/network/sweep"
)

// Branch says what sets the longest time at a structure: an area of its own, a
// pipe that enters, or the minimum time.
type Branch struct {
	Time float64           // longest time, min
	Area network.AreaIndex // −1 where it is none
	Pipe network.PipeIndex // −1 where it is none
	From network.AreaIndex // area at the head of the branch; −1: the minimum time at the structure Head
	Head network.StructureIndex
}

// none stands for no area and no pipe.
const none = -1

// Branches finds the longest time at every structure and the branch that it comes
// along, whichever kind of peak the flows have. Areas without runoff set no time.
// Of equal times the area is named before the pipe, and what comes first in its
// file before what comes later.
func Branches(n *network.Network, flows *sweep.Flows, minimum, frequency float64) []Branch {
	all := make([]Branch, len(n.Structures))
	order, _ := n.Order()
	for _, s := range order {
		b := Branch{Time: minimum, Area: none, Pipe: none, From: none, Head: s}
		for _, a := range n.AreasAt(s) {
			area := &n.Areas[a]
			if t := area.Time.Or(0); sweep.Coefficient(area.C, frequency) > 0 && (t > b.Time || t == b.Time && b.Area == none) {
				b = Branch{Time: t, Area: a, Pipe: none, From: a, Head: s}
			}
		}
		for _, p := range n.PipesIn(s) {
			in, above := &flows.Pipes[p], &all[n.Pipes[p].From]
			if t := above.Time + in.TravelTime; in.Rained() && t > b.Time {
				b = Branch{Time: t, Area: none, Pipe: p, From: above.From, Head: above.Head}
			}
		}
		all[s] = b
	}
	return all
}
