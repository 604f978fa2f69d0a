package grade

import "rimfall/network"

// Working is what the level of a structure was made of, for those who write it out. What a
// method does not use is 0.
type Working struct {
	By        By
	Out       network.PipeIndex // the pipe out that sets the level
	Flow      float64           // in it, of all barrels
	Energy    float64           // Ei, just inside it, over its invert
	Head      float64           // Vo²/2g there
	Full      bool              // it is full at its upper end
	K         float64           // coefficient on that head, by the turn or as given
	Main      network.PipeIndex // the pipe in by whose turn it was taken; -1 where the structure is a head
	Intensity float64           // DI of one barrel
	Entry     float64           // Eai
	Benching  float64           // CB
	Angle     float64           // Cθ
	Plunging  float64           // CP
	Inflows   []Inflow
	Own       float64 // flow that enters at the inlet itself and falls from its rim
	OwnHeight float64 // hk of it

	Trunk, Lateral network.PipeIndex // of a blind junction; -1 elsewhere
	Deflection     float64           // of the lateral
}

// By says how the loss of a structure came about.
type By int8

// The ways.
const (
	ByNothing     By = iota // the level is the energy of the pipe out, or still water
	ByAccessHole            // the FHWA access-hole method
	ByCoefficient           // a coefficient by the turn of the flow
	ByGivenLoss             // the structure's own coefficient
	ByMomentum              // momentum at a blind junction
	ByOutfall               // the receiving water, or the water in the end of a pipe
)

// Inflow is a pipe in, as the access-hole method counts it.
type Inflow struct {
	Pipe       network.PipeIndex
	Flow       float64
	Deflection float64 // degrees from straight on
	Plunges    bool
	Height     float64 // hk of a pipe that plunges
	Share      float64 // of a plunging flow that counts
}

// Working tells what the level of a structure was made of. ok is false where the level is
// not known.
func (l *Lines) Working(s network.StructureIndex) (w Working, ok bool) {
	at, given := &l.Structures[s], &l.network.Structures[s]
	w = Working{Out: at.Out, Main: none, Trunk: none, Lateral: none}
	if !at.Known {
		return w, false
	}
	if at.Out == none {
		w.By = ByOutfall
		return w, true
	}
	w.Flow = l.flows.Pipes[at.Out].Flow
	if w.Flow <= 0 {
		return w, true
	}
	m := l.mouth(at.Out)
	w.Energy, w.Head, w.Full = m.energy, m.head, l.Pipes[at.Out].full
	_, junction := l.junction(s, at.Out)
	switch {
	case given.Loss.OK:
		w.By, w.K = ByGivenLoss, given.Loss.V
	case l.settings.Method == NoLoss:
	case junction:
		w.By = ByMomentum
		in := l.network.PipesIn(s)
		w.Trunk, w.Lateral, w.Deflection = l.trunk(in[0], in[1], at.Out)
	case l.settings.Method == Coefficient:
		w.By, w.K = ByCoefficient, l.coefficient(s, &m)
		w.Main = l.mainIn(s, &m)
	default:
		w.By = ByAccessHole
		l.holeWorking(s, &m, &w)
	}
	return w, true
}

// holeWorking fills in the numbers of the access-hole method.
func (l *Lines) holeWorking(s network.StructureIndex, m *mouth, w *Working) {
	pipe, given := &l.network.Pipes[m.pipe], &l.network.Structures[s]
	barrels := float64(pipe.Count)
	w.Intensity = dischargeIntensity(m.flow/barrels, pipe.FullArea()/barrels, m.rise, l.settings.Gravity)
	w.Entry = m.entry
	w.Benching = benchingCoefficient(given.Benching, m.entry/m.rise)
	w.Angle, w.Plunging = l.turning(s, m)
	total := l.inflow(s)
	for _, in := range l.network.PipesIn(s) {
		flow := l.flows.Pipes[in].Flow
		if flow <= 0 {
			continue
		}
		i := Inflow{Pipe: in, Flow: flow, Plunges: l.plunges(in, m)}
		i.Deflection, _ = l.turn(in, m.pipe)
		if i.Plunges {
			i.Height, i.Share = m.plungeHeight(l.network.Pipes[in].InvertLower.V), min(1, m.flow/total)
		}
		w.Inflows = append(w.Inflows, i)
	}
	if given.Kind == network.Inlet && given.Rim.OK {
		w.Own = max(0, m.flow-total)
		w.OwnHeight = m.plungeHeight(given.Rim.V)
	}
}

// mainIn is the pipe in with the largest flow that does not plunge; none where there is none.
func (l *Lines) mainIn(s network.StructureIndex, m *mouth) network.PipeIndex {
	main, most := none, 0.0
	for _, in := range l.network.PipesIn(s) {
		if flow := l.flows.Pipes[in].Flow; flow > most && !l.plunges(in, m) {
			main, most = in, flow
		}
	}
	return main
}

// Counted is the part of the velocity head of a pipe in that makes up the level of a
// structure with its depth: 0.6 with access holes, all of it elsewhere.
func (s *Structure) Counted() float64 { return s.counted }

// BenchingCoefficients are CB of a form, submerged and unsubmerged.
func BenchingCoefficients(form network.Benching) (submerged, unsubmerged float64) {
	return benching[form].submerged, benching[form].unsubmerged
}
