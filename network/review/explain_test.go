package review_test

import (
	"bytes"
	"fmt"
	"math"
	"path/filepath"
	"strconv"
	"strings"
	"testing"

	"rimfall/network/analysis"
	"rimfall/network/report/text"
	"rimfall/network/review"
)

// printedLine is a row of the working as it is printed in Markdown.
type printedLine struct{ page, part, name, symbol, formula, numbers, result, source string }

// printedLines explains an id and reads what was printed.
func printedLines(t testing.TB, r *analysis.Result, id string, kinds ...review.Kind) []printedLine {
	t.Helper()
	pages, err := review.Explain(r, id, kinds...)
	if err != nil {
		t.Fatal(err)
	}
	var b bytes.Buffer
	if err := text.Explain(&b, r, pages, true); err != nil {
		t.Fatal(err)
	}
	var lines []printedLine
	var page, part string
	for row := range strings.Lines(b.String()) {
		row = strings.TrimSpace(row)
		switch {
		case strings.HasPrefix(row, "# "):
			page = row[2:]
		case strings.HasPrefix(row, "## "):
			part = row[3:]
		case strings.HasPrefix(part, "Assumptions"): // of the job, not of the page
		case strings.HasPrefix(row, "|") && !strings.HasPrefix(row, "|:") && !strings.Contains(row, "| symbol"):
			cells := strings.Split(strings.Trim(row, "|"), "|")
			if len(cells) != 6 {
				t.Fatalf("%d cells in %s", len(cells), row)
			}
			for i := range cells {
				cells[i] = strings.TrimSpace(cells[i])
			}
			lines = append(lines, printedLine{page, part, cells[0], cells[1], cells[2], cells[3], cells[4], cells[5]})
		}
	}
	return lines
}

// everyID lists the ids of a job, each once.
func everyID(r *analysis.Result) []string {
	seen := map[string]bool{}
	var ids []string
	add := func(id string) {
		if !seen[id] {
			seen[id] = true
			ids = append(ids, id)
		}
	}
	for _, a := range r.Network.Areas {
		add(a.ID)
	}
	for _, s := range r.Network.Structures {
		add(s.ID)
	}
	for _, p := range r.Network.Pipes {
		add(p.ID)
	}
	return ids
}

// recompute works out every printed line of every page of a job with the digits that are
// printed: a computed line must give its result to the last digit, a limit must hold or be
// broken as it says. It counts the lines that it has worked out.
func recompute(t *testing.T, r *analysis.Result) (count int) {
	t.Helper()
	for _, id := range everyID(r) {
		for _, l := range printedLines(t, r, id) {
			switch {
			case l.result == "holds" || l.result == "is broken":
				value, rest, _ := strings.Cut(l.numbers, " ")
				relation, limit, _ := strings.Cut(rest, " ")
				v, w := evaluated(t, value), evaluated(t, limit)
				if holds := relation == "≥" && v >= w || relation == "≤" && v <= w; holds != (l.result == "holds") {
					t.Errorf("%s, %s: %s %s %s", l.page, l.name, l.symbol, l.numbers, l.result)
				}
			case l.numbers != "":
				number, _, _ := strings.Cut(l.result, " ")
				_, after, _ := strings.Cut(number, ".")
				got := evaluated(t, l.numbers)
				if strings.Contains(l.result, "°") {
					got *= 180 / math.Pi
				}
				printed := strings.Replace(strconv.FormatFloat(got, 'f', len(after), 64), "-", "−", 1)
				if printed != number && !(number == "0" && math.Abs(got) < 0.5e-12) {
					t.Errorf("%s, %s: %s = %s = %s, printed %s", l.page, l.name, l.symbol, l.formula, l.numbers, l.result)
					t.Logf("worked out: %.17g", got)
				}
			default:
				continue
			}
			count++
		}
	}
	return count
}

func TestEveryPrintedLineGivesItsResult(t *testing.T) {
	const root = "../../"
	examples, err := filepath.Glob(root + "examples/*")
	if err != nil || len(examples) < 2 {
		t.Fatalf("examples %q, %v", examples, err)
	}
	type page struct {
		dir   string
		storm float64 // 0: the job's
	}
	pages := []page{{root + "testdata/networks/nine-lines", 0}, {root + "testdata/networks/twelve-sewers", 0}}
	for _, dir := range examples {
		pages = append(pages, page{dir, 0}, page{dir, 25})
	}
	for _, p := range pages {
		t.Run(fmt.Sprintf("%s in the storm of %g years", filepath.Base(p.dir), p.storm), func(t *testing.T) {
			t.Parallel()
			r := asRunOf(t, p.dir, analysis.Options{Size: true, ReturnPeriod: p.storm})
			if n := recompute(t, r); n < 30*len(r.Network.Pipes) {
				t.Errorf("%d lines were worked out, of %d pipes", n, len(r.Network.Pipes))
			}
		})
	}
}

