package data

import (
	"io"

	"rimfall/network/report"
	"rimfall/pipeflow/catalog"
)

// SizesJSON writes a list of sizes as one object.
func SizesJSON(w io.Writer, sizes []catalog.Size) error {
	return objectOf(w, "sizes", list(plain(report.SizeColumns), sizes))
}

// SizesCSV writes a list of sizes.
func SizesCSV(w io.Writer, sizes []catalog.Size) error {
	return tableOf(w, list(plain(report.SizeColumns), sizes))
}

// MaterialsJSON writes the materials as one object.
func MaterialsJSON(w io.Writer, materials []catalog.Material) error {
	return objectOf(w, "materials", list(plain(report.MaterialColumns), materials))
}

// MaterialsCSV writes the materials.
func MaterialsCSV(w io.Writer, materials []catalog.Material) error {
	return tableOf(w, list(plain(report.MaterialColumns), materials))
}

// objectOf writes one array as an object.
func objectOf[R any](w io.Writer, key string, r rows[R]) error {
	s := newSink(w)
	s.add("{\"caution\":")
	s.b = appendString(s.b, report.Caution)
	writeArray(s, key, r)
	s.add("\n}\n")
	s.flush(true)
	return s.err
}

func tableOf[R any](w io.Writer, r rows[R]) error {
	s := newSink(w)
	writeCSV(s, r)
	return s.err
}
