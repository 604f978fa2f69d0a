// Package rainfile reads rainfall as agencies publish it and as people keep it, recognised by its content:
//
//   - point files of NOAA Atlas 14 (US National Weather Service, Precipitation-Frequency Atlas of the United
//     States): depths or intensities, English or metric, partial-duration or annual-maximum, estimate and bounds
//     of the 90 % interval, as the server sends them and as spreadsheets save them again;
//   - the short-duration text of Environment and Climate Change Canada: annual maxima, the table of rates with
//     its 95 % limits, and the fitted power law;
//   - our own table (duration by return period) and our own list of annual maxima (year by duration).
//
// All of it becomes a hydrology.Table of intensities, with place, series and unit beside it. Bytes that are not
// valid UTF-8 are taken as Latin-1. What is wrong is a Fault with line and column, all of them in one go; what is
// only worth knowing is a Notice. The package opens no file and asks no server.
package rainfile
