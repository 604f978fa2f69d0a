// Package drawing draws a run as an engineer puts it into a plan set: profiles along the lines of a network, and the plan.
// Each sheet is one SVG page of its true size on paper, in black and white: what a line is shows by its weight and its
// dashes, a material that is cut through by hatching, a finding by a numbered mark. Text stays text.
//
// Profile and Plan choose a customary scale and state it; profiles state their vertical exaggeration. A label never
// stands on another one: labels look for room, and what finds none is left to the table under the drawing or counted in a
// note, never printed over something else.
//
// The same run always gives the same bytes: no clock and no map order has a part in them.
package drawing
