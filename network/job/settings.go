package job

import (
	"rimfall/network"
	"rimfall/network/units"
)

// Settings are what job.toml says, defaults filled in.
type Settings struct {
	Title    string
	Units    units.System
	Storm    network.Storm
	Criteria network.Criteria
	Grade    Grade
	Rainfall string // file name
	Rain     RainSettings
	FlowUnit string // in tables and drawings: "cfs", "m3/s" or "L/s"

	Unknown []float64 // numbers that stand for "not known" in a survey

	Files   map[string]string            // table → file name
	Columns map[string]map[string]string // table → field → heading
}

// Grade says how grade lines are found.
type Grade struct {
	StructureLoss string // "access-hole", "coefficient" or "none"
	OutfallStart  string // "midway" or "critical"
}

// The words of settings that are not numbers of their own type.
var (
	structureLosses = []string{"access-hole", "coefficient", "none"}
	outfallStarts   = []string{"midway", "critical"}
	unitNames       = []string{"us", "si"}
)

// tableFiles gives every table of a job its file name.
var tableFiles = map[string]string{
	"structures": "structures.csv",
	"pipes":      "pipes.csv",
	"areas":      "areas.csv",
	"rainfall":   "rainfall.csv",
	"departures": "departures.csv",
	"surfaces":   "surfaces.csv",
	"catalog":    "catalog.csv",
	"ground":     "ground.csv",
	"crossings":  "crossings.csv",
	"pieces":     "pieces.csv",
	"paths":      "paths.csv",
	"costs":      "costs.csv",
}

// defaults are the settings of an empty job.toml in a system of units.
func defaults(u units.System) Settings {
	s := Settings{
		Units:    u,
		Rainfall: tableFiles["rainfall"],
		Grade:    Grade{StructureLoss: structureLosses[0], OutfallStart: outfallStarts[0]},
		Storm: network.Storm{
			MinimumTime: 5, Uplift: 1,
			RationalFactor: u.RationalFactor, ManningFactor: u.ManningFactor,
		},
		Criteria: network.Criteria{
			MinSlope: 0.001, MaxSlope: 0.15, MaxDepthRatio: 1, N: 0.013,
		},
		Files:   map[string]string{},
		Columns: map[string]map[string]string{},
	}
	for table, file := range tableFiles {
		s.Files[table] = file
	}
	c := &s.Criteria
	if u.Name == units.SI.Name {
		s.FlowUnit = "m3/s"
		c.MinCover, c.LeastFall, c.MinRise = network.Some(0.3), 0.03, 0.3
		c.MinVelocity, c.MaxVelocity, c.Freeboard = 0.9, 4.5, 0.3
		c.MaxRationalArea = network.Some(80)
		c.MinClearance = network.Some(0.45)
	} else {
		s.FlowUnit = "cfs"
		c.MinCover, c.LeastFall, c.MinRise = network.Some(1), 0.1, 1
		c.MinVelocity, c.MaxVelocity, c.Freeboard = 3, 15, 1
		c.MaxRationalArea = network.Some(200)
		c.MinClearance = network.Some(1.5)
	}
	return s
}

// number is the range in which a numeric setting is accepted.
type number struct {
	set      func(*Settings, float64)
	low      float64
	high     float64
	openLow  bool // low itself is not accepted
	describe string
}

const huge = 1e300 // "no upper end"

