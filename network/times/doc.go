// Package times tells where the times of a run come from: for every area the
// flow path by which the water reaches its structure, step by step, and for every
// structure the branch whose water arrives last, and so governs.
//
// The formulas of the steps are those of package hydrology. A path that has sheet
// flow by the kinematic wave depends on the storm, so the inlet time of one area
// differs between the design storm and the check storm.
package times
