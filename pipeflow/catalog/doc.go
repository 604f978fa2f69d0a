// Package catalog lists the standard sizes of drain pipe with their walls, and Manning's n by material.
//
// # Units
//
// A row keeps the unit of its trade: inches where Units is "us", millimetres where it is "si". [Size.Section] turns it
// into the coherent unit of package pipeflow, feet or metres.
//
// # Sources
//
// Every row names its standard (ASTM, AASHTO, EN) and where the figures were taken from. "from memory" means that the
// standard's own table was not at hand when the row was written: hold it against the standard before you rely on it.
// Walls of round concrete pipe follow the rule D/12 + 1 in (wall B) and D/12 + 1.75 in (wall C) that a pipe maker quotes
// from ASTM C76 for 12 to 96 in. Roughness comes from three agencies' tables, named at the head of materials.csv.
//
// What is known to be approximate:
//   - Ellipses of C507 are true ellipses here; the standard builds them of arcs, with mostly 2.5 to 4 percent more
//     area (30 x 19 in: 6).
//   - Arches of C506 and pipe-arches of M36 are built from the radii listed. Where the four published dimensions do not
//     close exactly, span and rise are kept. The smallest pipe-arches (17 x 13 to 28 x 20 in) come out 7 to 13 percent
//     larger in area than makers print; from 35 x 24 in on the difference is under 5 percent.
//   - Polyethylene and polyvinyl chloride are taken at their nominal inside diameter.
//   - Boxes of C1577 come as two series: corners taken square, as most hand calculations do, and with their haunches.
//
// # A user's own list
//
// [Parse] reads a list with the same columns and [Catalog.With] lays it over the standard one: a series of the same
// name is replaced, a new series is put first, so that sizes are chosen from it.
package catalog