// criteriaNumbers are the numeric keys of [criteria] and of a criteria set file.
var criteriaNumbers = map[string]number{
	"min_cover":       {func(s *Settings, v float64) { s.Criteria.MinCover = network.Some(v) }, -huge, huge, false, "a length"},
	"max_cover":       {func(s *Settings, v float64) { s.Criteria.MaxCover = network.Some(v) }, 0, huge, true, "a length over 0"},
	"min_slope":       {func(s *Settings, v float64) { s.Criteria.MinSlope = v }, 0, 1, true, "a slope, rise over run, over 0"},
	"max_slope":       {func(s *Settings, v float64) { s.Criteria.MaxSlope = v }, 0, 10, true, "a slope, rise over run, over 0"},
	"least_fall":      {func(s *Settings, v float64) { s.Criteria.LeastFall = v }, 0, huge, false, "a height, 0 or more"},
	"min_size":        {func(s *Settings, v float64) { s.Criteria.MinRise = v / s.Units.SizeFactor }, 0, huge, true, "a size over 0"},
	"max_depth_ratio": {func(s *Settings, v float64) { s.Criteria.MaxDepthRatio = v }, 0, 1, true, "a ratio over 0, at most 1"},
	"min_velocity":    {func(s *Settings, v float64) { s.Criteria.MinVelocity = v }, 0, huge, false, "a velocity, 0 or more"},
	"min_shear":       {func(s *Settings, v float64) { s.Criteria.MinShear = network.Some(v) }, 0, huge, false, "a shear, 0 or more"},
	"max_velocity":    {func(s *Settings, v float64) { s.Criteria.MaxVelocity = v }, 0, huge, true, "a velocity over 0"},
	"freeboard":       {func(s *Settings, v float64) { s.Criteria.Freeboard = v }, 0, huge, false, "a height, 0 or more"},
	"freeboard_check": {func(s *Settings, v float64) { s.Criteria.FreeboardCheck = network.Some(v) }, 0, huge, false, "a height, 0 or more"},
	"n":               {func(s *Settings, v float64) { s.Criteria.N = v }, 0, 1, true, "a Manning's n, over 0"},

	"max_drop":            {func(s *Settings, v float64) { s.Criteria.MaxDrop = network.Some(v) }, 0, huge, true, "a height over 0"},
	"max_spacing":         {func(s *Settings, v float64) { s.Criteria.MaxSpacing = network.Some(v) }, 0, huge, true, "a length over 0"},
	"min_clearance":       {func(s *Settings, v float64) { s.Criteria.MinClearance = network.Some(v) }, 0, huge, false, "a height, 0 or more"},
	"max_outlet_velocity": {func(s *Settings, v float64) { s.Criteria.MaxOutletVelocity = network.Some(v) }, 0, huge, true, "a velocity over 0"},
	"max_rational_area":   {func(s *Settings, v float64) { s.Criteria.MaxRationalArea = network.Some(v) }, 0, huge, true, "an area over 0"},
}

// stormNumbers are the numeric keys of [storm].
var stormNumbers = map[string]number{
	"return_period":   {func(s *Settings, v float64) { s.Storm.ReturnPeriod = v }, 0, huge, true, "a return period in years"},
	"check_period":    {func(s *Settings, v float64) { s.Storm.CheckPeriod = network.Some(v) }, 0, huge, true, "a return period in years"},
	"minimum_time":    {func(s *Settings, v float64) { s.Storm.MinimumTime = v }, 0, huge, true, "a time in minutes, over 0"},
	"uplift":          {func(s *Settings, v float64) { s.Storm.Uplift = v }, 0, huge, true, "a factor over 0"},
	"rational_factor": {func(s *Settings, v float64) { s.Storm.RationalFactor = v }, 0, huge, true, "a factor over 0"},
	"manning_factor":  {func(s *Settings, v float64) { s.Storm.ManningFactor = v }, 0, huge, true, "a factor over 0"},
}

// word is a setting that takes one of a list of words.
type word struct {
	words []string
	set   func(s *Settings, i int)
}

var criteriaWords = map[string]word{
	"size_change":    {network.SizeChanges, func(s *Settings, i int) { s.Criteria.SizeChange = network.SizeChange(i) }},
	"size_for":       {network.SizeFors, func(s *Settings, i int) { s.Criteria.SizeFor = network.SizeFor(i) }},
	"velocity_basis": {network.VelocityBases, func(s *Settings, i int) { s.Criteria.VelocityBasis = network.VelocityBasis(i) }},
}

var stormWords = map[string]word{
	"travel_velocity": {network.TravelVelocities, func(s *Settings, i int) { s.Storm.Travel = network.TravelVelocity(i) }},
	"peak":            {network.Peaks, func(s *Settings, i int) { s.Storm.Peak = network.Peak(i) }},
}

var gradeWords = map[string]word{
	"structure_loss": {structureLosses, func(s *Settings, i int) { s.Grade.StructureLoss = structureLosses[i] }},
	"outfall_start":  {outfallStarts, func(s *Settings, i int) { s.Grade.OutfallStart = outfallStarts[i] }},
}

var outputWords = map[string]word{
	"flow": {units.FlowUnits, func(s *Settings, i int) { s.FlowUnit = units.FlowUnits[i] }},
}

var stormSwitches = map[string]func(*Settings, bool){
	"hold_upstream_peak": func(s *Settings, v bool) { s.Storm.HoldUpstreamPeak = v },
	"frequency_factor":   func(s *Settings, v bool) { s.Storm.FrequencyFactor = v },
}
