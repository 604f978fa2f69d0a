package main

import (
	"bytes"
	"context"
	"image/png"
	"io"
	"os"
	"os/exec"
	"path/filepath"
	"testing"
	"time"
)

// TestDrawingsRenderInABrowser draws the sheets of an example and has a real
// browser render them: ink must stand in every quarter of the sheet.
func TestDrawingsRenderInABrowser(t *testing.T) {
	browser, err := exec.LookPath("chromium")
	if err != nil {
		t.Skip("needs chromium")
	}
	dir := t.TempDir()
	for name, args := range map[string][]string{
		"profile.svg": {"profile", "../../examples/orchard-rise", "--size", "--from", "Q-1"},
		"plan.svg":    {"plan", "../../examples/orchard-rise", "--size"},
	} {
		svg := filepath.Join(dir, name)
		if status := run(append(args, "--out", svg), nil, io.Discard, io.Discard); status != exitRan {
			t.Fatalf("%v: exit status %d", args, status)
		}
		quarters := inkByQuarter(t, screenshot(t, browser, dir, svg))
		for i, dark := range quarters {
			if dark == 0 {
				t.Errorf("%s: no ink in quarter %d of the sheet", name, i)
			}
		}
	}
}

// screenshot renders a page as a PNG.
func screenshot(t *testing.T, browser, dir, page string) []byte {
	t.Helper()
	picture := page + ".png"
	ctx, cancel := context.WithTimeout(context.Background(), 2*time.Minute)
	defer cancel()
	cmd := exec.CommandContext(ctx, browser, "--headless", "--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run",
		"--disable-background-networking", "--user-data-dir="+filepath.Join(dir, "browser"), "--hide-scrollbars",
		"--window-size=1700,1100", "--screenshot="+picture, "file://"+page)
	if out, err := cmd.CombinedOutput(); err != nil {
		t.Fatalf("%v\n%s", err, out)
	}
	text, err := os.ReadFile(picture)
	if err != nil {
		t.Fatal(err)
	}
	return text
}

// inkByQuarter counts dark points in the four quarters of a picture.
func inkByQuarter(t *testing.T, picture []byte) (dark [4]int) {
	t.Helper()
	img, err := png.Decode(bytes.NewReader(picture))
	if err != nil {
		t.Fatal(err)
	}
	b := img.Bounds()
	for y := b.Min.Y; y < b.Max.Y; y++ {
		for x := b.Min.X; x < b.Max.X; x++ {
			r, g, bl, _ := img.At(x, y).RGBA()
			if r+g+bl < 3*0x8000 {
				quarter := 0
				if x > b.Dx()/2 {
					quarter++
				}
				if y > b.Dy()/2 {
					quarter += 2
				}
				dark[quarter]++
			}
		}
	}
	return dark
}
