package units

import "strconv"

// Litres in a cubic metre, and cubic metres in a cubic foot (0.3048³).
const (
	litresPerCubicMetre     = 1000
	cubicMetresPerCubicFoot = 0.3048 * 0.3048 * 0.3048
)

// FlowUnits are the words for units of flow in which tables and drawings may be
// shown, whatever the system of the job.
var FlowUnits = []string{"cfs", "m3/s", "L/s"}

// FlowLabel is a unit of flow as it is printed.
func FlowLabel(unit string) string {
	if unit == "m3/s" {
		return "m³/s"
	}
	return unit
}

// ShowFlow prints a flow of the system s, cfs or m³/s, in a unit, with two
// decimals in cfs, three in m³/s, one in L/s.
func (s System) ShowFlow(flow float64, unit string) string {
	v, decimals := flow, 2
	if unit != "cfs" {
		decimals = 3
		if s.Name == US.Name {
			v *= cubicMetresPerCubicFoot
		}
		if unit == "L/s" {
			v, decimals = v*litresPerCubicMetre, 1
		}
	} else if s.Name == SI.Name {
		v /= cubicMetresPerCubicFoot
	}
	return strconv.FormatFloat(v, 'f', decimals, 64)
}
