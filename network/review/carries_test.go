package review

import (
	"math"
	"path/filepath"
	"reflect"
	"testing"

	"rimfall/network"
	"rimfall/network/analysis"
)

func findCarries(t testing.TB, s *Subject, threads int) *Carries {
	t.Helper()
	c, err := s.FindCarries(CarriesOptions{Threads: threads})
	if err != nil {
		t.Fatal(err)
	}
	return c
}

// Brute force: storms in steps of 0.2 % over the whole range. Up to the period found every one holds, and the first that
// breaks is the next. Where it is a later one, the steps have passed over storms that break, which is then shown.
func TestPeriodsAreThoseThatBruteForceFinds(t *testing.T) {
	for name, change := range map[string]func(*Subject){
		"as it is":                 func(*Subject) {},
		"with partial-area peaks":  func(s *Subject) { s.Storm.Peak = network.PartialArea },
		"with a frequency factor":  func(s *Subject) { s.Storm.FrequencyFactor = true },
		"with the peak held below": func(s *Subject) { s.Storm.HoldUpstreamPeak = true },
	} {
		t.Run(name, func(t *testing.T) {
			s := read(t, millStreet)
			change(s)
			c := findCarries(t, s, 0)
			const step = 1.002
			first := make([]float64, len(carriedList(c))) // first period that breaks; 0: none
			for period := c.Smallest; period <= c.Largest; period *= step {
				for k, room := range breaksIn(t, s, period) {
					if room < 0 && first[k] == 0 {
						first[k] = period
					}
				}
			}
			for k, found := range carriedList(c) {
				switch {
				case !found.Judged:
				case found.None != (first[k] == c.Smallest):
					t.Errorf("limit %d: none holds is %t, brute force breaks first at %g", k, found.None, first[k])
				case found.None:
				case found.All && first[k] != 0 || !found.All && first[k] == 0 && found.Period < c.Largest/step:
					t.Errorf("limit %d: %+v, brute force breaks first at %g", k, found, first[k])
				case first[k] != 0 && first[k] < found.Period,
					first[k] > found.Period*step && breaksIn(t, s, found.Period*1.00001)[k] >= 0:
					t.Errorf("limit %d: %g years, brute force breaks first at %g", k, found.Period, first[k])
				}
			}
		})
	}
}

// At the period found the limit holds, and a hundred thousandth above it breaks.
func TestAtThePeriodFoundTheLimitHoldsAndJustAboveItBreaks(t *testing.T) {
	s := read(t, millStreet)
	found := carriedList(findCarries(t, s, 0))
	closed := 0
	for k, c := range found {
		if !c.Judged || c.All || c.None {
			continue
		}
		closed++
		if room := breaksIn(t, s, c.Period)[k]; room < 0 {
			t.Errorf("limit %d breaks at its %g years by %g", k, c.Period, room)
		}
		if room := breaksIn(t, s, c.Period*1.00001)[k]; room >= 0 {
			t.Errorf("limit %d still holds above its %g years, with %g of room", k, c.Period, room)
		}
	}
	if closed < 25 {
		t.Errorf("only %d periods inside the range; the job is meant to have more", closed)
	}
}

// What the columns themselves tell must agree with check, finding by finding.
func TestAColumnOfTheRainfallHoldsExactlyWhereCheckFindsNothing(t *testing.T) {
	s := read(t, millStreet)
	c := findCarries(t, s, 0)
	for _, period := range s.Job.Rain.Table.Periods {
		r, err := analysis.Run(s.Job, analysis.Options{ReturnPeriod: period})
		if err != nil {
			t.Fatal(err)
		}
		broken := map[string]bool{}
		for _, f := range r.Findings {
			broken[f.Rule.Name+" "+f.Subject] = true
		}
		holds := func(c Carried) bool { return !c.Judged || !c.None && period <= c.Period }
		for i, p := range s.Network.Pipes {
			if broken["capacity "+p.ID] == holds(c.Pipes[i].Capacity) {
				t.Errorf("%g years, pipe %s: check finds capacity broken: %t; carried: %+v", period, p.ID, broken["capacity "+p.ID], c.Pipes[i].Capacity)
			}
		}
		for i, at := range s.Network.Structures {
			for rule, carried := range map[string]Carried{"freeboard ": c.Structures[i].Freeboard, "flooding ": c.Structures[i].Rim} {
				if broken[rule+at.ID] == holds(carried) {
					t.Errorf("%g years, structure %s: check finds %sbroken: %t; carried: %+v", period, at.ID, rule, broken[rule+at.ID], carried)
				}
			}
		}
	}
}

func TestWhatIsCarriedDoesNotDependOnTheNumberOfThreads(t *testing.T) {
	s := read(t, millStreet)
	if one, three := findCarries(t, s, 1), findCarries(t, s, 3); !reflect.DeepEqual(one, three) {
		t.Errorf("one thread finds %+v\nthree find %+v", one, three)
	}
}

