package review

import (
	"rimfall/network"
	"rimfall/network/job"
	"rimfall/network/report"
)

// settingColumns are the settings that a result rests on, by their keys in job.toml.
var settingColumns = []report.Column[job.Settings]{
	maybe("return_period", "design storm, years", report.Number, func(s *job.Settings) network.Maybe { return network.Some(s.Storm.ReturnPeriod) }),
	maybe("check_period", "check storm, years", report.Number, func(s *job.Settings) network.Maybe { return s.Storm.CheckPeriod }),
	wording("rainfall", "rainfall file", func(s *job.Settings) string { return s.Rainfall }),
	plain("minimum_time", "minimum time", report.Minutes, func(s *job.Settings) float64 { return s.Storm.MinimumTime }),
	plain("uplift", "uplift of intensities", report.Number, func(s *job.Settings) float64 { return s.Storm.Uplift }),
	plain("rational_factor", "factor of the Rational method", report.Slope, func(s *job.Settings) float64 { return s.Storm.RationalFactor }),
	plain("manning_factor", "Manning's unit constant", report.Number, func(s *job.Settings) float64 { return s.Storm.ManningFactor }),
	wording("travel_velocity", "velocity of the travel time", func(s *job.Settings) string { return network.TravelVelocities[s.Storm.Travel] }),
	wording("peak", "peak", func(s *job.Settings) string { return network.Peaks[s.Storm.Peak] }),
	wording("hold_upstream_peak", "upstream peaks held", func(s *job.Settings) string { return yesNo(s.Storm.HoldUpstreamPeak) }),
	wording("frequency_factor", "frequency factor on C", func(s *job.Settings) string { return yesNo(s.Storm.FrequencyFactor) }),
	wording("structure_loss", "losses at structures", func(s *job.Settings) string { return s.Grade.StructureLoss }),
	wording("outfall_start", "start at a free outfall", func(s *job.Settings) string { return s.Grade.OutfallStart }),
	wording("set", "set of criteria", func(s *job.Settings) string { return s.Criteria.Title }),
	maybe("min_cover", "least cover", report.Length, func(s *job.Settings) network.Maybe { return s.Criteria.MinCover }),
	maybe("max_cover", "greatest cover", report.Length, func(s *job.Settings) network.Maybe { return s.Criteria.MaxCover }),
	plain("min_slope", "least slope", report.Slope, func(s *job.Settings) float64 { return s.Criteria.MinSlope }),
	plain("max_slope", "greatest slope", report.Slope, func(s *job.Settings) float64 { return s.Criteria.MaxSlope }),
	wording("size_change", "lined up where sizes change", func(s *job.Settings) string { return s.Criteria.SizeChange.String() }),
	plain("least_fall", "least fall through a structure", report.Length, func(s *job.Settings) float64 { return s.Criteria.LeastFall }),
	plain("min_size", "least size", report.Size, func(s *job.Settings) float64 { return s.Criteria.MinRise * s.Units.SizeFactor }),
	plain("max_depth_ratio", "greatest depth over rise", report.Number, func(s *job.Settings) float64 { return s.Criteria.MaxDepthRatio }),
	wording("size_for", "sizes serve", func(s *job.Settings) string { return network.SizeFors[s.Criteria.SizeFor] }),
	plain("min_velocity", "cleansing velocity", report.Velocity, func(s *job.Settings) float64 { return s.Criteria.MinVelocity }),
	wording("velocity_basis", "held against it", func(s *job.Settings) string { return network.VelocityBases[s.Criteria.VelocityBasis] }),
	maybe("min_shear", "cleansing shear", report.Number, func(s *job.Settings) network.Maybe { return s.Criteria.MinShear }),
	plain("max_velocity", "greatest velocity", report.Velocity, func(s *job.Settings) float64 { return s.Criteria.MaxVelocity }),
	plain("freeboard", "freeboard", report.Length, func(s *job.Settings) float64 { return s.Criteria.Freeboard }),
	maybe("min_clearance", "least clearance of a crossing", report.Length, func(s *job.Settings) network.Maybe { return s.Criteria.MinClearance }),
	maybe("max_drop", "greatest plain drop", report.Length, func(s *job.Settings) network.Maybe { return s.Criteria.MaxDrop }),
	maybe("max_spacing", "greatest distance of structures", report.Length, func(s *job.Settings) network.Maybe { return s.Criteria.MaxSpacing }),
	maybe("max_outlet_velocity", "greatest outlet velocity", report.Velocity, func(s *job.Settings) network.Maybe { return s.Criteria.MaxOutletVelocity }),
	maybe("max_rational_area", "greatest area of the method", report.Area, func(s *job.Settings) network.Maybe { return s.Criteria.MaxRationalArea }),
}

func maybe(key, name string, q report.Quantity, value func(*job.Settings) network.Maybe) report.Column[job.Settings] {
	return report.Column[job.Settings]{Key: key, Head: []string{name}, Quantity: q, Value: func(s *job.Settings) report.Value { return report.M(value(s)) }}
}

func plain(key, name string, q report.Quantity, value func(*job.Settings) float64) report.Column[job.Settings] {
	return maybe(key, name, q, func(s *job.Settings) network.Maybe { return network.Some(value(s)) })
}

func wording(key, name string, value func(*job.Settings) string) report.Column[job.Settings] {
	return report.Column[job.Settings]{Key: key, Head: []string{name}, Quantity: report.Text, Value: func(s *job.Settings) report.Value { return report.T(value(s)) }}
}

func yesNo(v bool) string {
	if v {
		return "yes"
	}
	return "no"
}
