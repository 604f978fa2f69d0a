package data

import (
	"math"
	"strconv"
	"unicode/utf8"

	"rimfall/network/report"
)

// appendNumber writes a number in shortest round-trip form, in JSON's grammar.
func appendNumber(b []byte, v float64) []byte {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return append(b, "null"...) // cannot come from a run; JSON has no word for it
	}
	a := math.Abs(v)
	if a < 1e15 && v == math.Trunc(v) { // whole numbers are common, and quicker this way
		return strconv.AppendInt(b, int64(v), 10)
	}
	if a < 1e-6 || a >= 1e21 {
		return strconv.AppendFloat(b, v, 'e', -1, 64)
	}
	return strconv.AppendFloat(b, v, 'f', -1, 64)
}

const hexDigits = "0123456789abcdef"

// appendString writes a text as a JSON string.
func appendString(b []byte, s string) []byte {
	b = append(b, '"')
	for i := 0; i < len(s); {
		c := s[i]
		switch {
		case c == '"' || c == '\\':
			b = append(b, '\\', c)
		case c == '\n':
			b = append(b, '\\', 'n')
		case c < 0x20:
			b = append(b, '\\', 'u', '0', '0', hexDigits[c>>4], hexDigits[c&15])
		case c < utf8.RuneSelf:
			b = append(b, c)
		default:
			r, size := utf8.DecodeRuneInString(s[i:])
			b = utf8.AppendRune(b, r)
			i += size
			continue
		}
		i++
	}
	return append(b, '"')
}

// appendObject writes a row as a JSON object; cells without a value are left out.
func appendObject[R any](b []byte, columns []report.Column[R], row *R) []byte {
	b = append(b, '{')
	first := true
	for i := range columns {
		v := columns[i].Value(row)
		if !v.OK {
			continue
		}
		if !first {
			b = append(b, ',')
		}
		first = false
		b = append(b, '"')
		b = append(b, columns[i].Key...)
		b = append(b, '"', ':')
		if v.Text != "" {
			b = appendString(b, v.Text)
		} else {
			b = appendNumber(b, v.Number)
		}
	}
	return append(b, '}')
}

// appendRecord writes a row as a CSV record (RFC 4180, with LF).
func appendRecord[R any](b []byte, columns []report.Column[R], row *R) []byte {
	for i := range columns {
		if i > 0 {
			b = append(b, ',')
		}
		v := columns[i].Value(row)
		switch {
		case !v.OK:
		case v.Text != "":
			b = appendCell(b, v.Text)
		default:
			b = appendNumber(b, v.Number)
		}
	}
	return append(b, '\n')
}

// appendCell writes a text cell, in quotes where CSV needs them. A text that a
// spreadsheet would run as a formula gets an apostrophe before it.
func appendCell(b []byte, s string) []byte {
	if s != "" && (s[0] == '=' || s[0] == '+' || s[0] == '-' || s[0] == '@') {
		s = "'" + s
	}
	quote := false
	for i := range len(s) {
		if c := s[i]; c == ',' || c == '"' || c == '\n' || c == '\r' || c == ' ' && (i == 0 || i == len(s)-1) {
			quote = true
		}
	}
	if !quote {
		return append(b, s...)
	}
	b = append(b, '"')
	for i := range len(s) {
		if s[i] == '"' {
			b = append(b, '"')
		}
		b = append(b, s[i])
	}
	return append(b, '"')
}
