package grade_test

import (
	"testing"

	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/pipeflow"
)

// At every structure the energy line of a pipe in falls to that of a pipe out by the sum of the named parts.
func TestEnergyAccountClosesAtEveryStructure(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		d := randomDrain(t)
		l := d.lines()
		for i := range d.Pipes {
			in := network.PipeIndex(i)
			outs := d.PipesOut(d.Pipes[i].To)
			if len(outs) == 0 {
				near(t, "exit at an outfall", sum(l.Account(in, -1)), l.Pipes[in].EGLLower-l.Structures[d.Pipes[i].To].Level, 1e-9)
			}
			for _, out := range outs {
				near(t, "account", sum(l.Account(in, out)), l.Pipes[in].EGLLower-l.Pipes[out].EGLUpper, 1e-9)
			}
		}
	})
}

func sum(losses []grade.Loss) float64 {
	total := 0.0
	for _, l := range losses {
		total += l.Value
	}
	return total
}

// The hydraulic line is never above the energy line, at the ends and between; water stands over the invert; a structure
// stands no lower than the energy of the pipe out that sets it, unless a coefficient is negative or momentum recovers.
func TestHydraulicLineIsNeverAboveTheEnergyLine(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		d := randomDrain(t)
		l := d.lines()
		for i := range l.Pipes {
			p := &l.Pipes[i]
			if !p.Known {
				t.Fatalf("pipe %d has no lines", i)
			}
			if p.HGLUpper > p.EGLUpper || p.HGLLower > p.EGLLower {
				t.Errorf("pipe %d: hydraulic line over the energy line", i)
			}
			for _, at := range l.Trace(network.PipeIndex(i), 7) {
				if at.HGL > at.EGL || at.Depth < 0 {
					t.Errorf("pipe %d at %g: depth %g, hydraulic line %g, energy line %g", i, at.Distance, at.Depth, at.HGL, at.EGL)
				}
			}
		}
		for i := range l.Structures {
			s := &l.Structures[i]
			if s.Out >= 0 && s.Parts.Junction == 0 && s.Level < l.Pipes[s.Out].EGLUpper-1e-9 {
				t.Errorf("structure %d stands under the energy of its pipe out", i)
			}
		}
	})
}

// The traced line begins and ends at the levels of the two ends, except at a jump that stands there.
func TestTraceMeetsTheEnds(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		d := randomDrain(t)
		l := d.lines()
		for i := range l.Pipes {
			p, points := &l.Pipes[i], l.Trace(network.PipeIndex(i), 5)
			first, last := points[0], points[len(points)-1]
			room := 1e-5 * d.Pipes[i].Section.Rise() // near critical depth the surface is nearly upright
			near(t, "lower end", first.HGL, p.HGLLower, room)
			near(t, "upper end", last.HGL, p.HGLUpper, room)
			for k := 1; k < len(points); k++ {
				if points[k].Distance < points[k-1].Distance {
					t.Errorf("pipe %d: the trace runs back at %g", i, points[k].Distance)
				}
			}
		}
	})
}

// Without losses at structures no level falls when the receiving water rises.
func TestLevelsRiseWithTheTailwaterWhereNothingIsLost(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		d := randomDrain(t)
		d.settings.Method = grade.NoLoss
		for i := range d.Structures {
			d.Structures[i].Loss = network.Maybe{}
		}
		for i := range d.Pipes {
			d.Pipes[i].Loss, d.Pipes[i].Bend = network.Maybe{}, 0
		}
		low := rapid.Float64Range(-3, 10).Draw(t, "low")
		high := low + rapid.Float64Range(0, 5).Draw(t, "more")
		d.Structures[0].Tailwater = network.Some(low)
		before := d.lines()
		d.Structures[0].Tailwater = network.Some(high)
		after := d.lines()
		for i := range before.Structures {
			// The surface is good to a few 1e-5 of the rise; 5 ft is the largest.
			if after.Structures[i].Level < before.Structures[i].Level-2e-4*5 {
				t.Errorf("tailwater %g to %g: level of structure %d falls from %.6f to %.6f", low, high, i, before.Structures[i].Level, after.Structures[i].Level)
			}
		}
	})
}

