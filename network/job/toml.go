package job

import (
	"errors"
	"fmt"
	"strings"

	"github.com/pelletier/go-toml/v2"
	"github.com/pelletier/go-toml/v2/unstable"

	"rimfall/network/fault"
)

// document is a TOML file: every value by its dotted key, and where it stands.
type document struct {
	file   string
	values map[string]any
	keys   []string // in the order of the file
	place  map[string]unstable.Position
}

// parseTOML reads a file's text. The library stops at a syntax error, so there is
// at most one fault here; types and names are judged afterwards, all of them.
func parseTOML(file string, text []byte, faults *fault.List) document {
	d := document{file: file, values: map[string]any{}, place: map[string]unstable.Position{}}
	var tree map[string]any
	if err := toml.Unmarshal(text, &tree); err != nil {
		var bad *toml.DecodeError
		if errors.As(err, &bad) {
			line, column := bad.Position()
			faults.Add(file, line, column, "not valid TOML: %s", strings.TrimPrefix(bad.Error(), "toml: "))
		} else {
			faults.Add(file, 0, 0, "not valid TOML: %v", err)
		}
		return d
	}
	d.flatten("", tree)
	d.locate(text)
	return d
}

// flatten spreads the tables of the tree into dotted keys. The tables of a list
// are numbered: equation[0].shift.
func (d *document) flatten(prefix string, tree map[string]any) {
	for k, v := range tree {
		switch v := v.(type) {
		case map[string]any:
			d.flatten(prefix+k+".", v)
		case []any:
			for i, element := range v {
				if sub, ok := element.(map[string]any); ok {
					d.flatten(fmt.Sprintf("%s%s[%d].", prefix, k, i), sub)
				}
			}
			d.values[prefix+k] = v
		default:
			d.values[prefix+k] = v
		}
	}
}

// locate finds line and column of every key.
func (d *document) locate(text []byte) {
	var p unstable.Parser
	p.Reset(text)
	table := ""
	count := map[string]int{} // tables of a list, by its name
	for p.NextExpression() {
		e := p.Expression()
		switch e.Kind {
		case unstable.Table:
			table = numbered(parts(e.Key()), count) + "."
		case unstable.ArrayTable:
			name := parts(e.Key())
			above := numbered(name[:len(name)-1], count)
			if above != "" {
				above = "." + above
			}
			count[above+"."+name[len(name)-1]]++
			table = numbered(name, count) + "."
		case unstable.KeyValue:
			d.locateValue(&p, table, e)
		}
	}
}

// locateValue records one key, and for an inline table the keys in it.
func (d *document) locateValue(p *unstable.Parser, prefix string, e *unstable.Node) {
	key := prefix + strings.Join(parts(e.Key()), ".")
	switch value := e.Value(); value.Kind {
	case unstable.InlineTable:
		for it := value.Children(); it.Next(); {
			d.locateValue(p, key+".", it.Node())
		}
		return
	case unstable.Array:
		d.locateTables(p, key, value)
	}
	it := e.Key()
	if it.Next() {
		d.keys = append(d.keys, key)
		d.place[key] = p.Shape(it.Node().Raw).Start
	}
}

// locateTables finds the keys of the tables in a list that stands on one line.
func (d *document) locateTables(p *unstable.Parser, key string, list *unstable.Node) {
	i := 0
	for it := list.Children(); it.Next(); {
		element := it.Node()
		if element.Kind == unstable.Comment {
			continue
		}
		if element.Kind == unstable.InlineTable {
			for inner := element.Children(); inner.Next(); {
				d.locateValue(p, fmt.Sprintf("%s[%d].", key, i), inner.Node())
			}
		}
		i++
	}
}

func parts(it unstable.Iterator) []string {
	var names []string
	for it.Next() {
		names = append(names, string(it.Node().Data))
	}
	return names
}

// numbered is the dotted name of a table; where a part of it is a list, the last table of the list is meant.
func numbered(names []string, count map[string]int) string {
	name := ""
	for _, part := range names {
		name += "." + part
		if n := count[name]; n > 0 {
			name += fmt.Sprintf("[%d]", n-1)
		}
	}
	return strings.TrimPrefix(name, ".")
}

// fault records what is wrong with the value of a key.
func (d *document) fault(faults *fault.List, key, format string, args ...any) {
	at := d.place[key]
	faults.Add(d.file, at.Line, at.Column, format, args...)
}
