package main

import (
	"bytes"
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
)

// converter turns SVG to PDF and keeps text as text; converterPackage is Debian's name of the package that has it.
const (
	converter        = "rsvg-convert"
	converterPackage = "librsvg2-bin"
)

// toPDF makes one PDF of SVG pages, in their order and true size.
func toPDF(pages []outputFile) ([]byte, error) {
	program, err := exec.LookPath(converter)
	if err != nil {
		return nil, fmt.Errorf("--pdf needs %s, which is not on this machine; Debian has it in the package %s. Without --pdf the sheets are SVG", converter, converterPackage)
	}
	dir, err := os.MkdirTemp("", "rimfall-pdf-")
	if err != nil {
		return nil, err
	}
	defer os.RemoveAll(dir)
	args := []string{"--format=pdf"}
	for i, p := range pages {
		name := filepath.Join(dir, fmt.Sprintf("%d.svg", i))
		if err := os.WriteFile(name, p.content, 0o600); err != nil {
			return nil, err
		}
		args = append(args, name)
	}
	var pdf, words bytes.Buffer
	cmd := exec.Command(program, args...)
	cmd.Stdout, cmd.Stderr = &pdf, &words
	// Without this a PDF carries the time at which it was made, and no two would be alike (reproducible-builds.org).
	cmd.Env = append(os.Environ(), "SOURCE_DATE_EPOCH=0")
	if err := cmd.Run(); err != nil {
		return nil, fmt.Errorf("%s: %w: %s", converter, err, strings.TrimSpace(words.String()))
	}
	return pdf.Bytes(), nil
}
