package review

import (
	"fmt"
	"math"
	"os"
	"path/filepath"
	"reflect"
	"slices"
	"strings"
	"testing"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/networktest"
)

func findDoubt(t testing.TB, s *Subject, o DoubtOptions) *Doubt {
	t.Helper()
	d, err := s.FindDoubt(o)
	if err != nil {
		t.Fatal(err)
	}
	return d
}

func usually(runs int) DoubtOptions {
	return DoubtOptions{Runs: runs, Seed: 1, Spreads: UsualSpreads, Shared: UsualShared}
}

func TestDoubtWithoutSpreadIsCheck(t *testing.T) {
	for _, peak := range []network.Peak{network.LongestTime, network.PartialArea} {
		s := read(t, millStreet)
		s.Job.Settings.Storm.Peak, s.Storm.Peak = peak, peak
		d := findDoubt(t, s, DoubtOptions{Runs: 50, Seed: 3, Shared: UsualShared})
		r, err := analysis.Run(s.Job, analysis.Options{})
		if err != nil {
			t.Fatal(err)
		}
		broken := map[string]float64{}
		for _, f := range r.Findings {
			broken[f.Rule.Name+" "+f.Subject] = 1
		}
		for i, p := range s.Network.Pipes {
			run, got := &r.Design.Flows.Pipes[i], &d.Pipes[i]
			ratio := run.Depth / p.Section.Rise()
			if got.DepthRatio != (Quantiles{ratio, ratio, ratio, true}) {
				t.Errorf("pipe %s: %+v, check has %g", p.ID, got.DepthRatio, ratio)
			}
			if want := (network.Maybe{V: broken["capacity "+p.ID], OK: run.HasCapacity}); got.OverCapacity != want {
				t.Errorf("pipe %s: chance over capacity %+v, check says %+v", p.ID, got.OverCapacity, want)
			}
			if want := network.Some(broken["surcharge "+p.ID]); got.Surcharge != want {
				t.Errorf("pipe %s: chance of surcharge %+v, check says %+v", p.ID, got.Surcharge, want)
			}
			if most, ok := got.Matters.Most(); ok {
				t.Errorf("pipe %s: %s matters, though nothing changes", p.ID, most)
			}
		}
		for i, at := range s.Network.Structures {
			level, got := r.Design.Lines.Structures[i].Level, &d.Structures[i]
			if got.Level != (Quantiles{level, level, level, true}) {
				t.Errorf("structure %s: %+v, check has %g", at.ID, got.Level, level)
			}
			judged := at.Rim.OK && at.Kind != network.Outfall
			if want := (network.Maybe{V: broken["flooding "+at.ID], OK: judged}); got.Flooding != want {
				t.Errorf("structure %s: chance of flooding %+v, check says %+v", at.ID, got.Flooding, want)
			}
			if want := (network.Maybe{V: broken["freeboard "+at.ID], OK: judged}); got.Freeboard != want {
				t.Errorf("structure %s: chance of lacking freeboard %+v, check says %+v", at.ID, got.Freeboard, want)
			}
		}
	}
}

func TestDoubtIsTheSameForASeedWhateverTheThreads(t *testing.T) {
	s := read(t, millStreet)
	answer := func(threads int, seed uint64) *Doubt {
		o := usually(200)
		o.Threads, o.Seed = threads, seed
		d := findDoubt(t, s, o)
		d.Options = DoubtOptions{}
		return d
	}
	one := answer(1, 1)
	for _, threads := range []int{1, 2, 5} {
		if !reflect.DeepEqual(answer(threads, 1), one) {
			t.Errorf("%d threads give another answer than one", threads)
		}
	}
	if reflect.DeepEqual(answer(1, 2), one) {
		t.Error("two seeds give the same answer")
	}
}

// A run can be made again by itself, from its number and the seed.
func TestARunDoesNotDependOnThoseBeforeIt(t *testing.T) {
	d := millDraw(t, usually(1))
	d.draw(9, 17)
	first, rain := slices.Clone(d.runner.network.Pipes), d.rain.factor
	for run := range 5 {
		d.draw(9, run)
	}
	d.draw(9, 17)
	if !reflect.DeepEqual(first, d.runner.network.Pipes) || rain != d.rain.factor {
		t.Error("run 17 differs when it is drawn again")
	}
}

