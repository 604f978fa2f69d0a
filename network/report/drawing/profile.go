package drawing

import (
	"fmt"
	"slices"

	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/fault"
)

// ProfileOptions say what is drawn. The zero value draws every line of the network on the paper usual for its units.
type ProfileOptions struct {
	Paper Paper
	From  string // id of a structure: only the way from there to its outfall

	// Along and Up fix the scales, as agencies do: 40 for 1 in = 40 ft, 500 for 1:500. Zero: chosen.
	Along, Up float64
}

// UnknownStructure says that a network has no such structure.
type UnknownStructure struct{ ID, Nearest string }

func (e UnknownStructure) Error() string {
	text := fmt.Sprintf("no structure %q", e.ID)
	if e.Nearest != "" {
		text += fmt.Sprintf("; did you mean %q?", e.Nearest)
	}
	return text
}

// Profiles draws the profiles of a run: a sheet for each line, or several where a line is too long for one. unknown names
// the lines of which no level is known, so that there is nothing to draw. The error is an
// [UnknownStructure] or a [NoScale].
func Profiles(result *analysis.Result, o ProfileOptions) (sheets []Sheet, unknown []string, err error) {
	r := newRun(result)
	if o.Paper.Name == "" {
		o.Paper, _ = PaperNamed("", r.units)
	}
	all, err := chosenLines(r, o.From)
	if err != nil {
		return nil, nil, err
	}
	var drawn []profileSheet
	for i := range all {
		l := &all[i]
		if _, _, ok := levels(r, l, part{0, len(l.pipes)}); !ok {
			unknown = append(unknown, l.title(r.Network))
			continue
		}
		parts, err := drawLine(r, l, o)
		if err != nil {
			return nil, nil, err
		}
		drawn = append(drawn, parts...)
	}
	for i := range drawn {
		drawn[i].finish(i, len(drawn))
		sheets = append(sheets, Sheet{drawn[i].file(), drawn[i].Canvas})
	}
	return sheets, unknown, nil
}

// chosenLines are the way from a structure, or all lines.
func chosenLines(r *run, from string) ([]line, error) {
	n := r.Network
	if from == "" {
		return lines(n), nil
	}
	i := slices.IndexFunc(n.Structures, func(s network.Structure) bool { return s.ID == from })
	if i < 0 {
		known := make([]string, len(n.Structures))
		for k := range known {
			known[k] = n.Structures[k].ID
		}
		near, _ := fault.Nearest(from, known)
		return nil, UnknownStructure{from, near}
	}
	l := lineFrom(n, &r.Design.Flows, network.StructureIndex(i))
	if len(l.pipes) == 0 {
		return nil, fmt.Errorf("no pipe leaves structure %s, so there is no way to draw", from)
	}
	return []line{l}, nil
}

// title names a line by its ends.
func (l *line) title(n *network.Network) string {
	upper, lower := l.structures[len(l.structures)-1], l.structures[0]
	text := fmt.Sprintf("line %s, from %s down to %s", l.name, n.Structures[upper].ID, n.Structures[lower].ID)
	if l.joins != "" {
		text += ", where it joins line " + l.joins
	}
	return text
}
