package job

import (
	"fmt"
	"maps"
	"math"
	"path/filepath"
	"slices"
	"strings"

	"rimfall/network/fault"
	"rimfall/network/units"
)

// section is one table of job.toml, or the top level of a criteria set: its keys by type.
type section struct {
	name     string
	numbers  map[string]number
	words    map[string]word
	switches map[string]func(*Settings, bool)
	texts    []string // keys that hold free text, read elsewhere
}

var (
	criteriaSection = section{name: "criteria", numbers: criteriaNumbers, words: criteriaWords, texts: []string{"set"}}
	criteriaSet     = section{numbers: criteriaNumbers, words: criteriaWords, texts: []string{"title", "units"}}
	jobSections     = []section{
		{texts: []string{"title", "units"}},
		{name: "storm", numbers: merged(stormNumbers, rainNumbers), words: merged(stormWords, rainWords), switches: stormSwitches, texts: []string{"rainfall", "equation"}},
		criteriaSection,
		{name: "grade", words: gradeWords},
		{name: "output", words: outputWords},
		{name: "unknown", texts: []string{"values"}},
	}
)

func (s section) known() []string {
	return slices.Concat(slices.Collect(maps.Keys(s.numbers)), slices.Collect(maps.Keys(s.words)),
		slices.Collect(maps.Keys(s.switches)), s.texts)
}

// readSettings judges job.toml. dir is the job folder, from which a criteria set is named.
func (r *reader) readSettings(d document) Settings {
	system := units.US
	if name := r.text(d, "units"); name != "" {
		u, ok := units.ByName(name)
		if !ok {
			d.fault(&r.faults, "units", "units = %q: write %q or %q", name, unitNames[0], unitNames[1])
		} else {
			system = u
		}
	}
	s := defaults(system)
	s.Title = r.text(d, "title")
	if s.Title == "" {
		s.Title = folderName(r.dir)
	}
	r.applyCriteriaSet(d, &s)
	r.applySections(d, &s)
	r.applyFiles(d, &s)
	r.readUnknown(d, &s)
	r.readEquations(d, &s)
	if file := r.text(d, "storm.rainfall"); file != "" {
		s.Rainfall = file
		if len(s.Rain.Equations) > 0 {
			d.fault(&r.faults, "storm.rainfall", "the job has rainfall = %q and a [storm.equation]: leave one of them out", file)
		}
	}
	if _, ok := d.values["storm.return_period"]; !ok {
		r.faults.Add(d.file, 0, 0, "no return_period in [storm]: name the design storm in years, for example return_period = 10")
	}
	if s.Criteria.MinSlope > s.Criteria.MaxSlope {
		r.faults.Add(d.file, 0, 0, "min_slope %g is over max_slope %g", s.Criteria.MinSlope, s.Criteria.MaxSlope)
	}
	return s
}

// merged lays the settings of several lists together.
func merged[V any](lists ...map[string]V) map[string]V {
	all := map[string]V{}
	for _, list := range lists {
		maps.Copy(all, list)
	}
	return all
}

// text reads a key that holds a text; "" where it is not there.
func (r *reader) text(d document, key string) string {
	v, ok := d.values[key]
	if !ok {
		return ""
	}
	t, ok := v.(string)
	if !ok {
		d.fault(&r.faults, key, "%s takes a text in quotes, not %s", key, kindOf(v))
	}
	return t
}

// applyCriteriaSet reads the file that [criteria] set names, before the job's own keys.
func (r *reader) applyCriteriaSet(d document, s *Settings) {
	name := r.text(d, "criteria.set")
	if name == "" {
		return
	}
	text, ok := r.readFile(name)
	if !ok {
		return
	}
	set := parseTOML(r.path(name), text, &r.faults)
	s.Criteria.Title, s.Criteria.File = r.text(set, "title"), name
	if s.Criteria.Title == "" && len(set.keys) > 0 {
		r.faults.Add(set.file, 0, 0, "a criteria set needs a title, which is printed on every output")
	}
	if u := r.text(set, "units"); u != "" && u != s.Units.Name {
		set.fault(&r.faults, "units", "the criteria are in units %q and the job is in %q; name a set in the job's units", u, s.Units.Name)
	}
	for _, key := range set.keys {
		r.apply(set, key, key, criteriaSet, s)
	}
}

