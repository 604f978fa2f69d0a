package finding

// The sources of the rules: public manuals and codes, by what they were seen to
// ask. Limits differ by agency, so each is a setting.
const (
	common = "common practice"
)

var rules = []Rule{
	{
		"capacity", "over capacity",
		"the design flow is over the full-bore capacity at the pipe's own slope",
		"the pipe cannot carry the design storm with a free surface; water backs up into the structures above",
		Error, "", "Missouri DOT EPG 750.4; Mooresville IN code",
	},
	{
		"surcharge", "under pressure",
		"the grade line stands above the crown at an end of the pipe",
		"the joints leak and the water has less room left to the rim; many agencies want the design storm below the crown",
		Warning, "", "grade line at the crown: Mooresville IN code; drawn where above it: San Benito County CA 23.31.044",
	},
	{
		"flooding", "grade line above the rim",
		"the grade line at the structure stands above its rim; it is not cut off there, and no water is lost from the pipes below",
		"water comes out of the structure, or cannot get in; the flow that would stay outside is an estimate for this structure alone",
		Error, "", "below grate or rim: Mooresville IN code; Shepherdsville KY ch. 154",
	},
	{
		"freeboard", "too little freeboard",
		"the rim is less than the freeboard above the grade line",
		"the margin covers what the method leaves out: debris, waves, losses that are larger than reckoned",
		Error, "freeboard, size_for", "0.5 to 1 ft by agency: Colorado Springs CO DCM vol. 1 ch. 9; Apache Junction AZ 10-4-7",
	},
	{
		"depth-ratio", "deeper than allowed",
		"the depth at design flow is over the allowed part of the rise, though under full-bore capacity",
		"the spare height that the criteria keep for air and for growth is used up",
		Error, "max_depth_ratio", common,
	},
	{
		"no-size-carries", "no listed size carries the flow",
		"every size of the catalogue falls short of the design flow where the pipe must lie; the largest was taken",
		"more barrels, another shape or a steeper line is needed",
		Error, "catalog.csv", common,
	},
	{
		"grade-line-size", "larger for the grade line",
		"the pipe was enlarged beyond what its flow asks for, because the grade line broke the freeboard",
		"the reviewer sees which sizes the freeboard costs",
		Notice, "size_for", common,
	},
	{
		"adverse-slope", "level or rising pipe",
		"the slope is zero or the lower end is higher than the upper end",
		"such a pipe has no capacity of its own and runs only under a head from above; silt settles in it",
		Error, "", "Adams County IN code; Vernonia OR Public Works Design Standards section 3",
	},
	{
		"slope", "slope outside the limits",
		"the slope is under the least or over the greatest allowed",
		"flat pipes silt up and cannot be built true; steep ones scour and need anchors",
		Error, "min_slope, max_slope", "Colorado Springs CO DCM vol. 1 ch. 9; Corry PA code 154.134",
	},
	{
		"cleansing-velocity", "too slow to clean itself",
		"the velocity, flowing full or at design depth as velocity_basis says, is under the least",
		"sand and silt settle in the pipe and take its capacity",
		Error, "min_velocity, velocity_basis", "3 ft/s: Vernonia OR section 3; Texas DOT Hydraulic Design Manual ch. 10",
	},
	{
		"cleansing-shear", "too little shear to clean itself",
		"the boundary shear γRS at design depth is under the least",
		"shear, not velocity alone, is what moves grains along the bottom",
		Error, "min_shear", common,
	},
	{
		"high-velocity", "too fast",
		"the velocity at design flow and its normal depth is over the greatest allowed",
		"fast water with sand wears the invert, and makes joints, bends and outlets costly",
		Error, "max_velocity", "10 to 25 ft/s by agency: Adams County IN, Shepherdsville KY ch. 154",
	},
	{
		"cover", "too little or too much cover",
		"the height between the rim and the outside of the pipe, at an end that is no outfall, is under the least or over the greatest",
		"wheels break shallow pipes and other services have no room above them; deep trenches are costly and dangerous and need a stronger pipe",
		Error, "min_cover, max_cover", "least 1 to 3 ft by agency: Missouri DOT EPG 750.4; Lawrenceburg IN code 155.036",
	},
	{
		"cover-along-pipe", "too little or too much cover between structures",
		"the height between a level of ground.csv and the outside of the pipe below it is under the least or over the greatest; the worst place of each pipe is named",
		"covers at the two ends say nothing of a ditch or a fill between them",
		Error, "min_cover, max_cover, ground.csv", common,
	},
	{
		"crossing-clearance", "too close to a crossing service",
		"the upright gap between the outsides of the pipe and of a service of crossings.csv is under the least; negative where they meet",
		"a leak reaches a water main, and the load of the upper pipe passes to the lower one",
		Error, "min_clearance, crossings.csv", "18 in from water mains: Tolono IL code",
	},
	{
		"min-size", "smaller than the least size",
		"the rise is under the least that the criteria allow",
		"small pipes clog and cannot be inspected",
		Error, "min_size", "12 to 15 in by agency: Silverton OR 3.13; Corry PA code 154.134",
	},
	{
		"size-decrease", "smaller than a pipe that enters",
		"the full area of all barrels is less than that of the largest pipe into its upper structure, which is no split",
		"what the larger pipe washes along lodges at the narrower one, whatever the capacity",
		Error, "", common,
	},
	{
		"invert-order", "pipe out above a pipe in",
		"the invert of a pipe out of a structure is above the invert of a pipe in",
		"water stands in the structure and in the pipe that enters",
		Error, "", common,
	},
	{
		"least-fall", "too little fall through a structure",
		"the invert out lies less than the least fall below the lowest invert in",
		"the fall makes up for the loss of the structure and for the tolerances of building",
		Warning, "least_fall", "0.10 ft: Iowa SUDAS ch. 2",
	},
	{
		"size-change", "sizes change without lining up",
		"where the rise changes, the matched point of the pipe out (crown, invert or 0.8 of the rise) is above that of a pipe in",
		"the larger pipe backs water up into the smaller one",
		Warning, "size_change", "crowns: Vernonia OR section 3; 0.8 of the depth: Ten States Standards 2014 section 33",
	},
	{
		"lowest-invert", "below the lowest level allowed",
		"an end of the pipe lies below the lowest invert of its structure",
		"what stands there, a receiving bed or a crossing service, does not give way",
		Error, "lowest_invert", common,
	},
	{
		"bounds-cross", "levels that cannot all be kept",
		"the lower bound of the upper invert lies above what cover, matched points or least fall allow; the lower bound holds",
		"one of the given levels has to give",
		Warning, "lowest_invert, invert_upper, invert_lower", common,
	},
	{
		"drop-structure", "large fall through a structure",
		"a pipe enters higher above the lowest invert out than the greatest plain drop",
		"falling water wears the floor and makes entry unsafe; a drop structure is called for",
		Warning, "max_drop", "24 in: Ten States Standards 2014 section 34",
	},
	{
		"long-pipe", "structures too far apart",
		"the pipe is longer than the greatest distance between structures",
		"cleaning equipment does not reach farther",
		Warning, "max_spacing", "400 ft: Vernonia OR section 3; 500 ft: Silverton OR 3.17",
	},
	{
		"outlet-velocity", "fast outlet",
		"the velocity of a pipe into an outfall is over the velocity that needs no protection",
		"the bed below the outlet scours",
		Warning, "max_outlet_velocity", "6 ft/s: Shepherdsville KY ch. 154",
	},
	{
		"drowned-outfall", "drowned outfall",
		"the receiving water stands above the crown of the pipe at its outfall",
		"the pipe cannot drain by itself, silt settles, and the line above starts from the receiving water",
		Warning, "tailwater", common,
	},
	{
		"fast-bend", "fast water into a bend",
		"water faster than critical has to turn by more than 10 degrees, at the lower structure or along the pipe",
		"it climbs the outer wall, may choke the pipe out and wears the structure; no loss formula covers it",
		Warning, "", common,
	},
	{
		"angle-assumed", "angle not known",
		"neither coordinates nor the angle column tell how the pipe meets the pipe out; the largest pipe in was taken straight, others at 90 degrees",
		"the loss of the structure depends on it",
		Warning, "angle, x, y", common,
	},
	{
		"jump", "hydraulic jump",
		"the water changes from fast to slow flow in the pipe",
		"it mixes in air, shakes the joints and wears the invert where it stands",
		Notice, "", common,
	},
	{
		"low-tailwater", "receiving water below the pipe",
		"the tailwater of the outfall is below the invert of the pipe; the outfall was taken as free",
		"the fall to the receiving water may scour the bed, or the level may be on another datum",
		Notice, "tailwater", common,
	},
	{
		"grade-line-unknown", "no grade line",
		"a pipe below has no inverts, so that the level from which the line would start is not known",
		"what is not judged has to be looked at by hand",
		Notice, "pipes.csv invert_upper", common,
	},
	{
		"flow-falls", "peak falls downstream",
		"the peak of the pipe is less than that of a pipe that enters its upper structure, which is no split",
		"rational peaks belong to different moments; some reviewers want the larger one held (hold_upstream_peak)",
		Notice, "hold_upstream_peak", common,
	},
	{
		"rational-area", "large area for the Rational method",
		"the area upstream is over the size to which the method is trusted",
		"storage and the movement of the storm, which the method leaves out, begin to count",
		Notice, "max_rational_area", "20 to 200 acres by agency; 240: Vernonia OR section 3",
	},
	{
		"below-first-duration", "shorter than the rainfall table",
		"the time is shorter than the first duration; its intensity was used",
		"the true intensity is higher than the one used",
		Notice, "rainfall.csv", common,
	},
	{
		"time-assumed", "inlet time not given",
		"the area has no inlet time; the minimum time was used",
		"the shortest time gives the highest intensity, which is safe but may be wasteful",
		Notice, "areas.csv time", common,
	},
	{
		"rim-unknown", "no rim",
		"the structure has no rim; cover and freeboard are not judged there",
		"what is not judged has to be looked at by hand",
		Notice, "structures.csv rim", common,
	},
	{
		"levels-unknown", "no inverts",
		"the pipe has a slope and no inverts; its levels are not judged",
		"what is not judged has to be looked at by hand",
		Notice, "pipes.csv invert_upper", common,
	},
	{
		"wall-unknown", "no wall thickness",
		"the wall is neither given nor in the catalogue; cover counts from the inside of the crown",
		"the true cover is less by the wall",
		Notice, "pipes.csv wall, catalog.csv", common,
	},
	{
		"no-flow", "pipe without flow",
		"no area and no inflow drains to the pipe",
		"an area may be tied to the wrong structure",
		Notice, "areas.csv structure", common,
	},
	{
		"unused-outfall", "outfall that nothing reaches",
		"no pipe enters the outfall",
		"a pipe may be tied to the wrong structure",
		Notice, "pipes.csv to", common,
	},
	{
		"departure-unused", "departure that matches nothing",
		"no finding has the rule and subject of a row of departures.csv",
		"the design has changed, or the row names the wrong thing",
		Notice, "departures.csv", common,
	},
}
