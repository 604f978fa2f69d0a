package job

import (
	"fmt"
	"slices"
	"strconv"
	"strings"

	"rimfall/network"
)

// Surveys of older drains write 0 or 9999, or leave a cell blank, where a value is not known.
// What is not known is never filled in silently: an invert of an existing pipe is taken from the
// straight line between known ones, n from the criteria, and each is an assumption that is printed.

// unknownFields are the columns in which a value of [unknown] means "not known". A slope is not
// among them, since a pipe may be level.
var unknownFields = map[string][]string{
	"structures": {"rim", "tailwater", "tailwater_check", "lowest_invert"},
	"pipes":      {"size", "n", "invert_upper", "invert_lower", "wall"},
	"areas":      {"time"},
}

// unknownMaterial is the word of a survey for a material that is not known.
const unknownMaterial = "unknown"

// readUnknown reads the values of [unknown].
func (r *reader) readUnknown(d document, s *Settings) {
	const key = "unknown.values"
	v, ok := d.values[key]
	if !ok {
		return
	}
	list, isList := v.([]any)
	if !isList {
		list = []any{v}
	}
	for _, item := range list {
		x, ok := asNumber(item)
		if !ok {
			d.fault(&r.faults, key, "values takes numbers that stand for \"not known\", such as [0, 9999], not %s", kindOf(item))
			return
		}
		s.Unknown = append(s.Unknown, x)
	}
}

// isUnknown tells whether a cell's number stands for "not known".
func (t *table) isUnknown(field string, v float64) bool {
	return slices.Contains(t.unknown, v) && slices.Contains(unknownFields[t.name], field)
}

// unlessUnknown is a cell's text, blank where it stands for "not known".
func (t *table) unlessUnknown(field, text string) string {
	if len(t.unknown) == 0 {
		return text
	}
	if v, ok := parseNumber(strings.TrimSpace(text), t.comma); ok && t.isUnknown(field, v) {
		return ""
	}
	return text
}

// assume fills in what is not known of existing pipes and lists it.
func (r *reader) assume() {
	n := r.network
	unknown := false
	for i := range n.Pipes {
		p := &n.Pipes[i]
		if p.Existing && p.AssumedN {
			n.Assumptions = append(n.Assumptions, network.Assumption{
				Pipe: network.PipeIndex(i), What: "n", Value: p.N, Because: "neither n nor material is given: n of the criteria",
			})
		}
		unknown = unknown || lacksLevels(p)
	}
	if !unknown {
		return // most jobs: nothing is looked for
	}
	if up, down, ok := n.KnownInverts(); ok {
		r.assumeInverts(up, down)
	}
}

// lacksLevels tells whether an existing pipe has neither both inverts nor a slope.
func lacksLevels(p *network.Pipe) bool { return p.Existing && !p.Slope.OK && p.Length > 0 }

// assumeInverts takes the inverts that lie between known ones. All are found before one is set:
// what is assumed is no known level.
func (r *reader) assumeInverts(up, down [][2]network.Reach) {
	n := r.network
	var levels []network.Assumption
	for i := range n.Pipes {
		if !lacksLevels(&n.Pipes[i]) {
			continue
		}
		for _, e := range []network.End{network.Upper, network.Lower} {
			if a, ok := r.between(network.PipeIndex(i), e, up[i][e], down[i][e]); ok {
				levels = append(levels, a)
			}
		}
	}
	for _, a := range levels {
		p := &n.Pipes[a.Pipe]
		if a.What == invertWords[network.Upper] {
			p.InvertUpper, p.AssumedUpper = network.Some(a.Value), true
		} else {
			p.InvertLower, p.AssumedLower = network.Some(a.Value), true
		}
		if p.InvertUpper.OK && p.InvertLower.OK {
			p.Slope = network.Some((p.InvertUpper.V - p.InvertLower.V) / p.Length)
		}
	}
	n.Assumptions = append(n.Assumptions, levels...)
}

var invertWords = [...]string{network.Upper: "invert, upper end", network.Lower: "invert, lower end"}

// between is the assumption of an invert that is not known.
func (r *reader) between(p network.PipeIndex, e network.End, up, down network.Reach) (network.Assumption, bool) {
	level := network.Between(up, down)
	if r.network.Pipes[p].Invert(e).OK || !level.OK {
		return network.Assumption{}, false
	}
	return network.Assumption{
		Pipe: p, What: invertWords[e], Value: level.V, Unit: r.settings.Units.Length,
		Because: fmt.Sprintf("on the line from %s to %s", r.reachWords(up, "up"), r.reachWords(down, "down")),
	}, true
}

func (r *reader) reachWords(at network.Reach, way string) string {
	number := func(v float64) string { return strconv.FormatFloat(v, 'f', -1, 64) }
	return fmt.Sprintf("%s (%s, %s end, %.2f %s %s)", number(at.Level), r.network.Pipes[at.Pipe].ID, at.End, at.Distance, r.settings.Units.Length, way)
}

// judgeSlopes finds existing pipes that are to be checked and have no slope: neither given nor
// on a line between known inverts.
func (r *reader) judgeSlopes(j *Job) {
	if r.purpose != ToCheck {
		return
	}
	for i := range r.network.Pipes {
		p := &r.network.Pipes[i]
		if lacksLevels(p) {
			r.faults = append(r.faults, j.Locate(network.Problem{
				Table: "pipes", Line: int(p.Line), Field: "slope",
				Text: fmt.Sprintf("pipe %s has no slope, and its inverts do not lie between known ones of existing pipes: write the slope or both inverts, or a known invert farther up and farther down", p.ID),
			}))
		}
	}
}
