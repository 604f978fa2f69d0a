package main

import (
	"bytes"
	"strings"
	"testing"
)

// Where the converter is missing, the message says which package has it, and no output comes.
func TestPDFWithoutItsConverterSaysWhereToGetIt(t *testing.T) {
	t.Setenv("PATH", t.TempDir())
	var out, words bytes.Buffer
	status := run([]string{"plan", "../../testdata/drawing/ferry-bank", "--size", "--pdf"}, strings.NewReader(""), &out, &words)
	if status != exitInput || out.Len() > 0 {
		t.Errorf("status %d, %d bytes of output", status, out.Len())
	}
	if text := words.String(); !strings.Contains(text, "rsvg-convert") || !strings.Contains(text, "librsvg2-bin") {
		t.Errorf("said %q", text)
	}
}
