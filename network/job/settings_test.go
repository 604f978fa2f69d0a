package job_test

import (
	"math"
	"reflect"
	"testing"

	"rimfall/network"
	"rimfall/network/job"
)

func TestSettingsLeftOutHaveTheirDefaults(t *testing.T) {
	us := read(t, folder(t, ""), job.ToCheck).Settings
	si := read(t, folder(t, `
-- job.toml --
units = "si"
[storm]
return_period = 10
-- pipes.csv --
id,from,to,length,size,slope
P1,A,B,100,300,0.01
P2,B,O,100,375,0.01
`), job.ToCheck).Settings
	some := network.Some
	for _, c := range []struct {
		name            string
		us, si          any
		defaultU, defSI any
	}{
		{"minimum_time", us.Storm.MinimumTime, si.Storm.MinimumTime, 5.0, 5.0},
		{"uplift", us.Storm.Uplift, si.Storm.Uplift, 1.0, 1.0},
		{"rational_factor", us.Storm.RationalFactor, si.Storm.RationalFactor, 1.0, 1.0 / 360},
		{"manning_factor", us.Storm.ManningFactor, si.Storm.ManningFactor, 1.486, 1.0},
		{"travel_velocity", us.Storm.Travel, si.Storm.Travel, network.TravelPartFull, network.TravelPartFull},
		{"peak", us.Storm.Peak, si.Storm.Peak, network.LongestTime, network.LongestTime},
		{"hold_upstream_peak", us.Storm.HoldUpstreamPeak, si.Storm.HoldUpstreamPeak, false, false},
		{"frequency_factor", us.Storm.FrequencyFactor, si.Storm.FrequencyFactor, false, false},
		{"check_period", us.Storm.CheckPeriod, si.Storm.CheckPeriod, network.Maybe{}, network.Maybe{}},
		{"min_cover", us.Criteria.MinCover, si.Criteria.MinCover, some(1), some(0.3)},
		{"max_cover", us.Criteria.MaxCover, si.Criteria.MaxCover, network.Maybe{}, network.Maybe{}},
		{"min_slope", us.Criteria.MinSlope, si.Criteria.MinSlope, 0.001, 0.001},
		{"max_slope", us.Criteria.MaxSlope, si.Criteria.MaxSlope, 0.15, 0.15},
		{"size_change", us.Criteria.SizeChange, si.Criteria.SizeChange, network.MatchCrowns, network.MatchCrowns},
		{"least_fall", us.Criteria.LeastFall, si.Criteria.LeastFall, 0.1, 0.03},
		{"min_size", us.Criteria.MinRise, si.Criteria.MinRise, 1.0, 0.3},
		{"max_depth_ratio", us.Criteria.MaxDepthRatio, si.Criteria.MaxDepthRatio, 1.0, 1.0},
		{"size_for", us.Criteria.SizeFor, si.Criteria.SizeFor, network.ForCapacity, network.ForCapacity},
		{"min_velocity", us.Criteria.MinVelocity, si.Criteria.MinVelocity, 3.0, 0.9},
		{"velocity_basis", us.Criteria.VelocityBasis, si.Criteria.VelocityBasis, network.FullBore, network.FullBore},
		{"min_shear", us.Criteria.MinShear, si.Criteria.MinShear, network.Maybe{}, network.Maybe{}},
		{"max_velocity", us.Criteria.MaxVelocity, si.Criteria.MaxVelocity, 15.0, 4.5},
		{"freeboard", us.Criteria.Freeboard, si.Criteria.Freeboard, 1.0, 0.3},
		{"n", us.Criteria.N, si.Criteria.N, 0.013, 0.013},
		{"structure_loss", us.Grade.StructureLoss, si.Grade.StructureLoss, "access-hole", "access-hole"},
		{"outfall_start", us.Grade.OutfallStart, si.Grade.OutfallStart, "midway", "midway"},
		{"flow", us.FlowUnit, si.FlowUnit, "cfs", "m3/s"},
	} {
		if !reflect.DeepEqual(c.us, c.defaultU) || !reflect.DeepEqual(c.si, c.defSI) {
			t.Errorf("%s is %v and %v, want %v in us and %v in si", c.name, c.us, c.si, c.defaultU, c.defSI)
		}
	}
}

func TestATitleLeftOutIsTheNameOfTheFolder(t *testing.T) {
	j := read(t, folder(t, "-- job.toml --\n[storm]\nreturn_period = 10\n"), job.ToCheck)
	if j.Settings.Title != "001" { // what the testing package calls its folder
		t.Errorf("title %q", j.Settings.Title)
	}
}

