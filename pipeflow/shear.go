package pipeflow

// Shear is the mean boundary shear stress of uniform flow, τ = γ R S (Chow 1959, section 7-4): gamma the specific weight
// of water (9806.65 N/m³, 62.4 lb/ft³), r the hydraulic radius, slope rise over run. The result is in Pa or lb/ft².
func Shear(gamma, r, slope float64) float64 { return gamma * r * slope }
