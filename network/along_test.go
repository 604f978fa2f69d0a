package network_test

import (
	"math"
	"testing"

	"rimfall/network"
	"rimfall/pipeflow"
)

// trench is a pipe of 2 ft with a wall of 0.25 ft, 100 ft long, from invert 50 down to 49.
func trench(t *testing.T) *network.Network {
	t.Helper()
	circle, err := pipeflow.NewCircle(2)
	if err != nil {
		t.Fatal(err)
	}
	return &network.Network{
		Structures: make([]network.Structure, 2),
		Pipes: []network.Pipe{{
			To: 1, Length: 100, Count: 1, Section: circle, Wall: 0.25,
			InvertUpper: network.Some(50), InvertLower: network.Some(49),
		}},
	}
}

// By hand: at 40 ft the invert is 50 - 1·40/100 = 49.60, so the outside is 49.35 below and 51.85 above.
func TestClearanceIsBetweenTheOutsides(t *testing.T) {
	for _, c := range []struct {
		name        string // a sentence
		top, bottom float64
		want        float64
	}{
		{"a main above leaves the gap to the outside of the crown", 54, 53, 1.15},
		{"a sewer below leaves the gap to the outside of the invert", 48, 47, 1.35},
		{"a duct that reaches into the crown has to rise by the overlap", 53, 51.5, -0.35},
		{"a cable in the middle of the pipe has to go the shorter way out", 50.1, 50, -0.75},
	} {
		t.Run(c.name, func(t *testing.T) {
			n := trench(t)
			got := n.Clearance(&network.Crossing{Station: 40, Top: c.top, Bottom: c.bottom})
			if !got.OK || math.Abs(got.V-c.want) > 1e-12 {
				t.Errorf("gap %v, want %v", got, c.want)
			}
		})
	}
}

func TestCoverUnderGroundIsToTheOutsideOfThePipe(t *testing.T) {
	n := trench(t)
	if got := n.CoverUnder(&network.GroundPoint{Station: 40, Elevation: 54}); !got.OK || math.Abs(got.V-2.15) > 1e-12 {
		t.Errorf("cover %v, want 2.15", got)
	}
}

func TestAPipeWithoutLevelsHasNeitherCoverNorClearance(t *testing.T) {
	n := trench(t)
	n.Pipes[0].InvertLower = network.Maybe{}
	if n.CoverUnder(&network.GroundPoint{Elevation: 54}).OK || n.Clearance(&network.Crossing{Top: 2, Bottom: 1}).OK {
		t.Error("a number came from an unknown invert")
	}
	if len(n.GroundOver(0)) != 0 {
		t.Error("ground where none was given")
	}
}
