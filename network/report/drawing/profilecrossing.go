package drawing

import (
	"fmt"

	"rimfall/network"
	"rimfall/network/report"
)

// crossings draws the services that cross: cut through, so hatched, and as tall against their width as the drawing is.
func (g *graph) crossings() {
	g.crossingsOf(func(station float64, c *network.Crossing) {
		centre, rx, ry := g.crossingShape(station, c)
		g.Ellipse(centre, rx, ry, shaft, Hatched)
		g.place.take(Box{centre.X - rx, centre.Y - ry, centre.X + rx, centre.Y + ry})
	})
}

// crossingShape is the ellipse of a round service; it is never too small to be seen.
func (g *graph) crossingShape(station float64, c *network.Crossing) (centre Point, rx, ry float64) {
	half := (c.Top - c.Bottom) / 2
	return g.at(station, c.Bottom+half), max(0.5, half*g.layout.along.mm), max(0.5, half*g.layout.up.mm)
}

// crossingNames writes what crosses, and the gap that is left.
func (g *graph) crossingNames() {
	g.crossingsOf(func(station float64, c *network.Crossing) {
		centre, rx, _ := g.crossingShape(station, c)
		show := func(v float64) string { return g.r.style.Show(report.Level, report.N(v)) }
		second := fmt.Sprintf("top %s, bottom %s", show(c.Top), show(c.Bottom))
		if gap := g.r.Network.Clearance(c); gap.OK {
			second = fmt.Sprintf("%s; gap %s", second, g.r.style.Show(report.Length, report.M(gap)))
		}
		g.call(centre, rx+0.2, c.Name, second, c.Name)
	})
}
