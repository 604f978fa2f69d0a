package rainfile

import (
	"regexp"
	"strconv"
	"strings"
	"unicode/utf8"
)

// page is a file as lines of text, without line ends and byte-order mark.
type page struct {
	lines     []string
	separator rune
}

func newPage(content []byte) page {
	text := strings.TrimPrefix(decode(content), "\ufeff")
	text = strings.ReplaceAll(strings.ReplaceAll(text, "\r\n", "\n"), "\r", "\n")
	p := page{lines: strings.Split(text, "\n"), separator: ','}
	// A spreadsheet saves with semicolons or tabs where the comma is the decimal sign.
	for _, line := range p.lines {
		if heading.MatchString(line) {
			if i := strings.IndexAny(line, ",;\t"); i >= 0 {
				p.separator = rune(line[i])
			}
			break
		}
	}
	return p
}

// heading is a line that heads a table: of durations, of periods, or of years.
var heading = regexp.MustCompile(`(?i)^[ "]*(by duration for|duration|year)\b|[,;\t] *"?(duration|year)\b`)

// decode takes bytes that are not valid UTF-8 as Latin-1, in which every byte is the character of its number.
func decode(content []byte) string {
	if utf8.Valid(content) {
		return string(content)
	}
	var text strings.Builder
	for _, b := range content {
		text.WriteRune(rune(b))
	}
	return text.String()
}

// cell is the text between two separators, trimmed, without quotes; Column is where it starts, in characters.
type cell struct {
	text   string
	line   int
	column int
}

// cells splits a line, which counts from 0. Separators within quotes do not count. Empty cells at the end are
// dropped: spreadsheets pad every line to the longest.
func (p page) cells(line int) []cell {
	var cells []cell
	var text strings.Builder
	start, quoted := 1, false
	characters := []rune(p.lines[line])
	for k := 0; k <= len(characters); k++ {
		switch {
		case k == len(characters) || characters[k] == p.separator && !quoted:
			cells = append(cells, trimmed(text.String(), line+1, start))
			text.Reset()
			start = k + 2
		case characters[k] == '"':
			quoted = !quoted
		default:
			text.WriteRune(characters[k])
		}
	}
	for len(cells) > 0 && cells[len(cells)-1].text == "" {
		cells = cells[:len(cells)-1]
	}
	return cells
}

func trimmed(text string, line, column int) cell {
	left := strings.TrimLeft(text, " \t\u00a0")
	column += utf8.RuneCountInString(text) - utf8.RuneCountInString(left)
	return cell{strings.TrimSpace(left), line, column}
}

// plainNumber is a number as people write it: no words, no hexadecimal, no underscores.
var plainNumber = regexp.MustCompile(`^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d{1,3})?$`)

// number reads a cell; a decimal comma is one only where commas do not separate. Not ok for anything else.
func (p page) number(text string) (float64, bool) {
	if p.separator != ',' {
		text = strings.Replace(text, ",", ".", 1)
	}
	if !plainNumber.MatchString(text) {
		return 0, false
	}
	x, err := strconv.ParseFloat(text, 64)
	return x, err == nil
}
