package grade

import "rimfall/network"

// The approximate method: a coefficient on the velocity head of the pipe out by the turn of the flow, HEC-22 3rd ed. 2009
// section 7.1.6.6, table 7-5 (from memory).

// turnLoss is a coefficient at a deflection, degrees.
type turnLoss struct{ deflection, coefficient float64 }

var (
	inletLosses   = []turnLoss{{0, 0.50}, {22.5, 0.70}, {45, 1.10}, {60, 1.25}, {90, 1.50}}
	manholeLosses = []turnLoss{{0, 0.15}, {22.5, 0.45}, {45, 0.75}, {60, 0.85}, {90, 1.00}}
)

// coefficient is Kah of a structure: by the deflection of the pipe in with the largest flow that does not plunge; that of a
// straight run where there is none.
func (l *Lines) coefficient(s network.StructureIndex, m *mouth) float64 {
	losses := manholeLosses
	if l.network.Structures[s].Kind == network.Inlet {
		losses = inletLosses
	}
	main := l.mainIn(s, m)
	if main == none {
		return losses[0].coefficient
	}
	deflection, _ := l.turn(main, m.pipe)
	return between(losses, deflection)
}

// between takes a coefficient from a table, straight between its rows and level beyond them.
func between(table []turnLoss, deflection float64) float64 {
	for i := 1; i < len(table); i++ {
		a, b := table[i-1], table[i]
		if deflection <= b.deflection {
			share := max(0, (deflection-a.deflection)/(b.deflection-a.deflection))
			return a.coefficient + share*(b.coefficient-a.coefficient)
		}
	}
	return table[len(table)-1].coefficient
}
