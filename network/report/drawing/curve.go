package drawing

import (
	"math"
	"strconv"

	"rimfall/network/calculator"
)

// curvePens tell the curves apart by their dashes, in the order of the curves.
var curvePens = []Pen{
	{Width: 0.35, Dashes: []float64{0.6, 1.1}},
	{Width: 0.35, Dashes: []float64{3, 1.2, 0.6, 1.2}},
	{Width: 0.35, Dashes: []float64{3, 1.2}},
	{Width: 0.5},
}

// drawCurves draws the hydraulic elements: ratios across, depth upward.
func drawCurves(c *Canvas, p calculator.Picture, room Box) {
	most := 1.0
	for _, curve := range p.Curves {
		for _, r := range curve.Ratio {
			most = max(most, r)
		}
	}
	step := evenStep(most)
	most = math.Ceil(most/step-1e-6) * step
	high := 1.0
	if p.Axis == calculator.Length {
		high = p.Rise
	}
	f := scaled{left: room.Left, bottom: room.Bottom, across: room.width() / most, up: room.height() / high}
	drawAxes(c, p, f, most, high, step)
	for i, curve := range p.Curves {
		var points []Point
		for j, r := range curve.Ratio {
			y := curve.Depths[j]
			if p.Axis != calculator.Length {
				y /= p.Rise
			}
			points = append(points, f.at(r, y))
		}
		c.Polyline(points, curvePens[i%len(curvePens)])
	}
	for _, l := range p.Levels {
		if l.Water {
			y := l.Depth * high / p.Rise
			c.Line(f.at(0, y), f.at(most, y), Pen{Width: 0.18})
		}
	}
	drawLegend(c, p.Curves, room)
}

// evenStep is a step of 1, 2 or 5 times a power of ten that cuts a length into 5 to 13 parts.
func evenStep(length float64) float64 {
	power := math.Pow(10, math.Floor(math.Log10(length/5)))
	for _, m := range []float64{1, 2, 5} {
		if length/(m*power) <= 13 {
			return m * power
		}
	}
	return 10 * power
}

// drawAxes draws grid, figures and the names of the axes.
func drawAxes(c *Canvas, p calculator.Picture, f scaled, most, high, step float64) {
	figureAt := func(v float64) string { return strconv.FormatFloat(math.Round(v*1e6)/1e6, 'f', -1, 64) }
	for i := 0; float64(i)*step <= most*(1+1e-9); i++ {
		x := float64(i) * step
		c.Line(f.at(x, 0), f.at(x, high), gridPen)
		at := f.at(x, 0)
		c.Text(Label{At: Point{at.X, at.Y + 4}, Text: figureAt(x), Size: 2.6, Anchor: Middle})
	}
	up := evenStep(high)
	for i := 0; float64(i)*up <= high*(1+1e-9); i++ {
		y := float64(i) * up
		c.Line(f.at(0, y), f.at(most, y), gridPen)
		at := f.at(0, y)
		c.Text(Label{At: Point{at.X - 1.5, at.Y + 0.9}, Text: figureAt(y), Size: 2.6, Anchor: End})
	}
	low, end := f.at(0, 0), f.at(most, high)
	c.Rect(Box{low.X, end.Y, end.X, low.Y}, finePen, Empty)
	c.Text(Label{At: Point{(low.X + end.X) / 2, low.Y + 8.5}, Text: p.Against, Size: 3, Anchor: Middle})
	middle := Point{low.X - 9, (low.Y + end.Y) / 2}
	c.Text(Label{At: middle, Text: p.DepthsIn, Size: 3, Anchor: Middle, Turn: -90})
	c.Text(Label{At: Point{low.X, calcTop}, Text: "Hydraulic elements", Size: 3.5, Bold: true})
}

// drawLegend names the curves above the scaled.
func drawLegend(c *Canvas, curves []calculator.Curve, room Box) {
	x := room.Left
	for i, curve := range curves {
		y := room.Top - 2
		c.Line(Point{x, y - 0.9}, Point{x + 9, y - 0.9}, curvePens[i%len(curvePens)])
		c.Text(Label{At: Point{x + 10, y}, Text: curve.Name, Size: 2.6})
		x += 10 + TextWidth(curve.Name, 2.6, false) + 4
	}
}
