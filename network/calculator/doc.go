// Package calculator answers one question of uniform flow: of section, roughness,
// slope and state of flow exactly one is unknown, is found from the rest, and is
// handed back with its working in the order of a hand calculation: the section, the
// uniform flow, the critical state.
//
// The equation is Manning's, Q = (k/n) A R^(2/3) S^(1/2) (Chow, Open-Channel
// Hydraulics, 1959, eq. 5-6), the critical state Q²T/(gA³) = 1 (Chow 1959, eq. 4-3);
// both are solved by package pipeflow, whose pages state how exactly. Here the
// unknown is recognised, sizes are looked up in the catalogue, and refusals are
// worded in the units of the question.
//
// Lengths are in ft or m, pipe sizes in inches or millimetres, flows in cfs or m³/s,
// slopes rise over run. A section runs with a free surface or just full; flow under
// pressure, varied flow and losses are left out.
package calculator
