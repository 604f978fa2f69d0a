// Package surface draws the water surface along one pipe: gradually varied flow between the water below it and, in a
// steep pipe, the critical depth at its upper end; the jump where the two meet; the stretches that run full.
//
// # Equations
//
//	gradually varied flow   dy/dx = (S0 - Sf) / (1 - Fr²)        Chow, Open-Channel Hydraulics, 1959, section 9-2
//	friction slope          Sf = (Q n / (k A R^(2/3)))²          Manning, Chow 1959, eq. 5-6
//	Froude number           Fr² = Q² T / (g A³)                  Chow 1959, eq. 4-3
//	specific force          M = Q²/(g A) + A ȳ                   Chow 1959, eq. 3-17
//	the jump                M above it = M below it              Chow 1959, section 15-1
//	full stretch            the pressure line rises upstream by Sf a unit of length
//
// Chow's section and equation numbers are from memory.
//
// In a full stretch the specific force is Q²/(gA) + A (h - (rise - ȳ)), h the height of the pressure line over the
// invert and ȳ the depth of the centroid below the crown: the same law with the water standing at h.
//
// # Method
//
// Distance is found by depth, dx = (1 - Fr²)/(S0 - Sf) dy, panel by panel with the seven-point Gauss–Kronrod rule.
// The depth is not the variable of integration: √(rise - y) is, because the width of a closed section goes to zero
// with that root at the crown, and, where the surface tends to normal depth, the logarithm of what is left to it,
// because there the distance grows like that logarithm. The seven values of a panel also give the depth at any place
// in it, by a series of Legendre polynomials, so neither the far end nor the jump costs further sections.
//
// # Regimes
//
//   - Mild, critical, horizontal or adverse slope, or a flow over what the pipe carries uniformly: from the lower end
//     up, starting at the water below or critical depth, the higher. A surface that meets the crown fills the pipe
//     above.
//   - Steep slope: from critical depth at the upper end down to normal depth. Water below that has more specific force
//     drives a jump up the pipe, at most to its upper end, which it drowns.
//   - A section with a flat roof has no critical depth for a flow that is fast even just below the roof; there its rise
//     stands for it.
//
// # How exact, and at what cost
//
// Against an independent solution (scipy, 136 stored cases: invented circles, boxes and ellipses of every regime, slopes -0.02 to
// 0.1) the depths at the ends differ by less than 5e-5 of the rise, and the place of a jump by less than 5e-5 of the length.
// Inside, against a sum of 20,000 steps, by less than 2e-4; in outlines with corners (arches, haunched boxes) 6e-4, off critical
// depth by 1 % of the rise. A profile measures a few dozen sections.
//
// # Units and limits
//
// Coherent units, feet and seconds or metres and seconds. Steady flow, hydrostatic pressure (slopes under 0.1), one
// roughness. Losses at structures, outfalls and bends are the caller's. A jump is a place without length.
package surface
