package page_test

import (
	"bytes"
	"encoding/xml"
	"errors"
	"io"
	"strings"
	"testing"

	"rimfall/network/analysis"
	"rimfall/network/report/page"
	"rimfall/network/review"
)

func pageOf(t *testing.T, dir, id string) string {
	t.Helper()
	o := analysis.Options{}
	j, err := analysis.Read(dir, o)
	if err != nil {
		t.Fatal(err)
	}
	r, err := analysis.Run(j, o)
	if err != nil {
		t.Fatal(err)
	}
	pages, err := review.Explain(r, id)
	if err != nil {
		t.Fatal(err)
	}
	var b bytes.Buffer
	if err := page.Explain(&b, r, pages); err != nil {
		t.Fatal(err)
	}
	return b.String()
}

// Read as XML, so that an element that is left open or a sign that is not escaped is found.
func TestThePageIsWellFormedAndStandsByItself(t *testing.T) {
	html := pageOf(t, "../../../testdata/networks/nine-lines", "1-4")
	d := xml.NewDecoder(strings.NewReader(html))
	d.Entity = xml.HTMLEntity
	count := map[string]int{}
	for {
		token, err := d.Token()
		if errors.Is(err, io.EOF) {
			break
		}
		if err != nil {
			t.Fatal(err)
		}
		e, ok := token.(xml.StartElement)
		if !ok {
			continue
		}
		count[e.Name.Local]++
		for _, a := range e.Attr {
			if a.Name.Local == "src" || a.Name.Local == "href" {
				t.Errorf("<%s> fetches %s", e.Name.Local, a.Value)
			}
		}
	}
	if count["script"] > 0 || count["link"] > 0 {
		t.Error("the page needs a script or a style sheet")
	}
	if count["h1"] != 3 || count["math"] < 100 || count["mfrac"] < 40 || count["msqrt"] < 4 {
		t.Errorf("elements: %v; the area, the structure and the pipe 1-4 stand on it, in formulas", count)
	}
}

func TestThePageHoldsFormulaNumbersAndResult(t *testing.T) {
	html := pageOf(t, "../../../testdata/networks/nine-lines", "1-4")
	const hydraulicRadius = `<math><msub><mi>R</mi><mi>f</mi></msub><mo>=</mo>` +
		`<mfrac><msub><mi>A</mi><mi>f</mi></msub><msub><mi>P</mi><mi>f</mi></msub></mfrac><mo>=</mo>` +
		`<mfrac><mrow><mn>3.14159</mn><mtext> ft²</mtext></mrow><mrow><mn>6.28319</mn><mtext> ft</mtext></mrow></mfrac><mo>=</mo>` +
		`<mrow><mn>0.5</mn><mtext> ft</mtext></mrow></math>`
	for _, want := range []string{hydraulicRadius, "<mo>≤</mo>", `<span class="broken">is broken</span>`, "<span>holds</span>", "Chow table 2-1", "a licensed engineer checks and signs"} {
		if !strings.Contains(html, want) {
			t.Errorf("the page has no %s", want)
		}
	}
}
