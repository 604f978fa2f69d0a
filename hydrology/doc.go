// Package hydrology answers how hard it rains, and how much of the rain arrives at a drain, and when.
//
// Rainfall is a Table of intensities by duration and return period, or an equation. For one storm either
// becomes an Intensity: intensity against duration. Durations are in minutes; intensities are in in/h or mm/h,
// whichever the table is in, and nothing here converts between them unless its name says so.
//
// The peak is that of the Rational method, Q = C·i·A: every drop that falls at the rate of the storm whose
// duration is the time of concentration. The method is for small areas without storage (agencies stop it at
// 20 to 200 acres). Losses other than C, hydrographs and storage are left out.
//
// The package knows nothing of networks, files' names or commands, and needs the standard library only.
package hydrology