// The published relation between columns: in a partial-duration series the depth of a duration is linear in ln T. One
// pipe with one area at the minimum time has a flow proportional to the intensity at that time, so its period can be
// worked out by hand: 12 in at 0.76 % carries 3.115 cfs; 0.6 acre of C 0.9 give 3.115 cfs at 5.768 in/h, between 5.424
// in/h in 10 years and 6.192 in 25: T = 10·2.5^((5.768 − 5.424)/(6.192 − 5.424)).
func TestTheLoneAreaOfAPipeBreaksItsCapacityWhereTheRelationSays(t *testing.T) {
	s := read(t, millStreet)
	b1 := pipeIndex(t, s.Network, "B1")
	for i := range s.Network.Areas {
		if a := &s.Network.Areas[i]; a.ID == "a3" {
			a.Area, a.C, a.Time = 0.6, 0.9, network.Some(5)
		}
	}
	p := &s.Network.Pipes[b1]
	// Manning, Q = 1.486/n·A·R^(2/3)·√S of a full circle of 1 ft: A = π/4, R = 1/4.
	capacity := 1.486 / 0.013 * math.Pi / 4 * math.Pow(0.25, 2.0/3) * math.Sqrt(p.Slope.V)
	intensity := capacity / (0.6 * 0.9)
	want := 10 * math.Pow(2.5, (intensity-5.424)/(6.192-5.424))
	got := findCarries(t, s, 0).Pipes[b1].Capacity
	if math.Abs(got.Period-want) > 1e-5*want { // the tolerance of the search and rounding
		t.Errorf("%+v, want %g years", got, want)
	}
}

func TestTheWeakestPlaceOfAPathIsTheLeastOfItsPeriods(t *testing.T) {
	s := read(t, millStreet)
	c := findCarries(t, s, 0)
	for i := range s.Network.Structures {
		least := math.Inf(1)
		reached := map[network.StructureIndex]bool{network.StructureIndex(i): true}
		order, _ := s.Network.Order()
		for _, at := range order {
			if !reached[at] {
				continue
			}
			for _, p := range s.Network.PipesOut(at) {
				reached[s.Network.Pipes[p].To] = true
				least = min(least, c.Pipes[p].Capacity.Period)
			}
		}
		weakest := c.Structures[i].WeakestCapacity
		if weakest.Place < 0 != math.IsInf(least, 1) || weakest.Place >= 0 && (weakest.Carried.Period != least || c.Pipes[weakest.Place].Capacity.Period != least) {
			t.Errorf("structure %s: %+v, least period %g", s.Network.Structures[i].ID, weakest, least)
		}
	}
}

func TestOneColumnOfRainfallTellsOnlyWhetherItHolds(t *testing.T) {
	s := read(t, filepath.Join("..", "..", "testdata", "networks", "twelve-sewers-printed"))
	c := findCarries(t, s, 0)
	if c.Runs != 1 || c.Smallest != c.Largest {
		t.Errorf("%d runs from %g to %g years", c.Runs, c.Smallest, c.Largest)
	}
	for i, p := range c.Pipes {
		if p.Capacity.All == p.Capacity.None {
			t.Errorf("pipe %s: %+v", s.Network.Pipes[i].ID, p.Capacity)
		}
	}
}

// A limit that breaks, holds again and breaks once more counts as broken from the first time on.
func TestABreakUnderAStormThatHeldCounts(t *testing.T) {
	b := bracket{}
	tried := []float64{2, 3, 4, 5}
	for _, run := range []struct{ period, room float64 }{{2, 5}, {4, 1}, {5, -1}, {3, -0.5}} {
		b.take(run.period, run.room, tried)
	}
	if b.holds != 2 || b.breaks != 3 {
		t.Errorf("holds %g, breaks %g; want 2 and 3", b.holds, b.breaks)
	}
}

func BenchmarkCarries(b *testing.B) {
	s := read(b, millStreet)
	for b.Loop() {
		findCarries(b, s, 0)
	}
}

func TestAPipeOfAPlanIsInTheClassOfItsPeriod(t *testing.T) {
	s := read(t, millStreet) // columns 2, 5, 10, 25, 50, 100
	c := &CarriesReport{Subject: s, Carries: &Carries{Pipes: []PipeCarries{
		{},
		{Capacity: Carried{Judged: true, None: true}},
		{Capacity: Carried{Judged: true, Period: 2}},
		{Capacity: Carried{Judged: true, Period: 9.99}},
		{Capacity: Carried{Judged: true, Period: 10}},
		{Capacity: Carried{Judged: true, Period: 99}},
		{Capacity: Carried{Judged: true, All: true, Period: 100}},
	}}}
	words, class := c.CarriesClasses(Capacity, 6)
	if want := []string{"under 2 years", "2 to 5 years", "5 to 10 years", "10 to 25 years", "25 to 100 years", "100 years and more"}; !reflect.DeepEqual(words, want) {
		t.Errorf("classes %q, want %q", words, want)
	}
	if want := []int{-1, 0, 1, 2, 3, 4, 5}; !reflect.DeepEqual(class, want) {
		t.Errorf("pipes in classes %v, want %v", class, want)
	}
}
