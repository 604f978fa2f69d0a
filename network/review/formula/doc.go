// Package formula holds a formula as it is written on paper, such as
//
//	k/n × A × R^(2/3) × √S
//
// and gives its value, and how it looks with its symbols, with numbers and units in
// their place, and as MathML (W3C MathML Core, 2024).
//
// A formula has numbers, symbols, + − × / ^ √ and brackets, and the functions sin, cos,
// acos, exp, ln, min and max. Angles are in radians. A symbol is a word of letters and digits,
// with an index behind an underscore: y_c. Multiplication is always written.
package formula
