package drawing

import (
	"fmt"
	"math"
	"slices"
	"strconv"
	"strings"

	"rimfall/hydrology"
	"rimfall/network/rain"
)

// The sheet of rainfall curves, mm.
const (
	rainWidth  = 250
	rainHeight = 180
	rainType   = 2.6
)

var rainRoom = Box{Left: 24, Top: 26, Right: 222, Bottom: 154}

// RainCurves draws the table of a rainfall file: intensity against duration, both
// on logarithmic scales, a curve for each return period.
func RainCurves(s *rain.Source) *Canvas {
	c := NewCanvas(rainWidth, rainHeight, "Rainfall, "+s.Describe())
	c.Text(Label{At: Point{rainRoom.Left, 12}, Text: "Rainfall intensity by duration and return period", Size: 4, Bold: true})
	for i, line := range wrapText(s.Describe(), rainType, rainRoom.width()) {
		c.Text(Label{At: Point{rainRoom.Left, 17.5 + 3.6*float64(i)}, Text: line, Size: rainType})
	}
	a := rainAxes(s.Table)
	a.drawDurations(c, s.Table.Durations)
	a.drawIntensities(c, string(s.Unit))
	c.Rect(rainRoom, finePen, Empty)
	for column := range s.Table.Periods {
		a.drawStorm(c, s.Table, column)
	}
	a.nameStorms(c, s.Table)
	return c
}

// wrapText breaks a text into lines of a width.
func wrapText(text string, size, width float64) []string {
	var lines []string
	line := ""
	for _, word := range strings.Fields(text) {
		if line != "" && TextWidth(line+" "+word, size, false) > width {
			lines, line = append(lines, line), ""
		}
		if line != "" {
			line += " "
		}
		line += word
	}
	return append(lines, line)
}

// logAxes turn durations and intensities to places on the sheet.
type logAxes struct{ shortest, longest, least, most float64 }

// rainAxes reach from the first duration to the last, and over whole parts of 1, 2 and
// 5 times the powers of ten in intensity.
func rainAxes(t hydrology.Table) logAxes {
	last := len(t.Durations) - 1
	a := logAxes{shortest: t.Durations[0], longest: t.Durations[last], least: math.Inf(1)}
	for _, row := range t.Values {
		a.least, a.most = min(a.least, slices.Min(row)), max(a.most, slices.Max(row))
	}
	marks := decadeMarks(a.least/10, a.most*10)
	for i, m := range marks {
		if m <= a.least && marks[i+1] > a.least {
			a.least = m
			break
		}
	}
	for _, m := range marks {
		if m >= a.most {
			a.most = m
			break
		}
	}
	if a.longest == a.shortest { // one duration: a curve of one point in the middle
		a.shortest, a.longest = a.shortest/2, a.longest*2
	}
	if a.least == a.most {
		a.least, a.most = a.least/2, a.most*2
	}
	return a
}

func (a logAxes) at(minutes, intensity float64) Point {
	x := math.Log(minutes/a.shortest) / math.Log(a.longest/a.shortest)
	y := math.Log(intensity/a.least) / math.Log(a.most/a.least)
	return Point{rainRoom.Left + x*rainRoom.width(), rainRoom.Bottom - y*rainRoom.height()}
}

// decadeMarks are 1, 2 and 5 times the powers of ten from low to high.
func decadeMarks(low, high float64) []float64 {
	var marks []float64
	for power := math.Floor(math.Log10(low)); power <= math.Ceil(math.Log10(high)); power++ {
		for _, m := range []float64{1, 2, 5} {
			v := m * math.Pow(10, power)
			if v >= low*(1-1e-9) && v <= high*(1+1e-9) {
				marks = append(marks, v)
			}
		}
	}
	return marks
}

