// Package grade draws the hydraulic and the energy grade line of a whole network in one pass from the outfalls up, once the
// flows are known.
//
// # The pass
//
// Everything is of one barrel: flow over count, its area, its rise.
//
//   - Outfall. A mild, flat, adverse or overcharged pipe starts at the receiving water, or at the depth of a free outfall,
//     midway between critical depth and the crown or critical depth, where that is higher. A steep pipe leaves at its own
//     depth, unless the specific force of the receiving water drives a jump into it.
//   - Pipe. Gradually varied flow, full stretches and the jump, by package surface. A bend adds 0.0033 Δ V²/2g at the upper
//     end, where the water below reaches it.
//   - Structure. The level is the energy in the upper end of the pipe out and what the structure adds: nothing, a
//     coefficient on the velocity head, the FHWA access hole, or the momentum of a blind junction. Of several pipes out the
//     highest level holds. It is not cut off at the rim.
//   - Pipe in. Its depth y solves y + c V²/2g = level - invert, c = 0.6 with access holes (0.4 is the exit loss) and 1 with
//     coefficients and blind junctions. Where the level is too low for critical depth, or the pipe plunges from above the
//     energy in the structure, it ends at critical depth, a steep one at its own.
//
// No velocity of a rapid stream is carried through a structure; what it has over the level is lost there. What is lost
// between a pipe in and a pipe out is the sum of named parts, which [Lines.Account] lists.
//
// # Sources
//
// Chow, Open-Channel Hydraulics, 1959, for the surface; FHWA HEC-22, 3rd ed. 2009, section 7.1.6, for structures, with the
// Texas DOT Hydraulic Design Manual, chapter 10 section 8. Where neither settles a case the rule is marked common practice:
//
//   - an outfall's level is the receiving water or the water in the end of a pipe, the higher;
//   - a pipe without flow holds no level up with its invert where another pipe out carries water;
//   - of two pipes into a blind junction the straighter is the trunk;
//   - a structure with a coefficient of its own acts as with that method.
//
// # Limits
//
// Steady peaks, which do not happen at one moment; no storage; nothing leaves at a rim. Levels are not known where an invert
// is missing, nor upstream of there. A higher receiving water may lower a level upstream: part-full losses, inlet control and
// moving jumps do that.
package grade
