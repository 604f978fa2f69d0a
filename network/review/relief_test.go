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

	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/job"
)

// The prices of this folder are those of a public estimate; its costs.csv names it.
const unitCosts = "../../testdata/review/unit-costs"

func findRelief(t testing.TB, s *Subject, o ReliefOptions) *Relief {
	t.Helper()
	r, err := s.FindRelief(o)
	if err != nil {
		t.Fatal(err)
	}
	return r
}

// allLimits are the sets of limits that are tried.
var allLimits = [][]LimitKind{nil, {Capacity}, {Freeboard, Rim}, {Capacity, Freeboard, Rim}, {Crown}}

// written writes the job with some of the work and reads it again, as its user does.
func written(t testing.TB, s *Subject, r *Relief, keep func(Alteration) bool) *Subject {
	t.Helper()
	part := *r
	part.Changes = nil
	for _, c := range r.Changes {
		if keep(c) {
			part.Changes = append(part.Changes, c)
		}
	}
	dir := filepath.Join(t.TempDir(), "relieved")
	if err := s.Job.WriteAmended(dir, (&ReliefReport{s, &part}).Amendments(), job.WriteOptions{}); err != nil {
		t.Fatal(err)
	}
	return read(t, dir)
}

// smaller lists the pipes that a check finds to be smaller than one that enters.
func smaller(t testing.TB, s *Subject) map[string]bool {
	t.Helper()
	r, err := analysis.Run(s.Job, analysis.Options{})
	if err != nil {
		t.Fatal(err)
	}
	found := map[string]bool{}
	for _, f := range r.Findings {
		if f.Rule.Name == "size-decrease" {
			found[f.Subject] = true
		}
	}
	return found
}

func TestACheckOfTheRelievedJobFindsNothingBroken(t *testing.T) {
	for _, limits := range allLimits {
		for _, works := range [][]Work{nil, {Replace}, {Double}} {
			t.Run(fmt.Sprintf("limits %v, works %v", limits, works), func(t *testing.T) {
				s := read(t, millStreet)
				r := findRelief(t, s, ReliefOptions{Limits: limits, Works: works, Runs: 300})
				if len(r.Broken) == 0 {
					t.Fatal("nothing is broken, so nothing is tried")
				}
				if !r.Complete() {
					t.Skipf("nothing found: %+v", r.Systems)
				}
				after := written(t, s, r, func(Alteration) bool { return true })
				if broken := brokenIn(t, after.Job, r.Options.Limits); len(broken) > 0 {
					t.Errorf("broken: %v", broken)
				}
				if now := fresh(smaller(t, after), smaller(t, s)); len(now) > 0 {
					t.Errorf("newly smaller than a pipe that enters: %v", now)
				}
			})
		}
	}
}

func TestLeavingOutAnyOneWorkBreaksALimitOrMakesASizeFall(t *testing.T) {
	for _, limits := range allLimits {
		for _, works := range [][]Work{nil, {Replace}} {
			s := read(t, millStreet)
			r := findRelief(t, s, ReliefOptions{Limits: limits, Works: works, Runs: 300})
			if !r.Complete() {
				continue
			}
			for _, left := range r.Changes {
				without := written(t, s, r, func(c Alteration) bool { return c.Pipe != left.Pipe })
				broken := brokenIn(t, without.Job, r.Options.Limits)
				if len(broken) == 0 && len(fresh(smaller(t, without), smaller(t, s))) == 0 {
					t.Errorf("limits %v, works %v: %s may be left as it is", limits, works, s.Network.Pipes[left.Pipe].ID)
				}
			}
		}
	}
}

// A survey of the same trunk, with semicolons, without a last line end, levels and materials blank.
func TestTheReliefOfASurveyWithUnknownLevelsHoldsToo(t *testing.T) {
	dir := t.TempDir()
	copied(t, dir, millStreet)
	file := filepath.Join(dir, "pipes.csv")
	text, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	blanked := strings.NewReplacer("24,clay,,102.50,101.20", "24,,,102.50,", "30,clay,,100.70,99.60", "30,,,,", "30,clay,,99.55,", "30,,,,", "12,clay,,108.60,107.30", "12,,,108.60,")
	survey := strings.ReplaceAll(strings.TrimSpace(blanked.Replace(string(text))), ",", ";")
	if err := os.WriteFile(file, []byte(survey), 0o644); err != nil {
		t.Fatal(err)
	}
	s := read(t, dir)
	if !levelsAssumed(s.Network) {
		t.Fatal("no level is assumed")
	}
	for _, works := range [][]Work{nil, {Replace}, {Double}} {
		r := findRelief(t, s, ReliefOptions{Limits: []LimitKind{Capacity, Freeboard, Rim}, Works: works, Runs: 300})
		after := written(t, s, r, func(Alteration) bool { return true })
		if broken := brokenIn(t, after.Job, r.Options.Limits); !r.Complete() || len(r.Changes) == 0 || len(broken) > 0 {
			t.Errorf("works %v: %d changes, broken: %v", works, len(r.Changes), broken)
		}
	}
}