// anyKind is an invented drain with something of everything: shapes, barrels, a split, a bend,
// losses of its own, a plunging pipe, a pipe from a drowned outfall up, a flat one, one that rises, a dry
// one, and one without inverts.
const anyKind = `
-- job.toml --
title = "Something of everything"
units = "us"
[storm]
return_period = 25
SETTINGS
-- structures.csv --
id,kind,x,y,rim,inflow,tailwater,benching,loss
A,inlet,0,0,120,,,,
B,manhole,200,0,118,0.5,,half,
C,blind-junction,400,50,,,,,
D,manhole,600,60,114,,,improved,0.3
E,inlet,800,60,112,,,depressed,
E2,manhole,820,160,112,,,full,
F,manhole,1000,60,111,,,flat,
OUT,outfall,1200,60,109,,108,,
S,inlet,400,-150,121,,,,
T,manhole,380,300,117,,,,
T2,inlet,300,300,117,,,,
DRY,manhole,1000,200,113,,,,
V,inlet,0,500,90,,,,
W,manhole,100,500,89,,,,
FREE,outfall,200,500,85,,,,
-- pipes.csv --
id,from,to,length,shape,size,count,n,invert_upper,invert_lower,slope,bend,loss,share,angle
AB,A,B,,circle,15,1,0.013,113,110,,15,,,
SC,S,C,,circle,12,1,0.013,116,112.5,,,,,
BC,B,C,,circle,18,1,0.013,109.5,108,,,,,
CD,C,D,,circle,24,1,0.013,107.5,106.5,,,,,
TD,T,D,,box,24in x 18in,1,0.013,108,107,,,0.4,,
T2T,T2,T,,ellipse,23x14,1,0.013,109,108.2,,,,,
DE,D,E,,circle,18,2,0.013,106.2,105.4,,,,,
EF,E,F,,circle,24,1,0.013,105,104.2,,,,0.6,
EE2,E,E2,,circle,18,1,0.012,105.2,105.2,,,,0.4,
E2F,E2,F,,arch,43.75x26.625,1,0.013,104.5,104.8,,,,,30
FO,F,OUT,,box,48x36,1,0.013,104,103,,,,,
DF,DRY,F,,circle,12,1,0.013,108,106,,,,,
VW,V,W,,circle,15,1,0.013,,,0.004,,,,
WF,W,FREE,,circle,15,1,0.013,84,80,,,,,
-- areas.csv --
id,structure,area,c,time
a1,A,1.5,0.7,8
a2,A,0.5,0.9,
a3,S,1.1,0.6,9
a4,B,0.01,0.5,
a5,T2,2.2,0.8,12
a6,E,3,0.45,25
a7,E2,0.4,0,6
a8,V,0.8,0.7,10
a9,F,4,0.25,30
-- rainfall.csv --
duration,10,25
5,7.1,8.3
10,5.6,6.7
30,3.4,4.1
60,2.1,2.6
`

func TestEveryPrintedLineGivesItsResultInEverySetting(t *testing.T) {
	for _, settings := range []string{
		"",
		"check_period = 10\nuplift = 1.15\nfrequency_factor = true",
		"hold_upstream_peak = true\ntravel_velocity = \"full-bore\"",
		"peak = \"partial-area\"",
		"peak = \"partial-area\"\nuplift = 1.3\ntravel_velocity = \"flow-over-full-area\"",
		"[grade]\nstructure_loss = \"coefficient\"",
		"[grade]\nstructure_loss = \"none\"\noutfall_start = \"critical\"",
		"minimum_time = 12\n[criteria]\nmin_shear = 0.05\nmax_outlet_velocity = 3\nmax_cover = 6\nvelocity_basis = \"design\"",
	} {
		t.Run(settings, func(t *testing.T) {
			t.Parallel()
			if n := recompute(t, asRun(t, anyKind, "SETTINGS", settings)); n < 700 {
				t.Errorf("%d lines were worked out", n)
			}
		})
	}
}
