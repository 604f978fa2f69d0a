package job

import (
	"embed"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
)

// starters are small jobs that run, with every column explained in comments.
//
//go:embed starter
var starters embed.FS

// WriteStarter writes a small job that runs, in a system of units, as the new
// folder dir. A folder that exists and is not empty is refused.
func WriteStarter(dir, units string) error {
	if entries, err := os.ReadDir(dir); err == nil && len(entries) > 0 || err != nil && !os.IsNotExist(err) {
		return fmt.Errorf("%s exists already and is not empty; name another folder", dir)
	}
	files, err := fs.Sub(starters, "starter/"+units)
	if err != nil {
		return err
	}
	parent := filepath.Dir(filepath.Clean(dir))
	if err := os.MkdirAll(parent, 0o755); err != nil {
		return fmt.Errorf("writing %s: %w", dir, err)
	}
	temporary, err := os.MkdirTemp(parent, ".new-job-")
	if err != nil {
		return fmt.Errorf("writing %s: %w", dir, err)
	}
	defer os.RemoveAll(temporary) // nothing is left of it once it has been renamed
	if err := os.CopyFS(temporary, files); err != nil {
		return fmt.Errorf("writing %s: %w", dir, err)
	}
	return replaceFolder(temporary, dir)
}
