package review

import (
	"math"
	"math/rand/v2"
	"os"
	"slices"

	"gonum.org/v1/gonum/stat/distuv"

	"rimfall/hydrology"
	"rimfall/hydrology/rainfile"
	"rimfall/network"
)

// draw draws the inputs of a run into the network of a runner. What nature shares is drawn once a run: the rain, what
// is wrong with inlet times and with inflows as a whole, one number for every material and one for every
// surface. Beside it each pipe, area and inflow has a number of its own, since independent
// numbers alone would average out:
//
//	ln factor = spread · (√shared · z of all + √(1 − shared) · z of its own)
type draw struct {
	runner  *runner
	given   network.Network // pipes, areas and structures before any draw
	options *DoubtOptions
	rain    drawnRain
	minimum float64 // inlet time of areas that have none

	source               rand.PCG
	material             []int32 // of each pipe, numbered by their first pipes
	surface              []int32 // of each area
	ofMaterial, ofCover  []float64
	ofRain, time, inflow float64 // z of this run
	drawn                []float64
}

func newDraw(r *runner, o *DoubtOptions, rain drawnRain, storm *network.Storm) *draw {
	d := &draw{runner: r, given: *r.network, options: o, rain: rain, minimum: storm.MinimumTime}
	r.network.Pipes = slices.Clone(r.network.Pipes)
	d.given.Areas, d.given.Structures = slices.Clone(r.network.Areas), slices.Clone(r.network.Structures)
	materials, surfaces := map[string]int32{}, map[string]int32{}
	for i := range d.given.Pipes {
		d.material = append(d.material, numbered(materials, d.given.Pipes[i].Material))
	}
	for i := range d.given.Areas {
		d.surface = append(d.surface, numbered(surfaces, d.given.Areas[i].Surface))
	}
	d.ofMaterial, d.ofCover = make([]float64, len(materials)), make([]float64, len(surfaces))
	d.drawn = make([]float64, len(d.given.Pipes))
	return d
}

// numbered is the number of a name, the next one for a new name.
func numbered(names map[string]int32, name string) int32 {
	i, ok := names[name]
	if !ok {
		i = int32(len(names))
		names[name] = i
	}
	return i
}

// draw draws run number run of a seed. Every input takes its numbers whatever its spread, so that the
// others are the same with and without it.
func (d *draw) draw(seed uint64, run int) {
	d.source.Seed(seed, uint64(run))
	z := distuv.Normal{Sigma: 1, Src: &d.source}
	d.drawRain()
	d.time, d.inflow = z.Rand(), z.Rand()
	for i := range d.ofMaterial {
		d.ofMaterial[i] = z.Rand()
	}
	for i := range d.ofCover {
		d.ofCover[i] = z.Rand()
	}
	s, n := &d.options.Spreads, d.runner.network
	for i := range n.Pipes {
		factor := d.factor(s.N, d.ofMaterial[d.material[i]], z.Rand())
		n.Pipes[i].N = d.given.Pipes[i].N * factor
		d.drawn[i] = factor
	}
	for i := range n.Areas {
		given := &d.given.Areas[i]
		n.Areas[i].C = min(1, given.C*d.factor(s.C, d.ofCover[d.surface[i]], z.Rand()))
		n.Areas[i].Time = network.Some(given.Time.Or(d.minimum) * d.factor(s.Time, d.time, z.Rand()))
	}
	for i := range n.Structures {
		if flow := d.given.Structures[i].Inflow; flow > 0 {
			n.Structures[i].Inflow = flow * d.factor(s.Flow, d.inflow, z.Rand())
		}
	}
}

// factor is a lognormal factor of median 1, of which a part of the variance is shared.
func (d *draw) factor(spread, all, own float64) float64 {
	if spread == 0 {
		return 1
	}
	return math.Exp(spread * (math.Sqrt(d.options.Shared)*all + math.Sqrt(1-d.options.Shared)*own))
}

// drawRain draws the rain of the whole run. With bounds it stays within them: the draw is normal, cut off at the
// confidence that they have. A spread of 0 turns it off, with bounds as without.
func (d *draw) drawRain() {
	uniform := rand.New(&d.source).Float64()
	spread := d.options.Spreads.Rain
	d.rain.factor, d.rain.weight = 1, 0
	if d.rain.upper == nil {
		d.ofRain = distuv.UnitNormal.Quantile(openUnit(uniform))
		if spread > 0 {
			d.rain.factor = math.Exp(spread * d.ofRain)
		}
		return
	}
	tail := (1 - d.rain.confidence) / 2
	d.ofRain = distuv.UnitNormal.Quantile(tail + d.rain.confidence*uniform)
	if spread > 0 {
		d.rain.weight = d.ofRain / distuv.UnitNormal.Quantile(1-tail)
	}
}

// openUnit keeps a number of 0 to 1 off 0, which has no normal quantile.
func openUnit(u float64) float64 { return max(u, 0x1p-54) }

// rainBounds are the limits that a rainfall file gives for the storm of a job.
type rainBounds struct {
	upper, lower hydrology.Intensity
	confidence   float64 // 0: none
}

// bounds reads the rainfall file of a job for the limits of its confidence interval. There are none where the
// file has not both, or where the job takes one of them in place of the estimate.
func (s *Subject) bounds() rainBounds {
	rain, set := &s.Job.Rain, &s.Job.Settings
	content, err := os.ReadFile(rain.File)
	if err != nil || rain.Equation() || rain.Bound != rainfile.Estimate {
		return rainBounds{}
	}
	file, faults := rainfile.Read(content, rainfile.Options{Unit: hydrology.IntensityUnit(set.Units.Intensity)})
	if len(faults) > 0 || !(file.Confidence > 0) {
		return rainBounds{}
	}
	factor, _ := file.Unit.To(hydrology.IntensityUnit(set.Units.Intensity))
	between := func(b rainfile.Bound) (hydrology.Intensity, bool) {
		table, ok := file.Table(b)
		if !ok {
			return nil, false
		}
		curve, ok := table.CurveBetween(s.Storm.ReturnPeriod, rain.Series)
		if !ok {
			return nil, false
		}
		return curve.Scaled(factor * s.Storm.Uplift), true
	}
	upper, okUpper := between(rainfile.Upper)
	lower, okLower := between(rainfile.Lower)
	if !okUpper || !okLower {
		return rainBounds{}
	}
	return rainBounds{upper, lower, file.Confidence}
}

// drawnRainOf is a storm ready to be drawn.
func drawnRainOf(rain hydrology.Intensity, b rainBounds) drawnRain {
	r := drawnRain{estimate: rain, upper: b.upper, lower: b.lower, confidence: b.confidence, factor: 1}
	if c, ok := rain.(interface{ Durations() []float64 }); ok {
		r.corners = c.Durations()
	}
	return r
}
