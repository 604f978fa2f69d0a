package network

import "rimfall/pipeflow"

// Manning is Manning's equation for one barrel of the pipe.
func (p *Pipe) Manning(factor float64) pipeflow.Manning {
	return pipeflow.Manning{Factor: factor, N: p.N, Slope: p.Slope.V}
}

// Capacity is the full-bore capacity of all barrels, cfs or m³/s; there is none
// where the pipe does not fall to its lower end. The largest discharge, near
// 0.94 of a diameter, is never counted on.
func (p *Pipe) Capacity(factor float64) (flow float64, ok bool) {
	if !p.Slope.OK || p.Slope.V <= 0 {
		return 0, false
	}
	return float64(p.Count) * p.Manning(factor).FullFlow(p.Section), true
}
