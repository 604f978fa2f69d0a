package text

import (
	"strings"
	"unicode/utf8"
)

// lineWidth is the width of running text in a terminal.
const lineWidth = 100

// wrapped prints a text after a label, further lines indented under it.
func (p *printer) wrapped(label, text string) {
	p.hanging("  "+label, text)
}

// hanging prints a text after a label, further lines under where it began.
func (p *printer) hanging(label, text string) {
	width := utf8.RuneCountInString(label)
	for _, l := range wrap(text, lineWidth-width) {
		p.line("%s%s", label, l)
		label = strings.Repeat(" ", width)
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