// leastOfAll runs every plan of a system. In each that holds, every pipe costs what it is said to need, or more.
func leastOfAll(t *rapid.T, f *reliever) (least Price, found bool) {
	p, need := make(plan, len(f.choices)), f.needs()
	for {
		if v := f.judge(p); v.holds() {
			for i, c := range p {
				if f.choices[i][c].Price.less(need[i]) {
					t.Fatalf("a plan holds with %+v for pipe %d, which is said to need %+v", f.choices[i][c].Price, i, need[i])
				}
			}
			if price := f.price(p); !found || price.less(least) {
				least, found = price, true
			}
		}
		k := 0
		for k < len(p) {
			if p[k]++; int(p[k]) < len(f.choices[k]) {
				break
			}
			p[k] = 0
			k++
		}
		if k == len(p) {
			return least, found
		}
	}
}

// Every plan of small drawn systems, with splits, adverse pipes, tailwaters, is run: none is cheaper than what is said to be
// the least, and none under the bound that a search which was broken off names. Prices are lengths, or drawn costs.
func TestTheLeastIsTheLeastOfAllPlans(t *testing.T) {
	base := read(t, millStreet)
	tried := 0
	rapid.Check(t, func(t *rapid.T) {
		s := drawnTrunk(t, base)
		s.Job.Costs = nil
		for i := range s.Network.Areas { // so that more is broken
			s.Network.Areas[i].Area *= 2
		}
		if rapid.Bool().Draw(t, "costs") {
			for _, size := range []float64{12, 15, 18, 21, 24, 30, 36, 42, 48, 54, 60} {
				s.Job.Costs = append(s.Job.Costs, job.Cost{Shape: "circle", Size: network.Size{Span: size, Rise: size}, Cost: rapid.Float64Range(10, 300).Draw(t, "cost")})
			}
		}
		s.Job.Settings.Storm.Peak = rapid.SampledFrom([]network.Peak{network.LongestTime, network.PartialArea}).Draw(t, "peak")
		s.Storm.Peak = s.Job.Settings.Storm.Peak
		o := ReliefOptions{Limits: rapid.SampledFrom(allLimits).Draw(t, "limits"), Runs: 1 << 20}.filled()
		rain, err := s.rain(s.Storm.ReturnPeriod)
		if err != nil {
			t.Fatal(err)
		}
		part, count := parts(s.Network)
		for which := range count {
			system := partOf(s.Network, part, int32(which))
			if len(system.pipes) == 0 || len(system.pipes) > 6 {
				continue
			}
			f := s.newReliever(&o, rain, system)
			if len(f.asItIs.problems) > 0 || len(f.asItIs.broken) == 0 {
				continue
			}
			for i := range f.choices { // few, so that all can be run; near sizes and far ones
				f.choices[i] = thinned(f.choices[i], 4)
			}
			tried++
			least, found := leastOfAll(t, f)
			f.search()
			if !f.least || f.found != found || found && math.Abs(f.price(f.best).First-least.First) > 1e-9*least.First {
				t.Fatalf("found %v %+v, least %v; of all plans %v %+v", f.found, f.price(f.best), f.least, found, least)
			}
			short := o
			short.Runs = rapid.IntRange(1, 40).Draw(t, "runs")
			f.options, f.found, f.least, f.best, f.bound = &short, false, false, make(plan, len(f.choices)), Price{}
			f.search()
			if found && f.bound.First > least.First*(1+1e-9) {
				t.Fatalf("said to have nothing under %+v, but %+v holds", f.bound, least)
			}
		}
	})
	t.Logf("%d systems", tried)
	if tried == 0 {
		t.Error("no system was tried")
	}
}

// thinned keeps the first of a list and some others, evenly spread.
func thinned(all []Choice, keep int) []Choice {
	if len(all) <= keep {
		return all
	}
	var some []Choice
	for k := range keep {
		some = append(some, all[k*(len(all)-1)/(keep-1)])
	}
	return some
}

