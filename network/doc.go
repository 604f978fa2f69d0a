// Package network holds a storm drain as it was given: structures joined by
// pipes, the areas that drain to them, and the criteria that the design must
// meet. Nothing computed and nothing judged stands here.
//
// The network is a directed graph over its structures; Graph shows it to any
// gonum algorithm. Structures, pipes and areas are addressed by dense indexes,
// in the order of their files; identifiers matter only at both ends of a run.
//
// Lengths and levels are in the coherent unit of the job, feet or metres; areas
// in acres or hectares; times in minutes (see package units).
package network
