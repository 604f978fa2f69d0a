package pipeflow

import (
	"errors"
	"fmt"
	"math"
	"slices"
)

// Point is one point of a surveyed ground line, looking downstream, and the roughness from there to the next point.
type Point struct {
	Station, Elevation float64
	N                  float64 // Manning's n up to the next point; 0 where not given
}

// Ground is an open section along a surveyed ground line. Water stands at one level across the whole line, in every low
// of it, whether or not it could get there. The rise is counted from the lowest point to the lower of the two ends,
// above which water would leave the line.
type Ground struct {
	slabs      []slab
	rise, span float64
	levels     []float64 // heights of the points, ascending, where the section's growth changes
}

// slab is the ground between two points, heights being counted from the lowest point of the line.
type slab struct {
	left, right   float64 // heights at its ends
	width, length float64 // along the stations, along the ground
	n             float64
}

// NewGround makes a section from two or more points in the order of their stations; an upright wall has two points at
// one station.
//
// Error: fewer than two points, a number that is none, a station that goes back (so the line cannot cross itself), a
// negative n, or a line that holds no water because one of its ends is its lowest point.
func NewGround(points []Point) (*Ground, error) {
	if len(points) < 2 {
		return nil, fmt.Errorf("pipeflow: a ground line needs at least two points, not %d", len(points))
	}
	lowest := math.Inf(1)
	for i, p := range points {
		if err := checkPoint(points, i); err != nil {
			return nil, err
		}
		lowest = min(lowest, p.Elevation)
	}
	g := &Ground{rise: min(points[0].Elevation, points[len(points)-1].Elevation) - lowest}
	if g.rise <= 0 {
		return nil, errors.New("pipeflow: the ground line holds no water: one of its ends is its lowest point; add the bank")
	}
	for i := range points[1:] {
		a, b := points[i], points[i+1]
		left, right := a.Elevation-lowest, b.Elevation-lowest
		width := b.Station - a.Station
		g.slabs = append(g.slabs, slab{left, right, width, math.Hypot(width, right-left), a.N})
	}
	for _, p := range points {
		g.levels = append(g.levels, min(p.Elevation-lowest, g.rise))
	}
	slices.Sort(g.levels)
	g.levels = slices.Compact(g.levels)
	g.span = g.At(g.rise).TopWidth
	return g, nil
}

func checkPoint(points []Point, i int) error {
	p := points[i]
	for _, value := range [...]float64{p.Station, p.Elevation, p.N} {
		if math.IsNaN(value) || math.IsInf(value, 0) {
			return fmt.Errorf("pipeflow: point %d of the ground line has a value that is no number: %v", i+1, p)
		}
	}
	if i > 0 && p.Station < points[i-1].Station {
		return fmt.Errorf("pipeflow: station %v of point %d goes back behind %v; a ground line runs one way and does not cross itself",
			p.Station, i+1, points[i-1].Station)
	}
	if p.N < 0 {
		return fmt.Errorf("pipeflow: n %v of point %d must be over 0, or 0 where not given", p.N, i+1)
	}
	return nil
}

// Rise is the height of the lower end of the line above its lowest point.
func (g *Ground) Rise() float64 { return g.rise }

// Span is the width of the water surface at the rise.
func (g *Ground) Span() float64 { return g.span }

// Closed is false.
func (g *Ground) Closed() bool { return false }

// At measures the section at a depth over its lowest point. Where the water just covers a level stretch, that stretch
// counts as wet.
func (g *Ground) At(depth float64) Geometry {
	y := clampDepth(depth, g.rise)
	var total Geometry
	for i := range g.slabs {
		part := g.slabs[i].at(y)
		total.Area += part.Area
		total.Perimeter += part.Perimeter
		total.TopWidth += part.TopWidth
	}
	return total
}

// Moment is the first moment of the wetted area about the water surface.
func (g *Ground) Moment(depth float64) float64 {
	y := clampDepth(depth, g.rise)
	sum := 0.0
	for i := range g.slabs {
		sum += g.slabs[i].moment(y)
	}
	return sum
}

// wet is the depth at both ends of a slab and the share of its width that is under water.
func (s *slab) wet(y float64) (left, right, share float64) {
	left, right = y-s.left, y-s.right
	switch {
	case left < 0 && right < 0:
		return 0, 0, 0
	case left >= 0 && right >= 0:
		return left, right, 1
	}
	deep := max(left, right)
	return deep, 0, deep / math.Abs(s.right-s.left)
}

// at is a trapezium on edge, or the triangle that is left of it at the water's edge.
func (s *slab) at(y float64) Geometry {
	left, right, share := s.wet(y)
	return Geometry{
		Area:      share * s.width * (left + right) / 2,
		Perimeter: share * s.length,
		TopWidth:  share * s.width,
	}
}

// moment is ∫ d²/2 over the wet width, d the depth.
func (s *slab) moment(y float64) float64 {
	left, right, share := s.wet(y)
	return share * s.width * (left*left + left*right + right*right) / 6
}

func (g *Ground) growth(depth float64) growth {
	var total growth // without bends: all slabs are straight
	for i := range g.slabs {
		s := &g.slabs[i]
		if _, _, share := s.wet(depth); share > 0 && share < 1 {
			total.perimeter += s.length / math.Abs(s.right-s.left)
			total.width += s.width / math.Abs(s.right-s.left)
		}
	}
	return total
}
