package drawing_test

import (
	"os"
	"path/filepath"
	"strings"
	"testing"

	"rimfall/network/report/drawing"
)

// A drawing of an old line says which of its pipes are drawn by assumption.
func TestWhatIsAssumedStandsOnEverySheet(t *testing.T) {
	dir := t.TempDir()
	for name, text := range map[string]string{
		"job.toml":       "units = \"us\"\n[storm]\nreturn_period = 10\n",
		"structures.csv": "id,kind,x,y,rim\nA,,0,0,106\nB,,200,0,105\nOUT,outfall,400,0,103\n",
		"pipes.csv":      "id,from,to,size,invert_upper,invert_lower,status\nP1,A,B,15,101,,existing\nP2,B,OUT,15,,98.9,existing\n",
		"areas.csv":      "id,structure,area,c,time\na,A,1,0.5,10\n",
		"rainfall.csv":   "duration,10\n5,4\n60,2\n",
	} {
		if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	for _, s := range allSheets(t, runJob(t, dir), drawing.Paper{}) {
		if all := strings.Join(texts(t, s), " "); !strings.Contains(all, "Assumed, not surveyed: inverts or n of 2 pipes: P1, P2") {
			t.Errorf("%s does not say what is assumed", s.Name)
		}
	}
}
