// Package hydrology answers how hard it rains, and how much of the rain arrives at a drain, and when.
//
// Rainfall is a Table of intensities by duration and return period, or an Equation. For one storm either becomes
// an Intensity: intensity against duration. Durations are in minutes; intensities are in in/h or mm/h, whichever
// the table is in. Between durations a table is log–log; between return periods it is linear in ln T, or for annual
// maxima in Gumbel's variate −ln(−ln(1 − 1/T)). Below the first duration the first intensity holds, and the Range
// says so; beyond the last there is none.
//
// Equations are sums of a·T^m/(t + d)^e and its published relatives, or cubics of ln i in ln t, with the place's
// constants, units and range.
//
// Areas have a runoff coefficient, composite by area (FHWA HDS-2, 2nd ed. 2002, ch. 5), raised in rare storms by a
// frequency factor (HEC-22, 3rd ed. 2009, ch. 3).
//
// The time of concentration is worked out along a path: sheet flow by the kinematic wave (HEC-22, eq. 3-2) or the
// NRCS form (NEH 630, ch. 15), shallow concentrated flow, gutter, channel and pipe; or for a basin as a whole by
// Kirpich, FAA, NRCS lag, Kerby, Bransby Williams or Témez. Each Step keeps its formula, its numbers and the limits
// that it is outside of. Methods lists the sources.
//
// The peak is that of the Rational method, Q = C·i·A, either with all of the area at the longest time, or as the
// largest over all durations of what has had time to arrive (PartialArea; HDS-2, eq. 5.31 for two areas). The method
// is for small areas without storage (agencies stop it at 20 to 200 acres). Losses other than C, hydrographs and
// storage are left out.
//
// The package knows nothing of networks, files or commands, and needs the standard library only. Package rainfile
// reads the agencies' files, package fit makes tables and equations of measurements.
package hydrology
