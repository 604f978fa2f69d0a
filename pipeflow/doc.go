// Package pipeflow answers the questions of steady uniform and critical flow in one conduit: how wide, deep and fast
// water runs in a section, how much it carries, and at what depth.
//
// # Units
//
// Every function works in coherent units, feet and seconds or metres and seconds, and never converts. The unit enters
// in three places only: the Manning constant [Manning.Factor] (1 for metres, 1.486 for feet), the acceleration of
// gravity g, and the specific weight gamma of [Shear].
//
// # Equations
//
//	Manning      Q = (k/n) A R^(2/3) S^(1/2)      Chow, Open-Channel Hydraulics, 1959, eq. 5-6 and 5-7
//	critical     Q² T / (g A³) = 1                Chow 1959, eq. 4-3
//	Froude       F = V / √(g A/T)                 Chow 1959, eq. 1-14 with the hydraulic depth A/T
//	shear        τ = γ R S                        Chow 1959, section 7-4
//
// # Questions
//
//	how much, how fast at a depth      Manning.Flow, Velocity, FullFlow, FullVelocity
//	how deep                           Manning.NormalDepth, NormalDepths, DepthsOfVelocity
//	what slope, roughness, size        Manning.SlopeFor, SlopeForVelocity, RoughnessFor, ScaleFor, ScaleForVelocity, LengthFor
//	the most it carries                Manning.LargestFlow, LargestVelocity
//	critical state                     CriticalDepth, Froude, Manning.CriticalSlope
//	energy and jump                    SpecificEnergy, AlternateDepth, SpecificForce, ConjugateDepth
//	scour and deposit                  Shear
//	roughness that varies              Varying, Manning.PartFull, Manning.Composite, HortonN, LotterN
//	why there is no answer             Manning.WhyNoNormalDepth, WhyNoVelocityDepth, WhyNoCriticalDepth
//
// # Accuracy
//
// Every shape was compared with integrals in 30 digits at depths from 1e-6 to 0.99 of the rise: area, perimeter, top width
// and first moment differ by no more than 9e-15 of their value. Normal and critical depth were compared with an independent
// root finder on those integrals: no more than 3e-15. See [Manning.NormalDepth] and [CriticalDepth] for their own ranges.
//
// # What it leaves out
//
// Energy losses along a pipe, water surface profiles and anything that knows of a network.
package pipeflow
