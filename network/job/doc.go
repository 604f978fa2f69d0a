// Package job reads a job folder, job.toml and its CSV tables, into a network
// with its criteria, storm and rainfall, and writes a network back as a complete
// new job folder.
//
// Everything a user wrote is judged: each fault of each file is collected with
// its file, line and column, and all are reported together. Nothing is repaired
// silently and nothing that was given is changed.
//
// Sizes and walls come in inches or millimetres and become coherent feet or
// metres here, once; see package units for what keeps its own unit.
package job
