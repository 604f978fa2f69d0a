package job

import (
	"errors"
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

// flatten spreads the tables of the tree into dotted keys.
func (d *document) flatten(prefix string, tree map[string]any) {
	for k, v := range tree {
		if sub, ok := v.(map[string]any); ok {
			d.flatten(prefix+k+".", sub)
			continue
		}
		d.values[prefix+k] = v
	}
}

// locate finds line and column of every key.
func (d *document) locate(text []byte) {
	var p unstable.Parser
	p.Reset(text)
	table := ""
	for p.NextExpression() {
		e := p.Expression()
		switch e.Kind {
		case unstable.Table, unstable.ArrayTable:
			table = dotted(e.Key()) + "."
		case unstable.KeyValue:
			d.locateValue(&p, table, e)
		}
	}
}

// locateValue records one key, and for an inline table the keys in it.
func (d *document) locateValue(p *unstable.Parser, prefix string, e *unstable.Node) {
	key := prefix + dotted(e.Key())
	if value := e.Value(); value.Kind == unstable.InlineTable {
		for it := value.Children(); it.Next(); {
			d.locateValue(p, key+".", it.Node())
		}
		return
	}
	it := e.Key()
	if it.Next() {
		d.keys = append(d.keys, key)
		d.place[key] = p.Shape(it.Node().Raw).Start
	}
}

func dotted(it unstable.Iterator) string {
	var parts []string
	for it.Next() {
		parts = append(parts, string(it.Node().Data))
	}
	return strings.Join(parts, ".")
}

// fault records what is wrong with the value of a key.
func (d *document) fault(faults *fault.List, key, format string, args ...any) {
	at := d.place[key]
	faults.Add(d.file, at.Line, at.Column, format, args...)
}
