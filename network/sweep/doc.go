// Package sweep passes once down a network, from its heads to its outfalls, and
// finds the time, the total ΣCA, the intensity and the peak flow at every
// structure and in every pipe, by the Rational method:
//
//	time at a structure = max(inlet times here, time + travel time of every pipe in, minimum time)
//	Q = factor · ΣCA · i(time) + steady inflows upstream
//
// Sizing is part of the pass where a pipe's size is blank, since the travel time,
// and with it every flow below, depends on the size just chosen.
//
// Peaks of different pipes happen at different moments, so they do not add. All
// of an area enters at its structure; nothing bypasses it. The structure of the
// method and its factors: HDS-2 (2nd ed. 2002) section 5.3, HEC-22 (3rd ed. 2009)
// section 7.2; the rules of this pass are those of the contract of job folders.
package sweep
