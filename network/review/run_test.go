package review

import (
	"path/filepath"
	"testing"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/networktest"
)

// millStreet is an invented older trunk line with a split, over a real rainfall table.
var millStreet = filepath.Join("..", "..", "testdata", "review", "mill-street")

// read reads a job folder that must have no fault.
func read(t testing.TB, dir string) *Subject {
	t.Helper()
	j, err := analysis.Read(dir, analysis.Options{})
	if err != nil {
		t.Fatal(err)
	}
	return Of(j, 0)
}

// breaksIn runs the job as check does, with a storm of the rainfall's between-column intensities, and tells which
// limits break, in the layout of rooms.
func breaksIn(t testing.TB, s *Subject, period float64) []float64 {
	t.Helper()
	row := make([]float64, 2*(len(s.Network.Pipes)+len(s.Network.Structures)))
	if err := s.roomsOf(newRunner(s.Network, s.settings, s.Storm.Peak), period, row); err != nil {
		t.Fatal(err)
	}
	return row
}

// carriedList lists what was found in the layout of rooms.
func carriedList(c *Carries) []Carried {
	var all []Carried
	for _, p := range c.Pipes {
		all = append(all, p.Capacity, p.Crown)
	}
	for _, s := range c.Structures {
		all = append(all, s.Freeboard, s.Rim)
	}
	return all
}

func pipeIndex(t testing.TB, n *network.Network, id string) network.PipeIndex {
	t.Helper()
	for i := range n.Pipes {
		if n.Pipes[i].ID == id {
			return network.PipeIndex(i)
		}
	}
	t.Fatalf("no pipe %s", id)
	return -1
}

// invented is a job of an invented network of any size.
func invented(t testing.TB, shape networktest.Shape, pipes int) *Subject {
	t.Helper()
	dir := t.TempDir()
	if err := networktest.WriteFolder(dir, networktest.New(shape, pipes)); err != nil {
		t.Fatal(err)
	}
	return read(t, dir)
}
