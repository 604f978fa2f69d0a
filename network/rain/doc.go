// Package rain shows a rainfall file by itself: its table, the equations that fit
// the table and by how much they miss it, and the distributions that fit its
// annual maxima, with confidence limits and how well each fits.
package rain
