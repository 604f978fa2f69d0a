// Package networktest makes invented networks of any size for benchmarks and
// property tests: a chain, a tree, and a forest of separate systems.
package networktest

import (
	"fmt"

	"rimfall/network"
	"rimfall/pipeflow"
)

// Shape names a way in which pipes are joined.
type Shape string

// The shapes: one line of pipes; one system in which two pipes enter every
// structure; many systems of 200 pipes, each a main line with short branches.
const (
	Chain  Shape = "chain"
	Tree   Shape = "tree"
	Forest Shape = "forest"
)

// Shapes lists every shape.
var Shapes = []Shape{Chain, Tree, Forest}

// systemSize is the number of pipes of one system of a forest.
const systemSize = 200

// New makes a connected network of pipes circular pipes with an area at every
// structure that a pipe leaves. Structure i is the upper end of pipe i, so the
// order of the rows is not the order of flow.
func New(shape Shape, pipes int) *network.Network {
	n := &network.Network{}
	next := downstream(shape)
	upper := make([]float64, pipes) // inverts
	for i := range pipes {
		inches := size(shape, i)
		upper[i] = outfallInvert + pipeSlope*pipeLength
		if to := next(i); to >= 0 { // crowns line up, with a fall
			upper[i] = upper[to] + (size(shape, to)-inches)/12 + structureFall + pipeSlope*pipeLength
		}
		rim := network.Some(upper[i] + inches/12 + wall + cover)
		n.Structures = append(n.Structures, network.Structure{ID: fmt.Sprintf("S%d", i), Rim: rim, Line: int32(i + 2)})
	}
	for i := range pipes {
		to := next(i)
		if to < 0 {
			to = len(n.Structures)
			n.Structures = append(n.Structures, network.Structure{ID: fmt.Sprintf("O%d", i), Kind: network.Outfall, Line: int32(to + 2)})
		}
		n.Pipes = append(n.Pipes, pipe(i, upper[i], size(shape, i), network.StructureIndex(i), network.StructureIndex(to)))
		n.Areas = append(n.Areas, network.Area{ID: fmt.Sprintf("A%d", i), Structure: network.StructureIndex(i), Area: 0.02, C: 0.5, Time: network.Some(8)})
	}
	n.Connect()
	return n
}

// size is the diameter in inches: larger on the main line of a system and near its outfall.
func size(shape Shape, i int) float64 {
	k := i % systemSize
	switch {
	case shape == Chain || shape == Tree || k%4 == 0 && k < systemSize/2:
		return 36
	case k%4 == 0:
		return 24
	}
	return 15
}

// downstream gives the pipe into whose upper structure pipe i leads; −1 an outfall.
func downstream(shape Shape) func(i int) int {
	switch shape {
	case Chain:
		return func(i int) int { return i - 1 }
	case Tree:
		return func(i int) int { return (i+1)/2 - 1 }
	}
	return func(i int) int { // a main line of every fourth pipe, branches of three
		base, k := i/systemSize*systemSize, i%systemSize
		switch {
		case k == 0:
			return -1
		case k%4 == 0:
			return base + k - 4
		}
		return base + k - 1
	}
}

// sections are shared by all pipes of one size, as the reader of jobs shares them.
var sections = func() map[float64]pipeflow.Section {
	all := map[float64]pipeflow.Section{}
	for _, inches := range []float64{15, 24, 36} {
		c, err := pipeflow.NewCircle(inches / 12)
		if err != nil {
			panic(err) // a slip of the list above
		}
		all[inches] = c
	}
	return all
}()

// A pipe is short, so that a chain of a million stays within a rainfall table, and
// lies so that few findings arise in a forest. Lengths in feet.
const (
	pipeLength    = 30
	pipeSlope     = 0.006
	structureFall = 0.1
	wall          = 0.25
	cover         = 5
	outfallInvert = 10
)

func pipe(i int, upper, inches float64, from, to network.StructureIndex) network.Pipe {
	s := sections[inches]
	return network.Pipe{
		ID: fmt.Sprintf("P%d", i), From: from, To: to, Length: pipeLength, Shape: "circle", Section: s,
		Size: network.Size{Span: inches, Rise: inches}, Count: 1, N: 0.013, Angle: network.Some(0),
		InvertUpper: network.Some(upper), InvertLower: network.Some(upper - pipeSlope*pipeLength), Slope: network.Some(pipeSlope),
		Wall: wall, HasWall: true, Line: int32(i + 2),
	}
}
