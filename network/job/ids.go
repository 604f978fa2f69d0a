package job

import (
	"hash/maphash"
	"slices"
	"strings"

	"rimfall/network/fault"
)

// ids gives identifiers their index and finds those that stand twice.
//
// It maps a hash of the text to the index and holds the texts themselves only
// where the rows do: a map keyed by a million texts costs three times as much to
// search, most of it waiting for memory. Two texts with one hash are told apart
// by the overflow.
type ids struct {
	seed     maphash.Seed
	index    map[uint64]int32
	overflow map[string]int32
	row      func(i int32) (id string, line int32)
	last     int32 // found by the last search
	rows     int32 // that are known to stand
}

// newIDs makes room for a number of rows; row gives the id and line of a row.
func newIDs(rows int, row func(i int32) (id string, line int32)) ids {
	return ids{seed: maphash.MakeSeed(), index: make(map[uint64]int32, rows), row: row}
}

// find gives the index of an id. The rows beside the last one found are tried
// first: files mostly name structures in the order in which they stand.
func (d *ids) find(text string) (int32, bool) {
	for _, i := range [...]int32{d.last, d.last + 1, d.last - 1} {
		if i >= 0 && i < d.rows {
			if id, _ := d.row(i); id == text && id != "" {
				d.last = i
				return i, true
			}
		}
	}
	i, ok := d.search(text)
	if ok {
		d.last = i
	}
	return i, ok
}

func (d *ids) search(text string) (int32, bool) {
	if d.index == nil { // of a table that could not be read
		return 0, false
	}
	if i, ok := d.index[maphash.String(d.seed, text)]; ok {
		if id, _ := d.row(i); id == text {
			return i, true
		}
		i, ok = d.overflow[text]
		return i, ok
	}
	return 0, false
}

// add judges the id of a new row, whose index is i. The text is copied.
func (d *ids) add(t *table, text string, i int) string {
	text = strings.TrimSpace(text)
	d.rows = int32(i) // the rows before this one
	if text == "" {
		t.faultAt("id", "id is blank: every row needs a name of its own")
		return ""
	}
	hash := maphash.String(d.seed, text)
	first, taken := d.index[hash]
	if taken {
		if id, line := d.row(first); id == text {
			t.faultAt("id", "id %q stands twice, first in line %d", text, line)
			return text
		}
	}
	text = strings.Clone(text)
	d.rows = int32(i) + 1
	if taken {
		if d.overflow == nil {
			d.overflow = map[string]int32{}
		}
		d.overflow[text] = int32(i)
		return text
	}
	d.index[hash] = int32(i)
	return text
}

// nearest words the known id that is closest to one that is not known; it looks at
// no more than a few thousand, since a file with a wrong column names an unknown
// structure in every row.
func (d *ids) nearest(text string) string {
	if d.rows > 5000 {
		return ""
	}
	var known []string
	for i := range d.rows {
		id, _ := d.row(i)
		known = append(known, id)
	}
	slices.Sort(known)
	if near, ok := fault.Nearest(text, known); ok {
		return "; did you mean \"" + near + "\"?"
	}
	return ""
}
