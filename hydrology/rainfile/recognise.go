package rainfile

import (
	"regexp"
	"strings"
)

var (
	atlas14Words = regexp.MustCompile(`(?i)NOAA Atlas|point precipitation frequency|by duration for (ARI|AEP)`)
	canadaWords  = regexp.MustCompile(`(?i)Environment and Climate Change Canada|Environment Canada|Short Duration Rainfall Intensity-Duration-Frequency`)
	// A row of an Atlas 14 file: 5-min: … 60-day:
	atlas14Row = regexp.MustCompile(`(?i)^[ "]*(\d+)-(min|hr|day)\b`)
	// What the Atlas 14 server sends for a point outside its coverage: result = 'none'; ErrorMsg = '…';
	errorAnswer = regexp.MustCompile(`(?is)result\s*=\s*'none'|ErrorMsg\s*=`)
	errorWords  = regexp.MustCompile(`(?is)ErrorMsg\s*=\s*['"](.*?)['"]\s*;`)
	webPage     = regexp.MustCompile(`(?i)<!doctype|<html`)
)

// recognise says what a page is by its own words, not by a file's name or a line's number. Comments do not count:
// a table of one's own names its source there.
func (p page) recognise() Kind {
	text := p.words()
	switch {
	case errorAnswer.MatchString(text) || webPage.MatchString(text):
		return Unknown
	case canadaWords.MatchString(text):
		return Canada
	case atlas14Words.MatchString(text):
		return Atlas14
	}
	return p.recogniseTable()
}

// words are the lines that are no comments.
func (p page) words() string {
	var text strings.Builder
	for _, line := range p.lines {
		if !strings.HasPrefix(strings.TrimLeft(line, " \t\""), "#") {
			text.WriteString(line + "\n")
		}
	}
	return text.String()
}

// recogniseTable looks at the first line past comments and blanks, which heads a table, and for rows of Atlas 14
// whose head somebody replaced by a heading of his own.
func (p page) recogniseTable() Kind {
	kind, headed := Unknown, false
	for k, line := range p.lines {
		if atlas14Row.MatchString(line) {
			return Atlas14
		}
		if headed || blankOrComment(line) {
			continue
		}
		headed = true
		for _, c := range p.cells(k) {
			switch strings.ToLower(c.text) {
			case "duration":
				kind = OwnTable
			case "year":
				kind = OwnMaxima
			}
		}
	}
	return kind
}

func blankOrComment(line string) bool {
	plain := strings.Trim(line, " \t,;\"")
	return plain == "" || strings.HasPrefix(plain, "#")
}

// refusal says why an unknown page is not read.
func (p page) refusal() string {
	text := strings.Join(p.lines, "\n")
	if errorAnswer.MatchString(text) {
		reason := "it gives no reason"
		if words := errorWords.FindStringSubmatch(text); words != nil {
			reason = "it says: " + strings.Join(strings.Fields(words[1]), " ")
		}
		return "this is the server's refusal saved as a file, and no rainfall; " + reason
	}
	if webPage.MatchString(text) {
		return "this is a web page, and no rainfall file; save the page's table as CSV or text"
	}
	return "the file is of an unknown kind; looked for were a NOAA Atlas 14 point file (by duration for ARI …), " +
		"an Environment Canada short-duration text (Table 2b …), and a CSV table headed duration or year"
}
