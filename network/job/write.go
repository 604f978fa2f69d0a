package job

import (
	"bytes"
	"fmt"
	"maps"
	"os"
	"path/filepath"
	"slices"
	"strconv"

	"rimfall/network"
)

// Write writes a complete new job folder: every file of the job as it stands,
// and pipes.csv with the blank cells filled in that were chosen. Given cells,
// comments and the order of rows and columns are kept. The folder appears whole
// or not at all; one that exists is replaced only with force.
func (j *Job) Write(dir string, completed *network.Network, force bool) error {
	if err := j.mayWrite(dir, force); err != nil {
		return err
	}
	return writeFolder(dir, func(temporary string) error { return j.writeInto(temporary, completed) })
}

// writeFolder makes a folder whole or not at all: fill writes into a temporary one
// beside it, which is then renamed.
func writeFolder(dir string, fill func(temporary string) error) error {
	parent := filepath.Dir(filepath.Clean(dir))
	if err := os.MkdirAll(parent, 0o755); err != nil {
		return fmt.Errorf("writing %s: %w", dir, err)
	}
	temporary, err := os.MkdirTemp(parent, ".new-job-")
	if err != nil {
		return fmt.Errorf("writing %s: %w", dir, err)
	}
	defer os.RemoveAll(temporary) // nothing is left of it once it has been renamed
	if err := fill(temporary); err != nil {
		return fmt.Errorf("writing %s: %w", dir, err)
	}
	if err := replaceFolder(temporary, dir); err != nil {
		return fmt.Errorf("writing %s: %w", dir, err)
	}
	return nil
}

// ExistsError says that a folder or file is there already.
type ExistsError struct{ Path string }

func (e ExistsError) Error() string {
	return fmt.Sprintf("%s exists already; name another place, or give --force to replace it", e.Path)
}

// mayWrite refuses an existing folder without force, and the job's own always.
func (j *Job) mayWrite(dir string, force bool) error {
	own, err1 := filepath.Abs(j.Dir)
	other, err2 := filepath.Abs(dir)
	if err1 == nil && err2 == nil && own == other {
		return fmt.Errorf("%s is the job that is read; name another folder for the new one", dir)
	}
	entries, err := os.ReadDir(dir)
	switch {
	case os.IsNotExist(err):
		return nil
	case err != nil: // a file stands there
		return ExistsError{dir}
	case len(entries) > 0 && !force:
		return ExistsError{dir}
	}
	return nil
}

// replaceFolder moves a finished folder to its place, and what was there away.
func replaceFolder(temporary, dir string) error {
	if err := os.Chmod(temporary, 0o755); err != nil {
		return err
	}
	old := temporary + "-old"
	err := os.Rename(dir, old)
	if err != nil && !os.IsNotExist(err) {
		return err
	}
	if err := os.Rename(temporary, dir); err != nil {
		_ = os.Rename(old, dir) // put back what was there; the first error is told
		return err
	}
	return os.RemoveAll(old)
}

// writeInto writes every file of the job below a folder. A file that the job
// shares with others, named by a path that leads out of the job folder, is
// copied into the new one, and job.toml names it there; one named by its whole
// path stays where it is.
func (j *Job) writeInto(dir string, completed *network.Network) error {
	settings := j.files[File]
	if j.settings.values["title"] == nil { // the title is the folder's name, which changes
		settings = append([]byte("title = "+strconv.Quote(j.Settings.Title)+"\n"), settings...)
	}
	for _, name := range slices.Sorted(maps.Keys(j.files)) {
		text, local := j.files[name], name
		switch {
		case name == File || filepath.IsAbs(name):
			continue
		case name == j.Settings.Files["pipes"]:
			text = j.tables["pipes"].completed(completed)
		}
		if !filepath.IsLocal(name) {
			local = j.localName(name)
			settings = bytes.ReplaceAll(settings, []byte(strconv.Quote(name)), []byte(strconv.Quote(local)))
		}
		if err := writeFile(filepath.Join(dir, local), text); err != nil {
			return err
		}
	}
	return writeFile(filepath.Join(dir, File), settings)
}

// localName is a name for a shared file inside the job folder.
func (j *Job) localName(name string) string {
	local := filepath.Base(name)
	for _, taken := j.files[local]; taken; _, taken = j.files[local] {
		local = "shared-" + local
	}
	return local
}

func writeFile(path string, text []byte) error {
	if err := os.MkdirAll(filepath.Dir(path), 0o755); err != nil {
		return err
	}
	return os.WriteFile(path, text, 0o644)
}
