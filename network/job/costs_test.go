package job

import (
	"os"
	"path/filepath"
	"strings"
	"testing"

	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/network/units"
)

// costsOf reads a table of costs by itself.
func costsOf(t *testing.T, text string) (Costs, fault.List) {
	t.Helper()
	dir := t.TempDir()
	if err := os.WriteFile(filepath.Join(dir, "costs.csv"), []byte(text), 0o644); err != nil {
		t.Fatal(err)
	}
	j := &Job{}
	s := defaults(units.US)
	r := &reader{dir: dir, settings: &s, files: map[string][]byte{}, tables: map[string]*table{}}
	r.readCosts(j)
	return j.Costs, r.faults
}

func inch(v float64) network.Size { return network.Size{Span: v, Rise: v} }

// The prices are the first three of Riverdale City (Utah), Capital Facilities Plan, Storm Drainage, Appendix F, Project 1,
// January 2009; the depths are invented.
const threeDepths = "work,size,depth,cost,note\nlaying,24,8,71.50,\n,24,12,81,\nlaying,24,,91.75,deeper\nremoval,,,16,any\nremoval,24,,17,\n"

func TestACostIsThatOfTheLeastDepthThatIsNotExceeded(t *testing.T) {
	costs, faults := costsOf(t, threeDepths)
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	for _, c := range []struct {
		name  string
		depth network.Maybe
		want  float64
	}{
		{"a shallow pipe has the first", network.Some(3), 71.50},
		{"at the depth itself the row still holds", network.Some(8), 71.50},
		{"over it the next does", network.Some(8.01), 81},
		{"a row without a depth holds at any", network.Some(40), 91.75},
		{"an unknown depth is taken as the greatest", network.Maybe{}, 91.75},
	} {
		if got, ok := costs.Laying("circle", "concrete", inch(24), c.depth); !ok || got != c.want {
			t.Errorf("%s: %g, want %g", c.name, got, c.want)
		}
	}
	if got, ok := costs.Laying("circle", "concrete", inch(27), network.Some(3)); ok {
		t.Errorf("a size that is not listed costs %g", got)
	}
	if got, ok := costs.Removal("circle", "clay", inch(30), network.Some(3)); !ok || got != 16 {
		t.Errorf("removal of any size: %g", got)
	}
}

func TestASizeThatIsNowhereListedSoDeepHasNoCost(t *testing.T) {
	costs, _ := costsOf(t, "size,depth,cost\n24,8,71.50\n")
	if got, ok := costs.Laying("circle", "", inch(24), network.Some(9)); ok {
		t.Errorf("it costs %g", got)
	}
}

func TestFaultsOfCostsAreAllReported(t *testing.T) {
	_, faults := costsOf(t, "work,size,cost\nlaying,,5\ndigging,24,5\nlaying,24 x 12,5\nlaying,24,-5\nlaying,24,\n")
	text := faults.Error()
	for _, want := range []string{"costs.csv:2:", "size is blank", "costs.csv:3:1", "digging", "costs.csv:4:8", "costs.csv:5:11", "must be over 0", "costs.csv:6:11", "cost is blank"} {
		if !strings.Contains(text, want) {
			t.Errorf("%q is not in\n%s", want, text)
		}
	}
}
