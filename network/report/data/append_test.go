package data

import (
	"encoding/csv"
	"encoding/json"
	"math"
	"strconv"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network/report"
)

func TestEveryNumberComesBackToTheLastBit(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		v := math.Float64frombits(rapid.Uint64().Draw(t, "bits"))
		text := appendNumber(nil, v)
		if !json.Valid(text) {
			t.Fatalf("%v is written %s, which is no JSON", v, text)
		}
		if math.IsNaN(v) || math.IsInf(v, 0) {
			return
		}
		back, err := strconv.ParseFloat(string(text), 64)
		if err != nil || math.Float64bits(back) != math.Float64bits(v) {
			t.Fatalf("%v is written %s and reads back as %v, %v", v, text, back, err)
		}
	})
}

func TestEveryTextComesBack(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		want := rapid.String().Draw(t, "text")
		var got string
		if err := json.Unmarshal(appendString(nil, want), &got); err != nil || got != want {
			t.Fatalf("%q is written %s and reads back as %q, %v", want, appendString(nil, want), got, err)
		}
	})
}

func TestTextsThatBreakJSONAreEscaped(t *testing.T) {
	for text, want := range map[string]string{
		`a "quoted" word`: `"a \"quoted\" word"`,
		`back\slash`:      `"back\\slash"`,
		"two\nlines":      `"two\nlines"`,
		"a\ttab":          `"a\u0009tab"`,
		"Straße":          `"Straße"`,
		"bad \xff byte":   `"bad ` + "\ufffd" + ` byte"`,
		"":                `""`,
	} {
		if got := string(appendString(nil, text)); got != want {
			t.Errorf("%q is written %s, want %s", text, got, want)
		}
	}
}

func TestCellsOfCSV(t *testing.T) {
	for text, want := range map[string]string{
		"plain":       "plain",
		"a, b":        `"a, b"`,
		`a "word"`:    `"a ""word"""`,
		"two\nlines":  "\"two\nlines\"",
		" blank":      `" blank"`,
		"=1+1":        "'=1+1", // a spreadsheet would run these
		"+49 30":      "'+49 30",
		"-5":          "'-5",
		"@here":       "'@here",
		"=SUM(A1,B2)": `"'=SUM(A1,B2)"`,
	} {
		if got := string(appendCell(nil, text)); got != want {
			t.Errorf("%q is written %s, want %s", text, got, want)
		}
	}
}

func TestRecordsOfCSVReadBack(t *testing.T) {
	text := func(r *string) report.Value { return report.T(*r) }
	columns := []report.Column[string]{{Key: "a", Value: text}, {Key: "b", Value: func(*string) report.Value { return report.N(-0.5) }}, {Key: "c", Value: func(*string) report.Value { return report.Value{} }}, {Key: "d", Value: text}}
	rapid.Check(t, func(t *rapid.T) {
		row := strings.ReplaceAll(rapid.String().Draw(t, "text"), "\r", "") // encoding/csv takes CRLF in quotes as LF
		record, err := csv.NewReader(strings.NewReader(string(appendRecord(nil, columns, &row)))).Read()
		want := row
		if row != "" && strings.ContainsRune("=+-@", rune(row[0])) {
			want = "'" + row
		}
		if err != nil || len(record) != 4 || record[0] != want || record[1] != "-0.5" || record[2] != "" || record[3] != want {
			t.Fatalf("%q reads back as %q, %v", row, record, err)
		}
	})
}
