package drawing

import (
	"cmp"
	"math"
	"slices"

	"rimfall/network/calculator"
	"rimfall/network/report"
)

// The page of the calculator, mm: section on the left, curves on the right.
const (
	calcWidth, calcHeight = 250, 150
	calcMargin            = 10
	calcTop               = 28 // under title and given
	calcBottom            = 118
)

// Pens of the calculator's page.
var (
	wallPen     = Pen{Width: 0.6}
	waterPen    = Pen{Width: 0.35}
	criticalPen = Pen{Width: 0.25, Dashes: []float64{2, 1.2}}
	finePen     = Pen{Width: 0.18}
	gridPen     = Pen{Width: 0.13, Grey: true}
)

// Calculation draws an answer or a rating of the calculator: the section with its water
// line, and the curves of what it holds and carries.
func Calculation(p calculator.Picture) *Canvas {
	c := NewCanvas(calcWidth, calcHeight, p.Title)
	c.Text(Label{At: Point{calcMargin, 15}, Text: p.Title, Size: 5, Bold: true})
	for i, l := range p.Lines {
		c.Text(fit(Label{At: Point{calcMargin, 21.5 + 4.5*float64(i)}, Text: l, Size: 3.5}, calcWidth-2*calcMargin, 2.5))
	}
	drawSection(c, p, Box{calcMargin, calcTop + 6, 112, calcBottom})
	drawCurves(c, p, Box{140, calcTop + 6, calcWidth - calcMargin - 4, calcBottom})
	y := 133.0
	for _, text := range append(slices.Clone(p.Foot), report.Caution) {
		for _, l := range wrap(text, 3, calcWidth-2*calcMargin) {
			c.Text(Label{At: Point{calcMargin, y}, Text: l, Size: 3})
			y += 4
		}
	}
	return c
}

// scaled turns lengths to places on the page.
type scaled struct {
	left, bottom float64 // of the lowest point's axis on the page
	across, up   float64 // mm per ft or m
}

func (f scaled) at(x, y float64) Point { return Point{f.left + x*f.across, f.bottom - y*f.up} }

// levelRoom is what is kept free beside the section for the names of levels.
const levelRoom = 34

// scaleSection fits the outline into a box: to one scale, or stretched upward where it is so
// flat that nothing would be seen.
func scaleSection(outline []calculator.Place, room Box) (f scaled, stretch float64) {
	low, high, top := math.Inf(1), math.Inf(-1), 0.0
	for _, p := range outline {
		low, high, top = min(low, p.X), max(high, p.X), max(top, p.Y)
	}
	width := room.width() - levelRoom
	scale := min(width/(high-low), room.height()/top)
	f = scaled{across: scale, up: scale}
	const flattest = 0.25 // of the height of the box; flatter sections are stretched
	if top*scale < flattest*room.height() {
		f.up = evenFactor(room.height()/2/top/scale) * scale
	}
	f.left = room.Left + width/2 - (low+high)/2*f.across
	f.bottom = (room.Top+room.Bottom)/2 + top*f.up/2
	return f, f.up / f.across
}

// evenFactor is the greatest of 1, 2, 5, 10, 20 … that is not over a factor of 1 or more.
func evenFactor(most float64) float64 {
	power := math.Pow(10, math.Floor(math.Log10(max(1, most))))
	for _, m := range []float64{5, 2} {
		if m*power <= most {
			return m * power
		}
	}
	return power
}

// drawSection draws outline and levels.
func drawSection(c *Canvas, p calculator.Picture, room Box) {
	f, stretch := scaleSection(p.Outline, room)
	var points []Point
	for _, place := range p.Outline {
		points = append(points, f.at(place.X, place.Y))
	}
	if p.Closed {
		c.Polygon(points, wallPen, Empty)
	} else {
		c.Polyline(points, wallPen)
	}
	drawLevels(c, p.Levels, f, room.Right-levelRoom+3)
	title := "Section"
	if stretch > 1 {
		title += ", heights stretched " + number(stretch) + " times"
	}
	c.Text(Label{At: Point{room.Left, calcTop}, Text: title, Size: 3.5, Bold: true})
}

// drawLevels draws each level where it is wet, a mark on the water, and its name at the
// side, names being kept apart.
func drawLevels(c *Canvas, levels []calculator.Level, f scaled, side float64) {
	levels = slices.Clone(levels)
	slices.SortStableFunc(levels, func(a, b calculator.Level) int { return -cmp.Compare(a.Depth, b.Depth) })
	const apart = 4.5
	last := math.Inf(-1)
	for i, l := range levels {
		pen := criticalPen
		if l.Water {
			pen = waterPen
		}
		y := f.at(0, l.Depth).Y
		end := 0.0
		for _, b := range l.Between {
			c.Line(f.at(b[0], l.Depth), f.at(b[1], l.Depth), pen)
			end = max(end, f.at(b[1], l.Depth).X)
		}
		name := max(y, last+apart)
		if i == 0 && len(levels) > 1 && f.at(0, levels[1].Depth).Y-y < apart {
			name = y - apart/2 // make room between two that are close
		}
		last = name
		c.Polyline([]Point{{end, y}, {side - 4, y}, {side - 1, name}}, finePen)
		c.Text(Label{At: Point{side, name + 1}, Text: l.Name, Size: 3})
		if l.Water {
			waterMark(c, f, l)
		}
	}
}

// waterMark is the triangle that stands on a water surface.
func waterMark(c *Canvas, f scaled, l calculator.Level) {
	widest := slices.MaxFunc(l.Between, func(a, b [2]float64) int { return cmp.Compare(a[1]-a[0], b[1]-b[0]) })
	at := f.at((widest[0]+widest[1])/2, l.Depth)
	c.Polygon([]Point{at, {at.X - 1.6, at.Y - 2.6}, {at.X + 1.6, at.Y - 2.6}}, finePen, White)
	c.Line(Point{at.X - 1.2, at.Y + 0.8}, Point{at.X + 1.2, at.Y + 0.8}, finePen)
	c.Line(Point{at.X - 0.6, at.Y + 1.5}, Point{at.X + 0.6, at.Y + 1.5}, finePen)
}
