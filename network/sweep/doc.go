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
// With peaks by partial area the flow at a structure is the largest over all
// durations t, when of each area min(1, (t − τ)/t_inlet) counts, τ being its travel
// time in pipes down to here (HDS-2 eq. 5.31 is the case of two areas). Every area
// upstream has a say in every pipe, and yet no list of them is gone through: the
// moments at which areas begin to come in and are in stand in one tree for each
// branch, in order of time, with sums at every node; a pipe's travel time shifts
// the clock of the tree and nothing in it; trees that meet are joined; and the
// largest flow is found by branch and bound, since what counts only grows with
// time and rain only falls. A pipe costs some log² n steps, on a chain as well. Sums
// are taken in another order than one by one, which costs about 1e-16 times the
// longest time over the shortest inlet time.
//
// Peaks of different pipes happen at different moments, so they do not add. All
// of an area enters at its structure; nothing bypasses it. The structure of the
// method and its factors: HDS-2 (2nd ed. 2002) section 5.3, HEC-22 (3rd ed. 2009)
// section 7.2; the rules of this pass are those of the contract of job folders.
package sweep
