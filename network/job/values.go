package job

import (
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
	case t.isUnknown(field, v):
	case s == positive && v <= 0:
		t.faultAt(field, "%s = %s: it must be over 0", field, text)
	case s == positive && v < smallest:
		t.faultAt(field, "%s = %s: no %s is that small", field, text, field)
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

// structure looks up the structure that a cell names. Rows mostly follow the
// order of structures.csv, so the neighbours of the last one found are tried first.
func (r *reader) structure(t *table, field, text string) network.StructureIndex {
	text = strings.TrimSpace(text)
	if i, ok := r.structures.find(text); ok {
		return network.StructureIndex(i)
	}
	if known := r.tables["structures"]; r.structures.rows == 0 || known != nil && known.broken {
		return -1 // the table of structures could not be read whole, which is a fault already
	}
	if text == "" {
		t.faultAt(field, "%s is blank: name a structure", field)
		return -1
	}
	t.faultAt(field, "unknown structure %q%s", text, r.structures.nearest(text))
	return -1
}
