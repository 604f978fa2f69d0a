package sweep

import (
	"rimfall/network"
	"rimfall/network/units"
)

// uniform finds how a pipe runs at its peak: at normal depth up to full-bore
// capacity, over it with the full area.
func (d *pass) uniform(p network.PipeIndex) {
	pipe, run := &d.n.Pipes[p], &d.flows.Pipes[p]
	run.Capacity, run.HasCapacity = pipe.Capacity(d.storm.ManningFactor)
	if run.Flow <= 0 {
		run.State = Dry
		return
	}
	barrel := run.Flow / float64(pipe.Count)
	if run.HasCapacity && run.Flow <= run.Capacity {
		depth, ok := pipe.Manning(d.storm.ManningFactor).NormalDepth(pipe.Section, barrel)
		if ok {
			run.State, run.Depth = PartFull, depth
			run.Velocity = barrel / pipe.Section.At(depth).Area
			return
		}
	}
	run.State, run.Depth = Full, pipe.Section.Rise()
	run.Velocity = run.Flow / pipe.FullArea()
}

// travel is the time that the water spends in a pipe, min, by the velocity that
// the job asks for; 0 where nothing flows.
func (d *pass) travel(p network.PipeIndex) {
	pipe, run := &d.n.Pipes[p], &d.flows.Pipes[p]
	if run.State == Dry {
		return
	}
	velocity := run.Velocity
	switch d.storm.Travel {
	case network.TravelFlowOverFullArea:
		velocity = run.Flow / pipe.FullArea()
	case network.TravelFullBore:
		velocity = run.Flow / pipe.FullArea()
		if run.HasCapacity {
			velocity = run.Capacity / pipe.FullArea()
		}
	}
	run.TravelTime = pipe.Length / velocity / units.SecondsPerMinute
}
