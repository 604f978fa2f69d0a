package job

import (
	"hash/maphash"
	"math/bits"
	"slices"
	"strings"

	"rimfall/network/fault"
)

// ids gives identifiers their index and finds those that stand twice.
//
// It is a table of slots, searched from the place that the hash of a text names
// (linear probing), with a piece of the hash beside each index. The texts stand
// in the rows only: a map keyed by a million texts takes several times as long,
// most of it waiting for memory. The seed changes from run to run; no result
// depends on it.
type ids struct {
	seed  maphash.Seed
	slots []slot // a power of two, at least twice the rows; nil: the table could not be read
	row   func(i int32) (id string, line int32)
	last  int32 // found by the last search
	rows  int32 // that are known to stand
}

// slot is one place of the table; next is the index of a row and one, 0 in an empty slot.
type slot struct {
	tag  uint32
	next int32
}

// newIDs makes room for at most a number of rows; row gives the id and line of a row.
func newIDs(rows int, row func(i int32) (id string, line int32)) ids {
	return ids{seed: maphash.MakeSeed(), slots: make([]slot, 1<<bits.Len(uint(2*rows))), row: row}
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
	if d.slots == nil {
		return 0, false
	}
	at := d.place(text)
	return at.next - 1, at.next > 0
}

// place is the slot of a text: the one that holds it, or the empty one where it belongs.
func (d *ids) place(text string) *slot {
	hash := maphash.String(d.seed, text)
	tag, mask := uint32(hash>>32), uint64(len(d.slots)-1)
	for i := hash & mask; ; i = (i + 1) & mask {
		at := &d.slots[i]
		if at.next == 0 {
			at.tag = tag // counts only once next is set
			return at
		}
		if at.tag == tag {
			if id, _ := d.row(at.next - 1); id == text {
				return at
			}
		}
	}
}

// add judges the id of a new row, whose index is i. The text is copied.
func (d *ids) add(t *table, text string, i int) string {
	text = strings.TrimSpace(text)
	d.rows = int32(i) // the rows before this one
	if text == "" {
		t.faultAt("id", "id is blank: every row needs a name of its own")
		return ""
	}
	at := d.place(text)
	if at.next > 0 {
		_, line := d.row(at.next - 1)
		t.faultAt("id", "id %q stands twice, first in line %d", text, line)
		return text
	}
	at.next, d.rows = int32(i)+1, int32(i)+1
	return strings.Clone(text)
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