func TestReliefDoesNotDependOnTheNumberOfThreads(t *testing.T) {
	s := read(t, millStreet)
	one, three := findRelief(t, s, ReliefOptions{Threads: 1, Runs: 500}), findRelief(t, s, ReliefOptions{Threads: 3, Runs: 500})
	one.Options.Threads, three.Options.Threads = 0, 0
	if !reflect.DeepEqual(one, three) {
		t.Errorf("one thread finds %+v\nthree find %+v", one, three)
	}
}

// By hand: round pipes of one n on one slope flow full as D^(8/3) (Manning's equation with A ~ D², R ~ D), so beside 24 in
// the shares of 12, 18 and 24 in are 1/(1 + 2^(8/3)), 1/(1 + (4/3)^(8/3)) and one half.
func TestASecondPipeTakesItsShareByConveyance(t *testing.T) {
	s := read(t, millStreet)
	p := &s.Network.Pipes[pipeIndex(t, s.Network, "T3")] // 24 in
	for inches, want := range map[float64]float64{12: 1 / (1 + math.Pow(2, 8.0/3)), 18: 1 / (1 + math.Pow(4.0/3, 8.0/3)), 24: 0.5} {
		for _, c := range analysis.Candidates(s.Job)("circle", "concrete") {
			if c.Size.Rise != inches {
				continue
			}
			if got := conveyanceShare(p, &Choice{Work: Double, Candidate: c}); math.Abs(got-want) > 1e-12 {
				t.Errorf("%g in beside 24 in takes %g, want %g", inches, got, want)
			}
		}
	}
}

// By hand from the unit costs of the estimate that costs.csv names: 310 ft of 30 in pipe at 91.75 $/ft and the removal of what
// lies at 16.00 $/ft are 33,402.50 $; 310 ft of 15 in pipe beside it at 39.25 $/ft are 12,167.50 $. 18 in is not listed.
func TestPricesAreThoseOfAPublicEstimate(t *testing.T) {
	s := priced(t)
	n := s.Network
	p := &n.Pipes[pipeIndex(t, n, "T3")]
	o := ReliefOptions{}.filled()
	var got []string
	for _, c := range s.choicesFor(n, p, &o, analysis.Candidates(s.Job)(p.Shape, p.Material)) {
		if c.Work != Keep && c.Size.Rise <= 30 {
			got = append(got, fmt.Sprintf("%s %g %.2f", c.Work, c.Size.Rise, c.Price.First))
		}
	}
	want := []string{"double 15 12167.50", "double 24 22165.00", "double 27 25110.00", "double 30 28442.50", "replace 27 30070.00", "replace 30 33402.50"}
	if !slices.Equal(got, want) {
		t.Errorf("%q\nwant %q", got, want)
	}
}

// priced is the job of Mill Street with the unit costs.
func priced(t testing.TB) *Subject {
	t.Helper()
	dir := t.TempDir()
	copied(t, dir, millStreet)
	copied(t, dir, unitCosts)
	return read(t, dir)
}

// copied copies the files of a folder.
func copied(t testing.TB, dir, folder string) {
	t.Helper()
	entries, err := os.ReadDir(folder)
	if err != nil {
		t.Fatal(err)
	}
	for _, e := range entries {
		text, err := os.ReadFile(filepath.Join(folder, e.Name()))
		if err == nil {
			err = os.WriteFile(filepath.Join(dir, e.Name()), text, 0o644)
		}
		if err != nil {
			t.Fatal(err)
		}
	}
}

func TestWhereRemovalIsDearPipesAreDoubled(t *testing.T) {
	s := priced(t)
	for i := range s.Job.Costs {
		if c := &s.Job.Costs[i]; c.Removal {
			c.Cost = 1000
		}
	}
	for _, c := range findRelief(t, s, ReliefOptions{Limits: []LimitKind{Capacity}}).Changes {
		if c.Choice.Work != Double {
			t.Errorf("pipe %s is to be %sd", s.Network.Pipes[c.Pipe].ID, c.Choice.Work)
		}
	}
}

func TestWhereNoListedSizeHelpsNothingIsClaimed(t *testing.T) {
	s := read(t, millStreet)
	for i := range s.Network.Structures {
		if at := &s.Network.Structures[i]; at.Kind == network.Outfall {
			at.Tailwater = network.Some(200) // over every rim
		}
	}
	r := findRelief(t, s, ReliefOptions{Runs: 50})
	if r.Complete() || len(r.Changes) > 0 || len(r.Systems[0].Left) == 0 {
		t.Errorf("%+v", r)
	}
}

// BenchmarkRelief searches an invented trunk for all limits.
func BenchmarkRelief(b *testing.B) {
	s := read(b, millStreet)
	for b.Loop() {
		findRelief(b, s, ReliefOptions{})
	}
}