// applySections goes through the keys of job.toml in the order of the file.
func (r *reader) applySections(d document, s *Settings) {
	for _, key := range d.keys {
		table, name, nested := strings.Cut(key, ".")
		if !nested {
			table, name = "", key
		}
		if table == "files" || table == "columns" || isEquation(key) {
			continue
		}
		i := slices.IndexFunc(jobSections, func(sec section) bool { return sec.name == table })
		if i < 0 {
			d.fault(&r.faults, key, "unknown table [%s]: %s", table, fault.Suggest(table, []string{"storm", "criteria", "grade", "output", "unknown", "files", "columns"}))
			continue
		}
		r.apply(d, key, name, jobSections[i], s)
	}
}

// apply judges one key of a section.
func (r *reader) apply(d document, key, name string, sec section, s *Settings) {
	v := d.values[key]
	if n, ok := sec.numbers[name]; ok {
		r.applyNumber(d, key, v, n, s)
		return
	}
	if w, ok := sec.words[name]; ok {
		r.applyWord(d, key, v, w, s)
		return
	}
	if set, ok := sec.switches[name]; ok {
		b, isBool := v.(bool)
		if !isBool {
			d.fault(&r.faults, key, "%s is true or false, not %s", name, kindOf(v))
			return
		}
		set(s, b)
		return
	}
	if slices.Contains(sec.texts, name) || strings.HasPrefix(name, "x_") || strings.HasPrefix(name, "note") {
		return
	}
	d.fault(&r.faults, key, "unknown setting %q: %s", key, fault.Suggest(name, sec.known()))
}

func (r *reader) applyNumber(d document, key string, v any, n number, s *Settings) {
	x, ok := asNumber(v)
	if !ok {
		d.fault(&r.faults, key, "%s takes %s, not %s", key, n.describe, kindOf(v))
		return
	}
	if math.IsNaN(x) || math.IsInf(x, 0) || x < n.low || x > n.high || n.openLow && x == n.low {
		d.fault(&r.faults, key, "%s = %g: it takes %s", key, x, n.describe)
		return
	}
	n.set(s, x)
}

func (r *reader) applyWord(d document, key string, v any, w word, s *Settings) {
	t, isText := v.(string)
	i := slices.Index(w.words, t)
	if !isText || i < 0 {
		d.fault(&r.faults, key, "%s = %v: write one of %s", key, v, quoted(w.words))
		return
	}
	w.set(s, i)
}

// applyFiles reads [files] and [columns.…].
func (r *reader) applyFiles(d document, s *Settings) {
	tables := slices.Sorted(maps.Keys(tableFiles))
	for _, key := range d.keys {
		parts := strings.SplitN(key, ".", 3)
		switch {
		case parts[0] == "files" && len(parts) == 2:
			if !slices.Contains(tables, parts[1]) {
				d.fault(&r.faults, key, "unknown table %q: %s", parts[1], fault.Suggest(parts[1], tables))
				continue
			}
			s.Files[parts[1]] = r.text(d, key)
			if parts[1] == "rainfall" {
				s.Rainfall = s.Files["rainfall"]
			}
		case parts[0] == "columns" && len(parts) == 3:
			r.applyColumn(d, key, parts[1], parts[2], s)
		case parts[0] == "columns" || parts[0] == "files":
			d.fault(&r.faults, key, "write [files] table = \"name.csv\" and [columns.table] field = \"heading\"")
		}
	}
}

func (r *reader) applyColumn(d document, key, table, field string, s *Settings) {
	fields, ok := tableFields[table]
	if !ok {
		d.fault(&r.faults, key, "unknown table %q: %s", table, fault.Suggest(table, slices.Collect(maps.Keys(tableFields))))
		return
	}
	if !slices.Contains(fields, field) {
		d.fault(&r.faults, key, "%s has no field %q: %s", table, field, fault.Suggest(field, fields))
		return
	}
	if s.Columns[table] == nil {
		s.Columns[table] = map[string]string{}
	}
	s.Columns[table][field] = strings.TrimSpace(r.text(d, key))
}

func asNumber(v any) (float64, bool) {
	switch x := v.(type) {
	case int64:
		return float64(x), true
	case float64:
		return x, true
	}
	return 0, false
}

func kindOf(v any) string {
	switch x := v.(type) {
	case string:
		return fmt.Sprintf("the text %q", x)
	case bool:
		return fmt.Sprintf("%t", x)
	case int64, float64:
		return fmt.Sprintf("the number %v", x)
	case []any:
		return "a list"
	}
	return "a date or time"
}

func quoted(words []string) string {
	q := make([]string, len(words))
	for i, w := range words {
		q[i] = fmt.Sprintf("%q", w)
	}
	return strings.Join(q, ", ")
}

func folderName(dir string) string {
	if abs, err := filepath.Abs(dir); err == nil {
		return filepath.Base(abs)
	}
	return filepath.Base(dir)
}