// A set is shared by many jobs; what a job says itself goes before it.
func TestKeysOfTheJobOverrideItsCriteriaSet(t *testing.T) {
	c := read(t, folder(t, `
-- job.toml --
[storm]
return_period = 10
[criteria]
min_cover = 3
set = "town.toml"
-- town.toml --
title = "Town, invented"
min_cover = 2
min_slope = 0.004
size_change = "inverts"
min_size = 15
`), job.ToCheck).Settings.Criteria
	if c.Title != "Town, invented" || c.File != "town.toml" || c.MinCover != network.Some(3) || c.MinSlope != 0.004 ||
		c.SizeChange != network.MatchInverts || c.MinRise != 1.25 || c.MaxSlope != 0.15 {
		t.Errorf("criteria %+v", c)
	}
}

func TestALengthLeftOutIsTheDistanceInPlan(t *testing.T) {
	n := read(t, folder(t, `
-- structures.csv --
id,kind,x,y
A,,0,0
B,,30,40
O,outfall,30,100
-- pipes.csv --
id,from,to,length,size,slope
P1,A,B,,12,0.01
P2,B,O,61.5,15,0.01
`), job.ToCheck).Network
	if n.Pipes[0].Length != 50 || n.Pipes[1].Length != 61.5 {
		t.Errorf("lengths %v and %v, want 50 and 61.5", n.Pipes[0].Length, n.Pipes[1].Length)
	}
}

func TestTwoOfInvertsAndSlopeGiveTheThird(t *testing.T) {
	for _, c := range []struct {
		name, up, low, slope  string
		wantUp, wantLow, want float64
	}{
		{"both inverts", "95", "94", "", 95, 94, 0.01},
		{"the upper invert and the slope", "95", "", "0.01", 95, 94, 0.01},
		{"the lower invert and the slope", "", "94", "0.01", 95, 94, 0.01},
		{"all three, and the given slope is the hydraulic one within 0.02 ft", "95", "94.015", "0.01", 95, 94.015, 0.01},
		{"a rising pipe", "94", "95", "", 94, 95, -0.01},
	} {
		t.Run(c.name, func(t *testing.T) {
			p := read(t, folder(t, "-- pipes.csv --\nid,from,to,length,size,invert_upper,invert_lower,slope\nP1,A,B,100,12,"+c.up+","+c.low+","+c.slope+"\nP2,B,O,100,15,,,0.01\n"), job.ToCheck).Network.Pipes[0]
			near := func(m network.Maybe, want float64) bool { return m.OK && math.Abs(m.V-want) < 1e-12 }
			if !near(p.InvertUpper, c.wantUp) || !near(p.InvertLower, c.wantLow) || !near(p.Slope, c.want) {
				t.Errorf("inverts %v and %v, slope %v", p.InvertUpper, p.InvertLower, p.Slope)
			}
		})
	}
}

func TestTheNOfAPipeIsItsOwnElseItsMaterialsElseTheCriterions(t *testing.T) {
	n := read(t, folder(t, `
-- job.toml --
[storm]
return_period = 10
[criteria]
n = 0.015
-- pipes.csv --
id,from,to,length,size,slope,material,n
P1,A,B,100,12,0.01,hdpe,0.011
P2,B,O,100,15,0.01,,
P3,C,O,100,15,0.01,HDPE,
P4,D,O,100,15,0.01,oak,0.02
-- structures.csv --
id,kind
A,
B,
C,
D,
O,outfall
`), job.ToCheck).Network
	// hdpe: 0.012 in the list of materials (California HDM table 851.2).
	for i, want := range []float64{0.011, 0.015, 0.012, 0.02} {
		if n.Pipes[i].N != want {
			t.Errorf("pipe %s: n %v, want %v", n.Pipes[i].ID, n.Pipes[i].N, want)
		}
	}
	if n.Pipes[2].Material != "hdpe" || n.Pipes[3].Material != "oak" {
		t.Errorf("materials %q and %q", n.Pipes[2].Material, n.Pipes[3].Material)
	}
}

func TestASurfaceGivesTheRunoffCoefficient(t *testing.T) {
	n := read(t, folder(t, `
-- areas.csv --
id,structure,area,c,surface
a1,A,1,,Lawn
a2,A,1,0.5,lawn
-- surfaces.csv --
surface,c
lawn,0.2
`), job.ToCheck).Network
	if n.Areas[0].C != 0.2 || n.Areas[1].C != 0.5 {
		t.Errorf("C %v and %v, want 0.2 of the surface and the given 0.5", n.Areas[0].C, n.Areas[1].C)
	}
}