// Where all is full and the pipes out control, a rise of the receiving water lifts every level above it by as much, whatever
// the method.
func TestLevelsRiseWithTheTailwaterWhereAllIsFull(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		d := randomDrain(t)
		low, more := rapid.Float64Range(100, 200).Draw(t, "low"), rapid.Float64Range(0, 50).Draw(t, "more")
		outfalls := func(level float64) {
			for i := range d.Structures {
				if d.Structures[i].Kind == network.Outfall {
					d.Structures[i].Tailwater = network.Some(level)
				}
			}
		}
		outfalls(low)
		before := d.lines()
		outfalls(low + more)
		after := d.lines()
		for i := range before.Structures {
			near(t, "rise of the level", after.Structures[i].Level-before.Structures[i].Level, more, 1e-9)
		}
	})
}

// Far above the crowns everything is full, and the levels are sums in closed form: friction, exits, bends and coefficients on
// velocity heads.
func TestDrownedNetworkIsASumOfPressureFlow(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		d := randomDrain(t)
		d.settings.Method = grade.Coefficient
		coefficient := rapid.Float64Range(0.1, 2).Draw(t, "coefficient")
		for i := range d.Structures {
			d.Structures[i].Loss = network.Some(coefficient)
		}
		for i := range d.Pipes {
			d.Pipes[i].Loss = network.Maybe{}
		}
		const deep = 1000
		d.Structures[0].Tailwater = network.Some(deep)
		if last := len(d.Structures) - 1; d.Structures[last].Kind == network.Outfall {
			d.Structures[last].Tailwater = network.Some(deep)
		}
		l := d.lines()
		level := make([]float64, len(d.Structures)) // structure i+1 is the upper end of pipe i, and stands after its lower end
		for i := range level {
			level[i] = deep
		}
		for s := 1; s < len(d.Structures); s++ {
			if d.Structures[s].Kind == network.Outfall {
				continue
			}
			level[s] = 0
			for _, p := range d.PipesOut(network.StructureIndex(s)) {
				level[s] = max(level[s], d.pressureRise(p, level[d.Pipes[p].To], coefficient))
			}
			near(t, "level", l.Structures[s].Level, level[s], 1e-8)
		}
	})
}

// pressureRise is the level above a full pipe from the level below it.
func (d *drain) pressureRise(p network.PipeIndex, below, coefficient float64) float64 {
	pipe, flow := &d.Pipes[p], d.flow[p]
	barrels := float64(pipe.Count)
	full := pipe.Section.At(pipe.Section.Rise())
	velocity := flow / (full.Area * barrels)
	head := velocity * velocity / (2 * d.settings.Gravity)
	friction, _ := pipeflow.Manning{Factor: d.settings.Manning, N: pipe.N}.SlopeFor(pipe.Section, pipe.Section.Rise(), flow/barrels)
	energy := below // a pipe into a structure gives up its velocity head in it
	if d.Structures[pipe.To].Kind == network.Outfall {
		energy = below + head
	}
	return energy + friction*pipe.Length + 0.0033*pipe.Bend*head + coefficient*head
}

// The order of the rows changes nothing, but for ties: among pipes alike the first is the largest, so here none are alike.
func TestRowOrderChangesNoLevel(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		d := randomDrain(t)
		for i := range d.Pipes {
			d.flow[i] *= 1 + float64(i)/1000
			d.Pipes[i].Angle = network.Some(d.Pipes[i].Angle.Or(30) + float64(i)/1000)
		}
		before := d.lines()
		shuffled := newDrain(d.units)
		shuffled.settings, shuffled.Structures = d.settings, d.Structures
		for _, i := range rapid.Permutation(indexes(len(d.Pipes))).Draw(t, "order") {
			shuffled.pipe(d.Pipes[i], d.flow[i])
		}
		after := shuffled.lines()
		for i := range before.Structures {
			near(t, "level", after.Structures[i].Level, before.Structures[i].Level, 1e-12*(1+abs(before.Structures[i].Level)))
		}
	})
}

func indexes(n int) []int {
	all := make([]int, n)
	for i := range all {
		all[i] = i
	}
	return all
}