func millDraw(t testing.TB, o DoubtOptions) *draw {
	t.Helper()
	s := read(t, millStreet)
	rain, err := s.rain(s.Storm.ReturnPeriod)
	if err != nil {
		t.Fatal(err)
	}
	return newDraw(newRunner(s.Network, s.settings, s.Storm.Peak), &o, drawnRainOf(rain, rainBounds{}), &s.Storm)
}

// moments are the mean and the standard deviation of numbers.
func moments(all []float64) (mean, deviation float64) {
	for _, v := range all {
		mean += v / float64(len(all))
	}
	for _, v := range all {
		deviation += (v - mean) * (v - mean) / float64(len(all)-1)
	}
	return mean, math.Sqrt(deviation)
}

// What is drawn has the stated distribution: ln of the factor has the mean 0 and the spread as its deviation, and two
// pipes of one material have the shared part of the variance in common, two of different ones nothing. Of 20,000 draws a
// mean is known to spread/√20,000 = 0.7 % of the spread, a deviation to half a percent of itself, a correlation
// of 0.7 to 0.004 and one of 0 to 0.007; the tolerances are four times these. The seed is fixed.
func TestDrawsHaveTheStatedSpreadAndShareTheStatedPart(t *testing.T) {
	const runs, spread, shared = 20_000, 0.2, 0.7
	o := DoubtOptions{Seed: 5, Shared: shared, Spreads: Spreads{N: spread, Rain: 0.1, Time: 0.3}}
	d := millDraw(t, o)
	n := d.runner.network
	concrete, same, clay := pipeIndex(t, n, "T1"), pipeIndex(t, n, "A1"), pipeIndex(t, n, "T4")
	var a, b, c, rain, time []float64
	for run := range runs {
		d.draw(o.Seed, run)
		a, b, c = append(a, math.Log(d.drawn[concrete])), append(b, math.Log(d.drawn[same])), append(c, math.Log(d.drawn[clay]))
		rain = append(rain, math.Log(d.rain.factor))
		time = append(time, math.Log(n.Areas[0].Time.V/d.given.Areas[0].Time.V))
	}
	for name, drawn := range map[string]struct {
		values []float64
		spread float64
	}{"n": {a, spread}, "n of another material": {c, spread}, "rain": {rain, 0.1}, "inlet time": {time, 0.3}} {
		if mean, deviation := moments(drawn.values); math.Abs(mean) > 0.028*drawn.spread || math.Abs(deviation/drawn.spread-1) > 0.02 {
			t.Errorf("%s: mean %g, deviation %g, want 0 and %g", name, mean, deviation, drawn.spread)
		}
	}
	if r := pearson(a, b); math.Abs(r-shared) > 0.016 {
		t.Errorf("two concrete pipes have a correlation of %g, want %g", r, shared)
	}
	if r := pearson(a, c); math.Abs(r) > 0.028 {
		t.Errorf("concrete and clay have a correlation of %g, want none", r)
	}
}

func pearson(a, b []float64) float64 {
	ma, sa := moments(a)
	mb, sb := moments(b)
	sum := 0.0
	for i := range a {
		sum += (a[i] - ma) * (b[i] - mb) / float64(len(a)-1)
	}
	return sum / (sa * sb)
}

// Capacity goes with 1/n. With nothing but n drawn, D1, a head with one area, is over its capacity where e^(spread·z) is
// over capacity/Q, whose chance is 1 − Φ(ln(capacity/Q)/spread). 4000 runs know a chance of a quarter to a deviation of
// 0.007; the tolerance is four of these.
func TestTheChanceOfALonePipeIsTheNormalIntegral(t *testing.T) {
	s := read(t, millStreet)
	d1 := pipeIndex(t, s.Network, "D1")
	r, err := analysis.Run(s.Job, analysis.Options{})
	if err != nil {
		t.Fatal(err)
	}
	run := &r.Design.Flows.Pipes[d1]
	const spread = 0.9 // D1 is far under its capacity
	d := findDoubt(t, s, DoubtOptions{Runs: 4000, Seed: 11, Shared: 1, Spreads: Spreads{N: spread}})
	want := 0.5 * math.Erfc(math.Log(run.Capacity/run.Flow)/spread/math.Sqrt2)
	if got := d.Pipes[d1].OverCapacity.V; math.Abs(got-want) > 0.03 {
		t.Errorf("chance %g, want %g", got, want)
	}
	if most, ok := d.Pipes[d1].Matters.Most(); !ok || most != NInput || math.Abs(d.Pipes[d1].Matters[NInput].V-1) > 1e-6 {
		t.Errorf("what matters: %+v", d.Pipes[d1].Matters)
	}
}

