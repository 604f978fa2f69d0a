package job

import (
	"os"
	"path/filepath"

	"rimfall/network/fault"
	"rimfall/network/units"
)

// UnitsOf gives the system of units of the job in a folder, for files that lie
// beside its settings and state no unit; not ok where the folder is no job.
func UnitsOf(dir string) (units.System, bool) {
	text, err := os.ReadFile(filepath.Join(dir, File))
	if err != nil {
		return units.System{}, false
	}
	var ignored fault.List
	d := parseTOML(File, text, &ignored)
	if len(ignored) > 0 {
		return units.System{}, false
	}
	name, given := d.values["units"].(string)
	if !given {
		return units.US, true
	}
	return units.ByName(name)
}
