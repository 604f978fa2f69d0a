package drawing_test

import (
	"fmt"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"rimfall/network/analysis"
	"rimfall/network/report/drawing"
)

// anyJob draws the texts of a job of any form: trees with splits, several outfalls, pipes of all shapes, lengths, slopes
// (level and rising ones too) and states, missing rims, coordinates and inverts, ground and services anywhere.
func anyJob(t *rapid.T) map[string]string {
	var s, p, a, ground, crossings strings.Builder
	s.WriteString("id,kind,x,y,rim,tailwater,tailwater_check\n")
	p.WriteString("id,from,to,length,shape,size,count,material,invert_upper,invert_lower,slope,status,share\n")
	a.WriteString("id,structure,area,c,time\n")
	ground.WriteString("pipe,station,elevation\n")
	crossings.WriteString("pipe,station,name,top,bottom\n")
	count := rapid.IntRange(2, 14).Draw(t, "structures")
	level := rapid.Float64Range(-50, 900).Draw(t, "level")
	inverts := []float64{level}
	id := func(i int) string { return fmt.Sprintf("S%0*d", 1+i%9, i) }
	fmt.Fprintf(&s, "%s,outfall,0,0,%.2f,%s,\n", id(0), level+3, maybe(t, "tailwater", level+1))
	for i := 1; i < count; i++ {
		to := rapid.IntRange(max(0, i-4), i-1).Draw(t, "to")
		length := rapid.Float64Range(1, 900).Draw(t, "length")
		upper := inverts[to] + rapid.Float64Range(-1, 25).Draw(t, "fall")
		inverts = append(inverts, upper)
		kind := rapid.SampledFrom([]string{"manhole", "inlet", "blind-junction"}).Draw(t, "kind")
		rim := ""
		if kind != "blind-junction" {
			rim = maybe(t, "rim", upper+rapid.Float64Range(2, 20).Draw(t, "depth"))
		}
		place := ","
		if rapid.IntRange(0, 5).Draw(t, "placed") > 0 {
			place = fmt.Sprintf("%.1f,%.1f", rapid.Float64Range(0, 2000).Draw(t, "x"), rapid.Float64Range(0, 2000).Draw(t, "y"))
		}
		fmt.Fprintf(&s, "%s,%s,%s,%s,,\n", id(i), kind, place, rim)
		form := rapid.SampledFrom([]string{"circle,24,", "circle,6,", "box,96x48,2", "ellipse,60x38,", "arch,43.75x26.625,", "circle,120,3"}).Draw(t, "form")
		levels := fmt.Sprintf("%.3f,%.3f,", upper, inverts[to])
		if rapid.IntRange(0, 9).Draw(t, "levels") == 0 {
			levels = ",,0.01"
		}
		fmt.Fprintf(&p, "P%d,%s,%s,%.3f,%s,concrete,%s,%s,\n", i, id(i), id(to), length, form, levels, rapid.SampledFrom([]string{"", "existing"}).Draw(t, "status"))
		fmt.Fprintf(&a, "a%d,%s,%.3f,0.6,10\n", i, id(i), rapid.Float64Range(0.01, 4).Draw(t, "area"))
		if rapid.Bool().Draw(t, "ground") {
			fmt.Fprintf(&ground, "P%d,%.3f,%.2f\n", i, length/3, upper+6)
		}
		if rapid.Bool().Draw(t, "service") {
			fmt.Fprintf(&crossings, "P%d,%.3f,service %d,%.2f,%.2f\n", i, length/2, i, upper+2, upper+1)
		}
	}
	ground.WriteString("P1,0,500\n")
	crossings.WriteString("P1,0,cable,500,500\n")
	unit := rapid.SampledFrom([]string{"us", "si"}).Draw(t, "units")
	text := p.String()
	if unit == "si" {
		text = strings.NewReplacer("circle,24", "circle,600", "circle,6,", "circle,150,", "96x48", "2400x1200", "60x38", "1500x950", "arch,43.75x26.625", "ellipse,1100x675", "circle,120", "circle,3000").Replace(text)
	}
	return map[string]string{
		"job.toml":       "title = \"Any\"\nunits = \"" + unit + "\"\n[storm]\nreturn_period = 10\ncheck_period = 50\n",
		"structures.csv": s.String(), "pipes.csv": text, "areas.csv": a.String(), "ground.csv": ground.String(), "crossings.csv": crossings.String(),
		"rainfall.csv": "duration,10,50\n5,6,9\n1e12,0.001,0.002\n",
	}
}

// maybe gives a number, or one time in four a blank.
func maybe(t *rapid.T, name string, v float64) string {
	if rapid.IntRange(0, 3).Draw(t, name+" given") == 0 {
		return ""
	}
	return fmt.Sprintf("%.3f", v)
}

func TestAnyNetworkIsDrawnInsideItsFramesAndWithoutTextOverText(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		dir, err := os.MkdirTemp("", "any-job-")
		if err != nil {
			t.Fatal(err)
		}
		defer os.RemoveAll(dir)
		for name, text := range anyJob(t) {
			if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
				t.Fatal(err)
			}
		}
		j, err := analysis.Read(dir, analysis.Options{})
		if err != nil {
			t.Fatal(err)
		}
		r, err := analysis.Run(j, analysis.Options{})
		if err != nil {
			t.Fatal(err)
		}
		for _, sheet := range allSheets(t, r, drawing.Paper{}) {
			holdSheet(t, sheet)
		}
	})
}