// Rain drawn within a file's own bounds never leaves them, and comes close to both.
func TestRainStaysWithinTheBoundsOfItsFile(t *testing.T) {
	s := read(t, boundedMillStreet(t))
	bounds := s.bounds()
	if bounds.confidence != 0.9 {
		t.Fatalf("bounds %+v; the file has those of 90 %%", bounds)
	}
	rain, err := s.rain(s.Storm.ReturnPeriod)
	if err != nil {
		t.Fatal(err)
	}
	o := usually(1)
	d := newDraw(newRunner(s.Network, s.settings, s.Storm.Peak), &o, drawnRainOf(rain, bounds), &s.Storm)
	least, most := math.Inf(1), 0.0
	for run := range 2000 {
		d.draw(1, run)
		for _, minutes := range []float64{5, 12, 47, 600} {
			i, _ := d.rain.At(minutes)
			low, _ := bounds.lower.At(minutes)
			high, _ := bounds.upper.At(minutes)
			if i < low*(1-1e-12) || i > high*(1+1e-12) {
				t.Fatalf("run %d: %g in/h at %g min, bounds %g and %g", run, i, minutes, low, high)
			}
			part := (i - low) / (high - low)
			least, most = min(least, part), max(most, part)
		}
		if _, where := d.rain.At(1e9); where != hydrology.Beyond {
			t.Fatal("a drawn storm is known for ever")
		}
	}
	if least > 0.01 || most < 0.99 {
		t.Errorf("the draws cover %g to %g of the way between the bounds", least, most)
	}
	if found := findDoubt(t, s, usually(100)); !found.Bounds || found.Confidence != 0.9 {
		t.Errorf("bounds %t of %g", found.Bounds, found.Confidence)
	}
}

// boundedMillStreet is Mill Street under a real rainfall file with three tables, those of Ann Arbor.
func boundedMillStreet(t *testing.T) string {
	t.Helper()
	dir := t.TempDir()
	if err := os.CopyFS(dir, os.DirFS(millStreet)); err != nil {
		t.Fatal(err)
	}
	content, err := os.ReadFile(filepath.Join("..", "..", "testdata", "rainfall", "ann-arbor-mi_all-bounds_depth_english_pds.csv"))
	if err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(filepath.Join(dir, "rainfall.csv"), content, 0o644); err != nil {
		t.Fatal(err)
	}
	return dir
}

func TestMoreRunsThanMemoryHoldsAreRefused(t *testing.T) {
	s := read(t, millStreet)
	if _, err := s.FindDoubt(usually(3_000_000)); err == nil || !strings.Contains(err.Error(), "take at most 2666666 runs") {
		t.Errorf("%v", err)
	}
}

func TestARunAllocatesNothing(t *testing.T) {
	o := usually(8)
	d := millDraw(t, o)
	s := read(t, millStreet)
	kept := newSample(s.Network, o.Runs)
	run := 0
	once := func() {
		d.draw(1, run)
		flows, problems := d.runner.sweep.Down(&s.Storm, &d.rain)
		if len(problems) > 0 {
			t.Fatal(problems[0].Text)
		}
		r := state{d.runner.network, &s.Job.Settings.Criteria, flows, d.runner.grade.Up(flows, 0)}
		kept.keep(run%o.Runs, &r, d)
		run++
	}
	if perRun := testing.AllocsPerRun(6, once); perRun != 0 {
		t.Errorf("%g allocations a run", perRun)
	}
}

// BenchmarkDoubt is 2000 runs of an invented network of 1000 pipes with their grade lines.
func BenchmarkDoubt(b *testing.B) {
	for _, shape := range networktest.Shapes {
		for _, threads := range []int{1, 2} {
			b.Run(fmt.Sprintf("%s/1000/threads=%d", shape, threads), func(b *testing.B) {
				s := invented(b, shape, 1000)
				o := usually(2000)
				o.Threads = threads
				for b.Loop() {
					findDoubt(b, s, o)
				}
			})
		}
	}
}
