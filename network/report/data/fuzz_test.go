package data_test

import (
	"bytes"
	"encoding/json"
	"errors"
	"os"
	"path/filepath"
	"testing"

	"rimfall/network/analysis"
	"rimfall/network/fault"
	"rimfall/network/report/data"
)

// FuzzWholeRun feeds any bytes for the three tables of a job and follows what is
// taken to the end: a job that has no fault runs, or says with a fault why not,
// and its JSON is valid, without a number that is none.
func FuzzWholeRun(f *testing.F) {
	f.Add([]byte("id,kind,rim,inflow\nA,,100,1\nB,,98,\nO,outfall,,\n"), []byte("id,from,to,length,size,slope,invert_upper\nP,A,B,100,12,0.01,95\nQ,B,O,100,15,-0.01,\n"), []byte("id,structure,area,c,time\na,A,1,0.5,10\n"))
	f.Add([]byte("id,kind,rim,lowest_invert\nA,,100,99\nO,outfall,98,97\n"), []byte("id,from,to,length,count,shape\nP,A,O,1e-6,3,box\n"), []byte("id,structure,area,c\na,A,1e9,1\n"))
	f.Add([]byte("id,kind,rim,tailwater\nA,blind-junction,,\nB,,1e9,\nO,outfall,0,50\n"), []byte("id,from,to,length,size,slope,share,invert_lower\nP,A,O,10,96,0.15,1,0\nQ,B,A,10,48x76,0,,5\n"), []byte("id,structure,area,c\na,B,1e-9,0.01\n"))
	f.Add([]byte("id,kind,rim\nA,,10\nO,outfall,\n"), []byte("id,from,to,length,shape,size,slope,invert_upper,n\nP,A,O,1000,ellipse,60x38,1e-9,5,0.9\n"), []byte("id,structure,area,c,time\na,A,100,1,59\n"))
	dir := f.TempDir()
	write := func(t testing.TB, name string, text []byte) {
		if err := os.WriteFile(filepath.Join(dir, name), text, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	write(f, "job.toml", []byte("[storm]\nreturn_period = 10\ncheck_period = 100\n"))
	write(f, "rainfall.csv", []byte("duration,10,100\n5,6,8\n60,1.5,2\n1e12,0.001,0.002\n"))
	f.Fuzz(func(t *testing.T, structures, pipes, areas []byte) {
		write(t, "structures.csv", structures)
		write(t, "pipes.csv", pipes)
		write(t, "areas.csv", areas)
		for _, o := range []analysis.Options{{}, {Size: true}} {
			j, err := analysis.Read(dir, o)
			if err != nil {
				continue
			}
			r, err := analysis.Run(j, o)
			var list fault.List
			if errors.As(err, &list) {
				continue
			}
			if err != nil {
				t.Fatal(err)
			}
			var b bytes.Buffer
			if err := data.JSON(&b, r, ""); err != nil || !json.Valid(b.Bytes()) {
				t.Fatalf("%v in\n%s", err, b.Bytes())
			}
			if bytes.Contains(b.Bytes(), []byte(":null")) {
				t.Fatalf("a number that is none:\n%s", b.Bytes())
			}
		}
	})
}
