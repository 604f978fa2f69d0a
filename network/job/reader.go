package job

import (
	"bytes"
	"errors"
	"io/fs"
	"os"
	"path/filepath"
	"unicode/utf8"

	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/pipeflow/catalog"
)

// reader reads one job folder and collects the faults of all its files.
type reader struct {
	dir     string
	purpose Purpose
	faults  fault.List
	files   map[string][]byte // text of every file that was read, without byte-order mark
	tables  map[string]*table

	settings   *Settings
	document   *document // job.toml, with the places of its keys
	network    *network.Network
	catalog    catalog.Catalog
	sections   map[sectionKey]Made
	lastKey    sectionKey // the section made or found last
	lastMade   Made
	structures ids
	pipes      ids
	areas      ids
	surfaces   surfaces          // nil where the job has none
	pieces     map[string]pieces // by id of their area
	piecesFile string
}

// path is a file's name as it is printed: below the job folder as the user named it.
func (r *reader) path(name string) string {
	if filepath.IsAbs(name) {
		return name
	}
	return filepath.Join(r.dir, name)
}

// readFile reads a file of the job and takes off a byte-order mark. ok is false,
// with a fault, where it cannot be read or is no UTF-8 text.
func (r *reader) readFile(name string) (text []byte, ok bool) {
	text, err := os.ReadFile(r.path(name))
	switch {
	case errors.Is(err, fs.ErrNotExist):
		r.faults.Add(r.path(name), 0, 0, "missing file")
		return nil, false
	case err != nil:
		var inner *fs.PathError
		if errors.As(err, &inner) {
			err = inner.Err
		}
		r.faults.Add(r.path(name), 0, 0, "cannot be read: %v", err)
		return nil, false
	}
	if bytes.HasPrefix(text, []byte{0xff, 0xfe}) || bytes.HasPrefix(text, []byte{0xfe, 0xff}) {
		r.faults.Add(r.path(name), 0, 0, "is UTF-16 text; save it as UTF-8")
		return nil, false
	}
	text = bytes.TrimPrefix(text, []byte("\xef\xbb\xbf"))
	if !utf8.Valid(text) {
		line, column := invalidAt(text)
		r.faults.Add(r.path(name), line, column, "is not UTF-8 text; save it as UTF-8")
		return nil, false
	}
	if bytes.IndexByte(text, '\n') < 0 { // line ends of old spreadsheets
		text = bytes.ReplaceAll(text, []byte("\r"), []byte("\n"))
	}
	r.files[name] = text
	return text, true
}

// has tells whether a file of the job exists.
func (r *reader) has(name string) bool {
	info, err := os.Stat(r.path(name))
	return err == nil && !info.IsDir()
}

// invalidAt finds the first byte that is no UTF-8.
func invalidAt(text []byte) (line, column int) {
	line, column = 1, 1
	for len(text) > 0 {
		c, size := utf8.DecodeRune(text)
		if c == utf8.RuneError && size == 1 {
			return line, column
		}
		if column++; c == '\n' {
			line, column = line+1, 1
		}
		text = text[size:]
	}
	return line, column
}
