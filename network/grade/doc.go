// Package grade draws the hydraulic and the energy grade line of a whole network in one pass from the outfalls up, once
// the flows are known.
package grade
