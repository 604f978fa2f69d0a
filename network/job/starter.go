package job

import (
	"embed"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"

	"rimfall/hydrology"
)

// starters are small jobs that run, with every column explained in comments.
//
//go:embed starter
var starters embed.FS

// WriteStarter writes a small job that runs, in a system of units, as the new
// folder dir. A folder that exists and is not empty is refused.
func WriteStarter(dir, units string) error { return writeStarter(dir, units, false) }

// WriteStarterWithSurfaces writes the same with surfaces.csv: published runoff
// coefficients to choose from, a source in each row.
func WriteStarterWithSurfaces(dir, units string) error { return writeStarter(dir, units, true) }

func writeStarter(dir, units string, withSurfaces bool) error {
	if entries, err := os.ReadDir(dir); err == nil && len(entries) > 0 || err != nil && !os.IsNotExist(err) {
		return fmt.Errorf("%s exists already and is not empty; name another folder", dir)
	}
	files, err := fs.Sub(starters, "starter/"+units)
	if err != nil {
		return err
	}
	return writeFolder(dir, func(temporary string) error {
		err := os.CopyFS(temporary, files)
		if err == nil && withSurfaces {
			err = os.WriteFile(filepath.Join(temporary, tableFiles["surfaces"]), []byte(hydrology.StartingSurfacesCSV()), 0o644)
		}
		return err
	})
}
