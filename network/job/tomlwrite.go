package job

import (
	"bytes"
	"regexp"
	"strconv"
)

// withNumber is the text of the file with another number as the value of a key.
func (d *document) withNumber(text []byte, key string, value float64) []byte {
	lines := bytes.SplitAfter(text, []byte("\n"))
	at := d.place[key]
	if at.Line < 1 || at.Line > len(lines) {
		return text
	}
	line := lines[at.Line-1]
	head := min(len(line), at.Column-1)
	changed := numberAfterEquals.ReplaceAll(line[head:], []byte("${1}"+strconv.FormatFloat(value, 'f', -1, 64)))
	lines[at.Line-1] = append(line[:head:head], changed...)
	return bytes.Join(lines, nil)
}

// numberAfterEquals is the value of a numeric key, with all that stands before it.
var numberAfterEquals = regexp.MustCompile(`^([^=]*=\s*)[-+0-9._eE]+`)
