package grade_test

import (
	"pgregory.net/rapid"

	"rimfall/network"
	"rimfall/network/grade"
	"rimfall/network/units"
	"rimfall/pipeflow"
)

// randomDrain is an invented tree of one to eight pipes of every slope, circles and boxes, with what a table can give
// beside: benching, losses, angles, bends, barrels, dry pipes, a split, a tailwater or none.
func randomDrain(t *rapid.T) *drain {
	d := newDrain(units.US)
	if rapid.Bool().Draw(t, "si") {
		d = newDrain(units.SI)
	}
	foot := 0.3048
	if d.units.Name == units.US.Name {
		foot = 1
	}
	d.settings.Method = grade.Method(rapid.IntRange(0, len(grade.Methods)-1).Draw(t, "method"))
	d.settings.Start = grade.Start(rapid.IntRange(0, len(grade.Starts)-1).Draw(t, "start"))
	river := d.structure(network.Structure{Kind: network.Outfall, Tailwater: chance(t, "tailwater", 0.6, -2*foot, 8*foot)})
	inverts := []float64{0}
	for range rapid.IntRange(1, 8).Draw(t, "pipes") {
		below := network.StructureIndex(rapid.IntRange(0, len(d.Structures)-1).Draw(t, "below"))
		length := rapid.Float64Range(20, 400).Draw(t, "length") * foot
		slope := rapid.SampledFrom([]float64{-0.003, 0, 0.0005, 0.002, 0.004, 0.01, 0.03}).Draw(t, "slope")
		lower := inverts[below] + rapid.SampledFrom([]float64{0, 0, 0.1, 1, 4}).Draw(t, "drop")*foot
		upper := lower + slope*length
		inverts = append(inverts, upper)
		s := d.structure(network.Structure{
			Kind: network.Kind(rapid.IntRange(0, 2).Draw(t, "kind")), Benching: network.Benching(rapid.IntRange(0, 4).Draw(t, "benching")),
			Rim: network.Some(upper + 8*foot), Loss: chance(t, "structure loss", 0.1, 0, 1.5),
		})
		section := randomSection(t, foot)
		velocity := rapid.SampledFrom([]float64{0, 0.5, 2, 4, 8}).Draw(t, "velocity") * foot
		d.pipe(network.Pipe{
			From: s, To: below, Length: length, Section: section, Count: int32(rapid.IntRange(1, 2).Draw(t, "barrels")),
			InvertUpper: network.Some(upper), InvertLower: network.Some(lower), Angle: chance(t, "angle", 0.6, 0, 180),
			Loss: chance(t, "pipe loss", 0.1, 0, 1.5), Bend: chance(t, "bend", 0.1, 0, 90).V,
		}, velocity*section.At(section.Rise()).Area)
	}
	if rapid.Bool().Draw(t, "split") {
		second := d.structure(network.Structure{Kind: network.Outfall})
		p := d.Pipes[0]
		p.To, p.InvertLower = second, network.Some(p.InvertUpper.V-0.01*p.Length)
		d.pipe(p, d.flow[0]/2)
	}
	_ = river
	return d
}

func chance(t *rapid.T, name string, share, low, high float64) network.Maybe {
	if rapid.Float64Range(0, 1).Draw(t, name+" given") > share {
		return network.Maybe{}
	}
	return network.Some(rapid.Float64Range(low, high).Draw(t, name))
}

func randomSection(t *rapid.T, foot float64) pipeflow.Section {
	rise := rapid.SampledFrom([]float64{1, 1.5, 2, 3, 5}).Draw(t, "rise") * foot
	if rapid.Float64Range(0, 1).Draw(t, "box") < 0.75 {
		c, _ := pipeflow.NewCircle(rise)
		return c
	}
	b, _ := pipeflow.NewBox(2*foot, rise)
	return b
}
