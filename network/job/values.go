package job

import (
	"maps"
	"slices"
	"strings"

	"rimfall/network"
	"rimfall/network/fault"
)

// sign says which numbers a field takes.
type sign int8

const (
	anySign sign = iota
	notNegative
	positive
)

// number reads a cell that may be blank; a blank or a fault gives "not given".
func (t *table) number(field, text string, s sign) network.Maybe {
	text = strings.TrimSpace(text)
	if text == "" {
		return network.Maybe{}
	}
	v, ok := parseNumber(text, t.comma)
	switch {
	case !ok:
		t.faultAt(field, "%s: %q is no number: %s", field, text, whyNoNumber(text, t.comma))
	case s == positive && v <= 0:
		t.faultAt(field, "%s = %s: it must be over 0", field, text)
	case s == notNegative && v < 0:
		t.faultAt(field, "%s = %s: it must not be negative", field, text)
	default:
		return network.Some(v)
	}
	return network.Maybe{}
}

// needed reads a cell that must not be blank.
func (t *table) needed(field, text string, s sign) float64 {
	if strings.TrimSpace(text) == "" {
		t.faultAt(field, "%s is blank: %s", field, "write a number")
		return 0
	}
	return t.number(field, text, s).V
}

// word reads a cell that takes one of a list of words; a blank gives the first.
func (t *table) word(field, text string, words []string) int {
	text = strings.TrimSpace(text)
	if text == "" {
		return 0
	}
	i := slices.Index(words, text)
	if i < 0 {
		i = slices.Index(words, strings.ToLower(text))
	}
	if i < 0 {
		t.faultAt(field, "%s: unknown word %q: %s", field, text, fault.Suggest(text, words))
		return 0
	}
	return i
}

// ids gives identifiers their index and finds those that stand twice.
type ids struct {
	index map[string]int32
	line  func(i int32) int32
}

func newIDs(rows int, line func(int32) int32) ids { return ids{make(map[string]int32, rows), line} }

// add judges the id of a new row, whose index is i. The text is copied.
func (d *ids) add(t *table, text string, i int) string {
	text = strings.TrimSpace(text)
	if text == "" {
		t.faultAt("id", "id is blank: every row needs a name of its own")
		return ""
	}
	if first, twice := d.index[text]; twice {
		t.faultAt("id", "id %q stands twice, first in line %d", text, d.line(first))
		return text
	}
	text = strings.Clone(text)
	d.index[text] = int32(i)
	return text
}

// nearest words the known id that is closest to one that is not known; it looks at
// no more than a few thousand, since a file with a wrong column names an unknown
// structure in every row.
func (d *ids) nearest(text string) string {
	if len(d.index) > 5000 {
		return ""
	}
	if near, ok := fault.Nearest(text, slices.Sorted(maps.Keys(d.index))); ok {
		return "; did you mean \"" + near + "\"?"
	}
	return ""
}

// structure looks up the structure that a cell names.
func (r *reader) structure(t *table, field, text string) network.StructureIndex {
	text = strings.TrimSpace(text)
	if i, ok := r.structures.index[text]; ok {
		return network.StructureIndex(i)
	}
	if len(r.structures.index) == 0 {
		return -1 // the table of structures could not be read or is empty, which is a fault already
	}
	if text == "" {
		t.faultAt(field, "%s is blank: name a structure", field)
		return -1
	}
	t.faultAt(field, "unknown structure %q%s", text, r.structures.nearest(text))
	return -1
}
