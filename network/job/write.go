package job

import (
	"bytes"
	"errors"
	"fmt"
	"io/fs"
	"maps"
	"os"
	"path/filepath"
	"slices"
	"strconv"

	"rimfall/network"
)

// WriteOptions say how a job folder is written.
type WriteOptions struct {
	Force        bool    // replace a job folder that is there
	ReturnPeriod float64 // design storm, years, in place of the job's; 0: the job's
}

// Write writes a complete new job folder: every file of the job as it stands,
// and pipes.csv with the blank cells filled in that were chosen. Given cells,
// comments and the order of rows and columns are kept. The folder appears whole
// or not at all; one that exists is replaced only with force.
func (j *Job) Write(dir string, completed *network.Network, o WriteOptions) error {
	if err := j.mayWrite(dir, o.Force); err != nil {
		return err
	}
	return writeFolder(dir, func(temporary string) error { return j.writeInto(temporary, completed, o) })
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

// mayWrite refuses the job that is read and every folder that holds it, a folder
// that exists without force, and with force one that is no job folder.
func (j *Job) mayWrite(dir string, force bool) error {
	if holds(dir, j.Dir) {
		return fmt.Errorf("%s is or holds the job that is read; name another folder for the new one", dir)
	}
	entries, err := os.ReadDir(dir)
	switch {
	case errors.Is(err, fs.ErrNotExist):
		return nil
	case err != nil:
		return fmt.Errorf("%s is no folder; name another place", dir)
	case len(entries) == 0:
		return nil
	case !force:
		return ExistsError{dir}
	}
	if _, err := os.Stat(filepath.Join(dir, File)); err != nil {
		return fmt.Errorf("%s is no job folder (it has no %s), so --force does not replace it; name another place", dir, File)
	}
	return nil
}

// holds tells whether a folder is another one or has it below it.
func holds(dir, other string) bool {
	a, err1 := filepath.Abs(dir)
	b, err2 := filepath.Abs(other)
	if err1 != nil || err2 != nil {
		return true
	}
	if r, err := filepath.EvalSymlinks(a); err == nil {
		a = r
	}
	if r, err := filepath.EvalSymlinks(b); err == nil {
		b = r
	}
	inside, err := filepath.Rel(a, b)
	return err == nil && (inside == "." || filepath.IsLocal(inside))
}

// replaceFolder moves a finished folder to its place. Of a folder that was there
// the files that the new one does not have are kept: they are the user's own.
func replaceFolder(temporary, dir string) error {
	if err := os.Chmod(temporary, 0o755); err != nil {
		return err
	}
	old := temporary + "-old"
	err := os.Rename(dir, old)
	if err != nil && !errors.Is(err, fs.ErrNotExist) {
		return err
	}
	if err := os.Rename(temporary, dir); err != nil {
		_ = os.Rename(old, dir) // put back what was there; the first error is told
		return err
	}
	return keepOwnFiles(old, dir)
}

// keepOwnFiles moves what only the old folder has into the new one, and takes the
// old one away.
func keepOwnFiles(old, dir string) error {
	entries, err := os.ReadDir(old)
	if errors.Is(err, fs.ErrNotExist) {
		return nil
	}
	if err != nil {
		return err
	}
	for _, e := range entries {
		place := filepath.Join(dir, e.Name())
		if _, err := os.Lstat(place); errors.Is(err, fs.ErrNotExist) {
			if err := os.Rename(filepath.Join(old, e.Name()), place); err != nil {
				return err
			}
		}
	}
	return os.RemoveAll(old)
}

// writeInto writes every file of the job below a folder. A file that the job
// shares with others, named by a path that leads out of the job folder, is
// copied into the new one, and job.toml names it there; one named by its whole
// path stays where it is.
func (j *Job) writeInto(dir string, completed *network.Network, o WriteOptions) error {
	settings := j.files[File]
	if o.ReturnPeriod > 0 && o.ReturnPeriod != j.Settings.Storm.ReturnPeriod {
		settings = j.settings.withNumber(settings, "storm.return_period", o.ReturnPeriod)
	}
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

// SharedFiles names the files of the job that a path leads to out of its folder;
// a written job holds copies of them.
func (j *Job) SharedFiles() []string {
	var shared []string
	for _, name := range slices.Sorted(maps.Keys(j.files)) {
		if !filepath.IsAbs(name) && !filepath.IsLocal(name) {
			shared = append(shared, name)
		}
	}
	return shared
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
