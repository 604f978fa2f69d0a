package grade

import (
	"math"

	"rimfall/network"
)

// junction is the loss of a blind junction of a trunk and one lateral, all three pipes full, by momentum (HEC-22 3rd ed.
// section 7.1.6.5, eq. 7-10, from memory):
//
//	Hj = (Qo Vo - Qi Vi - Ql Vl cos Δl) / (0.5 g (Ao + Ai)) + hi - ho      Ql = Qo - Qi
//
// i is the trunk, the straighter of the two pipes in (of two alike the one with more flow); flows and areas are of all
// barrels. The level is then the energy of the trunk. There is none for any other structure, nor where a pipe is not full.
func (l *Lines) junction(s network.StructureIndex, out network.PipeIndex) (loss float64, ok bool) {
	n, in := l.network, l.network.PipesIn(s)
	if n.Structures[s].Kind != network.BlindJunction || len(in) != 2 || len(n.PipesOut(s)) != 1 || !l.Pipes[out].full {
		return 0, false
	}
	trunk, lateral, deflection := l.trunk(in[0], in[1], out)
	o, i := l.stream(out, l.flows.Pipes[out].Flow), l.stream(trunk, l.flows.Pipes[trunk].Flow)
	j := l.stream(lateral, max(0, o.flow-i.flow))
	momentum := o.flow*o.velocity - i.flow*i.velocity - j.flow*j.velocity*math.Cos(deflection*math.Pi/180)
	loss = momentum/(0.5*l.settings.Gravity*(o.area+i.area)) + i.head - o.head
	level := l.Pipes[out].EGLUpper + loss
	return loss, l.fills(trunk, level) && l.fills(lateral, level)
}

// trunk tells of two pipes into a junction which is the straighter, and the deflection of the other.
func (l *Lines) trunk(a, b, out network.PipeIndex) (trunk, lateral network.PipeIndex, deflection float64) {
	turnA, _ := l.turn(a, out)
	turnB, _ := l.turn(b, out)
	if turnB < turnA || turnB == turnA && l.flows.Pipes[b].Flow > l.flows.Pipes[a].Flow {
		return b, a, turnA
	}
	return a, b, turnB
}

// stream is a flow with the whole area of a pipe.
type stream struct{ flow, area, velocity, head float64 }

func (l *Lines) stream(p network.PipeIndex, flow float64) stream {
	area := l.network.Pipes[p].FullArea()
	velocity := flow / area
	return stream{flow, area, velocity, velocity * velocity / (2 * l.settings.Gravity)}
}

// fills tells whether a pipe runs full at its lower end when its energy there is at a level.
func (l *Lines) fills(p network.PipeIndex, level float64) bool {
	pipe := &l.network.Pipes[p]
	head := l.stream(p, l.flows.Pipes[p].Flow).head
	return pipe.InvertLower.OK && level-head >= pipe.InvertLower.V+pipe.Section.Rise()
}
