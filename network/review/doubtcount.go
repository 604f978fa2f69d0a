package review

import (
	"math"
	"sync/atomic"

	"rimfall/network"
)

// Input is one of the inputs that are drawn.
type Input int8

// The inputs.
const (
	RainInput Input = iota // the rain of the run
	NInput                 // n of the pipe, at a structure of its pipe out
	CInput                 // the sum of C times area upstream
	TimeInput              // what inlet times have in common
	FlowInput              // the sum of steady inflows upstream
	inputs
)

// Inputs lists the words for the inputs, in the order of the constants.
var Inputs = []string{"rain", "n", "c", "time", "flow"}

func (i Input) String() string { return Inputs[i] }

// Correlations are the rank correlations of a result with each input; none where either never changes.
type Correlations [inputs]network.Maybe

// Most is the input with the greatest correlation, either way; ok is false where there is none.
func (c *Correlations) Most() (most Input, ok bool) {
	for i := range c {
		if c[i].OK && (!ok || math.Abs(c[i].V) > math.Abs(c[most].V)) {
			most, ok = Input(i), true
		}
	}
	return most, ok
}

// sample is what all runs show, the runs of one place side by side. A place of the sample is written by one run alone.
type sample struct {
	network *network.Network
	runs    int

	ratio, load, level [][]float64 // by pipe, pipe and structure; a level that is not known is NaN
	n, ca, inflow      [][]float32 // by pipe
	rain, time         []float64
	out                []network.PipeIndex // of a structure; −1: none
	over, surcharge    []atomic.Int32
	flooding, lacking  []atomic.Int32
	falls, crown       []bool // the limits that are judged
	rim, freeboard     []bool
}

func newSample(n *network.Network, runs int) *sample {
	pipes, structures := len(n.Pipes), len(n.Structures)
	k := &sample{
		network: n, runs: runs, rain: make([]float64, runs), time: make([]float64, runs), out: make([]network.PipeIndex, structures),
		ratio: table[float64](pipes, runs), load: table[float64](pipes, runs), level: table[float64](structures, runs),
		n: table[float32](pipes, runs), ca: table[float32](pipes, runs), inflow: table[float32](pipes, runs),
		over: make([]atomic.Int32, pipes), surcharge: make([]atomic.Int32, pipes),
		flooding: make([]atomic.Int32, structures), lacking: make([]atomic.Int32, structures),
		falls: make([]bool, pipes), crown: make([]bool, pipes), rim: make([]bool, structures), freeboard: make([]bool, structures),
	}
	for i := range k.out {
		k.out[i] = -1
		if out := n.PipesOut(network.StructureIndex(i)); len(out) > 0 {
			k.out[i] = out[0]
		}
	}
	for i := range n.Pipes {
		p := &n.Pipes[i]
		_, k.falls[i] = p.Capacity(1)
	}
	return k
}

// table makes rows of one length in one piece of memory.
func table[V float32 | float64](rows, length int) [][]V {
	all, t := make([]V, rows*length), make([][]V, rows)
	for i := range t {
		t[i] = all[i*length : (i+1)*length]
	}
	return t
}

// keep keeps what one run shows.
func (k *sample) keep(run int, r *state, d *draw) {
	k.rain[run], k.time[run] = d.ofRain, d.time
	for i := range r.flows.Pipes {
		p, flows := network.PipeIndex(i), &r.flows.Pipes[i]
		k.ratio[i][run] = flows.Depth / r.network.Pipes[i].Section.Rise()
		k.n[i][run], k.ca[i][run], k.inflow[i][run] = float32(d.drawn[i]), float32(flows.CA), float32(flows.Inflow)
		if room, ok := r.capacityRoom(p); ok {
			k.load[i][run] = flows.Flow / flows.Capacity
			count(&k.over[i], room < 0)
		}
		if room, ok := r.crownRoom(p, true); ok {
			count(&k.surcharge[i], room < 0)
		}
	}
	for i := range r.lines.Structures {
		s := network.StructureIndex(i)
		k.level[i][run] = math.NaN()
		if at := &r.lines.Structures[i]; at.Known {
			k.level[i][run] = at.Level
		}
		if room, ok := r.rimRoom(s); ok {
			count(&k.flooding[i], room < 0)
		}
		if room, ok := r.freeboardRoom(s); ok {
			count(&k.lacking[i], room < 0)
		}
	}
	if run == 0 {
		k.judged(r)
	}
}

func count(in *atomic.Int32, is bool) {
	if is {
		in.Add(1)
	}
}

// judged notes which limits are judged at all; it is the same in every run.
func (k *sample) judged(r *state) {
	for i := range k.crown {
		_, k.crown[i] = r.crownRoom(network.PipeIndex(i), true)
	}
	for i := range k.rim {
		_, k.rim[i] = r.rimRoom(network.StructureIndex(i))
		_, k.freeboard[i] = r.freeboardRoom(network.StructureIndex(i))
	}
}

// statistics counts and ranks what was kept.
func (k *sample) statistics(threads int) ([]PipeDoubt, []StructureDoubt) {
	pipes, structures := make([]PipeDoubt, len(k.ratio)), make([]StructureDoubt, len(k.level))
	rain, time := ranks(k.rain), ranks(k.time)
	each(threads, len(pipes), func(_, i int) {
		pipes[i] = PipeDoubt{
			OverCapacity: k.chance(&k.over[i], k.falls[i]), Surcharge: k.chance(&k.surcharge[i], k.crown[i]),
			DepthRatio: quantiles(k.ratio[i]),
		}
		if k.falls[i] {
			pipes[i].Load = quantiles(k.load[i])
			pipes[i].Matters = k.matters(k.load[i], network.PipeIndex(i), rain, time)
		}
	})
	each(threads, len(structures), func(_, i int) {
		structures[i] = StructureDoubt{Flooding: k.chance(&k.flooding[i], k.rim[i]), Freeboard: k.chance(&k.lacking[i], k.freeboard[i])}
		if len(k.level[i]) > 0 && !math.IsNaN(k.level[i][0]) {
			structures[i].Level = quantiles(k.level[i])
			structures[i].Matters = k.matters(k.level[i], k.out[i], rain, time)
		}
	})
	return pipes, structures
}

func (k *sample) chance(in *atomic.Int32, judged bool) network.Maybe {
	return network.Maybe{V: float64(in.Load()) / float64(k.runs), OK: judged}
}

// matters are the rank correlations of a result; n, C and inflow are those of a pipe, −1 where there is none.
func (k *sample) matters(result []float64, p network.PipeIndex, rain, time []float64) Correlations {
	var c Correlations
	own := ranks(result)
	c[RainInput], c[TimeInput] = correlation(own, rain), correlation(own, time)
	if p >= 0 {
		c[NInput] = correlation(own, ranks(widened(k.n[p])))
		c[CInput] = correlation(own, ranks(widened(k.ca[p])))
		c[FlowInput] = correlation(own, ranks(widened(k.inflow[p])))
	}
	return c
}

func widened(all []float32) []float64 {
	wide := make([]float64, len(all))
	for i, v := range all {
		wide[i] = float64(v)
	}
	return wide
}
