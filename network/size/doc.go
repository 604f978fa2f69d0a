// Package size chooses what a designer left blank in a pipe: its size from the
// catalogue, its slope and its inverts, under the criteria of the job.
//
// Every size is tried with its own slope and inverts, and the smallest that
// carries the peak there is taken. Cover, cleansing velocity, shear and greatest
// velocity act through the slope and the inverts; they are no reason for a
// larger pipe. Where no size carries the peak, the largest is taken.
//
//   - Upper invert: as high as the cover under the rim, the matched points of all
//     pipes in and the least fall below their inverts allow.
//   - Slope: the ground's where it serves, else the least that the criteria ask for;
//     never steeper than the greatest slope and velocity allow, the rest of the
//     ground's fall being taken by a drop at the upper structure.
//   - Lower bounds, from a lowest invert or a given invert downstream, win over all
//     of these.
//
// Inverts are chosen in whole hundredths of a foot or whole millimetres, rounded
// to the side on which every limit still holds. What was given is kept.
package size
