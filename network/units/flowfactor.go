package units

// FlowFactor brings a flow of the system into one of the FlowUnits.
func (s System) FlowFactor(unit string) float64 {
	factor := 1.0
	switch {
	case s.Name == US.Name && unit != "cfs":
		factor = cubicMetresPerCubicFoot
	case s.Name == SI.Name && unit == "cfs":
		factor = 1 / cubicMetresPerCubicFoot
	}
	if unit == "L/s" {
		factor *= litresPerCubicMetre
	}
	return factor
}