// drawDurations draws a line at every tabulated duration and names it, in a second
// line where the first has no room.
func (a logAxes) drawDurations(c *Canvas, durations []float64) {
	free := [2]float64{math.Inf(-1), math.Inf(-1)} // where each line of names ends
	for _, d := range durations {
		x := a.at(d, a.least).X
		c.Line(Point{x, rainRoom.Top}, Point{x, rainRoom.Bottom}, gridPen)
		text := durationText(d)
		half := TextWidth(text, rainType, false) / 2
		for line := range free {
			if x-half > free[line] {
				c.Text(Label{At: Point{x, rainRoom.Bottom + 4.5 + 3.4*float64(line)}, Text: text, Size: rainType, Anchor: Middle})
				free[line] = x + half + 1
				break
			}
		}
	}
	c.Text(Label{At: Point{(rainRoom.Left + rainRoom.Right) / 2, rainRoom.Bottom + 14}, Text: "duration", Size: 3, Anchor: Middle})
}

// durationText is a duration in min, h or d, whichever is whole.
func durationText(minutes float64) string {
	figure := func(v float64) string { return strconv.FormatFloat(v, 'g', 6, 64) }
	switch {
	case minutes >= 2880 && math.Mod(minutes, 1440) == 0:
		return figure(minutes/1440) + " d"
	case minutes >= 60 && math.Mod(minutes, 60) == 0:
		return figure(minutes/60) + " h"
	}
	return figure(minutes) + " min"
}

func (a logAxes) drawIntensities(c *Canvas, unit string) {
	for _, m := range decadeMarks(a.least, a.most) {
		y := a.at(a.shortest, m).Y
		c.Line(Point{rainRoom.Left, y}, Point{rainRoom.Right, y}, gridPen)
		c.Text(Label{At: Point{rainRoom.Left - 1.5, y + 0.9}, Text: strconv.FormatFloat(m, 'g', 6, 64), Size: rainType, Anchor: End})
	}
	middle := Point{rainRoom.Left - 13, (rainRoom.Top + rainRoom.Bottom) / 2}
	c.Text(Label{At: middle, Text: "intensity, " + unit, Size: 3, Anchor: Middle, Turn: -90})
}

// drawStorm draws one return period; between the durations it is straight, as the intensity is interpolated.
func (a logAxes) drawStorm(c *Canvas, t hydrology.Table, column int) {
	var points []Point
	for row, d := range t.Durations {
		points = append(points, a.at(d, t.Values[row][column]))
	}
	c.Polyline(points, Pen{Width: 0.3})
	for _, p := range points {
		c.Ellipse(p, 0.55, 0.55, Pen{Width: 0.18}, White)
	}
}

// nameStorms writes the return periods beside the right ends of the curves, moved
// apart where they are too near one another, each with a fine line to its curve.
func (a logAxes) nameStorms(c *Canvas, t hydrology.Table) {
	last := len(t.Durations) - 1
	const gap = 3.4
	ends := make([]Point, len(t.Periods)) // from the top down: the rarest first
	for k := range ends {
		ends[k] = a.at(t.Durations[last], t.Values[last][len(t.Periods)-1-k])
	}
	heights := spreadDown(ends, gap)
	for k, end := range ends {
		name := fmt.Sprintf("%g years", t.Periods[len(t.Periods)-1-k])
		if k == len(ends)-1 && t.Periods[0] == 1 {
			name = "1 year"
		}
		x := rainRoom.Right + 6
		c.Line(Point{end.X + 0.8, end.Y}, Point{x - 0.8, heights[k]}, Pen{Width: 0.13})
		c.Text(Label{At: Point{x, heights[k] + 0.9}, Text: name, Size: rainType})
	}
}

// spreadDown gives heights near those of the points, which go down the sheet, that are at least gap apart:
// neighbours that are too near form a block, which stands round the mean of its points.
func spreadDown(points []Point, gap float64) []float64 {
	type block struct {
		sum   float64 // of the heights, each less its place in the block
		count int
	}
	var blocks []block
	top := func(b block) float64 { return b.sum / float64(b.count) }
	for _, p := range points {
		blocks = append(blocks, block{p.Y, 1})
		for n := len(blocks); n > 1; n = len(blocks) {
			above, below := blocks[n-2], blocks[n-1]
			if top(below)-top(above) >= gap*float64(above.count) {
				break
			}
			above.sum += below.sum - gap*float64(above.count*below.count)
			above.count += below.count
			blocks = append(blocks[:n-2], above)
		}
	}
	var heights []float64
	for _, b := range blocks {
		for k := range b.count {
			heights = append(heights, top(b)+gap*float64(k))
		}
	}
	return heights
}
