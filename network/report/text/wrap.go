package text

import (
	"strings"
	"unicode/utf8"
)

// lineWidth is the width of running text in a terminal.
const lineWidth = 88

// wrapped prints a text after a label, further lines indented under it.
func (p *printer) wrapped(label, text string) {
	indent := "  " + label
	for _, l := range wrap(text, lineWidth-len(indent)) {
		p.line("%s%s", indent, l)
		indent = strings.Repeat(" ", utf8.RuneCountInString(indent))
	}
}

// wrap breaks a text at blanks into lines of at most width characters; a longer
// word stands alone.
func wrap(text string, width int) []string {
	var lines []string
	line := ""
	for _, word := range strings.Fields(text) {
		switch {
		case line == "":
			line = word
		case utf8.RuneCountInString(line)+1+utf8.RuneCountInString(word) <= width:
			line += " " + word
		default:
			lines, line = append(lines, line), word
		}
	}
	return append(lines, line)
}
