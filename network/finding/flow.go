package finding

import (
	"rimfall/network"
	"rimfall/network/size"
	"rimfall/network/sweep"
)

// The rules of flow and velocity.

func (j *judge) capacity() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if run.HasCapacity && run.Flow > run.Capacity {
			j.add("capacity", p.ID, network.Some(run.Flow), network.Some(run.Capacity),
				"design flow %s is over the full-bore capacity of %s", j.flow(run.Flow), j.flow(run.Capacity))
		}
	})
}

func (j *judge) depthRatio() {
	limit := j.Criteria.MaxDepthRatio
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if run.State != sweep.PartFull || limit >= 1 {
			return
		}
		if ratio := run.Depth / p.Section.Rise(); over(ratio, limit) {
			j.add("depth-ratio", p.ID, network.Some(ratio), network.Some(limit),
				"depth at design flow is %s of the rise, over %s", num(ratio, 3), num(limit, 3))
		}
	})
}

func (j *judge) noSizeCarries() {
	for _, r := range j.Remarks {
		if r.Kind == size.NoSizeCarries {
			j.add("no-size-carries", j.Network.Pipes[r.Pipe].ID, network.Some(r.Value), network.Some(r.Limit),
				"no size of the catalogue carries %s here; the largest, which was taken, carries %s", j.flow(r.Value), j.flow(r.Limit))
		}
	}
}

func (j *judge) cleansingVelocity() {
	limit := j.Criteria.MinVelocity
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		velocity, ok, what := run.Velocity, run.HasCapacity && run.State != sweep.Dry, "velocity at design flow"
		if j.Criteria.VelocityBasis == network.FullBore {
			velocity, ok, what = run.Capacity/p.FullArea(), run.HasCapacity, "velocity flowing full"
		}
		if ok && under(velocity, limit) {
			j.add("cleansing-velocity", p.ID, network.Some(velocity), network.Some(limit), "%s is %s, under %s", what, j.speed(velocity), j.speed(limit))
		}
	})
}

func (j *judge) cleansingShear() {
	limit := j.Criteria.MinShear
	if !limit.OK {
		return
	}
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if shear := run.Shear(p, j.Units.UnitWeight); shear.OK && under(shear.V, limit.V) {
			j.add("cleansing-shear", p.ID, shear, limit, "boundary shear at design depth is %s %s, under %s", num(shear.V, 3), j.Units.Shear, num(limit.V, 3))
		}
	})
}

func (j *judge) highVelocity() {
	limit := j.Criteria.MaxVelocity
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if run.State != sweep.Dry && over(run.Velocity, limit) {
			j.add("high-velocity", p.ID, network.Some(run.Velocity), network.Some(limit), "velocity at design flow is %s, over %s", j.speed(run.Velocity), j.speed(limit))
		}
	})
}

func (j *judge) outletVelocity() {
	limit := j.Criteria.MaxOutletVelocity
	if !limit.OK {
		return
	}
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		atOutfall := j.Network.Structures[p.To].Kind == network.Outfall
		if atOutfall && run.State != sweep.Dry && over(run.Velocity, limit.V) {
			j.add("outlet-velocity", p.ID, network.Some(run.Velocity), limit, "the pipe enters outfall %s at %s, over %s: the bed needs protection", j.id(p.To), j.speed(run.Velocity), j.speed(limit.V))
		}
	})
}

// flowFalls compares with the largest peak that enters; below a split flows fall
// for another reason.
func (j *judge) flowFalls() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if len(j.Network.PipesOut(p.From)) > 1 {
			return
		}
		for _, i := range j.Network.PipesIn(p.From) {
			if in := &j.Flows.Pipes[i]; over(in.Flow, run.Flow) {
				j.add("flow-falls", p.ID, network.Some(run.Flow), network.Some(in.Flow),
					"peak of %s is less than the %s of pipe %s above, whose shorter time has a higher intensity", j.flow(run.Flow), j.flow(in.Flow), j.Network.Pipes[i].ID)
				return
			}
		}
	})
}

// rationalArea names the first pipe on each way down whose area is over the limit.
func (j *judge) rationalArea() {
	limit := j.Criteria.MaxRationalArea
	if !limit.OK {
		return
	}
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if !over(run.Area, limit.V) {
			return
		}
		for _, i := range j.Network.PipesIn(p.From) {
			if over(j.Flows.Pipes[i].Area, limit.V) {
				return
			}
		}
		j.add("rational-area", p.ID, network.Some(run.Area), limit, "%s %s drain to the pipe, over the %s to which the Rational method is trusted",
			num(run.Area, 1), j.Units.Area, num(limit.V, 1))
	})
}

func (j *judge) belowFirstDuration() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if run.Rained() && run.BelowFirst {
			j.add("below-first-duration", p.ID, network.Some(run.Time), network.Maybe{},
				"the time of %s min is shorter than the first duration of the rainfall, whose intensity was used", num(run.Time, 2))
		}
	})
}

func (j *judge) noFlow() {
	j.eachPipe(func(p *network.Pipe, run *sweep.Pipe) {
		if run.State == sweep.Dry {
			j.add("no-flow", p.ID, network.Maybe{}, network.Maybe{}, "no area with runoff and no inflow drains to the pipe")
		}
	})
}
