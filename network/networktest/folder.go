package networktest

import (
	"bufio"
	"fmt"
	"os"
	"path/filepath"
	"strconv"

	"rimfall/network"
)

// WriteFolder writes a network as a job folder, with an invented rainfall table.
func WriteFolder(dir string, n *network.Network) error {
	if err := os.MkdirAll(dir, 0o755); err != nil {
		return err
	}
	files := map[string]func(w *bufio.Writer){
		"job.toml": func(w *bufio.Writer) { fmt.Fprint(w, "units = \"us\"\n[storm]\nreturn_period = 10\n") },
		"rainfall.csv": func(w *bufio.Writer) {
			fmt.Fprint(w, "duration,10\n5,6\n10,5\n30,3\n60,2\n1440,0.2\n100000,0.01\n10000000,0.001\n")
		},
		"structures.csv": func(w *bufio.Writer) { writeStructures(w, n) },
		"pipes.csv":      func(w *bufio.Writer) { writePipes(w, n) },
		"areas.csv":      func(w *bufio.Writer) { writeAreas(w, n) },
	}
	for name, write := range files {
		f, err := os.Create(filepath.Join(dir, name))
		if err != nil {
			return err
		}
		w := bufio.NewWriterSize(f, 1<<16)
		write(w)
		if err := w.Flush(); err != nil {
			return err
		}
		if err := f.Close(); err != nil {
			return err
		}
	}
	return nil
}

func number(v float64) string { return strconv.FormatFloat(v, 'f', -1, 64) }

func writeStructures(w *bufio.Writer, n *network.Network) {
	fmt.Fprintln(w, "id,kind,rim")
	for i := range n.Structures {
		s := &n.Structures[i]
		rim := ""
		if s.Rim.OK {
			rim = number(s.Rim.V)
		}
		fmt.Fprintf(w, "%s,%s,%s\n", s.ID, s.Kind, rim)
	}
}

func writePipes(w *bufio.Writer, n *network.Network) {
	fmt.Fprintln(w, "id,from,to,length,size,n,invert_upper,slope,angle")
	for i := range n.Pipes {
		p := &n.Pipes[i]
		fmt.Fprintf(w, "%s,%s,%s,%s,%s,%s,%s,%s,%s\n", p.ID, n.Structures[p.From].ID, n.Structures[p.To].ID,
			number(p.Length), number(p.Size.Rise), number(p.N), number(p.InvertUpper.V), number(p.Slope.V), number(p.Angle.V))
	}
}

func writeAreas(w *bufio.Writer, n *network.Network) {
	fmt.Fprintln(w, "id,structure,area,c,time")
	for i := range n.Areas {
		a := &n.Areas[i]
		fmt.Fprintf(w, "%s,%s,%s,%s,%s\n", a.ID, n.Structures[a.Structure].ID, number(a.Area), number(a.C), number(a.Time.V))
	}
}
