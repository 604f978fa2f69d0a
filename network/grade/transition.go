package grade

// BendLoss is the loss of a bend along a pipe that turns by a deflection in degrees, on the velocity head:
//
//	Hb = 0.0033 Δ V²/2g    (HEC-22 3rd ed. section 7.1.6.4, eq. 7-9, from memory)
func BendLoss(deflection, head float64) float64 { return 0.0033 * deflection * head }
