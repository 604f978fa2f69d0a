package job

import (
	"rimfall/hydrology"
	"rimfall/hydrology/rainfile"
	"rimfall/network"
)

// RainSettings say how the rainfall of a job is taken. The zero value is the
// estimate of the rainfall table, as a partial-duration series.
type RainSettings struct {
	Bound       rainfile.Bound   // which table of an agency's file
	Series      hydrology.Series // of a table that does not say
	SeriesGiven bool
	TwoYearDay  network.Maybe // 2-year 24-hour depth, in or mm, where the rainfall has none
	Equations   []equation    // [storm.equation], in place of a file
	SurfaceC    SurfaceC
	Impervious  Impervious
	ImperviousC network.Maybe // C of what is paved and of the rest, for the relation "two-part"
	PerviousC   network.Maybe
}

// SurfaceC says which coefficient of a surface is taken.
type SurfaceC int8

// The usual coefficient of surfaces.csv, or the low or high end of its range.
const (
	UsualC SurfaceC = iota
	LowC
	HighC
)

// Impervious is the relation by which C follows from the impervious percentage.
type Impervious int8

// The relations: hydrology.LinearImperviousC, CubicImperviousC and ImperviousC.
const (
	LinearRelation Impervious = iota
	CubicRelation
	TwoPartRelation
)

var (
	bounds      = []string{"estimate", "upper", "lower"}
	seriesNames = []string{"partial-duration", "annual-maximum"}
	surfaceCs   = []string{"usual", "low", "high"}
	relations   = []string{"linear", "cubic", "two-part"}
)

// rainNumbers are the numeric keys of [storm] about rainfall and runoff.
var rainNumbers = map[string]number{
	"two_year_day_depth": {func(s *Settings, v float64) { s.Rain.TwoYearDay = network.Some(v) }, 0, huge, true, "a depth over 0, in or mm"},
	"impervious_c":       {func(s *Settings, v float64) { s.Rain.ImperviousC = network.Some(v) }, 0, 1, false, "a runoff coefficient, 0 to 1"},
	"pervious_c":         {func(s *Settings, v float64) { s.Rain.PerviousC = network.Some(v) }, 0, 1, false, "a runoff coefficient, 0 to 1"},
}

// rainWords are those that take a word.
var rainWords = map[string]word{
	"bound":               {bounds, func(s *Settings, i int) { s.Rain.Bound = rainfile.Bound(i) }},
	"series":              {seriesNames, func(s *Settings, i int) { s.Rain.Series, s.Rain.SeriesGiven = hydrology.Series(i), true }},
	"surface_c":           {surfaceCs, func(s *Settings, i int) { s.Rain.SurfaceC = SurfaceC(i) }},
	"impervious_relation": {relations, func(s *Settings, i int) { s.Rain.Impervious = Impervious(i) }},
}
